package org.solewright.app.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.function.BiConsumer;
import org.junit.jupiter.api.Test;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.motion.PointTrack;
import org.solewright.domain.motion.Recording;
import org.solewright.formats.c3d.C3dFile;
import org.solewright.formats.c3d.C3dWriter;
import org.solewright.formats.io.FormatException;

/** Recordings whose markers are lost, exchanged, of two people or at an odd rate; standing trials that are no zero. */
class BadMarkersTest extends DemoCalls {

    private static Path changed(String from, String to, double rate, BiConsumer<String, double[]> change)
            throws IOException, FormatException {
        Recording walk = C3dFile.read(demo.resolve(from)).toRecording();
        List<PointTrack> points = new ArrayList<>();
        for (PointTrack p : walk.points()) {
            double[] xyz = new double[3 * p.frames()];
            p.copyTo(xyz, 0);
            change.accept(p.label(), xyz);
            points.add(PointTrack.of(p.label(), xyz));
        }
        double factor = rate > 0 ? rate / walk.rate() : 1;
        List<PlatformLoads> platforms = walk.platforms().stream()
                .map(p -> {
                    double[] force = new double[3 * p.samples()];
                    double[] moment = new double[force.length];
                    p.copyForceTo(force, 0);
                    p.copyMomentTo(moment, 0);
                    return new PlatformLoads(
                            p.number(), 2, p.corners(), p.up(), factor * p.rate(), p.time(0), true, force, moment);
                })
                .toList();
        Path file = Files.createDirectories(folder.resolve("changed")).resolve(to);
        C3dWriter.write(
                file,
                new Recording(
                        to, rate > 0 ? rate : walk.rate(), 1, walk.frames(), points, platforms, List.of(), List.of()));
        return file;
    }

    private static Called fitOf(String standing, Path walking, String... more) {
        List<String> args = new ArrayList<>(List.of(
                "fit",
                "--standing",
                standing,
                "--walking",
                walking.toString(),
                "--landmarks",
                at("landmarks.xml"),
                "--runs",
                "0",
                "--out",
                folder.resolve("bad").toString()));
        args.addAll(Arrays.asList(more));
        return call(args.toArray(String[]::new));
    }

    private static void assertNoDefect(Called c) {
        assertThat(c.code()).as(c.err()).isIn(0, 1, 3);
        assertThat(c.errors()).allMatch(l -> l.startsWith("solewright: "));
    }

    @Test
    void namesExchangedMidTrialAreFound() throws IOException, FormatException {
        Recording walk = C3dFile.read(demo.resolve("walking-1.c3d")).toRecording();
        double[] heel = new double[3 * walk.frames()];
        double[] head = new double[heel.length];
        walk.point("RHEE").orElseThrow().copyTo(heel, 0);
        walk.point("RMT5").orElseThrow().copyTo(head, 0);
        int from = 3 * 300;
        Path file = changed("walking-1.c3d", "exchanged.c3d", 0, (label, xyz) -> {
            double[] other = label.equals("RHEE") ? head : label.equals("RMT5") ? heel : xyz;
            System.arraycopy(other, from, xyz, from, xyz.length - from);
        });
        Called c = fitOf(at("standing.c3d"), file);
        assertNoDefect(c);
        assertThat(c.err()).contains("exchanged.c3d RHEE: warning points.swapped: at 1.500 s it jumps by");
        assertThat(fitOf(at("standing.c3d"), Path.of(at("walking-1.c3d"))).err())
                .doesNotContain("points.swapped", "standing.");
    }

    @Test
    void markersOfTwoPeopleAreNotAveraged() throws IOException, FormatException {
        Recording walk = C3dFile.read(demo.resolve("walking-1.c3d")).toRecording();
        List<PointTrack> points = new ArrayList<>();
        for (String person : List.of("A", "B")) {
            for (PointTrack p : walk.points()) {
                double[] xyz = new double[3 * p.frames()];
                p.copyTo(xyz, 0);
                points.add(PointTrack.of(person + ":" + p.label(), xyz));
            }
        }
        Path file = Files.createDirectories(folder.resolve("changed")).resolve("two.c3d");
        C3dWriter.write(
                file,
                new Recording(
                        "two.c3d", walk.rate(), 1, walk.frames(), points, walk.platforms(), List.of(), List.of()));
        Called c = fitOf(at("standing.c3d"), file);
        assertThat(c.code()).isEqualTo(3);
        assertThat(c.err())
                .contains("two.c3d: the landmark map fits the markers of 2 people in it: A, B: put the name");
    }

    @Test
    void standingTrialWithTheSubjectAbsentIsOneLine() throws IOException, FormatException {
        Path file = changed("standing.c3d", "absent.c3d", 0, (label, xyz) -> Arrays.fill(xyz, Double.NaN));
        Called c = fitOf(file.toString(), Path.of(at("walking-1.c3d")));
        assertThat(c.code()).isEqualTo(3);
        assertThat(c.errors()).hasSize(1);
    }

    @Test
    void lostMarkersAndOddRatesNeverCrash() throws IOException, FormatException {
        Path lost = changed("walking-1.c3d", "lost.c3d", 0, (label, xyz) -> {
            if (label.startsWith("RSH") || label.equals("RTOE")) {
                Arrays.fill(xyz, 0, 3 * 600, Double.NaN);
            }
        });
        assertNoDefect(fitOf(at("standing.c3d"), lost));
        for (double rate : new double[] {0.5, 5000}) {
            for (String more : List.of("--marker-cutoff=residual", "--zero=flat")) {
                Path odd = changed("walking-1.c3d", "odd.c3d", rate, (label, xyz) -> {});
                assertNoDefect(fitOf(at("standing.c3d"), odd, more));
            }
        }
    }

    @Test
    void standingWithTheHeelRaisedIsSaidAndSeveralStandingTrialsArePooled() throws IOException, FormatException {
        Path raised = changed("standing.c3d", "raised.c3d", 0, (label, xyz) -> {
            for (int i = 2; label.endsWith("HEE") && i < xyz.length; i += 3) {
                xyz[i] += 0.06;
            }
        });
        Called c = fitOf(raised.toString(), Path.of(at("walking-1.c3d")));
        assertThat(c.err()).contains("warning standing.heel-raised", "--zero flat");
        Called pooled = fitOf(at("standing.c3d"), Path.of(at("walking-1.c3d")), "--standing", at("standing.c3d"));
        assertThat(pooled.code()).isZero();
        // independent: the same standing trial twice is the same subject
        assertThat(pooled.out())
                .isEqualTo(
                        fitOf(at("standing.c3d"), Path.of(at("walking-1.c3d"))).out());
    }

    @Test
    void zeroAndCutoffStandInTheModelAndTheCurves() throws IOException {
        Called c = fitOf(
                at("standing.c3d"), Path.of(at("walking-1.c3d")), "--zero", "flat", "--marker-cutoff", "residual");
        assertThat(c.code()).as(c.err()).isZero();
        Path out = folder.resolve("bad");
        assertThat(Files.readString(out.resolve("foot-model-right.xml")))
                .contains(
                        "<setting name=\"zero\" value=\"flat\"/>",
                        "<setting name=\"marker-cutoff\" value=\"residual\"/>");
        assertThat(Files.readString(out.resolve("fit-curves.csv"))).contains("ankle-dorsiflexion-zero-flat");
        assertThat(fitOf(at("standing.c3d"), Path.of(at("walking-1.c3d")), "--zero", "knee")
                        .code())
                .isEqualTo(2);
        assertThat(fitOf(at("standing.c3d"), Path.of(at("walking-1.c3d")), "--marker-cutoff", "12")
                        .code())
                .isEqualTo(2);
    }
}
