package org.solewright.app.cli;

import static org.assertj.core.api.Assertions.assertThat;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.geometry.Vec3;
import org.solewright.domain.motion.PointTrack;
import org.solewright.domain.motion.RecordedEvent;
import org.solewright.domain.motion.Recording;
import org.solewright.formats.c3d.C3dFile;
import org.solewright.formats.c3d.C3dWriter;
import org.solewright.formats.io.FormatException;

/** The commands as a user calls them, on the demo's invented study. */
class CommandLineTest extends DemoCalls {

    @Test
    void demoAgreesWithItsTruth() {
        // exact: the demo compares 27 numbers with the truth of their construction, at the tolerances of design 04 I6.
        assertThat(demonstrated.code()).as(demonstrated.err()).isZero();
        assertThat(demonstrated.out())
                .contains("27 of 27 numbers agree with the truth")
                .doesNotContain("OUT");
    }

    @Test
    void demoWritesWhatTheCommandsPromise() {
        assertThat(demo).isDirectoryContaining(p -> p.endsWith("foot-model-right.xml"));
        for (String name : List.of(
                "foot-model-left.xml",
                "fit-contacts.csv",
                "fit-curves.csv",
                "posture-cost.csv",
                "posture-cost.xml",
                "postures.csv",
                "appraise-contacts.csv",
                "appraise-curves.csv",
                "rollover.csv",
                "rollover.xml",
                "rollover-curves.csv",
                "landscape.csv")) {
            assertThat(demo.resolve(name)).isNotEmptyFile();
        }
        assertThat(demonstrated.out()).contains("Not a medical device").contains("not metabolic energy");
    }

    @Test
    void surveyAsJsonHasTheFixedKeys() throws IOException {
        Called c = call("survey", "--json", at("walking-1.c3d"), at("standing.c3d"));
        assertThat(c.code()).isZero();
        List<String> lines = c.out().lines().toList();
        assertThat(lines).hasSize(2);
        JsonNode first = new ObjectMapper().readTree(lines.get(0));
        assertThat(first.at("/processor").asText()).isEqualTo("intel");
        assertThat(first.at("/storage").asText()).isEqualTo("real");
        assertThat(first.at("/points/rate_Hz").asDouble()).isEqualTo(200);
        assertThat(first.at("/points/firstFrame").asInt()).isEqualTo(1);
        assertThat(first.at("/analog/channels").asInt()).isEqualTo(12);
        assertThat(first.at("/platforms/1/number").asInt()).isEqualTo(2);
        assertThat(first.at("/platforms/0/corners_m")).hasSize(4);
        // exact: the load of 70 kg vaulting stays within twice body weight.
        assertThat(first.at("/platforms/0/peakVertical_N").asDouble()).isBetween(600.0, 1400.0);
        JsonNode second = new ObjectMapper().readTree(lines.get(1));
        assertThat(second.at("/analog/rate_Hz").isNull()).isTrue();
    }

    @Test
    void surveyAsAPageNamesGapsPlatformsAndEvents() throws IOException, FormatException {
        // exact: 4 frames at 100 Hz, the second point lost in frames 2 and 3; 812.5 is a float.
        double[] whole = {0.1, 0.2, 0.3, 0.1, 0.2, 0.3, 0.1, 0.2, 0.3, 0.1, 0.2, 0.3};
        double[] gapped = whole.clone();
        Arrays.fill(gapped, 3, 9, Double.NaN);
        double[] force = {0, 0, 0, 0, 0, 100, 0, 0, 812.5, 0, 0, 0};
        List<Vec3> corners =
                List.of(new Vec3(0.5, -0.3, 0), new Vec3(0, -0.3, 0), new Vec3(0, 0.3, 0), new Vec3(0.5, 0.3, 0));
        Path file = folder.resolve("page.c3d");
        C3dWriter.write(
                file,
                new Recording(
                        "page.c3d",
                        100,
                        1,
                        4,
                        List.of(PointTrack.of("HEEL", whole), PointTrack.of("TOE", gapped)),
                        List.of(new PlatformLoads(1, 2, corners, Vec3.Z, 100, 0, true, force, new double[12])),
                        List.of(new RecordedEvent(0.025, "Left", "Foot Strike", RecordedEvent.Source.GROUP)),
                        List.of()));
        Called c = call("survey", file.toString());
        assertThat(c.code()).as(c.err()).isZero();
        assertThat(c.out())
                .contains("intel, real samples, 4 frames from 1 at 100 Hz (0.040 s), lengths in mm")
                .contains("2 points, without gaps: HEEL")
                .containsPattern("TOE +lost in 2 of 4 frames, longest gap 2 frames \\(0\\.020 s\\)")
                .contains("6 analog channels at 100 Hz: Fx1 Fy1 Fz1 Mx1 My1 Mz1")
                .contains("platform 1, type 2: corners (0.500 -0.300 0.000)")
                .contains("peak vertical 812.5 N")
                .contains("event 0.025 s Left Foot Strike");
        assertThat(call("survey", "--header", file.toString()).out())
                .contains("2 points: HEEL TOE")
                .doesNotContain("peak");
    }

    @Test
    void strictSurveyMakesWarningsErrors() throws IOException, FormatException {
        Recording walk = C3dFile.read(demo.resolve("walking-1.c3d")).toRecording();
        List<PointTrack> twice = new ArrayList<>(walk.points());
        PlatformLoads p = walk.platforms().get(0);
        double[] pulling = new double[3 * p.samples()];
        Arrays.setAll(pulling, i -> i % 3 == 2 ? i < 300 ? -60 : 900 : 0);
        Path file = folder.resolve("pulling.c3d");
        C3dWriter.write(
                file,
                new Recording(
                        "pulling.c3d",
                        walk.rate(),
                        1,
                        walk.frames(),
                        twice,
                        List.of(new PlatformLoads(
                                1,
                                2,
                                p.corners(),
                                p.up(),
                                p.rate(),
                                p.time(0),
                                true,
                                pulling,
                                new double[pulling.length])),
                        List.of(),
                        List.of()));
        Called lenient = call("survey", file.toString(), at("walking-1.c3d"));
        assertThat(lenient.code()).isZero();
        assertThat(lenient.out())
                .contains("warning platform.negative-load")
                .contains("do: Check channels, scale and baseline")
                .containsSubsequence("pulling.c3d", "walking-1.c3d");
        Called strict = call("survey", "--strict", "--json", file.toString(), at("walking-1.c3d"));
        assertThat(strict.code()).isEqualTo(1);
        assertThat(strict.out()).contains("\"severity\":\"error\"");
        assertThat(strict.errors()).hasSize(1);
        assertThat(call("survey", "--strict", file.toString()).code()).isEqualTo(3);
    }

    @Test
    void surveyOfTheHeaderLeavesPeaksOut() throws IOException {
        Called c = call("survey", "--json", "--header", at("walking-1.c3d"));
        JsonNode node = new ObjectMapper().readTree(c.out());
        assertThat(node.at("/platforms/0").has("peakVertical_N")).isFalse();
        assertThat(node.at("/points/frames").asInt()).isPositive();
    }

    @Test
    void surveyNamesTheFileThatCannotBeReadAndReadsTheOthers() throws IOException {
        Path empty = Files.createFile(folder.resolve("empty.c3d"));
        Called c = call("survey", "--json", empty.toString(), at("standing.c3d"));
        assertThat(c.code()).isEqualTo(1);
        assertThat(c.out().lines().toList().get(0)).contains("\"severity\":\"error\"");
        assertThat(c.errors()).hasSize(1);
        assertThat(call("survey", empty.toString()).code()).isEqualTo(3);
    }

    @Test
    void tablesHaveTheFixedHeads() {
        assertThat(head("points")).startsWith("frame,time_s,SACR_x,SACR_y,SACR_z,SACR_residual,");
        assertThat(head("analog")).startsWith("sample,time_s,Fx1,");
        assertThat(head("loads"))
                .isEqualTo("sample,time_s,platform,force_x,force_y,force_z,cop_x,cop_y,cop_z,free_moment");
        assertThat(head("events")).isEqualTo("time_s,context,label,source");
    }

    @Test
    void recordingCutBeforeItsFirstFrameGivesNoTable() throws IOException {
        Path cut = folder.resolve("cut-parameters.c3d");
        Files.write(cut, Arrays.copyOf(Files.readAllBytes(demo.resolve("walking-1.c3d")), 1100));
        Path table = folder.resolve("cut.csv");
        Called c = call("tabulate", cut.toString(), "--what", "points", "--out", table.toString());
        assertThat(c.code()).isEqualTo(3);
        assertThat(c.errors()).hasSize(1);
        assertThat(table).doesNotExist();
    }

    @Test
    void surveyAsJsonListsLabelsAsStoredAndNamesOfAllPoints() throws IOException {
        // exact: the first parameter LABELS is that of POINT; by another name it labels nothing.
        byte[] b = Files.readAllBytes(demo.resolve("standing.c3d"));
        int at = new String(b, StandardCharsets.ISO_8859_1).indexOf("LABELS");
        b[at] = 'X';
        Path file = Files.write(folder.resolve("unlabelled.c3d"), b);
        JsonNode points = new ObjectMapper()
                .readTree(call("survey", "--json", file.toString()).out())
                .get("points");
        assertThat(points.get("labels")).isEmpty();
        assertThat(points.get("names")).hasSize(points.get("count").asInt());
        assertThat(points.get("names").get(0).asText()).isEqualTo("point_1");
    }

    private String head(String what) {
        Called c = call("tabulate", at("walking-1.c3d"), "--what", what);
        assertThat(c.code()).isZero();
        return c.out().lines().findFirst().orElseThrow();
    }

    @Test
    void loadsCellsOfAnUnloadedPlatformAreEmptyButForces() {
        String row = call("tabulate", at("walking-1.c3d"), "--what", "loads")
                .out()
                .lines()
                .skip(1)
                .findFirst()
                .orElseThrow();
        assertThat(row).startsWith("1,0.0,1,").endsWith(",,,,");
    }

    @Test
    void postureCostTableHasTheFixedHead() throws IOException {
        String head = Files.readAllLines(demo.resolve("posture-cost.csv")).get(0);
        assertThat(head)
                .startsWith("trial,step,side,trailing_side,window,step_length_m,")
                .contains(",push_off_J_sd,");
        assertThat(Files.readString(demo.resolve("posture-cost.csv"))).contains("walking-1,1,left,right,step,");
    }

    @Test
    void everyCommandShowsAnExample() {
        for (String name : List.of("survey", "tabulate", "fit", "appraise", "postures", "solve", "demo")) {
            Called c = call(name, "--help");
            assertThat(c.code()).isZero();
            assertThat(c.out()).contains("solewright " + name);
        }
    }

    @Test
    void sameInputGivesTheSameBytes() throws IOException {
        Path again = folder.resolve("again");
        assertThat(call("demo", again.toString()).code()).isZero();
        try (Stream<Path> files = Files.list(demo)) {
            for (Path file : files.toList()) {
                assertThat(again.resolve(file.getFileName())).hasSameBinaryContentAs(file);
            }
        }
    }
}
