package org.solewright.analysis.cost;

import org.solewright.analysis.dynamics.Limit;
import org.solewright.analysis.dynamics.LimitException;
import org.solewright.analysis.numerics.Root;
import org.solewright.domain.cost.WorkForm;

/**
 * An index of what a step costs: work of transitions, swinging the limb, activating pivots [derived from Kuo 2002 and Doke,
 * Donelan & Kuo 2005]. It is no metabolic rate: the step length of people at one speed is put in by {@link #calibrated}, the
 * ratio of the parts is what is calibrated, and the level of the swing is about five times too low.
 *
 * @param workCost c_w, cost per work of transitions
 * @param swingCost C_s, cost of the swing
 * @param activationCost C_a, cost of activating a pivot
 * @param naturalFrequency of the limb, dimensionless; 0 for a swing that grows with the fourth power of the frequency
 * @param gravity m/s2
 */
public record CostIndex(
        double workCost, double swingCost, double activationCost, double naturalFrequency, double gravity) {

    /** Positive work at 25 % efficiency [Donelan, Kram & Kuo 2002]; for transitions alone it is assumed. */
    public static final double DEFAULT_WORK_COST = 4;
    /** Calibrated on a rolling foot of 0.3 limb lengths at 1.25 m/s with activation a tenth of the cost [derived]. */
    public static final double DEFAULT_SWING_COST = 0.0936125733749551;
    /** As the swing cost. */
    public static final double DEFAULT_ACTIVATION_COST = 0.0023110945278763478;

    private static final int GRID = 160;
    private static final double SHORTEST = 0.1;

    /**
     * The three parts at one step length, per mass.
     *
     * @param work W/kg
     * @param swing W/kg
     * @param activation W/kg
     * @param slope derivative of their sum by step length, W/kg/m
     */
    public record Rates(double work, double swing, double activation, double slope) {
        /**
         * Their sum.
         *
         * @return W/kg
         */
        public double total() {
            return work + swing + activation;
        }
    }

    /**
     * The cheapest step length.
     *
     * @param stepLength m
     * @param isAtBound whether it is the shortest or longest that was tried
     * @param rates there
     */
    public record Optimum(double stepLength, boolean isAtBound, Rates rates) {}

    /**
     * Rates at a step length.
     *
     * @param factor limb and foot
     * @param speed m/s, above 0
     * @param stepLength m
     * @return the parts
     * @throws LimitException where the limb cannot take the step
     */
    public Rates at(StepFactor factor, double speed, double stepLength) throws LimitException {
        return rates(factor.at(stepLength), factor.limbLength(), factor.activations(), speed, stepLength);
    }

    /**
     * Rates at a step length where the work of the step is known.
     *
     * @param factor work over m v^2/2 and its slope
     * @param limbLength m, above 0
     * @param activations pivots that are activated in a step
     * @param speed m/s, above 0
     * @param stepLength m, above 0
     * @return the parts
     */
    Rates rates(StepFactor.Value factor, double limbLength, int activations, double speed, double stepLength) {
        double frequency = speed / stepLength;
        double work = workCost * factor.factor() * speed * speed / 2 * frequency;
        double workSlope =
                workCost * speed * speed * speed / 2 * (factor.slope() - factor.factor() / stepLength) / stepLength;
        double phi2 = frequency * frequency * limbLength / gravity;
        double natural = naturalFrequency * naturalFrequency;
        double over = naturalFrequency > 0 ? Math.max(phi2 - natural, 0) : phi2;
        double swingUnit = swingCost * gravity * Math.sqrt(gravity * limbLength) / limbLength;
        double swing = swingUnit * stepLength * phi2 * over;
        double swingSlope = over > 0 ? swingUnit * (phi2 * over - 2 * phi2 * over - 2 * phi2 * phi2) : 0;
        double activation = activationCost * gravity * limbLength * activations * frequency;
        return new Rates(work, swing, activation, workSlope + swingSlope - activation / stepLength);
    }

    /**
     * The default coefficients.
     *
     * @param gravity m/s2, above 0
     * @return the index with a swing that grows with the fourth power of the frequency
     */
    public static CostIndex standard(double gravity) {
        return new CostIndex(DEFAULT_WORK_COST, DEFAULT_SWING_COST, DEFAULT_ACTIVATION_COST, 0, gravity);
    }

    /**
     * The step length of the least cost: the best of a grid, then the root of the derivative.
     *
     * @param factor limb and foot
     * @param speed m/s, above 0
     * @return the optimum
     * @throws LimitException NO_SOLUTION where no step can be taken
     */
    public Optimum optimum(StepFactor factor, double speed) throws LimitException {
        double low = Math.max(SHORTEST * factor.limbLength(), factor.shortest());
        double high = factor.longest();
        if (!(high > low)) {
            throw new LimitException(
                    Limit.NO_SOLUTION,
                    VaultingStep.text("step lengths from %s m to %s m, expected a range", low, high));
        }
        int best = -1;
        double least = Double.POSITIVE_INFINITY;
        for (int i = 0; i < GRID; i++) {
            double cost = costOrInfinity(factor, speed, grid(low, high, i));
            if (cost < least) {
                least = cost;
                best = i;
            }
        }
        if (best < 0) {
            throw new LimitException(
                    Limit.NO_SOLUTION, VaultingStep.text("no step between %s m and %s m can be taken", low, high));
        }
        double from = grid(low, high, Math.max(0, best - 1));
        double to = grid(low, high, Math.min(GRID - 1, best + 1));
        double atFrom = slopeOrNaN(factor, speed, from);
        double atTo = slopeOrNaN(factor, speed, to);
        boolean isInside = atFrom < 0 && atTo > 0;
        double step = isInside ? Root.inBracket(d -> slopeOrNaN(factor, speed, d), from, to) : grid(low, high, best);
        return new Optimum(step, !isInside, at(factor, speed, step));
    }

    /** The last place is just short of the reach, where some factors have a pole. */
    private static double grid(double low, double high, int i) {
        return low + (high * (1 - 1e-9) - low) * i / (GRID - 1);
    }

    private double costOrInfinity(StepFactor factor, double speed, double stepLength) {
        try {
            return at(factor, speed, stepLength).total();
        } catch (LimitException e) {
            return Double.POSITIVE_INFINITY;
        }
    }

    private double slopeOrNaN(StepFactor factor, double speed, double stepLength) {
        try {
            return at(factor, speed, stepLength).slope();
        } catch (LimitException e) {
            return Double.NaN;
        }
    }

    /**
     * Coefficients with which a rolling foot has its optimum at a given step and activation a given share of the cost.
     *
     * @param workCost c_w, above 0
     * @param activationShare of the whole, 0 to below 1
     * @param rollingRatio arc radius over limb length
     * @param limbLength m
     * @param stepLength m
     * @param speed m/s, above 0
     * @param naturalFrequency of the limb, dimensionless; 0 for the fourth power
     * @param gravity m/s2
     * @return the index
     * @throws LimitException where the step is out of reach; NO_SOLUTION where no swing cost has that optimum
     */
    public static CostIndex calibrated(
            double workCost,
            double activationShare,
            double rollingRatio,
            double limbLength,
            double stepLength,
            double speed,
            double naturalFrequency,
            double gravity)
            throws LimitException {
        StepFactor factor = new StepFactor.Rolling(WorkForm.PUSH_OFF, limbLength, rollingRatio);
        Rates work = new CostIndex(workCost, 0, 0, naturalFrequency, gravity).at(factor, speed, stepLength);
        Rates swing = new CostIndex(0, 1, 0, naturalFrequency, gravity).at(factor, speed, stepLength);
        Rates activation = new CostIndex(0, 0, 1, naturalFrequency, gravity).at(factor, speed, stepLength);
        // Two linear equations: slopes sum to 0; activation = share x sum.
        double a = swing.slope();
        double b = activation.slope();
        double c = -activationShare * swing.swing();
        double d = (1 - activationShare) * activation.activation();
        double determinant = a * d - b * c;
        double swingCost = (-work.slope() * d - b * activationShare * work.work()) / determinant;
        double activationCost = (a * activationShare * work.work() + c * work.slope()) / determinant;
        if (!(swingCost > 0 && activationCost >= 0 && Double.isFinite(swingCost))) {
            throw new LimitException(
                    Limit.NO_SOLUTION,
                    VaultingStep.text(
                            "swing cost %s and activation cost %s, expected positive ones: the step cannot be an"
                                    + " optimum",
                            swingCost, activationCost));
        }
        return new CostIndex(workCost, swingCost, activationCost, naturalFrequency, gravity);
    }
}
