package org.solewright.formats.c3d;

import com.code_intelligence.jazzer.junit.FuzzTest;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.params.provider.MethodSource;
import org.solewright.formats.io.FormatException;

/**
 * Coverage-guided search for bytes that make the reader fail otherwise than by its exception, and for files that do not come
 * back from the writer. Run by {@code mvn -Pfuzz}, as long as {@code -Djazzer.max_duration=60s} says.
 */
class C3dFuzzTest {

    /** Larger seeds only slow the search. */
    private static final long LARGEST_SEED = 40_000;

    /** The project's own recordings, and the shared ones where they lie beside the checkout. */
    static Stream<byte[]> seeds() throws IOException {
        List<byte[]> seeds = new ArrayList<>();
        List<Path> folders = new ArrayList<>();
        folders.add(Path.of("src/test/resources/org/solewright/formats/c3d"));
        for (Path p = Path.of("").toAbsolutePath(); p != null; p = p.getParent()) {
            if (Files.isDirectory(p.resolve("shared/c3d/files"))) {
                folders.add(p.resolve("shared/c3d/files"));
                break;
            }
        }
        for (Path folder : folders) {
            try (Stream<Path> files = Files.list(folder)) {
                for (Path file : files.filter(f -> f.toString().endsWith(".c3d"))
                        .sorted()
                        .toList()) {
                    if (Files.size(file) <= LARGEST_SEED) {
                        seeds.add(Files.readAllBytes(file));
                    }
                }
            }
        }
        return seeds.stream();
    }

    @MethodSource("seeds")
    @FuzzTest(maxDuration = "60s")
    void bytesAreReadAndComeBackOrAreRefused(byte[] bytes) {
        Path file = null;
        Path copy = null;
        try {
            file = Files.createTempFile("fuzz", ".c3d");
            copy = Files.createTempFile("fuzz", ".copy");
            Files.write(file, bytes);
            C3dFile read = C3dFile.read(file);
            read.toRecording();
            C3dCopy.write(read, C3dCopy.Wanted.like(read), copy);
            C3dFile again = C3dFile.read(copy);
            // Of a value that was cut what is left is written, which may have another shape.
            boolean isCut = read.findings().stream().anyMatch(f -> f.code().equals("parameters.cut"));
            if (again.frames() != read.frames() || (!isCut && !again.labels().equals(read.labels()))) {
                throw new IllegalStateException("a written file reads otherwise than the one it was made of");
            }
        } catch (FormatException e) {
            // Refused in one sentence: that is the promise.
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        } finally {
            delete(file);
            delete(copy);
        }
    }

    private static void delete(Path file) {
        try {
            if (file != null) {
                Files.deleteIfExists(file);
            }
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }
}
