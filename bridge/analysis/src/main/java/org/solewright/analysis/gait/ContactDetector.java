package org.solewright.analysis.gait;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.solewright.domain.gait.PlatformLoads;

/** Finds when a platform bears load: crossings of a threshold, interpolated between samples. */
final class ContactDetector {

    private static final double FIRST_PASS_THRESHOLD = 20;
    private static final double WEIGHT_SHARE = 0.03;
    private static final double NOISE_DEVIATIONS = 5;

    /** A time under load; not seen means that it began or ended outside the recording. */
    record Loaded(double start, double end, boolean isStartSeen, boolean isEndSeen, double peak) {}

    private ContactDetector() {}

    /**
     * Contact threshold: min(20 N, 0.03 m g) but at least five SD of the unloaded platform's noise.
     *
     * @param platform loads
     * @param weight subject's weight, N; NaN where not known yet (20 N then)
     * @return N
     */
    static double threshold(PlatformLoads platform, double weight) {
        double scaled =
                Double.isNaN(weight) ? FIRST_PASS_THRESHOLD : Math.min(FIRST_PASS_THRESHOLD, WEIGHT_SHARE * weight);
        return Math.max(scaled, NOISE_DEVIATIONS * noise(platform));
    }

    /** SD of the vertical force while the platform is unloaded, from its median absolute deviation, N. */
    private static double noise(PlatformLoads platform) {
        double[] unloaded = new double[platform.samples()];
        int n = 0;
        for (int i = 0; i < unloaded.length; i++) {
            double f = platform.vertical(i);
            if (Math.abs(f) < FIRST_PASS_THRESHOLD / 2) {
                unloaded[n++] = f;
            }
        }
        if (n < 20) {
            return 0;
        }
        double[] sorted = Arrays.copyOf(unloaded, n);
        Arrays.sort(sorted);
        double median = sorted[n / 2];
        for (int i = 0; i < n; i++) {
            sorted[i] = Math.abs(sorted[i] - median);
        }
        Arrays.sort(sorted);
        // 1.4826 turns the median absolute deviation of a normal variable into its SD.
        return 1.4826 * sorted[n / 2];
    }

    /**
     * Times under load.
     *
     * @param platform loads
     * @param threshold N
     * @param shortest shorter contacts are dropped, s
     * @return in order of time
     */
    static List<Loaded> detect(PlatformLoads platform, double threshold, double shortest) {
        List<Loaded> found = new ArrayList<>();
        int n = platform.samples();
        int i = 0;
        while (i < n) {
            if (!(platform.vertical(i) >= threshold)) {
                i++;
                continue;
            }
            int end = i;
            double peak = 0;
            while (end < n && platform.vertical(end) >= threshold) {
                peak = Math.max(peak, platform.vertical(end));
                end++;
            }
            double start = i == 0 ? platform.time(0) : crossing(platform, i - 1, threshold);
            double stop = end == n ? platform.time(n - 1) : crossing(platform, end - 1, threshold);
            if (stop - start >= shortest) {
                found.add(new Loaded(start, stop, i > 0, end < n, peak));
            }
            i = end;
        }
        return found;
    }

    private static double crossing(PlatformLoads platform, int before, double threshold) {
        double a = platform.vertical(before);
        double b = platform.vertical(before + 1);
        return platform.time(before) + (threshold - a) / (b - a) / platform.rate();
    }
}
