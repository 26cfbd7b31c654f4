package org.solewright.analysis.fitting;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.foot.ChainPlan;
import org.solewright.domain.foot.Joint;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.foot.Located;
import org.solewright.domain.foot.SegmentName;
import org.solewright.domain.geometry.Vec3;

/** The joints between the segments of one foot, in its ankle frame A. The ankle is none of them. */
final class FootJoints {

    /**
     * One joint.
     *
     * @param name such as {@code midtarsal}
     * @param distal segment before it
     * @param centre in A
     * @param axis in A
     * @param cut a point of the plane that divides the two segments' masses, in A; the plane is vertical along the axis
     */
    record Between(String name, SegmentName distal, Located centre, Joint.Axis axis, Vec3 cut) {

        /** Horizontal normal of the plane, pointing to the toes. */
        FootSplit.Plane plane() {
            return new FootSplit.Plane(cut, Vec3.Y.cross(axis.direction()).unit());
        }
    }

    /** From the metatarsophalangeal joint to each interphalangeal one, share of the way to the tip (from memory). */
    private static final double[][] PHALANGES = {{0.57}, {0.52, 0.79}};

    /** Functional axis of the metatarsophalangeal joint before and above the heads, foot lengths [Front Bioeng Biotechnol 2014]. */
    private static final double FUNCTIONAL_FORWARD = 0.16;

    private static final double FUNCTIONAL_UP = 0.02;

    private final StandingSettings settings;
    private final LimbGeometry limb;
    private final Located toeTip;

    FootJoints(StandingSettings settings, LimbGeometry limb, Located toeTip) {
        this.settings = settings;
        this.limb = limb;
        this.toeTip = toeTip;
    }

    /** Joints of a plan by number, rear to front. */
    List<Between> of(SegmentPlan plan) {
        List<Between> joints = new ArrayList<>();
        long phalanges = plan.foot().stream()
                .filter(n -> n.isToe() && n != SegmentName.TOES)
                .count();
        for (SegmentName distal : plan.foot().subList(1, plan.foot().size())) {
            joints.add(
                    switch (distal) {
                        case MIDFOOT -> midtarsal(distal);
                        case FOREFOOT ->
                            plan.foot().contains(SegmentName.MIDFOOT) ? tarsometatarsal(distal) : midtarsal(distal);
                        case PHALANX_2 -> interphalangeal(distal, 1, (int) phalanges);
                        case PHALANX_3 -> interphalangeal(distal, 2, (int) phalanges);
                        default -> metatarsophalangeal(distal);
                    });
        }
        return List.copyOf(joints);
    }

    /**
     * Joints of a plan file, proximal to distal.
     *
     * @return empty where the standing trial lacks a landmark, see {@link #missing}
     */
    Optional<List<Between>> of(ChainPlan plan) {
        List<Between> joints = new ArrayList<>();
        for (ChainPlan.Part part : plan.parts()) {
            if (part.joint().isPresent()) {
                ChainPlan.Hinge hinge = part.joint().get();
                Optional<Located> centre = place(hinge.centre());
                Optional<Joint.Axis> axis = axis(hinge);
                if (centre.isEmpty() || axis.isEmpty()) {
                    return Optional.empty();
                }
                joints.add(new Between(
                        hinge.name(),
                        part.name(),
                        centre.get(),
                        axis.get(),
                        centre.get().position()));
            }
        }
        return Optional.of(List.copyOf(joints));
    }

    /** The landmarks that a plan's joints and tip need and the standing trial lacks. */
    List<Landmark> missing(ChainPlan plan) {
        List<Landmark> needed = new ArrayList<>();
        for (ChainPlan.Part part : plan.parts()) {
            part.joint().ifPresent(j -> {
                needed.add(j.centre().landmark());
                j.centre().other().ifPresent(needed::add);
                if (j.axis() instanceof ChainPlan.Axis.Through through) {
                    needed.add(through.from());
                    needed.add(through.to());
                }
            });
        }
        needed.add(plan.tip().landmark());
        plan.tip().other().ifPresent(needed::add);
        return needed.stream().distinct().filter(l -> limb.point(l).isEmpty()).toList();
    }

    /** A place of a plan file. */
    Optional<Located> place(ChainPlan.Place place) {
        Optional<Vec3> one = limb.point(place.landmark());
        if (place.other().isEmpty()) {
            return one.map(p -> new Located(p, Basis.MEASURED, OptionalDouble.of(LimbGeometry.FOOT_PLACEMENT_SD)));
        }
        Optional<Vec3> other = limb.point(place.other().get());
        return one.flatMap(p -> other.map(q -> new Located(
                p.plus(q).times(0.5),
                Basis.MEASURED,
                OptionalDouble.of(LimbGeometry.FOOT_PLACEMENT_SD / Math.sqrt(2)))));
    }

    private Optional<Joint.Axis> axis(ChainPlan.Hinge hinge) {
        if (hinge.axis() instanceof ChainPlan.Axis.Through through) {
            return limb.point(through.from())
                    .flatMap(a -> limb.point(through.to()).map(b -> through(hinge.name(), a, b)));
        }
        Vec3 direction =
                switch (((ChainPlan.Axis.Along) hinge.axis()).direction()) {
                    case ACROSS -> Vec3.Z;
                    case FORWARD -> Vec3.X;
                    case UP -> Vec3.Y;
                };
        return Optional.of(new Joint.Axis(hinge.name(), direction, Basis.ASSUMED, OptionalDouble.empty()));
    }

    /** An axis along the line between two landmarks, to the subject's right. */
    static Joint.Axis through(String name, Vec3 a, Vec3 b) {
        double sd = Math.sqrt(2) * LimbGeometry.FOOT_PLACEMENT_SD / a.distance(b);
        return new Joint.Axis(name, LimbGeometry.acrossToTheRight(a, b), Basis.MEASURED, OptionalDouble.of(sd));
    }

    private Between midtarsal(SegmentName distal) {
        Located centre = limb.midtarsal(settings.adultRegression());
        Joint.Axis axis = limb.hasMidtarsalLandmarks()
                ? through("midtarsal", limb.required(Landmark.NAVICULAR_TUBEROSITY), limb.required(Landmark.CUBOID))
                : new Joint.Axis("midtarsal", Vec3.Z, Basis.ASSUMED, OptionalDouble.empty());
        return new Between("midtarsal", distal, centre, axis, centre.position());
    }

    private Between tarsometatarsal(SegmentName distal) {
        Located centre = limb.tarsometatarsal();
        Joint.Axis axis = limb.hasMetatarsalBases()
                ? through(
                        "tarsometatarsal",
                        limb.required(Landmark.METATARSAL_1_BASE),
                        limb.required(Landmark.METATARSAL_5_BASE))
                : new Joint.Axis("tarsometatarsal", Vec3.Z, Basis.ASSUMED, OptionalDouble.empty());
        return new Between("tarsometatarsal", distal, centre, axis, centre.position());
    }

    private Joint.Axis headAxis() {
        return through(
                "metatarsophalangeal",
                limb.required(Landmark.METATARSAL_1_HEAD),
                limb.required(Landmark.METATARSAL_5_HEAD));
    }

    private Between metatarsophalangeal(SegmentName distal) {
        Located line = new Located(
                limb.heads(), Basis.MEASURED, OptionalDouble.of(LimbGeometry.FOOT_PLACEMENT_SD / Math.sqrt(2)));
        return new Between(
                "metatarsophalangeal",
                distal,
                settings.choices().isFunctionalToeAxis() ? functional() : line,
                headAxis(),
                line.position());
    }

    private Located functional() {
        double length = toeTip.position().x()
                - limb.required(Landmark.CALCANEUS_POSTERIOR).x();
        return Located.of(
                limb.heads().plus(new Vec3(FUNCTIONAL_FORWARD * length, FUNCTIONAL_UP * length, 0)),
                settings.adultRegression());
    }

    private Between interphalangeal(SegmentName distal, int number, int phalanges) {
        Landmark landmark = number == 1 ? Landmark.INTERPHALANGEAL_1 : Landmark.INTERPHALANGEAL_2;
        Vec3 heads = limb.heads();
        double share = PHALANGES[phalanges - 2][number - 1];
        Located centre = limb.point(landmark)
                .map(p -> new Located(p, Basis.MEASURED, OptionalDouble.of(LimbGeometry.FOOT_PLACEMENT_SD)))
                .orElseGet(() ->
                        Located.of(heads.plus(toeTip.position().minus(heads).times(share)), Basis.ASSUMED));
        String name = phalanges == 2 ? "interphalangeal" : "interphalangeal_" + number;
        Joint.Axis axis = new Joint.Axis(name, headAxis().direction(), Basis.ASSUMED, OptionalDouble.empty());
        return new Between(name, distal, centre, axis, centre.position());
    }
}
