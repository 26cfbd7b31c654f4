package org.solewright.app.pipeline;

import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import org.solewright.analysis.cost.ComparedPostures;
import org.solewright.analysis.cost.CostIndex;
import org.solewright.analysis.cost.EqualCost;
import org.solewright.analysis.cost.Landscape;
import org.solewright.analysis.cost.OptimumFoot;
import org.solewright.analysis.cost.StepFactor;
import org.solewright.analysis.cost.VaultingStep;
import org.solewright.analysis.dynamics.LimitException;
import org.solewright.domain.cost.FootRule;
import org.solewright.domain.cost.LandscapeRow;
import org.solewright.domain.cost.PostureRow;
import org.solewright.domain.cost.WorkForm;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.foot.FootModel;
import org.solewright.formats.table.LandscapeTable;
import org.solewright.formats.table.PosturesTable;

/** A landscape and the tables and the picture made from it. */
public final class PostureTables {

    /** Feet tried for a limb of the same work, over the step length. */
    private static final int FEET = 20;

    private final Landscape.Limb limb;
    private final Landscape.Axes axes;
    private final CostIndex index;
    private final Optional<FootModel> model;
    private final List<LandscapeRow> rows;
    private final Set<Finding> findings;

    PostureTables(
            Landscape.Limb limb,
            Landscape.Axes axes,
            CostIndex index,
            Optional<FootModel> model,
            List<LandscapeRow> rows,
            List<Finding> findings) {
        this.limb = limb;
        this.axes = axes;
        this.index = index;
        this.model = model;
        this.rows = List.copyOf(rows);
        this.findings = new LinkedHashSet<>(findings);
    }

    /**
     * What has to be said about the tables made so far.
     *
     * @return in the order they were made
     */
    public List<Finding> findings() {
        return List.copyOf(findings);
    }

    /**
     * The landscape.
     *
     * @return UTF-8 text
     */
    public byte[] landscape() {
        return LandscapeTable.bytes(rows);
    }

    /**
     * The cheapest step length with work, swing and activation, by foot, speed and form of the work. An index, not
     * metabolic energy.
     *
     * @return UTF-8 text
     */
    public byte[] optima() {
        StringBuilder csv = new StringBuilder("segments,foot_rule,leg_m,foot_m,speed_m_s,work_form,"
                + "optimum_step_length_m,at_bound,index_work,index_swing,index_activation,index_total\n");
        for (int segments : axes.segments()) {
            for (FootRule rule : axes.rules()) {
                for (double speed : axes.speeds()) {
                    for (WorkForm form : WorkForm.values()) {
                        csv.append(optimum(segments, rule, speed, form)).append('\n');
                    }
                }
            }
        }
        return csv.toString().getBytes(StandardCharsets.UTF_8);
    }

    private String optimum(int segments, FootRule rule, double speed, WorkForm form) {
        String of = segments + "," + rule.word() + "," + limb.leg() + ",";
        String at = "," + speed + "," + form.word() + ",";
        try {
            CostIndex.Optimum optimum = index.optimum(factor(segments, rule, form), speed);
            double unit = index.gravity() * speed;
            CostIndex.Rates rates = optimum.rates();
            return of + foot(segments, rule, form, optimum.stepLength()) + at + optimum.stepLength() + ","
                    + optimum.isAtBound() + "," + rates.work() / unit + "," + rates.swing() / unit + ","
                    + rates.activation() / unit + "," + rates.total() / unit;
        } catch (LimitException e) {
            findings.add(Finding.note(
                    "postures.out-of-reach",
                    segments + " segments, " + rule.word() + " foot",
                    "no cheapest step: " + e.limit() + ": " + e.getMessage()));
            return of + at + ",,,,,";
        }
    }

    private double footOf(int segments) {
        return segments == 0 ? 0 : limb.foot();
    }

    private StepFactor factor(int segments, FootRule rule, WorkForm form) {
        return switch (rule) {
            case GIVEN -> new StepFactor.Given(form, segments, limb.leg(), footOf(segments), limb.seriesShare());
            case EQUAL -> new StepFactor.Equal(form, segments, limb.leg(), limb.seriesShare());
            case OPTIMUM -> new StepFactor.Optimum(form, segments, limb.leg(), limb.seriesShare());
        };
    }

    private double foot(int segments, FootRule rule, WorkForm form, double stepLength) throws LimitException {
        return switch (rule) {
            case GIVEN -> footOf(segments);
            case EQUAL -> segments * stepLength / (segments + 1);
            case OPTIMUM ->
                OptimumFoot.of(form, segments, stepLength, limb.leg(), limb.seriesShare())
                        .footLength();
        };
    }

    /**
     * Legs and feet that cost what the given leg and foot do, by segments, speed, step length and form of the work.
     *
     * @return UTF-8 text
     */
    public byte[] constantWork() {
        StringBuilder csv = new StringBuilder(
                "segments,work_form,step_length_m,speed_m_s,work_per_step_J,leg_m,foot_m,vault_radius_m\n");
        for (int segments : axes.segments()) {
            for (double speed : axes.speeds()) {
                for (double step : axes.steps()) {
                    for (WorkForm form : WorkForm.values()) {
                        constantWork(csv, segments, speed, step, form);
                    }
                }
            }
        }
        return csv.toString().getBytes(StandardCharsets.UTF_8);
    }

    private void constantWork(StringBuilder csv, int segments, double speed, double stepLength, WorkForm form) {
        double factor;
        try {
            factor = VaultingStep.given(segments, stepLength, limb.leg(), footOf(segments), limb.seriesShare())
                    .factor(form);
        } catch (LimitException e) {
            findings.add(Finding.note(
                    "postures.out-of-reach",
                    segments + " segments",
                    "some steps have no work to be matched: " + e.limit()));
            return;
        }
        double work = factor * limb.mass() * speed * speed / 2;
        String start = segments + "," + form.word() + "," + stepLength + "," + speed + "," + work + ",";
        for (int i = 0; i < (segments == 0 ? 1 : FEET); i++) {
            try {
                VaultingStep step =
                        EqualCost.limb(form, segments, stepLength, stepLength * i / FEET, limb.seriesShare(), factor);
                csv.append(start)
                        .append(step.limbLength())
                        .append(',')
                        .append(step.footLength())
                        .append(',')
                        .append(step.radius())
                        .append('\n');
            } catch (LimitException e) {
                findings.add(Finding.note(
                        "postures.out-of-reach",
                        segments + " segments",
                        "some feet have no limb that costs as much: " + e.limit()));
            }
        }
    }

    /**
     * The model's own limb on its heel, on its metatarsal heads and on its toe tip.
     *
     * @return UTF-8 text
     * @throws UseCaseException where there is no model
     */
    public byte[] postures() throws UseCaseException {
        if (model.isEmpty()) {
            throw new UseCaseException(
                    UseCaseException.Kind.USAGE,
                    "--postures",
                    "given without --model, expected a model whose limb takes the postures",
                    "see 'solewright postures --help'");
        }
        List<PostureRow> all = new ArrayList<>();
        int number = 1;
        for (double speed : axes.speeds()) {
            for (double step : axes.steps()) {
                ComparedPostures compared = ComparedPostures.of(
                        new ModelLimb(model.get()).compared(),
                        new ComparedPostures.TakenStep(
                                "", Integer.toString(number), step, speed, limb.mass(), index.gravity()));
                all.addAll(compared.rows());
                // One of each kind: the steps differ in numbers alone.
                compared.findings().stream()
                        .filter(f -> findings.stream().noneMatch(g -> g.code().equals(f.code())))
                        .forEach(findings::add);
                number++;
            }
        }
        findings.add(Finding.note(
                "postures.thought-experiment", "digitigrade, unguligrade", ComparedPostures.THOUGHT_EXPERIMENT));
        return PosturesTable.bytes(all);
    }

    /**
     * The rows of the picture: one rule of the foot, the first speed, push-off work.
     *
     * @return in the order of the landscape
     */
    private List<LandscapeRow> drawn() {
        FootRule rule = axes.rules().contains(FootRule.EQUAL) && axes.rules().size() > 1
                ? FootRule.EQUAL
                : axes.rules().get(0);
        return rows.stream()
                .filter(r -> r.footRule() == rule
                        && r.workForm() == WorkForm.PUSH_OFF
                        && r.speed() == axes.speeds().get(0))
                .toList();
    }

    /**
     * Work per step against step length over limb length.
     *
     * @return SVG, UTF-8 text
     * @throws UseCaseException where there is no curve to draw
     */
    public byte[] plot() throws UseCaseException {
        List<LandscapeRow> drawn = drawn();
        OptionalDouble longest = drawn.stream()
                .filter(r -> r.workPerStep().isPresent())
                .mapToDouble(LandscapeRow::stepLength)
                .max();
        if (longest.isEmpty() || axes.steps().size() < 2) {
            throw new UseCaseException(
                    UseCaseException.Kind.USAGE,
                    "--plot",
                    "no curve, expected two or more step lengths within reach",
                    "give --from, --to and --by or leave them out");
        }
        return LandscapePlot.of(drawn).getBytes(StandardCharsets.UTF_8);
    }

    /**
     * The table that belongs to the picture.
     *
     * @return UTF-8 text
     */
    public byte[] plotted() {
        return LandscapeTable.bytes(drawn());
    }
}
