package org.solewright.formats.table;

import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.stream.Collectors;
import org.solewright.domain.gait.ContactRow;
import org.solewright.domain.gait.Side;
import org.solewright.domain.gait.Use;
import org.solewright.formats.io.AtomicOutput;
import org.solewright.formats.io.FormatException;
import org.solewright.formats.io.Spelling;

/**
 * The table of contacts: which foot stood on which platform when, whether its load is whole, and what it is used for.
 * Written by the tool, edited by the user, read back. Several uses of a contact are parted by semicolons, several
 * platforms by a plus sign; no platform is an empty cell.
 */
public final class ContactsTable {

    private static final List<String> COLUMNS =
            List.of("trial", "side", "platform", "start_s", "end_s", "whole", "used_for", "not_used_for", "why");
    private static final List<String> REQUIRED = List.of("trial", "side", "start_s", "end_s", "whole");
    private static final List<String> SIDES =
            Arrays.stream(Side.values()).map(Side::word).toList();
    private static final List<String> USES =
            Arrays.stream(Use.values()).map(Use::word).toList();
    private static final List<String> TRUE = List.of("true", "yes", "1");
    private static final List<String> FALSE = List.of("false", "no", "0");

    private ContactsTable() {}

    /**
     * Writes the table; the same rows give the same bytes.
     *
     * @param file target, replaced as a whole
     * @param rows in the order they are printed
     * @throws IOException where it cannot be written
     */
    public static void write(Path file, List<ContactRow> rows) throws IOException {
        AtomicOutput.write(file, bytes(rows));
    }

    /**
     * The bytes that {@link #write} writes.
     *
     * @param rows in the order they are printed
     * @return UTF-8 text
     */
    public static byte[] bytes(List<ContactRow> rows) {
        return CsvText.bytes(
                COLUMNS,
                rows.stream()
                        .map(r -> List.of(
                                r.trial(),
                                r.side().word(),
                                r.platforms().stream().map(String::valueOf).collect(Collectors.joining("+")),
                                CsvText.number(r.start()),
                                CsvText.number(r.end()),
                                Boolean.toString(r.whole()),
                                words(r.usedFor()),
                                words(r.notUsedFor()),
                                r.why()))
                        .toList());
    }

    private static String words(List<Use> uses) {
        return uses.stream().map(Use::word).collect(Collectors.joining(";"));
    }

    /**
     * Reads a table that was written by the tool and may have been edited by hand. Columns may stand in any order; those
     * for platform, uses and reason may be missing.
     *
     * @param file the table
     * @return rows in the file's order
     * @throws IOException where the file cannot be opened or read
     * @throws FormatException where it is not a table of contacts
     */
    public static List<ContactRow> read(Path file) throws IOException, FormatException {
        CsvTable table = CsvTable.read(file);
        for (String column : table.columns()) {
            if (!COLUMNS.contains(column)) {
                throw new FormatException(
                        file.toString(), "line 1: unknown column '" + column + "'", Spelling.hint(column, COLUMNS));
            }
        }
        for (String column : REQUIRED) {
            if (!table.columns().contains(column)) {
                throw new FormatException(
                        file.toString(),
                        "line 1: no column '" + column + "', expected " + String.join(",", COLUMNS),
                        "add the column");
            }
        }
        List<ContactRow> rows = new ArrayList<>();
        for (CsvTable.Line line : table.lines()) {
            rows.add(row(line));
        }
        return List.copyOf(rows);
    }

    private static ContactRow row(CsvTable.Line line) throws FormatException {
        double start = line.number("start_s", "s");
        double end = line.number("end_s", "s");
        if (end < start) {
            throw line.wrong("contact from " + start + " s to " + end + " s", "put the later time into end_s");
        }
        return new ContactRow(
                line.text("trial"),
                side(line),
                platforms(line),
                start,
                end,
                whole(line),
                uses(line, "used_for"),
                uses(line, "not_used_for"),
                line.text("why"));
    }

    private static Side side(CsvTable.Line line) throws FormatException {
        String word = line.text("side").toLowerCase(Locale.ROOT);
        for (Side side : Side.values()) {
            if (side.word().equals(word)) {
                return side;
            }
        }
        throw line.wrong("side '" + line.text("side") + "', expected left or right", Spelling.hint(word, SIDES));
    }

    private static List<Integer> platforms(CsvTable.Line line) throws FormatException {
        List<Integer> platforms = new ArrayList<>();
        for (String word : parts(line.text("platform"), "\\+")) {
            if (!word.matches("[1-9][0-9]{0,3}")) {
                throw line.wrong(
                        "platform '" + line.text("platform")
                                + "', expected a number from 1, or several with a + between",
                        "correct the cell or leave it empty");
            }
            platforms.add(Integer.valueOf(word));
        }
        return platforms;
    }

    private static boolean whole(CsvTable.Line line) throws FormatException {
        String word = line.text("whole").toLowerCase(Locale.ROOT);
        if (TRUE.contains(word)) {
            return true;
        }
        if (FALSE.contains(word)) {
            return false;
        }
        throw line.wrong("whole '" + line.text("whole") + "', expected true or false", "correct the cell");
    }

    private static List<Use> uses(CsvTable.Line line, String column) throws FormatException {
        List<Use> uses = new ArrayList<>();
        for (String word : parts(line.text(column), ";")) {
            Use use = Arrays.stream(Use.values())
                    .filter(u -> u.word().equals(word))
                    .findFirst()
                    .orElse(null);
            if (use == null) {
                throw line.wrong("unknown use '" + word + "' in " + column, Spelling.hint(word, USES));
            }
            uses.add(use);
        }
        return uses;
    }

    private static List<String> parts(String text, String separator) {
        return Arrays.stream(text.split(separator))
                .map(String::strip)
                .filter(word -> !word.isEmpty())
                .toList();
    }
}
