package org.solewright.analysis.numerics;

import java.util.function.DoubleUnaryOperator;
import org.apache.commons.math3.analysis.solvers.BrentSolver;

/** Roots of a function of one number. */
public final class Root {

    private static final double ACCURACY = 1e-16;
    private static final int MOST_EVALUATIONS = 10_000;

    private Root() {}

    /**
     * A root in a bracket by Brent's method [Brent 1973], to the last digits of the argument.
     *
     * @param function continuous in the bracket
     * @param low one end
     * @param high other end, not below {@code low}
     * @return an argument at which the function is 0 or changes its sign
     * @throws IllegalArgumentException where the function has one sign at both ends or is not a number there
     */
    public static double inBracket(DoubleUnaryOperator function, double low, double high) {
        double atLow = function.applyAsDouble(low);
        if (atLow == 0) {
            return low;
        }
        double atHigh = function.applyAsDouble(high);
        if (atHigh == 0) {
            return high;
        }
        if (!(Math.signum(atLow) * Math.signum(atHigh) < 0)) {
            throw new IllegalArgumentException("function is " + atLow + " at " + low + " and " + atHigh + " at " + high
                    + ", expected opposite signs");
        }
        return new BrentSolver(ACCURACY, Double.MIN_NORMAL, 0)
                .solve(MOST_EVALUATIONS, function::applyAsDouble, low, high);
    }
}
