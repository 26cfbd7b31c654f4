package org.solewright.app.cli;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class PosturesCommandTest {

    private static final String HEADER =
            "segments,foot_rule,leg_m,foot_m,step_length_m,speed_m_s,work_form,work_per_step_J,cost_of_transport,"
                    + "index_work,index_swing,index_activation,index_total,crossover_step_length_m";

    @TempDir
    private Path folder = Path.of("");

    private final StringWriter out = new StringWriter();
    private final StringWriter err = new StringWriter();

    private int run(String line) {
        return Main.run(new PrintWriter(out), new PrintWriter(err), ("postures " + line).split(" "));
    }

    private List<String> row(String start) {
        return out.toString()
                .lines()
                .filter(l -> l.startsWith(start))
                .map(l -> List.of(l.split(",", -1)))
                .findFirst()
                .orElseThrow();
    }

    @Test
    void oneStepHasARowPerSegmentsRuleAndForm() {
        assertThat(run("--leg 0.9 --foot 0.2 --mass 70 --speed 1.25 --step 0.6"))
                .isZero();
        List<String> lines = out.toString().lines().toList();
        assertThat(lines.get(0)).isEqualTo(HEADER);
        assertThat(lines).hasSize(1 + 7 * 3 * 5);
        // independent: design's worked answer for N = 1, f = 0.2, D = 0.6, L = 0.9, v = 1.25, m = 70: 6.000434027777778
        // J
        List<String> given = row("1,given,0.9,0.2,0.6,1.25,pushOff,");
        assertThat(Double.parseDouble(given.get(7))).isCloseTo(6.000434027777778, within(1e-12));
        // independent: N = 1, small angle and simultaneous, a = (0.7/0.9)^2: (f/(1-a))(1 + sqrt(1 - 2(1-a)))
        double b = 1 - 0.49 / 0.81;
        double crossover = 0.2 / b * (1 + Math.sqrt(1 - 2 * b));
        assertThat(Double.parseDouble(
                        row("1,given,0.9,0.2,0.6,1.25,simultaneous,").get(13)))
                .isCloseTo(crossover, within(1e-12));
        // design 04 A7: push crossover of one equal-vault segment 0.6202041029 L
        assertThat(Double.parseDouble(row("1,equal,0.9,0.3,0.6,1.25,pushOff,").get(13)))
                .isCloseTo(0.6202041029 * 0.9, within(1e-10));
        assertThat(row("1,optimum,").get(13)).isEqualTo("0.9"); // exact: D = L
        // exact: c_w = 4 times the cost of transport; C_a L (N + 1)/D = 0.0023110945278763478 * 0.9 * 2/0.6
        assertThat(Double.parseDouble(given.get(9))).isCloseTo(4 * Double.parseDouble(given.get(8)), within(1e-15));
        assertThat(Double.parseDouble(given.get(11))).isCloseTo(0.0023110945278763478 * 3, within(1e-15));
        // exact: C_s sqrt(gL) (D/L) (v/D)^4 (L/g)^2/v
        double swing = 0.0936125733749551
                * Math.sqrt(9.80665 * 0.9)
                * (0.6 / 0.9)
                * Math.pow(1.25 / 0.6, 4)
                * Math.pow(0.9 / 9.80665, 2)
                / 1.25;
        assertThat(Double.parseDouble(given.get(10))).isCloseTo(swing, within(1e-15));
        assertThat(Double.parseDouble(given.get(12)))
                .isCloseTo(
                        given.subList(9, 12).stream()
                                .mapToDouble(Double::parseDouble)
                                .sum(),
                        within(1e-15));
    }

    @Test
    void withoutAStepThereIsARangeAndOutOfReachRowsAreEmpty() {
        assertThat(run("--leg 0.9 --foot 0.2 --mass 70 --speed 1.25")).isZero();
        assertThat(out.toString().lines()).hasSize(1 + 7 * 3 * 5 * 17);
        out.getBuffer().setLength(0);
        assertThat(run("--leg 0.9 --foot 0.7 --mass 70 --speed 1.25 --from 0.6 --to 0.8 --by 0.1"))
                .isZero();
        assertThat(out.toString().lines()).hasSize(1 + 7 * 3 * 5 * 3);
        assertThat(row("1,given,0.9,0.7,0.6,1.25,pushOff").get(7)).isEmpty();
        assertThat(err.toString()).contains("STEP_NOT_LONGER_THAN_FOOT");
    }

    @Test
    void tableGoesToAFile() throws IOException {
        Path file = folder.resolve("landscape.csv");
        assertThat(run("--leg 0.9 --foot 0.2 --mass 70 --speed 1.25 --step 0.6 --out " + file))
                .isZero();
        assertThat(Files.readString(file)).startsWith(HEADER + "\n");
        assertThat(out.toString()).isEmpty();
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "--leg 0.9 --foot 0.2 --mass 70",
                "--foot 0.2 --mass 70 --speed 1",
                "--leg 0.9 --foot 0.2 --speed 1",
                "--leg -1 --foot 0.2 --mass 70 --speed 1",
                "--leg NaN --foot 0.2 --mass 70 --speed 1",
                "--leg 0.9 --foot -0.2 --mass 70 --speed 1",
                "--leg 0.9 --foot 0.2 --mass 0 --speed 1",
                "--leg 0.9 --foot 0.2 --mass 70 --speed Infinity",
                "--leg 0.9 --foot 0.2 --mass 70 --speed 1 --step 0",
                "--leg 0.9 --foot 0.2 --mass 70 --speed 1 --by 1e-9",
                "--leg 0.9 --foot 0.2 --mass 70 --speed 1 --step 0.5 --by 0.1",
                "--leg 0.9 --foot 0.2 --mass 70 --speed 1 --series-share 2",
                "--leg 0.9 --foot 0.2 --mass 70 --speed 1:2",
                "--leg 0.9 --foot 0.2 --mass 70 --speed 2:1:0.1",
                "--leg 0.9 --foot 0.2 --mass 70 --speed 1:2:0",
                "--leg 0.9 --foot 0.2 --mass 70 --speed NaN:1:1",
                "--leg 0.9 --foot 0.2 --mass 70 --speed 1 --segments 1.5",
                "--leg 0.9 --foot 0.2 --mass 70 --speed 1 --segments -1",
                "--leg 0.9 --foot 0.2 --mass 70 --speed 1 --foot-rule best",
                "--leg 0.9 --foot 0.2 --mass 70 --speed 0.5:2:0.001 --step 0.3:0.9:0.0001",
                "--leg 0.9 --foot 0.2 --mass 70 --speed 1 --postures p.csv",
                "--leg 0.9 --foot 0.2 --mass 70 --speed 1 --step 0.6 --plot p.svg",
                "--leg 0.9 --foot 0.2 --mass 70 --speed 1 --out p.csv --plot p.svg",
                "--leg 0.9 --foot 0.2 --mass 70 --speed 1 --model m.xml",
                "--leg long --foot 0.2 --mass 70 --speed 1"
            })
    void wrongUseIsOneLineAndCode2(String line) {
        assertThat(run(line)).isEqualTo(2);
        assertThat(out.toString()).isEmpty();
        assertThat(err.toString().lines()).hasSize(1);
    }

    @Test
    void rangesOfSpeedSegmentsAndRule() {
        assertThat(run("--leg 0.9 --foot 0.2 --mass 70 --speed 0.8:1.2:0.2 --segments 1:3:1 --foot-rule equal"
                        + " --step 0.5:0.7:0.1 --step 0.75"))
                .isZero();
        assertThat(out.toString().lines()).hasSize(1 + 3 * 3 * 4 * 5);
        assertThat(row("3,equal,0.9,0.5625,0.75,0.8,pushOff,").get(7)).isNotEmpty();
    }

    @Test
    void cheapestStepIsThatOfTheDesignsTable() throws IOException {
        Path file = folder.resolve("optima.csv");
        assertThat(run("--leg 0.9 --foot 0.2 --mass 70 --speed 1.25 --gravity 9.81 --step 0.6 --optimum " + file))
                .isZero();
        List<String> lines = Files.readAllLines(file);
        assertThat(lines).hasSize(1 + 7 * 3 * 5);
        // design 04 B, table: L = 0.9 m, 1.25 m/s, "opt 3" and "eq 2", four decimals printed
        assertThat(optimumStep(lines, "3,optimum,")).isCloseTo(0.5780, within(5e-5));
        assertThat(optimumStep(lines, "2,equal,")).isCloseTo(0.5293, within(5e-5));
        assertThat(optimumStep(lines, "0,optimum,")).isCloseTo(0.5853, within(5e-5));
    }

    private static double optimumStep(List<String> lines, String start) {
        return lines.stream()
                .filter(l -> l.startsWith(start) && l.contains(",pushOff,"))
                .mapToDouble(l -> Double.parseDouble(l.split(",", -1)[6]))
                .findFirst()
                .orElseThrow();
    }

    @Test
    void legsAndFeetOfConstantWorkCostTheSame() throws IOException {
        Path file = folder.resolve("same.csv");
        assertThat(run("--leg 0.9 --foot 0.2 --mass 70 --speed 1.25 --step 0.6 --segments 0:3:1 --constant-work "
                        + file))
                .isZero();
        List<String> lines = Files.readAllLines(file);
        // exact: one limb without segments, 20 feet with each of 1 to 3, in five forms
        assertThat(lines).hasSize(1 + 5 * (1 + 3 * 20));
        for (String line : lines.subList(1, lines.size())) {
            List<String> cells = List.of(line.split(",", -1));
            int n = Integer.parseInt(cells.get(0));
            double foot = Double.parseDouble(cells.get(6));
            double l = Double.parseDouble(cells.get(5)) - foot;
            double inner = n == 0 ? 0 : Math.pow(foot / n / l, 2);
            double last = Math.pow((0.6 - foot) / l, 2);
            double factor = n * factor(cells.get(1), inner) + factor(cells.get(1), last);
            // independent: the formulas of design 04 A3 written again
            assertThat(factor * 70 * 1.25 * 1.25 / 2)
                    .as(line)
                    .isCloseTo(Double.parseDouble(cells.get(4)), within(1e-9));
        }
    }

    private static double factor(String form, double q) {
        return switch (form) {
            case "noPush" -> q * (1 - q / 4);
            case "pushOff" -> q / (4 - q);
            case "simultaneous" -> q / 2;
            case "noPushSmallAngle" -> q;
            default -> q / 4;
        };
    }

    @Test
    void plotHasATableBesideItAndMarksCrossovers() throws IOException {
        Path file = folder.resolve("plot.svg");
        assertThat(run("--leg 0.9 --foot 0.2 --mass 70 --speed 1.25 --plot " + file))
                .isZero();
        String svg = Files.readString(file);
        assertThat(svg).contains("<title id=\"title\">", "<desc id=\"desc\">", "stroke-dasharray", "6 segments");
        // exact: crossings of 1 to 6 segments, all below the longest step of 1.1 limb lengths (04 A7: 0.62 to 0.75)
        assertThat(svg.split("<circle", -1)).hasSize(7);
        assertThat(svg).contains("1 segment: crossover at 0.6202 limb lengths");
        assertThat(svg).doesNotContain("NaN", "Infinity");
        List<String> table = Files.readAllLines(folder.resolve("plot.csv"));
        assertThat(table.get(0)).isEqualTo(HEADER);
        assertThat(table).hasSize(1 + 7 * 17);
    }

    @Test
    void missingModelIsOneLineAndCode3() {
        assertThat(run("--model " + folder.resolve("none.xml") + " --speed 1")).isEqualTo(3);
        assertThat(err.toString().lines()).hasSize(1);
        assertThat(err.toString()).contains("no such file");
    }
}
