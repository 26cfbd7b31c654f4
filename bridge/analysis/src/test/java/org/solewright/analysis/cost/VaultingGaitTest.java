package org.solewright.analysis.cost;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.solewright.analysis.dynamics.Limit;
import org.solewright.analysis.dynamics.LimitException;

class VaultingGaitTest {

    private static final double G = 9.81;

    @ParameterizedTest
    @CsvSource({"0, 0, 0.6, 1.2", "1, 0.2, 0.6, 1.2", "3, 0.25, 0.7, 0.8", "6, 0.2, 0.6, 1.5", "2, 0.2, 0.5, 0.3"})
    void levelGaitTakesItsTimeAndKeepsItsEnergy(int segments, double foot, double step, double speed)
            throws LimitException {
        VaultingStep geometry = VaultingStep.given(segments, step, 0.9, foot, 1);
        for (PushOffPolicy policy : new PushOffPolicy[] {PushOffPolicy.ALL, PushOffPolicy.TOE}) {
            VaultingGait gait = VaultingGait.level(geometry, speed, policy, G);
            // exact: the wanted mean speed, and what is pushed is what is lost over a period.
            assertThat(step / gait.stepTime()).isCloseTo(speed, within(1e-10));
            assertThat(gait.pushOffWork()).isCloseTo(gait.collisionLoss(), within(1e-10));
            assertThat(gait.endSpeed()).isCloseTo(gait.startSpeed(), within(1e-12));
            for (VaultingGait.Transition t : gait.transitions()) {
                // exact: momentum along the old limb u_a and the new limb u_b, and kinetic energy at the transition.
                double c = Math.cos(t.angle());
                double s = Math.sin(t.angle());
                assertThat(t.speedBefore() * c + t.pushImpulse() * s).isCloseTo(t.speedAfter(), within(1e-12));
                assertThat(t.speedBefore() * s - t.pushImpulse() * c).isCloseTo(t.collisionImpulse(), within(1e-12));
                assertThat(t.speedAfter() * t.speedAfter() / 2)
                        .isCloseTo(
                                t.speedBefore() * t.speedBefore() / 2 + t.pushOffWork() - t.collisionLoss(),
                                within(1e-12));
            }
        }
    }

    @Test
    void passiveGaitLosesWhatTheSlopeGives() throws LimitException {
        VaultingStep geometry = VaultingStep.given(2, 0.6, 0.9, 0.2, 1);
        VaultingGait gait = VaultingGait.passive(geometry, 0.05, G);
        // exact: energy over a period; the pivots advance by the step along the slope.
        assertThat(gait.collisionLoss()).isCloseTo(G * 0.6 * Math.sin(0.05), within(1e-12));
        // independent: the eigenvalue by differences of the squared-speed map, which is affine.
        double a = VaultingGait.passiveEigenvalue(geometry);
        double product = 1;
        for (VaultingGait.Transition t : gait.transitions()) {
            product *= Math.pow(t.speedAfter() / t.speedBefore(), 2);
        }
        assertThat(a).isCloseTo(product, within(1e-12));
    }

    @Test
    void equalPivotsOfAPolygonAreThePlainFoot() throws LimitException {
        // independent: the same foot by pivots in the leg frame on a circle about the hip.
        VaultingStep geometry = VaultingStep.given(2, 0.65, 0.9, 0.2, 0);
        double half = Math.asin(0.1 / (2 * 0.9));
        double[] pivots = {
            -0.9 * Math.sin(2 * half),
            -0.9 * Math.cos(2 * half),
            0,
            -0.9,
            0.9 * Math.sin(2 * half),
            -0.9 * Math.cos(2 * half)
        };
        VaultingGait level = VaultingGait.level(geometry, 1.2, PushOffPolicy.TOE, G);
        VaultingGait polygon =
                VaultingGait.polygon(PivotPolygon.of(pivots, 0.65), level.startSpeed(), PushOffPolicy.TOE, G);
        assertThat(polygon.stepTime()).isCloseTo(level.stepTime(), within(1e-12));
        assertThat(polygon.pushOffWork()).isCloseTo(level.pushOffWork(), within(1e-12));
    }

    @Test
    void scaledWalkerWalksAlike() throws LimitException {
        // exact: dimensional scaling [Hof 1996]: lengths x 3, gravity x 0.4, speeds x sqrt(1.2).
        VaultingGait one = VaultingGait.level(VaultingStep.given(2, 0.6, 0.9, 0.2, 1), 1.2, PushOffPolicy.ALL, G);
        double speed = Math.sqrt(1.2);
        VaultingGait other =
                VaultingGait.level(VaultingStep.given(2, 1.8, 2.7, 0.6, 1), 1.2 * speed, PushOffPolicy.ALL, 0.4 * G);
        assertThat(other.startSpeed() / one.startSpeed()).isCloseTo(speed, within(1e-12));
        assertThat(other.pushOffWork() / one.pushOffWork()).isCloseTo(1.2, within(1e-11));
    }

    @Test
    void limitsAreSaidByTheirCodes() throws LimitException {
        VaultingStep compass = VaultingStep.given(0, 0.6, 0.9, 0, 1);
        assertThat(limit(() -> VaultingGait.level(compass, 2.9, PushOffPolicy.ALL, G)))
                .isEqualTo(Limit.TAKE_OFF);
        assertThat(limit(() -> VaultingGait.level(compass, 1e-4, PushOffPolicy.ALL, G)))
                .isEqualTo(Limit.APEX_NOT_CLEARED);
        assertThat(limit(() -> VaultingGait.level(compass, 1.2, PushOffPolicy.NONE, G)))
                .isEqualTo(Limit.NO_PERIODIC_GAIT);
        assertThat(limit(() -> VaultingGait.passive(compass, -0.1, G))).isEqualTo(Limit.NO_PERIODIC_GAIT);
        assertThat(limit(() -> VaultingGait.passive(compass, 0.005, G))).isEqualTo(Limit.APEX_NOT_CLEARED);
        assertThat(limit(() -> VaultingGait.passive(compass, 1, G))).isEqualTo(Limit.TAKE_OFF);
        assertThat(limit(() -> PushOffPolicy.ofWord("heel"))).isEqualTo(Limit.POLICY);
        double[] pivots = {0, -0.9};
        assertThat(limit(() -> VaultingGait.polygon(PivotPolygon.of(pivots, 0.6), 0.5, PushOffPolicy.ALL, G)))
                .isEqualTo(Limit.APEX_NOT_CLEARED);
        assertThatThrownBy(() -> VaultingGait.level(compass, 2.9, PushOffPolicy.ALL, G))
                .hasMessageContaining("mean speed 2.9 m/s, expected at most");
    }

    private interface Attempt {
        Object run() throws LimitException;
    }

    private static Limit limit(Attempt attempt) {
        try {
            attempt.run();
        } catch (LimitException e) {
            return e.limit();
        }
        throw new AssertionError("no limit was met");
    }

    @Test
    void rimlessWheelIsThePassiveCompass() throws LimitException {
        // independent: spokes of a massless wheel with all mass at the hub are the limbs of a compass [McGeer 1990].
        RimlessWheel wheel = RimlessWheel.of(8, 0.15, 1, 0.9, G);
        VaultingStep compass = VaultingStep.given(0, 2 * 0.9 * Math.sin(Math.PI / 8), 0.9, 0, 1);
        VaultingGait gait = VaultingGait.passive(compass, 0.15, G);
        assertThat(wheel.rateAfter() * 0.9).isCloseTo(gait.startSpeed(), within(1e-12));
        assertThat(wheel.period().orElseThrow()).isCloseTo(gait.stepTime(), within(1e-12));
        assertThat(wheel.eigenvalue()).isCloseTo(VaultingGait.passiveEigenvalue(compass), within(1e-12));
    }

    @Test
    void rimlessWheelOfSixSpokesHasItsRationalNumbers() throws LimitException {
        // exact: 1 + 2/3 (cos 60 deg - 1) = 2/3, squared 4/9.
        RimlessWheel wheel = RimlessWheel.of(6, 0.2, 2.0 / 3, 1, G);
        assertThat(wheel.rateRatio()).isCloseTo(2.0 / 3, within(1e-15));
        assertThat(wheel.eigenvalue()).isCloseTo(4.0 / 9, within(1e-15));
        // exact: at its gentlest slope it just comes to rest over the spoke.
        RimlessWheel least = RimlessWheel.of(6, wheel.leastSlope() * (1 + 1e-9), 2.0 / 3, 1, G);
        RimlessWheel gentler = RimlessWheel.of(6, wheel.leastSlope() * (1 - 1e-9), 2.0 / 3, 1, G);
        assertThat(least.clearsApex()).isTrue();
        assertThat(gentler.clearsApex()).isFalse();
        assertThat(gentler.period()).isEmpty();
        assertThat(limit(() -> RimlessWheel.of(2, 0.2, 1, 1, G))).isEqualTo(Limit.SEGMENT_COUNT);
        assertThat(limit(() -> RimlessWheel.of(3, 0.2, 1, 1, G))).isEqualTo(Limit.REVERSES_AT_TRANSITION);
    }

    @Test
    void meanSpeedIsNotTransitionSpeed() throws LimitException {
        // published: design of the solver, D9: 1.53 times the quasi-steady work for the compass, 1.27 for one segment.
        VaultingGait compass = VaultingGait.level(VaultingStep.given(0, 0.6, 0.9, 0, 1), 1.2, PushOffPolicy.ALL, G);
        assertThat(compass.pushOffWork() / (0.125 * 1.44 / 2)).isCloseTo(1.53, within(0.005));
        VaultingStep one = VaultingStep.given(1, 0.6, 0.9, 0.2, 1);
        VaultingGait gait = VaultingGait.level(one, 1.2, PushOffPolicy.ALL, G);
        double steady = one.factor(org.solewright.domain.cost.WorkForm.PUSH_OFF) * 1.44 / 2;
        assertThat(gait.pushOffWork() / steady).isCloseTo(1.27, within(0.005));
    }

    @Test
    void wheelsOfManySpokesOrMuchInertiaKeepTheirDigits() throws LimitException {
        // exact: for k -> 0 the rate before is sqrt(g/l sin(slope)/sin a); the least slope is far below a
        RimlessWheel heavy = RimlessWheel.of(8, 0.15, 1e-30, 1, 9.81);
        double rate = Math.sqrt(9.81 * Math.sin(0.15) / Math.sin(Math.PI / 8));
        assertThat(heavy.rateBefore()).isCloseTo(rate, within(1e-14 * rate));
        assertThat(heavy.leastSlope()).isBetween(0.0, 1e-12);
        assertThat(RimlessWheel.of(1e9, 0.05, 1, 0.9, 9.81).leastSlope()).isBetween(0.0, 1e-8);
    }
}
