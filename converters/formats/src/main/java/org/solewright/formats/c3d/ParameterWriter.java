package org.solewright.formats.c3d;

import java.io.ByteArrayOutputStream;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.util.List;

/**
 * Builds a parameter section (Intel numbers). What some readers choke on is not written: the last link is 0, the block
 * count is right, every record has a description.
 */
final class ParameterWriter {

    private static final int BLOCK = 512;
    private static final int LONGEST = 255;

    private final ByteArrayOutputStream records = new ByteArrayOutputStream();
    private int groups;
    private int lastLink = -1;

    /** Starts a group; what follows belongs to it. */
    void group(String name, String description) {
        groups++;
        record(name, -groups, new byte[0], description);
    }

    void integers(String name, String description, int[] values, int... dimensions) {
        ByteBuffer data = head(2, values.length * 2, dimensions);
        for (int v : values) {
            data.putShort((short) v);
        }
        record(name, groups, content(data), description);
    }

    void reals(String name, String description, double[] values, int... dimensions) {
        ByteBuffer data = head(4, values.length * 4, dimensions);
        for (double v : values) {
            data.putFloat((float) v);
        }
        record(name, groups, content(data), description);
    }

    /** Lines of text, padded to the longest. */
    void texts(String name, String description, List<String> lines) {
        int width = 1;
        for (String line : lines) {
            width = Math.max(width, bytes(line).length);
        }
        if (width > LONGEST || lines.size() > LONGEST) {
            throw new IllegalArgumentException(name + " has " + lines.size() + " lines of up to " + width
                    + " bytes, expected at most 255 of each");
        }
        ByteBuffer data = head(-1, width * lines.size(), width, lines.size());
        for (String line : lines) {
            byte[] text = bytes(line);
            data.put(text);
            for (int k = text.length; k < width; k++) {
                data.put((byte) ' ');
            }
        }
        record(name, groups, content(data), description);
    }

    void text(String name, String description, String value) {
        byte[] text = bytes(value);
        ByteBuffer data = head(-1, text.length, text.length);
        data.put(text);
        record(name, groups, content(data), description);
    }

    private static byte[] bytes(String text) {
        return text.getBytes(StandardCharsets.UTF_8);
    }

    private static ByteBuffer head(int type, int bytes, int... dimensions) {
        ByteBuffer data = ByteBuffer.allocate(2 + dimensions.length + bytes).order(ByteOrder.LITTLE_ENDIAN);
        data.put((byte) type);
        data.put((byte) dimensions.length);
        for (int d : dimensions) {
            data.put((byte) d);
        }
        return data;
    }

    private static byte[] content(ByteBuffer data) {
        byte[] all = new byte[data.position()];
        data.flip();
        data.get(all);
        return all;
    }

    private void record(String name, int id, byte[] data, String description) {
        byte[] words = bytes(description);
        byte[] title = bytes(name);
        records.write(title.length);
        records.write(id);
        records.writeBytes(title);
        lastLink = records.size();
        int next = 2 + data.length + 1 + words.length;
        records.write(next & 0xff);
        records.write(next >> 8);
        records.writeBytes(data);
        records.write(words.length);
        records.writeBytes(words);
    }

    /** Blocks that the section takes. */
    int blocks() {
        return (4 + records.size() + BLOCK - 1) / BLOCK;
    }

    /** The whole section, filled up to full blocks. */
    byte[] section() {
        byte[] section = new byte[blocks() * BLOCK];
        section[0] = 1;
        section[1] = 0x50;
        section[2] = (byte) blocks();
        section[3] = (byte) Processor.INTEL.key();
        byte[] all = records.toByteArray();
        if (lastLink >= 0) {
            all[lastLink] = 0;
            all[lastLink + 1] = 0;
        }
        System.arraycopy(all, 0, section, 4, all.length);
        return section;
    }
}
