package org.solewright.formats.export;

/**
 * Whether a tensor can be a body's. With any mass distribution all principal minors of tr(I)/2 - I are positive or zero,
 * which holds the triangle inequality of the principal moments [Traversaro 2016, section III].
 */
final class TensorCheck {

    /** Share of the trace that rounding may cost. */
    private static final double ROUNDING = 1e-9;

    private TensorCheck() {}

    /**
     * Whether the tensor is possible.
     *
     * @param t nine values, row by row, any unit
     * @return false also where it is not symmetric or not finite
     */
    static boolean isPossible(double[] t) {
        double trace = t[0] + t[4] + t[8];
        double slack = ROUNDING * trace;
        boolean isSymmetric =
                Math.abs(t[1] - t[3]) <= slack && Math.abs(t[2] - t[6]) <= slack && Math.abs(t[5] - t[7]) <= slack;
        if (!(trace > 0) || !isSymmetric) {
            return false;
        }
        // Shares of the trace, so that the slack needs no unit.
        double a = 0.5 - t[0] / trace + ROUNDING;
        double b = 0.5 - t[4] / trace + ROUNDING;
        double c = 0.5 - t[8] / trace + ROUNDING;
        double d = -t[1] / trace;
        double e = -t[2] / trace;
        double f = -t[5] / trace;
        double whole = a * (b * c - f * f) - d * (d * c - e * f) + e * (d * f - e * b);
        return a >= 0
                && b >= 0
                && c >= 0
                && a * b - d * d >= 0
                && a * c - e * e >= 0
                && b * c - f * f >= 0
                && whole >= -ROUNDING;
    }
}
