package org.solewright.analysis.fitting;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import org.assertj.core.data.Offset;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.solewright.analysis.fitting.TetrahedralSolid.Section;
import org.solewright.domain.foot.InertiaTensor;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.foot.Segment;
import org.solewright.domain.foot.SegmentName;
import org.solewright.domain.foot.Sex;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Vec3;

class FootSplitTest {

    private static Offset<Double> share(double of, double part) {
        return within(Math.abs(of) * part);
    }

    @ParameterizedTest
    @ValueSource(ints = {2, 3, 4, 5, 6})
    void partsRecombineToTheRigidFoot(int parts) {
        recombine(new InventedSubject(), parts);
        InventedSubject landmarked = new InventedSubject();
        landmarked.putAllJoints();
        recombine(landmarked, parts);
    }

    private static void recombine(InventedSubject subject, int parts) {
        subject.segments = OptionalInt.of(1);
        StandingLimb whole = subject.limb(Side.RIGHT);
        Segment foot = whole.segments().get(1);
        subject.segments = OptionalInt.of(parts);
        StandingLimb split = subject.limb(Side.RIGHT);
        assertThat(split.segments()).hasSize(parts + 1);

        double mass = 0;
        Vec3 first = Vec3.ZERO;
        for (Segment s : split.segments().subList(1, parts + 1)) {
            assertThat(s.mass().value()).as(s.name().word()).isPositive();
            InertiaTensor t = s.inertia();
            // exact: of any body each moment is less than the sum of the two others
            assertThat(t.xx()).isLessThan(t.yy() + t.zz());
            assertThat(t.yy()).isLessThan(t.xx() + t.zz());
            assertThat(t.zz()).isLessThan(t.xx() + t.yy());
            mass += s.mass().value();
            first = first.plus(inFoot(split, s).times(s.mass().value()));
        }
        // exact: mechanics; 1e-9 relative is rounding with room
        assertThat(mass).isCloseTo(foot.mass().value(), share(mass, 1e-9));
        Vec3 centre = first.times(1 / mass);
        assertThat(centre.distance(foot.centreOfMass().position())).isCloseTo(0, within(1e-10));

        InertiaTensor total = InertiaTensor.principal(0, 0, 0);
        for (Segment s : split.segments().subList(1, parts + 1)) {
            total = total.plus(
                    s.inertia().shifted(s.mass().value(), inFoot(split, s).minus(centre)));
        }
        InertiaTensor expected = foot.inertia();
        double scale = 1e-9 * expected.yy();
        assertThat(total.xx()).isCloseTo(expected.xx(), within(scale));
        assertThat(total.yy()).isCloseTo(expected.yy(), within(scale));
        assertThat(total.zz()).isCloseTo(expected.zz(), within(scale));
        assertThat(total.xy()).isCloseTo(expected.xy(), within(scale));
        assertThat(total.xz()).isCloseTo(expected.xz(), within(scale));
        assertThat(total.yz()).isCloseTo(expected.yz(), within(scale));
    }

    /** Centre of mass in the ankle frame. */
    private static Vec3 inFoot(StandingLimb limb, Segment s) {
        Vec3 p = limb.poses().get(s.name()).transformPosition(s.centreOfMass().position());
        SegmentName rear = limb.segments().get(1).name();
        return limb.poses().get(rear).inversePosition(p);
    }

    @Test
    void frustumHasTheVolumeOfTheClosedForm() {
        Section rear = new Section(0, 0, 0, 0.03, 0.02);
        Section front = new Section(0.2, 0.01, 0.02, 0.01, 0.04);
        double volume = TetrahedralSolid.frusta(List.of(rear, front)).moments().mass();
        // exact: half axes linear in x: pi h (a1 b1 + a2 b2 + (a1 b2 + a2 b1)/2)/3; the polygons have the ellipses'
        // area
        double expected = Math.PI * 0.2 / 3 * (0.03 * 0.02 + 0.01 * 0.04 + (0.03 * 0.04 + 0.01 * 0.02) / 2);
        assertThat(volume).isCloseTo(expected, share(expected, 1e-4));
    }

    @Test
    void ellipticCylinderHasTheTensorOfTheClosedForm() {
        Section rear = new Section(-0.1, 0.3, -0.2, 0.03, 0.02);
        Section front = new Section(0.1, 0.3, -0.2, 0.03, 0.02);
        BodyMoments m = TetrahedralSolid.frusta(List.of(rear, front)).moments();
        // exact: Ixx = m (a^2+b^2)/4, Iyy = m (h^2/12 + width^2/4); a polygon of 48 sides departs by less than 1e-4
        assertThat(m.centre().distance(new Vec3(0, 0.3, -0.2))).isCloseTo(0, within(1e-12));
        assertThat(m.inertia().xx() / m.mass()).isCloseTo((9e-4 + 4e-4) / 4, share(3.25e-4, 1e-4));
        assertThat(m.inertia().yy() / m.mass()).isCloseTo(0.04 / 12 + 4e-4 / 4, share(3.4e-3, 1e-4));
        assertThat(m.inertia().zz() / m.mass()).isCloseTo(0.04 / 12 + 9e-4 / 4, share(3.6e-3, 1e-4));
    }

    @Test
    void bothSidesOfACutSumToTheWhole() {
        TetrahedralSolid solid = TetrahedralSolid.frusta(List.of(
                new Section(0, 0, 0, 0.03, 0.02),
                new Section(0.1, 0.01, 0, 0.02, 0.03),
                new Section(0.2, 0, 0, 0.01, 0.01)));
        Vec3 normal = new Vec3(1, 0.3, -0.4);
        Vec3 point = new Vec3(0.08, 0, 0);
        double behind = solid.behind(point, normal).moments().mass();
        double ahead = solid.behind(point, normal.times(-1)).moments().mass();
        double whole = solid.moments().mass();
        assertThat(behind).isBetween(0.2 * whole, 0.8 * whole);
        assertThat(behind + ahead).isCloseTo(whole, share(whole, 1e-12));
        assertThat(solid.behind(new Vec3(1, 0, 0), Vec3.X).moments().mass()).isCloseTo(whole, share(whole, 1e-12));
        assertThat(solid.behind(new Vec3(-1, 0, 0), Vec3.X).moments().mass()).isZero();
    }

    @Test
    void symmetricMapTurnsOneSpreadIntoTheOther() {
        double[][] p = {{4, 1, 0.2}, {1, 3, 0.1}, {0.2, 0.1, 2}};
        double[][] q = {{2, -0.3, 0}, {-0.3, 5, 0.4}, {0, 0.4, 1}};
        SymmetricMap a = SymmetricMap.between(p, q).orElseThrow();
        for (int i = 0; i < 3; i++) {
            for (int j = 0; j < 3; j++) {
                double sum = 0;
                for (int k = 0; k < 3; k++) {
                    for (int l = 0; l < 3; l++) {
                        sum += a.entry(i, k) * p[k][l] * a.entry(l, j);
                    }
                }
                assertThat(sum).isCloseTo(q[i][j], within(1e-12));
                assertThat(a.entry(i, j)).isCloseTo(a.entry(j, i), within(1e-14));
            }
        }
        assertThat(SymmetricMap.between(p, new double[][] {{1, 0, 0}, {0, 1, 0}, {0, 0, 0}}))
                .isEmpty();
    }

    @Test
    void jointPlaneOutsideTheFootIsRefused() {
        InventedSubject subject = new InventedSubject();
        subject.putBoth(Landmark.TOE_TIP, 0.10, 0.015, 0.10);
        subject.segments = OptionalInt.of(2);
        assertThat(subject.build(Side.RIGHT))
                .isEqualTo(new StandingOutcome.Refused(
                        "the right foot's landmarks do not leave room for 2 segments",
                        "check the landmarks of toe, metatarsal heads and midfoot, or use --segments 1"));
    }

    @Test
    void tableOfDeLevaGivesTheWorkedExample() {
        // published: [de Leva 1996] male, 73.0 kg, foot 0.2581 m, shank 0.4340 m; worked in the handbook, 0.5 %
        SegmentInertia foot = SegmentInertia.foot(InertiaTable.DE_LEVA, Optional.of(Sex.MALE));
        assertThat(foot.mass() * 73.0).isCloseTo(1.0001, within(5e-5));
        InertiaTensor t = foot.tensor(foot.mass() * 73.0, 0.2581);
        assertThat(t.yy()).isCloseTo(0.004400, share(0.0044, 0.005));
        assertThat(t.zz()).isCloseTo(0.003999, share(0.004, 0.005));
        assertThat(t.xx()).isCloseTo(0.001024, share(0.001, 0.005));
        SegmentInertia shank = SegmentInertia.shank(InertiaTable.DE_LEVA, Optional.of(Sex.FEMALE));
        assertThat(shank.mass() * 61.9).isCloseTo(2.9774, within(5e-5));
        InertiaTensor u = shank.tensor(shank.mass() * 61.9, 0.4323);
        assertThat(u.yy()).isCloseTo(0.039667, share(0.04, 0.005));
        assertThat(u.zz()).isCloseTo(0.038487, share(0.04, 0.005));
        assertThat(u.xx()).isCloseTo(0.00471, share(0.0047, 0.005));
    }

    @Test
    void solidThatHardlyFitsTheRegressionIsAFinding() {
        InventedSubject subject = new InventedSubject();
        assertThat(subject.limb(Side.RIGHT).findings()).isEmpty();
        subject.putBoth(Landmark.METATARSAL_1_HEAD, 0.135, 0.02, 0.085);
        subject.putBoth(Landmark.METATARSAL_5_HEAD, 0.115, 0.01, 0.115);
        assertThat(subject.limb(Side.RIGHT).findings())
                .singleElement()
                .satisfies(f -> assertThat(f.code()).isEqualTo("inertia.solid-distorted"));
    }
}
