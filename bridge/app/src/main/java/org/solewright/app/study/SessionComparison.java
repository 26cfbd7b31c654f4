package org.solewright.app.study;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import java.util.TreeMap;
import org.solewright.analysis.numerics.Sample;
import org.solewright.app.pipeline.UseCaseException;
import org.solewright.domain.cost.TransitionColumns;
import org.solewright.formats.io.FormatException;
import org.solewright.formats.table.PlainTable;

/**
 * Two sessions or conditions beside each other. For each quantity and side: the difference of the means, the SD within a
 * session, and the smallest difference worth believing, that is the half width of its 95 % interval
 *
 * <pre>t(0.975, n_A + n_B - 2) sqrt(s^2 (1/n_A + 1/n_B) + u_A^2 + u_B^2)</pre>
 *
 * with s the pooled SD within the sessions and u the part that a session has in common: markers were placed anew (design 03
 * section 7). u is the mean square of the rows' own SD; where they have none, a length takes 5 mm of each of its two
 * landmarks. Where subjects can be paired, the differences of the subjects' means and their t interval [JCGM 2008] are
 * told as well.
 */
public final class SessionComparison {

    private static final String TABLE = "posture-cost.csv";
    /** Placement of a landmark of the foot, m (design 03 section 7). */
    private static final double PLACEMENT = 0.005;

    private static final List<String> COLUMNS = List.of(
            "quantity",
            "unit",
            "side",
            "n_a",
            "mean_a",
            "n_b",
            "mean_b",
            "difference",
            "within_session_sd",
            "placement_sd",
            "smallest_believable",
            "believable",
            "pairs",
            "paired_difference",
            "paired_low",
            "paired_high");

    private SessionComparison() {}

    /**
     * What is compared.
     *
     * @param file a table of transitions, or a folder with {@code posture-cost.csv}
     * @param column of a study's table that selects rows; empty: all rows
     * @param value that the column must have
     */
    public record Side(Path file, String column, String value) {

        /** Its name in messages. */
        String name() {
            return column.isEmpty() ? file.toString() : column + " " + value;
        }
    }

    /**
     * One quantity of one side.
     *
     * @param quantity name of the column
     * @param side of the body
     * @param countA rows of A
     * @param meanA their mean
     * @param countB rows of B
     * @param meanB their mean
     * @param within SD within a session; NaN where no session has two rows
     * @param placement SD of what a session has in common
     * @param smallest difference worth believing; NaN where it cannot be told
     * @param pairs subjects in both
     * @param paired mean of their differences; NaN without pairs
     * @param half half width of its 95 % interval; NaN for fewer than three pairs
     */
    public record Row(
            String quantity,
            String side,
            int countA,
            double meanA,
            int countB,
            double meanB,
            double within,
            double placement,
            double smallest,
            int pairs,
            double paired,
            double half) {

        /**
         * The difference of the means.
         *
         * @return B less A
         */
        public double difference() {
            return meanB - meanA;
        }

        /**
         * Whether the difference is worth believing.
         *
         * @return true where it is larger than the smallest such difference
         */
        public boolean isBelievable() {
            return Math.abs(difference()) > smallest;
        }
    }

    /** The numbers of one quantity and side. */
    private static final class Numbers {
        private final List<Double> values = new ArrayList<>();
        private final Map<String, List<Double>> bySubject = new TreeMap<>();
        private double square;
        private int squares;

        double mean() {
            return mean(values);
        }

        static double mean(List<Double> values) {
            return values.stream().mapToDouble(Double::doubleValue).average().orElse(Double.NaN);
        }

        /** Sum of squares about the mean of each subject, and how many degrees of freedom it has. */
        double[] within() {
            double sum = 0;
            int free = 0;
            for (List<Double> of : bySubject.values()) {
                double mean = mean(of);
                sum += of.stream().mapToDouble(v -> (v - mean) * (v - mean)).sum();
                free += of.size() - 1;
            }
            return new double[] {sum, free};
        }

        /** Mean square of the rows' own SD; NaN where they have none. */
        double placement() {
            return squares == 0 ? Double.NaN : square / squares;
        }
    }

    private record Key(String quantity, String side) {}

    /**
     * Compares.
     *
     * @param a one session or condition
     * @param b the other
     * @return a row per quantity and side that both have
     * @throws UseCaseException where a table cannot be read, or has no rows
     * @throws FormatException where it is none
     */
    public static List<Row> of(Side a, Side b) throws UseCaseException, FormatException {
        Map<Key, Numbers> first = numbers(a);
        Map<Key, Numbers> second = numbers(b);
        List<Row> rows = new ArrayList<>();
        first.forEach((key, of) -> {
            Numbers other = second.get(key);
            if (other != null) {
                rows.add(row(key, of, other));
            }
        });
        return rows;
    }

    private static Row row(Key key, Numbers a, Numbers b) {
        double[] wa = a.within();
        double[] wb = b.within();
        double free = wa[1] + wb[1];
        double within = free > 0 ? Math.sqrt((wa[0] + wb[0]) / free) : Double.NaN;
        double placement = placement(key.quantity(), a, b);
        int na = a.values.size();
        int nb = b.values.size();
        double smallest = Double.NaN;
        if (free > 0) {
            smallest =
                    Sample.t95(free) * Math.sqrt(within * within * (1.0 / na + 1.0 / nb) + 2 * placement * placement);
        }
        List<Double> differences = new ArrayList<>();
        a.bySubject.forEach((subject, of) -> {
            List<Double> other = b.bySubject.get(subject);
            if (!subject.isEmpty() && other != null) {
                differences.add(Numbers.mean(other) - Numbers.mean(of));
            }
        });
        return new Row(
                key.quantity(),
                key.side(),
                na,
                a.mean(),
                nb,
                b.mean(),
                within,
                placement,
                smallest,
                differences.size(),
                Numbers.mean(differences),
                half(differences));
    }

    private static double placement(String quantity, Numbers a, Numbers b) {
        double square = (a.placement() + b.placement()) / 2;
        if (!Double.isNaN(square)) {
            return Math.sqrt(square);
        }
        // A length lies between two landmarks.
        return quantity.endsWith("_m") ? PLACEMENT * Math.sqrt(2) : 0;
    }

    private static double half(List<Double> differences) {
        if (differences.isEmpty()) {
            return Double.NaN;
        }
        return Sample.of(differences.stream().mapToDouble(Double::doubleValue).toArray())
                .half95()
                .orElse(Double.NaN);
    }

    private static Map<Key, Numbers> numbers(Side side) throws UseCaseException, FormatException {
        Path file = Files.isDirectory(side.file()) ? side.file().resolve(TABLE) : side.file();
        PlainTable.Content table = StudyFiles.table(file);
        for (String column : List.of("step", "side")) {
            if (!table.columns().contains(column)) {
                throw new FormatException(
                        file.toString(),
                        "line 1: no column '" + column + "', expected a table of transitions",
                        "give posture-cost.csv of appraise or transitions.csv of a study");
            }
        }
        Map<Key, Numbers> numbers = new LinkedHashMap<>();
        Set<String> known = Set.of(TransitionColumns.ALL.toArray(new String[0]));
        for (List<String> row : table.rows()) {
            boolean isWanted = !table.cell(row, "trial").equals("*")
                    && (side.column().isEmpty()
                            || table.cell(row, side.column()).equals(side.value()));
            if (!isWanted) {
                continue;
            }
            for (String column : table.columns()) {
                if (known.contains(column)
                        && !TransitionColumns.TEXT.contains(column)
                        && !column.endsWith(TransitionColumns.SD_SUFFIX)
                        && !column.equals("n")) {
                    add(numbers, file, table, row, column);
                }
            }
        }
        if (numbers.isEmpty()) {
            throw new UseCaseException(
                    UseCaseException.Kind.INPUT,
                    file.toString(),
                    side.column().isEmpty() ? "has no transition" : "has no transition of " + side.name(),
                    "check the name");
        }
        return numbers;
    }

    private static void add(
            Map<Key, Numbers> numbers, Path file, PlainTable.Content table, List<String> row, String column)
            throws FormatException {
        String text = table.cell(row, column);
        if (text.isEmpty()) {
            return;
        }
        Numbers of = numbers.computeIfAbsent(new Key(column, table.cell(row, "side")), k -> new Numbers());
        double value = StudyFiles.number(file, column, text);
        of.values.add(value);
        of.bySubject
                .computeIfAbsent(table.cell(row, "subject"), k -> new ArrayList<>())
                .add(value);
        String sd = table.cell(row, column + TransitionColumns.SD_SUFFIX);
        if (!sd.isEmpty()) {
            double s = StudyFiles.number(file, column + TransitionColumns.SD_SUFFIX, sd);
            of.square += s * s;
            of.squares++;
        }
    }

    /**
     * Lines for people.
     *
     * @param rows of a comparison
     * @return the table, and what is worth believing
     */
    public static List<String> lines(List<Row> rows) {
        List<String> lines = new ArrayList<>();
        lines.add(String.format(
                Locale.ROOT,
                "%-30s %-5s %12s %12s %12s %12s  %s",
                "quantity",
                "side",
                "A",
                "B",
                "B - A",
                "believable",
                ""));
        for (Row r : rows) {
            lines.add(String.format(
                    Locale.ROOT,
                    "%-30s %-5s %12.5g %12.5g %12.5g %12s  %s",
                    r.quantity(),
                    r.side(),
                    r.meanA(),
                    r.meanB(),
                    r.difference(),
                    Double.isNaN(r.smallest()) ? "unknown" : String.format(Locale.ROOT, "%.5g", r.smallest()),
                    Double.isNaN(r.smallest())
                            ? "one transition each"
                            : r.isBelievable() ? "differs" : "no difference worth believing"));
        }
        return lines;
    }

    /**
     * Writes the rows as a table.
     *
     * @param target file
     * @param rows of a comparison
     * @throws UseCaseException where it cannot be written
     */
    public static void write(Path target, List<Row> rows) throws UseCaseException {
        StudyFiles.write(target, COLUMNS, sink -> {
            for (Row r : rows) {
                sink.row(List.of(
                        r.quantity(),
                        TransitionColumns.unit(r.quantity()),
                        r.side(),
                        Integer.toString(r.countA()),
                        StudyFiles.text(r.meanA()),
                        Integer.toString(r.countB()),
                        StudyFiles.text(r.meanB()),
                        StudyFiles.text(r.difference()),
                        StudyFiles.text(r.within()),
                        StudyFiles.text(r.placement()),
                        StudyFiles.text(r.smallest()),
                        Double.isNaN(r.smallest()) ? "" : Boolean.toString(r.isBelievable()),
                        Integer.toString(r.pairs()),
                        StudyFiles.text(r.paired()),
                        StudyFiles.text(r.paired() - r.half()),
                        StudyFiles.text(r.paired() + r.half())));
            }
        });
    }
}
