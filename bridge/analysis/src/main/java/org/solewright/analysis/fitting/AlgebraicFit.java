package org.solewright.analysis.fitting;

import java.util.Arrays;
import java.util.Optional;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.EigenDecomposition;
import org.apache.commons.math3.linear.RealMatrix;
import org.solewright.analysis.numerics.SingularVectors;

/**
 * Algebraic circle and sphere fits: least squares of a |p|^2 + b.p + c under a constraint that names the method. Each
 * is empty where the points lie on a straight line or plane to working accuracy, or where the method finds no real
 * radius.
 *
 * <p>Kasa's fit is strongly biased to small radii on short arcs, and the unit-norm fit depends on where the origin lies
 * and on the unit of length: for roll-over shapes use {@link ArcFit} or {@link SphereFit}; these are starts and
 * comparisons.
 */
public final class AlgebraicFit {

    /** Ratio of singular values below which a column carries nothing but rounding. */
    private static final double RANK_TOLERANCE = 1e-13;
    /** Centres further away than this many spreads of the points are those of a straight line. */
    private static final double FARTHEST = 1e12;

    private AlgebraicFit() {}

    /**
     * Least squares of 2 c.p + t = |p|^2 with r^2 = t + |c|^2 [Kasa 1976, from memory].
     *
     * @param points {@code [n][dimensions]} row-major, finite, unmodified
     * @param dimensions 2 or 3
     * @return the circle or sphere
     */
    public static Optional<FittedSphere> kasa(double[] points, int dimensions) {
        Centred c = new Centred(points, ones(points, dimensions), dimensions);
        if (!(c.spread > 0) || Double.isInfinite(c.spread)) {
            return Optional.empty();
        }
        int columns = dimensions + 2;
        SingularVectors design = SingularVectors.of(withoutFirst(c.rows, columns), columns - 1);
        if (!(design.value(columns - 2) > RANK_TOLERANCE * design.value(0))) {
            return Optional.empty();
        }
        double[] solution = new double[columns - 1];
        for (int k = 0; k < columns - 1; k++) {
            double projection = 0;
            for (int row = 0; row < c.count; row++) {
                double dot = 0;
                for (int i = 0; i < columns - 1; i++) {
                    dot += c.rows[row * columns + 1 + i] * design.vector(i, k);
                }
                projection += dot * c.rows[row * columns];
            }
            for (int i = 0; i < columns - 1; i++) {
                solution[i] += projection * design.vector(i, k) / (design.value(k) * design.value(k));
            }
        }
        double[] u = new double[columns];
        u[0] = 1;
        for (int i = 1; i < columns; i++) {
            u[i] = -solution[i - 1];
        }
        return c.sphere(u);
    }

    /**
     * Smallest singular vector of the rows (|p|^2, p, 1), neither centred nor scaled: "the algebraic fit" of [Gander,
     * Golub and Strebel 1994].
     *
     * @param points {@code [n][dimensions]} row-major, finite, unmodified
     * @param dimensions 2 or 3
     * @return the circle or sphere
     */
    public static Optional<FittedSphere> unitNorm(double[] points, int dimensions) {
        int columns = dimensions + 2;
        int count = points.length / dimensions;
        double[] rows = new double[count * columns];
        for (int row = 0; row < count; row++) {
            double square = 0;
            for (int axis = 0; axis < dimensions; axis++) {
                double v = points[row * dimensions + axis];
                rows[row * columns + 1 + axis] = v;
                square += v * v;
            }
            rows[row * columns] = square;
            rows[row * columns + columns - 1] = 1;
        }
        SingularVectors singular = SingularVectors.of(rows, columns);
        double[] u = new double[columns];
        for (int i = 0; i < columns; i++) {
            u[i] = singular.vector(i, columns - 1);
        }
        return sphere(u, new double[dimensions], 1);
    }

    /**
     * Smallest eigenvalue not below 0 of S^T S u = eta C u with C the discriminant [Pratt 1987, from memory].
     *
     * @param points {@code [n][dimensions]} row-major, finite, unmodified
     * @param dimensions 2 or 3
     * @return the circle or sphere
     */
    public static Optional<FittedSphere> pratt(double[] points, int dimensions) {
        Centred c = new Centred(points, ones(points, dimensions), dimensions);
        if (!(c.spread > 0) || Double.isInfinite(c.spread)) {
            return Optional.empty();
        }
        int columns = dimensions + 2;
        int last = columns - 1;
        SingularVectors singular = SingularVectors.of(c.rows, columns);
        double[] u = new double[columns];
        if (singular.value(last) <= RANK_TOLERANCE * singular.value(0)) {
            for (int i = 0; i < columns; i++) {
                u[i] = singular.vector(i, last);
            }
            return c.sphere(u);
        }
        RealMatrix root = power(singular, columns, 1);
        RealMatrix constraint = new Array2DRowRealMatrix(columns, columns);
        for (int i = 1; i < last; i++) {
            constraint.setEntry(i, i, 1);
        }
        constraint.setEntry(0, last, -0.5);
        constraint.setEntry(last, 0, -0.5);
        RealMatrix product = root.multiply(constraint).multiply(root);
        EigenDecomposition eigen =
                new EigenDecomposition(product.add(product.transpose()).scalarMultiply(0.5));
        int chosen = -1;
        for (int i = 0; i < columns; i++) {
            double value = eigen.getRealEigenvalue(i);
            if (value > 0 && (chosen < 0 || value < eigen.getRealEigenvalue(chosen))) {
                chosen = i;
            }
        }
        if (chosen < 0) {
            return Optional.empty();
        }
        return c.sphere(power(singular, columns, -1)
                .operate(eigen.getEigenvector(chosen).toArray()));
    }

    /**
     * Smallest singular vector of the centred rows in Taubin's norm [Taubin 1991, from memory].
     *
     * @param points {@code [n][dimensions]} row-major, finite, unmodified
     * @param dimensions 2 or 3
     * @return the circle or sphere
     */
    public static Optional<FittedSphere> taubin(double[] points, int dimensions) {
        return taubin(points, ones(points, dimensions), dimensions);
    }

    /**
     * Taubin's fit with weights.
     *
     * @param points {@code [n][dimensions]} row-major, finite, unmodified
     * @param weights {@code [n]}, not negative, not all zero, unmodified
     * @param dimensions 2 or 3
     * @return the circle or sphere
     */
    public static Optional<FittedSphere> taubin(double[] points, double[] weights, int dimensions) {
        Centred c = new Centred(points, weights, dimensions);
        if (!(c.spread > 0) || Double.isInfinite(c.spread)) {
            return Optional.empty();
        }
        int columns = dimensions + 2;
        double[] reduced = new double[c.count * (dimensions + 1)];
        double norm = 2 * Math.sqrt(c.meanSquare);
        for (int row = 0; row < c.count; row++) {
            double root = c.rows[row * columns + columns - 1];
            int target = row * (dimensions + 1);
            reduced[target] = (c.rows[row * columns] - root * c.meanSquare) / norm;
            System.arraycopy(c.rows, row * columns + 1, reduced, target + 1, dimensions);
        }
        SingularVectors singular = SingularVectors.of(reduced, dimensions + 1);
        double[] u = new double[columns];
        u[0] = singular.vector(0, dimensions) / norm;
        for (int axis = 0; axis < dimensions; axis++) {
            u[1 + axis] = singular.vector(1 + axis, dimensions);
        }
        u[columns - 1] = -c.meanSquare * u[0];
        return c.sphere(u);
    }

    private static double[] ones(double[] points, int dimensions) {
        double[] ones = new double[points.length / dimensions];
        Arrays.fill(ones, 1);
        return ones;
    }

    private static double[] withoutFirst(double[] rows, int columns) {
        double[] out = new double[rows.length / columns * (columns - 1)];
        for (int row = 0; row < rows.length / columns; row++) {
            System.arraycopy(rows, row * columns + 1, out, row * (columns - 1), columns - 1);
        }
        return out;
    }

    private static RealMatrix power(SingularVectors singular, int columns, int exponent) {
        RealMatrix m = new Array2DRowRealMatrix(columns, columns);
        for (int i = 0; i < columns; i++) {
            for (int j = 0; j < columns; j++) {
                double sum = 0;
                for (int k = 0; k < columns; k++) {
                    sum += singular.vector(i, k) * Math.pow(singular.value(k), exponent) * singular.vector(j, k);
                }
                m.setEntry(i, j, sum);
            }
        }
        return m;
    }

    /** From u_0 |q|^2 + u.q + u_last = 0 with q = (p - mean)/spread. */
    private static Optional<FittedSphere> sphere(double[] u, double[] mean, double spread) {
        int dimensions = mean.length;
        double[] centre = new double[dimensions];
        double square = -u[dimensions + 1] / u[0];
        double farthest = 0;
        for (int axis = 0; axis < dimensions; axis++) {
            double q = -u[1 + axis] / (2 * u[0]);
            square += q * q;
            farthest = Math.max(farthest, Math.abs(q));
            centre[axis] = mean[axis] + spread * q;
        }
        if (!(square > 0) || !(farthest < FARTHEST)) {
            return Optional.empty();
        }
        return Optional.of(new FittedSphere(centre, spread * Math.sqrt(square)));
    }

    /** Rows root(w) (|q|^2, q, 1) of points centred and scaled to unit spread. */
    private static final class Centred {

        private final int count;
        private final double[] mean;
        private final double spread;
        private final double meanSquare;
        private final double[] rows;

        Centred(double[] points, double[] weights, int dimensions) {
            count = weights.length;
            mean = new double[dimensions];
            double sum = 0;
            for (int row = 0; row < count; row++) {
                sum += weights[row];
                for (int axis = 0; axis < dimensions; axis++) {
                    mean[axis] += weights[row] * points[row * dimensions + axis];
                }
            }
            for (int axis = 0; axis < dimensions; axis++) {
                mean[axis] /= sum;
            }
            double total = 0;
            for (int row = 0; row < count; row++) {
                for (int axis = 0; axis < dimensions; axis++) {
                    double v = points[row * dimensions + axis] - mean[axis];
                    total += weights[row] * v * v;
                }
            }
            spread = Math.sqrt(total / sum);
            int columns = dimensions + 2;
            rows = new double[count * columns];
            double squares = 0;
            for (int row = 0; row < count; row++) {
                double root = Math.sqrt(weights[row] / sum);
                double square = 0;
                for (int axis = 0; axis < dimensions; axis++) {
                    double q = (points[row * dimensions + axis] - mean[axis]) / spread;
                    square += q * q;
                    rows[row * columns + 1 + axis] = root * q;
                }
                rows[row * columns] = root * square;
                rows[row * columns + columns - 1] = root;
                squares += weights[row] / sum * square;
            }
            meanSquare = squares;
        }

        Optional<FittedSphere> sphere(double[] u) {
            return AlgebraicFit.sphere(u, mean, spread);
        }
    }
}
