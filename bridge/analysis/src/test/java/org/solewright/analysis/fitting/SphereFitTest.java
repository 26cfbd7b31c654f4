package org.solewright.analysis.fitting;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.Random;
import org.junit.jupiter.api.Test;

class SphereFitTest {

    private static final double[] GGS = {1, 7, 2, 6, 5, 8, 7, 7, 9, 5, 3, 7};

    @Test
    void algebraicAndGeometricCirclesOfGanderGolubAndStrebel() {
        FittedSphere unitNorm = AlgebraicFit.unitNorm(GGS, 2).orElseThrow();
        // published [Gander, Golub and Strebel 1994]: algebraic z = (5.3794, 7.2532), r = 3.0370; geometric
        // z = (4.7398, 2.9835), r = 4.7142; four decimals
        assertThat(unitNorm.centre(0)).isCloseTo(5.3794, within(5e-5));
        assertThat(unitNorm.centre(1)).isCloseTo(7.2532, within(5e-5));
        assertThat(unitNorm.radius()).isCloseTo(3.0370, within(5e-5));
        SphereFit geometric = SphereFit.fit(GGS, ones(6), 2).orElseThrow();
        assertThat(geometric.sphere().centre(0)).isCloseTo(4.7398, within(5e-5));
        assertThat(geometric.sphere().centre(1)).isCloseTo(2.9835, within(5e-5));
        assertThat(geometric.sphere().radius()).isCloseTo(4.7142, within(5e-5));
    }

    @Test
    void kasaSolvesItsNormalEquations() {
        FittedSphere kasa = AlgebraicFit.kasa(GGS, 2).orElseThrow();
        double t = kasa.radius() * kasa.radius() - kasa.centre(0) * kasa.centre(0) - kasa.centre(1) * kasa.centre(1);
        double sum = 0;
        double sumX = 0;
        double sumY = 0;
        for (int i = 0; i < 6; i++) {
            double x = GGS[2 * i];
            double y = GGS[2 * i + 1];
            double e = 2 * kasa.centre(0) * x + 2 * kasa.centre(1) * y + t - x * x - y * y;
            sum += e;
            sumX += e * x;
            sumY += e * y;
        }
        // exact: the residual of a least-squares fit is orthogonal to its columns; sums of terms near 1e2
        assertThat(sum).isCloseTo(0, within(1e-11));
        assertThat(sumX).isCloseTo(0, within(1e-10));
        assertThat(sumY).isCloseTo(0, within(1e-10));
    }

    @Test
    void allFitsGiveBackASphereFromItsPoints() {
        Random random = new Random(3);
        double[] points = new double[3 * 12];
        for (int i = 0; i < 12; i++) {
            double[] u = {random.nextGaussian(), random.nextGaussian(), random.nextGaussian()};
            double norm = Math.sqrt(u[0] * u[0] + u[1] * u[1] + u[2] * u[2]);
            for (int axis = 0; axis < 3; axis++) {
                points[3 * i + axis] = 0.1 * (axis + 1) + 0.25 * u[axis] / norm;
            }
        }
        for (FittedSphere sphere : new FittedSphere[] {
            AlgebraicFit.kasa(points, 3).orElseThrow(),
            AlgebraicFit.unitNorm(points, 3).orElseThrow(),
            AlgebraicFit.pratt(points, 3).orElseThrow(),
            AlgebraicFit.taubin(points, 3).orElseThrow(),
            SphereFit.fit(points, ones(12), 3).orElseThrow().sphere()
        }) {
            assertThat(sphere.radius()).isCloseTo(0.25, within(1e-10)); // exact: points on the sphere
            assertThat(sphere.centre(2)).isCloseTo(0.3, within(1e-10));
        }
    }

    @Test
    void kasaIsBiasedOnShortArcsAndTheOthersAreNot() {
        Random random = new Random(5);
        int repeats = 300;
        double kasa = 0;
        double taubin = 0;
        double pratt = 0;
        double geometric = 0;
        for (int repeat = 0; repeat < repeats; repeat++) {
            double[] points = new double[120];
            for (int i = 0; i < 60; i++) {
                double angle = 0.25 * (2 * i / 59.0 - 1);
                points[2 * i] = 0.3 * Math.sin(angle) + 0.002 * random.nextGaussian();
                points[2 * i + 1] = -0.3 * Math.cos(angle) + 0.002 * random.nextGaussian();
            }
            kasa += AlgebraicFit.kasa(points, 2).orElseThrow().radius() / repeats;
            taubin += AlgebraicFit.taubin(points, 2).orElseThrow().radius() / repeats;
            pratt += AlgebraicFit.pratt(points, 2).orElseThrow().radius() / repeats;
            geometric +=
                    SphereFit.fit(points, ones(60), 2).orElseThrow().sphere().radius() / repeats;
        }
        // design 04 H3: means 0.208 (Kasa) and 0.301 (the others), sd 0.028; 4 standard errors of 300 repeats
        assertThat(kasa).isCloseTo(0.208, within(0.007));
        assertThat(taubin).isCloseTo(0.301, within(0.007));
        assertThat(pratt).isCloseTo(0.301, within(0.007));
        assertThat(geometric).isCloseTo(0.301, within(0.007));
    }

    @Test
    void geometricFitIsStationary() {
        double[] weights = {1, 2, 1, 0.5, 1, 3};
        SphereFit fit = SphereFit.fit(GGS, weights, 2).orElseThrow();
        double[] gradient = new double[3];
        for (int i = 0; i < 6; i++) {
            double dx = GGS[2 * i] - fit.sphere().centre(0);
            double dy = GGS[2 * i + 1] - fit.sphere().centre(1);
            double d = Math.hypot(dx, dy);
            double e = weights[i] * (d - fit.sphere().radius());
            gradient[0] += e * dx / d;
            gradient[1] += e * dy / d;
            gradient[2] += e;
        }
        assertThat(gradient[0]).isCloseTo(0, within(1e-12)); // exact: the gradient vanishes at the minimum
        assertThat(gradient[1]).isCloseTo(0, within(1e-12));
        assertThat(gradient[2]).isCloseTo(0, within(1e-12));
    }

    @Test
    void pointsOnALineHaveNoCircle() {
        double[] line = {0, 0, 1, 1, 2, 2, 3, 3};
        assertThat(AlgebraicFit.kasa(line, 2)).isEmpty();
        assertThat(AlgebraicFit.pratt(line, 2)).isEmpty();
        assertThat(AlgebraicFit.taubin(line, 2)).isEmpty();
        assertThat(SphereFit.fit(line, ones(4), 2)).isEmpty();
        double[] onePlace = {1, 1, 1, 1, 1, 1, 1, 1};
        assertThat(AlgebraicFit.kasa(onePlace, 2)).isEmpty();
        assertThat(SphereFit.fit(onePlace, ones(4), 2)).isEmpty();
    }

    @Test
    void tooFewPointsAreRefused() {
        assertThatThrownBy(() -> SphereFit.fit(new double[] {0, 0, 1, 1}, ones(2), 2))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessageContaining("at least 3 points");
    }

    private static double[] ones(int count) {
        double[] ones = new double[count];
        Arrays.fill(ones, 1);
        return ones;
    }
}
