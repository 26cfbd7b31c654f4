package org.solewright.formats.footmodel;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import javax.xml.transform.stream.StreamSource;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.solewright.domain.cost.PostureCost;
import org.solewright.domain.cost.TransitionRow;
import org.solewright.domain.finding.Cautions;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.SourceFile;
import org.xmlunit.builder.Input;
import org.xmlunit.validation.Languages;
import org.xmlunit.validation.Validator;
import org.xmlunit.xpath.JAXPXPathEngine;

class PostureCostFileTest {

    @TempDir
    Path folder;

    private static PostureCost cost() {
        return new PostureCost(
                "0.1.0",
                List.of(new SourceFile("walking", "w.c3d", InventedModel.DIGEST)),
                List.of(new PostureCost.Setting("contact threshold", "20.0 N", "default")),
                List.of(
                        TransitionRow.builder()
                                .text("trial", "w.c3d")
                                .text("step", "1")
                                .text("side", "left")
                                .number("push_off_J", 22.1)
                                .number("collision_J", Double.NaN)
                                .build(),
                        TransitionRow.builder()
                                .text("trial", "*")
                                .text("step", "mean")
                                .text("of", "w.c3d")
                                .count("n", 1)
                                .build()),
                List.of(Finding.note("gait.flight", "", "no double support")),
                Cautions.LINES);
    }

    private static String at(String path, String xml) {
        JAXPXPathEngine engine = new JAXPXPathEngine();
        engine.setNamespaceContext(Map.of("p", "urn:solewright:posture-cost:1"));
        return engine.evaluate(path, Input.fromString(xml).build());
    }

    @Test
    void rowsColumnsAndProvenanceAreThere() throws Exception {
        Path file = folder.resolve("posture-cost.xml");
        PostureCostFile.write(file, cost());
        String xml = Files.readString(file);
        assertThat(xml).isEqualTo(new String(PostureCostFile.bytes(cost()), StandardCharsets.UTF_8));
        assertThat(at("/p:postureCost/@version", xml)).isEqualTo("0.1.0");
        assertThat(at("/p:postureCost/p:sources/p:file/@sha256", xml)).isEqualTo(InventedModel.DIGEST);
        assertThat(at("/p:postureCost/p:settings/p:setting/@value", xml)).isEqualTo("20.0 N");
        assertThat(at("/p:postureCost/p:columns/p:column[@name='speed_m_s']/@unit", xml))
                .isEqualTo("m/s");
        assertThat(at("/p:postureCost/p:rows/p:row[1]/p:cell[@column='push_off_J']", xml))
                .isEqualTo("22.1");
        assertThat(at("count(/p:postureCost/p:rows/p:row[1]/p:cell)", xml)).isEqualTo("4");
        assertThat(at("/p:postureCost/p:rows/p:row[2]/p:cell[@column='n']", xml))
                .isEqualTo("1");
        assertThat(at("count(/p:postureCost/p:frames/p:frame)", xml)).isEqualTo("3");
        assertThat(at("/p:postureCost/p:findings/p:finding", xml)).isEqualTo("no double support");
    }

    @Test
    void schemaInTheProjectAcceptsItAndKnowsTheColumns() {
        Validator validator = Validator.forLanguage(Languages.W3C_XML_SCHEMA_NS_URI);
        validator.setSchemaSource(new StreamSource(
                PostureCostFile.class.getResource("posture-cost-1.xsd").toString()));
        String xml = new String(PostureCostFile.bytes(cost()), StandardCharsets.UTF_8);
        assertThat(validator.validateInstance(Input.fromString(xml).build()).getProblems())
                .isEmpty();
        String stray = xml.replace("column=\"push_off_J\"", "column=\"push_off\"");
        assertThat(validator.validateInstance(Input.fromString(stray).build()).isValid())
                .isFalse();
    }
}
