package org.solewright.analysis.dynamics;

import java.util.function.DoubleUnaryOperator;

/** Integrals by Gauss and Legendre's rule; nodes by Newton's method on the Legendre polynomial. */
final class Quadrature {

    private static final int NODES = 12;
    private static final int NEWTON_STEPS = 60;
    private static final int BISECTIONS = 80;

    private final double[] node = new double[NODES];
    private final double[] weight = new double[NODES];

    Quadrature() {
        for (int i = 0; i < NODES; i++) {
            double x = Math.cos(Math.PI * (i + 0.75) / (NODES + 0.5));
            double slope = 1;
            for (int step = 0; step < NEWTON_STEPS; step++) {
                double before = 1;
                double now = x;
                for (int k = 2; k <= NODES; k++) {
                    double next = ((2 * k - 1) * x * now - (k - 1) * before) / k;
                    before = now;
                    now = next;
                }
                slope = NODES * (x * now - before) / (x * x - 1);
                x -= now / slope;
            }
            node[i] = x;
            weight[i] = 2 / ((1 - x * x) * slope * slope);
        }
    }

    double integral(DoubleUnaryOperator f, double from, double to, int cells) {
        double sum = 0;
        double half = (to - from) / (2 * cells);
        for (int cell = 0; cell < cells; cell++) {
            double middle = from + (2 * cell + 1) * half;
            for (int i = 0; i < NODES; i++) {
                sum += weight[i] * f.applyAsDouble(middle + half * node[i]);
            }
        }
        return sum * half;
    }

    /** Integral of the positive part, split where the sign changes between ends of cells. */
    double positive(DoubleUnaryOperator f, double from, double to, int cells) {
        double sum = 0;
        for (int cell = 0; cell < cells; cell++) {
            double low = from + (to - from) * cell / cells;
            double high = from + (to - from) * (cell + 1) / cells;
            double atLow = f.applyAsDouble(low);
            double atHigh = f.applyAsDouble(high);
            if (atLow * atHigh < 0) {
                double zero = zero(f, low, high, atLow);
                sum += atLow > 0 ? integral(f, low, zero, 1) : integral(f, zero, high, 1);
            } else {
                sum += Math.max(integral(f, low, high, 1), 0);
            }
        }
        return sum;
    }

    private static double zero(DoubleUnaryOperator f, double from, double to, double atFrom) {
        double low = from;
        double high = to;
        for (int i = 0; i < BISECTIONS; i++) {
            double middle = (low + high) / 2;
            if (f.applyAsDouble(middle) * atFrom > 0) {
                low = middle;
            } else {
                high = middle;
            }
        }
        return (low + high) / 2;
    }
}
