package org.solewright.analysis.cost;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.solewright.analysis.dynamics.LimitException;
import org.solewright.domain.cost.WorkForm;

class CostIndexTest {

    private static final CostIndex INDEX = new CostIndex(
            CostIndex.DEFAULT_WORK_COST, CostIndex.DEFAULT_SWING_COST, CostIndex.DEFAULT_ACTIVATION_COST, 0, 9.81);

    @ParameterizedTest
    // published: design of the solver, table of B: optimum step lengths, four digits.
    @CsvSource({
        "0.8, 0.6934, 0.5426, 0.5444, 0.6048, 0.5067, 0.5585",
        "1.0, 0.7010, 0.5620, 0.5562, 0.5939, 0.5174, 0.5524",
        "1.25, 0.7200, 0.5853, 0.5738, 0.5947, 0.5324, 0.5546",
        "1.8, 0.7654, 0.6286, 0.6103, 0.6120, 0.5620, 0.5692"
    })
    void optimaAreThoseOfTheTable(
            double speed, double rolling, double compass, double best1, double best6, double equal1, double equal6)
            throws LimitException {
        WorkForm push = WorkForm.PUSH_OFF;
        List<StepFactor> feet = List.of(
                new StepFactor.Rolling(push, 0.9, 0.3),
                new StepFactor.Optimum(push, 0, 0.9, 1),
                new StepFactor.Optimum(push, 1, 0.9, 1),
                new StepFactor.Optimum(push, 6, 0.9, 1),
                new StepFactor.Equal(push, 1, 0.9, 1),
                new StepFactor.Equal(push, 6, 0.9, 1));
        double[] expected = {rolling, compass, best1, best6, equal1, equal6};
        for (int i = 0; i < expected.length; i++) {
            CostIndex.Optimum optimum = INDEX.optimum(feet.get(i), speed);
            assertThat(optimum.stepLength()).isCloseTo(expected[i], within(5.1e-5));
            assertThat(optimum.isAtBound()).isFalse();
        }
    }

    @Test
    void slopesAgreeWithDifferencesForEveryFootAndForm() throws LimitException {
        double h = 1e-5;
        for (WorkForm form : WorkForm.values()) {
            for (StepFactor foot : List.of(
                    new StepFactor.Rolling(form, 0.9, 0.3),
                    new StepFactor.Rolling(form, 0.9, 0),
                    new StepFactor.Given(form, 2, 0.9, 0.2, 1),
                    new StepFactor.Equal(form, 3, 0.9, 0.7),
                    new StepFactor.Optimum(form, 2, 0.9, 1))) {
                // independent: central differences, error of order h^2.
                double expected = (foot.at(0.6 + h).factor() - foot.at(0.6 - h).factor()) / (2 * h);
                assertThat(foot.at(0.6).slope()).as(form + " " + foot).isCloseTo(expected, within(2e-8));
                double rates = (INDEX.at(foot, 1.3, 0.6 + h).total()
                                - INDEX.at(foot, 1.3, 0.6 - h).total())
                        / (2 * h);
                assertThat(INDEX.at(foot, 1.3, 0.6).slope()).isCloseTo(rates, within(1e-7));
            }
        }
    }

    @Test
    void calibrationPutsTheOptimumWhereItWasWanted() throws LimitException {
        for (double natural : new double[] {0, 0.3877008210018449}) {
            CostIndex index = CostIndex.calibrated(4, 0.1, 0.3, 0.9, 0.72, 1.25, natural, 9.81);
            CostIndex.Optimum optimum = index.optimum(new StepFactor.Rolling(WorkForm.PUSH_OFF, 0.9, 0.3), 1.25);
            // exact: the two conditions of the calibration.
            assertThat(optimum.stepLength()).isCloseTo(0.72, within(1e-9));
            assertThat(optimum.rates().activation() / optimum.rates().total()).isCloseTo(0.1, within(1e-9));
        }
        // published: design of the solver, B: C_s without activation.
        assertThat(CostIndex.calibrated(4, 0, 0.3, 0.9, 0.72, 1.25, 0, 9.81).swingCost())
                .isCloseTo(0.1068573202, within(1e-9));
    }

    @Test
    void indexScalesWithoutDimension() throws LimitException {
        // exact: [Hof 1996]: lengths x 2, gravity x 3, speed x sqrt(6): the same step per limb, rates x g sqrt(g l).
        CostIndex.Optimum one = INDEX.optimum(new StepFactor.Rolling(WorkForm.PUSH_OFF, 0.9, 0.3), 1.25);
        CostIndex other = new CostIndex(4, INDEX.swingCost(), INDEX.activationCost(), 0, 3 * 9.81);
        CostIndex.Optimum two = other.optimum(new StepFactor.Rolling(WorkForm.PUSH_OFF, 1.8, 0.3), 1.25 * Math.sqrt(6));
        assertThat(two.stepLength() / one.stepLength()).isCloseTo(2, within(1e-9));
        assertThat(two.rates().total() / one.rates().total()).isCloseTo(3 * Math.sqrt(6), within(1e-9));
    }

    @Test
    void optimumOnABoundIsSaid() throws LimitException {
        // exact: without swing and activation shorter steps are always cheaper.
        CostIndex work = new CostIndex(4, 0, 0, 0, 9.81);
        CostIndex.Optimum optimum = work.optimum(new StepFactor.Rolling(WorkForm.PUSH_OFF, 0.9, 0.3), 1.25);
        assertThat(optimum.isAtBound()).isTrue();
        assertThat(optimum.stepLength()).isCloseTo(0.09, within(1e-12));
        assertThatThrownBy(() -> INDEX.optimum(new StepFactor.Given(WorkForm.PUSH_OFF, 2, 0.9, 5, 1), 1))
                .isInstanceOf(LimitException.class);
    }
}
