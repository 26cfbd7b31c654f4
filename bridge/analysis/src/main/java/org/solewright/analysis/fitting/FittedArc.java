package org.solewright.analysis.fitting;

import java.util.OptionalDouble;
import org.solewright.analysis.numerics.Outcome;

/**
 * A circular arc fitted to points, with the curvature as its parameter, so that a straight path is an ordinary result.
 *
 * <p>The curvature is positive where the centre lies on the side of growing y, as for a sole that rolls on the ground
 * with y up. Means over several arcs are taken of the curvature, never of the radius.
 */
public final class FittedArc {

    private final ArcGeometry geometry;
    private final double firstLength;
    private final double lastLength;
    private final double rms;
    private final int points;
    private final double[] covariance;
    private final Outcome outcome;

    FittedArc(
            ArcGeometry geometry,
            double firstLength,
            double lastLength,
            double rms,
            int points,
            double[] covariance,
            Outcome outcome) {
        this.geometry = geometry;
        this.firstLength = firstLength;
        this.lastLength = lastLength;
        this.rms = rms;
        this.points = points;
        this.covariance = covariance.clone();
        this.outcome = outcome;
    }

    /**
     * The curvature.
     *
     * @return 1/m, positive where the centre lies towards growing y, 0 where straight
     */
    public double curvature() {
        return geometry.curvature();
    }

    /**
     * Standard deviation of the curvature from the scatter about the arc.
     *
     * @return 1/m; empty where three points or fewer carry weight
     */
    public OptionalDouble curvatureSd() {
        double variance = covariance[8];
        return Double.isFinite(variance) ? OptionalDouble.of(Math.sqrt(variance)) : OptionalDouble.empty();
    }

    /**
     * The radius with the curvature's sign.
     *
     * @return 1/curvature, m; infinite where straight
     */
    public double radius() {
        return 1 / geometry.curvature();
    }

    /**
     * Standard deviation of the radius to first order, sd(curvature)/curvature^2. It says nothing where the curvature is
     * not clearly different from 0.
     *
     * @return m; empty where straight or unknown
     */
    public OptionalDouble radiusSd() {
        OptionalDouble sd = curvatureSd();
        double k = geometry.curvature();
        return sd.isPresent() && k != 0 ? OptionalDouble.of(sd.getAsDouble() / (k * k)) : OptionalDouble.empty();
    }

    /**
     * First coordinate of the centre.
     *
     * @return m; empty where straight
     */
    public OptionalDouble centreX() {
        return finite(geometry.centreX());
    }

    /**
     * Second coordinate of the centre.
     *
     * @return m; empty where straight
     */
    public OptionalDouble centreY() {
        return finite(geometry.centreY());
    }

    private static OptionalDouble finite(double value) {
        return Double.isFinite(value) ? OptionalDouble.of(value) : OptionalDouble.empty();
    }

    /**
     * Length of the arc between the outermost feet of the points that carry weight.
     *
     * @return m, not negative
     */
    public double arcLength() {
        return lastLength - firstLength;
    }

    /**
     * Weighted root mean square distance of the points from the arc.
     *
     * @return m
     */
    public double rms() {
        return rms;
    }

    /**
     * Number of points that carry weight.
     *
     * @return 3 or more
     */
    public int points() {
        return points;
    }

    /**
     * Covariance of the parameters direction (rad), offset (m) and curvature (1/m) at the reference point in the middle
     * of the arc.
     *
     * @param row 0 direction, 1 offset, 2 curvature
     * @param column likewise
     * @return product of the parameters' units; NaN where unknown
     */
    public double covariance(int row, int column) {
        return covariance[3 * row + column];
    }

    /**
     * How the iteration ended.
     *
     * @return converged or stalled
     */
    public Outcome outcome() {
        return outcome;
    }

    /**
     * Signed distance of a point from the arc's circle, positive towards the centre of a positive curvature.
     *
     * @param x first coordinate, m
     * @param y second coordinate, m
     * @return m
     */
    public double distance(double x, double y) {
        return geometry.distance(x, y);
    }

    /**
     * A place on the arc, first coordinate.
     *
     * @param share 0 at the end towards smaller x of a level arc, 1 at the other
     * @return m
     */
    public double x(double share) {
        return geometry.x(firstLength + share * (lastLength - firstLength));
    }

    /**
     * A place on the arc, second coordinate.
     *
     * @param share 0 at the end towards smaller x of a level arc, 1 at the other
     * @return m
     */
    public double y(double share) {
        return geometry.y(firstLength + share * (lastLength - firstLength));
    }
}
