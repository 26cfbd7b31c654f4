package org.solewright.domain.gait;

/** What a stance may be used for. */
public enum Use {
    /** Foot-floor angle at contact. */
    CONTACT_ANGLE("contact-angle"),
    /** Roll-over shape and arc. */
    ROLL_OVER("roll-over"),
    /** Pivots of the sole. */
    PIVOTS("pivots"),
    /** Collision work as the leading limb. */
    COLLISION("collision"),
    /** Rebound work as the leading limb. */
    REBOUND("rebound"),
    /** Preload work as the leading limb. */
    PRELOAD("preload"),
    /** Push-off work as the trailing limb. */
    PUSH_OFF("push-off"),
    /** The subject's mass. */
    MASS("mass");

    private final String word;

    Use(String word) {
        this.word = word;
    }

    /**
     * The word used in files.
     *
     * @return such as {@code roll-over}
     */
    public String word() {
        return word;
    }
}
