package org.solewright.analysis.gait;

import org.solewright.domain.gait.Stance;

/**
 * A stance with what the review of all stances needs.
 *
 * @param stance the stance
 * @param copStart where the centre of pressure begins, along the foot from the heel landmark, in foot lengths; NaN
 *     where unknown
 * @param copEnd where it ends
 * @param lowest lowest foot landmark at foot flat over the platform's surface, m; NaN where unknown
 * @param isStartSeen whether the contact lies inside the recording
 * @param isEndSeen whether the off lies inside the recording
 */
record PlatformStance(
        Stance stance, double copStart, double copEnd, double lowest, boolean isStartSeen, boolean isEndSeen) {

    double copTravel() {
        return copEnd - copStart;
    }

    PlatformStance with(Stance changed) {
        return new PlatformStance(changed, copStart, copEnd, lowest, isStartSeen, isEndSeen);
    }
}
