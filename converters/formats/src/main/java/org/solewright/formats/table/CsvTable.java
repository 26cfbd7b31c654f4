package org.solewright.formats.table;

import de.siegmar.fastcsv.reader.CsvParseException;
import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.CsvRecord;
import de.siegmar.fastcsv.reader.FieldMismatchStrategy;
import java.io.IOException;
import java.io.InputStream;
import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.CodingErrorAction;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.solewright.formats.io.FormatException;

/**
 * A small delimited table as read: header and lines.
 *
 * @param columns names in the header, without spaces around
 * @param lines below it
 */
record CsvTable(List<String> columns, List<CsvTable.Line> lines) {

    private static final int LARGEST_BYTES = 16 << 20;

    /**
     * A line of the table.
     *
     * @param source the file's name
     * @param number line in the file, from 1
     * @param columns names in the header
     * @param cells as many as columns
     * @param hasDecimalComma whether one comma in a number is its decimal mark, as it separates no cells
     */
    record Line(String source, long number, List<String> columns, List<String> cells, boolean hasDecimalComma) {

        /** What stands in a column, without spaces around; empty where the table has no such column. */
        String text(String column) {
            int index = columns.indexOf(column);
            return index < 0 ? "" : cells.get(index).strip();
        }

        /** A finite number with a decimal point. */
        double number(String column, String unit) throws FormatException {
            String text = text(column);
            double value;
            try {
                value = Double.parseDouble(
                        hasDecimalComma && text.matches("[+-]?[0-9]+,[0-9]+") ? text.replace(',', '.') : text);
            } catch (NumberFormatException e) {
                throw wrong(
                        column + " '" + text + "', expected a number in " + unit,
                        text.indexOf(',') >= 0 ? "write a point as decimal mark" : "correct the cell");
            }
            if (!Double.isFinite(value)) {
                throw wrong(column + " '" + text + "', expected a finite number in " + unit, "correct the cell");
            }
            return value;
        }

        FormatException wrong(String message, String whatToDo) {
            return new FormatException(source, "line " + number + ": " + message, whatToDo);
        }
    }

    CsvTable {
        columns = List.copyOf(columns);
        lines = List.copyOf(lines);
    }

    static CsvTable read(Path file) throws IOException, FormatException {
        List<FormatException> wrong = new ArrayList<>();
        CsvTable table = read(file, wrong);
        if (!wrong.isEmpty()) {
            throw wrong.get(0);
        }
        return table;
    }

    /** Reads a table whose wrong lines are named and left out. */
    static CsvTable read(Path file, List<FormatException> wrong) throws IOException, FormatException {
        byte[] bytes;
        try (InputStream in = Files.newInputStream(file)) {
            bytes = in.readNBytes(LARGEST_BYTES + 1);
        }
        String source = file.toString();
        if (bytes.length > LARGEST_BYTES) {
            throw new FormatException(
                    source, "the file is larger than " + LARGEST_BYTES + " bytes", "give a table of that kind");
        }
        return parse(source, text(source, bytes), wrong);
    }

    private static String text(String source, byte[] bytes) throws FormatException {
        try {
            String text = StandardCharsets.UTF_8
                    .newDecoder()
                    .onMalformedInput(CodingErrorAction.REPORT)
                    .onUnmappableCharacter(CodingErrorAction.REPORT)
                    .decode(ByteBuffer.wrap(bytes))
                    .toString();
            return text.startsWith("\uFEFF") ? text.substring(1) : text;
        } catch (CharacterCodingException e) {
            throw new FormatException(source, "bytes that are not UTF-8 text", "save the table as UTF-8", e);
        }
    }

    /** What stands between the cells: the one of comma, semicolon and tab that is commonest in the header. */
    private static char separator(String text) {
        int end = text.indexOf('\n');
        String header = end < 0 ? text : text.substring(0, end);
        char best = ',';
        long most = header.chars().filter(c -> c == ',').count();
        for (char c : new char[] {';', '\t'}) {
            long count = header.chars().filter(h -> h == c).count();
            if (count > most) {
                most = count;
                best = c;
            }
        }
        return best;
    }

    private static CsvTable parse(String source, String text, List<FormatException> wrong) throws FormatException {
        char separator = separator(text);
        List<String> columns = List.of();
        List<Line> lines = new ArrayList<>();
        try (CsvReader<CsvRecord> reader = CsvReader.builder()
                .fieldSeparator(separator)
                .skipEmptyLines(true)
                .missingFieldStrategy(FieldMismatchStrategy.IGNORE)
                .extraFieldStrategy(FieldMismatchStrategy.IGNORE)
                .ofCsvRecord(text)) {
            for (CsvRecord r : reader) {
                if (columns.isEmpty()) {
                    columns = r.getFields().stream().map(String::strip).toList();
                } else {
                    try {
                        lines.add(line(source, columns, r, separator != ','));
                    } catch (FormatException e) {
                        wrong.add(e);
                    }
                }
            }
        } catch (CsvParseException e) {
            throw new FormatException(
                    source, "not a delimited table (" + e.getMessage() + ")", "save it as comma-separated text", e);
        } catch (IOException e) {
            throw new FormatException(source, "not readable as a table", "save it as comma-separated text", e);
        }
        if (columns.isEmpty()) {
            throw new FormatException(source, "the file is empty, expected a header row", "give another file");
        }
        return new CsvTable(columns, lines);
    }

    private static Line line(String source, List<String> columns, CsvRecord r, boolean hasDecimalComma)
            throws FormatException {
        Line line = new Line(source, r.getStartingLineNumber(), columns, r.getFields(), hasDecimalComma);
        if (r.getFieldCount() != columns.size()) {
            throw line.wrong(
                    r.getFieldCount() + " cells, expected " + columns.size() + " as in the header",
                    "quote cells that contain commas");
        }
        return line;
    }
}
