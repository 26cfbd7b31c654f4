package org.solewright.formats.c3d;

/**
 * The point samples of a file in its own length unit, {@code [frames][points]} row-major.
 *
 * <p>A sample is valid where its fourth word, as a signed 16-bit integer, is not negative and its coordinates are finite numbers.
 * 65535 is -1, as 16 of the files seen write it; a word outside the 16-bit range means valid with unknown residual.
 */
public final class C3dPoints {

    private static final float HIGHEST_UNSIGNED = 65535f;
    private static final float LOWEST = -32768f;
    private static final float HIGHEST = 32767f;

    private final int frames;
    private final int points;
    private final float[] xyz;
    private final short[] word;
    private final double coordinateScale;
    private final double residualScale;
    private final int written65535;
    private final int outOfRange;

    private C3dPoints(
            int frames,
            int points,
            float[] xyz,
            short[] word,
            double coordinateScale,
            double residualScale,
            int written65535,
            int outOfRange) {
        this.frames = frames;
        this.points = points;
        this.xyz = xyz;
        this.word = word;
        this.coordinateScale = coordinateScale;
        this.residualScale = residualScale;
        this.written65535 = written65535;
        this.outOfRange = outOfRange;
    }

    /** No samples. */
    static C3dPoints none(int points) {
        return new C3dPoints(0, points, new float[0], new short[0], 1, 1, 0, 0);
    }

    /**
     * Decodes; the caller has made sure that all frames lie inside the file.
     *
     * @param c cursor in the file's processor
     * @param layout where the samples lie
     * @param scale of integer samples, and of residuals
     */
    static C3dPoints read(ByteCursor c, DataLayout layout, float scale) {
        int n = layout.frames() * layout.points();
        float[] xyz = new float[3 * n];
        short[] word = new short[n];
        int unsigned = 0;
        int out = 0;
        float factor = Math.abs(scale);
        int i = 0;
        for (int frame = 0; frame < layout.frames(); frame++) {
            int at = layout.frameOffset(frame);
            for (int point = 0; point < layout.points(); point++, i++) {
                if (layout.isReal()) {
                    xyz[3 * i] = c.rawF32(at);
                    xyz[3 * i + 1] = c.rawF32(at + 4);
                    xyz[3 * i + 2] = c.rawF32(at + 8);
                    float w = c.rawF32(at + 12);
                    at += 16;
                    if (w >= LOWEST && w <= HIGHEST_UNSIGNED) {
                        word[i] = (short) w;
                        unsigned += w > HIGHEST ? 1 : 0;
                    } else {
                        out++;
                    }
                } else {
                    xyz[3 * i] = (short) c.rawU16(at);
                    xyz[3 * i + 1] = (short) c.rawU16(at + 2);
                    xyz[3 * i + 2] = (short) c.rawU16(at + 4);
                    word[i] = (short) c.rawU16(at + 6);
                    at += 8;
                }
            }
        }
        return new C3dPoints(
                layout.frames(), layout.points(), xyz, word, layout.isReal() ? 1 : factor, factor, unsigned, out);
    }

    /**
     * Number of frames.
     *
     * @return zero or more
     */
    public int frames() {
        return frames;
    }

    /**
     * Number of points.
     *
     * @return zero or more
     */
    public int points() {
        return points;
    }

    /**
     * A coordinate as stored, scaled, whether valid or not.
     *
     * @param frame zero-based
     * @param point zero-based
     * @param component 0 x, 1 y, 2 z
     * @return in the file's length unit
     */
    public double coordinate(int frame, int point, int component) {
        return xyz[3 * (frame * points + point) + component] * coordinateScale;
    }

    /**
     * Whether the sample was seen.
     *
     * @param frame zero-based
     * @param point zero-based
     * @return true where valid
     */
    public boolean isValid(int frame, int point) {
        int i = frame * points + point;
        return word[i] >= 0
                && Float.isFinite(xyz[3 * i])
                && Float.isFinite(xyz[3 * i + 1])
                && Float.isFinite(xyz[3 * i + 2]);
    }

    /**
     * Residual of the sample.
     *
     * @param frame zero-based
     * @param point zero-based
     * @return in the file's length unit; -1 where not valid
     */
    public double residual(int frame, int point) {
        int i = frame * points + point;
        return isValid(frame, point) ? (word[i] & 0xff) * residualScale : -1;
    }

    /**
     * Which cameras saw the sample.
     *
     * @param frame zero-based
     * @param point zero-based
     * @return bit mask of seven cameras; 0 where not valid
     */
    public int cameras(int frame, int point) {
        int i = frame * points + point;
        return isValid(frame, point) ? word[i] >> 8 : 0;
    }

    /** Samples whose fourth word is a negative one without its sign, as 65535 is -1. */
    int written65535() {
        return written65535;
    }

    /** Samples whose fourth word lies outside 16 bits. */
    int outOfRange() {
        return outOfRange;
    }
}
