package org.solewright.analysis.fitting;

import java.util.List;
import org.solewright.domain.geometry.Pose;
import org.solewright.domain.geometry.Rotation;
import org.solewright.domain.geometry.Vec3;

/**
 * A posture of a chain with the sums over its points that the normal equations need. Rotations R turn standing
 * directions into present ones, positions p are those of the joint with the parent; laboratory frame. Flat arrays, no
 * allocation after construction.
 */
final class ChainState {

    private static final double SMALL_ANGLE = 1e-8;

    /** Per segment and its descendants: weight, weighted x, xx (xx, xy, xz, yy, yz, zz), d, x cross d. */
    private static final int SUMS = 16;

    private final ChainLayout layout;
    private final double[] rotation;
    private final double[] position;
    private final double[] sums;
    private final double[] turn;
    private final double[] own = new double[9];
    private double cost;
    private double weight;

    ChainState(ChainLayout layout) {
        this.layout = layout;
        rotation = new double[9 * layout.segments];
        position = new double[3 * layout.segments];
        sums = new double[SUMS * layout.segments];
        turn = new double[9 * layout.segments];
    }

    double cost() {
        return cost;
    }

    /** Sum of the weights of the points that were there. */
    double weight() {
        return weight;
    }

    Pose pose(int segment) {
        int r = 9 * segment;
        Rotation turned = new Rotation(
                new Vec3(rotation[r], rotation[r + 3], rotation[r + 6]),
                new Vec3(rotation[r + 1], rotation[r + 4], rotation[r + 7]),
                new Vec3(rotation[r + 2], rotation[r + 5], rotation[r + 8]));
        int c = 3 * segment;
        Vec3 centre = new Vec3(layout.centre[c], layout.centre[c + 1], layout.centre[c + 2]);
        Vec3 here = new Vec3(position[c], position[c + 1], position[c + 2]);
        return new Pose(turned, here.minus(turned.transformVector(centre)));
    }

    /** Sets the rotations and puts the chain where its points are on the mean. */
    void place(List<Rotation> rotations, double[] present) {
        for (int s = 0; s < layout.segments; s++) {
            Rotation r = rotations.get(s);
            Vec3[] columns = {r.x(), r.y(), r.z()};
            for (int k = 0; k < 3; k++) {
                rotation[9 * s + k] = columns[k].x();
                rotation[9 * s + 3 + k] = columns[k].y();
                rotation[9 * s + 6 + k] = columns[k].z();
            }
        }
        position[0] = 0;
        position[1] = 0;
        position[2] = 0;
        hang();
        evaluate(present);
        if (weight > 0) {
            for (int k = 0; k < 3; k++) {
                position[k] = sums[10 + k] / weight;
            }
        }
        hang();
        evaluate(present);
    }

    private void hang() {
        for (int s = 1; s < layout.segments; s++) {
            int parent = layout.parent[s];
            turned(rotation, 9 * parent, layout.offset, 3 * s, position, 3 * s);
            for (int k = 0; k < 3; k++) {
                position[3 * s + k] += position[3 * parent + k];
            }
        }
    }

    /** out = M v. */
    private static void turned(double[] m, int at, double[] v, int from, double[] out, int to) {
        double x = v[from];
        double y = v[from + 1];
        double z = v[from + 2];
        out[to] = m[at] * x + m[at + 1] * y + m[at + 2] * z;
        out[to + 1] = m[at + 3] * x + m[at + 4] * y + m[at + 5] * z;
        out[to + 2] = m[at + 6] * x + m[at + 7] * y + m[at + 8] * z;
    }

    /** The hinge's axis now. */
    private void hinge(int s, double[] out) {
        turned(rotation, 9 * layout.parent[s], layout.axis, 3 * s, out, 0);
    }

    /**
     * Makes this the posture {@code from} moved by a step: translation and turn of the first segment, then the turn of
     * every other one about its joint, which carries all below it.
     */
    void moved(ChainState from, double[] step) {
        rotationOf(step[3], step[4], step[5], turn, 0);
        multiply(turn, 0, from.rotation, 0, rotation, 0);
        for (int k = 0; k < 3; k++) {
            position[k] = from.position[k] + step[k];
        }
        double[] axis = layout.scratch;
        for (int s = 1; s < layout.segments; s++) {
            int first = layout.first[s];
            if (layout.freedoms[s] == 1) {
                from.hinge(s, axis);
                rotationOf(step[first] * axis[0], step[first] * axis[1], step[first] * axis[2], own, 0);
            } else {
                rotationOf(step[first], step[first + 1], step[first + 2], own, 0);
            }
            multiply(turn, 9 * layout.parent[s], own, 0, turn, 9 * s);
            multiply(turn, 9 * s, from.rotation, 9 * s, rotation, 9 * s);
        }
        hang();
    }

    /** Rotation by a vector, radians along its axis, row-major. */
    private static void rotationOf(double x, double y, double z, double[] out, int at) {
        double square = x * x + y * y + z * z;
        double angle = Math.sqrt(square);
        double a = angle < SMALL_ANGLE ? 1 : Math.sin(angle) / angle;
        double half = Math.sin(angle / 2);
        double b = angle < SMALL_ANGLE ? 0.5 : 2 * half * half / square;
        out[at] = 1 - b * (y * y + z * z);
        out[at + 1] = b * x * y - a * z;
        out[at + 2] = b * x * z + a * y;
        out[at + 3] = b * x * y + a * z;
        out[at + 4] = 1 - b * (x * x + z * z);
        out[at + 5] = b * y * z - a * x;
        out[at + 6] = b * x * z - a * y;
        out[at + 7] = b * y * z + a * x;
        out[at + 8] = 1 - b * (x * x + y * y);
    }

    private static void multiply(double[] a, int i, double[] b, int j, double[] out, int o) {
        for (int row = 0; row < 9; row += 3) {
            for (int column = 0; column < 3; column++) {
                out[o + row + column] = a[i + row] * b[j + column]
                        + a[i + row + 1] * b[j + 3 + column]
                        + a[i + row + 2] * b[j + 6 + column];
            }
        }
    }

    /** Takes rounding out of the rotations. */
    void orthonormalise() {
        for (int s = 0; s < layout.segments; s++) {
            int r = 9 * s;
            scale(r);
            double dot = rotation[r] * rotation[r + 3]
                    + rotation[r + 1] * rotation[r + 4]
                    + rotation[r + 2] * rotation[r + 5];
            for (int k = 0; k < 3; k++) {
                rotation[r + 3 + k] -= dot * rotation[r + k];
            }
            scale(r + 3);
            for (int k = 0; k < 3; k++) {
                int l = (k + 1) % 3;
                int m = (k + 2) % 3;
                rotation[r + 6 + k] = rotation[r + l] * rotation[r + 3 + m] - rotation[r + m] * rotation[r + 3 + l];
            }
        }
    }

    private void scale(int row) {
        double norm = Math.sqrt(rotation[row] * rotation[row]
                + rotation[row + 1] * rotation[row + 1]
                + rotation[row + 2] * rotation[row + 2]);
        for (int k = 0; k < 3; k++) {
            rotation[row + k] /= norm;
        }
    }

    /** Where a point is carried to. */
    void carried(int point, double[] out, int at) {
        int s = layout.carrier[point];
        turned(rotation, 9 * s, layout.arm, 3 * point, out, at);
        for (int k = 0; k < 3; k++) {
            out[at + k] += position[3 * s + k];
        }
    }

    /** Sums over the points, those of a segment including all that hangs on it; positions from the first joint. */
    void evaluate(double[] present) {
        java.util.Arrays.fill(sums, 0);
        cost = 0;
        weight = 0;
        double[] p = layout.scratch;
        for (int point = 0; point < layout.points; point++) {
            double y0 = present[3 * point];
            double y1 = present[3 * point + 1];
            double y2 = present[3 * point + 2];
            if (!Double.isNaN(y0 + y1 + y2)) {
                carried(point, p, 0);
                add(layout.carrier[point], layout.weight[point], y0, y1, y2);
            }
        }
        for (int s = layout.segments - 1; s > 0; s--) {
            int to = SUMS * layout.parent[s];
            for (int k = 0; k < SUMS; k++) {
                sums[to + k] += sums[SUMS * s + k];
            }
        }
        weight = sums[0];
    }

    private void add(int segment, double w, double y0, double y1, double y2) {
        double[] p = layout.scratch;
        double d0 = y0 - p[0];
        double d1 = y1 - p[1];
        double d2 = y2 - p[2];
        double x = p[0] - position[0];
        double y = p[1] - position[1];
        double z = p[2] - position[2];
        cost += w * (d0 * d0 + d1 * d1 + d2 * d2);
        int at = SUMS * segment;
        sums[at] += w;
        sums[at + 1] += w * x;
        sums[at + 2] += w * y;
        sums[at + 3] += w * z;
        sums[at + 4] += w * x * x;
        sums[at + 5] += w * x * y;
        sums[at + 6] += w * x * z;
        sums[at + 7] += w * y * y;
        sums[at + 8] += w * y * z;
        sums[at + 9] += w * z * z;
        sums[at + 10] += w * d0;
        sums[at + 11] += w * d1;
        sums[at + 12] += w * d2;
        sums[at + 13] += w * (y * d2 - z * d1);
        sums[at + 14] += w * (z * d0 - x * d2);
        sums[at + 15] += w * (x * d1 - y * d0);
    }

    /**
     * Normal matrix and right side of the step. A turn u about a joint at p moves a point at x by u x (x - p); with
     * E = sum w (x - p_a)(x - p_b)^T over the points below b, the block of two turns is tr(E) I - E^T.
     *
     * @param normal receives the lower triangle, row-major {@code [parameters][parameters]}
     * @param right receives J^T W d
     */
    void normalEquations(double[] normal, double[] right) {
        int n = layout.parameters;
        java.util.Arrays.fill(normal, 0);
        for (int k = 0; k < 3; k++) {
            normal[k * n + k] = sums[0];
            right[k] = sums[10 + k];
        }
        double[] block = layout.block;
        double[] axisA = layout.axisA;
        double[] axisB = layout.axisB;
        for (int b = 0; b < layout.segments; b++) {
            int countB = freedoms(b, axisB);
            int firstB = b == 0 ? 3 : layout.first[b];
            turnRight(b, countB, firstB, right);
            translationBlock(b, countB, firstB, normal);
            for (int a = b; a >= 0; a = layout.parent[a]) {
                int countA = freedoms(a, axisA);
                int firstA = a == 0 ? 3 : layout.first[a];
                block(a, b, block);
                for (int i = 0; i < countB; i++) {
                    for (int j = 0; j < countA; j++) {
                        double sum = 0;
                        for (int u = 0; u < 3; u++) {
                            for (int v = 0; v < 3; v++) {
                                sum += axisA[3 * j + u] * block[3 * u + v] * axisB[3 * i + v];
                            }
                        }
                        normal[(firstB + i) * n + firstA + j] = sum;
                    }
                }
            }
        }
    }

    /** The directions a segment may turn about, rows of {@code out}. */
    private int freedoms(int s, double[] out) {
        if (s > 0 && layout.freedoms[s] == 1) {
            hinge(s, out);
            return 1;
        }
        java.util.Arrays.fill(out, 0);
        out[0] = 1;
        out[4] = 1;
        out[8] = 1;
        return 3;
    }

    private void turnRight(int b, int count, int first, double[] right) {
        int at = SUMS * b;
        double x = position[3 * b] - position[0];
        double y = position[3 * b + 1] - position[1];
        double z = position[3 * b + 2] - position[2];
        double m0 = sums[at + 13] - (y * sums[at + 12] - z * sums[at + 11]);
        double m1 = sums[at + 14] - (z * sums[at + 10] - x * sums[at + 12]);
        double m2 = sums[at + 15] - (x * sums[at + 11] - y * sums[at + 10]);
        double[] axis = layout.axisB;
        for (int i = 0; i < count; i++) {
            right[first + i] = axis[3 * i] * m0 + axis[3 * i + 1] * m1 + axis[3 * i + 2] * m2;
        }
    }

    /** Rows of the turns of b, columns of the translation. */
    private void translationBlock(int b, int count, int first, double[] normal) {
        int at = SUMS * b;
        double q0 = sums[at + 1] - sums[at] * (position[3 * b] - position[0]);
        double q1 = sums[at + 2] - sums[at] * (position[3 * b + 1] - position[1]);
        double q2 = sums[at + 3] - sums[at] * (position[3 * b + 2] - position[2]);
        double[] axis = layout.axisB;
        for (int i = 0; i < count; i++) {
            int row = (first + i) * layout.parameters;
            double u0 = axis[3 * i];
            double u1 = axis[3 * i + 1];
            double u2 = axis[3 * i + 2];
            normal[row] = u1 * q2 - u2 * q1;
            normal[row + 1] = u2 * q0 - u0 * q2;
            normal[row + 2] = u0 * q1 - u1 * q0;
        }
    }

    private void block(int a, int b, double[] out) {
        int at = SUMS * b;
        double trace = 0;
        for (int i = 0; i < 3; i++) {
            double pa = position[3 * a + i] - position[i];
            for (int j = 0; j < 3; j++) {
                double pb = position[3 * b + j] - position[j];
                double e = sums[at + layout.second(i, j)]
                        - sums[at + 1 + i] * pb
                        - pa * sums[at + 1 + j]
                        + sums[at] * pa * pb;
                out[3 * j + i] = -e;
                trace += i == j ? e : 0;
            }
        }
        out[0] += trace;
        out[4] += trace;
        out[8] += trace;
    }
}
