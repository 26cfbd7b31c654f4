package org.solewright.analysis.numerics;

import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.QRDecomposition;
import org.apache.commons.math3.linear.RealMatrix;
import org.apache.commons.math3.linear.SingularValueDecomposition;

/** Right singular vectors of a tall matrix with few columns, singular values falling. */
public final class SingularVectors {

    private final double[] values;
    private final RealMatrix vectors;

    private SingularVectors(double[] values, RealMatrix vectors) {
        this.values = values;
        this.vectors = vectors;
    }

    /**
     * Decomposes a matrix; its triangular factor is taken first, which leaves values and vectors as they are.
     *
     * @param rows {@code [rows][columns]} row-major, finite, unmodified
     * @param columns number of columns, 1 or more
     * @return the vectors
     */
    public static SingularVectors of(double[] rows, int columns) {
        int count = rows.length / columns;
        double[][] m = new double[Math.max(count, columns)][columns];
        for (int row = 0; row < count; row++) {
            System.arraycopy(rows, row * columns, m[row], 0, columns);
        }
        RealMatrix triangle = new QRDecomposition(new Array2DRowRealMatrix(m, false))
                .getR()
                .getSubMatrix(0, columns - 1, 0, columns - 1);
        SingularValueDecomposition svd = new SingularValueDecomposition(triangle);
        return new SingularVectors(svd.getSingularValues(), svd.getV());
    }

    /**
     * A singular value.
     *
     * @param index zero-based, largest first
     * @return not negative
     */
    public double value(int index) {
        return values[index];
    }

    /**
     * A component of a right singular vector.
     *
     * @param row component
     * @param index which vector, that of the largest value first
     * @return component of a unit vector
     */
    public double vector(int row, int index) {
        return vectors.getEntry(row, index);
    }
}
