package org.solewright.domain.foot;

import java.util.Locale;

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
    /** Phalanges. */
    TOES;

    /**
     * The word used in files.
     *
     * @return such as {@code hindfoot}
     */
    public String word() {
        return name().toLowerCase(Locale.ROOT);
    }
}
