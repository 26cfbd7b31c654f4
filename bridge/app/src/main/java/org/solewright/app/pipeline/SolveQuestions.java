package org.solewright.app.pipeline;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.json.JsonMapper;
import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import com.fasterxml.jackson.databind.node.TextNode;
import java.io.BufferedInputStream;
import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.OutputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import org.solewright.analysis.dynamics.Limit;
import org.solewright.analysis.dynamics.LimitException;
import org.solewright.formats.io.FormatException;
import org.solewright.formats.io.Spelling;

/** Answers the questions of a file: 04-posture-cost section 12. */
public final class SolveQuestions {

    private static final int BATCH = 200;

    private final JsonMapper mapper = new JsonMapper();
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
    record Answers(String json, List<String> refused) {

        /** Copies the list. */
        public Answers {
            refused = List.copyOf(refused);
        }
    }

    /**
     * Reads questions and answers them in their order, some hundreds at a time on all cores, whatever their number.
     *
     * @param file one question, an array of them, or an object with an array {@code records}
     * @param out where a JSON array goes, one answer to a line; empty: to {@code console}
     * @param console receives the answers where there is no file to write
     * @return what could not be asked that way, one sentence each, in the order of the file
     * @throws FormatException where the file is not JSON of that shape
     * @throws UseCaseException where a file cannot be read or written
     */
    public List<String> answer(Path file, Optional<Path> out, OutputStream console)
            throws FormatException, UseCaseException {
        QuestionFile questions = open(file);
        List<String> refused = new ArrayList<>();
        if (out.isPresent()) {
            ResultText.write(out.get(), stream -> answer(questions, stream, refused));
            return refused;
        }
        try {
            answer(questions, console, refused);
        } catch (IOException e) {
            throw new UseCaseException(
                    UseCaseException.Kind.OUTPUT, "standard output", "cannot be written", "give --out", e);
        }
        return refused;
    }

    private static QuestionFile open(Path file) throws FormatException, UseCaseException {
        try {
            return QuestionFile.of(file.toString(), () -> new BufferedInputStream(Files.newInputStream(file), 1 << 16));
        } catch (IOException e) {
            throw new UseCaseException(
                    UseCaseException.Kind.INPUT,
                    file.toString(),
                    !Files.exists(file) ? "no such file" : Files.isDirectory(file) ? "a folder" : "cannot be read",
                    "name a readable file of questions",
                    e);
        }
    }

    Answers answer(String source, byte[] bytes) throws FormatException {
        List<String> refused = new ArrayList<>();
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        try {
            answer(QuestionFile.of(source, () -> new ByteArrayInputStream(bytes)), out, refused);
        } catch (IOException e) {
            throw new UncheckedIOException("memory does not fail", e);
        }
        return new Answers(out.toString(StandardCharsets.UTF_8), refused);
    }

    private void answer(QuestionFile questions, OutputStream out, List<String> refused) throws IOException {
        ExecutorService pool = Executors.newFixedThreadPool(Runtime.getRuntime().availableProcessors());
        try {
            Run run = new Run(pool, out, refused);
            questions.forEach(run::take);
            run.finish();
        } finally {
            pool.shutdownNow();
        }
    }

    /** One pass over a file: batches ahead on the pool, written in their order. */
    private final class Run {
        private final ExecutorService pool;
        private final OutputStream out;
        private final List<String> refused;
        private final Deque<Future<Batched>> ahead = new ArrayDeque<>();
        private final int most = 2 * Runtime.getRuntime().availableProcessors();
        private List<JsonNode> batch = new ArrayList<>();
        private long taken;
        private boolean isBegun;

        Run(ExecutorService pool, OutputStream out, List<String> refused) {
            this.pool = pool;
            this.out = out;
            this.refused = refused;
        }

        void take(JsonNode question) throws IOException {
            batch.add(question);
            taken++;
            if (batch.size() == BATCH) {
                submit();
            }
        }

        private void submit() throws IOException {
            List<JsonNode> full = batch;
            long first = taken - full.size() + 1;
            batch = new ArrayList<>();
            ahead.add(pool.submit(() -> answered(full, first)));
            while (ahead.size() > most) {
                write();
            }
        }

        private void write() throws IOException {
            Batched done;
            try {
                done = ahead.remove().get();
            } catch (InterruptedException e) {
                Thread.currentThread().interrupt();
                throw new IOException("stopped", e);
            } catch (ExecutionException e) {
                throw new IllegalStateException(e.getCause());
            }
            out.write((isBegun ? ",\n" : "[\n").getBytes(StandardCharsets.UTF_8));
            isBegun = true;
            done.json().writeTo(out);
            refused.addAll(done.refused());
        }

        void finish() throws IOException {
            if (!batch.isEmpty()) {
                submit();
            }
            while (!ahead.isEmpty()) {
                write();
            }
            out.write((isBegun ? "\n]\n" : "[]\n").getBytes(StandardCharsets.UTF_8));
            out.flush();
        }
    }

    /** Answers of some questions, separated by commas. */
    private record Batched(ByteArrayOutputStream json, List<String> refused) {}

    private Batched answered(List<JsonNode> questions, long first) throws IOException {
        ByteArrayOutputStream json = new ByteArrayOutputStream(256 * questions.size());
        List<String> refused = new ArrayList<>();
        byte[] between = ",\n".getBytes(StandardCharsets.UTF_8);
        byte[] indent = "  ".getBytes(StandardCharsets.UTF_8);
        for (int i = 0; i < questions.size(); i++) {
            if (i > 0) {
                json.write(between);
            }
            json.write(indent);
            json.write(mapper.writeValueAsBytes(answer(questions.get(i), first + i, refused)));
        }
        return new Batched(json, refused);
    }

    private ObjectNode answer(JsonNode question, long number, List<String> refused) {
        ObjectNode answer = JsonNodeFactory.instance.objectNode();
        answer.set("id", orNull(question.get("id")));
        answer.set("question", orNull(question.get("question")));
        List<String> ignored = List.of();
        try {
            Answerer answerer = answerer(question);
            QuestionInputs in = inputs(question);
            try {
                answer.set("outputs", finite(answerer.rule().answer(in)));
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
        return answer;
    }

    private static String name(JsonNode question, long number) {
        JsonNode id = question.get("id");
        return id != null && id.isValueNode() && !id.isNull() ? QuestionInputs.shown(id.asText()) : "number " + number;
    }

    /** A number that has overflowed has no value: its place holds the code. */
    private static JsonNode finite(JsonNode node) {
        if (node.isDouble() && !Double.isFinite(node.doubleValue())) {
            return TextNode.valueOf(Limit.NO_SOLUTION.name());
        }
        if (node instanceof ObjectNode object) {
            object.properties().forEach(e -> e.setValue(finite(e.getValue())));
        } else if (node instanceof ArrayNode array) {
            for (int i = 0; i < array.size(); i++) {
                array.set(i, finite(array.get(i)));
            }
        }
        return node;
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
