package org.solewright.formats.c3d;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Set;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.solewright.domain.finding.Finding;
import org.solewright.formats.io.FormatException;

/** Parts of a file, flags put aside, and files whose header and parameters disagree. */
class C3dReadingTest {

    @TempDir
    private Path folder;

    private C3dFile changed(Change change) throws IOException, FormatException {
        byte[] bytes = Files.readAllBytes(Recordings.own("good.c3d"));
        change.in(ByteBuffer.wrap(bytes).order(ByteOrder.LITTLE_ENDIAN));
        Path file = folder.resolve("changed.c3d");
        Files.write(file, bytes);
        return C3dFile.read(file);
    }

    private interface Change {
        void in(ByteBuffer file);
    }

    private static C3dFile good() throws IOException, FormatException {
        return C3dFile.read(Recordings.own("good.c3d"));
    }

    private static void isSame(C3dFile found, C3dFile expected) {
        assertThat(found.frames()).isEqualTo(expected.frames());
        for (int frame = 0; frame < found.frames(); frame++) {
            for (int k = 0; k < found.labels().size(); k++) {
                int other = expected.labels().indexOf(found.labels().get(k));
                for (int c = 0; c < 3; c++) {
                    assertThat(found.points().coordinate(frame, k, c))
                            .isEqualTo(expected.points().coordinate(frame, other, c));
                }
                assertThat(found.points().residual(frame, k))
                        .isEqualTo(expected.points().residual(frame, other));
            }
        }
    }

    @Test
    void wantedPointsAloneAreTheSameAsAmongAll() throws IOException, FormatException {
        C3dFile whole = good();
        List<String> labels = whole.labels();
        Set<String> wanted = Set.of(labels.get(0), labels.get(labels.size() - 1));
        C3dFile part = C3dFile.read(Recordings.own("good.c3d"), C3dReading.only(wanted));
        assertThat(part.labels()).containsExactly(labels.get(0), labels.get(labels.size() - 1));
        assertThat(part.points().points()).isEqualTo(2);
        assertThat(part.analog().samples()).isZero();
        isSame(part, whole);
    }

    @Test
    void flagsCanBePutAside() throws IOException, FormatException {
        Path file = Recordings.own("good.c3d");
        C3dFile obeyed = good();
        C3dFile ignored = C3dFile.read(file, C3dReading.everything().ignoringFlags());
        for (int frame = 0; frame < obeyed.frames(); frame++) {
            for (int k = 0; k < obeyed.labels().size(); k++) {
                boolean isPlaced = obeyed.points().coordinate(frame, k, 0) != 0
                        || obeyed.points().coordinate(frame, k, 1) != 0
                        || obeyed.points().coordinate(frame, k, 2) != 0;
                assertThat(ignored.points().isValid(frame, k)).isEqualTo(isPlaced);
            }
        }
    }

    /** Offset of the value of the first parameter of that name in the good file, which has no two alike before it. */
    private static int value(ByteBuffer file, String group, String name) {
        String all = new String(file.array(), StandardCharsets.ISO_8859_1);
        int groupId = -file.get(all.indexOf(group, 512) - 1);
        for (int at = all.indexOf(name, 512); at > 0; at = all.indexOf(name, at + 1)) {
            if (file.get(at - 1) == groupId && file.get(at - 2) == name.length()) {
                int dimensions = file.get(at + name.length() + 3);
                return at + name.length() + 4 + dimensions;
            }
        }
        throw new IllegalStateException("no " + group + ":" + name);
    }

    private static List<String> codes(C3dFile file) {
        return file.findings().stream().map(Finding::code).toList();
    }

    @Test
    void fileSizeTellsWhichDataBlockIsMeant() throws IOException, FormatException {
        C3dFile late = changed(file -> file.putShort(16, (short) (file.getShort(16) + 1)));
        assertThat(codes(late)).contains("data.start");
        isSame(late, good());
        C3dFile parameter = changed(file -> {
            int at = value(file, "POINT", "DATA_START");
            file.putShort(at, (short) (file.getShort(at) + 1));
        });
        assertThat(codes(parameter)).contains("data.start");
        isSame(parameter, good());
    }

    @Test
    void fileSizeTellsWhichStorageIsMeant() throws IOException, FormatException {
        C3dFile header = changed(file -> file.putFloat(12, 0.1f));
        assertThat(codes(header)).contains("points.scale");
        isSame(header, good());
        C3dFile parameter = changed(file -> file.putFloat(value(file, "POINT", "SCALE"), 0.1f));
        assertThat(codes(parameter)).contains("points.scale");
        assertThat(parameter.isReal()).isTrue();
    }

    @Test
    void fileSizeTellsHowManyAnalogSamplesAreInAFrame() throws IOException, FormatException {
        C3dFile file = changed(f -> {
            int at = value(f, "ANALOG", "RATE");
            f.putFloat(at, 2 * f.getFloat(at));
        });
        assertThat(codes(file)).contains("analog.rate");
        assertThat(file.analog().samples()).isEqualTo(good().analog().samples());
        isSame(file, good());
    }

    @Test
    void vaxNumbersOfEveryExponentAgreeWithTheDefinition() {
        for (int exponent = 0; exponent < 256; exponent++) {
            for (int fraction : new int[] {0, 1, 0x400000, 0x7fffff}) {
                for (int sign = 0; sign < 2; sign++) {
                    int bits = (sign << 31) | (exponent << 23) | fraction;
                    // exact: sign x 0.1fraction(binary) x 2^(exponent - 128), exponent 0 is 0. Published: VAX F format.
                    double expected = exponent == 0
                            ? 0
                            : (sign == 0 ? 1 : -1)
                                    * (0.5 + fraction / (double) (1 << 24))
                                    * Math.pow(2, exponent - 128);
                    assertThat(VaxFloat.of(Integer.rotateLeft(bits, 16))).isEqualTo((float) expected);
                }
            }
        }
    }
}
