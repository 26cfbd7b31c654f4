package org.solewright.domain.gait;

import java.util.Locale;

/** Side of the body. */
public enum Side {
    /** The subject's left. */
    LEFT,
    /** The subject's right. */
    RIGHT;

    /**
     * The other side.
     *
     * @return the opposite
     */
    public Side opposite() {
        return this == LEFT ? RIGHT : LEFT;
    }

    /**
     * The word used in files.
     *
     * @return {@code left} or {@code right}
     */
    public String word() {
        return name().toLowerCase(Locale.ROOT);
    }
}
