package org.solewright.analysis.audit;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.solewright.domain.gait.Side;

/**
 * What an audit looks at.
 *
 * @param name of the results, for messages
 * @param centreOfMass position, m
 * @param velocity of the centre of mass, m/s
 * @param loads ground forces
 * @param feet landmarks of the feet
 * @param mass stated mass of the model or subject, kg
 */
public record AuditedResults(
        String name,
        Optional<AuditedVector> centreOfMass,
        Optional<AuditedVector> velocity,
        List<Load> loads,
        List<Foot> feet,
        OptionalDouble mass) {

    /** Copies the lists. */
    public AuditedResults {
        loads = List.copyOf(loads);
        feet = List.copyOf(feet);
    }

    /**
     * The same with another mass.
     *
     * @param stated kg
     * @return these results with that mass
     */
    public AuditedResults withMass(OptionalDouble stated) {
        return new AuditedResults(name, centreOfMass, velocity, loads, feet, stated);
    }

    /**
     * The ground's load at one contact or platform.
     *
     * @param side whose foot bears it, where the results say so
     * @param force on the subject, N
     * @param centreOfPressure m, sampled like the force
     */
    public record Load(Optional<Side> side, AuditedVector force, AuditedVector centreOfPressure) {}

    /**
     * A foot.
     *
     * @param side which
     * @param landmarks sampled alike, at least one
     */
    public record Foot(Side side, List<AuditedVector> landmarks) {

        /** Copies the list. */
        public Foot {
            landmarks = List.copyOf(landmarks);
        }
    }
}
