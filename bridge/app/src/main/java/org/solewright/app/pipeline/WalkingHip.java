package org.solewright.app.pipeline;

import java.util.HashMap;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.solewright.analysis.fitting.HipCentre;
import org.solewright.analysis.fitting.StandingLimb;
import org.solewright.analysis.fitting.StandingPosture;
import org.solewright.analysis.gait.LandmarkTracks;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.foot.Population;
import org.solewright.domain.foot.SegmentName;
import org.solewright.domain.foot.SidedLandmark;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Vec3;

/**
 * The hip centre of a walking recording without its standing trial: frame by frame from the pelvis as in standing, of
 * people; else the greater trochanter itself. A model holds neither pelvis nor thigh.
 */
final class WalkingHip {

    private final StandingLimb limb;
    private final LimbMotion motion;
    private final Map<SidedLandmark, double[]> pelvis = new HashMap<>();
    private final Optional<double[]> trochanter;

    WalkingHip(StandingLimb limb, LandmarkTracks tracks, LimbMotion motion) {
        this.limb = limb;
        this.motion = motion;
        if (limb.population() != Population.OTHER) {
            for (Landmark landmark : new Landmark[] {Landmark.ASIS, Landmark.PSIS, Landmark.SACRUM}) {
                for (Side side : Side.values()) {
                    tracks.track(landmark, side).ifPresent(t -> pelvis.put(new SidedLandmark(landmark, side), t));
                }
            }
        }
        trochanter = tracks.track(Landmark.TROCHANTER_MAJOR, limb.side());
    }

    /** Hip centre in a frame, laboratory frame. */
    Optional<Vec3> at(int frame) {
        return fromPelvis(frame).or(() -> trochanter.map(t -> point(t, frame)).filter(Vec3::isFinite));
    }

    private Optional<Vec3> fromPelvis(int frame) {
        Map<SidedLandmark, Vec3> places = new HashMap<>();
        pelvis.forEach((name, track) -> {
            Vec3 p = point(track, frame);
            if (p.isFinite()) {
                places.put(name, p);
            }
        });
        malleolus(frame).ifPresent(p -> places.put(new SidedLandmark(Landmark.MALLEOLUS_MEDIAL, limb.side()), p));
        return HipCentre.fromPelvis(new StandingPosture(places, Map.of(), Vec3.Y, OptionalDouble.empty()), limb.side());
    }

    /** The medial malleolus as the shank carries it; only the length to it counts, by 4 %. */
    private Optional<Vec3> malleolus(int frame) {
        Optional<Vec3> stood = limb.landmarks().stream()
                .filter(l -> l.name().equals(Landmark.MALLEOLUS_MEDIAL.word()) && l.segment() == SegmentName.SHANK)
                .findFirst()
                .flatMap(l -> Optional.ofNullable(limb.poses().get(SegmentName.SHANK))
                        .map(x -> x.transformPosition(l.position())));
        return motion.chain()
                .pose(SegmentName.SHANK.word(), frame)
                .or(() -> motion.shank().flatMap(s -> s.pose(frame)))
                .flatMap(x -> stood.map(x::transformPosition));
    }

    private static Vec3 point(double[] xyz, int frame) {
        return 3 * frame + 2 < xyz.length
                ? new Vec3(xyz[3 * frame], xyz[3 * frame + 1], xyz[3 * frame + 2])
                : new Vec3(Double.NaN, Double.NaN, Double.NaN);
    }
}
