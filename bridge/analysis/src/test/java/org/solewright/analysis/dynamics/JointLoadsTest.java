package org.solewright.analysis.dynamics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.assertj.core.data.Offset;
import org.junit.jupiter.api.Test;
import org.solewright.domain.foot.InertiaTensor;
import org.solewright.domain.geometry.Pose;
import org.solewright.domain.geometry.Rotation;
import org.solewright.domain.geometry.Vec3;

/** Inverse dynamics of chains: closed cases, a textbook example, a simulated running stride with known moments. */
class JointLoadsTest {

    private static final double G = 9.80665;
    private static final Vec3 GRAVITY = new Vec3(0, -G, 0);
    private static final InertiaTensor ROD = InertiaTensor.principal(0.02, 0.001, 0.02);

    private static Rotation turned(double a) {
        return new Rotation(new Vec3(Math.cos(a), Math.sin(a), 0), new Vec3(-Math.sin(a), Math.cos(a), 0), Vec3.Z);
    }

    private static SegmentState still(Vec3 place) {
        Pose x = new Pose(Rotation.IDENTITY, place);
        return SegmentState.of(x, x, x, 0.01, Vec3.ZERO);
    }

    private static void close(Vec3 actual, Vec3 expected, double tolerance) {
        Offset<Double> t = within(tolerance);
        assertThat(actual.x()).as("x of " + actual).isCloseTo(expected.x(), t);
        assertThat(actual.y()).as("y of " + actual).isCloseTo(expected.y(), t);
        assertThat(actual.z()).as("z of " + actual).isCloseTo(expected.z(), t);
    }

    @Test
    void standingFootLoadsTheAnkleAsInTheTextbook() {
        // published: [Winter 2009] example 5.1: 588 N 4 cm before the ankle, foot of 0.9 kg with its centre 6 cm before
        // it,
        // g 9.8 m/s2: R = -579.2 N, M = 588 x 0.02 - 579.2 x 0.06 = -22.99 N m (two digits printed).
        Vec3 ankle = new Vec3(0, 0.1, 0);
        Wrench ground = new Wrench(new Vec3(0, 588, 0), Vec3.ZERO, new Vec3(0.04, 0, 0));
        ChainLink foot = new ChainLink(0.9, ROD, still(new Vec3(0.06, 0.04, 0)), ankle, ground);
        Wrench load = JointLoads.of(List.of(foot), new Vec3(0, -9.8, 0)).on(0);
        assertThat(load.force().y()).isCloseTo(-579.2, within(0.05));
        assertThat(load.moment().z()).isCloseTo(-22.99, within(0.005));
    }

    @Test
    void standingChainBearsItsWeightAlone() {
        // exact: statics. Two links of 2 kg and 1 kg hang from the origin with their centres 0.1 m and 0.3 m aside:
        // F = 3 g, M = g (2 x 0.1 + 1 x 0.3) about z.
        ChainLink upper = new ChainLink(2, ROD, still(new Vec3(0.1, -0.2, 0)), Vec3.ZERO, Wrench.NONE);
        ChainLink lower = new ChainLink(1, ROD, still(new Vec3(0.3, -0.5, 0)), new Vec3(0.2, -0.4, 0), Wrench.NONE);
        JointLoads loads = JointLoads.of(List.of(upper, lower), GRAVITY);
        close(loads.on(0).force(), new Vec3(0, 3 * G, 0), 1e-12);
        close(loads.on(0).moment(), new Vec3(0, 0, G * 0.5), 1e-12);
        close(loads.on(1).moment(), new Vec3(0, 0, G * 0.1), 1e-12);
        assertThat(loads.power(1)).isZero();
    }

    @Test
    void freeFallLoadsNoJoint() {
        // exact: x = v t, y = -g t^2/2; the second difference of a parabola is exact.
        double h = 0.01;
        List<Pose> x = new ArrayList<>();
        for (int i = -1; i <= 1; i++) {
            double t = i * h;
            x.add(new Pose(turned(0.3), new Vec3(2 * t, 5 - G * t * t / 2, 0)));
        }
        SegmentState state = SegmentState.of(x.get(0), x.get(1), x.get(2), h, new Vec3(0.05, -0.1, 0.02));
        Wrench load = JointLoads.of(
                        List.of(new ChainLink(3, ROD, state, x.get(1).position(), Wrench.NONE)), GRAVITY)
                .on(0);
        // tolerance: rounding of positions of 5 m over h^2 = 1e-4 s2: 1e-15 x 5/1e-4 x 3 kg
        close(load.force(), Vec3.ZERO, 1e-9);
        close(load.moment(), Vec3.ZERO, 1e-9);
    }

    @Test
    void rodOnAHingeIsPulledInwardsAndHeldAgainstItsWeight() {
        // exact: rate w, centre at r from the hinge: F = -m w^2 r (radial) x (2 (1 - cos wh)/(wh)^2) of the second
        // difference, plus m g upwards; M about the hinge = r x m g.
        double w = 3;
        double h = 1e-3;
        double m = 1.5;
        Vec3 centre = new Vec3(0.4, 0, 0);
        double angle = 0.7;
        SegmentState state = SegmentState.of(
                new Pose(turned(angle - w * h), Vec3.ZERO),
                new Pose(turned(angle), Vec3.ZERO),
                new Pose(turned(angle + w * h), Vec3.ZERO),
                h,
                centre);
        close(state.w(), new Vec3(0, 0, w), 1e-10);
        close(state.wRate(), Vec3.ZERO, 1e-7);
        close(state.velocityAt(Vec3.ZERO), Vec3.ZERO, 0.4 * w * w * w * h * h);
        Wrench load = JointLoads.of(List.of(new ChainLink(m, ROD, state, Vec3.ZERO, Wrench.NONE)), GRAVITY)
                .on(0);
        double shrunk = 2 * (1 - Math.cos(w * h)) / (w * w * h * h);
        Vec3 r = turned(angle).transformVector(centre);
        close(load.force(), r.times(-m * w * w * shrunk).plus(new Vec3(0, m * G, 0)), 1e-8);
        close(load.moment(), r.cross(new Vec3(0, m * G, 0)), 1e-8);
    }

    @Test
    void spinningBodyNeedsTheMomentOfEuler() {
        // exact: a body that turns evenly about an axis fixed in space and not principal needs M = w x I w.
        double h = 1e-3;
        InertiaTensor skew = new InertiaTensor(0.03, 0.05, 0.04, 0, 0.01, 0);
        double w = 4;
        SegmentState state = SegmentState.of(
                new Pose(turned(-w * h), Vec3.ZERO),
                new Pose(Rotation.IDENTITY, Vec3.ZERO),
                new Pose(turned(w * h), Vec3.ZERO),
                h,
                Vec3.ZERO);
        Wrench load = JointLoads.of(List.of(new ChainLink(1, skew, state, Vec3.ZERO, Wrench.NONE)), Vec3.ZERO)
                .on(0);
        // w e_z x (I_xz w, 0, I_zz w) = (0, I_xz w^2, 0)
        close(load.moment(), new Vec3(0, 0.01 * w * w, 0), 1e-7);
    }

    @Test
    void jointPowerIsTheGainOfEnergyOfBothSegments() {
        // independent: energy balance. Two rods on a fixed hinge turn with given accelerations; joint powers, that of
        // the
        // hinge on the ground included, are the rate of their energy.
        double h = 1e-4;
        double l = 0.4;
        List<JointLoads> loads = new ArrayList<>();
        double[] energy = new double[3];
        double power = Double.NaN;
        for (int k = -1; k <= 1; k++) {
            List<ChainLink> links = links(0.3 + k * h, h, l);
            for (ChainLink link : links) {
                SegmentState s = link.state();
                energy[k + 1] += link.mass()
                                * (s.velocity().dot(s.velocity()) / 2
                                        + G * s.centreOfMass().y())
                        + 0.02 * s.w().z() * s.w().z() / 2;
            }
            JointLoads of = JointLoads.of(links, GRAVITY);
            loads.add(of);
            if (k == 0) {
                power = of.power(1) + of.on(0).moment().dot(links.get(0).state().w());
            }
        }
        // tolerance: differences of order h^2 and rounding over h
        assertThat((energy[2] - energy[0]) / (2 * h)).isCloseTo(power, within(1e-4));
        assertThat(Math.abs(power)).isGreaterThan(0.1);
    }

    private static List<ChainLink> links(double t, double h, double l) {
        Vec3 centre = new Vec3(0, -l / 2, 0);
        List<List<Pose>> poses = List.of(new ArrayList<>(), new ArrayList<>());
        for (int i = -1; i <= 1; i++) {
            double s = t + i * h;
            Pose upper = new Pose(turned(0.5 * s + 0.8 * s * s), Vec3.ZERO);
            poses.get(0).add(upper);
            poses.get(1).add(new Pose(turned(Math.sin(3 * s)), upper.transformPosition(new Vec3(0, -l, 0))));
        }
        List<ChainLink> links = new ArrayList<>();
        for (List<Pose> p : poses) {
            SegmentState state = SegmentState.of(p.get(0), p.get(1), p.get(2), h, centre);
            links.add(new ChainLink(1.2, ROD, state, p.get(1).position(), Wrench.NONE));
        }
        return links;
    }

    @Test
    void segmentOfNegativeMassIsRefused() {
        org.assertj.core.api.Assertions.assertThatThrownBy(
                        () -> new ChainLink(-1, ROD, still(Vec3.ZERO), Vec3.ZERO, Wrench.NONE))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessageContaining("-1.0 kg");
    }

    // The shared simulated running stride: thigh, shank, foot.
    private static final double[] MASS = {6.85, 2.86, 1.00};
    private static final double[] INERTIA = {0.145361267, 0.042996389, 0.0200};
    private static final double[] CENTRE = {0.4323725, 0.4334975, 0};

    private static Optional<Path> stride() {
        for (Path p = Path.of("").toAbsolutePath(); p != null; p = p.getParent()) {
            if (Files.isRegularFile(p.resolve("shared/gait/inverse-dynamics/all.kin"))) {
                return Optional.of(p.resolve("shared/gait/inverse-dynamics"));
            }
        }
        return Optional.empty();
    }

    private static double[][] table(Path file) throws IOException {
        return Files.readAllLines(file).stream()
                .map(line -> java.util.Arrays.stream(line.strip().split("\\s+"))
                        .mapToDouble(Double::parseDouble)
                        .toArray())
                .toArray(double[][]::new);
    }

    @Test
    void momentsOfASimulatedStrideAreTheTrueOnes() throws IOException {
        Optional<Path> data = stride();
        assumeTrue(data.isPresent(), "the shared gait data are not beside this checkout");
        double[][] kin = table(data.get().resolve("all.kin"));
        double[][] load = table(data.get().resolve("all.frc"));
        double[][] truth = table(data.get().resolve("all.mom"));
        double h = 1e-4;
        double[] squares = new double[3];
        int n = 0;
        for (int row = 2750; row < 5500; row++) {
            List<ChainLink> chain = new ArrayList<>();
            for (int s = 0; s < 3; s++) {
                Pose[] x = {pose(kin[row - 1], s), pose(kin[row], s), pose(kin[row + 1], s)};
                double length = joint(kin[row], s).distance(joint(kin[row], s + 1));
                SegmentState state = SegmentState.of(x[0], x[1], x[2], h, new Vec3(0, -CENTRE[s] * length, 0));
                Wrench ground = s < 2
                        ? Wrench.NONE
                        : new Wrench(new Vec3(load[row][0], load[row][1], 0), Vec3.ZERO, new Vec3(load[row][2], 0, 0));
                chain.add(new ChainLink(
                        MASS[s], InertiaTensor.principal(0, 0, INERTIA[s]), state, joint(kin[row], s), ground));
            }
            JointLoads loads = JointLoads.of(chain, new Vec3(0, -9.81, 0));
            for (int s = 0; s < 3; s++) {
                double d = loads.on(s).moment().z() - truth[row][s];
                squares[s] += d * d;
            }
            n++;
        }
        for (int s = 0; s < 3; s++) {
            // independent: the simulation's own moments; 0.3 N m is the bound of the data's README.
            assertThat(Math.sqrt(squares[s] / n)).as("joint " + s).isLessThan(0.3);
        }
    }

    private static Vec3 joint(double[] row, int joint) {
        return new Vec3(row[2 * joint], row[2 * joint + 1], 0);
    }

    private static Pose pose(double[] row, int segment) {
        Vec3 up = joint(row, segment).minus(joint(row, segment + 1)).unit();
        return new Pose(Rotation.ofYandX(up, new Vec3(up.y(), -up.x(), 0)), joint(row, segment));
    }
}
