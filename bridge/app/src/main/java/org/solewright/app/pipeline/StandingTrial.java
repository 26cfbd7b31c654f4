package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.solewright.analysis.fitting.StandingPosture;
import org.solewright.analysis.gait.LandmarkTracks;
import org.solewright.analysis.gait.Mirror;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.foot.LandmarkMap;
import org.solewright.domain.foot.SidedLandmark;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Vec3;
import org.solewright.domain.motion.Recording;

/** One or several standing recordings, pooled: where labels and landmarks were on the mean. Laboratory frame, m. */
final class StandingTrial implements StandingPoints {

    private static final double SNAP = Math.cos(Math.toRadians(20));

    private static final double LEVEL = Math.cos(Math.toRadians(2));

    private final List<LandmarkTracks> tracks;

    StandingTrial(List<LandmarkTracks> tracks) {
        this.tracks = List.copyOf(tracks);
    }

    /** The landmarks of standing recordings; mirrored, if asked for, across a plane through up. */
    static StandingTrial of(LandmarkMap map, List<Recording> standing, boolean isMirrored, List<Finding> findings) {
        List<LandmarkTracks> tracks = new ArrayList<>();
        for (Recording r : standing) {
            Recording seen = r;
            if (isMirrored) {
                Vec3 up = new StandingTrial(List.of(LandmarkTracks.of(r, map, 0, new ArrayList<>())))
                        .up()
                        .orElse(Vec3.Z);
                seen = Mirror.of(r, up);
            }
            tracks.add(LandmarkTracks.of(seen, map, 0, findings));
        }
        return new StandingTrial(tracks);
    }

    List<LandmarkTracks> tracks() {
        return tracks;
    }

    /** Mean position of a landmark over all standing recordings that have it. */
    Optional<Vec3> landmark(Landmark landmark, Side side) {
        return pooled(
                tracks.stream().flatMap(t -> t.mean(landmark, side).stream()).toList());
    }

    /** Mean position of a label over all standing recordings that have it. */
    @Override
    public Optional<Vec3> label(String label) {
        return pooled(tracks.stream()
                .flatMap(t -> t.labelled(label).flatMap(LandmarkTracks::meanOf).stream())
                .toList());
    }

    /** Labels of a landmark over all standing recordings, in order. */
    List<String> labels(Landmark landmark, Side side) {
        return tracks.stream()
                .flatMap(t -> t.labels(landmark, side).stream())
                .distinct()
                .toList();
    }

    private static Optional<Vec3> pooled(List<Vec3> means) {
        Vec3 sum = Vec3.ZERO;
        for (Vec3 m : means) {
            sum = sum.plus(m);
        }
        return means.isEmpty() ? Optional.empty() : Optional.of(sum.times(1.0 / means.size()));
    }

    /**
     * Up from the subject: from the malleoli to the hips, taken as the laboratory axis that lies within 20 degrees of it
     * where one does.
     */
    Optional<Vec3> up() {
        List<Vec3> low = new ArrayList<>();
        List<Vec3> high = new ArrayList<>();
        for (Side side : Side.values()) {
            landmark(Landmark.MALLEOLUS_LATERAL, side).ifPresent(low::add);
            landmark(Landmark.TROCHANTER_MAJOR, side)
                    .or(() -> landmark(Landmark.ASIS, side))
                    .ifPresent(high::add);
        }
        return pooled(low).flatMap(a -> pooled(high).map(b -> snapped(b.minus(a).unit())));
    }

    private static Vec3 snapped(Vec3 up) {
        for (Vec3 axis : List.of(Vec3.X, Vec3.Y, Vec3.Z)) {
            double along = up.dot(axis);
            if (Math.abs(along) > SNAP) {
                return axis.times(Math.signum(along));
            }
        }
        return up;
    }

    /** Up from platforms in the standing recordings. */
    Optional<Vec3> platformUp() {
        Vec3 sum = Vec3.ZERO;
        for (LandmarkTracks t : tracks) {
            for (PlatformLoads p : t.recording().platforms()) {
                sum = sum.plus(p.up());
            }
        }
        return sum.norm() > 0.5 ? Optional.of(sum.unit()) : Optional.empty();
    }

    /** Up from the platforms of walking, else of standing, else from the subject; empty where none says. */
    Optional<Vec3> up(List<Recording> walking) {
        Vec3 sum = Vec3.ZERO;
        for (Recording r : walking) {
            for (PlatformLoads p : r.platforms()) {
                sum = sum.plus(p.up());
            }
        }
        Optional<Vec3> platforms = sum.norm() > 0.5 ? Optional.of(sum.unit()) : platformUp();
        // The standing trial's floor is level in its own laboratory axes: small tilts of platform corners are not up.
        return platforms.map(p -> up().filter(s -> s.dot(p) > LEVEL).orElse(p)).or(this::up);
    }

    /**
     * The posture for building limbs.
     *
     * @param up unit vector
     * @param floor height along up, m; empty where not given
     * @return mean positions
     */
    StandingPosture posture(Vec3 up, OptionalDouble floor) {
        Map<SidedLandmark, Vec3> landmarks = new LinkedHashMap<>();
        Map<SidedLandmark, List<Vec3>> clusters = new LinkedHashMap<>();
        for (Landmark landmark : Landmark.values()) {
            for (Side side : Side.values()) {
                SidedLandmark key = new SidedLandmark(landmark, side);
                if (landmark.isCluster()) {
                    List<Vec3> points = labels(landmark, side).stream()
                            .flatMap(l -> label(l).stream())
                            .toList();
                    if (!points.isEmpty()) {
                        clusters.put(key, points);
                    }
                } else {
                    landmark(landmark, side).ifPresent(p -> landmarks.put(key, p));
                }
            }
        }
        return new StandingPosture(landmarks, clusters, up, floor);
    }
}
