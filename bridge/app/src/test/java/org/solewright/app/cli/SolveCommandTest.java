package org.solewright.app.cli;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.json.JsonMapper;
import java.io.IOException;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class SolveCommandTest {

    private static final String STEP = "{\"id\": \"a\", \"question\": \"transition.step\", \"inputs\": {%s}}";
    private static final String GEOMETRY = "\"segments\": 1, \"stepLength\": 0.6, \"limbLength\": 0.9";

    @TempDir
    private Path folder = Path.of("");

    private final StringWriter out = new StringWriter();
    private final StringWriter err = new StringWriter();

    private int solve(String json, String... more) throws IOException {
        Path file = folder.resolve("questions.json");
        Files.writeString(file, json);
        String[] args = new String[2 + more.length];
        args[0] = "solve";
        args[1] = file.toString();
        System.arraycopy(more, 0, args, 2, more.length);
        return run(args);
    }

    private int run(String... args) {
        return Main.run(new PrintWriter(out), new PrintWriter(err), args);
    }

    private JsonNode answer(int index) throws IOException {
        return new JsonMapper().readTree(out.toString()).get(index);
    }

    @Test
    void oneQuestionIsAnsweredInAnArray() throws IOException {
        int code = solve(String.format(STEP, GEOMETRY + ", \"footLength\": 0.2, \"speed\": 1.25, \"mass\": 70"));
        assertThat(code).isZero();
        assertThat(err.toString()).isEmpty();
        JsonNode a = answer(0);
        assertThat(a.get("id").asText()).isEqualTo("a");
        assertThat(a.get("question").asText()).isEqualTo("transition.step");
        assertThat(a.get("outputs")).hasSize(5); // all five forms where none is named
        // exact: foot 0.2 and 0.4 over radius 0.7, m g D with standard gravity
        double inner = 0.04 / 0.49;
        double last = 0.16 / 0.49;
        double work = (inner / (4 - inner) + last / (4 - last)) * 70 * 1.25 * 1.25 / 2;
        JsonNode push = a.get("outputs").get("pushOff");
        assertThat(push.get("workPerStep").asDouble()).isCloseTo(work, within(1e-13));
        assertThat(push.get("costOfTransport").asDouble()).isCloseTo(work / (70 * 9.80665 * 0.6), within(1e-15));
    }

    @Test
    void unusedInputsAreListed() throws IOException {
        solve(String.format(
                STEP,
                GEOMETRY + ", \"footRule\": \"equal\", \"footLength\": \"long\", \"colour\": \"red\", \"shoe\": null,"
                        + " \"speed\": 1, \"mass\": 70, \"workForm\": \"noPush\""));
        assertThat(answer(0).get("ignored").toString()).isEqualTo("[\"footLength\",\"colour\"]");
        assertThat(answer(0).get("outputs").has("noPush")).isTrue();
        assertThat(answer(0).get("outputs")).hasSize(1);
    }

    @Test
    void geometryIsTestedBeforeMissingSpeed() throws IOException {
        assertThat(solve(String.format(STEP, GEOMETRY + ", \"footLength\": 0.7")))
                .isZero();
        assertThat(answer(0).get("outputs").get("error").asText()).isEqualTo("STEP_NOT_LONGER_THAN_FOOT");
        assertThat(answer(0).get("outputs").get("message").asText()).contains("0.6", "0.7");
        assertThat(err.toString()).isEmpty();
    }

    @Test
    void callersErrorsAreNamedAndTheOthersAnswered() throws IOException {
        int code = solve("{\"records\": [" + String.format(STEP, GEOMETRY) + ","
                + "{\"id\": 7, \"question\": \"walker.run\", \"inputs\": {}},"
                + "{\"id\": \"t\", \"question\": \"transition.halving\", \"inputs\": {\"stepLength\": \"NaN\","
                + " \"limbLength\": 0.9}},"
                + "{\"question\": \"transition.halving\", \"inputs\": {\"stepLength\": 0.6, \"limbLength\": 0.9}}, 3,"
                + "{\"question\": \"transition.stepp\"}]}");
        assertThat(code).isEqualTo(1);
        assertThat(answer(0).get("outputs").get("error").asText()).isEqualTo("MISSING_INPUT");
        assertThat(answer(0).get("outputs").get("message").asText()).contains("'speed'");
        assertThat(answer(1).get("outputs").get("error").asText()).isEqualTo("UNKNOWN_QUESTION");
        assertThat(answer(1).get("outputs").get("message").asText()).contains("there is no question 'walker.run'");
        assertThat(answer(1).get("id").asInt()).isEqualTo(7);
        assertThat(answer(2).get("outputs").get("error").asText()).isEqualTo("WRONG_TYPE");
        assertThat(answer(3).get("outputs").get("simultaneous").asDouble()).isEqualTo(0.5);
        assertThat(answer(4).get("outputs").get("error").asText()).isEqualTo("WRONG_TYPE");
        assertThat(err.toString().lines()).hasSize(5);
        assertThat(answer(5).get("outputs").get("message").asText())
                .isEqualTo("there is no question 'transition.stepp', did you mean 'transition.step'?");
        assertThat(err.toString().lines().toList().get(0))
                .startsWith("solewright: ")
                .contains("question a: MISSING_INPUT: input 'speed' is not given");
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "",
                "   ",
                "{",
                "[1, 2",
                "nonsense",
                "{\"a\": NaN}",
                "\"text\"",
                "17",
                "null",
                "{\"records\": 3}",
                "{\"records\": {\"id\": 1}}",
                "{\"id\": 1} {\"id\": 2}",
                "{\"id\": 1, \"id\": 2}",
                "\u0000\u0001",
                "[{\"id\": \"\\ud800"
            })
    void whatIsNoFileOfQuestionsIsOneLineAndCode3(String text) throws IOException {
        assertThat(solve(text)).isEqualTo(3);
        assertThat(out.toString()).isEmpty();
        assertThat(err.toString().lines()).hasSize(1);
        assertThat(err.toString()).startsWith("solewright: ").doesNotContain("Exception");
    }

    @Test
    void deepNestingAndLongNumbersAreOneLineAndCode3() throws IOException {
        assertThat(solve("[".repeat(200_000))).isEqualTo(3);
        assertThat(solve("[" + "9".repeat(100_000) + "]")).isEqualTo(3);
        assertThat(err.toString().lines()).hasSize(2);
    }

    @Test
    void hugeAndTinyNumbersAreAnsweredWithACode() throws IOException {
        String[] numbers = {"1e308", "1e999", "-1e308", "1e-300", "0", "-0.0", "1" + "0".repeat(400)};
        StringBuilder records = new StringBuilder("[");
        for (String a : numbers) {
            for (String b : numbers) {
                for (String question : new String[] {
                    "transition.step",
                    "rolling.arc",
                    "rolling.short-arc",
                    "rolling.equivalent-arc",
                    "transition.equal-cost",
                    "transition.series-share",
                    "trial.synthetic"
                }) {
                    records.append(records.length() > 1 ? "," : "")
                            .append(String.format(
                                    "{\"question\": \"%s\", \"inputs\": {\"segments\": 2, \"stepLength\": %s,"
                                            + " \"limbLength\": %s, \"footLength\": %s, \"arcRadius\": %s,"
                                            + " \"arcHalfAngle\": %s, \"stepFactor\": %s, \"mass\": %s, \"speed\": %s,"
                                            + " \"referenceSpeed\": %s, \"footRule\": \"optimum\"}}",
                                    question, a, b, a, b, a, a, b, a, a));
                }
            }
        }
        int code = solve(records.append("]").toString());
        assertThat(code).isBetween(0, 1);
        assertThat(out.toString()).doesNotContain("\"NaN\"").doesNotContain("\"Infinity\"");
        assertThat(new JsonMapper().readTree(out.toString())).hasSize(7 * 7 * 7);
    }

    @Test
    void degeneratePointsHaveACodeInTheirPlace() throws IOException {
        solve(
                "[{\"question\": \"fit.circle\", \"inputs\": {\"points\": [[0, 0], [1, 1]]}},"
                        + "{\"question\": \"fit.circle\", \"inputs\": {\"points\": [[0, 0], [1, 1], [2, 2], [3, 3]]}},"
                        + "{\"question\": \"fit.circle\", \"inputs\": {\"points\": [[1, 1], [1, 1], [1, 1]]}},"
                        + "{\"question\": \"fit.circle\", \"inputs\": {\"points\": [[1, 0], [0, 1], [-1, 0]]}},"
                        + "{\"question\": \"fit.circle\", \"inputs\": {\"points\": [[1, 0], [0, 1], [-1]]}},"
                        + "{\"question\": \"fit.circle\", \"inputs\": {\"points\": [[1e59, 0], [0, 1e59], [-1e59, 1], [3, 4]]}}]");
        assertThat(answer(0).get("outputs").get("error").asText()).isEqualTo("TOO_FEW_POINTS");
        assertThat(answer(1).get("outputs").get("geometric").asText()).isEqualTo("NO_SOLUTION");
        assertThat(answer(2).get("outputs").get("kasa").asText()).isEqualTo("NO_SOLUTION");
        // exact: unit circle; three points leave nothing to judge the scatter by
        assertThat(answer(3).get("outputs").get("geometric").get("radius").asDouble())
                .isCloseTo(1, within(1e-12));
        assertThat(answer(3).get("outputs").get("geometric").get("sigma").asText())
                .isEqualTo("TOO_FEW_POINTS");
        assertThat(answer(4).get("outputs").get("error").asText()).isEqualTo("WRONG_TYPE");
        assertThat(out.toString()).doesNotContain("\"NaN\"").doesNotContain("\"Infinity\"");
    }

    @Test
    void equalCostHasACodeInThePlaceOfTheStepThatDoesNotExist() throws IOException {
        solve("[{\"question\": \"transition.equal-cost\", \"inputs\": {\"segments\": 1, \"limbLength\": 0.9,"
                + " \"stepFactor\": 1.5, \"workForm\": \"noPush\"}},"
                + "{\"question\": \"transition.equal-cost\", \"inputs\": {\"segments\": 0, \"limbLength\": 0.9,"
                + " \"stepFactor\": 1.5, \"workForm\": \"noPush\"}},"
                + "{\"question\": \"transition.equal-cost\", \"inputs\": {\"segments\": 1, \"limbLength\": 0.9,"
                + " \"stepFactor\": 0.3}}]");
        // exact: two transitions of the equal-vault foot lose up to 1 each, the optimum foot is none at D > L: up to 1
        assertThat(answer(0).get("outputs").get("equal").has("stepLength")).isTrue();
        assertThat(answer(0).get("outputs").get("optimum").asText()).isEqualTo("NO_SOLUTION");
        assertThat(answer(1).get("outputs").get("error").asText()).isEqualTo("NO_SOLUTION");
        assertThat(answer(2).get("outputs")).hasSize(5);
    }

    @Test
    void byteOrderMarkAndEmptyListAreAccepted() throws IOException {
        assertThat(solve("\ufeff[]")).isZero();
        assertThat(out.toString()).isEqualTo("[]\n");
    }

    @Test
    void missingFileAndFolderAreOneLineAndCode3() {
        assertThat(run("solve", folder.resolve("none.json").toString())).isEqualTo(3);
        assertThat(run("solve", folder.toString())).isEqualTo(3);
        assertThat(err.toString().lines()).hasSize(2);
        assertThat(err.toString()).contains("none.json: no such file: ").contains(": a folder: ");
    }

    @Test
    void answersGoToAFileWholeOrNotAtAll() throws IOException {
        Path target = folder.resolve("answers.json");
        assertThat(solve("[]", "--out", target.toString())).isZero();
        assertThat(Files.readString(target, StandardCharsets.UTF_8)).isEqualTo("[]\n");
        assertThat(out.toString()).isEmpty();
        assertThat(solve("[]", "--out", folder.resolve("no/such/answers.json").toString()))
                .isEqualTo(4);
        assertThat(err.toString().lines()).hasSize(1);
        try (var files = Files.list(folder)) {
            assertThat(files).hasSize(2);
        }
    }

    @Test
    void sameQuestionsSameBytes() throws IOException {
        String question = String.format(STEP, GEOMETRY + ", \"footRule\": \"optimum\", \"speed\": 1, \"mass\": 70");
        solve(question);
        String first = out.toString();
        out.getBuffer().setLength(0);
        solve(question);
        assertThat(out.toString()).isEqualTo(first);
    }
}
