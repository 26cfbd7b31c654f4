package org.solewright.analysis.fitting;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import org.assertj.core.data.Offset;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.Quantity;
import org.solewright.domain.finding.Severity;
import org.solewright.domain.foot.FootModel;
import org.solewright.domain.foot.Joint;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.foot.Pad;
import org.solewright.domain.foot.Population;
import org.solewright.domain.foot.Segment;
import org.solewright.domain.foot.SegmentName;
import org.solewright.domain.foot.SidedLandmark;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Pose;
import org.solewright.domain.geometry.Vec3;

class StandingModelTest {

    /** Rounding of a few dozen operations on numbers below one. */
    private static final Offset<Double> ROUNDING = within(1e-12);

    private final InventedSubject subject = new InventedSubject();

    private static void assertAt(Vec3 actual, double x, double y, double z) {
        assertThat(actual.distance(new Vec3(x, y, z)))
                .as("%s against %s %s %s", actual, x, y, z)
                .isCloseTo(0, ROUNDING);
    }

    private static List<String> codes(StandingLimb limb) {
        return limb.findings().stream().map(Finding::code).toList();
    }

    @ParameterizedTest
    @EnumSource(Side.class)
    void framesHaveXForwardYUpZRightAndOriginsAtTheProximalJoints(Side side) {
        StandingLimb limb = subject.limb(side);
        Pose foot = limb.poses().get(SegmentName.FOOT);
        Pose shank = limb.poses().get(SegmentName.SHANK);
        // exact: in this laboratory forward is y, up is z, right is x
        for (Pose pose : List.of(foot, shank)) {
            assertAt(pose.rotation().x(), 0, 1, 0);
            assertAt(pose.rotation().y(), 0, 0, 1);
            assertAt(pose.rotation().z(), 1, 0, 0);
        }
        double right = side == Side.RIGHT ? 1 : -1;
        assertAt(foot.position(), 0.10 * right, 0, 0.075);
        assertAt(shank.position(), 0.10 * right, 0, 0.49);
        assertAt(limb.joints().get(0).centre().position(), 0, 0.075 - 0.49, 0);
    }

    @Test
    void landmarksStandInTheirSegmentsFrames() {
        FootModel model = subject.limb(Side.RIGHT).model("1", List.of(), List.of());
        Vec3 heel = model.landmarks().stream()
                .filter(l -> l.name().equals("calcaneus_posterior"))
                .findFirst()
                .orElseThrow()
                .position();
        assertAt(heel, -0.06, 0.04 - 0.075, 0);
        Vec3 cluster = model.landmarks().stream()
                .filter(l -> l.name().equals("shank_cluster.2") && l.segment() == SegmentName.SHANK)
                .findFirst()
                .orElseThrow()
                .position();
        assertAt(cluster, 0.02, 0.25 - 0.49, 0.05);
        assertThat(model.landmarks())
                .noneMatch(l -> l.name().equals("asis") || l.name().startsWith("trochanter"));
    }

    @Test
    void hipByHarringtonOfTheWorkedExample() {
        // published: [Harrington et al. 2007] formula worked with PW 230.8, PD 192.0, LL 963.25 mm; printed to 0.01 mm
        Vec3 right = HipCentre.harrington(0.2308, 0.1920, 0.96325, Side.RIGHT);
        Vec3 left = HipCentre.harrington(0.2308, 0.1920, 0.96325, Side.LEFT);
        assertThat(right.x()).isCloseTo(-0.05598, within(5e-6));
        assertThat(right.y()).isCloseTo(-0.08256, within(5e-6));
        assertThat(right.z()).isCloseTo(0.09859, within(5e-6));
        assertThat(left.z()).isCloseTo(-0.09859, within(5e-6));
    }

    @Test
    void limbLengthIsHipCentreToFloor() {
        // exact: level pelvis, PW 0.23, PD 0.19, LL from (0.06,0.98,0.115) to (0.005,0.08,0.055)
        double leg = Math.sqrt(0.055 * 0.055 + 0.90 * 0.90 + 0.06 * 0.06);
        double height = 0.98 - 0.16 * 0.23 - 0.04 * leg - 0.0071;
        StandingLimb limb = subject.limb(Side.LEFT);
        assertThat(limb.limbLength().value()).isCloseTo(height, ROUNDING);
        assertThat(limb.limbLength().basis()).isEqualTo(Basis.REGRESSION);
        assertThat(limb.hip().position().z()).isCloseTo(height, ROUNDING);
        subject.floor = OptionalDouble.of(-0.02);
        assertThat(subject.limb(Side.LEFT).limbLength().value()).isCloseTo(height + 0.02, ROUNDING);
    }

    @Test
    void trochanterStandsInForAnIncompletePelvis() {
        subject.remove(Landmark.SACRUM);
        StandingLimb limb = subject.limb(Side.RIGHT);
        assertAt(limb.hip().position(), 0.17, 0, 0.90);
        assertThat(limb.limbLength().basis()).isEqualTo(Basis.ASSUMED);
        assertThat(codes(limb)).containsExactly("landmark.missing");
        subject.remove(Landmark.TROCHANTER_MAJOR);
        // published: [Drillis Contini 1966] hip height over foot length 0.530/0.152; foot length as if from the heel to
        // the first head, 0.195 forward and 0.055 inwards, over 0.73
        assertThat(subject.limb(Side.RIGHT).limbLength().value())
                .isCloseTo(0.530 / 0.152 * Math.hypot(0.195, 0.055) / 0.73, ROUNDING);
    }

    @Test
    void rigidFootHasMassCentreAndTensorOfDeLeva() {
        subject.segments = OptionalInt.of(1);
        Segment foot = subject.limb(Side.RIGHT).segments().get(1);
        // published: [de Leva 1996] table 4, foot, male: 0.0137, 0.4415, radii 0.257 0.245 0.124
        assertThat(foot.mass().value()).isCloseTo(0.0137 * 80, ROUNDING);
        assertThat(foot.mass().basis()).isEqualTo(Basis.REGRESSION);
        assertThat(foot.mass().sd().orElseThrow()).isCloseTo(0.0137 * 0.8, ROUNDING);
        // exact: from heel (-0.06, -0.035, 0) to toe tip (0.19, -0.06, 0) in the foot's frame
        assertAt(foot.centreOfMass().position(), -0.06 + 0.4415 * 0.25, -0.035 - 0.4415 * 0.025, 0);
        double square = 0.0137 * 80 * (0.25 * 0.25 + 0.025 * 0.025);
        double c = 0.25 / Math.hypot(0.25, 0.025);
        double s = -0.025 / Math.hypot(0.25, 0.025);
        double along = square * 0.124 * 0.124;
        double normal = square * 0.257 * 0.257;
        assertThat(foot.inertia().zz()).isCloseTo(square * 0.245 * 0.245, within(1e-15));
        assertThat(foot.inertia().xx()).isCloseTo(along * c * c + normal * s * s, within(1e-15));
        assertThat(foot.inertia().yy()).isCloseTo(along * s * s + normal * c * c, within(1e-15));
        assertThat(foot.inertia().xy()).isCloseTo((along - normal) * c * s, within(1e-15));
    }

    @Test
    void dempsterMeasuresTheFootFromMalleolusToSecondHead() {
        subject.segments = OptionalInt.of(1);
        subject.inertia = InertiaTable.DEMPSTER;
        subject.putBoth(Landmark.METATARSAL_2_HEAD, 0.14, 0.02, 0.08);
        subject.sex = Optional.empty();
        Segment foot = subject.limb(Side.RIGHT).segments().get(1);
        // published: Dempster after [Winter 2009] table 4.1: 0.0145, 0.50, 0.475; exact: malleolus
        // (-0.005,-0.005,0.045),
        // head (0.14,-0.055,-0.02) in the foot's frame
        assertThat(foot.mass().value()).isCloseTo(0.0145 * 80, ROUNDING);
        assertThat(foot.mass().basis()).isEqualTo(Basis.REGRESSION);
        assertThat(foot.inertiaBasis()).isEqualTo(Basis.ASSUMED);
        assertAt(foot.centreOfMass().position(), 0.0675, -0.03, 0.0125);
        double length2 = 0.145 * 0.145 + 0.05 * 0.05 + 0.065 * 0.065;
        // exact: the trace does not depend on the axes; radii keep the proportions of the mean of [de Leva 1996]'s
        // sexes
        double k = 0.475 / ((0.245 + 0.279) / 2);
        double trace = 0.0145
                * 80
                * length2
                * (0.475 * 0.475 + Math.pow(k * (0.257 + 0.299) / 2, 2) + Math.pow(k * (0.124 + 0.139) / 2, 2));
        assertThat(foot.inertia().xx() + foot.inertia().yy() + foot.inertia().zz())
                .isCloseTo(trace, within(1e-12));
    }

    @Test
    void unknownPopulationMakesRegressionsAssumedAndIsSaid() {
        subject.segments = OptionalInt.of(1);
        subject.population = Population.UNKNOWN;
        subject.sex = Optional.empty();
        StandingLimb limb = subject.limb(Side.RIGHT);
        Segment foot = limb.segments().get(1);
        assertThat(foot.mass().value()).isCloseTo((0.0137 + 0.0129) / 2 * 80, ROUNDING);
        assertThat(foot.mass().basis()).isEqualTo(Basis.ASSUMED);
        assertThat(foot.inertiaBasis()).isEqualTo(Basis.ASSUMED);
        assertThat(limb.limbLength().basis()).isEqualTo(Basis.ASSUMED);
        assertThat(codes(limb)).contains("population.unknown");
    }

    @Test
    void footLengthIsMeasuredToTheToeTipElseByRegression() {
        assertThat(subject.limb(Side.RIGHT).footLength().orElseThrow().value()).isCloseTo(0.25, ROUNDING);
        subject.remove(Landmark.TOE_TIP);
        StandingLimb limb = subject.limb(Side.RIGHT);
        Quantity length = limb.footLength().orElseThrow();
        assertThat(length.value()).isCloseTo(Math.hypot(0.195, 0.055) / 0.73, ROUNDING);
        assertThat(length.basis()).isEqualTo(Basis.REGRESSION);
        assertThat(codes(limb)).contains("foot-length.regression");
        subject.population = Population.OTHER;
        assertThat(subject.limb(Side.RIGHT).footLength()).isEmpty();
    }

    @Test
    void segmentsDefaultToWhatTheLandmarksAllow() {
        assertThat(subject.limb(Side.RIGHT).segments().stream().map(Segment::name))
                .containsExactly(SegmentName.SHANK, SegmentName.FOOT, SegmentName.TOES);
        subject.putBoth(Landmark.NAVICULAR_TUBEROSITY, 0.045, 0.045, 0.07);
        subject.putBoth(Landmark.CUBOID, 0.035, 0.03, 0.13);
        assertThat(subject.limb(Side.RIGHT).segments().stream().map(Segment::name))
                .containsExactly(SegmentName.SHANK, SegmentName.HINDFOOT, SegmentName.FOREFOOT, SegmentName.TOES);
        subject.remove(Landmark.TOE_TIP);
        assertThat(subject.limb(Side.RIGHT).segments().stream().map(Segment::name))
                .containsExactly(SegmentName.SHANK, SegmentName.FOOT);
    }

    @Test
    void massesOfSlicesAreAssumedThoughTheWholeIsNot() {
        List<Segment> split = subject.limb(Side.RIGHT).segments();
        assertThat(split.stream().map(s -> s.mass().basis()))
                .containsExactly(Basis.REGRESSION, Basis.ASSUMED, Basis.ASSUMED);
        subject.segments = OptionalInt.of(1);
        assertThat(subject.limb(Side.RIGHT).segments().get(1).mass().basis()).isEqualTo(Basis.REGRESSION);
    }

    @Test
    void midtarsalJointLiesBetweenItsLandmarksElseByRegression() {
        subject.segments = OptionalInt.of(3);
        Joint regression = subject.limb(Side.RIGHT).joints().get(1);
        // exact: heel (-0.06,-0.035,0) to heads (0.125,-0.06,0), 0.38 of the way
        assertAt(regression.centre().position(), -0.06 + 0.38 * 0.185, -0.035 - 0.38 * 0.025, 0);
        assertThat(regression.centre().basis()).isEqualTo(Basis.REGRESSION);
        assertThat(regression.axes().get(0).basis()).isEqualTo(Basis.ASSUMED);
        subject.putBoth(Landmark.NAVICULAR_TUBEROSITY, 0.045, 0.045, 0.07);
        subject.putBoth(Landmark.CUBOID, 0.035, 0.03, 0.13);
        Joint measured = subject.limb(Side.RIGHT).joints().get(1);
        assertAt(measured.centre().position(), 0.04, 0.0375 - 0.075, 0);
        assertThat(measured.centre().basis()).isEqualTo(Basis.MEASURED);
        Joint toes = subject.limb(Side.RIGHT).joints().get(2);
        assertAt(toes.centre().position(), 0.125 - 0.04, 0.015 - 0.0375, 0);
    }

    @ParameterizedTest
    @EnumSource(Side.class)
    void transverseAxesPointRightAndTheSubtalarForwardAndUp(Side side) {
        subject.segments = OptionalInt.of(3);
        StandingLimb limb = subject.limb(side);
        for (Joint joint : limb.joints()) {
            assertThat(joint.axes().get(0).direction().z()).as(joint.name()).isPositive();
        }
        Vec3 subtalar = limb.joints().get(0).axes().get(1).direction();
        // published: 42 deg up, 23 deg inwards [Isman Inman 1969]; design 03 prints four digits
        assertThat(subtalar.x()).isCloseTo(0.6841, within(1e-4));
        assertThat(subtalar.y()).isCloseTo(0.6691, within(1e-4));
        assertThat(subtalar.z()).isCloseTo(side == Side.RIGHT ? -0.2904 : 0.2904, within(1e-4));
    }

    @Test
    void padsTouchTheFloorInStanding() {
        StandingLimb limb = subject.limb(Side.RIGHT);
        assertThat(limb.pads().stream().map(Pad::name))
                .containsExactly("heel", "metatarsal_5", "metatarsal_1", "hallux");
        for (Pad pad : limb.pads()) {
            Pose frame = limb.poses().get(pad.segment());
            assertThat(frame.transformPosition(pad.centre()).z()).isCloseTo(pad.radius(), ROUNDING);
        }
        Pad heel = limb.pads().get(0);
        // exact: 0.09 of 0.25 m; centre 7 mm and one radius before the landmark
        assertThat(heel.radius()).isCloseTo(0.0225, ROUNDING);
        assertThat(heel.centre().x()).isCloseTo(-0.06 + 0.007 + 0.0225, ROUNDING);
        assertThat(limb.pads().get(3).segment()).isEqualTo(SegmentName.TOES);
        // exact: equal stiffness per root of radius
        Pad head = limb.pads().get(1);
        assertThat(head.stiffness() / Math.sqrt(head.radius()))
                .isCloseTo(heel.stiffness() / Math.sqrt(heel.radius()), within(1e-6 * heel.stiffness()));
        // exact: F = k d^1.5 is 1.1 body weights at 9 mm
        assertThat(heel.stiffness() * Math.pow(0.009, 1.5)).isCloseTo(1.1 * 80 * 9.80665, within(1e-9));
    }

    @Test
    void requiredLandmarksThatAreMissingAreNamed() {
        subject.remove(Landmark.MALLEOLUS_MEDIAL);
        subject.remove(Landmark.MALLEOLUS_LATERAL);
        assertThat(subject.build(Side.RIGHT))
                .isEqualTo(new StandingOutcome.Refused(
                        "the standing trial has no right malleolus_medial, right malleolus_lateral",
                        "record these landmarks in standing, or name their labels in the landmark map"));
    }

    @Test
    void oneLimbCanBeBuiltWithoutTheOther() {
        subject.landmarks.keySet().removeIf(l -> l.side() == Side.LEFT && l.landmark() != Landmark.ASIS);
        assertThat(subject.limb(Side.RIGHT).limbLength().basis()).isEqualTo(Basis.REGRESSION);
        assertThat(subject.build(Side.LEFT)).isInstanceOf(StandingOutcome.Refused.class);
    }

    @Test
    void lowTrochanterIsFoundThoughThePelvisAgrees() {
        subject.put(Landmark.TROCHANTER_MAJOR, Side.RIGHT, 0, 0.85, 0.17);
        Finding finding = subject.limb(Side.LEFT).findings().get(0);
        assertThat(finding.code()).isEqualTo("limb.length-differs");
        assertThat(finding.message())
                .isEqualTo(
                        "trochanter height is 0.850 m on the right and 0.900 m on the left, more than 2 % apart; limb"
                                + " lengths by the pelvis agree, so the right trochanter's marker is low");
        assertThat(subject.limb(Side.RIGHT).findings())
                .isEqualTo(subject.limb(Side.LEFT).findings());
    }

    @Test
    void swappedSidesAndSwappedMalleoliAreMirrored() {
        InventedSubject swapped = new InventedSubject();
        swapped.landmarks.clear();
        subject.landmarks.forEach((name, position) -> swapped.landmarks.put(
                new SidedLandmark(name.landmark(), name.side().opposite()), position));
        Finding sides = mirrored(swapped.limb(Side.RIGHT));
        assertThat(sides.severity()).isEqualTo(Severity.ERROR);
        subject.put(Landmark.MALLEOLUS_MEDIAL, Side.RIGHT, 0.005, 0.08, 0.145);
        subject.put(Landmark.MALLEOLUS_LATERAL, Side.RIGHT, -0.005, 0.07, 0.055);
        assertThat(mirrored(subject.limb(Side.RIGHT)).message())
                .startsWith("the medial malleolus of the right foot lies outwards of the lateral one: ");
    }

    private static Finding mirrored(StandingLimb limb) {
        return limb.findings().stream()
                .filter(f -> f.code().equals("frame.mirrored"))
                .findFirst()
                .orElseThrow();
    }

    @Test
    void lengthsAreComparedWithStature() {
        // published: foot 0.152, ankle 0.039, hip 0.530 of stature [Drillis Contini 1966]; here 0.25, 0.075 and 0.90 m
        subject.stature = Optional.of(Quantity.of(1.70, Basis.MEASURED));
        assertThat(codes(subject.limb(Side.RIGHT))).isEmpty();
        subject.stature = Optional.of(Quantity.of(1.40, Basis.MEASURED));
        StandingLimb limb = subject.limb(Side.RIGHT);
        assertThat(limb.findings().stream().map(Finding::severity))
                .containsExactly(Severity.WARNING, Severity.ERROR, Severity.WARNING);
        assertThat(limb.findings().get(0).message())
                .startsWith("right foot length 0.250 m is 17 % more than the 0.213 m usual for a stature of 1.400 m");
    }

    @Test
    void floorIsAssumedBelowTheLowestLandmarkAndSaid() {
        subject.floor = OptionalDouble.empty();
        StandingLimb limb = subject.limb(Side.RIGHT);
        assertThat(limb.floor().value()).isCloseTo(0.01 - 0.007, ROUNDING);
        assertThat(codes(limb)).contains("floor.assumed");
    }
}
