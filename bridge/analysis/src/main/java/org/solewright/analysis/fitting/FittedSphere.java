package org.solewright.analysis.fitting;

/** Centre and radius of a circle (two dimensions) or sphere (three). */
public final class FittedSphere {

    private final double[] centre;
    private final double radius;

    FittedSphere(double[] centre, double radius) {
        this.centre = centre.clone();
        this.radius = radius;
    }

    /**
     * Number of dimensions.
     *
     * @return 2 or 3
     */
    public int dimensions() {
        return centre.length;
    }

    /**
     * A coordinate of the centre.
     *
     * @param axis zero-based
     * @return in the unit of the points
     */
    public double centre(int axis) {
        return centre[axis];
    }

    /**
     * The radius.
     *
     * @return in the unit of the points, not negative
     */
    public double radius() {
        return radius;
    }
}
