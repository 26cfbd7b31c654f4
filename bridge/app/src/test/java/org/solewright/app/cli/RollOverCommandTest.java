package org.solewright.app.cli;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.solewright.domain.motion.Recording;
import org.solewright.formats.c3d.C3dFile;
import org.solewright.formats.c3d.C3dWriter;
import org.solewright.formats.io.FormatException;

/** The roll-over check sheet of the demo's invented walk, and what it says of bad input. */
class RollOverCommandTest extends DemoCalls {

    private static Called check(String model, String walking, String... more) {
        List<String> args = new ArrayList<>(List.of(
                "rollover",
                "--model",
                model,
                "--walking",
                walking,
                "--landmarks",
                at("landmarks.xml"),
                "--marker-low-pass",
                "0"));
        args.addAll(Arrays.asList(more));
        return call(args.toArray(String[]::new));
    }

    private static double value(Path sheet, String start) throws IOException {
        try (Stream<String> lines = Files.lines(sheet)) {
            return lines.filter(l -> l.startsWith(start))
                    .map(l -> Double.parseDouble(l.split(",", -1)[5]))
                    .findFirst()
                    .orElseThrow();
        }
    }

    @Test
    void sheetHoldsTheInventedWalk() throws IOException {
        Path sheet = demo.resolve("rollover.csv");
        // exact: a stiff foot of 0.28 m from first to last pivot, 0.31 m long; samples under 50 N are left out, which
        // costs less than a sample's travel.
        assertThat(value(sheet, "*,mean,right,cop_path,")).isCloseTo(0.28, within(0.002));
        assertThat(value(sheet, "*,mean,right,cop_path_over_foot_length,")).isCloseTo(0.28 / 0.31, within(0.007));
        assertThat(value(sheet, "*,mean,left,effective_foot_length,")).isCloseTo(0.28, within(0.002));
        // exact: the stiff ankle does not move; the pivots lie at both ends and the middle of the foot.
        assertThat(value(sheet, "*,mean,left,lock_ankle_angle,")).isCloseTo(0, within(1e-3));
        assertThat(value(sheet, "*,mean,left,pivot_2_position,") - value(sheet, "*,mean,left,pivot_1_position,"))
                .isCloseTo(0.14, within(0.001));
        String text = Files.readString(sheet);
        assertThat(text)
                .contains("Heel bore load 0-")
                .contains("published")
                .contains("caution")
                .doesNotContain("plantigrade");
        String xml = Files.readString(demo.resolve("rollover.xml"));
        assertThat(xml)
                .contains("urn:solewright:rollover:1")
                .contains("role=\"model\"")
                .contains("Not a medical device")
                .doesNotContain("plantigrade");
    }

    @Test
    void curvesHaveTheirPointsMeansAndEvents() throws IOException {
        List<String> lines = Files.readAllLines(demo.resolve("rollover-curves.csv"));
        assertThat(lines.get(0)).isEqualTo("trial,step,side,curve,unit,percent,mean,sd,n");
        for (String curve : List.of(
                "foot-floor-angle,deg",
                "cop-along-foot,m",
                "cop-foot-forward,m",
                "roll-over-shank-forward,m",
                "roll-over-limb-up,m",
                "vertical-force,N",
                "ankle-dorsiflexion,deg")) {
            assertThat(lines.stream().filter(l -> l.startsWith("*,mean,right," + curve + ",")))
                    .as(curve)
                    .hasSize(101)
                    .allMatch(l -> l.endsWith(",2") || l.endsWith(",0") || l.endsWith(",1"));
        }
        assertThat(lines).anyMatch(l -> l.startsWith("*,mean,left,event-heel-rise,%,"));
    }

    @Test
    void sameCallGivesTheSameBytesAndOneStanceSaysSo() throws IOException {
        Path once = folder.resolve("once");
        Path again = folder.resolve("again");
        for (Path out : List.of(once, again)) {
            Called c = check(at("foot-model-left.xml"), at("walking-1.c3d"), "--side", "left", "--out", out.toString());
            assertThat(c.code()).as(c.err()).isZero();
            assertThat(c.err()).contains("note rollover.one-stance");
        }
        for (String name : List.of("rollover.csv", "rollover.xml", "rollover-curves.csv")) {
            assertThat(Files.readAllBytes(once.resolve(name))).isEqualTo(Files.readAllBytes(again.resolve(name)));
        }
        assertThat(Files.readString(once.resolve("rollover.csv")))
                .contains("within-stance")
                .doesNotContain("between-stances")
                .doesNotContain("consistency,deg");
    }

    @Test
    void animalHasAPostureAndNoFiguresOfPeople() throws IOException {
        Path model = folder.resolve("animal.xml");
        Files.writeString(
                model,
                Files.readString(demo.resolve("foot-model-right.xml"))
                        .replace("population=\"adult\"", "population=\"other\""));
        Path out = folder.resolve("animal");
        Called c = check(model.toString(), at("walking-1.c3d"), "--floor", "0", "--out", out.toString());
        assertThat(c.code()).as(c.err()).isZero();
        assertThat(Files.readString(out.resolve("rollover.csv")))
                .contains(",posture,,,,,,,,,plantigrade")
                .doesNotContain("published");
        assertThat(Files.readString(out.resolve("rollover.xml"))).contains("posture=\"plantigrade\"");
    }

    @Test
    void stanceThatTheUserTakesOutIsLeftOut() throws IOException {
        Path contacts = folder.resolve("edited.csv");
        List<String> rows = new ArrayList<>(Files.readAllLines(demo.resolve("fit-contacts.csv")));
        rows.replaceAll(
                r -> r.startsWith("walking-1,right") ? r.replaceFirst(",true,([^,]*),,", ",false,,$1,by hand") : r);
        Files.write(contacts, rows);
        Path out = folder.resolve("without");
        Called c = check(
                at("foot-model-right.xml"),
                at("walking-1.c3d"),
                "--contacts",
                contacts.toString(),
                "--out",
                out.toString());
        assertThat(c.code()).as(c.err()).isZero();
        assertThat(c.err()).contains("warning rollover.stance-left-out");
        assertThat(Files.readString(out.resolve("rollover.csv")))
                .contains(",not_whole,,,,,,,,,by hand")
                .contains("Foot flat is not known.")
                .doesNotContain("heel_rise,%");
    }

    @Test
    void badInputIsOneLine() throws IOException, FormatException {
        Path bare = folder.resolve("bare.xml");
        Files.writeString(
                bare, Files.readString(demo.resolve("foot-model-right.xml")).replaceAll("<landmark [^>]*/>", ""));
        Recording walk = C3dFile.read(demo.resolve("walking-1.c3d")).toRecording();
        Path flat = folder.resolve("no-platform.c3d");
        C3dWriter.write(
                flat,
                new Recording(
                        "no-platform.c3d",
                        walk.rate(),
                        1,
                        walk.frames(),
                        walk.points(),
                        List.of(),
                        List.of(),
                        List.of()));
        String right = at("foot-model-right.xml");
        String first = at("walking-1.c3d");
        refused(check(bare.toString(), first), 3, "holds no landmarks");
        refused(check(right, flat.toString()), 3, "holds no force platform");
        refused(check(right, at("standing.c3d")), 3, "standing.c3d");
        refused(check(first, right), 3, "walking-1.c3d");
        refused(check(right, right), 3, "foot-model-right.xml");
        refused(check(right, first, "--side", "left"), 2, "of which no model is given");
        refused(check(right, first, "--side", "both-of-them"), 2, "is unknown");
        refused(check(right, first, "--model", right), 2, "is the second model of the right side");
        refused(check(right, first, "--annotate", folder.toString()), 2, "is not for rollover");
        refused(call("rollover", "--walking", first), 2, "--model");
    }

    private static void refused(Called c, int code, String said) {
        assertThat(c.code()).as(c.err()).isEqualTo(code);
        assertThat(c.errors()).as(c.err()).hasSize(1);
        assertThat(c.err()).startsWith("solewright: ").contains(said);
    }
}
