package org.solewright.app.cli;

import java.nio.file.Path;
import java.util.concurrent.Callable;
import org.solewright.app.pipeline.UseCaseException;
import org.solewright.formats.io.FormatException;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** Does the failed trials of a study again. */
@Command(
        name = "retry",
        description = "Runs a study and does its failed trials again although nothing has changed.",
        footer = {"", "Example:", "  solewright study retry recordings --failed"})
final class StudyRetryCommand implements Callable<Integer> {

    @Parameters(paramLabel = "DIR", description = "Folder of the study.")
    private Path folder = Path.of(".");

    @Option(names = "--failed", required = true, description = "The failed ones.")
    private boolean isFailed;

    @Mixin
    private StudyArguments arguments = new StudyArguments();

    @Spec
    private CommandSpec spec = CommandSpec.create();

    /** For picocli. */
    StudyRetryCommand() {}

    @Override
    public Integer call() throws UseCaseException, FormatException {
        return arguments.run(folder, isFailed, spec);
    }
}
