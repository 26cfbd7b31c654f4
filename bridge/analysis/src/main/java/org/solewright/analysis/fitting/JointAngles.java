package org.solewright.analysis.fitting;

import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Rotation;
import org.solewright.domain.geometry.Vec3;

/**
 * Angles of a joint of the foot after [Grood Suntay 1983], z-x-y, with the signs of [Wu 1995] made alike on both
 * sides. Zero where both segments are turned as in the standing trial.
 *
 * @param dorsiflexion about the proximal segment's z, rad, (-pi, pi]
 * @param inversion about the floating axis, rad, [-pi/2, pi/2]; the others lose their meaning near its ends
 * @param adduction about the distal segment's y, rad, (-pi, pi]
 */
public record JointAngles(double dorsiflexion, double inversion, double adduction) {

    /** Floating angle beyond which the other two angles are not to be believed, rad (design 03 section 1: 80 deg). */
    public static final double LARGEST_FLOATING = Math.toRadians(80);

    /**
     * The angles.
     *
     * @param axes R_LB, axes of the joint in the standing trial: x forward, y up, z to the subject's right
     * @param proximal turn of the proximal segment from standing to now, laboratory frame
     * @param distal turn of the distal segment likewise
     * @param side whose; inversion and adduction of a left foot are turned in sign
     * @return the angles
     */
    public static JointAngles of(Rotation axes, Rotation proximal, Rotation distal, Side side) {
        Rotation r = proximal.times(axes).inverse().times(distal.times(axes));
        double sign = side == Side.RIGHT ? 1 : -1;
        // R = Rz(a) Rx(b) Ry(c): second column (-sin a cos b, cos a cos b, sin b), third row (.., sin b, cos b cos c).
        double dorsiflexion = Math.atan2(-r.y().x(), r.y().y());
        double inversion = Math.asin(Math.max(-1, Math.min(1, r.y().z())));
        double adduction = Math.atan2(-r.x().z(), r.z().z());
        return new JointAngles(dorsiflexion, sign * inversion, sign * adduction);
    }

    /**
     * Axes across a joint line.
     *
     * @param across along the joint, to the subject's right, any length
     * @param upwards approximate direction of the proximal segment, any length, not parallel to {@code across}
     * @return R_LB: z along the line, x normal to both, forward [Wu 2002]
     */
    public static Rotation axes(Vec3 across, Vec3 upwards) {
        Vec3 z = across.unit();
        Vec3 x = upwards.cross(z).unit();
        return new Rotation(x, z.cross(x), z);
    }

    /**
     * Whether the floating angle leaves the others their meaning.
     *
     * @return false beyond 80 deg
     */
    public boolean isClear() {
        return Math.abs(inversion) <= LARGEST_FLOATING;
    }
}
