package org.solewright.domain.foot;

import org.solewright.domain.geometry.Rotation;
import org.solewright.domain.geometry.Vec3;

/**
 * Inertia tensor of a body about a point, as tensor elements: the products carry their minus sign, xy = -int x y dm.
 *
 * @param xx about x, kg m2
 * @param yy about y, kg m2
 * @param zz about z, kg m2
 * @param xy product element, kg m2
 * @param xz product element, kg m2
 * @param yz product element, kg m2
 */
public record InertiaTensor(double xx, double yy, double zz, double xy, double xz, double yz) {

    /** Checks that all elements are finite and the moments not negative. */
    public InertiaTensor {
        if (!Double.isFinite(xx + yy + zz + xy + xz + yz) || xx < 0 || yy < 0 || zz < 0) {
            throw new IllegalArgumentException("inertia " + xx + ", " + yy + ", " + zz + "; " + xy + ", " + xz + ", "
                    + yz + " kg m2, expected finite elements and moments of 0 or more");
        }
    }

    /**
     * The tensor of a body whose principal axes are those of the frame.
     *
     * @param xx about x, kg m2
     * @param yy about y, kg m2
     * @param zz about z, kg m2
     * @return the tensor
     */
    public static InertiaTensor principal(double xx, double yy, double zz) {
        return new InertiaTensor(xx, yy, zz, 0, 0, 0);
    }

    /**
     * The tensor in another frame about the same point.
     *
     * @param r_AB rotation of this tensor's frame B in the wanted frame A
     * @return the tensor in A
     */
    public InertiaTensor rotated(Rotation r_AB) {
        Vec3 x = r_AB.inverse().x();
        Vec3 y = r_AB.inverse().y();
        Vec3 z = r_AB.inverse().z();
        return new InertiaTensor(
                x.dot(times(x)), y.dot(times(y)), z.dot(times(z)), x.dot(times(y)), x.dot(times(z)), y.dot(times(z)));
    }

    /**
     * The tensor about another point of a body whose tensor about its centre of mass is this (Steiner).
     *
     * @param mass kg
     * @param offset from that point to the centre of mass (or back), m
     * @return the tensor about that point
     */
    public InertiaTensor shifted(double mass, Vec3 offset) {
        double x = offset.x();
        double y = offset.y();
        double z = offset.z();
        return new InertiaTensor(
                xx + mass * (y * y + z * z),
                yy + mass * (x * x + z * z),
                zz + mass * (x * x + y * y),
                xy - mass * x * y,
                xz - mass * x * z,
                yz - mass * y * z);
    }

    /**
     * The tensor of two bodies about the same point.
     *
     * @param o the other body's, same point and frame
     * @return the sum
     */
    public InertiaTensor plus(InertiaTensor o) {
        return new InertiaTensor(xx + o.xx, yy + o.yy, zz + o.zz, xy + o.xy, xz + o.xz, yz + o.yz);
    }

    /**
     * Angular momentum for an angular velocity.
     *
     * @param w rad/s
     * @return kg m2/s
     */
    public Vec3 times(Vec3 w) {
        return new Vec3(
                xx * w.x() + xy * w.y() + xz * w.z(),
                xy * w.x() + yy * w.y() + yz * w.z(),
                xz * w.x() + yz * w.y() + zz * w.z());
    }
}
