package org.solewright.analysis.cost;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.geometry.Pose;
import org.solewright.domain.geometry.Rotation;
import org.solewright.domain.geometry.Vec3;

class DistalWorkTest {

    private static final double RATE = 1000;

    /** A platform of 1 m about the origin with a constant force at a place. */
    private static PlatformLoads platform(Vec3 force, Vec3 place, int samples) {
        double[] f = new double[3 * samples];
        double[] m = new double[3 * samples];
        Vec3 moment = place.cross(force);
        for (int i = 0; i < samples; i++) {
            put(f, i, force);
            put(m, i, moment);
        }
        List<Vec3> corners =
                List.of(new Vec3(0.5, 0.5, 0), new Vec3(-0.5, 0.5, 0), new Vec3(-0.5, -0.5, 0), new Vec3(0.5, -0.5, 0));
        return new PlatformLoads(1, 2, corners, Vec3.Z, RATE, 0, true, f, m);
    }

    private static void put(double[] xyz, int i, Vec3 v) {
        xyz[3 * i] = v.x();
        xyz[3 * i + 1] = v.y();
        xyz[3 * i + 2] = v.z();
    }

    private static Pose turned(double angle, Vec3 at) {
        // About the laboratory's y: x goes to (cos, 0, -sin).
        Rotation r = new Rotation(
                new Vec3(Math.cos(angle), 0, -Math.sin(angle)), Vec3.Y, new Vec3(Math.sin(angle), 0, Math.cos(angle)));
        return new Pose(r, at);
    }

    @Test
    void plantedSegmentDoesNoWorkAndASlidingOneLosesFriction() {
        PlatformLoads platform = platform(new Vec3(-280, 0, 700), new Vec3(0.1, 0.05, 0), 1001);
        Pose still = turned(0.3, new Vec3(0.1, 0, 0.4));
        PowerWork none = new DistalWork(i -> Optional.of(still), 200, 0, Vec3.ZERO)
                .over(platform, 0, 0.1, 0.9)
                .orElseThrow();
        assertThat(none.positive()).isZero();
        assertThat(none.negative()).isZero();
        // exact: -280 N against 0.5 m/s forward over 0.8 s: -112 J. A belt that moves with the segment takes it away.
        DistalWork sliding =
                new DistalWork(i -> Optional.of(turned(0.3, new Vec3(0.5 * i / 200, 0, 0.4))), 200, 0, Vec3.ZERO);
        assertThat(sliding.over(platform, 0, 0.1, 0.9).orElseThrow().negative()).isCloseTo(-112, within(1e-9));
        DistalWork onBelt = new DistalWork(
                i -> Optional.of(turned(0.3, new Vec3(0.5 * i / 200, 0, 0.4))), 200, 0, new Vec3(0.5, 0, 0));
        assertThat(onBelt.over(platform, 0, 0.1, 0.9).orElseThrow().negative()).isCloseTo(0, within(1e-9));
    }

    @Test
    void segmentThatTurnsAboutAnAnkleAboveTheLoadDoesTheMomentsWork() {
        // exact: a shank that turns at 0.4 rad/s about an ankle at 0.1 m over the load: F of 700 N through a point 0.05
        // m in
        // front of it has the moment -35 N m about y, so -14 W, over 0.5 s -7 J; the turn is the plain central
        // difference.
        PlatformLoads platform = platform(new Vec3(0, 0, 700), new Vec3(0.05, 0, 0), 1001);
        DistalWork turning =
                new DistalWork(i -> Optional.of(turned(0.4 * i / 1000, new Vec3(0, 0, 0.1))), 1000, 0, Vec3.ZERO);
        assertThat(turning.over(platform, 0, 0.2, 0.7).orElseThrow().negative()).isCloseTo(-7, within(1e-5));
    }

    @Test
    void unknownPosesGiveNoWork() {
        PlatformLoads platform = platform(new Vec3(0, 0, 700), Vec3.ZERO, 1001);
        DistalWork lost =
                new DistalWork(i -> i == 100 ? Optional.empty() : Optional.of(turned(0, Vec3.ZERO)), 200, 0, Vec3.ZERO);
        assertThat(lost.over(platform, 10, 0.1, 0.9)).isEmpty();
    }
}
