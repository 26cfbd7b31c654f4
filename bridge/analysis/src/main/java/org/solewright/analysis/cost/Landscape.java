package org.solewright.analysis.cost;

import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.stream.IntStream;
import org.solewright.analysis.dynamics.Limit;
import org.solewright.analysis.dynamics.LimitException;
import org.solewright.domain.cost.FootRule;
import org.solewright.domain.cost.LandscapeRow;
import org.solewright.domain.cost.Posture;
import org.solewright.domain.cost.WorkForm;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.Found;

/**
 * What a limb's feet cost over step length and speed: given foot, equal-vault foot and optimum foot, in every form of the
 * work, with the cost index.
 */
public final class Landscape {

    private static final List<WorkForm> FORMS = List.of(WorkForm.values());

    private final Limb limb;
    private final CostIndex index;
    private final double leg;
    private final double foot;
    private final double seriesShare;
    private final Map<Limit, Integer> refused = new EnumMap<>(Limit.class);

    private Landscape(Limb limb, CostIndex index) {
        this.limb = limb;
        this.index = index;
        this.leg = limb.leg();
        this.foot = limb.foot();
        this.seriesShare = limb.seriesShare();
    }

    /**
     * The limb and the body on it.
     *
     * @param leg total limb length, m, above 0
     * @param foot given foot length along the ground, m, not negative
     * @param seriesShare share of the foot length that is taken out of the limb, 0 to 1
     * @param mass kg, above 0
     */
    public record Limb(double leg, double foot, double seriesShare, double mass) {}

    /**
     * What is varied.
     *
     * @param segments numbers of foot segments, not negative
     * @param rules how the foot length is chosen
     * @param speeds hip speeds before each transition, m/s, above 0
     * @param steps step lengths, m, above 0
     */
    public record Axes(List<Integer> segments, List<FootRule> rules, List<Double> speeds, List<Double> steps) {

        /** Feet of 0 to 6 segments by every rule. */
        public static final List<Integer> ALL_SEGMENTS =
                IntStream.rangeClosed(0, Posture.MOST_SEGMENTS).boxed().toList();

        /** Copies the lists. */
        public Axes {
            segments = List.copyOf(segments);
            rules = List.copyOf(rules);
            speeds = List.copyOf(speeds);
            steps = List.copyOf(steps);
        }

        /**
         * Number of rows of the landscape.
         *
         * @return product of the sizes and of the forms of the work
         */
        public long rows() {
            long curves = (long) segments.size() * rules.size() * WorkForm.values().length;
            return Math.multiplyExact(Math.multiplyExact(curves, (long) speeds.size()), (long) steps.size());
        }
    }

    /**
     * The landscape of a limb.
     *
     * @param limb the limb
     * @param axes what is varied
     * @param index prices the rows; with the gravity of the costs of transport
     * @return rows by segments, rule, speed, step and form; a finding says how many have no value and why
     */
    public static Found<List<LandscapeRow>> of(Limb limb, Axes axes, CostIndex index) {
        Landscape landscape = new Landscape(limb, index);
        List<LandscapeRow> rows = new ArrayList<>(Math.toIntExact(axes.rows()));
        for (int segments : axes.segments()) {
            for (FootRule rule : axes.rules()) {
                Map<WorkForm, OptionalDouble> crossovers = landscape.crossovers(segments, rule);
                for (double speed : axes.speeds()) {
                    for (double step : axes.steps()) {
                        landscape.point(segments, rule, speed, step, crossovers, rows);
                    }
                }
            }
        }
        List<Finding> findings = new ArrayList<>();
        landscape.refused.forEach((limit, count) -> findings.add(Finding.note(
                "postures.out-of-reach", "", count + " of " + rows.size() + " rows have no work: " + limit)));
        return new Found<>(rows, findings);
    }

    private Map<WorkForm, OptionalDouble> crossovers(int segments, FootRule rule) {
        Map<WorkForm, OptionalDouble> crossovers = new EnumMap<>(WorkForm.class);
        for (WorkForm form : FORMS) {
            crossovers.put(form, crossover(segments, rule, form));
        }
        return crossovers;
    }

    /** Rows of all forms; but for the optimum they share one foot. */
    private void point(
            int segments,
            FootRule rule,
            double speed,
            double stepLength,
            Map<WorkForm, OptionalDouble> crossovers,
            List<LandscapeRow> rows) {
        OptionalDouble ofRule = rule == FootRule.GIVEN ? OptionalDouble.of(footOf(segments)) : OptionalDouble.empty();
        Optional<VaultingStep> shared = Optional.empty();
        if (rule != FootRule.OPTIMUM) {
            try {
                shared = Optional.of(step(segments, rule, stepLength, WorkForm.PUSH_OFF));
                ofRule = OptionalDouble.of(shared.get().footLength());
            } catch (LimitException e) {
                refused.merge(e.limit(), FORMS.size(), Integer::sum);
            }
        }
        for (WorkForm form : FORMS) {
            OptionalDouble length = ofRule;
            OptionalDouble work = OptionalDouble.empty();
            OptionalDouble cost = OptionalDouble.empty();
            Optional<LandscapeRow.Index> priced = Optional.empty();
            try {
                if (shared.isPresent() || rule == FootRule.OPTIMUM) {
                    VaultingStep step = shared.isPresent() ? shared.get() : step(segments, rule, stepLength, form);
                    length = OptionalDouble.of(step.footLength());
                    double factor = step.factor(form);
                    double joules = factor * limb.mass() * speed * speed / 2;
                    work = OptionalDouble.of(joules);
                    cost = OptionalDouble.of(joules / (limb.mass() * index.gravity() * stepLength));
                    priced = Optional.of(priced(step, factor, speed));
                }
            } catch (LimitException e) {
                refused.merge(e.limit(), 1, Integer::sum);
            }
            rows.add(new LandscapeRow(
                    segments,
                    rule,
                    leg,
                    length,
                    stepLength,
                    speed,
                    form,
                    work,
                    cost,
                    priced,
                    crossovers.getOrDefault(form, OptionalDouble.empty())));
        }
    }

    private double footOf(int segments) {
        return segments == 0 ? 0 : foot;
    }

    private VaultingStep step(int segments, FootRule rule, double stepLength, WorkForm form) throws LimitException {
        return switch (rule) {
            case GIVEN -> VaultingStep.given(segments, stepLength, leg, footOf(segments), seriesShare);
            case EQUAL -> VaultingStep.equalVaults(segments, stepLength, leg, seriesShare);
            case OPTIMUM -> OptimumFoot.of(form, segments, stepLength, leg, seriesShare);
        };
    }

    private LandscapeRow.Index priced(VaultingStep step, double factor, double speed) {
        CostIndex.Rates rates =
                index.rates(new StepFactor.Value(factor, 0), leg, step.segments() + 1, speed, step.stepLength());
        double unit = index.gravity() * speed;
        return new LandscapeRow.Index(rates.work() / unit, rates.swing() / unit, rates.activation() / unit);
    }

    private OptionalDouble crossover(int segments, FootRule rule, WorkForm form) {
        if (segments == 0) {
            return OptionalDouble.empty();
        }
        double reach = TransitionWork.reach(form) * leg;
        OptionalDouble found =
                switch (rule) {
                    case GIVEN -> given(segments, form);
                    case EQUAL -> equalVaults(segments, form);
                    case OPTIMUM -> scaled(Crossover.optimumFoot(seriesShare));
                };
        return found.isPresent() && found.getAsDouble() < reach ? found : OptionalDouble.empty();
    }

    private OptionalDouble equalVaults(int segments, WorkForm form) {
        try {
            return scaled(Crossover.equalVaults(form, segments, seriesShare));
        } catch (LimitException e) {
            throw new IllegalStateException("crossover of " + segments + " segments refused", e);
        }
    }

    private OptionalDouble scaled(OptionalDouble ratio) {
        return ratio.isPresent() ? OptionalDouble.of(ratio.getAsDouble() * leg) : ratio;
    }

    private OptionalDouble given(int segments, WorkForm form) {
        double radius = leg - seriesShare * foot;
        if (!(foot > 0 && radius > 0)) {
            return OptionalDouble.empty();
        }
        return form == WorkForm.NO_PUSH || form == WorkForm.PUSH_OFF
                ? FootCrossover.of(form, segments, foot, radius, leg).high()
                : FootCrossover.simultaneous(segments, foot, radius, leg).high();
    }
}
