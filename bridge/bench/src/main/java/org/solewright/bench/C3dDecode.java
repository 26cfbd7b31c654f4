package org.solewright.bench;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.FloatBuffer;
import java.nio.ShortBuffer;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Optional;
import java.util.Set;
import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Level;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.TearDown;
import org.solewright.formats.c3d.C3dFile;
import org.solewright.formats.c3d.C3dReading;
import org.solewright.formats.io.FormatException;

/** Reading C3D files against the plainest loop over the same bytes and against a plain copy of them. */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MICROSECONDS)
public class C3dDecode {

    /** Stands for the generated file of 200 MiB. */
    static final String GENERATED = "generated";

    /** Recordings of the shared folder: large and small reals, integers. */
    static final String[] SHARED = {"s00-human-sample.c3d", "s34-albertoreal.c3d", "s34-albertoint.c3d"};

    /** Which file: the generated one or a recording of the shared folder. */
    @Param(GENERATED)
    public String file = GENERATED;

    private Path folder = Path.of("");
    private Path path = Path.of("");
    private boolean isReal;
    private String label = "";

    /** A recording beside the checkout; empty where it is absent. */
    static Optional<Path> shared(String name) {
        String named = System.getProperty("solewright.shared", "");
        if (!named.isEmpty()) {
            return Optional.of(Path.of(named, "c3d", "files", name)).filter(Files::isRegularFile);
        }
        for (Path p = Path.of("").toAbsolutePath(); p != null; p = p.getParent()) {
            Path found = p.resolve(Path.of("shared", "c3d", "files", name));
            if (Files.isRegularFile(found)) {
                return Optional.of(found);
            }
        }
        return Optional.empty();
    }

    /**
     * Finds or writes the file.
     *
     * @throws IOException where the folder for temporary files cannot be used
     * @throws FormatException where the file is broken
     */
    @Setup(Level.Trial)
    public void find() throws IOException, FormatException {
        if (file.equals(GENERATED)) {
            folder = Files.createTempDirectory("solewright-bench");
            path = folder.resolve("generated.c3d");
            GeneratedRecording.write(path);
        } else {
            path = shared(file).orElseThrow(() -> new IllegalStateException(file + " is not there"));
        }
        C3dFile header = C3dFile.readHeader(path);
        isReal = header.isReal();
        label = header.labels().get(0);
    }

    /**
     * Removes what was written.
     *
     * @throws IOException where it cannot be removed
     */
    @TearDown(Level.Trial)
    public void remove() throws IOException {
        if (file.equals(GENERATED)) {
            Files.deleteIfExists(path);
            Files.deleteIfExists(folder);
        }
    }

    /**
     * The reader.
     *
     * @return the file
     * @throws IOException where it fails
     * @throws FormatException where the file is broken
     */
    @Benchmark
    public C3dFile read() throws IOException, FormatException {
        return C3dFile.read(path);
    }

    /**
     * One point without analog samples.
     *
     * @return the file
     * @throws IOException where it fails
     * @throws FormatException where the file is broken
     */
    @Benchmark
    public C3dFile readOnePoint() throws IOException, FormatException {
        return C3dFile.read(path, C3dReading.only(Set.of(label)));
    }

    /**
     * Header and parameters.
     *
     * @return the file without samples
     * @throws IOException where it fails
     * @throws FormatException where the file is broken
     */
    @Benchmark
    public C3dFile readHeader() throws IOException, FormatException {
        return C3dFile.readHeader(path);
    }

    /**
     * All bytes, every word of them widened.
     *
     * @return the words
     * @throws IOException where it fails
     */
    @Benchmark
    public double[] plain() throws IOException {
        ByteBuffer bytes = ByteBuffer.wrap(Files.readAllBytes(path)).order(ByteOrder.LITTLE_ENDIAN);
        if (!isReal) {
            ShortBuffer words = bytes.asShortBuffer();
            double[] wide = new double[words.remaining()];
            for (int i = 0; i < wide.length; i++) {
                wide[i] = words.get(i);
            }
            return wide;
        }
        FloatBuffer words = bytes.asFloatBuffer();
        double[] wide = new double[words.remaining()];
        for (int i = 0; i < wide.length; i++) {
            wide[i] = words.get(i);
        }
        return wide;
    }

    /**
     * All bytes, copied once in memory.
     *
     * @return the copy
     * @throws IOException where it fails
     */
    @Benchmark
    public byte[] copy() throws IOException {
        return Files.readAllBytes(path).clone();
    }
}
