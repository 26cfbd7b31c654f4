package org.solewright.analysis.fitting;

import java.util.Arrays;
import java.util.List;
import org.solewright.domain.foot.InertiaTensor;
import org.solewright.domain.geometry.Vec3;

/**
 * A solid of density one as a heap of tetrahedra, so that it can be mapped, cut by any plane and weighed without error
 * beyond rounding: the parts of a cut sum to the whole.
 */
final class TetrahedralSolid {

    private static final int COMPONENTS = 12;
    private static final int SECTORS = 48;

    /** {@code [tetrahedra][4][3]} row-major, m. */
    private final double[] xyz;

    private TetrahedralSolid(double[] xyz) {
        this.xyz = xyz;
    }

    /**
     * An ellipse in a plane normal to x.
     *
     * @param x where it lies, m
     * @param y its centre, m
     * @param z its centre, m
     * @param height half axis along y, m, more than 0
     * @param width half axis along z, m, more than 0
     */
    record Section(double x, double y, double z, double height, double width) {}

    /**
     * Elliptic frusta through sections. Each ellipse stands as a polygon of the same area.
     *
     * @param sections two or more, with rising x
     * @return the solid
     */
    static TetrahedralSolid frusta(List<Section> sections) {
        Heap heap = new Heap();
        for (int i = 1; i < sections.size(); i++) {
            double[][] rear = rim(sections.get(i - 1));
            double[][] front = rim(sections.get(i));
            for (int k = 1; k <= SECTORS; k++) {
                int next = k % SECTORS + 1;
                heap.prism(rear[0], rear[k], rear[next], front[0], front[k], front[next]);
            }
        }
        return new TetrahedralSolid(heap.content());
    }

    private static double[][] rim(Section s) {
        double step = 2 * Math.PI / SECTORS;
        double sameArea = Math.sqrt(step / Math.sin(step));
        double[][] rim = new double[SECTORS + 1][];
        rim[0] = new double[] {s.x, s.y, s.z};
        for (int k = 0; k < SECTORS; k++) {
            rim[k + 1] = new double[] {
                s.x, s.y + sameArea * s.height * Math.cos(k * step), s.z + sameArea * s.width * Math.sin(k * step)
            };
        }
        return rim;
    }

    /**
     * The solid under an affine map.
     *
     * @param map linear part
     * @param from the place that goes to {@code to}, m
     * @param to m
     * @return the mapped solid
     */
    TetrahedralSolid mapped(SymmetricMap map, Vec3 from, Vec3 to) {
        double[] out = new double[xyz.length];
        for (int i = 0; i < xyz.length; i += 3) {
            double x = xyz[i] - from.x();
            double y = xyz[i + 1] - from.y();
            double z = xyz[i + 2] - from.z();
            out[i] = to.x() + map.entry(0, 0) * x + map.entry(0, 1) * y + map.entry(0, 2) * z;
            out[i + 1] = to.y() + map.entry(1, 0) * x + map.entry(1, 1) * y + map.entry(1, 2) * z;
            out[i + 2] = to.z() + map.entry(2, 0) * x + map.entry(2, 1) * y + map.entry(2, 2) * z;
        }
        return new TetrahedralSolid(out);
    }

    /**
     * The part on one side of a plane.
     *
     * @param point of the plane, m
     * @param normal of the plane; the part it points away from is kept
     * @return that part, empty where the solid lies on the other side
     */
    TetrahedralSolid behind(Vec3 point, Vec3 normal) {
        Heap heap = new Heap();
        double[][] inside = new double[4][];
        double[][] outside = new double[4][];
        for (int t = 0; t < xyz.length; t += COMPONENTS) {
            int in = 0;
            int out = 0;
            for (int corner = t; corner < t + COMPONENTS; corner += 3) {
                double distance = (xyz[corner] - point.x()) * normal.x()
                        + (xyz[corner + 1] - point.y()) * normal.y()
                        + (xyz[corner + 2] - point.z()) * normal.z();
                double[] p = {xyz[corner], xyz[corner + 1], xyz[corner + 2], distance};
                if (distance <= 0) {
                    inside[in++] = p;
                } else {
                    outside[out++] = p;
                }
            }
            keep(heap, inside, in, outside);
        }
        return new TetrahedralSolid(heap.content());
    }

    private static void keep(Heap heap, double[][] inside, int in, double[][] outside) {
        double[] a = inside[0];
        double[] b = inside[1];
        double[] c = inside[2];
        switch (in) {
            case 1 -> heap.tetrahedron(a, cut(a, outside[0]), cut(a, outside[1]), cut(a, outside[2]));
            case 2 -> heap.prism(a, cut(a, outside[0]), cut(a, outside[1]), b, cut(b, outside[0]), cut(b, outside[1]));
            case 3 -> heap.prism(a, b, c, cut(a, outside[0]), cut(b, outside[0]), cut(c, outside[0]));
            case 4 -> heap.tetrahedron(a, b, c, inside[3]);
            default -> {
                // wholly on the other side
            }
        }
    }

    private static double[] cut(double[] in, double[] out) {
        double k = in[3] / (in[3] - out[3]);
        return new double[] {in[0] + k * (out[0] - in[0]), in[1] + k * (out[1] - in[1]), in[2] + k * (out[2] - in[2])};
    }

    /**
     * Volume, centre and tensor for density one.
     *
     * @return the moments; a mass of 0 has its centre at the origin
     */
    BodyMoments moments() {
        double[] sum = new double[10];
        for (int t = 0; t < xyz.length; t += COMPONENTS) {
            add(t, sum);
        }
        double m = sum[0];
        if (!(m > 0)) {
            return new BodyMoments(0, Vec3.ZERO, InertiaTensor.principal(0, 0, 0));
        }
        Vec3 c = new Vec3(sum[1] / m, sum[2] / m, sum[3] / m);
        double xx = Math.max(0, sum[4] - m * c.x() * c.x());
        double yy = Math.max(0, sum[5] - m * c.y() * c.y());
        double zz = Math.max(0, sum[6] - m * c.z() * c.z());
        return new BodyMoments(
                m,
                c,
                new InertiaTensor(
                        yy + zz,
                        xx + zz,
                        xx + yy,
                        m * c.x() * c.y() - sum[7],
                        m * c.x() * c.z() - sum[8],
                        m * c.y() * c.z() - sum[9]));
    }

    /** Adds volume, first moments and xx yy zz xy xz yz of a tetrahedron about the origin. */
    private void add(int t, double[] sum) {
        double volume = Math.abs(determinant(t)) / 6;
        double[] total = new double[3];
        double[] square = new double[6];
        for (int corner = t; corner < t + COMPONENTS; corner += 3) {
            double x = xyz[corner];
            double y = xyz[corner + 1];
            double z = xyz[corner + 2];
            total[0] += x;
            total[1] += y;
            total[2] += z;
            square[0] += x * x;
            square[1] += y * y;
            square[2] += z * z;
            square[3] += x * y;
            square[4] += x * z;
            square[5] += y * z;
        }
        sum[0] += volume;
        for (int k = 0; k < 3; k++) {
            sum[1 + k] += volume * total[k] / 4;
            sum[4 + k] += volume / 20 * (square[k] + total[k] * total[k]);
        }
        sum[7] += volume / 20 * (square[3] + total[0] * total[1]);
        sum[8] += volume / 20 * (square[4] + total[0] * total[2]);
        sum[9] += volume / 20 * (square[5] + total[1] * total[2]);
    }

    private double determinant(int t) {
        double ax = xyz[t + 3] - xyz[t];
        double ay = xyz[t + 4] - xyz[t + 1];
        double az = xyz[t + 5] - xyz[t + 2];
        double bx = xyz[t + 6] - xyz[t];
        double by = xyz[t + 7] - xyz[t + 1];
        double bz = xyz[t + 8] - xyz[t + 2];
        double cx = xyz[t + 9] - xyz[t];
        double cy = xyz[t + 10] - xyz[t + 1];
        double cz = xyz[t + 11] - xyz[t + 2];
        return ax * (by * cz - bz * cy) + ay * (bz * cx - bx * cz) + az * (bx * cy - by * cx);
    }

    /** Tetrahedra piled up. */
    private static final class Heap {

        private double[] content = new double[64 * COMPONENTS];
        private int size;

        void tetrahedron(double[] a, double[] b, double[] c, double[] d) {
            if (size + COMPONENTS > content.length) {
                content = Arrays.copyOf(content, 2 * content.length);
            }
            put(a);
            put(b);
            put(c);
            put(d);
        }

        /** Two triangles joined corner by corner. */
        void prism(double[] a, double[] b, double[] c, double[] d, double[] e, double[] f) {
            tetrahedron(a, b, c, d);
            tetrahedron(b, c, d, e);
            tetrahedron(c, d, e, f);
        }

        private void put(double[] p) {
            System.arraycopy(p, 0, content, size, 3);
            size += 3;
        }

        double[] content() {
            return Arrays.copyOf(content, size);
        }
    }
}
