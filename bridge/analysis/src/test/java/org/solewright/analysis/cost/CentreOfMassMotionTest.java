package org.solewright.analysis.cost;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;
import org.solewright.analysis.numerics.Series;

class CentreOfMassMotionTest {

    private static final double G = 9.80665;
    private static final double MASS = 70;
    private static final double RATE = 1000;
    private static final double PERIOD = 0.5;
    private static final double HEIGHT = 0.02;
    private static final double OMEGA = 2 * Math.PI / PERIOD;

    /** Height h cos(w t), so the vertical force is m (g - h w^2 cos(w t)); forward force a m sin(w t). */
    private static Series[] loads() {
        int n = 801;
        double[] forward = new double[n];
        double[] up = new double[n];
        for (int i = 0; i < n; i++) {
            double t = i / RATE;
            forward[i] = MASS * 0.5 * Math.sin(OMEGA * t);
            up[i] = MASS * (G - HEIGHT * OMEGA * OMEGA * Math.cos(OMEGA * t));
        }
        return new Series[] {new Series(0, RATE, forward), new Series(0, RATE, up), new Series(0, RATE, new double[n])};
    }

    private static CentreOfMassMotion motion() {
        return CentreOfMassMotion.over(loads(), 0.1, 0.1 + PERIOD, new double[] {1.3, 0, 0.02}, new double[3], G);
    }

    @Test
    void massIsTheMeanVerticalLoadOverGravity() {
        // exact: the oscillating part has no mean over a period; the trapezium rule is exact to 1e-6 here.
        assertThat(motion().mass()).isCloseTo(MASS, within(1e-5));
    }

    @Test
    void velocityIsTheIntegralWithTheGivenMean() {
        CentreOfMassMotion m = motion();
        for (double t : new double[] {0.1, 0.2345, 0.4, 0.6}) {
            // exact: up -h w sin(w t); forward 1.3 - (0.5/w) cos(w t), which has no mean over a period.
            assertThat(m.velocity(1).at(t)).isCloseTo(-HEIGHT * OMEGA * Math.sin(OMEGA * t), within(1e-5));
            assertThat(m.velocity(0).at(t)).isCloseTo(1.3 - 0.5 / OMEGA * Math.cos(OMEGA * t), within(1e-5));
            assertThat(m.velocity(2).at(t)).isCloseTo(0.02, within(1e-9));
        }
    }

    @Test
    void heightRangeIsTwiceTheAmplitude() {
        assertThat(motion().heightRange()).isCloseTo(2 * HEIGHT, within(1e-5));
    }

    @Test
    void workOfTheTotalForceIsTheChangeOfEnergy() {
        CentreOfMassMotion m = motion();
        double from = 0.15;
        double to = 0.33;
        double kinetic = MASS / 2 * (square(m.speed(to)) - square(m.speed(from)));
        double potential = MASS * G * HEIGHT * (Math.cos(OMEGA * to) - Math.cos(OMEGA * from));
        // independent: energy balance of a point mass.
        assertThat(m.power(loads()).integral(from, to)).isCloseTo(kinetic + potential, within(1e-3));
    }

    @Test
    void greatestTurnIsTheRangeOfTheDirection() {
        CentreOfMassMotion m = motion();
        double low = 1;
        double high = -1;
        for (double t = 0.1; t <= 0.6; t += 1e-4) {
            double d = Math.atan2(-HEIGHT * OMEGA * Math.sin(OMEGA * t), 1.3 - 0.5 / OMEGA * Math.cos(OMEGA * t));
            low = Math.min(low, d);
            high = Math.max(high, d);
        }
        // exact velocity on a finer grid; samples 1 ms apart miss an extreme by about (w 0.5 ms)^2/2.
        assertThat(m.greatestTurn()).isCloseTo(high - low, within(2e-5));
    }

    private static double square(double x) {
        return x * x;
    }
}
