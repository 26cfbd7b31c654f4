package org.solewright.analysis.dynamics;

/**
 * What defines an invented walk.
 *
 * @param mass kg, above 0
 * @param limbLength L, hip to ground with the foot raised out of the limb, m, above 0
 * @param segments N of the foot, 0 or more
 * @param footLength f along the ground, m, 0 without segments; the vault radius is L - f
 * @param stepLength D, m, above f
 * @param referenceSpeed hip speed at the ideal step transition, m/s, above 0
 * @param stepBridgeShare share of the lean at the step that its bridge replaces, above 0 to 1
 * @param innerBridgeShare share of the lean at an inner transition that its bridge replaces, above 0 to 1
 * @param gravity m/s2, above 0
 */
public record WalkParameters(
        double mass,
        double limbLength,
        int segments,
        double footLength,
        double stepLength,
        double referenceSpeed,
        double stepBridgeShare,
        double innerBridgeShare,
        double gravity) {

    /** Share of the lean at the step that its bridge replaces, where not chosen [design choice]. */
    public static final double DEFAULT_STEP_BRIDGE_SHARE = 0.35;
    /** Share of the lean at an inner transition that its bridge replaces, where not chosen [design choice]. */
    public static final double DEFAULT_INNER_BRIDGE_SHARE = 0.6;

    /** Checks the ranges. */
    public WalkParameters {
        check("mass", mass, "kg");
        check("limb length", limbLength, "m");
        check("step length", stepLength, "m");
        check("reference speed", referenceSpeed, "m/s");
        check("gravity", gravity, "m/s2");
        checkShare("step bridge", stepBridgeShare);
        checkShare("inner bridge", innerBridgeShare);
        if (segments < 0 || !(footLength >= 0) || (segments == 0 && footLength != 0)) {
            throw new IllegalArgumentException("foot of " + segments + " segments and " + footLength
                    + " m, expected 0 or more of both and 0 m without segments");
        }
    }

    /**
     * Radius of the vaults.
     *
     * @return L - f, m; not above 0 where nothing is left of the limb
     */
    public double radius() {
        return limbLength - footLength;
    }

    /**
     * Distance of neighbouring pivots of the foot.
     *
     * @return m; 0 without segments
     */
    public double innerSpacing() {
        return segments > 0 ? footLength / segments : 0;
    }

    /**
     * Lean at the ideal step transition.
     *
     * @return rad; NaN where the limb does not reach
     */
    public double stepLean() {
        return Math.asin((stepLength - footLength) / (2 * radius()));
    }

    /**
     * Square of the hip's speed at the top of a vault.
     *
     * @return m2/s2; not above 0 where the hip does not pass the top
     */
    public double topSpeedSquared() {
        double half = Math.sin(stepLean() / 2);
        return referenceSpeed * referenceSpeed - 4 * gravity * radius() * half * half;
    }

    /**
     * Least push of the limb at the ends of the vaults as they are walked, over the mass: g cos a - v^2/l.
     *
     * @return m/s2; negative where the limb would have to pull
     */
    public double leastVaultPush() {
        double lean = (1 - stepBridgeShare) * stepLean();
        double inner = (1 - innerBridgeShare) * Math.asin(innerSpacing() / (2 * radius()));
        double widest = Math.max(lean, inner);
        double half = Math.sin(widest / 2);
        return gravity * Math.cos(widest) - (topSpeedSquared() / radius() + 4 * gravity * half * half);
    }

    private static void check(String name, double value, String unit) {
        if (!(value > 0) || Double.isInfinite(value)) {
            throw new IllegalArgumentException(name + " " + value + " " + unit + ", expected more than 0 " + unit);
        }
    }

    private static void checkShare(String name, double share) {
        if (!(share > 0 && share <= 1)) {
            throw new IllegalArgumentException(name + " share " + share + ", expected more than 0 and no more than 1");
        }
    }
}
