package org.solewright.analysis.gait;

import java.util.function.IntPredicate;
import java.util.function.IntToDoubleFunction;

/**
 * How one foot rolled over the ground in one stance (design 03 section 6): angle at contact, foot flat, heel rise, travel
 * of the centre of pressure, and which places bore load. NaN where a number is not known; shares and places in stance run
 * from 0 to 1.
 *
 * @param contactAngle foot-floor angle at contact less that of standing, rad, toes up positive
 * @param flat from when to when heel and metatarsal heads were both down
 * @param heelRise from when on the heel stayed up
 * @param heel when the heel bore load: the centre of pressure behind the ankle, the heel low
 * @param heelShare share of stance with that
 * @param heads when the metatarsal line bore load: the centre of pressure within a pad's radius of it
 * @param toes when the toes bore load: the centre of pressure before that
 * @param travel of the centre of pressure along the foot, m
 * @param leastHeel least height of the heel over its standing height while loaded, m
 * @param leastHeads least height of the metatarsal heads likewise, m
 * @param isPastHeads whether the centre of pressure passed the metatarsal line; false where not known
 * @param onToes share of the samples under load with the centre of pressure between metatarsal line and toe tip
 */
public record RollOverCheck(
        double contactAngle,
        Interval flat,
        double heelRise,
        Interval heel,
        double heelShare,
        Interval heads,
        Interval toes,
        double travel,
        double leastHeel,
        double leastHeads,
        boolean isPastHeads,
        double onToes) {

    /** Least share of stance with load on the heel for a heel that bears (design 03 section 6). */
    public static final double LEAST_HEEL_SHARE = 0.03;

    /** Height over standing, in foot lengths, up to which a heel is low (design 03 section 6). */
    public static final double LOW = 0.10;

    /** Half width of the metatarsal line's bearing, in foot lengths: radius of its pads (design 03 section 6, assumed). */
    public static final double PAD_RADIUS = 0.05;

    private static final double MOSTLY = 0.9;

    /**
     * A part of stance.
     *
     * @param from 0 at contact; NaN where there is none
     * @param to 1 at off; NaN where there is none
     */
    public record Interval(double from, double to) {

        static final Interval NONE = new Interval(Double.NaN, Double.NaN);

        /**
         * Whether there is one.
         *
         * @return true where both ends are known
         */
        public boolean isKnown() {
            return from <= to;
        }
    }

    /**
     * Lengths that decide.
     *
     * @param rise height over standing up to which heel or heads are down, m (10 mm, scaled)
     * @param footLength m; NaN where not known, then places that bear load are not told
     * @param leastLoad vertical force under which the centre of pressure is not used, N
     */
    public record Limits(double rise, double footLength, double leastLoad) {}

    /** What a way of standing is called in comparative work. */
    public enum Posture {
        /** On heel and ball. */
        PLANTIGRADE,
        /** On the digits, the heel raised. */
        DIGITIGRADE,
        /** On the tips of the digits, the metatarsal line raised as well. */
        UNGULIGRADE,
        /** None of these can be told. */
        UNDETERMINED
    }

    /**
     * Checks one stance.
     *
     * @param foot samples from at most one before contact to at most one after off
     * @param limits what decides
     * @return the check
     */
    public static RollOverCheck of(StanceFoot foot, Limits limits) {
        Loaded loaded = Loaded.of(foot, limits.leastLoad());
        double low = LOW * limits.footLength();
        double pad = PAD_RADIUS * limits.footLength();
        Interval flat = longest(foot, i -> Math.max(foot.heel(i), foot.heads(i)) <= limits.rise());
        IntPredicate onHeel = loaded.of(i -> foot.beforeAnkle(i) < 0 && foot.heel(i) <= low);
        return new RollOverCheck(
                at(foot, foot::angle, 0),
                refined(foot, flat, limits.rise()),
                rise(foot, limits.rise()),
                longest(foot, onHeel),
                low > 0 && loaded.knows(foot::beforeAnkle) ? share(foot, onHeel) : Double.NaN,
                longest(foot, loaded.of(i -> Math.abs(foot.beforeHeads(i)) <= pad)),
                longest(foot, loaded.of(i -> foot.beforeHeads(i) > pad)),
                -loaded.least(i -> -foot.centreOfPressure(i)) - loaded.least(foot::centreOfPressure),
                loaded.least(foot::heel),
                loaded.least(foot::heads),
                share(foot, loaded.of(i -> foot.beforeHeads(i) > 0)) > 0,
                share(foot, loaded.of(i -> foot.beforeHeads(i) >= -pad && foot.beforeToe(i) <= 0)));
    }

    /** The samples of a stance under enough load; before the first and after the last of them these stand in. */
    private record Loaded(int first, int last) {

        static Loaded of(StanceFoot foot, double leastLoad) {
            int first = -1;
            int last = -1;
            for (int i = 0; i < foot.size(); i++) {
                if (isInStance(foot, i) && foot.load(i) > leastLoad) {
                    first = first < 0 ? i : first;
                    last = i;
                }
            }
            return new Loaded(first, last);
        }

        IntPredicate of(IntPredicate holds) {
            return i -> first >= 0 && holds.test(Math.max(first, Math.min(last, i)));
        }

        boolean knows(IntToDoubleFunction value) {
            return Double.isFinite(least(value));
        }

        /** Least value under load; NaN where there is none. */
        double least(IntToDoubleFunction value) {
            double least = Double.POSITIVE_INFINITY;
            for (int i = Math.max(0, first); i <= last; i++) {
                double v = value.applyAsDouble(i);
                least = v < least ? v : least;
            }
            return Double.isFinite(least) ? least : Double.NaN;
        }
    }

    /**
     * Whether the heel bore load by the rule of design 03 section 6.
     *
     * @return true where the centre of pressure lay behind the ankle for long enough with the heel low
     */
    public boolean isHeelBearing() {
        return heelShare >= LEAST_HEEL_SHARE;
    }

    /**
     * The posture, for comparative work.
     *
     * @param footLength m; NaN where not known
     * @param hasToe whether the tip of the toes was tracked
     * @return undetermined where no rule holds
     */
    public Posture posture(double footLength, boolean hasToe) {
        double low = LOW * footLength;
        if (isHeelBearing()) {
            return isPastHeads ? Posture.PLANTIGRADE : Posture.UNDETERMINED;
        }
        if (!(leastHeel > low) || !hasToe) {
            return Posture.UNDETERMINED;
        }
        if (leastHeads > low) {
            return Posture.UNGULIGRADE;
        }
        return onToes >= MOSTLY ? Posture.DIGITIGRADE : Posture.UNDETERMINED;
    }

    /** A value at a place in stance, between samples. */
    private static double at(StanceFoot foot, IntToDoubleFunction value, double phase) {
        for (int i = 0; i + 1 < foot.size(); i++) {
            if (foot.phase(i) <= phase && foot.phase(i + 1) >= phase) {
                double share = (phase - foot.phase(i)) / (foot.phase(i + 1) - foot.phase(i));
                return value.applyAsDouble(i) * (1 - share) + value.applyAsDouble(i + 1) * share;
            }
        }
        return Double.NaN;
    }

    private static boolean isInStance(StanceFoot foot, int i) {
        return foot.phase(i) >= 0 && foot.phase(i) <= 1;
    }

    /** Longest run within stance; one that begins with the first sample of stance begins with the contact. */
    private static Interval longest(StanceFoot foot, IntPredicate holds) {
        Interval best = Interval.NONE;
        int i = 0;
        while (i < foot.size()) {
            int end = i;
            while (end < foot.size() && isInStance(foot, end) && holds.test(end)) {
                end++;
            }
            if (end > i) {
                boolean fromContact = i == 0 || !isInStance(foot, i - 1);
                boolean toOff = end == foot.size() || !isInStance(foot, end);
                Interval run = new Interval(fromContact ? 0 : foot.phase(i), toOff ? 1 : foot.phase(end - 1));
                best = best.isKnown() && best.to() - best.from() >= run.to() - run.from() ? best : run;
            }
            i = Math.max(end, i + 1);
        }
        return best;
    }

    /** The run's ends where the higher of heel and heads crosses the limit between samples. */
    private static Interval refined(StanceFoot foot, Interval run, double limit) {
        double from = run.from();
        double to = run.to();
        for (int i = 0; i + 1 < foot.size(); i++) {
            double a = Math.max(foot.heel(i), foot.heads(i));
            double b = Math.max(foot.heel(i + 1), foot.heads(i + 1));
            double crossing = foot.phase(i) + (foot.phase(i + 1) - foot.phase(i)) * (limit - a) / (b - a);
            if (foot.phase(i + 1) == run.from() && crossing >= 0 && a > limit) {
                from = crossing;
            }
            if (foot.phase(i) == run.to() && crossing <= 1 && b > limit) {
                to = crossing;
            }
        }
        return new Interval(from, to);
    }

    /** From when on the heel stays higher; NaN where it is not known at the end of stance, or never low. */
    private static double rise(StanceFoot foot, double limit) {
        boolean isUp = false;
        for (int i = foot.size() - 1; i >= 0; i--) {
            if (!isInStance(foot, i)) {
                continue;
            }
            double heel = foot.heel(i);
            if (Double.isNaN(heel) || (!isUp && heel <= limit)) {
                return Double.NaN;
            }
            if (heel <= limit) {
                double next = foot.heel(i + 1);
                return foot.phase(i) + (foot.phase(i + 1) - foot.phase(i)) * (limit - heel) / (next - heel);
            }
            isUp = true;
        }
        return Double.NaN;
    }

    private static double share(StanceFoot foot, IntPredicate holds) {
        int n = 0;
        int all = 0;
        for (int i = 0; i < foot.size(); i++) {
            if (isInStance(foot, i)) {
                all++;
                n += holds.test(i) ? 1 : 0;
            }
        }
        return all == 0 ? Double.NaN : (double) n / all;
    }
}
