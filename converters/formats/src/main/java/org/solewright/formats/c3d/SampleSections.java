package org.solewright.formats.c3d;

import java.io.EOFException;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.channels.FileChannel;

/**
 * Reads the wanted runs of words of every frame through one buffer: memory is the stores and that buffer, and bytes far
 * from any wanted run are not touched.
 */
final class SampleSections {

    private static final int CHUNK_BYTES = 1 << 20;

    private final FileChannel channel;
    private final DataLayout layout;
    private final boolean isVax;
    private final int wordBytes;
    private final ByteBuffer chunk;
    private long chunkFrom;
    private long chunkTo;

    SampleSections(FileChannel channel, DataLayout layout, Processor processor) {
        this.channel = channel;
        this.layout = layout;
        this.isVax = processor == Processor.DEC;
        this.wordBytes = layout.wordBytes();
        this.chunk = ByteBuffer.allocateDirect(CHUNK_BYTES)
                .order(processor == Processor.MIPS ? ByteOrder.BIG_ENDIAN : ByteOrder.LITTLE_ENDIAN);
    }

    /**
     * Fills the stores frame by frame.
     *
     * @param runs pairs of first word in the frame and count of words, ascending, for each store
     * @param stores one per list of runs, each with room for all its words of all frames
     */
    void read(int[][] runs, SampleStore[] stores) throws IOException {
        long frameWords = layout.frameBytes() / wordBytes;
        int[] filled = new int[stores.length];
        for (int frame = 0; frame < layout.frames(); frame++) {
            long start = frame * frameWords;
            for (int s = 0; s < stores.length; s++) {
                for (int r = 0; r < runs[s].length; r += 2) {
                    run(start + runs[s][r], runs[s][r + 1], stores[s], filled[s]);
                    filled[s] += runs[s][r + 1];
                }
            }
        }
    }

    private void run(long first, int count, SampleStore store, int to) throws IOException {
        long at = first;
        long end = first + count;
        int into = to;
        while (at < end) {
            if (at < chunkFrom || at >= chunkTo) {
                load(at);
            }
            int n = (int) (Math.min(end, chunkTo) - at);
            store.put(chunk, (int) (at - chunkFrom), into, n, isVax);
            at += n;
            into += n;
        }
    }

    private void load(long word) throws IOException {
        long from = layout.start() + word * wordBytes;
        long end = layout.start() + layout.frames() * layout.frameBytes();
        chunk.clear().limit((int) Math.min(CHUNK_BYTES, end - from));
        while (chunk.hasRemaining()) {
            if (channel.read(chunk, from + chunk.position()) < 0) {
                throw new EOFException("the file became shorter while it was read");
            }
        }
        chunk.flip();
        chunkFrom = word;
        chunkTo = word + chunk.limit() / wordBytes;
    }
}
