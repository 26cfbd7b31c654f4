package org.solewright.app.cli;

import java.io.PrintWriter;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.Optional;
import java.util.concurrent.Callable;
import org.solewright.app.pipeline.ResultText;
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
        SolveQuestions.Answers answers = new SolveQuestions().answer(questions);
        PrintWriter console = spec.commandLine().getOut();
        if (out.isPresent()) {
            ResultText.write(out.get(), answers.json().getBytes(StandardCharsets.UTF_8));
        } else {
            console.print(answers.json());
        }
        for (String refused : answers.refused()) {
            spec.commandLine()
                    .getErr()
                    .println("solewright: " + questions + ": " + refused + ": correct that question");
        }
        return answers.refused().isEmpty() ? ExitCode.DONE : ExitCode.SOME_FAILED;
    }
}
