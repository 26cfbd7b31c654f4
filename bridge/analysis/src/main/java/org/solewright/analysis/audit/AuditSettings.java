package org.solewright.analysis.audit;

/**
 * What an audit goes by.
 *
 * @param limit residuals above this share are findings: of body weight, positive work, weight times height, foot length
 * @param cutoff low-pass that motion and loads pass alike, Hz; 0: none
 * @param gravity m/s2
 */
public record AuditSettings(double limit, double cutoff, double gravity) {

    /** Limit where none is given (design: 5 %). */
    public static final double DEFAULT_LIMIT = 0.05;

    /** Checks the range. */
    public AuditSettings {
        if (!(limit > 0) || !(cutoff >= 0) || !(gravity > 0)) {
            throw new IllegalArgumentException("audit limit " + limit + ", cut-off " + cutoff + " Hz, gravity "
                    + gravity + " m/s2, expected more than 0, 0 or more and more than 0");
        }
    }
}
