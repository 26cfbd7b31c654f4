package org.solewright.analysis.fitting;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.solewright.domain.geometry.Rotation;
import org.solewright.domain.geometry.Vec3;

class MotionAxisTest {

    private static final Vec3 AXIS = new Vec3(0.2, -0.3, 0.9).unit();

    /** Turn about a unit vector, by the formula of Rodrigues. */
    private static Rotation turn(Vec3 k, double angle) {
        return new Rotation(turned(Vec3.X, k, angle), turned(Vec3.Y, k, angle), turned(Vec3.Z, k, angle));
    }

    private static Vec3 turned(Vec3 v, Vec3 k, double angle) {
        return v.times(Math.cos(angle))
                .plus(k.cross(v).times(Math.sin(angle)))
                .plus(k.times(k.dot(v) * (1 - Math.cos(angle))));
    }

    private static double apart(Vec3 a, Vec3 b) {
        return a.cross(b).norm();
    }

    /** A hinge between two segments that both move freely; the distal one is fixed in it turned by {@code mounted}. */
    private static List<Rotation> hinge(double range, Rotation mounted, double noise, long seed) {
        Random random = new Random(seed);
        List<Rotation> relative = new ArrayList<>();
        for (int i = 0; i < 200; i++) {
            Rotation proximal = turn(new Vec3(1, i / 50.0, 0.3).unit(), 0.02 * i);
            Rotation distal = proximal.times(turn(AXIS, range * (0.5 - 0.5 * Math.cos(2 * Math.PI * i / 200))))
                    .times(mounted);
            Vec3 shake = new Vec3(random.nextGaussian(), random.nextGaussian(), random.nextGaussian());
            Rotation shaken = noise > 0 ? turn(shake.unit(), noise * shake.norm()) : Rotation.IDENTITY;
            relative.add(proximal.inverse().times(distal.times(shaken)));
        }
        return relative;
    }

    @Test
    void axisOfAHingeIsRecoveredWithoutNoise() {
        MotionAxis axis = MotionAxis.of(hinge(Math.toRadians(25), Rotation.IDENTITY, 0, 1))
                .orElseThrow();
        // exact: the axis that the segments were turned about; 1e-6 is asked for, rounding is far below
        assertThat(apart(axis.proximal(), AXIS)).isLessThan(1e-6);
        assertThat(apart(axis.distal(), AXIS)).isLessThan(1e-6);
        assertThat(axis.residual()).isLessThan(1e-6);
        assertThat(axis.range()).isCloseTo(Math.toRadians(25), within(1e-6));
        assertThat(axis.isAccepted()).isTrue();
    }

    @Test
    void standingOffTheHingeDoesNotMoveTheAxisInTheProximalSegment() {
        Rotation mounted = turn(new Vec3(1, 1, 0).unit(), 0.2);
        MotionAxis axis =
                MotionAxis.of(hinge(Math.toRadians(20), mounted, 0, 1)).orElseThrow();
        assertThat(apart(axis.proximal(), AXIS)).isLessThan(1e-6);
        // exact: R_p^T R_d carries the distal direction on the axis: mounted^T a
        assertThat(apart(axis.distal(), mounted.inverseVector(AXIS))).isLessThan(1e-6);
        assertThat(axis.range()).isCloseTo(Math.toRadians(20), within(1e-6));
    }

    @Test
    void noisyAxisLiesWithinItsStandardDeviation() {
        double squares = 0;
        double stated = 0;
        int runs = 100;
        for (int seed = 0; seed < runs; seed++) {
            MotionAxis axis = MotionAxis.of(hinge(Math.toRadians(25), Rotation.IDENTITY, Math.toRadians(0.5), seed))
                    .orElseThrow();
            double off = Math.asin(apart(axis.proximal(), AXIS));
            squares += off * off / runs;
            stated += axis.sd(200) / runs;
            assertThat(axis.isAccepted()).isTrue();
        }
        // independent: scatter over seeded runs of white shaking, whose looks are as many as the frames
        assertThat(Math.sqrt(squares) / stated).isBetween(0.5, 1.5);
    }

    @Test
    void smallOrManyAxedMotionIsNotAccepted() {
        assertThat(MotionAxis.of(hinge(Math.toRadians(8), Rotation.IDENTITY, 0, 1))
                        .orElseThrow()
                        .isAccepted())
                .isFalse();
        List<Rotation> two = new ArrayList<>();
        for (int i = 0; i < 100; i++) {
            two.add(turn(AXIS, 0.4 * Math.sin(0.1 * i)).times(turn(Vec3.X, 0.15 * Math.cos(0.23 * i))));
        }
        MotionAxis axis = MotionAxis.of(two).orElseThrow();
        assertThat(axis.residual()).isGreaterThan(MotionAxis.LARGEST_RESIDUAL);
        assertThat(axis.isAccepted()).isFalse();
    }

    @Test
    void nothingThatTurnsHasNoAxis() {
        assertThat(MotionAxis.of(List.of())).isEmpty();
        assertThat(MotionAxis.of(List.of(Rotation.IDENTITY, Rotation.IDENTITY, Rotation.IDENTITY)))
                .isEmpty();
    }

    @Test
    void meanOfTurnsAboutOneAxisIsTheirMiddle() {
        Rotation mean = MotionAxis.mean(List.of(turn(AXIS, 0.1), turn(AXIS, 0.3)));
        Rotation middle = turn(AXIS, 0.2);
        // exact: by symmetry
        assertThat(mean.x().distance(middle.x())).isLessThan(1e-12);
        assertThat(mean.y().distance(middle.y())).isLessThan(1e-12);
    }
}
