package org.solewright.analysis.dynamics;

import java.util.Locale;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.ArrayRealVector;
import org.apache.commons.math3.linear.DecompositionSolver;
import org.apache.commons.math3.linear.LUDecomposition;
import org.apache.commons.math3.linear.SingularMatrixException;

/**
 * Newton's method on the stride map: half angle and stance rate come back, and where spring and step time are sought the
 * time is the wanted one. Unknown are stance rate and half angle, or push, or push and stiffness.
 */
final class WalkerSearch {

    private static final int MOST_ITERATIONS = 60;
    private static final int MOST_HALVINGS = 12;
    private static final double STEP_TOLERANCE = 1e-13;
    private static final double RESIDUAL_TOLERANCE = 1e-13;
    /** Gaits nearer than this are one. */
    private static final double SAME = 1e-7;

    private static final double SMALL_RESIDUAL = 1e-10;

    private final WalkerModel model;
    private final int[] unknowns;
    private final double time;
    /** Half angle, stance rate, push impulse, hip stiffness. */
    private final double[] x;

    /** Begun again at its own end the method may stall on rounding; so it runs once. */
    private boolean isDone;

    private boolean hasConverged;

    private WalkerSearch(WalkerModel model, int[] unknowns, double time, double[] x) {
        this.model = model;
        this.unknowns = unknowns;
        this.time = time;
        this.x = x;
    }

    /** Half angle and rate are sought. */
    static WalkerSearch ofStep(WalkerModel model, double halfAngle, double rate) {
        double[] x = {halfAngle, rate, model.pushImpulse(), model.hipStiffness()};
        return new WalkerSearch(model, new int[] {0, 1}, Double.NaN, x);
    }

    /** Rate and push are sought. */
    static WalkerSearch ofPush(WalkerModel model, double halfAngle, double rate, double push) {
        double[] x = {halfAngle, rate, push, model.hipStiffness()};
        return new WalkerSearch(model, new int[] {1, 2}, Double.NaN, x);
    }

    /** Rate, push and spring are sought. */
    static WalkerSearch ofSpring(WalkerModel model, double halfAngle, double rate, double push, double time) {
        double[] x = {halfAngle, rate, push, model.hipStiffness()};
        return new WalkerSearch(model, new int[] {1, 2, 3}, time, x);
    }

    double halfAngle() {
        return x[0];
    }

    double rate() {
        return x[1];
    }

    double push() {
        return x[2];
    }

    double stiffness() {
        return x[3];
    }

    /** Time of the step it has come to. */
    double stepTime() throws LimitException {
        return step(x).time();
    }

    /** Whether another search ends at the same gait. */
    boolean meets(WalkerSearch other) {
        return other.converges() && Math.abs(x[0] - other.x[0]) < SAME && Math.abs(x[1] - other.x[1]) < SAME;
    }

    private WalkerStep step(double[] at) throws LimitException {
        return WalkerStep.of(model.with(at[2], at[3]), at[0], at[1]);
    }

    private double[] residual(WalkerStep step, double[] at) {
        double[] r = new double[unknowns.length];
        r[0] = step.halfAngle() - at[0];
        r[1] = step.rateAfter() - at[1];
        if (r.length > 2) {
            r[2] = step.time() - time;
        }
        return r;
    }

    /** Seeks; x is the gait found, or the last place reached. */
    boolean converges() {
        if (!isDone) {
            isDone = true;
            try {
                hasConverged = newton();
            } catch (LimitException e) {
                hasConverged = false;
            }
        }
        return hasConverged;
    }

    private boolean newton() throws LimitException {
        WalkerStep step = step(x);
        double[] r = residual(step, x);
        for (int i = 0; i < MOST_ITERATIONS; i++) {
            double[] change;
            try {
                change = change(step, r);
            } catch (SingularMatrixException e) {
                return false;
            }
            double share = 1;
            boolean isTaken = false;
            for (int halving = 0; halving < MOST_HALVINGS && !isTaken; halving++) {
                double[] trial = x.clone();
                for (int k = 0; k < unknowns.length; k++) {
                    trial[unknowns[k]] += share * change[k];
                }
                WalkerStep next = trial[0] > 0 ? stepOrNone(trial) : null;
                double[] after = next == null ? r : residual(next, trial);
                if (next != null && (size(after) < size(r) || size(after) < RESIDUAL_TOLERANCE)) {
                    System.arraycopy(trial, 0, x, 0, x.length);
                    step = next;
                    r = after;
                    isTaken = true;
                }
                share /= 2;
            }
            double moved = size(change) * 2 * share;
            if (!isTaken || moved < STEP_TOLERANCE * (1 + size(x))) {
                return size(r) < SMALL_RESIDUAL;
            }
        }
        return size(r) < SMALL_RESIDUAL;
    }

    private @org.jspecify.annotations.Nullable WalkerStep stepOrNone(double[] at) {
        try {
            return step(at);
        } catch (LimitException e) {
            return null;
        }
    }

    private double[] change(WalkerStep step, double[] r) {
        int n = unknowns.length;
        double[][] jacobian = new double[n][n];
        for (int row = 0; row < n; row++) {
            for (int k = 0; k < n; k++) {
                int by = unknowns[k];
                jacobian[row][k] = step.derivative(row, by) - (row == by ? 1 : 0);
            }
        }
        DecompositionSolver solver = new LUDecomposition(new Array2DRowRealMatrix(jacobian, false)).getSolver();
        return solver.solve(new ArrayRealVector(r, false)).mapMultiply(-1).toArray();
    }

    private static double size(double[] v) {
        double size = 0;
        for (double a : v) {
            size = Math.max(size, Math.abs(a));
        }
        return size;
    }

    /** Why nothing was found. */
    LimitException failure() {
        try {
            step(x);
        } catch (LimitException e) {
            return e;
        }
        return new LimitException(
                Limit.NO_PERIODIC_GAIT,
                String.format(
                        Locale.ROOT,
                        "no gait that repeats itself was found at slope %s rad, feet of %s limb lengths, hip stiffness %s:"
                                + " the search ended at a half angle of %s rad",
                        model.slope(),
                        model.rollingRatio(),
                        x[3],
                        x[0]));
    }

    /** The gait found. */
    WalkerGait gait() throws LimitException {
        WalkerStep step = step(x);
        WalkerModel found = model.with(x[2], x[3]);
        double reach = Math.sqrt(found.squaredReach(x[0]));
        double angle = 2 * found.contactAngle(x[0]);
        double after = x[1] * reach;
        double before = (after - x[2] * Math.sin(angle)) / Math.cos(angle);
        double trace = step.derivative(0, 0) + step.derivative(1, 1);
        double determinant =
                step.derivative(0, 0) * step.derivative(1, 1) - step.derivative(0, 1) * step.derivative(1, 0);
        WalkerGait gait = new WalkerGait(
                x[0],
                x[1],
                found.start(x[0], x[1])[3],
                step.time(),
                found.stepLength(x[0]),
                before,
                after,
                angle,
                x[2],
                x[3],
                trace,
                determinant);
        if (x[2] < 0) {
            throw new LimitException(
                    Limit.NEGATIVE_PUSH, String.format(Locale.ROOT, "push impulse %s, expected 0 or more", x[2]));
        }
        if (gait.collisionImpulse() < 0) {
            throw new LimitException(
                    Limit.OVER_PUSH,
                    String.format(
                            Locale.ROOT,
                            "collision impulse %s, expected 0 or more: the new limb would pull",
                            gait.collisionImpulse()));
        }
        return gait;
    }
}
