package org.solewright.domain.finding;

import java.util.Locale;

/** How much a finding matters: a note informs, a warning asks for a check, an error makes the input failed. */
public enum Severity {
    /** Worth knowing; the result stands. */
    NOTE,
    /** The result stands, but should be checked before use. */
    WARNING,
    /** The input counts as failed. */
    ERROR;

    /**
     * The word used in files.
     *
     * @return {@code note}, {@code warning} or {@code error}
     */
    public String word() {
        return name().toLowerCase(Locale.ROOT);
    }
}
