package org.solewright.domain.foot;

import java.util.OptionalDouble;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.geometry.Vec3;

/**
 * A position with where it comes from and how sure it is.
 *
 * @param position m, in the frame of the place that holds it, finite
 * @param basis where it comes from
 * @param sd standard deviation of each component, m; empty where unknown
 */
public record Located(Vec3 position, Basis basis, OptionalDouble sd) {

    /** Checks that the position is finite. */
    public Located {
        if (!position.isFinite()) {
            throw new IllegalArgumentException("position " + position + ", expected finite components");
        }
    }

    /**
     * A position whose standard deviation is unknown.
     *
     * @param position m
     * @param basis where it comes from
     * @return the position with its basis
     */
    public static Located of(Vec3 position, Basis basis) {
        return new Located(position, basis, OptionalDouble.empty());
    }
}
