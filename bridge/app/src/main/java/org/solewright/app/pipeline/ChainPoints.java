package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.solewright.analysis.fitting.StandingLimb;
import org.solewright.domain.foot.Joint;
import org.solewright.domain.foot.SegmentName;
import org.solewright.domain.geometry.Pose;
import org.solewright.domain.geometry.Vec3;

/**
 * Which points of a foot move which segment of its chain. A segment whose own points cannot tell its turn is left out and
 * follows its neighbours: phalanges without points move with those before them, and a segment between two others whose
 * points lie on its own axis is fixed to the one behind it unless the one before it is tracked in all its turns.
 */
final class ChainPoints {

    private static final int FEWEST = 3;

    /** Distance from an axis within which a point says nothing about the turn about it, m: placement of a landmark. */
    private static final double ON_AXIS = 0.005;

    private final StandingLimb limb;
    private final Map<SegmentName, LimbMotion.Points> points = new LinkedHashMap<>();

    private ChainPoints(StandingLimb limb) {
        this.limb = limb;
    }

    /**
     * Assigns.
     *
     * @param limb as it stood
     * @param own tracked points of each of the foot's segments, proximal to distal
     * @return the points that move each of them, none where it follows its neighbours
     */
    static Map<SegmentName, LimbMotion.Points> of(StandingLimb limb, Map<SegmentName, LimbMotion.Points> own) {
        ChainPoints chain = new ChainPoints(limb);
        chain.points.putAll(own);
        List<SegmentName> names = List.copyOf(own.keySet());
        for (int i = 0; i + 1 < names.size(); i++) {
            chain.fillPhalanx(names, i);
        }
        for (int i = names.size() - 2; i > 0; i--) {
            chain.releaseMiddle(names.get(i - 1), names.get(i), names.get(i + 1));
        }
        return chain.points;
    }

    private LimbMotion.Points at(SegmentName name) {
        return points.getOrDefault(name, new LimbMotion.Points(List.of(), List.of()));
    }

    /** A phalanx without points takes those of the next one that has some: all between move as one. */
    private void fillPhalanx(List<SegmentName> names, int i) {
        SegmentName name = names.get(i);
        if (!name.isToe() || !at(name).reference().isEmpty()) {
            return;
        }
        for (SegmentName next : names.subList(i + 1, names.size())) {
            if (!at(next).reference().isEmpty()) {
                points.put(name, at(next));
                points.put(next, new LimbMotion.Points(List.of(), List.of()));
                return;
            }
        }
    }

    private void releaseMiddle(SegmentName behind, SegmentName name, SegmentName before) {
        LimbMotion.Points own = at(name);
        boolean isTurnUnknown = own.reference().size() < FEWEST
                && own.reference().stream().allMatch(p -> isOnAxis(name, p))
                && at(before).reference().size() < FEWEST;
        if (!own.reference().isEmpty() && isTurnUnknown) {
            points.put(behind, both(at(behind), own));
            points.put(name, new LimbMotion.Points(List.of(), List.of()));
        }
    }

    private static LimbMotion.Points both(LimbMotion.Points a, LimbMotion.Points b) {
        List<Vec3> reference = new ArrayList<>(a.reference());
        reference.addAll(b.reference());
        List<double[]> tracks = new ArrayList<>(a.tracks());
        tracks.addAll(b.tracks());
        return new LimbMotion.Points(reference, tracks);
    }

    private boolean isOnAxis(SegmentName name, Vec3 point) {
        Optional<Joint> joint = limb.joints().stream()
                .filter(j -> j.distal() == name && !j.axes().isEmpty())
                .findFirst();
        Optional<Pose> proximal =
                joint.flatMap(j -> Optional.ofNullable(limb.poses().get(j.proximal())));
        if (joint.isEmpty() || proximal.isEmpty()) {
            return false;
        }
        Vec3 arm = point.minus(
                proximal.get().transformPosition(joint.get().centre().position()));
        Vec3 axis = proximal.get().transformVector(joint.get().axes().get(0).direction());
        return arm.cross(axis).norm() < ON_AXIS;
    }
}
