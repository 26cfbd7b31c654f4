package org.solewright.app.study;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.TreeMap;
import org.solewright.app.pipeline.UseCaseException;
import org.solewright.domain.cost.PostureRow;
import org.solewright.domain.cost.TransitionColumns;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.Quantity;
import org.solewright.domain.finding.Severity;
import org.solewright.domain.foot.FootModel;
import org.solewright.domain.foot.Rolling;
import org.solewright.domain.study.StudySettings.Output;
import org.solewright.domain.study.StudyTrial;
import org.solewright.formats.footmodel.FootModelFile;
import org.solewright.formats.io.FormatException;
import org.solewright.formats.table.PlainTable;

/**
 * The tables of a study, in long form: leading columns say whose row it is. Rows stand in the order of trials.csv,
 * whatever the order in which the trials were done.
 */
final class SummaryTables {

    /** The tables' task in the ledger. */
    static final String ID = "tables study/all";

    private static final String TRIAL = "trial";
    private static final List<String> IDS = List.of("subject", "session", "condition", TRIAL);
    private static final String COST = "posture-cost.csv";
    private static final String POSTURES = "postures.csv";
    private static final List<String> FOOT = List.of(
            "subject",
            "session",
            "condition",
            "side",
            "file",
            "mass_kg",
            "mass_kg_sd",
            "limb_length_m",
            "limb_length_m_sd",
            "foot_length_m",
            "foot_length_m_sd",
            "effective_foot_length_m",
            "effective_foot_length_m_sd",
            "segments",
            "shank_arc_radius_m",
            "shank_arc_radius_m_sd",
            "limb_arc_radius_m",
            "limb_arc_radius_m_sd");

    private final Study study;
    private final Ledger ledger;
    private final List<StudyTask> fits;
    private final List<StudyTask> appraisals;
    private final String version;
    private final Map<String, StudyTrial> trials = new HashMap<>();

    SummaryTables(Study study, Ledger ledger, List<StudyTask> fits, List<StudyTask> appraisals, String version) {
        this.study = study;
        this.ledger = ledger;
        this.fits = fits;
        this.version = version;
        study.trials().forEach(t -> trials.put(t.id(), t));
        this.appraisals = inTableOrder(appraisals);
    }

    private List<StudyTask> inTableOrder(List<StudyTask> tasks) {
        Map<Long, StudyTask> byLine = new TreeMap<>();
        tasks.forEach(t -> byLine.put(trial(t).line(), t));
        return List.copyOf(byLine.values());
    }

    private StudyTrial trial(StudyTask task) {
        StudyTrial trial = trials.get(task.name());
        if (trial == null) {
            throw new IllegalStateException("task " + task.name() + " is of no trial");
        }
        return trial;
    }

    /** The tables as a task of the ledger. */
    StudyTask task() {
        return new StudyTask(
                StudyTask.Kind.TABLES,
                "study",
                "",
                "",
                "all",
                List.of(
                        new StudyTask.Source("settings", study.folder().resolve(Study.SETTINGS)),
                        new StudyTask.Source("subjects", study.folder().resolve(Study.SUBJECTS)),
                        new StudyTask.Source("trials", study.folder().resolve(Study.TRIALS))),
                "",
                Path.of(Study.TABLES),
                Optional.empty(),
                out -> List.of());
    }

    /**
     * Writes the tables that the settings ask for, and the metadata.
     *
     * @param former files that an earlier run wrote
     * @return what was written
     * @throws UseCaseException where a file cannot be written or read back
     */
    List<Outcome.Output> write(List<Outcome.Output> former) throws UseCaseException {
        Path folder = study.folder().resolve(Study.TABLES);
        Set<Output> asked = study.settings().outputs();
        List<Path> written = new ArrayList<>();
        try {
            Files.createDirectories(folder);
            written.add(trials(folder.resolve("trials.csv")));
            if (asked.contains(Output.TRANSITIONS)) {
                written.add(transitions(folder.resolve("transitions.csv")));
            }
            if (asked.contains(Output.MEASURES)) {
                written.add(measures(folder.resolve("measures.csv")));
            }
            if (asked.contains(Output.POSTURES)) {
                written.add(postures(folder.resolve(POSTURES)));
            }
            if (asked.contains(Output.FINDINGS)) {
                written.add(findings(folder.resolve("findings.csv")));
            }
            if (asked.contains(Output.FEET)) {
                written.add(feet(folder.resolve("feet.csv")));
            }
            written.add(ResearchObject.write(study, version, written, outputs()));
            List<Outcome.Output> outputs = new ArrayList<>();
            Set<String> names = new HashSet<>();
            for (Path file : written) {
                Outcome.Output o = new Outcome.Output(
                        study.folder().relativize(file).toString().replace('\\', '/'),
                        Digests.sha256(file),
                        Files.size(file));
                outputs.add(o);
                names.add(o.file());
            }
            for (Outcome.Output o : former) {
                if (!names.contains(o.file())) {
                    Files.deleteIfExists(study.folder().resolve(o.file()));
                }
            }
            return outputs;
        } catch (IOException e) {
            throw StudyTask.unwritable(folder, e);
        }
    }

    /** Models and summaries of all tasks that went well, for the metadata. */
    private List<Outcome.Output> outputs() throws UseCaseException {
        List<Outcome.Output> all = new ArrayList<>();
        for (List<StudyTask> tasks : List.of(fits, appraisals)) {
            for (StudyTask task : tasks) {
                for (Outcome.Output o : entry(task).outputs()) {
                    if (o.file().endsWith(".xml")) {
                        all.add(o);
                    }
                }
            }
        }
        return all;
    }

    private Outcome entry(StudyTask task) throws UseCaseException {
        return ledger.entry(task.id())
                .orElseThrow(() -> new IllegalStateException("the ledger lost " + task.id()))
                .outcome();
    }

    private static List<String> ids(StudyTask task) {
        return List.of(task.subject(), task.session(), task.condition(), task.trial());
    }

    /** Does something with a task. */
    @FunctionalInterface
    private interface Each {
        void task(StudyTask task, Outcome outcome) throws IOException, FormatException;
    }

    private void each(List<StudyTask> tasks, Each each) throws IOException {
        for (StudyTask task : tasks) {
            try {
                each.task(task, entry(task));
            } catch (UseCaseException | FormatException e) {
                throw new IOException(task.name() + ": " + e.getMessage(), e);
            }
        }
    }

    private static List<String> joined(List<String> ids, List<String> cells) {
        List<String> row = new ArrayList<>(ids);
        row.addAll(cells);
        return row;
    }

    private Path trials(Path file) throws IOException {
        List<String> columns =
                joined(IDS, List.of("kind", "task", "file", "state", "message", "notes", "warnings", "errors"));
        PlainTable.write(file, columns, sink -> {
            each(fits, (task, outcome) -> sink.row(joined(ids(task), state(task, outcome, "", ""))));
            each(appraisals, (task, outcome) -> {
                StudyTrial trial = trial(task);
                sink.row(joined(ids(task), state(task, outcome, trial.kind().word(), trial.file())));
            });
        });
        return file;
    }

    private static List<String> state(StudyTask task, Outcome outcome, String kind, String file) {
        List<String> cells = new ArrayList<>(
                List.of(kind, task.kind().word(), file, outcome.state().word(), outcome.message()));
        for (Severity severity : List.of(Severity.NOTE, Severity.WARNING, Severity.ERROR)) {
            cells.add(Long.toString(outcome.findings().stream()
                    .filter(f -> f.severity() == severity)
                    .count()));
        }
        return cells;
    }

    /** A table of a trial that went well. */
    private Optional<PlainTable.Content> content(Outcome outcome, String name) throws IOException, FormatException {
        if (outcome.state() != Outcome.State.DONE) {
            return Optional.empty();
        }
        for (Outcome.Output o : outcome.outputs()) {
            if (o.file().endsWith("/" + name)) {
                return Optional.of(PlainTable.read(study.folder().resolve(o.file())));
            }
        }
        return Optional.empty();
    }

    /** Stacks tables of the trials; rows that summarise others are left out. */
    private void stack(Path file, String name, List<String> columns) throws IOException {
        PlainTable.write(
                file,
                joined(IDS, columns),
                sink -> each(appraisals, (task, outcome) -> {
                    Optional<PlainTable.Content> table = content(outcome, name);
                    if (table.isPresent()) {
                        for (List<String> row : table.get().rows()) {
                            if (!isSummary(table.get(), row)) {
                                sink.row(joined(
                                        ids(task),
                                        columns.stream()
                                                .map(c -> table.get().cell(row, c))
                                                .toList()));
                            }
                        }
                    }
                }));
    }

    private static boolean isSummary(PlainTable.Content table, List<String> row) {
        return table.cell(row, TRIAL).equals("*");
    }

    private Path transitions(Path file) throws IOException {
        stack(
                file,
                COST,
                TransitionColumns.ALL.stream()
                        .filter(c -> !c.equals(TRIAL) && !c.equals("of") && !c.equals("n"))
                        .toList());
        return file;
    }

    private Path postures(Path file) throws IOException {
        stack(
                file,
                POSTURES,
                PostureRow.COLUMNS.stream().filter(c -> !c.equals(TRIAL)).toList());
        return file;
    }

    private Path measures(Path file) throws IOException {
        List<String> columns = joined(IDS, List.of("step", "side", "quantity", "unit", "value", "sd"));
        List<String> quantities = TransitionColumns.ALL.stream()
                .filter(c -> !TransitionColumns.TEXT.contains(c)
                        && !c.equals("n")
                        && !c.endsWith(TransitionColumns.SD_SUFFIX))
                .toList();
        PlainTable.write(
                file,
                columns,
                sink -> each(appraisals, (task, outcome) -> {
                    Optional<PlainTable.Content> table = content(outcome, COST);
                    if (table.isEmpty()) {
                        return;
                    }
                    for (List<String> row : table.get().rows()) {
                        if (!isSummary(table.get(), row)) {
                            for (String quantity : quantities) {
                                measure(sink, task, table.get(), row, quantity);
                            }
                        }
                    }
                }));
        return file;
    }

    private static void measure(
            PlainTable.Sink sink, StudyTask task, PlainTable.Content table, List<String> row, String quantity)
            throws IOException {
        String value = table.cell(row, quantity);
        if (!value.isEmpty()) {
            sink.row(joined(
                    ids(task),
                    List.of(
                            table.cell(row, "step"),
                            table.cell(row, "side"),
                            quantity,
                            TransitionColumns.unit(quantity),
                            value,
                            table.cell(row, quantity + TransitionColumns.SD_SUFFIX))));
        }
    }

    private Path findings(Path file) throws IOException {
        List<String> columns = joined(IDS, List.of("task", "code", "severity", "where", "message"));
        PlainTable.write(file, columns, sink -> {
            Each row = (task, outcome) -> {
                for (Finding f : outcome.findings()) {
                    sink.row(joined(
                            ids(task),
                            List.of(task.kind().word(), f.code(), f.severity().word(), f.where(), f.message())));
                }
            };
            each(fits, row);
            each(appraisals, row);
        });
        return file;
    }

    private Path feet(Path file) throws IOException {
        PlainTable.write(
                file,
                FOOT,
                sink -> each(fits, (task, outcome) -> {
                    for (Outcome.Output o : outcome.outputs()) {
                        if (o.file().contains("/foot-model-")) {
                            sink.row(foot(
                                    task,
                                    o.file(),
                                    FootModelFile.read(study.folder().resolve(o.file()))));
                        }
                    }
                }));
        return file;
    }

    private static List<String> foot(StudyTask task, String file, FootModel model) {
        List<String> row = new ArrayList<>(List.of(
                task.subject(), task.session(), task.condition(), model.side().word(), file));
        quantity(row, Optional.of(model.subject().mass()));
        quantity(row, Optional.of(model.subject().limbLength()));
        quantity(row, model.subject().footLength());
        quantity(row, model.subject().effectiveFootLength());
        row.add(Integer.toString(model.segments().size() - 1));
        for (String frame : List.of("shank", "limb")) {
            Optional<Rolling.Arc> arc = model.rolling().arcs().stream()
                    .filter(a -> a.frame().word().equals(frame))
                    .findFirst();
            row.add(arc.map(a -> Double.toString(a.radius())).orElse(""));
            row.add(text(arc.map(Rolling.Arc::radiusSd).orElse(OptionalDouble.empty())));
        }
        return row;
    }

    private static void quantity(List<String> row, Optional<Quantity> quantity) {
        row.add(quantity.map(q -> Double.toString(q.value())).orElse(""));
        row.add(text(quantity.map(Quantity::sd).orElse(OptionalDouble.empty())));
    }

    private static String text(OptionalDouble value) {
        return value.isPresent() ? Double.toString(value.getAsDouble()) : "";
    }
}
