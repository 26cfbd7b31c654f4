package org.solewright.analysis.cost;

import org.solewright.analysis.dynamics.Limit;
import org.solewright.analysis.dynamics.LimitException;
import org.solewright.analysis.numerics.Root;
import org.solewright.domain.cost.WorkForm;

/**
 * A foot that rolls on a circular arc with its centre on the limb's axis, at both feet's contact before a step.
 *
 * <p>The lean a solves D = 2 R a + 2 (L-R) sin a; the hip's velocity falls at b = atan2((L-R) sin a, R + (L-R) cos a), and the
 * transition angle is 2 b [derived; small angle (1 - R/L) D/L: Adamczyk, Collins and Kuo 2006]. Where the arc is too
 * short its edges are pivots.
 *
 * @param stepLength D, m
 * @param limbLength L, m
 * @param arcRadius R, m
 * @param arcHalfAngle half of the angle the arc spans, rad; infinite where it is as long as needed
 * @param halfAngle lean of the limb at contact, rad
 * @param contactAngle half of the transition angle, rad
 * @param truncated whether the limb stands on the arc's edges at contact
 */
public record RollingFoot(
        double stepLength,
        double limbLength,
        double arcRadius,
        double arcHalfAngle,
        double halfAngle,
        double contactAngle,
        boolean truncated) {

    /**
     * A foot whose arc is as long as needed.
     *
     * @param stepLength D, m
     * @param limbLength L, m
     * @param arcRadius R, m, 0 to L
     * @return the foot at contact
     * @throws LimitException NONPOSITIVE_RADIUS, NONPOSITIVE_STEP, ARC_RADIUS, STEP_OUT_OF_REACH
     */
    public static RollingFoot full(double stepLength, double limbLength, double arcRadius) throws LimitException {
        check(stepLength, limbLength, arcRadius);
        double most = longest(limbLength, arcRadius);
        if (!(stepLength < most)) {
            throw new LimitException(
                    Limit.STEP_OUT_OF_REACH,
                    VaultingStep.text(
                            "step length %s m, expected less than %s m for an arc of %s m under a limb of %s m",
                            stepLength, most, arcRadius, limbLength));
        }
        double lean = lean(stepLength, limbLength, arcRadius);
        return new RollingFoot(
                stepLength,
                limbLength,
                arcRadius,
                Double.POSITIVE_INFINITY,
                lean,
                slope(lean, limbLength, arcRadius),
                false);
    }

    /**
     * A foot whose arc spans a given angle.
     *
     * @param stepLength D, m
     * @param limbLength L, m
     * @param arcRadius R, m, 0 to L
     * @param arcHalfAngle half of the angle the arc spans, rad, not negative
     * @return the foot at contact
     * @throws LimitException NONPOSITIVE_RADIUS, NONPOSITIVE_STEP, ARC_RADIUS, STEP_OUT_OF_REACH
     */
    public static RollingFoot shortArc(double stepLength, double limbLength, double arcRadius, double arcHalfAngle)
            throws LimitException {
        check(stepLength, limbLength, arcRadius);
        if (!(arcHalfAngle >= 0)) {
            throw new LimitException(
                    Limit.ARC_RADIUS,
                    VaultingStep.text("half angle of the arc %s rad, expected 0 rad or more", arcHalfAngle));
        }
        if (stepLength < longest(limbLength, arcRadius)) {
            double lean = lean(stepLength, limbLength, arcRadius);
            if (lean <= arcHalfAngle) {
                double contact = slope(lean, limbLength, arcRadius);
                return new RollingFoot(stepLength, limbLength, arcRadius, arcHalfAngle, lean, contact, false);
            }
        }
        double edge = edge(limbLength, arcRadius, arcHalfAngle);
        double gap = stepLength - 2 * arcRadius * arcHalfAngle;
        if (!(Math.abs(gap) < 2 * edge)) {
            throw new LimitException(
                    Limit.STEP_OUT_OF_REACH,
                    VaultingStep.text(
                            "%s m of the step length %s m are not covered by the arc, expected less than twice the"
                                    + " distance %s m of hip and edge",
                            gap, stepLength, edge));
        }
        double contact = Math.asin(gap / (2 * edge));
        double lean = contact + edgeAngle(limbLength, arcRadius, arcHalfAngle);
        return new RollingFoot(stepLength, limbLength, arcRadius, arcHalfAngle, lean, contact, true);
    }

    private static void check(double stepLength, double limbLength, double arcRadius) throws LimitException {
        VaultingStep.checkLimb(limbLength);
        VaultingStep.checkStep(stepLength);
        checkArc(limbLength, arcRadius);
    }

    /**
     * Checks limb and arc.
     *
     * @param limbLength L, m
     * @param arcRadius R, m
     * @throws LimitException NONPOSITIVE_RADIUS, ARC_RADIUS
     */
    public static void requireArc(double limbLength, double arcRadius) throws LimitException {
        VaultingStep.checkLimb(limbLength);
        checkArc(limbLength, arcRadius);
    }

    private static void checkArc(double limbLength, double arcRadius) throws LimitException {
        if (!(arcRadius >= 0 && arcRadius <= limbLength)) {
            throw new LimitException(
                    Limit.ARC_RADIUS,
                    VaultingStep.text("arc radius %s m, expected 0 m to the limb length %s m", arcRadius, limbLength));
        }
    }

    static double longest(double limbLength, double arcRadius) {
        return Math.PI * arcRadius + 2 * (limbLength - arcRadius);
    }

    private static double lean(double stepLength, double limbLength, double arcRadius) {
        double arm = limbLength - arcRadius;
        if (arcRadius == 0) {
            return Math.asin(stepLength / (2 * limbLength));
        }
        return Root.inBracket(a -> 2 * arcRadius * a + 2 * arm * Math.sin(a) - stepLength, 0, Math.PI / 2);
    }

    private static double slope(double lean, double limbLength, double arcRadius) {
        double arm = limbLength - arcRadius;
        return Math.atan2(arm * Math.sin(lean), arcRadius + arm * Math.cos(lean));
    }

    private static double edge(double limbLength, double arcRadius, double arcHalfAngle) {
        double arm = limbLength - arcRadius;
        return Math.hypot(arm + arcRadius * Math.cos(arcHalfAngle), arcRadius * Math.sin(arcHalfAngle));
    }

    /**
     * Angle between the hip's velocities before and after the transition.
     *
     * @return rad
     */
    public double transitionAngle() {
        return 2 * contactAngle;
    }

    /**
     * Arc length that the step needs, 2 R a.
     *
     * @return m
     */
    public double arcLengthNeeded() {
        return 2 * arcRadius * halfAngle;
    }

    /**
     * Length of the arc there is.
     *
     * @return m; infinite where it is as long as needed
     */
    public double arcLength() {
        return 2 * arcRadius * arcHalfAngle;
    }

    /**
     * Distance of the arc's edge from the hip.
     *
     * @return m; means something for a truncated arc
     */
    public double edgeRadius() {
        return edge(limbLength, arcRadius, arcHalfAngle);
    }

    /**
     * Angle at the hip between the limb's axis and the arc's edge.
     *
     * @return rad; means something for a truncated arc
     */
    public double rolledHalfAngle() {
        return edgeAngle(limbLength, arcRadius, arcHalfAngle);
    }

    private static double edgeAngle(double limbLength, double arcRadius, double arcHalfAngle) {
        return Math.atan2(
                arcRadius * Math.sin(arcHalfAngle), limbLength - arcRadius + arcRadius * Math.cos(arcHalfAngle));
    }

    /**
     * Work of the step's one transition over m v^2/2. The small-angle forms are those of an arc as long as needed.
     *
     * @param form how the work is counted
     * @return factor, not negative
     * @throws LimitException REVERSES_AT_TRANSITION for noPush from a right angle on
     */
    public double factor(WorkForm form) throws LimitException {
        double small = (1 - arcRadius / limbLength) * stepLength / limbLength;
        return switch (form) {
            case NO_PUSH_SMALL_ANGLE -> small * small;
            case PUSH_OFF_SMALL_ANGLE -> small / 2 * (small / 2);
            case NO_PUSH -> {
                checkForward(transitionAngle());
                yield TransitionWork.factorOfAngle(form, transitionAngle());
            }
            case PUSH_OFF, SIMULTANEOUS -> TransitionWork.factorOfAngle(form, transitionAngle());
        };
    }

    static void checkForward(double angle) throws LimitException {
        if (!(angle < Math.PI / 2)) {
            throw new LimitException(
                    Limit.REVERSES_AT_TRANSITION,
                    VaultingStep.text("transition angle %s rad, expected less than pi/2 without a push", angle));
        }
    }

    /**
     * Arc radius over limb length of the rolling foot that costs the push-off work of a step factor.
     *
     * @param stepLength D, m
     * @param limbLength L, m
     * @param pushOffFactor work over m v^2/2
     * @return R/L, 0 to 1
     * @throws LimitException NO_SOLUTION where even a point foot is cheaper, else as {@link #full}
     */
    public static double equivalentRatio(double stepLength, double limbLength, double pushOffFactor)
            throws LimitException {
        double compass = full(stepLength, limbLength, 0).factor(WorkForm.PUSH_OFF);
        double excess = pushOffFactor - compass;
        if (Math.abs(excess) <= 4 * Math.ulp(compass)) {
            return 0;
        }
        if (!(excess < 0)) {
            throw new LimitException(
                    Limit.NO_SOLUTION,
                    VaultingStep.text(
                            "push-off factor %s, expected no more than %s of a point foot", pushOffFactor, compass));
        }
        return Root.inBracket(
                ratio -> {
                    double lean = lean(stepLength, limbLength, ratio * limbLength);
                    double half = Math.tan(slope(lean, limbLength, ratio * limbLength));
                    return half * half - pushOffFactor;
                },
                0,
                1);
    }

    /**
     * The same for small angles, 1 - (L/(D l)) sqrt(f^2/N + (D-f)^2), l the vault radius.
     *
     * @param step the segmented foot
     * @return R/L; negative where even a point foot is cheaper
     */
    public static double equivalentRatioSmallAngle(VaultingStep step) {
        double last = step.stepLength() - step.footLength();
        double inner = step.segments() > 0 ? step.footLength() * step.footLength() / step.segments() : 0;
        return 1 - step.limbLength() / (step.stepLength() * step.radius()) * Math.sqrt(inner + last * last);
    }
}
