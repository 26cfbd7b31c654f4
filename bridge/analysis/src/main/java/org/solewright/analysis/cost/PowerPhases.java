package org.solewright.analysis.cost;

import java.util.ArrayList;
import java.util.List;
import org.solewright.analysis.numerics.Series;

/**
 * The successive phases of one limb's power on the centre of mass over its stance: collision, rebound, preload,
 * push-off ([Kuo, Donelan and Ruina 2005]), bounded by the zero crossings of the power. Excursions of less than 1 % of
 * the stance's work or 15 ms (scaled) belong to the phase around them.
 */
final class PowerPhases {

    private static final double SMALL_WORK = 0.01;

    /** A run of power of one sign; work in J, its sign that of the run. */
    record Run(double start, double end, double work) {
        double duration() {
            return end - start;
        }

        boolean isPositive() {
            return work > 0;
        }
    }

    private PowerPhases() {}

    /**
     * Runs of one sign in order.
     *
     * @param power W
     * @param from s
     * @param to s
     * @param shortest runs of shorter duration are merged, s
     * @return runs of alternating sign that cover the interval
     */
    static List<Run> runs(Series power, double from, double to, double shortest) {
        List<Run> runs = split(power, from, to);
        double total = runs.stream().mapToDouble(r -> Math.abs(r.work())).sum();
        while (runs.size() > 1) {
            int least = -1;
            for (int i = 0; i < runs.size(); i++) {
                Run r = runs.get(i);
                boolean isSmall = Math.abs(r.work()) < SMALL_WORK * total || r.duration() < shortest;
                if (isSmall
                        && (least < 0
                                || Math.abs(r.work()) < Math.abs(runs.get(least).work()))) {
                    least = i;
                }
            }
            if (least < 0) {
                break;
            }
            merge(runs, least);
        }
        return runs;
    }

    private static void merge(List<Run> runs, int i) {
        int first = Math.max(0, i - 1);
        int last = Math.min(runs.size() - 1, i + 1);
        double work = 0;
        for (int k = first; k <= last; k++) {
            work += runs.get(k).work();
        }
        Run merged = new Run(runs.get(first).start(), runs.get(last).end(), work);
        for (int k = last; k >= first; k--) {
            runs.remove(k);
        }
        runs.add(first, merged);
    }

    private static List<Run> split(Series power, double from, double to) {
        List<Run> runs = new ArrayList<>();
        double start = from;
        double t0 = from;
        double p0 = power.at(from);
        while (t0 < to) {
            double t1 = Math.min(to, power.time(power.nextSample(t0)));
            double p1 = power.at(t1);
            if (p0 * p1 < 0) {
                double crossing = t0 + (t1 - t0) * p0 / (p0 - p1);
                runs.add(new Run(start, crossing, power.integral(start, crossing)));
                start = crossing;
            }
            if (p1 != 0) {
                p0 = p1;
            }
            t0 = t1;
        }
        runs.add(new Run(start, to, power.integral(start, to)));
        return runs;
    }
}
