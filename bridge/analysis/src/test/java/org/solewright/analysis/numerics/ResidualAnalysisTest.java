package org.solewright.analysis.numerics;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

class ResidualAnalysisTest {

    private static final double RATE = 200;
    private static final int SAMPLES = 800;

    /** A walking marker's height, invented: three harmonics of 1 Hz. */
    private static double[] truth() {
        double[] y = new double[SAMPLES];
        for (int i = 0; i < SAMPLES; i++) {
            double t = 2 * Math.PI * i / RATE;
            y[i] = 0.05 * Math.sin(t) + 0.02 * Math.sin(2 * t + 1) + 0.006 * Math.sin(4 * t + 2);
        }
        return y;
    }

    private static double error(double[] noisy, double[] truth, double cutoff) {
        double[] smooth = LowPass.of(cutoff, RATE).applyToRuns(noisy);
        double sum = 0;
        for (int i = 50; i < SAMPLES - 50; i++) {
            sum += (smooth[i] - truth[i]) * (smooth[i] - truth[i]);
        }
        return Math.sqrt(sum / (SAMPLES - 100));
    }

    @Test
    void cutoffFoundIsNearlyTheBestThereIs() {
        double[] truth = truth();
        for (double noise : new double[] {0.0003, 0.001, 0.003}) {
            Random random = new Random(7);
            double[] noisy = truth.clone();
            for (int i = 0; i < SAMPLES; i++) {
                noisy[i] += noise * random.nextGaussian();
            }
            double cutoff = ResidualAnalysis.cutoff(List.of(noisy), RATE).orElseThrow();
            double best = Double.POSITIVE_INFINITY;
            for (double c = 1; c <= 25; c += 0.25) {
                best = Math.min(best, error(noisy, truth, c));
            }
            // independent: the error against the truth of all cut-offs; the method balances distortion and noise, which
            // is not the least error, hence the factor
            assertThat(error(noisy, truth, cutoff))
                    .as("noise " + noise + " cutoff " + cutoff)
                    .isLessThan(1.5 * best);
        }
    }

    @Test
    void moreNoiseAsksForALowerCutoff() {
        double last = Double.POSITIVE_INFINITY;
        for (double noise : new double[] {0.0002, 0.001, 0.005}) {
            Random random = new Random(11);
            double[] noisy = truth();
            for (int i = 0; i < SAMPLES; i++) {
                noisy[i] += noise * random.nextGaussian();
            }
            noisy[100] = Double.NaN;
            double cutoff = ResidualAnalysis.cutoff(List.of(noisy), RATE).orElseThrow();
            assertThat(cutoff).isLessThan(last);
            last = cutoff;
        }
    }

    @Test
    void slowOrEmptyRecordingsGiveNone() {
        assertThat(ResidualAnalysis.cutoff(List.of(new double[100]), 5)).isEmpty();
        assertThat(ResidualAnalysis.cutoff(List.of(new double[100]), 100)).isEmpty();
        double[] lost = new double[100];
        java.util.Arrays.fill(lost, Double.NaN);
        assertThat(ResidualAnalysis.cutoff(List.of(lost), 100)).isEmpty();
    }
}
