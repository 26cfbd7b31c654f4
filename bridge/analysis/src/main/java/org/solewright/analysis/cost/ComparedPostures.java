package org.solewright.analysis.cost;

import java.util.ArrayList;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import org.solewright.analysis.dynamics.LimitException;
import org.solewright.domain.cost.ComparedLimb;
import org.solewright.domain.cost.Comparison;
import org.solewright.domain.cost.Posture;
import org.solewright.domain.cost.PostureRow;
import org.solewright.domain.cost.TransitionRow;
import org.solewright.domain.cost.WorkForm;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.Quantity;

/**
 * What a step would have cost in other postures of the same limb: a point foot, a flat foot of 1 to 6 segments, the
 * measured arc, a raised heel, the tip of the toe. Push-off and simultaneous work bracket what a limb does; neither is the
 * measured one.
 *
 * @param rows rows of {@code postures.csv}, postures in the order of {@link Posture#all}, then comparisons, then forms
 * @param simultaneous work per step at the measured step and speed, J, by posture; absent where there is none
 * @param crossover step lengths at which the flat one-segment foot and the reference limb cost the same, simultaneous
 * @param crossoverReference the reference limb, {@code unguligrade}; empty where its length is unknown
 * @param findings what has no value and why
 */
public record ComparedPostures(
        List<PostureRow> rows,
        Map<Posture, Double> simultaneous,
        FootCrossover crossover,
        String crossoverReference,
        List<Finding> findings) {

    /** Heading of digitigrade and unguligrade postures of a person. */
    public static final String THOUGHT_EXPERIMENT =
            "geometric thought experiment: muscle work to hold the heel up is not counted";

    private static final List<WorkForm> FORMS = List.of(WorkForm.PUSH_OFF, WorkForm.SIMULTANEOUS);
    private static final FootCrossover NO_CROSSOVER = new FootCrossover(OptionalDouble.empty(), OptionalDouble.empty());

    /** Copies the lists. */
    public ComparedPostures {
        rows = List.copyOf(rows);
        simultaneous = Collections.unmodifiableMap(new LinkedHashMap<>(simultaneous));
        findings = List.copyOf(findings);
    }

    /**
     * The step that was taken.
     *
     * @param trial recording, for the rows
     * @param step number or name, for the rows
     * @param stepLength D, m, above 0
     * @param speedBefore hip speed before the transition, m/s, above 0
     * @param mass kg, above 0
     * @param gravity m/s2, above 0
     */
    public record TakenStep(
            String trial, String step, double stepLength, double speedBefore, double mass, double gravity) {

        /** Checks that all numbers are above 0. */
        public TakenStep {
            if (!(stepLength > 0 && speedBefore > 0 && mass > 0 && gravity > 0)
                    || !Double.isFinite(stepLength + speedBefore + mass + gravity)) {
                throw new IllegalArgumentException("step of " + stepLength + " m at " + speedBefore + " m/s, mass "
                        + mass + " kg, gravity " + gravity + " m/s2, expected numbers above 0");
            }
        }
    }

    /** One posture's geometry. */
    private record Stand(Posture posture, double limb, double foot, double arcRadius, Basis basis) {}

    /** Works at a step; throws where the posture cannot take it. */
    private static double factor(Stand stand, double stepLength, WorkForm form) throws LimitException {
        if (stand.posture().kind() == Posture.Kind.ROLLING_ARC) {
            double half = stand.arcRadius() > 0 ? stand.foot() / (2 * stand.arcRadius()) : 0;
            return RollingFoot.shortArc(stepLength, stand.limb(), stand.arcRadius(), half)
                    .factor(form);
        }
        int segments = stand.posture().segments().orElse(0);
        return VaultingStep.given(segments, stepLength, stand.limb(), stand.foot(), 0)
                .factor(form);
    }

    /**
     * Compares the postures at a step.
     *
     * @param limb lengths of the limb
     * @param step the step
     * @return rows, wide columns and findings
     */
    public static ComparedPostures of(ComparedLimb limb, TakenStep step) {
        List<Finding> findings = new ArrayList<>();
        List<PostureRow> rows = new ArrayList<>();
        Map<Posture, Double> wide = new LinkedHashMap<>();
        for (Stand stand : stands(limb, step, findings)) {
            for (Comparison comparison : Comparison.values()) {
                for (WorkForm form : FORMS) {
                    PostureRow row =
                            row(stand, comparison, form, limb.limbLength().value(), step, findings);
                    rows.add(row);
                    if (comparison == Comparison.MEASURED && form == WorkForm.SIMULTANEOUS) {
                        row.workPerStep().ifPresent(work -> wide.put(stand.posture(), work));
                    }
                }
            }
        }
        boolean known = limb.footLength().isPresent() && limb.toToeTip().isPresent();
        FootCrossover crossover = known
                ? FootCrossover.simultaneous(
                        1,
                        limb.footLength().orElseThrow().value(),
                        limb.limbLength().value(),
                        limb.toToeTip().orElseThrow().value())
                : NO_CROSSOVER;
        if (known && crossover.low().isEmpty() && crossover.high().isEmpty()) {
            findings.add(Finding.note(
                    "postures.no-crossover",
                    place(step),
                    "the flat one-segment foot and the unguligrade limb cost the same at no step length within reach"));
        }
        return new ComparedPostures(rows, wide, crossover, known ? "unguligrade" : "", findings);
    }

    private static List<Stand> stands(ComparedLimb limb, TakenStep step, List<Finding> findings) {
        List<Stand> stands = new ArrayList<>();
        Quantity l = limb.limbLength();
        for (Posture posture : Posture.all()) {
            Optional<Stand> stand =
                    switch (posture.kind()) {
                        case COMPASS -> Optional.of(new Stand(posture, l.value(), 0, 0, l.basis()));
                        case PLANTIGRADE ->
                            limb.footLength()
                                    .map(f ->
                                            new Stand(posture, l.value(), f.value(), 0, weaker(l.basis(), f.basis())));
                        case ROLLING_ARC -> arc(posture, limb, step, findings);
                        case DIGITIGRADE ->
                            limb.toMetatarsalHeads()
                                    .flatMap(r -> limb.headsToToeTip()
                                            .map(f -> new Stand(
                                                    posture, r.value(), f.value(), 0, weaker(r.basis(), f.basis()))));
                        case UNGULIGRADE -> limb.toToeTip().map(r -> new Stand(posture, r.value(), 0, 0, r.basis()));
                    };
            stand.ifPresent(stands::add);
            if (stand.isEmpty() && posture.kind() != Posture.Kind.ROLLING_ARC && firstOfKind(posture)) {
                findings.add(Finding.note(
                        "postures.length-unknown",
                        place(step),
                        missing(posture.kind()) + " is not known: no "
                                + posture.kind().name().toLowerCase(Locale.ROOT) + " posture"));
            }
        }
        return stands;
    }

    private static boolean firstOfKind(Posture posture) {
        return posture.kind() != Posture.Kind.PLANTIGRADE || posture.segments().equals(OptionalInt.of(1));
    }

    private static String missing(Posture.Kind kind) {
        return switch (kind) {
            case COMPASS -> "the limb length";
            case PLANTIGRADE -> "the effective foot length";
            case ROLLING_ARC -> "the limb arc";
            case DIGITIGRADE -> "the way from hip to metatarsal heads or from there to the toe tip";
            case UNGULIGRADE -> "the way from hip to toe tip";
        };
    }

    private static Optional<Stand> arc(Posture posture, ComparedLimb limb, TakenStep step, List<Finding> findings) {
        if (limb.arc().isEmpty()) {
            findings.add(Finding.note(
                    "postures.arc-unknown", place(step), "no arc in the limb frame is known: no rolling posture"));
            return Optional.empty();
        }
        ComparedLimb.Arc arc = limb.arc().get();
        double l = limb.limbLength().value();
        double curvature = arc.curvature().value();
        if (!(curvature * l >= 1)) {
            findings.add(Finding.note(
                    "postures.arc-outside",
                    place(step),
                    VaultingStep.text(
                            "the limb arc has curvature %.3f 1/m, expected at least 1/limb length = %.3f 1/m: no rolling"
                                    + " posture",
                            curvature, 1 / l)));
            return Optional.empty();
        }
        Basis basis = weaker(
                limb.limbLength().basis(),
                weaker(arc.curvature().basis(), arc.length().basis()));
        return Optional.of(new Stand(posture, l, arc.length().value(), 1 / curvature, basis));
    }

    private static Basis weaker(Basis a, Basis b) {
        return a.compareTo(b) >= 0 ? a : b;
    }

    private static PostureRow row(
            Stand stand,
            Comparison comparison,
            WorkForm form,
            double limbLength,
            TakenStep step,
            List<Finding> findings) {
        double ratio = comparison == Comparison.SAME_FROUDE ? stand.limb() / limbLength : 1;
        double share =
                switch (comparison) {
                    case MEASURED, SAME_FROUDE -> 1;
                    case STEP_09 -> 0.9;
                    case STEP_08 -> 0.8;
                };
        double stepLength = step.stepLength() * ratio * share;
        double speed = step.speedBefore() * Math.sqrt(ratio);
        OptionalDouble work = OptionalDouble.empty();
        try {
            work = OptionalDouble.of(factor(stand, stepLength, form) * step.mass() * speed * speed / 2);
        } catch (LimitException e) {
            if (form == FORMS.get(0)) {
                findings.add(Finding.note(
                        "postures.out-of-reach",
                        place(step),
                        stand.posture().word() + ", " + comparison.word() + ": " + e.limit() + ": " + e.getMessage()));
            }
        }
        double w = work.orElse(Double.NaN);
        boolean there = work.isPresent();
        return new PostureRow(
                step.trial(),
                step.step(),
                stand.posture(),
                stand.limb(),
                stand.foot(),
                stand.basis(),
                comparison,
                form,
                stepLength,
                speed,
                work,
                there ? OptionalDouble.of(w / stepLength) : OptionalDouble.empty(),
                there ? OptionalDouble.of(w / (step.mass() * step.gravity() * stepLength)) : OptionalDouble.empty());
    }

    private static String place(TakenStep step) {
        return step.trial() + " step " + step.step();
    }

    /**
     * Work per step at the measured step and speed, simultaneous.
     *
     * @param posture which
     * @return J; empty where it has no value
     */
    public OptionalDouble work(Posture posture) {
        Double work = simultaneous.get(posture);
        return work == null ? OptionalDouble.empty() : OptionalDouble.of(work);
    }

    /**
     * Fills the wide columns of a transition: {@code compass_J} to {@code unguligrade_J}, {@code crossover_low_m},
     * {@code crossover_step_length_m} and {@code crossover_reference}.
     *
     * @param row the row being built, modified
     */
    public void fill(TransitionRow.Builder row) {
        for (Posture posture : Posture.all()) {
            row.number(posture.word() + "_J", work(posture));
        }
        row.number("crossover_low_m", crossover.low());
        row.number("crossover_step_length_m", crossover.high());
        row.text("crossover_reference", crossoverReference);
    }
}
