package org.solewright.analysis.numerics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;

class CholeskyTest {

    @Test
    void inverseTimesMatrixIsOne() {
        double[] a = {4, 2, -2, 2, 10, 2, -2, 2, 6};
        double[] inverse = Cholesky.of(a, 3).orElseThrow().inverse();
        for (int row = 0; row < 3; row++) {
            for (int column = 0; column < 3; column++) {
                double sum = 0;
                for (int k = 0; k < 3; k++) {
                    sum += a[3 * row + k] * inverse[3 * k + column];
                }
                assertThat(sum).isCloseTo(row == column ? 1 : 0, within(1e-14)); // exact
            }
        }
    }

    @Test
    void matrixThatIsNotPositiveDefiniteHasNoFactor() {
        assertThat(Cholesky.of(new double[] {1, 2, 2, 1}, 2)).isEmpty(); // exact: determinant -3
        assertThat(Cholesky.of(new double[] {1, 1, 1, 1}, 2)).isEmpty(); // exact: determinant 0
        assertThat(Cholesky.of(new double[] {Double.NaN}, 1)).isEmpty();
    }
}
