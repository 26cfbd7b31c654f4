package org.solewright.analysis.cost;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.solewright.analysis.dynamics.SyntheticWalk;
import org.solewright.analysis.dynamics.WalkParameters;
import org.solewright.analysis.gait.FootTracks;
import org.solewright.analysis.gait.GaitSettings;
import org.solewright.analysis.gait.Mirror;
import org.solewright.analysis.gait.Pass;
import org.solewright.analysis.gait.Step;
import org.solewright.analysis.gait.StepFinder;
import org.solewright.analysis.gait.WalkingTrial;
import org.solewright.domain.cost.Measure;
import org.solewright.domain.cost.WalkTruth;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Vec3;

/**
 * A walk whose truth is known by construction (design 04 I), analysed as a recording. Expected numbers are those of the
 * construction: works by fine quadrature of F . v, times and lengths by definition; tolerances are those of 04 I6.
 */
class InventedWalkTest {

    private static final double RATE = 200;
    private static final double LOAD_RATE = 1000;
    private static final int STEPS = 6;
    // Laboratory: x forward, y left, z up.
    private static final WalkParameters PARAMETERS =
            new WalkParameters(70, 0.95, 2, 0.22, 0.62, 1.35, 0.4, 0.6, GaitSettings.STANDARD_GRAVITY);

    private static WalkTruth truth;
    private static Pass pass;
    private static List<Step> steps;
    private static final List<Finding> FINDINGS = new ArrayList<>();

    @BeforeAll
    static void analyse() {
        SyntheticWalk walk = new SyntheticWalk(PARAMETERS);
        truth = walk.truth();
        pass = Pass.of(trial(walk), new GaitSettings(GaitSettings.STANDARD_GRAVITY, 0.95, Double.NaN));
        steps = StepFinder.steps(pass, FINDINGS);
    }

    @Test
    void contactsAreWhereTheFeetStood() {
        SyntheticWalk walk = new SyntheticWalk(PARAMETERS);
        assertThat(pass.stances()).hasSize(2);
        // The 20 N threshold is crossed a little after contact: 4 ms of a load that rises over 0.13 s.
        assertThat(pass.stances().get(0).start()).isCloseTo(walk.contact(2), within(0.004));
        assertThat(pass.stances().get(0).end()).isCloseTo(walk.off(2), within(0.004));
        assertThat(pass.stances().get(0).side()).isEqualTo(Side.RIGHT);
        assertThat(pass.stances().get(1).side()).isEqualTo(Side.LEFT);
        assertThat(pass.stances()).allMatch(s -> s.whole());
        assertThat(Mirror.isMirrored(pass)).contains(false);
    }

    @Test
    void stepTimeLengthMassAndSpeedAreTheTruth() {
        StepMechanics m = StepMechanics.of(steps.get(0));
        assertThat(value(m, Measure.STEP_TIME)).isCloseTo(truth.stepTime(), within(0.001));
        assertThat(value(m, Measure.STEP_LENGTH)).isCloseTo(0.62, within(1e-3));
        assertThat(value(m, Measure.MASS)).isCloseTo(70, within(70 * 1e-4));
        assertThat(value(m, Measure.SPEED)).isCloseTo(truth.speed(), within(1e-3));
    }

    @Test
    void worksOfTheTransitionAreTheTruth() {
        StepMechanics m = StepMechanics.of(steps.get(0));
        WalkTruth.Step step =
                (WalkTruth.Step) truth.transitions().get(truth.transitions().size() - 1);
        assertThat(value(m, Measure.PUSH_OFF_DOUBLE_SUPPORT))
                .isCloseTo(step.trailingPositive(), within(2e-3 * step.trailingPositive()));
        assertThat(value(m, Measure.COLLISION_DOUBLE_SUPPORT))
                .isCloseTo(step.leadingNegative(), within(-2e-3 * step.leadingNegative()));
    }

    @Test
    void evenWalkIsSteadyAndHasTheImpulsiveAnglesOrder() {
        StepMechanics m = StepMechanics.of(steps.get(0));
        assertThat(m.findings()).noneMatch(f -> f.code().equals("gait.unsteady"));
        // exact for the ideal transition: 2 asin(s/2l) with s = D - f; the bridge turns a little less far.
        double ideal = 2 * Math.asin((0.62 - 0.22) / (2 * truth.radius()));
        assertThat(value(m, Measure.TRANSITION_ANGLE)).isBetween(0.5 * ideal, ideal);
    }

    private static double value(StepMechanics m, Measure measure) {
        Double v = m.values().get(measure);
        assertThat(v).as(measure.column()).isNotNull();
        return v;
    }

    @Test
    void strideIsTheWindowWhereAllItsLoadsAreWhole() {
        SyntheticWalk walk = new SyntheticWalk(PARAMETERS);
        List<PlatformLoads> platforms = new ArrayList<>();
        int frames = trial(walk).pelvis().frames();
        for (int foot = 1; foot <= 4; foot++) {
            platforms.add(platform(walk, foot, foot, frames));
        }
        WalkingTrial two = trial(walk);
        WalkingTrial four = new WalkingTrial(
                two.name(), two.rate(), two.startTime(), two.up(), two.pelvis(), two.feet(), platforms, 0);
        List<Step> all = StepFinder.steps(
                Pass.of(four, new GaitSettings(GaitSettings.STANDARD_GRAVITY, 0.95, Double.NaN)), new ArrayList<>());
        assertThat(all).hasSize(3);
        assertThat(all).extracting(s -> s.loads().isStride()).containsExactly(false, true, false);
        StepMechanics m = StepMechanics.of(all.get(1));
        WalkTruth.Step step =
                (WalkTruth.Step) truth.transitions().get(truth.transitions().size() - 1);
        assertThat(value(m, Measure.MASS)).isCloseTo(70, within(70 * 1e-4));
        assertThat(value(m, Measure.PUSH_OFF_DOUBLE_SUPPORT))
                .isCloseTo(step.trailingPositive(), within(2e-3 * step.trailingPositive()));
        assertThat(value(m, Measure.COLLISION_DOUBLE_SUPPORT))
                .isCloseTo(step.leadingNegative(), within(-2e-3 * step.leadingNegative()));
    }

    @Test
    void walkOnTwoBeltsCostsWhatItCostsOverGround() {
        SyntheticWalk walk = new SyntheticWalk(PARAMETERS);
        GaitSettings settings = new GaitSettings(GaitSettings.STANDARD_GRAVITY, 0.95, Double.NaN);
        WalkingTrial two = trial(walk);
        int frames = two.pelvis().frames();
        List<PlatformLoads> ground = new ArrayList<>();
        for (int foot = 1; foot <= 4; foot++) {
            ground.add(platform(walk, foot, foot, frames));
        }
        WalkingTrial over = new WalkingTrial("ground", RATE, 0, Vec3.Z, two.pelvis(), two.feet(), ground, 0);
        double belt = 1.2;
        WalkingTrial onBelts = new WalkingTrial(
                "belts",
                RATE,
                0,
                Vec3.Z,
                new WalkingTrial.Track(carried(pelvis(walk, frames), belt)),
                feet(walk, frames, belt),
                List.of(belt(walk, 1, -1, belt, frames), belt(walk, 2, 1, belt, frames)),
                belt);
        List<Step> expected = StepFinder.steps(Pass.of(over, settings), new ArrayList<>());
        List<Finding> findings = new ArrayList<>();
        List<Step> found = StepFinder.steps(Pass.of(onBelts, settings), findings);
        assertThat(expected).hasSize(3);
        for (Step step : expected) {
            Step same = found.stream()
                    .filter(f -> Math.abs(f.loads().leading().start()
                                    - step.loads().leading().start())
                            < 1e-6)
                    .findFirst()
                    .orElseThrow(() -> new AssertionError(findings.toString()));
            StepMechanics a = StepMechanics.of(step);
            StepMechanics b = StepMechanics.of(same);
            if (step.loads().isStride() == same.loads().isStride()) {
                for (Measure m : List.of(
                        Measure.PUSH_OFF, Measure.COLLISION, Measure.STEP_LENGTH, Measure.SPEED, Measure.MASS)) {
                    // exact: a frame that moves evenly sees the same forces and the same motion against the ground.
                    if (a.values().containsKey(m)) {
                        assertThat(value(b, m)).as(m.column()).isCloseTo(value(a, m), within(1e-6));
                    }
                }
            }
        }
    }

    private static double[] pelvis(SyntheticWalk walk, int frames) {
        double[] pelvis = new double[3 * frames];
        double[] s = new double[6];
        for (int i = 0; i < frames; i++) {
            walk.hip(i / RATE, s);
            set(pelvis, i, s[0], 0, s[1]);
        }
        return pelvis;
    }

    private static double[] carried(double[] xyz, double belt) {
        double[] out = xyz.clone();
        for (int i = 0; i < out.length; i += 3) {
            out[i] -= belt * (i / 3) / RATE;
        }
        return out;
    }

    private static Map<Side, FootTracks> feet(SyntheticWalk walk, int frames, double belt) {
        double[][][] tracks = new double[2][3][3 * frames];
        for (int i = 0; i < frames; i++) {
            for (int side = 0; side < 2; side++) {
                double[] at = foot(walk, side, i / RATE);
                double y = side == 0 ? -0.1 : 0.1;
                set(tracks[side][0], i, at[0] - 0.02, y, 0.03 + at[1]);
                set(tracks[side][1], i, at[0] + 0.15, 0.7 * y, 0.01 + at[1]);
                set(tracks[side][2], i, at[0] + 0.12, 1.4 * y, 0.01 + at[1]);
            }
        }
        Map<Side, FootTracks> feet = new EnumMap<>(Side.class);
        for (int side = 0; side < 2; side++) {
            feet.put(
                    side == 0 ? Side.RIGHT : Side.LEFT,
                    new FootTracks(
                            carried(tracks[side][0], belt),
                            List.of(carried(tracks[side][1], belt), carried(tracks[side][2], belt)),
                            Optional.empty()));
        }
        return feet;
    }

    /** A belt under the feet of one side, whose loads lie where the belt has carried them. */
    private static PlatformLoads belt(SyntheticWalk walk, int number, int sign, double belt, int frames) {
        int samples = (int) Math.round((frames - 1) / RATE * LOAD_RATE) + 1;
        double[] force = new double[3 * samples];
        double[] moment = new double[3 * samples];
        Vec3 centre = new Vec3(0, sign * 0.3, 0);
        double[] load = new double[3];
        for (int i = 0; i < samples; i++) {
            double t = i / LOAD_RATE;
            Vec3 f = Vec3.ZERO;
            Vec3 m = Vec3.ZERO;
            for (int foot = sign < 0 ? 2 : 1; foot <= 4; foot += 2) {
                walk.load(foot, t, load);
                if (load[1] != 0) {
                    Vec3 one = new Vec3(load[0], 0, load[1]);
                    f = f.plus(one);
                    m = m.plus(new Vec3(load[2] - belt * t, sign * 0.1, 0)
                            .minus(centre)
                            .cross(one));
                }
            }
            set(force, i, f.x(), f.y(), f.z());
            set(moment, i, m.x(), m.y(), m.z());
        }
        List<Vec3> corners = List.of(
                new Vec3(3, centre.y() + 0.3, 0),
                new Vec3(-3, centre.y() + 0.3, 0),
                new Vec3(-3, centre.y() - 0.3, 0),
                new Vec3(3, centre.y() - 0.3, 0));
        return new PlatformLoads(number, 2, corners, Vec3.Z, LOAD_RATE, 0, true, force, moment);
    }

    private static WalkingTrial trial(SyntheticWalk walk) {
        int frames = (int) Math.floor(STEPS * walk.stepTime() * RATE) + 1;
        double[] pelvis = new double[3 * frames];
        double[][] heel = new double[2][3 * frames];
        double[][] first = new double[2][3 * frames];
        double[][] fifth = new double[2][3 * frames];
        double[] s = new double[6];
        for (int i = 0; i < frames; i++) {
            double t = i / RATE;
            walk.hip(t, s);
            pelvis[3 * i] = s[0];
            pelvis[3 * i + 2] = s[1];
            for (int side = 0; side < 2; side++) {
                double[] at = foot(walk, side, t);
                // Even footfalls are the right foot, at y = -0.1; the medial head lies nearer the midline.
                double y = side == 0 ? -0.1 : 0.1;
                set(heel[side], i, at[0] - 0.02, y, 0.03 + at[1]);
                set(first[side], i, at[0] + 0.15, 0.7 * y, 0.01 + at[1]);
                set(fifth[side], i, at[0] + 0.12, 1.4 * y, 0.01 + at[1]);
            }
        }
        Map<Side, FootTracks> feet = Map.of(
                Side.RIGHT, new FootTracks(heel[0], List.of(first[0], fifth[0]), Optional.empty()),
                Side.LEFT, new FootTracks(heel[1], List.of(first[1], fifth[1]), Optional.empty()));
        List<PlatformLoads> platforms = List.of(platform(walk, 1, 2, frames), platform(walk, 2, 3, frames));
        return new WalkingTrial("invented", RATE, 0, Vec3.Z, new WalkingTrial.Track(pelvis), feet, platforms, 0);
    }

    /** Ground position and height of a foot: at rest in stance, a smooth arc in swing. */
    private static double[] foot(SyntheticWalk walk, int side, double t) {
        for (int j = side - 4; j < STEPS + 4; j += 2) {
            if (t >= walk.contact(j) && t <= walk.off(j)) {
                return new double[] {j * PARAMETERS.stepLength(), 0};
            }
            if (t > walk.off(j) && t < walk.contact(j + 2)) {
                double u = (t - walk.off(j)) / (walk.contact(j + 2) - walk.off(j));
                double smooth = u * u * u * (10 - 15 * u + 6 * u * u);
                double x = j * PARAMETERS.stepLength();
                return new double[] {
                    x + smooth * ((j + 2) * PARAMETERS.stepLength() - x), 0.06 * Math.pow(Math.sin(Math.PI * u), 2)
                };
            }
        }
        throw new IllegalStateException("no footfall at " + t);
    }

    private static PlatformLoads platform(SyntheticWalk walk, int number, int foot, int frames) {
        int samples = (int) Math.round((frames - 1) / RATE * LOAD_RATE) + 1;
        double[] force = new double[3 * samples];
        double[] moment = new double[3 * samples];
        double from = foot * PARAMETERS.stepLength() - 0.2;
        double to = from + 0.62;
        double side = foot % 2 == 0 ? -0.1 : 0.1;
        Vec3 centre = new Vec3((from + to) / 2, 0, 0);
        double[] load = new double[3];
        for (int i = 0; i < samples; i++) {
            walk.load(foot, i / LOAD_RATE, load);
            Vec3 f = new Vec3(load[0], 0, load[1]);
            Vec3 m = load[1] == 0
                    ? Vec3.ZERO
                    : new Vec3(load[2], side, 0).minus(centre).cross(f);
            set(force, i, f.x(), f.y(), f.z());
            set(moment, i, m.x(), m.y(), m.z());
        }
        List<Vec3> corners =
                List.of(new Vec3(to, 0.4, 0), new Vec3(from, 0.4, 0), new Vec3(from, -0.4, 0), new Vec3(to, -0.4, 0));
        return new PlatformLoads(number, 2, corners, Vec3.Z, LOAD_RATE, 0, true, force, moment);
    }

    private static void set(double[] xyz, int i, double x, double y, double z) {
        xyz[3 * i] = x;
        xyz[3 * i + 1] = y;
        xyz[3 * i + 2] = z;
    }
}
