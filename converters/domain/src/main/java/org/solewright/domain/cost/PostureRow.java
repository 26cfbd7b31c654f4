package org.solewright.domain.cost;

import java.util.List;
import java.util.OptionalDouble;
import org.solewright.domain.finding.Basis;

/**
 * What one posture would cost at one step: a row of {@code postures.csv}.
 *
 * @param trial recording the step comes from
 * @param step number or name of the step within it
 * @param posture which
 * @param limb hip to rearmost bearing place, m
 * @param foot bearing length along the ground, m; for a rolling foot the length of its arc
 * @param basis the weaker basis of the two lengths
 * @param comparison at which step and speed
 * @param workForm how the work is counted
 * @param stepLength m
 * @param speed hip speed before the transition, m/s
 * @param workPerStep J; empty where the posture cannot take this step
 * @param workPerMetre J/m; empty likewise
 * @param costOfTransport work per step over m g D; empty likewise
 */
public record PostureRow(
        String trial,
        String step,
        Posture posture,
        double limb,
        double foot,
        Basis basis,
        Comparison comparison,
        WorkForm workForm,
        double stepLength,
        double speed,
        OptionalDouble workPerStep,
        OptionalDouble workPerMetre,
        OptionalDouble costOfTransport) {

    /** The columns of {@code postures.csv}, in their order. */
    public static final List<String> COLUMNS = List.of(
            "trial",
            "step",
            "posture",
            "segments",
            "limb_m",
            "foot_m",
            "basis",
            "comparison",
            "work_form",
            "step_length_m",
            "speed_m_s",
            "work_per_step_J",
            "work_per_metre_J",
            "cost_of_transport");

    /**
     * The cells of the row.
     *
     * @return one text per column; empty where there is no value; numbers in digits that read back as the same number
     */
    public List<String> cells() {
        return List.of(
                trial,
                step,
                posture.word(),
                posture.segments().isPresent()
                        ? Integer.toString(posture.segments().getAsInt())
                        : "",
                Double.toString(limb),
                Double.toString(foot),
                basis.word(),
                comparison.word(),
                workForm.word(),
                Double.toString(stepLength),
                Double.toString(speed),
                text(workPerStep),
                text(workPerMetre),
                text(costOfTransport));
    }

    private static String text(OptionalDouble value) {
        return value.isPresent() ? Double.toString(value.getAsDouble()) : "";
    }
}
