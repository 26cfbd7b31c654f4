package org.solewright.analysis.cost;

import java.util.Locale;
import org.solewright.analysis.dynamics.Limit;
import org.solewright.analysis.dynamics.LimitException;
import org.solewright.domain.cost.WorkForm;

/**
 * One step of a limb that vaults over the pivots of a segmented foot: N transitions between neighbouring pivots and one
 * from the last pivot to the next foot's first. Without segments it is the compass. All vaults have the radius l = L -
 * share f.
 */
public final class VaultingStep {

    /** More segments than any foot has; keeps an answer that lists every transition small. */
    private static final int MOST_SEGMENTS = 100_000;

    private final int segments;
    private final double stepLength;
    private final double limbLength;
    private final double footLength;
    private final double seriesShare;

    private VaultingStep(int segments, double stepLength, double limbLength, double footLength, double seriesShare) {
        this.segments = segments;
        this.stepLength = stepLength;
        this.limbLength = limbLength;
        this.footLength = footLength;
        this.seriesShare = seriesShare;
    }

    /**
     * A step with a foot of given length.
     *
     * @param segments number N of foot segments, whole, not negative
     * @param stepLength D, hip travel per step, m
     * @param limbLength L, m
     * @param footLength f, along the ground, m; 0 without segments
     * @param seriesShare share of the foot length that is taken out of the limb, 0 (lies flat) to 1 (series limb)
     * @return the step
     * @throws LimitException by the first of NONPOSITIVE_RADIUS, SEGMENT_COUNT, NONPOSITIVE_STEP,
     *     FOOT_WITHOUT_SEGMENTS, NEGATIVE_FOOT, STEP_NOT_LONGER_THAN_FOOT and PIVOT_SPACING_OUT_OF_REACH that applies
     */
    public static VaultingStep given(
            double segments, double stepLength, double limbLength, double footLength, double seriesShare)
            throws LimitException {
        double radius = limbLength - seriesShare * footLength;
        if (!(radius > 0)) {
            throw new LimitException(
                    Limit.NONPOSITIVE_RADIUS,
                    text(
                            "vault radius %s m = limb %s m - %s x foot %s m, expected more than 0 m",
                            radius, limbLength, seriesShare, footLength));
        }
        int count = count(segments);
        checkStep(stepLength);
        if (count == 0 && footLength != 0) {
            throw new LimitException(
                    Limit.FOOT_WITHOUT_SEGMENTS, text("foot length %s m with 0 segments, expected 0 m", footLength));
        }
        if (footLength < 0) {
            throw new LimitException(Limit.NEGATIVE_FOOT, text("foot length %s m, expected 0 m or more", footLength));
        }
        if (footLength >= stepLength) {
            throw new LimitException(
                    Limit.STEP_NOT_LONGER_THAN_FOOT,
                    text("step length %s m, expected more than the foot length %s m", stepLength, footLength));
        }
        VaultingStep step = new VaultingStep(count, stepLength, limbLength, footLength, seriesShare);
        double widest = step.widestSpacing();
        if (widest >= 2 * radius) {
            throw new LimitException(
                    Limit.PIVOT_SPACING_OUT_OF_REACH,
                    text("pivots %s m apart, expected less than twice the vault radius %s m", widest, radius));
        }
        return step;
    }

    /**
     * A step with the foot that makes all vaults equal, f = N D/(N + 1).
     *
     * @param segments number N of foot segments, whole, not negative
     * @param stepLength D, m
     * @param limbLength L, m
     * @param seriesShare share of the foot length that is taken out of the limb, 0 to 1
     * @return the step
     * @throws LimitException as {@link #given}
     */
    public static VaultingStep equalVaults(double segments, double stepLength, double limbLength, double seriesShare)
            throws LimitException {
        checkLimb(limbLength);
        int count = count(segments);
        checkStep(stepLength);
        return given(count, stepLength, limbLength, count * stepLength / (count + 1), seriesShare);
    }

    /**
     * Checks a number of segments.
     *
     * @param segments N
     * @return the same
     * @throws LimitException SEGMENT_COUNT where it is negative, not whole or too large
     */
    public static int segmentCount(double segments) throws LimitException {
        return count(segments);
    }

    /**
     * Checks a limb length.
     *
     * @param limbLength m
     * @throws LimitException NONPOSITIVE_RADIUS where it is not above 0
     */
    public static void requireLimb(double limbLength) throws LimitException {
        checkLimb(limbLength);
    }

    static void checkLimb(double limbLength) throws LimitException {
        if (!(limbLength > 0)) {
            throw new LimitException(
                    Limit.NONPOSITIVE_RADIUS, text("limb length %s m, expected more than 0 m", limbLength));
        }
    }

    static int count(double segments) throws LimitException {
        if (!(segments >= 0) || segments != Math.rint(segments)) {
            throw new LimitException(
                    Limit.SEGMENT_COUNT, text("%s foot segments, expected a whole number of 0 or more", segments));
        }
        if (segments > MOST_SEGMENTS) {
            throw new LimitException(
                    Limit.SEGMENT_COUNT,
                    text("%s foot segments, expected at most %s", segments, (double) MOST_SEGMENTS));
        }
        return (int) segments;
    }

    static void checkStep(double stepLength) throws LimitException {
        if (!(stepLength > 0)) {
            throw new LimitException(
                    Limit.NONPOSITIVE_STEP, text("step length %s m, expected more than 0 m", stepLength));
        }
    }

    static String text(String pattern, Object... numbers) {
        return String.format(Locale.ROOT, pattern, numbers);
    }

    /**
     * Number N of foot segments.
     *
     * @return 0 for the compass
     */
    public int segments() {
        return segments;
    }

    /**
     * Step length D.
     *
     * @return m
     */
    public double stepLength() {
        return stepLength;
    }

    /**
     * Limb length L.
     *
     * @return m
     */
    public double limbLength() {
        return limbLength;
    }

    /**
     * Foot length f along the ground.
     *
     * @return m
     */
    public double footLength() {
        return footLength;
    }

    /**
     * Radius of all vaults, l = L - share f.
     *
     * @return m, above 0
     */
    public double radius() {
        return limbLength - seriesShare * footLength;
    }

    /**
     * Number of transitions of a step.
     *
     * @return N + 1
     */
    public int transitions() {
        return segments + 1;
    }

    /**
     * Distance of the pivots of a transition.
     *
     * @param transition zero-based, the last one goes to the next foot
     * @return m
     */
    public double spacing(int transition) {
        return transition < segments ? footLength / segments : stepLength - footLength;
    }

    private double widestSpacing() {
        return segments > 0 ? Math.max(spacing(0), spacing(segments)) : spacing(0);
    }

    /**
     * Angle between the hip's velocities before and after a transition.
     *
     * @param transition zero-based
     * @return rad, 0 to below pi
     */
    public double angle(int transition) {
        return 2 * Math.asin(spacing(transition) / (2 * radius()));
    }

    /**
     * Work of the step over m v^2/2, summed over its transitions.
     *
     * @param form how the work is counted
     * @return step factor, not negative
     * @throws LimitException REVERSES_AT_TRANSITION for noPush where a pivot spacing reaches sqrt 2 radii
     */
    public double factor(WorkForm form) throws LimitException {
        double widest = widestSpacing();
        if (form == WorkForm.NO_PUSH && widest >= TransitionWork.reach(form) * radius()) {
            throw new LimitException(
                    Limit.REVERSES_AT_TRANSITION,
                    text(
                            "pivots %s m apart, expected less than sqrt 2 times the vault radius %s m without a push",
                            widest, radius()));
        }
        return unchecked(form, segments, stepLength, footLength, radius());
    }

    /** Factor without the checks: a number that means something within the reach only. */
    static double unchecked(WorkForm form, int segments, double stepLength, double footLength, double radius) {
        double last = (stepLength - footLength) / radius;
        double inner = segments > 0 ? footLength / segments / radius : 0;
        return segments * TransitionWork.factor(form, inner * inner) + TransitionWork.factor(form, last * last);
    }
}
