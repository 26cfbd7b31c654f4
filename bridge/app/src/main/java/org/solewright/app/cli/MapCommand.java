package org.solewright.app.cli;

import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.Optional;
import java.util.concurrent.Callable;
import org.solewright.app.pipeline.ProposedMap;
import org.solewright.app.pipeline.ResultText;
import org.solewright.app.pipeline.UseCaseException;
import org.solewright.formats.io.FormatException;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** Proposes a column map from a table's head. */
@Command(
        name = "map",
        description = "Proposes a column map from the head of a delimited table of results, for you to correct.",
        footer = {
            "",
            "Example:",
            "  solewright map walk-loads.csv --out results.xml",
            "Beside each column stands what was recognised and how surely; what was not is listed. Corrected, it goes to",
            "'solewright appraise --results results.xml'."
        })
final class MapCommand implements Callable<Integer> {

    @Parameters(paramLabel = "TABLE", description = "Delimited text with a header.")
    private Path table = Path.of("");

    @Option(names = "--out", paramLabel = "R.xml", description = "File to write (default: standard output).")
    private Optional<Path> out = Optional.empty();

    @Spec
    private CommandSpec spec = CommandSpec.create();

    /** For picocli. */
    MapCommand() {}

    @Override
    public Integer call() throws UseCaseException, FormatException {
        if (out.isPresent()
                && out.get()
                        .toAbsolutePath()
                        .normalize()
                        .equals(table.toAbsolutePath().normalize())) {
            throw GaitArguments.usage("--out", "is the table itself", "name another file");
        }
        Optional<Path> folder = out.map(o -> o.toAbsolutePath().getParent());
        String xml = ProposedMap.of(table, folder);
        if (out.isPresent()) {
            ResultText.write(out.get(), xml.getBytes(StandardCharsets.UTF_8));
            spec.commandLine().getOut().println("wrote " + out.get());
        } else {
            spec.commandLine().getOut().print(xml);
        }
        return ExitCode.DONE;
    }
}
