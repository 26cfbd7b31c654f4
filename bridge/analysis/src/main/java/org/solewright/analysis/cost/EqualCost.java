package org.solewright.analysis.cost;

import org.solewright.analysis.dynamics.Limit;
import org.solewright.analysis.dynamics.LimitException;
import org.solewright.analysis.numerics.Root;
import org.solewright.domain.cost.WorkForm;

/** Configurations that cost the same: the step length for a given step factor, and the feet for a given step. */
public final class EqualCost {

    private static final double MARCH = 0.002;
    private static final int BISECTIONS = 200;

    /** A step for each length. */
    @FunctionalInterface
    private interface Steps {
        VaultingStep at(double stepLength) throws LimitException;
    }

    private EqualCost() {}

    /**
     * The shortest step with equal vaults that has a step factor.
     *
     * @param form how the work is counted
     * @param segments number N of foot segments, whole, not negative
     * @param limbLength L, m
     * @param seriesShare share of the foot length that is taken out of the limb, 0 to 1
     * @param factor work over m v^2/2
     * @return the step
     * @throws LimitException NO_SOLUTION where no step within reach has that factor, else as
     *     {@link VaultingStep#equalVaults}
     */
    public static VaultingStep equalVaults(
            WorkForm form, double segments, double limbLength, double seriesShare, double factor)
            throws LimitException {
        return shortest(
                d -> VaultingStep.equalVaults(segments, d, limbLength, seriesShare),
                form,
                segments,
                limbLength,
                factor);
    }

    /**
     * The shortest step with the optimum foot that has a step factor.
     *
     * @param form how the work is counted
     * @param segments number N of foot segments, whole, not negative
     * @param limbLength L, m
     * @param seriesShare share of the foot length that is taken out of the limb, 0 to 1
     * @param factor work over m v^2/2
     * @return the step
     * @throws LimitException NO_SOLUTION where no step within reach has that factor, else as {@link OptimumFoot#of}
     */
    public static VaultingStep optimumFoot(
            WorkForm form, double segments, double limbLength, double seriesShare, double factor)
            throws LimitException {
        return shortest(
                d -> OptimumFoot.of(form, segments, d, limbLength, seriesShare), form, segments, limbLength, factor);
    }

    private static VaultingStep shortest(Steps steps, WorkForm form, double segments, double limbLength, double factor)
            throws LimitException {
        VaultingStep.checkLimb(limbLength);
        VaultingStep.count(segments);
        if (!(factor > 0) || Double.isInfinite(factor)) {
            throw none(factor, "expected a factor of more than 0");
        }
        double below = 0;
        for (int i = 1; ; i++) {
            double length = i * MARCH * limbLength;
            double found = factorAt(steps, form, length);
            if (Double.isNaN(found)) {
                length = lastWithin(steps, form, below, length);
                if (!(length > below && factorAt(steps, form, length) >= factor)) {
                    throw none(factor, "no step within reach costs that much");
                }
                found = factorAt(steps, form, length);
            }
            if (found >= factor) {
                double low = below;
                double root = Root.inBracket(d -> d == 0 ? -factor : factorAt(steps, form, d) - factor, low, length);
                return steps.at(root);
            }
            below = length;
        }
    }

    private static LimitException none(double factor, String why) {
        return new LimitException(Limit.NO_SOLUTION, VaultingStep.text("step factor %s: %s", factor, why));
    }

    /** NaN stands for out of reach here only. */
    private static double factorAt(Steps steps, WorkForm form, double length) {
        try {
            return steps.at(length).factor(form);
        } catch (LimitException e) {
            return Double.NaN;
        }
    }

    private static double lastWithin(Steps steps, WorkForm form, double within, double without) {
        double low = within;
        double high = without;
        for (int i = 0; i < BISECTIONS; i++) {
            double middle = (low + high) / 2;
            if (Double.isNaN(factorAt(steps, form, middle))) {
                high = middle;
            } else {
                low = middle;
            }
        }
        return low;
    }

    /**
     * The two feet of a series limb that cost the same at a step length, small angles, noPush: roots of ((N+1)/N - k) f^2 -
     * 2 (D - k L) f + D^2 - k L^2 [derived].
     *
     * @param segments N, 1 or more
     * @param stepLength D, m
     * @param limbLength L, m
     * @param factor k, work over m v^2/2
     * @param longer whether the longer of the two is meant
     * @return foot length, m; not negative for the roots that are feet
     * @throws LimitException NO_SOLUTION where the factor lies below the optimum
     */
    public static double foot(int segments, double stepLength, double limbLength, double factor, boolean longer)
            throws LimitException {
        double a = (segments + 1.0) / segments - factor;
        double b = stepLength - factor * limbLength;
        double c = stepLength * stepLength - factor * limbLength * limbLength;
        double discriminant = b * b - a * c;
        if (!(discriminant >= 0)) {
            throw none(factor, VaultingStep.text("no foot makes a step of %s m cost that little", stepLength));
        }
        double root = Math.sqrt(discriminant);
        double first = (b - root) / a;
        double second = (b + root) / a;
        return longer ? Math.max(first, second) : Math.min(first, second);
    }

    /**
     * The foot of a series limb that costs what the compass does, small angles, noPush: 2 D L (L - D)/(L^2 (N+1)/N - D^2)
     * [derived]; shorter feet are cheaper.
     *
     * @param segments N, 1 or more
     * @param stepLength D, m, below L
     * @param limbLength L, m
     * @return foot length, m
     */
    public static double footOfCompassCost(int segments, double stepLength, double limbLength) {
        return 2
                * stepLength
                * limbLength
                * (limbLength - stepLength)
                / (limbLength * limbLength * (segments + 1) / segments - stepLength * stepLength);
    }

    /**
     * The limb on which a foot costs a given factor: the longer the foot that suits the step, the shorter may the limb be.
     *
     * @param form how the work is counted
     * @param segments N, not negative
     * @param stepLength D, m, above 0
     * @param footLength f, m, 0 to below D; 0 without segments
     * @param seriesShare share of the foot length that is taken out of the limb, 0 to 1
     * @param factor k, work over m v^2/2, above 0
     * @return the step of the limb found
     * @throws LimitException NO_SOLUTION where no limb has that factor, else as {@link VaultingStep#given}
     */
    public static VaultingStep limb(
            WorkForm form, int segments, double stepLength, double footLength, double seriesShare, double factor)
            throws LimitException {
        double inner = segments > 0 ? footLength / segments : 0;
        double last = stepLength - footLength;
        double squares = segments * inner * inner + last * last;
        double radius =
                switch (form) {
                    case NO_PUSH_SMALL_ANGLE -> Math.sqrt(squares / factor);
                    case PUSH_OFF_SMALL_ANGLE -> Math.sqrt(squares / (4 * factor));
                    case SIMULTANEOUS -> Math.sqrt(squares / (2 * factor));
                    case PUSH_OFF, NO_PUSH -> radius(form, segments, stepLength, footLength, squares, factor);
                };
        return VaultingStep.given(segments, stepLength, radius + seriesShare * footLength, footLength, seriesShare);
    }

    private static double radius(
            WorkForm form, int segments, double stepLength, double footLength, double squares, double factor)
            throws LimitException {
        double widest = Math.max(segments > 0 ? footLength / segments : 0, stepLength - footLength);
        double least = widest / TransitionWork.reach(form) * (1 + 1e-12);
        // At these radii the factor is no more than the wanted one: q(1 - q/4) <= q; every transition its equal share.
        double part = factor / (segments + 1);
        double bound =
                form == WorkForm.NO_PUSH ? Math.sqrt(squares / factor) : widest / Math.sqrt(4 * part / (1 + part));
        // Wider by more than the rounding, for the bound itself is the root where all transitions are equal.
        double most = bound * (1 + 1e-9);
        if (!(most > least) || VaultingStep.unchecked(form, segments, stepLength, footLength, least) < factor) {
            throw none(factor, VaultingStep.text("no limb makes a step of %s m cost that much", stepLength));
        }
        return Root.inBracket(
                l -> VaultingStep.unchecked(form, segments, stepLength, footLength, l) - factor, least, most);
    }
}
