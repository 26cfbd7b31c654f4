package org.solewright.analysis.audit;

import java.util.List;
import org.solewright.analysis.numerics.Series;

/**
 * Three columns of results that belong together, at the rate of their table: x forward, y left, z up. Samples are copied
 * in.
 */
public final class AuditedVector {

    /** The axes in words. */
    static final List<String> AXES = List.of("forward", "left", "up");

    private final String name;
    private final List<String> columns;
    private final double start;
    private final double rate;
    private final double[] xyz;

    /**
     * A vector.
     *
     * @param name of what it belongs to, for messages
     * @param columns name of the table's column behind each of the three axes; empty where there is none
     * @param start time of the first sample, s
     * @param rate samples per second, Hz, above 0
     * @param xyz {@code [samples][3]} row-major, SI units, NaN where lost; copied
     * @throws IllegalArgumentException where a shape or the rate is wrong
     */
    public AuditedVector(String name, List<String> columns, double start, double rate, double[] xyz) {
        if (columns.size() != 3 || xyz.length % 3 != 0 || !(rate > 0)) {
            throw new IllegalArgumentException(name + " has " + columns.size() + " columns and " + xyz.length
                    + " components at " + rate + " Hz, expected 3, a multiple of 3 and more than 0 Hz");
        }
        this.name = name;
        this.columns = List.copyOf(columns);
        this.start = start;
        this.rate = rate;
        this.xyz = xyz.clone();
    }

    String name() {
        return name;
    }

    /** The column behind an axis in quotation marks, else the axis in words. */
    String column(int axis) {
        return columns.get(axis).isEmpty()
                ? "the " + AXES.get(axis) + " column of " + name
                : "column '" + columns.get(axis) + "' (" + name + ", " + AXES.get(axis) + ")";
    }

    double rate() {
        return rate;
    }

    double start() {
        return start;
    }

    int samples() {
        return xyz.length / 3;
    }

    double end() {
        return start + (samples() - 1) / rate;
    }

    double time(int sample) {
        return start + sample / rate;
    }

    double at(int sample, int axis) {
        return xyz[3 * sample + axis];
    }

    boolean isKnown(int sample) {
        return !Double.isNaN(xyz[3 * sample] + xyz[3 * sample + 1] + xyz[3 * sample + 2]);
    }

    /** Sample next to a time, -1 outside. */
    int sample(double time) {
        int i = (int) Math.round((time - start) * rate);
        return i >= 0 && i < samples() ? i : -1;
    }

    double[] interleaved() {
        return xyz.clone();
    }

    /** One component with 0 for lost samples. */
    Series component(int axis) {
        double[] v = new double[samples()];
        for (int i = 0; i < v.length; i++) {
            v[i] = Double.isNaN(at(i, axis)) ? 0 : at(i, axis);
        }
        return new Series(start, rate, v);
    }
}
