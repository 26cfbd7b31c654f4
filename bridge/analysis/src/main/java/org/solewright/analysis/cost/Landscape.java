package org.solewright.analysis.cost;

import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import org.solewright.analysis.dynamics.Limit;
import org.solewright.analysis.dynamics.LimitException;
import org.solewright.domain.cost.FootRule;
import org.solewright.domain.cost.LandscapeRow;
import org.solewright.domain.cost.Posture;
import org.solewright.domain.cost.WorkForm;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.Found;

/**
 * What a limb's feet of 0 to 6 segments cost over step length: given foot, equal-vault foot and optimum foot, in every
 * form of the work.
 */
public final class Landscape {

    private final double leg;
    private final double foot;
    private final double seriesShare;
    private final double mass;
    private final double gravity;
    private final double speed;
    private final Map<Limit, Integer> refused = new EnumMap<>(Limit.class);

    private Landscape(double leg, double foot, double seriesShare, double mass, double gravity, double speed) {
        this.leg = leg;
        this.foot = foot;
        this.seriesShare = seriesShare;
        this.mass = mass;
        this.gravity = gravity;
        this.speed = speed;
    }

    /**
     * The landscape of a limb.
     *
     * @param leg total limb length, m, above 0
     * @param foot given foot length along the ground, m, not negative
     * @param seriesShare share of the foot length that is taken out of the limb, 0 to 1
     * @param mass kg, above 0
     * @param gravity m/s2, above 0
     * @param speed hip speed before each transition, m/s, above 0
     * @param steps step lengths, m, above 0, unmodified
     * @return rows by segments, rule, step and form; a finding says how many have no value and why
     */
    public static Found<List<LandscapeRow>> of(
            double leg, double foot, double seriesShare, double mass, double gravity, double speed, double[] steps) {
        Landscape landscape = new Landscape(leg, foot, seriesShare, mass, gravity, speed);
        List<LandscapeRow> rows = new ArrayList<>();
        for (int segments = 0; segments <= Posture.MOST_SEGMENTS; segments++) {
            for (FootRule rule : FootRule.values()) {
                Map<WorkForm, OptionalDouble> crossovers = new EnumMap<>(WorkForm.class);
                for (WorkForm form : WorkForm.values()) {
                    crossovers.put(form, landscape.crossover(segments, rule, form));
                }
                for (double step : steps) {
                    for (WorkForm form : WorkForm.values()) {
                        rows.add(landscape.row(
                                segments, rule, step, form, crossovers.getOrDefault(form, OptionalDouble.empty())));
                    }
                }
            }
        }
        List<Finding> findings = new ArrayList<>();
        landscape.refused.forEach((limit, count) -> findings.add(Finding.note(
                "postures.out-of-reach", "", count + " of " + rows.size() + " rows have no work: " + limit)));
        return new Found<>(rows, findings);
    }

    private LandscapeRow row(int segments, FootRule rule, double stepLength, WorkForm form, OptionalDouble crossover) {
        OptionalDouble length = OptionalDouble.empty();
        OptionalDouble work = OptionalDouble.empty();
        OptionalDouble cost = OptionalDouble.empty();
        try {
            VaultingStep step =
                    switch (rule) {
                        case GIVEN ->
                            VaultingStep.given(segments, stepLength, leg, segments == 0 ? 0 : foot, seriesShare);
                        case EQUAL -> VaultingStep.equalVaults(segments, stepLength, leg, seriesShare);
                        case OPTIMUM -> OptimumFoot.of(form, segments, stepLength, leg, seriesShare);
                    };
            length = OptionalDouble.of(step.footLength());
            double joules = step.factor(form) * mass * speed * speed / 2;
            work = OptionalDouble.of(joules);
            cost = OptionalDouble.of(joules / (mass * gravity * stepLength));
        } catch (LimitException e) {
            refused.merge(e.limit(), 1, Integer::sum);
        }
        if (length.isEmpty() && rule == FootRule.GIVEN) {
            length = OptionalDouble.of(segments == 0 ? 0 : foot);
        }
        return new LandscapeRow(segments, rule, leg, length, stepLength, speed, form, work, cost, crossover);
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
