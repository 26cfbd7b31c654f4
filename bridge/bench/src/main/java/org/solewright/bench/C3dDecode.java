package org.solewright.bench;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.FloatBuffer;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Set;
import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Level;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.TearDown;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.geometry.Vec3;
import org.solewright.domain.motion.PointTrack;
import org.solewright.domain.motion.Recording;
import org.solewright.formats.c3d.C3dFile;
import org.solewright.formats.c3d.C3dReading;
import org.solewright.formats.c3d.C3dWriter;
import org.solewright.formats.io.FormatException;

/** A real file of 170 MB (60 points, 42 channels at 10 samples a frame) against the plainest loop over the same bytes. */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MICROSECONDS)
public class C3dDecode {

    private static final int FRAMES = 65_000;
    private static final int POINTS = 60;
    private static final int PLATFORMS = 7;
    private static final int PER_FRAME = 10;

    private Path file = Path.of("");

    /**
     * Writes the file.
     *
     * @throws IOException where the folder for temporary files cannot be used
     */
    @Setup(Level.Trial)
    public void write() throws IOException {
        List<PointTrack> points = new ArrayList<>();
        double[] xyz = new double[3 * FRAMES];
        for (int k = 0; k < POINTS; k++) {
            double start = k;
            Arrays.setAll(xyz, i -> Math.sin(0.001 * i + start));
            points.add(PointTrack.of("P" + k, xyz));
        }
        List<PlatformLoads> platforms = new ArrayList<>();
        double[] load = new double[3 * FRAMES * PER_FRAME];
        Arrays.setAll(load, i -> 400 + 300 * Math.sin(0.0003 * i));
        for (int k = 0; k < PLATFORMS; k++) {
            List<Vec3> corners =
                    List.of(new Vec3(k + 0.9, 0.5, 0), new Vec3(k, 0.5, 0), new Vec3(k, 0, 0), new Vec3(k + 0.9, 0, 0));
            platforms.add(new PlatformLoads(k + 1, 2, corners, Vec3.Z, 1000, 0, true, load, new double[load.length]));
        }
        file = Files.createTempFile("solewright-bench", ".c3d");
        C3dWriter.write(file, new Recording("bench.c3d", 100, 1, FRAMES, points, platforms, List.of(), List.of()));
    }

    /**
     * Removes the file.
     *
     * @throws IOException where it cannot be removed
     */
    @TearDown(Level.Trial)
    public void remove() throws IOException {
        Files.deleteIfExists(file);
    }

    /**
     * The reader.
     *
     * @return the file's content
     * @throws IOException where it cannot be read
     * @throws FormatException never
     */
    @Benchmark
    public C3dFile read() throws IOException, FormatException {
        return C3dFile.read(file);
    }

    /**
     * The plainest loop: all bytes read, every real widened.
     *
     * @return the reals
     * @throws IOException where the file cannot be read
     */
    @Benchmark
    public double[] plain() throws IOException {
        FloatBuffer reals = ByteBuffer.wrap(Files.readAllBytes(file))
                .order(ByteOrder.LITTLE_ENDIAN)
                .asFloatBuffer();
        double[] all = new double[reals.remaining()];
        for (int i = 0; i < all.length; i++) {
            all[i] = reals.get(i);
        }
        return all;
    }

    /**
     * The bytes alone.
     *
     * @return the bytes
     * @throws IOException where the file cannot be read
     */
    @Benchmark
    public byte[] copy() throws IOException {
        return Files.readAllBytes(file);
    }

    /**
     * Header and parameters.
     *
     * @return the file without samples
     * @throws IOException where it cannot be read
     * @throws FormatException never
     */
    @Benchmark
    public C3dFile header() throws IOException, FormatException {
        return C3dFile.readHeader(file);
    }

    /**
     * Two of the sixty points.
     *
     * @return the file with these points
     * @throws IOException where it cannot be read
     * @throws FormatException never
     */
    @Benchmark
    public C3dFile twoPoints() throws IOException, FormatException {
        return C3dFile.read(file, C3dReading.only(Set.of("P3", "P40")));
    }
}
