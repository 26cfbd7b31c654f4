package org.solewright.app.cli;

import java.nio.file.Path;
import java.util.Optional;
import java.util.concurrent.Callable;
import org.solewright.app.pipeline.Conversion;
import org.solewright.app.pipeline.UseCaseException;
import org.solewright.formats.io.FormatException;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** A C3D file again, in the form another program wants. */
@Command(
        name = "convert",
        description = "Writes a C3D file again, in the form another program wants, whole or cropped.",
        footer = {
            "",
            "Example: the second from 1.2 s on, as little-endian reals",
            "  solewright convert walk-1.c3d --out part.c3d --processor intel --storage real --from 1.2s --to 2.2s"
        })
final class ConvertCommand implements Callable<Integer> {

    @Parameters(paramLabel = "FILE", description = "C3D file.")
    private Path file = Path.of("");

    @Option(names = "--out", paramLabel = "F.c3d", required = true, description = "File to write.")
    private Path out = Path.of("");

    @Option(names = "--processor", paramLabel = "P", description = "intel, dec or mips (default: the file's own).")
    private Optional<String> processor = Optional.empty();

    @Option(names = "--storage", paramLabel = "S", description = "real or integer (default: the file's own).")
    private Optional<String> storage = Optional.empty();

    @Mixin
    private WindowArguments window = new WindowArguments();

    @Spec
    private CommandSpec spec = CommandSpec.create();

    /** For picocli. */
    ConvertCommand() {}

    @Override
    public Integer call() throws UseCaseException, FormatException {
        Conversion done = Conversion.write(new Conversion.Request(
                file, out, processor, storage, window.from(), window.to(), window.isFlagIgnored()));
        FindingPrinter.print(spec.commandLine().getErr(), done.findings());
        spec.commandLine().getOut().println(done.line());
        return ExitCode.DONE;
    }
}
