package org.solewright.app.cli;

import java.nio.file.Path;
import java.util.concurrent.Callable;
import org.solewright.app.pipeline.UseCaseException;
import org.solewright.app.study.StudyCheck;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** Says everything that is wrong with a study before anything runs. */
@Command(
        name = "check",
        description = "Says everything that is wrong with a study before anything runs, with file and line.",
        footer = {"", "Example:", "  solewright study check recordings"})
final class StudyCheckCommand implements Callable<Integer> {

    @Parameters(paramLabel = "DIR", description = "Folder of the study.")
    private Path folder = Path.of(".");

    @Spec
    private CommandSpec spec = CommandSpec.create();

    /** For picocli. */
    StudyCheckCommand() {}

    @Override
    public Integer call() throws UseCaseException {
        StudyCheck.Result result = StudyCheck.of(folder);
        FindingPrinter.print(spec.commandLine().getErr(), result.findings());
        spec.commandLine()
                .getOut()
                .println(folder + ": " + result.subjects() + " subjects, " + result.trials() + " trials, "
                        + result.errors() + " errors, " + (result.findings().size() - result.errors()) + " warnings");
        return result.errors() == 0 ? ExitCode.DONE : result.trials() == 0 ? ExitCode.INPUT : ExitCode.SOME_FAILED;
    }
}
