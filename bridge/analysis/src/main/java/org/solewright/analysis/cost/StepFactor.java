package org.solewright.analysis.cost;

import org.solewright.analysis.dynamics.LimitException;
import org.solewright.domain.cost.WorkForm;

/**
 * Work of a step over m v^2/2 as a function of its length, for one limb and a rule that gives the foot; with its
 * derivative, for optima.
 */
public sealed interface StepFactor permits StepFactor.Rolling, StepFactor.Given, StepFactor.Equal, StepFactor.Optimum {

    /**
     * Work factor and its derivative.
     *
     * @param factor over m v^2/2
     * @param slope of the factor, 1/m
     */
    record Value(double factor, double slope) {}

    /**
     * The factor at a step length.
     *
     * @param stepLength m
     * @return factor and derivative
     * @throws LimitException where the limb cannot take the step
     */
    Value at(double stepLength) throws LimitException;

    /**
     * Limb length.
     *
     * @return m
     */
    double limbLength();

    /**
     * Pivots that are activated in a step.
     *
     * @return N + 1, or 2 for a rolling foot
     */
    int activations();

    /**
     * Step lengths below this are out of reach.
     *
     * @return m
     */
    default double shortest() {
        return 0;
    }

    /**
     * Step lengths from this on are out of reach.
     *
     * @return m
     */
    double longest();

    /** Factor and slope of vaults over a foot, by d(foot)/d(step). */
    private static Value polygon(VaultingStep step, WorkForm form, double footRate, double share)
            throws LimitException {
        double l = step.radius();
        double lengthRate = -share * footRate;
        double factor = step.factor(form);
        int n = step.segments();
        double slope = part(step.spacing(n), 1 - footRate, l, lengthRate, form);
        if (n > 0) {
            slope += n * part(step.spacing(0), footRate / n, l, lengthRate, form);
        }
        return new Value(factor, slope);
    }

    private static double part(double s, double spacingRate, double l, double lengthRate, WorkForm form) {
        double ratio = s / l;
        double rate = 2 * ratio / l * (spacingRate - ratio * lengthRate);
        return TransitionWork.slope(form, ratio * ratio) * rate;
    }

    /**
     * A foot that rolls over an arc as long as needed.
     *
     * @param form how the work is counted
     * @param limbLength m
     * @param rollingRatio arc radius over limb length
     */
    record Rolling(WorkForm form, double limbLength, double rollingRatio) implements StepFactor {
        @Override
        public Value at(double stepLength) throws LimitException {
            double r = rollingRatio * limbLength;
            double arm = limbLength - r;
            RollingFoot foot = RollingFoot.full(stepLength, limbLength, r);
            double factor = foot.factor(form);
            if (form == WorkForm.NO_PUSH_SMALL_ANGLE || form == WorkForm.PUSH_OFF_SMALL_ANGLE) {
                return new Value(factor, 2 * factor / stepLength);
            }
            double a = foot.halfAngle();
            double square = r * r + arm * arm + 2 * r * arm * Math.cos(a);
            double angleRate = 2 * (arm * (r * Math.cos(a) + arm) / square) / (2 * r + 2 * arm * Math.cos(a));
            double angle = foot.transitionAngle();
            double byAngle =
                    switch (form) {
                        case PUSH_OFF -> Math.tan(angle / 2) / (Math.cos(angle / 2) * Math.cos(angle / 2));
                        case NO_PUSH -> Math.sin(2 * angle);
                        default -> Math.sin(angle);
                    };
            return new Value(factor, byAngle * angleRate);
        }

        @Override
        public int activations() {
            return 2;
        }

        @Override
        public double longest() {
            return RollingFoot.longest(limbLength, rollingRatio * limbLength);
        }
    }

    /**
     * A foot of given length.
     *
     * @param form how the work is counted
     * @param segments N
     * @param limbLength m
     * @param footLength m
     * @param seriesShare share of the foot that is taken out of the limb
     */
    record Given(WorkForm form, double segments, double limbLength, double footLength, double seriesShare)
            implements StepFactor {
        @Override
        public Value at(double stepLength) throws LimitException {
            VaultingStep step = VaultingStep.given(segments, stepLength, limbLength, footLength, seriesShare);
            return polygon(step, form, 0, seriesShare);
        }

        @Override
        public int activations() {
            return (int) segments + 1;
        }

        @Override
        public double shortest() {
            return footLength;
        }

        @Override
        public double longest() {
            return footLength + TransitionWork.reach(form) * (limbLength - seriesShare * footLength);
        }
    }

    /**
     * The foot that makes all vaults equal.
     *
     * @param form how the work is counted
     * @param segments N
     * @param limbLength m
     * @param seriesShare share of the foot that is taken out of the limb
     */
    record Equal(WorkForm form, double segments, double limbLength, double seriesShare) implements StepFactor {
        @Override
        public Value at(double stepLength) throws LimitException {
            VaultingStep step = VaultingStep.equalVaults(segments, stepLength, limbLength, seriesShare);
            return polygon(step, form, segments / (segments + 1), seriesShare);
        }

        @Override
        public int activations() {
            return (int) segments + 1;
        }

        @Override
        public double longest() {
            double a = TransitionWork.reach(form);
            return a * limbLength * (segments + 1) / (1 + a * seriesShare * segments);
        }
    }

    /**
     * The cheapest foot at every step length.
     *
     * @param form how the work is counted
     * @param segments N
     * @param limbLength m
     * @param seriesShare share of the foot that is taken out of the limb
     */
    record Optimum(WorkForm form, double segments, double limbLength, double seriesShare) implements StepFactor {
        @Override
        public Value at(double stepLength) throws LimitException {
            // At the optimum the factor does not change with the foot, so that it counts as given.
            VaultingStep step = OptimumFoot.of(form, segments, stepLength, limbLength, seriesShare);
            return polygon(step, form, 0, seriesShare);
        }

        @Override
        public int activations() {
            return (int) segments + 1;
        }

        @Override
        public double longest() {
            double a = TransitionWork.reach(form);
            if (a * seriesShare >= 1 || segments == 0) {
                return a * limbLength;
            }
            double foot = a * limbLength * segments / (1 + a * seriesShare * segments);
            return foot + a * (limbLength - seriesShare * foot);
        }
    }
}
