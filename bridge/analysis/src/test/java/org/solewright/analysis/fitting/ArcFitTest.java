package org.solewright.analysis.fitting;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.solewright.analysis.numerics.Outcome;

class ArcFitTest {

    private static final double[] GGS_X = {1, 2, 5, 7, 9, 3};
    private static final double[] GGS_Y = {7, 6, 8, 7, 5, 7};

    @Test
    void pointsOnAnArcGiveItBack() {
        double[] x = new double[21];
        double[] y = new double[21];
        arc(x, y, 0.05, -0.4, 0.3, 0.25);
        FittedArc arc = ArcFit.fit(x, y);
        // exact: the points lie on the circle; 1e-12 for rounding over a fit of condition about 1e3
        assertThat(arc.curvature()).isCloseTo(1 / 0.3, within(1e-10));
        assertThat(arc.radius()).isCloseTo(0.3, within(1e-11));
        assertThat(arc.centreX().orElseThrow()).isCloseTo(0.05, within(1e-11));
        assertThat(arc.centreY().orElseThrow()).isCloseTo(-0.4, within(1e-11));
        assertThat(arc.arcLength()).isCloseTo(2 * 0.3 * 0.25, within(1e-11));
        assertThat(arc.rms()).isLessThan(1e-12);
        assertThat(arc.x(0)).isCloseTo(x[0], within(1e-11));
        assertThat(arc.y(0)).isCloseTo(y[0], within(1e-11));
        assertThat(arc.x(1)).isCloseTo(x[20], within(1e-11));
        assertThat(arc.outcome()).isInstanceOf(Outcome.Converged.class);
    }

    @Test
    void arcThatBulgesUpwardsHasNegativeCurvature() {
        double[] x = new double[15];
        double[] y = new double[15];
        arc(x, y, 0, 0, 0.5, 0.4);
        for (int i = 0; i < y.length; i++) {
            y[i] = -y[i];
        }
        assertThat(ArcFit.fit(x, y).curvature()).isCloseTo(-2, within(1e-9)); // exact: mirror image
    }

    @Test
    void straightPathHasCurvatureZeroAndNoCentre() {
        double[] x = {0, 0.1, 0.2, 0.3, 0.4};
        double[] y = {0, 0, 0, 0, 0};
        FittedArc arc = ArcFit.fit(x, y);
        assertThat(arc.curvature()).isZero();
        assertThat(arc.centreX()).isEmpty();
        assertThat(arc.radiusSd()).isEmpty();
        assertThat(arc.radius()).isInfinite();
        assertThat(arc.arcLength()).isCloseTo(0.4, within(1e-15)); // exact: distance of the ends
    }

    @Test
    void noisyStraightPathHasCurvatureWithinItsDeviation() {
        Random random = new Random(7);
        double[] x = new double[200];
        double[] y = new double[200];
        for (int i = 0; i < x.length; i++) {
            x[i] = i * 1e-3;
            y[i] = 0.001 * random.nextGaussian();
        }
        FittedArc arc = ArcFit.fit(x, y);
        // 4 SD: one in 16000 for a normal error
        assertThat(Math.abs(arc.curvature())).isLessThan(4 * arc.curvatureSd().orElseThrow());
        assertThat(arc.outcome()).isInstanceOf(Outcome.Converged.class);
    }

    @Test
    void sixPointsOfGanderGolubAndStrebelGiveTheirGeometricCircle() {
        FittedArc arc = ArcFit.fit(GGS_X, GGS_Y);
        // published [Gander, Golub and Strebel 1994]: z = (4.7398, 2.9835), r = 4.7142, four decimals; the centre lies
        // below these points
        assertThat(-arc.radius()).isCloseTo(4.7142, within(5e-5));
        assertThat(arc.centreX().orElseThrow()).isCloseTo(4.7398, within(5e-5));
        assertThat(arc.centreY().orElseThrow()).isCloseTo(2.9835, within(5e-5));
    }

    @Test
    void agreesWithTheCentreFormInCircleAndDeviation() {
        double[] points = new double[12];
        for (int i = 0; i < 6; i++) {
            points[2 * i] = GGS_X[i];
            points[2 * i + 1] = GGS_Y[i];
        }
        double[] weights = {1, 2, 0.5, 3, 1, 0};
        FittedArc arc = ArcFit.fit(GGS_X, GGS_Y, weights);
        SphereFit circle = SphereFit.fit(points, weights, 2).orElseThrow();
        // independent: the same minimum in other parameters; 1e-9 for two iterations to 1e-13 of flat minima
        assertThat(Math.abs(arc.radius())).isCloseTo(circle.sphere().radius(), within(1e-8));
        assertThat(arc.centreX().orElseThrow()).isCloseTo(circle.sphere().centre(0), within(1e-8));
        assertThat(arc.rms()).isCloseTo(Math.sqrt(circle.sumOfSquares() / 7.5), within(1e-10));
        // independent: sd(r) of the other parameters' covariance, the same to first order
        assertThat(arc.radiusSd().orElseThrow()).isCloseTo(Math.sqrt(circle.covariance(2, 2)), within(1e-6));
    }

    @Test
    void standardDeviationIsThatOfRepeatedFits() {
        Random random = new Random(11);
        int repeats = 400;
        double[] curvatures = new double[repeats];
        double stated = 0;
        for (int repeat = 0; repeat < repeats; repeat++) {
            double[] x = new double[60];
            double[] y = new double[60];
            arc(x, y, 0, 0, 0.3, 0.25);
            for (int i = 0; i < x.length; i++) {
                x[i] += 0.002 * random.nextGaussian();
                y[i] += 0.002 * random.nextGaussian();
            }
            FittedArc arc = ArcFit.fit(x, y);
            curvatures[repeat] = arc.curvature();
            stated += arc.curvatureSd().orElseThrow() / repeats;
        }
        double mean = Arrays.stream(curvatures).average().orElseThrow();
        double sd = Math.sqrt(
                Arrays.stream(curvatures).map(c -> (c - mean) * (c - mean)).sum() / (repeats - 1));
        // independent: spread of 400 fits, itself uncertain by 1/sqrt(800) = 3.5 %; 4 of these
        assertThat(sd / stated).isCloseTo(1, within(0.14));
        // the mean curvature of short noisy arcs is unbiased to a fraction of its SD
        assertThat(mean).isCloseTo(1 / 0.3, within(4 * sd / Math.sqrt(repeats) + 0.02 / 0.3));
    }

    @Test
    void weightsCountAsRepetitions() {
        double[] x = {0, 1, 2, 3, 4};
        double[] y = {0.8, 0.3, 0.05, 0.2, 0.9};
        FittedArc weighted = ArcFit.fit(x, y, new double[] {2, 1, 3, 1, 1});
        FittedArc repeated = ArcFit.fit(
                new double[] {0, 0, 1, 2, 2, 2, 3, 4}, new double[] {0.8, 0.8, 0.3, 0.05, 0.05, 0.05, 0.2, 0.9});
        assertThat(weighted.curvature()).isCloseTo(repeated.curvature(), within(1e-10)); // exact: the same sum
        assertThat(weighted.rms()).isCloseTo(repeated.rms(), within(1e-12));
        assertThat(weighted.points()).isEqualTo(5);
    }

    @Test
    void argumentsStayAsTheyAre() {
        double[] x = GGS_X.clone();
        double[] y = GGS_Y.clone();
        double[] weights = {1, 1, 1, 1, 1, 1};
        ArcFit.fit(x, y, weights);
        assertThat(x).containsExactly(GGS_X);
        assertThat(y).containsExactly(GGS_Y);
        assertThat(weights).containsOnly(1);
    }

    @Test
    void threePointsHaveNoDeviation() {
        FittedArc arc = ArcFit.fit(new double[] {-1, 0, 1}, new double[] {1, 0, 1});
        assertThat(arc.radius()).isCloseTo(1, within(1e-12)); // exact: unit circle about (0, 1)
        assertThat(arc.curvatureSd()).isEmpty();
    }

    @Test
    void refusesWhatIsNoArc() {
        assertThatThrownBy(() -> ArcFit.fit(new double[] {0, 1}, new double[] {0, 1}))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessageContaining("2 points");
        assertThatThrownBy(() -> ArcFit.fit(new double[] {1, 1, 1}, new double[] {2, 2, 2}))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessageContaining("coincide");
        assertThatThrownBy(() -> ArcFit.fit(new double[] {0, 1, Double.NaN}, new double[] {0, 1, 2}))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessageContaining("point 2");
    }

    /** Points on the lower part of a circle, equal steps of angle from -half to half. */
    private static void arc(double[] x, double[] y, double centreX, double centreY, double radius, double half) {
        for (int i = 0; i < x.length; i++) {
            double angle = half * (2.0 * i / (x.length - 1) - 1);
            x[i] = centreX + radius * Math.sin(angle);
            y[i] = centreY - radius * Math.cos(angle);
        }
    }
}
