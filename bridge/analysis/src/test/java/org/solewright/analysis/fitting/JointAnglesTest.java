package org.solewright.analysis.fitting;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Random;
import org.junit.jupiter.api.Test;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Rotation;
import org.solewright.domain.geometry.Vec3;

class JointAnglesTest {

    private static Rotation aboutX(double a) {
        return new Rotation(Vec3.X, new Vec3(0, Math.cos(a), Math.sin(a)), new Vec3(0, -Math.sin(a), Math.cos(a)));
    }

    private static Rotation aboutY(double a) {
        return new Rotation(new Vec3(Math.cos(a), 0, -Math.sin(a)), Vec3.Y, new Vec3(Math.sin(a), 0, Math.cos(a)));
    }

    private static Rotation aboutZ(double a) {
        return new Rotation(new Vec3(Math.cos(a), Math.sin(a), 0), new Vec3(-Math.sin(a), Math.cos(a), 0), Vec3.Z);
    }

    @Test
    void turnsOneAfterTheOtherComeBack() {
        // independent: the turns are composed about known axes, z of the proximal, then x, then y of the distal
        // segment.
        Random random = new Random(3);
        for (int trial = 0; trial < 100; trial++) {
            double a = 3 * (2 * random.nextDouble() - 1);
            double b = 1.3 * (2 * random.nextDouble() - 1);
            double c = 3 * (2 * random.nextDouble() - 1);
            Rotation axes = aboutY(random.nextDouble()).times(aboutX(random.nextDouble()));
            Rotation proximal = aboutX(random.nextDouble()).times(aboutZ(random.nextDouble()));
            Rotation turn = aboutZ(a).times(aboutX(b)).times(aboutY(c));
            Rotation distal = proximal.times(axes).times(turn).times(axes.inverse());
            JointAngles found = JointAngles.of(axes, proximal, distal, Side.RIGHT);
            assertThat(found.dorsiflexion()).isCloseTo(a, within(1e-12));
            assertThat(found.inversion()).isCloseTo(b, within(1e-12));
            assertThat(found.adduction()).isCloseTo(c, within(1e-12));
        }
    }

    @Test
    void toesUpSoleInwardsAndToesInwardsArePositiveOnARightFoot() {
        // exact: with x forward, y up and z right, toes at +x go up; the sole of a right foot, down at -y, turns to the
        // left; toes go to the left, -z.
        assertThat(aboutZ(0.2).transformVector(Vec3.X).y()).isPositive();
        assertThat(aboutX(0.2).transformVector(Vec3.Y.times(-1)).z()).isNegative();
        assertThat(aboutY(0.2).transformVector(Vec3.X).z()).isNegative();
        Rotation still = Rotation.IDENTITY;
        assertThat(JointAngles.of(still, still, aboutZ(0.2), Side.RIGHT).dorsiflexion())
                .isCloseTo(0.2, within(1e-15));
        assertThat(JointAngles.of(still, still, aboutX(0.2), Side.RIGHT).inversion())
                .isCloseTo(0.2, within(1e-15));
        assertThat(JointAngles.of(still, still, aboutY(0.2), Side.RIGHT).adduction())
                .isCloseTo(0.2, within(1e-15));
    }

    @Test
    void leftIsTheMirrorOfRight() {
        // exact: mirroring in the sagittal plane, S = diag(1, 1, -1), makes of a turn R the turn S R S.
        Rotation axes = JointAngles.axes(new Vec3(0.1, 0.05, 1), new Vec3(0.1, 1, 0.2));
        Rotation proximal = aboutX(0.2).times(aboutZ(-0.3));
        Rotation distal = aboutY(0.15).times(aboutZ(0.4)).times(aboutX(-0.1));
        JointAngles right = JointAngles.of(axes, proximal, distal, Side.RIGHT);
        JointAngles left = JointAngles.of(
                JointAngles.axes(new Vec3(-0.1, -0.05, 1), new Vec3(0.1, 1, -0.2)),
                mirrored(proximal),
                mirrored(distal),
                Side.LEFT);
        assertThat(left.dorsiflexion()).isCloseTo(right.dorsiflexion(), within(1e-12));
        assertThat(left.inversion()).isCloseTo(right.inversion(), within(1e-12));
        assertThat(left.adduction()).isCloseTo(right.adduction(), within(1e-12));
    }

    private static Rotation mirrored(Rotation r) {
        return new Rotation(mirrored(r.x()), mirrored(r.y()), mirrored(r.z()).times(-1));
    }

    private static Vec3 mirrored(Vec3 v) {
        return new Vec3(v.x(), v.y(), -v.z());
    }

    @Test
    void standingIsZeroAndASteepFloatingAngleIsNotClear() {
        Rotation turned = aboutY(0.7).times(aboutX(0.2));
        JointAngles standing = JointAngles.of(aboutZ(0.3), turned, turned, Side.LEFT);
        assertThat(standing.dorsiflexion()).isCloseTo(0, within(1e-15));
        assertThat(standing.isClear()).isTrue();
        JointAngles steep =
                JointAngles.of(Rotation.IDENTITY, Rotation.IDENTITY, aboutX(Math.toRadians(81)), Side.RIGHT);
        assertThat(steep.isClear()).isFalse();
    }
}
