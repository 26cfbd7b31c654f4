package org.solewright.analysis.dynamics;

import org.solewright.domain.geometry.Pose;
import org.solewright.domain.geometry.Rotation;
import org.solewright.domain.geometry.Vec3;

/**
 * How a rigid segment moves at an instant, in the laboratory frame.
 *
 * @param pose X_LS of the segment
 * @param centreOfMass m
 * @param velocity of the centre of mass, m/s
 * @param acceleration of the centre of mass, m/s2
 * @param w angular velocity, rad/s
 * @param wRate angular acceleration, rad/s2
 */
public record SegmentState(Pose pose, Vec3 centreOfMass, Vec3 velocity, Vec3 acceleration, Vec3 w, Vec3 wRate) {

    private static final double SMALL_TURN = 1e-4;

    /**
     * From three neighbouring poses by central differences: of the position the second difference, of the turn the
     * rotation vectors before and after. A segment that turns evenly about a fixed axis has its angular velocity exactly;
     * the acceleration of a point that circles with w comes out smaller by 1 - (w h)^2 / 12.
     *
     * <p>Poses are to be those of filtered points: differences of unfiltered ones magnify their noise by 1/h^2.
     *
     * @param before X_LS one time step earlier
     * @param now X_LS
     * @param after X_LS one time step later
     * @param step time step h, s, above 0
     * @param centre_S centre of mass in the segment's frame, m
     * @return the state in the middle
     */
    public static SegmentState of(Pose before, Pose now, Pose after, double step, Vec3 centre_S) {
        Vec3 p = before.transformPosition(centre_S);
        Vec3 q = now.transformPosition(centre_S);
        Vec3 r = after.transformPosition(centre_S);
        Vec3 earlier = turn(before.rotation(), now.rotation()).times(1 / step);
        Vec3 later = turn(now.rotation(), after.rotation()).times(1 / step);
        return new SegmentState(
                now,
                q,
                r.minus(p).times(1 / (2 * step)),
                r.minus(q).minus(q.minus(p)).times(1 / (step * step)),
                earlier.plus(later).times(0.5),
                later.minus(earlier).times(1 / step));
    }

    /** Rotation vector that turns one orientation into another, in the frame in which both are given. */
    static Vec3 turn(Rotation from, Rotation to) {
        Rotation r = to.times(from.inverse());
        Vec3 axis = new Vec3(r.y().z() - r.z().y(), r.z().x() - r.x().z(), r.x().y() - r.y().x()).times(0.5);
        double sin = axis.norm();
        double cos = (r.x().x() + r.y().y() + r.z().z() - 1) / 2;
        double angle = Math.atan2(sin, cos);
        // angle / sin(angle) is 1 + angle^2 / 6 to within 1e-17 below the small turn.
        return axis.times(angle < SMALL_TURN ? 1 + angle * angle / 6 : angle / sin);
    }

    /**
     * Velocity of a point that moves with the segment.
     *
     * @param place where the point is now, laboratory frame, m
     * @return m/s
     */
    public Vec3 velocityAt(Vec3 place) {
        return velocity.plus(w.cross(place.minus(centreOfMass)));
    }
}
