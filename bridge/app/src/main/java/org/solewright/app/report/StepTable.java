package org.solewright.app.report;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.solewright.domain.cost.TransitionRow;

/** The table of all transitions: a row per quantity, a column per step, then mean and interval of each side. */
final class StepTable {

    /** One quantity. */
    private record Line(String words, String unit, String column, int digits) {}

    private static final List<Line> LINES = List.of(
            new Line("Step length", "m", "step_length_m", 3),
            new Line("Step width", "m", "step_width_m", 3),
            new Line("Step time", "s", "step_time_s", 3),
            new Line("Speed, mean", "m/s", "speed_m_s", 3),
            new Line("Speed at contact", "m/s", "speed_before_m_s", 3),
            new Line("Mass carried", "kg", "mass_kg", 1),
            new Line("Push-off", "J", "push_off_J", 1),
            new Line("  while both feet bear", "J", "push_off_ds_J", 1),
            new Line("Collision", "J", "collision_J", 1),
            new Line("  while both feet bear", "J", "collision_ds_J", 1),
            new Line("Rebound", "J", "rebound_J", 1),
            new Line("Preload", "J", "preload_J", 1),
            new Line("Both limbs together, positive", "J", "combined_positive_J", 1),
            new Line("Both limbs together, negative", "J", "combined_negative_J", 1),
            new Line("Transition angle", "\u00b0", "transition_angle_deg", 1),
            new Line("  while both feet bear", "\u00b0", "transition_angle_ds_deg", 1),
            new Line("Collision angle", "\u00b0", "collision_angle_deg", 2),
            new Line("Collision fraction", "1", "collision_fraction", 3),
            new Line("Mechanical cost of transport", "1", "mechanical_cost_of_transport", 4),
            new Line("Height range of the centre of mass", "m", "com_height_range_m", 3),
            new Line("Rolling radius, shank frame", "m", "rolling_radius_m", 3),
            new Line("Distal to the shank, positive", "J", "ankle_foot_work_pos_J", 1),
            new Line("Distal to the shank, negative", "J", "ankle_foot_work_neg_J", 1),
            new Line("Model: point foot", "J", "compass_J", 1),
            new Line("Model: flat foot, 1 segment", "J", "plantigrade_1_J", 1),
            new Line("Model: flat foot, 3 segments", "J", "plantigrade_3_J", 1),
            new Line("Model: rolling arc", "J", "rolling_arc_J", 1));

    private static final int MOST = 6;

    private StepTable() {}

    static Block.Table of(List<TransitionRow> all) {
        List<TransitionRow> steps = new ArrayList<>();
        List<TransitionRow> means = new ArrayList<>();
        for (TransitionRow row : all) {
            boolean isSummary = row.text("trial").orElse("").equals("*");
            if (!isSummary) {
                steps.add(row);
            } else if (row.text("step").orElse("").equals("mean")
                    && row.text("of").isEmpty()
                    && row.number("n").orElse(0) > 1) {
                means.add(row);
            }
        }
        List<String> columns = new ArrayList<>(List.of("Quantity"));
        boolean areShown = steps.size() <= MOST;
        if (areShown) {
            steps.forEach(s -> columns.add(s.text("trial").orElse("") + " step "
                    + s.text("step").orElse("") + ", " + s.text("trailing_side").orElse("") + " to "
                    + s.text("side").orElse("")));
        }
        means.forEach(m -> columns.add("Mean to the " + m.text("side").orElse("") + ", n = "
                + Words.number(m.number("n"), 0) + ", SD over steps, 95 % interval"));
        List<Block.Row> rows = new ArrayList<>();
        for (Line line : LINES) {
            List<String> cells = new ArrayList<>();
            boolean isAny = false;
            for (TransitionRow step : areShown ? steps : List.<TransitionRow>of()) {
                OptionalDouble v = step.number(line.column());
                isAny |= v.isPresent();
                cells.add(v.isEmpty() ? Words.NONE : Words.withSd(v.getAsDouble(), sd(step, line), line.digits()));
            }
            for (TransitionRow mean : means) {
                isAny |= mean.number(line.column()).isPresent();
                cells.add(mean(all, mean, line));
            }
            if (isAny) {
                rows.add(new Block.Row(line.words().replace("  ", "\u2003") + " (" + line.unit() + ")", cells));
            }
        }
        return new Block.Table(
                areShown
                        ? "All steps; \u00b1 is one SD from the doubt about mean velocity and mass, where it is known"
                        : "Means over " + steps.size() + " steps; each step stands in posture-cost.csv",
                columns,
                rows,
                true);
    }

    private static OptionalDouble sd(TransitionRow row, Line line) {
        return org.solewright.domain.cost.TransitionColumns.ALL.contains(line.column() + "_sd")
                ? row.number(line.column() + "_sd")
                : OptionalDouble.empty();
    }

    private static String mean(List<TransitionRow> all, TransitionRow mean, Line line) {
        OptionalDouble value = mean.number(line.column());
        if (value.isEmpty()) {
            return Words.NONE;
        }
        OptionalDouble sd =
                beside(all, mean, "sd").map(r -> r.number(line.column())).orElse(OptionalDouble.empty());
        Optional<TransitionRow> low = beside(all, mean, "low");
        Optional<TransitionRow> high = beside(all, mean, "high");
        int digits = sd.isPresent() && sd.getAsDouble() > 0 ? Words.digits(sd.getAsDouble()) : line.digits();
        String text = Words.withSd(value.getAsDouble(), sd, line.digits());
        if (low.isPresent()
                && high.isPresent()
                && low.get().number(line.column()).isPresent()) {
            text += " (" + Words.number(low.get().number(line.column()), digits) + " to "
                    + Words.number(high.get().number(line.column()), digits) + ")";
        }
        return text;
    }

    private static Optional<TransitionRow> beside(List<TransitionRow> all, TransitionRow mean, String step) {
        return all.stream()
                .filter(r -> r.text("trial").orElse("").equals("*")
                        && r.text("step").orElse("").equals(step)
                        && r.text("of").equals(mean.text("of"))
                        && r.text("side").equals(mean.text("side")))
                .findFirst();
    }
}
