package org.solewright.domain.foot;

import java.util.Arrays;
import java.util.Locale;
import java.util.Optional;

/** The anatomical landmarks and clusters that a landmark map may name, distal to proximal. */
public enum Landmark {
    /** Rearmost point of the heel. */
    CALCANEUS_POSTERIOR,
    /** Shelf of the calcaneus below the medial malleolus. */
    SUSTENTACULUM_TALI,
    /** Ridge of the calcaneus below the lateral malleolus. */
    PERONEAL_TUBERCLE,
    /** Medial point of the navicular. */
    NAVICULAR_TUBEROSITY,
    /** Lateral side of the cuboid. */
    CUBOID,
    /** Base of the first metatarsal. */
    METATARSAL_1_BASE,
    /** Base of the fifth metatarsal. */
    METATARSAL_5_BASE,
    /** Head of the first metatarsal. */
    METATARSAL_1_HEAD,
    /** Head of the second metatarsal. */
    METATARSAL_2_HEAD,
    /** Head of the fifth metatarsal. */
    METATARSAL_5_HEAD,
    /** First interphalangeal joint of the longest toe (or the great toe's only one), next to the metatarsals. */
    INTERPHALANGEAL_1,
    /** Second interphalangeal joint. */
    INTERPHALANGEAL_2,
    /** Third interphalangeal joint, of birds and reptiles. */
    INTERPHALANGEAL_3,
    /** Fourth interphalangeal joint, of birds and reptiles. */
    INTERPHALANGEAL_4,
    /** Tip of the great toe. */
    HALLUX_TIP,
    /** Tip of the longest toe. */
    TOE_TIP,
    /** Medial malleolus. */
    MALLEOLUS_MEDIAL,
    /** Lateral malleolus. */
    MALLEOLUS_LATERAL,
    /** Medial epicondyle of the femur. */
    FEMORAL_EPICONDYLE_MEDIAL,
    /** Lateral epicondyle of the femur. */
    FEMORAL_EPICONDYLE_LATERAL,
    /** Greater trochanter. */
    TROCHANTER_MAJOR,
    /** Anterior superior iliac spine. */
    ASIS,
    /** Posterior superior iliac spine. */
    PSIS,
    /** Sacrum, midway between the posterior superior iliac spines. */
    SACRUM,
    /** Points fixed to the toes. */
    TOES_CLUSTER,
    /** Points fixed to the forefoot. */
    FOREFOOT_CLUSTER,
    /** Points fixed to the midfoot. */
    MIDFOOT_CLUSTER,
    /** Points fixed to the hindfoot. */
    HINDFOOT_CLUSTER,
    /** Points fixed to the shank. */
    SHANK_CLUSTER,
    /** Points fixed to the thigh. */
    THIGH_CLUSTER,
    /** Points fixed to the pelvis. */
    PELVIS_CLUSTER;

    /**
     * The landmark of that name.
     *
     * @param word name as in files, such as {@code malleolus_medial}
     * @return the landmark, empty where there is none of that name
     */
    public static Optional<Landmark> ofWord(String word) {
        return Arrays.stream(values()).filter(l -> l.word().equals(word)).findFirst();
    }

    /**
     * The word used in files.
     *
     * @return such as {@code malleolus_medial}
     */
    public String word() {
        return name().toLowerCase(Locale.ROOT);
    }

    /**
     * Whether each label of this name is a point of its own; several labels of any other landmark stand for their mean.
     *
     * @return true for the clusters
     */
    public boolean isCluster() {
        return compareTo(TOES_CLUSTER) >= 0;
    }
}
