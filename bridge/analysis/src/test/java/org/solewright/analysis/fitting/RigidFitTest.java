package org.solewright.analysis.fitting;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.assertj.core.data.Offset;
import org.junit.jupiter.api.Test;
import org.solewright.domain.geometry.Pose;
import org.solewright.domain.geometry.Rotation;
import org.solewright.domain.geometry.Vec3;

class RigidFitTest {

    /** Rounding of a handful of operations on numbers near one. */
    private static final Offset<Double> ROUNDING = within(1e-12);

    private static final Vec3 LOST = new Vec3(Double.NaN, Double.NaN, Double.NaN);

    private static final List<Vec3> SQUARE =
            List.of(new Vec3(0, 0, 0), new Vec3(1, 0, 0), new Vec3(0, 1, 0), new Vec3(1, 1, 0));

    private static void assertSame(Vec3 actual, Vec3 expected, Offset<Double> tolerance) {
        assertThat(actual.distance(expected)).isCloseTo(0, tolerance);
    }

    @Test
    void quarterTurnOfASquareIsFound() {
        // published: worked example after [Soederkvist Wedin 1993]: R = [[0,-1,0],[1,0,0],[0,0,1]]
        List<Vec3> turned = List.of(new Vec3(0, 0, 0), new Vec3(0, 1, 0), new Vec3(-1, 0, 0), new Vec3(-1, 1, 0));
        RigidFit fit = RigidFit.of(SQUARE, turned).orElseThrow();
        assertSame(fit.pose().rotation().x(), new Vec3(0, 1, 0), ROUNDING);
        assertSame(fit.pose().rotation().y(), new Vec3(-1, 0, 0), ROUNDING);
        assertSame(fit.pose().rotation().z(), new Vec3(0, 0, 1), ROUNDING);
        assertSame(fit.pose().position(), new Vec3(0, 0, 0), ROUNDING);
        assertThat(fit.rms()).isCloseTo(0, ROUNDING);
        assertThat(fit.points()).isEqualTo(4);
    }

    @Test
    void knownPosesComeBackExactly() {
        // independent: the pose is made first, the points are carried by it
        Random random = new Random(20261201);
        for (int trial = 0; trial < 200; trial++) {
            Pose truth = new Pose(
                    Rotation.ofXandZ(vector(random), vector(random)),
                    vector(random).times(3));
            List<Vec3> reference = new ArrayList<>();
            List<Vec3> present = new ArrayList<>();
            for (int i = 0; i < 3 + trial % 4; i++) {
                reference.add(vector(random));
                present.add(truth.transformPosition(reference.get(i)));
            }
            RigidFit fit = RigidFit.of(reference, present).orElseThrow();
            assertSame(fit.pose().position(), truth.position(), within(1e-9));
            assertSame(fit.pose().rotation().x(), truth.rotation().x(), within(1e-9));
            assertSame(fit.pose().rotation().y(), truth.rotation().y(), within(1e-9));
            assertThat(fit.shapeChange()).isCloseTo(0, within(1e-12));
        }
    }

    @Test
    void mirroredPointsDoNotGiveAMirror() {
        List<Vec3> body = List.of(new Vec3(0, 0, 0), new Vec3(1, 0, 0), new Vec3(0, 1, 0), new Vec3(0, 0, 1));
        List<Vec3> mirrored =
                body.stream().map(p -> new Vec3(-p.x(), p.y(), p.z())).toList();
        RigidFit fit = RigidFit.of(body, mirrored).orElseThrow();
        Rotation r = fit.pose().rotation();
        assertThat(r.x().cross(r.y()).dot(r.z())).isCloseTo(1, ROUNDING);
        assertThat(fit.rms()).isGreaterThan(0.1);
        // exact: a reflection keeps all distances
        assertThat(fit.shapeChange()).isCloseTo(0, ROUNDING);
    }

    @Test
    void planarClusterSeenMirroredIsStillARotation() {
        List<Vec3> mirrored =
                SQUARE.stream().map(p -> new Vec3(-p.x(), p.y(), p.z())).toList();
        RigidFit fit = RigidFit.of(SQUARE, mirrored).orElseThrow();
        // exact: in the plane the reflection x -> -x is the half turn about y
        assertThat(fit.rms()).isCloseTo(0, ROUNDING);
        assertSame(fit.pose().rotation().z(), new Vec3(0, 0, -1), ROUNDING);
    }

    @Test
    void lostPointsAreLeftOut() {
        List<Vec3> moved = SQUARE.stream().map(p -> p.plus(new Vec3(0, 0, 2))).toList();
        List<Vec3> gappy = List.of(moved.get(0), LOST, moved.get(2), moved.get(3));
        RigidFit fit = RigidFit.of(SQUARE, gappy).orElseThrow();
        assertThat(fit.points()).isEqualTo(3);
        assertSame(fit.pose().position(), new Vec3(0, 0, 2), ROUNDING);
        assertThat(RigidFit.of(SQUARE, List.of(moved.get(0), LOST, LOST, moved.get(3))))
                .isEmpty();
    }

    @Test
    void pointsOnOneLineDoNotGiveAPose() {
        List<Vec3> line = List.of(new Vec3(0, 0, 0), new Vec3(1, 1, 0), new Vec3(2, 2, 0), new Vec3(5, 5, 0));
        assertThat(RigidFit.of(line, line)).isEmpty();
        assertThat(RigidFit.of(List.of(Vec3.X, Vec3.X, Vec3.X), List.of(Vec3.X, Vec3.X, Vec3.X)))
                .isEmpty();
    }

    @Test
    void stretchedSquareShowsRmsAndChangeOfShape() {
        // exact: half-diagonal r = sqrt(1/2) grows by 10 %, so each corner is off by 0.1 r; four sides change by 0.1,
        // two diagonals by 0.1 sqrt 2: rms of change = sqrt((4 0.01 + 2 0.02)/6)
        List<Vec3> stretched = SQUARE.stream().map(p -> p.times(1.1)).toList();
        RigidFit fit = RigidFit.of(SQUARE, stretched).orElseThrow();
        assertThat(fit.rms()).isCloseTo(0.1 * Math.sqrt(0.5), ROUNDING);
        assertThat(fit.shapeChange()).isCloseTo(Math.sqrt(0.08 / 6), ROUNDING);
    }

    @Test
    void heavyPointsPullTheFit() {
        double[] reference = {0, 0, 0, 1, 0, 0, 0, 1, 0, 1, 1, 0};
        double[] present = {0, 0, 0, 1, 0, 0, 0, 1, 0, 1, 1, 0.4};
        double[] before = present.clone();
        RigidFit even = RigidFit.of(reference, present).orElseThrow();
        RigidFit trusting =
                RigidFit.of(reference, present, new double[] {1, 1, 1, 1e-9}).orElseThrow();
        assertSame(trusting.pose().position(), new Vec3(0, 0, 0), within(1e-8));
        assertThat(even.pose().position().norm()).isGreaterThan(0.01);
        assertThat(present).isEqualTo(before);
    }

    @Test
    void lengthsThatDoNotBelongTogetherAreRefused() {
        assertThatThrownBy(() -> RigidFit.of(new double[9], new double[12]))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessage("rigid fit of 9 to 12 components with 3 weights, expected 3 components to a weight");
    }

    private static Vec3 vector(Random random) {
        return new Vec3(random.nextGaussian(), random.nextGaussian(), random.nextGaussian());
    }
}
