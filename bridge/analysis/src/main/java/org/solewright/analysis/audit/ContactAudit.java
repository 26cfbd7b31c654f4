package org.solewright.analysis.audit;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.solewright.domain.finding.Finding;

/** Audit of contacts: loads where no foot is, pulling contacts, feet below the floor. */
public final class ContactAudit {

    /** Largest contact threshold, N (design 03 section 3). */
    private static final double THRESHOLD = 20;

    /** A load belongs to a foot within this many foot lengths of its landmarks. */
    private static final double NEAR = 0.3;

    /** A foot this many foot lengths above its lowest bears nothing. */
    private static final double IN_THE_AIR = 0.35;

    private static final double EXPLAINED = 0.25;
    private static final double LEAST_FACTOR = 0.08;
    private static final double TURNED = 0.15;

    private final AuditedResults results;
    private final AuditSettings settings;
    private final List<FootRest> feet;
    private final List<Finding> found = new ArrayList<>();

    private ContactAudit(AuditedResults results, AuditSettings settings) {
        this.results = results;
        this.settings = settings;
        this.feet = results.feet().stream().map(f -> new FootRest(f)).toList();
    }

    /**
     * What contacts say.
     *
     * @param results what is audited
     * @param settings limit
     * @return errors, at most one of a kind for each contact or foot
     */
    public static List<Finding> of(AuditedResults results, AuditSettings settings) {
        ContactAudit audit = new ContactAudit(results, settings);
        results.loads().forEach(audit::load);
        audit.feet.forEach(audit::floor);
        return audit.found;
    }

    private double threshold() {
        return Math.min(THRESHOLD, 0.03 * results.mass().orElse(Double.POSITIVE_INFINITY) * settings.gravity());
    }

    private void load(AuditedResults.Load load) {
        AuditedVector force = load.force();
        int pulling = 0;
        int first = -1;
        double worst = 0;
        int loaded = 0;
        for (int i = 0; i < force.samples(); i++) {
            double up = force.at(i, 2);
            loaded += up > threshold() ? 1 : 0;
            if (up < -threshold()) {
                pulling++;
                first = first < 0 ? i : first;
                worst = Math.min(worst, up);
            }
        }
        if (pulling > 0) {
            found.add(Finding.error(
                    "audit.pulling-contact",
                    where(load),
                    say(
                            "%s pulls the subject down in %d samples, with %.0f N at most, first at %.3f s: a floor cannot pull;"
                                    + " check the sign of its vertical force",
                            force.column(2), pulling, -worst, force.time(first))));
        }
        if (loaded > 0 && !feet.isEmpty()) {
            place(load, loaded);
        }
    }

    private String where(AuditedResults.Load load) {
        return results.name() + " " + load.force().name();
    }

    private static String say(String format, Object... numbers) {
        return String.format(Locale.ROOT, format, numbers);
    }

    private List<FootRest> candidates(AuditedResults.Load load) {
        return feet.stream()
                .filter(f -> load.side().isEmpty() || load.side().get() == f.side())
                .toList();
    }

    private void place(AuditedResults.Load load, int loaded) {
        AuditedVector force = load.force();
        List<FootRest> own = candidates(load);
        int away = 0;
        int seen = 0;
        int high = 0;
        double farthest = 0;
        double firstAway = Double.NaN;
        double firstHigh = Double.NaN;
        for (int i = 0; i < force.samples(); i++) {
            if (!(force.at(i, 2) > threshold())) {
                continue;
            }
            double time = force.time(i);
            Optional<FootRest> nearest = nearest(own, load, i, time);
            if (nearest.isEmpty()) {
                continue;
            }
            seen++;
            FootRest foot = nearest.get();
            double distance = foot.distance(load.centreOfPressure(), i, time);
            if (distance > NEAR * foot.length()) {
                away++;
                farthest = Math.max(farthest, distance);
                firstAway = Double.isNaN(firstAway) ? time : firstAway;
            } else if (height(foot, time) > IN_THE_AIR * foot.length()) {
                high++;
                firstHigh = Double.isNaN(firstHigh) ? time : firstHigh;
            }
        }
        if (away > settings.limit() * loaded) {
            String cause = column(own, load);
            found.add(Finding.error(
                    "audit.load-without-contact",
                    where(load),
                    say(
                            "the centre of pressure lies beside %s in %.0f %% of its loaded samples, %.2f m at most, first at %.3f s%s",
                            own.size() == 1 ? "the " + own.get(0).side().word() + " foot" : "every foot",
                            100.0 * away / seen,
                            farthest,
                            firstAway,
                            cause)));
        }
        if (high > settings.limit() * loaded) {
            found.add(Finding.error(
                    "audit.load-in-the-air",
                    where(load),
                    say(
                            "there is a load under a foot that is in the air in %.0f %% of its loaded samples, first at %.3f s",
                            100.0 * high / seen, firstHigh)));
        }
    }

    private static double height(FootRest foot, double time) {
        int i = (int) Math.round((time - foot.time(0)) / (foot.time(1) - foot.time(0)));
        return i >= 0 && i < foot.samples() ? foot.lowest(i) - foot.ground() : Double.NaN;
    }

    private static Optional<FootRest> nearest(List<FootRest> own, AuditedResults.Load load, int i, double time) {
        FootRest best = null;
        double least = Double.POSITIVE_INFINITY;
        for (FootRest f : own) {
            double d = f.distance(load.centreOfPressure(), i, time);
            if (d < least) {
                least = d;
                best = f;
            }
        }
        return Optional.ofNullable(best);
    }

    /** The column of the centre of pressure that, times one factor, would lie under a foot. */
    private String column(List<FootRest> own, AuditedResults.Load load) {
        String best = "";
        double least = EXPLAINED;
        for (FootRest foot : own) {
            for (int c = 0; c < 2; c++) {
                double[] fit = factor(foot, load, c);
                boolean isFactor = Math.abs(fit[0] - 1) > LEAST_FACTOR;
                if (isFactor && fit[1] < least) {
                    least = fit[1];
                    String column = load.centreOfPressure().column(c);
                    best = Math.abs(fit[0] + 1) < TURNED
                            ? ": with the sign of " + column + " turned it lies under the "
                                    + foot.side().word() + " foot"
                            : String.format(
                                    Locale.ROOT,
                                    ": %s times %s lies under the %s foot; check its unit and scale",
                                    column,
                                    Factor.rough(fit[0]),
                                    foot.side().word());
                }
            }
        }
        return best;
    }

    /** Least-squares factor on an axis, and the rms that it leaves over the rms before, both against the standing foot. */
    private double[] factor(FootRest foot, AuditedResults.Load load, int axis) {
        AuditedVector cop = load.centreOfPressure();
        double cc = 0;
        double cf = 0;
        double ff = 0;
        double before = 0;
        for (int i = 0; i < cop.samples(); i++) {
            double time = cop.time(i);
            double f = foot.middle(time, axis);
            double c = cop.at(i, axis);
            if (load.force().at(i, 2) > threshold() && foot.stands(time) && !Double.isNaN(f + c)) {
                cc += c * c;
                cf += c * f;
                ff += f * f;
                before += (c - f) * (c - f);
            }
        }
        double s = cc > 0 ? cf / cc : 1;
        double left = Math.max(0, ff - s * cf);
        return new double[] {s, before > 0 ? Math.sqrt(left / before) : 1};
    }

    private void floor(FootRest foot) {
        double sum = 0;
        int n = 0;
        for (AuditedResults.Load load : results.loads()) {
            for (int i = 0; i < load.force().samples(); i++) {
                double z = load.centreOfPressure().at(i, 2);
                if (load.force().at(i, 2) > threshold() && !Double.isNaN(z)) {
                    sum += z;
                    n++;
                }
            }
        }
        double floor = n > 0 ? sum / n : 0;
        double length = Double.isNaN(foot.length()) ? 0.25 : foot.length();
        double deepest = 0;
        double when = Double.NaN;
        for (int i = 0; i < foot.samples(); i++) {
            double below = floor - foot.lowest(i);
            if (below > deepest) {
                deepest = below;
                when = foot.time(i);
            }
        }
        if (deepest > settings.limit() * length) {
            found.add(Finding.error(
                    "audit.foot-below-floor",
                    results.name() + " " + foot.side().word(),
                    String.format(
                            Locale.ROOT,
                            "the %s foot is %.3f m below the floor (height %.3f m, that of the centres of pressure) at"
                                    + " %.3f s, limit %.3f m: check the heights of landmarks and centres of pressure",
                            foot.side().word(),
                            deepest,
                            floor,
                            when,
                            settings.limit() * length)));
        }
    }
}
