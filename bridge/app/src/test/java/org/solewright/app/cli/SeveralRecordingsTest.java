package org.solewright.app.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.motion.PointTrack;
import org.solewright.domain.motion.Recording;
import org.solewright.formats.c3d.C3dFile;
import org.solewright.formats.c3d.C3dWriter;
import org.solewright.formats.io.FormatException;

/** Several walking recordings in one call: failed, mirrored, of one name, with other orders of labels. */
class SeveralRecordingsTest extends DemoCalls {

    @Test
    void oneFailedWalkingRecordingIsNamedAndTheOthersAreUsed() throws IOException {
        Path empty = Files.createFile(folder.resolve("lost.c3d"));
        for (String bad : List.of(empty.toString(), folder.resolve("absent.c3d").toString(), at("standing.c3d"))) {
            Called c = fit("--walking", bad, "--out", folder.resolve("some").toString());
            assertThat(c.code()).as(bad + c.err()).isEqualTo(1);
            assertThat(c.err())
                    .contains("error input.failed")
                    .contains(Path.of(bad).getFileName().toString());
            assertThat(folder.resolve("some").resolve("foot-model-right.xml")).isNotEmptyFile();
            Called a = call(
                    "appraise",
                    "--walking",
                    at("walking-1.c3d"),
                    "--walking",
                    bad,
                    "--landmarks",
                    at("landmarks.xml"),
                    "--out",
                    folder.resolve("some").toString());
            assertThat(a.code()).as(bad + a.err()).isEqualTo(1);
        }
    }

    @Test
    void recordingsOfOneNameInTwoFoldersStayApart() throws IOException {
        Path other = Files.createDirectories(folder.resolve("other")).resolve("walking-1.c3d");
        Files.copy(demo.resolve("walking-2.c3d"), other);
        Path apart = folder.resolve("apart");
        Path same = folder.resolve("same");
        assertThat(fit("--walking", at("walking-2.c3d"), "--out", apart.toString())
                        .code())
                .isZero();
        assertThat(fit("--walking", other.toString(), "--out", same.toString()).code())
                .isZero();
        assertThat(Files.readString(same.resolve("fit-contacts.csv"))).contains("walking-1#2,");
        // independent: the same two recordings under two names give the same arc.
        assertThat(arc(same)).isEqualTo(arc(apart));
    }

    private static String arc(Path models) throws IOException {
        return Files.readAllLines(models.resolve("foot-model-right.xml")).stream()
                .filter(l -> l.contains("<arc frame=\"limb\""))
                .findFirst()
                .orElseThrow();
    }

    @Test
    void orderOfTheLabelsInAFileDoesNotMatter() throws IOException, FormatException {
        Recording walk = C3dFile.read(demo.resolve("walking-1.c3d")).toRecording();
        List<PointTrack> reversed = new ArrayList<>(walk.points());
        Collections.reverse(reversed);
        Path file = Files.createDirectories(folder.resolve("reversed")).resolve("walking-1.c3d");
        C3dWriter.write(
                file,
                new Recording(
                        walk.name(), walk.rate(), 1, walk.frames(), reversed, walk.platforms(), List.of(), List.of()));
        // independent: the recording is the same, only its points are listed the other way round.
        assertThat(radius(file.toString())).isEqualTo(radius(at("walking-1.c3d")));
    }

    private static String radius(String walking) {
        Called c = call(
                "appraise",
                "--model",
                demo.resolve("foot-model-right.xml").toString(),
                "--walking",
                walking,
                "--landmarks",
                demo.resolve("landmarks.xml").toString(),
                "--marker-low-pass",
                "0",
                "--out",
                folder.resolve("radius").toString());
        return c.out()
                .lines()
                .filter(l -> l.contains("rolling radius"))
                .findFirst()
                .orElse("none " + c.err());
    }

    @Test
    void mirroredRecordingDoesNotWeighTheSubject() throws IOException, FormatException {
        Recording walk = C3dFile.read(demo.resolve("walking-1.c3d")).toRecording();
        List<PointTrack> swapped = walk.points().stream()
                .map(p -> {
                    double[] xyz = new double[3 * p.frames()];
                    p.copyTo(xyz, 0);
                    String label = p.label().startsWith("L")
                            ? "R" + p.label().substring(1)
                            : p.label().startsWith("R") ? "L" + p.label().substring(1) : p.label();
                    return PointTrack.of(label, xyz);
                })
                .toList();
        List<PlatformLoads> doubled = walk.platforms().stream()
                .map(p -> {
                    double[] force = new double[3 * p.samples()];
                    double[] moment = new double[force.length];
                    p.copyForceTo(force, 0);
                    p.copyMomentTo(moment, 0);
                    for (int i = 0; i < force.length; i++) {
                        force[i] *= 2;
                        moment[i] *= 2;
                    }
                    return new PlatformLoads(
                            p.number(), 2, p.corners(), p.up(), p.rate(), p.time(0), true, force, moment);
                })
                .toList();
        Path file = folder.resolve("mirrored.c3d");
        C3dWriter.write(
                file,
                new Recording("mirrored.c3d", walk.rate(), 1, walk.frames(), swapped, doubled, List.of(), List.of()));
        Called c = fit(
                "--walking",
                file.toString(),
                "--out",
                folder.resolve("mirrored").toString());
        assertThat(c.code()).isEqualTo(1);
        assertThat(c.err()).contains("error frame.mirrored");
        // exact: the usable recording carries 70 kg; the mirrored one was given twice its loads.
        assertThat(c.out()).contains("body mass              70.0 ");
    }
}
