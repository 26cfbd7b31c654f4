package org.solewright.formats.footmodel;

import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.jspecify.annotations.Nullable;
import org.solewright.domain.gait.Side;
import org.solewright.domain.motion.ResultsMap;
import org.solewright.formats.footmodel.resultsxml.XmlAxes;
import org.solewright.formats.footmodel.resultsxml.XmlColumn;
import org.solewright.formats.footmodel.resultsxml.XmlResults;
import org.solewright.formats.footmodel.resultsxml.XmlTable;
import org.solewright.formats.io.FormatException;

/** Column maps of results as XML, namespace {@code urn:solewright:results:1}. */
public final class ResultsMapFile {

    private static final Map<String, Double> UNITS = Map.ofEntries(
            Map.entry("m", 1.0),
            Map.entry("cm", 1e-2),
            Map.entry("mm", 1e-3),
            Map.entry("m/s", 1.0),
            Map.entry("mm/s", 1e-3),
            Map.entry("N", 1.0),
            Map.entry("kN", 1e3),
            Map.entry("N.m", 1.0),
            Map.entry("N.mm", 1e-3),
            Map.entry("deg", Math.PI / 180),
            Map.entry("rad", 1.0),
            Map.entry("s", 1.0),
            Map.entry("ms", 1e-3),
            Map.entry("W", 1.0),
            Map.entry("%", 1e-2));
    private static final Map<String, Character> DELIMITERS =
            Map.of("comma", ',', "semicolon", ';', "tab", '\t', "space", ' ');
    private static final List<String> QUANTITIES = Arrays.stream(ResultsMap.Quantity.values())
            .map(ResultsMap.Quantity::word)
            .toList();

    private ResultsMapFile() {}

    /** Holds what is slow to make until a map is first read. */
    private static final class Holder {
        static final XmlBinding<XmlResults> BINDING = new XmlBinding<>(
                XmlResults.class,
                "results",
                "urn:solewright:results:1",
                "results-1.xsd",
                List.of(
                        new KnownWords("column", "quantity", "quantity", QUANTITIES),
                        new KnownWords(
                                "column",
                                "unit",
                                "unit",
                                UNITS.keySet().stream().sorted().toList())));
    }

    /**
     * Reads a column map.
     *
     * @param file the XML file
     * @return the map
     * @throws IOException where the file cannot be opened or read
     * @throws FormatException where it is not a column map
     */
    public static ResultsMap read(Path file) throws IOException, FormatException {
        XmlBinding.Parsed<XmlResults> parsed = Holder.BINDING.read(file);
        XmlResults root = parsed.root();
        List<ResultsMap.Table> tables = new ArrayList<>();
        for (XmlTable table : root.getTable()) {
            tables.add(table(parsed, table));
        }
        Double mass = root.getMass();
        if (mass != null && !(mass > 0)) {
            throw parsed.wrong(root, "mass " + mass + " kg, expected more than 0 kg");
        }
        return new ResultsMap(
                text(root.getSubject()),
                mass == null ? OptionalDouble.empty() : OptionalDouble.of(mass),
                axes(parsed, root.getAxes()),
                tables,
                root.getRecording().stream()
                        .map(r -> new ResultsMap.RecordingFile(r.getFile(), r.getLandmarks()))
                        .toList());
    }

    private static ResultsMap.Axes axes(XmlBinding.Parsed<XmlResults> parsed, XmlAxes xml) throws FormatException {
        try {
            return new ResultsMap.Axes(direction(xml.getX()), direction(xml.getY()), direction(xml.getZ()));
        } catch (IllegalArgumentException e) {
            throw parsed.wrong(xml, String.valueOf(e.getMessage()));
        }
    }

    private static ResultsMap.Direction direction(String word) {
        return ResultsMap.Direction.valueOf(word.toUpperCase(Locale.ROOT));
    }

    private static ResultsMap.Table table(XmlBinding.Parsed<XmlResults> parsed, XmlTable xml) throws FormatException {
        Double rate = xml.getRate();
        String time = text(xml.getTimeColumn());
        if (time.isEmpty() == (rate == null)) {
            throw parsed.wrong(
                    xml,
                    rate == null
                            ? "a table with neither timeColumn nor rate, expected one"
                            : "a table with both timeColumn and rate, expected one");
        }
        if (rate != null && !(rate > 0)) {
            throw parsed.wrong(xml, "rate " + rate + " Hz, expected more than 0 Hz");
        }
        List<ResultsMap.Column> columns = new ArrayList<>();
        for (XmlColumn c : xml.getColumn()) {
            columns.add(new ResultsMap.Column(
                    c.getName(),
                    quantity(c.getQuantity()),
                    text(c.getOf()),
                    side(c.getSide()),
                    c.getAxis() == null ? -1 : "xyz".indexOf(c.getAxis()),
                    unit(c.getUnit())));
        }
        return new ResultsMap.Table(
                text(xml.getFile()),
                Optional.ofNullable(DELIMITERS.get(xml.getDelimiter())).orElse(','),
                xml.getSkipLines().intValueExact(),
                xml.isHeader(),
                time,
                unit(xml.getTimeUnit()),
                rate == null ? OptionalDouble.empty() : OptionalDouble.of(rate),
                columns);
    }

    private static double unit(String word) {
        return Optional.ofNullable(UNITS.get(word)).orElse(1.0);
    }

    private static ResultsMap.Quantity quantity(String word) {
        return Arrays.stream(ResultsMap.Quantity.values())
                .filter(q -> q.word().equals(word))
                .findFirst()
                .orElseThrow(() -> new IllegalArgumentException("quantity '" + word + "' is unknown"));
    }

    private static Optional<Side> side(@Nullable String word) {
        return Arrays.stream(Side.values()).filter(s -> s.word().equals(word)).findFirst();
    }

    private static String text(@Nullable String value) {
        return value == null ? "" : value;
    }
}
