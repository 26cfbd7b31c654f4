package org.solewright.analysis.dynamics;

import java.util.Locale;
import org.solewright.analysis.numerics.EllipticIntegral;

/**
 * A point mass at the hip that vaults about a pivot: lean'' = (g/r) sin(lean + slope), lean from the ground's normal,
 * forward positive, the ground descending forward by the slope.
 */
public final class Vault {

    private Vault() {}

    /**
     * Square of the rate after a part of a vault, w0^2 + (2g/r) (cos(start + slope) - cos(end + slope)).
     *
     * @param radius m, above 0
     * @param gravity m/s2, above 0
     * @param startAngle from the vertical, rad
     * @param endAngle from the vertical, rad
     * @param startRate rad/s
     * @return rad2/s2; negative where the mass does not get there
     */
    static double squaredRate(double radius, double gravity, double startAngle, double endAngle, double startRate) {
        // cos a - cos b as a product, which keeps the digits of small changes.
        return startRate * startRate
                + 4 * gravity / radius * Math.sin((endAngle - startAngle) / 2) * Math.sin((endAngle + startAngle) / 2);
    }

    /**
     * Duration of a vault from its start to its end.
     *
     * @param radius m
     * @param gravity m/s2, above 0
     * @param startLean rad
     * @param endLean rad
     * @param startRate rate of the lean at the start, rad/s
     * @param slope rad
     * @return s
     * @throws LimitException NONPOSITIVE_RADIUS; APEX_NOT_CLEARED where the mass comes to rest before the end
     */
    public static double duration(
            double radius, double gravity, double startLean, double endLean, double startRate, double slope)
            throws LimitException {
        if (!(radius > 0)) {
            throw new LimitException(
                    Limit.NONPOSITIVE_RADIUS,
                    String.format(Locale.ROOT, "vault radius %s m, expected more than 0 m", radius));
        }
        if (endLean == startLean) {
            return 0;
        }
        // A vault backwards is its own mirror image.
        double sense = Math.signum(endLean - startLean);
        double a = sense * (startLean + slope);
        double b = sense * (endLean + slope);
        double rate = sense * startRate;
        double top = squaredRate(radius, gravity, a, 0, rate);
        boolean passesTop = a < 0 && b > 0;
        double atEnd = squaredRate(radius, gravity, a, b, rate);
        if (!(rate > 0 || (rate == 0 && a > 0)) || !(atEnd > 0) || (passesTop && !(top > 0))) {
            throw new LimitException(
                    Limit.APEX_NOT_CLEARED,
                    String.format(
                            Locale.ROOT,
                            "squared rate %s rad2/s2 at the top and %s rad2/s2 at the end, expected more than 0 all the"
                                    + " way from lean %s to %s rad at a start rate of %s rad/s",
                            top,
                            atEnd,
                            startLean,
                            endLean,
                            startRate));
        }
        return duration(radius, gravity, a, b, top);
    }

    /**
     * Duration between two angles from the vertical, moving forward.
     *
     * @param radius m
     * @param gravity m/s2
     * @param a start, rad, within pi of the vertical
     * @param b end, rad, above the start
     * @param top squared rate at the vertical, rad2/s2; negative where the mass stays on one side
     * @return s; infinite where it comes to rest on the way
     */
    public static double duration(double radius, double gravity, double a, double b, double top) {
        double c = 4 * gravity / radius;
        if (top > 0) {
            double m = -c / top;
            return 2 / Math.sqrt(top) * (EllipticIntegral.first(b / 2, m) - EllipticIntegral.first(a / 2, m));
        }
        // One side: w^2 = c (sin^2(x/2) - s^2). With cos(x/2) = sqrt(1-s^2) sin p it is dt = 2 dp / (sqrt c sqrt(1 -
        // (1-s^2) sin^2 p)) [derived].
        double m = 1 + top / c;
        double near = Math.min(Math.abs(a), Math.abs(b));
        double far = Math.max(Math.abs(a), Math.abs(b));
        return 2 / Math.sqrt(c) * (turned(near, m) - turned(far, m));
    }

    private static double turned(double x, double m) {
        double sine = Math.min(1, Math.cos(x / 2) / Math.sqrt(m));
        return sine * EllipticIntegral.symmetricFirstKind(1 - sine * sine, 1 - m * sine * sine, 1);
    }

    /**
     * Rate at the end of a vault.
     *
     * @param radius m, above 0
     * @param gravity m/s2
     * @param startLean rad
     * @param endLean rad
     * @param startRate rad/s
     * @param slope rad
     * @return rad/s, of the sense in which the lean changes
     */
    public static double endRate(
            double radius, double gravity, double startLean, double endLean, double startRate, double slope) {
        double rate = Math.sqrt(squaredRate(radius, gravity, startLean + slope, endLean + slope, startRate));
        return endLean < startLean ? -rate : rate;
    }
}
