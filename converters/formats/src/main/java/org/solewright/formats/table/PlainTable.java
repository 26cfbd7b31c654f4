package org.solewright.formats.table;

import de.siegmar.fastcsv.writer.CsvWriter;
import de.siegmar.fastcsv.writer.LineDelimiter;
import java.io.BufferedWriter;
import java.io.IOException;
import java.io.OutputStreamWriter;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.List;
import org.solewright.formats.io.AtomicOutput;
import org.solewright.formats.io.FormatException;

/** A delimited table of texts, whatever its columns. */
public final class PlainTable {

    private PlainTable() {}

    /**
     * A table as read.
     *
     * @param columns of its header
     * @param rows below it, each with as many cells as columns
     */
    public record Content(List<String> columns, List<List<String>> rows) {

        /** Copies the lists. */
        public Content {
            columns = List.copyOf(columns);
            rows = List.copyOf(rows);
        }

        /**
         * A cell.
         *
         * @param row one of the rows
         * @param column name of a column
         * @return its text; empty where there is no such column
         */
        public String cell(List<String> row, String column) {
            int index = columns.indexOf(column);
            return index < 0 ? "" : row.get(index);
        }
    }

    /** Takes rows one by one. */
    @FunctionalInterface
    public interface Sink {
        /**
         * Takes a row.
         *
         * @param row cells
         * @throws IOException where it cannot be written
         */
        void row(List<String> row) throws IOException;
    }

    /** Gives rows one by one. */
    @FunctionalInterface
    public interface Filler {
        /**
         * Gives all rows.
         *
         * @param sink takes them
         * @throws IOException where one cannot be had or written
         */
        void fill(Sink sink) throws IOException;
    }

    /**
     * Writes a table row by row.
     *
     * @param target replaced as a whole
     * @param columns of the header
     * @param filler gives the rows
     * @throws IOException where the file cannot be written
     */
    public static void write(Path target, List<String> columns, Filler filler) throws IOException {
        AtomicOutput.write(target, out -> {
            try (CsvWriter csv = CsvWriter.builder()
                    .lineDelimiter(LineDelimiter.LF)
                    .build(new BufferedWriter(new OutputStreamWriter(out, StandardCharsets.UTF_8)))) {
                csv.writeRecord(columns);
                filler.fill(csv::writeRecord);
            }
        });
    }

    /**
     * Reads a table of up to 16 MB.
     *
     * @param file the table
     * @return header and rows
     * @throws IOException where the file cannot be opened or read
     * @throws FormatException where it is no table
     */
    public static Content read(Path file) throws IOException, FormatException {
        CsvTable table = CsvTable.read(file);
        return new Content(
                table.columns(),
                table.lines().stream().map(CsvTable.Line::cells).toList());
    }
}
