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
        assertThat(given.subList(9, 13)).containsOnly("");
        assertThat(err.toString()).contains("note postures.index-later");
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
                "--leg 0.9 --foot 0.2 --mass 70 --speed 1 --model m.xml",
                "--leg long --foot 0.2 --mass 70 --speed 1"
            })
    void wrongUseIsOneLineAndCode2(String line) {
        assertThat(run(line)).isEqualTo(2);
        assertThat(out.toString()).isEmpty();
        assertThat(err.toString().lines()).hasSize(1);
    }

    @Test
    void missingModelIsOneLineAndCode3() {
        assertThat(run("--model " + folder.resolve("none.xml") + " --speed 1")).isEqualTo(3);
        assertThat(err.toString().lines()).hasSize(1);
        assertThat(err.toString()).contains("no such file");
    }
}
