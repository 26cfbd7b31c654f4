package org.solewright.app.report;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.solewright.domain.foot.SegmentName;
import org.solewright.domain.geometry.Pose;
import org.solewright.domain.geometry.Vec3;

/**
 * One foot over one stance, as it was tracked. Frame: x forward along the walk, y up from the ground under the foot, z to the
 * subject's right, m.
 *
 * @param trial recording
 * @param instants in order of time, at least one
 */
public record FootRoll(String trial, List<Instant> instants) {

    /**
     * One instant.
     *
     * @param percent of stance, 0 to 100
     * @param poses of the segments that were tracked
     * @param centreOfPressure on the ground; empty without load
     * @param vertical load, N; 0 where not measured
     */
    public record Instant(
            double percent, Map<SegmentName, Pose> poses, Optional<Vec3> centreOfPressure, double vertical) {

        /** Copies the map. */
        public Instant {
            poses = Collections.unmodifiableMap(new LinkedHashMap<>(poses));
        }
    }

    /** Copies the list. */
    public FootRoll {
        instants = List.copyOf(instants);
        if (instants.isEmpty()) {
            throw new IllegalArgumentException("a stance of " + trial + " without instants, expected at least one");
        }
    }
}
