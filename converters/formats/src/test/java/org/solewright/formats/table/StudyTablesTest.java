package org.solewright.formats.table;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.solewright.domain.foot.Population;
import org.solewright.domain.foot.Sex;
import org.solewright.domain.study.StudySubject;
import org.solewright.domain.study.StudyTrial;
import org.solewright.formats.io.FormatException;

class StudyTablesTest {

    @TempDir
    private Path folder;

    private Path file(String text) throws IOException {
        return Files.writeString(folder.resolve("table.csv"), text, StandardCharsets.UTF_8);
    }

    private static List<String> messages(StudyTables.Read<?> read) {
        return read.wrong().stream().map(FormatException::getMessage).toList();
    }

    @Test
    void tableOfASpreadsheetIsUnderstood() throws IOException, FormatException {
        // Byte order mark, semicolons, decimal commas, CRLF, a cell of two lines: as a German spreadsheet saves it.
        StudyTables.Read<StudySubject> read =
                StudyTables.subjects(file("\uFEFFid;mass_kg;stature_m;limb_length_m;population;sex;notes\r\n"
                        + "P1;70,5;1,68;0,9;Adult;female;\"tall;\r\nlimps\"\r\nP2;;;;;;\r\n"));
        assertThat(messages(read)).isEmpty();
        StudySubject first = read.rows().get(0);
        assertThat(first.mass().getAsDouble()).isEqualTo(70.5);
        assertThat(first.population()).isEqualTo(Population.ADULT);
        assertThat(first.sex()).contains(Sex.FEMALE);
        assertThat(first.notes()).isEqualTo("tall;\r\nlimps");
        StudySubject second = read.rows().get(1);
        // The cell of two lines counts as two.
        assertThat(second.line()).isEqualTo(4);
        assertThat(second.mass()).isEmpty();
        assertThat(second.population()).isEqualTo(Population.UNKNOWN);
    }

    @Test
    void everyWrongLineIsNamed() throws IOException, FormatException {
        StudyTables.Read<StudyTrial> read =
                StudyTables.trials(file("subject,kind,file,condition,walking_aid,slope_deg\n"
                        + "P1,walking,a/w.c3d,,,\n"
                        + "P1,running,a/x.c3d,,,\n"
                        + "P1,walking,a/w.c3d,,,\n"
                        + "P1,walking,b/W.c3d,,,\n"
                        + "../x,walking,a/y.c3d,,,\n"
                        + "P1,walking,,,,\n"
                        + "P1,walking,a/z.c3d,shoed,,\n"
                        + "P1,walking,a/q.c3d,,,80\n"
                        + "P1,walking\n"
                        + "P1,walking,a/ok.c3d,SHOD,Cane,-5\n"));
        assertThat(messages(read))
                .containsExactly(
                        "line 10: 2 cells, expected 6 as in the header",
                        "line 3: kind 'running', expected one of standing, walking, results",
                        "line 4: file 'a/w.c3d' for the second time, first in line 2",
                        "line 5: trial 'P1/W' for the second time, first in line 2",
                        "line 6: subject '../x' is no identifier",
                        "line 7: no file",
                        "line 8: condition 'shoed', expected one of barefoot, shod, orthosis, prosthesis",
                        "line 9: slope_deg 80.0 is out of range, expected -45.0 to 45.0 deg");
        assertThat(read.rows()).hasSize(2);
        StudyTrial aided = read.rows().get(1);
        assertThat(aided.isAided()).isTrue();
        assertThat(aided.condition()).isEqualTo(StudyTrial.Condition.SHOD);
        // Exact: 5 deg are pi/36.
        assertThat(aided.slope()).isCloseTo(-Math.PI / 36, within(1e-15));
        assertThat(read.rows().get(0).isAided()).isFalse();
    }

    @Test
    void repeatedSubjectIsWrongWhateverItsCase() throws IOException, FormatException {
        StudyTables.Read<StudySubject> read = StudyTables.subjects(file("id\nP1\np1\n"));
        assertThat(messages(read)).containsExactly("line 3: subject 'p1' for the second time, first in line 2");
    }

    @Test
    void unknownMissingAndRepeatedColumnsAreNamed() throws IOException, FormatException {
        assertThat(messages(StudyTables.subjects(file("id,weight\nP1,3\n"))))
                .containsExactly("line 1: unknown column 'weight'");
        Path noFile = file("subject,kind\nP1,walking\n");
        assertThatThrownBy(() -> StudyTables.trials(noFile))
                .isInstanceOf(FormatException.class)
                .hasMessageContaining("no column 'file'");
        Path twice = file("id,id\nP1,P1\n");
        assertThatThrownBy(() -> StudyTables.subjects(twice))
                .isInstanceOf(FormatException.class)
                .hasMessageContaining("column 'id' for the second time");
    }

    @Test
    void whatIsWrittenIsReadBack() throws IOException, FormatException {
        StudyTrial trial = new StudyTrial(
                "P1",
                "2",
                "walk-1",
                StudyTrial.Kind.WALKING,
                "P1/2/walk 1.c3d",
                StudyTrial.Condition.ORTHOSIS,
                OptionalDouble.of(0.02),
                StudyTrial.NO_AID,
                0,
                1.25,
                2);
        Path trials = folder.resolve("trials.csv");
        Files.write(trials, StudyTables.trialBytes(List.of(trial)));
        assertThat(StudyTables.trials(trials).rows()).containsExactly(trial);
        StudySubject subject = StudyTables.subjects(file("id,mass_kg,sex\nP1,70,male\n"))
                .rows()
                .get(0);
        Path subjects = folder.resolve("subjects.csv");
        Files.write(subjects, StudyTables.subjectBytes(List.of(subject)));
        assertThat(StudyTables.subjects(subjects).rows()).containsExactly(subject);
    }

    @Test
    void plainTableComesBack() throws IOException, FormatException {
        Path file = folder.resolve("plain.csv");
        PlainTable.write(file, List.of("a", "b"), sink -> {
            sink.row(List.of("1,5", "two\nlines"));
            sink.row(List.of("", "x"));
        });
        PlainTable.Content content = PlainTable.read(file);
        assertThat(content.columns()).containsExactly("a", "b");
        assertThat(content.rows()).containsExactly(List.of("1,5", "two\nlines"), List.of("", "x"));
        assertThat(content.cell(content.rows().get(0), "b")).isEqualTo("two\nlines");
        assertThat(content.cell(content.rows().get(0), "c")).isEmpty();
    }
}
