package org.solewright.analysis.dynamics;

/**
 * A gait of the simplest walker that repeats itself, in units of limb length, gravity and hip mass.
 *
 * @param halfAngle lean of both limbs at heel strike, rad
 * @param stanceRate rate of the stance limb just after it
 * @param swingRate rate of the swing limb just after it
 * @param stepTime in limb times
 * @param stepLength in limb lengths
 * @param speedBefore of the hip, before push and collision
 * @param speedAfter of the hip
 * @param transitionAngle between the hip's velocities, rad
 * @param pushImpulse per hip mass
 * @param hipStiffness over foot mass, gravity and limb length
 * @param trace of the stride map's derivative by half angle and stance rate
 * @param determinant of the same
 */
public record WalkerGait(
        double halfAngle,
        double stanceRate,
        double swingRate,
        double stepTime,
        double stepLength,
        double speedBefore,
        double speedAfter,
        double transitionAngle,
        double pushImpulse,
        double hipStiffness,
        double trace,
        double determinant) {

    /**
     * Mean speed.
     *
     * @return step length over step time
     */
    public double speed() {
        return stepLength / stepTime;
    }

    /**
     * Work of the push.
     *
     * @return per step
     */
    public double pushOffWork() {
        return pushImpulse * pushImpulse / 2;
    }

    /**
     * Impulse of the collision.
     *
     * @return along contact to hip
     */
    public double collisionImpulse() {
        return speedBefore * Math.sin(transitionAngle) - pushImpulse * Math.cos(transitionAngle);
    }

    /**
     * Loss of the collision.
     *
     * @return per step
     */
    public double collisionLoss() {
        return collisionImpulse() * collisionImpulse() / 2;
    }

    /** Above 0 as long as no eigenvalue has passed -1. */
    double doublingMargin() {
        return 1 + trace + determinant;
    }

    /**
     * Eigenvalues of the stride map, sorted by real, then imaginary part.
     *
     * @return real part, imaginary part of the first, then of the second
     */
    public double[] eigenvalues() {
        double half = trace / 2;
        double square = half * half - determinant;
        if (square < 0) {
            double imaginary = Math.sqrt(-square);
            return new double[] {half, -imaginary, half, imaginary};
        }
        // The larger one first, the other by the product, which does not cancel.
        double large = half + Math.copySign(Math.sqrt(square), half);
        double small = large == 0 ? 0 : determinant / large;
        return new double[] {Math.min(large, small), 0, Math.max(large, small), 0};
    }
}
