package org.solewright.app.study;

import java.nio.file.Files;
import java.nio.file.Path;
import java.sql.Connection;
import java.sql.PreparedStatement;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Statement;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.solewright.app.pipeline.UseCaseException;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.Severity;
import org.sqlite.SQLiteConfig;
import org.sqlite.SQLiteErrorCode;
import org.sqlite.SQLiteException;

/**
 * What was done, with which inputs, by which version: one transaction per task, on the disk when the method returns.
 * Clock times, host and folder stand here and nowhere else; no decision rests on them. Used by one thread.
 */
final class Ledger implements AutoCloseable {

    /** Marks the database as a ledger: the letters SoLe. */
    private static final int APPLICATION = 0x536F4C65;

    private static final int FORMAT = 1;
    private static final int BUSY_MS = 30_000;

    private static final List<String> SCHEMA = List.of(
            "CREATE TABLE run(id INTEGER PRIMARY KEY, started TEXT, ended TEXT, how TEXT, host TEXT, process INTEGER,"
                    + " folder TEXT, version TEXT, jobs INTEGER)",
            "CREATE TABLE task(id TEXT PRIMARY KEY, kind TEXT, subject TEXT, session TEXT, condition TEXT, trial TEXT,"
                    + " state TEXT, message TEXT, version TEXT, options TEXT, run INTEGER, ended TEXT, seconds REAL)",
            "CREATE TABLE input(task TEXT, number INTEGER, role TEXT, file TEXT, sha256 TEXT,"
                    + " PRIMARY KEY(task, number)) WITHOUT ROWID",
            "CREATE TABLE output(task TEXT, number INTEGER, file TEXT, sha256 TEXT, bytes INTEGER,"
                    + " PRIMARY KEY(task, number)) WITHOUT ROWID",
            "CREATE TABLE finding(task TEXT, number INTEGER, code TEXT, severity TEXT, place TEXT, message TEXT,"
                    + " PRIMARY KEY(task, number)) WITHOUT ROWID",
            "PRAGMA application_id = " + APPLICATION,
            "PRAGMA user_version = " + FORMAT);

    private final Path file;
    private final Connection connection;

    private Ledger(Path file, Connection connection) {
        this.file = file;
        this.connection = connection;
    }

    /**
     * A task as the ledger has it.
     *
     * @param version that did it
     * @param options it was done with
     * @param outcome what came of it
     */
    record Entry(String version, String options, Outcome outcome) {}

    /**
     * Opens the ledger of a study; makes it where there is none. A damaged one is refused and left as it is.
     *
     * @param study folder of the study
     * @return the ledger
     * @throws UseCaseException where it is damaged, of another program or a later version, or cannot be written
     */
    static Ledger open(Path study) throws UseCaseException {
        Path file = study.resolve(Study.LEDGER);
        SQLiteConfig config = new SQLiteConfig();
        config.setJournalMode(SQLiteConfig.JournalMode.WAL);
        config.setSynchronous(SQLiteConfig.SynchronousMode.FULL);
        config.setBusyTimeout(BUSY_MS);
        return open(file, config);
    }

    /**
     * Opens the ledger of a study to look at it.
     *
     * @param study folder of the study
     * @return the ledger; empty where nothing was run yet
     * @throws UseCaseException where it is damaged, of another program or a later version
     */
    static Optional<Ledger> look(Path study) throws UseCaseException {
        Path file = study.resolve(Study.LEDGER);
        if (!Files.exists(file)) {
            return Optional.empty();
        }
        SQLiteConfig config = new SQLiteConfig();
        config.setReadOnly(true);
        config.setBusyTimeout(BUSY_MS);
        return Optional.of(open(file, config));
    }

    private static Ledger open(Path file, SQLiteConfig config) throws UseCaseException {
        if (Files.isDirectory(file)) {
            throw new UseCaseException(
                    UseCaseException.Kind.INPUT, file.toString(), "is a folder, expected the ledger", "move it away");
        }
        try {
            Connection connection = config.createConnection("jdbc:sqlite:" + file.toAbsolutePath());
            try {
                Ledger ledger = new Ledger(file, connection);
                ledger.recognise();
                connection.setAutoCommit(false);
                return ledger;
            } catch (SQLException | UseCaseException e) {
                connection.close();
                throw e;
            }
        } catch (SQLException e) {
            throw failure(file, e);
        }
    }

    private void recognise() throws SQLException, UseCaseException {
        int application = number("PRAGMA application_id");
        int tables = number("SELECT count(*) FROM sqlite_master");
        if (application == 0 && tables == 0) {
            if (connection.isReadOnly()) {
                return;
            }
            connection.setAutoCommit(false);
            try (Statement s = connection.createStatement()) {
                for (String sql : SCHEMA) {
                    s.execute(sql);
                }
            }
            connection.commit();
            return;
        }
        if (application != APPLICATION) {
            throw unusable("is a database of another program", "move it away");
        }
        int format = number("PRAGMA user_version");
        if (format != FORMAT) {
            throw unusable(
                    "is a ledger of format " + format + ", this version knows " + FORMAT,
                    "use the version that wrote it");
        }
        try (Statement s = connection.createStatement();
                ResultSet r = s.executeQuery("PRAGMA quick_check(1)")) {
            if (!r.next() || !"ok".equals(r.getString(1))) {
                throw damaged(file, String.valueOf(r.getString(1)));
            }
        }
    }

    private int number(String sql) throws SQLException {
        try (Statement s = connection.createStatement();
                ResultSet r = s.executeQuery(sql)) {
            return r.next() ? r.getInt(1) : 0;
        }
    }

    private UseCaseException unusable(String what, String whatToDo) {
        return new UseCaseException(UseCaseException.Kind.INPUT, file.toString(), what, whatToDo);
    }

    private static UseCaseException damaged(Path file, String how) {
        return new UseCaseException(
                UseCaseException.Kind.INPUT,
                file.toString(),
                "is a damaged ledger (" + how.replaceAll("\\s+", " ").strip() + "); it was left as it is",
                "restore a copy, or move it away with the files " + Study.LEDGER
                        + "-* beside it: the study is then run anew");
    }

    /** What a failure of the database means for the user. */
    private static UseCaseException failure(Path file, SQLException e) {
        SQLiteErrorCode code = e instanceof SQLiteException s ? s.getResultCode() : SQLiteErrorCode.SQLITE_ERROR;
        String name = code.name();
        if (name.startsWith("SQLITE_CORRUPT") || name.startsWith("SQLITE_NOTADB")) {
            return damaged(file, name);
        }
        return new UseCaseException(
                UseCaseException.Kind.OUTPUT,
                file.toString(),
                "the ledger cannot be written or opened (" + name + ")",
                "free space or make the folder writable, then run again: what is done stays done",
                e);
    }

    /**
     * A task as it was left.
     *
     * @param id of the task
     * @return empty where the ledger does not know it
     * @throws UseCaseException where the ledger cannot be read
     */
    Optional<Entry> entry(String id) throws UseCaseException {
        try (PreparedStatement s =
                connection.prepareStatement("SELECT state, message, version, options FROM task WHERE id = ?")) {
            s.setString(1, id);
            try (ResultSet r = s.executeQuery()) {
                if (!r.next()) {
                    return Optional.empty();
                }
                Optional<Outcome.State> state = Outcome.State.ofWord(text(r, 1));
                if (state.isEmpty()) {
                    return Optional.empty();
                }
                return Optional.of(new Entry(
                        text(r, 3),
                        text(r, 4),
                        new Outcome(state.get(), text(r, 2), inputs(id), findings(id), outputs(id))));
            }
        } catch (SQLException e) {
            throw failure(file, e);
        }
    }

    /** Makes a value of a row. */
    @FunctionalInterface
    interface Row<T> {
        T of(ResultSet row) throws SQLException;
    }

    /** Takes a row as texts by column. */
    @FunctionalInterface
    interface RowTaker<E extends Exception> {
        void take(Map<String, String> row) throws E;
    }

    private <T> List<T> rows(String sql, String id, Row<T> row) throws SQLException {
        List<T> rows = new ArrayList<>();
        try (PreparedStatement s = connection.prepareStatement(sql)) {
            s.setString(1, id);
            try (ResultSet r = s.executeQuery()) {
                while (r.next()) {
                    rows.add(row.of(r));
                }
            }
        }
        return rows;
    }

    private List<Outcome.Input> inputs(String id) throws SQLException {
        return rows(
                "SELECT role, file, sha256 FROM input WHERE task = ? ORDER BY number",
                id,
                r -> new Outcome.Input(text(r, 1), text(r, 2), text(r, 3)));
    }

    private List<Outcome.Output> outputs(String id) throws SQLException {
        return rows(
                "SELECT file, sha256, bytes FROM output WHERE task = ? ORDER BY number",
                id,
                r -> new Outcome.Output(text(r, 1), text(r, 2), r.getLong(3)));
    }

    private List<Finding> findings(String id) throws SQLException {
        return rows(
                "SELECT code, severity, place, message FROM finding WHERE task = ? ORDER BY number",
                id,
                r -> new Finding(text(r, 1), severity(text(r, 2)), text(r, 3), text(r, 4)));
    }

    private static Severity severity(String word) {
        for (Severity s : Severity.values()) {
            if (s.word().equals(word)) {
                return s;
            }
        }
        return Severity.WARNING;
    }

    private static String text(ResultSet row, int column) throws SQLException {
        return Optional.ofNullable(row.getString(column)).orElse("");
    }

    /**
     * Enters what came of a task in place of what was there, in one transaction.
     *
     * @param task what was done
     * @param version that did it
     * @param outcome what came of it
     * @param run number of the run
     * @param now clock time, for people
     * @param seconds it took
     * @throws UseCaseException where the ledger cannot be written
     */
    void enter(StudyTask task, String version, Outcome outcome, long run, String now, double seconds)
            throws UseCaseException {
        String id = task.id();
        try {
            for (String table : List.of("input", "output", "finding")) {
                execute("DELETE FROM " + table + " WHERE task = ?", id);
            }
            execute(
                    "INSERT OR REPLACE INTO task VALUES(?,?,?,?,?,?,?,?,?,?,?,?,?)",
                    id,
                    task.kind().word(),
                    task.subject(),
                    task.session(),
                    task.condition(),
                    task.trial(),
                    outcome.state().word(),
                    outcome.message(),
                    version,
                    task.options(),
                    run,
                    now,
                    seconds);
            int number = 0;
            for (Outcome.Input i : outcome.inputs()) {
                execute("INSERT INTO input VALUES(?,?,?,?,?)", id, number++, i.role(), i.file(), i.sha256());
            }
            number = 0;
            for (Outcome.Output o : outcome.outputs()) {
                execute("INSERT INTO output VALUES(?,?,?,?,?)", id, number++, o.file(), o.sha256(), o.bytes());
            }
            number = 0;
            for (Finding f : outcome.findings()) {
                execute(
                        "INSERT INTO finding VALUES(?,?,?,?,?,?)",
                        id,
                        number++,
                        f.code(),
                        f.severity().word(),
                        f.where(),
                        f.message());
            }
            connection.commit();
        } catch (SQLException e) {
            throw rolledBack(e);
        }
    }

    /**
     * Removes a task.
     *
     * @param id of the task
     * @throws UseCaseException where the ledger cannot be written
     */
    void forget(String id) throws UseCaseException {
        try {
            for (String table : List.of("input", "output", "finding")) {
                execute("DELETE FROM " + table + " WHERE task = ?", id);
            }
            execute("DELETE FROM task WHERE id = ?", id);
            connection.commit();
        } catch (SQLException e) {
            throw rolledBack(e);
        }
    }

    private void execute(String sql, Object... values) throws SQLException {
        try (PreparedStatement s = connection.prepareStatement(sql)) {
            for (int i = 0; i < values.length; i++) {
                s.setObject(i + 1, values[i]);
            }
            s.executeUpdate();
        }
    }

    private UseCaseException rolledBack(SQLException e) {
        try {
            connection.rollback();
        } catch (SQLException again) {
            e.addSuppressed(again);
        }
        return failure(file, e);
    }

    /**
     * Enters the beginning of a run.
     *
     * @param now clock time
     * @param host that runs it
     * @param folder of the study, absolute
     * @param version of the tool
     * @param jobs tasks at once
     * @return its number
     * @throws UseCaseException where the ledger cannot be written
     */
    long begin(String now, String host, String folder, String version, int jobs) throws UseCaseException {
        try {
            execute(
                    "INSERT INTO run(started, how, host, process, folder, version, jobs) VALUES(?,?,?,?,?,?,?)",
                    now,
                    "not ended",
                    host,
                    ProcessHandle.current().pid(),
                    folder,
                    version,
                    jobs);
            long id;
            try (Statement s = connection.createStatement();
                    ResultSet r = s.executeQuery("SELECT last_insert_rowid()")) {
                id = r.next() ? r.getLong(1) : 0;
            }
            connection.commit();
            return id;
        } catch (SQLException e) {
            throw rolledBack(e);
        }
    }

    /**
     * Enters the end of a run.
     *
     * @param run its number
     * @param now clock time
     * @param how it ended
     * @throws UseCaseException where the ledger cannot be written
     */
    void end(long run, String now, String how) throws UseCaseException {
        try {
            execute("UPDATE run SET ended = ?, how = ? WHERE id = ?", now, how, run);
            connection.commit();
        } catch (SQLException e) {
            throw rolledBack(e);
        }
    }

    /**
     * Rows of a question to the ledger, as texts by column.
     *
     * @param sql the question
     * @param row receives each
     * @param <E> what it may fail with
     * @throws UseCaseException where the ledger cannot be read
     * @throws E where a row cannot be taken
     */
    <E extends Exception> void each(String sql, RowTaker<E> row) throws UseCaseException, E {
        try (Statement s = connection.createStatement();
                ResultSet r = s.executeQuery(sql)) {
            int columns = r.getMetaData().getColumnCount();
            while (r.next()) {
                Map<String, String> cells = new LinkedHashMap<>();
                for (int c = 1; c <= columns; c++) {
                    cells.put(r.getMetaData().getColumnLabel(c), text(r, c));
                }
                row.take(cells);
            }
        } catch (SQLException e) {
            throw failure(file, e);
        }
    }

    /**
     * Writes the ledger as a database of its own.
     *
     * @param target a file that does not exist
     * @throws UseCaseException where it cannot be written
     */
    void copyTo(Path target) throws UseCaseException {
        try {
            connection.setAutoCommit(true);
            execute("VACUUM INTO ?", target.toAbsolutePath().toString());
        } catch (SQLException e) {
            throw failure(target, e);
        }
    }

    @Override
    public void close() throws UseCaseException {
        try {
            connection.close();
        } catch (SQLException e) {
            throw failure(file, e);
        }
    }
}
