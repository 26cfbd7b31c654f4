package org.solewright.analysis.fitting;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import org.solewright.analysis.numerics.Sample;
import org.solewright.domain.foot.Rolling;

/**
 * Roll-over shapes of several stances of one foot: the arc that fits them and the pivots, if the limb vaults about any.
 */
public final class RollOver {

    private static final int FEWEST_SAMPLES = 8;
    private static final double BLOCK = 0.1;
    private static final double SLOWER = 3;

    private RollOver() {}

    /**
     * Whether a path has enough samples for an arc.
     *
     * @param path samples of one stance
     * @return true where an arc can be fitted
     */
    public static boolean isLongEnough(RollOverPath path) {
        return path.samples() >= FEWEST_SAMPLES;
    }

    /**
     * The arc of one stance: geometric fit in curvature form to the path smoothed at 10 Hz, weighted by equal steps of
     * travel.
     *
     * @param path samples of one stance, long enough
     * @return the arc in the path's frame
     */
    public static FittedArc arc(RollOverPath path) {
        RollOverPath smoothed = path.smoothed();
        return ArcFit.fit(smoothed.x(), smoothed.y(), smoothed.travelWeights());
    }

    /**
     * SD of an arc's curvature when neighbouring samples say the same: the fit's own, widened to blocks of 100 ms.
     *
     * @param arc the fit
     * @param rate samples per second, Hz
     * @return 1/m; empty where the fit has none
     */
    public static OptionalDouble blockSd(FittedArc arc, double rate) {
        OptionalDouble sd = arc.curvatureSd();
        return sd.isPresent()
                ? OptionalDouble.of(sd.getAsDouble() * Math.sqrt(Math.max(1, BLOCK * rate)))
                : OptionalDouble.empty();
    }

    /**
     * The arc of several stances: means of curvature, centre and length; the SD is that between stances, for one stance
     * that of its fit.
     *
     * @param frame frame of the paths
     * @param paths one per stance, each long enough, at least one
     * @return the arc of the model
     */
    public static Rolling.Arc common(Rolling.Frame frame, List<RollOverPath> paths) {
        List<FittedArc> arcs = new ArrayList<>();
        for (RollOverPath p : paths) {
            arcs.add(arc(p));
        }
        Sample sample =
                Sample.of(arcs.stream().mapToDouble(FittedArc::curvature).toArray());
        double curvature = sample.mean();
        OptionalDouble sd = arcs.size() == 1 ? blockSd(arcs.get(0), paths.get(0).rate()) : sample.sd();
        OptionalDouble radiusSd = sd.isPresent() && curvature != 0
                ? OptionalDouble.of(sd.getAsDouble() / (curvature * curvature))
                : OptionalDouble.empty();
        return new Rolling.Arc(
                frame,
                curvature,
                sd,
                radiusSd,
                mean(arcs.stream().map(FittedArc::centreX).toList()),
                mean(arcs.stream().map(FittedArc::centreY).toList()),
                arcs.stream().mapToDouble(FittedArc::arcLength).average().orElseThrow(),
                Math.sqrt(arcs.stream()
                        .mapToDouble(a -> a.rms() * a.rms())
                        .average()
                        .orElseThrow()),
                arcs.size());
    }

    private static OptionalDouble mean(List<OptionalDouble> values) {
        double sum = 0;
        for (OptionalDouble v : values) {
            if (v.isEmpty()) {
                return OptionalDouble.empty();
            }
            sum += v.getAsDouble();
        }
        return OptionalDouble.of(sum / values.size());
    }

    /**
     * Times at which the centre of pressure dwells: three times slower than its mean for at least that long.
     *
     * @param path samples of one stance
     * @param shortest s, 40 ms scaled
     * @return first and last sample of each dwell, in order
     */
    public static List<int[]> dwells(RollOverPath path, double shortest) {
        double[] x = path.x();
        double[] y = path.y();
        int n = x.length;
        List<int[]> found = new ArrayList<>();
        if (n < FEWEST_SAMPLES) {
            return found;
        }
        double[] speed = new double[n];
        double travel = 0;
        for (int i = 0; i < n; i++) {
            int a = Math.max(0, i - 1);
            int b = Math.min(n - 1, i + 1);
            speed[i] = Math.hypot(x[b] - x[a], y[b] - y[a]) * path.rate() / (b - a);
            travel += i == 0 ? 0 : Math.hypot(x[i] - x[i - 1], y[i] - y[i - 1]);
        }
        // The mean, not the median: where the limb vaults perfectly, more than half of the samples do not move at all.
        double limit = travel * path.rate() / (n - 1) / SLOWER;
        int i = 0;
        while (i < n) {
            int end = i;
            while (end < n && speed[end] < limit) {
                end++;
            }
            if (end - i >= shortest * path.rate()) {
                found.add(new int[] {i, end - 1});
            }
            i = Math.max(end, i + 1);
        }
        return found;
    }
}
