package org.solewright.app.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.solewright.domain.motion.RecordedEvent;
import org.solewright.formats.c3d.C3dFile;
import org.solewright.formats.io.FormatException;

/** Recordings written back: converted, cropped, annotated. */
class ConvertCommandTest extends DemoCalls {

    private Path to(String name) {
        return folder.resolve(name);
    }

    @Test
    void recordingIsWrittenForAnotherProcessorAndReadsTheSame() {
        for (String processor : List.of("intel", "dec", "mips")) {
            for (String storage : List.of("real", "integer")) {
                Path out = to(processor + "-" + storage + ".c3d");
                Called c = call(
                        "convert",
                        at("walking-1.c3d"),
                        "--out",
                        out.toString(),
                        "--processor",
                        processor,
                        "--storage",
                        storage);
                assertThat(c.code()).as(c.err()).isZero();
                assertThat(c.out()).contains(processor + ", " + storage + " samples, frames 1 to 716");
                Called s = call("survey", "--json", out.toString());
                assertThat(s.out())
                        .contains("\"processor\":\"" + processor + "\"")
                        .contains("\"storage\":\"" + storage + "\"")
                        .contains("\"frames\":716");
            }
        }
    }

    @Test
    void tableOfACropIsTheTableOfTheCroppedFile() {
        Path part = to("part.c3d");
        assertThat(call("convert", at("walking-1.c3d"), "--out", part.toString(), "--from", "101", "--to", "1.5s")
                        .code())
                .isZero();
        for (String what : List.of("points", "loads", "analog", "events")) {
            Called whole = call("tabulate", at("walking-1.c3d"), "--what", what, "--from", "101", "--to", "1.5s");
            Called cropped = call("tabulate", part.toString(), "--what", what);
            assertThat(whole.code()).isZero();
            List<String> a = whole.out().lines().toList();
            List<String> b = cropped.out().lines().toList();
            assertThat(b).as(what).hasSameSizeAs(a);
            if (what.equals("points")) {
                // exact: at 200 Hz frame 301 is at 1.5 s, so 201 frames and the header row.
                assertThat(a).hasSize(202).isEqualTo(b);
                assertThat(a.get(1)).startsWith("101,0.5,");
                assertThat(a.get(201)).startsWith("301,1.5,");
            }
        }
    }

    @Test
    void placesThatAreNotInTheRecordingAreWrongUsage() {
        String out = to("never.c3d").toString();
        for (String[] place : new String[][] {
            {"--from", "0"},
            {"--to", "900"},
            {"--from", "9s"},
            {"--from", "Right Foot Strike"},
            {"--from", "300", "--to", "200"}
        }) {
            List<String> args = new ArrayList<>(List.of("convert", at("walking-1.c3d"), "--out", out));
            args.addAll(List.of(place));
            Called c = call(args.toArray(String[]::new));
            assertThat(c.code()).as(c.err()).isEqualTo(2);
            assertThat(c.errors()).hasSize(1);
            assertThat(Path.of(out)).doesNotExist();
        }
        assertThat(call("convert", at("walking-1.c3d"), "--out", out, "--processor", "amiga")
                        .err())
                .contains("use intel, dec or mips");
        assertThat(call("convert", at("walking-1.c3d"), "--out", out, "--storage", "paper")
                        .code())
                .isEqualTo(2);
    }

    @Test
    void inputIsNeverReplacedAndAFolderIsNoFile() throws IOException {
        byte[] before = Files.readAllBytes(demo.resolve("walking-1.c3d"));
        Called c = call("convert", at("walking-1.c3d"), "--out", at("walking-1.c3d"), "--storage", "integer");
        assertThat(c.code()).isEqualTo(4);
        assertThat(c.errors()).hasSize(1);
        assertThat(Files.readAllBytes(demo.resolve("walking-1.c3d"))).isEqualTo(before);
        assertThat(call("convert", at("walking-1.c3d"), "--out", folder.toString())
                        .code())
                .isEqualTo(4);
        assertThat(call("convert", at("landmarks.xml"), "--out", to("x.c3d").toString())
                        .code())
                .isEqualTo(3);
    }

    @Test
    void annotatedRecordingsCarryJointsPressureAndContacts() throws IOException, FormatException {
        Path notes = to("notes");
        Called c = fit("--out", to("annotated").toString(), "--annotate", notes.toString());
        assertThat(c.code()).as(c.err()).isZero();
        C3dFile file = C3dFile.read(notes.resolve("walking-1.c3d"));
        assertThat(file.labels())
                .contains("R_ANKLE_CENTRE", "L_ANKLE_CENTRE", "R_KNEE_CENTRE", "R_HIP_CENTRE", "COP_1", "COP_2");
        assertThat(file.events())
                .anyMatch(e -> e.label().equals("Foot Strike") && e.context().equals("Right"));
        int strike = (int) Math.round(file.events().get(0).time() * file.rate());
        int cop = file.labels().indexOf("COP_1");
        int heel = file.labels().indexOf("RHEE");
        int at = strike + 4;
        int side = file.events().get(0).context().equals("Right")
                ? heel
                : file.labels().indexOf("LHEE");
        // common practice: just after heel strike the centre of pressure is under the hind part of the foot.
        double near = Double.POSITIVE_INFINITY;
        for (int k : new int[] {cop, file.labels().indexOf("COP_2")}) {
            if (file.points().isValid(at, k)) {
                near = Math.min(
                        near,
                        Math.hypot(
                                file.points().coordinate(at, k, 0)
                                        - file.points().coordinate(at, side, 0),
                                file.points().coordinate(at, k, 1)
                                        - file.points().coordinate(at, side, 1)));
            }
        }
        assertThat(near).isLessThan(120);
        // Writing back changes nothing of what was recorded.
        Called again = call("tabulate", notes.resolve("walking-1.c3d").toString(), "--what", "loads");
        assertThat(again.out())
                .isEqualTo(
                        call("tabulate", at("walking-1.c3d"), "--what", "loads").out());
        Called mirrored = fit(
                "--mirrored",
                "--annotate",
                notes.toString(),
                "--out",
                to("annotated").toString());
        assertThat(mirrored.code()).isEqualTo(2);
    }

    @Test
    void partFromOneEventToTheNextIsCutAtTheirFrames() throws IOException, FormatException {
        Path notes = to("events");
        assertThat(fit("--out", to("fitted").toString(), "--annotate", notes.toString())
                        .code())
                .isZero();
        Path whole = notes.resolve("walking-1.c3d");
        C3dFile file = C3dFile.read(whole);
        double strike = first(file, "Right", "Foot Strike", 0);
        double off = first(file, "Right", "Foot Off", strike);
        Path part = to("stance.c3d");
        Called c = call(
                "convert",
                whole.toString(),
                "--out",
                part.toString(),
                "--from",
                "Right:Foot Strike",
                "--to",
                "right foot off");
        assertThat(c.code()).as(c.err()).isZero();
        C3dFile cut = C3dFile.read(part);
        // exact: frame n is at (n - 1) / rate.
        assertThat(cut.firstFrame()).isEqualTo((int) Math.rint(strike * file.rate()) + 1);
        assertThat(cut.firstFrame() + cut.frames() - 1).isEqualTo((int) Math.rint(off * file.rate()) + 1);
        assertThat(cut.events()).isEqualTo(file.events());
    }

    private static double first(C3dFile file, String side, String label, double after) {
        return file.events().stream()
                .filter(e -> e.context().equals(side) && e.label().equals(label) && e.time() >= after)
                .mapToDouble(RecordedEvent::time)
                .min()
                .orElseThrow();
    }

    @Test
    void annotatedRecordingsOfOneNameStayApartAndNoInputIsReplaced() throws IOException {
        Path other = Files.createDirectories(to("elsewhere")).resolve("walking-1.c3d");
        Files.copy(demo.resolve("walking-2.c3d"), other);
        Path notes = to("both");
        Called c = fit("--walking", other.toString(), "--out", to("two").toString(), "--annotate", notes.toString());
        assertThat(c.code()).as(c.err()).isZero();
        assertThat(c.out()).contains("wrote annotated recordings into " + notes);
        assertThat(notes.resolve("walking-1.c3d")).isNotEmptyFile();
        assertThat(notes.resolve("walking-1#2.c3d")).isNotEmptyFile();
        byte[] before = Files.readAllBytes(other);
        Called refused = fit(
                "--walking",
                other.toString(),
                "--out",
                to("two").toString(),
                "--annotate",
                to("elsewhere").toString());
        assertThat(refused.code()).isEqualTo(4);
        assertThat(refused.err()).contains("is an input of this call and would be replaced");
        assertThat(Files.readAllBytes(other)).isEqualTo(before);
    }
}
