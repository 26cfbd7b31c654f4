package org.solewright.analysis.dynamics;

import java.util.Locale;
import org.solewright.analysis.numerics.Root;

/**
 * Gaits of the simplest walking model that repeat themselves step by step: a heavy hip on two light limbs with round feet,
 * down a slope [Garcia et al. 1998] or pushed [Kuo 2002], with a hip spring. Everything is in units of limb length, gravity
 * and hip mass.
 */
public final class SimplestWalker {

    private static final int RUNGS = 12;
    private static final int FINE_RUNGS = 48;

    private static final double FIRST_SLOPE = 0.002;
    private static final double SLOPE_FACTOR = 1.15;
    private static final double STEEPEST = 0.6;

    private SimplestWalker() {}

    /** The two gaits of one walker; the short one is never stable. */
    public enum Gait {
        /** The swing limb swings back before heel strike. */
        LONG,
        /** It strikes before. */
        SHORT
    }

    /**
     * Step time of a gait for small steps.
     *
     * @param gait which
     * @param rollingRatio radius of the feet over limb length, 0 to below 1
     * @param hipStiffness over foot mass, gravity and limb length, above -1
     * @return in limb times
     */
    public static double leadingStepTime(Gait gait, double rollingRatio, double hipStiffness) {
        double omega = Math.sqrt(1 + hipStiffness);
        if (gait == Gait.SHORT) {
            return Math.PI / omega;
        }
        return 2 / omega * Root.inBracket(x -> longGait(x, omega, rollingRatio, hipStiffness), Math.PI / 2, Math.PI);
    }

    /** Zero at half the swing phase of the long gait's leading order. */
    private static double longGait(double x, double omega, double rollingRatio, double hipStiffness) {
        double leg = 1 - rollingRatio;
        double lambda = Math.sqrt(leg);
        double b = (leg + hipStiffness) / (leg + 1 + hipStiffness);
        double ratio = omega * (1 + b) / ((1 - b) * lambda);
        return Math.sin(x) + Math.cos(x) * ratio * Math.tanh(lambda * x / omega);
    }

    /**
     * Half angle of a passive gait for small steps, (slope tanh^2(lambda T/2)/c^3)^(1/3).
     *
     * @param gait which
     * @param slope rad, above 0
     * @param rollingRatio radius of the feet over limb length, 0 to below 1
     * @param hipStiffness over foot mass, gravity and limb length
     * @return rad
     */
    public static double leadingHalfAngle(Gait gait, double slope, double rollingRatio, double hipStiffness) {
        double leg = 1 - rollingRatio;
        double tangent = Math.tanh(Math.sqrt(leg) * leadingStepTime(gait, rollingRatio, hipStiffness) / 2);
        return Math.cbrt(slope * tangent * tangent / (leg * leg * leg));
    }

    /** Half angle at which slope and push make up for the loss, small steps: slope = c^2 k^2 a^3 - c k P a. */
    private static double startAngle(WalkerModel model, double stepTime) throws LimitException {
        double leg = model.leg();
        double lambda = Math.sqrt(leg);
        double k = lambda / Math.tanh(lambda * stepTime / 2);
        double ck = leg * k;
        double push = Math.max(0, model.pushImpulse());
        double low = Math.sqrt(push / (3 * ck));
        double atLow = ck * ck * low * low * low - ck * push * low - model.slope();
        if (!(model.slope() > 0 || (push > 0 && atLow < 0))) {
            throw new LimitException(
                    Limit.NO_PERIODIC_GAIT,
                    String.format(
                            Locale.ROOT,
                            "slope %s rad and push impulse %s, expected a descent or a push that makes up for the loss",
                            model.slope(),
                            model.pushImpulse()));
        }
        double high = 2 * (low + Math.cbrt(Math.max(0, model.slope()) / (ck * ck)) + Math.sqrt(push / ck));
        return Root.inBracket(a -> ck * ck * a * a * a - ck * push * a - model.slope(), low, high);
    }

    private static double startRate(WalkerModel model, double halfAngle, double stepTime) {
        double leg = model.leg();
        double lambda = Math.sqrt(leg);
        double lean = model.slope() / leg;
        double phase = lambda * stepTime;
        return lambda * ((halfAngle - lean) * Math.cosh(phase) + halfAngle + lean) / Math.sinh(phase);
    }

    private static WalkerModel model(double slope, double rollingRatio, double hipStiffness, double push)
            throws LimitException {
        if (!(rollingRatio >= 0 && rollingRatio < 1)) {
            throw new LimitException(
                    Limit.ARC_RADIUS,
                    String.format(
                            Locale.ROOT, "radius of the feet %s limb lengths, expected 0 to below 1", rollingRatio));
        }
        if (!(hipStiffness > -1)) {
            throw new LimitException(
                    Limit.NO_PERIODIC_GAIT,
                    String.format(Locale.ROOT, "hip stiffness %s, expected more than -1", hipStiffness));
        }
        if (push < 0) {
            throw new LimitException(
                    Limit.NEGATIVE_PUSH, String.format(Locale.ROOT, "push impulse %s, expected 0 or more", push));
        }
        return new WalkerModel(slope, rollingRatio, hipStiffness, push);
    }

    /**
     * The gait of a walker whose slope and push are given.
     *
     * @param gait which
     * @param slope rad, descending forward
     * @param rollingRatio radius of the feet over limb length, 0 to below 1
     * @param hipStiffness over foot mass, gravity and limb length
     * @param push impulse per hip mass, not negative
     * @return the gait
     * @throws LimitException ARC_RADIUS, NEGATIVE_PUSH, NO_PERIODIC_GAIT, NO_HEEL_STRIKE, OVER_PUSH
     */
    public static WalkerGait passive(Gait gait, double slope, double rollingRatio, double hipStiffness, double push)
            throws LimitException {
        WalkerModel model = model(slope, rollingRatio, hipStiffness, push);
        return ofKind(gait, model, (kind, rungs) -> climb(kind, model, rungs));
    }

    /** From a small step of the kind up to the wanted one; with one rung, straight from the leading order. */
    private static WalkerSearch climb(Gait gait, WalkerModel model, int rungs) throws LimitException {
        double time = leadingStepTime(gait, model.rollingRatio(), model.hipStiffness());
        WalkerModel part = model.gentler(1.0 / rungs);
        double angle = startAngle(part, time);
        WalkerSearch rung = WalkerSearch.ofStep(part, angle, startRate(part, angle, time));
        boolean holds = rung.converges();
        for (int k = 2; k <= rungs && holds; k++) {
            part = model.gentler((double) k / rungs);
            rung = WalkerSearch.ofStep(part, rung.halfAngle() * k / (k - 1), rung.rate() * k / (k - 1));
            holds = rung.converges();
        }
        return rung;
    }

    /**
     * The gait of a walker whose step is given; the push is sought.
     *
     * @param gait which
     * @param slope rad, descending forward
     * @param rollingRatio radius of the feet over limb length, 0 to below 1
     * @param hipStiffness over foot mass, gravity and limb length
     * @param halfAngle rad
     * @return the gait
     * @throws LimitException ARC_RADIUS, STEP_OUT_OF_REACH, NO_PERIODIC_GAIT, NO_HEEL_STRIKE, NEGATIVE_PUSH, OVER_PUSH
     */
    public static WalkerGait powered(
            Gait gait, double slope, double rollingRatio, double hipStiffness, double halfAngle) throws LimitException {
        WalkerModel model = model(slope, rollingRatio, hipStiffness, 0);
        requireAngle(halfAngle);
        return ofKind(gait, model, (kind, rungs) -> climb(kind, model, halfAngle, rungs));
    }

    private static WalkerSearch climb(Gait gait, WalkerModel model, double halfAngle, int rungs) {
        double time = leadingStepTime(gait, model.rollingRatio(), model.hipStiffness());
        WalkerModel part = new WalkerModel(model.slope() / rungs, model.rollingRatio(), model.hipStiffness(), 0);
        double angle = halfAngle / rungs;
        WalkerSearch rung = pushed(part, angle, startRate(part, angle, time));
        boolean holds = rung.converges();
        for (int k = 2; k <= rungs && holds; k++) {
            part = new WalkerModel(model.slope() * k / rungs, model.rollingRatio(), model.hipStiffness(), 0);
            rung = WalkerSearch.ofPush(part, halfAngle * k / rungs, rung.rate() * k / (k - 1), rung.push());
            holds = rung.converges();
        }
        return rung;
    }

    /** A search for a gait of a kind, in so many rungs from a small step. */
    @FunctionalInterface
    private interface Climb {
        WalkerSearch to(Gait gait, int rungs) throws LimitException;
    }

    /** The gait of the wanted kind: straight, else by rungs; Newton's method may meet the other kind on the way. */
    private static WalkerGait ofKind(Gait gait, WalkerModel model, Climb climb) throws LimitException {
        WalkerSearch straight = straightOrByRungs(gait, climb);
        if (!straight.converges()) {
            throw straight.failure();
        }
        Gait other = gait == Gait.LONG ? Gait.SHORT : Gait.LONG;
        double time = straight.stepTime();
        double own = Math.abs(time - leadingStepTime(gait, model.rollingRatio(), model.hipStiffness()));
        double others = Math.abs(time - leadingStepTime(other, model.rollingRatio(), model.hipStiffness()));
        if (2 * own < others || !straight.meets(straightOrByRungs(other, climb))) {
            return straight.gait();
        }
        for (int rungs : new int[] {RUNGS, FINE_RUNGS}) {
            WalkerSearch climbed = climb.to(gait, rungs);
            if (climbed.converges() && !straight.meets(climbed)) {
                return climbed.gait();
            }
        }
        if (own <= others) {
            return straight.gait();
        }
        throw new LimitException(
                Limit.NO_PERIODIC_GAIT,
                String.format(
                        Locale.ROOT,
                        "only the other gait is found at slope %s rad, feet of %s limb lengths, hip stiffness %s",
                        model.slope(),
                        model.rollingRatio(),
                        model.hipStiffness()));
    }

    private static WalkerSearch straightOrByRungs(Gait gait, Climb climb) throws LimitException {
        WalkerSearch straight = climb.to(gait, 1);
        return straight.converges() ? straight : climb.to(gait, RUNGS);
    }

    private static WalkerSearch pushed(WalkerModel model, double halfAngle, double rate) {
        double push = rate * Math.sqrt(model.squaredReach(halfAngle)) * Math.tan(model.contactAngle(halfAngle));
        return WalkerSearch.ofPush(model, halfAngle, rate, push);
    }

    private static void requireAngle(double halfAngle) throws LimitException {
        if (!(halfAngle > 0 && halfAngle < Math.PI / 2)) {
            throw new LimitException(
                    Limit.STEP_OUT_OF_REACH,
                    String.format(Locale.ROOT, "half angle %s rad, expected 0 to pi/2 rad", halfAngle));
        }
    }

    /**
     * The long level gait of a wanted speed and step length; hip spring and push are sought.
     *
     * @param speed step length over step time, above 0
     * @param stepLength in limb lengths
     * @param rollingRatio radius of the feet over limb length, 0 to below 1
     * @return the gait
     * @throws LimitException ARC_RADIUS, NONPOSITIVE_STEP, STEP_OUT_OF_REACH, NO_SOLUTION, NO_HEEL_STRIKE
     */
    public static WalkerGait target(double speed, double stepLength, double rollingRatio) throws LimitException {
        WalkerModel model = model(0, rollingRatio, 0, 0);
        if (!(stepLength > 0)) {
            throw new LimitException(
                    Limit.NONPOSITIVE_STEP,
                    String.format(Locale.ROOT, "step length %s limb lengths, expected more than 0", stepLength));
        }
        if (!(stepLength < model.stepLength(Math.PI / 2))) {
            throw new LimitException(
                    Limit.STEP_OUT_OF_REACH,
                    String.format(
                            Locale.ROOT,
                            "step length %s limb lengths, expected less than %s",
                            stepLength,
                            model.stepLength(Math.PI / 2)));
        }
        double time = stepLength / speed;
        double angle = Root.inBracket(a -> model.stepLength(a) - stepLength, 0, Math.PI / 2);
        WalkerModel sprung = model.with(0, stiffness(time, rollingRatio));
        double rate = startRate(sprung, angle, time);
        double push = rate * Math.sqrt(model.squaredReach(angle)) * Math.tan(model.contactAngle(angle));
        WalkerSearch search = WalkerSearch.ofSpring(sprung, angle, rate, push, time);
        if (search.converges()) {
            return search.gait();
        }
        WalkerSearch rung = search;
        for (int k = 1; k <= RUNGS; k++) {
            double part = angle * k / RUNGS;
            rung = k == 1
                    ? WalkerSearch.ofSpring(sprung, part, startRate(sprung, part, time), push / (RUNGS * RUNGS), time)
                    : WalkerSearch.ofSpring(
                            model.with(0, rung.stiffness()),
                            part,
                            rung.rate() * k / (k - 1),
                            rung.push() * k * k / ((k - 1) * (k - 1)),
                            time);
            if (!rung.converges()) {
                throw rung.failure();
            }
        }
        return rung.gait();
    }

    /** Stiffness at which the long gait's leading step time is the wanted one. */
    private static double stiffness(double time, double rollingRatio) throws LimitException {
        double low = Math.max(Math.PI / time, 1e-3);
        double high = 2 * Math.PI / time;
        double atLow = stiffnessGap(low, time, rollingRatio);
        double atHigh = stiffnessGap(high, time, rollingRatio);
        if (!(low < high && atLow > 0 && atHigh < 0)) {
            throw new LimitException(
                    Limit.NO_SOLUTION,
                    String.format(Locale.ROOT, "no hip spring gives a step time of %s: the step takes too long", time));
        }
        double omega = Root.inBracket(o -> stiffnessGap(o, time, rollingRatio), low, high);
        return omega * omega - 1;
    }

    private static double stiffnessGap(double omega, double time, double rollingRatio) {
        return longGait(omega * time / 2, omega, rollingRatio, omega * omega - 1);
    }

    /**
     * The gentlest slope at which the long gait becomes one of two steps: an eigenvalue of -1.
     *
     * @param rollingRatio radius of the feet over limb length, 0 to below 1
     * @param hipStiffness over foot mass, gravity and limb length
     * @return the gait at that slope; the slope is its model's
     * @throws LimitException ARC_RADIUS; NO_SOLUTION where no slope up to 0.6 rad does
     */
    public static Doubling periodDoubling(double rollingRatio, double hipStiffness) throws LimitException {
        double slope = FIRST_SLOPE;
        WalkerGait before = passive(Gait.LONG, slope, rollingRatio, hipStiffness, 0);
        while (slope * SLOPE_FACTOR < STEEPEST) {
            double next = slope * SLOPE_FACTOR;
            WalkerGait gait = follow(before, next, slope, rollingRatio, hipStiffness);
            if (before.doublingMargin() > 0 && gait.doublingMargin() <= 0) {
                return between(before, slope, gait, next, rollingRatio, hipStiffness);
            }
            before = gait;
            slope = next;
        }
        throw new LimitException(
                Limit.NO_SOLUTION, String.format(Locale.ROOT, "no period doubling up to a slope of %s rad", STEEPEST));
    }

    /**
     * Where the period doubles.
     *
     * @param slope rad
     * @param gait of one step at that slope
     */
    public record Doubling(double slope, WalkerGait gait) {}

    private static WalkerGait follow(
            WalkerGait from, double slope, double fromSlope, double rollingRatio, double hipStiffness)
            throws LimitException {
        double growth = Math.cbrt(slope / fromSlope);
        WalkerSearch search = WalkerSearch.ofStep(
                new WalkerModel(slope, rollingRatio, hipStiffness, 0),
                from.halfAngle() * growth,
                from.stanceRate() * growth);
        if (!search.converges()) {
            throw search.failure();
        }
        return search.gait();
    }

    /** Illinois' variant of the false position, since each value needs a search of its own. */
    private static Doubling between(
            WalkerGait low,
            double lowSlope,
            WalkerGait high,
            double highSlope,
            double rollingRatio,
            double hipStiffness)
            throws LimitException {
        double a = lowSlope;
        double b = highSlope;
        double fa = low.doublingMargin();
        double fb = high.doublingMargin();
        WalkerGait gait = high;
        double slope = b;
        for (int i = 0; i < 80 && Math.abs(b - a) > 1e-15 && gait.doublingMargin() != 0; i++) {
            slope = b - fb * (b - a) / (fb - fa);
            gait = follow(low, slope, lowSlope, rollingRatio, hipStiffness);
            double f = gait.doublingMargin();
            if (f * fb < 0) {
                a = b;
                fa = fb;
            } else {
                fa /= 2;
            }
            b = slope;
            fb = f;
            if (Math.abs(f) < 1e-13) {
                break;
            }
        }
        return new Doubling(slope, gait);
    }
}
