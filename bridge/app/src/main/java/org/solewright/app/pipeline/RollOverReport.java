package org.solewright.app.pipeline;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import org.solewright.domain.finding.Cautions;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.foot.RollOverMeasure;
import org.solewright.domain.foot.RollOverSheet;
import org.solewright.domain.foot.Rolling;
import org.solewright.formats.footmodel.RollOverFile;
import org.solewright.formats.io.FormatException;
import org.solewright.formats.table.CurvesTable;
import org.solewright.formats.table.RollOverTable;

/**
 * A roll-over check, written: what the command prints about it.
 *
 * @param lines the summary, one line each
 * @param findings all findings
 * @param failed names of inputs that failed
 */
public record RollOverReport(List<String> lines, List<Finding> findings, List<String> failed) {

    /** Copies the lists. */
    public RollOverReport {
        lines = List.copyOf(lines);
        findings = List.copyOf(findings);
        failed = List.copyOf(failed);
    }

    /**
     * Checks and writes {@code rollover.csv}, {@code rollover.xml} and {@code rollover-curves.csv}.
     *
     * @param request what is asked
     * @param out folder, made where it is missing
     * @return what to print
     * @throws UseCaseException where an input lacks what is needed or the folder cannot be written
     * @throws FormatException where a file is not as its format says
     */
    public static RollOverReport write(RollOverUseCase.Request request, Path out)
            throws UseCaseException, FormatException {
        return write(RollOverUseCase.run(request), request, out);
    }

    /** Writes what a run gave, as {@link #write(RollOverUseCase.Request, Path)} does. */
    static RollOverReport write(RollOverUseCase.Result result, RollOverUseCase.Request request, Path out)
            throws UseCaseException {
        Map<String, byte[]> files = new LinkedHashMap<>();
        files.put("rollover.csv", RollOverTable.bytes(result.sheet()));
        files.put("rollover.xml", RollOverFile.bytes(result.sheet()));
        files.put("rollover-curves.csv", CurvesTable.bytes(result.curves()));
        List<Path> inputs = new ArrayList<>(request.gait().inputs());
        inputs.addAll(request.models());
        List<Path> written = OutputFolder.of(out, inputs).write(files);
        List<String> lines = new ArrayList<>();
        result.sheet().feet().forEach(f -> describe(lines, f));
        if (!result.sheet().comparisons().isEmpty()) {
            lines.add("published, for comparison:");
            result.sheet().comparisons().forEach(c -> lines.add("  " + c.text() + " (" + c.source() + ")"));
        }
        written.forEach(f -> lines.add("wrote " + f));
        lines.addAll(Cautions.LINES);
        return new RollOverReport(lines, result.sheet().findings(), result.failed());
    }

    private static void describe(List<String> lines, RollOverSheet.Foot foot) {
        lines.add(foot.side().word() + " foot");
        foot.observations().forEach(o -> lines.add("  " + o));
        for (RollOverSheet.Stance s : foot.stances()) {
            lines.add(String.format(
                    Locale.ROOT,
                    "  %s stance %d at %.3f s%s%s%s",
                    s.trial(),
                    s.step(),
                    s.start(),
                    s.isWhole() ? "" : ", not whole: " + s.why(),
                    s.evidence().isEmpty() ? "" : ": " + s.evidence(),
                    s.posture().map(p -> "; " + p).orElse("")));
        }
        for (RollOverMeasure measure : List.of(RollOverMeasure.ANGLE_CONSISTENCY, RollOverMeasure.COP_CONSISTENCY)) {
            foot.mean(measure)
                    .ifPresent(v -> lines.add(String.format(
                            Locale.ROOT,
                            "  %s %.4f %s over %d stances (%s)",
                            measure.word().replace('_', ' '),
                            measure.inUnit(v.value()),
                            measure.unit(),
                            v.n(),
                            measure.definition())));
        }
        for (Rolling.Pivot p : foot.pivots()) {
            lines.add(String.format(
                    Locale.ROOT,
                    "  pivot %.3f m from the heel, %.0f to %.0f %% of stance (measured)",
                    p.position(),
                    p.from(),
                    p.to()));
        }
        for (RollOverSheet.Lock l : foot.locks()) {
            lines.add(String.format(
                    Locale.ROOT,
                    "  %s held still at %.1f deg for %.0f %% of stance (%s)",
                    l.joint(),
                    Math.toDegrees(l.lock().angle()),
                    l.lock().stancePercent(),
                    l.lock().basis().word()));
        }
    }
}
