package org.solewright.analysis.cost;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import org.junit.jupiter.api.Test;
import org.solewright.domain.cost.ComparedLimb;
import org.solewright.domain.cost.Comparison;
import org.solewright.domain.cost.Posture;
import org.solewright.domain.cost.PostureRow;
import org.solewright.domain.cost.TransitionRow;
import org.solewright.domain.cost.WorkForm;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.Quantity;

class ComparedPosturesTest {

    private static final ComparedPostures.TakenStep STEP =
            new ComparedPostures.TakenStep("walk", "1", 0.793, 1.675, 83.2, 9.80665);
    private static final Posture COMPASS = new Posture(Posture.Kind.COMPASS, OptionalInt.of(0));
    private static final Posture PLANTIGRADE_1 = new Posture(Posture.Kind.PLANTIGRADE, OptionalInt.of(1));
    private static final Posture ROLLING = new Posture(Posture.Kind.ROLLING_ARC, OptionalInt.empty());
    private static final Posture DIGITIGRADE = new Posture(Posture.Kind.DIGITIGRADE, OptionalInt.of(1));
    private static final Posture UNGULIGRADE = new Posture(Posture.Kind.UNGULIGRADE, OptionalInt.of(0));

    @Test
    void worksAndCrossoversOfTheDesignsCheck() {
        // independent: design 03 section 8, check line, three digits
        ComparedPostures flat = ComparedPostures.of(limb(0.213, 1.144), STEP);
        assertThat(flat.work(COMPASS).orElseThrow()).isCloseTo(42.3, within(0.05));
        assertThat(flat.work(PLANTIGRADE_1).orElseThrow()).isCloseTo(25.7, within(0.05));
        assertThat(flat.crossover().low().orElseThrow()).isCloseTo(0.271, within(0.0005));
        assertThat(flat.crossover().high().orElseThrow()).isCloseTo(0.990, within(0.0005));
        assertThat(flat.crossoverReference()).isEqualTo("unguligrade");
        ComparedPostures longer = ComparedPostures.of(limb(0.29, 1.09), STEP);
        assertThat(longer.work(PLANTIGRADE_1).orElseThrow()).isCloseTo(22.7, within(0.05));
        assertThat(longer.work(UNGULIGRADE).orElseThrow()).isCloseTo(30.9, within(0.05));
    }

    @Test
    void everyPostureHasARowPerComparisonAndForm() {
        ComparedPostures all = ComparedPostures.of(whole(), STEP);
        assertThat(all.rows()).hasSize(10 * 4 * 2);
        assertThat(all.findings()).isEmpty();
        assertThat(all.rows()).allMatch(r -> r.workPerStep().isPresent());
        assertThat(all.rows().get(0).cells()).hasSameSizeAs(PostureRow.COLUMNS);
        assertThat(all.rows().stream().map(r -> r.posture().word()).distinct())
                .containsExactly(
                        "compass",
                        "plantigrade_1",
                        "plantigrade_2",
                        "plantigrade_3",
                        "plantigrade_4",
                        "plantigrade_5",
                        "plantigrade_6",
                        "rolling_arc",
                        "digitigrade",
                        "unguligrade");
    }

    @Test
    void sameFroudeScalesStepAndSpeedWithTheLimb() {
        PostureRow row =
                row(ComparedPostures.of(whole(), STEP), UNGULIGRADE, Comparison.SAME_FROUDE, WorkForm.PUSH_OFF);
        // exact: D/r and v^2/r as for the measured limb
        assertThat(row.stepLength() / 1.144).isCloseTo(0.793 / 0.931, within(1e-14));
        assertThat(row.speed() * row.speed() / 1.144).isCloseTo(1.675 * 1.675 / 0.931, within(1e-13));
        // exact: the push-off factor q/(4-q) depends on D/r alone, so the work grows as v^2, that is as r
        PostureRow compass = row(ComparedPostures.of(whole(), STEP), COMPASS, Comparison.MEASURED, WorkForm.PUSH_OFF);
        assertThat(row.workPerStep().orElseThrow())
                .isCloseTo(compass.workPerStep().orElseThrow() * 1.144 / 0.931, within(1e-11));
        assertThat(row.costOfTransport().orElseThrow())
                .isCloseTo(compass.costOfTransport().orElseThrow(), within(1e-13));
    }

    @Test
    void shorterStepKeepsTheSpeed() {
        PostureRow row = row(ComparedPostures.of(whole(), STEP), COMPASS, Comparison.STEP_08, WorkForm.SIMULTANEOUS);
        assertThat(row.stepLength()).isCloseTo(0.8 * 0.793, within(1e-15));
        assertThat(row.speed()).isEqualTo(1.675);
        // exact: q/2 grows as D^2; per metre as D
        PostureRow full = row(ComparedPostures.of(whole(), STEP), COMPASS, Comparison.MEASURED, WorkForm.SIMULTANEOUS);
        assertThat(row.workPerStep().orElseThrow())
                .isCloseTo(0.64 * full.workPerStep().orElseThrow(), within(1e-12));
        assertThat(row.workPerMetre().orElseThrow())
                .isCloseTo(0.8 * full.workPerMetre().orElseThrow(), within(1e-12));
    }

    @Test
    void shortArcPivotsOnItsEdges() {
        PostureRow row = row(ComparedPostures.of(whole(), STEP), ROLLING, Comparison.MEASURED, WorkForm.SIMULTANEOUS);
        // independent: distance of hip and edge by coordinates, half the uncovered step over it is the sine of half the
        // angle, 2 sin^2 of that
        double half = 0.2 / (2 * 0.3);
        double edge = Math.hypot(0.3 * Math.sin(half), 0.931 - 0.3 + 0.3 * Math.cos(half));
        double sine = (0.793 - 0.2) / (2 * edge);
        assertThat(row.workPerStep().orElseThrow())
                .isCloseTo(2 * sine * sine * 83.2 * 1.675 * 1.675 / 2, within(1e-11));
    }

    @Test
    void weakerBasisCounts() {
        ComparedPostures all = ComparedPostures.of(whole(), STEP);
        assertThat(row(all, DIGITIGRADE, Comparison.MEASURED, WorkForm.PUSH_OFF).basis())
                .isEqualTo(Basis.ASSUMED);
        assertThat(row(all, COMPASS, Comparison.MEASURED, WorkForm.PUSH_OFF).basis())
                .isEqualTo(Basis.MEASURED);
    }

    @Test
    void whatIsUnknownIsLeftOutWithAFinding() {
        ComparedLimb bare = new ComparedLimb(
                measured(0.931),
                Optional.empty(),
                Optional.empty(),
                Optional.empty(),
                Optional.empty(),
                Optional.empty());
        ComparedPostures only = ComparedPostures.of(bare, STEP);
        assertThat(only.rows()).hasSize(8);
        assertThat(only.work(ROLLING)).isEmpty();
        assertThat(only.crossoverReference()).isEmpty();
        assertThat(only.findings())
                .extracting(Finding::code)
                .containsExactly(
                        "postures.length-unknown",
                        "postures.arc-unknown",
                        "postures.length-unknown",
                        "postures.length-unknown");
    }

    @Test
    void flatOrTooLargeArcIsLeftOutWithAFinding() {
        ComparedLimb flat = new ComparedLimb(
                measured(0.931),
                Optional.of(measured(0.213)),
                Optional.of(new ComparedLimb.Arc(measured(0), measured(0.2))),
                Optional.empty(),
                Optional.empty(),
                Optional.of(measured(1.144)));
        ComparedPostures compared = ComparedPostures.of(flat, STEP);
        assertThat(compared.work(ROLLING)).isEmpty();
        assertThat(compared.findings()).extracting(Finding::code).contains("postures.arc-outside");
    }

    @Test
    void postureOutOfReachHasAnEmptyRowAndAFinding() {
        ComparedPostures compared = ComparedPostures.of(
                limb(0.213, 1.144), new ComparedPostures.TakenStep("walk", "1", 2.0, 1.675, 83.2, 9.80665));
        PostureRow row = row(compared, COMPASS, Comparison.MEASURED, WorkForm.PUSH_OFF);
        assertThat(row.workPerStep()).isEmpty();
        assertThat(row.cells().get(11)).isEmpty();
        assertThat(compared.findings())
                .anyMatch(f -> f.code().equals("postures.out-of-reach")
                        && f.message().startsWith("compass, measured: PIVOT_SPACING_OUT_OF_REACH"));
    }

    @Test
    void fillsTheWideColumns() {
        TransitionRow.Builder builder = TransitionRow.builder();
        ComparedPostures.of(whole(), STEP).fill(builder);
        TransitionRow row = builder.build();
        for (String column : List.of(
                "compass_J", "plantigrade_6_J", "rolling_arc_J", "digitigrade_J", "unguligrade_J", "crossover_low_m")) {
            assertThat(row.number(column)).as(column).isPresent();
        }
        assertThat(row.text("crossover_reference")).contains("unguligrade");
    }

    @Test
    void equalLimbsHaveOneCrossover() {
        FootCrossover same = FootCrossover.simultaneous(1, 0.2, 0.9, 0.9);
        // exact: a = 1 leaves D = f (1 + 1/N)/2 = f, which is not longer than the foot
        assertThat(same.low()).isEmpty();
        assertThat(same.high()).isEmpty();
        FootCrossover longLimb = FootCrossover.simultaneous(1, 0.2, 0.95, 0.9);
        // exact: a shorter reference limb costs more at every step, no upper crossover
        assertThat(longLimb.high()).isEmpty();
    }

    @Test
    void rootFindingAgreesWithTheFormula() {
        FootCrossover formula = FootCrossover.simultaneous(2, 0.213, 0.931, 1.144);
        FootCrossover roots = FootCrossover.of(WorkForm.SIMULTANEOUS, 2, 0.213, 0.931, 1.144);
        // independent: closed form against roots of the difference; N = 2 starts below its low crossover only if D > f
        assertThat(roots.high().orElseThrow()).isCloseTo(formula.high().orElseThrow(), within(1e-12));
        assertThat(roots.low().isPresent()).isEqualTo(formula.low().isPresent());
    }

    private static PostureRow row(ComparedPostures all, Posture posture, Comparison comparison, WorkForm form) {
        return all.rows().stream()
                .filter(r -> r.posture().equals(posture) && r.comparison() == comparison && r.workForm() == form)
                .findFirst()
                .orElseThrow();
    }

    private static ComparedLimb limb(double foot, double toeTip) {
        return new ComparedLimb(
                measured(0.931),
                Optional.of(measured(foot)),
                Optional.empty(),
                Optional.empty(),
                Optional.empty(),
                Optional.of(measured(toeTip)));
    }

    private static ComparedLimb whole() {
        return new ComparedLimb(
                measured(0.931),
                Optional.of(measured(0.213)),
                Optional.of(new ComparedLimb.Arc(measured(1 / 0.3), measured(0.2))),
                Optional.of(Quantity.of(1.03, Basis.ASSUMED)),
                Optional.of(measured(0.07)),
                Optional.of(measured(1.144)));
    }

    private static Quantity measured(double value) {
        return Quantity.of(value, Basis.MEASURED);
    }
}
