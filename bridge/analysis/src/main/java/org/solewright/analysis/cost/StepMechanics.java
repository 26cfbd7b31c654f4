package org.solewright.analysis.cost;

import java.util.ArrayList;
import java.util.Collections;
import java.util.EnumMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.SplittableRandom;
import org.solewright.analysis.gait.Step;
import org.solewright.analysis.gait.StepLoads;
import org.solewright.analysis.numerics.Series;
import org.solewright.domain.cost.Measure;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.gait.Use;

/**
 * What one step-to-step transition cost, from measured loads: work windows, integration and phases of the centre of mass
 * ([Donelan, Kram and Kuo 2002], [Kuo, Donelan and Ruina 2005]) and the collision measures of [Lee et al. 2011].
 *
 * <p>A value that the loads cannot give is absent from {@link #values()}, and a finding says why. The SD of a work is
 * its spread over the doubt about the mean velocity (upward 0.015 m/s on a step, 0.003 m/s on a stride; forward 0.02
 * m/s) and the mass (1 %), by a seeded Monte Carlo: same input, same SD.
 *
 * @param values by measure, SI units, finite
 * @param deviations SD by measure, SI units, finite; absent where not estimated
 * @param motion centre of mass over the window
 * @param trailingPower W at the load samples
 * @param leadingPower W at the load samples
 * @param findings what has to be said
 */
public record StepMechanics(
        Map<Measure, Double> values,
        Map<Measure, Double> deviations,
        CentreOfMassMotion motion,
        Series trailingPower,
        Series leadingPower,
        List<Finding> findings) {

    private static final double UP_DOUBT_STEP = 0.015;
    private static final double UP_DOUBT_STRIDE = 0.003;
    private static final double FORWARD_DOUBT = 0.02;
    private static final double MASS_DOUBT = 0.01;
    private static final double STEADY_SPEED = 0.04;
    private static final double STEADY_WORK = 0.1;
    private static final int DRAWS = 400;
    private static final long SEED = 20261201L;

    /** Copies the collections. */
    public StepMechanics {
        values = Collections.unmodifiableMap(new LinkedHashMap<>(values));
        deviations = Collections.unmodifiableMap(new LinkedHashMap<>(deviations));
        findings = List.copyOf(findings);
    }

    /**
     * Horizontal force that changes no velocity: over a stride, which repeats itself, the whole mean (design 04 H1); over a
     * step the platforms' bias alone, since a step may well speed up or slow down.
     */
    private static double[] steadyForce(StepLoads loads) {
        if (!loads.isStride()) {
            return new double[] {loads.biasForward(), 0, loads.biasRight()};
        }
        double from = loads.windowFrom();
        double to = loads.windowTo();
        return new double[] {
            loads.totalForce().forward().mean(from, to),
            0,
            loads.totalForce().right().mean(from, to)
        };
    }

    /**
     * Computes one transition.
     *
     * @param step the step
     * @return its mechanics
     */
    public static StepMechanics of(Step step) {
        StepLoads loads = step.loads();
        CentreOfMassMotion motion = CentreOfMassMotion.over(
                loads.totalForce().components(),
                loads.windowFrom(),
                loads.windowTo(),
                new double[] {loads.meanForward(), 0, loads.meanRight()},
                steadyForce(loads),
                loads.gravity());
        List<Finding> findings = new ArrayList<>();
        Map<Measure, Double> values = new EnumMap<>(Measure.class);
        values.put(Measure.MASS, motion.mass());
        values.put(Measure.SPEED, loads.meanForward());
        works(loads, motion, values, findings);
        kinematics(loads, motion, values);
        collision(loads, motion, values);
        putFinite(values, Measure.STEP_LENGTH, step.length());
        putFinite(values, Measure.STEP_WIDTH, step.width());
        putFinite(values, Measure.STEP_TIME, step.time());
        steadiness(step, values, findings);
        Map<Measure, Double> deviations = spread(loads, motion, values);
        return new StepMechanics(
                values,
                deviations,
                motion,
                motion.power(loads.trailingForce().components()),
                motion.power(loads.leadingForce().components()),
                findings);
    }

    private static void steadiness(Step step, Map<Measure, Double> values, List<Finding> findings) {
        double net = values.getOrDefault(Measure.COMBINED_POSITIVE, Double.NaN)
                + values.getOrDefault(Measure.COMBINED_NEGATIVE, Double.NaN);
        double perMass = net / values.getOrDefault(Measure.MASS, Double.NaN);
        double slowest =
                step.neighbourSpeeds().stream().mapToDouble(v -> v).min().orElse(Double.NaN);
        double fastest =
                step.neighbourSpeeds().stream().mapToDouble(v -> v).max().orElse(Double.NaN);
        double change = fastest / slowest - 1;
        if (Math.abs(perMass) >= STEADY_WORK || change > STEADY_SPEED) {
            findings.add(Finding.warning(
                    "gait.unsteady",
                    place(step.loads()),
                    String.format(
                            Locale.ROOT,
                            "net work %.3f J/kg (steady: under %.1f) and neighbouring steps from %.2f to %.2f m/s (steady:"
                                    + " within %.0f %%); compare this step with steady ones only with care",
                            perMass,
                            STEADY_WORK,
                            slowest,
                            fastest,
                            100 * STEADY_SPEED)));
        }
    }

    private static void kinematics(StepLoads loads, CentreOfMassMotion motion, Map<Measure, Double> values) {
        double contact = loads.leading().start();
        putFinite(values, Measure.SPEED_BEFORE, motion.speed(contact));
        putFinite(values, Measure.TRANSITION_ANGLE, motion.greatestTurn());
        if (loads.hasDoubleSupport()) {
            putFinite(
                    values,
                    Measure.TRANSITION_ANGLE_DOUBLE_SUPPORT,
                    motion.direction(loads.trailing().end()) - motion.direction(contact));
        }
        putFinite(values, Measure.HEIGHT_RANGE, motion.heightRange());
    }

    private static void works(
            StepLoads loads, CentreOfMassMotion motion, Map<Measure, Double> values, List<Finding> findings) {
        Series trailing = motion.power(loads.trailingForce().components());
        Series leading = motion.power(loads.leadingForce().components());
        double doubleFrom = loads.leading().start();
        double doubleTo = Math.max(doubleFrom, loads.trailing().end());
        pushOff(loads, trailing, doubleFrom, doubleTo, values, findings);
        leadingPhases(loads, leading, doubleFrom, doubleTo, values, findings);
        Series total = motion.power(loads.totalForce().components());
        putFinite(values, Measure.COMBINED_POSITIVE, total.positiveIntegral(motion.from(), motion.to()));
        putFinite(values, Measure.COMBINED_NEGATIVE, total.negativeIntegral(motion.from(), motion.to()));
    }

    private static void pushOff(
            StepLoads loads,
            Series power,
            double doubleFrom,
            double doubleTo,
            Map<Measure, Double> values,
            List<Finding> findings) {
        String where = place(loads);
        if (!loads.trailing().allows(Use.PUSH_OFF)) {
            findings.add(excluded(where, "push-off", loads.trailing().why()));
            return;
        }
        double from = Math.max(loads.trailing().start(), loads.knownFrom());
        List<PowerPhases.Run> runs =
                PowerPhases.runs(power, from, loads.trailing().end(), loads.shortestPhase());
        int last = runs.size() - 1;
        while (last >= 0 && !runs.get(last).isPositive()) {
            last--;
        }
        if (last < 0 || runs.get(last).start() <= loads.knownFrom()) {
            findings.add(runsOut(where, "push-off"));
            return;
        }
        PowerPhases.Run run = runs.get(last);
        values.put(Measure.PUSH_OFF, run.work());
        if (loads.hasDoubleSupport()) {
            values.put(Measure.PUSH_OFF_DOUBLE_SUPPORT, part(power, run, doubleFrom, doubleTo));
        }
    }

    private static void leadingPhases(
            StepLoads loads,
            Series power,
            double doubleFrom,
            double doubleTo,
            Map<Measure, Double> values,
            List<Finding> findings) {
        String where = place(loads);
        double to = Math.min(loads.leading().end(), loads.knownTo());
        List<PowerPhases.Run> runs = PowerPhases.runs(power, loads.leading().start(), to, loads.shortestPhase());
        int first = 0;
        while (first < runs.size() && runs.get(first).isPositive()) {
            first++;
        }
        Measure[] phases = {Measure.COLLISION, Measure.REBOUND, Measure.PRELOAD};
        Use[] uses = {Use.COLLISION, Use.REBOUND, Use.PRELOAD};
        for (int k = 0; k < phases.length; k++) {
            if (!loads.leading().allows(uses[k])) {
                findings.add(excluded(where, uses[k].word(), loads.leading().why()));
                continue;
            }
            int i = first + k;
            if (i >= runs.size()
                    || (i == runs.size() - 1 && to < loads.leading().end())) {
                findings.add(runsOut(where, uses[k].word()));
                continue;
            }
            values.put(phases[k], runs.get(i).work());
            if (k == 0 && loads.hasDoubleSupport()) {
                values.put(Measure.COLLISION_DOUBLE_SUPPORT, part(power, runs.get(i), doubleFrom, doubleTo));
            }
        }
    }

    private static double part(Series power, PowerPhases.Run run, double from, double to) {
        double a = Math.max(run.start(), from);
        double b = Math.min(run.end(), to);
        return b > a ? power.integral(a, b) : 0;
    }

    private static void collision(StepLoads loads, CentreOfMassMotion motion, Map<Measure, Double> values) {
        int intervals = (int) Math.round(
                (motion.to() - motion.from()) * loads.totalForce().up().rate());
        Series[] force = loads.totalForce().components();
        double step = (motion.to() - motion.from()) / intervals;
        double[] f = new double[3 * (intervals + 1)];
        double[] v = new double[f.length];
        for (int i = 0; i <= intervals; i++) {
            double time = i == intervals ? motion.to() : motion.from() + i * step;
            // Solver axes: x forward, y left, z up.
            f[3 * i] = force[0].at(time);
            f[3 * i + 1] = -force[2].at(time);
            f[3 * i + 2] = force[1].at(time);
            v[3 * i] = motion.velocity(0).at(time);
            v[3 * i + 1] = -motion.velocity(2).at(time);
            v[3 * i + 2] = motion.velocity(1).at(time);
        }
        CollisionMeasures c = CollisionMeasures.of(f, v, step, motion.mass(), loads.gravity());
        putFinite(values, Measure.COLLISION_ANGLE, c.collisionAngle());
        putFinite(values, Measure.COLLISION_FRACTION, c.collisionFraction());
        putFinite(values, Measure.MECHANICAL_COST_OF_TRANSPORT, c.mechanicalCostOfTransport());
    }

    private static Map<Measure, Double> spread(
            StepLoads loads, CentreOfMassMotion motion, Map<Measure, Double> values) {
        Measure[] works = {
            Measure.PUSH_OFF,
            Measure.COLLISION,
            Measure.REBOUND,
            Measure.PRELOAD,
            Measure.PUSH_OFF_DOUBLE_SUPPORT,
            Measure.COLLISION_DOUBLE_SUPPORT,
            Measure.COMBINED_POSITIVE,
            Measure.COMBINED_NEGATIVE
        };
        double[] sum = new double[works.length];
        double[] sum2 = new double[works.length];
        int[] count = new int[works.length];
        SplittableRandom random = new SplittableRandom(SEED);
        double upDoubt = loads.isStride() ? UP_DOUBT_STRIDE : UP_DOUBT_STEP;
        for (int draw = 0; draw < DRAWS; draw++) {
            double forward = FORWARD_DOUBT * random.nextGaussian();
            double up = upDoubt * random.nextGaussian();
            double mass = 1 + MASS_DOUBT * random.nextGaussian();
            Map<Measure, Double> varied = new EnumMap<>(Measure.class);
            works(loads, motion.varied(new double[] {forward, up, 0}, mass), varied, new ArrayList<>());
            for (int k = 0; k < works.length; k++) {
                Double w = varied.get(works[k]);
                if (w != null) {
                    sum[k] += w;
                    sum2[k] += w * w;
                    count[k]++;
                }
            }
        }
        Map<Measure, Double> deviations = new EnumMap<>(Measure.class);
        for (int k = 0; k < works.length; k++) {
            if (values.containsKey(works[k]) && count[k] > DRAWS / 2) {
                double mean = sum[k] / count[k];
                deviations.put(works[k], Math.sqrt(Math.max(0, sum2[k] - count[k] * mean * mean) / (count[k] - 1)));
            }
        }
        deviations.put(Measure.MASS, MASS_DOUBT * motion.mass());
        deviations.put(Measure.SPEED, FORWARD_DOUBT);
        return deviations;
    }

    private static void putFinite(Map<Measure, Double> values, Measure measure, double value) {
        if (Double.isFinite(value)) {
            values.put(measure, value);
        }
    }

    private static String place(StepLoads loads) {
        return loads.leading().trial() + " " + loads.trailing().side().word() + " to "
                + loads.leading().side().word();
    }

    private static Finding excluded(String where, String phase, String why) {
        return Finding.warning("phase.excluded", where, phase + " work is left empty: " + why);
    }

    private static Finding runsOut(String where, String phase) {
        return Finding.warning(
                "phase.incomplete",
                where,
                phase + " work is left empty: the phase runs out of the interval in which every load is measured");
    }
}
