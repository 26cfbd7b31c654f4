package org.solewright.analysis.cost;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.catchThrowableOfType;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.EnumSource;
import org.solewright.analysis.dynamics.Limit;
import org.solewright.analysis.dynamics.LimitException;
import org.solewright.domain.cost.WorkForm;

class VaultingStepTest {

    @Test
    void rationalFactorsAreThoseOfTheAngle() {
        for (double ratio = 0.05; ratio < 1.4; ratio += 0.05) {
            double angle = 2 * Math.asin(ratio / 2);
            for (WorkForm form : new WorkForm[] {WorkForm.NO_PUSH, WorkForm.PUSH_OFF, WorkForm.SIMULTANEOUS}) {
                // independent: trigonometric form of the same factor
                assertThat(TransitionWork.factor(form, ratio * ratio))
                        .isCloseTo(TransitionWork.factorOfAngle(form, angle), within(1e-13));
            }
            double q = ratio * ratio;
            double noPush = TransitionWork.factor(WorkForm.NO_PUSH, q);
            double push = TransitionWork.factor(WorkForm.PUSH_OFF, q);
            // exact: q(1-q/4) q/(4-q) = q^2/4; ratio 4 cos^4(d/2)
            assertThat(noPush * push).isCloseTo(q * q / 4, within(1e-14));
            assertThat(noPush / push).isCloseTo(4 * Math.pow(Math.cos(angle / 2), 4), within(1e-12));
        }
    }

    @Test
    void noPushIsTheSameLossByTheSpeedAfter() {
        double angle = 0.6;
        // exact: v+ = v cos d, so sin^2 d v^2 = tan^2 d v+^2
        double after = Math.cos(angle);
        assertThat(TransitionWork.factorOfAngle(WorkForm.NO_PUSH, angle))
                .isCloseTo(Math.pow(Math.tan(angle) * after, 2), within(1e-15));
    }

    @Test
    void stepSumsItsTransitions() throws LimitException {
        VaultingStep step = VaultingStep.given(2, 0.6, 0.9, 0.25, 1);
        // exact: two transitions over f/2, one over D - f, radius L - f = 0.65
        double inner = 0.125 * 0.125 / (0.65 * 0.65);
        double last = 0.35 * 0.35 / (0.65 * 0.65);
        assertThat(step.factor(WorkForm.PUSH_OFF))
                .isCloseTo(2 * inner / (4 - inner) + last / (4 - last), within(1e-15));
        assertThat(step.transitions()).isEqualTo(3);
        assertThat(step.angle(2)).isCloseTo(2 * Math.asin(0.35 / 1.3), within(1e-15));
        VaultingStep flat = VaultingStep.given(2, 0.6, 0.9, 0.25, 0);
        assertThat(flat.radius()).isEqualTo(0.9); // exact: a flat foot takes nothing from the limb
    }

    @ParameterizedTest
    @CsvSource({
        // exact: the first limit in the design's order that is broken
        "1.5, 0.6, -0.9, 0, NONPOSITIVE_RADIUS",
        "1, 0.6, 0.9, 0.9, NONPOSITIVE_RADIUS",
        "-1, 0, 0.9, 0, SEGMENT_COUNT",
        "1.5, 0.6, 0.9, 0, SEGMENT_COUNT",
        "0, 0, 0.9, 0.1, NONPOSITIVE_STEP",
        "0, 0.6, 0.9, -0.1, FOOT_WITHOUT_SEGMENTS",
        "2, 0.6, 0.9, -0.1, NEGATIVE_FOOT",
        "1, 0.6, 0.9, 0.6, STEP_NOT_LONGER_THAN_FOOT",
        "0, 1.8, 0.9, 0, PIVOT_SPACING_OUT_OF_REACH",
        "1, 0.85, 0.9, 0.8, PIVOT_SPACING_OUT_OF_REACH"
    })
    void limitsAreCheckedInTheirOrder(double segments, double step, double limb, double foot, Limit expected) {
        LimitException e =
                catchThrowableOfType(LimitException.class, () -> VaultingStep.given(segments, step, limb, foot, 1));
        assertThat(e.limit()).isEqualTo(expected);
    }

    @Test
    void messageHasTheNumbers() {
        assertThatThrownBy(() -> VaultingStep.given(1, 0.6, 0.9, 0.7, 1))
                .hasMessage("step length 0.6 m, expected more than the foot length 0.7 m");
    }

    @Test
    void withoutPushTheHipMustNotGoBack() throws LimitException {
        VaultingStep step = VaultingStep.given(0, 1.3, 0.9, 0, 1);
        assertThat(step.factor(WorkForm.PUSH_OFF)).isPositive();
        LimitException e = catchThrowableOfType(LimitException.class, () -> step.factor(WorkForm.NO_PUSH));
        assertThat(e.limit()).isEqualTo(Limit.REVERSES_AT_TRANSITION); // exact: 1.3 > 0.9 sqrt 2
    }

    @ParameterizedTest
    @EnumSource(WorkForm.class)
    void optimumFootIsNoDearerThanItsNeighbours(WorkForm form) throws LimitException {
        for (double share : new double[] {0, 0.5, 1}) {
            for (int n : new int[] {1, 3, 6}) {
                VaultingStep best = OptimumFoot.of(form, n, 0.6, 0.9, share);
                double least = best.factor(form);
                for (double f = 0; f < 0.599; f += 0.001) {
                    if (0.9 - share * f > 0 && Math.max(f / n, 0.6 - f) < 1.41 * (0.9 - share * f)) {
                        // independent: grid of feet
                        assertThat(VaultingStep.given(n, 0.6, 0.9, f, share).factor(form))
                                .isGreaterThanOrEqualTo(least - 1e-14);
                    }
                }
            }
        }
    }

    @Test
    void optimumFootSmallAngleHasItsClosedFactor() throws LimitException {
        for (double share : new double[] {0, 0.3, 1}) {
            VaultingStep best = OptimumFoot.of(WorkForm.NO_PUSH_SMALL_ANGLE, 2, 0.7, 0.9, share);
            // exact: D^2/(L^2 + N (L - share D)^2)
            double left = 0.9 - share * 0.7;
            assertThat(best.factor(WorkForm.NO_PUSH_SMALL_ANGLE))
                    .isCloseTo(0.49 / (0.81 + 2 * left * left), within(1e-14));
        }
    }

    @ParameterizedTest
    @EnumSource(WorkForm.class)
    void noFootBeatsTheCompassFromAStepOfOneLimbLengthOn(WorkForm form) throws LimitException {
        for (int n : new int[] {1, 2, 6, 12}) {
            // exact: the derivative of the factor at f = 0 has the sign of D - L
            assertThat(OptimumFoot.of(form, n, 0.88, 0.9, 1).footLength()).isPositive();
            assertThat(OptimumFoot.of(form, n, 0.92, 0.9, 1).footLength()).isZero();
        }
    }

    @ParameterizedTest
    @CsvSource({
        // design 04 A7, table, ten decimals; N = 4 without a push printed 0.6633866811, a slip: the worked answer is
        // 0.66338668104
        "1, 0.5857864376, 0.6202041029, 0.5553453110",
        "2, 0.6339745962, 0.6666666667, 0.6045119035",
        "3, 0.6666666667, 0.6978305207, 0.6381771026",
        "4, 0.6909830056, 0.7208254887, 0.6633866810",
        "5, 0.7101020514, 0.7387961250, 0.6833133570",
        "6, 0.7257081148, 0.7533939444, 0.6996495809",
        "12, 0.7828707270, 0.8063266123, 0.7600621593"
    })
    void crossoversOfTheEqualVaultFoot(int n, double small, double push, double noPush) throws LimitException {
        assertThat(Crossover.equalVaults(WorkForm.SIMULTANEOUS, n, 1).orElseThrow())
                .isCloseTo(small, within(5.1e-11));
        assertThat(Crossover.equalVaults(WorkForm.PUSH_OFF, n, 1).orElseThrow()).isCloseTo(push, within(5.1e-11));
        assertThat(Crossover.equalVaults(WorkForm.NO_PUSH, n, 1).orElseThrow()).isCloseTo(noPush, within(5.1e-11));
    }

    @ParameterizedTest
    @EnumSource(WorkForm.class)
    void atTheCrossoverFootAndCompassCostTheSame(WorkForm form) throws LimitException {
        for (double share : new double[] {0.8, 1}) {
            double d = Crossover.equalVaults(form, 3, share).orElseThrow();
            // independent: both steps computed
            assertThat(VaultingStep.equalVaults(3, d, 1, share).factor(form))
                    .isCloseTo(VaultingStep.given(0, d, 1, 0, share).factor(form), within(1e-13));
        }
    }

    @Test
    void aFlatFootNeverCrossesTheCompass() throws LimitException {
        assertThat(Crossover.equalVaults(WorkForm.PUSH_OFF, 2, 0)).isEmpty();
        assertThat(Crossover.optimumFoot(0)).isEmpty();
    }

    @Test
    void halvingTheStepOfACompass() throws LimitException {
        double d = 0.6 / 0.9;
        double q = d * d;
        // exact: (1/2)(1-d^2/16)/(1-d^2/4), (1/2)(4-d^2)/(4-d^2/4), 1/2
        assertThat(Halving.ratio(WorkForm.NO_PUSH, 0.6, 0.9))
                .isCloseTo(0.5 * (1 - q / 16) / (1 - q / 4), within(1e-14));
        assertThat(Halving.ratio(WorkForm.PUSH_OFF, 0.6, 0.9)).isCloseTo(0.5 * (4 - q) / (4 - q / 4), within(1e-14));
        assertThat(Halving.ratio(WorkForm.SIMULTANEOUS, 0.6, 0.9)).isCloseTo(0.5, within(1e-15));
    }

    @ParameterizedTest
    @EnumSource(WorkForm.class)
    void equalCostStepHasTheWantedFactor(WorkForm form) throws LimitException {
        for (int n = 0; n < 4; n++) {
            // independent: factor of the answer
            assertThat(EqualCost.equalVaults(form, n, 0.9, 1, 0.2).factor(form)).isCloseTo(0.2, within(1e-12));
            assertThat(EqualCost.optimumFoot(form, n, 0.9, 1, 0.2).factor(form)).isCloseTo(0.2, within(1e-12));
        }
    }

    @Test
    void equalVaultStepSmallAngleInClosedForm() throws LimitException {
        double k = Math.sqrt(0.2);
        // exact: sqrt(k) L sqrt(N+1)/(1 + sqrt(k) N/sqrt(N+1))
        assertThat(EqualCost.equalVaults(WorkForm.NO_PUSH_SMALL_ANGLE, 3, 0.9, 1, 0.2)
                        .stepLength())
                .isCloseTo(k * 0.9 * 2 / (1 + k * 3 / 2), within(1e-13));
    }

    @Test
    void factorBeyondReachHasNoSolution() {
        LimitException e = catchThrowableOfType(
                LimitException.class, () -> EqualCost.equalVaults(WorkForm.NO_PUSH, 0, 0.9, 1, 1.01));
        assertThat(e.limit()).isEqualTo(Limit.NO_SOLUTION); // exact: sin^2 does not exceed 1
        LimitException zero = catchThrowableOfType(
                LimitException.class, () -> EqualCost.equalVaults(WorkForm.PUSH_OFF, 0, 0.9, 1, 0));
        assertThat(zero.limit()).isEqualTo(Limit.NO_SOLUTION);
    }

    @Test
    void hugePushOffIsStillWithinReach() throws LimitException {
        // exact: q/(4-q) = 100 gives q = 400/101
        assertThat(EqualCost.equalVaults(WorkForm.PUSH_OFF, 0, 0.9, 1, 100).stepLength())
                .isCloseTo(0.9 * Math.sqrt(400.0 / 101), within(1e-12));
    }

    @Test
    void feetOfEqualCost() throws LimitException {
        double k = 0.42;
        for (boolean longer : new boolean[] {false, true}) {
            double f = EqualCost.foot(1, 0.6, 0.9, k, longer);
            // independent: factor of the answer
            assertThat(VaultingStep.given(1, 0.6, 0.9, f, 1).factor(WorkForm.NO_PUSH_SMALL_ANGLE))
                    .isCloseTo(k, within(1e-13));
        }
        double compass = EqualCost.footOfCompassCost(1, 0.6, 0.9);
        assertThat(VaultingStep.given(1, 0.6, 0.9, compass, 1).factor(WorkForm.NO_PUSH_SMALL_ANGLE))
                .isCloseTo(0.36 / 0.81, within(1e-14));
        LimitException e = catchThrowableOfType(LimitException.class, () -> EqualCost.foot(1, 0.6, 0.9, 0.1, false));
        assertThat(e.limit()).isEqualTo(Limit.NO_SOLUTION);
    }
}
