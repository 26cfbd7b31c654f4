package org.solewright.analysis.fitting;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.solewright.domain.foot.ChainPlan;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.foot.SegmentName;

/**
 * How a foot is divided, rear to front, and which segment carries a landmark.
 *
 * @param foot the foot's segments; the shank stands before them
 * @param given carriers by a plan file; empty for the plans by number, whose carriers follow from anatomy
 */
record SegmentPlan(List<SegmentName> foot, Optional<Map<Landmark, SegmentName>> given) {

    /** Most parts of a foot that is not divided by a plan file. */
    static final int MOST = 6;

    SegmentPlan {
        foot = List.copyOf(foot);
        given = given.map(Map::copyOf);
    }

    /**
     * The plan of that many parts: one rigid foot; foot and toes; hindfoot, forefoot and toes; hindfoot, midfoot,
     * forefoot and toes; five and six split the toes at the interphalangeal joints.
     *
     * @param parts 1 to 6
     * @return the plan
     */
    static SegmentPlan of(int parts) {
        List<SegmentName> foot =
                switch (parts) {
                    case 1 -> List.of(SegmentName.FOOT);
                    case 2 -> List.of(SegmentName.FOOT, SegmentName.TOES);
                    case 3 -> List.of(SegmentName.HINDFOOT, SegmentName.FOREFOOT, SegmentName.TOES);
                    case 4 ->
                        List.of(SegmentName.HINDFOOT, SegmentName.MIDFOOT, SegmentName.FOREFOOT, SegmentName.TOES);
                    case 5 ->
                        List.of(
                                SegmentName.HINDFOOT,
                                SegmentName.MIDFOOT,
                                SegmentName.FOREFOOT,
                                SegmentName.PHALANX_1,
                                SegmentName.PHALANX_2);
                    case MOST ->
                        List.of(
                                SegmentName.HINDFOOT,
                                SegmentName.MIDFOOT,
                                SegmentName.FOREFOOT,
                                SegmentName.PHALANX_1,
                                SegmentName.PHALANX_2,
                                SegmentName.PHALANX_3);
                    default -> throw new IllegalArgumentException(parts + " foot segments, expected 1 to " + MOST);
                };
        return new SegmentPlan(foot, Optional.empty());
    }

    /** The plan of a file. */
    static SegmentPlan of(ChainPlan plan) {
        return new SegmentPlan(plan.parts().stream().map(ChainPlan.Part::name).toList(), Optional.of(plan.carriers()));
    }

    /**
     * As many parts as the landmarks allow: toes need a toe landmark, a midtarsal joint its two landmarks, a midfoot the
     * bases of the metatarsals, phalanges the joints between them.
     *
     * @param limb landmarks
     * @return 1 to 6
     */
    static int most(LimbGeometry limb) {
        if (limb.toeLandmark().isEmpty()) {
            return 1;
        }
        if (!limb.hasMidtarsalLandmarks()) {
            return 2;
        }
        if (!limb.hasMetatarsalBases()) {
            return 3;
        }
        if (limb.point(Landmark.INTERPHALANGEAL_1).isEmpty()) {
            return 4;
        }
        return limb.point(Landmark.INTERPHALANGEAL_2).isEmpty() ? 5 : MOST;
    }

    SegmentName rear() {
        return foot.get(0);
    }

    /** The segment that carries the metatarsal heads. */
    SegmentName heads() {
        if (given.isPresent()) {
            return carrier(Landmark.METATARSAL_1_HEAD)
                    .or(() -> carrier(Landmark.METATARSAL_5_HEAD))
                    .orElseGet(this::rear);
        }
        return foot.contains(SegmentName.FOREFOOT) ? SegmentName.FOREFOOT : SegmentName.FOOT;
    }

    /** The segment at the front. */
    SegmentName toes() {
        return foot.get(foot.size() - 1);
    }

    /** The segment behind another one, in the order of the chain. */
    SegmentName before(SegmentName segment) {
        int at = foot.indexOf(segment);
        return at > 0 ? foot.get(at - 1) : SegmentName.SHANK;
    }

    /**
     * The segment that carries a landmark or cluster, the shank where it lies above the ankle.
     *
     * @param landmark which
     * @return empty where the model does not carry it, such as those of thigh and pelvis
     */
    Optional<SegmentName> carrier(Landmark landmark) {
        Optional<SegmentName> byFile = given.flatMap(g -> Optional.ofNullable(g.get(landmark)));
        if (byFile.isPresent()) {
            return byFile;
        }
        return switch (landmark) {
            case TROCHANTER_MAJOR, ASIS, PSIS, SACRUM, THIGH_CLUSTER, PELVIS_CLUSTER -> Optional.empty();
            case MALLEOLUS_MEDIAL,
                    MALLEOLUS_LATERAL,
                    FEMORAL_EPICONDYLE_MEDIAL,
                    FEMORAL_EPICONDYLE_LATERAL,
                    SHANK_CLUSTER -> Optional.of(SegmentName.SHANK);
            default -> given.isPresent() ? Optional.empty() : Optional.of(ofFoot(landmark));
        };
    }

    private SegmentName ofFoot(Landmark landmark) {
        return switch (landmark) {
            case CALCANEUS_POSTERIOR, SUSTENTACULUM_TALI, PERONEAL_TUBERCLE, HINDFOOT_CLUSTER -> rear();
            case NAVICULAR_TUBEROSITY, CUBOID, MIDFOOT_CLUSTER -> orElse(SegmentName.MIDFOOT, heads());
            case INTERPHALANGEAL_1, TOES_CLUSTER -> orElse(SegmentName.PHALANX_1, toes());
            case INTERPHALANGEAL_2 -> orElse(SegmentName.PHALANX_2, toes());
            case INTERPHALANGEAL_3, INTERPHALANGEAL_4, HALLUX_TIP, TOE_TIP -> toes();
            default -> heads();
        };
    }

    private SegmentName orElse(SegmentName wanted, SegmentName otherwise) {
        return foot.contains(wanted) ? wanted : otherwise;
    }
}
