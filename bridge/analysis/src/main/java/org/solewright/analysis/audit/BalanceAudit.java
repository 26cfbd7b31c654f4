package org.solewright.analysis.audit;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.solewright.analysis.cost.PowerWork;
import org.solewright.analysis.numerics.Series;
import org.solewright.domain.finding.Finding;

/**
 * Audit of the balance of forces, energy and moments: the acceleration of the centre of mass, its energy and the loads'
 * power are recomputed from the results' own columns, filtered alike [Bisseling and Hof 2006].
 */
public final class BalanceAudit {

    private static final double LEAST_SHARE = 0.05;
    private static final int FEWEST = 5;

    private final AuditedResults results;
    private final AuditSettings settings;
    private final BalanceSignals signals;

    private BalanceAudit(AuditedResults results, AuditSettings settings, BalanceSignals signals) {
        this.results = results;
        this.settings = settings;
        this.signals = signals;
    }

    /**
     * An audit.
     *
     * @param results what is audited
     * @param settings limit and filter
     * @return the audit; empty where the results have no centre of mass or no loads
     */
    public static Optional<BalanceAudit> of(AuditedResults results, AuditSettings settings) {
        return BalanceSignals.of(results, settings).map(s -> new BalanceAudit(results, settings, s));
    }

    /**
     * The interval in which every load on the body should be among the results: all of them where the body is loaded at
     * both ends, as in a simulation; else from the first load to the last.
     *
     * @return start and end, s, and whether the body is loaded at both ends
     */
    public Interval loaded() {
        int first = -1;
        int last = -1;
        int n = signals.samples();
        int firstClear = -1;
        int lastClear = -1;
        double threshold = LEAST_SHARE
                * mass(signals.clear(Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY))
                * settings.gravity();
        for (int i = 0; i < n; i++) {
            if (signals.isClear(i)) {
                double f = Math.sqrt(
                        square(signals.force(0, i)) + square(signals.force(1, i)) + square(signals.force(2, i)));
                firstClear = firstClear < 0 ? i : firstClear;
                lastClear = i;
                first = first < 0 && f > threshold ? i : first;
                last = f > threshold ? i : last;
            }
        }
        boolean isThroughout = first >= 0 && first == firstClear && last == lastClear;
        return new Interval(
                first < 0 ? Double.NaN : signals.time(first),
                first < 0 ? Double.NaN : signals.time(last),
                isThroughout);
    }

    /**
     * An interval.
     *
     * @param from s; NaN where there is no load
     * @param to s
     * @param isThroughout whether it is all that the results hold
     */
    public record Interval(double from, double to, boolean isThroughout) {}

    /** Stated mass, else what the loads carry. */
    private double mass(int[] samples) {
        double sum = 0;
        for (int i : samples) {
            sum += signals.force(2, i) / samples.length;
        }
        return results.mass().orElse(Math.abs(sum) / settings.gravity());
    }

    /**
     * The balance over an interval.
     *
     * @param from s
     * @param to s
     * @param periods 2: a whole stride, all three moments come back; 1: one step, the moment about the sideways axis does; 0:
     *     neither
     * @return empty where the interval holds no five clear samples
     */
    public Optional<Balance> over(double from, double to, int periods) {
        int[] samples = signals.clear(from, to);
        if (samples.length < FEWEST) {
            return Optional.empty();
        }
        double mass = mass(samples);
        double weight = mass * settings.gravity();
        double sum = 0;
        double peak = 0;
        double peakTime = Double.NaN;
        for (int i : samples) {
            double square = 0;
            for (int c = 0; c < 3; c++) {
                square += square(signals.force(c, i) - needed(c, i, mass));
            }
            sum += square / samples.length;
            if (Math.sqrt(square) > peak) {
                peak = Math.sqrt(square);
                peakTime = signals.time(i);
            }
        }
        double first = signals.time(samples[0]);
        double last = signals.time(samples[samples.length - 1]);
        // What the filter's ends cut off is no period any more.
        boolean isWhole = last - first > (to - from) - 2.5 / signals.rate();
        return Optional.of(new Balance(
                first,
                last,
                mass,
                Math.sqrt(sum) / weight,
                peak / weight,
                peakTime,
                energyResidual(samples, mass),
                isWhole ? momentResidual(from, to, weight, periods) : Double.NaN));
    }

    private double needed(int axis, int i, double mass) {
        return mass * (signals.acceleration(axis, i) + (axis == 2 ? settings.gravity() : 0));
    }

    /**
     * Energy of the differences: with the terms in h^2 its change over a sample is exactly the trapezium of m (a - g) . v of
     * the central differences [derived], so that only what the loads do otherwise is left.
     */
    private double energy(int i, double mass) {
        double quarter = 1 / (4 * signals.rate() * signals.rate());
        double v2 = 0;
        for (int c = 0; c < 3; c++) {
            v2 += square(signals.velocity(c, i)) + quarter * square(signals.acceleration(c, i));
        }
        double height = signals.position(2, i) + quarter * signals.acceleration(2, i);
        return mass * (v2 / 2 + settings.gravity() * height);
    }

    private double energyResidual(int[] samples, double mass) {
        double[] power = new double[samples.length];
        double worst = 0;
        double work = 0;
        double start = energy(samples[0], mass);
        for (int k = 0; k < samples.length; k++) {
            for (int c = 0; c < 3; c++) {
                power[k] += signals.force(c, samples[k]) * signals.velocity(c, samples[k]);
            }
            if (k > 0) {
                work += (power[k - 1] + power[k]) / (2 * signals.rate());
                worst = Math.max(worst, Math.abs(energy(samples[k], mass) - start - work));
            }
        }
        double positive = PowerWork.of(power, 1 / signals.rate()).positive();
        return positive > 0 ? worst / positive : Double.NaN;
    }

    /** Of the samples as they are: a mean over a period needs no filter, and products of filtered ones are others. */
    private double momentResidual(double from, double to, double weight, int periods) {
        if (periods == 0 || results.centreOfMass().isEmpty()) {
            return Double.NaN;
        }
        AuditedVector com = results.centreOfMass().get();
        Series[] path = {com.component(0), com.component(1), com.component(2)};
        double[] sum = new double[3];
        double ground = 0;
        for (AuditedResults.Load load : results.loads()) {
            AuditedVector cop = load.centreOfPressure();
            AuditedVector force = load.force();
            double[][] moment = new double[3][force.samples()];
            for (int s = Math.max(0, force.sample(from) - 1); s < force.samples() && force.time(s) < to + 1; s++) {
                double time = force.time(s);
                if (cop.isKnown(s) && force.isKnown(s) && !Double.isNaN(path[0].at(time))) {
                    double[] arm = new double[3];
                    for (int c = 0; c < 3; c++) {
                        arm[c] = cop.at(s, c) - path[c].at(time);
                    }
                    ground = cop.at(s, 2);
                    for (int c = 0; c < 3; c++) {
                        int a = (c + 1) % 3;
                        int b = (c + 2) % 3;
                        moment[c][s] = arm[a] * force.at(s, b) - arm[b] * force.at(s, a);
                    }
                }
            }
            for (int c = 0; c < 3; c++) {
                sum[c] += new Series(force.start(), force.rate(), moment[c]).mean(from, to);
            }
        }
        double height = path[2].mean(from, to) - ground;
        double square = 0;
        for (int c = 0; c < 3; c++) {
            square += periods == 2 || c == 1 ? square(sum[c]) : 0;
        }
        return height > 0 ? Math.sqrt(square) / (weight * height) : Double.NaN;
    }

    /**
     * What an interval's balance says, with the likeliest cause in the words of the tables.
     *
     * @param balance of the interval
     * @param where for messages
     * @return errors of force and energy over the limit
     */
    public List<Finding> findings(Balance balance, String where) {
        List<Finding> found = new ArrayList<>();
        int[] samples = signals.clear(balance.from(), balance.to());
        if (balance.forceResidual() > settings.limit()) {
            found.add(Finding.error(
                    "audit.force-residual",
                    where,
                    say(
                            "loads and acceleration of the centre of mass disagree by %.3f body weights rms, %.3f at most"
                                    + " at %.3f s (limit %.3f), %.2f to %.2f s",
                            balance.forceResidual(),
                            balance.peakForceResidual(),
                            balance.peakTime(),
                            settings.limit(),
                            balance.from(),
                            balance.to())));
        }
        found.addAll(new BalanceDiagnosis(results, settings, signals, samples, balance.mass(), where).findings());
        if (balance.energyResidual() > settings.limit()) {
            found.add(Finding.error(
                    "audit.energy-residual",
                    where,
                    say(
                            "energy of the centre of mass and work of the loads come apart by %.1f %% of the positive work"
                                    + " (limit %.1f %%), %.2f to %.2f s",
                            100 * balance.energyResidual(), 100 * settings.limit(), balance.from(), balance.to())));
        }
        return found;
    }

    /**
     * What the mean moment over a period says.
     *
     * @param balance of a stride or step
     * @param where for messages
     * @return an error over the limit
     */
    public List<Finding> momentFindings(Balance balance, String where) {
        List<Finding> found = new ArrayList<>();
        if (balance.momentResidual() > settings.limit()) {
            found.add(Finding.error(
                    "audit.moment-residual",
                    where,
                    say(
                            "the mean moment of the loads about the centre of mass over a period is %.3f of weight times"
                                    + " height, expected 0 (limit %.3f): check centres of pressure and position of the"
                                    + " centre of mass",
                            balance.momentResidual(), settings.limit())));
        }
        return found;
    }

    private static String say(String format, Object... numbers) {
        return String.format(Locale.ROOT, format, numbers);
    }

    private static double square(double x) {
        return x * x;
    }
}
