package org.solewright.formats.table;

import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.solewright.domain.foot.Population;
import org.solewright.domain.foot.Sex;
import org.solewright.domain.study.StudySubject;
import org.solewright.domain.study.StudyTrial;
import org.solewright.formats.io.FormatException;
import org.solewright.formats.io.Spelling;

/**
 * The two tables of a study, {@code subjects.csv} and {@code trials.csv}. They are written by people: every line that is
 * wrong is named, not only the first. Comma, semicolon or tab between the cells; a decimal comma is understood where it
 * does not separate them.
 */
public final class StudyTables {

    private static final List<String> SUBJECTS =
            List.of("id", "mass_kg", "stature_m", "limb_length_m", "population", "sex", "notes");
    private static final List<String> TRIALS = List.of(
            "subject",
            "session",
            "trial",
            "kind",
            "file",
            "condition",
            "sole_thickness_m",
            "walking_aid",
            "slope_deg",
            "belt_speed_m_s");
    private static final List<String> POPULATIONS = List.of("adult", "child", "other");
    private static final List<String> SEXES =
            Arrays.stream(Sex.values()).map(Sex::word).toList();
    /** Letters, digits and a few signs: identifiers become names of folders. */
    private static final String IDENTIFIER = "[\\p{L}\\p{N}][\\p{L}\\p{N}._+-]{0,99}";

    private StudyTables() {}

    /**
     * A table as read.
     *
     * @param rows that could be understood, in the file's order
     * @param wrong what could not, in the file's order
     * @param <T> kind of row
     */
    public record Read<T>(List<T> rows, List<FormatException> wrong) {

        /** Copies the lists. */
        public Read {
            rows = List.copyOf(rows);
            wrong = List.copyOf(wrong);
        }
    }

    /** Makes a row of a line. */
    @FunctionalInterface
    private interface Row<T> {
        T of(CsvTable.Line line) throws FormatException;
    }

    /**
     * Reads {@code subjects.csv}; an identifier that comes for the second time is wrong.
     *
     * @param file the table
     * @return subjects
     * @throws IOException where the file cannot be opened or read
     * @throws FormatException where it is no table
     */
    public static Read<StudySubject> subjects(Path file) throws IOException, FormatException {
        Map<String, Long> seen = new HashMap<>();
        return read(file, SUBJECTS, List.of("id"), line -> {
            StudySubject s = subject(line);
            once(
                    line,
                    seen,
                    "subject '" + s.id() + "'",
                    s.id().toLowerCase(Locale.ROOT),
                    "give every subject one line");
            return s;
        });
    }

    /**
     * Reads {@code trials.csv}; a trial or a file that comes for the second time is wrong.
     *
     * @param file the table
     * @return trials
     * @throws IOException where the file cannot be opened or read
     * @throws FormatException where it is no table
     */
    public static Read<StudyTrial> trials(Path file) throws IOException, FormatException {
        Map<String, Long> names = new HashMap<>();
        Map<String, Long> files = new HashMap<>();
        return read(file, TRIALS, List.of("subject", "kind", "file"), line -> {
            StudyTrial t = trial(line);
            once(line, files, "file '" + t.file() + "'", t.file(), "give every recording one line");
            once(
                    line,
                    names,
                    "trial '" + t.id() + "'",
                    t.id().toLowerCase(Locale.ROOT),
                    "tell them apart in the column 'trial'");
            return t;
        });
    }

    private static void once(CsvTable.Line line, Map<String, Long> seen, String what, String key, String whatToDo)
            throws FormatException {
        Long first = seen.putIfAbsent(key, line.number());
        if (first != null) {
            throw line.wrong(what + " for the second time, first in line " + first, whatToDo);
        }
    }

    private static <T> Read<T> read(Path file, List<String> known, List<String> required, Row<T> row)
            throws IOException, FormatException {
        List<FormatException> wrong = new ArrayList<>();
        CsvTable table = CsvTable.read(file, wrong);
        for (String column : table.columns()) {
            if (!known.contains(column)) {
                wrong.add(new FormatException(
                        file.toString(), "line 1: unknown column '" + column + "'", Spelling.hint(column, known)));
            } else if (table.columns().indexOf(column) != table.columns().lastIndexOf(column)) {
                throw new FormatException(
                        file.toString(), "line 1: column '" + column + "' for the second time", "remove one of them");
            }
        }
        for (String column : required) {
            if (!table.columns().contains(column)) {
                throw new FormatException(
                        file.toString(),
                        "line 1: no column '" + column + "', expected " + String.join(",", known),
                        "add the column");
            }
        }
        List<T> rows = new ArrayList<>();
        for (CsvTable.Line line : table.lines()) {
            try {
                rows.add(row.of(line));
            } catch (FormatException e) {
                wrong.add(e);
            }
        }
        return new Read<>(rows, wrong);
    }

    private static StudySubject subject(CsvTable.Line line) throws FormatException {
        return new StudySubject(
                identifier(line, "id", false),
                quantity(line, "mass_kg", "kg", 0.01, 1e5),
                quantity(line, "stature_m", "m", 0.05, 10),
                quantity(line, "limb_length_m", "m", 0.01, 10),
                word(line, "population", POPULATIONS)
                        .flatMap(Population::ofWord)
                        .orElse(Population.UNKNOWN),
                word(line, "sex", SEXES).map(w -> w.equals(Sex.FEMALE.word()) ? Sex.FEMALE : Sex.MALE),
                line.text("notes"),
                line.number());
    }

    private static StudyTrial trial(CsvTable.Line line) throws FormatException {
        String file = line.text("file").replace('\\', '/');
        if (file.isEmpty()) {
            throw line.wrong("no file", "name the recording, relative to the study's folder");
        }
        String name = line.text("trial").isEmpty() ? stem(file) : identifier(line, "trial", false);
        if (!name.matches(IDENTIFIER)) {
            throw line.wrong(
                    "the file's name '" + name + "' is no identifier of a trial",
                    "give the trial a name of letters, digits, '.', '_', '+' and '-' in the column 'trial'");
        }
        String aid = line.text("walking_aid").toLowerCase(Locale.ROOT);
        return new StudyTrial(
                identifier(line, "subject", false),
                identifier(line, "session", true),
                name,
                word(line, "kind", StudyTrial.Kind.words())
                        .flatMap(StudyTrial.Kind::ofWord)
                        .orElseThrow(() -> line.wrong("no kind", "write standing, walking or results")),
                file,
                word(line, "condition", StudyTrial.Condition.words())
                        .flatMap(StudyTrial.Condition::ofWord)
                        .orElse(StudyTrial.Condition.BAREFOOT),
                quantity(line, "sole_thickness_m", "m", 0, 0.5),
                aid.isEmpty() ? StudyTrial.NO_AID : aid,
                Math.toRadians(quantity(line, "slope_deg", "deg", -45, 45).orElse(0)),
                quantity(line, "belt_speed_m_s", "m/s", 0, 20).orElse(0),
                line.number());
    }

    private static String stem(String file) {
        String name = file.substring(file.lastIndexOf('/') + 1);
        int dot = name.lastIndexOf('.');
        return dot > 0 ? name.substring(0, dot) : name;
    }

    private static String identifier(CsvTable.Line line, String column, boolean mayBeEmpty) throws FormatException {
        String text = line.text(column);
        if (text.isEmpty() && mayBeEmpty) {
            return text;
        }
        if (!text.matches(IDENTIFIER)) {
            throw line.wrong(
                    text.isEmpty() ? "no " + column : column + " '" + text + "' is no identifier",
                    "use letters, digits, '.', '_', '+' and '-', beginning with a letter or digit");
        }
        return text;
    }

    private static OptionalDouble quantity(CsvTable.Line line, String column, String unit, double low, double high)
            throws FormatException {
        if (line.text(column).isEmpty()) {
            return OptionalDouble.empty();
        }
        double value = line.number(column, unit);
        if (!(value >= low && value <= high)) {
            throw line.wrong(
                    String.format(
                            Locale.ROOT, "%s %s is out of range, expected %s to %s %s", column, value, low, high, unit),
                    "correct the cell or leave it empty");
        }
        return OptionalDouble.of(value);
    }

    private static Optional<String> word(CsvTable.Line line, String column, List<String> words) throws FormatException {
        String text = line.text(column).toLowerCase(Locale.ROOT);
        if (text.isEmpty()) {
            return Optional.empty();
        }
        if (!words.contains(text)) {
            throw line.wrong(
                    column + " '" + line.text(column) + "', expected one of " + String.join(", ", words),
                    Spelling.hint(text, words));
        }
        return Optional.of(text);
    }

    /**
     * The bytes of {@code subjects.csv}.
     *
     * @param subjects in their order
     * @return UTF-8 text
     */
    public static byte[] subjectBytes(List<StudySubject> subjects) {
        return CsvText.bytes(
                SUBJECTS,
                subjects.stream()
                        .map(s -> List.of(
                                s.id(),
                                CsvText.number(s.mass()),
                                CsvText.number(s.stature()),
                                CsvText.number(s.limbLength()),
                                s.population() == Population.UNKNOWN
                                        ? ""
                                        : s.population().word(),
                                s.sex().map(Sex::word).orElse(""),
                                s.notes()))
                        .toList());
    }

    /**
     * The bytes of {@code trials.csv}.
     *
     * @param trials in their order
     * @return UTF-8 text
     */
    public static byte[] trialBytes(List<StudyTrial> trials) {
        return CsvText.bytes(
                TRIALS,
                trials.stream()
                        .map(t -> List.of(
                                t.subject(),
                                t.session(),
                                t.name(),
                                t.kind().word(),
                                t.file(),
                                t.condition().word(),
                                CsvText.number(t.soleThickness()),
                                t.walkingAid(),
                                t.slope() == 0 ? "" : CsvText.number(Math.toDegrees(t.slope())),
                                t.beltSpeed() == 0 ? "" : CsvText.number(t.beltSpeed())))
                        .toList());
    }
}
