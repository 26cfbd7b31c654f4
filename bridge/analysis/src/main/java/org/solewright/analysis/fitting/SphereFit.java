package org.solewright.analysis.fitting;

import java.util.Arrays;
import java.util.Optional;
import org.solewright.analysis.numerics.Cholesky;
import org.solewright.analysis.numerics.DampedNewton;
import org.solewright.analysis.numerics.Outcome;

/**
 * Geometric least squares of a circle or sphere, sum w (|p - c| - r)^2 [Gander, Golub and Strebel 1994], by damped Newton
 * steps from Taubin's fit. For arcs that may be flat use {@link ArcFit}.
 */
public final class SphereFit {

    private final FittedSphere sphere;
    private final double squares;
    private final int degreesOfFreedom;
    private final double[] cofactor;
    private final Outcome outcome;

    private SphereFit(FittedSphere sphere, double squares, int degreesOfFreedom, double[] cofactor, Outcome outcome) {
        this.sphere = sphere;
        this.squares = squares;
        this.degreesOfFreedom = degreesOfFreedom;
        this.cofactor = cofactor;
        this.outcome = outcome;
    }

    /**
     * Fits a circle or sphere.
     *
     * @param points {@code [n][dimensions]} row-major, finite, unmodified
     * @param weights {@code [n]}, not negative, unmodified
     * @param dimensions 2 for a circle, 3 for a sphere
     * @return the fit; empty where the points lie on a straight line or plane to working accuracy
     * @throws IllegalArgumentException where fewer than dimensions + 1 points carry weight or the counts differ
     */
    public static Optional<SphereFit> fit(double[] points, double[] weights, int dimensions) {
        int loaded = 0;
        for (double w : weights) {
            loaded += w > 0 ? 1 : 0;
        }
        if (points.length != dimensions * weights.length || loaded < dimensions + 1) {
            throw new IllegalArgumentException(
                    "sphere of " + dimensions + " dimensions through " + points.length + " coordinates, " + loaded
                            + " weights above 0; expected at least " + (dimensions + 1) + " points");
        }
        int count = loaded;
        return AlgebraicFit.taubin(points, weights, dimensions).flatMap(start -> from(start, points, weights, count));
    }

    private static Optional<SphereFit> from(FittedSphere start, double[] points, double[] weights, int loaded) {
        int dimensions = start.dimensions();
        double[] origin = new double[dimensions];
        for (int axis = 0; axis < dimensions; axis++) {
            origin[axis] = start.centre(axis);
        }
        Residuals problem = new Residuals(points, weights, origin, start.radius());
        double[] p = new double[dimensions + 1];
        p[dimensions] = 1;
        Outcome outcome = DampedNewton.minimise(problem, p);
        int size = dimensions + 1;
        double[] gaussNewton = new double[size * size];
        problem.derivatives(p, new double[size], gaussNewton, new double[size * size]);
        Optional<Cholesky> factor = Cholesky.of(gaussNewton, size);
        if (factor.isEmpty() || !(p[dimensions] > 0)) {
            return Optional.empty();
        }
        double[] centre = new double[dimensions];
        for (int axis = 0; axis < dimensions; axis++) {
            centre[axis] = origin[axis] + start.radius() * p[axis];
        }
        FittedSphere sphere = new FittedSphere(centre, start.radius() * p[dimensions]);
        double squares = 2 * problem.cost(p) * start.radius() * start.radius();
        return Optional.of(
                new SphereFit(sphere, squares, loaded - size, factor.get().inverse(), outcome));
    }

    /**
     * The circle or sphere.
     *
     * @return centre and radius
     */
    public FittedSphere sphere() {
        return sphere;
    }

    /**
     * The weighted sum of squared distances.
     *
     * @return in the unit of the weights times that of the points squared
     */
    public double sumOfSquares() {
        return squares;
    }

    /**
     * Number of points over that of parameters.
     *
     * @return zero or more; at zero nothing is known of the scatter
     */
    public int degreesOfFreedom() {
        return degreesOfFreedom;
    }

    /**
     * Root of the sum of squares over the degrees of freedom.
     *
     * @return in the unit of the points; NaN without degrees of freedom
     */
    public double sigma() {
        return degreesOfFreedom > 0 ? Math.sqrt(squares / degreesOfFreedom) : Double.NaN;
    }

    /**
     * Covariance of the centre's coordinates and the radius, sigma^2 (J^T W J)^-1.
     *
     * @param row coordinate, or the number of dimensions for the radius
     * @param column likewise
     * @return square of the points' unit; NaN without degrees of freedom
     */
    public double covariance(int row, int column) {
        return sigma() * sigma() * cofactor[row * (sphere.dimensions() + 1) + column];
    }

    /**
     * How the iteration ended.
     *
     * @return converged or stalled
     */
    public Outcome outcome() {
        return outcome;
    }

    /** Distances in units of the start's radius, parameters the centre from the start's and the radius. */
    private static final class Residuals implements DampedNewton.Problem {

        private final double[] points;
        private final double[] weights;
        private final int dimensions;

        Residuals(double[] points, double[] weights, double[] origin, double unit) {
            this.dimensions = origin.length;
            this.points = new double[points.length];
            for (int i = 0; i < points.length; i++) {
                this.points[i] = (points[i] - origin[i % dimensions]) / unit;
            }
            this.weights = Arrays.copyOf(weights, weights.length);
        }

        private double distance(int row, double[] p) {
            double square = 0;
            for (int axis = 0; axis < dimensions; axis++) {
                double v = points[row * dimensions + axis] - p[axis];
                square += v * v;
            }
            return Math.sqrt(square);
        }

        @Override
        public double cost(double[] p) {
            double cost = 0;
            for (int row = 0; row < weights.length; row++) {
                double e = distance(row, p) - p[dimensions];
                cost += weights[row] * e * e;
            }
            return cost / 2;
        }

        @Override
        public void derivatives(double[] p, double[] gradient, double[] gaussNewton, double[] curvature) {
            int size = dimensions + 1;
            double[] jacobian = new double[size];
            jacobian[dimensions] = -1;
            for (int row = 0; row < weights.length; row++) {
                double distance = Math.max(distance(row, p), Double.MIN_NORMAL);
                double w = weights[row];
                double e = distance - p[dimensions];
                for (int axis = 0; axis < dimensions; axis++) {
                    jacobian[axis] = (p[axis] - points[row * dimensions + axis]) / distance;
                }
                for (int i = 0; i < size; i++) {
                    gradient[i] += w * e * jacobian[i];
                    for (int j = 0; j < size; j++) {
                        gaussNewton[i * size + j] += w * jacobian[i] * jacobian[j];
                        if (i < dimensions && j < dimensions) {
                            curvature[i * size + j] +=
                                    w * e / distance * ((i == j ? 1 : 0) - jacobian[i] * jacobian[j]);
                        }
                    }
                }
            }
        }
    }
}
