package org.solewright.analysis.fitting;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.solewright.domain.geometry.Pose;
import org.solewright.domain.geometry.Rotation;
import org.solewright.domain.geometry.Vec3;

/** Chains whose truth is made first: thigh, shank, hindfoot, forefoot and toes, the toes on a hinge with one point. */
class ChainFitTest {

    private static final double WEIGHT = 1 / (0.003 * 0.003);
    private static final int TOES = 4;
    private static final Vec3 HINGE = new Vec3(0.2, 0.1, 1).unit();
    private static final List<Vec3> JOINTS = List.of(
            Vec3.ZERO,
            new Vec3(2, 0.5, 0.1),
            new Vec3(2.02, 0.08, 0.1),
            new Vec3(2.07, 0.05, 0.1),
            new Vec3(2.15, 0.02, 0.1));

    private static final ChainModel LIMB = limb(WEIGHT, WEIGHT);

    private static ChainModel limb(double weight, double ofForefoot) {
        return new ChainModel(List.of(
                segment(
                        -1,
                        Optional.empty(),
                        weight,
                        new Vec3(2, 0.9, 0.1),
                        new Vec3(2.05, 0.7, 0.15),
                        new Vec3(1.95, 0.6, 0.2),
                        new Vec3(2.06, 0.55, 0.05)),
                segment(
                        0,
                        Optional.empty(),
                        weight,
                        new Vec3(2.06, 0.4, 0.1),
                        new Vec3(2.04, 0.3, 0.16),
                        new Vec3(1.96, 0.25, 0.13),
                        new Vec3(2.03, 0.09, 0.14)),
                segment(
                        1,
                        Optional.empty(),
                        weight,
                        new Vec3(1.94, 0.03, 0.1),
                        new Vec3(1.98, 0.04, 0.07),
                        new Vec3(1.99, 0.05, 0.13)),
                segment(
                        2,
                        Optional.empty(),
                        ofForefoot,
                        new Vec3(2.08, 0.06, 0.07),
                        new Vec3(2.09, 0.04, 0.14),
                        new Vec3(2.15, 0.03, 0.06),
                        new Vec3(2.13, 0.03, 0.15)),
                segment(3, Optional.of(HINGE), weight, new Vec3(2.2, 0.02, 0.09))));
    }

    private static ChainModel.Segment segment(int parent, Optional<Vec3> hinge, double weight, Vec3... points) {
        return new ChainModel.Segment(parent, JOINTS.get(parent + 1), hinge, List.of(points), weight);
    }

    private static Rotation about(Vec3 axis, double angle) {
        Vec3 u = axis.unit();
        return new Rotation(turned(u, angle, Vec3.X), turned(u, angle, Vec3.Y), turned(u, angle, Vec3.Z));
    }

    private static Vec3 turned(Vec3 u, double angle, Vec3 v) {
        return v.times(Math.cos(angle))
                .plus(u.cross(v).times(Math.sin(angle)))
                .plus(u.times(u.dot(v) * (1 - Math.cos(angle))));
    }

    private static Vec3 vector(Random random) {
        return new Vec3(random.nextGaussian(), random.nextGaussian(), random.nextGaussian());
    }

    /** A swinging limb: smooth turns of every joint, the first segment walking along x. */
    private static List<Pose> truth(double phase) {
        List<Pose> poses = new ArrayList<>();
        poses.add(new Pose(about(new Vec3(0.1, 0.2, 1), 0.5 * Math.sin(phase)), new Vec3(1.5 * phase, 0.02, -0.1)));
        for (int s = 1; s <= TOES; s++) {
            Vec3 axis = s == TOES ? HINGE : new Vec3(0.3 * s, 0.2, 1);
            Rotation own = about(axis, 0.4 * Math.sin(phase + s));
            Pose above = poses.get(s - 1);
            Rotation r = above.rotation().times(own);
            Vec3 joint = JOINTS.get(s);
            poses.add(new Pose(r, above.transformPosition(joint).minus(r.transformVector(joint))));
        }
        return poses;
    }

    private static double[] points(ChainModel model, List<Pose> poses) {
        double[] xyz = new double[3 * model.points()];
        int k = 0;
        for (int s = 0; s < poses.size(); s++) {
            for (Vec3 p : model.segments().get(s).points()) {
                Vec3 here = poses.get(s).transformPosition(p);
                xyz[k++] = here.x();
                xyz[k++] = here.y();
                xyz[k++] = here.z();
            }
        }
        return xyz;
    }

    private static double error(Pose a, Pose b, Vec3 near) {
        return Math.max(
                a.transformPosition(near).distance(b.transformPosition(near)),
                Math.max(
                        a.rotation().x().distance(b.rotation().x()),
                        a.rotation().y().distance(b.rotation().y())));
    }

    private static void assertTrue(ChainFit fit, List<Pose> truth, double tolerance) {
        for (int s = 0; s < truth.size(); s++) {
            assertThat(error(fit.pose(s), truth.get(s), JOINTS.get(Math.max(1, s))))
                    .as("segment " + s)
                    .isLessThan(tolerance);
        }
    }

    @Test
    void knownPosesComeBackFrameAfterFrame() {
        // independent: the poses are made first; the target is 1e-6 m and rad, convergence reaches rounding.
        ChainFit fit = new ChainFit(LIMB);
        for (int frame = 0; frame < 200; frame++) {
            List<Pose> truth = truth(0.03 * frame);
            assertThat(fit.fit(points(LIMB, truth))).isEqualTo(ChainFit.State.DETERMINED);
            assertTrue(fit, truth, 1e-8);
        }
        assertThat(fit.steps()).isLessThan(8);
        assertThat(fit.rms()).isLessThan(1e-8);
    }

    @Test
    void startFromNothingFindsAnyPosture() {
        Random random = new Random(20261201);
        for (int trial = 0; trial < 50; trial++) {
            Pose anywhere = new Pose(Rotation.ofXandZ(vector(random), vector(random)), vector(random));
            List<Pose> truth =
                    truth(6 * random.nextDouble()).stream().map(anywhere::times).toList();
            ChainFit fit = new ChainFit(LIMB);
            assertThat(fit.fit(points(LIMB, truth))).isEqualTo(ChainFit.State.DETERMINED);
            assertTrue(fit, truth, 1e-8);
        }
    }

    @Test
    void jointsHoldSegmentsThatHaveLostPoints() {
        // independent: with ankle and midtarsal joint known, one point of the hindfoot and two of the shank are enough.
        ChainFit fit = new ChainFit(LIMB);
        for (int frame = 0; frame < 100; frame++) {
            List<Pose> truth = truth(0.03 * frame);
            double[] present = points(LIMB, truth);
            for (int lost : new int[] {1, 4, 6, 9, 10}) {
                present[3 * lost + frame % 3] = Double.NaN;
            }
            double[] before = present.clone();
            assertThat(fit.fit(present)).isEqualTo(ChainFit.State.DETERMINED);
            assertTrue(fit, truth, 1e-6);
            assertThat(present).isEqualTo(before);
        }
    }

    @Test
    void segmentWithoutPointsFollowsItsParent() {
        ChainFit fit = new ChainFit(LIMB);
        fit.fit(points(LIMB, truth(0.5)));
        Rotation held = fit.pose(3).rotation().inverse().times(fit.pose(TOES).rotation());
        double[] present = points(LIMB, truth(0.53));
        Arrays.fill(present, present.length - 3, present.length, Double.NaN);
        assertThat(fit.fit(present)).isEqualTo(ChainFit.State.DETERMINED);
        assertThat(fit.isObserved(TOES)).isFalse();
        assertThat(fit.isObserved(3)).isTrue();
        Rotation still = fit.pose(3).rotation().inverse().times(fit.pose(TOES).rotation());
        assertThat(still.x().distance(held.x())).isLessThan(1e-9);
        assertTrue(fit, truth(0.53).subList(0, TOES), 1e-8);
    }

    @Test
    void tooFewPointsAreSaidAndTheNextWholeFrameIsRight() {
        ChainFit fit = new ChainFit(LIMB);
        double[] none = points(LIMB, truth(1));
        Arrays.fill(none, Double.NaN);
        assertThat(fit.fit(none)).isEqualTo(ChainFit.State.UNDETERMINED);
        assertThat(fit.rms()).isNaN();
        double[] two = points(LIMB, truth(1));
        Arrays.fill(two, 6, two.length, Double.NaN);
        assertThat(fit.fit(two)).isEqualTo(ChainFit.State.UNDETERMINED);
        assertThat(fit.fit(points(LIMB, truth(2)))).isEqualTo(ChainFit.State.DETERMINED);
        assertTrue(fit, truth(2), 1e-8);
    }

    @Test
    void deformedClusterOfSmallWeightLeavesTheOthersAlone() {
        // exact: a weight of (0.003/0.03)^2 = 1/100 of the others' lets an error of 10 mm act as one of 0.1 mm would;
        // the
        // same error at full weight draws the chain further off.
        double[] light = deformed(limb(WEIGHT, WEIGHT / 100));
        double[] heavy = deformed(LIMB);
        assertThat(light[2]).isLessThan(0.2 * heavy[2]);
        assertThat(light[1]).isLessThan(0.2 * heavy[1]);
    }

    private static double[] deformed(ChainModel model) {
        ChainFit fit = new ChainFit(model);
        List<Pose> truth = truth(0.4);
        double[] present = points(model, truth);
        int first = 3 * (4 + 4 + 3);
        present[first] += 0.01;
        present[first + 4] -= 0.01;
        assertThat(fit.fit(present)).isEqualTo(ChainFit.State.DETERMINED);
        double[] errors = new double[truth.size()];
        for (int s = 1; s < errors.length; s++) {
            errors[s] = error(fit.pose(s), truth.get(s), JOINTS.get(s));
        }
        return errors;
    }

    @Test
    void neighboursMeetAtTheirJointWhateverThePointsSay() {
        ChainFit fit = new ChainFit(LIMB);
        Random random = new Random(7);
        double[] present = points(LIMB, truth(0.4));
        for (int i = 0; i < present.length; i++) {
            present[i] += 0.01 * random.nextGaussian();
        }
        assertThat(fit.fit(present)).isEqualTo(ChainFit.State.DETERMINED);
        for (int s = 1; s <= TOES; s++) {
            Vec3 joint = JOINTS.get(s);
            assertThat(fit.pose(s)
                            .transformPosition(joint)
                            .distance(fit.pose(s - 1).transformPosition(joint)))
                    .isLessThan(1e-12);
        }
        Vec3 above = fit.pose(3).transformVector(HINGE);
        assertThat(fit.pose(TOES).transformVector(HINGE).distance(above)).isLessThan(1e-12);
    }

    @Test
    void oneSegmentIsTheRigidFit() {
        // independent: the closed form of RigidFit minimises the same sum.
        ChainModel one = new ChainModel(LIMB.segments().subList(0, 1));
        Random random = new Random(11);
        double[] reference = points(one, List.of(new Pose(Rotation.IDENTITY, Vec3.ZERO)));
        double[] present = points(one, truth(1.1).subList(0, 1));
        for (int i = 0; i < present.length; i++) {
            present[i] += 0.005 * random.nextGaussian();
        }
        ChainFit fit = new ChainFit(one);
        fit.fit(present);
        RigidFit rigid = RigidFit.of(reference, present).orElseThrow();
        assertThat(error(fit.pose(0), rigid.pose(), JOINTS.get(1))).isLessThan(1e-8);
        assertThat(fit.rms()).isCloseTo(rigid.rms(), within(1e-10));
    }

    @Test
    void normalEquationsAreThoseOfFiniteDifferences() {
        // independent: the Jacobian by central differences of carried points, step 1e-5: error some 1e-10.
        ChainLayout layout = new ChainLayout(LIMB);
        ChainState at = new ChainState(layout);
        double[] present = points(LIMB, truth(0.9));
        present[3 * 5] = Double.NaN;
        at.place(truth(0.6).stream().map(Pose::rotation).toList(), present);
        int n = layout.parameters;
        double[] normal = new double[n * n];
        double[] right = new double[n];
        at.normalEquations(normal, right);
        double[][] jacobian = new double[n][];
        double[] here = carried(layout, at);
        for (int i = 0; i < n; i++) {
            double[] up = moved(layout, at, i, 1e-5);
            double[] down = moved(layout, at, i, -1e-5);
            jacobian[i] = new double[up.length];
            for (int k = 0; k < up.length; k++) {
                jacobian[i][k] = Double.isNaN(present[3 * (k / 3)]) ? 0 : (up[k] - down[k]) / 2e-5;
            }
        }
        for (int i = 0; i < n; i++) {
            double gradient = 0;
            for (int k = 0; k < here.length; k++) {
                gradient += jacobian[i][k] == 0 ? 0 : WEIGHT * jacobian[i][k] * (present[k] - here[k]);
            }
            assertThat(right[i]).as("right side " + i).isCloseTo(gradient, within(1e-7 * WEIGHT));
            for (int j = 0; j <= i; j++) {
                double sum = 0;
                for (int k = 0; k < here.length; k++) {
                    sum += WEIGHT * jacobian[i][k] * jacobian[j][k];
                }
                assertThat(normal[i * n + j]).as("normal " + i + "," + j).isCloseTo(sum, within(1e-7 * WEIGHT));
            }
        }
    }

    private static double[] moved(ChainLayout layout, ChainState at, int parameter, double by) {
        double[] step = new double[layout.parameters];
        step[parameter] = by;
        ChainState to = new ChainState(layout);
        to.moved(at, step);
        return carried(layout, to);
    }

    private static double[] carried(ChainLayout layout, ChainState state) {
        double[] xyz = new double[3 * layout.points];
        for (int k = 0; k < layout.points; k++) {
            state.carried(k, xyz, 3 * k);
        }
        return xyz;
    }

    @Test
    void trackingLeavesOutWhatIsNotKnown() {
        List<double[]> tracks = new ArrayList<>();
        for (int k = 0; k < LIMB.points(); k++) {
            tracks.add(new double[9]);
        }
        for (int frame = 0; frame < 3; frame++) {
            double[] here = points(LIMB, truth(0.1 * frame));
            for (int k = 0; k < tracks.size(); k++) {
                for (int c = 0; c < 3; c++) {
                    tracks.get(k)[3 * frame + c] = frame == 1 ? Double.NaN : here[3 * k + c];
                }
            }
        }
        ChainTracking tracking = ChainTracking.of(LIMB, tracks, 3);
        assertThat(tracking.determined()).isEqualTo(2);
        assertThat(tracking.pose(0, 1)).isEmpty();
        assertThat(tracking.pose(0, 3)).isEmpty();
        assertThat(error(tracking.pose(2, 2).orElseThrow(), truth(0.2).get(2), JOINTS.get(2)))
                .isLessThan(1e-8);
    }

    @Test
    void brokenPromisesAreNamed() {
        ChainFit fit = new ChainFit(LIMB);
        assertThatThrownBy(() -> fit.fit(new double[5])).hasMessageContaining("5 components for a chain of 16 points");
        assertThatThrownBy(() -> new ChainModel(List.of())).hasMessageContaining("0 segments");
        assertThatThrownBy(() -> new ChainModel(LIMB.segments().subList(1, 2)))
                .hasMessageContaining("segment 0 hangs on segment 0");
        assertThatThrownBy(() -> segment(0, Optional.of(new Vec3(0, 0, 2)), 1)).hasMessageContaining("length 2.0");
        assertThatThrownBy(() -> segment(0, Optional.empty(), 0)).hasMessageContaining("weight 0.0");
        assertThatThrownBy(() -> ChainTracking.of(LIMB, List.of(), 3)).hasMessageContaining("0 tracks");
    }
}
