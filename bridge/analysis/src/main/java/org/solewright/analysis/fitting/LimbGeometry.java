package org.solewright.analysis.fitting;

import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.foot.Located;
import org.solewright.domain.foot.SidedLandmark;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Pose;
import org.solewright.domain.geometry.Rotation;
import org.solewright.domain.geometry.Vec3;

/**
 * One limb's landmarks and joint centres in the ankle frame A of the standing trial: origin midway between the malleoli,
 * x the horizontal direction from the heel to the middle of the metatarsal heads, y up, z to the subject's right.
 */
final class LimbGeometry {

    /** Placement of a landmark of the foot or a malleolus, SD per session, m (design 03 section 7). */
    static final double FOOT_PLACEMENT_SD = 0.005;

    /** Placement of a landmark of knee, pelvis or hip, SD per session, m (design 03 section 7). */
    static final double LEG_PLACEMENT_SD = 0.010;

    /** Landmarks without which no foot can be made. */
    static final List<Landmark> REQUIRED = List.of(
            Landmark.MALLEOLUS_MEDIAL,
            Landmark.MALLEOLUS_LATERAL,
            Landmark.CALCANEUS_POSTERIOR,
            Landmark.METATARSAL_1_HEAD,
            Landmark.METATARSAL_5_HEAD);

    /** Heel to first metatarsal head over foot length (design 03 section 5, regression). */
    static final double HEAD_SHARE = 0.73;

    /** Heel to midtarsal joint over heel to metatarsal heads (design 03 section 5, regression). */
    private static final double MIDTARSAL_SHARE = 0.38;

    /** Heel to middle of the metatarsal bases over heel to heads (proportions of the skeleton, from memory). */
    private static final double TARSOMETATARSAL_SHARE = 0.64;

    private final Side side;
    private final Pose x_LA;
    private final Map<Landmark, Vec3> points;

    private LimbGeometry(Side side, Pose x_LA, Map<Landmark, Vec3> points) {
        this.side = side;
        this.x_LA = x_LA;
        this.points = points;
    }

    /**
     * The limb of a side.
     *
     * @param posture landmarks in L; the required ones of that side must be there
     * @param side whose
     * @return the limb; empty where the heel lies straight below or above the metatarsal heads
     */
    static Optional<LimbGeometry> of(StandingPosture posture, Side side) {
        Vec3 heel = posture.position(Landmark.CALCANEUS_POSTERIOR, side).orElseThrow();
        Vec3 heads = posture.middle(Landmark.METATARSAL_1_HEAD, Landmark.METATARSAL_5_HEAD, side)
                .orElseThrow();
        Vec3 ankle = posture.middle(Landmark.MALLEOLUS_MEDIAL, Landmark.MALLEOLUS_LATERAL, side)
                .orElseThrow();
        Vec3 along = heads.minus(heel);
        Vec3 level = along.minus(posture.up().times(along.dot(posture.up())));
        if (!(level.norm() > 0)) {
            return Optional.empty();
        }
        Pose x_LA = new Pose(Rotation.ofYandX(posture.up(), level), ankle);
        Map<Landmark, Vec3> points = new EnumMap<>(Landmark.class);
        for (Landmark landmark : Landmark.values()) {
            posture.position(landmark, side).ifPresent(p -> points.put(landmark, x_LA.inversePosition(p)));
        }
        return Optional.of(new LimbGeometry(side, x_LA, points));
    }

    static List<SidedLandmark> missing(StandingPosture posture, Side side) {
        return REQUIRED.stream()
                .filter(l -> posture.position(l, side).isEmpty())
                .map(l -> new SidedLandmark(l, side))
                .toList();
    }

    Side side() {
        return side;
    }

    /** X_LA. */
    Pose ankleFrame() {
        return x_LA;
    }

    /** All landmarks in A. */
    Map<Landmark, Vec3> points() {
        return points;
    }

    Optional<Vec3> point(Landmark landmark) {
        return Optional.ofNullable(points.get(landmark));
    }

    /** A landmark that {@link #REQUIRED} promises. */
    Vec3 required(Landmark landmark) {
        return point(landmark).orElseThrow();
    }

    Vec3 heads() {
        return required(Landmark.METATARSAL_1_HEAD)
                .plus(required(Landmark.METATARSAL_5_HEAD))
                .times(0.5);
    }

    /** Unit vector across the foot from one landmark to another, turned to point to the subject's right. */
    static Vec3 acrossToTheRight(Vec3 a, Vec3 b) {
        Vec3 line = b.minus(a).unit();
        return line.z() < 0 ? line.times(-1) : line;
    }

    /** Horizontal distance. */
    static double level(Vec3 a, Vec3 b) {
        return Math.hypot(b.x() - a.x(), b.z() - a.z());
    }

    /** Horizontal distance from the heel to the first metatarsal head, m. */
    double heelToFirstHead() {
        return level(required(Landmark.CALCANEUS_POSTERIOR), required(Landmark.METATARSAL_1_HEAD));
    }

    /** The landmark at the front of the foot. */
    Optional<Vec3> toeLandmark() {
        return point(Landmark.TOE_TIP).or(() -> point(Landmark.HALLUX_TIP));
    }

    /**
     * The front of the foot.
     *
     * @param human whether the regression on people may be used as one
     * @param floorHeight of the floor in A, m, for the height of a tip without landmark
     * @param markerRadius m
     * @return position in A
     */
    Located toeTip(Basis human, double floorHeight, double markerRadius) {
        Optional<Vec3> landmark = toeLandmark();
        if (landmark.isPresent()) {
            return new Located(landmark.get(), Basis.MEASURED, OptionalDouble.of(FOOT_PLACEMENT_SD));
        }
        Vec3 heel = required(Landmark.CALCANEUS_POSTERIOR);
        double length = heelToFirstHead() / HEAD_SHARE;
        return Located.of(new Vec3(heel.x() + length, floorHeight + markerRadius, heel.z()), human);
    }

    /** Midtarsal joint centre in A: between navicular tuberosity and cuboid, else by regression. */
    Located midtarsal(Basis human) {
        Optional<Vec3> navicular = point(Landmark.NAVICULAR_TUBEROSITY);
        Optional<Vec3> cuboid = point(Landmark.CUBOID);
        if (navicular.isPresent() && cuboid.isPresent()) {
            return new Located(
                    navicular.get().plus(cuboid.get()).times(0.5),
                    Basis.MEASURED,
                    OptionalDouble.of(FOOT_PLACEMENT_SD / Math.sqrt(2)));
        }
        Vec3 heel = required(Landmark.CALCANEUS_POSTERIOR);
        return Located.of(heel.plus(heads().minus(heel).times(MIDTARSAL_SHARE)), human);
    }

    /**
     * Middle of the metatarsal bases, the tarsometatarsal joint's centre in A; without both of them a share of the way
     * from heel to heads.
     */
    Located tarsometatarsal() {
        Optional<Vec3> first = point(Landmark.METATARSAL_1_BASE);
        Optional<Vec3> fifth = point(Landmark.METATARSAL_5_BASE);
        if (first.isPresent() && fifth.isPresent()) {
            return new Located(
                    first.get().plus(fifth.get()).times(0.5),
                    Basis.MEASURED,
                    OptionalDouble.of(FOOT_PLACEMENT_SD / Math.sqrt(2)));
        }
        Vec3 heel = required(Landmark.CALCANEUS_POSTERIOR);
        return Located.of(heel.plus(heads().minus(heel).times(TARSOMETATARSAL_SHARE)), Basis.ASSUMED);
    }

    boolean hasMetatarsalBases() {
        return point(Landmark.METATARSAL_1_BASE).isPresent()
                && point(Landmark.METATARSAL_5_BASE).isPresent();
    }

    boolean hasMidtarsalLandmarks() {
        return point(Landmark.NAVICULAR_TUBEROSITY).isPresent()
                && point(Landmark.CUBOID).isPresent();
    }
}
