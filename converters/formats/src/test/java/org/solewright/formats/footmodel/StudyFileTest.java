package org.solewright.formats.footmodel;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.EnumSet;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.solewright.domain.study.StudySettings;
import org.solewright.formats.io.FormatException;

class StudyFileTest {

    @TempDir
    private Path folder;

    private Path file(String text) throws IOException {
        return Files.writeString(folder.resolve("study.xml"), text, StandardCharsets.UTF_8);
    }

    @Test
    void whatIsWrittenIsReadBack() throws IOException, FormatException {
        StudySettings settings = new StudySettings(
                "the study",
                "2026-03-01",
                "maps/landmarks.xml",
                Optional.of("columns.xml"),
                6,
                OptionalDouble.of(0.0095),
                OptionalDouble.of(-0.01),
                true,
                true,
                "kinematic",
                OptionalInt.of(2),
                "dempster",
                4,
                EnumSet.of(StudySettings.Output.TRANSITIONS, StudySettings.Output.FEET));
        Path file = folder.resolve("written.xml");
        Files.write(file, StudyFile.bytes(settings));
        assertThat(StudyFile.read(file)).isEqualTo(settings);
        assertThat(StudyFile.bytes(settings)).isEqualTo(Files.readAllBytes(file));
    }

    @Test
    void whatIsNotStatedIsTheDefault() throws IOException, FormatException {
        StudySettings read = StudyFile.read(
                file("<study xmlns='urn:solewright:study:1' name='s'><landmarks file='m.xml'/></study>"));
        assertThat(read.markerCutoff()).isEqualTo(10);
        assertThat(read.events()).isEqualTo("platform");
        assertThat(read.fitTrials()).isEqualTo(StudySettings.DEFAULT_FIT_TRIALS);
        assertThat(read.outputs()).hasSize(StudySettings.Output.values().length);
        assertThat(read.date()).isEmpty();
    }

    @Test
    void unknownWordNamesItsLine() throws IOException {
        Path file = file("<study xmlns='urn:solewright:study:1' name='s'>\n<landmarks file='m.xml'/>\n"
                + "<laboratory events='platfrom'/></study>");
        assertThatThrownBy(() -> StudyFile.read(file))
                .isInstanceOf(FormatException.class)
                .hasMessageContaining("line 3")
                .hasMessageContaining("platfrom");
    }

    @Test
    void numberOutOfRangeIsRefused() throws IOException {
        Path file = file("<study xmlns='urn:solewright:study:1' name='s'>\n<landmarks file='m.xml'/>\n"
                + "<foot segments='9'/></study>");
        assertThatThrownBy(() -> StudyFile.read(file))
                .isInstanceOf(FormatException.class)
                .hasMessageContaining("line 3");
    }
}
