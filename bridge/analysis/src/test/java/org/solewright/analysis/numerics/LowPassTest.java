package org.solewright.analysis.numerics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class LowPassTest {

    @ParameterizedTest
    @CsvSource({"10,240", "10,100", "6,60", "40,100", "20,1000"})
    void sineAtTheCutoffComesOutAtHalfPower(double cutoff, double rate) {
        // exact: the stated cut-off is where the two passes together have gain 1/sqrt 2 (03 section 2).
        assertThat(gain(cutoff, cutoff, rate)).isCloseTo(Math.sqrt(0.5), within(1e-6));
    }

    @ParameterizedTest
    @CsvSource({"3,10,240", "20,10,240", "30,10,100"})
    void gainFollowsTheTwoPassButterworthLaw(double frequency, double cutoff, double rate) {
        // exact: bilinear Butterworth, |H|^2 = 1/(1 + (tan(pi f/r)/tan(pi fc/r))^4 (sqrt 2 - 1)).
        double ratio = Math.tan(Math.PI * frequency / rate) / Math.tan(Math.PI * cutoff / rate);
        double expected = 1 / (1 + Math.pow(ratio, 4) * (Math.sqrt(2) - 1));
        // 1e-5: at 30 Hz in 100 Hz a whole number of periods does not end on a sample.
        assertThat(gain(frequency, cutoff, rate)).isCloseTo(expected, within(1e-5));
    }

    @Test
    void straightLinePassesUnchangedToItsEnds() {
        double[] line = new double[50];
        for (int i = 0; i < line.length; i++) {
            line[i] = 3 - 0.2 * i;
        }
        double[] out = LowPass.of(10, 240).apply(line);
        // exact: unit gain at zero frequency and odd reflection continue a line as a line; 1e-4 is what is left of the
        // start-up of a filter that begins on a slope, a pad away.
        for (int i = 0; i < line.length; i++) {
            assertThat(out[i]).isCloseTo(line[i], within(1e-4));
        }
    }

    @Test
    void lostSamplesStayLostAndDoNotSpread() {
        double[] x = new double[40];
        java.util.Arrays.fill(x, 2.5);
        x[20] = Double.NaN;
        double[] out = LowPass.of(10, 240).applyToRuns(x);
        for (int i = 0; i < x.length; i++) {
            if (i == 20) {
                assertThat(out[i]).isNaN();
            } else {
                assertThat(out[i]).isCloseTo(2.5, within(1e-12));
            }
        }
        assertThat(x[19]).isEqualTo(2.5);
    }

    @Test
    void cutoffBeyondHalfTheRateIsRefusedWithTheNumbers() {
        assertThatThrownBy(() -> LowPass.of(60, 100))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessage("cut-off 60.0 Hz, expected more than 0 Hz and less than half the rate 100.0 Hz");
    }

    /** Amplitude of the response in the middle of a long sine, by projection on sine and cosine over whole periods. */
    private static double gain(double frequency, double cutoff, double rate) {
        int n = (int) Math.round(200 * rate / frequency);
        double[] x = new double[n];
        for (int i = 0; i < n; i++) {
            x[i] = Math.sin(2 * Math.PI * frequency * i / rate);
        }
        double[] y = LowPass.of(cutoff, rate).apply(x);
        int from = (int) Math.round(50 * rate / frequency);
        int to = (int) Math.round(150 * rate / frequency);
        double s = 0;
        double c = 0;
        for (int i = from; i < to; i++) {
            s += y[i] * Math.sin(2 * Math.PI * frequency * i / rate);
            c += y[i] * Math.cos(2 * Math.PI * frequency * i / rate);
        }
        return 2 * Math.hypot(s, c) / (to - from);
    }
}
