package org.solewright.formats.c3d;

import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import org.solewright.formats.io.FormatException;

/**
 * Bounds-checked reading of numbers and text from a file's bytes in the order of one processor. Positions are offsets from
 * the start of the file; a field that does not end inside the file is an error that names its offset.
 */
final class ByteCursor {

    private final String source;
    private final byte[] bytes;
    private final Processor processor;

    ByteCursor(String source, byte[] bytes, Processor processor) {
        this.source = source;
        this.bytes = bytes;
        this.processor = processor;
    }

    ByteCursor as(Processor other) {
        return new ByteCursor(source, bytes, other);
    }

    String source() {
        return source;
    }

    int length() {
        return bytes.length;
    }

    Processor processor() {
        return processor;
    }

    boolean holds(long offset, long count) {
        return offset >= 0 && count >= 0 && offset + count <= bytes.length;
    }

    int u8(int offset) throws FormatException {
        check(offset, 1);
        return bytes[offset] & 0xff;
    }

    int i8(int offset) throws FormatException {
        check(offset, 1);
        return bytes[offset];
    }

    int u16(int offset) throws FormatException {
        check(offset, 2);
        return rawU16(offset);
    }

    int i16(int offset) throws FormatException {
        return (short) u16(offset);
    }

    float f32(int offset) throws FormatException {
        check(offset, 4);
        return rawF32(offset);
    }

    /** Without a check: the caller has made sure that the block lies inside the file. */
    int rawU16(int offset) {
        int a = bytes[offset] & 0xff;
        int b = bytes[offset + 1] & 0xff;
        return processor == Processor.MIPS ? (a << 8) | b : (b << 8) | a;
    }

    /** Without a check: the caller has made sure that the block lies inside the file. */
    float rawF32(int offset) {
        int a = bytes[offset] & 0xff;
        int b = bytes[offset + 1] & 0xff;
        int c = bytes[offset + 2] & 0xff;
        int d = bytes[offset + 3] & 0xff;
        return switch (processor) {
            case INTEL -> Float.intBitsToFloat((d << 24) | (c << 16) | (b << 8) | a);
            case MIPS -> Float.intBitsToFloat((a << 24) | (b << 16) | (c << 8) | d);
            case DEC -> VaxFloat.of((d << 24) | (c << 16) | (b << 8) | a);
        };
    }

    /** Text as stored: Windows-1252 where it is no valid UTF-8; trailing blanks and zeros dropped. */
    String text(int offset, int count) throws FormatException {
        check(offset, count);
        int end = offset + count;
        while (end > offset && (bytes[end - 1] == ' ' || bytes[end - 1] == 0)) {
            end--;
        }
        return Text.decode(bytes, offset, end - offset);
    }

    /** The first words of the file, without sign. */
    List<Integer> words(int count) throws FormatException {
        List<Integer> words = new ArrayList<>();
        for (int i = 0; i < count; i++) {
            words.add(u16(2 * i));
        }
        return words;
    }

    /** Bytes as characters of the same numbers. */
    String latin(int offset, int count) throws FormatException {
        check(offset, count);
        return new String(bytes, offset, count, StandardCharsets.ISO_8859_1);
    }

    private void check(int offset, int count) throws FormatException {
        if (!holds(offset, count)) {
            throw new FormatException(
                    source,
                    "ends at byte " + bytes.length + " inside a field of " + count + " bytes at offset " + offset,
                    "get a complete copy of the file");
        }
    }
}
