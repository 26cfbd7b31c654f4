package org.solewright.app.cli;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.Callable;
import org.solewright.app.pipeline.ProposedLandmarks;
import org.solewright.app.pipeline.UseCaseException;
import org.solewright.formats.io.AtomicOutput;
import org.solewright.formats.io.FormatException;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** Proposes a landmark map. */
@Command(
        name = "landmarks",
        description = "Proposes a landmark map from the labels of recordings, for you to confirm.",
        footer = {
            "",
            "Example:",
            "  solewright landmarks standing.c3d walk-1.c3d --out map.xml",
            "Then open map.xml, confirm or correct every line, and give it to fit as --landmarks."
        })
final class LandmarksCommand implements Callable<Integer> {

    @Parameters(arity = "1..*", paramLabel = "FILE", description = "C3D files; a standing recording first.")
    private List<Path> files = new ArrayList<>();

    @Option(names = "--out", paramLabel = "MAP.xml", description = "File to write instead of standard output.")
    private Optional<Path> out = Optional.empty();

    @Option(
            names = "--name",
            paramLabel = "TEXT",
            defaultValue = "proposed",
            description = "Name of the map (default: ${DEFAULT-VALUE}).")
    private String name = "proposed";

    @Spec
    private CommandSpec spec = CommandSpec.create();

    /** For picocli. */
    LandmarksCommand() {}

    @Override
    public Integer call() throws UseCaseException, FormatException {
        ProposedLandmarks proposal = ProposedLandmarks.of(files, name);
        if (out.isPresent()) {
            write(out.get(), proposal.xml());
            spec.commandLine().getOut().println("wrote " + out.get());
        } else {
            spec.commandLine().getOut().print(proposal.xml());
        }
        FindingPrinter.print(spec.commandLine().getErr(), proposal.findings());
        return ExitCode.DONE;
    }

    private void write(Path file, String xml) throws UseCaseException {
        if (files.stream()
                .anyMatch(f -> f.toAbsolutePath()
                        .normalize()
                        .equals(file.toAbsolutePath().normalize()))) {
            throw new UseCaseException(
                    UseCaseException.Kind.OUTPUT,
                    file.toString(),
                    "is an input of this call and would be replaced",
                    "give another --out");
        }
        try {
            AtomicOutput.write(file, xml.getBytes(StandardCharsets.UTF_8));
        } catch (IOException e) {
            throw new UseCaseException(
                    UseCaseException.Kind.OUTPUT,
                    file.toString(),
                    "cannot be written (" + e.getMessage() + ")",
                    "give another --out",
                    e);
        }
    }
}
