package org.solewright.formats.export;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.OutputStream;

/** Keeps what is written, up to a size. */
final class BoundedOutput extends OutputStream {

    private final int most;
    private final ByteArrayOutputStream kept = new ByteArrayOutputStream();
    private volatile boolean full;
    private volatile boolean abandoned;

    BoundedOutput(int most) {
        this.most = most;
    }

    boolean isFull() {
        return full;
    }

    /** Refuses everything from now on, which ends a template that writes without end. */
    void abandon() {
        abandoned = true;
    }

    byte[] content() {
        return kept.toByteArray();
    }

    @Override
    public void write(int b) throws IOException {
        write(new byte[] {(byte) b}, 0, 1);
    }

    @Override
    public void write(byte[] bytes, int offset, int length) throws IOException {
        if (abandoned || full || length > most - kept.size()) {
            full = !abandoned;
            throw new IOException("more than " + most + " bytes");
        }
        kept.write(bytes, offset, length);
    }
}
