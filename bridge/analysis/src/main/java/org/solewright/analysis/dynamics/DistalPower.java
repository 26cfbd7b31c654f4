package org.solewright.analysis.dynamics;

import org.solewright.domain.geometry.Vec3;

/**
 * Power of everything distal to a rigid segment, joints and soft parts alike [Takahashi and Stanhope 2013]: the ground's
 * force on the segment as if it were rigid to the ground. 0 for a segment that rolls without slip or stands.
 */
public final class DistalPower {

    private DistalPower() {}

    /**
     * The power, F . (v + w x (cop - com)) + M . w.
     *
     * @param force on the subject, N
     * @param freeMoment about the centre of pressure, N m
     * @param velocity of the segment's centre of mass, m/s
     * @param angularVelocity of the segment, rad/s
     * @param centreOfMass of the segment, m
     * @param centreOfPressure m
     * @return W; all vectors in one frame
     */
    public static double of(
            Vec3 force,
            Vec3 freeMoment,
            Vec3 velocity,
            Vec3 angularVelocity,
            Vec3 centreOfMass,
            Vec3 centreOfPressure) {
        Vec3 atGround = velocity.plus(angularVelocity.cross(centreOfPressure.minus(centreOfMass)));
        return force.dot(atGround) + freeMoment.dot(angularVelocity);
    }
}
