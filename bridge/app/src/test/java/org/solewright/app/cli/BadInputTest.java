package org.solewright.app.cli;

import static org.assertj.core.api.Assertions.assertThat;

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
import org.solewright.domain.motion.Recording;
import org.solewright.formats.c3d.C3dFile;
import org.solewright.formats.c3d.C3dWriter;
import org.solewright.formats.io.FormatException;

/** What the commands say of input they cannot use. */
class BadInputTest extends DemoCalls {

    @Test
    void badInputsEndInOneLineAndTheirExitCode() throws IOException {
        Path picture = folder.resolve("picture.c3d");
        byte[] png = new byte[2000];
        Arrays.fill(png, (byte) 0x5a);
        System.arraycopy(new byte[] {(byte) 0x89, 'P', 'N', 'G', 13, 10, 26, 10}, 0, png, 0, 8);
        Files.write(picture, png);
        Path cut = folder.resolve("cut.c3d");
        Files.write(cut, Arrays.copyOf(Files.readAllBytes(demo.resolve("walking-1.c3d")), 3000));
        Path empty = Files.write(folder.resolve("nothing.c3d"), new byte[0]);
        for (String bad : List.of(
                folder.resolve("absent.c3d").toString(),
                folder.toString(),
                empty.toString(),
                picture.toString(),
                cut.toString())) {
            Path out = folder.resolve("out-of-bad");
            Called c = call(
                    "fit",
                    "--standing",
                    at("standing.c3d"),
                    "--walking",
                    bad,
                    "--landmarks",
                    at("landmarks.xml"),
                    "--out",
                    out.toString());
            assertThat(c.code()).as(bad + c.err()).isEqualTo(3);
            assertThat(c.errors()).as(bad).hasSize(1);
            assertThat(c.err())
                    .startsWith("solewright: ")
                    .contains(Path.of(bad).getFileName().toString());
            assertThat(out).doesNotExist();
        }
    }

    @Test
    void unknownLandmarkIsRefusedWithTheWordThatWasMeant() throws IOException {
        Path map = changedMap("calcaneus_posterior", "calcaneus_posterio");
        Called c = call(
                "fit",
                "--standing",
                at("standing.c3d"),
                "--walking",
                at("walking-1.c3d"),
                "--landmarks",
                map.toString());
        assertThat(c.code()).isEqualTo(3);
        assertThat(c.errors()).hasSize(1);
        assertThat(c.err()).contains("calcaneus_posterio").contains("did you mean 'calcaneus_posterior'?");
    }

    @Test
    void labelOfARequiredLandmarkThatNoFileHasIsRefusedWithASuggestion() throws IOException {
        Path map = changedMap(">RHEE<", ">RHEEL<");
        Called c = call(
                "fit",
                "--standing",
                at("standing.c3d"),
                "--walking",
                at("walking-1.c3d"),
                "--landmarks",
                map.toString());
        assertThat(c.code()).isEqualTo(3);
        assertThat(c.errors()).hasSize(1);
        assertThat(c.err())
                .contains("right calcaneus_posterior")
                .contains("'RHEEL'")
                .contains("did you mean 'RHEE'?");
    }

    @Test
    void labelOfAnotherLandmarkThatNoFileHasIsAWarning() throws IOException {
        Path map = changedMap(">RTOE<", ">RTOES<");
        Called c = call(
                "fit",
                "--standing",
                at("standing.c3d"),
                "--walking",
                at("walking-1.c3d"),
                "--landmarks",
                map.toString(),
                "--out",
                folder.resolve("without-toe").toString());
        assertThat(c.code()).as(c.err()).isZero();
        assertThat(c.err()).contains("warning landmarks.label-missing").contains("did you mean 'RTOE'?");
    }

    private Path changedMap(String from, String to) throws IOException {
        Path map = Files.createTempFile(folder, "map", ".xml");
        String text = Files.readString(demo.resolve("landmarks.xml"));
        assertThat(text).contains(from);
        return Files.writeString(map, text.replace(from, to), StandardCharsets.UTF_8);
    }

    @Test
    void standingWithoutMalleoliIsRefused() {
        Called c = call(
                "fit",
                "--standing",
                at("walking-1.c3d"),
                "--walking",
                at("walking-1.c3d"),
                "--landmarks",
                at("landmarks.xml"));
        assertThat(c.code()).isEqualTo(3);
        assertThat(c.errors()).hasSize(1);
        assertThat(c.err()).contains("walking-1.c3d").contains("malleolus_medial");
    }

    @Test
    void walkingThatHitsNoPlatformIsRefused() throws IOException, FormatException {
        Recording walk = C3dFile.read(demo.resolve("walking-1.c3d")).toRecording();
        List<PlatformLoads> unloaded = walk.platforms().stream()
                .map(p -> new PlatformLoads(
                        p.number(),
                        2,
                        p.corners(),
                        p.up(),
                        p.rate(),
                        p.time(0),
                        true,
                        new double[3 * p.samples()],
                        new double[3 * p.samples()]))
                .toList();
        Path file = folder.resolve("missed.c3d");
        C3dWriter.write(
                file,
                new Recording(
                        "missed.c3d", walk.rate(), 1, walk.frames(), walk.points(), unloaded, List.of(), List.of()));
        for (String command : List.of("fit", "appraise")) {
            List<String> args = new ArrayList<>(
                    List.of(command, "--walking", file.toString(), "--landmarks", at("landmarks.xml"), "--mass", "70"));
            if (command.equals("fit")) {
                args.addAll(List.of("--standing", at("standing.c3d")));
            }
            Called c = call(args.toArray(String[]::new));
            assertThat(c.code()).as(c.err()).isEqualTo(3);
            assertThat(c.errors()).hasSize(1);
            assertThat(c.err()).contains("missed").contains("no tracked foot stood on a force platform");
        }
    }

    @Test
    void standingTakenForWalkingIsRefused() {
        Called c = call(
                "fit",
                "--standing",
                at("standing.c3d"),
                "--walking",
                at("standing.c3d"),
                "--landmarks",
                at("landmarks.xml"),
                "--mass",
                "70");
        assertThat(c.code()).isEqualTo(3);
        assertThat(c.errors()).hasSize(1);
        assertThat(c.err()).contains("standing.c3d").contains("nobody walks");
    }

    @Test
    void outputFolderThatCannotBeMadeIsRefused() throws IOException {
        Path file = Files.createFile(folder.resolve("a-file"));
        Called c = fit("--out", file.resolve("below").toString());
        assertThat(c.code()).isEqualTo(4);
        assertThat(c.errors()).hasSize(1);
        assertThat(call(
                                "tabulate",
                                at("standing.c3d"),
                                "--what",
                                "points",
                                "--out",
                                file.resolve("x.csv").toString())
                        .code())
                .isEqualTo(4);
    }

    @Test
    void inputIsNeverReplaced() throws IOException {
        Path contacts = folder.resolve("own").resolve("fit-contacts.csv");
        Files.createDirectories(contacts.getParent());
        Files.copy(demo.resolve("fit-contacts.csv"), contacts);
        byte[] before = Files.readAllBytes(contacts);
        Called c = fit(
                "--contacts", contacts.toString(), "--out", contacts.getParent().toString());
        assertThat(c.code()).isEqualTo(4);
        assertThat(c.err()).contains("is an input of this call");
        assertThat(Files.readAllBytes(contacts)).isEqualTo(before);
        try (Stream<Path> files = Files.list(contacts.getParent())) {
            assertThat(files).containsExactly(contacts);
        }
    }

    @Test
    void wrongUsageIsExitTwoAndOneLine() {
        for (String[] args : new String[][] {
            {"frobnicate"},
            {"fit"},
            {"tabulate", "x.c3d", "--what", "everything"},
            {"survey"},
            {"fit", "--standing", "a", "--walking", "b", "--landmarks", "c", "--segments", "9"},
            {"fit", "--standing", "a", "--walking", "b", "--landmarks", "c", "--mass", "-3"}
        }) {
            Called c = call(args);
            assertThat(c.code()).as(String.join(" ", args)).isEqualTo(2);
            assertThat(c.errors()).as(String.join(" ", args)).hasSize(1);
        }
    }
}
