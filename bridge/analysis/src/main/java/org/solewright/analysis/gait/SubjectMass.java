package org.solewright.analysis.gait;

import java.util.List;
import java.util.Optional;
import org.solewright.analysis.numerics.Sample;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.finding.Quantity;
import org.solewright.domain.gait.Use;

/**
 * The subject's mass from the mean vertical load of work windows: over those with two whole contacts, else over all.
 *
 * @param mass kg, measured, with its SD: between windows, for one window the 1 % of a window's mass
 * @param windows how many windows
 * @param isWhole whether the windows had two whole contacts
 */
public record SubjectMass(Quantity mass, int windows, boolean isWhole) {

    private static final double WINDOW_DOUBT = 0.01;
    /** Heavier than any land animal, kg: a window that carries more has broken loads. */
    private static final double HEAVIEST = 20000;

    /**
     * The mass.
     *
     * @param steps steps by pass
     * @return empty where there is no step with a believable load
     */
    public static Optional<SubjectMass> of(List<List<Step>> steps) {
        List<Step> all = steps.stream()
                .flatMap(List::stream)
                .filter(s -> massOf(s) > 0 && massOf(s) < HEAVIEST)
                .toList();
        List<Step> whole = all.stream()
                .filter(s -> s.loads().trailing().allows(Use.MASS)
                        && s.loads().leading().allows(Use.MASS))
                .toList();
        List<Step> used = whole.isEmpty() ? all : whole;
        if (used.isEmpty()) {
            return Optional.empty();
        }
        double[] masses = used.stream().mapToDouble(SubjectMass::massOf).toArray();
        Sample sample = Sample.of(masses);
        double sd = sample.sd().orElse(WINDOW_DOUBT * sample.mean());
        return Optional.of(
                new SubjectMass(Quantity.of(sample.mean(), Basis.MEASURED, sd), masses.length, !whole.isEmpty()));
    }

    private static double massOf(Step step) {
        StepLoads loads = step.loads();
        return loads.totalForce().up().mean(loads.windowFrom(), loads.windowTo()) / loads.gravity();
    }
}
