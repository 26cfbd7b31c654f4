package org.solewright.analysis.fitting;

import java.util.List;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.foot.SegmentName;

/**
 * How a foot is divided, rear to front, and which segment carries a landmark.
 *
 * @param foot the foot's segments; the shank stands before them
 */
record SegmentPlan(List<SegmentName> foot) {

    SegmentPlan {
        foot = List.copyOf(foot);
    }

    /**
     * The plan of that many parts: one rigid foot; foot and toes; hindfoot, forefoot and toes.
     *
     * @param parts 1 to 3
     * @return the plan
     */
    static SegmentPlan of(int parts) {
        return new SegmentPlan(
                switch (parts) {
                    case 1 -> List.of(SegmentName.FOOT);
                    case 2 -> List.of(SegmentName.FOOT, SegmentName.TOES);
                    case 3 -> List.of(SegmentName.HINDFOOT, SegmentName.FOREFOOT, SegmentName.TOES);
                    default -> throw new IllegalArgumentException(parts + " foot segments, expected 1 to 3");
                });
    }

    /**
     * As many parts as the landmarks allow: toes need a toe landmark, a midtarsal joint its two landmarks.
     *
     * @param limb landmarks
     * @return 1 to 3
     */
    static int most(LimbGeometry limb) {
        if (limb.toeLandmark().isEmpty()) {
            return 1;
        }
        return limb.hasMidtarsalLandmarks() ? 3 : 2;
    }

    SegmentName rear() {
        return foot.get(0);
    }

    SegmentName heads() {
        return foot.size() == 3 ? SegmentName.FOREFOOT : SegmentName.FOOT;
    }

    SegmentName toes() {
        return foot.get(foot.size() - 1);
    }

    /** The segment that carries a landmark or cluster; the shank where it lies above the ankle. */
    SegmentName carrier(Landmark landmark) {
        return switch (landmark) {
            case CALCANEUS_POSTERIOR, SUSTENTACULUM_TALI, PERONEAL_TUBERCLE, HINDFOOT_CLUSTER -> rear();
            case NAVICULAR_TUBEROSITY,
                    CUBOID,
                    METATARSAL_1_BASE,
                    METATARSAL_5_BASE,
                    METATARSAL_1_HEAD,
                    METATARSAL_2_HEAD,
                    METATARSAL_5_HEAD,
                    MIDFOOT_CLUSTER,
                    FOREFOOT_CLUSTER -> heads();
            case HALLUX_TIP, TOE_TIP, TOES_CLUSTER -> toes();
            default -> SegmentName.SHANK;
        };
    }

    /** Whether the model carries a landmark at all; those of thigh and pelvis it does not. */
    static boolean carries(Landmark landmark) {
        return switch (landmark) {
            case TROCHANTER_MAJOR, ASIS, PSIS, SACRUM, THIGH_CLUSTER, PELVIS_CLUSTER -> false;
            default -> true;
        };
    }
}
