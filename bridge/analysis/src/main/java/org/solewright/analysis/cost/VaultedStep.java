package org.solewright.analysis.cost;

import java.util.ArrayList;
import java.util.List;
import org.solewright.analysis.dynamics.Limit;
import org.solewright.analysis.dynamics.LimitException;

/**
 * A chain of vaults with a policy of pushing: the squared speed at the start of vault k is scale[k] v0^2 + shift[k], v0 the
 * speed at the start of the step.
 */
final class VaultedStep {

    private final VaultChain chain;
    private final PushOffPolicy policy;
    private final double[] scale;
    private final double[] shift;
    private final double leastSquare;
    private final double greatestSquare;

    VaultedStep(VaultChain chain, PushOffPolicy policy) throws LimitException {
        this.chain = chain;
        this.policy = policy;
        int n = chain.vaults();
        this.scale = new double[n + 1];
        this.shift = new double[n + 1];
        scale[0] = 1;
        for (int k = 0; k < n; k++) {
            double kept = kept(k);
            scale[k + 1] = scale[k] * kept;
            shift[k + 1] = (shift[k] + chain.gain(k)) * kept;
        }
        double least = 0;
        double greatest = Double.POSITIVE_INFINITY;
        for (int k = 0; k < n; k++) {
            least = Math.max(least, (chain.leastSquare(k) - shift[k]) / scale[k]);
            greatest = Math.min(greatest, (chain.greatestSquare(k) - shift[k]) / scale[k]);
        }
        this.leastSquare = least;
        this.greatestSquare = greatest;
    }

    /** Share of the squared speed that a transition leaves; the toe's own push restores the start speed. */
    private double kept(int k) throws LimitException {
        boolean isPushed = policy == PushOffPolicy.ALL || (policy == PushOffPolicy.TOE && k == chain.vaults() - 1);
        if (isPushed) {
            return 1;
        }
        RollingFoot.checkForward(chain.angle(k));
        double cosine = Math.cos(chain.angle(k));
        return cosine * cosine;
    }

    /** Squared start speed at which the hip just passes every top, m2/s2. */
    double leastSquare() {
        return leastSquare;
    }

    /** Greatest squared start speed without a pull, m2/s2. */
    double greatestSquare() {
        return greatestSquare;
    }

    void requireWindow() throws LimitException {
        if (!(greatestSquare > leastSquare)) {
            throw new LimitException(
                    Limit.TAKE_OFF,
                    VaultingStep.text(
                            "squared start speed up to %s m2/s2 without a pull, expected more than the %s m2/s2 that"
                                    + " clear the tops",
                            greatestSquare, leastSquare));
        }
    }

    /** Squared start speed that comes back a step later. */
    double fixedSquare() {
        int n = chain.vaults();
        return shift[n] == 0 ? 0 : shift[n] / (1 - scale[n]);
    }

    /** Squared speed that vault k has to spare at its top, by the start's spare over the least. */
    private double spare(int k, double spare) {
        double bound = (chain.leastSquare(k) - shift[k]) / scale[k];
        return scale[k] * (spare + Math.max(0, leastSquare - bound));
    }

    /** Duration of the step by the squared start speed over the least, s. */
    double time(double spare) {
        double time = 0;
        for (int k = 0; k < chain.vaults(); k++) {
            time += chain.duration(k, spare(k, spare));
        }
        return time;
    }

    /** The step from a squared start speed, after a check of its limits. */
    VaultingGait within(double square) throws LimitException {
        if (!(square > leastSquare)) {
            throw new LimitException(
                    Limit.APEX_NOT_CLEARED,
                    VaultingStep.text(
                            "start speed %s m/s, expected more than %s m/s to pass every top",
                            Math.sqrt(square), Math.sqrt(leastSquare)));
        }
        if (!(square <= greatestSquare)) {
            throw new LimitException(
                    Limit.TAKE_OFF,
                    VaultingStep.text(
                            "start speed %s m/s, expected at most %s m/s: faster the limb would have to pull",
                            Math.sqrt(square), Math.sqrt(Math.max(0, greatestSquare))));
        }
        return gait(square - leastSquare);
    }

    VaultingGait gait(double spare) throws LimitException {
        double square = leastSquare + spare;
        double startSpeed = Math.sqrt(square);
        List<VaultingGait.Transition> transitions = new ArrayList<>();
        double speed = startSpeed;
        for (int k = 0; k < chain.vaults(); k++) {
            double before = Math.sqrt(scale[k] * square + shift[k] + chain.gain(k));
            VaultingGait.Transition t = transition(k, before, startSpeed);
            transitions.add(t);
            speed = t.speedAfter();
        }
        return new VaultingGait(startSpeed, time(spare), speed, transitions);
    }

    private VaultingGait.Transition transition(int k, double before, double startSpeed) throws LimitException {
        double angle = chain.angle(k);
        double push = 0;
        if (policy == PushOffPolicy.ALL) {
            push = before * Math.tan(angle / 2);
        } else if (policy == PushOffPolicy.TOE && k == chain.vaults() - 1) {
            push = (startSpeed - before * Math.cos(angle)) / Math.sin(angle);
        }
        double collision = before * Math.sin(angle) - push * Math.cos(angle);
        if (push < 0) {
            throw new LimitException(
                    Limit.NEGATIVE_PUSH,
                    VaultingStep.text("push of %s N s/kg at transition %d, expected 0 or more", push, k + 1));
        }
        if (collision < 0) {
            throw new LimitException(
                    Limit.OVER_PUSH,
                    VaultingStep.text(
                            "collision of %s N s/kg at transition %d, expected 0 or more: the new limb would pull",
                            collision, k + 1));
        }
        double after = before * Math.cos(angle) + push * Math.sin(angle);
        return new VaultingGait.Transition(before, after, angle, push, collision);
    }
}
