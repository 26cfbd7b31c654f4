package org.solewright.app.pipeline;

import com.fasterxml.jackson.core.JsonFactory;
import com.fasterxml.jackson.core.JsonLocation;
import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.core.StreamReadConstraints;
import com.fasterxml.jackson.databind.DeserializationFeature;
import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.json.JsonMapper;
import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import org.solewright.analysis.dynamics.LimitException;
import org.solewright.formats.io.FormatException;
import org.solewright.formats.io.Spelling;

/** Answers the questions of a file: 04-posture-cost section 12. */
public final class SolveQuestions {

    /** Files above this size are refused before they are read. */
    private static final long MOST_BYTES = 64L << 20;

    private static final int DEEPEST = 100;

    private final JsonMapper mapper = JsonMapper.builder(JsonFactory.builder()
                    .streamReadConstraints(StreamReadConstraints.builder()
                            .maxNestingDepth(DEEPEST)
                            .build())
                    .build())
            .enable(DeserializationFeature.FAIL_ON_TRAILING_TOKENS)
            .enable(DeserializationFeature.FAIL_ON_READING_DUP_TREE_KEY)
            .build();
    private final Map<String, Answerer> answerers = new TreeMap<>();

    /** With all questions of this version. */
    public SolveQuestions() {
        answerers.putAll(TransitionAnswers.all());
        answerers.putAll(RollingAnswers.all());
        answerers.putAll(VaultAnswers.all());
        answerers.putAll(WalkerAnswers.all());
        answerers.putAll(CostAnswers.all());
        answerers.putAll(ImpactAnswers.all());
        answerers.putAll(SprawlAnswers.all());
        answerers.putAll(FitAnswers.all());
        answerers.putAll(MotionAnswers.all());
    }

    /**
     * Answers of a file.
     *
     * @param json a JSON array, one answer to a line
     * @param refused what could not be asked that way, one sentence each, in the order of the file
     */
    public record Answers(String json, List<String> refused) {

        /** Copies the list. */
        public Answers {
            refused = List.copyOf(refused);
        }
    }

    /**
     * Reads questions and answers them in their order.
     *
     * @param file one question, an array of them, or an object with an array {@code records}
     * @return the answers
     * @throws FormatException where the file is not JSON of that shape
     * @throws UseCaseException where the file cannot be read
     */
    public Answers answer(Path file) throws FormatException, UseCaseException {
        byte[] bytes;
        try {
            if (Files.isRegularFile(file) && Files.size(file) > MOST_BYTES) {
                throw new FormatException(
                        file.toString(),
                        "the file has " + Files.size(file) + " bytes, expected up to " + MOST_BYTES,
                        "ask in several files");
            }
            bytes = Files.readAllBytes(file);
        } catch (IOException e) {
            throw new UseCaseException(
                    UseCaseException.Kind.INPUT,
                    file.toString(),
                    !Files.exists(file) ? "no such file" : Files.isDirectory(file) ? "a folder" : "cannot be read",
                    "name a readable file of questions",
                    e);
        }
        return answer(file.toString(), bytes);
    }

    Answers answer(String source, byte[] bytes) throws FormatException {
        List<JsonNode> questions = questions(source, parse(source, bytes));
        List<String> lines = new ArrayList<>();
        List<String> refused = new ArrayList<>();
        for (JsonNode question : questions) {
            lines.add("  " + answer(question, lines.size() + 1, refused));
        }
        String json = lines.isEmpty() ? "[]\n" : "[\n" + String.join(",\n", lines) + "\n]\n";
        return new Answers(json, refused);
    }

    private JsonNode parse(String source, byte[] bytes) throws FormatException {
        JsonNode root;
        try {
            root = mapper.readTree(bytes);
        } catch (JsonProcessingException e) {
            JsonLocation at = e.getLocation();
            String place = at == null || at.getLineNr() < 1
                    ? ""
                    : "line " + at.getLineNr() + ", column " + at.getColumnNr() + ": ";
            throw new FormatException(
                    source,
                    place + "not JSON (" + QuestionInputs.shown(e.getOriginalMessage()) + ")",
                    "give one question, an array of questions, or {\"records\": [...]}",
                    e);
        } catch (IOException e) {
            throw new FormatException(
                    source,
                    "not JSON (" + QuestionInputs.shown(String.valueOf(e.getMessage())) + ")",
                    "save the file as UTF-8",
                    e);
        }
        if (root.isMissingNode()) {
            throw new FormatException(
                    source, "the file is empty", "give one question, an array of questions, or {\"records\": [...]}");
        }
        return root;
    }

    private static List<JsonNode> questions(String source, JsonNode root) throws FormatException {
        JsonNode list = root.isObject() && root.has("records") ? root.get("records") : root;
        List<JsonNode> questions = new ArrayList<>();
        if (list.isArray()) {
            list.forEach(questions::add);
        } else if (list.isObject() && !root.has("records")) {
            questions.add(list);
        } else {
            throw new FormatException(
                    source,
                    (root.has("records") ? "\"records\" is " : "the file holds ") + QuestionInputs.kind(list)
                            + ", expected questions",
                    "give one question, an array of questions, or {\"records\": [...]}");
        }
        return questions;
    }

    private String answer(JsonNode question, int number, List<String> refused) {
        ObjectNode answer = JsonNodeFactory.instance.objectNode();
        answer.set("id", orNull(question.get("id")));
        answer.set("question", orNull(question.get("question")));
        List<String> ignored = List.of();
        try {
            Answerer answerer = answerer(question);
            QuestionInputs in = inputs(question);
            try {
                answer.set("outputs", answerer.rule().answer(in));
            } finally {
                ignored = in.ignored(answerer.inputs());
            }
        } catch (CallerError e) {
            refuse(answer, e.code().name(), String.valueOf(e.getMessage()));
            refused.add("question " + name(question, number) + ": " + e.code() + ": " + e.getMessage());
        } catch (LimitException e) {
            refuse(answer, e.limit().name(), String.valueOf(e.getMessage()));
        } catch (IllegalArgumentException e) {
            refuse(answer, CallerError.Code.WRONG_TYPE.name(), String.valueOf(e.getMessage()));
            refused.add(
                    "question " + name(question, number) + ": " + CallerError.Code.WRONG_TYPE + ": " + e.getMessage());
        }
        if (!ignored.isEmpty()) {
            ArrayNode names = answer.putArray("ignored");
            ignored.forEach(names::add);
        }
        return answer.toString();
    }

    private static String name(JsonNode question, int number) {
        JsonNode id = question.get("id");
        return id != null && id.isValueNode() && !id.isNull() ? QuestionInputs.shown(id.asText()) : "number " + number;
    }

    private static void refuse(ObjectNode answer, String code, String message) {
        ObjectNode outputs = JsonNodeFactory.instance.objectNode();
        outputs.put("error", code);
        outputs.put("message", message);
        answer.set("outputs", outputs);
    }

    private static JsonNode orNull(JsonNode node) {
        return node == null ? JsonNodeFactory.instance.nullNode() : node;
    }

    private Answerer answerer(JsonNode question) throws CallerError {
        if (!question.isObject()) {
            throw new CallerError(
                    CallerError.Code.WRONG_TYPE,
                    "the question is " + QuestionInputs.kind(question) + ", expected an object");
        }
        JsonNode word = question.get("question");
        if (word == null || word.isNull()) {
            throw new CallerError(CallerError.Code.MISSING_INPUT, "'question' is not given");
        }
        if (!word.isTextual()) {
            throw new CallerError(
                    CallerError.Code.WRONG_TYPE,
                    "'question' is " + QuestionInputs.kind(word) + ", expected the name of a question");
        }
        Answerer answerer = answerers.get(word.textValue());
        if (answerer == null) {
            String name = "'" + QuestionInputs.shown(word.textValue()) + "'";
            throw new CallerError(
                    CallerError.Code.UNKNOWN_QUESTION,
                    "there is no question " + name
                            + Spelling.nearest(word.textValue(), answerers.keySet())
                                    .map(n -> ", did you mean '" + n + "'?")
                                    .orElse(""));
        }
        return answerer;
    }

    private static QuestionInputs inputs(JsonNode question) throws CallerError {
        JsonNode inputs = question.get("inputs");
        if (inputs != null && !inputs.isNull() && !inputs.isObject()) {
            throw new CallerError(
                    CallerError.Code.WRONG_TYPE, "'inputs' is " + QuestionInputs.kind(inputs) + ", expected an object");
        }
        return new QuestionInputs(inputs == null || inputs.isNull() ? JsonNodeFactory.instance.objectNode() : inputs);
    }
}
