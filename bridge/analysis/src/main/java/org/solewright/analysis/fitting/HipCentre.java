package org.solewright.analysis.fitting;

import java.util.Optional;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Pose;
import org.solewright.domain.geometry.Rotation;
import org.solewright.domain.geometry.Vec3;

/** Hip joint centre from landmarks of the pelvis. */
public final class HipCentre {

    private HipCentre() {}

    /**
     * [Harrington et al. 2007], in the pelvis frame: origin midway between the anterior superior iliac spines, x forward,
     * y up, z to the right. The published offsets are in millimetres.
     *
     * @param width between the anterior spines, m
     * @param depth from the middle of the anterior to the middle of the posterior spines (or the sacrum), m
     * @param leg from the anterior spine to the medial malleolus, m
     * @param side whose hip
     * @return position in the pelvis frame, m
     */
    static Vec3 harrington(double width, double depth, double leg, Side side) {
        double x = -0.24 * depth - 0.0099;
        double y = -0.16 * width - 0.04 * leg - 0.0071;
        double z = 0.28 * depth + 0.16 * width + 0.0079;
        return new Vec3(x, y, side == Side.RIGHT ? z : -z);
    }

    /**
     * The hip centre from the pelvis as it stood.
     *
     * @param posture landmarks in L
     * @param side whose hip
     * @return position in L, m; empty where a landmark of the pelvis or the medial malleolus is missing
     */
    public static Optional<Vec3> fromPelvis(StandingPosture posture, Side side) {
        Optional<Vec3> right = posture.position(Landmark.ASIS, Side.RIGHT);
        Optional<Vec3> left = posture.position(Landmark.ASIS, Side.LEFT);
        Optional<Vec3> rear = rear(posture);
        Optional<Vec3> malleolus = posture.position(Landmark.MALLEOLUS_MEDIAL, side);
        if (right.isEmpty() || left.isEmpty() || rear.isEmpty() || malleolus.isEmpty()) {
            return Optional.empty();
        }
        Vec3 across = right.get().minus(left.get());
        Vec3 middle = right.get().plus(left.get()).times(0.5);
        Vec3 forward = middle.minus(rear.get());
        if (!(across.cross(forward).norm() > 0)) {
            return Optional.empty();
        }
        Vec3 z = across.unit();
        Vec3 y = z.cross(forward).unit();
        Pose x_LP = new Pose(new Rotation(y.cross(z), y, z), middle);
        Vec3 asis = side == Side.RIGHT ? right.get() : left.get();
        Vec3 hip = harrington(across.norm(), forward.norm(), asis.distance(malleolus.get()), side);
        return Optional.of(x_LP.transformPosition(hip));
    }

    private static Optional<Vec3> rear(StandingPosture posture) {
        Optional<Vec3> right = posture.position(Landmark.PSIS, Side.RIGHT);
        Optional<Vec3> left = posture.position(Landmark.PSIS, Side.LEFT);
        if (right.isPresent() && left.isPresent()) {
            return Optional.of(right.get().plus(left.get()).times(0.5));
        }
        return posture.position(Landmark.SACRUM, Side.RIGHT).or(() -> posture.position(Landmark.SACRUM, Side.LEFT));
    }
}
