package org.solewright.app.cli;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class SprawlCommandTest {

    private static final String LIMB =
            "--femur 0.06 --hip-height 0.06 --sphere-radius 0.05 --speed 0.15 --stance-time 0.4";

    @TempDir
    private Path folder = Path.of("");

    private final StringWriter out = new StringWriter();
    private final StringWriter err = new StringWriter();

    private int run(String line) {
        return Main.run(
                new PrintWriter(out),
                new PrintWriter(err),
                ("sprawl " + line + " --out " + folder.resolve("limb")).split(" "));
    }

    private List<double[]> rows(String name, int skipped) throws IOException {
        return Files.readAllLines(folder.resolve("limb").resolve(name)).stream()
                .skip(1)
                .map(l -> Arrays.stream(l.split(",", -1))
                        .skip(skipped)
                        .mapToDouble(c -> c.isEmpty() ? Double.NaN : Double.parseDouble(c))
                        .toArray())
                .toList();
    }

    @Test
    void writesTablesAndPlanView() throws IOException {
        assertThat(run(LIMB + " --protraction 40deg --segments 3")).isZero();
        double rho = Math.sqrt(0.0036 - 0.0001); // exact: femur^2 - (hip height - radius)^2
        double sine = Math.sin(Math.toRadians(40));
        List<double[]> knee = rows("knee-track.csv", 0);
        double[] first = knee.get(0);
        double[] last = knee.get(knee.size() - 1);
        // exact: the knee stands rho sin before the hip, at the end as much behind it; rounding alone
        assertThat(first[2] - first[1]).isCloseTo(rho * sine, within(1e-14));
        assertThat(last[2] - last[1]).isCloseTo(-rho * sine, within(1e-14));
        assertThat(knee.get(knee.size() / 2)[3]).isCloseTo(rho, within(1e-14));
        assertThat(knee).allSatisfy(k -> assertThat(k[4]).isEqualTo(0.05));
        List<double[]> toe = rows("toe-curve.csv", 0);
        // exact: the curve lies on the sphere and begins below the knee; tolerance of the integrator
        assertThat(toe)
                .allSatisfy(p -> assertThat(Math.sqrt(p[2] * p[2] + p[3] * p[3] + p[4] * p[4]))
                        .isCloseTo(0.05, within(1e-12)));
        assertThat(toe.get(0)[4]).isEqualTo(-0.05);
        // independent: rolling without slip, the curve is as long as the track, here the sum of its chords; both are
        // short
        // by a 24th of (spacing times curvature) squared, below 1e-4 of the length
        double track = 0;
        for (int i = 1; i < knee.size(); i++) {
            track += Math.hypot(knee.get(i)[2] - knee.get(i - 1)[2], knee.get(i)[3] - knee.get(i - 1)[3]);
        }
        assertThat(toe.get(toe.size() - 1)[1]).isCloseTo(track, within(1e-4 * track));
        List<double[]> nodes = rows("toe-segments.csv", 1);
        assertThat(nodes).hasSize(8);
        assertThat(nodes.get(7)[5]).isLessThanOrEqualTo(nodes.get(0)[5]);
        assertThat(Files.readString(folder.resolve("limb/sprawl.svg")))
                .startsWith("<svg xmlns")
                .doesNotContain("NaN")
                .endsWith("</svg>\n");
        assertThat(out.toString()).contains("knee track", "toe in 3 segments: deviation", "wrote ");
        assertThat(err.toString()).isEmpty();
    }

    @Test
    void radiansAreDegreesWithoutAWord() throws IOException {
        assertThat(run(LIMB + " --protraction " + Math.toRadians(40))).isZero();
        byte[] radians = Files.readAllBytes(folder.resolve("limb/knee-track.csv"));
        assertThat(run(LIMB + " --protraction 40deg")).isZero();
        assertThat(Files.readAllBytes(folder.resolve("limb/knee-track.csv"))).isEqualTo(radians);
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            value = {
                "--femur 0.005 --hip-height 0.06 --sphere-radius 0.05 --speed 0.15 --stance-time 0.4 --protraction 0.7"
                        + "|sprawl: FEMUR_TOO_SHORT, femur 0.005 m, expected more than",
                "--femur 0.06 --hip-height 0.06 --sphere-radius 0 --speed 0.15 --stance-time 0.4 --protraction 0.7"
                        + "|--sphere-radius: is 0.0 m: give a number above 0",
                "--femur 1 --hip-height 0.06 --sphere-radius 1e-9 --speed 9 --stance-time 9 --protraction 0.1"
                        + "|sprawl: NO_SOLUTION, track of",
                LIMB + " --protraction 91deg|--protraction: is",
                LIMB + " --protraction wide|--protraction: is 'wide'",
                LIMB + " --protraction 0.7 --segments 0|--segments: is 0",
                LIMB + " --protraction 0.7 --segments 61|--segments: is 61",
            })
    void aLimbThatCannotBeIsOneLine(String line, String message) {
        assertThat(run(line)).isEqualTo(2);
        assertThat(err.toString()).startsWith("solewright: " + message).hasLineCount(1);
        assertThat(out.toString()).isEmpty();
        assertThat(folder.resolve("limb")).doesNotExist();
    }
}
