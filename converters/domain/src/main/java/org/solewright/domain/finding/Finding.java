package org.solewright.domain.finding;

/**
 * Something the user must be told about the data.
 *
 * @param code stable word for scripts, lower case with dots and hyphens, such as {@code platform.origin-sign}
 * @param severity how much it matters
 * @param where what it concerns: a file name, platform, landmark or stance; empty where the whole input is meant
 * @param message one clear sentence with the numbers and, where it helps, what to do
 */
public record Finding(String code, Severity severity, String where, String message) {

    /** Checks that code and message say something. */
    public Finding {
        if (code.isBlank() || message.isBlank()) {
            throw new IllegalArgumentException("finding without code or message: code '" + code + "'");
        }
    }

    /**
     * A finding of severity note.
     *
     * @param code stable word
     * @param where what it concerns
     * @param message one sentence
     * @return the finding
     */
    public static Finding note(String code, String where, String message) {
        return new Finding(code, Severity.NOTE, where, message);
    }

    /**
     * A finding of severity warning.
     *
     * @param code stable word
     * @param where what it concerns
     * @param message one sentence
     * @return the finding
     */
    public static Finding warning(String code, String where, String message) {
        return new Finding(code, Severity.WARNING, where, message);
    }

    /**
     * A finding of severity error.
     *
     * @param code stable word
     * @param where what it concerns
     * @param message one sentence
     * @return the finding
     */
    public static Finding error(String code, String where, String message) {
        return new Finding(code, Severity.ERROR, where, message);
    }
}
