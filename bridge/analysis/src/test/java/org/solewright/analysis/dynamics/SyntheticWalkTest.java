package org.solewright.analysis.dynamics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;
import org.solewright.domain.cost.WalkTruth;

class SyntheticWalkTest {

    private static final WalkParameters ONE_SEGMENT = new WalkParameters(70, 0.95, 1, 0.2, 0.65, 1.35, 0.35, 0.6, 9.81);
    private static final WalkParameters THREE_SEGMENTS =
            new WalkParameters(70, 0.95, 3, 0.24, 0.6, 1.35, 0.4, 0.6, 9.81);

    @Test
    void accelerationIsTheSecondDerivativeOfThePath() {
        SyntheticWalk walk = new SyntheticWalk(THREE_SEGMENTS);
        double[] before = new double[6];
        double[] now = new double[6];
        double[] after = new double[6];
        double h = 1e-4;
        for (double t = -0.3; t < 1.3; t += 0.00711) {
            walk.hip(t - h, before);
            walk.hip(t, now);
            walk.hip(t + h, after);
            // independent: central differences; h^2/6 of the third, h^2/12 of the fourth derivative (up to 1e4 m/s4
            // where
            // bridges begin and the third derivative jumps by some 300 m/s3, times h) and rounding 1e-16/h^2
            assertThat(now[2]).isCloseTo((after[0] - before[0]) / (2 * h), within(2e-5));
            assertThat(now[3]).isCloseTo((after[1] - before[1]) / (2 * h), within(2e-5));
            assertThat(now[4]).isCloseTo((after[0] - 2 * now[0] + before[0]) / (h * h), within(0.05));
            assertThat(now[5]).isCloseTo((after[1] - 2 * now[1] + before[1]) / (h * h), within(0.05));
        }
    }

    @Test
    void limbForcesAddUpToNewtonsLaw() {
        SyntheticWalk walk = new SyntheticWalk(ONE_SEGMENT);
        double[] s = new double[6];
        double[] load = new double[3];
        for (double t = 0; t < 2; t += 0.0031) {
            walk.hip(t, s);
            double fx = 0;
            double fz = 0;
            for (int foot = 0; foot < 6; foot++) {
                walk.load(foot, t, load);
                fx += load[0];
                fz += load[1];
            }
            assertThat(fx).isCloseTo(70 * s[4], within(1e-9)); // exact: definition, rounding of forces near 1e3
            assertThat(fz).isCloseTo(70 * (s[5] + 9.81), within(1e-9));
        }
    }

    @Test
    void meanForceOfAStepIsTheWeight() {
        SyntheticWalk walk = new SyntheticWalk(ONE_SEGMENT);
        double[] s = new double[6];
        int n = 20000;
        double mean = 0;
        for (int i = 0; i < n; i++) {
            walk.hip(walk.stepTime() * i / n, s);
            mean += (s[5] + 9.81) / n;
        }
        assertThat(mean).isCloseTo(9.81, within(1e-6)); // exact: periodic velocity; trapezium with continuous values
    }

    @Test
    void energyIsConstantOnVaultsAndRestoredByTransitions() {
        SyntheticWalk walk = new SyntheticWalk(ONE_SEGMENT);
        WalkTruth truth = walk.truth();
        for (WalkTruth.Transition transition : truth.transitions()) {
            if (transition instanceof WalkTruth.Step step) {
                // exact: energy is the same after a step
                assertThat(step.trailingPositive()
                                + step.trailingNegative()
                                + step.leadingPositive()
                                + step.leadingNegative())
                        .isCloseTo(0, within(1e-10));
            } else if (transition instanceof WalkTruth.Inner inner) {
                assertThat(inner.positive() + inner.negative()).isCloseTo(0, within(1e-11));
            }
        }
    }

    @Test
    void shortBridgesTendToTheImpulsiveModels() {
        WalkTruth truth = new SyntheticWalk(new WalkParameters(70, 0.95, 1, 0.2, 0.65, 1.35, 1e-4, 1e-4, 9.81)).truth();
        WalkTruth.Inner inner = (WalkTruth.Inner) truth.transitions().get(0);
        WalkTruth.Step step = (WalkTruth.Step) truth.transitions().get(1);
        // independent: design 04 I7, limits of vanishing bridges; linear in the share 1e-4, factor of some units
        assertThat(step.trailingPositive() / step.impulsive().simultaneous()).isCloseTo(1, within(1e-3));
        assertThat(step.combinedPositive() / step.impulsive().combined()).isCloseTo(1, within(1e-3));
        assertThat(inner.positive() / inner.impulsive().combined()).isCloseTo(1, within(1e-3));
    }

    @Test
    void finiteDoubleSupportCostsMoreThanImpulses() {
        WalkTruth truth = new SyntheticWalk(ONE_SEGMENT).truth();
        WalkTruth.Step step = (WalkTruth.Step) truth.transitions().get(1);
        // independent: design 04 I7, 1.74 times the simultaneous and 3.2 times the push-off work
        assertThat(step.trailingPositive() / step.impulsive().simultaneous()).isCloseTo(1.74, within(0.005));
        assertThat(step.trailingPositive() / step.impulsive().pushOff()).isCloseTo(3.2, within(0.05));
        assertThat(truth.doubleSupport()).isCloseTo(0.13, within(0.005));
    }

    @Test
    void smallInnerBridgeRunsTheCentreOfPressureBackAndForth() {
        assertThat(new SyntheticWalk(THREE_SEGMENTS).truth().centreOfPressureMonotone())
                .isTrue();
        WalkTruth early = new SyntheticWalk(new WalkParameters(70, 0.95, 1, 0.2, 0.65, 1.35, 0.35, 0.1, 9.81)).truth();
        // independent: design 04 I3
        assertThat(early.centreOfPressureMonotone()).isFalse();
    }

    @Test
    void centreOfPressureStandsOnThePivotInVaults() {
        SyntheticWalk walk = new SyntheticWalk(ONE_SEGMENT);
        double[] s = new double[6];
        double[] load = new double[3];
        double[] times = {0.01, 0.05, walk.stepTime() - walk.doubleSupport() - 0.02};
        double[] pivots = {0, 0, 0.2};
        for (int i = 0; i < times.length; i++) {
            walk.hip(times[i], s);
            walk.load(0, times[i], load);
            assertThat(load[2]).isEqualTo(pivots[i]);
            // independent: zero moment about the hip, the law of the intersection of force line and ground
            assertThat(s[0] - s[1] * load[0] / load[1]).isCloseTo(pivots[i], within(1e-12));
        }
    }

    @Test
    void walkThatDoesNotPassTheTopIsRefused() {
        WalkParameters slow = new WalkParameters(70, 0.95, 1, 0.2, 0.65, 0.4, 0.35, 0.6, 9.81);
        assertThatThrownBy(() -> new SyntheticWalk(slow))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessageContaining("does not pass the top");
    }
}
