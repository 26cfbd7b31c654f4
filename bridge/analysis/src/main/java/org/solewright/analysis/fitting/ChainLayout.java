package org.solewright.analysis.fitting;

import org.solewright.domain.geometry.Vec3;

/** A chain in flat arrays, and the scratch of the one thread that fits it. */
final class ChainLayout {

    private static final int[] SECOND = {4, 5, 6, 5, 7, 8, 6, 8, 9};

    final int segments;
    final int points;
    final int parameters;
    final int[] parent;

    /** Joint in the standing trial, {@code [segments][3]}; of the first segment the mean of its points. */
    final double[] centre;

    /** From the parent's joint to this one in the standing trial, {@code [segments][3]}. */
    final double[] offset;

    final double[] axis;
    final int[] first;
    final int[] freedoms;
    final int[] carrier;

    /** From its segment's joint to the point in the standing trial, {@code [points][3]}. */
    final double[] arm;

    final double[] weight;
    final double[] scratch = new double[3];
    final double[] block = new double[9];
    final double[] axisA = new double[9];
    final double[] axisB = new double[9];

    ChainLayout(ChainModel model) {
        segments = model.segments().size();
        points = model.points();
        parent = new int[segments];
        centre = new double[3 * segments];
        offset = new double[3 * segments];
        axis = new double[3 * segments];
        first = new int[segments];
        freedoms = new int[segments];
        carrier = new int[points];
        arm = new double[3 * points];
        weight = new double[points];
        int parameter = 0;
        int point = 0;
        for (int s = 0; s < segments; s++) {
            ChainModel.Segment segment = model.segments().get(s);
            parent[s] = segment.parent();
            Vec3 joint = s == 0 ? mean(segment) : segment.joint();
            put(joint, centre, s);
            if (s > 0) {
                int above = 3 * parent[s];
                put(joint.minus(new Vec3(centre[above], centre[above + 1], centre[above + 2])), offset, s);
            }
            put(segment.hinge().orElse(Vec3.ZERO), axis, s);
            first[s] = parameter;
            freedoms[s] = s == 0 ? 6 : segment.hinge().isPresent() ? 1 : 3;
            parameter += freedoms[s];
            for (Vec3 p : segment.points()) {
                carrier[point] = s;
                put(p.minus(joint), arm, point);
                weight[point] = segment.weight();
                point++;
            }
        }
        parameters = parameter;
    }

    private static Vec3 mean(ChainModel.Segment segment) {
        Vec3 sum = Vec3.ZERO;
        for (Vec3 p : segment.points()) {
            sum = sum.plus(p);
        }
        return segment.points().isEmpty()
                ? segment.joint()
                : sum.times(1.0 / segment.points().size());
    }

    private static void put(Vec3 v, double[] out, int at) {
        out[3 * at] = v.x();
        out[3 * at + 1] = v.y();
        out[3 * at + 2] = v.z();
    }

    /** Where the sum of products of components i and j stands. */
    int second(int i, int j) {
        return SECOND[3 * i + j];
    }
}
