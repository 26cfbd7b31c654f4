package org.solewright.domain.geometry;

/**
 * A rotation R_AB: turns components in B into components in A. Stored as its three columns, the axes of B expressed in
 * A.
 *
 * @param x first axis of B in A, unit length
 * @param y second axis of B in A, unit length
 * @param z third axis of B in A, unit length
 */
public record Rotation(Vec3 x, Vec3 y, Vec3 z) {

    private static final double TOLERANCE = 1e-6;

    /** No rotation. */
    public static final Rotation IDENTITY = new Rotation(Vec3.X, Vec3.Y, Vec3.Z);

    /** Checks that the axes are orthonormal and right-handed within 1e-6. */
    public Rotation {
        double defect = Math.max(
                Math.max(Math.abs(x.norm() - 1), Math.abs(y.norm() - 1)),
                x.cross(y).distance(z));
        if (!(defect < TOLERANCE)) {
            throw new IllegalArgumentException("axes depart from a right-handed orthonormal frame by " + defect);
        }
    }

    /**
     * The frame whose x is along {@code x} and whose z is the part of {@code z} normal to it.
     *
     * @param x direction of the first axis, any length
     * @param z approximate direction of the third axis, not parallel to x
     * @return the rotation
     */
    public static Rotation ofXandZ(Vec3 x, Vec3 z) {
        Vec3 ex = x.unit();
        Vec3 ey = z.cross(ex).unit();
        return new Rotation(ex, ey, ex.cross(ey));
    }

    /**
     * The frame whose y is along {@code y} and whose x is the part of {@code x} normal to it.
     *
     * @param y direction of the second axis, any length
     * @param x approximate direction of the first axis, not parallel to y
     * @return the rotation
     */
    public static Rotation ofYandX(Vec3 y, Vec3 x) {
        Vec3 ey = y.unit();
        Vec3 ez = x.cross(ey).unit();
        return new Rotation(ey.cross(ez), ey, ez);
    }

    /**
     * Rotation about an axis.
     *
     * @param w along the axis, as long as the angle, rad
     * @return the rotation, by the formula of Rodrigues; the identity for a vector of length 0
     */
    public static Rotation ofVector(Vec3 w) {
        double angle = w.norm();
        if (angle == 0) {
            return IDENTITY;
        }
        Vec3 k = w.times(1 / angle);
        return new Rotation(turned(Vec3.X, k, angle), turned(Vec3.Y, k, angle), turned(Vec3.Z, k, angle));
    }

    private static Vec3 turned(Vec3 v, Vec3 axis, double angle) {
        return v.times(Math.cos(angle))
                .plus(axis.cross(v).times(Math.sin(angle)))
                .plus(axis.times(axis.dot(v) * (1 - Math.cos(angle))));
    }

    /**
     * Axis and angle of this rotation.
     *
     * @return along the axis, as long as the angle, 0 to pi rad; accurate for angles well below pi
     */
    public Vec3 vector() {
        Vec3 twice = new Vec3(y.z() - z.y(), z.x() - x.z(), x.y() - y.x());
        double sine = twice.norm() / 2;
        double angle = Math.atan2(sine, (x.x() + y.y() + z.z() - 1) / 2);
        return sine == 0 ? Vec3.ZERO : twice.times(angle / (2 * sine));
    }

    /**
     * Turns components in B into components in A.
     *
     * @param v vector in B
     * @return the same vector in A
     */
    public Vec3 transformVector(Vec3 v) {
        return new Vec3(
                x.x() * v.x() + y.x() * v.y() + z.x() * v.z(),
                x.y() * v.x() + y.y() * v.y() + z.y() * v.z(),
                x.z() * v.x() + y.z() * v.y() + z.z() * v.z());
    }

    /**
     * Turns components in A into components in B.
     *
     * @param v vector in A
     * @return the same vector in B
     */
    public Vec3 inverseVector(Vec3 v) {
        return new Vec3(x.dot(v), y.dot(v), z.dot(v));
    }

    /**
     * R_BA.
     *
     * @return the inverse rotation
     */
    public Rotation inverse() {
        return new Rotation(
                new Vec3(x.x(), y.x(), z.x()), new Vec3(x.y(), y.y(), z.y()), new Vec3(x.z(), y.z(), z.z()));
    }

    /**
     * R_AB R_BC = R_AC.
     *
     * @param o R_BC
     * @return R_AC
     */
    public Rotation times(Rotation o) {
        return new Rotation(transformVector(o.x), transformVector(o.y), transformVector(o.z));
    }
}
