package org.solewright.app.pipeline;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.Severity;
import org.solewright.formats.c3d.C3dCopy;
import org.solewright.formats.c3d.C3dFile;
import org.solewright.formats.c3d.C3dReading;
import org.solewright.formats.c3d.Processor;
import org.solewright.formats.io.FormatException;

/**
 * A C3D file written again in another form.
 *
 * @param line what was written
 * @param findings of the file and of the writing
 */
public record Conversion(String line, List<Finding> findings) {

    /** Copies the list. */
    public Conversion {
        findings = List.copyOf(findings);
    }

    /**
     * What the user asked for.
     *
     * @param file C3D file
     * @param out file to write
     * @param processor word of the command line; empty: the file's own
     * @param storage word of the command line; empty: the file's own
     * @param from first frame; empty: from the start
     * @param to last frame; empty: to the end
     * @param isFlagIgnored whether samples that are flagged missing are taken for seen
     */
    public record Request(
            Path file,
            Path out,
            Optional<String> processor,
            Optional<String> storage,
            Optional<String> from,
            Optional<String> to,
            boolean isFlagIgnored) {}

    /**
     * Converts a file.
     *
     * @param request what is asked
     * @return what was written
     * @throws UseCaseException where an option or a file cannot be used
     * @throws FormatException where the file is no C3D file or does not fit the wanted form
     */
    public static Conversion write(Request request) throws UseCaseException, FormatException {
        Optional<Processor> processor = processor(request.processor());
        Optional<Boolean> isReal = storage(request.storage());
        C3dReading reading =
                request.isFlagIgnored() ? C3dReading.everything().ignoringFlags() : C3dReading.everything();
        C3dFile file = InputFiles.read(request.file(), f -> C3dFile.read(f, reading));
        for (Finding f : file.findings()) {
            if (f.severity() == Severity.ERROR) {
                throw new UseCaseException(
                        UseCaseException.Kind.INPUT,
                        request.file().toString(),
                        f.message(),
                        "get a complete copy of the file");
            }
        }
        FrameWindow window = request.from().isEmpty() && request.to().isEmpty()
                ? FrameWindow.whole(file)
                : FrameWindow.of(request.file(), file, request.from(), request.to());
        C3dCopy.Wanted wanted = new C3dCopy.Wanted(
                processor.orElse(file.processor()),
                isReal.orElse(file.isReal()),
                window.first(),
                window.last(),
                List.of(),
                List.of());
        List<Finding> findings = new ArrayList<>(file.findings());
        findings.addAll(copy(request.file(), file, wanted, request.out()));
        return new Conversion(
                String.format(
                        Locale.ROOT,
                        "wrote %s: %s, %s samples, frames %d to %d",
                        request.out(),
                        wanted.processor().word(),
                        wanted.isReal() ? "real" : "integer",
                        file.firstFrame() + window.first(),
                        file.firstFrame() + window.last()),
                findings);
    }

    /** Writes a copy; never over the file itself. */
    static List<Finding> copy(Path path, C3dFile file, C3dCopy.Wanted wanted, Path out)
            throws UseCaseException, FormatException {
        try {
            if (Files.exists(out) && Files.isSameFile(out, path)) {
                throw new UseCaseException(
                        UseCaseException.Kind.OUTPUT,
                        out.toString(),
                        "is the input of this call and would be replaced",
                        "give another --out");
            }
            if (Files.isDirectory(out)) {
                throw new IOException("it is a folder");
            }
            return C3dCopy.write(file, wanted, out);
        } catch (IOException e) {
            throw new UseCaseException(
                    UseCaseException.Kind.OUTPUT,
                    out.toString(),
                    "cannot be written (" + e.getMessage() + ")",
                    "give another --out",
                    e);
        }
    }

    private static Optional<Processor> processor(Optional<String> word) throws UseCaseException {
        if (word.isEmpty()) {
            return Optional.empty();
        }
        for (Processor p : Processor.values()) {
            if (p.word().equals(word.get())) {
                return Optional.of(p);
            }
        }
        throw new UseCaseException(
                UseCaseException.Kind.USAGE,
                "--processor",
                "'" + word.get() + "' is unknown",
                "use intel, dec or mips");
    }

    private static Optional<Boolean> storage(Optional<String> word) throws UseCaseException {
        if (word.isEmpty()) {
            return Optional.empty();
        }
        return switch (word.get()) {
            case "real" -> Optional.of(true);
            case "integer" -> Optional.of(false);
            default ->
                throw new UseCaseException(
                        UseCaseException.Kind.USAGE,
                        "--storage",
                        "'" + word.get() + "' is unknown",
                        "use real or integer");
        };
    }
}
