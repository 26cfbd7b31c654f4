package org.solewright.analysis.fitting;

import org.solewright.domain.foot.InertiaTensor;
import org.solewright.domain.geometry.Vec3;

/**
 * Mass moments of a body.
 *
 * @param mass kg, or m3 for a solid of density one
 * @param centre centre of mass, m
 * @param inertia tensor about the centre of mass, kg m2 (or m5)
 */
record BodyMoments(double mass, Vec3 centre, InertiaTensor inertia) {

    /**
     * The same shape with another mass.
     *
     * @param factor more than 0
     * @return mass and tensor times the factor
     */
    BodyMoments scaled(double factor) {
        return new BodyMoments(
                mass * factor,
                centre,
                new InertiaTensor(
                        inertia.xx() * factor,
                        inertia.yy() * factor,
                        inertia.zz() * factor,
                        inertia.xy() * factor,
                        inertia.xz() * factor,
                        inertia.yz() * factor));
    }

    /**
     * Spread of mass about the centre: the mean of r r^T, m2, as {@code [3][3]}. With the tensor I it is (tr I / 2) - I
     * over the mass.
     */
    double[][] spread() {
        double half = (inertia.xx() + inertia.yy() + inertia.zz()) / 2;
        return new double[][] {
            {(half - inertia.xx()) / mass, -inertia.xy() / mass, -inertia.xz() / mass},
            {-inertia.xy() / mass, (half - inertia.yy()) / mass, -inertia.yz() / mass},
            {-inertia.xz() / mass, -inertia.yz() / mass, (half - inertia.zz()) / mass}
        };
    }
}
