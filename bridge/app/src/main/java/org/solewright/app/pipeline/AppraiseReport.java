package org.solewright.app.pipeline;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.Set;
import org.solewright.analysis.cost.ComparedPostures;
import org.solewright.app.report.PageForm;
import org.solewright.domain.cost.TransitionColumns;
import org.solewright.domain.cost.TransitionRow;
import org.solewright.domain.finding.Cautions;
import org.solewright.domain.finding.Finding;
import org.solewright.formats.footmodel.PostureCostFile;
import org.solewright.formats.io.FormatException;
import org.solewright.formats.table.ContactsTable;
import org.solewright.formats.table.CurvesTable;
import org.solewright.formats.table.PostureCostTable;
import org.solewright.formats.table.PosturesTable;

/**
 * An appraisal, written: what the command prints about it.
 *
 * @param lines the summary, one line each
 * @param findings all findings
 * @param failed names of inputs that failed
 */
public record AppraiseReport(List<String> lines, List<Finding> findings, List<String> failed) {

    /** Copies the lists. */
    public AppraiseReport {
        lines = List.copyOf(lines);
        findings = List.copyOf(findings);
        failed = List.copyOf(failed);
    }

    /**
     * Appraises and writes {@code posture-cost.csv}, {@code posture-cost.xml}, {@code postures.csv}, {@code
     * appraise-contacts.csv} and {@code appraise-curves.csv}.
     *
     * @param request what is asked
     * @param out folder, made where it is missing
     * @param pages forms in which the page is written beside; may be empty
     * @return what to print
     * @throws UseCaseException where an input lacks what is needed or the folder cannot be written
     * @throws FormatException where a file is not as its format says
     */
    public static AppraiseReport write(AppraiseUseCase.Request request, Path out, Set<PageForm> pages)
            throws UseCaseException, FormatException {
        return write(AppraiseUseCase.run(request), request, out, pages);
    }

    /**
     * The same without a page.
     *
     * @param request what is asked
     * @param out folder, made where it is missing
     * @return what to print
     * @throws UseCaseException where an input lacks what is needed or the folder cannot be written
     * @throws FormatException where a file is not as its format says
     */
    public static AppraiseReport write(AppraiseUseCase.Request request, Path out)
            throws UseCaseException, FormatException {
        return write(request, out, Set.of());
    }

    /** Writes what a run gave, as {@link #write(AppraiseUseCase.Request, Path, Set)} does. */
    static AppraiseReport write(
            AppraiseUseCase.Result result, AppraiseUseCase.Request request, Path out, Set<PageForm> pages)
            throws UseCaseException {
        if (result.cost().rows().isEmpty()) {
            return new AppraiseReport(
                    List.of("nothing was written: these results cannot be appraised; see what the audit found"),
                    result.cost().findings(),
                    result.failed());
        }
        Map<String, byte[]> files = new LinkedHashMap<>();
        files.put("posture-cost.csv", PostureCostTable.bytes(result.cost().rows()));
        files.put("posture-cost.xml", PostureCostFile.bytes(result.cost()));
        files.put("postures.csv", PosturesTable.bytes(result.postures()));
        files.put("appraise-contacts.csv", ContactsTable.bytes(result.contacts()));
        files.put("appraise-curves.csv", CurvesTable.bytes(result.curves()));
        files.putAll(ResultPages.files(result, request.results().isEmpty(), pages));
        List<Path> inputs = new ArrayList<>(request.gait().inputs());
        inputs.addAll(request.models());
        inputs.addAll(request.tables());
        request.results().ifPresent(inputs::add);
        List<Path> written = OutputFolder.of(out, inputs).write(files);
        List<String> lines = new ArrayList<>();
        result.cost().rows().stream()
                .filter(r -> !r.text("trial").orElse("").equals("*"))
                .forEach(r -> describe(lines, r));
        if (!result.postures().isEmpty()) {
            lines.add("* " + ComparedPostures.THOUGHT_EXPERIMENT);
        }
        written.forEach(f -> lines.add("wrote " + f));
        request.gait().annotate().ifPresent(d -> lines.add("wrote annotated recordings into " + d));
        lines.addAll(Cautions.LINES);
        return new AppraiseReport(lines, result.cost().findings(), result.failed());
    }

    private static void describe(List<String> lines, TransitionRow row) {
        lines.add(String.format(
                Locale.ROOT,
                "%s step %s, %s to %s (%s window)",
                row.text("trial").orElse(""),
                row.text("step").orElse(""),
                row.text("trailing_side").orElse(""),
                row.text("side").orElse(""),
                row.text("window").orElse("")));
        line(lines, row, "step length", "step_length_m", "m", 3);
        line(lines, row, "step time", "step_time_s", "s", 3);
        line(lines, row, "speed, mean", "speed_m_s", "m/s", 3);
        line(lines, row, "speed at contact", "speed_before_m_s", "m/s", 3);
        line(lines, row, "mass carried", "mass_kg", "kg", 1);
        line(lines, row, "push-off", "push_off_J", "J", 1);
        line(lines, row, "  in double support", "push_off_ds_J", "J", 1);
        line(lines, row, "collision", "collision_J", "J", 1);
        line(lines, row, "  in double support", "collision_ds_J", "J", 1);
        line(lines, row, "rebound", "rebound_J", "J", 1);
        line(lines, row, "preload", "preload_J", "J", 1);
        line(lines, row, "transition angle", "transition_angle_deg", "deg", 1);
        line(lines, row, "  in double support", "transition_angle_ds_deg", "deg", 1);
        line(lines, row, "collision angle", "collision_angle_deg", "deg", 2);
        line(lines, row, "collision fraction", "collision_fraction", "", 3);
        line(lines, row, "mechanical cost", "mechanical_cost_of_transport", "", 4);
        line(lines, row, "height range of COM", "com_height_range_m", "m", 3);
        line(lines, row, "audit: force residual", "audit_force_residual_bw", "body weights rms", 4);
        line(lines, row, "audit: energy residual", "audit_energy_residual", "of the positive work", 4);
        line(lines, row, "rolling radius, shank", "rolling_radius_m", "m", 3);
        lines.add("  model works of the same step, simultaneous push-off and collision:");
        line(lines, row, "point foot (compass)", "compass_J", "J", 1);
        line(lines, row, "flat foot, 1 segment", "plantigrade_1_J", "J", 1);
        line(lines, row, "flat foot, 3 segments", "plantigrade_3_J", "J", 1);
        line(lines, row, "rolling arc", "rolling_arc_J", "J", 1);
        line(lines, row, "heel raised *", "digitigrade_J", "J", 1);
        line(lines, row, "tip-toe *", "unguligrade_J", "J", 1);
    }

    private static void line(
            List<String> lines, TransitionRow row, String words, String column, String unit, int digits) {
        OptionalDouble value = row.number(column);
        if (value.isEmpty()) {
            return;
        }
        String sdColumn = column + "_sd";
        OptionalDouble sd = TransitionColumns.ALL.contains(sdColumn) ? row.number(sdColumn) : OptionalDouble.empty();
        lines.add(String.format(Locale.ROOT, "  %-22s %9." + digits + "f", words, value.getAsDouble())
                + (sd.isPresent() ? String.format(Locale.ROOT, " +- %." + digits + "f", sd.getAsDouble()) : "")
                + (unit.isEmpty() ? "" : " " + unit));
    }
}
