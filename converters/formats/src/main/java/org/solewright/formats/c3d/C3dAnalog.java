package org.solewright.formats.c3d;

/** The analog samples of a file, scaled, {@code [samples][channels]} row-major. */
public final class C3dAnalog {

    private static final float UNSIGNED = 65536f;

    private final int samples;
    private final int channels;
    private final double rate;
    private final SampleStore store;
    private final boolean isUnsigned;
    private final double[] offset;
    private final double[] factor;

    /**
     * Samples.
     *
     * @param samples per channel
     * @param channels number of channels
     * @param rate samples per second, Hz
     * @param store {@code [samples][channels]}
     * @param isUnsigned whether integer words are read without their sign
     * @param offset per channel
     * @param factor per channel
     */
    C3dAnalog(
            int samples,
            int channels,
            double rate,
            SampleStore store,
            boolean isUnsigned,
            double[] offset,
            double[] factor) {
        this.samples = samples;
        this.channels = channels;
        this.rate = rate;
        this.store = store;
        this.isUnsigned = isUnsigned;
        this.offset = offset;
        this.factor = factor;
    }

    /** No samples. */
    static C3dAnalog none(int channels) {
        return new C3dAnalog(
                0, channels, Double.NaN, SampleStore.of(true, 0), false, new double[channels], new double[channels]);
    }

    /** A word as it lies in the file: a real, or an integer without its sign where the file says so. */
    float stored(int sample, int channel) {
        float raw = store.at(sample * channels + channel);
        return isUnsigned && raw < 0 ? raw + UNSIGNED : raw;
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
        return (stored(sample, channel) - offset[channel]) * factor[channel];
    }

    /** Whether an offset of -32768 may have been meant as +32768, since the stored samples lie there. */
    boolean isOffsetAmbiguous(int channel) {
        if (offset[channel] != Short.MIN_VALUE || samples == 0) {
            return false;
        }
        double sum = 0;
        for (int i = 0; i < samples; i++) {
            sum += stored(i, channel);
        }
        return sum / samples > -Short.MIN_VALUE / 2;
    }
}
