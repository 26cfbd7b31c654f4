package org.solewright.formats.io;

import java.io.IOException;
import java.io.OutputStream;
import java.nio.file.AtomicMoveNotSupportedException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.util.concurrent.atomic.AtomicLong;

/** Writes a file beside its target and renames it, so that a half-written file never bears the target's name. */
public final class AtomicOutput {

    /** What fills the file. */
    @FunctionalInterface
    public interface Filler {
        /**
         * Writes the whole content.
         *
         * @param out stream to the temporary file, buffered by the caller where needed
         * @throws IOException where writing fails
         */
        void fill(OutputStream out) throws IOException;
    }

    private static final AtomicLong COUNT = new AtomicLong();

    private AtomicOutput() {}

    /**
     * Replaces or creates the target with what the filler writes. Where the filler fails, the target is as before and
     * no other file is left.
     *
     * @param target file to be written; its folder must exist
     * @param filler writes the content
     * @throws IOException where the folder cannot be written or the filler fails
     */
    public static void write(Path target, Filler filler) throws IOException {
        Path absolute = target.toAbsolutePath();
        Path folder = absolute.getParent();
        if (folder == null) {
            throw new IOException(target + " is not a file name");
        }
        if (!Files.isDirectory(folder)) {
            throw new IOException("its folder does not exist");
        }
        // Not createTempFile: its files are for their owner alone, and a result is for everybody who may read the
        // folder.
        Path temporary =
                folder.resolve(".writing-" + ProcessHandle.current().pid() + "-" + COUNT.incrementAndGet() + ".part");
        try {
            try (OutputStream out = Files.newOutputStream(temporary)) {
                filler.fill(out);
            }
            try {
                Files.move(temporary, absolute, StandardCopyOption.ATOMIC_MOVE, StandardCopyOption.REPLACE_EXISTING);
            } catch (AtomicMoveNotSupportedException e) {
                Files.move(temporary, absolute, StandardCopyOption.REPLACE_EXISTING);
            }
        } finally {
            Files.deleteIfExists(temporary);
        }
    }

    /**
     * Replaces or creates the target with these bytes.
     *
     * @param target file to be written; its folder must exist
     * @param content all bytes
     * @throws IOException where the folder cannot be written
     */
    public static void write(Path target, byte[] content) throws IOException {
        write(target, out -> out.write(content));
    }
}
