package org.solewright.analysis.dynamics;

import java.util.Locale;
import org.apache.commons.math3.ode.FirstOrderDifferentialEquations;
import org.apache.commons.math3.ode.nonstiff.DormandPrince853Integrator;
import org.solewright.analysis.numerics.EllipticIntegral;

/**
 * A sprawled limb whose foot is a sphere about the knee: the ground track is the plan path of the knee, a trochoid where
 * the femur retracts at a constant rate while the hip advances [derived]. The sphere rolls without slip and without spin
 * about the vertical; on its surface the track develops into the contact curve.
 *
 * <p>World: x forward, y to the limb's side, z up; the foot's frame is the world's at the start of the stance.
 */
public final class SprawledLimb {

    /** Square of the knee's speed over that of the hip that is rounding alone: (8 units in the last place)^2. */
    private static final double REST = 3e-30;

    private static final double TOLERANCE = 1e-13;
    private static final int QUATERNION = 4;
    /** Rolled angle, rad, beyond which the integration is neither quick nor exact. */
    private static final double MOST_ROLLING = 1e4;

    private final double sphereRadius;
    private final double speed;
    private final double protraction;
    private final double stanceTime;
    private final double planarRadius;

    private SprawledLimb(
            double sphereRadius, double speed, double protraction, double stanceTime, double planarRadius) {
        this.sphereRadius = sphereRadius;
        this.speed = speed;
        this.protraction = protraction;
        this.stanceTime = stanceTime;
        this.planarRadius = planarRadius;
    }

    /**
     * A limb.
     *
     * @param femurLength m
     * @param hipHeight m
     * @param sphereRadius m, above 0
     * @param speed of the hip, m/s, above 0
     * @param protraction angle of the femur from the lateral axis at the start, as much behind it at the end, rad, above 0
     * @param stanceTime s, above 0
     * @return the limb
     * @throws LimitException NONPOSITIVE_RADIUS; FEMUR_TOO_SHORT where it does not reach from hip to knee
     */
    public static SprawledLimb of(
            double femurLength,
            double hipHeight,
            double sphereRadius,
            double speed,
            double protraction,
            double stanceTime)
            throws LimitException {
        requireSphere(sphereRadius);
        double drop = hipHeight - sphereRadius;
        double square = (femurLength - drop) * (femurLength + drop);
        if (!(femurLength > 0 && square > 0)) {
            throw new LimitException(
                    Limit.FEMUR_TOO_SHORT,
                    String.format(
                            Locale.ROOT,
                            "femur %s m, expected more than the %s m between the heights of hip and knee",
                            femurLength,
                            Math.abs(drop)));
        }
        return new SprawledLimb(sphereRadius, speed, protraction, stanceTime, Math.sqrt(square));
    }

    static void requireSphere(double sphereRadius) throws LimitException {
        if (!(sphereRadius > 0)) {
            throw new LimitException(
                    Limit.NONPOSITIVE_RADIUS,
                    String.format(Locale.ROOT, "sphere radius %s m, expected more than 0 m", sphereRadius));
        }
    }

    /**
     * Distance of the knee from the hip in plan.
     *
     * @return m
     */
    public double planarRadius() {
        return planarRadius;
    }

    /**
     * Speed of the knee about the hip over the speed of the hip: below 1 the track runs forward throughout, at 1 it has a
     * cusp, above 1 it runs backwards at mid-stance.
     *
     * @return ratio
     */
    public double rateRatio() {
        return sweep() / advance();
    }

    /** Way of the hip over stance, m. */
    private double advance() {
        return speed * stanceTime;
    }

    /** Way of the knee about the hip over stance, m. */
    private double sweep() {
        return 2 * protraction * planarRadius;
    }

    /**
     * Length of the ground track.
     *
     * @return m
     */
    public double trackLength() {
        double d = Math.abs(advance() - sweep());
        double product = 4 * advance() * sweep();
        double half = protraction / 2;
        double sine = Math.sin(half / 2);
        // At the cusp the speed is 2 V |sin(phi/2)|. Advance and sweep in place of the two speeds cannot overflow.
        return d == 0
                ? 2 / protraction * Math.sqrt(product) * 2 * sine * sine
                : 2 * d / protraction * EllipticIntegral.second(half, -product / d / d);
    }

    /**
     * Advance of the knee over stance.
     *
     * @return m
     */
    public double netAdvance() {
        return speed * stanceTime - 2 * planarRadius * Math.sin(protraction);
    }

    private double angle(double time) {
        return protraction * (1 - 2 * time / stanceTime);
    }

    /**
     * Forward place of the knee from its start.
     *
     * @param time from the start of the stance, s
     * @return m
     */
    public double kneeX(double time) {
        return speed * time + planarRadius * (Math.sin(angle(time)) - Math.sin(protraction));
    }

    /**
     * Sideways place of the knee from the hip's path.
     *
     * @param time from the start of the stance, s
     * @return m
     */
    public double kneeY(double time) {
        return planarRadius * Math.cos(angle(time));
    }

    /**
     * Curvature of the track, to the left positive.
     *
     * @param time from the start of the stance, s
     * @return 1/m; not a number at a cusp, where the knee stands still within rounding
     */
    public double curvature(double time) {
        double half = Math.sin(angle(time) / 2);
        double d = advance() - sweep();
        double square = d * d + 4 * advance() * sweep() * half * half;
        double turned = sweep() - advance() * Math.cos(angle(time));
        if (square <= REST * advance() * advance()) {
            return Double.NaN;
        }
        return 2 * protraction * sweep() * turned / (square * Math.sqrt(square));
    }

    /**
     * Orientation of the foot, foot to world.
     *
     * @param time from the start of the stance, s
     * @return {@code [9]} row-major
     * @throws LimitException NO_SOLUTION where the track is more than ten thousand sphere radii long
     */
    public double[] rotation(double time) throws LimitException {
        double[] q = {1, 0, 0, 0};
        double share = time / stanceTime;
        if (share > 0) {
            double turns = trackLength() / sphereRadius;
            if (!(turns <= MOST_ROLLING)) {
                throw new LimitException(
                        Limit.NO_SOLUTION,
                        String.format(
                                Locale.ROOT,
                                "track of %s m on a sphere of %s m, expected up to %s times the radius: longer, the end"
                                        + " orientation has no digits left",
                                trackLength(),
                                sphereRadius,
                                MOST_ROLLING));
            }
            new DormandPrince853Integrator(1e-12, 1, TOLERANCE, TOLERANCE).integrate(new Rolling(), 0, q, share, q);
        }
        double norm = Math.sqrt(q[0] * q[0] + q[1] * q[1] + q[2] * q[2] + q[3] * q[3]);
        return matrix(q[0] / norm, q[1] / norm, q[2] / norm, q[3] / norm);
    }

    private static double[] matrix(double w, double x, double y, double z) {
        return new double[] {
            1 - 2 * (y * y + z * z),
            2 * (x * y - w * z),
            2 * (x * z + w * y),
            2 * (x * y + w * z),
            1 - 2 * (x * x + z * z),
            2 * (y * z - w * x),
            2 * (x * z - w * y),
            2 * (y * z + w * x),
            1 - 2 * (x * x + y * y)
        };
    }

    /**
     * The contact in the foot's frame.
     *
     * @param time from the start of the stance, s
     * @return {@code [3]}, m
     * @throws LimitException as {@link #rotation}
     */
    public double[] contact(double time) throws LimitException {
        double[] r = rotation(time);
        return new double[] {-sphereRadius * r[6], -sphereRadius * r[7], -sphereRadius * r[8]};
    }

    /**
     * The contact curve in the foot's frame.
     *
     * @param samples 2 or more, equally spaced in time
     * @return {@code [samples][3]} row-major, m
     * @throws LimitException as {@link #rotation}
     */
    public double[] contactCurve(int samples) throws LimitException {
        double[] curve = new double[3 * samples];
        for (int i = 0; i < samples; i++) {
            System.arraycopy(contact(stanceTime * i / (samples - 1)), 0, curve, 3 * i, 3);
        }
        return curve;
    }

    /** Quaternion of the foot over the share of the stance, under the angular velocity z x v / r in world axes. */
    private final class Rolling implements FirstOrderDifferentialEquations {
        @Override
        public int getDimension() {
            return QUATERNION;
        }

        @Override
        public void computeDerivatives(double share, double[] q, double[] out) {
            double angle = protraction * (1 - 2 * share);
            double vx = advance() - sweep() * Math.cos(angle);
            double vy = sweep() * Math.sin(angle);
            double ox = -vy / sphereRadius / 2;
            double oy = vx / sphereRadius / 2;
            out[0] = -ox * q[1] - oy * q[2];
            out[1] = ox * q[0] + oy * q[3];
            out[2] = oy * q[0] - ox * q[3];
            out[3] = ox * q[2] - oy * q[1];
        }
    }
}
