package org.solewright.domain.cost;

/** At which step and speed a posture is compared. */
public enum Comparison {
    /** The measured step length and speed. */
    MEASURED("measured"),
    /** The same step over limb length and the same Froude number for the posture's own limb. */
    SAME_FROUDE("same-froude"),
    /** 0.9 of the measured step length at the measured speed. */
    STEP_09("step-0.9"),
    /** 0.8 of the measured step length at the measured speed. */
    STEP_08("step-0.8");

    private final String word;

    Comparison(String word) {
        this.word = word;
    }

    /**
     * The word used in files.
     *
     * @return such as {@code same-froude}
     */
    public String word() {
        return word;
    }
}
