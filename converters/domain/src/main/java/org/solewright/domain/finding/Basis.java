package org.solewright.domain.finding;

import java.util.Locale;

/** Where a number comes from. */
public enum Basis {
    /** Computed from this subject's recordings. */
    MEASURED,
    /** From a published regression on other people, applied to this subject. */
    REGRESSION,
    /** A stated default that nothing in the recording supports. */
    ASSUMED;

    /**
     * The word used in files.
     *
     * @return {@code measured}, {@code regression} or {@code assumed}
     */
    public String word() {
        return name().toLowerCase(Locale.ROOT);
    }
}
