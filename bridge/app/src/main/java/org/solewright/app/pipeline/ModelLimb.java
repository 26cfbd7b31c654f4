package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.solewright.analysis.fitting.SegmentTracking;
import org.solewright.analysis.gait.LandmarkTracks;
import org.solewright.domain.cost.ComparedLimb;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.finding.Quantity;
import org.solewright.domain.foot.FootModel;
import org.solewright.domain.foot.Joint;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.foot.LandmarkPosition;
import org.solewright.domain.foot.Pad;
import org.solewright.domain.foot.Rolling;
import org.solewright.domain.foot.SegmentName;
import org.solewright.domain.geometry.Pose;
import org.solewright.domain.geometry.Vec3;

/**
 * What a foot model says about its limb beyond what it lists: lengths of the compared postures, the pose of the shank in
 * a walking recording. Segment axes are parallel in the model's posture, so positions add up along the chain.
 */
final class ModelLimb {

    private static final double PLANTARFLEXION_LIMIT = Math.toRadians(50);
    private static final int FEWEST = 3;

    private final FootModel model;
    private Optional<LandmarkTracks> seen = Optional.empty();
    private Optional<SegmentTracking> shank = Optional.empty();
    private Optional<ModelChain> chain = Optional.empty();

    ModelLimb(FootModel model) {
        this.model = model;
    }

    FootModel model() {
        return model;
    }

    /** Ankle centre in the shank frame, whose origin is the knee. */
    private Vec3 ankle_S() {
        return model.joints().stream()
                .filter(j -> j.proximal() == SegmentName.SHANK)
                .findFirst()
                .map(j -> j.centre().position())
                .orElseThrow(() -> new IllegalArgumentException("the model has no joint of the shank"));
    }

    /** Origin of a foot segment from the ankle, model axes, m. */
    private Vec3 origin(SegmentName segment) {
        for (Joint j : model.joints()) {
            if (j.distal() == segment) {
                return j.proximal() == SegmentName.SHANK
                        ? Vec3.ZERO
                        : origin(j.proximal()).plus(j.centre().position());
            }
        }
        return Vec3.ZERO;
    }

    /** A landmark from the ankle, model axes, m. */
    private Optional<Vec3> landmark(Landmark landmark) {
        return model.landmarks().stream()
                .filter(l -> l.name().equals(landmark.word()) && l.segment() != SegmentName.SHANK)
                .findFirst()
                .map(l -> origin(l.segment()).plus(l.position()));
    }

    private OptionalDouble floorBelowAnkle() {
        double lowest = Double.POSITIVE_INFINITY;
        for (Pad p : model.pads()) {
            lowest = Math.min(lowest, origin(p.segment()).plus(p.centre()).y() - p.radius());
        }
        return Double.isFinite(lowest) ? OptionalDouble.of(lowest) : OptionalDouble.empty();
    }

    /**
     * Lengths for the compared postures (03 section 8). The heel is raised until heads or toe tip lie in line with the
     * shank, at most by the plantarflexion limit: the measured range, else 50 degrees (assumed).
     */
    ComparedLimb compared() {
        Quantity limb = model.subject().limbLength();
        Optional<Vec3> heads = heads();
        Optional<Vec3> tip = toeTip(heads);
        Basis tipBasis = hasToe() ? Basis.MEASURED : Basis.REGRESSION;
        Optional<ComparedLimb.Arc> arc = model.rolling()
                .arc(Rolling.Frame.LIMB)
                .map(a -> new ComparedLimb.Arc(
                        Quantity.of(a.curvature(), Basis.MEASURED), Quantity.of(a.arcLength(), Basis.MEASURED)));
        return new ComparedLimb(
                limb,
                model.subject().effectiveFootLength(),
                arc,
                heads.flatMap(h -> raised(h, Basis.ASSUMED)),
                heads.flatMap(h -> tip.map(t -> Quantity.of(Math.abs(t.x() - h.x()), tipBasis))),
                tip.flatMap(t -> raised(t, Basis.ASSUMED)));
    }

    private boolean hasToe() {
        return landmark(Landmark.TOE_TIP).isPresent()
                || landmark(Landmark.HALLUX_TIP).isPresent();
    }

    private Optional<Vec3> heads() {
        Optional<Vec3> first = landmark(Landmark.METATARSAL_1_HEAD);
        Optional<Vec3> fifth = landmark(Landmark.METATARSAL_5_HEAD);
        return first.flatMap(a -> fifth.map(b -> a.plus(b).times(0.5)));
    }

    private Optional<Vec3> toeTip(Optional<Vec3> heads) {
        Optional<Vec3> toe = landmark(Landmark.TOE_TIP).or(() -> landmark(Landmark.HALLUX_TIP));
        if (toe.isPresent()) {
            return toe;
        }
        Optional<Vec3> heel = landmark(Landmark.CALCANEUS_POSTERIOR);
        return model.subject()
                .footLength()
                .flatMap(length -> heel.flatMap(h -> heads.map(m -> new Vec3(h.x() + length.value(), m.y(), m.z()))));
    }

    /** Hip to a place of the foot with the heel raised: hip straight above the ankle, the foot turned down. */
    private Optional<Quantity> raised(Vec3 place, Basis basis) {
        OptionalDouble floor = floorBelowAnkle();
        if (floor.isEmpty()) {
            return Optional.empty();
        }
        double hipAboveAnkle = model.subject().limbLength().value() + floor.getAsDouble();
        double reach = Math.hypot(place.x(), place.y());
        double fromShank = Math.atan2(place.x(), -place.y());
        double turned = Math.max(0, fromShank - plantarflexionLimit());
        double x = reach * Math.sin(turned);
        double y = hipAboveAnkle + reach * Math.cos(turned);
        return Optional.of(Quantity.of(Math.hypot(x, y), basis));
    }

    private double plantarflexionLimit() {
        return model.joints().stream()
                .filter(j -> j.proximal() == SegmentName.SHANK)
                .findFirst()
                .flatMap(Joint::range)
                .filter(r -> r.basis() == Basis.MEASURED)
                .map(r -> Math.abs(r.min()))
                .orElse(PLANTARFLEXION_LIMIT);
    }

    /** Whether three points of the shank or more are tracked. */
    boolean hasShank(LandmarkTracks walking) {
        track(walking);
        return shank.isPresent();
    }

    /** Poses of all segments; empty where fewer than three points of the shank are tracked. */
    Optional<ModelChain> chain(LandmarkTracks walking) {
        track(walking);
        return chain;
    }

    /** Poses are those of one recording at a time: its steps are asked for one after the other. */
    private void track(LandmarkTracks walking) {
        if (seen.isEmpty() || !seen.get().equals(walking)) {
            shank = fitted(walking);
            chain = ModelChain.of(model, walking);
            seen = Optional.of(walking);
        }
    }

    private Optional<SegmentTracking> fitted(LandmarkTracks walking) {
        List<Vec3> reference = new ArrayList<>();
        List<double[]> tracks = new ArrayList<>();
        for (Landmark landmark : Landmark.values()) {
            List<LandmarkPosition> points = model.landmarks().stream()
                    .filter(l -> l.segment() == SegmentName.SHANK && isOf(l.name(), landmark))
                    .toList();
            List<String> labels = walking.labels(landmark, model.side());
            if (!points.isEmpty() && points.size() == labels.size()) {
                for (int i = 0; i < labels.size(); i++) {
                    reference.add(points.get(i).position());
                    walking.labelled(labels.get(i)).ifPresent(tracks::add);
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

    private static boolean isOf(String name, Landmark landmark) {
        return landmark.isCluster()
                ? name.startsWith(landmark.word()) && !name.equals(landmark.word())
                : name.equals(landmark.word());
    }

    /** X_LS of the shank in a frame: that of the chain, else of its own points alone, as a fit has it. */
    Optional<Pose> shankPose(LandmarkTracks walking, int frame) {
        track(walking);
        return chain.flatMap(c -> c.pose(SegmentName.SHANK, frame)).or(() -> shank.flatMap(s -> s.pose(frame)));
    }

    Optional<Vec3> ankle(LandmarkTracks walking, int frame) {
        return shankPose(walking, frame).map(x -> x.transformPosition(ankle_S()));
    }

    Optional<Vec3> knee(LandmarkTracks walking, int frame) {
        return shankPose(walking, frame).map(Pose::position);
    }
}
