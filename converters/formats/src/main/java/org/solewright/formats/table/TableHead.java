package org.solewright.formats.table;

import java.io.BufferedReader;
import java.io.IOException;
import java.nio.charset.MalformedInputException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.regex.Pattern;
import org.solewright.formats.io.FormatException;

/** The beginning of a delimited table that nobody has described yet: delimiter, lines above, header, first numbers. */
public final class TableHead {

    private static final int MOST_LINES_ABOVE = 200;
    private static final int MOST_ROWS = 5000;
    private static final int LONGEST_LINE = 1_000_000;
    private static final char[] DELIMITERS = {'\t', ';', ',', ' '};

    private final char delimiter;
    private final int skipLines;
    private final List<String> header;
    private final List<String> units;
    private final double[][] rows;

    private TableHead(char delimiter, int skipLines, List<String> header, List<String> units, double[][] rows) {
        this.delimiter = delimiter;
        this.skipLines = skipLines;
        this.header = List.copyOf(header);
        this.units = List.copyOf(units);
        this.rows = rows;
    }

    /**
     * Reads the first lines of a table.
     *
     * @param file delimited text, UTF-8
     * @return what they tell
     * @throws IOException where it cannot be read
     * @throws FormatException where no two rows of numbers are found
     */
    public static TableHead read(Path file) throws IOException, FormatException {
        List<String> lines = new ArrayList<>();
        try (BufferedReader in = Files.newBufferedReader(file, StandardCharsets.UTF_8)) {
            StringBuilder line = new StringBuilder();
            int c;
            while (lines.size() < MOST_LINES_ABOVE + MOST_ROWS && (c = in.read()) >= 0) {
                if (c == '\n') {
                    lines.add(line.toString().stripTrailing());
                    line.setLength(0);
                } else if (line.length() < LONGEST_LINE) {
                    line.append((char) c);
                } else {
                    throw new FormatException(
                            file.toString(), "line " + (lines.size() + 1) + " is too long", "give a table in lines");
                }
            }
            if (line.length() > 0) {
                lines.add(line.toString().stripTrailing());
            }
        } catch (MalformedInputException e) {
            throw new FormatException(file.toString(), "holds bytes that are not UTF-8 text", "save it as UTF-8", e);
        }
        TableHead best = null;
        for (char delimiter : DELIMITERS) {
            TableHead head = of(lines, delimiter);
            if (head != null && (best == null || head.rows[0].length > best.rows[0].length)) {
                best = head;
            }
        }
        if (best == null) {
            throw new FormatException(
                    file.toString(),
                    "holds no two rows of two or more numbers among its first lines",
                    "give a delimited table with a point as decimal mark");
        }
        return best;
    }

    private static @org.jspecify.annotations.Nullable TableHead of(List<String> lines, char delimiter) {
        int first = -1;
        for (int i = 0; i + 1 < Math.min(lines.size(), MOST_LINES_ABOVE) && first < 0; i++) {
            double[] one = numbers(lines.get(i), delimiter);
            double[] two = numbers(lines.get(i + 1), delimiter);
            first = one.length >= 2 && one.length == two.length ? i : -1;
        }
        if (first < 0) {
            return null;
        }
        int columns = numbers(lines.get(first), delimiter).length;
        List<double[]> rows = new ArrayList<>();
        for (int i = first; i < lines.size() && rows.size() < MOST_ROWS; i++) {
            double[] row = numbers(lines.get(i), delimiter);
            if (row.length == columns) {
                rows.add(row);
            }
        }
        List<String> above = first > 0 ? cells(lines.get(first - 1), delimiter) : List.of();
        List<String> higher = first > 1 ? cells(lines.get(first - 2), delimiter) : List.of();
        double[][] values = rows.toArray(new double[0][]);
        boolean isUnits = above.size() == columns
                && higher.size() == columns
                && above.stream().allMatch(TableHead::isUnit);
        if (isUnits) {
            return new TableHead(delimiter, first, higher, above, values);
        }
        return above.size() == columns
                ? new TableHead(delimiter, first - 1, above, List.of(), values)
                : new TableHead(delimiter, first, List.of(), List.of(), values);
    }

    private static boolean isUnit(String cell) {
        String word = cell.replaceAll("[\\[\\](){}\\s]", "");
        return word.length() <= 8
                && word.matches("[A-Za-z%./*^0-9-]*")
                && (word.equals("1") || !word.matches("[0-9.]+"));
    }

    private static List<String> cells(String line, char delimiter) {
        String[] parts = delimiter == ' '
                ? line.strip().split("\\s+")
                : line.split(Pattern.quote(String.valueOf(delimiter)), -1);
        return Arrays.stream(parts)
                .map(p -> p.strip().replaceAll("^\"|\"$", ""))
                .toList();
    }

    /** The line's numbers, NaN for an empty cell; none where a cell is something else. */
    private static double[] numbers(String line, char delimiter) {
        List<String> cells = cells(line, delimiter);
        double[] row = new double[cells.size()];
        int known = 0;
        for (int i = 0; i < row.length; i++) {
            String cell = cells.get(i);
            try {
                row[i] = cell.isEmpty() ? Double.NaN : Double.parseDouble(cell);
                known += Double.isNaN(row[i]) ? 0 : 1;
            } catch (NumberFormatException e) {
                return new double[0];
            }
        }
        return known > 0 ? row : new double[0];
    }

    /**
     * Between cells.
     *
     * @return comma, semicolon, tabulator, or a blank for any run of blanks
     */
    public char delimiter() {
        return delimiter;
    }

    /**
     * Lines above the header, or above the numbers where the header does not stand next to them.
     *
     * @return zero or more
     */
    public int skipLines() {
        return skipLines;
    }

    /**
     * Names of the columns.
     *
     * @return one for each column; none where there is no header
     */
    public List<String> header() {
        return header;
    }

    /**
     * Units in a row of their own between header and numbers.
     *
     * @return one for each column, or none
     */
    public List<String> units() {
        return units;
    }

    /**
     * Number of columns.
     *
     * @return 2 or more
     */
    public int columns() {
        return rows[0].length;
    }

    /**
     * Number of rows read.
     *
     * @return 2 or more
     */
    public int rows() {
        return rows.length;
    }

    /**
     * A number of the table.
     *
     * @param row zero-based
     * @param column zero-based
     * @return NaN where the cell is empty
     */
    public double at(int row, int column) {
        return rows[row][column];
    }
}
