package org.solewright.analysis.numerics;

import org.apache.commons.math3.analysis.interpolation.SplineInterpolator;
import org.apache.commons.math3.analysis.polynomials.PolynomialSplineFunction;

/** Bridges short gaps of a sampled signal by a cubic spline; nothing is extrapolated. */
public final class Gaps {

    private static final int SIDE = 3;
    private static final int SUPPORT = 10;

    private Gaps() {}

    /**
     * Bridges gaps of at most that many samples that have at least three samples on each side.
     *
     * @param x {@code [samples][width]} row-major, NaN where lost; bridged in place
     * @param width components that are lost together
     * @param longest longest gap bridged, samples
     * @return number of samples bridged
     */
    public static int bridge(double[] x, int width, int longest) {
        int n = x.length / width;
        int bridged = 0;
        int i = 0;
        while (i < n) {
            if (!isLost(x, width, i)) {
                i++;
                continue;
            }
            int end = i;
            while (end < n && isLost(x, width, end)) {
                end++;
            }
            if (end - i <= longest && runBefore(x, width, i) >= SIDE && runAfter(x, width, end) >= SIDE) {
                fill(x, width, i, end);
                bridged += end - i;
            }
            i = end;
        }
        return bridged;
    }

    private static boolean isLost(double[] x, int width, int i) {
        return Double.isNaN(x[i * width]);
    }

    private static int runBefore(double[] x, int width, int start) {
        int k = 0;
        while (k < SUPPORT && start - 1 - k >= 0 && !isLost(x, width, start - 1 - k)) {
            k++;
        }
        return k;
    }

    private static int runAfter(double[] x, int width, int end) {
        int n = x.length / width;
        int k = 0;
        while (k < SUPPORT && end + k < n && !isLost(x, width, end + k)) {
            k++;
        }
        return k;
    }

    private static void fill(double[] x, int width, int start, int end) {
        int before = runBefore(x, width, start);
        int after = runAfter(x, width, end);
        double[] t = new double[before + after];
        for (int k = 0; k < before; k++) {
            t[k] = start - before + k;
        }
        for (int k = 0; k < after; k++) {
            t[before + k] = end + k;
        }
        double[] y = new double[t.length];
        for (int c = 0; c < width; c++) {
            for (int k = 0; k < t.length; k++) {
                y[k] = x[((int) t[k]) * width + c];
            }
            PolynomialSplineFunction spline = new SplineInterpolator().interpolate(t, y);
            for (int i = start; i < end; i++) {
                x[i * width + c] = spline.value(i);
            }
        }
    }
}
