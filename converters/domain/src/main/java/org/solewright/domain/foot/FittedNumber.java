package org.solewright.domain.foot;

import java.util.OptionalDouble;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.gait.Side;

/**
 * A number of a fitted foot with all that is known of its uncertainty. A row of the table of uncertainties.
 *
 * @param side whose
 * @param quantity name, such as {@code arc.shank.curvature}
 * @param unit its unit
 * @param basis where the number comes from
 * @param value in the unit
 * @param sd standard deviation of the value from all that follows; empty where it is not estimable
 * @param measurementSd effect of placement, skin and platforms, by Monte Carlo; empty where no runs were asked for
 * @param stanceSd SD over stances; where there is one stance, that of its fit; empty where not estimable
 * @param isBetween whether {@code stanceSd} is the SD between stances, else that within the one stance
 * @param n number of stances; 0 for what standing gives
 * @param low lower end of the 95 % interval; empty where there is none
 * @param high its upper end
 * @param smallestDifference smallest difference between two sessions worth believing (95 %); for angles only
 */
public record FittedNumber(
        Side side,
        String quantity,
        String unit,
        Basis basis,
        double value,
        OptionalDouble sd,
        OptionalDouble measurementSd,
        OptionalDouble stanceSd,
        boolean isBetween,
        int n,
        OptionalDouble low,
        OptionalDouble high,
        OptionalDouble smallestDifference) {}
