package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.EnumMap;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.solewright.analysis.fitting.StandingLimb;
import org.solewright.analysis.fitting.StandingPosture;
import org.solewright.analysis.gait.LandmarkTracks;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.finding.Quantity;
import org.solewright.domain.foot.FootModel;
import org.solewright.domain.foot.Joint;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.foot.LandmarkPosition;
import org.solewright.domain.foot.Located;
import org.solewright.domain.foot.Pad;
import org.solewright.domain.foot.SegmentName;
import org.solewright.domain.foot.SidedLandmark;
import org.solewright.domain.geometry.Pose;
import org.solewright.domain.geometry.Rotation;
import org.solewright.domain.geometry.Vec3;

/**
 * The standing trial as a model holds it, in the model's ankle frame A: origin at the ankle centre, axes those of all its
 * segments (x forward, y up, z right). What is not in the model (pelvis and thigh) is not here either.
 */
final class ModelStanding {

    /** Marker radius where a model has no pads that touch the floor, m (design 03 section 5, assumed). */
    private static final double MARKER_RADIUS = 0.007;

    private final FootModel model;
    private final Map<SegmentName, Pose> poses = new EnumMap<>(SegmentName.class);
    private final Map<String, Vec3> landmarks = new LinkedHashMap<>();
    private final double floor;
    private final StandingLimb limb;

    private ModelStanding(FootModel model, Vec3 knee) {
        this.model = model;
        poses.put(SegmentName.SHANK, new Pose(Rotation.IDENTITY, knee));
        for (Joint joint : model.joints()) {
            Pose proximal = poses.get(joint.proximal());
            if (proximal != null) {
                poses.put(
                        joint.distal(),
                        new Pose(
                                Rotation.IDENTITY,
                                proximal.position().plus(joint.centre().position())));
            }
        }
        for (LandmarkPosition l : model.landmarks()) {
            Pose pose = poses.get(l.segment());
            if (pose != null) {
                landmarks.put(l.name(), pose.transformPosition(l.position()));
            }
        }
        floor = floorOf();
        limb = limb(knee);
    }

    /**
     * The standing trial of a model.
     *
     * @param model shank and foot
     * @return what it holds; empty where no joint leads from its shank to its foot
     */
    static Optional<ModelStanding> of(FootModel model) {
        return model.joints().stream()
                .filter(j -> j.proximal() == SegmentName.SHANK)
                .findFirst()
                .map(j -> new ModelStanding(model, j.centre().position().times(-1)));
    }

    private double floorOf() {
        double lowest = Double.POSITIVE_INFINITY;
        for (Pad p : model.pads()) {
            Pose pose = poses.get(p.segment());
            if (pose != null) {
                lowest = Math.min(lowest, pose.transformPosition(p.centre()).y() - p.radius());
            }
        }
        if (Double.isFinite(lowest)) {
            return lowest;
        }
        return landmarks.values().stream().mapToDouble(Vec3::y).min().orElse(0) - MARKER_RADIUS;
    }

    FootModel model() {
        return model;
    }

    /** Height of the floor in A, m; negative. */
    double floor() {
        return floor;
    }

    /** A landmark in A. */
    Optional<Vec3> landmark(Landmark landmark) {
        return Optional.ofNullable(landmarks.get(landmark.word()));
    }

    private List<Vec3> cluster(Landmark landmark) {
        List<Vec3> points = new ArrayList<>();
        for (int i = 1; landmarks.containsKey(landmark.word() + "." + i); i++) {
            points.add(Optional.ofNullable(landmarks.get(landmark.word() + "." + i))
                    .orElseThrow());
        }
        return points;
    }

    /**
     * Where the labels of a recording stood. A cluster whose points are fewer or more than the model's cannot be told
     * apart, nor can the labels of a landmark that several stand for.
     */
    StandingPoints labels(LandmarkTracks walking) {
        Map<String, Vec3> stood = new HashMap<>();
        for (Landmark landmark : Landmark.values()) {
            List<String> labels = walking.labels(landmark, model.side());
            List<Vec3> points = landmark.isCluster()
                    ? cluster(landmark)
                    : landmark(landmark).stream().toList();
            for (int i = 0; i < labels.size() && points.size() == labels.size(); i++) {
                stood.put(labels.get(i), points.get(i));
            }
        }
        return label -> Optional.ofNullable(stood.get(label));
    }

    /** Landmarks and clusters in A. */
    StandingPosture posture() {
        Map<SidedLandmark, Vec3> places = new LinkedHashMap<>();
        Map<SidedLandmark, List<Vec3>> clusters = new LinkedHashMap<>();
        for (Landmark landmark : Landmark.values()) {
            SidedLandmark key = new SidedLandmark(landmark, model.side());
            landmark(landmark).ifPresent(p -> places.put(key, p));
            List<Vec3> points = cluster(landmark);
            if (!points.isEmpty()) {
                clusters.put(key, points);
            }
        }
        return new StandingPosture(places, clusters, Vec3.Y, OptionalDouble.of(floor));
    }

    /** The limb in A. Its hip is straight above the ankle: the model does not say more. */
    StandingLimb limb() {
        return limb;
    }

    private StandingLimb limb(Vec3 knee) {
        Vec3 hip = new Vec3(0, model.subject().limbLength().value() + floor, 0);
        return new StandingLimb(
                model.side(),
                model.subject().id(),
                model.subject().mass(),
                model.subject().stature(),
                model.subject().population(),
                model.subject().sex(),
                Located.of(hip, Basis.ASSUMED),
                Located.of(knee, Basis.MEASURED),
                Located.of(Vec3.ZERO, Basis.MEASURED),
                Quantity.of(floor, Basis.MEASURED),
                model.subject().limbLength(),
                model.subject().footLength(),
                poses,
                model.segments(),
                model.joints(),
                model.landmarks(),
                model.pads(),
                List.of());
    }
}
