package org.solewright.domain.geometry;

/**
 * Pose X_AB of frame B in frame A.
 *
 * @param rotation R_AB
 * @param position origin of B in A, m
 */
public record Pose(Rotation rotation, Vec3 position) {

    /**
     * A position given in B, in A.
     *
     * @param p position in B, m
     * @return position in A, m
     */
    public Vec3 transformPosition(Vec3 p) {
        return rotation.transformVector(p).plus(position);
    }

    /**
     * A position given in A, in B.
     *
     * @param p position in A, m
     * @return position in B, m
     */
    public Vec3 inversePosition(Vec3 p) {
        return rotation.inverseVector(p.minus(position));
    }

    /**
     * A direction given in B, in A.
     *
     * @param v vector in B
     * @return vector in A
     */
    public Vec3 transformVector(Vec3 v) {
        return rotation.transformVector(v);
    }

    /**
     * X_AB X_BC = X_AC.
     *
     * @param o X_BC
     * @return X_AC
     */
    public Pose times(Pose o) {
        return new Pose(rotation.times(o.rotation), transformPosition(o.position));
    }
}
