package org.solewright.analysis.cost;

import org.solewright.analysis.numerics.Series;

/**
 * Work of the positive and of the negative part of a sampled power that runs straight between its samples, split at its
 * zero crossings.
 *
 * @param positive J, not negative
 * @param negative J, not positive
 */
public record PowerWork(double positive, double negative) {

    /**
     * The works of sampled power.
     *
     * @param power W, equally spaced, unmodified
     * @param timeStep s, above 0
     * @return both works; 0 for fewer than two samples
     */
    public static PowerWork of(double[] power, double timeStep) {
        double positive = 0;
        double negative = 0;
        for (int i = 1; i < power.length; i++) {
            positive += Series.positivePart(power[i - 1], power[i]);
            negative -= Series.positivePart(-power[i - 1], -power[i]);
        }
        return new PowerWork(positive * timeStep, negative * timeStep);
    }
}
