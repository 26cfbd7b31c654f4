package org.solewright.analysis.cost;

import java.util.List;
import org.solewright.analysis.dynamics.Limit;
import org.solewright.analysis.dynamics.LimitException;
import org.solewright.analysis.numerics.Root;

/**
 * Walking as a row of vaults with impulsive transitions [derived; collision losses as McGeer 1990]. Speeds are the hip's;
 * works and impulses are per unit mass.
 *
 * @param startSpeed just after heel strike, m/s
 * @param stepTime s
 * @param endSpeed at the start of the next step, m/s
 * @param transitions in their order, the last one is the heel strike
 */
public record VaultingGait(double startSpeed, double stepTime, double endSpeed, List<Transition> transitions) {

    /** Below this spare the time at the top no longer tells speeds apart. */
    private static final double LEAST_SPARE = 1e-300;

    /**
     * One transition.
     *
     * @param speedBefore m/s
     * @param speedAfter m/s
     * @param angle between the velocities before and after, rad
     * @param pushImpulse along the old limb, N s/kg
     * @param collisionImpulse along the new limb, N s/kg
     */
    public record Transition(
            double speedBefore, double speedAfter, double angle, double pushImpulse, double collisionImpulse) {

        /**
         * Work of the push.
         *
         * @return J/kg
         */
        public double pushOffWork() {
            return pushImpulse * pushImpulse / 2;
        }

        /**
         * Loss of the collision.
         *
         * @return J/kg
         */
        public double collisionLoss() {
            return collisionImpulse * collisionImpulse / 2;
        }
    }

    /**
     * Start speeds between which the hip clears every top and no limb has to pull.
     *
     * @param least m/s
     * @param greatest m/s
     */
    public record SpeedWindow(double least, double greatest) {}

    /** Copies the list. */
    public VaultingGait {
        transitions = List.copyOf(transitions);
    }

    /**
     * Work of all pushes.
     *
     * @return J/kg
     */
    public double pushOffWork() {
        return transitions.stream().mapToDouble(Transition::pushOffWork).sum();
    }

    /**
     * Loss of all collisions.
     *
     * @return J/kg
     */
    public double collisionLoss() {
        return transitions.stream().mapToDouble(Transition::collisionLoss).sum();
    }

    /**
     * Start speeds of a level gait that pushes at every transition.
     *
     * @param step geometry of the step
     * @param gravity m/s2
     * @return the window
     * @throws LimitException TAKE_OFF where every speed that clears the tops is too fast
     */
    public static SpeedWindow window(VaultingStep step, double gravity) throws LimitException {
        VaultedStep all = new VaultedStep(VaultChain.of(step, gravity, 0), PushOffPolicy.ALL);
        all.requireWindow();
        return new SpeedWindow(Math.sqrt(all.leastSquare()), Math.sqrt(all.greatestSquare()));
    }

    /**
     * The level gait that repeats itself at a mean speed.
     *
     * @param step geometry of the step
     * @param meanSpeed step length over step time, m/s, above 0
     * @param policy where the limb pushes
     * @param gravity m/s2
     * @return the gait
     * @throws LimitException NO_PERIODIC_GAIT without a push, TAKE_OFF where it is too fast, APEX_NOT_CLEARED where no speed
     *     is slow enough, OVER_PUSH, REVERSES_AT_TRANSITION
     */
    public static VaultingGait level(VaultingStep step, double meanSpeed, PushOffPolicy policy, double gravity)
            throws LimitException {
        if (policy == PushOffPolicy.NONE) {
            throw new LimitException(
                    Limit.NO_PERIODIC_GAIT, "policy none on level ground loses energy at every step: give a push");
        }
        VaultedStep vaulted = new VaultedStep(VaultChain.of(step, gravity, 0), policy);
        vaulted.requireWindow();
        double most = vaulted.greatestSquare() - vaulted.leastSquare();
        double time = step.stepLength() / meanSpeed;
        if (time < vaulted.time(most)) {
            throw new LimitException(
                    Limit.TAKE_OFF,
                    VaultingStep.text(
                            "mean speed %s m/s, expected at most %s m/s: faster the limb would have to pull",
                            meanSpeed, step.stepLength() / vaulted.time(most)));
        }
        if (!(time < vaulted.time(LEAST_SPARE))) {
            throw new LimitException(
                    Limit.APEX_NOT_CLEARED,
                    VaultingStep.text(
                            "mean speed %s m/s, expected more than %s m/s: slower the hip does not pass the top",
                            meanSpeed, step.stepLength() / vaulted.time(LEAST_SPARE)));
        }
        // Near the slowest speed the time grows as the logarithm of the spare, which is the variable.
        double spare = Math.exp(Root.inBracket(
                u -> vaulted.time(Math.min(most, Math.exp(u))) - time, Math.log(LEAST_SPARE), Math.log(most)));
        return vaulted.gait(Math.min(most, spare));
    }

    /**
     * The gait down a slope that needs no push.
     *
     * @param step geometry of the step, along the slope
     * @param slope rad, descending forward
     * @param gravity m/s2
     * @return the gait
     * @throws LimitException NO_PERIODIC_GAIT on a slope that does not descend, APEX_NOT_CLEARED where it is too gentle,
     *     TAKE_OFF where it is too steep, REVERSES_AT_TRANSITION
     */
    public static VaultingGait passive(VaultingStep step, double slope, double gravity) throws LimitException {
        VaultedStep vaulted = new VaultedStep(VaultChain.of(step, gravity, slope), PushOffPolicy.NONE);
        double square = vaulted.fixedSquare();
        if (!(square > 0)) {
            throw new LimitException(
                    Limit.NO_PERIODIC_GAIT,
                    VaultingStep.text("slope %s rad, expected one that descends: more than 0 rad", slope));
        }
        return vaulted.within(square);
    }

    /**
     * What a small change of the speed at heel strike leaves of itself a step later.
     *
     * @param step geometry of the step
     * @return product of cos^2 of the transition angles
     */
    public static double passiveEigenvalue(VaultingStep step) {
        double product = 1;
        for (int k = 0; k < step.transitions(); k++) {
            double cosine = Math.cos(step.angle(k));
            product *= cosine * cosine;
        }
        return product;
    }

    /**
     * One step over a foot whose pivots lie anywhere, on the level.
     *
     * @param foot pivots and step
     * @param startSpeed m/s, above 0
     * @param policy where the limb pushes
     * @param gravity m/s2
     * @return the step
     * @throws LimitException APEX_NOT_CLEARED, TAKE_OFF, OVER_PUSH, NEGATIVE_PUSH, REVERSES_AT_TRANSITION
     */
    public static VaultingGait polygon(PivotPolygon foot, double startSpeed, PushOffPolicy policy, double gravity)
            throws LimitException {
        return new VaultedStep(VaultChain.of(foot, gravity), policy).within(startSpeed * startSpeed);
    }
}
