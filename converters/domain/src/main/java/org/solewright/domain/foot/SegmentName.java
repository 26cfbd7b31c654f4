package org.solewright.domain.foot;

import java.util.Arrays;
import java.util.Locale;
import java.util.Optional;

/** The segments a foot is divided into, proximal to distal. */
public enum SegmentName {
    /** Knee to ankle. */
    SHANK,
    /** One rigid foot, or all of the foot behind the toes. */
    FOOT,
    /** Talus and calcaneus. */
    HINDFOOT,
    /** Navicular, cuboid and cuneiforms. */
    MIDFOOT,
    /** Metatarsals. */
    FOREFOOT,
    /** All phalanges as one. */
    TOES,
    /** Phalanx next to the metatarsals; of a foot with several toes all of that rank as one. */
    PHALANX_1,
    /** Second phalanx; of a foot split at one interphalangeal joint all of the toes beyond it. */
    PHALANX_2,
    /** Third phalanx. */
    PHALANX_3,
    /** Fourth phalanx, of birds and reptiles. */
    PHALANX_4,
    /** Fifth phalanx, of birds and reptiles. */
    PHALANX_5;

    /**
     * Whether it lies before the metatarsophalangeal joint.
     *
     * @return true for the toes and each phalanx
     */
    public boolean isToe() {
        return compareTo(TOES) >= 0;
    }

    /**
     * The segment of that name.
     *
     * @param word as in files
     * @return the name, empty where there is none such
     */
    public static Optional<SegmentName> ofWord(String word) {
        return Arrays.stream(values()).filter(s -> s.word().equals(word)).findFirst();
    }

    /**
     * The word used in files.
     *
     * @return such as {@code hindfoot}
     */
    public String word() {
        return name().toLowerCase(Locale.ROOT);
    }
}
