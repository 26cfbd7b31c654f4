package org.solewright.analysis.gait;

import java.util.ArrayList;
import java.util.List;

/**
 * Contacts and offs from the foot's travel relative to the pelvis ([Zeni et al. 2008]): contact where the heel is
 * farthest ahead, off where the forefoot is farthest behind.
 */
final class KinematicEvents {

    private KinematicEvents() {}

    /**
     * Frames at which a curve has a maximum that stands out.
     *
     * @param x samples, NaN where lost
     * @param apart least distance of two maxima, samples
     * @return zero-based frames in order, each at least five samples from a lost one or an end
     */
    static List<Integer> peaks(double[] x, int apart) {
        double low = Double.POSITIVE_INFINITY;
        double high = Double.NEGATIVE_INFINITY;
        for (double v : x) {
            if (!Double.isNaN(v)) {
                low = Math.min(low, v);
                high = Math.max(high, v);
            }
        }
        double least = low + 0.6 * (high - low);
        List<Integer> found = new ArrayList<>();
        int margin = 5;
        for (int i = margin; i < x.length - margin; i++) {
            if (!(x[i] >= least) || !isHighest(x, i, Math.max(margin, apart / 2))) {
                continue;
            }
            if (Double.isNaN(x[i - margin]) || Double.isNaN(x[i + margin])) {
                continue;
            }
            if (!found.isEmpty() && i - found.get(found.size() - 1) < apart) {
                continue;
            }
            found.add(i);
        }
        return found;
    }

    private static boolean isHighest(double[] x, int i, int reach) {
        for (int k = Math.max(0, i - reach); k <= Math.min(x.length - 1, i + reach); k++) {
            if (x[k] > x[i]) {
                return false;
            }
        }
        return true;
    }
}
