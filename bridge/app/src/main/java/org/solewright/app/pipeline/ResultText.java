package org.solewright.app.pipeline;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.solewright.formats.io.AtomicOutput;

/** Writes a result where the user wants it, whole or not at all. */
public final class ResultText {

    private ResultText() {}

    /**
     * Writes a file.
     *
     * @param file target; its folder must exist
     * @param content all bytes
     * @throws UseCaseException where the file cannot be written
     */
    public static void write(Path file, byte[] content) throws UseCaseException {
        write(file, out -> out.write(content));
    }

    /** Writes a file piece by piece; where that fails the file is as before. */
    static void write(Path file, AtomicOutput.Filler filler) throws UseCaseException {
        try {
            if (Files.isDirectory(file)) {
                throw new IOException("it is a folder");
            }
            AtomicOutput.write(file, filler);
        } catch (IOException e) {
            throw new UseCaseException(
                    UseCaseException.Kind.OUTPUT,
                    file.toString(),
                    "cannot be written (" + e.getClass().getSimpleName() + ")",
                    "name a file in an existing folder that may be written",
                    e);
        }
    }
}
