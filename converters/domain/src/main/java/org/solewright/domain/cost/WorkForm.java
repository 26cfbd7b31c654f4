package org.solewright.domain.cost;

/** How the work of a transition is counted; all are factors times m v^2/2 with v before the transition. */
public enum WorkForm {
    /** Nothing is pushed: the kinetic energy lost, sin^2 delta. */
    NO_PUSH("noPush"),
    /** Impulsive push-off before the collision, tan^2(delta/2). */
    PUSH_OFF("pushOff"),
    /** Push-off and collision proportional in time, 2 sin^2(delta/2). */
    SIMULTANEOUS("simultaneous"),
    /** Small-angle limit of {@link #NO_PUSH}. */
    NO_PUSH_SMALL_ANGLE("noPushSmallAngle"),
    /** Small-angle limit of {@link #PUSH_OFF}. */
    PUSH_OFF_SMALL_ANGLE("pushOffSmallAngle");

    private final String word;

    WorkForm(String word) {
        this.word = word;
    }

    /**
     * The word used in files.
     *
     * @return such as {@code pushOff}
     */
    public String word() {
        return word;
    }
}
