package org.solewright.analysis.fitting;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.LUDecomposition;
import org.apache.commons.math3.linear.MatrixUtils;
import org.apache.commons.math3.linear.RealMatrix;
import org.apache.commons.math3.linear.SingularValueDecomposition;
import org.solewright.domain.geometry.Pose;
import org.solewright.domain.geometry.Rotation;
import org.solewright.domain.geometry.Vec3;

/**
 * The pose that carries a body's points from where they were in a reference to where they are now, by weighted least
 * squares, det = +1 [Soederkvist Wedin 1993].
 *
 * @param pose turns positions and directions of the reference into present ones
 * @param points number of points that were there in both
 * @param rms weighted root mean square distance between the carried points and the present ones, m
 * @param shapeChange root mean square change of the distances between the points, all pairs alike, m; unlike
 *     {@code rms} it does not depend on the fit
 */
public record RigidFit(Pose pose, int points, double rms, double shapeChange) {

    private static final int FEWEST_POINTS = 3;

    /** Spread across a line over spread along it, squared, below which the turn about the line is not known. */
    private static final double COLLINEAR = 1e-8;

    /**
     * Fits with equal weights.
     *
     * @param reference {@code [points][3]} row-major, m; NaN where a point is lost; not modified
     * @param present the same points now, likewise
     * @return the fit; empty where fewer than three points are there in both, or they lie on one line
     * @throws IllegalArgumentException where the lengths differ or are not a multiple of three
     */
    public static Optional<RigidFit> of(double[] reference, double[] present) {
        double[] weights = new double[reference.length / 3];
        Arrays.fill(weights, 1);
        return of(reference, present, weights);
    }

    /**
     * Fits with equal weights.
     *
     * @param reference positions, m; NaN where lost
     * @param present the same points now, in the same order
     * @return the fit; empty where fewer than three points are there in both, or they lie on one line
     * @throws IllegalArgumentException where the lists differ in length
     */
    public static Optional<RigidFit> of(List<Vec3> reference, List<Vec3> present) {
        return of(flat(reference), flat(present));
    }

    /**
     * Fits with given weights.
     *
     * @param reference {@code [points][3]} row-major, m; NaN where a point is lost; not modified
     * @param present the same points now, likewise
     * @param weights one per point, not negative; a point of weight 0 is left out; not modified
     * @return the fit; empty where fewer than three points are there in both, or they lie on one line
     * @throws IllegalArgumentException where the lengths do not belong together
     */
    public static Optional<RigidFit> of(double[] reference, double[] present, double[] weights) {
        if (reference.length != present.length || reference.length != 3 * weights.length) {
            throw new IllegalArgumentException("rigid fit of " + reference.length + " to " + present.length
                    + " components with " + weights.length + " weights, expected 3 components to a weight");
        }
        double[] used = usable(reference, present, weights);
        int points = 0;
        double total = 0;
        for (double w : used) {
            points += w > 0 ? 1 : 0;
            total += w;
        }
        if (points < FEWEST_POINTS) {
            return Optional.empty();
        }
        int count = points;
        Vec3 from = mean(reference, used, total);
        Vec3 to = mean(present, used, total);
        return rotation(reference, from, present, to, used).map(r -> {
            Pose pose = new Pose(r, to.minus(r.transformVector(from)));
            return new RigidFit(
                    pose, count, rms(pose, reference, present, used), shapeChange(reference, present, used));
        });
    }

    private static double[] usable(double[] reference, double[] present, double[] weights) {
        double[] used = new double[weights.length];
        for (int i = 0; i < used.length; i++) {
            double sum = 0;
            for (int k = 3 * i; k < 3 * i + 3; k++) {
                sum += reference[k] + present[k];
            }
            used[i] = Double.isNaN(sum) || !(weights[i] > 0) ? 0 : weights[i];
        }
        return used;
    }

    private static Vec3 mean(double[] xyz, double[] used, double total) {
        double x = 0;
        double y = 0;
        double z = 0;
        for (int i = 0; i < used.length; i++) {
            if (used[i] > 0) {
                x += used[i] * xyz[3 * i];
                y += used[i] * xyz[3 * i + 1];
                z += used[i] * xyz[3 * i + 2];
            }
        }
        return new Vec3(x / total, y / total, z / total);
    }

    private static Optional<Rotation> rotation(double[] a, Vec3 from, double[] b, Vec3 to, double[] used) {
        double[][] c = new double[3][3];
        double[] p = new double[3];
        double[] q = new double[3];
        for (int i = 0; i < used.length; i++) {
            if (used[i] > 0) {
                centred(a, i, from, p);
                centred(b, i, to, q);
                for (int row = 0; row < 3; row++) {
                    for (int column = 0; column < 3; column++) {
                        c[row][column] += used[i] * q[row] * p[column];
                    }
                }
            }
        }
        SingularValueDecomposition svd = new SingularValueDecomposition(new Array2DRowRealMatrix(c, false));
        double[] s = svd.getSingularValues();
        if (!(s[1] > COLLINEAR * s[0])) {
            return Optional.empty();
        }
        RealMatrix u = svd.getU();
        RealMatrix vt = svd.getVT();
        double det = new LUDecomposition(u.multiply(vt)).getDeterminant() < 0 ? -1 : 1;
        RealMatrix r = u.multiply(MatrixUtils.createRealDiagonalMatrix(new double[] {1, 1, det}))
                .multiply(vt);
        return Optional.of(new Rotation(column(r, 0), column(r, 1), column(r, 2)));
    }

    private static void centred(double[] xyz, int i, Vec3 mean, double[] out) {
        out[0] = xyz[3 * i] - mean.x();
        out[1] = xyz[3 * i + 1] - mean.y();
        out[2] = xyz[3 * i + 2] - mean.z();
    }

    private static Vec3 column(RealMatrix m, int column) {
        return new Vec3(m.getEntry(0, column), m.getEntry(1, column), m.getEntry(2, column));
    }

    private static Vec3 point(double[] xyz, int i) {
        return new Vec3(xyz[3 * i], xyz[3 * i + 1], xyz[3 * i + 2]);
    }

    private static double rms(Pose pose, double[] a, double[] b, double[] used) {
        double sum = 0;
        double total = 0;
        for (int i = 0; i < used.length; i++) {
            if (used[i] > 0) {
                Vec3 d = pose.transformPosition(point(a, i)).minus(point(b, i));
                sum += used[i] * d.dot(d);
                total += used[i];
            }
        }
        return Math.sqrt(sum / total);
    }

    private static double shapeChange(double[] a, double[] b, double[] used) {
        double sum = 0;
        int pairs = 0;
        for (int i = 0; i < used.length; i++) {
            for (int j = i + 1; j < used.length; j++) {
                if (used[i] > 0 && used[j] > 0) {
                    double change =
                            point(b, i).distance(point(b, j)) - point(a, i).distance(point(a, j));
                    sum += change * change;
                    pairs++;
                }
            }
        }
        return Math.sqrt(sum / pairs);
    }

    private static double[] flat(List<Vec3> positions) {
        double[] xyz = new double[3 * positions.size()];
        for (int i = 0; i < positions.size(); i++) {
            xyz[3 * i] = positions.get(i).x();
            xyz[3 * i + 1] = positions.get(i).y();
            xyz[3 * i + 2] = positions.get(i).z();
        }
        return xyz;
    }
}
