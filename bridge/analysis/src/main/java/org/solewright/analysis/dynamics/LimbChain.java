package org.solewright.analysis.dynamics;

import java.util.Arrays;
import java.util.List;

/**
 * Rigid segments that hang from a hip with a point mass, in the sagittal plane: x forward, z up. Coordinates are the hip's
 * place and the absolute angle of every segment, whose direction is (sin a, -cos a) from its proximal end.
 *
 * @param hipMass kg, not negative
 * @param segments each after the one it hangs from
 */
public record LimbChain(double hipMass, List<Segment> segments) {

    /** Rows of the hip in the coordinates. */
    static final int HIP = 2;

    /**
     * A segment.
     *
     * @param parent index of the segment at whose distal end it hangs, -1 for the hip
     * @param length m, not negative
     * @param mass kg, not negative
     * @param centre distance of the centre of mass from the proximal end, m
     * @param inertia about the centre of mass, kg m2, not negative
     * @param angle rad
     * @param rate rad/s, before the impact
     */
    public record Segment(
            int parent, double length, double mass, double centre, double inertia, double angle, double rate) {}

    /** Copies the list and checks its order. */
    public LimbChain {
        segments = List.copyOf(segments);
        for (int i = 0; i < segments.size(); i++) {
            int parent = segments.get(i).parent();
            if (parent < -1 || parent >= i) {
                throw new IllegalArgumentException(
                        "segment " + i + " hangs from " + parent + ", expected -1 for the hip or a segment before it");
            }
        }
    }

    /**
     * Number of coordinates.
     *
     * @return 2 more than segments
     */
    public int coordinates() {
        return HIP + segments.size();
    }

    /**
     * Adds the row of a point's velocity in a direction to a matrix.
     *
     * @param segment index, -1 for the hip
     * @param distance from the segment's proximal end, m
     * @param x component of the direction
     * @param z component of the direction
     * @param out receives the row, {@code coordinates()} values, overwritten
     */
    void pointRow(int segment, double distance, double x, double z, double[] out) {
        Arrays.fill(out, 0);
        out[0] = x;
        out[1] = z;
        double along = distance;
        for (int s = segment; s >= 0; s = segments.get(s).parent()) {
            double angle = segments.get(s).angle();
            out[HIP + s] = along * (x * Math.cos(angle) + z * Math.sin(angle));
            int parent = segments.get(s).parent();
            along = parent >= 0 ? segments.get(parent).length() : 0;
        }
    }

    /** The mass matrix, row by row. */
    double[][] massMatrix() {
        int n = coordinates();
        double[][] mass = new double[n][n];
        mass[0][0] = hipMass;
        mass[1][1] = hipMass;
        double[] x = new double[n];
        double[] z = new double[n];
        for (int s = 0; s < segments.size(); s++) {
            Segment segment = segments.get(s);
            pointRow(s, segment.centre(), 1, 0, x);
            pointRow(s, segment.centre(), 0, 1, z);
            for (int i = 0; i < n; i++) {
                for (int j = 0; j < n; j++) {
                    mass[i][j] += segment.mass() * (x[i] * x[j] + z[i] * z[j]);
                }
            }
            mass[HIP + s][HIP + s] += segment.inertia();
        }
        return mass;
    }
}
