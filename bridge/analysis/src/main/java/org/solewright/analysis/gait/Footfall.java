package org.solewright.analysis.gait;

import org.solewright.domain.gait.Side;

/**
 * A foot's time on the ground from kinematics.
 *
 * @param side the foot
 * @param start contact, s; the recording's start where the contact is not in view
 * @param end off, s; the recording's end where it is not in view
 * @param isStartSeen whether the contact is in view
 * @param isEndSeen whether the off is in view
 */
record Footfall(Side side, double start, double end, boolean isStartSeen, boolean isEndSeen) {

    boolean overlaps(double from, double to) {
        return Math.min(end, to) - Math.max(start, from) > 0.5 * Math.min(to - from, end - start);
    }
}
