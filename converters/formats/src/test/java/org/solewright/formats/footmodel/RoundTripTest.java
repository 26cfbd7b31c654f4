package org.solewright.formats.footmodel;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.solewright.domain.cost.PostureCost;
import org.solewright.domain.cost.TransitionRow;
import org.solewright.domain.finding.Cautions;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.SourceFile;
import org.solewright.formats.footmodel.costxml.XmlPostureCost;
import org.solewright.formats.footmodel.footxml.XmlFootModel;
import org.solewright.formats.footmodel.landmarksxml.XmlLandmarkMap;
import org.solewright.formats.footmodel.resultsxml.XmlResults;
import org.solewright.formats.io.FormatException;
import org.xmlunit.builder.DiffBuilder;
import org.xmlunit.diff.Comparison;
import org.xmlunit.diff.ComparisonResult;
import org.xmlunit.diff.Diff;

/** XML of every schema, read and written again, says the same. */
class RoundTripTest {

    private static Path templates() {
        Path top = Path.of("").toAbsolutePath();
        while (!Files.exists(top.resolve("DEVELOPERS.md"))) {
            top = top.getParent();
        }
        return top.resolve("templates");
    }

    private static String resource(String name) throws IOException {
        return Files.readString(templates().resolve("src/main/resources/org/solewright/templates/" + name));
    }

    private static XmlBinding<?> binding(String root) {
        return switch (root) {
            case "footModel" ->
                new XmlBinding<>(
                        XmlFootModel.class, root, "urn:solewright:foot-model:1", "foot-model-1.xsd", List.of());
            case "postureCost" ->
                new XmlBinding<>(
                        XmlPostureCost.class, root, "urn:solewright:posture-cost:1", "posture-cost-1.xsd", List.of());
            case "landmarkMap" ->
                new XmlBinding<>(
                        XmlLandmarkMap.class, root, "urn:solewright:landmarks:1", "landmarks-1.xsd", List.of());
            default -> new XmlBinding<>(XmlResults.class, root, "urn:solewright:results:1", "results-1.xsd", List.of());
        };
    }

    private static <T> byte[] again(XmlBinding<T> binding, byte[] xml) throws FormatException {
        return binding.render(binding.parse("given", xml).root());
    }

    private static void losesNothing(String root, String xml) throws FormatException {
        byte[] written = again(binding(root), xml.getBytes(StandardCharsets.UTF_8));
        Diff diff = DiffBuilder.compare(xml)
                .withTest(written)
                .ignoreComments()
                .ignoreWhitespace()
                .withDifferenceEvaluator(
                        (comparison, outcome) -> isAddition(comparison) ? ComparisonResult.EQUAL : outcome)
                .checkForIdentical()
                .build();
        assertThat(diff.getDifferences()).as(root).isEmpty();
    }

    /** What the schema adds to a file written by hand: defaults, and a whole number in the form of every other. */
    private static boolean isAddition(Comparison comparison) {
        Object given = comparison.getControlDetails().getValue();
        Object written = comparison.getTestDetails().getValue();
        return switch (comparison.getType()) {
            case ELEMENT_NUM_ATTRIBUTES -> (Integer) given < (Integer) written;
            case ATTR_NAME_LOOKUP -> given == null;
            case ATTR_VALUE -> String.valueOf(written).equals(given + ".0");
            default -> false;
        };
    }

    @Test
    void footModelWithEverythingInIt() throws FormatException {
        losesNothing("footModel", new String(FootModelFile.bytes(InventedModel.full()), StandardCharsets.UTF_8));
    }

    @Test
    void postureCostSummary() throws FormatException {
        PostureCost cost = new PostureCost(
                "0.1.0",
                List.of(new SourceFile("walking", "w <1> & \"2\".c3d", InventedModel.DIGEST)),
                List.of(new PostureCost.Setting("contact threshold", "20.0 N", "default")),
                List.of(TransitionRow.builder()
                        .text("trial", "w.c3d")
                        .text("step", "1")
                        .number("push_off_J", 1.0 / 3)
                        .number("collision_J", Double.NaN)
                        .build()),
                List.of(Finding.note("gait.flight", "here", "no \u00fc double < support")),
                Cautions.LINES);
        losesNothing("postureCost", new String(PostureCostFile.bytes(cost), StandardCharsets.UTF_8));
    }

    @Test
    void mapsThatPeopleCopy() throws Exception {
        losesNothing("landmarkMap", resource("landmark-map.xml"));
        losesNothing("results", resource("column-map.xml"));
    }

    /** The examples of templates/README.md are blocks of indented XML. */
    @ParameterizedTest
    @ValueSource(strings = {"footModel", "postureCost"})
    void examplesOfTheDocumentFollowTheirSchema(String root) throws Exception {
        List<String> block = new ArrayList<>();
        for (String line : Files.readAllLines(templates().resolve("README.md"))) {
            if (line.startsWith("    <" + root + " ")
                    || (!block.isEmpty() && !block.get(block.size() - 1).startsWith("    </" + root + ">"))) {
                block.add(line);
            }
        }
        assertThat(block).isNotEmpty();
        again(binding(root), String.join("\n", block).strip().getBytes(StandardCharsets.UTF_8));
    }

    @ParameterizedTest
    @ValueSource(strings = {"footModel", "postureCost", "landmarkMap", "results"})
    void entitiesAreRefused(String root) {
        String outside = "<!DOCTYPE x [<!ENTITY e SYSTEM 'file:///etc/passwd'>]><x>&e;</x>";
        String laughs = "<!DOCTYPE x [<!ENTITY a 'ha'><!ENTITY b '&a;&a;&a;&a;&a;&a;&a;&a;&a;&a;'>]><x>&b;</x>";
        for (String hostile : List.of(outside, laughs)) {
            org.assertj.core.api.Assertions.assertThatThrownBy(
                            () -> binding(root).parse("hostile.xml", hostile.getBytes(StandardCharsets.UTF_8)))
                    .isInstanceOf(FormatException.class)
                    .hasMessageContaining("document type declaration");
        }
    }

    @Test
    void endlessAttributeIsRefused() throws Exception {
        // Of the length that is read at most and one more; a file of a gigabyte is read as far and refused alike.
        byte[] long1 = new byte[(32 << 20) + 1];
        java.util.Arrays.fill(long1, (byte) 'a');
        byte[] start = "<footModel xmlns='urn:solewright:foot-model:1' side='".getBytes(StandardCharsets.UTF_8);
        System.arraycopy(start, 0, long1, 0, start.length);
        org.assertj.core.api.Assertions.assertThatThrownBy(
                        () -> binding("footModel").parse("long.xml", long1))
                .isInstanceOf(FormatException.class)
                .hasMessageContaining("larger than");
    }
}
