package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.solewright.analysis.fitting.ChainModel;
import org.solewright.analysis.fitting.ChainTracking;
import org.solewright.analysis.fitting.RigidFit;
import org.solewright.analysis.fitting.SegmentTracking;
import org.solewright.analysis.gait.LandmarkTracks;
import org.solewright.domain.foot.FootModel;
import org.solewright.domain.foot.Joint;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.foot.LandmarkPosition;
import org.solewright.domain.foot.Segment;
import org.solewright.domain.foot.SegmentName;
import org.solewright.domain.geometry.Pose;
import org.solewright.domain.geometry.Rotation;
import org.solewright.domain.geometry.Vec3;

/**
 * Poses of a model's segments over a walking recording, by the chain fit through the points that the model's landmarks
 * have there [Lu and O'Connor 1999]. A segment without points of its own is inferred: it goes with the one above it.
 */
final class ModelChain {

    private static final int FEWEST = 3;

    /** Least rms of a cluster, m: noise of a marker (common practice). */
    private static final double LEAST_RMS = 0.0005;

    /** Rms of a cluster that has no fit of its own, m: placement of a landmark (design 03 section 7). */
    private static final double UNKNOWN_RMS = 0.005;

    private final FootModel model;
    private final Map<SegmentName, Vec3> origins = new EnumMap<>(SegmentName.class);
    private final List<SegmentName> tracked = new ArrayList<>();
    private final List<SegmentName> observed = new ArrayList<>();
    private final ChainTracking tracking;

    private ModelChain(FootModel model, LandmarkTracks walking, List<List<LandmarkPosition>> places) {
        this.model = model;
        for (Segment s : model.segments()) {
            origins.put(s.name(), origin(s.name()));
        }
        List<ChainModel.Segment> segments = new ArrayList<>();
        List<double[]> tracks = new ArrayList<>();
        for (int i = 0; i < places.size(); i++) {
            SegmentName name = model.segments().get(i).name();
            List<Vec3> reference = new ArrayList<>();
            List<double[]> own = new ArrayList<>();
            for (LandmarkPosition place : places.get(i)) {
                track(model, walking, place).ifPresent(t -> {
                    reference.add(originOf(name).plus(place.position()));
                    own.add(t);
                });
            }
            if (!reference.isEmpty()) {
                int parent = segments.size() - 1;
                Optional<Vec3> hinge = reference.size() < FEWEST && parent >= 0 ? hinge(name) : Optional.empty();
                double rms = rms(reference, own, walking.recording().frames());
                segments.add(new ChainModel.Segment(parent, originOf(name), hinge, reference, 1 / (rms * rms)));
                tracks.addAll(own);
                tracked.add(name);
                if (reference.size() >= FEWEST) {
                    observed.add(name);
                }
            }
        }
        tracking = ChainTracking.of(
                new ChainModel(segments), tracks, walking.recording().frames());
    }

    /** The chain; empty where the shank has fewer than three tracked points. */
    static Optional<ModelChain> of(FootModel model, LandmarkTracks walking) {
        List<List<LandmarkPosition>> places = model.segments().stream()
                .map(s -> model.landmarks().stream()
                        .filter(l -> l.segment() == s.name())
                        .toList())
                .toList();
        long shank = places.isEmpty()
                ? 0
                : places.get(0).stream()
                        .filter(p -> track(model, walking, p).isPresent())
                        .count();
        if (shank < FEWEST || model.segments().get(0).name() != SegmentName.SHANK) {
            return Optional.empty();
        }
        return Optional.of(new ModelChain(model, walking, places));
    }

    private Vec3 origin(SegmentName name) {
        return joint(name)
                .map(j -> origin(j.proximal()).plus(j.centre().position()))
                .orElse(Vec3.ZERO);
    }

    private Vec3 originOf(SegmentName name) {
        return Optional.ofNullable(origins.get(name)).orElse(Vec3.ZERO);
    }

    /** The joint that a segment hangs on. */
    private Optional<Joint> joint(SegmentName name) {
        return model.joints().stream().filter(j -> j.distal() == name).findFirst();
    }

    private Optional<Vec3> hinge(SegmentName name) {
        return joint(name)
                .filter(j -> j.kind() == Joint.Kind.HINGE)
                .map(j -> j.axes().get(0).direction());
    }

    private static double rms(List<Vec3> reference, List<double[]> own, int frames) {
        if (reference.size() < FEWEST) {
            return UNKNOWN_RMS;
        }
        SegmentTracking rigid = SegmentTracking.of(reference, own, frames);
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

    /** Points of a cluster are {@code NAME.1}, {@code NAME.2} in the order of their labels. */
    private static Optional<double[]> track(FootModel model, LandmarkTracks walking, LandmarkPosition place) {
        for (Landmark landmark : Landmark.values()) {
            List<String> labels = walking.labels(landmark, model.side());
            if (place.name().equals(landmark.word())) {
                return labels.isEmpty() ? Optional.empty() : walking.track(landmark, model.side());
            }
            for (int i = 0; i < labels.size(); i++) {
                if (place.name().equals(landmark.word() + "." + (i + 1))) {
                    return walking.labelled(labels.get(i));
                }
            }
        }
        return Optional.empty();
    }

    FootModel model() {
        return model;
    }

    /** Whether a segment has three tracked points of its own, so that its turn does not rest on a joint's axis. */
    boolean isObserved(SegmentName name) {
        return observed.contains(name);
    }

    /** X_LS of a segment in a frame; that of the tracked segment above it for an inferred one; empty where not known. */
    Optional<Pose> pose(SegmentName name, int frame) {
        SegmentName carrier = name;
        while (!tracked.contains(carrier)) {
            Optional<Joint> above = joint(carrier);
            if (above.isEmpty()) {
                return Optional.empty();
            }
            carrier = above.get().proximal();
        }
        return tracking.pose(tracked.indexOf(carrier), frame)
                .map(x -> x.times(new Pose(Rotation.IDENTITY, originOf(name))));
    }
}
