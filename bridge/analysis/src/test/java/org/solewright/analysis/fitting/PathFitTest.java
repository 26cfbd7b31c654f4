package org.solewright.analysis.fitting;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.Random;
import org.junit.jupiter.api.Test;

class PathFitTest {

    @Test
    void pivotsAreThoseOfTheBestOfAllSplits() {
        Random random = new Random(19);
        double[] x = new double[14];
        double[] y = new double[14];
        double[] w = new double[14];
        for (int i = 0; i < 14; i++) {
            x[i] = i / 5 * 0.1 + 0.03 * random.nextGaussian();
            y[i] = 100 + 0.02 * random.nextGaussian();
            w[i] = 1 + random.nextInt(5);
        }
        double best = Double.POSITIVE_INFINITY;
        for (int first = 1; first < 13; first++) {
            for (int second = first + 1; second < 14; second++) {
                best = Math.min(
                        best,
                        scatter(x, y, w, 0, first) + scatter(x, y, w, first, second) + scatter(x, y, w, second, 14));
            }
        }
        FittedPath path = PathFit.pivots(x, y, w, 3);
        assertThat(path.sumOfSquares()).isCloseTo(best, within(1e-12)); // independent: all 78 splits tried
        assertThat(path.cuts()).isEqualTo(4);
        assertThat(path.cut(0)).isZero();
        assertThat(path.cut(3)).isEqualTo(14);
    }

    @Test
    void polylineIsTheBestOfAllVertices() {
        Random random = new Random(23);
        double[] x = new double[12];
        double[] y = new double[12];
        double[] w = new double[12];
        for (int i = 0; i < 12; i++) {
            x[i] = 0.02 * i;
            y[i] = 0.05 * Math.abs(i - 7) + 0.01 * random.nextGaussian();
            w[i] = 1;
        }
        FittedPath path = PathFit.polyline(x, y, w, 2);
        double best = Double.POSITIVE_INFINITY;
        for (int node = 1; node < 11; node++) {
            double sum = 0;
            for (int i = 0; i < 12; i++) {
                sum += i <= node ? chord(x, y, 0, node, i) : chord(x, y, node, 11, i);
            }
            best = Math.min(best, sum);
        }
        assertThat(path.sumOfSquares()).isCloseTo(best, within(1e-14)); // independent: all 10 vertices tried
        assertThat(path.x(0)).isEqualTo(x[0]);
        assertThat(path.x(2)).isEqualTo(x[11]);
    }

    @Test
    void dwellWeightsFallWithTheFourthPowerOfSpeed() {
        double[] x = {0, 0, 0, 0.002, 0.004};
        double[] weights = PathFit.dwellWeights(x, new double[5], new double[] {700, 700, 700, 700, -3}, 0.01, 0.1);
        // exact: speeds 0, 0, 0.1, 0.2 m/s by central differences, 1/(1 + 1) and 1/(1 + 16); a pull carries no weight
        assertThat(weights[1]).isEqualTo(700);
        assertThat(weights[2]).isCloseTo(350, within(1e-9));
        assertThat(weights[3]).isCloseTo(700 / 17.0, within(1e-9));
        assertThat(weights[4]).isZero();
    }

    @Test
    void refusesMoreRunsThanSamples() {
        assertThatThrownBy(() -> PathFit.pivots(new double[2], new double[2], new double[] {1, 0}, 2))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessageContaining("1 samples that carry weight in 2 runs");
        assertThatThrownBy(() -> PathFit.polyline(new double[2], new double[2], new double[] {1, 0}, 2))
                .isInstanceOf(IllegalArgumentException.class);
    }

    private static double scatter(double[] x, double[] y, double[] w, int from, int to) {
        double sum = 0;
        double mx = 0;
        double my = 0;
        for (int i = from; i < to; i++) {
            sum += w[i];
            mx += w[i] * x[i];
            my += w[i] * y[i];
        }
        double scatter = 0;
        for (int i = from; i < to; i++) {
            scatter += w[i] * (Math.pow(x[i] - mx / sum, 2) + Math.pow(y[i] - my / sum, 2));
        }
        return scatter;
    }

    /** Squared distance to a chord by trying many of its points. */
    private static double chord(double[] x, double[] y, int from, int to, int sample) {
        double low = 0;
        double high = 1;
        for (int i = 0; i < 200; i++) {
            double a = low + (high - low) / 3;
            double b = high - (high - low) / 3;
            if (square(x, y, from, to, sample, a) < square(x, y, from, to, sample, b)) {
                high = b;
            } else {
                low = a;
            }
        }
        return square(x, y, from, to, sample, (low + high) / 2);
    }

    private static double square(double[] x, double[] y, int from, int to, int sample, double share) {
        double dx = x[sample] - x[from] - share * (x[to] - x[from]);
        double dy = y[sample] - y[from] - share * (y[to] - y[from]);
        return dx * dx + dy * dy;
    }
}
