package org.solewright.analysis.dynamics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.solewright.analysis.fitting.ArcFit;
import org.solewright.analysis.fitting.FittedPath;
import org.solewright.analysis.fitting.PathFit;
import org.solewright.domain.cost.WalkTruth;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Pose;
import org.solewright.domain.geometry.Rotation;
import org.solewright.domain.geometry.Vec3;
import org.solewright.domain.motion.Recording;

class WalkRecorderTest {

    private static final WalkParameters PARAMETERS =
            new WalkParameters(70, 0.95, 2, 0.22, 0.62, 1.35, 0.4, 0.6, 9.80665);
    private static final Pose IDENTITY = new Pose(new Rotation(Vec3.X, Vec3.Y, Vec3.Z), Vec3.ZERO);
    private static final WalkRecorder.BodyPoint HIP =
            new WalkRecorder.BodyPoint("HIP", Side.RIGHT, WalkRecorder.Carrier.PELVIS, Vec3.ZERO);
    private static final WalkRecorder.BodyPoint ANKLE = new WalkRecorder.BodyPoint(
            "ANK", Side.RIGHT, WalkRecorder.Carrier.SHANK_AND_FOOT, new Vec3(-0.06, -0.1, -0.66));

    private final SyntheticWalk walk = new SyntheticWalk(PARAMETERS);
    private final WalkTruth truth = walk.truth();

    private WalkRecorder recorder(Pose laboratory) {
        return new WalkRecorder(
                walk, new WalkRecorder.Settings("walk", 100, 10, 6, true, 0.1, 0.5, -0.06, -0.66, laboratory));
    }

    @Test
    void loadedPivotStaysOnTheGround() {
        WalkRecorder recorder = recorder(IDENTITY);
        for (int pivot : new int[] {0, 2}) {
            WalkTruth.Place place = truth.pivots().get(pivot);
            WalkRecorder.BodyPoint point = new WalkRecorder.BodyPoint(
                    "P", Side.RIGHT, WalkRecorder.Carrier.SHANK_AND_FOOT, new Vec3(place.x(), 0, place.z()));
            double from = pivot == 0 ? walk.contact(2) : walk.off(2) - walk.doubleSupport();
            double to = from + walk.doubleSupport();
            for (int i = 1; i < 50; i++) {
                Vec3 at = recorder.place(point, from + (to - from) * i / 50);
                // exact: the limb telescopes so that the pivot stays at jD, or jD + f
                assertThat(at.x()).isCloseTo(2 * 0.62 + (pivot == 0 ? 0 : 0.22), within(1e-12));
                assertThat(at.z()).isCloseTo(0, within(1e-12));
            }
        }
    }

    @Test
    void pointsMoveSmoothly() {
        WalkRecorder recorder = recorder(IDENTITY);
        double h = 1e-4;
        double[] last = new double[3];
        for (int i = 0; i < 20000; i++) {
            double t = i * h;
            Vec3 a = recorder.place(ANKLE, t);
            Vec3 b = recorder.place(ANKLE, t + h);
            double vx = (b.x() - a.x()) / h;
            double vz = (b.z() - a.z()) / h;
            if (i > 0) {
                // exact: continuous velocity; accelerations of a swinging ankle stay below 100 m/s2
                assertThat(Math.abs(vx - last[0])).as("at " + t).isLessThan(100 * h);
                assertThat(Math.abs(vz - last[1])).as("at " + t).isLessThan(100 * h);
            }
            last[0] = vx;
            last[1] = vz;
        }
    }

    @Test
    void platformsCatchOneFootfallEach() {
        Recording recording = recorder(IDENTITY).walking(List.of(HIP, ANKLE));
        assertThat(recording.frames()).isEqualTo((int) Math.floor(6 * walk.stepTime() * 100) + 1);
        assertThat(recording.platforms()).hasSize(2);
        PlatformLoads second = recording.platforms().get(1);
        assertThat(second.samples()).isEqualTo(recording.frames() * 10);
        assertThat(second.centre().x()).isCloseTo(3 * 0.62 + 0.11, within(1e-12)); // exact: middle of the foot
        assertThat(second.corners().get(0).distance(second.corners().get(1))).isCloseTo(0.62, within(1e-12));
        for (int sample = 0; sample < second.samples(); sample++) {
            double t = second.time(sample);
            boolean loaded = t > walk.contact(3) && t < walk.off(3);
            assertThat(second.vertical(sample) > 0).as("at " + t).isEqualTo(loaded);
            if (second.vertical(sample) > 20) {
                Vec3 cop = second.centreOfPressure(sample);
                assertThat(cop.x()).isBetween(3 * 0.62 - 1e-9, 3 * 0.62 + 0.22 + 1e-9);
                assertThat(cop.y()).isCloseTo(0.1, within(1e-9)); // exact: the left foot
                assertThat(cop.z()).isCloseTo(0, within(1e-12));
                assertThat(second.freeMoment(sample)).isCloseTo(0, within(1e-9)); // exact: by construction
            }
        }
    }

    @Test
    void pivotsAndRadiusComeBackFromTheLimbFrame() {
        Recording recording = recorder(IDENTITY).walking(List.of(HIP, ANKLE));
        PlatformLoads platform = recording.platforms().get(0);
        WalkRecorder recorder = recorder(IDENTITY);
        List<double[]> path = new ArrayList<>();
        for (int sample = 0; sample < platform.samples(); sample++) {
            double t = platform.time(sample);
            if (platform.vertical(sample) > 50 && t < walk.contact(3)) {
                path.add(limbFrame(recorder, t, platform.centreOfPressure(sample), platform.vertical(sample)));
            }
        }
        double[] x = path.stream().mapToDouble(p -> p[0]).toArray();
        double[] y = path.stream().mapToDouble(p -> p[1]).toArray();
        double[] vertical = path.stream().mapToDouble(p -> p[2]).toArray();
        FittedPath pivots = PathFit.pivots(x, y, PathFit.dwellWeights(x, y, vertical, 0.001, 0.1), 3);
        double[] px = new double[3];
        double[] py = new double[3];
        for (int i = 0; i < 3; i++) {
            px[i] = pivots.x(i);
            py[i] = pivots.y(i);
            // design 04 I6: pivots within 0.5 mm
            assertThat(px[i]).isCloseTo(expectedX(i), within(5e-4));
            assertThat(py[i]).isCloseTo(expectedY(i), within(5e-4));
        }
        // exact: the pivots lie on the vault circle about the hip; 0.5 mm of a pivot move the radius of a short arc by
        // r/x times that, x = 0.11 m
        assertThat(ArcFit.fit(px, py).radius()).isCloseTo(truth.radius(), within(0.05));
    }

    /** Place in the frame with its origin at the ankle and y to the hip, x forward; then the vertical force. */
    private double[] limbFrame(WalkRecorder recorder, double t, Vec3 cop, double vertical) {
        Vec3 ankle = recorder.place(ANKLE, t);
        Vec3 hip = recorder.place(HIP, t);
        double ux = hip.x() - ankle.x();
        double uz = hip.z() - ankle.z();
        double length = Math.hypot(ux, uz);
        double dx = cop.x() - ankle.x();
        double dz = cop.z() - ankle.z();
        return new double[] {(dx * uz - dz * ux) / length, (dx * ux + dz * uz) / length, vertical};
    }

    private double expectedX(int pivot) {
        double dx = truth.pivots().get(pivot).x() + 0.06;
        double dz = truth.pivots().get(pivot).z() + 0.66;
        return (dx * 0.66 - dz * 0.06) / Math.hypot(0.06, 0.66);
    }

    private double expectedY(int pivot) {
        double dx = truth.pivots().get(pivot).x() + 0.06;
        double dz = truth.pivots().get(pivot).z() + 0.66;
        return (dx * 0.06 + dz * 0.66) / Math.hypot(0.06, 0.66);
    }

    @Test
    void laboratoryPoseMovesPointsAndLoadsAlike() {
        Pose turned = new Pose(new Rotation(Vec3.Y, Vec3.Z, Vec3.X), new Vec3(3, 1, 2));
        Recording plain = recorder(IDENTITY).walking(List.of(HIP, ANKLE));
        Recording moved = recorder(turned).walking(List.of(HIP, ANKLE));
        assertThat(moved.points()
                        .get(1)
                        .at(40)
                        .distance(turned.transformPosition(plain.points().get(1).at(40))))
                .isLessThan(1e-12);
        PlatformLoads a = plain.platforms().get(0);
        PlatformLoads b = moved.platforms().get(0);
        int loaded = (int) Math.round(walk.contact(2) * 1000) + 200;
        assertThat(b.force(loaded).distance(turned.transformVector(a.force(loaded))))
                .isLessThan(1e-9);
        assertThat(b.centreOfPressure(loaded).distance(turned.transformPosition(a.centreOfPressure(loaded))))
                .isLessThan(1e-12);
    }

    @Test
    void standingPutsTheLowestPivotOnTheGround() {
        WalkRecorder recorder = recorder(IDENTITY);
        WalkTruth.Place middle = truth.pivots().get(1);
        WalkRecorder.BodyPoint pivot = new WalkRecorder.BodyPoint(
                "P", Side.LEFT, WalkRecorder.Carrier.SHANK_AND_FOOT, new Vec3(middle.x(), 0, middle.z()));
        Recording standing = recorder.standing("stand", 20, List.of(pivot, HIP));
        assertThat(standing.points().get(0).at(7).z()).isCloseTo(0, within(1e-15)); // exact
        assertThat(standing.points().get(1).at(19).z()).isEqualTo(truth.radius());
        assertThat(standing.frames()).isEqualTo(20);
    }
}
