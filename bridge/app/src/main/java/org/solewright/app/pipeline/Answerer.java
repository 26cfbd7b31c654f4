package org.solewright.app.pipeline;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.OptionalDouble;
import java.util.Set;
import org.solewright.analysis.dynamics.Limit;
import org.solewright.analysis.dynamics.LimitException;

/**
 * Answers one kind of question.
 *
 * @param inputs names of the inputs it looks at; others are listed as ignored
 * @param rule how it answers
 */
record Answerer(Set<String> inputs, Rule rule) {

    /** From inputs to outputs. */
    @FunctionalInterface
    interface Rule {
        /**
         * Answers.
         *
         * @param in inputs
         * @return outputs
         * @throws CallerError where an input is missing or not what its name says
         * @throws LimitException where a model has no value: an answer with a code
         */
        JsonNode answer(QuestionInputs in) throws CallerError, LimitException;
    }

    /** A number that a model may not have. */
    @FunctionalInterface
    interface Value {
        double get() throws LimitException;
    }

    static Answerer of(Rule rule, String... inputs) {
        return new Answerer(Set.of(inputs), rule);
    }

    static ObjectNode object() {
        return JsonNodeFactory.instance.objectNode();
    }

    /** Puts a number; one that has overflowed has no value. */
    static void put(ObjectNode node, String name, double value) {
        if (Double.isFinite(value)) {
            node.put(name, value);
        } else {
            node.put(name, Limit.NO_SOLUTION.name());
        }
    }

    static void putOrNull(ObjectNode node, String name, OptionalDouble value) {
        if (value.isPresent()) {
            put(node, name, value.getAsDouble());
        } else {
            node.putNull(name);
        }
    }

    /** Puts a number, or the code word where it has no value. */
    static void putOrCode(ObjectNode node, String name, Value value) {
        try {
            put(node, name, value.get());
        } catch (LimitException e) {
            node.put(name, e.limit().name());
        }
    }
}
