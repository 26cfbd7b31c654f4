package org.solewright.analysis.numerics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;

class DampedNewtonTest {

    /** Residuals 10 (y - x^2) and 1 - x [Rosenbrock 1960], minimum 0 at (1, 1). */
    private static final DampedNewton.Problem VALLEY = new DampedNewton.Problem() {
        @Override
        public double cost(double[] p) {
            double a = 10 * (p[1] - p[0] * p[0]);
            double b = 1 - p[0];
            return (a * a + b * b) / 2;
        }

        @Override
        public void derivatives(double[] p, double[] gradient, double[] gaussNewton, double[] curvature) {
            double a = 10 * (p[1] - p[0] * p[0]);
            double b = 1 - p[0];
            double slope = -20 * p[0];
            gradient[0] = a * slope - b;
            gradient[1] = 10 * a;
            gaussNewton[0] = slope * slope + 1;
            gaussNewton[1] = 10 * slope;
            gaussNewton[2] = gaussNewton[1];
            gaussNewton[3] = 100;
            curvature[0] = -20 * a;
        }
    };

    @Test
    void followsACurvedValleyToItsEnd() {
        double[] p = {-1.2, 1};
        Outcome outcome = DampedNewton.minimise(VALLEY, p);
        assertThat(outcome).isInstanceOf(Outcome.Converged.class);
        assertThat(p[0]).isCloseTo(1, within(1e-12)); // published [Rosenbrock 1960]
        assertThat(p[1]).isCloseTo(1, within(1e-12));
    }

    @Test
    void problemThatIsNoNumberStalls() {
        DampedNewton.Problem broken = new DampedNewton.Problem() {
            @Override
            public double cost(double[] p) {
                return Double.NaN;
            }

            @Override
            public void derivatives(double[] p, double[] gradient, double[] gaussNewton, double[] curvature) {
                gaussNewton[0] = Double.NaN;
            }
        };
        assertThat(DampedNewton.minimise(broken, new double[] {0})).isInstanceOf(Outcome.Stalled.class);
    }
}
