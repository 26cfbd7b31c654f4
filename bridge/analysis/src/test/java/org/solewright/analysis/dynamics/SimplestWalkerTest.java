package org.solewright.analysis.dynamics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import org.apache.commons.math3.ode.FirstOrderDifferentialEquations;
import org.apache.commons.math3.ode.nonstiff.DormandPrince853Integrator;
import org.junit.jupiter.api.Test;
import org.solewright.analysis.dynamics.SimplestWalker.Gait;

class SimplestWalkerTest {

    @Test
    void fixedPointsOfTheSimplestWalkerAgreeWithThirtyDigitArithmetic() throws LimitException {
        // published: design of the solver, E6, slope 0.009, confirmed there with 30 digits; the model is that of
        // [Garcia et al. 1998].
        WalkerGait walk = SimplestWalker.passive(Gait.LONG, 0.009, 0, 0, 0);
        assertThat(walk.halfAngle()).isCloseTo(0.200310900544247, within(1e-12));
        assertThat(walk.stanceRate()).isCloseTo(0.199832473004952, within(1e-12));
        assertThat(walk.stepTime()).isCloseTo(3.88246375285137, within(1e-11));
        assertThat(walk.eigenvalues())
                .containsExactly(
                        new double[] {-0.190099841065886, -0.557598776682076, -0.190099841065886, 0.557598776682076},
                        within(1e-9));
        WalkerGait hop = SimplestWalker.passive(Gait.SHORT, 0.009, 0, 0, 0);
        assertThat(hop.halfAngle()).isCloseTo(0.193937369810182, within(1e-12));
        assertThat(hop.eigenvalues())
                .containsExactly(new double[] {0.459589589797677, 0, 4.00386435892974, 0}, within(1e-8));
    }

    @Test
    void stepsGrowWithTheCubeRootOfTheSlope() throws LimitException {
        // published: [Garcia et al. 1998]: alpha -> c slope^(1/3); design E5: c = 0.9709561249 long, 0.9439760684
        // short.
        for (Gait gait : Gait.values()) {
            double c = gait == Gait.LONG ? 0.9709561249 : 0.9439760684;
            assertThat(SimplestWalker.leadingHalfAngle(gait, 1e-6, 0, 0) / 1e-2).isCloseTo(c, within(1e-9));
            double alpha = SimplestWalker.passive(gait, 1e-6, 0, 0, 0).halfAngle();
            // The next term is of order slope: 2e-7 of 1e-2.
            assertThat(alpha / 1e-2).isCloseTo(c, within(1e-4));
        }
        assertThat(SimplestWalker.leadingStepTime(Gait.LONG, 0, 0)).isCloseTo(3.812091795, within(1e-9));
        assertThat(SimplestWalker.leadingStepTime(Gait.SHORT, 0, 0)).isEqualTo(Math.PI);
    }

    @Test
    void energyOfEveryGaitBalances() throws LimitException {
        for (double ratio : new double[] {0, 0.3, 0.6}) {
            WalkerGait down = SimplestWalker.passive(Gait.LONG, 0.006, ratio, 0.5, 0);
            // exact: the hip falls by step length times sine of the slope; without a push that is the loss.
            assertThat(down.collisionLoss()).isCloseTo(down.stepLength() * Math.sin(0.006), within(1e-10));
            WalkerGait level = SimplestWalker.powered(Gait.LONG, 0, ratio, 2, 0.3);
            assertThat(level.collisionLoss()).isCloseTo(level.pushOffWork(), within(1e-10));
            // exact: on the level at equal speeds the push is v tan(half the transition angle).
            assertThat(level.pushImpulse())
                    .isCloseTo(level.speedBefore() * Math.tan(level.transitionAngle() / 2), within(1e-10));
            WalkerGait both = SimplestWalker.passive(Gait.LONG, 0.004, ratio, 1, 0.03);
            assertThat(both.collisionLoss())
                    .isCloseTo(both.pushOffWork() + both.stepLength() * Math.sin(0.004), within(1e-10));
        }
    }

    @Test
    void variationalDerivativesAgreeWithDifferences() throws LimitException {
        WalkerModel model = new WalkerModel(0.01, 0.2, 0.7, 0.05);
        WalkerGait near = SimplestWalker.passive(Gait.LONG, 0.01, 0.2, 0.7, 0.05);
        double[] x = {1.01 * near.halfAngle(), 0.995 * near.stanceRate(), 0.05, 0.7};
        WalkerStep step = WalkerStep.of(model, x[0], x[1]);
        double h = 1e-5;
        for (int by = 0; by < 4; by++) {
            double[] more = x.clone();
            double[] less = x.clone();
            more[by] += h;
            less[by] -= h;
            WalkerStep up = WalkerStep.of(model.with(more[2], more[3]), more[0], more[1]);
            WalkerStep down = WalkerStep.of(model.with(less[2], less[3]), less[0], less[1]);
            // independent: central differences, error h^2 and 1e-13/h.
            assertThat(step.derivative(0, by)).isCloseTo((up.halfAngle() - down.halfAngle()) / (2 * h), within(1e-6));
            assertThat(step.derivative(1, by)).isCloseTo((up.rateAfter() - down.rateAfter()) / (2 * h), within(1e-6));
            assertThat(step.derivative(2, by)).isCloseTo((up.time() - down.time()) / (2 * h), within(1e-6));
        }
    }

    @Test
    void startRateOfTheSwingLimbIsGarciasWithoutFeetAndPush() {
        WalkerModel model = new WalkerModel(0.009, 0, 0, 0);
        double[] y = model.start(0.2, 0.21);
        // published: [Garcia et al. 1998]: phi'+ = (1 - cos 2a) theta'+, phi = theta - psi.
        assertThat(y[2] - y[3]).isCloseTo((1 - Math.cos(0.4)) * 0.21, within(1e-15));
    }

    @Test
    void wantedSpeedAndStepAreMet() throws LimitException {
        for (double ratio : new double[] {0, 0.3, 0.5}) {
            WalkerGait gait = SimplestWalker.target(0.4, 0.7, ratio);
            // exact: what was asked for.
            assertThat(gait.speed()).isCloseTo(0.4, within(1e-10));
            assertThat(gait.stepLength()).isCloseTo(0.7, within(1e-12));
        }
        // published: design of the solver, E6: a rolling foot of 0.3 costs 0.4056 of a point foot's work.
        assertThat(SimplestWalker.target(0.4, 0.7, 0.3).pushOffWork()
                        / SimplestWalker.target(0.4, 0.7, 0).pushOffWork())
                .isCloseTo(0.4056, within(5e-5));
    }

    @Test
    void periodDoublesWhereAnEigenvaluePassesMinusOne() throws LimitException {
        SimplestWalker.Doubling doubling = SimplestWalker.periodDoubling(0, 0);
        // published: [Garcia et al. 1998]: stable for slopes below 0.015; design E6: 0.01508844.
        assertThat(doubling.slope()).isCloseTo(0.01508844, within(5e-9));
        assertThat(doubling.gait().eigenvalues()[0]).isCloseTo(-1, within(1e-9));
    }

    @Test
    void walkersThatCannotWalkAreRefused() {
        assertThatThrownBy(() -> SimplestWalker.passive(Gait.LONG, 0, 0, 0, 0))
                .isInstanceOf(LimitException.class)
                .hasMessageContaining("expected a descent or a push");
        assertThatThrownBy(() -> SimplestWalker.passive(Gait.LONG, 0.01, 1.2, 0, 0))
                .hasMessageContaining("radius of the feet 1.2");
        assertThatThrownBy(() -> SimplestWalker.passive(Gait.LONG, 0.01, 0, 0, -0.1))
                .hasMessageContaining("push impulse -0.1");
        assertThatThrownBy(() -> SimplestWalker.powered(Gait.LONG, 0, 0, 0, 2)).hasMessageContaining("half angle 2.0");
        assertThatThrownBy(() -> SimplestWalker.target(0.4, 2.5, 0)).hasMessageContaining("step length 2.5");
        assertThatThrownBy(() -> SimplestWalker.target(0.4, -1, 0)).hasMessageContaining("step length -1.0");
    }

    @Test
    void gaitsKeepTheirNamesOnSteepSlopesAndInLongSteps() throws LimitException {
        // independent: followed from a gentler slope or a shorter step, the step time changes by little, while the
        // other
        // gait's differs by more than 0.3; straight from the leading order Newton's method meets the other one here
        double before =
                SimplestWalker.passive(SimplestWalker.Gait.SHORT, 0.28, 0, 0, 0).stepTime();
        assertThat(SimplestWalker.passive(SimplestWalker.Gait.SHORT, 0.2995, 0, 0, 0)
                        .stepTime())
                .isCloseTo(before, within(0.1));
        double shorter =
                SimplestWalker.powered(SimplestWalker.Gait.LONG, 0, 0, 0, 0.52).stepTime();
        assertThat(SimplestWalker.powered(SimplestWalker.Gait.LONG, 0, 0, 0, 0.54)
                        .stepTime())
                .isCloseTo(shorter, within(0.05));
        assertThat(SimplestWalker.powered(SimplestWalker.Gait.SHORT, 0, 0, 0, 0.54)
                        .stepTime())
                .isLessThan(shorter - 0.3);
    }

    @Test
    void integratorIsOfEighthOrder() {
        // exact: E = (theta'^2)/2 + cos theta of the stance limb (point feet, level) stays; the error of a method of
        // order 8
        // falls by 2^8 when the step is halved. Half of that is asked for, since the steps are not yet small
        WalkerModel model = new WalkerModel(0, 0, 0, 0);
        double[] error = new double[2];
        for (int i = 0; i < 2; i++) {
            double[] y = {-0.5, 0.5, 1.2, 0.3};
            double energy = y[2] * y[2] / 2 + Math.cos(y[0]);
            DormandPrince853Integrator fixed = new DormandPrince853Integrator(0.5 / (i + 1), 0.5 / (i + 1), 1e9, 1e9);
            fixed.setInitialStepSize(0.5 / (i + 1));
            fixed.integrate(
                    new FirstOrderDifferentialEquations() {
                        @Override
                        public int getDimension() {
                            return 4;
                        }

                        @Override
                        public void computeDerivatives(double t, double[] at, double[] rates) {
                            model.rates(at, rates);
                        }
                    },
                    0,
                    y,
                    2,
                    y);
            error[i] = Math.abs(y[2] * y[2] / 2 + Math.cos(y[0]) - energy);
        }
        assertThat(error[0] / error[1]).as(error[0] + " " + error[1]).isGreaterThan(128);
    }
}
