package org.solewright.analysis.cost;

import java.util.OptionalDouble;
import org.solewright.analysis.dynamics.Limit;
import org.solewright.analysis.dynamics.LimitException;
import org.solewright.analysis.numerics.Root;
import org.solewright.domain.cost.WorkForm;

/**
 * Step length over limb length below which a foot is cheaper than the compass of the same total limb length, the foot
 * being chosen anew at every step [derived]. For a given foot see {@link FootCrossover}.
 */
public final class Crossover {

    private static final double MARCH = 1e-3;

    private Crossover() {}

    /**
     * Crossover of the equal-vault foot.
     *
     * @param form how the work is counted
     * @param segments number N of foot segments, whole, 1 or more
     * @param seriesShare share of the foot length that is taken out of the limb, 0 to 1
     * @return D/L; empty where the foot is always cheaper within reach
     * @throws LimitException SEGMENT_COUNT, or NO_SOLUTION without segments
     */
    public static OptionalDouble equalVaults(WorkForm form, double segments, double seriesShare) throws LimitException {
        int n = VaultingStep.count(segments);
        if (n == 0) {
            throw new LimitException(Limit.NO_SOLUTION, "0 foot segments are the compass itself and never cross it");
        }
        if (seriesShare == 0) {
            return OptionalDouble.empty();
        }
        return switch (form) {
            case SIMULTANEOUS, NO_PUSH_SMALL_ANGLE, PUSH_OFF_SMALL_ANGLE ->
                OptionalDouble.of(smallAngle(n) / seriesShare);
            case PUSH_OFF ->
                seriesShare == 1
                        ? OptionalDouble.of((n + 1) * (4 - 2 * Math.sqrt(3.0 / (n + 1))) / (4.0 * n + 1))
                        : numerical(form, n, seriesShare);
            case NO_PUSH -> numerical(form, n, seriesShare);
        };
    }

    /**
     * Crossover of the optimum foot: the derivative of the step factor at foot length 0 has the sign of share D - L, for
     * every form.
     *
     * @param seriesShare share of the foot length that is taken out of the limb, 0 to 1
     * @return D/L; empty for a foot that takes nothing from the limb
     */
    public static OptionalDouble optimumFoot(double seriesShare) {
        return seriesShare > 0 ? OptionalDouble.of(1 / seriesShare) : OptionalDouble.empty();
    }

    private static double smallAngle(int n) {
        return (n + 1.0) / n * (1 - 1 / Math.sqrt(n + 1.0));
    }

    private static OptionalDouble numerical(WorkForm form, int n, double share) {
        double reach = TransitionWork.reach(form);
        double last = 0;
        for (int i = 1; i * MARCH < reach; i++) {
            double d = i * MARCH;
            double difference = difference(form, n, share, d);
            if (Double.isNaN(difference)) {
                break;
            }
            if (difference >= 0) {
                double low = last;
                return low == 0
                        ? OptionalDouble.of(d)
                        : OptionalDouble.of(Root.inBracket(x -> difference(form, n, share, x), low, d));
            }
            last = d;
        }
        return OptionalDouble.empty();
    }

    /** Foot minus compass; NaN where the foot is out of reach. */
    private static double difference(WorkForm form, int n, double share, double d) {
        double radius = 1 - share * d * n / (n + 1);
        double ratio = d / ((n + 1) * radius);
        if (!(radius > 0) || ratio >= TransitionWork.reach(form)) {
            return Double.NaN;
        }
        return (n + 1) * TransitionWork.factor(form, ratio * ratio) - TransitionWork.factor(form, d * d);
    }
}
