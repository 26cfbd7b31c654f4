package org.solewright.analysis.numerics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;

class SampleTest {

    @Test
    void meanAndDeviationAreThoseOfTheSample() {
        Sample s = Sample.of(new double[] {2, 4, 9});
        // exact: mean 5, squares 9 + 1 + 16 over n - 1 = 2.
        assertThat(s.mean()).isCloseTo(5, within(1e-12));
        assertThat(s.sd().getAsDouble()).isCloseTo(Math.sqrt(13), within(1e-12));
    }

    @Test
    void intervalOfThreeUsesStudentsT() {
        // published: t of 0.975 with 2 degrees of freedom is 4.3027 in every table of Student's distribution (4
        // digits).
        assertThat(Sample.of(new double[] {2, 4, 9}).half95().getAsDouble())
                .isCloseTo(4.3027 * Math.sqrt(13.0 / 3), within(5e-4));
    }

    @Test
    void fewerThanThreeValuesHaveNoInterval() {
        assertThat(Sample.of(new double[] {2, 4}).half95()).isEmpty();
        assertThat(Sample.of(new double[] {2}).sd()).isEmpty();
        assertThatThrownBy(() -> Sample.of(new double[0])).hasMessage("sample of 0 values, expected at least 1");
    }
}
