package org.solewright.formats.table;

import java.util.ArrayList;
import java.util.List;
import org.solewright.domain.foot.RollOverMeasure;
import org.solewright.domain.foot.RollOverSheet;
import org.solewright.domain.foot.Rolling;

/**
 * The roll-over check as a table: one number a row, with unit, basis and spread; what is said in words stands in the last
 * column. Rows of stances come before the means of a foot, whose {@code trial} is {@code *}.
 */
public final class RollOverTable {

    private static final List<String> COLUMNS = List.of(
            "trial", "step", "side", "measure", "unit", "value", "sd", "spread", "n", "low", "high", "basis", "text");

    private static final String ALL = "*";

    private RollOverTable() {}

    /**
     * The table's bytes; the same sheet gives the same bytes.
     *
     * @param sheet what is written
     * @return UTF-8 text
     */
    public static byte[] bytes(RollOverSheet sheet) {
        List<List<String>> rows = new ArrayList<>();
        sheet.feet().forEach(f -> foot(rows, f));
        sheet.comparisons().forEach(c -> rows.add(words(ALL, "", "", "published", c.text() + " (" + c.source() + ")")));
        sheet.findings()
                .forEach(f -> rows.add(words(
                        ALL,
                        "",
                        "",
                        "finding",
                        f.severity().word() + " " + f.code() + (f.where().isEmpty() ? "" : " " + f.where()) + ": "
                                + f.message())));
        sheet.cautions().forEach(c -> rows.add(words(ALL, "", "", "caution", c)));
        return CsvText.bytes(COLUMNS, rows);
    }

    private static void foot(List<List<String>> rows, RollOverSheet.Foot foot) {
        String side = foot.side().word();
        for (RollOverSheet.Stance s : foot.stances()) {
            String step = Integer.toString(s.step());
            s.values().forEach(v -> rows.add(value(s.trial(), step, side, v)));
            if (!s.evidence().isEmpty()) {
                rows.add(words(
                        s.trial(),
                        step,
                        side,
                        "heel_bearing",
                        s.heelBearing().map(b -> b ? "yes: " : "no: ").orElse("") + s.evidence()));
            }
            s.posture().ifPresent(p -> rows.add(words(s.trial(), step, side, "posture", p)));
            if (!s.why().isEmpty()) {
                rows.add(words(s.trial(), step, side, "not_whole", s.why()));
            }
        }
        foot.summary().forEach(v -> rows.add(value(ALL, "mean", side, v)));
        foot.observations().forEach(o -> rows.add(words(ALL, "mean", side, "observation", o)));
        int number = 0;
        for (Rolling.Pivot p : foot.pivots()) {
            number++;
            rows.add(known(side, "pivot_" + number + "_position", "m", p.position(), "measured"));
            rows.add(known(side, "pivot_" + number + "_height", "m", p.height(), "measured"));
            rows.add(known(side, "pivot_" + number + "_from", "%", p.from(), "measured"));
            rows.add(known(side, "pivot_" + number + "_to", "%", p.to(), "measured"));
        }
        for (RollOverSheet.Lock l : foot.locks()) {
            String basis = l.lock().basis().word();
            rows.add(known(
                    side,
                    "lock_" + l.joint() + "_angle",
                    "deg",
                    Math.toDegrees(l.lock().angle()),
                    basis));
            rows.add(known(side, "lock_" + l.joint() + "_length", "%", l.lock().stancePercent(), basis));
        }
    }

    private static List<String> value(String trial, String step, String side, RollOverSheet.Value v) {
        RollOverMeasure m = v.measure();
        return List.of(
                trial,
                step,
                side,
                m.word(),
                m.unit(),
                CsvText.number(m.inUnit(v.value())),
                v.sd().isPresent() ? CsvText.number(m.inUnit(v.sd().getAsDouble())) : "",
                v.sd().isPresent() ? v.spread().word() : "",
                Integer.toString(v.n()),
                v.low().isPresent() ? CsvText.number(m.inUnit(v.low().getAsDouble())) : "",
                v.high().isPresent() ? CsvText.number(m.inUnit(v.high().getAsDouble())) : "",
                v.basis().word(),
                "");
    }

    private static List<String> known(String side, String measure, String unit, double value, String basis) {
        return List.of(ALL, "mean", side, measure, unit, CsvText.number(value), "", "", "", "", "", basis, "");
    }

    private static List<String> words(String trial, String step, String side, String measure, String text) {
        return List.of(trial, step, side, measure, "", "", "", "", "", "", "", "", text);
    }
}
