package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.solewright.analysis.fitting.SegmentTracking;
import org.solewright.analysis.fitting.StandingLimb;
import org.solewright.analysis.gait.LandmarkTracks;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.foot.Segment;
import org.solewright.domain.foot.SegmentName;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Pose;
import org.solewright.domain.geometry.Vec3;

/**
 * The segments of one limb over one walking recording: the chain fit gives their poses, separate rigid fits to the
 * standing trial are its check and stand in where the chain is not known. The thigh is in the chain only where the shank
 * alone has too few points, the pelvis never: a cluster that is rigid in itself but slides on the thigh as a whole has a
 * small rms, and its weight 1/rms^2 would turn the shank after the skin of the thigh.
 *
 * @param shank knee to ankle; empty where fewer than three of its points are tracked
 * @param foot one rigid foot
 * @param pelvis carries the hip
 * @param thigh carries the hip where the pelvis is not tracked
 * @param chain poses of the segments that hang together
 * @param hipCarrier points of the segment that carries the hip, pelvis or thigh; none where neither is tracked
 */
record LimbMotion(
        Optional<SegmentTracking> shank,
        Optional<SegmentTracking> foot,
        Optional<SegmentTracking> pelvis,
        Optional<SegmentTracking> thigh,
        LimbChain chain,
        Points hipCarrier) {

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

    static LimbMotion of(StandingPoints standing, LandmarkTracks walking, StandingLimb limb) {
        List<Side> own = List.of(limb.side());
        Optional<SegmentTracking> pelvis = track(standing, walking, PELVIS, List.of(Side.LEFT, Side.RIGHT));
        Optional<SegmentTracking> thigh = track(standing, walking, THIGH, own);
        LimbChain chain = new LimbChain(limb, walking.recording().frames());
        Points shank = points(standing, walking, SHANK, own);
        if (thigh.isPresent() && shank.reference().size() < FEWEST) {
            chain.add(LimbChain.THIGH, points(standing, walking, THIGH, own));
        }
        chain.add(SegmentName.SHANK.word(), shank);
        Map<SegmentName, Points> ofFoot = new LinkedHashMap<>();
        for (Segment segment : limb.segments()) {
            if (segment.name() != SegmentName.SHANK) {
                ofFoot.put(segment.name(), points(standing, walking, carried(limb, segment.name()), own));
            }
        }
        ChainPoints.of(limb, ofFoot).forEach((name, points) -> chain.add(name.word(), points));
        chain.fit();
        Points carrier = pelvis.isPresent()
                ? points(standing, walking, PELVIS, List.of(Side.LEFT, Side.RIGHT))
                : points(standing, walking, THIGH, own);
        return new LimbMotion(
                track(standing, walking, SHANK, own),
                track(standing, walking, FOOT, own),
                pelvis,
                thigh,
                chain,
                carrier);
    }

    /** Landmarks that a segment of the foot carries; those of toes only where the toes are a segment of their own. */
    private static List<Landmark> carried(StandingLimb limb, SegmentName segment) {
        List<Landmark> landmarks = new ArrayList<>();
        for (Landmark landmark : Landmark.values()) {
            boolean isCarried = limb.landmarks().stream()
                    .anyMatch(l -> l.segment() == segment
                            && (l.name().equals(landmark.word()) || l.name().startsWith(landmark.word() + ".")));
            if (isCarried && (FOOT.contains(landmark) || segment.isToe())) {
                landmarks.add(landmark);
            }
        }
        return landmarks;
    }

    /**
     * Points of one segment that are both in the standing and in the walking recording.
     *
     * @param reference standing positions, m
     * @param tracks walking positions, each {@code [frames][3]}, m
     */
    record Points(List<Vec3> reference, List<double[]> tracks) {}

    private static Points points(
            StandingPoints standing, LandmarkTracks walking, List<Landmark> landmarks, List<Side> sides) {
        List<Vec3> reference = new ArrayList<>();
        List<double[]> tracks = new ArrayList<>();
        List<String> used = new ArrayList<>();
        for (Landmark landmark : landmarks) {
            for (Side side : sides) {
                for (String label : walking.labels(landmark, side)) {
                    Optional<Vec3> stood = standing.label(label);
                    Optional<double[]> track = walking.labelled(label);
                    if (stood.isPresent() && track.isPresent() && !used.contains(label)) {
                        used.add(label);
                        reference.add(stood.get());
                        tracks.add(track.get());
                    }
                }
            }
        }
        return new Points(reference, tracks);
    }

    private static Optional<SegmentTracking> track(
            StandingPoints standing, LandmarkTracks walking, List<Landmark> landmarks, List<Side> sides) {
        Points points = points(standing, walking, landmarks, sides);
        if (points.reference().size() < FEWEST) {
            return Optional.empty();
        }
        SegmentTracking tracking = SegmentTracking.of(
                points.reference(), points.tracks(), walking.recording().frames());
        return tracking.fitted() == 0 ? Optional.empty() : Optional.of(tracking);
    }

    private static Optional<Vec3> at(Optional<Pose> chain, Optional<SegmentTracking> rigid, Vec3 standing, int frame) {
        return chain.or(() -> rigid.flatMap(r -> r.pose(frame))).map(x -> x.transformPosition(standing));
    }

    /** Ankle centre in a frame. */
    Optional<Vec3> ankle(StandingLimb limb, int frame) {
        return at(
                chain.pose(SegmentName.SHANK.word(), frame), shank, limb.ankle().position(), frame);
    }

    /** Knee centre in a frame. */
    Optional<Vec3> knee(StandingLimb limb, int frame) {
        return at(
                chain.pose(SegmentName.SHANK.word(), frame), shank, limb.knee().position(), frame);
    }

    /** Hip centre in a frame, carried by the pelvis, else by the thigh. */
    Optional<Vec3> hip(StandingLimb limb, int frame) {
        return pelvis.or(() -> thigh).flatMap(s -> s.at(limb.hip().position(), frame));
    }

    /** Pose of the shank from standing to a frame. */
    Optional<Pose> shankPose(int frame) {
        return chain.pose(SegmentName.SHANK.word(), frame).or(() -> shank.flatMap(s -> s.pose(frame)));
    }

    /** Pose of the segment that carries the hip from standing to a frame. */
    Optional<Pose> hipPose(int frame) {
        return pelvis.or(() -> thigh).flatMap(s -> s.pose(frame));
    }

    /** Pose of the foot, or of its rearmost segment, from standing to a frame. */
    Optional<Pose> rearfoot(StandingLimb limb, int frame) {
        return chain.pose(limb.segments().get(1).name().word(), frame).or(() -> foot.flatMap(f -> f.pose(frame)));
    }
}
