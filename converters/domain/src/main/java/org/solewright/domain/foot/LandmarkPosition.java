package org.solewright.domain.foot;

import org.solewright.domain.geometry.Vec3;

/**
 * Where a landmark lies on its segment.
 *
 * @param name the landmark's word; points of a cluster have a number behind it, such as {@code shank_cluster.2}
 * @param segment whose frame it is given in
 * @param position m, finite
 */
public record LandmarkPosition(String name, SegmentName segment, Vec3 position) {

    /** Checks that the position is finite. */
    public LandmarkPosition {
        if (!position.isFinite()) {
            throw new IllegalArgumentException("landmark " + name + " at " + position + ", expected finite components");
        }
    }
}
