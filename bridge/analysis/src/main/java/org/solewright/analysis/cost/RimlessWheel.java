package org.solewright.analysis.cost;

import java.util.OptionalDouble;
import org.solewright.analysis.dynamics.Limit;
import org.solewright.analysis.dynamics.LimitException;
import org.solewright.analysis.dynamics.Vault;
import org.solewright.analysis.numerics.Root;

/**
 * A wheel of spokes without a rim that rolls down a slope, at the rate that repeats itself [McGeer 1990; derived].
 *
 * @param halfAngle half the angle between two spokes, rad
 * @param slope rad, descending forward
 * @param inertiaRatio m l^2/(I + m l^2)
 * @param spokeLength m
 * @param gravity m/s2
 */
public record RimlessWheel(double halfAngle, double slope, double inertiaRatio, double spokeLength, double gravity) {

    private static final int FEWEST_SPOKES = 3;

    /**
     * A wheel.
     *
     * @param spokes number of spokes
     * @param slope rad, descending forward
     * @param inertiaRatio m l^2/(I + m l^2), above 0, at most 1
     * @param spokeLength m
     * @param gravity m/s2
     * @return the wheel
     * @throws LimitException SEGMENT_COUNT, NONPOSITIVE_RADIUS, NO_PERIODIC_GAIT on a slope that does not descend,
     *     REVERSES_AT_TRANSITION where a collision throws it back
     */
    public static RimlessWheel of(double spokes, double slope, double inertiaRatio, double spokeLength, double gravity)
            throws LimitException {
        if (!(spokes >= FEWEST_SPOKES) || spokes != Math.rint(spokes)) {
            throw new LimitException(
                    Limit.SEGMENT_COUNT, VaultingStep.text("%s spokes, expected a whole number of 3 or more", spokes));
        }
        if (!(spokeLength > 0)) {
            throw new LimitException(
                    Limit.NONPOSITIVE_RADIUS,
                    VaultingStep.text("spoke length %s m, expected more than 0 m", spokeLength));
        }
        RimlessWheel wheel = new RimlessWheel(Math.PI / spokes, slope, inertiaRatio, spokeLength, gravity);
        if (!(wheel.rateRatio() > 0)) {
            throw new LimitException(
                    Limit.REVERSES_AT_TRANSITION,
                    VaultingStep.text(
                            "rate after over before a collision %s, expected more than 0", wheel.rateRatio()));
        }
        if (!(slope > 0 && slope < Math.PI / 2)) {
            throw new LimitException(
                    Limit.NO_PERIODIC_GAIT,
                    VaultingStep.text("slope %s rad, expected one that descends: 0 to pi/2 rad", slope));
        }
        return wheel;
    }

    /**
     * Rate after a collision over the rate before, 1 + ratio (cos 2a - 1).
     *
     * @return share
     */
    public double rateRatio() {
        return 1 - lost();
    }

    /** 1 less the rate ratio, with all its digits. */
    private double lost() {
        double sine = Math.sin(halfAngle);
        return 2 * inertiaRatio * sine * sine;
    }

    /** 1 - ratio^2 = 2 inertiaRatio sin^2(halfAngle) (2 - lost), of which the first factors cancel. */
    private double squaredRateBefore(double onSlope) {
        return 2 * gravity / spokeLength * Math.sin(onSlope) / (Math.sin(halfAngle) * (2 - lost()));
    }

    /**
     * Rate just before a collision.
     *
     * @return rad/s
     */
    public double rateBefore() {
        return Math.sqrt(squaredRateBefore(slope));
    }

    /**
     * Rate just after a collision.
     *
     * @return rad/s
     */
    public double rateAfter() {
        return rateRatio() * rateBefore();
    }

    /**
     * What a small change of the rate leaves of itself a collision later.
     *
     * @return square of the rate ratio
     */
    public double eigenvalue() {
        return rateRatio() * rateRatio();
    }

    /**
     * Whether it passes over each spoke.
     *
     * @return true where it rolls on
     */
    public boolean clearsApex() {
        return slope >= halfAngle || topSquare() > 0;
    }

    private double topSquare() {
        double half = Math.sin((halfAngle - slope) / 2);
        return rateAfter() * rateAfter() - 4 * inertiaRatio * gravity / spokeLength * half * half;
    }

    /**
     * Whether each spoke pushes until the next collision.
     *
     * @return true where none has to pull
     */
    public boolean staysDown() {
        return spokeLength * rateBefore() * rateBefore() <= gravity * Math.cos(halfAngle + slope);
    }

    /**
     * The gentlest slope that it rolls down.
     *
     * @return rad
     */
    public double leastSlope() {
        double share = eigenvalue() / (2 * Math.sin(halfAngle) * (2 - lost()));
        return Root.inBracket(
                s -> {
                    double half = Math.sin((halfAngle - s) / 2);
                    return share * Math.sin(s) - inertiaRatio * half * half;
                },
                0,
                halfAngle);
    }

    /**
     * Time from collision to collision.
     *
     * @return s; empty where it does not roll
     */
    public OptionalDouble period() {
        if (!clearsApex()) {
            return OptionalDouble.empty();
        }
        return OptionalDouble.of(
                Vault.duration(spokeLength, gravity * inertiaRatio, slope - halfAngle, slope + halfAngle, topSquare()));
    }
}
