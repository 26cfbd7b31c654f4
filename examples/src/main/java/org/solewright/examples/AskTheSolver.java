package org.solewright.examples;

import java.util.Optional;
import org.solewright.analysis.cost.ComparedPostures;
import org.solewright.domain.cost.ComparedLimb;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.finding.Quantity;

/** Asks the solver what one step would cost one limb in other postures. */
public final class AskTheSolver {

    private AskTheSolver() {}

    /**
     * The postures of a limb at one step.
     *
     * @param limbLength hip to floor, m
     * @param footLength travel of the centre of pressure, m
     * @param stepLength m
     * @param speed before the transition, m/s
     * @param mass kg
     * @return rows and works; mechanical work under stated assumptions, not metabolic energy
     */
    public static ComparedPostures postures(
            double limbLength, double footLength, double stepLength, double speed, double mass) {
        ComparedLimb limb = new ComparedLimb(
                Quantity.of(limbLength, Basis.MEASURED),
                Optional.of(Quantity.of(footLength, Basis.MEASURED)),
                Optional.empty(),
                Optional.empty(),
                Optional.empty(),
                Optional.empty());
        return ComparedPostures.of(
                limb, new ComparedPostures.TakenStep("example", "1", stepLength, speed, mass, 9.80665));
    }
}
