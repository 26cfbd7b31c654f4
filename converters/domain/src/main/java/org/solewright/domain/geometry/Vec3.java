package org.solewright.domain.geometry;

/**
 * Three components: a position in metres, a direction, a force or a moment; the frame is in the variable's name.
 *
 * @param x first component
 * @param y second component
 * @param z third component
 */
public record Vec3(double x, double y, double z) {

    /** All components zero. */
    public static final Vec3 ZERO = new Vec3(0, 0, 0);
    /** First axis. */
    public static final Vec3 X = new Vec3(1, 0, 0);
    /** Second axis. */
    public static final Vec3 Y = new Vec3(0, 1, 0);
    /** Third axis. */
    public static final Vec3 Z = new Vec3(0, 0, 1);

    /**
     * Sum.
     *
     * @param o other vector
     * @return this + o
     */
    public Vec3 plus(Vec3 o) {
        return new Vec3(x + o.x, y + o.y, z + o.z);
    }

    /**
     * Difference.
     *
     * @param o other vector
     * @return this - o
     */
    public Vec3 minus(Vec3 o) {
        return new Vec3(x - o.x, y - o.y, z - o.z);
    }

    /**
     * Multiple.
     *
     * @param k factor
     * @return k this
     */
    public Vec3 times(double k) {
        return new Vec3(k * x, k * y, k * z);
    }

    /**
     * Scalar product.
     *
     * @param o other vector
     * @return this . o
     */
    public double dot(Vec3 o) {
        return x * o.x + y * o.y + z * o.z;
    }

    /**
     * Vector product.
     *
     * @param o other vector
     * @return this x o
     */
    public Vec3 cross(Vec3 o) {
        return new Vec3(y * o.z - z * o.y, z * o.x - x * o.z, x * o.y - y * o.x);
    }

    /**
     * Length.
     *
     * @return Euclidean norm, not negative
     */
    public double norm() {
        return Math.sqrt(dot(this));
    }

    /**
     * Distance of two positions.
     *
     * @param o other position
     * @return |this - o|
     */
    public double distance(Vec3 o) {
        return minus(o).norm();
    }

    /**
     * The same direction with length one.
     *
     * @return unit vector
     * @throws IllegalArgumentException where the length is zero or not finite
     */
    public Vec3 unit() {
        double n = norm();
        if (!(n > 0) || Double.isInfinite(n)) {
            throw new IllegalArgumentException("vector of length " + n + " has no direction");
        }
        return times(1 / n);
    }

    /**
     * Whether all components are finite; a lost sample is NaN.
     *
     * @return true where finite
     */
    public boolean isFinite() {
        return Double.isFinite(x) && Double.isFinite(y) && Double.isFinite(z);
    }
}
