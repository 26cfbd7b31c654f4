package org.solewright.bench;

import com.sun.management.ThreadMXBean;
import java.io.IOException;
import java.io.PrintWriter;
import java.lang.management.ManagementFactory;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Locale;
import java.util.Set;
import org.solewright.formats.c3d.C3dFile;
import org.solewright.formats.c3d.C3dReading;
import org.solewright.formats.io.FormatException;

/**
 * First calls on the generated file in a fresh process: time of reading the header, and all bytes that a reading allocates,
 * which its peak heap cannot exceed.
 */
final class C3dMemory {

    private static final double MEGA = 1 << 20;

    private C3dMemory() {}

    static void print(PrintWriter out) throws IOException {
        Path folder = Files.createTempDirectory("solewright-bench");
        Path file = folder.resolve("generated.c3d");
        try {
            GeneratedRecording.write(file);
            long start = System.nanoTime();
            C3dFile.readHeader(file);
            double first = (System.nanoTime() - start) / 1e6;
            out.printf(
                    Locale.ROOT,
                    "%8.3f  first header of the 200 MiB file over 50 ms (%.1f ms), at most 1%n",
                    first / 50,
                    first);
            double words = (double) GeneratedRecording.FRAMES * GeneratedRecording.FRAME_WORDS;
            allocated(out, file, C3dReading.everything(), "all", words * Float.BYTES);
            double four = 4.0 * GeneratedRecording.FRAMES;
            allocated(out, file, C3dReading.only(Set.of("point_7")), "one point", four * Float.BYTES);
        } catch (FormatException e) {
            throw new IllegalStateException(e);
        } finally {
            Files.deleteIfExists(file);
            Files.deleteIfExists(folder);
        }
    }

    private static void allocated(PrintWriter out, Path file, C3dReading reading, String what, double arrays)
            throws IOException, FormatException {
        ThreadMXBean thread = (ThreadMXBean) ManagementFactory.getThreadMXBean();
        long before = thread.getCurrentThreadAllocatedBytes();
        C3dFile.read(file, reading);
        double bytes = thread.getCurrentThreadAllocatedBytes() - before;
        out.printf(
                Locale.ROOT,
                "%8.3f  heap allocated over the arrays of %s and 64 MiB (%.1f of %.1f MiB), at most 1%n",
                bytes / (arrays + 64 * MEGA),
                what,
                bytes / MEGA,
                arrays / MEGA);
    }
}
