package org.solewright.domain.cost;

import java.util.Optional;
import org.solewright.domain.finding.Quantity;

/**
 * The lengths of one limb that the compared postures need. All postures share its hip, thigh, shank and foot.
 *
 * @param limbLength l, hip to floor in standing, m, above 0
 * @param footLength f, effective: travel of the centre of pressure in the limb frame, m, above 0; empty where unknown
 * @param arc the arc fitted to the roll-over shape in the limb frame; empty where unknown
 * @param toMetatarsalHeads hip to metatarsal heads with the heel raised, m, above 0; empty where unknown
 * @param headsToToeTip metatarsal heads to toe tip along the ground, m, above 0; empty where unknown
 * @param toToeTip hip to toe tip with the whole foot raised, m, above 0; empty where unknown
 */
public record ComparedLimb(
        Quantity limbLength,
        Optional<Quantity> footLength,
        Optional<Arc> arc,
        Optional<Quantity> toMetatarsalHeads,
        Optional<Quantity> headsToToeTip,
        Optional<Quantity> toToeTip) {

    /**
     * An arc.
     *
     * @param curvature 1/m; 0 where flat
     * @param length of the arc, m, not negative
     */
    public record Arc(Quantity curvature, Quantity length) {

        /** Checks that the length is not negative. */
        public Arc {
            if (!(length.value() >= 0)) {
                throw new IllegalArgumentException("arc length " + length.value() + " m, expected 0 m or more");
            }
        }
    }

    /** Checks that all lengths are above 0. */
    public ComparedLimb {
        check("limb length", limbLength);
        footLength.ifPresent(q -> check("foot length", q));
        toMetatarsalHeads.ifPresent(q -> check("hip to metatarsal heads", q));
        headsToToeTip.ifPresent(q -> check("metatarsal heads to toe tip", q));
        toToeTip.ifPresent(q -> check("hip to toe tip", q));
    }

    private static void check(String name, Quantity q) {
        if (!(q.value() > 0)) {
            throw new IllegalArgumentException(name + " " + q.value() + " m, expected more than 0 m");
        }
    }
}
