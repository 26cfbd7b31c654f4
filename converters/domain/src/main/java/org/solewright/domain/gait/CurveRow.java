package org.solewright.domain.gait;

import java.util.OptionalDouble;

/**
 * One point of a curve over a step or stance. A row of the curves table.
 *
 * @param trial name of the recording, {@code *} for the mean over several
 * @param step which step or stance, as the table of transitions names it
 * @param side whose
 * @param curve name of the curve
 * @param unit its unit
 * @param percent place along the step or stance, 0-100
 * @param mean value, or mean over {@code n}, in the unit; NaN where not known
 * @param sd standard deviation in the unit; empty where unknown
 * @param n number of curves behind the mean, 1 for a single one
 */
public record CurveRow(
        String trial,
        String step,
        Side side,
        String curve,
        String unit,
        double percent,
        double mean,
        OptionalDouble sd,
        int n) {}
