package org.solewright.analysis.numerics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;

class SeriesTest {

    // 0 at 1.0 s, 4 at 1.5 s, -4 at 2.0 s, 0 at 2.5 s.
    private final Series zigzag = new Series(1.0, 2.0, new double[] {0, 4, -4, 0});

    @Test
    void valueBetweenSamplesIsLinear() {
        assertThat(zigzag.at(1.25)).isCloseTo(2, within(1e-12));
        assertThat(zigzag.at(1.75)).isCloseTo(0, within(1e-12));
    }

    @Test
    void outsideTheSamplesThereIsNoValue() {
        assertThat(zigzag.at(0.9)).isNaN();
        assertThat(zigzag.at(2.6)).isNaN();
        assertThat(zigzag.integral(0.9, 1.5)).isNaN();
    }

    @Test
    void integralWithEndsBetweenSamplesIsThatOfTheBrokenLine() {
        // exact: rising flank 8 (t - 1), so from 1.25 to 1.5 s the area is 0.25 (2 + 4)/2 = 0.75.
        assertThat(zigzag.integral(1.25, 1.5)).isCloseTo(0.75, within(1e-12));
        assertThat(zigzag.integral(1.0, 2.5)).isCloseTo(0, within(1e-12));
        assertThat(zigzag.mean(1.0, 1.5)).isCloseTo(2, within(1e-12));
    }

    @Test
    void positiveAndNegativePartsAreSplitAtTheCrossing() {
        // exact: triangles 0.5 * 4 / 2 and 0.25 * 4 / 2 on each side.
        assertThat(zigzag.positiveIntegral(1.0, 2.5)).isCloseTo(1.5, within(1e-12));
        assertThat(zigzag.negativeIntegral(1.0, 2.5)).isCloseTo(-1.5, within(1e-12));
        assertThat(zigzag.positiveIntegral(1.6, 1.8)).isCloseTo(0.15 * 2.4 / 2, within(1e-12));
    }

    @Test
    void lostNeighbourDoesNotSpoilAnExactHit() {
        Series s = new Series(0, 10, new double[] {1, 2, Double.NaN});
        assertThat(s.at(0.1)).isEqualTo(2);
        assertThat(s.at(0.15)).isNaN();
    }
}
