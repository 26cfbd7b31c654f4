package org.solewright.app.study;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static org.solewright.app.study.StudyCalls.call;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.solewright.app.pipeline.UseCaseException;
import org.solewright.app.study.StudyCalls.Called;
import org.solewright.formats.io.FormatException;
import org.solewright.formats.table.PlainTable;

class CompareCommandTest {

    @TempDir
    private Path folder;

    private Path file(String name, String text) throws IOException {
        return Files.writeString(folder.resolve(name), text, StandardCharsets.UTF_8);
    }

    private static List<SessionComparison.Row> compared(Path a, Path b) throws UseCaseException, FormatException {
        return SessionComparison.of(new SessionComparison.Side(a, "", ""), new SessionComparison.Side(b, "", ""));
    }

    @Test
    void sessionWithItselfDiffersByNothing() throws IOException, FormatException {
        file(
                "posture-cost.csv",
                "trial,step,side,push_off_J,step_length_m\nw,1,left,7.5,0.6\nw,2,left,8.25,0.61\n*,mean,,8,0.6\n");
        Called called = call("compare", folder, folder, "--out", folder.resolve("compared.csv"));
        assertThat(called.code()).isZero();
        assertThat(called.err()).isEmpty();
        assertThat(called.out()).contains("no difference worth believing").doesNotContain(" differs");
        PlainTable.Content table = PlainTable.read(folder.resolve("compared.csv"));
        assertThat(table.rows())
                .hasSize(2)
                .allMatch(r -> table.cell(r, "difference").equals("0.0"));
        assertThat(table.rows()).allMatch(r -> table.cell(r, "believable").equals("false"));
    }

    @Test
    void smallestBelievableDifferenceIsThatOfItsFormula() throws IOException, UseCaseException, FormatException {
        Path a = file("a.csv", "step,side,push_off_J,push_off_J_sd\n1,left,1,0.5\n2,left,3,0.5\n");
        Path b = file("b.csv", "step,side,push_off_J,push_off_J_sd\n1,left,11,0.5\n2,left,13,0.5\n");
        SessionComparison.Row row = compared(a, b).get(0);
        assertThat(row.difference()).isEqualTo(10);
        // Exact: both sessions have the sum of squares 2 at 1 degree of freedom, s = sqrt(4/2); published: t(0.975, 2)
        // =
        // 4.303 in any table; s^2 (1/2 + 1/2) + 0.25 + 0.25 = 2.5.
        assertThat(row.within()).isCloseTo(Math.sqrt(2), within(1e-12));
        assertThat(row.smallest()).isCloseTo(4.303 * Math.sqrt(2.5), within(2e-3));
        assertThat(row.isBelievable()).isTrue();
    }

    @Test
    void lengthWithoutSdTakesThePlacementOfTwoLandmarks() throws IOException, UseCaseException, FormatException {
        Path a = file("a.csv", "step,side,step_length_m\n1,left,0.6\n2,left,0.6\n");
        Path b = file("b.csv", "step,side,step_length_m\n1,left,0.625\n2,left,0.625\n");
        // Exact: 5 mm of each of two landmarks; the rows do not spread.
        SessionComparison.Row row = compared(a, b).get(0);
        assertThat(row.placement()).isCloseTo(0.005 * Math.sqrt(2), within(1e-12));
        assertThat(row.smallest()).isCloseTo(4.303 * Math.sqrt(2) * 0.005 * Math.sqrt(2), within(1e-5));
        assertThat(row.isBelievable()).isFalse();
    }

    @Test
    void newPlacementIsSeldomTakenForADifference() throws IOException, UseCaseException, FormatException {
        // Two sessions of the same walking in which only the two landmarks of a length were placed anew, 5 mm each.
        Random random = new Random(20261201);
        int believed = 0;
        for (int pair = 0; pair < 100; pair++) {
            believed += compared(session(random, "a.csv"), session(random, "b.csv"))
                            .get(0)
                            .isBelievable()
                    ? 1
                    : 0;
        }
        assertThat(believed).as("of 100 pairs, seed 20261201").isLessThanOrEqualTo(5);
    }

    private Path session(Random random, String name) throws IOException {
        double placed = 0.005 * (random.nextGaussian() - random.nextGaussian());
        StringBuilder text = new StringBuilder("step,side,step_length_m\n");
        for (int step = 1; step <= 6; step++) {
            text.append(step)
                    .append(",left,")
                    .append(0.6 + placed + 0.01 * random.nextGaussian())
                    .append('\n');
        }
        return file(name, text.toString());
    }

    @Test
    void subjectsOfAStudyArePaired() throws IOException, FormatException {
        Path tables = Files.createDirectories(folder.resolve("study/tables"));
        StringBuilder text = new StringBuilder("subject,session,condition,trial,step,side,push_off_J\n");
        double[] differences = {1, 2, 3};
        for (int s = 0; s < 3; s++) {
            text.append("P")
                    .append(s)
                    .append(",1,barefoot,w,1,left,")
                    .append(10 * s)
                    .append('\n');
            text.append("P")
                    .append(s)
                    .append(",1,shod,v,1,left,")
                    .append(10 * s + differences[s])
                    .append('\n');
        }
        Files.writeString(tables.resolve("transitions.csv"), text);
        Path out = folder.resolve("out.csv");
        Called called = call(
                "compare", "barefoot", "shod", "--study", folder.resolve("study"), "--by", "condition", "--out", out);
        assertThat(called.code()).isZero();
        PlainTable.Content table = PlainTable.read(out);
        List<String> row = table.rows().get(0);
        assertThat(table.cell(row, "pairs")).isEqualTo("3");
        // Exact: mean 2, SD 1; published: t(0.975, 2) = 4.303; half = 4.303/sqrt(3).
        assertThat(Double.parseDouble(table.cell(row, "paired_difference"))).isCloseTo(2, within(1e-12));
        assertThat(Double.parseDouble(table.cell(row, "paired_high")))
                .isCloseTo(2 + 4.303 / Math.sqrt(3), within(1e-3));
        // One transition in each session of a subject: nothing tells how sessions spread.
        assertThat(table.cell(row, "smallest_believable")).isEmpty();
        assertThat(call("compare", "x", "shod", "--study", folder.resolve("study"))
                        .err())
                .contains("has no transition of session x: check the name");
        assertThat(call("compare", "x", "y", "--study", folder.resolve("study"), "--by", "z")
                        .code())
                .isEqualTo(2);
    }

    @Test
    void whatIsNoTableOfTransitionsIsOneLine() throws IOException {
        Path other = file("other.csv", "a,b\n1,2\n");
        assertThat(call("compare", other, other).code()).isEqualTo(3);
        assertThat(call("compare", other, folder.resolve("none")).errors()).hasSize(1);
        assertThat(call("compare", folder.resolve("none"), other).err()).contains("no such file");
        Path text = file("text.csv", "step,side,push_off_J\n1,left,many\n");
        assertThat(call("compare", text, text).err()).contains("push_off_J 'many', expected a number");
    }
}
