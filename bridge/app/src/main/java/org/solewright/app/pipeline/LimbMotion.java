package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.solewright.analysis.fitting.SegmentTracking;
import org.solewright.analysis.fitting.StandingLimb;
import org.solewright.analysis.gait.LandmarkTracks;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Vec3;

/**
 * The segments of one limb over one walking recording, by separate rigid fits to the standing trial.
 *
 * @param shank knee to ankle; empty where fewer than three of its points are tracked
 * @param foot one rigid foot
 * @param pelvis carries the hip
 * @param thigh carries the hip where the pelvis is not tracked
 */
record LimbMotion(
        Optional<SegmentTracking> shank,
        Optional<SegmentTracking> foot,
        Optional<SegmentTracking> pelvis,
        Optional<SegmentTracking> thigh) {

    private static final int FEWEST = 3;
    private static final List<Landmark> SHANK = List.of(
            Landmark.SHANK_CLUSTER,
            Landmark.MALLEOLUS_MEDIAL,
            Landmark.MALLEOLUS_LATERAL,
            Landmark.FEMORAL_EPICONDYLE_MEDIAL,
            Landmark.FEMORAL_EPICONDYLE_LATERAL);
    private static final List<Landmark> FOOT = List.of(
            Landmark.CALCANEUS_POSTERIOR,
            Landmark.SUSTENTACULUM_TALI,
            Landmark.PERONEAL_TUBERCLE,
            Landmark.NAVICULAR_TUBEROSITY,
            Landmark.CUBOID,
            Landmark.METATARSAL_1_BASE,
            Landmark.METATARSAL_5_BASE,
            Landmark.METATARSAL_1_HEAD,
            Landmark.METATARSAL_2_HEAD,
            Landmark.METATARSAL_5_HEAD,
            Landmark.HINDFOOT_CLUSTER,
            Landmark.MIDFOOT_CLUSTER,
            Landmark.FOREFOOT_CLUSTER);
    private static final List<Landmark> PELVIS =
            List.of(Landmark.ASIS, Landmark.PSIS, Landmark.SACRUM, Landmark.PELVIS_CLUSTER);
    private static final List<Landmark> THIGH = List.of(Landmark.THIGH_CLUSTER, Landmark.TROCHANTER_MAJOR);

    static LimbMotion of(StandingTrial standing, LandmarkTracks walking, Side side) {
        return new LimbMotion(
                track(standing, walking, SHANK, List.of(side)),
                track(standing, walking, FOOT, List.of(side)),
                track(standing, walking, PELVIS, List.of(Side.LEFT, Side.RIGHT)),
                track(standing, walking, THIGH, List.of(side)));
    }

    private static Optional<SegmentTracking> track(
            StandingTrial standing, LandmarkTracks walking, List<Landmark> landmarks, List<Side> sides) {
        List<Vec3> reference = new ArrayList<>();
        List<double[]> tracks = new ArrayList<>();
        List<String> used = new ArrayList<>();
        for (Landmark landmark : landmarks) {
            for (Side side : sides) {
                for (String label : walking.labels(landmark, side)) {
                    Optional<Vec3> stood = standing.label(label);
                    if (stood.isPresent() && !used.contains(label)) {
                        used.add(label);
                        reference.add(stood.get());
                        walking.labelled(label).ifPresent(tracks::add);
                    }
                }
            }
        }
        if (reference.size() < FEWEST) {
            return Optional.empty();
        }
        SegmentTracking tracking =
                SegmentTracking.of(reference, tracks, walking.recording().frames());
        return tracking.fitted() == 0 ? Optional.empty() : Optional.of(tracking);
    }

    Optional<Vec3> ankle(StandingLimb limb, int frame) {
        return shank.flatMap(s -> s.at(limb.ankle().position(), frame));
    }

    Optional<Vec3> knee(StandingLimb limb, int frame) {
        return shank.flatMap(s -> s.at(limb.knee().position(), frame));
    }

    Optional<Vec3> hip(StandingLimb limb, int frame) {
        return pelvis.or(() -> thigh).flatMap(s -> s.at(limb.hip().position(), frame));
    }
}
