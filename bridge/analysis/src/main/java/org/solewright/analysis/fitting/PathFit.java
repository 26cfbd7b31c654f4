package org.solewright.analysis.fitting;

import java.util.Arrays;

/**
 * Pivots and polylines of a time-ordered plane path (a centre of pressure in the limb frame), by the dynamic programme
 * E[k][j] = min over i of E[k-1][i] + cost(i, j). It finds the global optimum.
 *
 * <p>Trap: without a weight that falls with the path's speed the samples that travel from one pivot to the next shift
 * the pivots by 20 to 30 mm. Use {@link #dwellWeights}.
 */
public final class PathFit {

    private PathFit() {}

    /**
     * Weights F/(1 + (u/u0)^4) with u the speed of the path by central differences (one-sided at the ends).
     *
     * @param x first coordinate, m, unmodified
     * @param y second coordinate, m, unmodified
     * @param vertical vertical force, N, unmodified; negative counts as 0
     * @param timeStep s, more than 0
     * @param dwellSpeed u0, m/s, more than 0; on recordings 0.034 sqrt(g l)
     * @return one weight per sample, N
     * @throws IllegalArgumentException where the counts differ or a step or speed is not above 0
     */
    public static double[] dwellWeights(double[] x, double[] y, double[] vertical, double timeStep, double dwellSpeed) {
        if (x.length != y.length || x.length != vertical.length || !(timeStep > 0) || !(dwellSpeed > 0)) {
            throw new IllegalArgumentException("path of " + x.length + " x, " + y.length + " y, " + vertical.length
                    + " forces, time step " + timeStep + " s, dwell speed " + dwellSpeed
                    + " m/s; expected equal counts, step and speed above 0");
        }
        double[] weights = new double[x.length];
        for (int i = 0; i < x.length; i++) {
            int before = Math.max(i - 1, 0);
            int after = Math.min(i + 1, x.length - 1);
            double time = Math.max(after - before, 1) * timeStep;
            double ratio = Math.hypot(x[after] - x[before], y[after] - y[before]) / time / dwellSpeed;
            weights[i] = Math.max(vertical[i], 0) / (1 + ratio * ratio * ratio * ratio);
        }
        return weights;
    }

    /**
     * Splits the path in contiguous runs and gives each the weighted mean of its samples; minimises the sum of w |c -
     * p_run|^2. Work grows as runs times samples squared.
     *
     * @param x first coordinate, m, finite, unmodified
     * @param y second coordinate, m, finite, unmodified
     * @param weights not negative, finite, unmodified; every run gets some weight
     * @param runs number of pivots, 1 or more
     * @return the pivots
     * @throws IllegalArgumentException where fewer samples than runs carry weight, or the counts differ
     */
    public static FittedPath pivots(double[] x, double[] y, double[] weights, int runs) {
        check(x, y, weights);
        int loaded = 0;
        for (double w : weights) {
            loaded += w > 0 ? 1 : 0;
        }
        if (runs < 1 || loaded < runs) {
            throw new IllegalArgumentException(
                    "path of " + loaded + " samples that carry weight in " + runs + " runs, expected 1 to " + loaded);
        }
        PrefixSums sums = new PrefixSums(x, y, weights);
        int[] cuts = optimum(sums, runs, 0, x.length, x.length);
        double[] px = new double[runs];
        double[] py = new double[runs];
        double squares = 0;
        for (int run = 0; run < runs; run++) {
            px[run] = sums.meanX(cuts[run], cuts[run + 1]);
            py[run] = sums.meanY(cuts[run], cuts[run + 1]);
            for (int i = cuts[run]; i < cuts[run + 1]; i++) {
                double dx = x[i] - px[run];
                double dy = y[i] - py[run];
                squares += weights[i] * (dx * dx + dy * dy);
            }
        }
        return new FittedPath(px, py, cuts, squares);
    }

    /**
     * Lays a polyline through samples of the path from its first to its last; minimises the weighted squared distance of
     * the samples to their chord, clamped to its ends. Work grows as samples cubed.
     *
     * @param x first coordinate, m, finite, unmodified
     * @param y second coordinate, m, finite, unmodified
     * @param weights not negative, finite, unmodified
     * @param segments number of chords, 1 to samples - 1
     * @return the vertices
     * @throws IllegalArgumentException where there are too few samples or the counts differ
     */
    public static FittedPath polyline(double[] x, double[] y, double[] weights, int segments) {
        check(x, y, weights);
        if (segments < 1 || x.length < segments + 1) {
            throw new IllegalArgumentException(
                    "path of " + x.length + " samples in " + segments + " segments, expected 1 to " + (x.length - 1));
        }
        int n = x.length;
        double[] table = new double[n * n];
        for (int i = 0; i < n; i++) {
            for (int j = i + 1; j < n; j++) {
                table[i * n + j] = chordCost(x, y, weights, i, j);
            }
        }
        int[] nodes = optimum((i, j) -> table[i * n + j], segments, 0, n - 1, n);
        double[] px = new double[segments + 1];
        double[] py = new double[segments + 1];
        double squares = 0;
        for (int node = 0; node <= segments; node++) {
            px[node] = x[nodes[node]];
            py[node] = y[nodes[node]];
            squares += node < segments ? table[nodes[node] * n + nodes[node + 1]] : 0;
        }
        return new FittedPath(px, py, nodes, squares);
    }

    private static void check(double[] x, double[] y, double[] weights) {
        if (x.length != y.length || x.length != weights.length) {
            throw new IllegalArgumentException(
                    "path of " + x.length + " x, " + y.length + " y and " + weights.length + " weights");
        }
        for (int i = 0; i < x.length; i++) {
            if (!Double.isFinite(x[i] + y[i] + weights[i]) || weights[i] < 0) {
                throw new IllegalArgumentException("sample " + i + " of the path at " + x[i] + ", " + y[i]
                        + " with weight " + weights[i] + ", expected finite numbers and a weight of 0 or more");
            }
        }
    }

    private static double chordCost(double[] x, double[] y, double[] weights, int from, int to) {
        double dx = x[to] - x[from];
        double dy = y[to] - y[from];
        double square = dx * dx + dy * dy;
        double sum = 0;
        for (int i = from; i <= to; i++) {
            double px = x[i] - x[from];
            double py = y[i] - y[from];
            double share = square > 0 ? Math.min(Math.max((px * dx + py * dy) / square, 0), 1) : 0;
            double ex = px - share * dx;
            double ey = py - share * dy;
            sum += weights[i] * (ex * ex + ey * ey);
        }
        return sum;
    }

    private interface Cost {
        double between(int from, int to);
    }

    /** Marks first, ..., last of {@code pieces} pieces with the least total cost; marks lie below {@code limit} + 1. */
    private static int[] optimum(Cost cost, int pieces, int first, int last, int limit) {
        double[] before = new double[limit + 1];
        double[] now = new double[limit + 1];
        int[][] came = new int[pieces + 1][limit + 1];
        Arrays.fill(before, Double.POSITIVE_INFINITY);
        before[first] = 0;
        for (int piece = 1; piece <= pieces; piece++) {
            Arrays.fill(now, Double.POSITIVE_INFINITY);
            for (int j = first + piece; j <= last - (pieces - piece); j++) {
                for (int i = first + piece - 1; i < j; i++) {
                    if (before[i] < now[j]) {
                        double total = before[i] + cost.between(i, j);
                        if (total < now[j]) {
                            now[j] = total;
                            came[piece][j] = i;
                        }
                    }
                }
            }
            double[] swap = before;
            before = now;
            now = swap;
        }
        int[] marks = new int[pieces + 1];
        marks[pieces] = last;
        for (int piece = pieces; piece > 0; piece--) {
            marks[piece - 1] = came[piece][marks[piece]];
        }
        return marks;
    }

    /** Weighted sums up to each sample about the path's mean, so that nothing is lost to a far origin. */
    private static final class PrefixSums implements Cost {

        private final double[] w;
        private final double[] wx;
        private final double[] wy;
        private final double[] wq;
        private final double originX;
        private final double originY;

        PrefixSums(double[] x, double[] y, double[] weights) {
            int n = x.length;
            double sum = 0;
            double sumX = 0;
            double sumY = 0;
            for (int i = 0; i < n; i++) {
                sum += weights[i];
                sumX += weights[i] * x[i];
                sumY += weights[i] * y[i];
            }
            originX = sumX / sum;
            originY = sumY / sum;
            w = new double[n + 1];
            wx = new double[n + 1];
            wy = new double[n + 1];
            wq = new double[n + 1];
            for (int i = 0; i < n; i++) {
                double u = x[i] - originX;
                double v = y[i] - originY;
                w[i + 1] = w[i] + weights[i];
                wx[i + 1] = wx[i] + weights[i] * u;
                wy[i + 1] = wy[i] + weights[i] * v;
                wq[i + 1] = wq[i] + weights[i] * (u * u + v * v);
            }
        }

        @Override
        public double between(int from, int to) {
            double weight = w[to] - w[from];
            if (!(weight > 0)) {
                return Double.POSITIVE_INFINITY;
            }
            double sx = wx[to] - wx[from];
            double sy = wy[to] - wy[from];
            return Math.max(wq[to] - wq[from] - (sx * sx + sy * sy) / weight, 0);
        }

        double meanX(int from, int to) {
            return originX + (wx[to] - wx[from]) / (w[to] - w[from]);
        }

        double meanY(int from, int to) {
            return originY + (wy[to] - wy[from]) / (w[to] - w[from]);
        }
    }
}
