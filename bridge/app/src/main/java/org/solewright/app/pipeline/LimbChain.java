package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.EnumSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import org.solewright.analysis.fitting.ChainModel;
import org.solewright.analysis.fitting.ChainTracking;
import org.solewright.analysis.fitting.RigidFit;
import org.solewright.analysis.fitting.SegmentTracking;
import org.solewright.analysis.fitting.StandingLimb;
import org.solewright.domain.foot.Joint;
import org.solewright.domain.foot.SegmentName;
import org.solewright.domain.geometry.Pose;
import org.solewright.domain.geometry.Vec3;

/**
 * The chain of one limb over one walking recording: shank, above it the thigh where needed, and the foot's segments, as
 * far as their points are tracked. A cluster weighs 1/rms^2 of its own rigid fit, freed of the fit's six unknowns; one
 * without such a fit weighs as the placement of a landmark.
 */
final class LimbChain {

    static final String THIGH = "thigh";

    private static final int FEWEST = 3;

    /** Least rms of a cluster, m: noise of a marker (common practice). */
    private static final double LEAST_RMS = 0.0005;

    /** Rms of a cluster that has no fit of its own, m: placement of a landmark (design 03 section 7). */
    private static final double UNKNOWN_RMS = 0.005;

    private final StandingLimb limb;
    private final int frames;
    private final List<String> names = new ArrayList<>();
    private final List<ChainModel.Segment> segments = new ArrayList<>();
    private final List<double[]> tracks = new ArrayList<>();
    private Optional<ChainTracking> tracking = Optional.empty();

    LimbChain(StandingLimb limb, int frames) {
        this.limb = limb;
        this.frames = frames;
    }

    /** Adds a segment below those added before; one without points is left out, and of a shank all above. */
    void add(String name, LimbMotion.Points points) {
        if (points.reference().isEmpty()) {
            if (name.equals(SegmentName.SHANK.word())) {
                names.clear();
                segments.clear();
                tracks.clear();
            }
            return;
        }
        int parent = segments.size() - 1;
        Optional<Vec3> hinge = points.reference().size() < FEWEST && parent >= 0
                ? joint(limb, name).flatMap(j -> hinge(limb, j))
                : Optional.empty();
        double rms = rms(points);
        names.add(name);
        segments.add(new ChainModel.Segment(parent, centre(limb, name), hinge, points.reference(), 1 / (rms * rms)));
        tracks.addAll(points.tracks());
    }

    private double rms(LimbMotion.Points points) {
        int count = points.reference().size();
        if (count < FEWEST) {
            return UNKNOWN_RMS;
        }
        SegmentTracking rigid = SegmentTracking.of(points.reference(), points.tracks(), frames);
        double sum = 0;
        double free = 0;
        for (int frame = 0; frame < frames; frame++) {
            Optional<RigidFit> fit = rigid.fit(frame);
            if (fit.isPresent()) {
                sum += fit.get().points() * fit.get().rms() * fit.get().rms();
                free += fit.get().points() - 2;
            }
        }
        return free > 0 ? Math.max(LEAST_RMS, Math.sqrt(sum / free)) : UNKNOWN_RMS;
    }

    private static Optional<Joint> joint(StandingLimb limb, String name) {
        return limb.joints().stream()
                .filter(j -> j.distal().word().equals(name))
                .findFirst();
    }

    private static Optional<Vec3> hinge(StandingLimb limb, Joint joint) {
        return joint.kind() == Joint.Kind.HINGE
                ? Optional.ofNullable(limb.poses().get(joint.proximal()))
                        .map(x -> x.transformVector(joint.axes().get(0).direction()))
                : Optional.empty();
    }

    /** Centre of the joint with the segment above in the standing trial. */
    private static Vec3 centre(StandingLimb limb, String name) {
        return switch (name) {
            case THIGH -> limb.hip().position();
            case "shank" -> limb.knee().position();
            default ->
                joint(limb, name)
                        .flatMap(j -> Optional.ofNullable(limb.poses().get(j.proximal()))
                                .map(x -> x.transformPosition(j.centre().position())))
                        .orElse(limb.ankle().position());
        };
    }

    /** Names of the segments, as {@link #pose} takes them, parents first. */
    List<String> names() {
        return names;
    }

    /** Walking positions of the points, segment by segment, each {@code [frames][3]}, m. */
    List<double[]> tracks() {
        return tracks;
    }

    /** The same points and weights on joints of another estimate of the limb; not for a chain without segments. */
    ChainModel model(StandingLimb other) {
        List<ChainModel.Segment> moved = new ArrayList<>();
        for (int s = 0; s < segments.size(); s++) {
            ChainModel.Segment own = segments.get(s);
            String name = names.get(s);
            moved.add(new ChainModel.Segment(
                    own.parent(),
                    centre(other, name),
                    own.hinge().isPresent() ? joint(other, name).flatMap(j -> hinge(other, j)) : Optional.empty(),
                    own.points(),
                    own.weight()));
        }
        return new ChainModel(moved);
    }

    /** Whether a segment has so many points of its own that no joint decides how it turns. */
    boolean isTurnSeen(String name) {
        int segment = names.indexOf(name);
        return segment >= 0 && segments.get(segment).points().size() >= FEWEST;
    }

    /** Fits all frames. */
    void fit() {
        if (!segments.isEmpty()) {
            tracking = Optional.of(ChainTracking.of(new ChainModel(segments), tracks, frames));
        }
    }

    /** Pose of a segment from standing to a frame, laboratory frame; empty where the chain is not known. */
    Optional<Pose> pose(String name, int frame) {
        int segment = names.indexOf(name);
        return segment < 0 ? Optional.empty() : tracking.flatMap(t -> t.pose(segment, frame));
    }

    /** Segments of shank and foot that had points and came out in some frame. */
    Set<SegmentName> observed() {
        Set<SegmentName> observed = EnumSet.noneOf(SegmentName.class);
        boolean isKnown = tracking.isPresent() && tracking.get().determined() > 0;
        for (SegmentName name : SegmentName.values()) {
            if (isKnown && names.contains(name.word())) {
                observed.add(name);
            }
        }
        return observed;
    }
}
