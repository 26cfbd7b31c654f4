package org.solewright.analysis.audit;

/**
 * How far loads and motion of the centre of mass agree over an interval.
 *
 * @param from start of what was looked at, s
 * @param to its end, s
 * @param mass kg
 * @param forceResidual rms of |F - m (a - g)| over the weight
 * @param peakForceResidual the greatest of them
 * @param peakTime when, s
 * @param energyResidual greatest difference between the change of energy and the work of the loads since the start, over
 *     the loads' positive work; NaN where there is none
 * @param momentResidual mean moment of the loads about the centre of mass over weight times its height, which is 0 over a
 *     period of the gait since the angular momentum comes back; NaN where it is not known
 */
public record Balance(
        double from,
        double to,
        double mass,
        double forceResidual,
        double peakForceResidual,
        double peakTime,
        double energyResidual,
        double momentResidual) {}
