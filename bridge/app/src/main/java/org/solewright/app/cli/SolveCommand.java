package org.solewright.app.cli;

import java.io.OutputStream;
import java.io.PrintWriter;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.Callable;
import org.solewright.app.pipeline.SolveQuestions;
import org.solewright.app.pipeline.UseCaseException;
import org.solewright.formats.io.FormatException;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** Questions in, answers out. */
@Command(
        name = "solve",
        description = "Answers questions to the posture-cost solver, by JSON files.",
        footer = {
            "",
            "Example: what one step costs with a foot of one segment",
            "  echo '{\"id\": \"a\", \"question\": \"transition.step\", \"inputs\": {\"segments\": 1,"
                    + " \"stepLength\": 0.6, \"limbLength\": 0.9, \"footLength\": 0.2, \"speed\": 1.25,"
                    + " \"mass\": 70, \"workForm\": \"pushOff\"}}' > question.json",
            "  solewright solve question.json"
        })
final class SolveCommand implements Callable<Integer> {

    @Spec
    private CommandSpec spec = CommandSpec.create();

    @Parameters(
            paramLabel = "QUESTIONS.json",
            description = "One question, an array of questions, or {\"records\": [...]}.")
    private Path questions = Path.of("");

    @Option(names = "--out", paramLabel = "A.json", description = "File for the answers; default: standard output.")
    private Optional<Path> out = Optional.empty();

    /** For picocli. */
    SolveCommand() {}

    @Override
    public Integer call() throws FormatException, UseCaseException {
        PrintWriter console = spec.commandLine().getOut();
        List<String> refused = new SolveQuestions().answer(questions, out, new ConsoleBytes(console));
        console.flush();
        for (String what : refused) {
            spec.commandLine().getErr().println("solewright: " + questions + ": " + what + ": correct that question");
        }
        return refused.isEmpty() ? ExitCode.DONE : ExitCode.SOME_FAILED;
    }

    /** The console as a stream of UTF-8. */
    private static final class ConsoleBytes extends OutputStream {
        private final PrintWriter console;

        ConsoleBytes(PrintWriter console) {
            this.console = console;
        }

        @Override
        public void write(int b) {
            console.write(b);
        }

        @Override
        public void write(byte[] bytes, int offset, int length) {
            // Batches end between characters.
            console.write(new String(bytes, offset, length, StandardCharsets.UTF_8));
        }
    }
}
