package org.solewright.app.pipeline;

import static org.assertj.core.api.Assertions.assertThat;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.json.JsonMapper;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Iterator;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Stream;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestFactory;
import org.solewright.formats.io.FormatException;

/**
 * The worked answers of the design, independent of this program: a number agrees where it differs from its reference by no
 * more than the record's tolerance times the reference plus 1e-10.
 */
class WorkedAnswersTest {

    private static final double FLOOR = 1e-10;

    private static Optional<JsonNode> checks() throws IOException {
        Optional<Path> file = SharedFolder.find().map(f -> f.resolve("design").resolve("solver-checks.json"));
        return file.isPresent() && file.get().toFile().isFile()
                ? Optional.of(new JsonMapper().readTree(file.get().toFile()))
                : Optional.empty();
    }

    @TestFactory
    Stream<DynamicTest> everyRecordAgrees() throws IOException, FormatException {
        Optional<JsonNode> checks = checks();
        assumeTrue(checks.isPresent(), "solver-checks.json is not beside the checkout: worked answers not compared");
        List<DynamicTest> tests = new ArrayList<>();
        for (JsonNode record : checks.get().get("records")) {
            tests.add(DynamicTest.dynamicTest(record.get("id").asText(), () -> agree(record)));
        }
        assertThat(tests).hasSizeGreaterThan(140);
        return tests.stream();
    }

    @Test
    void theWholeFileIsAnsweredInItsOrder() throws IOException, FormatException {
        Optional<JsonNode> checks = checks();
        assumeTrue(checks.isPresent(), "solver-checks.json is not beside the checkout: worked answers not compared");
        SolveQuestions.Answers answers =
                new SolveQuestions().answer("checks", checks.get().toString().getBytes(StandardCharsets.UTF_8));
        JsonNode list = new JsonMapper().readTree(answers.json());
        assertThat(list).hasSameSizeAs(checks.get().get("records"));
        for (int i = 0; i < list.size(); i++) {
            JsonNode record = checks.get().get("records").get(i);
            assertThat(list.get(i).get("id")).isEqualTo(record.get("id"));
        }
    }

    private static void agree(JsonNode record) throws IOException, FormatException {
        String json = new SolveQuestions()
                .answer("record", record.toString().getBytes(StandardCharsets.UTF_8))
                .json();
        JsonNode answer = new JsonMapper().readTree(json).get(0);
        assertThat(answer.get("id")).isEqualTo(record.get("id"));
        assertThat(answer.get("question")).isEqualTo(record.get("question"));
        assertThat(answer.has("ignored")).isFalse();
        compare(
                "outputs",
                record.get("outputs"),
                answer.get("outputs"),
                record.get("tol").doubleValue());
    }

    private static void compare(String where, JsonNode expected, JsonNode found, double tolerance) {
        assertThat(found).as(where).isNotNull();
        if (expected.isObject()) {
            Iterator<Map.Entry<String, JsonNode>> fields = expected.properties().iterator();
            while (fields.hasNext()) {
                Map.Entry<String, JsonNode> e = fields.next();
                compare(
                        where + "." + e.getKey(),
                        e.getValue(),
                        found.get(e.getKey()),
                        tolerance(e.getKey(), tolerance));
            }
        } else if (expected.isArray()) {
            assertThat(found).as(where).hasSameSizeAs(expected);
            for (int i = 0; i < expected.size(); i++) {
                compare(where + "[" + i + "]", expected.get(i), found.get(i), tolerance);
            }
        } else if (expected.isNumber()) {
            assertThat(found.isNumber()).as(where + " is " + found).isTrue();
            double y = expected.doubleValue();
            assertThat(Math.abs(found.doubleValue() - y))
                    .as(where + ": " + found + " for " + expected)
                    .isLessThanOrEqualTo(tolerance * Math.abs(y) + FLOOR);
        } else {
            assertThat(found).as(where).isEqualTo(expected);
        }
    }

    /** The note of the circle fits: covariance rel 1e-5. */
    private static double tolerance(String name, double tolerance) {
        return name.equals("covariance") ? 1e-5 : tolerance;
    }
}
