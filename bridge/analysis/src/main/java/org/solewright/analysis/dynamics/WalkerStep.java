package org.solewright.analysis.dynamics;

import java.util.Locale;
import org.apache.commons.math3.exception.MaxCountExceededException;
import org.apache.commons.math3.exception.NoBracketingException;
import org.apache.commons.math3.exception.NumberIsTooSmallException;
import org.apache.commons.math3.ode.FirstOrderDifferentialEquations;
import org.apache.commons.math3.ode.events.EventHandler;
import org.apache.commons.math3.ode.nonstiff.DormandPrince853Integrator;

/**
 * One step of the simplest walker from heel strike to heel strike, with its derivatives by the variational equations: the
 * stride map of half angle and stance rate. Finite differences of a map with a located event would cost half the digits.
 */
final class WalkerStep {

    private static final double LONGEST = 30;
    private static final double TOLERANCE = 1e-14;
    private static final double CHECK_INTERVAL = 0.05;
    private static final double EVENT_ACCURACY = 1e-13;
    private static final int MOST_EVALUATIONS = 60_000;
    private static final int MOST_EVENT_ITERATIONS = 100;

    private final double[] end;
    private final double time;
    private final double halfAngle;
    private final double rateAfter;
    /** Derivatives of half angle, stance rate and time, each by the four varied quantities. */
    private final double[][] derivative = new double[3][WalkerModel.VARIED];

    private WalkerStep(WalkerModel model, double time, double[] y, double[] rates) {
        this.end = y;
        double gap = y[0] + y[1];
        double gapRate = rates[0] + rates[1];
        // The last correction to the event is smaller than its square can show.
        double late = -gap / gapRate;
        this.time = time + late;
        this.halfAngle = y[0] + rates[0] * late;
        double rate = y[2] + rates[2] * late;
        double beta = model.contactAngle(halfAngle);
        double betaRate = model.contactAngleRate(halfAngle);
        double reach = Math.sqrt(model.squaredReach(halfAngle));
        double reachRate = -model.rollingRatio() * model.leg() * Math.sin(halfAngle) / reach;
        double sine = Math.sin(2 * beta);
        double cosine = Math.cos(2 * beta);
        double push = model.pushImpulse();
        this.rateAfter = rate * cosine + push * sine / reach;
        double byAngle = -2 * sine * betaRate * rate
                + push * (2 * cosine * betaRate / reach - sine * reachRate / (reach * reach));
        for (int k = 0; k < WalkerModel.VARIED; k++) {
            int at = WalkerModel.STATE * (k + 1);
            double delay = -(y[at] + y[at + 1]) / gapRate;
            double angle = y[at] + rates[0] * delay;
            derivative[0][k] = angle;
            derivative[1][k] = cosine * (y[at + 2] + rates[2] * delay) + byAngle * angle + (k == 2 ? sine / reach : 0);
            derivative[2][k] = delay;
        }
    }

    /**
     * A step.
     *
     * @param model the walker
     * @param halfAngle at its start, above 0
     * @param rate of the stance limb at its start
     * @return the step
     * @throws LimitException NO_HEEL_STRIKE where the swing limb does not come down ahead of the stance limb
     */
    static WalkerStep of(WalkerModel model, double halfAngle, double rate) throws LimitException {
        double[] y = model.start(halfAngle, rate);
        HeelStrike strike = new HeelStrike(halfAngle);
        DormandPrince853Integrator integrator = new DormandPrince853Integrator(1e-10, 1, TOLERANCE, TOLERANCE);
        integrator.setMaxEvaluations(MOST_EVALUATIONS);
        integrator.addEventHandler(strike, CHECK_INTERVAL, EVENT_ACCURACY, MOST_EVENT_ITERATIONS);
        double time;
        try {
            time = integrator.integrate(new Motion(model), 0, y, LONGEST, y);
        } catch (MaxCountExceededException | NumberIsTooSmallException | NoBracketingException e) {
            throw noStrike(halfAngle, rate);
        }
        if (!strike.isMet) {
            throw noStrike(halfAngle, rate);
        }
        double[] rates = new double[y.length];
        model.rates(y, rates);
        if (!(rates[0] + rates[1] > 0)) {
            throw noStrike(halfAngle, rate);
        }
        return new WalkerStep(model, time, y, rates);
    }

    private static LimitException noStrike(double halfAngle, double rate) {
        return new LimitException(
                Limit.NO_HEEL_STRIKE,
                String.format(
                        Locale.ROOT,
                        "no heel strike within %s limb times from a half angle of %s rad and a stance rate of %s",
                        LONGEST,
                        halfAngle,
                        rate));
    }

    double time() {
        return time;
    }

    double halfAngle() {
        return halfAngle;
    }

    double rateAfter() {
        return rateAfter;
    }

    /** Rate of the stance limb just before heel strike. */
    double rateBefore() {
        return end[2];
    }

    /**
     * A derivative.
     *
     * @param of 0 half angle, 1 stance rate, 2 time
     * @param by 0 half angle, 1 stance rate, 2 push impulse, 3 hip stiffness
     */
    double derivative(int of, int by) {
        return derivative[of][by];
    }

    /** The equations of motion as the integrator wants them. */
    private record Motion(WalkerModel model) implements FirstOrderDifferentialEquations {
        @Override
        public int getDimension() {
            return WalkerModel.STATE * (1 + WalkerModel.VARIED);
        }

        @Override
        public void computeDerivatives(double t, double[] y, double[] out) {
            model.rates(y, out);
        }
    }

    /** Both feet at one height, the swing foot coming down ahead; the mid-stance scuff is passed over. */
    private static final class HeelStrike implements EventHandler {
        private final double least;
        private boolean isMet;

        HeelStrike(double halfAngle) {
            this.least = halfAngle / 4;
        }

        @Override
        public void init(double t0, double[] y0, double t) {
            isMet = false;
        }

        @Override
        public double g(double t, double[] y) {
            return y[0] + y[1];
        }

        @Override
        public Action eventOccurred(double t, double[] y, boolean increasing) {
            isMet = increasing && y[0] > least;
            return isMet ? Action.STOP : Action.CONTINUE;
        }

        @Override
        public void resetState(double t, double[] y) {
            // The state runs on.
        }
    }
}
