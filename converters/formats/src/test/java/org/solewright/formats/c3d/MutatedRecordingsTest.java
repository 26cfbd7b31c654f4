package org.solewright.formats.c3d;

import static org.assertj.core.api.Assertions.assertThat;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import com.fasterxml.jackson.databind.JsonNode;
import java.io.IOException;
import java.io.RandomAccessFile;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.solewright.domain.motion.PointTrack;
import org.solewright.domain.motion.RecordedEvent;
import org.solewright.formats.io.FormatException;

/**
 * Recordings cut at many places and with single bytes of header and parameters turned: each is read, or refused in one
 * sentence. A share of the bytes is drawn with a fixed seed; {@code -Dsolewright.mutations=1} turns every one.
 */
class MutatedRecordingsTest {

    private static final long SEED = 20261201;
    private static final int CUTS = 50;
    private static final int MOST_PARAMETER_BYTES = 1 << 18;

    @TempDir
    private Path folder;

    /** Reads, and where that goes, all of it, and writes what was read. */
    private static boolean read(Path path, boolean isWritten, int form, Path copy) throws IOException {
        try {
            C3dFile file = C3dFile.read(path);
            file.toRecording();
            if (isWritten) {
                C3dCopy.write(file, wanted(file, form), copy);
                C3dFile again = C3dFile.read(copy);
                assertThat(again.frames()).isEqualTo(file.frames());
                assertThat(again.firstFrame()).isEqualTo(file.firstFrame());
                int points = file.labels().size();
                assertThat(again.labels().subList(0, points)).isEqualTo(file.labels());
            }
            return true;
        } catch (FormatException e) {
            assertThat(e.getMessage()).isNotBlank().doesNotContain("\n");
            return false;
        }
    }

    /** As it is, or in one of the six encodings with a computed point and event. */
    private static C3dCopy.Wanted wanted(C3dFile file, int form) {
        if (form % 7 == 6) {
            return C3dCopy.Wanted.like(file);
        }
        double[] xyz = new double[3 * file.frames()];
        Arrays.fill(xyz, 0.5);
        return new C3dCopy.Wanted(
                Processor.values()[form % 7 / 2],
                form % 2 == 0,
                0,
                file.frames() - 1,
                List.of(new AddedPoint(PointTrack.of("COMPUTED", xyz), "by a test")),
                List.of(new RecordedEvent(1, "Left", "Computed", RecordedEvent.Source.GROUP)));
    }

    private void mutate(Path original, double share) throws IOException {
        Path path = folder.resolve("mutated.c3d");
        Path copy = folder.resolve("copy.c3d");
        Files.copy(original, path, StandardCopyOption.REPLACE_EXISTING);
        long size = Files.size(path);
        Random random = new Random(SEED + size);
        long data = Math.min(size, end(original, size));
        try (RandomAccessFile file = new RandomAccessFile(path.toFile(), "rw")) {
            int turned = 0;
            for (long at = 0; at < data; at++) {
                if (random.nextDouble() >= share) {
                    continue;
                }
                file.seek(at);
                int before = file.read();
                for (int after : new int[] {before ^ 0xff, random.nextInt(256)}) {
                    file.seek(at);
                    file.write(after);
                    turned++;
                    String where = original.getFileName() + ", byte " + at + " is " + after + " for " + before;
                    try {
                        read(path, turned % 5 == 0, turned, copy);
                    } catch (RuntimeException | AssertionError e) {
                        throw new AssertionError(where, e);
                    }
                }
                file.seek(at);
                file.write(before);
            }
            for (int cut = CUTS - 1; cut >= 0; cut--) {
                file.setLength(size * cut / CUTS + random.nextInt(7));
                try {
                    read(path, false, 0, copy);
                } catch (RuntimeException e) {
                    throw new AssertionError(original.getFileName() + " cut to " + file.length() + " bytes", e);
                }
            }
        }
    }

    /** Header and parameters, as far as the good file says. */
    private static long end(Path original, long size) {
        try {
            C3dFile file = C3dFile.readHeader(original);
            double start = file.parameters()
                    .find("POINT", "DATA_START")
                    .map(d -> d.unsigned(0))
                    .orElse(3.0);
            return Math.min(MOST_PARAMETER_BYTES, Math.max(1, (long) start - 1) * 512);
        } catch (IOException | FormatException e) {
            return Math.min(size, 4096);
        }
    }

    private static double share(double usual) {
        return Double.parseDouble(System.getProperty("solewright.mutations", Double.toString(usual)));
    }

    @Test
    void ownRecordings() throws IOException {
        for (String name : new String[] {"good.c3d", "gap_before_data.c3d", "dec_int.c3d", "mips_int.c3d"}) {
            mutate(Recordings.own(name), share(0.05));
        }
    }

    @Test
    void realRecordings() throws IOException {
        assumeTrue(Recordings.shared().isPresent(), "the shared recordings are not beside this checkout");
        Path shared = Recordings.shared().orElseThrow();
        for (JsonNode truth : Recordings.lines(shared.resolve("truth.jsonl"))) {
            mutate(shared.resolve("files").resolve(truth.get("file").asText()), share(0.01));
        }
    }
}
