package org.solewright.app.cli;

import java.io.BufferedWriter;
import java.io.IOException;
import java.io.OutputStreamWriter;
import java.io.PrintWriter;
import java.io.UncheckedIOException;
import java.io.Writer;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.List;
import java.util.concurrent.Callable;
import org.jspecify.annotations.Nullable;
import org.solewright.app.pipeline.Tabulation;
import org.solewright.app.pipeline.UseCaseException;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.Severity;
import org.solewright.formats.io.AtomicOutput;
import org.solewright.formats.io.FormatException;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** A C3D file's content as a delimited table. */
@Command(
        name = "tabulate",
        description = "Writes points, analog samples, platform loads or events of a C3D file as a delimited table.",
        footer = {"", "Example:", "  solewright tabulate walk-1.c3d --what loads --out loads.csv"})
final class TabulateCommand implements Callable<Integer> {

    @Parameters(paramLabel = "FILE", description = "C3D file.")
    private Path file = Path.of("");

    @Option(names = "--what", paramLabel = "TABLE", required = true, description = "points, analog, loads or events.")
    private String what = "";

    @Option(names = "--out", paramLabel = "F.csv", description = "File to write (default: standard output).")
    @Nullable
    private Path out;

    @Option(names = "--units-row", description = "A second header row gives the units.")
    private boolean hasUnitsRow;

    @Mixin
    private WindowArguments window = new WindowArguments();

    @Spec
    private CommandSpec spec = CommandSpec.create();

    /** For picocli. */
    TabulateCommand() {}

    @Override
    public Integer call() throws UseCaseException, FormatException {
        Tabulation.What table = Tabulation.What.ofWord(what)
                .orElseThrow(() -> GaitArguments.usage(
                        "--what", "'" + what + "' is unknown", "use points, analog, loads or events"));
        Tabulation tabulation =
                Tabulation.of(file, table, hasUnitsRow, window.from(), window.to(), window.isFlagIgnored());
        List<Finding> findings = tabulation.findings();
        for (Finding f : findings) {
            if (f.severity() == Severity.ERROR) {
                throw new UseCaseException(
                        UseCaseException.Kind.INPUT, file.toString(), f.message(), "get a complete copy of the file");
            }
        }
        FindingPrinter.print(spec.commandLine().getErr(), findings);
        if (out == null) {
            PrintWriter stdout = spec.commandLine().getOut();
            try {
                tabulation.write(stdout);
            } catch (IOException e) {
                throw new UncheckedIOException("a print writer does not throw", e);
            }
            stdout.flush();
            return ExitCode.DONE;
        }
        try {
            AtomicOutput.write(out, stream -> {
                Writer writer = new BufferedWriter(new OutputStreamWriter(stream, StandardCharsets.UTF_8));
                tabulation.write(writer);
                writer.flush();
            });
        } catch (IOException e) {
            throw new UseCaseException(
                    UseCaseException.Kind.OUTPUT,
                    out.toString(),
                    "cannot be written (" + e.getMessage() + ")",
                    "give another --out",
                    e);
        }
        return ExitCode.DONE;
    }
}
