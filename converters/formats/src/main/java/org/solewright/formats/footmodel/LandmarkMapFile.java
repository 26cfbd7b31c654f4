package org.solewright.formats.footmodel;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.solewright.domain.foot.LabelPattern;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.foot.LandmarkMap;
import org.solewright.domain.gait.Side;
import org.solewright.formats.footmodel.landmarksxml.XmlLandmark;
import org.solewright.formats.footmodel.landmarksxml.XmlLandmarkMap;
import org.solewright.formats.io.AtomicOutput;
import org.solewright.formats.io.FormatException;

/** Landmark maps as XML, namespace {@code urn:solewright:landmarks:1}. */
public final class LandmarkMapFile {

    private static final String BOTH = "both";
    private static final List<String> SIDES = List.of(Side.LEFT.word(), Side.RIGHT.word(), BOTH);
    private static final List<String> LANDMARKS =
            Arrays.stream(Landmark.values()).map(Landmark::word).toList();

    private LandmarkMapFile() {}

    /** Holds what is slow to make until a map is first read or written. */
    private static final class Holder {
        static final XmlBinding<XmlLandmarkMap> BINDING = new XmlBinding<>(
                XmlLandmarkMap.class,
                "landmarkMap",
                "urn:solewright:landmarks:1",
                "landmarks-1.xsd",
                List.of(
                        new KnownWords("landmark", "name", "landmark", LANDMARKS),
                        new KnownWords("landmark", "side", "side", SIDES)));
    }

    /**
     * Reads a landmark map.
     *
     * @param file the XML file
     * @return the map, entries in the file's order
     * @throws IOException where the file cannot be opened or read
     * @throws FormatException where it is not a landmark map, names an unknown landmark, or gives a landmark of a side
     *     twice
     */
    public static LandmarkMap read(Path file) throws IOException, FormatException {
        return toDomain(Holder.BINDING.read(file));
    }

    /**
     * Writes a landmark map; the same map gives the same bytes.
     *
     * @param file target, replaced as a whole
     * @param map what is written
     * @throws IOException where it cannot be written
     */
    public static void write(Path file, LandmarkMap map) throws IOException {
        AtomicOutput.write(file, Holder.BINDING.render(toXml(map)));
    }

    /**
     * The bytes of a map with a comment before each landmark, for a user to read and correct.
     *
     * @param map what is written
     * @param head comment before the map, lines
     * @param notes one per entry of the map
     * @return UTF-8 XML that its schema accepts
     * @throws IllegalArgumentException where there are not as many notes as entries
     */
    public static byte[] bytes(LandmarkMap map, List<String> head, List<String> notes) {
        if (notes.size() != map.entries().size()) {
            throw new IllegalArgumentException(
                    notes.size() + " notes for " + map.entries().size() + " landmarks");
        }
        String xml = new String(Holder.BINDING.render(toXml(map)), StandardCharsets.UTF_8);
        StringBuilder out = new StringBuilder();
        int entry = 0;
        for (String line : xml.split("\n", -1)) {
            if (line.contains("<landmarkMap")) {
                out.append("<!-- ")
                        .append(comment(String.join("\n     ", head)))
                        .append(" -->\n");
            } else if (line.contains("<landmark ")) {
                out.append("    <!-- ").append(comment(notes.get(entry++))).append(" -->\n");
            }
            out.append(line).append('\n');
        }
        return out.toString().strip().concat("\n").getBytes(StandardCharsets.UTF_8);
    }

    /** Text that may stand in a comment: no two hyphens in a row and none at the end. */
    private static String comment(String text) {
        String legal = XmlWords.legal(text);
        while (legal.contains("--")) {
            legal = legal.replace("--", "- -");
        }
        return legal.endsWith("-") ? legal + " " : legal;
    }

    private static LandmarkMap toDomain(XmlBinding.Parsed<XmlLandmarkMap> parsed) throws FormatException {
        List<LandmarkMap.Entry> entries = new ArrayList<>();
        for (XmlLandmark xml : parsed.root().getLandmark()) {
            Landmark landmark = Landmark.ofWord(xml.getName())
                    .orElseThrow(() -> parsed.wrong(xml, "unknown landmark '" + xml.getName() + "'"));
            LandmarkMap.Entry entry = new LandmarkMap.Entry(
                    landmark,
                    side(xml.getSide()),
                    xml.getLabel().stream().map(LabelPattern::new).toList());
            if (entries.stream().anyMatch(e -> overlap(e, entry))) {
                throw parsed.wrong(
                        xml,
                        "landmark '" + xml.getName() + "' of side '" + xml.getSide()
                                + "' for the second time, expected each once with all its labels");
            }
            entries.add(entry);
        }
        return new LandmarkMap(Optional.ofNullable(parsed.root().getName()).orElse(""), entries);
    }

    private static boolean overlap(LandmarkMap.Entry a, LandmarkMap.Entry b) {
        return a.landmark() == b.landmark()
                && (a.side().isEmpty() || b.side().isEmpty() || a.side().equals(b.side()));
    }

    private static Optional<Side> side(String word) {
        return Arrays.stream(Side.values()).filter(s -> s.word().equals(word)).findFirst();
    }

    private static XmlLandmarkMap toXml(LandmarkMap map) {
        XmlLandmarkMap xml = new XmlLandmarkMap();
        if (!map.name().isEmpty()) {
            xml.setName(map.name());
        }
        for (LandmarkMap.Entry entry : map.entries()) {
            XmlLandmark landmark = new XmlLandmark();
            landmark.setName(entry.landmark().word());
            landmark.setSide(entry.side().map(Side::word).orElse(BOTH));
            entry.labels().forEach(label -> landmark.getLabel().add(label.text()));
            xml.getLandmark().add(landmark);
        }
        return xml;
    }
}
