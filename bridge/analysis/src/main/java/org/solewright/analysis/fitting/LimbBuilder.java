package org.solewright.analysis.fitting;

import java.util.ArrayList;
import java.util.Collections;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.finding.Quantity;
import org.solewright.domain.foot.ChainPlan;
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
    private final List<FootJoints.Between> joints;
    private final Map<SegmentName, Vec3> origins = new EnumMap<>(SegmentName.class);
    private Optional<FootSplit> split = Optional.empty();

    LimbBuilder(
            StandingSettings settings, LimbGeometry limb, SegmentPlan plan, double floorHeight, JointCentres centres) {
        this.settings = settings;
        this.limb = limb;
        this.plan = plan;
        this.floorHeight = floorHeight;
        knee = centres.knee();
        Located tip = limb.toeTip(
                settings.adultRegression(), floorHeight, settings.markerRadius().value());
        FootJoints foot = new FootJoints(settings, limb, tip);
        Optional<ChainPlan> own = settings.choices().plan();
        toeTip = own.flatMap(p -> foot.place(p.tip())).orElse(tip);
        joints = own.flatMap(foot::of).orElseGet(() -> foot.of(plan));
        origins.put(SegmentName.SHANK, knee.position());
        origins.put(plan.rear(), Vec3.ZERO);
        joints.forEach(j -> origins.put(j.distal(), j.centre().position()));
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
                SegmentName.SHANK, Optional.empty(), shank(), knee.position().norm(), tableBasis(), knee.basis()));
        List<Basis> bases = Collections.nCopies(plan.foot().size(), Basis.ASSUMED);
        List<BodyMoments> parts;
        Optional<ChainPlan> own = settings.choices().plan();
        if (own.isPresent()) {
            PlannedMasses masses =
                    PlannedMasses.of(own.get(), ends(), settings.mass().value());
            parts = masses.moments();
            bases = masses.bases();
        } else if (plan.foot().size() == 1) {
            parts = List.of(foot());
            bases = List.of(tableBasis());
        } else {
            split = FootSplit.of(
                    foot(), limb, floorHeight, settings.markerRadius().value(), toeTip.position(), planes());
            if (split.isEmpty()) {
                return Optional.empty();
            }
            parts = split.get().parts();
        }
        List<Vec3> ends = ends();
        SegmentName parent = SegmentName.SHANK;
        for (int i = 0; i < parts.size(); i++) {
            SegmentName name = plan.foot().get(i);
            double length = ends.get(i).distance(ends.get(i + 1));
            segments.add(segment(name, Optional.of(parent), parts.get(i), length, bases.get(i), lengthBasis(i)));
            parent = name;
        }
        return Optional.of(List.copyOf(segments));
    }

    /** Ankle, joints and tip in A. */
    private List<Vec3> ends() {
        List<Vec3> ends = new ArrayList<>();
        ends.add(Vec3.ZERO);
        joints.forEach(j -> ends.add(j.centre().position()));
        ends.add(toeTip.position());
        return ends;
    }

    /** The weaker of the bases of a segment's two ends. */
    private Basis lengthBasis(int segment) {
        Basis rear =
                segment == 0 ? Basis.MEASURED : joints.get(segment - 1).centre().basis();
        Basis front = segment == joints.size()
                ? toeTip.basis()
                : joints.get(segment).centre().basis();
        return rear.compareTo(front) > 0 ? rear : front;
    }

    private Vec3 origin(SegmentName name) {
        return Optional.ofNullable(origins.get(name)).orElseThrow();
    }

    /**
     * One segment. How a foot's mass falls to its slices is an assumption, though their sum is not; of a table with one
     * radius of gyration (Dempster) so is the tensor.
     */
    private Segment segment(
            SegmentName name,
            Optional<SegmentName> parent,
            BodyMoments moments,
            double length,
            Basis basis,
            Basis lengthBasis) {
        boolean isDistorted = settings.inertia() == InertiaTable.DEMPSTER
                || (settings.choices().plan().isPresent() && name != SegmentName.SHANK);
        double share = moments.mass() / settings.mass().value();
        OptionalDouble bodySd = settings.mass().sd();
        OptionalDouble sd =
                bodySd.isPresent() ? OptionalDouble.of(share * bodySd.getAsDouble()) : OptionalDouble.empty();
        Basis within = isDistorted ? Basis.ASSUMED : basis;
        return new Segment(
                name,
                parent,
                new Quantity(moments.mass(), basis, sd),
                Located.of(
                        moments.centre().minus(origin(name)),
                        settings.choices().plan().isPresent() ? within : basis),
                moments.inertia(),
                within,
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
        return joints.stream().map(FootJoints.Between::plane).toList();
    }

    /**
     * Joints between the segments.
     *
     * @return proximal to distal
     */
    List<Joint> joints() {
        double middleSd = LimbGeometry.FOOT_PLACEMENT_SD / Math.sqrt(2);
        List<Joint> all = new ArrayList<>();
        all.add(ankle(new Located(knee.position().times(-1), Basis.MEASURED, OptionalDouble.of(middleSd))));
        for (FootJoints.Between j : joints) {
            SegmentName proximal = plan.before(j.distal());
            Located centre = new Located(
                    j.centre().position().minus(origin(proximal)),
                    j.centre().basis(),
                    j.centre().sd());
            all.add(hinge(j.axis(), proximal, j.distal(), centre));
        }
        return List.copyOf(all);
    }

    private Joint ankle(Located centre) {
        Joint.Axis talocrural = FootJoints.through(
                "talocrural", limb.required(Landmark.MALLEOLUS_MEDIAL), limb.required(Landmark.MALLEOLUS_LATERAL));
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
            Optional<SegmentName> carrier = plan.carrier(landmark);
            if (carrier.isPresent()) {
                SegmentName segment = carrier.get();
                limb.point(landmark)
                        .ifPresent(
                                p -> out.add(new LandmarkPosition(landmark.word(), segment, p.minus(origin(segment)))));
                List<Vec3> cluster = posture.cluster(landmark, limb.side());
                for (int i = 0; i < cluster.size(); i++) {
                    Vec3 p = limb.ankleFrame().inversePosition(cluster.get(i));
                    out.add(new LandmarkPosition(landmark.word() + "." + (i + 1), segment, p.minus(origin(segment))));
                }
            }
        }
        return List.copyOf(out);
    }
}
