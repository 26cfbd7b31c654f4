package org.solewright.analysis.fitting;

import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.apache.commons.math3.exception.MathIllegalStateException;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.Quantity;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.foot.Located;
import org.solewright.domain.foot.Pad;
import org.solewright.domain.foot.SegmentName;
import org.solewright.domain.foot.SidedLandmark;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Pose;
import org.solewright.domain.geometry.Rotation;
import org.solewright.domain.geometry.Vec3;

/**
 * Builds a limb from a standing trial: model frames, joint centres, segments with mass and inertia, contact pads, and
 * what has to be said about them. Which landmarks are required, which joint centres and which regressions: design 03
 * section 5.
 */
public final class StandingModel {

    private StandingModel() {}

    /**
     * Builds the limb of one side.
     *
     * @param posture mean standing positions of the landmarks of both sides, as far as recorded
     * @param settings subject and choices
     * @param side whose limb
     * @return the limb, or why there is none
     */
    public static StandingOutcome build(StandingPosture posture, StandingSettings settings, Side side) {
        try {
            return checked(posture, settings, side);
        } catch (IllegalArgumentException | MathIllegalStateException e) {
            // Landmarks that lie impossibly break the invariant of some part of the limb, which says so.
            return new StandingOutcome.Refused(
                    "the standing landmarks of the " + side.word() + " side make no limb (" + e.getMessage() + ")",
                    "check the landmark map, the units and the recording");
        }
    }

    private static StandingOutcome checked(StandingPosture posture, StandingSettings settings, Side side) {
        List<SidedLandmark> missing = LimbGeometry.missing(posture, side);
        if (!missing.isEmpty()) {
            return new StandingOutcome.Refused(
                    "the standing trial has no "
                            + String.join(
                                    ", ",
                                    missing.stream().map(SidedLandmark::words).toList()),
                    "record these landmarks in standing, or name their labels in the landmark map");
        }
        Optional<LimbGeometry> limb = LimbGeometry.of(posture, side);
        if (limb.isEmpty()) {
            return new StandingOutcome.Refused(
                    "the " + side.word() + " heel lies straight above or below the metatarsal heads",
                    "check the landmark map and the up direction");
        }
        Quantity floor = floor(posture, settings);
        Optional<JointCentres> centres = centres(posture, limb.get(), settings, floor);
        if (centres.isEmpty()) {
            return new StandingOutcome.Refused(
                    "the standing trial has no " + side.word() + " trochanter_major, from which the hip of an animal"
                            + " is taken",
                    "record it, or name its label in the landmark map");
        }
        return assemble(posture, settings, limb.get(), floor, centres.get());
    }

    private static StandingOutcome assemble(
            StandingPosture posture,
            StandingSettings settings,
            LimbGeometry limb,
            Quantity floor,
            JointCentres centres) {
        Side side = limb.side();
        double floorHeight = heightInAnkleFrame(posture, limb, floor);
        List<Landmark> lacking = settings.choices()
                .plan()
                .map(p -> new FootJoints(settings, limb, limb.toeTip(Basis.ASSUMED, floorHeight, 0)).missing(p))
                .orElse(List.of());
        if (!lacking.isEmpty()) {
            return new StandingOutcome.Refused(
                    "the standing trial has no " + side.word() + " "
                            + String.join(
                                    ", ", lacking.stream().map(Landmark::word).toList())
                            + ", where the segment plan puts a joint or the tip",
                    "record it, name its label in the landmark map, or change the plan");
        }
        Optional<DividedFoot> divided = DividedFoot.of(settings, limb, floorHeight, centres);
        if (divided.isEmpty()) {
            return new StandingOutcome.Refused(
                    "the " + side.word() + " foot's landmarks do not leave room for "
                            + settings.segments().orElseGet(() -> SegmentPlan.most(limb)) + " segments",
                    "check the landmarks of toe, metatarsal heads and midfoot, or use --segments 1");
        }
        LimbBuilder builder = divided.get().builder();
        Optional<Quantity> footLength = footLength(limb, settings);
        Quantity limbLength = new Quantity(
                centres.hip().position().y() - floorHeight,
                centres.hip().basis(),
                centres.hip().sd());
        if (!(limbLength.value() > 0)) {
            return new StandingOutcome.Refused(
                    String.format(
                            Locale.ROOT,
                            "the %s hip lies %.3f m below the floor in the standing trial",
                            side.word(),
                            -limbLength.value()),
                    "check the landmark map, the units and --floor");
        }
        double scale = footLength.map(Quantity::value).orElse(limb.heelToFirstHead() / LimbGeometry.HEAD_SHARE);
        return new StandingOutcome.Built(new StandingLimb(
                side,
                settings.subjectId(),
                settings.mass(),
                settings.stature(),
                settings.population(),
                settings.sex(),
                inLaboratory(limb, centres.hip()),
                inLaboratory(limb, centres.knee()),
                ankle(limb),
                floor,
                limbLength,
                footLength,
                poses(limb, builder),
                divided.get().segments(),
                builder.joints(),
                builder.landmarks(posture),
                pads(settings, limb, divided.get().plan(), builder, floorHeight, scale),
                findings(posture, settings, limb, divided.get(), floor, centres, limbLength, footLength)));
    }

    private static List<Pad> pads(
            StandingSettings settings,
            LimbGeometry limb,
            SegmentPlan plan,
            LimbBuilder builder,
            double floorHeight,
            double footLength) {
        Map<SegmentName, Vec3> origins = builder.origins();
        return new FootPads(
                        limb,
                        floorHeight,
                        settings.markerRadius().value(),
                        footLength,
                        settings.mass().value())
                .pads(
                        plan.rear(),
                        origins.getOrDefault(plan.rear(), Vec3.ZERO),
                        plan.heads(),
                        origins.getOrDefault(plan.heads(), Vec3.ZERO),
                        plan.toes(),
                        origins.getOrDefault(plan.toes(), Vec3.ZERO));
    }

    private static List<Finding> findings(
            StandingPosture posture,
            StandingSettings settings,
            LimbGeometry limb,
            DividedFoot divided,
            Quantity floor,
            JointCentres centres,
            Quantity limbLength,
            Optional<Quantity> footLength) {
        List<Finding> findings = new ArrayList<>(StandingChecks.subject(settings));
        StandingChecks.mirrored(limb, posture).ifPresent(findings::add);
        if (floor.basis() == Basis.ASSUMED) {
            findings.add(Finding.note(
                    "floor.assumed",
                    "standing",
                    String.format(
                            Locale.ROOT,
                            "no platform or option gives the floor: it is put at %.4f m, the lowest foot landmark less"
                                    + " the marker radius",
                            floor.value())));
        }
        findings.addAll(StandingChecks.missing(limb, centres, settings));
        findings.addAll(divided.findings());
        otherLimbLength(posture, settings, limb.side().opposite(), floor).ifPresent(other -> {
            boolean right = limb.side() == Side.RIGHT;
            double own = limbLength.value();
            findings.addAll(
                    StandingChecks.limbLengths(posture, right ? own : other, right ? other : own, floor.value()));
        });
        if (settings.isHuman()) {
            findings.addAll(UprightChecks.of(limb, centres));
            double ankleHeight = -heightInAnkleFrame(posture, limb, floor);
            settings.stature()
                    .ifPresent(stature -> findings.addAll(StandingChecks.plausibility(
                            limb.side(),
                            stature.value(),
                            footLength.map(Quantity::value).orElse(Double.NaN),
                            ankleHeight,
                            limbLength.value())));
        }
        divided.builder()
                .split()
                .flatMap(s -> StandingChecks.distorted(limb.side(), s))
                .ifPresent(findings::add);
        return findings;
    }

    private static Optional<Double> otherLimbLength(
            StandingPosture posture, StandingSettings settings, Side other, Quantity floor) {
        if (!LimbGeometry.missing(posture, other).isEmpty()) {
            return Optional.empty();
        }
        return LimbGeometry.of(posture, other)
                .flatMap(limb -> centres(posture, limb, settings, floor)
                        .map(c -> c.hip().position().y() - heightInAnkleFrame(posture, limb, floor)));
    }

    private static Optional<JointCentres> centres(
            StandingPosture posture, LimbGeometry limb, StandingSettings settings, Quantity floor) {
        return JointCentres.of(posture, limb, settings, heightInAnkleFrame(posture, limb, floor));
    }

    private static double heightInAnkleFrame(StandingPosture posture, LimbGeometry limb, Quantity floor) {
        return floor.value() - limb.ankleFrame().position().dot(posture.up());
    }

    /** The floor as given, else the lowest landmark of either foot less the marker radius. */
    private static Quantity floor(StandingPosture posture, StandingSettings settings) {
        OptionalDouble given = posture.floor();
        if (given.isPresent()) {
            return Quantity.of(given.getAsDouble(), Basis.MEASURED);
        }
        double lowest = posture.landmarks().entrySet().stream()
                .filter(e -> e.getKey().landmark().compareTo(Landmark.MALLEOLUS_LATERAL) <= 0)
                .mapToDouble(e -> e.getValue().dot(posture.up()))
                .min()
                .orElseThrow();
        return Quantity.of(lowest - settings.markerRadius().value(), Basis.ASSUMED);
    }

    private static Optional<Quantity> footLength(LimbGeometry limb, StandingSettings settings) {
        Vec3 heel = limb.required(Landmark.CALCANEUS_POSTERIOR);
        double sd = Math.sqrt(2) * LimbGeometry.FOOT_PLACEMENT_SD;
        Optional<Vec3> tip = limb.toeLandmark();
        if (tip.isPresent()) {
            return Optional.of(Quantity.of(LimbGeometry.level(heel, tip.get()), Basis.MEASURED, sd));
        }
        if (!settings.isHuman()) {
            return Optional.empty();
        }
        return Optional.of(Quantity.of(
                limb.heelToFirstHead() / LimbGeometry.HEAD_SHARE,
                settings.adultRegression(),
                sd / LimbGeometry.HEAD_SHARE));
    }

    private static Located inLaboratory(LimbGeometry limb, Located in_A) {
        return new Located(limb.ankleFrame().transformPosition(in_A.position()), in_A.basis(), in_A.sd());
    }

    private static Located ankle(LimbGeometry limb) {
        return new Located(
                limb.ankleFrame().position(),
                Basis.MEASURED,
                OptionalDouble.of(LimbGeometry.FOOT_PLACEMENT_SD / Math.sqrt(2)));
    }

    private static Map<SegmentName, Pose> poses(LimbGeometry limb, LimbBuilder builder) {
        Map<SegmentName, Pose> poses = new EnumMap<>(SegmentName.class);
        builder.origins()
                .forEach((name, origin) ->
                        poses.put(name, limb.ankleFrame().times(new Pose(Rotation.IDENTITY, origin))));
        return poses;
    }
}
