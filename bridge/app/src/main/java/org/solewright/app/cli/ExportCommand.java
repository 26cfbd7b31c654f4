package org.solewright.app.cli;

import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.Optional;
import java.util.concurrent.Callable;
import org.solewright.app.pipeline.ExportUseCase;
import org.solewright.app.pipeline.UseCaseException;
import org.solewright.formats.export.Exported;
import org.solewright.formats.io.FormatException;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;

/** A foot model in another format. */
@Command(
        name = "export",
        description = "Writes a foot model in another format, by one of our templates or your own (XSLT 3.0).",
        footer = {
            "",
            "Example: the right foot for a rigid-body simulation",
            "  solewright export --model foot-model-right.xml --template urdf --out foot-right.urdf",
            "hanim: X3D 4.0 with HAnim; urdf: URDF, z up; table: every parameter with unit and basis, CSV;",
            "template-kit: the stylesheet to start your own from (see README.md in the folder templates)."
        })
final class ExportCommand implements Callable<Integer> {

    @Spec
    private CommandSpec spec = CommandSpec.create();

    @Option(names = "--model", required = true, paramLabel = "M.xml", description = "Foot model that fit wrote.")
    private Path model = Path.of("");

    @Option(
            names = "--template",
            required = true,
            paramLabel = "NAME|FILE.xsl",
            description = "hanim, urdf, table, template-kit, or the file of your own stylesheet.")
    private String template = "";

    @Option(names = "--out", paramLabel = "F", description = "File to write; default: standard output.")
    private Optional<Path> out = Optional.empty();

    /** For picocli. */
    ExportCommand() {}

    @Override
    public Integer call() throws UseCaseException, FormatException {
        Exported exported = ExportUseCase.run(model, template, out);
        if (out.isEmpty()) {
            spec.commandLine().getOut().print(new String(exported.content(), StandardCharsets.UTF_8));
        }
        FindingPrinter.print(spec.commandLine().getErr(), exported.findings());
        return ExitCode.DONE;
    }
}
