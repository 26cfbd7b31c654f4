package org.solewright.analysis.cost;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.solewright.analysis.dynamics.LimitException;
import org.solewright.domain.cost.FootRule;
import org.solewright.domain.cost.LandscapeRow;
import org.solewright.domain.cost.WorkForm;

/** What people in the trade expect of the closed forms, limits and scaling. */
class FactsOfTheTradeTest {

    private static double compass(WorkForm form, double step, double limb) throws LimitException {
        return VaultingStep.given(0, step, limb, 0, 1).factor(form);
    }

    /** Common practice: work grows with the square of the transition angle. */
    @ParameterizedTest
    @EnumSource(WorkForm.class)
    void workGrowsWithTheSquareOfTheTransitionAngle(WorkForm form) throws LimitException {
        VaultingStep small = VaultingStep.given(0, 0.01, 0.9, 0, 1);
        VaultingStep twice = VaultingStep.given(0, 0.02, 0.9, 0, 1);
        double angles = twice.angle(0) / small.angle(0);
        // exact up to the next order, q/4 = 1.2e-4 at most
        assertThat(twice.factor(form) / small.factor(form)).isCloseTo(angles * angles, within(4 * 2e-4));
    }

    /** Common practice: at one step length and speed the cost of transport falls with the square of limb length. */
    @ParameterizedTest
    @EnumSource(
            value = WorkForm.class,
            names = {"NO_PUSH_SMALL_ANGLE", "PUSH_OFF_SMALL_ANGLE", "SIMULTANEOUS"})
    void costOfTransportFallsWithTheSquareOfLimbLength(WorkForm form) throws LimitException {
        // exact: q = (D/L)^2
        assertThat(compass(form, 0.6, 1.8)).isCloseTo(compass(form, 0.6, 0.9) / 4, within(1e-15));
    }

    /** Common practice: halving the compass step halves the work per distance and doubles the step rate. */
    @Test
    void halvingTheCompassStepHalvesTheWorkPerDistanceAndDoublesTheSwingFrequency() throws LimitException {
        CostIndex swing = new CostIndex(0, 1, 0, 0, 9.81);
        CostIndex work = new CostIndex(1, 0, 0, 0, 9.81);
        StepFactor foot = new StepFactor.Given(WorkForm.SIMULTANEOUS, 0, 0.9, 0, 1);
        // exact: (D/2)^2/(D/2) against D^2/D; amplitude x frequency^4: 2^4/2
        assertThat(work.at(foot, 1.2, 0.3).work())
                .isCloseTo(work.at(foot, 1.2, 0.6).work() / 2, within(1e-14));
        assertThat(swing.at(foot, 1.2, 0.3).swing())
                .isCloseTo(8 * swing.at(foot, 1.2, 0.6).swing(), within(1e-12));
    }

    /** Common practice: below the crossover every further segment costs less, above it the compass wins. */
    @ParameterizedTest
    @EnumSource(WorkForm.class)
    void belowTheCrossoverEveryFurtherSegmentCostsLess(WorkForm form) throws LimitException {
        // The least crossover is that of one segment; 0.5 limb lengths lie below it in every form (04 A7: 0.555).
        double before = compass(form, 0.5, 1);
        for (int n = 1; n <= 6; n++) {
            double factor = VaultingStep.equalVaults(n, 0.5, 1, 1).factor(form);
            assertThat(factor).as(n + " segments").isLessThan(before);
            before = factor;
        }
        for (int n = 1; n <= 6; n++) {
            double above = Crossover.equalVaults(form, n, 1).orElseThrow() * 1.02;
            assertThat(VaultingStep.equalVaults(n, above, 1, 1).factor(form))
                    .as(n + " segments")
                    .isGreaterThan(compass(form, above, 1));
        }
    }

    /** [Adamczyk, Collins & Kuo 2006]: collision work falls with (1 - rho)^2. */
    @ParameterizedTest
    @ValueSource(doubles = {0.1, 0.3, 0.5, 0.9})
    void workOfAnArcFallsWithTheSquareOfOneLessItsRadius(double ratio) throws LimitException {
        double step = 0.02;
        double arc = RollingFoot.full(step, 1, ratio).factor(WorkForm.PUSH_OFF);
        // next order relative to the law: below D^2 = 4e-4
        assertThat(arc / compass(WorkForm.PUSH_OFF, step, 1)).isCloseTo((1 - ratio) * (1 - ratio), within(4e-4));
    }

    /** Limit of no arc and of a wheel, approached. */
    @Test
    void arcsApproachCompassAndWheel() throws LimitException {
        double compass = compass(WorkForm.PUSH_OFF, 0.6, 0.9);
        // first order in rho: k(rho) = k (1 - O(rho))
        assertThat(RollingFoot.full(0.6, 0.9, 0.9e-9).factor(WorkForm.PUSH_OFF)).isCloseTo(compass, within(1e-8));
        // exact law near the wheel: ((1 - rho) sin a)^2 with the contact angle a = D/2L, to first order in 1 - rho
        double left = 1e-5;
        double a = 0.6 / 0.9 / 2;
        assertThat(RollingFoot.full(0.6, 0.9, 0.9 * (1 - left)).factor(WorkForm.PUSH_OFF))
                .isCloseTo(Math.pow(left * Math.sin(a), 2), within(1e-4 * left * left));
    }

    /** A flat foot of many segments costs what its last transition does: inner losses fall as 1/N. */
    @ParameterizedTest
    @EnumSource(WorkForm.class)
    void manySegmentsLeaveTheLastTransition(WorkForm form) throws LimitException {
        double limit = compass(form, 0.4, 0.9);
        double hundred = VaultingStep.given(100, 0.6, 0.9, 0.2, 0).factor(form) - limit;
        double thousand = VaultingStep.given(1000, 0.6, 0.9, 0.2, 0).factor(form) - limit;
        // exact to first order: N q(f/N) = q(f)/N; the next order is q/4 = 1e-6 of it, cancellation 1e-13
        assertThat(hundred / thousand).isCloseTo(10, within(1e-4));
    }

    /** [Hof 1996]: limbs of any size, mass and gravity at one dimensionless speed and step have one landscape. */
    @Test
    void landscapeScalesWithoutDimension() {
        List<LandscapeRow> unit = scaled(1, 1, 1);
        List<LandscapeRow> other = scaled(0.87, 63, 3.7);
        assertThat(other).hasSameSizeAs(unit);
        for (int i = 0; i < unit.size(); i++) {
            LandscapeRow a = unit.get(i);
            LandscapeRow b = other.get(i);
            assertThat(b.workPerStep().isPresent()).isEqualTo(a.workPerStep().isPresent());
            if (a.workPerStep().isPresent()) {
                double w = a.workPerStep().getAsDouble();
                assertThat(b.workPerStep().getAsDouble() / (63 * 3.7 * 0.87)).isCloseTo(w, within(1e-12 * w));
                double whole = a.index().orElseThrow().total();
                assertThat(b.index().orElseThrow().total()).isCloseTo(whole, within(1e-12 * whole));
            }
        }
    }

    private static List<LandscapeRow> scaled(double length, double mass, double gravity) {
        double speed = Math.sqrt(gravity * length);
        return Landscape.of(
                        new Landscape.Limb(length, 0.2 * length, 1, mass),
                        new Landscape.Axes(
                                List.of(0, 1, 3),
                                List.of(FootRule.GIVEN, FootRule.EQUAL),
                                List.of(0.4 * speed, 0.5 * speed),
                                List.of(0.5 * length, 0.8 * length)),
                        CostIndex.standard(gravity))
                .value();
    }

    /** The limb of equal cost has the factor that was asked for. */
    @ParameterizedTest
    @EnumSource(WorkForm.class)
    void limbOfEqualCostHasTheWantedFactor(WorkForm form) throws LimitException {
        for (int n = 0; n <= 4; n++) {
            double foot = n == 0 ? 0 : 0.17;
            VaultingStep step = EqualCost.limb(form, n, 0.6, foot, 0.5, 0.11);
            assertThat(step.factor(form)).isCloseTo(0.11, within(1e-14));
            assertThat(step.limbLength()).isCloseTo(step.radius() + 0.5 * foot, within(1e-15));
        }
    }
}
