package org.solewright.analysis.fitting;

import java.util.Optional;
import java.util.function.DoubleUnaryOperator;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.EigenDecomposition;
import org.apache.commons.math3.linear.RealMatrix;

/**
 * The symmetric positive linear map A that turns one spread of mass into another, A P A = Q: A = P^-1/2 (P^1/2 Q
 * P^1/2)^1/2 P^-1/2. It is the one that moves the mass least [Olkin Pukelsheim 1982].
 */
final class SymmetricMap {

    private final RealMatrix matrix;
    private final double smallest;
    private final double largest;

    private SymmetricMap(RealMatrix matrix, double smallest, double largest) {
        this.matrix = matrix;
        this.smallest = smallest;
        this.largest = largest;
    }

    /**
     * The map between two spreads.
     *
     * @param from {@code [3][3]} symmetric, m2
     * @param to likewise
     * @return the map; empty where one of them is not positive definite
     */
    static Optional<SymmetricMap> between(double[][] from, double[][] to) {
        RealMatrix p = new Array2DRowRealMatrix(from);
        RealMatrix q = new Array2DRowRealMatrix(to);
        if (!isPositive(p) || !isPositive(q)) {
            return Optional.empty();
        }
        RealMatrix root = function(p, Math::sqrt);
        RealMatrix inverse = function(p, v -> 1 / Math.sqrt(v));
        RealMatrix middle = function(symmetric(root.multiply(q).multiply(root)), Math::sqrt);
        RealMatrix a = symmetric(inverse.multiply(middle).multiply(inverse));
        double[] values = new EigenDecomposition(a).getRealEigenvalues();
        return Optional.of(new SymmetricMap(a, values[2], values[0]));
    }

    /** Least stretch. */
    double smallest() {
        return smallest;
    }

    /** Greatest stretch. */
    double largest() {
        return largest;
    }

    double entry(int row, int column) {
        return matrix.getEntry(row, column);
    }

    private static boolean isPositive(RealMatrix m) {
        for (double v : new EigenDecomposition(symmetric(m)).getRealEigenvalues()) {
            if (!(v > 0)) {
                return false;
            }
        }
        return true;
    }

    private static RealMatrix symmetric(RealMatrix m) {
        return m.add(m.transpose()).scalarMultiply(0.5);
    }

    private static RealMatrix function(RealMatrix m, DoubleUnaryOperator f) {
        EigenDecomposition e = new EigenDecomposition(symmetric(m));
        RealMatrix d = e.getD();
        for (int i = 0; i < 3; i++) {
            d.setEntry(i, i, f.applyAsDouble(d.getEntry(i, i)));
        }
        return e.getV().multiply(d).multiply(e.getVT());
    }
}
