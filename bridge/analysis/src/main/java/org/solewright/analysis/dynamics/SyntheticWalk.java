package org.solewright.analysis.dynamics;

import static org.solewright.analysis.dynamics.HipPhase.AX;
import static org.solewright.analysis.dynamics.HipPhase.AZ;
import static org.solewright.analysis.dynamics.HipPhase.STATE;
import static org.solewright.analysis.dynamics.HipPhase.VX;
import static org.solewright.analysis.dynamics.HipPhase.X;
import static org.solewright.analysis.dynamics.HipPhase.Z;

import java.util.ArrayList;
import java.util.List;
import org.solewright.domain.cost.WalkTruth;

/**
 * An invented periodic walk on level ground whose every number is known [derived]. A point mass at the hip vaults over the
 * pivots of a segmented foot; each transition is a bridge with continuous acceleration. Forces are defined by F = m (a + g
 * up) with the exact second derivative of the path, never by differences of samples.
 *
 * <p>Axes: x forward, z up. Foot j stands with its first pivot at x = j D; time 0 is the start of the first vault over foot
 * 0, the end of the step from foot -1. The walk goes on for all times.
 */
public final class SyntheticWalk {

    private final WalkParameters p;
    private final double radius;
    private final double innerLean;
    private final double stepLean;
    private final List<HipPhase> phases = new ArrayList<>();
    private final double[] starts;
    private final double stepTime;
    private final Quadrature quadrature = new Quadrature();

    /**
     * The walk.
     *
     * @param parameters what defines it
     * @throws IllegalArgumentException where the limb does not reach or the hip does not pass the top of a vault
     */
    public SyntheticWalk(WalkParameters parameters) {
        this.p = parameters;
        this.radius = p.radius();
        double inner = p.innerSpacing();
        double last = p.stepLength() - p.footLength();
        if (!(radius > 0) || !(inner < 2 * radius) || !(last > 0) || !(last < 2 * radius)) {
            throw new IllegalArgumentException("walk with vault radius " + radius + " m, pivots " + inner + " and "
                    + last + " m apart, expected more than 0 m and less than two radii");
        }
        this.innerLean = Math.asin(inner / (2 * radius));
        this.stepLean = p.stepLean();
        if (!(topRateSquared() > 0)) {
            throw new IllegalArgumentException("walk with " + p.referenceSpeed()
                    + " m/s at the step does not pass the top" + " of a vault of " + radius + " m");
        }
        build(inner, last);
        this.starts = new double[phases.size() + 1];
        for (int i = 0; i < phases.size(); i++) {
            starts[i + 1] = starts[i] + phases.get(i).duration();
        }
        this.stepTime = starts[phases.size()];
    }

    private double topRateSquared() {
        return p.topSpeedSquared() / (radius * radius);
    }

    private double rate(double lean) {
        double half = Math.sin(lean / 2);
        return Math.sqrt(topRateSquared() + 4 * p.gravity() / radius * half * half);
    }

    private double innerEnd() {
        return innerLean - p.innerBridgeShare() * innerLean;
    }

    private double stepEnd() {
        return stepLean - p.stepBridgeShare() * stepLean;
    }

    private void build(double inner, double last) {
        int n = p.segments();
        for (int k = 0; k <= n; k++) {
            double pivot = k * inner;
            double from = k == 0 ? -stepEnd() : -innerEnd();
            double to = k == n ? stepEnd() : innerEnd();
            phases.add(new HipPhase.Vault(quadrature, pivot, radius, p.gravity(), topRateSquared(), from, to));
            phases.add(k == n ? bridge(pivot, last, stepEnd()) : bridge(pivot, inner, innerEnd()));
        }
    }

    private HipPhase bridge(double pivot, double gap, double lean) {
        double[] start = new double[STATE];
        double[] end = new double[STATE];
        HipPhase.onCircle(pivot, radius, p.gravity(), lean, rate(lean), start);
        HipPhase.onCircle(pivot + gap, radius, p.gravity(), -lean, rate(lean), end);
        double duration = (end[X] - start[X]) / end[VX];
        return new HipPhase.Bridge(duration, start, end);
    }

    /**
     * What defines the walk.
     *
     * @return the parameters
     */
    public WalkParameters parameters() {
        return p;
    }

    /**
     * Duration of a step.
     *
     * @return s
     */
    public double stepTime() {
        return stepTime;
    }

    /**
     * Duration of double support.
     *
     * @return s
     */
    public double doubleSupport() {
        return phases.get(phases.size() - 1).duration();
    }

    /**
     * When a foot meets the ground.
     *
     * @param foot number of the footfall, any whole number
     * @return s
     */
    public double contact(int foot) {
        return foot * stepTime - doubleSupport();
    }

    /**
     * When a foot leaves the ground.
     *
     * @param foot number of the footfall
     * @return s
     */
    public double off(int foot) {
        return (foot + 1) * stepTime;
    }

    /**
     * Vault radius.
     *
     * @return m
     */
    double radius() {
        return radius;
    }

    /**
     * Angle of a pivot in the limb frame, from straight down, forward positive.
     *
     * @param pivot zero-based from the heel
     * @return rad
     */
    double pivotAngle(int pivot) {
        return (pivot - p.segments() / 2.0) * 2 * innerLean;
    }

    /**
     * Place of a pivot on the ground.
     *
     * @param foot number of the footfall
     * @param pivot zero-based from the heel
     * @return x, m
     */
    double pivotX(int foot, int pivot) {
        return foot * p.stepLength() + (p.segments() > 0 ? p.footLength() * pivot / p.segments() : 0);
    }

    private int step(double time) {
        return (int) Math.floor(time / stepTime);
    }

    private int phase(double timeInStep) {
        int phase = phases.size() - 1;
        while (phase > 0 && timeInStep < starts[phase]) {
            phase--;
        }
        return phase;
    }

    /**
     * The hip's position, velocity and acceleration.
     *
     * @param time s
     * @param out filled with x, z, their first and their second derivatives; m, m/s, m/s2
     */
    public void hip(double time, double[] out) {
        int step = step(time);
        double within = time - step * stepTime;
        int phase = phase(within);
        phases.get(phase).state(within - starts[phase], out);
        out[X] += step * p.stepLength();
    }

    /** Where the walk stands: step in progress, phase in it, time within that phase. */
    record Moment(int step, int phase, double time) {

        boolean isBridge() {
            return phase % 2 != 0;
        }

        int pivot() {
            return phase / 2;
        }
    }

    Moment moment(double time) {
        int step = step(time);
        double within = time - step * stepTime;
        int phase = phase(within);
        return new Moment(step, phase, within - starts[phase]);
    }

    boolean isStepBridge(Moment moment) {
        return moment.phase() == phases.size() - 1;
    }

    HipPhase phaseAt(Moment moment) {
        return phases.get(moment.phase());
    }

    double innerIdealLean() {
        return innerLean;
    }

    double stepIdealLean() {
        return stepLean;
    }

    double innerEndLean() {
        return innerEnd();
    }

    double leanRate(double lean) {
        return rate(lean);
    }

    /**
     * Force on the subject and centre of pressure under a footfall.
     *
     * @param foot number of the footfall
     * @param time s
     * @param out filled with forward force, upward force (N) and x of the centre of pressure (m); zeros while unloaded
     */
    public void load(int foot, double time, double[] out) {
        out[0] = 0;
        out[1] = 0;
        out[2] = 0;
        Moment moment = moment(time);
        double[] s = new double[STATE];
        phaseAt(moment).state(moment.time(), s);
        double offset = moment.step() * p.stepLength();
        s[X] += offset;
        if (isStepBridge(moment)) {
            double[] push = new double[2];
            pushes(s, offset, push);
            if (foot == moment.step()) {
                along(s, pivotX(foot, p.segments()), push[0], out);
            } else if (foot == moment.step() + 1) {
                along(s, pivotX(foot, 0), push[1], out);
            }
        } else if (foot == moment.step()) {
            out[0] = p.mass() * s[AX];
            out[1] = p.mass() * (s[AZ] + p.gravity());
            out[2] = moment.isBridge() ? s[X] - s[Z] * out[0] / out[1] : pivotX(foot, moment.pivot());
        }
    }

    private static void along(double[] s, double pivot, double push, double[] out) {
        double length = Math.hypot(s[X] - pivot, s[Z]);
        out[0] = push * (s[X] - pivot) / length;
        out[1] = push * s[Z] / length;
        out[2] = pivot;
    }

    /** Pushes of trailing and leading limb along toe-hip and heel-hip in a step bridge. */
    void pushes(double[] s, double offset, double[] push) {
        double oldX = s[X] - (offset + p.footLength());
        double newX = s[X] - (offset + p.stepLength());
        double oldLength = Math.hypot(oldX, s[Z]);
        double newLength = Math.hypot(newX, s[Z]);
        double fx = p.mass() * s[AX];
        double fz = p.mass() * (s[AZ] + p.gravity());
        double determinant = (oldX - newX) * s[Z];
        push[0] = (fx * s[Z] - fz * newX) / determinant * oldLength;
        push[1] = (fz * oldX - fx * s[Z]) / determinant * newLength;
    }

    /**
     * What is true of the walk.
     *
     * @return times, places and works
     */
    public WalkTruth truth() {
        return new TransitionQuadrature(this).truth();
    }
}
