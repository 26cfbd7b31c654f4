package org.solewright.analysis.fitting;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.foot.ChainPlan;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.foot.Segment;
import org.solewright.domain.foot.SegmentName;

/**
 * A foot divided as asked, or into fewer parts where its landmarks do not allow as many.
 *
 * @param plan the division
 * @param builder of that plan
 * @param segments proximal to distal
 * @param findings about merged segments and joints put by proportion
 */
record DividedFoot(SegmentPlan plan, LimbBuilder builder, List<Segment> segments, List<Finding> findings) {

    /** Fewest parts that joint planes cut; with fewer there is nothing to merge. */
    private static final int FEWEST = 2;

    DividedFoot {
        segments = List.copyOf(segments);
        findings = List.copyOf(findings);
    }

    /**
     * Divides a foot.
     *
     * @param settings with the number of parts, if any, or the plan
     * @param limb landmarks in A
     * @param floorHeight of the floor in A, m
     * @param centres of hip and knee
     * @return empty where the landmarks leave no room for two parts, or the plan's joint for the mass it divides
     */
    static Optional<DividedFoot> of(
            StandingSettings settings, LimbGeometry limb, double floorHeight, JointCentres centres) {
        if (settings.choices().plan().isPresent()) {
            ChainPlan own = settings.choices().plan().get();
            SegmentPlan plan = SegmentPlan.of(own);
            LimbBuilder builder = new LimbBuilder(settings, limb, plan, floorHeight, centres);
            return builder.segments().map(s -> new DividedFoot(plan, builder, s, planned(own, limb)));
        }
        int asked = settings.segments().orElseGet(() -> SegmentPlan.most(limb));
        int parts = allowed(asked, limb, settings);
        do {
            SegmentPlan plan = SegmentPlan.of(parts);
            LimbBuilder builder = new LimbBuilder(settings, limb, plan, floorHeight, centres);
            Optional<List<Segment>> segments = builder.segments();
            if (segments.isPresent()) {
                List<Finding> findings = new ArrayList<>();
                if (parts < asked) {
                    findings.add(merged(asked, parts, limb));
                }
                findings.addAll(byProportion(plan, limb));
                return Optional.of(new DividedFoot(plan, builder, segments.get(), findings));
            }
            parts--;
        } while (parts >= FEWEST);
        return Optional.empty();
    }

    /**
     * What the landmarks allow of a number of parts: toes are not split without their tip, and proportions of people
     * say nothing about an animal.
     */
    private static int allowed(int asked, LimbGeometry limb, StandingSettings settings) {
        int parts = asked;
        boolean isHuman = settings.isHuman();
        if (parts == SegmentPlan.MOST
                && !isHuman
                && limb.point(Landmark.INTERPHALANGEAL_2).isEmpty()) {
            parts--;
        }
        boolean isJointKnown = isHuman || limb.point(Landmark.INTERPHALANGEAL_1).isPresent();
        if (parts > 4 && (limb.toeLandmark().isEmpty() || !isJointKnown)) {
            parts = 4;
        }
        return parts >= 4 && !isHuman && !limb.hasMetatarsalBases() ? 3 : parts;
    }

    private static Finding merged(int asked, int parts, LimbGeometry limb) {
        String side = limb.side().word();
        return Finding.warning(
                "segments.merged",
                side,
                "the " + side + " foot is divided into " + parts + " segments, not the " + asked
                        + " asked for: its landmarks do not give the others room or a joint"
                        + (limb.toeLandmark().isEmpty() ? " (no toe landmark)" : ""));
    }

    private static List<Finding> byProportion(SegmentPlan plan, LimbGeometry limb) {
        List<Finding> findings = new ArrayList<>();
        String side = limb.side().word();
        List<SegmentName> foot = plan.foot();
        boolean hasMidfoot = foot.contains(SegmentName.MIDFOOT);
        if (foot.contains(SegmentName.FOREFOOT) && !limb.hasMidtarsalLandmarks()) {
            findings.add(Finding.note(
                    "midtarsal.regression",
                    side,
                    side + " foot has not both navicular tuberosity and cuboid: the midtarsal joint is put by"
                            + " regression"));
        }
        if (hasMidfoot && !limb.hasMetatarsalBases()) {
            findings.add(Finding.note(
                    "tarsometatarsal.proportion",
                    side,
                    side
                            + " foot has not both metatarsal bases: the tarsometatarsal joint is put by proportion, its axis"
                            + " across the foot"));
        }
        boolean isFirstPut = foot.contains(SegmentName.PHALANX_2)
                && limb.point(Landmark.INTERPHALANGEAL_1).isEmpty();
        boolean isSecondPut = foot.contains(SegmentName.PHALANX_3)
                && limb.point(Landmark.INTERPHALANGEAL_2).isEmpty();
        if (isFirstPut || isSecondPut) {
            findings.add(Finding.note(
                    "interphalangeal.proportion",
                    side,
                    side + " toes have no landmark at "
                            + (isFirstPut && isSecondPut
                                    ? "their interphalangeal joints: they are"
                                    : "an interphalangeal" + " joint: it is")
                            + " put by proportion between metatarsal heads and toe tip"));
        }
        return findings;
    }

    private static List<Finding> planned(ChainPlan plan, LimbGeometry limb) {
        List<String> assumed = plan.parts().stream()
                .filter(p -> p.mass().isEmpty())
                .map(p -> p.name().word())
                .toList();
        if (assumed.isEmpty()) {
            return List.of();
        }
        String side = limb.side().word();
        return List.of(Finding.note(
                "plan.mass-assumed",
                side,
                "the plan gives no mass of the " + side + " " + String.join(", ", assumed)
                        + ": its shape is filled with " + (int) PlannedMasses.DENSITY + " kg/m3"));
    }
}
