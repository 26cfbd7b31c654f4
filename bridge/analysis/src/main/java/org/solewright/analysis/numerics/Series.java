package org.solewright.analysis.numerics;

/**
 * A scalar sampled at equal intervals, read between samples by linear interpolation; integrals are those of the
 * piecewise linear curve, exact also for ends between samples. Samples are copied in.
 */
public final class Series {

    private final double start;
    private final double rate;
    private final double[] value;
    private final double[] integral;

    /**
     * A sampled curve.
     *
     * @param start time of the first sample, s
     * @param rate samples per second, Hz, more than 0
     * @param value samples; copied; NaN makes every integral over it NaN
     */
    public Series(double start, double rate, double[] value) {
        this.start = start;
        this.rate = rate;
        this.value = value.clone();
        this.integral = new double[value.length];
        for (int i = 1; i < value.length; i++) {
            integral[i] = integral[i - 1] + (value[i - 1] + value[i]) / (2 * rate);
        }
    }

    /**
     * Number of samples.
     *
     * @return zero or more
     */
    public int samples() {
        return value.length;
    }

    /**
     * Time of a sample.
     *
     * @param sample zero-based
     * @return s
     */
    public double time(int sample) {
        return start + sample / rate;
    }

    /**
     * Time of the first sample.
     *
     * @return s
     */
    public double start() {
        return start;
    }

    /**
     * Time of the last sample.
     *
     * @return s
     */
    public double end() {
        return time(value.length - 1);
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
     * A sample.
     *
     * @param sample zero-based
     * @return its value
     */
    public double sample(int sample) {
        return value[sample];
    }

    /**
     * The curve at a time.
     *
     * @param time s
     * @return linear interpolation; NaN outside the samples
     */
    public double at(double time) {
        double s = position(time);
        int i = (int) s;
        double f = s - i;
        // An exact hit must not read a lost or missing neighbour.
        return Double.isNaN(s) ? Double.NaN : f == 0 ? value[i] : value[i] * (1 - f) + value[i + 1] * f;
    }

    /**
     * Integral of the curve.
     *
     * @param from s, within the samples
     * @param to s, within the samples
     * @return integral from one to the other; NaN outside the samples
     */
    public double integral(double from, double to) {
        return primitive(to) - primitive(from);
    }

    /**
     * Mean of the curve.
     *
     * @param from s
     * @param to s, more than from
     * @return integral over duration
     */
    public double mean(double from, double to) {
        return integral(from, to) / (to - from);
    }

    /**
     * Integral of the positive part, split exactly at the zero crossings.
     *
     * @param from s, within the samples
     * @param to s, not before from
     * @return not negative; NaN outside the samples
     */
    public double positiveIntegral(double from, double to) {
        double sum = 0;
        double t0 = from;
        double v0 = at(from);
        while (t0 < to) {
            double t1 = Math.min(to, time(nextSample(t0)));
            double v1 = at(t1);
            sum += positivePart(v0, v1) * (t1 - t0);
            t0 = t1;
            v0 = v1;
        }
        return sum;
    }

    /**
     * Integral of the negative part.
     *
     * @param from s, within the samples
     * @param to s, not before from
     * @return not positive; NaN outside the samples
     */
    public double negativeIntegral(double from, double to) {
        return integral(from, to) - positiveIntegral(from, to);
    }

    /**
     * First sample strictly after a time.
     *
     * @param time s
     * @return zero-based; may be beyond the last sample
     */
    public int nextSample(double time) {
        return (int) Math.floor((time - start) * rate + 1e-9) + 1;
    }

    /**
     * Mean of the positive part of a straight line between two samples, split exactly at its zero crossing.
     *
     * @param a one sample
     * @param b the other
     * @return not negative, in the samples' unit; NaN where one of them is lost
     */
    public static double positivePart(double a, double b) {
        if (a >= 0 && b >= 0) {
            return (a + b) / 2;
        }
        if (a <= 0 && b <= 0) {
            return 0;
        }
        // NaN falls through and stays NaN.
        double high = a > b ? a : b;
        double low = a > b ? b : a;
        return high * high / (2 * (high - low));
    }

    private double primitive(double time) {
        double s = position(time);
        int i = (int) s;
        double f = s - i;
        if (Double.isNaN(s)) {
            return Double.NaN;
        }
        return f == 0 ? integral[i] : integral[i] + (value[i] * f + (value[i + 1] - value[i]) * f * f / 2) / rate;
    }

    /** Place in samples; NaN outside, where a rounding error of a millionth of a sample is still inside. */
    private double position(double time) {
        double s = (time - start) * rate;
        double nearest = Math.rint(s);
        if (Math.abs(s - nearest) < 1e-6) {
            s = nearest;
        }
        return s >= 0 && s <= value.length - 1 ? s : Double.NaN;
    }
}
