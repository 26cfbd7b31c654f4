package org.solewright.formats.table;

import de.siegmar.fastcsv.reader.CsvParseException;
import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.CsvRecord;
import java.io.BufferedReader;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.MalformedInputException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.Iterator;
import java.util.List;
import java.util.Locale;
import org.solewright.domain.motion.ResultsMap;
import org.solewright.formats.io.FormatException;
import org.solewright.formats.io.Spelling;

/** The mapped columns of a delimited table of results, in SI units, evenly spaced in time. */
public final class ResultsTable {

    private static final long LARGEST_BYTES = 2_000_000_000L;
    private static final int FIRST_ROOM = 1024;
    private static final int LONGEST_TIME_STEPS = 20_000_000;

    private final double start;
    private final double rate;
    private final boolean isResampled;
    private final double[][] columns;

    private ResultsTable(double start, double rate, boolean isResampled, double[][] columns) {
        this.start = start;
        this.rate = rate;
        this.isResampled = isResampled;
        this.columns = columns;
    }

    /**
     * Reads a table. Uneven times are brought to their mean spacing by linear interpolation.
     *
     * @param file delimited text, UTF-8
     * @param map what its columns mean
     * @return the columns in the map's order
     * @throws IOException where it cannot be read
     * @throws FormatException where a column is missing or a cell is no number
     */
    public static ResultsTable read(Path file, ResultsMap.Table map) throws IOException, FormatException {
        if (Files.size(file) > LARGEST_BYTES) {
            throw new FormatException(file.toString(), "has more than 2 GB", "give a part of the table");
        }
        try (BufferedReader in = Files.newBufferedReader(file, StandardCharsets.UTF_8)) {
            for (int i = 0; i < map.skipLines(); i++) {
                if (in.readLine() == null) {
                    throw new FormatException(
                            file.toString(),
                            "ends within the " + map.skipLines() + " lines above its header",
                            "correct skipLines");
                }
            }
            Rows rows = new Rows(file.toString(), map);
            if (map.delimiter() == ' ') {
                rows.ofLines(in);
            } else {
                rows.ofCells(in);
            }
            return rows.table();
        } catch (MalformedInputException e) {
            throw new FormatException(file.toString(), "holds bytes that are not UTF-8 text", "save it as UTF-8", e);
        } catch (UncheckedIOException e) {
            throw new FormatException(file.toString(), "holds bytes that are not UTF-8 text", "save it as UTF-8", e);
        }
    }

    /**
     * Time of the first sample.
     *
     * @return s
     */
    public double start() {
        return start;
    }

    /**
     * Samples per second.
     *
     * @return Hz
     */
    public double rate() {
        return rate;
    }

    /**
     * Whether its times were uneven.
     *
     * @return true where samples were interpolated
     */
    public boolean isResampled() {
        return isResampled;
    }

    /**
     * Number of samples.
     *
     * @return 2 or more
     */
    public int samples() {
        return columns[0].length;
    }

    /**
     * A column.
     *
     * @param index in the map's order
     * @return a copy of its samples in SI units, NaN where a cell is empty
     */
    public double[] column(int index) {
        return columns[index].clone();
    }

    /** Collects the mapped cells row by row. */
    private static final class Rows {
        private final String source;
        private final ResultsMap.Table map;
        private final boolean hasTime;
        private int[] places = new int[0];
        private double[][] values;
        private int count;

        Rows(String source, ResultsMap.Table map) {
            this.source = source;
            this.map = map;
            this.hasTime = !map.timeColumn().isEmpty();
            this.values = new double[map.columns().size() + 1][FIRST_ROOM];
        }

        void ofCells(BufferedReader in) throws IOException, FormatException {
            try {
                Iterator<CsvRecord> records = CsvReader.builder()
                        .fieldSeparator(map.delimiter())
                        .skipEmptyLines(true)
                        .ofCsvRecord(in)
                        .iterator();
                while (records.hasNext()) {
                    CsvRecord r = records.next();
                    row(r.getStartingLineNumber() + map.skipLines(), r.getFields());
                }
            } catch (CsvParseException e) {
                throw new FormatException(
                        source, "not a delimited table (" + e.getMessage() + ")", "correct delimiter and skipLines", e);
            }
        }

        void ofLines(BufferedReader in) throws IOException, FormatException {
            long number = map.skipLines();
            for (String line = in.readLine(); line != null; line = in.readLine()) {
                number++;
                if (!line.isBlank()) {
                    row(number, Arrays.asList(line.strip().split("\\s+")));
                }
            }
        }

        private void row(long line, List<String> cells) throws FormatException {
            if (places.length == 0) {
                places = places(cells);
                if (map.hasHeader()) {
                    return;
                }
            }
            if (count == values[0].length) {
                for (int k = 0; k < values.length; k++) {
                    values[k] = Arrays.copyOf(values[k], 2 * count);
                }
            }
            for (int k = 0; k < places.length; k++) {
                values[k][count] = places[k] < 0 ? Double.NaN : number(line, cells, k);
            }
            count++;
        }

        private double number(long line, List<String> cells, int k) throws FormatException {
            String text = places[k] < cells.size() ? cells.get(places[k]).strip() : "";
            if (text.isEmpty() || text.equalsIgnoreCase("nan")) {
                return Double.NaN;
            }
            double scale = k == 0 ? map.timeScale() : map.columns().get(k - 1).scale();
            try {
                double v = Double.parseDouble(text) * scale;
                if (Double.isInfinite(v)) {
                    throw new NumberFormatException("infinite");
                }
                return v;
            } catch (NumberFormatException e) {
                throw new FormatException(
                        source,
                        "line " + line + ", column " + name(k) + ": '"
                                + (text.length() > 40 ? text.substring(0, 40) : text) + "', expected a number",
                        text.indexOf(',') >= 0 ? "write a point as decimal mark" : "correct the cell or skipLines",
                        e);
            }
        }

        private String name(int k) {
            return k == 0 ? map.timeColumn() : map.columns().get(k - 1).name();
        }

        private int[] places(List<String> first) throws FormatException {
            int[] found = new int[values.length];
            List<String> names = first.stream().map(String::strip).toList();
            for (int k = 0; k < found.length; k++) {
                if (k == 0 && !hasTime) {
                    found[k] = -1;
                } else if (map.hasHeader()) {
                    found[k] = names.indexOf(name(k));
                    if (found[k] < 0) {
                        throw new FormatException(
                                source,
                                "has no column '" + name(k) + "'"
                                        + Spelling.nearest(name(k), names)
                                                .map(n -> "; did you mean '" + n + "'?")
                                                .orElse(""),
                                "correct the column map");
                    }
                } else {
                    found[k] = number(name(k), first.size());
                }
            }
            return found;
        }

        private int number(String name, int columns) throws FormatException {
            if (!name.matches("\\d{1,6}") || Integer.parseInt(name) < 1 || Integer.parseInt(name) > columns) {
                throw new FormatException(
                        source,
                        "has no header, and column '" + name + "' is no number from 1 to " + columns,
                        "name columns by their numbers");
            }
            return Integer.parseInt(name) - 1;
        }

        ResultsTable table() throws FormatException {
            if (count < 2) {
                throw new FormatException(
                        source, "holds " + count + " rows of numbers, expected 2 or more", "give results");
            }
            double[][] columns = new double[values.length - 1][];
            for (int k = 0; k < columns.length; k++) {
                columns[k] = Arrays.copyOf(values[k + 1], count);
            }
            if (!hasTime) {
                return new ResultsTable(0, map.rate().orElseThrow(), false, columns);
            }
            double[] time = Arrays.copyOf(values[0], count);
            double worst = 0;
            double step = (time[count - 1] - time[0]) / (count - 1);
            for (int i = 0; i < count; i++) {
                if (Double.isNaN(time[i]) || (i > 0 && !(time[i] > time[i - 1]))) {
                    throw new FormatException(
                            source,
                            String.format(
                                    Locale.ROOT,
                                    "row %d is at %s s after %s s, expected times that rise",
                                    i + 1,
                                    time[i],
                                    i > 0 ? time[i - 1] : Double.NaN),
                            "correct the time column");
                }
                worst = Math.max(worst, Math.abs(time[i] - time[0] - i * step));
            }
            // Printed times are rounded: a hundredth of a step is even.
            boolean isEven = worst < Math.max(0.01 * step, 1.1e-6);
            if (!isEven && count > LONGEST_TIME_STEPS) {
                throw new FormatException(
                        source, "has uneven times in " + count + " rows", "give evenly spaced results");
            }
            if (!isEven) {
                for (int k = 0; k < columns.length; k++) {
                    columns[k] = interpolated(time, columns[k], step);
                }
            }
            return new ResultsTable(time[0], 1 / step, !isEven, columns);
        }

        private static double[] interpolated(double[] time, double[] value, double step) {
            double[] out = new double[value.length];
            int after = 1;
            for (int i = 0; i < out.length; i++) {
                double t = Math.min(time[0] + i * step, time[time.length - 1]);
                while (after < time.length - 1 && time[after] < t) {
                    after++;
                }
                double share = (t - time[after - 1]) / (time[after] - time[after - 1]);
                out[i] = share <= 0
                        ? value[after - 1]
                        : share >= 1 ? value[after] : value[after - 1] * (1 - share) + value[after] * share;
            }
            return out;
        }
    }
}
