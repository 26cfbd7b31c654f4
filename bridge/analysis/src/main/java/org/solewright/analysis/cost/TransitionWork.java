package org.solewright.analysis.cost;

import org.solewright.domain.cost.WorkForm;

/**
 * Work factors of one step-to-step transition: work over m v^2/2, v the hip's speed before it.
 *
 * <p>Exact factors are rational in q = (s/l)^2, s the distance of the two pivots and l the common vault radius: noPush
 * q(1 - q/4) = sin^2 d, pushOff q/(4 - q) = tan^2(d/2), simultaneous q/2 = 2 sin^2(d/2), d the full angle between the limbs
 * [derived from impulses along the limbs; small angle: Kuo 2002].
 */
public final class TransitionWork {

    private TransitionWork() {}

    /**
     * Factor for equal radii.
     *
     * @param form how the work is counted
     * @param q (s/l)^2, 0 to below 4; to 2 for noPush
     * @return factor, not negative
     */
    public static double factor(WorkForm form, double q) {
        return switch (form) {
            case NO_PUSH -> q * (1 - q / 4);
            case PUSH_OFF -> q / (4 - q);
            case SIMULTANEOUS -> q / 2;
            case NO_PUSH_SMALL_ANGLE -> q;
            case PUSH_OFF_SMALL_ANGLE -> q / 4;
        };
    }

    /**
     * Derivative of the factor.
     *
     * @param form how the work is counted
     * @param q (s/l)^2
     * @return d factor/dq
     */
    static double slope(WorkForm form, double q) {
        return switch (form) {
            case NO_PUSH -> 1 - q / 2;
            case PUSH_OFF -> 4 / ((4 - q) * (4 - q));
            case SIMULTANEOUS -> 0.5;
            case NO_PUSH_SMALL_ANGLE -> 1;
            case PUSH_OFF_SMALL_ANGLE -> 0.25;
        };
    }

    /**
     * Factor for any radii, from the angle.
     *
     * @param form how the work is counted
     * @param angle full angle between the limbs, rad, 0 to below pi; to pi/2 for noPush
     * @return factor, not negative
     */
    public static double factorOfAngle(WorkForm form, double angle) {
        double half = Math.sin(angle / 2);
        return switch (form) {
            case NO_PUSH -> Math.sin(angle) * Math.sin(angle);
            case PUSH_OFF -> Math.tan(angle / 2) * Math.tan(angle / 2);
            case SIMULTANEOUS -> 2 * half * half;
            case NO_PUSH_SMALL_ANGLE -> angle * angle;
            case PUSH_OFF_SMALL_ANGLE -> angle * angle / 4;
        };
    }

    /**
     * Spacing of pivots over radius from which on a form has no value.
     *
     * @param form how the work is counted
     * @return sqrt 2 for noPush (the hip would go back), else 2 (the limb does not reach)
     */
    static double reach(WorkForm form) {
        return form == WorkForm.NO_PUSH ? Math.sqrt(2) : 2;
    }
}
