package org.solewright.app.pipeline;

import java.util.Optional;
import org.solewright.analysis.gait.Pass;
import org.solewright.analysis.gait.RollOverCheck;
import org.solewright.analysis.gait.StanceFoot;
import org.solewright.domain.gait.Stance;
import org.solewright.domain.gait.Use;

/**
 * One stance of a roll-over check.
 *
 * @param pass its pass
 * @param motion the limb's segments in that pass
 * @param hip the hip in that pass
 * @param stance the stance
 * @param number of the stance in its pass, from 1
 * @param foot the foot over the stance
 * @param check what the foot showed
 * @param shapes roll-over paths; empty where the stance gives none
 */
record CheckedStance(
        Pass pass,
        LimbMotion motion,
        WalkingHip hip,
        Stance stance,
        int number,
        StanceFoot foot,
        RollOverCheck check,
        Optional<WalkingRollOver.Shapes> shapes) {

    /** Whether contact, off and all between are known: else no place in stance can be told. */
    static boolean isComplete(Stance stance) {
        return stance.allows(Use.ROLL_OVER) && stance.allows(Use.PUSH_OFF);
    }

    boolean isComplete() {
        return isComplete(stance);
    }
}
