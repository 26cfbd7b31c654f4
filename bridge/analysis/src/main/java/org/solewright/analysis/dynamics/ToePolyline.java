package org.solewright.analysis.dynamics;

import java.util.Arrays;

/**
 * A curve replaced by straight toe segments, and by how much the curve leaves them. Nodes at equal arc length are poor near
 * a bend, where more segments may even be worse; the nodes that make the largest deviation least come from a dynamic
 * programme over the samples [derived].
 */
public final class ToePolyline {

    private final int[] nodes;
    private final double deviation;

    private ToePolyline(int[] nodes, double deviation) {
        this.nodes = nodes;
        this.deviation = deviation;
    }

    /**
     * Nodes at equal arc length.
     *
     * @param curve {@code [samples][3]} row-major, m, unmodified
     * @param segments 1 or more
     * @return the polyline
     */
    public static ToePolyline equalArc(double[] curve, int segments) {
        int samples = curve.length / 3;
        double[] length = new double[samples];
        for (int i = 1; i < samples; i++) {
            length[i] = length[i - 1] + distance(curve, i - 1, i);
        }
        int[] nodes = new int[segments + 1];
        for (int k = 0; k <= segments; k++) {
            double wanted = length[samples - 1] * k / segments;
            int at = Arrays.binarySearch(length, wanted);
            int after = Math.min(samples - 1, at >= 0 ? at : -at - 1);
            boolean isNearer = after > 0 && wanted - length[after - 1] < length[after] - wanted;
            nodes[k] = isNearer ? after - 1 : after;
        }
        double worst = 0;
        for (int k = 0; k < segments; k++) {
            worst = Math.max(worst, deviation(curve, nodes[k], nodes[k + 1]));
        }
        return new ToePolyline(nodes, worst);
    }

    /**
     * Nodes at samples that make the largest deviation least.
     *
     * @param curve {@code [samples][3]} row-major, m, unmodified; a few hundred samples
     * @param segments 1 or more, fewer than samples
     * @return the polyline
     */
    public static ToePolyline minimax(double[] curve, int segments) {
        int n = curve.length / 3;
        double[][] between = new double[n][n];
        for (int i = 0; i < n; i++) {
            for (int j = i + 1; j < n; j++) {
                between[i][j] = deviation(curve, i, j);
            }
        }
        double[] best = between[0].clone();
        int[][] from = new int[segments][n];
        for (int k = 1; k < segments; k++) {
            double[] next = new double[n];
            for (int j = 0; j < n; j++) {
                next[j] = Double.POSITIVE_INFINITY;
                for (int i = 0; i <= j; i++) {
                    double worst = Math.max(best[i], between[i][j]);
                    if (worst < next[j]) {
                        next[j] = worst;
                        from[k][j] = i;
                    }
                }
            }
            best = next;
        }
        int[] nodes = new int[segments + 1];
        nodes[segments] = n - 1;
        for (int k = segments - 1; k >= 1; k--) {
            nodes[k] = from[k][nodes[k + 1]];
        }
        return new ToePolyline(nodes, best[n - 1]);
    }

    private static double distance(double[] c, int i, int j) {
        double x = c[3 * j] - c[3 * i];
        double y = c[3 * j + 1] - c[3 * i + 1];
        double z = c[3 * j + 2] - c[3 * i + 2];
        return Math.sqrt(x * x + y * y + z * z);
    }

    /** Largest distance of the samples between two nodes from the straight line segment between them. */
    private static double deviation(double[] c, int from, int to) {
        double dx = c[3 * to] - c[3 * from];
        double dy = c[3 * to + 1] - c[3 * from + 1];
        double dz = c[3 * to + 2] - c[3 * from + 2];
        double square = dx * dx + dy * dy + dz * dz;
        double worst = 0;
        for (int i = from + 1; i < to; i++) {
            double x = c[3 * i] - c[3 * from];
            double y = c[3 * i + 1] - c[3 * from + 1];
            double z = c[3 * i + 2] - c[3 * from + 2];
            double share = square > 0 ? Math.max(0, Math.min(1, (x * dx + y * dy + z * dz) / square)) : 0;
            double ex = x - share * dx;
            double ey = y - share * dy;
            double ez = z - share * dz;
            worst = Math.max(worst, ex * ex + ey * ey + ez * ez);
        }
        return Math.sqrt(worst);
    }

    /**
     * Indices of the nodes among the samples.
     *
     * @return a copy, first and last sample included
     */
    public int[] nodes() {
        return nodes.clone();
    }

    /**
     * Largest distance of the curve from the polyline.
     *
     * @return m
     */
    public double deviation() {
        return deviation;
    }
}
