package org.solewright.analysis.dynamics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

/** When one wrench per foot tells the moment of a joint inside the foot, and how far it does. */
class FootLoadRuleTest {

    @Test
    void jointHasAMomentOnlyWithEverythingBehindItInTheAir() {
        assertThat(FootLoadRule.state(true, true, 0.2, 0.18)).isEqualTo(FootLoadRule.State.INDETERMINATE);
        assertThat(FootLoadRule.state(true, false, 0.2, 0.18)).isEqualTo(FootLoadRule.State.INDETERMINATE);
        assertThat(FootLoadRule.state(false, true, 0.17, 0.18)).isEqualTo(FootLoadRule.State.BOUNDED);
        assertThat(FootLoadRule.state(false, false, 0.2, 0.18)).isEqualTo(FootLoadRule.State.DETERMINED);
        // All behind the axis is in the air, yet the load lies behind it: a contradiction of the measurement.
        assertThat(FootLoadRule.state(false, false, 0.17, 0.18)).isEqualTo(FootLoadRule.State.INDETERMINATE);
    }

    @Test
    void wholeLoadBeyondTheAxisTurnsByItsArm() {
        // exact: 600 N x 0.03 m
        FootLoadRule.Share s = FootLoadRule.share(FootLoadRule.State.DETERMINED, 600, 0.21, 0.16, 0.18, 0.24);
        assertThat(s.leastMoment()).isCloseTo(18, within(1e-12));
        assertThat(s.greatestMoment()).isEqualTo(s.leastMoment());
        assertThat(s.leastShare()).isOne();
        FootLoadRule.Share none = FootLoadRule.share(FootLoadRule.State.INDETERMINATE, 600, 0.21, 0.16, 0.18, 0.24);
        assertThat(none.leastMoment()).isNaN();
    }

    @Test
    void everyPossibleSharingLiesBetweenTheBoundsAndReachesThem() {
        // independent: random distributions of two forces with the given sum and centre.
        double force = 700;
        double rear = 0.15;
        double axis = 0.18;
        double tip = 0.25;
        SplittableRandom random = new SplittableRandom(7);
        for (double cop : new double[] {0.16, 0.179, 0.18, 0.2, 0.24}) {
            FootLoadRule.Share s = FootLoadRule.share(FootLoadRule.State.BOUNDED, force, cop, rear, axis, tip);
            double lowMoment = Double.POSITIVE_INFINITY;
            double highMoment = Double.NEGATIVE_INFINITY;
            double lowShare = 1;
            double highShare = 0;
            for (int k = 0; k < 200_000; k++) {
                double proximal = rear + (axis - rear) * random.nextDouble();
                double distal = axis + (tip - axis) * random.nextDouble();
                double share = (cop - proximal) / (distal - proximal);
                if (share >= 0 && share <= 1) {
                    double moment = share * force * (distal - axis);
                    lowMoment = Math.min(lowMoment, moment);
                    highMoment = Math.max(highMoment, moment);
                    lowShare = Math.min(lowShare, share);
                    highShare = Math.max(highShare, share);
                }
            }
            assertThat(lowMoment).isGreaterThanOrEqualTo(s.leastMoment() - 1e-9);
            assertThat(highMoment).isLessThanOrEqualTo(s.greatestMoment() + 1e-9);
            // tolerance: how near 200 000 draws come to an end, in N m and shares
            assertThat(lowMoment).isCloseTo(s.leastMoment(), within(0.4));
            assertThat(highMoment).isCloseTo(s.greatestMoment(), within(0.8));
            assertThat(lowShare).isCloseTo(s.leastShare(), within(0.02)).isGreaterThanOrEqualTo(s.leastShare() - 1e-9);
            assertThat(highShare)
                    .isCloseTo(s.greatestShare(), within(0.04))
                    .isLessThanOrEqualTo(s.greatestShare() + 1e-9);
        }
    }

    @Test
    void placesOutOfOrderAreRefused() {
        assertThatThrownBy(() -> FootLoadRule.share(FootLoadRule.State.BOUNDED, 1, 0, 0.2, 0.18, 0.25))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessageContaining("rear 0.2 m");
    }
}
