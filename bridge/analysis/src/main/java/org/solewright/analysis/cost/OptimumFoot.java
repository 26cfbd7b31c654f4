package org.solewright.analysis.cost;

import org.solewright.analysis.dynamics.LimitException;
import org.solewright.analysis.numerics.Root;
import org.solewright.domain.cost.WorkForm;

/**
 * The foot length that makes a step cheapest when the total limb length is shared between limb and foot [derived].
 *
 * <p>The equal-vault foot is not that foot unless the foot lies flat (share 0): a longer foot shortens the limb.
 */
public final class OptimumFoot {

    private static final int GRID = 512;

    private final WorkForm form;
    private final int segments;
    private final double stepLength;
    private final double limbLength;
    private final double seriesShare;

    private OptimumFoot(WorkForm form, int segments, double stepLength, double limbLength, double seriesShare) {
        this.form = form;
        this.segments = segments;
        this.stepLength = stepLength;
        this.limbLength = limbLength;
        this.seriesShare = seriesShare;
    }

    /**
     * The cheapest step.
     *
     * @param form how the work is counted; the small-angle forms have a closed form
     * @param segments number N of foot segments, whole, not negative
     * @param stepLength D, m
     * @param limbLength L, m
     * @param seriesShare share of the foot length that is taken out of the limb, 0 to 1
     * @return the step with its foot length, 0 where no foot beats the compass
     * @throws LimitException as {@link VaultingStep#given}, and REVERSES_AT_TRANSITION for noPush where no foot avoids it
     */
    public static VaultingStep of(
            WorkForm form, double segments, double stepLength, double limbLength, double seriesShare)
            throws LimitException {
        VaultingStep.checkLimb(limbLength);
        int count = VaultingStep.count(segments);
        VaultingStep.checkStep(stepLength);
        double foot = 0;
        if (count > 0) {
            OptimumFoot optimum = new OptimumFoot(form, count, stepLength, limbLength, seriesShare);
            boolean small = form == WorkForm.NO_PUSH_SMALL_ANGLE || form == WorkForm.PUSH_OFF_SMALL_ANGLE;
            foot = small ? smallAngle(count, stepLength, limbLength, seriesShare) : optimum.exact();
        }
        return VaultingStep.given(count, stepLength, limbLength, foot, seriesShare);
    }

    /**
     * Foot length in closed form, small angles, f = N D (L - share D)/((N + 1) L - share N D); 0 where that is negative.
     * Exact for simultaneous work, whose factor is proportional to q.
     *
     * @param segments N, not negative
     * @param stepLength D, m, above 0
     * @param limbLength L, m, above 0
     * @param seriesShare 0 to 1
     * @return m, 0 to below D
     */
    public static double smallAngle(int segments, double stepLength, double limbLength, double seriesShare) {
        double left = limbLength - seriesShare * stepLength;
        return left > 0
                ? segments * stepLength * left / ((segments + 1) * limbLength - seriesShare * segments * stepLength)
                : 0;
    }

    private double exact() {
        double reach = TransitionWork.reach(form);
        double most = Math.min(stepLength, reach * limbLength * segments / (1 + reach * seriesShare * segments));
        double least = 0;
        if (seriesShare > 0) {
            most = Math.min(most, limbLength / seriesShare);
        }
        double gain = reach * seriesShare - 1;
        if (gain > 0) {
            most = Math.min(most, (reach * limbLength - stepLength) / gain);
        } else if (gain < 0) {
            least = Math.max(0, (stepLength - reach * limbLength) / -gain);
        }
        if (!(most > least)) {
            return least;
        }
        int best = 0;
        double bestFactor = Double.POSITIVE_INFINITY;
        for (int i = 0; i < GRID; i++) {
            double factor = factor(foot(least, most, i));
            if (factor < bestFactor) {
                bestFactor = factor;
                best = i;
            }
        }
        double low = foot(least, most, Math.max(best - 1, 0));
        double high = foot(least, most, Math.min(best + 1, GRID - 1));
        double atLow = slope(low);
        double atHigh = slope(high);
        if (atLow < 0 && atHigh > 0) {
            return Root.inBracket(this::slope, low, high);
        }
        return foot(least, most, best);
    }

    /** Grid point; the upper limit itself is out of reach, the lower one is not where it is 0. */
    private static double foot(double least, double most, int index) {
        double offset = least > 0 ? 0.5 : 0;
        return least + (most - least) * (index + offset) / GRID;
    }

    private double factor(double foot) {
        return VaultingStep.unchecked(form, segments, stepLength, foot, limbLength - seriesShare * foot);
    }

    private double slope(double foot) {
        double radius = limbLength - seriesShare * foot;
        double inner = foot / segments;
        double last = stepLength - foot;
        return segments * change(inner, 1.0 / segments, radius) + change(last, -1, radius);
    }

    private double change(double spacing, double spacingSlope, double radius) {
        double ratio = spacing / radius;
        double qSlope = 2 * ratio * spacingSlope / radius + 2 * seriesShare * ratio * ratio / radius;
        return TransitionWork.slope(form, ratio * ratio) * qSlope;
    }
}
