package org.solewright.analysis.numerics;

import java.util.OptionalDouble;
import org.apache.commons.math3.distribution.TDistribution;

/**
 * Mean, spread and confidence of a few independent values.
 *
 * @param n how many, at least 1
 * @param mean arithmetic mean
 * @param sd sample standard deviation, n - 1; empty for one value
 */
public record Sample(int n, double mean, OptionalDouble sd) {

    private static final int FEWEST_FOR_INTERVAL = 3;
    private static final double TWO_SIDED_95 = 0.975;

    /**
     * Statistics of the values.
     *
     * @param values at least one; not modified
     * @return the sample
     * @throws IllegalArgumentException where there is none
     */
    public static Sample of(double[] values) {
        if (values.length == 0) {
            throw new IllegalArgumentException("sample of 0 values, expected at least 1");
        }
        double mean = 0;
        for (double v : values) {
            mean += v / values.length;
        }
        double sum = 0;
        for (double v : values) {
            sum += (v - mean) * (v - mean);
        }
        return new Sample(
                values.length,
                mean,
                values.length > 1 ? OptionalDouble.of(Math.sqrt(sum / (values.length - 1))) : OptionalDouble.empty());
    }

    /**
     * Half width of the 95 % interval of the mean by Student's t.
     *
     * @return empty for fewer than three values
     */
    public OptionalDouble half95() {
        if (n < FEWEST_FOR_INTERVAL) {
            return OptionalDouble.empty();
        }
        return OptionalDouble.of(t95(n - 1) * sd.orElseThrow() / Math.sqrt(n));
    }

    /**
     * Student's t for two-sided 95 % intervals.
     *
     * @param freedom degrees of freedom, more than 0
     * @return the 0.975 quantile
     */
    public static double t95(double freedom) {
        return new TDistribution(freedom).inverseCumulativeProbability(TWO_SIDED_95);
    }
}
