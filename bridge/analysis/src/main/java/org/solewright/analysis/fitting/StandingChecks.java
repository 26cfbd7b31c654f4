package org.solewright.analysis.fitting;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.foot.Population;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Vec3;

/** What has to be said about a standing trial and the limbs made of it. */
final class StandingChecks {

    /** Sides differing by more are a finding (design 03 section 5). */
    private static final double LENGTH_DIFFERENCE = 0.02;

    /** Departure of a length from its share of stature (design 03 section 5). */
    private static final double IMPLAUSIBLE = 0.15;

    private static final double IMPOSSIBLE = 0.30;

    /** Stretch of the solid (design 03 section 5). */
    private static final double LEAST_STRETCH = 0.7;

    private static final double GREATEST_STRETCH = 1.4;

    /** Shares of stature, [Drillis Contini 1966]. */
    private static final Map<String, Double> OF_STATURE =
            Map.of("foot length", 0.152, "ankle height", 0.039, "hip height", JointCentres.HIP_HEIGHT_OVER_STATURE);

    private StandingChecks() {}

    /** About the subject: whose regressions stand for whom. */
    static List<Finding> subject(StandingSettings settings) {
        Population population = settings.population();
        if (population == Population.UNKNOWN) {
            return List.of(Finding.warning(
                    "population.unknown",
                    "",
                    "population not given: regressions for adults"
                            + (settings.sex().isEmpty() ? ", the mean of both sexes," : "")
                            + " are used and count as assumed; give --population and --sex"));
        }
        if (population != Population.ADULT) {
            return List.of(Finding.warning(
                    "population.outside-regression",
                    "",
                    "population is " + population.word() + ": regressions for adults are used outside their population"
                            + " and count as assumed"));
        }
        if (settings.sex().isEmpty() && settings.inertia() == InertiaTable.DE_LEVA) {
            return List.of(Finding.warning(
                    "population.unknown",
                    "",
                    "sex not given: the mean of both sexes is used for mass and inertia of the segments and counts as"
                            + " assumed; give --sex"));
        }
        return List.of();
    }

    /** About missing landmarks of one side. */
    static List<Finding> missing(LimbGeometry limb, JointCentres centres, StandingSettings settings) {
        List<Finding> findings = new ArrayList<>();
        String side = limb.side().word();
        if (limb.point(Landmark.FEMORAL_EPICONDYLE_MEDIAL).isEmpty()
                || limb.point(Landmark.FEMORAL_EPICONDYLE_LATERAL).isEmpty()) {
            findings.add(Finding.warning(
                    "landmark.missing",
                    side,
                    side + " knee has not both epicondyles: its centre is put on the line from ankle to hip by"
                            + " proportion"));
        }
        switch (centres.hipSource()) {
            case PELVIS -> {
                // the intended source
            }
            case TROCHANTER ->
                findings.add(Finding.warning(
                        "landmark.missing",
                        side,
                        side + " hip has no complete pelvis landmarks: the greater trochanter is taken as its centre"));
            case PROPORTION ->
                findings.add(
                        Finding.warning(
                                "landmark.missing",
                                side,
                                side
                                        + " hip has neither pelvis landmarks nor trochanter: it is put above the ankle by proportion"));
        }
        if (limb.toeLandmark().isEmpty() && settings.isHuman()) {
            findings.add(Finding.note(
                    "foot-length.regression",
                    side,
                    side + " foot has no toe landmark: its length is the distance from heel to first metatarsal head"
                            + " over " + LimbGeometry.HEAD_SHARE));
        }
        return findings;
    }

    /** About the handedness of one limb: medial points lie nearer the midline. */
    static Optional<Finding> mirrored(LimbGeometry limb, StandingPosture posture) {
        Vec3 medial = limb.required(Landmark.MALLEOLUS_MEDIAL);
        Vec3 lateral = limb.required(Landmark.MALLEOLUS_LATERAL);
        int outwards = limb.side() == Side.RIGHT ? 1 : -1;
        boolean inOrder = outwards * (lateral.z() - medial.z()) > 0;
        Optional<Vec3> other =
                posture.position(Landmark.CALCANEUS_POSTERIOR, limb.side().opposite());
        boolean ownSide = other.map(
                        p -> outwards * limb.ankleFrame().inversePosition(p).z() < 0)
                .orElse(true);
        if (inOrder && ownSide) {
            return Optional.empty();
        }
        String what = inOrder
                ? "the other heel lies outwards of the " + limb.side().word() + " foot"
                : "the medial malleolus of the " + limb.side().word() + " foot lies outwards of the lateral one";
        return Optional.of(Finding.error(
                "frame.mirrored",
                limb.side().word(),
                what + ": the recording is left-handed or has its sides or landmarks swapped; check the landmark map or"
                        + " use --mirrored"));
    }

    /** About two limbs' lengths. */
    static List<Finding> limbLengths(StandingPosture posture, double right, double left, double floor) {
        List<Finding> findings = new ArrayList<>();
        if (differ(right, left)) {
            findings.add(lengthsDiffer("limb length", right, left, ""));
        }
        Optional<Vec3> r = posture.position(Landmark.TROCHANTER_MAJOR, Side.RIGHT);
        Optional<Vec3> l = posture.position(Landmark.TROCHANTER_MAJOR, Side.LEFT);
        if (r.isPresent() && l.isPresent() && !differ(right, left)) {
            double rightHeight = r.get().dot(posture.up()) - floor;
            double leftHeight = l.get().dot(posture.up()) - floor;
            if (differ(rightHeight, leftHeight)) {
                String low = rightHeight < leftHeight ? "right" : "left";
                findings.add(lengthsDiffer(
                        "trochanter height",
                        rightHeight,
                        leftHeight,
                        "; limb lengths by the pelvis agree, so the " + low + " trochanter's marker is low"));
            }
        }
        return findings;
    }

    private static boolean differ(double a, double b) {
        return Math.abs(a - b) > LENGTH_DIFFERENCE * (a + b) / 2;
    }

    private static Finding lengthsDiffer(String what, double right, double left, String more) {
        return Finding.warning(
                "limb.length-differs",
                "standing",
                String.format(
                        Locale.ROOT,
                        "%s is %.3f m on the right and %.3f m on the left, more than 2 %% apart%s",
                        what,
                        right,
                        left,
                        more));
    }

    /** About lengths against stature. */
    static List<Finding> plausibility(
            Side side, double stature, double footLength, double ankleHeight, double hipHeight) {
        List<Finding> findings = new ArrayList<>();
        compare(findings, side, "foot length", footLength, stature);
        compare(findings, side, "ankle height", ankleHeight, stature);
        compare(findings, side, "hip height", hipHeight, stature);
        return findings;
    }

    private static void compare(List<Finding> findings, Side side, String what, double length, double stature) {
        double expected = OF_STATURE.getOrDefault(what, Double.NaN) * stature;
        double departure = length / expected - 1;
        if (Math.abs(departure) > IMPLAUSIBLE) {
            String message = String.format(
                    Locale.ROOT,
                    "%s %s %.3f m is %.0f %% %s than the %.3f m usual for a stature of %.3f m; check landmarks, units"
                            + " and --stature",
                    side.word(),
                    what,
                    length,
                    100 * Math.abs(departure),
                    departure > 0 ? "more" : "less",
                    expected,
                    stature);
            findings.add(
                    Math.abs(departure) > IMPOSSIBLE
                            ? Finding.error("length.implausible", side.word(), message)
                            : Finding.warning("length.implausible", side.word(), message));
        }
    }

    /** About the map that gave the foot's solid its moments. */
    static Optional<Finding> distorted(Side side, FootSplit split) {
        if (split.smallestStretch() >= LEAST_STRETCH && split.largestStretch() <= GREATEST_STRETCH) {
            return Optional.empty();
        }
        return Optional.of(Finding.warning(
                "inertia.solid-distorted",
                side.word(),
                String.format(
                        Locale.ROOT,
                        "the solid through the %s foot's landmarks had to be stretched by %.2f to %.2f to get the"
                                + " regression's inertia, expected %.1f to %.1f",
                        side.word(),
                        split.smallestStretch(),
                        split.largestStretch(),
                        LEAST_STRETCH,
                        GREATEST_STRETCH)));
    }
}
