package org.solewright.app.pipeline;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.solewright.app.report.PageForm;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.finding.Cautions;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.Quantity;
import org.solewright.domain.foot.FootModel;
import org.solewright.domain.foot.Rolling;
import org.solewright.domain.gait.CurveRow;
import org.solewright.formats.footmodel.FootModelFile;
import org.solewright.formats.io.FormatException;
import org.solewright.formats.table.ContactsTable;
import org.solewright.formats.table.CurvesTable;
import org.solewright.formats.table.UncertaintyTable;

/**
 * A fit, written: what the command prints about it.
 *
 * @param lines the summary, one line each
 * @param findings all findings
 * @param failed names of inputs that failed
 */
public record FitReport(List<String> lines, List<Finding> findings, List<String> failed) {

    /** Copies the lists. */
    public FitReport {
        lines = List.copyOf(lines);
        findings = List.copyOf(findings);
        failed = List.copyOf(failed);
    }

    /**
     * Fits and writes {@code foot-model-right.xml}, {@code foot-model-left.xml}, {@code fit-contacts.csv}, {@code
     * fit-curves.csv} and {@code fit-uncertainty.csv}.
     *
     * @param request what is asked
     * @param out folder, made where it is missing
     * @param pages forms in which a page per side is written beside; may be empty
     * @return what to print
     * @throws UseCaseException where an input lacks what is needed or the folder cannot be written
     * @throws FormatException where a file is not as its format says
     */
    public static FitReport write(FitUseCase.Request request, Path out, Set<PageForm> pages)
            throws UseCaseException, FormatException {
        return write(FitUseCase.run(request), request, out, pages);
    }

    /**
     * The same without pages.
     *
     * @param request what is asked
     * @param out folder, made where it is missing
     * @return what to print
     * @throws UseCaseException where an input lacks what is needed or the folder cannot be written
     * @throws FormatException where a file is not as its format says
     */
    public static FitReport write(FitUseCase.Request request, Path out) throws UseCaseException, FormatException {
        return write(request, out, Set.of());
    }

    /** Writes what a run gave, as {@link #write(FitUseCase.Request, Path, Set)} does. */
    static FitReport write(FitUseCase.Result result, FitUseCase.Request request, Path out, Set<PageForm> pages)
            throws UseCaseException {
        Map<String, byte[]> files = new LinkedHashMap<>();
        result.models().forEach((side, m) -> files.put("foot-model-" + side.word() + ".xml", FootModelFile.bytes(m)));
        files.put("fit-contacts.csv", ContactsTable.bytes(result.contacts()));
        List<CurveRow> curves = new ArrayList<>(LoadCurves.of(result.subject().passes()));
        result.angles().values().forEach(a -> curves.addAll(a.rows()));
        files.put("fit-curves.csv", CurvesTable.bytes(curves));
        files.put("fit-uncertainty.csv", UncertaintyTable.bytes(result.numbers()));
        files.putAll(ResultPages.files(result, pages));
        List<Path> written = OutputFolder.of(out, request.inputs()).write(files);
        List<String> lines = new ArrayList<>();
        result.models().values().forEach(m -> describe(lines, m));
        lines.add("contacts:");
        result.contacts()
                .forEach(c -> lines.add(String.format(
                        Locale.ROOT,
                        "  %s %s platform %s  %.3f to %.3f s  %s",
                        c.trial(),
                        c.side().word(),
                        c.platforms().toString().replaceAll("[\\[\\]]", ""),
                        c.start(),
                        c.end(),
                        c.whole() ? "whole" : "not whole: " + c.why())));
        written.forEach(f -> lines.add("wrote " + f));
        request.gait().annotate().ifPresent(d -> lines.add("wrote annotated recordings into " + d));
        lines.addAll(Cautions.LINES);
        return new FitReport(lines, result.findings(), result.failed());
    }

    private static void describe(List<String> lines, FootModel model) {
        lines.add(model.side().word() + " foot");
        lines.add("  body mass              " + text(model.subject().mass(), "kg", 1));
        lines.add("  limb length            " + text(model.subject().limbLength(), "m", 3));
        model.subject().footLength().ifPresent(q -> lines.add("  foot length            " + text(q, "m", 3)));
        model.subject().effectiveFootLength().ifPresent(q -> lines.add("  effective foot length  " + text(q, "m", 3)));
        model.segments()
                .forEach(s -> lines.add(String.format(
                        Locale.ROOT,
                        "  segment %-14s %s, length %s%s",
                        s.name().word(),
                        text(s.mass(), "kg", 3),
                        text(s.length(), "m", 3),
                        s.observed() ? "" : ", inferred")));
        for (Rolling.Arc arc : model.rolling().arcs()) {
            lines.add(String.format(
                    Locale.ROOT,
                    "  arc, %-5s frame       radius %.3f m%s, length %.3f m, rms %.1f mm, %d stance%s (%s)",
                    arc.frame().word(),
                    arc.radius(),
                    arc.radiusSd().isPresent()
                            ? String.format(
                                    Locale.ROOT, " +- %.3f", arc.radiusSd().getAsDouble())
                            : "",
                    arc.arcLength(),
                    1000 * arc.rms(),
                    arc.steps(),
                    arc.steps() == 1 ? "" : "s",
                    Basis.MEASURED.word()));
        }
        for (Rolling.Pivot p : model.rolling().pivots()) {
            lines.add(String.format(
                    Locale.ROOT,
                    "  pivot                  %.3f m from the heel, %.0f to %.0f %% of stance (measured)",
                    p.position(),
                    p.from(),
                    p.to()));
        }
    }

    private static String text(Quantity q, String unit, int digits) {
        Optional<String> sd = q.sd().isPresent()
                ? Optional.of(String.format(Locale.ROOT, " +- %." + digits + "f", q.sd().getAsDouble()))
                : Optional.empty();
        return String.format(Locale.ROOT, "%." + digits + "f", q.value()) + sd.orElse("") + " " + unit + " ("
                + q.basis().word() + ")";
    }
}
