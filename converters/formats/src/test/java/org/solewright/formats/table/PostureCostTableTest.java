package org.solewright.formats.table;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.solewright.domain.cost.TransitionColumns;
import org.solewright.domain.cost.TransitionRow;
import org.solewright.domain.gait.CurveRow;
import org.solewright.domain.gait.Side;

class PostureCostTableTest {

    // published: design 05, posture-cost.csv, copied from there
    private static final String FIXED = "trial,step,side,trailing_side,window,step_length_m,step_width_m,step_time_s,"
            + "speed_m_s,speed_before_m_s,mass_kg,limb_length_m,foot_length_m,effective_foot_length_m,"
            + "push_off_J,collision_J,rebound_J,preload_J,push_off_ds_J,collision_ds_J,combined_positive_J,"
            + "combined_negative_J,"
            + "transition_angle_deg,transition_angle_ds_deg,collision_angle_deg,collision_fraction,"
            + "mechanical_cost_of_transport,com_height_range_m,"
            + "rolling_radius_m,effective_segments,posture,compass_J,plantigrade_1_J,plantigrade_2_J,plantigrade_3_J,"
            + "plantigrade_4_J,plantigrade_5_J,plantigrade_6_J,rolling_arc_J,digitigrade_J,unguligrade_J,"
            + "crossover_low_m,crossover_step_length_m,crossover_reference,ankle_foot_work_pos_J,"
            + "ankle_foot_work_neg_J,foot_work_pos_J,foot_work_neg_J,"
            + "audit_force_residual_bw,audit_energy_residual,findings,";

    @TempDir
    Path folder;

    @Test
    void headerIsTheFixedOrderThenDeviationsThenDimensionlessThenSummary() {
        String header = new String(PostureCostTable.bytes(List.of()), StandardCharsets.UTF_8);
        assertThat(header)
                .startsWith(FIXED)
                .endsWith(",speed_nd,step_length_nd,push_off_nd,collision_nd,of,n,ankle_work_pos_J,ankle_work_neg_J\n");
        List<String> between = Arrays.asList(
                header.substring(FIXED.length(), header.indexOf(",speed_nd")).split(","));
        assertThat(between).allMatch(name -> name.endsWith("_sd")).contains("push_off_J_sd", "speed_m_s_sd");
        assertThat(header.strip().split(",")).doesNotHaveDuplicates();
    }

    @Test
    void emptyCellsStayEmptyAndNumbersReadBackTheSame() throws Exception {
        TransitionRow row = TransitionRow.builder()
                .text("trial", "a, \"b\"")
                .number("push_off_J", 0.1 + 0.2)
                .number("collision_J", -1e-7)
                .number("rebound_J", Double.NaN)
                .count("effective_segments", 2)
                .build();
        Path file = folder.resolve("posture-cost.csv");
        PostureCostTable.write(file, List.of(row));
        List<String> lines = Files.readAllLines(file);
        assertThat(lines).hasSize(2);
        assertThat(lines.get(1)).startsWith("\"a, \"\"b\"\"\",,,,,,").contains(",0.30000000000000004,-1.0E-7,,,");
        assertThat(lines.get(1).length() - lines.get(1).replace(",", "").length())
                .isEqualTo(TransitionColumns.ALL.size()); // the separators, one less than columns, and one in the name
    }

    @Test
    void unknownColumnIsRefused() {
        assertThatThrownBy(() -> TransitionRow.builder().number("push_off", 1))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessage("'push_off' is not a column of numbers of the posture-cost table");
        assertThatThrownBy(() -> TransitionRow.builder().number("side", 1))
                .isInstanceOf(IllegalArgumentException.class);
    }

    @Test
    void unitsComeFromTheNames() {
        assertThat(TransitionColumns.unit("speed_before_m_s")).isEqualTo("m/s");
        assertThat(TransitionColumns.unit("push_off_J_sd")).isEqualTo("J");
        assertThat(TransitionColumns.unit("step_length_m")).isEqualTo("m");
        assertThat(TransitionColumns.unit("transition_angle_ds_deg")).isEqualTo("deg");
        assertThat(TransitionColumns.unit("push_off_nd")).isEqualTo("1");
        assertThat(TransitionColumns.unit("collision_fraction")).isEqualTo("1");
        assertThat(TransitionColumns.unit("side")).isEmpty();
    }

    @Test
    void curvesHaveTheirColumnsAndEmptyCells() {
        byte[] bytes = CurvesTable.bytes(List.of(
                new CurveRow("w.c3d", "1", Side.LEFT, "force_up", "N", 0, 12.5, OptionalDouble.empty(), 1),
                new CurveRow("w.c3d", "1", Side.LEFT, "force_up", "N", 1, Double.NaN, OptionalDouble.of(2), 1)));
        assertThat(new String(bytes, StandardCharsets.UTF_8))
                .isEqualTo("trial,step,side,curve,unit,percent,mean,sd,n\n"
                        + "w.c3d,1,left,force_up,N,0.0,12.5,,1\n"
                        + "w.c3d,1,left,force_up,N,1.0,,2.0,1\n");
    }
}
