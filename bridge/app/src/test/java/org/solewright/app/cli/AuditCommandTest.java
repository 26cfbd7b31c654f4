package org.solewright.app.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Locale;
import java.util.function.UnaryOperator;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.solewright.analysis.dynamics.SyntheticWalk;
import org.solewright.analysis.dynamics.WalkParameters;
import org.solewright.analysis.dynamics.WalkRecorder;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Pose;
import org.solewright.domain.geometry.Rotation;
import org.solewright.domain.geometry.Vec3;

/** The invented walk as the table of a simulation: its map proposed, its results appraised and audited, whole and spoilt. */
class AuditCommandTest {

    private static final double ASIDE = 0.1;
    private static final double[][] POINTS = {{-0.14, 0}, {0.04, 0.04}, {0.02, -0.04}};
    private static final String[] NAMES = {"heel", "metatarsal_1_head", "metatarsal_5_head"};

    @TempDir
    static Path folder;

    private record Called(int code, String out, String err) {}

    private static Called call(String... args) {
        StringWriter out = new StringWriter();
        StringWriter err = new StringWriter();
        int code = Main.run(new PrintWriter(out), new PrintWriter(err), args);
        return new Called(code, out.toString(), err.toString());
    }

    private static final SyntheticWalk WALK =
            new SyntheticWalk(new WalkParameters(70, 1.18, 2, 0.28, 0.58, 1.08, 0.4, 0.6, 9.80665));

    private static double[] load(Side side, double time) {
        double[] one = new double[3];
        int step = (int) Math.floor(time / WALK.stepTime());
        for (int foot = step - 1; foot <= step + 1; foot++) {
            if ((foot % 2 == 0) == (side == Side.RIGHT)) {
                WALK.load(foot, time, one);
                if (one[1] != 0) {
                    return one;
                }
            }
        }
        return new double[3];
    }

    /** A table of {@code seconds} at a rate; forces of the left foot may be left out. */
    static Path table(String name, double rate, double seconds, boolean hasLeft) throws IOException {
        WalkRecorder recorder = new WalkRecorder(
                WALK,
                new WalkRecorder.Settings(
                        "walk",
                        100,
                        10,
                        6,
                        true,
                        ASIDE,
                        0.5,
                        -0.05,
                        -0.82,
                        new Pose(new Rotation(Vec3.X, Vec3.Y, Vec3.Z), Vec3.ZERO)));
        StringBuilder csv = new StringBuilder("time_s,com_x_m,com_y_m,com_z_m");
        for (Side side : Side.values()) {
            for (String point : NAMES) {
                for (char axis : "xyz".toCharArray()) {
                    csv.append(',')
                            .append(side.word())
                            .append('_')
                            .append(point)
                            .append('_')
                            .append(axis)
                            .append("_m");
                }
            }
        }
        for (Side side : Side.values()) {
            if (side == Side.RIGHT || hasLeft) {
                for (String quantity : new String[] {"ground_force", "cop"}) {
                    for (char axis : "xyz".toCharArray()) {
                        csv.append(',')
                                .append(side.word())
                                .append('_')
                                .append(quantity)
                                .append('_')
                                .append(axis);
                    }
                }
            }
        }
        csv.append(",remark\n");
        double[] hip = new double[6];
        for (int i = 0; i < seconds * rate; i++) {
            double t = 0.37 + i / rate;
            WALK.hip(t, hip);
            csv.append(t).append(',').append(hip[0]).append(",0,").append(hip[1]);
            for (Side side : Side.values()) {
                double middle = side == Side.LEFT ? ASIDE : -ASIDE;
                for (int p = 0; p < NAMES.length; p++) {
                    double medial = side == Side.LEFT ? -POINTS[p][1] : POINTS[p][1];
                    Vec3 at = recorder.place(
                            new WalkRecorder.BodyPoint(
                                    "p",
                                    side,
                                    WalkRecorder.Carrier.SHANK_AND_FOOT,
                                    new Vec3(POINTS[p][0], middle + medial, -0.84)),
                            t);
                    csv.append(',')
                            .append(at.x())
                            .append(',')
                            .append(at.y())
                            .append(',')
                            .append(at.z());
                }
            }
            for (Side side : Side.values()) {
                if (side == Side.RIGHT || hasLeft) {
                    double[] f = load(side, t);
                    csv.append(',').append(f[0]).append(",0,").append(f[1]).append(',');
                    csv.append(f[1] > 0 ? f[2] + "," + (side == Side.LEFT ? ASIDE : -ASIDE) + ",0" : ",,");
                }
            }
            csv.append(",1\n");
        }
        return Files.writeString(folder.resolve(name), csv, StandardCharsets.UTF_8);
    }

    private static Called appraise(Path table, UnaryOperator<String> change, String... more) throws IOException {
        Path map = folder.resolve(table.getFileName() + ".xml");
        Called proposed = call("map", table.toString(), "--out", map.toString());
        assertThat(proposed.code()).as(proposed.err()).isZero();
        Files.writeString(map, change.apply(Files.readString(map)).replace("<results ", "<results mass=\"70\" "));
        String[] args = new String[5 + more.length];
        System.arraycopy(
                new String[] {
                    "appraise",
                    "--results",
                    map.toString(),
                    "--out",
                    folder.resolve("cost").toString()
                },
                0,
                args,
                0,
                5);
        System.arraycopy(more, 0, args, 5, more.length);
        return call(args);
    }

    @Test
    void theProposedMapOfAnInventedTableIsRightAtOnce() throws IOException {
        Path table = table("walk.csv", 250, 4, true);
        Called c = call("map", table.toString());
        assertThat(c.out())
                .contains("<axes x=\"forward\" y=\"left\" z=\"up\"/> <!-- likely")
                .contains("timeColumn=\"time_s\" timeUnit=\"s\"")
                .contains(
                        "<column name=\"com_x_m\" quantity=\"com-position\" axis=\"x\" unit=\"m\"/> <!-- com position: sure -->")
                .contains(
                        "name=\"left_heel_z_m\" quantity=\"point-position\" of=\"calcaneus_posterior\" side=\"left\" axis=\"z\"")
                .contains("quantity=\"ground-force\" side=\"right\" axis=\"y\" unit=\"N\"")
                .contains("not recognised, left out: 'remark'");
        Called whole = appraise(table, x -> x);
        // exact: loads are m (a + g) of the same walk.
        assertThat(whole.err()).doesNotContain("error audit.");
        assertThat(whole.code()).as(whole.err()).isZero();
        assertThat(whole.out()).contains("audit: force residual").contains("audit: energy residual");
        String[] lines =
                Files.readString(folder.resolve("cost/posture-cost.csv")).split("\n");
        int force = java.util.Arrays.asList(lines[0].split(",")).indexOf("audit_force_residual_bw");
        // The third transition: the first ones lie where the filter settles.
        String[] cells = lines[3].split(",", -1);
        assertThat(Double.parseDouble(cells[force])).isLessThan(1e-3);
        assertThat(Double.parseDouble(cells[force + 1])).isLessThan(1e-3);
    }

    @Test
    void whatIsSpoiltIsNamedAndEndsInOne() throws IOException {
        Path table = table("spoilt.csv", 250, 4, true);
        String forward = "name=\"right_ground_force_x\" quantity=\"ground-force\" side=\"right\" axis=\"x\" unit=\"N\"";
        Called scaled = appraise(table, x -> x.replace(forward, forward.replace("\"N\"", "\"kN\"")));
        assertThat(scaled.code()).as(scaled.err()).isEqualTo(1);
        assertThat(scaled.err())
                .contains("error audit.column-scaled: column 'right_ground_force_x'")
                .contains("times 0.001 loads and motion agree")
                .contains("error audit.force-residual");
        Called height = appraise(
                table,
                x -> x.replace(
                        "name=\"com_z_m\" quantity=\"com-position\" axis=\"z\" unit=\"m\"",
                        "name=\"com_z_m\" quantity=\"com-position\" axis=\"z\" unit=\"mm\""));
        assertThat(height.err()).contains("column 'com_z_m'").contains("times 1000 ");
        Called turned = appraise(table, x -> x, "--audit-limit", "0.05");
        assertThat(turned.code()).as(turned.err()).isZero();
        assertThat(call("appraise", "--results", "x.xml", "--audit-limit", "0").code())
                .isEqualTo(2);
    }

    @Test
    void aTurnedAxisAndAFootLeftOutAreNamedThoughNothingCanBeAppraised() throws IOException {
        Path table = table("turned.csv", 250, 4, true);
        String text = Files.readString(table);
        StringBuilder turned = new StringBuilder();
        for (String line : text.split("\n")) {
            String[] cells = line.split(",", -1);
            // Columns 24 and 30 are the vertical forces (after time, 3 of the COM, 18 of the feet, two horizontal
            // ones).
            for (int column : new int[] {24, 30}) {
                boolean isNumber = !line.startsWith("time");
                cells[column] = isNumber ? Double.toString(-Double.parseDouble(cells[column])) : cells[column];
            }
            turned.append(String.join(",", cells)).append('\n');
        }
        Files.writeString(table, turned.toString());
        Called c = appraise(table, x -> x.replaceFirst("<axes [^>]*>", "<axes x=\"forward\" y=\"left\" z=\"up\"/>"));
        assertThat(c.code()).as(c.err()).isEqualTo(1);
        assertThat(c.err())
                .contains("audit.pulling-contact")
                .contains("error audit.axis-turned: the up columns of all ground forces")
                .contains("error input.failed");
        assertThat(c.out()).contains("nothing was written");

        Called missing = appraise(table("right.csv", 250, 4, false), x -> x);
        assertThat(missing.code()).as(missing.err()).isEqualTo(1);
        assertThat(missing.err())
                .contains("error audit.force-left-out")
                .contains("the ground force of the left foot was left out");
    }

    @Test
    void tablesThatTellNothingAreRefusedInALine() throws IOException {
        Path words = Files.writeString(folder.resolve("words.txt"), "no table\nat all\n");
        Called c = call("map", words.toString());
        assertThat(c.code()).isEqualTo(3);
        assertThat(c.err().lines()).singleElement().asString().contains("no two rows of two or more numbers");
        Path bare = Files.writeString(folder.resolve("bare.txt"), "1 2 3\n2 3 4\n");
        assertThat(call("map", bare.toString()).err()).contains("has no header");
        assertThat(call("map", folder.resolve("absent.csv").toString()).code()).isEqualTo(3);
        assertThat(call("map", bare.toString(), "--out", bare.toString()).code())
                .isEqualTo(2);
    }

    @Test
    void headsOfManyKindsAreUnderstood() throws IOException {
        Path semicolons = Files.writeString(
                folder.resolve("semicolons.txt"),
                "made by a platform\nTime;LeftForceX;LeftForceY;LeftForceZ;FP2_Px;FP2_Fz;ankle_moment_r;knee angle L;odd--name-\n"
                        + "ms;N;N;N;mm;kN;N.mm;deg;1\n0;1;800;2;100;0.5;3;4;5\n2;1;800;2;101;0.5;3;4;5\n");
        Called c = call("map", semicolons.toString());
        assertThat(c.code()).as(c.err()).isZero();
        assertThat(c.out())
                .contains("delimiter=\"semicolon\" skipLines=\"3\" header=\"false\" timeColumn=\"1\" timeUnit=\"ms\"")
                .contains(
                        "<column name=\"3\" quantity=\"ground-force\" side=\"left\" axis=\"y\" unit=\"N\"/> <!-- LeftForceY")
                .contains("<column name=\"5\" quantity=\"cop\" of=\"2\" axis=\"x\" unit=\"mm\"/>")
                .contains("<column name=\"6\" quantity=\"ground-force\" of=\"2\" axis=\"z\" unit=\"kN\"/>")
                .contains("<column name=\"7\" quantity=\"joint-moment\" of=\"ankle\" side=\"right\" unit=\"N.mm\"/>")
                .contains("<column name=\"8\" quantity=\"joint-angle\" of=\"knee\" side=\"left\" unit=\"deg\"/>")
                .contains("'odd- -name-'");
        Path tabs = Files.writeString(
                folder.resolve("tabs.txt"), String.format(Locale.ROOT, "t\tFx\tFy\tFz%n0\t1\t2\t3%n1\t1\t2\t3%n"));
        assertThat(call("map", tabs.toString()).out())
                .contains("delimiter=\"tab\"")
                .contains("ground force: likely; unit N: guess");
    }
}
