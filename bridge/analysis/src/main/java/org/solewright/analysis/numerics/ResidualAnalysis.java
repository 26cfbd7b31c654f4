package org.solewright.analysis.numerics;

import java.util.List;
import java.util.OptionalDouble;

/**
 * The cut-off at which a low-pass distorts a signal as much as it lets noise through, by residual analysis [Winter 2009]:
 * the root mean square of what the filter takes away is drawn against its cut-off; at high cut-offs that is noise alone
 * and falls along a line, whose height at 0 Hz tells how much noise there is; the cut-off sought takes away as much.
 */
public final class ResidualAnalysis {

    /** Spacing of the cut-offs tried, Hz. */
    private static final double SPACING = 0.5;

    private static final double LOWEST = 1;

    /** Highest cut-off tried, Hz (walking has nothing above; common practice), and share of the sampling rate. */
    private static final double HIGHEST = 25;

    private static final double MOST_OF_RATE = 0.4;

    /** From this share of the highest cut-off on the residual is taken for noise. */
    private static final double NOISE_FROM = 0.6;

    private static final int FEWEST = 4;

    private ResidualAnalysis() {}

    /**
     * The cut-off for signals that are filtered alike, such as the three coordinates of a point.
     *
     * @param signals each one sample after the other at the rate; NaN where lost; not modified
     * @param rate Hz
     * @return Hz; empty where the rate leaves no room for a line or nothing is there
     */
    public static OptionalDouble cutoff(List<double[]> signals, double rate) {
        double top = Math.min(HIGHEST, MOST_OF_RATE * rate);
        int count = (int) Math.floor((top - LOWEST) / SPACING + 1e-9) + 1;
        if (count < 2 * FEWEST) {
            return OptionalDouble.empty();
        }
        double[] residual = new double[count];
        for (int k = 0; k < count; k++) {
            residual[k] = residual(signals, LOWEST + k * SPACING, rate);
        }
        double noise = heightAtZero(residual, top);
        if (!(noise > 0)) {
            return OptionalDouble.empty();
        }
        for (int k = 1; k < count; k++) {
            if (residual[k] <= noise) {
                double part = residual[k - 1] > noise ? (residual[k - 1] - noise) / (residual[k - 1] - residual[k]) : 0;
                return OptionalDouble.of(LOWEST + (k - 1 + part) * SPACING);
            }
        }
        return OptionalDouble.of(top);
    }

    private static double residual(List<double[]> signals, double cutoff, double rate) {
        LowPass filter = LowPass.of(cutoff, rate);
        double sum = 0;
        int n = 0;
        for (double[] signal : signals) {
            double[] smooth = filter.applyToRuns(signal);
            for (int i = 0; i < signal.length; i++) {
                double d = signal[i] - smooth[i];
                if (!Double.isNaN(d)) {
                    sum += d * d;
                    n++;
                }
            }
        }
        return Math.sqrt(sum / n);
    }

    /** Height at 0 Hz of the line through the residuals of the high cut-offs, least squares. */
    private static double heightAtZero(double[] residual, double top) {
        double sx = 0;
        double sy = 0;
        double sxx = 0;
        double sxy = 0;
        int n = 0;
        for (int k = 0; k < residual.length; k++) {
            double x = LOWEST + k * SPACING;
            if (x >= NOISE_FROM * top) {
                sx += x;
                sy += residual[k];
                sxx += x * x;
                sxy += x * residual[k];
                n++;
            }
        }
        double slope = (n * sxy - sx * sy) / (n * sxx - sx * sx);
        return (sy - slope * sx) / n;
    }
}
