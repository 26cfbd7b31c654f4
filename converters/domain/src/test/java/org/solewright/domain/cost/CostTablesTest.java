package org.solewright.domain.cost;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.finding.Quantity;

/** Heads and cells of the cost tables; the heads are those that scripts of users are written against. */
class CostTablesTest {

    @Test
    void transitionColumnsStandInTheirPromisedOrder() {
        String head = String.join(",", TransitionColumns.ALL);
        assertThat(head)
                .startsWith("trial,step,side,trailing_side,window,step_length_m,step_width_m,step_time_s,speed_m_s,"
                        + "speed_before_m_s,mass_kg,limb_length_m,foot_length_m,effective_foot_length_m,"
                        + "push_off_J,collision_J,rebound_J,preload_J,push_off_ds_J,collision_ds_J,"
                        + "combined_positive_J,combined_negative_J,"
                        + "transition_angle_deg,transition_angle_ds_deg,collision_angle_deg,collision_fraction,"
                        + "mechanical_cost_of_transport,com_height_range_m,"
                        + "rolling_radius_m,effective_segments,posture,compass_J,plantigrade_1_J,plantigrade_2_J,"
                        + "plantigrade_3_J,plantigrade_4_J,plantigrade_5_J,plantigrade_6_J,rolling_arc_J,"
                        + "digitigrade_J,unguligrade_J,"
                        + "crossover_low_m,crossover_step_length_m,crossover_reference,"
                        + "ankle_foot_work_pos_J,ankle_foot_work_neg_J,foot_work_pos_J,foot_work_neg_J,"
                        + "audit_force_residual_bw,audit_energy_residual,findings,step_length_m_sd,")
                .endsWith(",speed_nd,step_length_nd,push_off_nd,collision_nd,of,n,ankle_work_pos_J,ankle_work_neg_J");
        assertThat(TransitionColumns.ALL).doesNotHaveDuplicates();
    }

    @Test
    void everyMeasureAndPostureHasItsColumn() {
        for (Measure measure : Measure.values()) {
            assertThat(TransitionColumns.MEASURED).contains(measure.column());
        }
        for (Posture posture : Posture.all()) {
            assertThat(TransitionColumns.ALL).contains(posture.word() + "_J");
        }
    }

    @ParameterizedTest
    @CsvSource({
        "step_length_m, m",
        "step_length_m_sd, m",
        "speed_before_m_s, m/s",
        "step_time_s, s",
        "mass_kg, kg",
        "push_off_J_sd, J",
        "transition_angle_deg, deg",
        "collision_fraction, 1",
        "n, 1",
        "findings, ''"
    })
    void unitOfAColumnIsTheEndOfItsName(String column, String unit) {
        assertThat(TransitionColumns.unit(column)).isEqualTo(unit);
    }

    @Test
    void anglesStandInDegreesAndEverythingElseInSi() {
        // exact: pi rad is 180 degrees.
        assertThat(Measure.COLLISION_ANGLE.inColumnUnit(Math.PI)).isCloseTo(180, within(1e-12));
        assertThat(Measure.PUSH_OFF.inColumnUnit(7.5)).isEqualTo(7.5);
    }

    @Test
    void cellsStandInTheOrderOfTheColumns() {
        TransitionRow row = TransitionRow.builder()
                .number("push_off_J", 12.5)
                .count("n", 3)
                .text("trial", "walk")
                .number("speed_m_s", Double.NaN)
                .number("collision_J", OptionalDouble.empty())
                .text("findings", "")
                .build();
        assertThat(row.cells().keySet()).containsExactly("trial", "push_off_J", "n");
        assertThat(row.number("push_off_J")).hasValue(12.5);
        assertThat(row.number("n")).hasValue(3);
        assertThat(row.number("trial")).isEmpty();
        assertThat(row.text("n")).contains("3");
        assertThat(row.text("push_off_J")).contains("12.5");
        assertThat(row.text("speed_m_s")).isEmpty();
    }

    @Test
    void columnsThatAreNoneAreRefused() {
        assertThatThrownBy(() -> TransitionRow.builder().number("push_off", 1))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessage("'push_off' is not a column of numbers of the posture-cost table");
        assertThatThrownBy(() -> TransitionRow.builder().text("push_off_J", "much"))
                .hasMessage("'push_off_J' is not a column of words of the posture-cost table");
        assertThatThrownBy(() -> new TransitionRow(Map.of("colour", new TransitionRow.Text("red"))))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessageContaining("colour");
    }

    @Test
    void postureRowHasACellForEachColumn() {
        PostureRow row = new PostureRow(
                "walk",
                "2",
                new Posture(Posture.Kind.PLANTIGRADE, OptionalInt.of(3)),
                0.9,
                0.2,
                Basis.MEASURED,
                Comparison.SAME_FROUDE,
                WorkForm.SIMULTANEOUS,
                0.6,
                1.25,
                OptionalDouble.of(4.5),
                OptionalDouble.of(7.5),
                OptionalDouble.empty());
        assertThat(row.cells())
                .hasSameSizeAs(PostureRow.COLUMNS)
                .containsExactly(
                        "walk",
                        "2",
                        "plantigrade_3",
                        "3",
                        "0.9",
                        "0.2",
                        "measured",
                        "same-froude",
                        "simultaneous",
                        "0.6",
                        "1.25",
                        "4.5",
                        "7.5",
                        "");
        assertThat(String.join(",", PostureRow.COLUMNS))
                .isEqualTo("trial,step,posture,segments,limb_m,foot_m,basis,comparison,work_form,step_length_m,"
                        + "speed_m_s,work_per_step_J,work_per_metre_J,cost_of_transport");
    }

    @Test
    void landscapeRowSumsItsIndex() {
        LandscapeRow row = new LandscapeRow(
                2,
                FootRule.OPTIMUM,
                0.9,
                OptionalDouble.of(0.25),
                0.6,
                1.25,
                WorkForm.PUSH_OFF,
                OptionalDouble.of(3),
                OptionalDouble.of(0.01),
                Optional.of(new LandscapeRow.Index(0.5, 0.25, 0.125)),
                OptionalDouble.empty());
        // exact: 1/2 + 1/4 + 1/8 = 7/8
        assertThat(row.cells())
                .containsExactly(
                        "2", "optimum", "0.9", "0.25", "0.6", "1.25", "pushOff", "3.0", "0.01", "0.5", "0.25", "0.125",
                        "0.875", "");
        assertThat(String.join(",", LandscapeRow.COLUMNS))
                .isEqualTo("segments,foot_rule,leg_m,foot_m,step_length_m,speed_m_s,work_form,work_per_step_J,"
                        + "cost_of_transport,index_work,index_swing,index_activation,index_total,"
                        + "crossover_step_length_m");
    }

    @Test
    void wordsOfComparisonsAndFormsAreThoseOfTheTables() {
        assertThat(Stream.of(Comparison.values()).map(Comparison::word))
                .containsExactly("measured", "same-froude", "step-0.9", "step-0.8");
        assertThat(Stream.of(WorkForm.values()).map(WorkForm::word))
                .containsExactly("noPush", "pushOff", "simultaneous", "noPushSmallAngle", "pushOffSmallAngle");
        assertThat(Stream.of(FootRule.values()).map(FootRule::word)).containsExactly("given", "equal", "optimum");
    }

    @Test
    void limbOfImpossibleLengthsIsRefused() {
        Quantity good = Quantity.of(0.9, Basis.MEASURED);
        Quantity none = Quantity.of(0, Basis.MEASURED);
        assertThatThrownBy(() -> limb(none, Optional.empty())).hasMessage("limb length 0.0 m, expected more than 0 m");
        assertThatThrownBy(() -> limb(good, Optional.of(none))).hasMessage("foot length 0.0 m, expected more than 0 m");
        assertThatThrownBy(() -> new ComparedLimb.Arc(none, Quantity.of(-0.1, Basis.MEASURED)))
                .hasMessage("arc length -0.1 m, expected 0 m or more");
        assertThat(List.of(limb(good, Optional.of(good)).limbLength())).containsExactly(good);
    }

    private static ComparedLimb limb(Quantity length, Optional<Quantity> foot) {
        return new ComparedLimb(length, foot, Optional.empty(), Optional.empty(), Optional.empty(), Optional.empty());
    }
}
