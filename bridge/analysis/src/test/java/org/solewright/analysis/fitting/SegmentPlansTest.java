package org.solewright.analysis.fitting;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import org.assertj.core.data.Offset;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.foot.ChainPlan;
import org.solewright.domain.foot.Joint;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.foot.LandmarkPosition;
import org.solewright.domain.foot.Population;
import org.solewright.domain.foot.Segment;
import org.solewright.domain.foot.SegmentName;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Vec3;

/** Feet of four to six segments and chains by a plan of the user's own. */
class SegmentPlansTest {

    private static final Offset<Double> ROUNDING = within(1e-12);

    private final InventedSubject subject = new InventedSubject();

    private static List<String> names(StandingLimb limb) {
        return limb.segments().stream().map(s -> s.name().word()).toList();
    }

    private static List<String> codes(StandingLimb limb) {
        return limb.findings().stream().map(Finding::code).toList();
    }

    private static void assertAt(Vec3 actual, double x, double y, double z) {
        assertThat(actual.distance(new Vec3(x, y, z))).isCloseTo(0, ROUNDING);
    }

    @ParameterizedTest
    @CsvSource({
        "4, shank hindfoot midfoot forefoot toes",
        "5, shank hindfoot midfoot forefoot phalanx_1 phalanx_2",
        "6, shank hindfoot midfoot forefoot phalanx_1 phalanx_2 phalanx_3"
    })
    void segmentsStandInTheOrderOfTheChain(int parts, String expected) {
        subject.putAllJoints();
        subject.segments = OptionalInt.of(parts);
        StandingLimb limb = subject.limb(Side.RIGHT);
        assertThat(String.join(" ", names(limb))).isEqualTo(expected);
        assertThat(limb.findings()).isEmpty();
        List<Segment> segments = limb.segments();
        for (int i = 1; i < segments.size(); i++) {
            assertThat(segments.get(i).parent()).contains(segments.get(i - 1).name());
            Joint joint = limb.joints().get(i - 1);
            assertThat(joint.proximal()).isEqualTo(segments.get(i - 1).name());
            assertThat(joint.distal()).isEqualTo(segments.get(i).name());
            // exact: a frame's origin is its proximal joint, all axes are parallel in standing
            Vec3 step = limb.poses()
                    .get(joint.proximal())
                    .inversePosition(limb.poses().get(joint.distal()).position());
            assertThat(step.distance(joint.centre().position())).isCloseTo(0, ROUNDING);
            // exact: a segment is as long as it is from its joint to the next one
            if (i > 1) {
                assertThat(segments.get(i - 1).length().value()).isCloseTo(step.norm(), ROUNDING);
            }
        }
    }

    @Test
    void asManySegmentsAsLandmarksAllow() {
        subject.putAllJoints();
        assertThat(names(subject.limb(Side.RIGHT))).hasSize(7);
        subject.remove(Landmark.INTERPHALANGEAL_2);
        assertThat(names(subject.limb(Side.RIGHT))).hasSize(6);
        subject.remove(Landmark.INTERPHALANGEAL_1);
        assertThat(names(subject.limb(Side.RIGHT))).hasSize(5);
        subject.remove(Landmark.METATARSAL_5_BASE);
        assertThat(names(subject.limb(Side.RIGHT))).hasSize(4);
    }

    @Test
    void jointsLieWhereTheirLandmarksAre() {
        subject.putAllJoints();
        subject.segments = OptionalInt.of(6);
        List<Joint> joints = subject.limb(Side.RIGHT).joints();
        assertThat(joints.stream().map(Joint::name))
                .containsExactly(
                        "ankle",
                        "midtarsal",
                        "tarsometatarsal",
                        "metatarsophalangeal",
                        "interphalangeal_1",
                        "interphalangeal_2");
        // exact: middle of the bases (0.065, 0.03, 0.10) from the middle of navicular and cuboid (0.04, 0.0375, 0.10)
        assertAt(joints.get(2).centre().position(), 0.025, -0.0075, 0);
        // exact: along the bases, turned to the right: (-0.02, -0.02, 0.08)
        Vec3 axis = new Vec3(-0.02, -0.02, 0.08).unit();
        assertAt(joints.get(2).axes().get(0).direction(), axis.x(), axis.y(), axis.z());
        assertThat(joints.get(2).axes().get(0).basis()).isEqualTo(Basis.MEASURED);
        // exact: (0.155, 0.018, 0.10) from the middle of the heads (0.125, 0.015, 0.10); then 0.017 on and 0.002 down
        assertAt(joints.get(4).centre().position(), 0.03, 0.003, 0);
        assertAt(joints.get(5).centre().position(), 0.017, -0.002, 0);
        assertThat(joints.get(5).axes().get(0).basis()).isEqualTo(Basis.ASSUMED);
    }

    @Test
    void withoutLandmarksJointsArePutByProportionAndSaidSo() {
        subject.segments = OptionalInt.of(6);
        StandingLimb limb = subject.limb(Side.RIGHT);
        assertThat(codes(limb))
                .containsExactly("midtarsal.regression", "tarsometatarsal.proportion", "interphalangeal.proportion");
        List<Joint> joints = limb.joints();
        // exact: heel (-0.06,-0.035,0) to heads (0.125,-0.06,0): 0.38 and 0.64 of the way
        assertAt(joints.get(2).centre().position(), 0.26 * 0.185, -0.26 * 0.025, 0);
        assertThat(joints.get(2).centre().basis()).isEqualTo(Basis.ASSUMED);
        // exact: heads to toe tip (0.065, 0, 0): 0.52 and 0.79 of the way
        assertAt(joints.get(4).centre().position(), 0.52 * 0.065, 0, 0);
        assertAt(joints.get(5).centre().position(), 0.27 * 0.065, 0, 0);
        // a segment between joints that are put by proportion has a length of that kind
        assertThat(limb.segments().get(2).length().basis()).isEqualTo(Basis.ASSUMED);
        subject.segments = OptionalInt.of(5);
        assertAt(subject.limb(Side.RIGHT).joints().get(4).centre().position(), 0.57 * 0.065, 0, 0);
    }

    @Test
    void toesWithoutTipAreNotSplit() {
        subject.remove(Landmark.TOE_TIP);
        subject.segments = OptionalInt.of(6);
        StandingLimb limb = subject.limb(Side.RIGHT);
        assertThat(names(limb)).containsExactly("shank", "hindfoot", "midfoot", "forefoot", "toes");
        assertThat(limb.findings())
                .filteredOn(f -> f.code().equals("segments.merged"))
                .singleElement()
                .satisfies(f -> assertThat(f.message())
                        .isEqualTo(
                                "the right foot is divided into 4 segments, not the 6 asked for: its landmarks do not"
                                        + " give the others room or a joint (no toe landmark)"));
    }

    @Test
    void proportionsOfPeopleSayNothingAboutAnAnimal() {
        subject.population = Population.OTHER;
        subject.segments = OptionalInt.of(6);
        assertThat(names(subject.limb(Side.RIGHT))).hasSize(4);
        subject.putAllJoints();
        assertThat(names(subject.limb(Side.RIGHT))).hasSize(7);
        subject.remove(Landmark.INTERPHALANGEAL_2);
        assertThat(names(subject.limb(Side.RIGHT))).hasSize(6);
        assertThat(codes(subject.limb(Side.RIGHT))).contains("segments.merged");
    }

    @Test
    void segmentsWithoutRoomAreMerged() {
        subject.putAllJoints();
        // the last joint lies before the tip: nothing is left of the third phalanx
        subject.putBoth(Landmark.INTERPHALANGEAL_2, 0.30, 0.016, 0.10);
        StandingLimb limb = subject.limb(Side.RIGHT);
        assertThat(names(limb)).hasSize(6);
        assertThat(codes(limb)).contains("segments.merged");
    }

    @Test
    void functionalAxisOfTheToesLiesBeforeAndAboveTheHeads() {
        subject.segments = OptionalInt.of(2);
        StandingLimb line = subject.limb(Side.RIGHT);
        subject.choices = new FootChoices(Optional.empty(), true);
        StandingLimb functional = subject.limb(Side.RIGHT);
        Vec3 moved = functional
                .joints()
                .get(1)
                .centre()
                .position()
                .minus(line.joints().get(1).centre().position());
        // published: 16 % of foot length forward, 2 % up [Front Bioeng Biotechnol 2014]; foot 0.25 m long
        assertAt(moved, 0.04, 0.005, 0);
        assertThat(functional.joints().get(1).centre().basis()).isEqualTo(Basis.REGRESSION);
        // exact: the toes' mass is still what lies before the heads
        assertThat(functional.segments().get(2).mass().value())
                .isCloseTo(line.segments().get(2).mass().value(), ROUNDING);
    }

    private static ChainPlan.Part part(
            SegmentName name,
            Optional<ChainPlan.Hinge> joint,
            Optional<ChainPlan.MassShare> mass,
            Landmark... carried) {
        return new ChainPlan.Part(name, joint, new ChainPlan.Shape(0.02, 0.02, 0.02, 0.02), mass, List.of(carried));
    }

    private static ChainPlan digit() {
        return new ChainPlan(
                "digit",
                List.of(
                        part(
                                SegmentName.FOREFOOT,
                                Optional.empty(),
                                Optional.of(new ChainPlan.MassShare(0.01, Basis.MEASURED)),
                                Landmark.CALCANEUS_POSTERIOR,
                                Landmark.METATARSAL_1_HEAD),
                        part(
                                SegmentName.PHALANX_1,
                                Optional.of(new ChainPlan.Hinge(
                                        "fetlock",
                                        new ChainPlan.Place(
                                                Landmark.METATARSAL_1_HEAD, Optional.of(Landmark.METATARSAL_5_HEAD)),
                                        new ChainPlan.Axis.Through(
                                                Landmark.METATARSAL_5_HEAD, Landmark.METATARSAL_1_HEAD))),
                                Optional.empty()),
                        part(
                                SegmentName.PHALANX_2,
                                Optional.of(new ChainPlan.Hinge(
                                        "pastern",
                                        new ChainPlan.Place(Landmark.INTERPHALANGEAL_1, Optional.empty()),
                                        new ChainPlan.Axis.Along(ChainPlan.Direction.ACROSS))),
                                Optional.empty(),
                                Landmark.TOE_TIP)),
                new ChainPlan.Place(Landmark.TOE_TIP, Optional.empty()));
    }

    @Test
    void planOfTheUsersOwnMakesItsChain() {
        subject.putBoth(Landmark.INTERPHALANGEAL_1, 0.155, 0.018, 0.10);
        subject.population = Population.OTHER;
        subject.choices = new FootChoices(Optional.of(digit()), false);
        StandingLimb limb = subject.limb(Side.RIGHT);
        assertThat(names(limb)).containsExactly("shank", "forefoot", "phalanx_1", "phalanx_2");
        assertThat(limb.joints().stream().map(Joint::name)).containsExactly("ankle", "fetlock", "pastern");
        assertThat(limb.joints().stream().map(Joint::kind)).containsOnly(Joint.Kind.HINGE);
        // exact: middle of the heads from the ankle; the axis is turned to the subject's right whatever its order
        assertAt(limb.joints().get(1).centre().position(), 0.125, 0.015 - 0.075, 0);
        assertThat(limb.joints().get(1).axes().get(0).direction().z()).isPositive();
        assertAt(limb.joints().get(2).axes().get(0).direction(), 0, 0, 1);
        assertThat(limb.joints().get(2).axes().get(0).basis()).isEqualTo(Basis.ASSUMED);
        // exact: 1 % of 80 kg where given; else a cylinder of 1100 kg/m3, the polygon has the ellipse's area
        assertThat(limb.segments().get(1).mass().value()).isCloseTo(0.8, ROUNDING);
        assertThat(limb.segments().get(1).mass().basis()).isEqualTo(Basis.MEASURED);
        double length = Math.hypot(0.03, 0.003);
        Segment first = limb.segments().get(2);
        assertThat(first.mass().value()).isCloseTo(1100 * Math.PI * 1e-4 * length, within(1e-9));
        assertThat(first.mass().basis()).isEqualTo(Basis.ASSUMED);
        // exact: a cylinder's centre is its middle, its moment about its own axis m r^2/2 (polygon: 1e-4)
        assertAt(first.centreOfMass().position(), 0.015, 0.0015, 0);
        Vec3 along = new Vec3(0.03, 0.003, 0).unit();
        double about = first.inertia().xx() * along.x() * along.x()
                + first.inertia().yy() * along.y() * along.y()
                + 2 * first.inertia().xy() * along.x() * along.y();
        assertThat(about).isCloseTo(first.mass().value() * 1e-4 / 2, within(1e-4 * about));
        assertThat(codes(limb)).contains("plan.mass-assumed");
        // only what the plan names is carried, beside the shank's
        assertThat(limb.landmarks().stream()
                        .filter(l -> l.segment() != SegmentName.SHANK)
                        .map(LandmarkPosition::name))
                .containsExactly("calcaneus_posterior", "metatarsal_1_head", "toe_tip");
    }

    @Test
    void planWhoseJointHasNoLandmarkIsRefused() {
        subject.choices = new FootChoices(Optional.of(digit()), false);
        assertThat(subject.build(Side.LEFT))
                .isEqualTo(new StandingOutcome.Refused(
                        "the standing trial has no left interphalangeal_1, where the segment plan puts a joint or the tip",
                        "record it, name its label in the landmark map, or change the plan"));
    }

    @Test
    void planOfSegmentsWithoutLengthIsRefused() {
        subject.putBoth(Landmark.INTERPHALANGEAL_1, 0.125, 0.015, 0.10);
        subject.choices = new FootChoices(Optional.of(digit()), false);
        assertThat(subject.build(Side.RIGHT)).isInstanceOf(StandingOutcome.Refused.class);
    }
}
