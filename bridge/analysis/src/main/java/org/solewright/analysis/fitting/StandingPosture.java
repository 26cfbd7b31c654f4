package org.solewright.analysis.fitting;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.foot.SidedLandmark;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Vec3;

/**
 * Where the landmarks were, on the mean, while the subject stood still; all in the laboratory frame L.
 *
 * @param landmarks mean positions, m; several labels of a landmark already averaged
 * @param clusters mean positions of the points of clusters, m, in the order of their labels
 * @param up unit vector
 * @param floor height of the floor along {@code up}, m; empty where no platform or option gives it
 */
public record StandingPosture(
        Map<SidedLandmark, Vec3> landmarks, Map<SidedLandmark, List<Vec3>> clusters, Vec3 up, OptionalDouble floor) {

    private static final double TOLERANCE = 1e-6;

    /** Copies the maps and checks that the positions are finite and {@code up} has unit length. */
    public StandingPosture {
        landmarks = Collections.unmodifiableMap(new LinkedHashMap<>(landmarks));
        clusters = Collections.unmodifiableMap(new LinkedHashMap<>(clusters));
        landmarks.forEach((name, position) -> {
            if (!position.isFinite()) {
                throw new IllegalArgumentException(name.words() + " at " + position + ", expected finite components");
            }
        });
        if (!(Math.abs(up.norm() - 1) < TOLERANCE)) {
            throw new IllegalArgumentException("up direction of length " + up.norm() + ", expected 1");
        }
    }

    /**
     * A landmark's position.
     *
     * @param landmark which
     * @param side whose
     * @return position in L, m; empty where it was not recorded
     */
    public Optional<Vec3> position(Landmark landmark, Side side) {
        return Optional.ofNullable(landmarks.get(new SidedLandmark(landmark, side)));
    }

    /**
     * The points of a cluster.
     *
     * @param cluster which
     * @param side whose
     * @return positions in L, m, in the order of their labels; none where the cluster was not recorded
     */
    public List<Vec3> cluster(Landmark cluster, Side side) {
        return clusters.getOrDefault(new SidedLandmark(cluster, side), List.of());
    }

    /**
     * Middle of two landmarks of one side.
     *
     * @param a one
     * @param b the other
     * @param side whose
     * @return position in L, m; empty where one of them was not recorded
     */
    Optional<Vec3> middle(Landmark a, Landmark b, Side side) {
        return position(a, side)
                .flatMap(p -> position(b, side).map(q -> p.plus(q).times(0.5)));
    }
}
