package org.solewright.domain.foot;

import java.util.Arrays;
import java.util.Locale;
import java.util.Optional;

/** Whose regressions may be applied. */
public enum Population {
    /** A grown human. */
    ADULT,
    /** A growing human. */
    CHILD,
    /** Any other animal. */
    OTHER,
    /** Not stated: regressions for adults, as an assumption. */
    UNKNOWN;

    /**
     * The population of that name.
     *
     * @param word as in files
     * @return the population, empty where there is none of that name
     */
    public static Optional<Population> ofWord(String word) {
        return Arrays.stream(values()).filter(p -> p.word().equals(word)).findFirst();
    }

    /**
     * The word used in files.
     *
     * @return {@code adult}, {@code child}, {@code other} or {@code unknown}
     */
    public String word() {
        return name().toLowerCase(Locale.ROOT);
    }
}
