package org.solewright.app.cli;

import java.nio.file.Path;
import java.util.concurrent.Callable;
import org.solewright.app.pipeline.UseCaseException;
import org.solewright.app.study.StudyStatus;
import org.solewright.formats.io.FormatException;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** Says how far a study is. */
@Command(
        name = "status",
        description = "Says how far a study is, which trials failed and why; also while it runs.",
        footer = {"", "Example:", "  solewright study status recordings"})
final class StudyStatusCommand implements Callable<Integer> {

    @Parameters(paramLabel = "DIR", description = "Folder of the study.")
    private Path folder = Path.of(".");

    @Spec
    private CommandSpec spec = CommandSpec.create();

    /** For picocli. */
    StudyStatusCommand() {}

    @Override
    public Integer call() throws UseCaseException, FormatException {
        StudyStatus.lines(folder).forEach(l -> spec.commandLine().getOut().println(FindingPrinter.printable(l)));
        return ExitCode.DONE;
    }
}
