package org.solewright.domain.cost;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * A point of a limb's posture landscape: what one foot costs at one step.
 *
 * @param segments number of foot segments, 0 for the compass
 * @param footRule how the foot length is chosen
 * @param leg total limb length, m
 * @param foot foot length along the ground, m; empty where there is no step to choose it for
 * @param stepLength m
 * @param speed hip speed before each transition, m/s
 * @param workForm how the work is counted
 * @param workPerStep J; empty where the limb cannot take this step
 * @param costOfTransport work per step over m g D; empty likewise
 * @param index the cost index, empty likewise
 * @param crossover step length at which this foot costs what the compass of the same total limb length does, m; empty
 *     where there is none within reach
 */
public record LandscapeRow(
        int segments,
        FootRule footRule,
        double leg,
        OptionalDouble foot,
        double stepLength,
        double speed,
        WorkForm workForm,
        OptionalDouble workPerStep,
        OptionalDouble costOfTransport,
        Optional<Index> index,
        OptionalDouble crossover) {

    /**
     * Parts of the cost index over g v: dimensionless, an index and not metabolic energy.
     *
     * @param work of the transitions
     * @param swing of the limb's swing
     * @param activation of the pivots
     */
    public record Index(double work, double swing, double activation) {
        /**
         * The whole index.
         *
         * @return sum of the parts
         */
        public double total() {
            return work + swing + activation;
        }
    }

    /** The columns of the landscape, in their order. */
    public static final List<String> COLUMNS = List.of(
            "segments",
            "foot_rule",
            "leg_m",
            "foot_m",
            "step_length_m",
            "speed_m_s",
            "work_form",
            "work_per_step_J",
            "cost_of_transport",
            "index_work",
            "index_swing",
            "index_activation",
            "index_total",
            "crossover_step_length_m");

    /**
     * The cells of the row.
     *
     * @return one text per column; empty where there is no value; numbers in digits that read back as the same number
     */
    public List<String> cells() {
        return List.of(
                Integer.toString(segments),
                footRule.word(),
                Double.toString(leg),
                text(foot),
                Double.toString(stepLength),
                Double.toString(speed),
                workForm.word(),
                text(workPerStep),
                text(costOfTransport),
                text(index.map(Index::work)),
                text(index.map(Index::swing)),
                text(index.map(Index::activation)),
                text(index.map(Index::total)),
                text(crossover));
    }

    private static String text(Optional<Double> value) {
        return value.map(v -> Double.toString(v)).orElse("");
    }

    private static String text(OptionalDouble value) {
        return value.isPresent() ? Double.toString(value.getAsDouble()) : "";
    }
}
