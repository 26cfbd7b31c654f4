package org.solewright.analysis.dynamics;

import org.solewright.domain.foot.InertiaTensor;
import org.solewright.domain.geometry.Vec3;

/**
 * A segment of a limb as its joint loads are computed.
 *
 * @param mass kg, 0 or more
 * @param inertia about the segment's centre of mass, in its own frame, kg m2
 * @param state how it moves
 * @param joint centre of the joint with the segment proximal to it, laboratory frame, m
 * @param external load on it from outside the limb, laboratory frame; {@link Wrench#NONE} without
 */
public record ChainLink(double mass, InertiaTensor inertia, SegmentState state, Vec3 joint, Wrench external) {

    /** Checks the mass. */
    public ChainLink {
        if (!(mass >= 0)) {
            throw new IllegalArgumentException("segment mass " + mass + " kg, expected 0 kg or more");
        }
    }

    /**
     * What all loads on the segment must come to, weight left out: m (a - g) through its centre of mass and the rate of
     * change of its angular momentum, I w' + w x I w by the equations of Newton and Euler.
     */
    Wrench inertialLoad(Vec3 gravity) {
        InertiaTensor inertia_L = inertia.rotated(state.pose().rotation());
        Vec3 rate = inertia_L.times(state.wRate()).plus(state.w().cross(inertia_L.times(state.w())));
        return new Wrench(state.acceleration().minus(gravity).times(mass), rate, state.centreOfMass());
    }
}
