package org.solewright.app.cli;

import java.nio.file.Path;
import java.time.LocalDate;
import java.time.ZoneId;
import java.util.concurrent.Callable;
import org.solewright.app.pipeline.UseCaseException;
import org.solewright.app.study.StudyProposal;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** Proposes the files of a study. */
@Command(
        name = "init",
        description = "Proposes study.xml, subjects.csv and trials.csv from a folder of C3D files: a folder per subject"
                + " and session, or names such as sub-01_ses-1_task-walk_run-2.c3d.",
        footer = {"", "Example:", "  solewright study init recordings"})
final class StudyInitCommand implements Callable<Integer> {

    @Parameters(paramLabel = "DIR", description = "Folder of recordings.")
    private Path folder = Path.of(".");

    @Spec
    private CommandSpec spec = CommandSpec.create();

    /** For picocli. */
    StudyInitCommand() {}

    @Override
    public Integer call() throws UseCaseException {
        StudyProposal.write(folder, LocalDate.now(ZoneId.systemDefault()).toString())
                .forEach(spec.commandLine().getOut()::println);
        return ExitCode.DONE;
    }
}
