package org.solewright.domain.foot;

/**
 * What a point's label must look like; {@code *} stands for any characters, none included. Upper and lower case differ.
 *
 * @param text the pattern, not blank
 */
public record LabelPattern(String text) {

    /** Checks that the pattern says something. */
    public LabelPattern {
        if (text.isBlank()) {
            throw new IllegalArgumentException("label pattern is blank");
        }
    }

    /**
     * Whether a label fits, as it stands or without what precedes its last colon (a subject's name).
     *
     * @param label label of a point as in the recording
     * @return true where it fits
     */
    public boolean matches(String label) {
        return fits(label) || fits(label.substring(label.lastIndexOf(':') + 1));
    }

    private boolean fits(String label) {
        int at = 0;
        int star = -1;
        int resume = 0;
        int i = 0;
        while (i < label.length()) {
            if (at < text.length() && text.charAt(at) == '*') {
                star = at++;
                resume = i;
            } else if (at < text.length() && text.charAt(at) == label.charAt(i)) {
                at++;
                i++;
            } else if (star >= 0) {
                at = star + 1;
                i = ++resume;
            } else {
                return false;
            }
        }
        while (at < text.length() && text.charAt(at) == '*') {
            at++;
        }
        return at == text.length();
    }
}
