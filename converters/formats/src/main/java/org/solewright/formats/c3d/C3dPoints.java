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
    private static final int WORDS = 4;

    private final int frames;
    private final int points;
    private final SampleStore store;
    private final boolean isReal;
    private final boolean isFlagObeyed;
    private final double coordinateScale;
    private final double residualScale;
    private int written65535;
    private int outOfRange;

    /**
     * Samples.
     *
     * @param frames number of frames
     * @param points points per frame
     * @param store four words per point, {@code [frames][points][4]}
     * @param isReal whether the words are reals
     * @param scale of integer samples, and of residuals
     * @param isFlagObeyed whether the fourth word decides what is missing
     */
    C3dPoints(int frames, int points, SampleStore store, boolean isReal, float scale, boolean isFlagObeyed) {
        this.frames = frames;
        this.points = points;
        this.store = store;
        this.isReal = isReal;
        this.isFlagObeyed = isFlagObeyed;
        this.residualScale = Math.abs(scale);
        this.coordinateScale = isReal ? 1 : residualScale;
        for (int i = WORDS - 1; isReal && i < store.words(); i += WORDS) {
            float w = store.at(i);
            if (!(w >= LOWEST && w <= HIGHEST_UNSIGNED)) {
                outOfRange++;
            } else if (w > HIGHEST) {
                written65535++;
            }
        }
    }

    /** No samples. */
    static C3dPoints none(int points) {
        return new C3dPoints(0, points, SampleStore.of(true, 0), true, 1, true);
    }

    private int first(int frame, int point) {
        return WORDS * (frame * points + point);
    }

    /** The fourth word of a sample as a signed 16-bit integer; 0 where it lies outside 16 bits. */
    private int word(int first) {
        float w = store.at(first + WORDS - 1);
        return w >= LOWEST && w <= HIGHEST_UNSIGNED ? (short) (int) w : 0;
    }

    /** Whether the sample counts as seen although the file flags it as missing. */
    boolean isFlagOverridden(int frame, int point) {
        return !isFlagObeyed && isValid(frame, point) && word(first(frame, point)) < 0;
    }

    /** What a step of the residual byte stands for, in the file's length unit. */
    double residualScale() {
        return residualScale;
    }

    /**
     * A word of a sample as it lies in the file.
     *
     * @param frame zero-based
     * @param point zero-based
     * @param word 0 x, 1 y, 2 z, 3 residual and cameras
     * @return a real, or a signed integer
     */
    float stored(int frame, int point, int word) {
        return store.at(first(frame, point) + word);
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
        return store.at(first(frame, point) + component) * coordinateScale;
    }

    /**
     * Whether the sample was seen.
     *
     * @param frame zero-based
     * @param point zero-based
     * @return true where valid
     */
    public boolean isValid(int frame, int point) {
        int i = first(frame, point);
        if (!isReal) {
            return isFlagObeyed ? store.at(i + WORDS - 1) >= 0 : isPlaced(i);
        }
        return (isFlagObeyed ? word(i) >= 0 : isPlaced(i))
                && Float.isFinite(store.at(i))
                && Float.isFinite(store.at(i + 1))
                && Float.isFinite(store.at(i + 2));
    }

    private boolean isPlaced(int i) {
        return store.at(i) != 0 || store.at(i + 1) != 0 || store.at(i + 2) != 0;
    }

    /**
     * Residual of the sample.
     *
     * @param frame zero-based
     * @param point zero-based
     * @return in the file's length unit; -1 where not valid
     */
    public double residual(int frame, int point) {
        int word = word(first(frame, point));
        return isValid(frame, point) ? (word < 0 ? 0 : (word & 0xff) * residualScale) : -1;
    }

    /**
     * Which cameras saw the sample.
     *
     * @param frame zero-based
     * @param point zero-based
     * @return bit mask of seven cameras; 0 where not valid
     */
    public int cameras(int frame, int point) {
        return isValid(frame, point) ? Math.max(0, word(first(frame, point))) >> 8 : 0;
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
