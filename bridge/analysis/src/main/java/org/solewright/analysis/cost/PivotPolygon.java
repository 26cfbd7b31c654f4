package org.solewright.analysis.cost;

import org.solewright.analysis.dynamics.Limit;
import org.solewright.analysis.dynamics.LimitException;
import org.solewright.domain.cost.WorkForm;

/**
 * A step over a foot whose pivots lie anywhere in the limb frame (hip at the origin, limb axis down), so that the vaults
 * have different radii. The angle a transition subtends at the hip is 2 atan2(sqrt((s-a+b)(s+a-b)),
 * sqrt((a+b-s)(a+b+s))), a and b the radii before and after [half-angle theorem].
 */
public final class PivotPolygon {

    private final double[] spacing;
    private final double[] radius;

    private PivotPolygon(double[] spacing, double[] radius) {
        this.spacing = spacing;
        this.radius = radius;
    }

    /**
     * A foot and its step.
     *
     * @param pivots {@code [n][2]} row-major, x forward and z up from the hip, m, heel first, finite, unmodified
     * @param stepLength D, m
     * @return the step
     * @throws LimitException SEGMENT_COUNT without pivots, NONPOSITIVE_RADIUS, NONPOSITIVE_STEP, POLYGON_NOT_CONVEX,
     *     STEP_NOT_LONGER_THAN_FOOT, PIVOT_SPACING_OUT_OF_REACH
     */
    public static PivotPolygon of(double[] pivots, double stepLength) throws LimitException {
        int count = pivots.length / 2;
        if (count == 0) {
            throw new LimitException(Limit.SEGMENT_COUNT, "0 pivots, expected 1 or more");
        }
        double[] radius = new double[count + 1];
        for (int i = 0; i < count; i++) {
            radius[i] = Math.hypot(pivots[2 * i], pivots[2 * i + 1]);
            if (!(radius[i] > 0)) {
                throw new LimitException(
                        Limit.NONPOSITIVE_RADIUS,
                        VaultingStep.text("pivot %d is 0 m from the hip, expected more than 0 m", i + 1));
            }
        }
        radius[count] = radius[0];
        VaultingStep.checkStep(stepLength);
        checkConvex(pivots, count);
        double[] spacing = new double[count];
        double foot = 0;
        for (int i = 0; i + 1 < count; i++) {
            spacing[i] = Math.hypot(pivots[2 * i + 2] - pivots[2 * i], pivots[2 * i + 3] - pivots[2 * i + 1]);
            foot += spacing[i];
        }
        if (!(foot < stepLength)) {
            throw new LimitException(
                    Limit.STEP_NOT_LONGER_THAN_FOOT,
                    VaultingStep.text("step length %s m, expected more than the foot length %s m", stepLength, foot));
        }
        spacing[count - 1] = stepLength - foot;
        for (int i = 0; i < count; i++) {
            double difference = Math.abs(radius[i] - radius[i + 1]);
            if (!(spacing[i] >= difference && spacing[i] < radius[i] + radius[i + 1])) {
                throw new LimitException(
                        Limit.PIVOT_SPACING_OUT_OF_REACH,
                        VaultingStep.text(
                                "pivots %s m apart, expected from the difference to the sum of the radii %s and %s m",
                                spacing[i], radius[i], radius[i + 1]));
            }
        }
        return new PivotPolygon(spacing, radius);
    }

    private static void checkConvex(double[] p, int count) throws LimitException {
        for (int i = 0; i + 2 < count; i++) {
            double ax = p[2 * i + 2] - p[2 * i];
            double az = p[2 * i + 3] - p[2 * i + 1];
            double bx = p[2 * i + 4] - p[2 * i + 2];
            double bz = p[2 * i + 5] - p[2 * i + 3];
            double cross = ax * bz - az * bx;
            if (!(cross > 0)) {
                throw new LimitException(
                        Limit.POLYGON_NOT_CONVEX,
                        VaultingStep.text(
                                "cross product %s m2 of the edges at pivot %d, expected more than 0 m2", cross, i + 2));
            }
        }
    }

    /**
     * Number of transitions, as many as pivots.
     *
     * @return 1 or more
     */
    public int transitions() {
        return spacing.length;
    }

    /**
     * Distance of the pivots of a transition.
     *
     * @param transition zero-based, the last one goes to the next foot
     * @return m
     */
    public double spacing(int transition) {
        return spacing[transition];
    }

    /**
     * Radius of the vault before a transition.
     *
     * @param transition zero-based
     * @return m
     */
    public double radiusBefore(int transition) {
        return radius[transition];
    }

    /**
     * Radius of the vault after a transition.
     *
     * @param transition zero-based
     * @return m
     */
    public double radiusAfter(int transition) {
        return radius[transition + 1];
    }

    /**
     * Angle between the hip's velocities before and after a transition.
     *
     * @param transition zero-based
     * @return rad
     */
    public double angle(int transition) {
        double s = spacing[transition];
        double a = radius[transition];
        double b = radius[transition + 1];
        return 2 * Math.atan2(Math.sqrt((s - a + b) * (s + a - b)), Math.sqrt((a + b - s) * (a + b + s)));
    }

    /**
     * Work of a transition over m v^2/2, v the speed before it.
     *
     * @param form how the work is counted
     * @param transition zero-based
     * @return factor, not negative
     * @throws LimitException REVERSES_AT_TRANSITION for noPush from a right angle on
     */
    public double factor(WorkForm form, int transition) throws LimitException {
        double angle = angle(transition);
        if (form == WorkForm.NO_PUSH) {
            RollingFoot.checkForward(angle);
        }
        return TransitionWork.factorOfAngle(form, angle);
    }

    /**
     * Work of the step over m v^2/2, summed over its transitions.
     *
     * @param form how the work is counted
     * @return factor, not negative
     * @throws LimitException REVERSES_AT_TRANSITION for noPush where a transition reaches a right angle
     */
    public double factor(WorkForm form) throws LimitException {
        double sum = 0;
        for (int transition = 0; transition < transitions(); transition++) {
            sum += factor(form, transition);
        }
        return sum;
    }
}
