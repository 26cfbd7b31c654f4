package org.solewright.analysis.fitting;

import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.finding.Quantity;
import org.solewright.domain.foot.InertiaTensor;
import org.solewright.domain.foot.Joint;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.foot.LandmarkPosition;
import org.solewright.domain.foot.Located;
import org.solewright.domain.foot.Segment;
import org.solewright.domain.foot.SegmentName;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Rotation;
import org.solewright.domain.geometry.Vec3;

/** Segments and joints of one limb, all worked out in its ankle frame A and given in the segments' frames. */
final class LimbBuilder {

    /**
     * Subtalar axis of a right foot: 42 deg up from the ground, 23 deg inwards from the foot's midline [Isman Inman 1969].
     */
    private static final Vec3 SUBTALAR_RIGHT = new Vec3(0.6841, 0.6691, -0.2904).unit();

    /** Spread of the subtalar axis's inclination between people, rad [Isman Inman 1969]. */
    private static final double SUBTALAR_SD = Math.toRadians(9);

    private final StandingSettings settings;
    private final LimbGeometry limb;
    private final SegmentPlan plan;
    private final double floorHeight;
    private final Located knee;
    private final Located toeTip;
    private final Located midtarsal;
    private final Map<SegmentName, Vec3> origins = new EnumMap<>(SegmentName.class);
    private Optional<FootSplit> split = Optional.empty();

    LimbBuilder(
            StandingSettings settings, LimbGeometry limb, SegmentPlan plan, double floorHeight, JointCentres centres) {
        this.settings = settings;
        this.limb = limb;
        this.plan = plan;
        this.floorHeight = floorHeight;
        knee = centres.knee();
        toeTip = limb.toeTip(
                settings.adultRegression(), floorHeight, settings.markerRadius().value());
        midtarsal = limb.midtarsal(settings.adultRegression());
        origins.put(SegmentName.SHANK, knee.position());
        for (SegmentName name : plan.foot()) {
            origins.put(
                    name,
                    switch (name) {
                        case TOES -> limb.heads();
                        case FOREFOOT -> midtarsal.position();
                        default -> Vec3.ZERO;
                    });
        }
    }

    /** Origins of the segments in A. */
    Map<SegmentName, Vec3> origins() {
        return origins;
    }

    Located toeTip() {
        return toeTip;
    }

    /** The split behind the last {@link #segments()}; empty for a rigid foot. */
    Optional<FootSplit> split() {
        return split;
    }

    /**
     * Shank and foot segments.
     *
     * @return proximal to distal; empty where the joint planes do not cut the foot
     */
    Optional<List<Segment>> segments() {
        List<Segment> segments = new ArrayList<>();
        segments.add(segment(
                SegmentName.SHANK, Optional.empty(), shank(), knee.position().norm()));
        BodyMoments whole = foot();
        List<BodyMoments> parts = List.of(whole);
        if (plan.foot().size() > 1) {
            split = FootSplit.of(
                    whole, limb, floorHeight, settings.markerRadius().value(), toeTip.position(), planes());
            if (split.isEmpty()) {
                return Optional.empty();
            }
            parts = split.get().parts();
        }
        SegmentName parent = SegmentName.SHANK;
        for (int i = 0; i < parts.size(); i++) {
            SegmentName name = plan.foot().get(i);
            boolean last = i == parts.size() - 1;
            Vec3 end = last ? toeTip.position() : origin(plan.foot().get(i + 1));
            segments.add(segment(name, Optional.of(parent), parts.get(i), end.distance(origin(name))));
            parent = name;
        }
        return Optional.of(List.copyOf(segments));
    }

    private Vec3 origin(SegmentName name) {
        return Optional.ofNullable(origins.get(name)).orElseThrow();
    }

    /**
     * One segment. How a foot's mass falls to its slices is an assumption, though their sum is not; of a table with one
     * radius of gyration (Dempster) so is the tensor.
     */
    private Segment segment(SegmentName name, Optional<SegmentName> parent, BodyMoments moments, double length) {
        boolean sliced = split.isPresent() && name != SegmentName.SHANK;
        Basis basis = sliced ? Basis.ASSUMED : tableBasis();
        Basis tensorBasis = settings.inertia() == InertiaTable.DEMPSTER ? Basis.ASSUMED : basis;
        double share = moments.mass() / settings.mass().value();
        OptionalDouble bodySd = settings.mass().sd();
        OptionalDouble sd =
                bodySd.isPresent() ? OptionalDouble.of(share * bodySd.getAsDouble()) : OptionalDouble.empty();
        Basis lengthBasis = name == SegmentName.SHANK
                ? knee.basis()
                : name == plan.toes()
                        ? toeTip.basis()
                        : name == SegmentName.HINDFOOT ? midtarsal.basis() : Basis.MEASURED;
        return new Segment(
                name,
                parent,
                new Quantity(moments.mass(), basis, sd),
                Located.of(moments.centre().minus(origin(name)), basis),
                moments.inertia(),
                tensorBasis,
                Quantity.of(length, lengthBasis),
                false);
    }

    /** A table by sex for a subject of unknown sex, or for one who is not an adult, is an assumption. */
    private Basis tableBasis() {
        boolean sexNeeded = settings.inertia() == InertiaTable.DE_LEVA;
        return sexNeeded && settings.sex().isEmpty() ? Basis.ASSUMED : settings.adultRegression();
    }

    private BodyMoments shank() {
        SegmentInertia table = SegmentInertia.shank(settings.inertia(), settings.sex());
        return along(table, knee.position(), Vec3.ZERO);
    }

    private BodyMoments foot() {
        SegmentInertia table = SegmentInertia.foot(settings.inertia(), settings.sex());
        return switch (settings.inertia()) {
            case DE_LEVA -> along(table, limb.required(Landmark.CALCANEUS_POSTERIOR), toeTip.position());
            case DEMPSTER ->
                along(
                        table,
                        limb.required(Landmark.MALLEOLUS_LATERAL),
                        limb.point(Landmark.METATARSAL_2_HEAD).orElseGet(limb::heads));
        };
    }

    /** A segment's moments in A from its two ends. */
    private BodyMoments along(SegmentInertia table, Vec3 from, Vec3 to) {
        Vec3 line = to.minus(from);
        double mass = table.mass() * settings.mass().value();
        InertiaTensor own = table.tensor(mass, line.norm());
        return new BodyMoments(
                mass, from.plus(line.times(table.centre())), own.rotated(Rotation.ofXandZ(line, Vec3.Z)));
    }

    private List<FootSplit.Plane> planes() {
        List<FootSplit.Plane> planes = new ArrayList<>();
        if (plan.foot().contains(SegmentName.FOREFOOT)) {
            planes.add(new FootSplit.Plane(midtarsal.position(), forward(midtarsalAxis())));
        }
        planes.add(new FootSplit.Plane(limb.heads(), forward(headAxis())));
        return planes;
    }

    /** Horizontal normal of a vertical plane through a line across the foot, pointing to the toes. */
    private static Vec3 forward(Joint.Axis across) {
        return Vec3.Y.cross(across.direction()).unit();
    }

    private Joint.Axis headAxis() {
        Vec3 first = limb.required(Landmark.METATARSAL_1_HEAD);
        Vec3 fifth = limb.required(Landmark.METATARSAL_5_HEAD);
        return axis("metatarsophalangeal", first, fifth, Basis.MEASURED);
    }

    private Joint.Axis midtarsalAxis() {
        if (limb.hasMidtarsalLandmarks()) {
            return axis(
                    "midtarsal",
                    limb.required(Landmark.NAVICULAR_TUBEROSITY),
                    limb.required(Landmark.CUBOID),
                    Basis.MEASURED);
        }
        return new Joint.Axis("midtarsal", Vec3.Z, Basis.ASSUMED, OptionalDouble.empty());
    }

    private static Joint.Axis axis(String name, Vec3 a, Vec3 b, Basis basis) {
        double sd = Math.sqrt(2) * LimbGeometry.FOOT_PLACEMENT_SD / a.distance(b);
        return new Joint.Axis(name, LimbGeometry.acrossToTheRight(a, b), basis, OptionalDouble.of(sd));
    }

    /**
     * Joints between the segments.
     *
     * @return proximal to distal
     */
    List<Joint> joints() {
        double middleSd = LimbGeometry.FOOT_PLACEMENT_SD / Math.sqrt(2);
        List<Joint> joints = new ArrayList<>();
        joints.add(ankle(new Located(knee.position().times(-1), Basis.MEASURED, OptionalDouble.of(middleSd))));
        if (plan.foot().contains(SegmentName.FOREFOOT)) {
            joints.add(hinge(midtarsalAxis(), SegmentName.HINDFOOT, SegmentName.FOREFOOT, midtarsal));
        }
        if (plan.foot().size() > 1) {
            Vec3 centre = limb.heads().minus(origin(plan.heads()));
            joints.add(hinge(
                    headAxis(),
                    plan.heads(),
                    SegmentName.TOES,
                    new Located(centre, Basis.MEASURED, OptionalDouble.of(middleSd))));
        }
        return List.copyOf(joints);
    }

    private Joint ankle(Located centre) {
        Joint.Axis talocrural = axis(
                "talocrural",
                limb.required(Landmark.MALLEOLUS_MEDIAL),
                limb.required(Landmark.MALLEOLUS_LATERAL),
                Basis.MEASURED);
        if (!settings.isHuman()) {
            return new Joint(
                    "ankle",
                    SegmentName.SHANK,
                    plan.rear(),
                    Joint.Kind.HINGE,
                    centre,
                    List.of(talocrural),
                    Optional.empty(),
                    Optional.empty());
        }
        boolean right = limb.side() == Side.RIGHT;
        Vec3 direction = right ? SUBTALAR_RIGHT : new Vec3(SUBTALAR_RIGHT.x(), SUBTALAR_RIGHT.y(), -SUBTALAR_RIGHT.z());
        Joint.Axis subtalar =
                new Joint.Axis("subtalar", direction, settings.adultRegression(), OptionalDouble.of(SUBTALAR_SD));
        return new Joint(
                "ankle",
                SegmentName.SHANK,
                plan.rear(),
                Joint.Kind.UNIVERSAL,
                centre,
                List.of(talocrural, subtalar),
                Optional.empty(),
                Optional.empty());
    }

    private static Joint hinge(Joint.Axis axis, SegmentName proximal, SegmentName distal, Located centre) {
        return new Joint(
                axis.name(),
                proximal,
                distal,
                Joint.Kind.HINGE,
                centre,
                List.of(axis),
                Optional.empty(),
                Optional.empty());
    }

    /**
     * Landmarks and cluster points of shank and foot.
     *
     * @param posture with the clusters
     * @return in their segments' frames, in the order of the landmarks
     */
    List<LandmarkPosition> landmarks(StandingPosture posture) {
        List<LandmarkPosition> out = new ArrayList<>();
        for (Landmark landmark : Landmark.values()) {
            if (SegmentPlan.carries(landmark)) {
                SegmentName carrier = plan.carrier(landmark);
                limb.point(landmark)
                        .ifPresent(
                                p -> out.add(new LandmarkPosition(landmark.word(), carrier, p.minus(origin(carrier)))));
                List<Vec3> cluster = posture.cluster(landmark, limb.side());
                for (int i = 0; i < cluster.size(); i++) {
                    Vec3 p = limb.ankleFrame().inversePosition(cluster.get(i));
                    out.add(new LandmarkPosition(landmark.word() + "." + (i + 1), carrier, p.minus(origin(carrier))));
                }
            }
        }
        return List.copyOf(out);
    }
}
