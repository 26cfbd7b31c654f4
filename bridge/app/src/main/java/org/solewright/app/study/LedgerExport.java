package org.solewright.app.study;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.solewright.app.pipeline.UseCaseException;
import org.solewright.formats.table.PlainTable;

/** A study's ledger for other programs. */
public final class LedgerExport {

    private static final Map<String, List<String>> TABLES = Map.of(
            "run", List.of("id", "started", "ended", "how", "host", "process", "folder", "version", "jobs"),
            "task",
                    List.of(
                            "id",
                            "kind",
                            "subject",
                            "session",
                            "condition",
                            "trial",
                            "state",
                            "message",
                            "version",
                            "options",
                            "run",
                            "ended",
                            "seconds"),
            "input", List.of("task", "number", "role", "file", "sha256"),
            "output", List.of("task", "number", "file", "sha256", "bytes"),
            "finding", List.of("task", "number", "code", "severity", "place", "message"));

    private LedgerExport() {}

    /**
     * Writes the ledger.
     *
     * @param folder of the study
     * @param isCsv whether as a folder of tables, else as a database
     * @param out folder or database; empty: in the study's folder
     * @return what was written
     * @throws UseCaseException where there is no ledger, or a file cannot be written
     */
    public static List<Path> write(Path folder, boolean isCsv, Optional<Path> out) throws UseCaseException {
        Path target = out.orElse(folder.resolve(isCsv ? "ledger-export" : "ledger-export.sqlite"));
        try (Ledger ledger = Ledger.look(folder)
                .orElseThrow(() -> new UseCaseException(
                        UseCaseException.Kind.INPUT,
                        folder.resolve(Study.LEDGER).toString(),
                        "there is no ledger",
                        "run the study first"))) {
            return isCsv ? tables(ledger, target) : database(ledger, target);
        } catch (IOException e) {
            throw StudyTask.unwritable(target, e);
        }
    }

    private static List<Path> tables(Ledger ledger, Path target) throws IOException {
        Files.createDirectories(target);
        List<Path> written = new ArrayList<>();
        for (String table : TABLES.keySet().stream().sorted().toList()) {
            Path file = target.resolve(table + ".csv");
            List<String> columns = TABLES.getOrDefault(table, List.of());
            PlainTable.write(file, columns, sink -> {
                try {
                    ledger.each(
                            "SELECT * FROM " + table + " ORDER BY 1, 2",
                            row -> sink.row(columns.stream()
                                    .map(c -> row.getOrDefault(c, ""))
                                    .toList()));
                } catch (UseCaseException e) {
                    throw new IOException(e.getMessage(), e);
                }
            });
            written.add(file);
        }
        return written;
    }

    /** A copy, made beside its place and then renamed. */
    private static List<Path> database(Ledger ledger, Path target) throws IOException, UseCaseException {
        Path unfinished =
                target.resolveSibling(".writing-" + ProcessHandle.current().pid() + ".part");
        Files.deleteIfExists(unfinished);
        try {
            ledger.copyTo(unfinished);
            Files.move(
                    unfinished,
                    target,
                    java.nio.file.StandardCopyOption.ATOMIC_MOVE,
                    java.nio.file.StandardCopyOption.REPLACE_EXISTING);
        } finally {
            Files.deleteIfExists(unfinished);
        }
        return List.of(target);
    }
}
