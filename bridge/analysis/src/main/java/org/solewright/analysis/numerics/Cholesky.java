package org.solewright.analysis.numerics;

import java.util.Arrays;
import java.util.Optional;

/** Factor of a small symmetric positive definite matrix, A = L L^T. */
public final class Cholesky {

    private final double[] factor;
    private final int size;

    private Cholesky(double[] factor, int size) {
        this.factor = factor;
        this.size = size;
    }

    /**
     * Factors a matrix.
     *
     * @param matrix {@code [size][size]} row-major, symmetric; only the lower triangle is looked at, unmodified
     * @param size number of rows
     * @return the factor; empty where the matrix is not positive definite to working accuracy
     */
    public static Optional<Cholesky> of(double[] matrix, int size) {
        double[] l = new double[size * size];
        for (int row = 0; row < size; row++) {
            for (int column = 0; column <= row; column++) {
                double sum = matrix[row * size + column];
                for (int k = 0; k < column; k++) {
                    sum -= l[row * size + k] * l[column * size + k];
                }
                if (row == column) {
                    if (!(sum > Math.ulp(1.0) * matrix[row * size + row])) {
                        return Optional.empty();
                    }
                    l[row * size + row] = Math.sqrt(sum);
                } else {
                    l[row * size + column] = sum / l[column * size + column];
                }
            }
        }
        return Optional.of(new Cholesky(l, size));
    }

    /**
     * Solves A x = b.
     *
     * @param b right side of {@code size} entries, replaced by the solution
     */
    public void solve(double[] b) {
        for (int row = 0; row < size; row++) {
            double sum = b[row];
            for (int k = 0; k < row; k++) {
                sum -= factor[row * size + k] * b[k];
            }
            b[row] = sum / factor[row * size + row];
        }
        for (int row = size - 1; row >= 0; row--) {
            double sum = b[row];
            for (int k = row + 1; k < size; k++) {
                sum -= factor[k * size + row] * b[k];
            }
            b[row] = sum / factor[row * size + row];
        }
    }

    /**
     * The inverse matrix.
     *
     * @return {@code [size][size]} row-major, symmetric
     */
    public double[] inverse() {
        double[] inverse = new double[size * size];
        double[] unit = new double[size];
        for (int column = 0; column < size; column++) {
            Arrays.fill(unit, 0);
            unit[column] = 1;
            solve(unit);
            for (int row = 0; row < size; row++) {
                inverse[row * size + column] = unit[row];
            }
        }
        return inverse;
    }
}
