package org.solewright.app.pipeline;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.json.JsonMapper;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import org.solewright.formats.io.FormatException;

/** One question put to the solver as a script puts it, and what stands in its answer. */
final class Asked {

    private Asked() {}

    /** Outputs of one question; inputs are JSON without its braces, with apostrophes for quotes. */
    static JsonNode ask(String question, String inputs) throws IOException, FormatException {
        String json =
                "{\"id\": 1, \"question\": \"" + question + "\", \"inputs\": {" + inputs.replace('\'', '"') + "}}";
        String answers = new SolveQuestions()
                .answer("questions", json.getBytes(StandardCharsets.UTF_8))
                .json();
        return new JsonMapper().readTree(answers).get(0).get("outputs");
    }

    /** Requires a number at a JSON pointer, within a tolerance relative to the larger of it and 1. */
    static void is(JsonNode outputs, String name, double expected, double tolerance) {
        assertThat(outputs.at(name).isNumber())
                .as(name + " is " + outputs.at(name) + " in " + outputs)
                .isTrue();
        assertThat(outputs.at(name).doubleValue())
                .as(name)
                .isCloseTo(expected, within(tolerance * Math.max(1, Math.abs(expected))));
    }
}
