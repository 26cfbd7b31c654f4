package org.solewright.formats.c3d;

import java.io.IOException;
import java.io.OutputStream;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;

/** Numbers in the order and form of one processor, to a stream through one buffer. */
final class WordOutput {

    private static final int BUFFER = 1 << 16;
    private static final int LONGEST = 4;

    private final OutputStream out;
    private final Processor processor;
    private final ByteBuffer buffer;

    WordOutput(OutputStream out, Processor processor) {
        this.out = out;
        this.processor = processor;
        this.buffer = ByteBuffer.allocate(BUFFER)
                .order(processor == Processor.MIPS ? ByteOrder.BIG_ENDIAN : ByteOrder.LITTLE_ENDIAN);
    }

    /** The 32-bit word that stands for a number in the order of the buffer. */
    static int word(float value, Processor processor) {
        return processor == Processor.DEC ? VaxFloat.word(value) : Float.floatToRawIntBits(value);
    }

    void real(float value) throws IOException {
        room();
        buffer.putInt(word(value, processor));
    }

    void integer(int value) throws IOException {
        room();
        buffer.putShort((short) value);
    }

    private void room() throws IOException {
        if (buffer.remaining() < LONGEST) {
            flush();
        }
    }

    void flush() throws IOException {
        out.write(buffer.array(), 0, buffer.position());
        buffer.clear();
    }
}
