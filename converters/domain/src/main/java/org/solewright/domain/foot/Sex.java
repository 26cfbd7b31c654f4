package org.solewright.domain.foot;

import java.util.Locale;

/** Sex, where a regression distinguishes. */
public enum Sex {
    /** Female. */
    FEMALE,
    /** Male. */
    MALE;

    /**
     * The word used in files.
     *
     * @return {@code female} or {@code male}
     */
    public String word() {
        return name().toLowerCase(Locale.ROOT);
    }
}
