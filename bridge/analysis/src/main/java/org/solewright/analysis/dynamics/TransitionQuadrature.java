package org.solewright.analysis.dynamics;

import static org.solewright.analysis.dynamics.HipPhase.AX;
import static org.solewright.analysis.dynamics.HipPhase.AZ;
import static org.solewright.analysis.dynamics.HipPhase.STATE;
import static org.solewright.analysis.dynamics.HipPhase.VX;
import static org.solewright.analysis.dynamics.HipPhase.VZ;
import static org.solewright.analysis.dynamics.HipPhase.X;
import static org.solewright.analysis.dynamics.HipPhase.Z;

import java.util.ArrayList;
import java.util.List;
import org.solewright.domain.cost.WalkTruth;

/** What is true of an invented walk, by quadrature of force times velocity of each limb. */
final class TransitionQuadrature {

    private static final int MONOTONE_SAMPLES = 2000;
    private static final double MONOTONE_TOLERANCE = 1e-9;
    private static final int LIMB_FORCE_SAMPLES = 2000;
    private static final int WORK_CELLS = 200;

    private final SyntheticWalk walk;
    private final WalkParameters p;
    private final Quadrature quadrature = new Quadrature();

    TransitionQuadrature(SyntheticWalk walk) {
        this.walk = walk;
        this.p = walk.parameters();
    }

    private HipPhase bridge(int pivot) {
        return walk.phaseAt(new SyntheticWalk.Moment(0, 2 * pivot + 1, 0));
    }

    WalkTruth truth() {
        List<WalkTruth.Place> pivots = new ArrayList<>();
        for (int k = 0; k <= p.segments(); k++) {
            pivots.add(new WalkTruth.Place(
                    walk.radius() * Math.sin(walk.pivotAngle(k)), -walk.radius() * Math.cos(walk.pivotAngle(k))));
        }
        List<WalkTruth.Transition> transitions = new ArrayList<>();
        for (int k = 0; k <= p.segments(); k++) {
            transitions.add(k == p.segments() ? stepTruth() : innerTruth(bridge(k)));
        }
        return new WalkTruth(
                walk.stepTime(),
                p.stepLength() / walk.stepTime(),
                walk.radius(),
                walk.doubleSupport(),
                pivots,
                transitions,
                leastLimbForce(),
                isMonotone());
    }

    private double power(double[] s) {
        return p.mass() * (s[AX] * s[VX] + (s[AZ] + p.gravity()) * s[VZ]);
    }

    private WalkTruth.Inner innerTruth(HipPhase bridge) {
        double[] s = new double[STATE];
        double positive = quadrature.positive(
                t -> {
                    bridge.state(t, s);
                    return power(s);
                },
                0,
                bridge.duration(),
                WORK_CELLS);
        double negative = quadrature.positive(
                t -> {
                    bridge.state(t, s);
                    return -power(s);
                },
                0,
                bridge.duration(),
                WORK_CELLS);
        return new WalkTruth.Inner(positive, -negative, bridge.duration(), impulsive(walk.innerIdealLean()));
    }

    private WalkTruth.Step stepTruth() {
        HipPhase bridge = bridge(p.segments());
        return new WalkTruth.Step(
                limbWork(bridge, 0, 1),
                -limbWork(bridge, 0, -1),
                limbWork(bridge, 1, 1),
                -limbWork(bridge, 1, -1),
                quadrature.positive(
                        t -> {
                            double[] s = new double[STATE];
                            bridge.state(t, s);
                            return power(s);
                        },
                        0,
                        bridge.duration(),
                        WORK_CELLS),
                bridge.duration(),
                impulsive(walk.stepIdealLean()));
    }

    private double limbWork(HipPhase bridge, int limb, int sign) {
        double[] s = new double[STATE];
        double[] push = new double[2];
        return quadrature.positive(
                t -> {
                    bridge.state(t, s);
                    walk.pushes(s, 0, push);
                    double arm = s[X] - (limb == 0 ? p.footLength() : p.stepLength());
                    return sign * push[limb] * (arm * s[VX] + s[Z] * s[VZ]) / Math.hypot(arm, s[Z]);
                },
                0,
                bridge.duration(),
                WORK_CELLS);
    }

    private WalkTruth.Impulsive impulsive(double lean) {
        double speed = walk.radius() * walk.leanRate(lean);
        double energy = p.mass() * speed * speed / 2;
        double half = Math.sin(lean) * Math.sin(lean);
        double tangent = Math.tan(lean) * Math.tan(lean);
        double whole = Math.sin(2 * lean) * Math.sin(2 * lean);
        return new WalkTruth.Impulsive(
                speed, 2 * lean, energy * tangent, energy * 2 * half, energy * half, energy * whole);
    }

    private double leastLimbForce() {
        HipPhase bridge = bridge(p.segments());
        double[] s = new double[STATE];
        double[] push = new double[2];
        double least = Double.POSITIVE_INFINITY;
        for (int i = 0; i <= LIMB_FORCE_SAMPLES; i++) {
            bridge.state(bridge.duration() * i / LIMB_FORCE_SAMPLES, s);
            walk.pushes(s, 0, push);
            least = Math.min(least, Math.min(push[0], push[1]));
        }
        return least;
    }

    private boolean isMonotone() {
        double[] s = new double[STATE];
        for (int k = 0; k < p.segments(); k++) {
            HipPhase bridge = bridge(k);
            double before = Double.NEGATIVE_INFINITY;
            for (int i = 0; i <= MONOTONE_SAMPLES; i++) {
                bridge.state(bridge.duration() * i / MONOTONE_SAMPLES, s);
                double x = s[X] - s[Z] * s[AX] / (s[AZ] + p.gravity());
                if (x < before - MONOTONE_TOLERANCE) {
                    return false;
                }
                before = x;
            }
        }
        return true;
    }
}
