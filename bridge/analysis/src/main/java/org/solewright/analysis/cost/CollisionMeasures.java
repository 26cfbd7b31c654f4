package org.solewright.analysis.cost;

/**
 * How far force and velocity of the centre of mass are from being perpendicular [Lee, Bertram, Anttonen, Ros, Harris and
 * Biewener 2011; formulas from memory]. The means are weighted with |F||v|, integrals are trapezia, the force is the total
 * one.
 *
 * @param collisionAngle mean of asin(|F.v|/(|F||v|)), rad
 * @param forceAngle mean lean of the force from the vertical, rad
 * @param velocityAngle mean lean of the velocity from the horizontal, rad
 * @param collisionFraction collision angle over the sum of the other two, 0 to 1; 0 where that sum is 0
 * @param mechanicalCostOfTransport integral of |F.v| over m g times the horizontal way; NaN where there is no way
 * @param costFromCollisionAngle collision angle times integral of |F||v| over m g times the horizontal way; NaN where
 *     there is no way
 */
public record CollisionMeasures(
        double collisionAngle,
        double forceAngle,
        double velocityAngle,
        double collisionFraction,
        double mechanicalCostOfTransport,
        double costFromCollisionAngle) {

    private static final int FORCE = 0;
    private static final int VELOCITY = 1;
    private static final int COLLISION = 2;
    private static final int PRODUCT = 3;
    private static final int POWER = 4;
    private static final int WAY = 5;

    /**
     * The measures over a stretch of samples.
     *
     * @param force total force, N, {@code [samples][3]} row-major, x forward, y left, z up, unmodified
     * @param velocity of the centre of mass, m/s, same shape, unmodified
     * @param timeStep s, above 0
     * @param mass kg, above 0
     * @param gravity m/s2, above 0
     * @return the measures
     * @throws IllegalArgumentException where the shapes differ
     */
    public static CollisionMeasures of(
            double[] force, double[] velocity, double timeStep, double mass, double gravity) {
        if (force.length != velocity.length || force.length % 3 != 0) {
            throw new IllegalArgumentException("collision measures of " + force.length + " force and " + velocity.length
                    + " velocity components, expected equal multiples of 3");
        }
        int count = force.length / 3;
        double[] sums = new double[WAY + 1];
        for (int i = 0; i < count; i++) {
            double share = i == 0 || i == count - 1 ? timeStep / 2 : timeStep;
            add(sums, force, velocity, 3 * i, share);
        }
        double weight = sums[PRODUCT];
        double collision = weight > 0 ? sums[COLLISION] / weight : 0;
        double lean = weight > 0 ? sums[FORCE] / weight : 0;
        double path = weight > 0 ? sums[VELOCITY] / weight : 0;
        double sum = lean + path;
        double scale = mass * gravity * sums[WAY];
        return new CollisionMeasures(
                collision,
                lean,
                path,
                sum > 0 ? collision / sum : 0,
                scale > 0 ? sums[POWER] / scale : Double.NaN,
                scale > 0 ? collision * weight / scale : Double.NaN);
    }

    private static void add(double[] sums, double[] force, double[] velocity, int at, double share) {
        double fx = force[at];
        double fy = force[at + 1];
        double fz = force[at + 2];
        double vx = velocity[at];
        double vy = velocity[at + 1];
        double vz = velocity[at + 2];
        double horizontalForce = Math.hypot(fx, fy);
        double horizontalSpeed = Math.hypot(vx, vy);
        double product = Math.hypot(horizontalForce, fz) * Math.hypot(horizontalSpeed, vz);
        double power = Math.abs(fx * vx + fy * vy + fz * vz);
        if (product > 0) {
            double weight = share * product;
            sums[PRODUCT] += weight;
            sums[COLLISION] += weight * Math.asin(Math.min(power / product, 1));
            sums[FORCE] += weight * Math.atan2(horizontalForce, Math.abs(fz));
            sums[VELOCITY] += weight * Math.atan2(Math.abs(vz), horizontalSpeed);
        } else if (Double.isNaN(product)) {
            sums[PRODUCT] = Double.NaN;
        }
        sums[POWER] += share * power;
        sums[WAY] += share * horizontalSpeed;
    }

    /**
     * Turn of the velocity in the sagittal plane between two instants, positive when it turns upwards.
     *
     * @param forwardBefore m/s
     * @param upBefore m/s
     * @param forwardAfter m/s
     * @param upAfter m/s
     * @return rad, -pi to pi
     */
    public static double turn(double forwardBefore, double upBefore, double forwardAfter, double upAfter) {
        return Math.atan2(
                forwardBefore * upAfter - upBefore * forwardAfter, forwardBefore * forwardAfter + upBefore * upAfter);
    }
}
