package org.solewright.formats.export;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.concurrent.TimeUnit;
import javax.xml.XMLConstants;
import javax.xml.parsers.DocumentBuilderFactory;
import javax.xml.transform.stream.StreamSource;
import javax.xml.validation.Schema;
import javax.xml.validation.SchemaFactory;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.solewright.domain.finding.Cautions;
import org.solewright.domain.foot.FootModel;
import org.solewright.domain.foot.Segment;
import org.solewright.domain.foot.SegmentName;
import org.solewright.domain.gait.Side;
import org.solewright.formats.io.FormatException;
import org.w3c.dom.Document;
import org.w3c.dom.Element;
import org.w3c.dom.NodeList;

class TemplatesTest {

    private static final String UPDATE = "solewright.pin";

    @TempDir
    Path folder;

    private static FootModel three() {
        return InventedFoot.of(
                Side.RIGHT,
                InventedFoot.INERTIA,
                SegmentName.SHANK,
                SegmentName.HINDFOOT,
                SegmentName.FOREFOOT,
                SegmentName.TOES);
    }

    private static String text(String template, FootModel model) throws Exception {
        Exported e = Exports.run(template, model);
        assertThat(e.findings()).as("findings of %s", template).isEmpty();
        return new String(e.content(), StandardCharsets.UTF_8);
    }

    @ParameterizedTest
    @ValueSource(strings = {"hanim", "urdf", "table", "template-kit"})
    void layoutIsPinned(String template) throws Exception {
        // Pinned: for the layout of bytes only; -Dsolewright.pin=true in the tests' JVM writes them anew.
        Path pinned = Exports.root()
                .resolve("converters/formats/src/test/resources/org/solewright/formats/export/" + template + ".txt");
        String written = text(template, three());
        if (Boolean.getBoolean(UPDATE)) {
            Files.createDirectories(pinned.getParent());
            Files.writeString(pinned, written);
        }
        assertThat(written).isEqualTo(Files.readString(pinned));
    }

    @ParameterizedTest
    @ValueSource(strings = {"hanim", "urdf", "table", "template-kit"})
    void cautionsStandInEveryOutput(String template) throws Exception {
        for (FootModel model : InventedFoot.all()) {
            assertThat(text(template, model)).contains(Cautions.LINES);
        }
    }

    private static Document parsed(String xml) throws Exception {
        return DocumentBuilderFactory.newInstance()
                .newDocumentBuilder()
                .parse(new ByteArrayInputStream(xml.getBytes(StandardCharsets.UTF_8)));
    }

    private static List<Element> elements(Document d, String name) {
        NodeList nodes = d.getElementsByTagName(name);
        List<Element> found = new ArrayList<>();
        for (int i = 0; i < nodes.getLength(); i++) {
            Element e = (Element) nodes.item(i);
            if (!e.hasAttribute("USE")) {
                found.add(e);
            }
        }
        return found;
    }

    private static double[] numbers(String text) {
        return java.util.Arrays.stream(text.split(" "))
                .mapToDouble(Double::parseDouble)
                .toArray();
    }

    @Test
    void humanoidHasMassesPlacesAndInertiaInItsAxes() throws Exception {
        Document d = parsed(text("hanim", InventedFoot.all().get(0)));
        Element talus = elements(d, "HAnimSegment").stream()
                .filter(e -> e.getAttribute("name").endsWith("_talus"))
                .findFirst()
                .orElseThrow();
        assertThat(Double.parseDouble(talus.getAttribute("mass"))).isEqualTo(3.5 / 3);
        // Exact: the pad's underside is 0.4 + 0.02 + 0.02 below the knee, so the knee is 0.44 high; the centre of mass
        // at
        // (0.03, -0.45, 0.01) from it has left -0.01, up -0.01, forward 0.03.
        double[] com = numbers(talus.getAttribute("centerOfMass"));
        assertThat(com[0]).isCloseTo(-0.01, within(1e-12));
        assertThat(com[1]).isCloseTo(-0.01, within(1e-12));
        assertThat(com[2]).isCloseTo(0.03, within(1e-12));
        // Exact: left = -z, up = y, forward = x, so II = zz, yy, xx; IJ = -zy, IK = -zx, JK = yx.
        double[] expected = {0.006, -3e-4, -2e-4, -3e-4, 0.005, -1e-4, -2e-4, -1e-4, 0.004};
        assertThat(numbers(talus.getAttribute("momentsOfInertia"))).containsExactly(expected, within(1e-15));
    }

    @Test
    void humanoidsFollowTheSchema() throws Exception {
        Path schemas = shared("schema/x3d");
        SchemaFactory factory = SchemaFactory.newInstance(XMLConstants.W3C_XML_SCHEMA_NS_URI);
        factory.setFeature(XMLConstants.FEATURE_SECURE_PROCESSING, false);
        factory.setProperty("jdk.xml.maxOccurLimit", "0");
        Schema schema = factory.newSchema(
                new StreamSource(schemas.resolve("x3d-4.0.xsd").toFile()));
        JsonNode names = new ObjectMapper()
                .readTree(schemas.resolve("hanim_left_leg_names.json").toFile());
        Map<String, String> parents = new HashMap<>();
        for (String list : List.of("left_leg_joints", "left_leg_segments")) {
            names.get(list)
                    .forEach(n -> parents.put(
                            list + n.get("name").asText(), n.get("parent").asText()));
        }
        for (FootModel model : InventedFoot.all()) {
            String xml = text("hanim", model);
            schema.newValidator()
                    .validate(new StreamSource(new ByteArrayInputStream(xml.getBytes(StandardCharsets.UTF_8))));
            Document d = parsed(xml);
            for (String kind : List.of("HAnimJoint", "HAnimSegment")) {
                for (Element e : elements(d, kind)) {
                    String name = e.getAttribute("name").replaceFirst("^r_", "l_");
                    String above =
                            ((Element) e.getParentNode()).getAttribute("name").replaceFirst("^r_", "l_");
                    if (!name.equals("humanoid_root") && !name.equals("sacroiliac")) {
                        String list = kind.equals("HAnimJoint") ? "left_leg_joints" : "left_leg_segments";
                        assertThat(parents).containsEntry(list + name, above);
                    }
                }
            }
            double mass = elements(d, "HAnimSegment").stream()
                    .mapToDouble(e -> Double.parseDouble(e.getAttribute("mass")))
                    .sum();
            // Independent: the sum of the domain's masses; rounding of the sum.
            assertThat(mass).isCloseTo(mass(model), within(1e-12));
        }
        // The program's own list of names is the standard's.
        names.get("left_leg_joints").forEach(n -> {
            String name = n.get("name").asText();
            assertThat(HanimNames.above(name).get(0)).isEqualTo(n.get("parent").asText());
        });
        names.get("left_leg_segments")
                .forEach(n -> assertThat(HanimNames.jointOf(n.get("name").asText()))
                        .isEqualTo(n.get("parent").asText()));
    }

    private static double mass(FootModel model) {
        return model.segments().stream()
                .map(Segment::mass)
                .mapToDouble(q -> q.value())
                .sum();
    }

    @Test
    void bonesOfEachSegmentAreSaid() throws Exception {
        assertThat(text("hanim", three()))
                .contains("name=\"stands_for\" value=\"&#34;tibia and fibula&#34;\"")
                .contains("&#34;talus and calcaneus&#34;")
                .contains("&#34;navicular, cuboid and cuneiforms, metatarsals&#34;")
                .contains("&#34;first phalanges, second phalanges, third phalanges&#34;");
    }

    @Test
    void legOfTheStandardIsNotMadeLonger() throws Exception {
        FootModel bird = InventedFoot.of(
                Side.LEFT, InventedFoot.INERTIA, SegmentName.SHANK, SegmentName.FOOT, SegmentName.PHALANX_4);
        assertThatThrownBy(() -> Exports.run("hanim", bird))
                .isInstanceOf(FormatException.class)
                .hasMessageContaining("no place for the chain shank, foot, phalanx_4; the template urdf has");
        assertThat(text("urdf", bird)).contains("<link name=\"phalanx_4\">");
    }

    @Test
    void robotsPassTheirChecker() throws Exception {
        assumeTrue(isInstalled("check_urdf"), "check_urdf (package liburdfdom-tools) is not installed");
        for (FootModel model : InventedFoot.all()) {
            Path file = folder.resolve("foot.urdf");
            Files.writeString(file, text("urdf", model));
            Path log = folder.resolve("log.txt");
            Process p = new ProcessBuilder("check_urdf", file.toString())
                    .redirectErrorStream(true)
                    .redirectOutput(log.toFile())
                    .start();
            assertThat(p.waitFor(30, TimeUnit.SECONDS)).isTrue();
            assertThat(Files.readString(log)).contains("Successfully Parsed XML");
            assertThat(p.exitValue()).isZero();
        }
    }

    private static boolean isInstalled(String program) {
        String path = System.getenv().getOrDefault("PATH", "");
        return java.util.Arrays.stream(path.split(java.io.File.pathSeparator))
                .anyMatch(f -> Files.isExecutable(Path.of(f, program)));
    }

    private static Path shared(String name) throws IOException {
        String set = System.getProperty("solewright.shared", "");
        Path found = null;
        if (!set.isEmpty()) {
            found = Path.of(set).resolve(name);
        } else {
            for (Path p = Path.of("").toAbsolutePath(); p != null && found == null; p = p.getParent()) {
                Path there = p.resolve("shared").resolve(name);
                found = Files.exists(there) ? there : null;
            }
        }
        assumeTrue(found != null && Files.exists(found), "no shared/" + name + " beside the checkout");
        return java.util.Objects.requireNonNull(found);
    }

    @Test
    void tableHasEveryNumberOfTheModel() throws Exception {
        FootModel model = three();
        String table = text("table", model);
        assertThat(table)
                .contains("segment.shank.mass,3.5,kg,regression,,\n")
                .contains("subject.mass,70.0,kg,measured,0.1,\n")
                .contains("subject.id,'=demo-01,,,,\n")
                .contains("source.1.path,\"s, \"\"1\"\".c3d\",,,,\n")
                .contains("rolling.arc.limb.radius,INF,m,measured,,limb\n")
                .contains("pad.pad_1.stiffness,800000.0,N/m^1.5,assumed,,\n");
        String xml = new String(org.solewright.formats.footmodel.FootModelFile.bytes(model), StandardCharsets.UTF_8);
        // Independent: every number that stands in the model's XML stands in a cell.
        java.util.regex.Matcher m = java.util.regex.Pattern.compile("=\"(-?[0-9.]+(?:E-?[0-9]+)?)\"")
                .matcher(xml.substring(xml.indexOf("<subject")));
        List<String> lines = table.lines()
                .flatMap(l -> java.util.Arrays.stream(l.split(",")))
                .toList();
        while (m.find()) {
            assertThat(lines).contains(m.group(1));
        }
    }
}
