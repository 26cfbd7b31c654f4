package org.solewright.analysis.fitting;

import java.util.Arrays;
import java.util.Optional;
import org.solewright.analysis.numerics.Cholesky;
import org.solewright.analysis.numerics.DampedNewton;
import org.solewright.analysis.numerics.Outcome;

/**
 * Geometric least squares of a circular arc in curvature form: minimises sum w e^2 with e the distance to the curve
 * along its normal, over direction, offset and curvature. The residual is written (2a - k(a^2+b^2))/(1+s), s^2 = 1 - 2ka +
 * k^2(a^2+b^2), which has no singularity at k = 0 [derived; the parameters are those of Karimaki 1991, from memory].
 *
 * <p>The start is Taubin's algebraic fit, or the straight line where that one has no centre.
 */
public final class ArcFit {

    private static final int PARAMETERS = 3;
    /** Radii over this many spreads of the points start from the straight line. */
    private static final double FLAT_START = 1e5;
    /** Curvature times spread that is rounding: its rise is far below the last digit of the points. */
    private static final double STRAIGHT = 1e-13;

    private final double[] x;
    private final double[] y;
    private final double[] weights;
    private final double scale;
    private final double weightSum;
    private final int loaded;
    private final int reference;

    private ArcFit(double[] x, double[] y, double[] weights) {
        this.x = x;
        this.y = y;
        this.weights = weights;
        double sum = 0;
        double sumX = 0;
        double sumY = 0;
        int count = 0;
        for (int i = 0; i < x.length; i++) {
            sum += weights[i];
            sumX += weights[i] * x[i];
            sumY += weights[i] * y[i];
            count += weights[i] > 0 ? 1 : 0;
        }
        double spread = 0;
        int nearest = 0;
        double least = Double.POSITIVE_INFINITY;
        for (int i = 0; i < x.length; i++) {
            double square = square(x[i] - sumX / sum) + square(y[i] - sumY / sum);
            spread += weights[i] * square;
            if (weights[i] > 0 && square < least) {
                least = square;
                nearest = i;
            }
        }
        this.weightSum = sum;
        this.loaded = count;
        this.scale = Math.sqrt(spread / sum);
        this.reference = nearest;
    }

    /**
     * Fits an arc to points of equal weight.
     *
     * @param x first coordinates, m, finite, unmodified
     * @param y second coordinates, m, finite, as many, unmodified
     * @return the arc
     * @throws IllegalArgumentException where there are fewer than 3 points, the counts differ, a number is not finite or
     *     all points coincide
     */
    public static FittedArc fit(double[] x, double[] y) {
        double[] weights = new double[x.length];
        Arrays.fill(weights, 1);
        return fit(x, y, weights);
    }

    /**
     * Fits an arc to weighted points. Only the ratios of the weights matter: the standard deviations come from the
     * weighted scatter over n - 3 degrees of freedom and take the points as independent.
     *
     * @param x first coordinates, m, finite, unmodified
     * @param y second coordinates, m, finite, as many, unmodified
     * @param weights relative weights, finite, not negative, as many, unmodified
     * @return the arc
     * @throws IllegalArgumentException where fewer than 3 points carry weight, the counts differ, a number is not finite,
     *     a weight is negative or all points coincide
     */
    public static FittedArc fit(double[] x, double[] y, double[] weights) {
        check(x, y, weights);
        ArcFit fit = new ArcFit(x, y, weights);
        if (fit.loaded < PARAMETERS) {
            throw new IllegalArgumentException(
                    "arc through " + fit.loaded + " points that carry weight, expected 3 or more");
        }
        if (!(fit.scale > 0)) {
            throw new IllegalArgumentException("arc through " + fit.loaded + " points that all coincide");
        }
        return fit.run();
    }

    private static void check(double[] x, double[] y, double[] weights) {
        if (x.length != y.length || x.length != weights.length) {
            throw new IllegalArgumentException(
                    "arc through " + x.length + " x, " + y.length + " y and " + weights.length + " weights");
        }
        for (int i = 0; i < x.length; i++) {
            if (!Double.isFinite(x[i] + y[i] + weights[i]) || weights[i] < 0) {
                throw new IllegalArgumentException("point " + i + " of the arc at " + x[i] + ", " + y[i]
                        + " with weight " + weights[i] + ", expected finite numbers and a weight of 0 or more");
            }
        }
    }

    private static double square(double v) {
        return v * v;
    }

    private FittedArc run() {
        double[] best = lineStart();
        Outcome outcome = minimise(best);
        double cost = cost(best);
        Optional<double[]> other = circleStart();
        if (other.isPresent()) {
            double[] p = other.get();
            Outcome otherOutcome = minimise(p);
            double otherCost = cost(p);
            if (otherCost < cost) {
                best = p;
                outcome = otherOutcome;
                cost = otherCost;
            }
        }
        return result(best, cost, outcome);
    }

    private Outcome minimise(double[] p) {
        return DampedNewton.minimise(
                new DampedNewton.Problem() {
                    @Override
                    public double cost(double[] at) {
                        return ArcFit.this.cost(at);
                    }

                    @Override
                    public void derivatives(double[] at, double[] gradient, double[] gaussNewton, double[] curvature) {
                        ArcFit.this.derivatives(at, gradient, gaussNewton);
                    }
                },
                p);
    }

    private double[] lineStart() {
        double sumX = 0;
        double sumY = 0;
        double xx = 0;
        double xy = 0;
        double yy = 0;
        for (int i = 0; i < x.length; i++) {
            double w = weights[i] / weightSum;
            double u = (x[i] - x[reference]) / scale;
            double v = (y[i] - y[reference]) / scale;
            sumX += w * u;
            sumY += w * v;
            xx += w * u * u;
            xy += w * u * v;
            yy += w * v * v;
        }
        double along = 0.5 * Math.atan2(2 * (xy - sumX * sumY), xx - sumX * sumX - (yy - sumY * sumY));
        double direction = along + Math.PI / 2;
        return new double[] {direction, sumX * Math.cos(direction) + sumY * Math.sin(direction), 0};
    }

    private Optional<double[]> circleStart() {
        double[] points = new double[2 * x.length];
        for (int i = 0; i < x.length; i++) {
            points[2 * i] = (x[i] - x[reference]) / scale;
            points[2 * i + 1] = (y[i] - y[reference]) / scale;
        }
        return AlgebraicFit.taubin(points, weights, 2)
                .filter(s -> s.radius() < FLAT_START)
                .map(s -> {
                    double distance = Math.hypot(s.centre(0), s.centre(1));
                    double direction = distance > 0 ? Math.atan2(s.centre(1), s.centre(0)) : Math.PI / 2;
                    return new double[] {direction, distance - s.radius(), 1 / s.radius()};
                });
    }

    private ArcGeometry unitGeometry(double[] p) {
        return new ArcGeometry(0, 0, p[0], p[1], p[2]);
    }

    private double cost(double[] p) {
        ArcGeometry g = unitGeometry(p);
        double cost = 0;
        for (int i = 0; i < x.length; i++) {
            cost += weights[i] * square(g.distance((x[i] - x[reference]) / scale, (y[i] - y[reference]) / scale));
        }
        return cost / (2 * weightSum);
    }

    private void derivatives(double[] p, double[] gradient, double[] gaussNewton) {
        ArcGeometry g = unitGeometry(p);
        double k = p[2];
        double[] jacobian = new double[PARAMETERS];
        for (int i = 0; i < x.length; i++) {
            double u = (x[i] - x[reference]) / scale;
            double v = (y[i] - y[reference]) / scale;
            double a = g.above(u, v);
            double b = g.along(u, v);
            double s = Math.max(g.ratio(b, a), Double.MIN_NORMAL);
            double twice = 2 * a - k * (a * a + b * b);
            double e = twice / (1 + s);
            jacobian[0] = -b * (1 + k * p[1]) / s;
            jacobian[1] = -(1 - k * a) / s;
            jacobian[2] = (a * e - a * a - b * b) / (s * (1 + s));
            double w = weights[i] / weightSum;
            for (int row = 0; row < PARAMETERS; row++) {
                gradient[row] += w * e * jacobian[row];
                for (int column = 0; column < PARAMETERS; column++) {
                    gaussNewton[PARAMETERS * row + column] += w * jacobian[row] * jacobian[column];
                }
            }
        }
    }

    private FittedArc result(double[] p, double cost, Outcome outcome) {
        double[] gaussNewton = new double[PARAMETERS * PARAMETERS];
        derivatives(p, new double[PARAMETERS], gaussNewton);
        double[] covariance = new double[PARAMETERS * PARAMETERS];
        Arrays.fill(covariance, Double.NaN);
        Optional<Cholesky> factor = Cholesky.of(gaussNewton, PARAMETERS);
        if (loaded > PARAMETERS && factor.isPresent()) {
            double[] inverse = factor.get().inverse();
            double variance = 2 * cost / (loaded - PARAMETERS);
            double[] unit = {1, scale, 1 / scale};
            for (int i = 0; i < covariance.length; i++) {
                covariance[i] = variance * inverse[i] * unit[i / PARAMETERS] * unit[i % PARAMETERS];
            }
        }
        double curvature = Math.abs(p[2]) < STRAIGHT ? 0 : p[2] / scale;
        ArcGeometry raw = new ArcGeometry(x[reference], y[reference], p[0], scale * p[1], curvature);
        ArcGeometry g = raw.upward();
        if (!g.equals(raw)) {
            for (int i = 1; i < PARAMETERS; i++) {
                covariance[i] = -covariance[i];
                covariance[PARAMETERS * i] = -covariance[PARAMETERS * i];
            }
        }
        double first = Double.POSITIVE_INFINITY;
        double last = Double.NEGATIVE_INFINITY;
        for (int i = 0; i < x.length; i++) {
            if (weights[i] > 0) {
                double length = g.length(x[i], y[i]);
                first = Math.min(first, length);
                last = Math.max(last, length);
            }
        }
        return new FittedArc(g, first, last, scale * Math.sqrt(2 * cost), loaded, covariance, outcome);
    }
}
