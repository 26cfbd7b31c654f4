package org.solewright.formats.footmodel;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import javax.xml.transform.stream.StreamSource;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.foot.FootModel;
import org.solewright.domain.foot.Rolling;
import org.solewright.formats.io.FormatException;
import org.xmlunit.builder.Input;
import org.xmlunit.validation.Languages;
import org.xmlunit.validation.ValidationResult;
import org.xmlunit.validation.Validator;
import org.xmlunit.xpath.JAXPXPathEngine;

class FootModelFileTest {

    @TempDir
    Path folder;

    private static String text() {
        return new String(FootModelFile.bytes(InventedModel.full()), StandardCharsets.UTF_8);
    }

    private FormatException refusal(String content) throws IOException {
        Path file = Files.writeString(folder.resolve("model.xml"), content);
        FormatException e = catchThrowableOfType(FormatException.class, () -> FootModelFile.read(file));
        assertThat(e).as("refused").isNotNull();
        assertThat(e.source()).isEqualTo(file.toString());
        return e;
    }

    @Test
    void writtenModelReadsBackEqual() throws Exception {
        FootModel model = InventedModel.full();
        Path file = folder.resolve("model.xml");
        FootModelFile.write(file, model);
        assertThat(FootModelFile.read(file)).isEqualTo(model);
    }

    @Test
    void sameModelGivesTheSameBytesWithLineFeedsOnly() throws Exception {
        Path file = folder.resolve("model.xml");
        FootModelFile.write(file, InventedModel.full());
        assertThat(Files.readAllBytes(file)).isEqualTo(FootModelFile.bytes(InventedModel.full()));
        assertThat(text())
                .doesNotContain("\r")
                .startsWith("<?xml version=\"1.0\" encoding=\"UTF-8\"")
                .endsWith("\n");
        assertThat(Files.list(folder)).containsExactly(file);
    }

    @Test
    void schemaInTheProjectAcceptsWhatIsWritten() {
        Validator validator = Validator.forLanguage(Languages.W3C_XML_SCHEMA_NS_URI);
        validator.setSchemaSource(new StreamSource(
                FootModelFile.class.getResource("foot-model-1.xsd").toString()));
        ValidationResult result =
                validator.validateInstance(Input.fromString(text()).build());
        assertThat(result.getProblems()).isEmpty();
        assertThat(result.isValid()).isTrue();
    }

    @ParameterizedTest
    @CsvSource({
        "/m:footModel/@side, left",
        "/m:footModel/m:subject/@mass, 80.33333333333333",
        "/m:footModel/m:subject/@population, adult",
        "/m:footModel/m:sources/m:file[1]/@path, stand 1.c3d",
        "/m:footModel/m:segments/m:segment[2]/@parent, shank",
        "/m:footModel/m:segments/m:segment[2]/m:mass/@value, 0.9",
        "/m:footModel/m:segments/m:segment[2]/m:inertia/@xy, -1.0E-4",
        "/m:footModel/m:segments/m:segment[2]/m:centreOfMass/@basis, regression",
        "/m:footModel/m:joints/m:joint[1]/m:centre/@y, -0.42",
        "/m:footModel/m:joints/m:joint[1]/m:lock/@stancePercent, 12.5",
        "/m:footModel/m:joints/m:joint[1]/m:range/@max, 0.4",
        "/m:footModel/m:landmarks/m:landmark[1]/@segment, foot",
        "/m:footModel/m:rolling/m:arc[@frame='shank']/@radius, 0.3",
        "/m:footModel/m:rolling/m:arc[@frame='limb']/@radius, INF",
        "/m:footModel/m:rolling/m:arc[@frame='limb']/@curvature, 0.0",
        "/m:footModel/m:rolling/m:outline/m:point[2]/@x, 0.12",
        "/m:footModel/m:rolling/m:pivots/m:pivot[2]/@from, 60.0",
        "/m:footModel/m:rolling/m:cap/@centreZ, 0.2",
        "/m:footModel/m:contacts/m:pad/@stiffness, 333333.3333333333",
        "/m:footModel/m:findings/m:finding/@code, cluster.deformed",
        "count(/m:footModel/m:cautions/m:caution), 4"
    })
    void namesAreThoseOfTheInterface(String path, String value) {
        JAXPXPathEngine engine = new JAXPXPathEngine();
        engine.setNamespaceContext(Map.of("m", "urn:solewright:foot-model:1"));
        assertThat(engine.evaluate(path, Input.fromString(text()).build())).isEqualTo(value);
    }

    @Test
    void segmentThatThereIsNotIsNamedWithWhatWasMeant() throws Exception {
        FormatException e = refusal(text().replace("name=\"toes\"", "name=\"toe\""));
        assertThat(e.getMessage()).endsWith("unknown segment 'toe'").startsWith("line ");
        assertThat(e.whatToDo()).isEqualTo("did you mean 'toes'?");
    }

    @Test
    void whatNoSchemaCanSayIsRefusedWithItsLine() throws Exception {
        assertThat(refusal(text().replace("x=\"0.6\"", "x=\"0.9\"")).getMessage())
                .matches("line \\d+: axis subtalar has length 1\\.20\\d*, expected 1");
        assertThat(refusal(text().replace("parent=\"foot\"", "parent=\"hindfoot\"")))
                .hasMessage("line 2: parent of toes names segment hindfoot, which the model has not");
        assertThat(refusal(text().replace(" footLengthBasis=\"regression\"", "")))
                .hasMessageContaining("attribute 'footLength' without 'footLengthBasis'");
    }

    @Test
    void numbersOutsideTheirRangeAreRefused() throws Exception {
        assertThat(refusal(text().replace("value=\"0.9\"", "value=\"-0.9\"")).getMessage())
                .contains("-0.9");
        assertThat(refusal(text().replace("value=\"0.9\"", "value=\"0,9\"")).getMessage())
                .endsWith("'0,9', expected a value of type double");
        assertThat(refusal(text().replace("value=\"0.9\"", "value=\"NaN\"")).getMessage())
                .contains("NaN");
    }

    @Test
    void otherSchemasVersionIsNamed() throws Exception {
        assertThat(refusal(text().replace("urn:solewright:foot-model:1", "urn:solewright:foot-model:9")))
                .hasMessage("line 2: root element 'footModel' of namespace 'urn:solewright:foot-model:9',"
                        + " expected 'footModel' of 'urn:solewright:foot-model:1'");
    }

    @Test
    void cutAnywhereTheFileIsRefusedAndNothingElse() throws Exception {
        String text = text();
        for (int length = 0; length < text.length() - 20; length += 97) {
            refusal(text.substring(0, length));
        }
    }

    @Test
    void charactersThatXmlForbidsDoNotSpoilTheFile() throws Exception {
        FootModel model = InventedModel.full();
        FootModel odd = new FootModel(
                model.side(),
                model.version(),
                model.subject(),
                model.sources(),
                model.segments(),
                model.joints(),
                model.landmarks(),
                model.rolling(),
                model.pads(),
                List.of(Finding.note("odd", "a\u0001b", "c\u0000\ud800d")),
                model.cautions());
        Path file = folder.resolve("odd.xml");
        FootModelFile.write(file, odd);
        assertThat(FootModelFile.read(file).findings().get(0).message()).isEqualTo("c\ufffd\ufffdd");
    }

    @Test
    void deviationThatIsNotFiniteIsLeftOut() throws Exception {
        FootModel model = InventedModel.full();
        Rolling.Arc nearlyFlat = new Rolling.Arc(
                Rolling.Frame.SHANK,
                1e-200,
                OptionalDouble.of(Double.NaN),
                OptionalDouble.of(Double.POSITIVE_INFINITY),
                OptionalDouble.empty(),
                OptionalDouble.empty(),
                0.2,
                0.001,
                1);
        FootModel odd = new FootModel(
                model.side(),
                model.version(),
                model.subject(),
                model.sources(),
                model.segments(),
                model.joints(),
                model.landmarks(),
                new Rolling(List.of(nearlyFlat), List.of(), List.of(), Optional.empty()),
                model.pads(),
                model.findings(),
                model.cautions());
        Path file = folder.resolve("flat.xml");
        FootModelFile.write(file, odd);
        Rolling.Arc arc = FootModelFile.read(file).rolling().arcs().get(0);
        assertThat(arc.radiusSd()).isEmpty();
        assertThat(arc.curvatureSd()).isEmpty();
        assertThat(arc.curvature()).isEqualTo(1e-200);
    }
}
