package org.solewright.analysis.fitting;

import org.solewright.analysis.numerics.LowPass;
import org.solewright.domain.geometry.Rotation;
import org.solewright.domain.geometry.Vec3;

/**
 * The path of the centre of pressure in a body frame in the sagittal plane of the walking frame: the roll-over shape of
 * [Hansen and Childress 2004]. Origin ankle, y from the ankle to the upper joint, x forward; m.
 */
public final class RollOverPath {

    private static final double SMOOTHING = 10;
    private static final double MOST_OF_RATE = 0.4;

    private final double rate;
    private final double[] x;
    private final double[] y;
    private final double[] load;

    private RollOverPath(double rate, double[] x, double[] y, double[] load) {
        this.rate = rate;
        this.x = x;
        this.y = y;
        this.load = load;
    }

    /**
     * Collects samples at equal intervals. Not shared between threads.
     */
    public static final class Collector {

        private final double rate;
        private final Rotation R_LW;
        private double[] xyf = new double[3 * 64];
        private int n;

        /**
         * An empty collector.
         *
         * @param rate samples per second, Hz
         * @param R_LW walking frame (x forward, y up, z right) in the laboratory frame
         */
        public Collector(double rate, Rotation R_LW) {
            this.rate = rate;
            this.R_LW = R_LW;
        }

        /**
         * Adds the next sample; one that is not finite is left out.
         *
         * @param centreOfPressure laboratory frame, m
         * @param ankle laboratory frame, m
         * @param upper knee or hip, laboratory frame, m
         * @param vertical load, N
         */
        public void add(Vec3 centreOfPressure, Vec3 ankle, Vec3 upper, double vertical) {
            Vec3 u = R_LW.inverseVector(upper.minus(ankle));
            double length = Math.hypot(u.x(), u.y());
            double ux = u.x() / length;
            double uy = u.y() / length;
            Vec3 p = R_LW.inverseVector(centreOfPressure.minus(ankle));
            if (!Double.isFinite(p.x() + p.y() + ux + uy)) {
                return;
            }
            if (3 * n == xyf.length) {
                xyf = java.util.Arrays.copyOf(xyf, 2 * xyf.length);
            }
            xyf[3 * n] = p.x() * uy - p.y() * ux;
            xyf[3 * n + 1] = p.x() * ux + p.y() * uy;
            xyf[3 * n + 2] = vertical;
            n++;
        }

        /**
         * The path so far.
         *
         * @return the samples added
         */
        public RollOverPath path() {
            double[] x = new double[n];
            double[] y = new double[n];
            double[] load = new double[n];
            for (int i = 0; i < n; i++) {
                x[i] = xyf[3 * i];
                y[i] = xyf[3 * i + 1];
                load[i] = xyf[3 * i + 2];
            }
            return new RollOverPath(rate, x, y, load);
        }
    }

    /**
     * Number of samples.
     *
     * @return zero or more
     */
    public int samples() {
        return x.length;
    }

    /**
     * Samples per second.
     *
     * @return Hz
     */
    public double rate() {
        return rate;
    }

    /**
     * Forward positions.
     *
     * @return m, a fresh array
     */
    public double[] x() {
        return x.clone();
    }

    /**
     * Positions along ankle to upper joint, negative below the ankle.
     *
     * @return m, a fresh array
     */
    public double[] y() {
        return y.clone();
    }

    /**
     * Vertical load at the samples.
     *
     * @return N, a fresh array
     */
    public double[] load() {
        return load.clone();
    }

    /**
     * The path smoothed at 10 Hz.
     *
     * @return a path with as many samples; unchanged where it is shorter than two samples
     */
    public RollOverPath smoothed() {
        if (x.length < 2) {
            return this;
        }
        LowPass filter = LowPass.of(Math.min(SMOOTHING, MOST_OF_RATE * rate), rate);
        return new RollOverPath(rate, filter.apply(x), filter.apply(y), load);
    }

    /**
     * Weights that make equal steps of travel count alike: half the travel to either neighbour.
     *
     * @return m, as many as samples, not negative
     */
    public double[] travelWeights() {
        double[] w = new double[x.length];
        for (int i = 1; i < w.length; i++) {
            double step = Math.hypot(x[i] - x[i - 1], y[i] - y[i - 1]);
            w[i - 1] += step / 2;
            w[i] += step / 2;
        }
        return w;
    }

    /**
     * Distance from the rearmost to the foremost sample.
     *
     * @return m along x; NaN without samples
     */
    public double extent() {
        double low = Double.POSITIVE_INFINITY;
        double high = Double.NEGATIVE_INFINITY;
        for (double v : x) {
            low = Math.min(low, v);
            high = Math.max(high, v);
        }
        return x.length == 0 ? Double.NaN : high - low;
    }
}
