package org.solewright.analysis.gait;

/**
 * Settings of the gait analysis. Times stated for a limb of 0.9 m are scaled by the root of the limb length (03).
 *
 * @param gravity m/s^2
 * @param limbLength l, m, more than 0; 0.9 where nothing is known
 * @param weight subject's weight m g, N; NaN where not known yet
 */
public record GaitSettings(double gravity, double limbLength, double weight) {

    /** Standard gravity, m/s^2, exact (CGPM 1901). */
    public static final double STANDARD_GRAVITY = 9.80665;

    private static final double REFERENCE_LIMB = 0.9;
    private static final double SHORTEST_STRIDE = 0.6;
    private static final double SHORTEST_CONTACT = 0.1;
    private static final double SHORTEST_PHASE = 0.015;

    /** Checks the limb length. */
    public GaitSettings {
        if (!(limbLength > 0)) {
            throw new IllegalArgumentException("limb length " + limbLength + " m, expected more than 0 m");
        }
    }

    /**
     * Settings where neither mass nor limb are known.
     *
     * @return settings for a limb of 0.9 m
     */
    public static GaitSettings unknownSubject() {
        return new GaitSettings(STANDARD_GRAVITY, REFERENCE_LIMB, Double.NaN);
    }

    private double timeScale() {
        return Math.sqrt(limbLength / REFERENCE_LIMB);
    }

    /** Like contacts of one foot are farther apart than this, s (common practice, scaled). */
    double shortestStride() {
        return SHORTEST_STRIDE * timeScale();
    }

    /** Shorter times under load are no contacts, s (common practice, scaled). */
    double shortestContact() {
        return SHORTEST_CONTACT * timeScale();
    }

    /** Shorter phases of limb power are merged, s (03 section 4, scaled). */
    double shortestPhase() {
        return SHORTEST_PHASE * timeScale();
    }
}
