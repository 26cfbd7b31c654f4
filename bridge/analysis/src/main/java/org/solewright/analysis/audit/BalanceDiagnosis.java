package org.solewright.analysis.audit;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.solewright.domain.finding.Finding;

/**
 * Which column spoils the balance of forces: one factor on one column, on one axis of all loads or on all loads is fitted
 * by least squares, and what explains most of the residual with fewest columns is named.
 */
final class BalanceDiagnosis {

    /** A cause must leave at most this share of the residual. */
    private static final double EXPLAINED = 0.25;
    /** Below this residual on an axis, in body weights, there is nothing to explain. */
    private static final double LEAST = 0.004;
    /** A factor nearer to 1 than this is no finding. */
    private static final double LEAST_FACTOR = 0.08;
    /** Causes that leave residuals alike within this share are told apart by the number of their columns. */
    private static final double ALIKE = 1.25;

    private static final double TURNED = 0.15;
    private static final double TRAVEL = 0.4;

    private final AuditedResults results;
    private final AuditSettings settings;
    private final BalanceSignals signals;
    private final int[] samples;
    private final double mass;
    private final String where;
    private final List<Cause> causes = new ArrayList<>();

    BalanceDiagnosis(
            AuditedResults results,
            AuditSettings settings,
            BalanceSignals signals,
            int[] samples,
            double mass,
            String where) {
        this.results = results;
        this.settings = settings;
        this.signals = signals;
        this.samples = samples;
        this.mass = mass;
        this.where = where;
    }

    /** A possible cause: what to multiply by what, and the rms that is left on all axes, N. */
    private record Cause(String what, double factor, double left, int columns, boolean isTurn) {}

    /** At most one cause, as an error. */
    List<Finding> findings() {
        double weight = mass * settings.gravity();
        double before = 0;
        double worst = 0;
        for (int c = 0; c < 3; c++) {
            double r = residual(c);
            before += r * r;
            worst = Math.max(worst, r);
        }
        before = Math.sqrt(before);
        if (worst < LEAST * weight) {
            return List.of();
        }
        for (int c = 0; c < 3; c++) {
            axis(c, before);
        }
        all();
        exchanged(before);
        double limit = EXPLAINED * before;
        double best = causes.stream().mapToDouble(Cause::left).min().orElse(Double.POSITIVE_INFINITY);
        double alike = Math.max(best * ALIKE, best + 0.02 * before);
        return causes.stream()
                .filter(k -> k.left() <= limit && k.left() <= alike && Math.abs(k.factor() - 1) > LEAST_FACTOR)
                .min(Comparator.comparingInt(Cause::columns).thenComparingDouble(Cause::left))
                .map(this::finding)
                .or(() -> new MissingForce(results, settings, signals, samples, mass).finding(where))
                .stream()
                .toList();
    }

    private Finding finding(Cause cause) {
        if (cause.isTurn()) {
            return Finding.error("audit.axis-turned", where, cause.what());
        }
        if (Math.abs(cause.factor() + 1) < TURNED) {
            return Finding.error(
                    "audit.axis-turned",
                    where,
                    cause.what()
                            + ": with its sign turned loads and motion agree; its axis is named the wrong way round");
        }
        return Finding.error(
                "audit.column-scaled",
                where,
                String.format(
                        Locale.ROOT,
                        "%s: times %s loads and motion agree; check its unit and scale",
                        cause.what(),
                        Factor.text(cause.factor())));
    }

    private double weight(int axis) {
        return axis == 2 ? mass * settings.gravity() : 0;
    }

    private double inertia(int axis, int i) {
        return mass * signals.acceleration(axis, i);
    }

    private double residual(int axis) {
        double sum = 0;
        for (int i : samples) {
            double r = signals.force(axis, i) - inertia(axis, i) - weight(axis);
            sum += r * r / samples.length;
        }
        return Math.sqrt(sum);
    }

    private double others(int axis, double before) {
        double r = residual(axis);
        return Math.max(0, before * before - r * r);
    }

    /** Factor s with which s a comes nearest to b, and the cause it would be. */
    private void add(String what, double[] a, double[] b, double others, int columns) {
        double ab = 0;
        double aa = 0;
        for (int k = 0; k < a.length; k++) {
            ab += a[k] * b[k];
            aa += a[k] * a[k];
        }
        if (aa > 0) {
            double s = ab / aa;
            double left = 0;
            for (int k = 0; k < a.length; k++) {
                left += (s * a[k] - b[k]) * (s * a[k] - b[k]) / samples.length;
            }
            causes.add(new Cause(what, s, Math.sqrt(left + others), columns, false));
        }
    }

    private void axis(int c, double before) {
        double others = others(c, before);
        double[] needed = new double[samples.length];
        double[] force = new double[samples.length];
        double[] inertia = new double[samples.length];
        double[] carried = new double[samples.length];
        for (int k = 0; k < samples.length; k++) {
            inertia[k] = inertia(c, samples[k]);
            needed[k] = inertia[k] + weight(c);
            force[k] = signals.force(c, samples[k]);
            carried[k] = force[k] - weight(c);
        }
        Optional<Boolean> isMotionRight = travelsWithTheFeet(c);
        if (!isMotionRight.orElse(false)) {
            AuditedVector com = results.centreOfMass().or(results::velocity).orElseThrow();
            add(com.column(c), inertia, carried, others, 1);
        }
        if (isMotionRight.orElse(true)) {
            int loads = results.loads().size();
            for (int p = 0; p < loads; p++) {
                double[] own = new double[samples.length];
                double[] rest = new double[samples.length];
                for (int k = 0; k < samples.length; k++) {
                    own[k] = signals.force(p, c, samples[k]);
                    rest[k] = needed[k] - force[k] + own[k];
                }
                add(results.loads().get(p).force().column(c), own, rest, others, 1);
            }
            if (loads > 1) {
                add("the " + AuditedVector.AXES.get(c) + " columns of all ground forces", force, needed, others, loads);
            }
        }
    }

    /** One factor on all forces: their unit, or the stated mass. */
    private void all() {
        double[] force = new double[3 * samples.length];
        double[] needed = new double[force.length];
        for (int c = 0; c < 3; c++) {
            for (int k = 0; k < samples.length; k++) {
                force[3 * k + c] = signals.force(c, samples[k]);
                needed[3 * k + c] = inertia(c, samples[k]) + weight(c);
            }
        }
        add(
                "all ground forces (or the stated mass, the other way round)",
                force,
                needed,
                0,
                2 + results.loads().size());
    }

    private void exchanged(double before) {
        for (int c = 0; c < 3; c++) {
            int d = (c + 1) % 3;
            double sum = Math.max(0, others(c, before) - residual(d) * residual(d));
            for (int i : samples) {
                double one = signals.force(d, i) - inertia(c, i) - weight(c);
                double two = signals.force(c, i) - inertia(d, i) - weight(d);
                sum += (one * one + two * two) / samples.length;
            }
            causes.add(new Cause(
                    "ground forces " + AuditedVector.AXES.get(c) + " and " + AuditedVector.AXES.get(d)
                            + " are exchanged: the other way round loads and motion agree",
                    0,
                    Math.sqrt(sum),
                    4 + results.loads().size(),
                    true));
        }
    }

    /** Whether the centre of mass goes as far as the feet along an axis; empty where they do not go far or are not known. */
    private Optional<Boolean> travelsWithTheFeet(int axis) {
        if (results.centreOfMass().isEmpty() || samples.length < 2) {
            return Optional.empty();
        }
        double feet = 0;
        int n = 0;
        double from = signals.time(samples[0]);
        double to = signals.time(samples[samples.length - 1]);
        for (AuditedResults.Foot foot : results.feet()) {
            AuditedVector v = foot.landmarks().get(0);
            int a = v.sample(from);
            int b = v.sample(to);
            if (a >= 0 && b >= 0 && v.isKnown(a) && v.isKnown(b)) {
                feet += v.at(b, axis) - v.at(a, axis);
                n++;
            }
        }
        if (n < 2 || Math.abs(feet / n) < TRAVEL) {
            return Optional.empty();
        }
        double own = signals.position(axis, samples[samples.length - 1]) - signals.position(axis, samples[0]);
        // Half a step of difference is the gait's own.
        return Optional.of(Math.abs(own - feet / n) < Math.max(0.6, 0.5 * Math.abs(feet / n))
                && own * feet > 0
                && own / (feet / n) > 0.5);
    }
}
