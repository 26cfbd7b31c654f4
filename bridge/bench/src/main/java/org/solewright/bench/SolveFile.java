package org.solewright.bench;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.json.JsonMapper;
import java.io.IOException;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Locale;
import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Level;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.TearDown;
import org.solewright.app.cli.Main;

/** A hundred thousand questions from file to file against reading and writing the same JSON. */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MICROSECONDS)
public class SolveFile {

    private static final int QUESTIONS = 100_000;

    private final JsonMapper mapper = new JsonMapper();
    private Path folder = Path.of("");
    private Path questions = Path.of("");
    private Path answers = Path.of("");

    /**
     * Writes the questions.
     *
     * @throws IOException where the folder for temporary files cannot be used
     */
    @Setup(Level.Trial)
    public void write() throws IOException {
        folder = Files.createTempDirectory("solewright-bench");
        questions = folder.resolve("questions.json");
        answers = folder.resolve("answers.json");
        StringBuilder json = new StringBuilder("[\n");
        for (int i = 0; i < QUESTIONS; i++) {
            json.append(String.format(
                    Locale.ROOT,
                    "{\"id\": \"q%d\", \"question\": \"transition.step\", \"inputs\": {\"segments\": %d, \"stepLength\":"
                            + " %.5f, \"limbLength\": 0.9, \"footLength\": 0.2, \"speed\": 1.25, \"mass\": 70,"
                            + " \"workForm\": \"pushOff\"}}%s\n",
                    i,
                    1 + i % 3,
                    0.4 + 0.4 * i / QUESTIONS,
                    i + 1 < QUESTIONS ? "," : ""));
        }
        Files.writeString(questions, json.append("]\n"));
    }

    /**
     * Removes the files.
     *
     * @throws IOException where they cannot be removed
     */
    @TearDown(Level.Trial)
    public void remove() throws IOException {
        for (Path file : new Path[] {questions, answers, folder.resolve("copy.json"), folder}) {
            Files.deleteIfExists(file);
        }
    }

    /**
     * The command.
     *
     * @return exit code
     */
    @Benchmark
    public int solve() {
        PrintWriter sink = new PrintWriter(new StringWriter());
        int code = Main.run(sink, sink, new String[] {"solve", questions.toString(), "--out", answers.toString()});
        if (code != 0) {
            throw new IllegalStateException("solve ended with " + code);
        }
        return code;
    }

    /**
     * Reading the questions as a tree and writing it.
     *
     * @return size of the copy
     * @throws IOException where a file fails
     */
    @Benchmark
    public long jackson() throws IOException {
        Path copy = folder.resolve("copy.json");
        JsonNode tree = mapper.readTree(questions.toFile());
        mapper.writeValue(copy.toFile(), tree);
        return Files.size(copy);
    }
}
