package org.solewright.analysis.fitting;

import java.util.Optional;
import org.solewright.domain.geometry.Vec3;

/**
 * The joint centres of one limb over a recording, each carried by the segment that it is fixed to.
 *
 * @param shank tracks knee and ankle
 * @param pelvis tracks the hip; empty where neither pelvis nor thigh can be tracked
 * @param hip hip centre in the standing trial, laboratory frame, m
 * @param knee likewise
 * @param ankle likewise
 */
public record LimbTracking(
        SegmentTracking shank, Optional<SegmentTracking> pelvis, Vec3 hip, Vec3 knee, Vec3 ankle) {

    /**
     * Ankle centre.
     *
     * @param frame zero-based
     * @return m, laboratory frame; empty where not known
     */
    public Optional<Vec3> ankleAt(int frame) {
        return shank.at(ankle, frame);
    }

    /**
     * Knee centre.
     *
     * @param frame zero-based
     * @return m, laboratory frame; empty where not known
     */
    public Optional<Vec3> kneeAt(int frame) {
        return shank.at(knee, frame);
    }

    /**
     * Hip centre.
     *
     * @param frame zero-based
     * @return m, laboratory frame; empty where not known
     */
    public Optional<Vec3> hipAt(int frame) {
        return pelvis.flatMap(p -> p.at(hip, frame));
    }
}
