package org.solewright.formats.c3d;

/** The analog samples of a file, scaled, {@code [samples][channels]} row-major. */
public final class C3dAnalog {

    private final int samples;
    private final int channels;
    private final double rate;
    private final float[] raw;
    private final double[] offset;
    private final double[] factor;

    C3dAnalog(int samples, int channels, double rate, float[] raw, double[] offset, double[] factor) {
        this.samples = samples;
        this.channels = channels;
        this.rate = rate;
        this.raw = raw;
        this.offset = offset;
        this.factor = factor;
    }

    /** Raw words; the caller has made sure that all frames lie inside the file. */
    static float[] raw(ByteCursor c, DataLayout layout, boolean isUnsigned) {
        int words = layout.channels() * layout.analogPerFrame();
        float[] raw = new float[layout.frames() * words];
        int i = 0;
        for (int frame = 0; frame < layout.frames(); frame++) {
            int at = layout.frameOffset(frame) + layout.pointBytes();
            for (int k = 0; k < words; k++, i++) {
                if (layout.isReal()) {
                    raw[i] = c.rawF32(at);
                    at += 4;
                } else {
                    int v = c.rawU16(at);
                    raw[i] = isUnsigned ? v : (short) v;
                    at += 2;
                }
            }
        }
        return raw;
    }

    /**
     * Number of samples per channel.
     *
     * @return zero or more
     */
    public int samples() {
        return samples;
    }

    /**
     * Number of channels.
     *
     * @return zero or more
     */
    public int channels() {
        return channels;
    }

    /**
     * Samples per second.
     *
     * @return Hz; NaN without channels
     */
    public double rate() {
        return rate;
    }

    /**
     * A sample: (stored - OFFSET) x SCALE x GEN_SCALE.
     *
     * @param sample zero-based
     * @param channel zero-based
     * @return in the channel's unit
     */
    public double value(int sample, int channel) {
        return (raw[sample * channels + channel] - offset[channel]) * factor[channel];
    }

    /** Whether an offset of -32768 may have been meant as +32768, since the stored samples lie there. */
    boolean isOffsetAmbiguous(int channel) {
        if (offset[channel] != Short.MIN_VALUE || samples == 0) {
            return false;
        }
        double sum = 0;
        for (int i = channel; i < samples * channels; i += channels) {
            sum += raw[i];
        }
        return sum / samples > -Short.MIN_VALUE / 2;
    }
}
