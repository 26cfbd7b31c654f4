package org.solewright.app.cli;

import java.nio.file.Path;
import java.util.Optional;
import java.util.concurrent.Callable;
import org.solewright.app.pipeline.UseCaseException;
import org.solewright.app.study.LedgerExport;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** Hands on a study's ledger. */
@Command(
        name = "export",
        description = "Writes the ledger for other programs: runs, tasks, inputs, outputs and findings.",
        footer = {"", "Example:", "  solewright study export recordings --format csv --out ledger"})
final class StudyExportCommand implements Callable<Integer> {

    @Parameters(paramLabel = "DIR", description = "Folder of the study.")
    private Path folder = Path.of(".");

    @Option(
            names = "--format",
            paramLabel = "WORD",
            defaultValue = "csv",
            description = "csv: a folder of tables; sqlite: a database (default: ${DEFAULT-VALUE}).")
    private String format = "csv";

    @Option(
            names = "--out",
            paramLabel = "PATH",
            description = "Folder or database (default: ledger-export or ledger-export.sqlite in DIR).")
    private Optional<Path> out = Optional.empty();

    @Spec
    private CommandSpec spec = CommandSpec.create();

    /** For picocli. */
    StudyExportCommand() {}

    @Override
    public Integer call() throws UseCaseException {
        if (format.equals("parquet")) {
            throw GaitArguments.usage(
                    "--format", "parquet is not written by this version", "export csv and convert it");
        }
        if (!format.equals("csv") && !format.equals("sqlite")) {
            throw GaitArguments.usage("--format", "'" + format + "' is unknown", "use csv or sqlite");
        }
        LedgerExport.write(folder, format.equals("csv"), out)
                .forEach(f -> spec.commandLine().getOut().println("wrote " + f));
        return ExitCode.DONE;
    }
}
