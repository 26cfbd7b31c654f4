package org.solewright.formats.footmodel;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.catchThrowableOfType;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.solewright.domain.foot.LabelPattern;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.foot.LandmarkMap;
import org.solewright.domain.gait.Side;
import org.solewright.formats.io.FormatException;

class LandmarkMapFileTest {

    private static final String GOOD = """
            <?xml version="1.0" encoding="UTF-8"?>
            <landmarkMap xmlns="urn:solewright:landmarks:1" name="invented">
              <landmark name="calcaneus_posterior" side="right">
                <label>R_HEEL</label>
              </landmark>
              <landmark name="sacrum" side="both">
                <label> SACR </label>
                <label>V_*</label>
              </landmark>
            </landmarkMap>
            """;

    @TempDir
    Path folder;

    private Path file(String content) throws IOException {
        return Files.writeString(folder.resolve("map.xml"), content);
    }

    private FormatException refusal(String content) throws IOException {
        Path file = file(content);
        FormatException e = catchThrowableOfType(FormatException.class, () -> LandmarkMapFile.read(file));
        assertThat(e).as("refused").isNotNull();
        assertThat(e.source()).isEqualTo(file.toString());
        assertThat(e.getMessage() + e.whatToDo()).doesNotContain("\n");
        return e;
    }

    @Test
    void readsLandmarksSidesAndPatterns() throws Exception {
        assertThat(LandmarkMapFile.read(file(GOOD)))
                .isEqualTo(new LandmarkMap(
                        "invented",
                        List.of(
                                new LandmarkMap.Entry(
                                        Landmark.CALCANEUS_POSTERIOR,
                                        Optional.of(Side.RIGHT),
                                        List.of(new LabelPattern("R_HEEL"))),
                                new LandmarkMap.Entry(
                                        Landmark.SACRUM,
                                        Optional.empty(),
                                        List.of(new LabelPattern("SACR"), new LabelPattern("V_*"))))));
    }

    @Test
    void writtenMapReadsBackEqualAndTwiceTheSameBytes() throws Exception {
        LandmarkMap map = LandmarkMapFile.read(file(GOOD));
        Path first = folder.resolve("first.xml");
        Path second = folder.resolve("second.xml");
        LandmarkMapFile.write(first, map);
        LandmarkMapFile.write(second, map);
        assertThat(LandmarkMapFile.read(first)).isEqualTo(map);
        assertThat(first).hasSameBinaryContentAs(second);
        assertThat(Files.readString(first)).doesNotContain("\r").endsWith("\n");
    }

    @Test
    void unknownLandmarkNamesLineAndWhatWasMeant() throws Exception {
        FormatException e = refusal(GOOD.replace("calcaneus_posterior", "calcaneus_posteriro"));
        assertThat(e).hasMessage("line 3: unknown landmark 'calcaneus_posteriro'");
        assertThat(e.whatToDo()).isEqualTo("did you mean 'calcaneus_posterior'?");
    }

    @Test
    void landmarkFarFromAllNamesListsThem() throws Exception {
        FormatException e = refusal(GOOD.replace("calcaneus_posterior", "elbow"));
        assertThat(e).hasMessage("line 3: unknown landmark 'elbow'");
        assertThat(e.whatToDo()).startsWith("use one of calcaneus_posterior, ").endsWith("pelvis_cluster");
    }

    @Test
    void everyLandmarkOfTheDomainIsInTheSchema() throws Exception {
        for (Landmark landmark : Landmark.values()) {
            String one = GOOD.substring(0, GOOD.indexOf("  <landmark name=\"sacrum\"")) + "</landmarkMap>\n";
            assertThat(LandmarkMapFile.read(file(one.replace("calcaneus_posterior", landmark.word())))
                            .names(landmark, Side.RIGHT))
                    .isTrue();
        }
    }

    @Test
    void landmarkOfOneSideTwiceIsRefused() throws Exception {
        FormatException e = refusal(GOOD.replace("\"sacrum\"", "\"calcaneus_posterior\""));
        assertThat(e)
                .hasMessage("line 6: landmark 'calcaneus_posterior' of side 'both' for the second time,"
                        + " expected each once with all its labels");
    }

    @Test
    void wrongNamespaceIsNamed() throws Exception {
        FormatException e = refusal(GOOD.replace("landmarks:1", "landmarks:2"));
        assertThat(e)
                .hasMessage("line 2: root element 'landmarkMap' of namespace 'urn:solewright:landmarks:2',"
                        + " expected 'landmarkMap' of 'urn:solewright:landmarks:1'");
    }

    @Test
    void missingLabelIsSaidInEnglishWhateverTheLocale() throws Exception {
        FormatException e = refusal(GOOD.replace("<label>R_HEEL</label>", ""));
        assertThat(e).hasMessage("line 5: element 'landmark' is not complete, expected {label}");
        assertThat(e.whatToDo()).isEqualTo("correct the file against its schema");
    }

    @Test
    void departuresFromTheSchemaAreSaidInEnglish() throws Exception {
        assertThat(refusal(GOOD.replace("side=\"right\"", "side=\"right\" colour=\"red\"")))
                .hasMessage("line 3: attribute 'colour' of element 'landmark', expected none such");
        assertThat(refusal(GOOD.replace("side=\"right\"", "")))
                .hasMessage("line 3: element 'landmark' without attribute 'side'");
        assertThat(refusal(GOOD.replace("<label>R_HEEL</label>", "<name/>")))
                .hasMessage("line 4: element 'name', expected {label}");
    }

    @Test
    void emptyFileIsNamedAsEmpty() throws Exception {
        assertThat(refusal("")).hasMessage("the file is empty, expected XML with root element 'landmarkMap'");
    }

    @Test
    void otherBytesAreNotXml() throws Exception {
        assertThat(refusal("trial,side\n").getMessage()).startsWith("line 1: not XML (");
        Path png = Files.write(folder.resolve("map.png"), new byte[] {(byte) 0x89, 'P', 'N', 'G', 13, 10, 26, 10, 0});
        assertThatThrownBy(() -> LandmarkMapFile.read(png)).isInstanceOf(FormatException.class);
    }

    @Test
    void truncatedFileNamesTheLine() throws Exception {
        assertThat(refusal(GOOD.substring(0, GOOD.indexOf("</landmark>"))).getMessage())
                .startsWith("line ");
    }

    @Test
    void wrongEncodingIsRefused() throws Exception {
        Path file = Files.write(
                folder.resolve("map.xml"), GOOD.replace("invented", "fu\u00df").getBytes(StandardCharsets.ISO_8859_1));
        assertThatThrownBy(() -> LandmarkMapFile.read(file))
                .isInstanceOf(FormatException.class)
                .hasMessageStartingWith("line 2: not XML (");
    }

    @Test
    void entityBombIsRefusedAtItsDeclaration() throws Exception {
        String bomb = "<?xml version=\"1.0\"?>\n<!DOCTYPE landmarkMap [<!ENTITY a \"aaaaaaaaaa\">"
                + "<!ENTITY b \"&a;&a;&a;&a;&a;&a;&a;&a;&a;&a;\"><!ENTITY c \"&b;&b;&b;&b;&b;&b;&b;&b;\">]>\n"
                + "<landmarkMap xmlns=\"urn:solewright:landmarks:1\" name=\"&c;\"/>";
        FormatException e = refusal(bomb);
        assertThat(e).hasMessage("line 2: a document type declaration, expected none");
        assertThat(e.whatToDo()).isEqualTo("remove the DOCTYPE");
    }

    @Test
    void externalEntityIsNotOpened() throws Exception {
        Path secret = Files.writeString(folder.resolve("secret"), "secret");
        FormatException e = refusal("<!DOCTYPE landmarkMap [<!ENTITY x SYSTEM \"" + secret.toUri() + "\">]>\n"
                + "<landmarkMap xmlns=\"urn:solewright:landmarks:1\" name=\"&x;\"/>");
        assertThat(e).hasMessage("line 1: a document type declaration, expected none");
    }

    @Test
    void deepNestingIsRefused() throws Exception {
        String deep = "<landmarkMap xmlns=\"urn:solewright:landmarks:1\">" + "<landmark>".repeat(100_000);
        assertThat(refusal(deep).getMessage()).startsWith("line 1: ");
    }

    @Test
    void missingFileIsNotAFormatMatter() {
        assertThatThrownBy(() -> LandmarkMapFile.read(folder.resolve("absent.xml")))
                .isInstanceOf(NoSuchFileException.class);
    }

    @Test
    void mapsThatShipAreInOrder() throws Exception {
        Path top = Path.of("").toAbsolutePath().getParent().getParent();
        LandmarkMap example = LandmarkMapFile.read(
                top.resolve("templates/src/main/resources/org/solewright/templates/landmark-map.xml"));
        assertThat(example.names(Landmark.NAVICULAR_TUBEROSITY, Side.LEFT)).isTrue();
        LandmarkMap recording =
                LandmarkMapFile.read(top.resolve("bridge/app/src/test/resources/org/solewright/app/s26-landmarks.xml"));
        assertThat(recording.labels(
                        Landmark.SHANK_CLUSTER, Side.LEFT, List.of("R_SHANK_1", "L_SHANK_1", "L_SHANK_2", "L_HEEL")))
                .containsExactly("L_SHANK_1", "L_SHANK_2");
    }
}
