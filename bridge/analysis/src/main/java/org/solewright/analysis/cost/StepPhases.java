package org.solewright.analysis.cost;

import java.util.ArrayList;
import java.util.List;
import org.solewright.analysis.gait.StepLoads;
import org.solewright.domain.cost.Measure;

/** When the four phases of a transition begin and end: push-off of the trailing limb, the others of the leading one. */
public final class StepPhases {

    /**
     * One phase.
     *
     * @param measure whose work it is
     * @param isTrailing whether the trailing limb does it
     * @param start s
     * @param end s
     * @param work J, negative where the limb takes work up
     */
    public record Phase(Measure measure, boolean isTrailing, double start, double end, double work) {}

    private StepPhases() {}

    /**
     * The phases that have a work.
     *
     * @param loads of the step
     * @param mechanics of the same step
     * @return in order of time; those left empty by the mechanics are not among them
     */
    public static List<Phase> of(StepLoads loads, StepMechanics mechanics) {
        List<Phase> phases = new ArrayList<>();
        double from = Math.max(loads.trailing().start(), loads.knownFrom());
        List<PowerPhases.Run> trailing = PowerPhases.runs(
                mechanics.trailingPower(), from, loads.trailing().end(), loads.shortestPhase());
        for (int i = trailing.size() - 1; i >= 0; i--) {
            if (trailing.get(i).isPositive()) {
                add(phases, mechanics, Measure.PUSH_OFF, true, trailing.get(i));
                break;
            }
        }
        double to = Math.min(loads.leading().end(), loads.knownTo());
        List<PowerPhases.Run> leading =
                PowerPhases.runs(mechanics.leadingPower(), loads.leading().start(), to, loads.shortestPhase());
        int first = 0;
        while (first < leading.size() && leading.get(first).isPositive()) {
            first++;
        }
        Measure[] order = {Measure.COLLISION, Measure.REBOUND, Measure.PRELOAD};
        for (int k = 0; k < order.length && first + k < leading.size(); k++) {
            add(phases, mechanics, order[k], false, leading.get(first + k));
        }
        return List.copyOf(phases);
    }

    private static void add(
            List<Phase> phases, StepMechanics mechanics, Measure measure, boolean isTrailing, PowerPhases.Run run) {
        if (mechanics.values().containsKey(measure)) {
            phases.add(new Phase(measure, isTrailing, run.start(), run.end(), run.work()));
        }
    }
}
