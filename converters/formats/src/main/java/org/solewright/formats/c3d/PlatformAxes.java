package org.solewright.formats.c3d;

import java.util.List;
import org.solewright.domain.geometry.Vec3;

/**
 * Platform axes in the laboratory frame: x along c1 + c4 - c2 - c3, z = x cross (c1 + c2 - c3 - c4), pointing down.
 *
 * @param x first axis
 * @param y second axis
 * @param z third axis, down
 */
record PlatformAxes(Vec3 x, Vec3 y, Vec3 z) {

    /** Axes of four corners; IllegalArgumentException where they span no plane. */
    static PlatformAxes of(List<Vec3> c) {
        Vec3 x = c.get(0).plus(c.get(3)).minus(c.get(1)).minus(c.get(2)).unit();
        Vec3 z =
                x.cross(c.get(0).plus(c.get(1)).minus(c.get(2)).minus(c.get(3))).unit();
        return new PlatformAxes(x, z.cross(x), z);
    }

    Vec3 toLaboratory(double[] v, int at, double sign) {
        return x.times(sign * v[at]).plus(y.times(sign * v[at + 1])).plus(z.times(sign * v[at + 2]));
    }

    Vec3 fromLaboratory(Vec3 v) {
        return new Vec3(v.dot(x), v.dot(y), v.dot(z));
    }
}
