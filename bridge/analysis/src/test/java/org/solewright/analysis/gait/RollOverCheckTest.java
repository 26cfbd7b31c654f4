package org.solewright.analysis.gait;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.List;
import java.util.function.DoubleUnaryOperator;
import org.junit.jupiter.api.Test;
import org.solewright.domain.geometry.Vec3;

/**
 * A foot made for the test: 0.2 m from heel to heads, both at 0.03 m in standing over a floor at 0.5 m; heights, ankle and
 * centre of pressure are given functions of the place in stance. Tolerance: one of 400 samples where a number falls on one.
 */
class RollOverCheckTest {

    private static final double FLOOR = 0.5;
    private static final double SAMPLE = 1.0 / 400;
    private static final StanceFoot.Standing STOOD = new StanceFoot.Standing(0.03, 0.03, 0.03, 0.02, 0);
    private static final RollOverCheck.Limits LIMITS = new RollOverCheck.Limits(0.010, 0.27, 50);

    private static StanceFoot foot(DoubleUnaryOperator heel, DoubleUnaryOperator heads, DoubleUnaryOperator cop) {
        return new StanceFoot(samples(heel, heads, cop), STOOD, FLOOR);
    }

    private static List<StanceFoot.Sample> samples(
            DoubleUnaryOperator heel, DoubleUnaryOperator heads, DoubleUnaryOperator cop) {
        List<StanceFoot.Sample> samples = new ArrayList<>();
        for (int i = -1; i <= 401; i++) {
            double p = i * SAMPLE;
            double h = FLOOR + 0.03 + heel.applyAsDouble(p);
            double m = FLOOR + 0.03 + heads.applyAsDouble(p);
            samples.add(new StanceFoot.Sample(
                    p,
                    p > 0.01 && p < 0.99 ? 700 : 10,
                    new Vec3(1, h, 0.1),
                    new Vec3(1.2, m, 0.06),
                    new Vec3(1.2, m, 0.14),
                    new Vec3(1.27, FLOOR + 0.02, 0.1),
                    new Vec3(1.05, FLOOR + 0.09, 0.1),
                    new Vec3(1 + cop.applyAsDouble(p), FLOOR, 0.1)));
        }
        return samples;
    }

    /** Heads come down by 10 % of stance, the heel rises from 50 % on, by 0.1 m a stance each. */
    private static StanceFoot person() {
        return foot(p -> Math.max(0, 0.1 * (p - 0.5)), p -> Math.max(0, 0.1 * (0.2 - p)), p -> 0.25 * p);
    }

    @Test
    void eventsOfAKnownFootComeOut() {
        RollOverCheck check = RollOverCheck.of(person(), LIMITS);
        // exact: atan(0.1 * 0.2 / 0.2) at contact.
        assertThat(check.contactAngle()).isCloseTo(Math.atan(0.1), within(1e-9));
        // exact: heads 10 mm up at 0.2 - 0.1, heel 10 mm up at 0.5 + 0.1.
        assertThat(check.flat().from()).isCloseTo(0.1, within(1e-9));
        assertThat(check.flat().to()).isCloseTo(0.6, within(1e-9));
        assertThat(check.heelRise()).isCloseTo(0.6, within(1e-9));
    }

    @Test
    void placesThatBoreLoadComeOut() {
        RollOverCheck check = RollOverCheck.of(person(), LIMITS);
        // exact: behind the ankle up to 0.05 / 0.25; line at 0.2 with 0.05 * 0.27 to either side.
        assertThat(check.heel().from()).isZero();
        assertThat(check.heel().to()).isCloseTo(0.2, within(1.5 * SAMPLE));
        assertThat(check.heelShare()).isCloseTo(0.2, within(1.5 * SAMPLE));
        assertThat(check.heads().from()).isCloseTo((0.2 - 0.0135) / 0.25, within(1.5 * SAMPLE));
        assertThat(check.heads().to()).isCloseTo((0.2 + 0.0135) / 0.25, within(1.5 * SAMPLE));
        assertThat(check.toes().to()).isEqualTo(1);
        // exact: samples 5 to 395 of 400 bear more than 50 N.
        assertThat(check.travel()).isCloseTo(0.25 * 390 * SAMPLE, within(1e-9));
        assertThat(check.leastHeel()).isCloseTo(0, within(1e-12));
        assertThat(check.isHeelBearing()).isTrue();
        assertThat(check.posture(0.27, true)).isEqualTo(RollOverCheck.Posture.PLANTIGRADE);
    }

    @Test
    void posturesOfAnimalsAreTold() {
        StanceFoot digits = foot(p -> 0.08, p -> 0, p -> 0.2 + 0.06 * p);
        RollOverCheck check = RollOverCheck.of(digits, LIMITS);
        assertThat(check.isHeelBearing()).isFalse();
        assertThat(check.heelRise()).as("never low").isNaN();
        assertThat(check.flat().isKnown()).isFalse();
        assertThat(check.posture(0.27, true)).isEqualTo(RollOverCheck.Posture.DIGITIGRADE);
        assertThat(check.posture(0.27, false)).isEqualTo(RollOverCheck.Posture.UNDETERMINED);
        RollOverCheck tips = RollOverCheck.of(foot(p -> 0.12, p -> 0.05, p -> 0.26), LIMITS);
        assertThat(tips.posture(0.27, true)).isEqualTo(RollOverCheck.Posture.UNGULIGRADE);
        RollOverCheck stuck = RollOverCheck.of(foot(p -> 0, p -> 0, p -> 0.01), LIMITS);
        assertThat(stuck.posture(0.27, true)).isEqualTo(RollOverCheck.Posture.UNDETERMINED);
    }

    @Test
    void withoutFootLengthNoPlaceIsTold() {
        RollOverCheck check = RollOverCheck.of(person(), new RollOverCheck.Limits(0.010, Double.NaN, 50));
        assertThat(check.heelShare()).isNaN();
        assertThat(check.heads().isKnown()).isFalse();
        assertThat(check.heelRise()).isCloseTo(0.6, within(1e-9));
        assertThat(check.posture(Double.NaN, true)).isEqualTo(RollOverCheck.Posture.UNDETERMINED);
    }

    @Test
    void floorIsThatOfTheLandmarksThatStandOnIt() {
        List<StanceFoot.Sample> raised = samples(p -> 0.05, p -> 0.002, p -> 0.2);
        // exact: toe 0, heads 2 mm twice, the heel 50 mm up is left out: 4/3 mm.
        assertThat(StanceFoot.floor(raised, STOOD, 0.010).orElseThrow()).isCloseTo(FLOOR + 0.004 / 3, within(1e-12));
        assertThat(StanceFoot.floor(List.of(), STOOD, 0.010)).isEmpty();
    }

    @Test
    void stanceWithoutSamplesKnowsNothing() {
        RollOverCheck check = RollOverCheck.of(new StanceFoot(List.of(), STOOD, FLOOR), LIMITS);
        assertThat(check.contactAngle()).isNaN();
        assertThat(check.travel()).isNaN();
        assertThat(check.isPastHeads()).isFalse();
    }
}
