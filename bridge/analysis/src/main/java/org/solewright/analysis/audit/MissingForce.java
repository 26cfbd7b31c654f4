package org.solewright.analysis.audit;

import java.util.Locale;
import java.util.Optional;
import org.solewright.domain.finding.Finding;

/** A foot that stands without a load under it while force is wanting: its force was left out. */
final class MissingForce {

    private static final double EXPLAINED = 0.6;
    private static final double WANTING = 0.25;

    private final AuditedResults results;
    private final AuditSettings settings;
    private final BalanceSignals signals;
    private final int[] samples;
    private final double mass;

    MissingForce(AuditedResults results, AuditSettings settings, BalanceSignals signals, int[] samples, double mass) {
        this.results = results;
        this.settings = settings;
        this.signals = signals;
        this.samples = samples;
        this.mass = mass;
    }

    Optional<Finding> finding(String where) {
        double weight = mass * settings.gravity();
        double all = 0;
        double wanting = 0;
        double from = Double.NaN;
        double to = Double.NaN;
        double[] bySide = new double[results.feet().size()];
        FootRest[] rests = results.feet().stream().map(f -> new FootRest(f)).toArray(FootRest[]::new);
        for (int i : samples) {
            double square = 0;
            for (int c = 0; c < 3; c++) {
                double r =
                        signals.force(c, i) - mass * (signals.acceleration(c, i) + (c == 2 ? settings.gravity() : 0));
                square += r * r;
            }
            all += square;
            double lack = mass * (signals.acceleration(2, i) + settings.gravity()) - signals.force(2, i);
            // Turned or scaled forces push too little as well, but where a load is.
            boolean isWanting = lack > WANTING * weight && Math.abs(signals.force(2, i)) < lack;
            if (isWanting) {
                wanting += square;
                from = Double.isNaN(from) ? signals.time(i) : from;
                to = signals.time(i);
                for (int f = 0; f < rests.length; f++) {
                    if (rests[f].stands(signals.time(i)) && !isLoaded(rests[f], signals.time(i), weight)) {
                        bySide[f] += square;
                    }
                }
            }
        }
        int most = 0;
        for (int f = 1; f < bySide.length; f++) {
            most = bySide[f] > bySide[most] ? f : most;
        }
        if (bySide.length > 0 && bySide[most] > EXPLAINED * all) {
            String side = results.feet().get(most).side().word();
            return Optional.of(Finding.error(
                    "audit.force-left-out",
                    where,
                    String.format(
                            Locale.ROOT,
                            "force is wanting while the %s foot stands without a load under it (first at %.2f s, last at"
                                    + " %.2f s): the ground force of the %s foot was left out",
                            side,
                            from,
                            to,
                            side)));
        }
        boolean isUnloaded = wanting > EXPLAINED * all && gaps() > 0;
        return isUnloaded
                ? Optional.of(Finding.error(
                        "audit.force-left-out",
                        where,
                        String.format(
                                Locale.ROOT,
                                "no ground force carries the body between %.2f and %.2f s, yet it does not fall: the ground"
                                        + " force of one foot was left out",
                                from,
                                to)))
                : Optional.empty();
    }

    /** Samples without any load although the body does not fall. */
    private int gaps() {
        int n = 0;
        double weight = mass * settings.gravity();
        for (int i : samples) {
            boolean isFalling = signals.acceleration(2, i) < -settings.gravity() / 2;
            n += !isFalling && Math.abs(signals.force(2, i)) < settings.limit() * weight ? 1 : 0;
        }
        return n;
    }

    /** Whether a load of some size has its centre of pressure near the foot. */
    private boolean isLoaded(FootRest foot, double time, double weight) {
        for (AuditedResults.Load load : results.loads()) {
            int s = load.force().sample(time);
            if (s < 0) {
                continue;
            }
            double size = Math.sqrt(square(load.force().at(s, 0))
                    + square(load.force().at(s, 1))
                    + square(load.force().at(s, 2)));
            boolean isOwn = load.side().isEmpty() || load.side().get() == foot.side();
            if (isOwn
                    && size > settings.limit() * weight
                    && foot.distance(load.centreOfPressure(), s, time) < foot.length()) {
                return true;
            }
        }
        return false;
    }

    private static double square(double x) {
        return x * x;
    }
}
