package org.solewright.domain.cost;

import java.util.Locale;

/** How the length of a segmented foot is chosen. */
public enum FootRule {
    /** The length is given. */
    GIVEN,
    /** All vaults of a step are equal. */
    EQUAL,
    /** The step is cheapest. */
    OPTIMUM;

    /**
     * The word used in files.
     *
     * @return {@code given}, {@code equal} or {@code optimum}
     */
    public String word() {
        return name().toLowerCase(Locale.ROOT);
    }
}
