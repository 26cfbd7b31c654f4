package org.solewright.domain.foot;

import org.solewright.domain.finding.Basis;
import org.solewright.domain.geometry.Vec3;

/**
 * A contact element of the sole: a sphere with the force F = stiffness d^1.5 (1 + damping d'), never tensile [Hunt
 * Crossley 1975].
 *
 * @param name what it lies under, such as {@code heel}
 * @param segment whose frame it is given in
 * @param centre m
 * @param radius m, more than 0
 * @param stiffness N/m^1.5, more than 0
 * @param damping s/m, not negative
 * @param friction coefficient of dry friction, not negative
 * @param basis where its numbers come from, the weakest of them
 */
public record Pad(
        String name,
        SegmentName segment,
        Vec3 centre,
        double radius,
        double stiffness,
        double damping,
        double friction,
        Basis basis) {

    /** Checks that radius and stiffness are more than 0 and damping and friction not negative. */
    public Pad {
        if (!(radius > 0) || !(stiffness > 0) || !(damping >= 0) || !(friction >= 0) || !centre.isFinite()) {
            throw new IllegalArgumentException("pad " + name + " of radius " + radius + " m, stiffness " + stiffness
                    + " N/m^1.5, damping " + damping + " s/m, friction " + friction);
        }
    }
}
