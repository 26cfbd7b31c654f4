package org.solewright.domain.foot;

import java.util.Optional;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.finding.Quantity;

/**
 * A rigid part of the limb. Its frame has the origin at the proximal joint, x forward, y up, z to the subject's right in
 * the posture of the standing trial.
 *
 * @param name which
 * @param parent the segment proximal to it; empty for the first
 * @param mass kg, more than 0
 * @param centreOfMass in the segment's frame, m
 * @param inertia about its own centre of mass, in its frame, kg m2
 * @param inertiaBasis where the tensor comes from
 * @param length from its proximal joint to its distal joint, of the last segment to the toe tip, m
 * @param observed true where its motion in walking was tracked, false where it follows its neighbours
 */
public record Segment(
        SegmentName name,
        Optional<SegmentName> parent,
        Quantity mass,
        Located centreOfMass,
        InertiaTensor inertia,
        Basis inertiaBasis,
        Quantity length,
        boolean observed) {

    /** Checks that the mass is more than 0. */
    public Segment {
        if (!(mass.value() > 0)) {
            throw new IllegalArgumentException(name.word() + " mass " + mass.value() + " kg, expected more than 0 kg");
        }
    }
}
