package org.solewright.app.pipeline;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.solewright.domain.foot.Joint;

class StanceAverageTest {

    /** Rises by 0.9 deg per cent to 40 %, holds still at 40 deg to 70 %, falls again. */
    private static double[] plateau() {
        double[] angle = new double[101];
        for (int i = 0; i < angle.length; i++) {
            angle[i] = Math.toRadians(40 - 0.9 * Math.max(0, Math.max(40 - i, i - 70)));
        }
        return angle;
    }

    @Test
    void jointThatHoldsStillIsLockedThere() {
        // exact: a band of 2 deg adds 2 % (1.8 deg) of each slope to the 30 % that hold still; mean of 31 times 40,
        // twice
        // 39.1 and twice 38.2 deg.
        Joint.Lock lock = StanceAverage.of(List.of(plateau())).lock().orElseThrow();
        assertThat(lock.stancePercent()).isCloseTo(34, within(1e-9));
        assertThat(Math.toDegrees(lock.angle())).isCloseTo((31 * 40 + 2 * 39.1 + 2 * 38.2) / 35, within(1e-9));
    }

    @Test
    void jointThatAlwaysMovesHasNoLock() {
        double[] ramp = new double[101];
        Arrays.setAll(ramp, i -> Math.toRadians(0.5 * i));
        // exact: 2 deg are 4 % of stance.
        assertThat(StanceAverage.of(List.of(ramp)).lock()).isEmpty();
        // exact: two stances 4 deg apart have SD 4/sqrt(2) = 2.83 deg; 3 SD = 8.49 deg are 16 whole per cent.
        double[] later = new double[101];
        Arrays.setAll(later, i -> ramp[i] + Math.toRadians(4));
        assertThat(StanceAverage.of(List.of(ramp, later)).lock().orElseThrow().stancePercent())
                .isCloseTo(16, within(1e-9));
    }

    @Test
    void lostSamplesAreLeftOutOfMeanAndSpread() {
        StanceAverage average =
                StanceAverage.of(List.of(new double[] {1, Double.NaN, 4}, new double[] {3, Double.NaN, Double.NaN}));
        assertThat(average.mean(0)).isEqualTo(2);
        assertThat(average.sd(0)).isCloseTo(Math.sqrt(2), within(1e-15));
        assertThat(average.count(0)).isEqualTo(2);
        assertThat(average.mean(1)).isNaN();
        assertThat(average.count(1)).isZero();
        assertThat(average.sd(2)).isNaN();
        assertThat(average.range()).containsExactly(2, 4);
    }
}
