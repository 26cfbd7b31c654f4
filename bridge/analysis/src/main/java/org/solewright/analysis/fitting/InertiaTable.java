package org.solewright.analysis.fitting;

import java.util.Arrays;
import java.util.Optional;

/** Published tables of segment masses and moments of inertia. */
public enum InertiaTable {
    /** [de Leva 1996]: foot from heel to toe tip, shank from knee to ankle centre, by sex. */
    DE_LEVA("deleva"),
    /** Dempster after [Winter 2009], table 4.1: foot from lateral malleolus to second metatarsal head. */
    DEMPSTER("dempster");

    private final String word;

    InertiaTable(String word) {
        this.word = word;
    }

    /**
     * The table of that name.
     *
     * @param word as on the command line
     * @return the table, empty where there is none of that name
     */
    public static Optional<InertiaTable> ofWord(String word) {
        return Arrays.stream(values()).filter(t -> t.word.equals(word)).findFirst();
    }

    /**
     * The word used on the command line.
     *
     * @return {@code deleva} or {@code dempster}
     */
    public String word() {
        return word;
    }
}
