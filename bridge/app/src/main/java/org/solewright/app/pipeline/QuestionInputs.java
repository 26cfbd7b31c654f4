package org.solewright.app.pipeline;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import org.solewright.domain.cost.WorkForm;
import org.solewright.domain.geometry.Vec3;

/** The inputs of one question. A value of null counts as not given. */
final class QuestionInputs {

    /** Standard gravity, m/s2 [CGPM 1901]. */
    static final double STANDARD_GRAVITY = 9.80665;
    /** Numbers beyond this size would overflow when squared and summed; no quantity of a gait comes near. */
    private static final double GREATEST = 1e60;

    private static final int SHOWN = 60;

    private final JsonNode inputs;
    private final Set<String> setAside = new HashSet<>();

    QuestionInputs(JsonNode inputs) {
        this.inputs = inputs;
    }

    /** Names that are given and neither among the used ones nor kept, in the order of the file. */
    List<String> ignored(Set<String> used) {
        List<String> names = new ArrayList<>();
        inputs.properties().forEach(e -> {
            if (!e.getValue().isNull() && (!used.contains(e.getKey()) || setAside.contains(e.getKey()))) {
                names.add(e.getKey());
            }
        });
        return names;
    }

    /** Marks an input that another one makes useless. */
    void setAside(String name) {
        setAside.add(name);
    }

    private JsonNode node(String name) {
        JsonNode node = inputs.get(name);
        return node == null ? JsonNodeFactory.instance.nullNode() : node;
    }

    boolean has(String name) {
        return !node(name).isNull();
    }

    private JsonNode needed(String name) throws CallerError {
        if (!has(name)) {
            throw new CallerError(CallerError.Code.MISSING_INPUT, "input '" + name + "' is not given");
        }
        return node(name);
    }

    double number(String name) throws CallerError {
        return number(needed(name), "input '" + name + "'");
    }

    double number(String name, double fallback) throws CallerError {
        return has(name) ? number(name) : fallback;
    }

    double positive(String name) throws CallerError {
        return positive(number(name), name);
    }

    double positive(String name, double fallback) throws CallerError {
        return positive(number(name, fallback), name);
    }

    private static double positive(double value, String name) throws CallerError {
        if (!(value > 0)) {
            throw new CallerError(
                    CallerError.Code.WRONG_TYPE, "input '" + name + "' is " + value + ", expected more than 0");
        }
        return value;
    }

    double notNegative(String name) throws CallerError {
        double value = number(name);
        if (!(value >= 0)) {
            throw new CallerError(
                    CallerError.Code.WRONG_TYPE, "input '" + name + "' is " + value + ", expected 0 or more");
        }
        return value;
    }

    double notNegative(String name, double fallback) throws CallerError {
        return has(name) ? notNegative(name) : fallback;
    }

    /** A whole number that counts entries of a list. */
    int index(String name, int least, int greatest) throws CallerError {
        double value = number(name);
        if (!(value >= least && value <= greatest) || value != Math.rint(value)) {
            throw new CallerError(
                    CallerError.Code.WRONG_TYPE,
                    "input '" + name + "' is " + value + ", expected a whole number from " + least + " to " + greatest);
        }
        return (int) value;
    }

    /** The inputs inside an input. */
    QuestionInputs object(String name) throws CallerError {
        return object(needed(name), "input '" + name + "'");
    }

    /** A list of objects. */
    List<QuestionInputs> objects(String name) throws CallerError {
        JsonNode list = list(needed(name), "input '" + name + "'");
        List<QuestionInputs> all = new ArrayList<>();
        for (int i = 0; i < list.size(); i++) {
            all.add(object(list.get(i), "entry " + (i + 1) + " of input '" + name + "'"));
        }
        return all;
    }

    private static QuestionInputs object(JsonNode node, String where) throws CallerError {
        if (!node.isObject()) {
            throw new CallerError(CallerError.Code.WRONG_TYPE, where + " is " + kind(node) + ", expected an object");
        }
        return new QuestionInputs(node);
    }

    /** A vector of three numbers. */
    Vec3 vector(String name) throws CallerError {
        double[] v = numbers(name);
        if (v.length != 3) {
            throw new CallerError(
                    CallerError.Code.WRONG_TYPE, "input '" + name + "' has " + v.length + " numbers, expected 3");
        }
        return new Vec3(v[0], v[1], v[2]);
    }

    /** A share, 0 to 1. */
    double share(String name, double fallback) throws CallerError {
        double value = number(name, fallback);
        if (!(value >= 0 && value <= 1)) {
            throw new CallerError(
                    CallerError.Code.WRONG_TYPE, "input '" + name + "' is " + value + ", expected 0 to 1");
        }
        return value;
    }

    /** A share, above 0 to 1. */
    double positiveShare(String name, double fallback) throws CallerError {
        double value = share(name, fallback);
        return positive(value, name);
    }

    /** An angle from the vertical or level, rad, less than pi in size. */
    double angle(String name) throws CallerError {
        double value = number(name);
        if (!(Math.abs(value) < Math.PI)) {
            throw new CallerError(
                    CallerError.Code.WRONG_TYPE,
                    "input '" + name + "' is " + value + ", expected an angle between -pi and pi rad");
        }
        return value;
    }

    double angle(String name, double fallback) throws CallerError {
        return has(name) ? angle(name) : fallback;
    }

    double gravity() throws CallerError {
        return positive("gravity", STANDARD_GRAVITY);
    }

    int count(String name) throws CallerError {
        double value = number(name);
        if (!(value >= 1 && value <= Integer.MAX_VALUE) || value != Math.rint(value)) {
            throw new CallerError(
                    CallerError.Code.WRONG_TYPE,
                    "input '" + name + "' is " + value + ", expected a whole number of 1 or more");
        }
        return (int) value;
    }

    Optional<WorkForm> workForm() throws CallerError {
        Optional<String> word = word("workForm");
        if (word.isEmpty()) {
            return Optional.empty();
        }
        for (WorkForm form : WorkForm.values()) {
            if (form.word().equals(word.get())) {
                return Optional.of(form);
            }
        }
        throw new CallerError(
                CallerError.Code.WRONG_TYPE,
                "input 'workForm' is \"" + shown(word.get()) + "\", expected one of "
                        + String.join(
                                ", ",
                                Arrays.stream(WorkForm.values())
                                        .map(WorkForm::word)
                                        .toList()));
    }

    /** The form that is asked for, or all five. */
    List<WorkForm> workForms() throws CallerError {
        return workForm().map(List::of).orElse(List.of(WorkForm.values()));
    }

    Optional<String> word(String name) throws CallerError {
        if (!has(name)) {
            return Optional.empty();
        }
        JsonNode node = node(name);
        if (!node.isTextual()) {
            throw new CallerError(
                    CallerError.Code.WRONG_TYPE, "input '" + name + "' is " + kind(node) + ", expected a word");
        }
        return Optional.of(node.textValue());
    }

    /** Numbers of a list. */
    double[] numbers(String name) throws CallerError {
        JsonNode list = list(needed(name), "input '" + name + "'");
        double[] out = new double[list.size()];
        for (int i = 0; i < out.length; i++) {
            out[i] = number(list.get(i), "number " + (i + 1) + " of input '" + name + "'");
        }
        return out;
    }

    /** A list of places or vectors, row-major. */
    double[] rows(String name, int columns) throws CallerError {
        JsonNode list = list(needed(name), "input '" + name + "'");
        double[] out = new double[list.size() * columns];
        int at = 0;
        for (int row = 0; row < list.size(); row++) {
            String where = "entry " + (row + 1) + " of input '" + name + "'";
            JsonNode entry = list(list.get(row), where);
            if (entry.size() != columns) {
                throw new CallerError(
                        CallerError.Code.WRONG_TYPE, where + " has " + entry.size() + " numbers, expected " + columns);
            }
            for (int column = 0; column < columns; column++) {
                out[at++] = number(entry.get(column), where);
            }
        }
        return out;
    }

    private static JsonNode list(JsonNode node, String where) throws CallerError {
        if (!node.isArray()) {
            throw new CallerError(CallerError.Code.WRONG_TYPE, where + " is " + kind(node) + ", expected a list");
        }
        return node;
    }

    private static double number(JsonNode node, String where) throws CallerError {
        if (!node.isNumber()) {
            throw new CallerError(CallerError.Code.WRONG_TYPE, where + " is " + kind(node) + ", expected a number");
        }
        double value = node.doubleValue();
        if (!(Math.abs(value) <= GREATEST)) {
            throw new CallerError(
                    CallerError.Code.WRONG_TYPE,
                    where + " is " + value + ", expected a number of size up to " + GREATEST);
        }
        return value;
    }

    static String kind(JsonNode node) {
        return switch (node.getNodeType()) {
            case STRING -> "the text \"" + shown(node.textValue()) + "\"";
            case BOOLEAN -> "the word " + node.asText();
            case ARRAY -> "a list";
            case OBJECT -> "an object";
            case NULL, MISSING -> "null";
            default -> "the value " + shown(node.asText());
        };
    }

    static String shown(String text) {
        String line = text.replaceAll("\\p{Cntrl}", " ");
        return line.length() > SHOWN ? line.substring(0, SHOWN) + "..." : line;
    }
}
