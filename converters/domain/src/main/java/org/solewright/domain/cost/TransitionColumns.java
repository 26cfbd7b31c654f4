package org.solewright.domain.cost;

import java.util.List;
import java.util.stream.Stream;

/** The columns of the posture-cost table, one row per transition, in their fixed order. */
public final class TransitionColumns {

    private static final List<String> IDENTITY = List.of("trial", "step", "side", "trailing_side", "window");

    private static final List<String> MEASURED_STEP = List.of(
            "step_length_m",
            "step_width_m",
            "step_time_s",
            "speed_m_s",
            "speed_before_m_s",
            "mass_kg",
            "limb_length_m",
            "foot_length_m",
            "effective_foot_length_m",
            "push_off_J",
            "collision_J",
            "rebound_J",
            "preload_J",
            "push_off_ds_J",
            "collision_ds_J",
            "combined_positive_J",
            "combined_negative_J",
            "transition_angle_deg",
            "transition_angle_ds_deg",
            "collision_angle_deg",
            "collision_fraction",
            "mechanical_cost_of_transport",
            "com_height_range_m",
            "rolling_radius_m");

    private static final List<String> POSTURES = List.of(
            "effective_segments",
            "posture",
            "compass_J",
            "plantigrade_1_J",
            "plantigrade_2_J",
            "plantigrade_3_J",
            "plantigrade_4_J",
            "plantigrade_5_J",
            "plantigrade_6_J",
            "rolling_arc_J",
            "digitigrade_J",
            "unguligrade_J",
            "crossover_low_m",
            "crossover_step_length_m",
            "crossover_reference");

    private static final List<String> MEASURED_DISTAL =
            List.of("ankle_foot_work_pos_J", "ankle_foot_work_neg_J", "foot_work_pos_J", "foot_work_neg_J");

    private static final List<String> CONSTITUENT = List.of("ankle_work_pos_J", "ankle_work_neg_J");

    private static final List<String> AUDIT = List.of("audit_force_residual_bw", "audit_energy_residual", "findings");

    private static final List<String> DIMENSIONLESS =
            List.of("speed_nd", "step_length_nd", "push_off_nd", "collision_nd");

    /** Ending of the column that holds a measured quantity's standard deviation. */
    public static final String SD_SUFFIX = "_sd";

    /** Columns that hold words; all others hold numbers. */
    public static final List<String> TEXT = List.of(
            "trial", "step", "side", "trailing_side", "window", "posture", "crossover_reference", "findings", "of");

    /** Measured quantities, each of which has a column {@code NAME_sd}. */
    public static final List<String> MEASURED =
            Stream.of(MEASURED_STEP, MEASURED_DISTAL).flatMap(List::stream).toList();

    /** All columns; {@code of} and {@code n} are filled in the summary rows only. */
    public static final List<String> ALL = Stream.of(
                    IDENTITY,
                    MEASURED_STEP,
                    POSTURES,
                    MEASURED_DISTAL,
                    AUDIT,
                    MEASURED.stream().map(name -> name + SD_SUFFIX).toList(),
                    DIMENSIONLESS,
                    List.of("of", "n"),
                    CONSTITUENT)
            .flatMap(List::stream)
            .toList();

    private TransitionColumns() {}

    /**
     * The unit of a column, from the end of its name.
     *
     * @param column one of {@link #ALL}
     * @return such as {@code m/s}; {@code 1} where dimensionless, empty where it holds words
     */
    public static String unit(String column) {
        if (TEXT.contains(column)) {
            return "";
        }
        String name = column.endsWith(SD_SUFFIX) ? column.substring(0, column.length() - SD_SUFFIX.length()) : column;
        if (name.endsWith("_m_s")) {
            return "m/s";
        }
        String last = name.substring(name.lastIndexOf('_') + 1);
        return switch (last) {
            case "m", "s", "kg", "J", "deg" -> last;
            default -> "1";
        };
    }
}
