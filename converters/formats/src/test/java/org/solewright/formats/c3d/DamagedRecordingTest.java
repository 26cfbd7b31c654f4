package org.solewright.formats.c3d;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.solewright.domain.finding.Finding;
import org.solewright.formats.io.FormatException;

/** Damage made by patching a good file: it is read, or refused in one clear sentence; nothing else happens. */
class DamagedRecordingTest {

    @TempDir
    private Path folder;

    private static byte[] good() throws IOException {
        return Files.readAllBytes(Recordings.own("good.c3d"));
    }

    private C3dFile read(byte[] bytes) throws IOException, FormatException {
        Path file = folder.resolve("damaged.c3d");
        Files.write(file, bytes);
        return C3dFile.read(file);
    }

    @Test
    void emptyFileIsSaidToBeEmpty() {
        assertThatThrownBy(() -> read(new byte[0]))
                .isInstanceOf(FormatException.class)
                .hasMessage("is empty");
    }

    @Test
    void wrongKeyNamesWhatWasFound() throws IOException {
        byte[] b = good();
        b[1] = 0x51;
        assertThatThrownBy(() -> read(b)).hasMessage("is not a C3D file: byte 1 is 0x51, expected 0x50");
        assertThatThrownBy(() -> C3dFile.read(Recordings.own("not_a_c3d_key.c3d")))
                .isInstanceOf(FormatException.class);
    }

    @Test
    void pictureWhoseSecondByteIsTheKeyIsRefused() {
        byte[] png = new byte[80000];
        Arrays.fill(png, (byte) 0x77);
        System.arraycopy(new byte[] {(byte) 0x89, 'P', 'N', 'G', 13, 10, 26, 10}, 0, png, 0, 8);
        assertThatThrownBy(() -> read(png))
                .isInstanceOf(FormatException.class)
                .hasMessageStartingWith("is not a C3D file");
    }

    @Test
    void smallPictureIsCalledOne() {
        byte[] png = new byte[700];
        System.arraycopy(new byte[] {(byte) 0x89, 'P', 'N', 'G', 13, 10, 26, 10}, 0, png, 0, 8);
        assertThatThrownBy(() -> read(png))
                .isInstanceOf(FormatException.class)
                .hasMessage("is not a C3D file: it is a PNG picture");
    }

    @Test
    void folderIsNoRecording() {
        assertThatThrownBy(() -> C3dFile.read(folder))
                .isInstanceOf(FormatException.class)
                .hasMessage("is not a regular file");
    }

    @Test
    void unsignedFormsOfANegativeFlagAreMissing() throws IOException, FormatException {
        byte[] b = good();
        // good.c3d has its data in block 3, floats, so the fourth word of the first point is at 1024 + 12; its first
        // sample is valid by its truth.
        for (float word : new float[] {65535f, 65534f, 32768f}) {
            ByteBuffer.wrap(b).order(ByteOrder.LITTLE_ENDIAN).putFloat(1036, word);
            assertThat(read(b).points().isValid(0, 0)).as("%s", word).isFalse();
        }
        for (float word : new float[] {32767f, 65536f, 1.7e38f}) {
            ByteBuffer.wrap(b).order(ByteOrder.LITTLE_ENDIAN).putFloat(1036, word);
            assertThat(read(b).points().isValid(0, 0)).as("%s", word).isTrue();
        }
    }

    @Test
    void cutAnywhereIsReadAsFarAsItGoesOrRefused() throws IOException {
        byte[] b = good();
        for (int length = 0; length < b.length; length += 61) {
            try {
                C3dFile file = read(Arrays.copyOf(b, length));
                if (file.frames() < 80) {
                    assertThat(file.findings()).extracting(Finding::code).contains("file.truncated");
                }
            } catch (FormatException e) {
                assertThat(e.getMessage()).isNotBlank().doesNotContain("\n");
            }
        }
    }

    @Test
    void truncatedInsideAFrameGivesTheWholeFrames() throws IOException, FormatException {
        C3dFile file = C3dFile.read(Recordings.own("truncated_mid_frame.c3d"));
        // independent: the truth of this file says 37 of 80 frames.
        assertThat(file.frames()).isEqualTo(37);
        assertThat(file.findings()).extracting(Finding::code).contains("file.truncated");
    }

    @Test
    void hugeCountsAllocateNothing() throws IOException {
        for (int at : new int[] {2, 4, 6, 8, 16, 18}) {
            byte[] b = good();
            b[at] = (byte) 0xff;
            b[at + 1] = (byte) 0xff;
            try {
                assertThat(read(b).points().points()).isLessThanOrEqualTo(65535);
            } catch (FormatException e) {
                assertThat(e.getMessage()).isNotBlank();
            }
        }
    }

    @Test
    void parameterWithImpossibleDimensionsIsCut() throws IOException, FormatException {
        byte[] b = good();
        int at = indexOf(b, "LABELS") + "LABELS".length() + 2;
        // Type, number of dimensions: seven dimensions of whatever follows.
        b[at + 1] = 7;
        Arrays.fill(b, at + 2, at + 9, (byte) 0xff);
        C3dFile file = read(b);
        assertThat(file.findings()).extracting(Finding::code).contains("parameters.cut");
        assertThat(file.frames()).isEqualTo(80);
    }

    private static int indexOf(byte[] b, String text) {
        String all = new String(b, java.nio.charset.StandardCharsets.ISO_8859_1);
        return all.indexOf(text);
    }

    @Test
    void randomDamageIsReadOrRefused() throws IOException {
        long seed = 20261201;
        Random random = new Random(seed);
        byte[] good = good();
        for (int run = 0; run < 4000; run++) {
            byte[] b = good.clone();
            int changes = 1 + random.nextInt(12);
            for (int k = 0; k < changes; k++) {
                b[random.nextInt(random.nextBoolean() ? 1200 : b.length)] =
                        (byte) (random.nextInt(3) == 0 ? 0xff : random.nextInt(256));
            }
            b[1] = 0x50;
            try {
                read(b).toRecording();
            } catch (FormatException e) {
                assertThat(e.getMessage()).as("seed " + seed + " run " + run).isNotBlank();
            }
        }
    }
}
