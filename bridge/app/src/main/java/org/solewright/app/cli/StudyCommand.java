package org.solewright.app.cli;

import java.nio.file.Path;
import java.util.concurrent.Callable;
import org.jspecify.annotations.Nullable;
import org.solewright.app.pipeline.UseCaseException;
import org.solewright.formats.io.FormatException;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** Runs a whole study, or goes on with it. */
@Command(
        name = "study",
        description = "Runs a whole study: a foot per subject and session, an appraisal per trial, tables. What is done"
                + " and unchanged is not done again.",
        subcommands = {
            StudyInitCommand.class,
            StudyCheckCommand.class,
            StudyStatusCommand.class,
            StudyRetryCommand.class,
            StudyExportCommand.class,
        },
        footer = {
            "",
            "Example:",
            "  solewright study init recordings     # proposes study.xml, subjects.csv, trials.csv",
            "  solewright study check recordings    # says everything that is wrong",
            "  solewright study recordings          # runs; stopped or killed, the same call goes on",
            "Writes models, results, tables and ro-crate-metadata.json beside them; ledger.sqlite says what was done."
        })
final class StudyCommand implements Callable<Integer> {

    @Parameters(paramLabel = "DIR", arity = "0..1", description = "Folder of the study.")
    @Nullable
    private Path folder;

    @Mixin
    private StudyArguments arguments = new StudyArguments();

    @Spec
    private CommandSpec spec = CommandSpec.create();

    /** For picocli. */
    StudyCommand() {}

    @Override
    public Integer call() throws UseCaseException, FormatException {
        if (folder == null) {
            throw GaitArguments.usage("study", "no folder was given", "give the folder of a study");
        }
        return arguments.run(folder, false, spec);
    }
}
