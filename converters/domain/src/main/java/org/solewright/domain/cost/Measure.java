package org.solewright.domain.cost;

/** What is measured of one step-to-step transition; SI units. */
public enum Measure {
    /** Forward distance of the heels at their contacts, m. */
    STEP_LENGTH("step_length_m"),
    /** Sideways distance of the heels at their contacts, m. */
    STEP_WIDTH("step_width_m"),
    /** Contact to opposite contact, s. */
    STEP_TIME("step_time_s"),
    /** Mean forward speed of the pelvis over the work window, m/s. */
    SPEED("speed_m_s"),
    /** Speed of the centre of mass at the leading contact, m/s. */
    SPEED_BEFORE("speed_before_m_s"),
    /** Mean vertical load over the work window over g, kg. */
    MASS("mass_kg"),
    /** Push-off work of the trailing limb, J. */
    PUSH_OFF("push_off_J"),
    /** Collision work of the leading limb, J, negative. */
    COLLISION("collision_J"),
    /** Rebound work of the leading limb, J. */
    REBOUND("rebound_J"),
    /** Preload work of the leading limb, J, negative. */
    PRELOAD("preload_J"),
    /** Part of the push-off inside double support, J. */
    PUSH_OFF_DOUBLE_SUPPORT("push_off_ds_J"),
    /** Part of the collision inside double support, J, negative. */
    COLLISION_DOUBLE_SUPPORT("collision_ds_J"),
    /** Positive work of the limbs' summed power over the work window, J. */
    COMBINED_POSITIVE("combined_positive_J"),
    /** Negative work of the limbs' summed power over the work window, J. */
    COMBINED_NEGATIVE("combined_negative_J"),
    /** Lowest to highest direction of the velocity over the work window, rad. */
    TRANSITION_ANGLE("transition_angle_deg"),
    /** Turn of the velocity between contact and opposite foot-off, rad. */
    TRANSITION_ANGLE_DOUBLE_SUPPORT("transition_angle_ds_deg"),
    /** Weighted collision angle, rad. */
    COLLISION_ANGLE("collision_angle_deg"),
    /** Collision angle over the sum of force and velocity angles, 1. */
    COLLISION_FRACTION("collision_fraction"),
    /** Work without regard of sign over weight and distance, 1. */
    MECHANICAL_COST_OF_TRANSPORT("mechanical_cost_of_transport"),
    /** Highest minus lowest centre of mass over the work window, m. */
    HEIGHT_RANGE("com_height_range_m");

    private final String column;

    Measure(String column) {
        this.column = column;
    }

    /**
     * The column of posture-cost.csv. Columns that end in {@code _deg} hold degrees, the value here is in radians.
     *
     * @return the column's name
     */
    public String column() {
        return column;
    }

    /**
     * The number that stands in the column.
     *
     * @param si value in SI units
     * @return value in the column's unit
     */
    public double inColumnUnit(double si) {
        return column.endsWith("_deg") ? Math.toDegrees(si) : si;
    }
}
