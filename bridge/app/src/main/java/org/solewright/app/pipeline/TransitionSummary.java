package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import org.solewright.analysis.numerics.Sample;
import org.solewright.domain.cost.TransitionColumns;
import org.solewright.domain.cost.TransitionRow;
import org.solewright.domain.gait.Side;

/**
 * Mean, SD and 95 % interval rows after the rows of each trial and, for the whole call, of each side. Intervals by
 * Student's t over transitions; none for fewer than three. Radii are averaged as curvatures.
 */
final class TransitionSummary {

    private static final int FEWEST_FOR_INTERVAL = 3;
    private static final String RADIUS = "rolling_radius_m";

    private TransitionSummary() {}

    static List<TransitionRow> withSummaries(List<TransitionRow> rows) {
        List<TransitionRow> out = new ArrayList<>();
        Map<String, List<TransitionRow>> byTrial = new LinkedHashMap<>();
        for (TransitionRow r : rows) {
            byTrial.computeIfAbsent(r.text("trial").orElse(""), k -> new ArrayList<>())
                    .add(r);
        }
        byTrial.forEach((trial, of) -> {
            out.addAll(of);
            out.addAll(summary(of, trial, ""));
        });
        for (Side side : Side.values()) {
            List<TransitionRow> of = rows.stream()
                    .filter(r -> r.text("side").filter(side.word()::equals).isPresent())
                    .toList();
            if (!of.isEmpty()) {
                out.addAll(summary(of, "", side.word()));
            }
        }
        return out;
    }

    private static List<TransitionRow> summary(List<TransitionRow> rows, String of, String side) {
        TransitionRow.Builder mean = start("mean", of, side, rows.size());
        TransitionRow.Builder sd = start("sd", of, side, rows.size());
        TransitionRow.Builder low = start("low", of, side, rows.size());
        TransitionRow.Builder high = start("high", of, side, rows.size());
        for (String column : TransitionColumns.ALL) {
            if (TransitionColumns.TEXT.contains(column) || column.equals("n") || column.endsWith("_sd")) {
                continue;
            }
            double[] values = rows.stream()
                    .map(r -> r.number(column))
                    .filter(OptionalDouble::isPresent)
                    .mapToDouble(OptionalDouble::getAsDouble)
                    .map(v -> column.equals(RADIUS) ? 1 / v : v)
                    .toArray();
            if (values.length > 0) {
                fill(column, values, mean, sd, low, high);
            }
        }
        List<TransitionRow> out = new ArrayList<>(List.of(mean.build()));
        if (rows.size() > 1) {
            out.add(sd.build());
        }
        if (rows.size() >= FEWEST_FOR_INTERVAL) {
            out.add(low.build());
            out.add(high.build());
        }
        return out;
    }

    private static TransitionRow.Builder start(String step, String of, String side, int n) {
        return TransitionRow.builder()
                .text("trial", "*")
                .text("step", step)
                .text("side", side)
                .text("of", of)
                .count("n", n);
    }

    private static void fill(
            String column,
            double[] values,
            TransitionRow.Builder mean,
            TransitionRow.Builder sd,
            TransitionRow.Builder low,
            TransitionRow.Builder high) {
        Sample sample = Sample.of(values);
        double m = sample.mean();
        boolean isRadius = column.equals(RADIUS);
        mean.number(column, isRadius ? 1 / m : m);
        sample.sd().ifPresent(s -> sd.number(column, isRadius ? s / (m * m) : s));
        sample.half95().ifPresent(half -> {
            low.number(column, isRadius ? 1 / (m + half) : m - half);
            high.number(column, isRadius ? reciprocal(m - half) : m + half);
        });
    }

    private static double reciprocal(double curvature) {
        return curvature > 0 ? 1 / curvature : Double.NaN;
    }
}
