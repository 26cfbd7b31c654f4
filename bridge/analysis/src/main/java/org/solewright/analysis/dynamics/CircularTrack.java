package org.solewright.analysis.dynamics;

import java.util.Locale;
import org.apache.commons.math3.geometry.euclidean.threed.Rotation;
import org.apache.commons.math3.geometry.euclidean.threed.RotationConvention;
import org.apache.commons.math3.geometry.euclidean.threed.Vector3D;

/**
 * A sphere that rolls without slip or spin along a circle on the ground, starting forward along x. On its surface the track
 * becomes a small circle, tan(angular radius) = track radius over sphere radius [derived].
 *
 * @param trackRadius m
 * @param sphereRadius m
 * @param turnAngle rad, to the left positive
 */
public record CircularTrack(double trackRadius, double sphereRadius, double turnAngle) {

    /**
     * A track.
     *
     * @param trackRadius m
     * @param sphereRadius m
     * @param turnAngle rad, to the left positive
     * @return the track
     * @throws LimitException NONPOSITIVE_RADIUS
     */
    public static CircularTrack of(double trackRadius, double sphereRadius, double turnAngle) throws LimitException {
        SprawledLimb.requireSphere(sphereRadius);
        if (!(trackRadius > 0)) {
            throw new LimitException(
                    Limit.NONPOSITIVE_RADIUS,
                    String.format(Locale.ROOT, "track radius %s m, expected more than 0 m", trackRadius));
        }
        return new CircularTrack(trackRadius, sphereRadius, turnAngle);
    }

    /**
     * Angular radius of the small circle.
     *
     * @return rad
     */
    public double circleAngle() {
        return Math.atan2(trackRadius, sphereRadius);
    }

    /**
     * Angle about the small circle's own centre.
     *
     * @return rad
     */
    public double sphereArcAngle() {
        return turnAngle * Math.hypot(1, trackRadius / sphereRadius);
    }

    /**
     * Orientation of the foot at the end, foot to world: a turn with the track after one about the axis that is fixed beside
     * it.
     *
     * @return {@code [9]} row-major
     */
    public double[] rotationEnd() {
        double ratio = trackRadius / sphereRadius;
        Vector3D axis = new Vector3D(0, ratio, -1);
        Rotation own = new Rotation(axis, turnAngle * axis.getNorm(), RotationConvention.VECTOR_OPERATOR);
        Rotation turn = new Rotation(Vector3D.PLUS_K, turnAngle, RotationConvention.VECTOR_OPERATOR);
        double[][] m = turn.compose(own, RotationConvention.VECTOR_OPERATOR).getMatrix();
        double[] flat = new double[9];
        for (int i = 0; i < 9; i++) {
            flat[i] = m[i / 3][i % 3];
        }
        return flat;
    }

    /**
     * The contact at the end in the foot's frame.
     *
     * @return {@code [3]}, m
     */
    public double[] contactEnd() {
        double[] r = rotationEnd();
        return new double[] {-sphereRadius * r[6], -sphereRadius * r[7], -sphereRadius * r[8]};
    }
}
