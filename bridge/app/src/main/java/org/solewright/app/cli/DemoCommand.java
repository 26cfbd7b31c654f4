package org.solewright.app.cli;

import java.nio.file.Path;
import java.util.concurrent.Callable;
import org.solewright.app.pipeline.DemoUseCase;
import org.solewright.app.pipeline.UseCaseException;
import org.solewright.formats.io.FormatException;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** Writes an invented study, runs the main job on it and compares with the truth. */
@Command(
        name = "demo",
        description = "Writes an invented study and runs the main job on it, beside the truth it was made from.",
        footer = {"", "Example:", "  solewright demo my-demo"})
final class DemoCommand implements Callable<Integer> {

    @Parameters(
            paramLabel = "DIR",
            arity = "0..1",
            defaultValue = "solewright-demo",
            description = "Folder for the study and its results (default: ${DEFAULT-VALUE}).")
    private Path folder = Path.of("solewright-demo");

    @Spec
    private CommandSpec spec = CommandSpec.create();

    /** For picocli. */
    DemoCommand() {}

    @Override
    public Integer call() throws UseCaseException, FormatException {
        DemoUseCase.Result result = DemoUseCase.run(folder, Version.NUMBER);
        FindingPrinter.print(spec.commandLine().getErr(), result.findings());
        result.lines().forEach(spec.commandLine().getOut()::println);
        return result.comparisons().stream().allMatch(DemoUseCase.Comparison::isRight)
                ? ExitCode.DONE
                : ExitCode.SOME_FAILED;
    }
}
