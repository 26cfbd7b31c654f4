package org.solewright.analysis.dynamics;

/** A limit of the models, by the code word that scripts see. */
public enum Limit {
    /** Nothing of the limb is left between pivot and hip. */
    NONPOSITIVE_RADIUS,
    /** The number of foot segments is negative or not whole. */
    SEGMENT_COUNT,
    /** The step length is not above 0. */
    NONPOSITIVE_STEP,
    /** A foot length is given for a limb without foot segments. */
    FOOT_WITHOUT_SEGMENTS,
    /** The foot length is below 0. */
    NEGATIVE_FOOT,
    /** The foot covers the whole step. */
    STEP_NOT_LONGER_THAN_FOOT,
    /** Two successive pivots are too far apart for the limb. */
    PIVOT_SPACING_OUT_OF_REACH,
    /** Without a push the hip would go back after the transition. */
    REVERSES_AT_TRANSITION,
    /** No configuration has the wanted value. */
    NO_SOLUTION,
    /** The arc's radius is below 0 or above the limb length, or its half angle below 0. */
    ARC_RADIUS,
    /** The step is too long for the rolling foot. */
    STEP_OUT_OF_REACH,
    /** The pivots do not bulge downwards in their order. */
    POLYGON_NOT_CONVEX,
    /** The hip comes to rest before the top of a vault. */
    APEX_NOT_CLEARED,
    /** The hip is too fast to stay on its circle without a pull of the limb. */
    TAKE_OFF,
    /** There are fewer points than a shape needs. */
    TOO_FEW_POINTS,
    /** The new limb would have to pull at a transition. */
    OVER_PUSH,
    /** The old limb would have to pull at a transition. */
    NEGATIVE_PUSH,
    /** There is no such way of pushing off. */
    POLICY,
    /** No walk repeats itself. */
    NO_PERIODIC_GAIT,
    /** The swing limb does not come to the ground ahead of the stance limb. */
    NO_HEEL_STRIKE,
    /** The rows of the constraints depend on one another. */
    REDUNDANT_CONSTRAINTS,
    /** The femur does not reach from the hip to the knee. */
    FEMUR_TOO_SHORT
}
