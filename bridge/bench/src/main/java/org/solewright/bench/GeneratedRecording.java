package org.solewright.bench;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.channels.FileChannel;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.Arrays;

/** A real C3D file of 200 MiB: 60 points, and 32 channels at 10 samples a frame with two platforms among them. */
final class GeneratedRecording {

    static final int POINTS = 60;
    static final int CHANNELS = 32;
    static final int PER_FRAME = 10;
    static final int FRAME_WORDS = 4 * POINTS + CHANNELS * PER_FRAME;
    static final int FRAMES = (200 << 20) / (4 * FRAME_WORDS);

    private static final int BLOCK = 512;
    private static final int PARAMETER_BLOCKS = 10;

    private GeneratedRecording() {}

    /** Writes the file; what stood there is replaced. */
    static void write(Path file) throws IOException {
        try (FileChannel channel = FileChannel.open(
                file, StandardOpenOption.CREATE, StandardOpenOption.WRITE, StandardOpenOption.TRUNCATE_EXISTING)) {
            put(channel, beginning());
            ByteBuffer frames =
                    ByteBuffer.allocate(100 * FRAME_WORDS * Float.BYTES).order(ByteOrder.LITTLE_ENDIAN);
            for (int frame = 0; frame < FRAMES; frame++) {
                for (int point = 0; point < POINTS; point++) {
                    float swing = (float) Math.sin(0.01 * frame + point);
                    frames.putFloat(100 * swing).putFloat(10 * point).putFloat(800 + 50 * swing);
                    frames.putFloat(frame % 50 == point ? -1 : 5);
                }
                for (int k = 0; k < CHANNELS * PER_FRAME; k++) {
                    frames.putFloat((frame * 7 + k * 13) % 1000);
                }
                if (!frames.hasRemaining() || frame == FRAMES - 1) {
                    put(channel, frames.flip());
                    frames.clear();
                }
            }
        }
    }

    private static void put(FileChannel channel, ByteBuffer bytes) throws IOException {
        while (bytes.hasRemaining()) {
            channel.write(bytes);
        }
    }

    private static ByteBuffer beginning() {
        ByteBuffer b = ByteBuffer.allocate((1 + PARAMETER_BLOCKS) * BLOCK).order(ByteOrder.LITTLE_ENDIAN);
        b.put((byte) 2).put((byte) 0x50).putShort((short) POINTS).putShort((short) (CHANNELS * PER_FRAME));
        b.putShort((short) 1).putShort((short) 65535).putShort((short) 0).putFloat(-1);
        b.putShort((short) (2 + PARAMETER_BLOCKS)).putShort((short) PER_FRAME).putFloat(200);
        b.position(BLOCK);
        b.put((byte) 1).put((byte) 0x50).put((byte) PARAMETER_BLOCKS).put((byte) 84);
        group(b, 1, "POINT");
        whole(b, 1, "USED", POINTS);
        reals(b, 1, "SCALE", -1);
        reals(b, 1, "RATE", 200);
        whole(b, 1, "DATA_START", 2 + PARAMETER_BLOCKS);
        whole(b, 1, "FRAMES", 65535);
        reals(b, 1, "LONG_FRAMES", FRAMES);
        text(b, 1, "UNITS", "mm");
        group(b, 2, "ANALOG");
        whole(b, 2, "USED", CHANNELS);
        reals(b, 2, "RATE", 200 * PER_FRAME);
        reals(b, 2, "GEN_SCALE", 1);
        float[] scales = new float[CHANNELS];
        Arrays.fill(scales, 0.5f);
        reals(b, 2, "SCALE", scales);
        whole(b, 2, "OFFSET", new int[CHANNELS]);
        group(b, 3, "FORCE_PLATFORM");
        whole(b, 3, "USED", 2);
        whole(b, 3, "TYPE", 2, 2);
        wholes(b, 3, "CHANNEL", new int[] {6, 2}, 1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12);
        dimensioned(
                b,
                3,
                "CORNERS",
                new int[] {3, 4, 2},
                500,
                500,
                0,
                0,
                500,
                0,
                0,
                0,
                0,
                500,
                0,
                0,
                1000,
                500,
                0,
                500,
                500,
                0,
                500,
                0,
                0,
                1000,
                0,
                0);
        dimensioned(b, 3, "ORIGIN", new int[] {3, 2}, 0, 0, -40, 0, 0, -40);
        group(b, 4, "TRIAL");
        whole(b, 4, "ACTUAL_START_FIELD", 1, 0);
        whole(b, 4, "ACTUAL_END_FIELD", FRAMES & 0xffff, FRAMES >> 16);
        return b.position(0);
    }

    private static void name(ByteBuffer b, int id, String name, int rest) {
        b.put((byte) name.length()).put((byte) id).put(name.getBytes(StandardCharsets.US_ASCII));
        b.putShort((short) (2 + rest));
    }

    private static void group(ByteBuffer b, int id, String name) {
        name(b, -id, name, 1);
        b.put((byte) 0);
    }

    private static void head(ByteBuffer b, int id, String name, int bytesEach, int... dimensions) {
        int count = 1;
        for (int d : dimensions) {
            count *= d;
        }
        name(b, id, name, 3 + dimensions.length + count * Math.abs(bytesEach));
        b.put((byte) bytesEach).put((byte) dimensions.length);
        for (int d : dimensions) {
            b.put((byte) d);
        }
    }

    private static int[] one(int length) {
        return length == 1 ? new int[0] : new int[] {length};
    }

    private static void whole(ByteBuffer b, int id, String name, int... values) {
        wholes(b, id, name, one(values.length), values);
    }

    private static void wholes(ByteBuffer b, int id, String name, int[] dimensions, int... values) {
        head(b, id, name, Short.BYTES, dimensions);
        for (int v : values) {
            b.putShort((short) v);
        }
        b.put((byte) 0);
    }

    private static void reals(ByteBuffer b, int id, String name, float... values) {
        dimensioned(b, id, name, one(values.length), values);
    }

    private static void dimensioned(ByteBuffer b, int id, String name, int[] dimensions, float... values) {
        head(b, id, name, Float.BYTES, dimensions);
        for (float v : values) {
            b.putFloat(v);
        }
        b.put((byte) 0);
    }

    private static void text(ByteBuffer b, int id, String name, String text) {
        head(b, id, name, -1, text.length());
        b.put(text.getBytes(StandardCharsets.US_ASCII)).put((byte) 0);
    }
}
