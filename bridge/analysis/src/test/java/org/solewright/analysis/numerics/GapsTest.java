package org.solewright.analysis.numerics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;

class GapsTest {

    @Test
    void shortGapOfALineIsBridgedExactly() {
        double[] x = line(20);
        lose(x, 8, 11);
        assertThat(Gaps.bridge(x, 2, 5)).isEqualTo(3);
        // exact: a cubic spline reproduces a straight line.
        for (int i = 0; i < 20; i++) {
            assertThat(x[2 * i]).isCloseTo(1 + 0.5 * i, within(1e-12));
            assertThat(x[2 * i + 1]).isCloseTo(-2.0 * i, within(1e-12));
        }
    }

    @Test
    void longerGapStaysMissing() {
        double[] x = line(20);
        lose(x, 8, 14);
        assertThat(Gaps.bridge(x, 2, 5)).isZero();
        assertThat(x[2 * 10]).isNaN();
    }

    @Test
    void nothingIsExtrapolatedAtTheEnds() {
        double[] x = line(20);
        lose(x, 0, 2);
        lose(x, 18, 20);
        assertThat(Gaps.bridge(x, 2, 5)).isZero();
        assertThat(x[0]).isNaN();
        assertThat(x[39]).isNaN();
    }

    @Test
    void gapWithFewerThanThreeNeighboursOnASideStaysMissing() {
        double[] x = line(20);
        lose(x, 2, 3);
        assertThat(Gaps.bridge(x, 2, 5)).isZero();
        assertThat(x[4]).isNaN();
    }

    @Test
    void smoothCurveIsBridgedToTheOrderOfASpline() {
        double[] x = new double[60];
        for (int i = 0; i < x.length; i++) {
            x[i] = Math.sin(0.1 * i);
        }
        double[] truth = x.clone();
        for (int i = 30; i < 34; i++) {
            x[i] = Double.NaN;
        }
        Gaps.bridge(x, 1, 5);
        // independent: the curve itself; cubic interpolation error 5/384 h^4 max|f''''| with h = 5 samples of 0.1 rad.
        for (int i = 30; i < 34; i++) {
            assertThat(x[i]).isCloseTo(truth[i], within(5.0 / 384 * Math.pow(0.5, 4) * 2));
        }
    }

    private static double[] line(int n) {
        double[] x = new double[2 * n];
        for (int i = 0; i < n; i++) {
            x[2 * i] = 1 + 0.5 * i;
            x[2 * i + 1] = -2.0 * i;
        }
        return x;
    }

    private static void lose(double[] x, int from, int to) {
        for (int i = 2 * from; i < 2 * to; i++) {
            x[i] = Double.NaN;
        }
    }
}
