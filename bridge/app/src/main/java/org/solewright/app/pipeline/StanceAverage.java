package org.solewright.app.pipeline;

import java.util.List;
import java.util.Optional;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.foot.Joint;

/** Mean and SD over stances of one angle, at equal steps of stance; rad. */
final class StanceAverage {

    /** Band of a lock, rad (design 03 section 5: 2 deg or 3 SD). */
    private static final double LOCK_BAND = Math.toRadians(2);

    private static final double LOCK_SDS = 3;
    private static final double SHORTEST_LOCK = 0.08;

    private final double[] mean;
    private final double[] sd;
    private final int[] count;

    private StanceAverage(int points) {
        mean = new double[points];
        sd = new double[points];
        count = new int[points];
    }

    /** Averages curves of equal length, each where it is known. */
    static StanceAverage of(List<double[]> curves) {
        StanceAverage average = new StanceAverage(curves.get(0).length);
        for (int i = 0; i < average.mean.length; i++) {
            double sum = 0;
            int n = 0;
            for (double[] c : curves) {
                if (!Double.isNaN(c[i])) {
                    sum += c[i];
                    n++;
                }
            }
            double squares = 0;
            for (double[] c : curves) {
                squares += Double.isNaN(c[i]) ? 0 : Math.pow(c[i] - sum / n, 2);
            }
            average.mean[i] = n > 0 ? sum / n : Double.NaN;
            average.sd[i] = n > 1 ? Math.sqrt(squares / (n - 1)) : Double.NaN;
            average.count[i] = n;
        }
        return average;
    }

    double mean(int point) {
        return mean[point];
    }

    /** NaN for one stance. */
    double sd(int point) {
        return sd[point];
    }

    int count(int point) {
        return count[point];
    }

    /** Least and largest mean. */
    double[] range() {
        double[] ends = {Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY};
        for (double m : mean) {
            if (!Double.isNaN(m)) {
                ends[0] = Math.min(ends[0], m);
                ends[1] = Math.max(ends[1], m);
            }
        }
        return ends;
    }

    /**
     * The longest interval of at least 8 % of stance in which the mean stays within a band of 2 deg, or of three times the
     * mean SD over the interval where that is more.
     */
    Optional<Joint.Lock> lock() {
        int longest = 0;
        int from = 0;
        for (int first = 0; first < mean.length; first++) {
            double low = mean[first];
            double high = mean[first];
            double sds = 0;
            int known = 0;
            for (int last = first; last < mean.length && !Double.isNaN(mean[last]); last++) {
                low = Math.min(low, mean[last]);
                high = Math.max(high, mean[last]);
                sds += Double.isNaN(sd[last]) ? 0 : sd[last];
                known += Double.isNaN(sd[last]) ? 0 : 1;
                double band = Math.max(LOCK_BAND, known == 0 ? 0 : LOCK_SDS * sds / known);
                if (high - low <= band && last - first > longest) {
                    longest = last - first;
                    from = first;
                }
            }
        }
        double share = longest / (mean.length - 1.0);
        if (share < SHORTEST_LOCK) {
            return Optional.empty();
        }
        double sum = 0;
        for (int i = from; i <= from + longest; i++) {
            sum += mean[i] / (longest + 1);
        }
        return Optional.of(new Joint.Lock(sum, 100 * share, Basis.MEASURED));
    }
}
