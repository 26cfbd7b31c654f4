package org.solewright.domain.foot;

import java.util.Arrays;
import java.util.Optional;

/** What the roll-over check measures of one stance, in the order of its sheet. Angles and heights are less standing. */
public enum RollOverMeasure {
    /** Time on the ground. */
    STANCE_TIME("stance_time", "s", 1, "from contact to off"),
    /** Foot-floor angle at contact. */
    CONTACT_ANGLE(
            "contact_angle",
            "deg",
            Math.toDegrees(1),
            "line from heel to metatarsal heads against the floor at contact, less that of standing; toes up positive"),
    /** Begin of foot flat. */
    FLAT_FROM(
            "foot_flat_from",
            "%",
            100,
            "begin of the longest time in which heel and metatarsal heads are within 10 mm (scaled by limb length) above"
                    + " their standing heights; of stance"),
    /** End of foot flat. */
    FLAT_TO("foot_flat_to", "%", 100, "end of that time; of stance"),
    /** Heel rise. */
    HEEL_RISE(
            "heel_rise",
            "%",
            100,
            "instant after which the heel stays over 10 mm (scaled by limb length) above its standing height; of stance"),
    /** Begin of load on the heel. */
    HEEL_FROM(
            "heel_bore_load_from",
            "%",
            100,
            "begin of the time with the centre of pressure behind the ankle and the heel within 10 % of foot length of its"
                    + " standing height; of stance"),
    /** End of load on the heel. */
    HEEL_TO("heel_bore_load_to", "%", 100, "end of that time; of stance"),
    /** Share of stance with load on the heel. */
    HEEL_SHARE("cop_behind_ankle", "%", 100, "all such times together; of stance"),
    /** Begin of load on the metatarsal line. */
    METATARSAL_FROM(
            "metatarsal_line_bore_load_from",
            "%",
            100,
            "begin of the longest time with the centre of pressure within 5 % of foot length of the metatarsal line; of"
                    + " stance"),
    /** End of load on the metatarsal line. */
    METATARSAL_TO("metatarsal_line_bore_load_to", "%", 100, "end of that time; of stance"),
    /** Begin of load on the toes. */
    TOES_FROM(
            "toes_bore_load_from",
            "%",
            100,
            "begin of the longest time with the centre of pressure over 5 % of foot length before the metatarsal line; of"
                    + " stance"),
    /** End of load on the toes. */
    TOES_TO("toes_bore_load_to", "%", 100, "end of that time; of stance"),
    /** Travel of the COP. */
    COP_PATH("cop_path", "m", 1, "travel of the centre of pressure along the foot, contact to off"),
    /** The same over foot length. */
    COP_PATH_SHARE("cop_path_over_foot_length", "1", 1, "that travel over foot length"),
    /** Effective foot length. */
    EFFECTIVE_LENGTH(
            "effective_foot_length",
            "m",
            1,
            "travel of the centre of pressure in the limb frame, contact to opposite contact"),
    /** Least height of the heel. */
    LEAST_HEEL("least_heel_height", "m", 1, "least height of the heel over its standing height while it is loaded"),
    /** Least height of the metatarsal heads. */
    LEAST_HEADS(
            "least_metatarsal_height",
            "m",
            1,
            "least height of the metatarsal heads over their standing height while loaded"),
    /** Curvature of the arc in the shank frame. */
    SHANK_CURVATURE("arc_shank_curvature", "1/m", 1, "arc fitted to the roll-over shape in the shank frame"),
    /** Its radius. */
    SHANK_RADIUS("arc_shank_radius", "m", 1, "its radius; mean and SD are those of the curvature"),
    /** Its radius over limb length. */
    SHANK_RADIUS_OVER_LIMB("arc_shank_radius_over_limb_length", "1", 1, "that radius over limb length"),
    /** Its radius over stature. */
    SHANK_RADIUS_OVER_STATURE("arc_shank_radius_over_stature", "1", 1, "that radius over body height"),
    /** Its length. */
    SHANK_ARC_LENGTH("arc_shank_length", "m", 1, "length of that arc"),
    /** Curvature of the arc in the limb frame. */
    LIMB_CURVATURE("arc_limb_curvature", "1/m", 1, "arc fitted to the roll-over shape in the limb frame"),
    /** Its radius. */
    LIMB_RADIUS("arc_limb_radius", "m", 1, "its radius; mean and SD are those of the curvature"),
    /** Its radius over limb length. */
    LIMB_RADIUS_OVER_LIMB("arc_limb_radius_over_limb_length", "1", 1, "that radius over limb length"),
    /** Its radius over stature. */
    LIMB_RADIUS_OVER_STATURE("arc_limb_radius_over_stature", "1", 1, "that radius over body height"),
    /** Its length. */
    LIMB_ARC_LENGTH("arc_limb_length", "m", 1, "length of that arc"),
    /** Likeness of the foot-floor angle of the stances. */
    ANGLE_CONSISTENCY(
            "foot_floor_angle_consistency",
            "deg",
            Math.toDegrees(1),
            "root mean square, over 101 points of stance, of the SD between stances of the foot-floor angle; 0: all alike"),
    /** Likeness of the path of the COP of the stances. */
    COP_CONSISTENCY(
            "cop_path_consistency",
            "m",
            1,
            "root mean square, over 101 points of stance, of the SD between stances of the centre of pressure along the"
                    + " foot; 0: all alike");

    private final String word;
    private final String unit;
    private final double factor;
    private final String definition;

    RollOverMeasure(String word, String unit, double factor, String definition) {
        this.word = word;
        this.unit = unit;
        this.factor = factor;
        this.definition = definition;
    }

    /**
     * The measure of that name.
     *
     * @param word as in files
     * @return the measure, empty where there is none of that name
     */
    public static Optional<RollOverMeasure> ofWord(String word) {
        return Arrays.stream(values()).filter(m -> m.word.equals(word)).findFirst();
    }

    /**
     * The word used in files.
     *
     * @return such as {@code contact_angle}
     */
    public String word() {
        return word;
    }

    /**
     * The unit of files and sheets.
     *
     * @return such as {@code deg}; {@code 1} where dimensionless
     */
    public String unit() {
        return unit;
    }

    /**
     * What it is.
     *
     * @return one phrase
     */
    public String definition() {
        return definition;
    }

    /**
     * A value in the unit of files and sheets.
     *
     * @param value SI, shares of stance 0 to 1
     * @return in {@link #unit}
     */
    public double inUnit(double value) {
        return factor * value;
    }

    /**
     * A value out of a file.
     *
     * @param value in {@link #unit}
     * @return SI, shares of stance 0 to 1
     */
    public double ofUnit(double value) {
        return value / factor;
    }

    /**
     * Whether it is 1 over a curvature, so that its mean and spread are those of the curvature.
     *
     * @return true for radii and their ratios
     */
    public boolean isOfRadius() {
        return word.contains("_radius");
    }
}
