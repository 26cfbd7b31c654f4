package org.solewright.analysis.cost;

import org.solewright.analysis.numerics.Series;

/**
 * Velocity of the centre of mass from the total ground reaction over one work window, in the walking frame (forward, up,
 * right).
 *
 * <p>m = mean F_up / g over the window, a = (F - mean F_up - bias) / m, the velocity shifted so that its mean over the
 * window is the given one ([Donelan, Kram and Kuo 2002]; over a single step the sideways mean is the pelvis's, not zero).
 * Outside the window the same constants continue the motion as far as all loads are known.
 */
public final class CentreOfMassMotion {

    private final Series[] velocity = new Series[3];
    private final Series[] force;
    private final double mass;
    private final double from;
    private final double to;

    private CentreOfMassMotion(Series[] force, double mass, double from, double to) {
        this.force = force;
        this.mass = mass;
        this.from = from;
        this.to = to;
    }

    /**
     * Integrates the loads.
     *
     * @param force total force on the subject, N: forward, up, right; sampled alike
     * @param from start of the work window, s
     * @param to end of the work window, s
     * @param meanVelocity mean velocity over the window, m/s: forward, up, right
     * @param bias horizontal force that is no load, N: forward, up (not used), right
     * @param gravity m/s^2
     * @return the motion
     */
    public static CentreOfMassMotion over(
            Series[] force, double from, double to, double[] meanVelocity, double[] bias, double gravity) {
        double weight = force[1].mean(from, to);
        CentreOfMassMotion motion = new CentreOfMassMotion(force, weight / gravity, from, to);
        double[] rest = {bias[0], weight, bias[2]};
        motion.integrate(rest, meanVelocity, motion.mass);
        return motion;
    }

    /**
     * The same loads with a slightly other mean velocity and mass, for the spread of what follows from them.
     *
     * @param shift added to the mean velocity, m/s: forward, up, right
     * @param massFactor factor on the mass
     * @return the varied motion
     */
    CentreOfMassMotion varied(double[] shift, double massFactor) {
        CentreOfMassMotion varied = new CentreOfMassMotion(force, mass * massFactor, from, to);
        for (int c = 0; c < 3; c++) {
            double mean = velocity[c].mean(from, to);
            double[] v = new double[velocity[c].samples()];
            for (int i = 0; i < v.length; i++) {
                v[i] = mean + shift[c] + (velocity[c].sample(i) - mean) / massFactor;
            }
            varied.velocity[c] = new Series(velocity[c].start(), velocity[c].rate(), v);
        }
        return varied;
    }

    private void integrate(double[] rest, double[] meanVelocity, double m) {
        for (int c = 0; c < 3; c++) {
            Series f = force[c];
            double[] v = new double[f.samples()];
            for (int i = 1; i < v.length; i++) {
                v[i] = v[i - 1] + ((f.sample(i - 1) + f.sample(i)) / 2 - rest[c]) / (m * f.rate());
            }
            double offset = meanVelocity[c] - new Series(f.start(), f.rate(), v).mean(from, to);
            for (int i = 0; i < v.length; i++) {
                v[i] += offset;
            }
            velocity[c] = new Series(f.start(), f.rate(), v);
        }
    }

    /**
     * Mass that the window carried.
     *
     * @return kg
     */
    public double mass() {
        return mass;
    }

    /**
     * Start of the work window.
     *
     * @return s
     */
    public double from() {
        return from;
    }

    /**
     * End of the work window.
     *
     * @return s
     */
    public double to() {
        return to;
    }

    /**
     * A component of the velocity.
     *
     * @param component 0 forward, 1 up, 2 right
     * @return m/s at the load samples
     */
    public Series velocity(int component) {
        return velocity[component];
    }

    /**
     * Speed.
     *
     * @param time s
     * @return m/s
     */
    public double speed(double time) {
        return Math.sqrt(square(velocity[0].at(time)) + square(velocity[1].at(time)) + square(velocity[2].at(time)));
    }

    /**
     * Direction of the velocity in the sagittal plane.
     *
     * @param time s
     * @return angle above the horizontal, rad
     */
    public double direction(double time) {
        return Math.atan2(velocity[1].at(time), velocity[0].at(time));
    }

    /**
     * Power of one limb on the centre of mass, F_i . v.
     *
     * @param limb force of that limb on the subject, N: forward, up, right; sampled like the total
     * @return W at the load samples
     */
    public Series power(Series[] limb) {
        double[] p = new double[limb[0].samples()];
        for (int c = 0; c < 3; c++) {
            for (int i = 0; i < p.length; i++) {
                p[i] += limb[c].sample(i) * velocity[c].sample(i);
            }
        }
        return new Series(limb[0].start(), limb[0].rate(), p);
    }

    /**
     * Angle from the lowest to the highest direction of the velocity over the work window.
     *
     * @return rad, not negative
     */
    public double greatestTurn() {
        double low = Math.min(direction(from), direction(to));
        double high = Math.max(direction(from), direction(to));
        Series v = velocity[0];
        for (int i = v.nextSample(from); i < v.samples() && v.time(i) < to; i++) {
            double d = Math.atan2(velocity[1].sample(i), v.sample(i));
            low = Math.min(low, d);
            high = Math.max(high, d);
        }
        return high - low;
    }

    /**
     * Range of the height of the centre of mass over the work window.
     *
     * @return m, not negative
     */
    public double heightRange() {
        Series up = velocity[1];
        double low = 0;
        double high = 0;
        for (int i = up.nextSample(from); i < up.samples() && up.time(i) < to; i++) {
            double h = up.integral(from, up.time(i));
            low = Math.min(low, h);
            high = Math.max(high, h);
        }
        double last = up.integral(from, to);
        return Math.max(high, last) - Math.min(low, last);
    }

    private static double square(double x) {
        return x * x;
    }
}
