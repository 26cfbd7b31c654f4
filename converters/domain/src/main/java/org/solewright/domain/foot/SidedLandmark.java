package org.solewright.domain.foot;

import org.solewright.domain.gait.Side;

/**
 * A landmark of one side of the body. A point of the midline, such as the sacrum, stands under both sides.
 *
 * @param landmark what it is
 * @param side whose it is
 */
public record SidedLandmark(Landmark landmark, Side side) {

    /**
     * Both words, for messages.
     *
     * @return such as {@code right malleolus_medial}
     */
    public String words() {
        return side.word() + " " + landmark.word();
    }
}
