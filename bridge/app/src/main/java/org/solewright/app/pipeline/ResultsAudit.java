package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;
import org.solewright.analysis.audit.AuditSettings;
import org.solewright.analysis.audit.AuditedResults;
import org.solewright.analysis.audit.Balance;
import org.solewright.analysis.audit.BalanceAudit;
import org.solewright.analysis.audit.ContactAudit;
import org.solewright.analysis.audit.JointAudit;
import org.solewright.analysis.cost.StepMechanics;
import org.solewright.analysis.gait.GaitSettings;
import org.solewright.analysis.gait.Step;
import org.solewright.domain.cost.Measure;
import org.solewright.domain.cost.TransitionRow;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.Severity;

/** The audit of a set of results: of the whole where every load is among them, else of the work windows of its rows. */
final class ResultsAudit {

    private final AuditedResults results;
    private final AuditSettings settings;
    private final Optional<BalanceAudit> balance;
    private final List<Finding> findings = new ArrayList<>();
    private final List<Balance> rows = new ArrayList<>();
    private boolean isWholeAudited;
    private final List<Double> strides = new ArrayList<>();
    private final List<Double> steps = new ArrayList<>();

    /**
     * An audit.
     *
     * @param inputs of the results
     * @param mass given, stated or the model's, kg
     * @param limit residuals above this share are findings
     * @param cutoff low-pass of markers and loads, Hz
     */
    ResultsAudit(AuditInputs inputs, OptionalDouble mass, double limit, double cutoff) {
        this.results = inputs.results().withMass(mass);
        this.settings = new AuditSettings(limit, cutoff, GaitSettings.STANDARD_GRAVITY);
        this.balance = BalanceAudit.of(results, settings);
        findings.addAll(ContactAudit.of(results, settings));
        findings.addAll(JointAudit.of(inputs.joints(), settings, inputs.name()));
        balance.filter(b -> b.loaded().isThroughout()).ifPresent(this::whole);
        if (balance.isEmpty()) {
            findings.add(Finding.note(
                    "audit.incomplete",
                    results.name(),
                    results.loads().isEmpty()
                            ? "no ground forces are mapped: residuals of force, energy and moment are not known"
                            : "no centre of mass is mapped (com-position or com-velocity): residuals of force, energy and"
                                    + " moment are not known"));
        }
    }

    private void whole(BalanceAudit audit) {
        BalanceAudit.Interval all = audit.loaded();
        audit.over(all.from(), all.to(), 0).ifPresent(b -> findings.addAll(audit.findings(b, results.name())));
        isWholeAudited = true;
    }

    /** Fills the audit's columns of a row. */
    void fill(TransitionRow.Builder row, Step step, StepMechanics mechanics) {
        Double carried = mechanics.values().get(Measure.MASS);
        if (carried != null && results.mass().isPresent()) {
            (step.loads().isStride() ? strides : steps)
                    .add(carried / results.mass().getAsDouble());
        }
        if (balance.isEmpty()) {
            return;
        }
        Optional<Balance> of = balance.get()
                .over(
                        step.loads().windowFrom(),
                        step.loads().windowTo(),
                        step.loads().isStride() ? 2 : 1);
        of.ifPresent(b -> {
            rows.add(b);
            row.number("audit_force_residual_bw", b.forceResidual());
            row.number("audit_energy_residual", b.energyResidual());
        });
        if (of.isEmpty()) {
            findings.add(Finding.note(
                    "audit.incomplete",
                    results.name() + " step " + step.number(),
                    "the work window lies where the filter settles or the centre of mass is not known: no residuals"));
        }
    }

    /** All that is found once the rows are known. */
    List<Finding> findings() {
        List<Finding> all = new ArrayList<>(findings);
        if (balance.isPresent() && !isWholeAudited) {
            Optional<Balance> worst = rows.stream().max((a, b) -> Double.compare(a.forceResidual(), b.forceResidual()));
            BalanceAudit.Interval loaded = balance.get().loaded();
            worst.or(() -> balance.get().over(loaded.from(), loaded.to(), 0))
                    .ifPresent(b -> all.addAll(balance.get().findings(b, results.name())));
        }
        rows.stream()
                .filter(b -> !Double.isNaN(b.momentResidual()))
                .max((a, b) -> Double.compare(a.momentResidual(), b.momentResidual()))
                .ifPresent(b -> all.addAll(balance.orElseThrow().momentFindings(b, results.name())));
        mass().ifPresent(all::add);
        return all;
    }

    /** By the median of strides, over which the mean load is the weight; of steps where there is no stride. */
    private Optional<Finding> mass() {
        List<Double> ratios = strides.isEmpty() ? steps : strides;
        if (ratios.isEmpty()) {
            return Optional.empty();
        }
        double ratio = ratios.stream().sorted().toList().get(ratios.size() / 2);
        return Math.abs(ratio - 1) > settings.limit()
                ? Optional.of(Finding.error(
                        "audit.mass",
                        results.name(),
                        String.format(
                                Locale.ROOT,
                                "the loads carry %.3f of the stated mass of %.2f kg (limit %.1f %%): check both",
                                ratio,
                                results.mass().orElse(Double.NaN),
                                100 * settings.limit())))
                : Optional.empty();
    }

    /** Whether anything is over its limit. */
    boolean hasErrors() {
        return findings().stream().anyMatch(f -> f.severity() == Severity.ERROR);
    }
}
