package org.solewright.analysis.dynamics;

/** Polynomial of fifth degree with given value, first and second derivative at both ends of an interval [Hermite]. */
final class Quintic {

    private final double[] c = new double[6];

    /**
     * The polynomial.
     *
     * @param duration length of the interval, above 0
     * @param start value, first and second derivative at its start
     * @param end value, first and second derivative at its end
     */
    Quintic(double duration, double[] start, double[] end) {
        double t = duration;
        double gap = end[0] - start[0] - start[1] * t - start[2] * t * t / 2;
        double rate = (end[1] - start[1] - start[2] * t) * t;
        double bend = (end[2] - start[2]) * t * t;
        double cube = t * t * t;
        c[0] = start[0];
        c[1] = start[1];
        c[2] = start[2] / 2;
        c[3] = (10 * gap - 4 * rate + bend / 2) / cube;
        c[4] = (-15 * gap + 7 * rate - bend) / (cube * t);
        c[5] = (6 * gap - 3 * rate + bend / 2) / (cube * t * t);
    }

    double value(double t) {
        return c[0] + t * (c[1] + t * (c[2] + t * (c[3] + t * (c[4] + t * c[5]))));
    }

    double slope(double t) {
        return c[1] + t * (2 * c[2] + t * (3 * c[3] + t * (4 * c[4] + t * 5 * c[5])));
    }

    double curvature(double t) {
        return 2 * c[2] + t * (6 * c[3] + t * (12 * c[4] + t * 20 * c[5]));
    }
}
