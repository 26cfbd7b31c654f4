package org.solewright.analysis.fitting;

import java.util.List;
import java.util.Optional;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.LUDecomposition;
import org.apache.commons.math3.linear.MatrixUtils;
import org.apache.commons.math3.linear.RealMatrix;
import org.apache.commons.math3.linear.SingularValueDecomposition;
import org.solewright.domain.geometry.Rotation;
import org.solewright.domain.geometry.Vec3;

/**
 * The axis that two segments have in common while they turn against each other: the pair of directions, one fixed to
 * each, that lie together best over all frames, as in the symmetrical axis of rotation approach [Ehrig et al. 2007] (from
 * memory; only its directions, and by the singular vectors of the mean rotation, which minimise the same sum of squares).
 *
 * @param proximal unit vector fixed to the proximal segment, in the frame of the reference posture
 * @param distal the same line fixed to the distal segment, likewise; equal to {@code proximal} for a perfect hinge
 * @param range largest less smallest turn about it, rad
 * @param spread standard deviation of the turn about it, rad
 * @param residual root mean square angle between the two directions, rad: what one hinge leaves over
 */
public record MotionAxis(Vec3 proximal, Vec3 distal, double range, double spread, double residual) {

    /** Range from which motion shows an axis, rad (design 03 section 5: 10 deg). */
    public static final double LEAST_RANGE = Math.toRadians(10);

    /** Residual up to which one hinge tells the motion, rad (design 03 section 5: 2 deg). */
    public static final double LARGEST_RESIDUAL = Math.toRadians(2);

    private static final int FEWEST = 3;

    /**
     * The common axis.
     *
     * @param relative turn of the distal segment in the proximal one, from the reference posture to each frame: R_p^T R_d
     * @return the axis; empty for fewer than three frames or where nothing turns
     */
    public static Optional<MotionAxis> of(List<Rotation> relative) {
        if (relative.size() < FEWEST) {
            return Optional.empty();
        }
        SingularValueDecomposition svd = new SingularValueDecomposition(sum(relative));
        double[] s = svd.getSingularValues();
        // Without a turn all directions lie together: the second value is as large as the first.
        if (!(s[0] - s[1] > 1e-12 * s[0])) {
            return Optional.empty();
        }
        Vec3 proximal = column(svd.getU(), 0);
        Vec3 distal = column(svd.getV(), 0);
        Rotation together = carrying(distal, proximal);
        Vec3 e = perpendicular(proximal);
        Vec3 f = proximal.cross(e);
        double[] turns = new double[relative.size()];
        double squares = 0;
        for (int i = 0; i < turns.length; i++) {
            Rotation r = relative.get(i).times(together.inverse());
            Vec3 turned = r.transformVector(e);
            turns[i] = Math.atan2(turned.dot(f), turned.dot(e));
            Vec3 carried = relative.get(i).transformVector(distal);
            double apart = Math.atan2(carried.cross(proximal).norm(), carried.dot(proximal));
            squares += apart * apart;
        }
        return Optional.of(turning(proximal, distal, turns, Math.sqrt(squares / turns.length)));
    }

    private static MotionAxis turning(Vec3 proximal, Vec3 distal, double[] turns, double residual) {
        double least = 0;
        double most = 0;
        double sum = 0;
        double squares = 0;
        for (double turn : turns) {
            double t = Math.IEEEremainder(turn - turns[0], 2 * Math.PI);
            least = Math.min(least, t);
            most = Math.max(most, t);
            sum += t;
            squares += t * t;
        }
        double mean = sum / turns.length;
        double spread = Math.sqrt(Math.max(0, squares / turns.length - mean * mean));
        return new MotionAxis(proximal, distal, most - least, spread, residual);
    }

    /**
     * The mean of rotations, the one nearest to all in the sense of least squares of their elements.
     *
     * @param rotations one or more
     * @return the mean
     * @throws IllegalArgumentException where there is none
     */
    public static Rotation mean(List<Rotation> rotations) {
        if (rotations.isEmpty()) {
            throw new IllegalArgumentException("mean of 0 rotations, expected at least 1");
        }
        SingularValueDecomposition svd = new SingularValueDecomposition(sum(rotations));
        RealMatrix u = svd.getU();
        double det = new LUDecomposition(u.multiply(svd.getVT())).getDeterminant() < 0 ? -1 : 1;
        RealMatrix r = u.multiply(MatrixUtils.createRealDiagonalMatrix(new double[] {1, 1, det}))
                .multiply(svd.getVT());
        return new Rotation(column(r, 0), column(r, 1), column(r, 2));
    }

    /** Whether motion may stand for the anatomical line. */
    public boolean isAccepted() {
        return range > LEAST_RANGE && residual < LARGEST_RESIDUAL;
    }

    /**
     * Standard deviation of the direction from the residual: what a hinge leaves over tilts the axis the more, the less the
     * joint turns.
     *
     * @param independent number of independent looks at it, 1 or more
     * @return rad
     */
    public double sd(double independent) {
        return residual / (spread * Math.sqrt(Math.max(1, independent)));
    }

    private static RealMatrix sum(List<Rotation> rotations) {
        double[][] m = new double[3][3];
        for (Rotation r : rotations) {
            add(m, 0, r.x());
            add(m, 1, r.y());
            add(m, 2, r.z());
        }
        return new Array2DRowRealMatrix(m, false);
    }

    private static void add(double[][] m, int column, Vec3 v) {
        m[0][column] += v.x();
        m[1][column] += v.y();
        m[2][column] += v.z();
    }

    private static Vec3 column(RealMatrix m, int column) {
        return new Vec3(m.getEntry(0, column), m.getEntry(1, column), m.getEntry(2, column));
    }

    private static Vec3 perpendicular(Vec3 a) {
        return a.cross(Math.abs(a.x()) < 0.5 ? Vec3.X : Vec3.Y).unit();
    }

    /** The shortest rotation from one unit vector to another that is not opposite to it. */
    private static Rotation carrying(Vec3 from, Vec3 to) {
        Vec3 axis = from.cross(to);
        Vec3 side = axis.norm() > 1e-12 ? axis.unit() : perpendicular(from);
        Rotation a = new Rotation(from, side, from.cross(side));
        Rotation b = new Rotation(to, side, to.cross(side));
        return b.times(a.inverse());
    }
}
