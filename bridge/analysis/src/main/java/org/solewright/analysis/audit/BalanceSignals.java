package org.solewright.analysis.audit;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.solewright.analysis.numerics.Gaps;
import org.solewright.analysis.numerics.LowPass;
import org.solewright.analysis.numerics.Series;

/**
 * Centre of mass and loads on the samples of the centre of mass. The second central difference of a path over h is the
 * mean of its acceleration over [t - h, t + h] with triangular weights: forces are averaged in the same way before both
 * pass the same filter, so that what is left is no matter of rates.
 */
final class BalanceSignals {

    private static final double LONGEST_GAP = 0.1;
    private static final double LARGEST_SHARE = 0.4;
    /** The filter's response to an end has fallen to 1e-4 after this many radians at the cut-off. */
    private static final double SETTLED = 14;

    private final double start;
    private final double rate;
    private final double[][] position;
    private final List<double[][]> forces = new ArrayList<>();
    private final double[][] total;
    private final boolean[] isClear;

    private BalanceSignals(AuditedVector com, double[] xyz, AuditedResults results, AuditSettings settings) {
        this.start = com.start();
        this.rate = com.rate();
        int n = com.samples();
        Optional<LowPass> filter = settings.cutoff() > 0 && settings.cutoff() < LARGEST_SHARE * rate
                ? Optional.of(LowPass.of(settings.cutoff(), rate))
                : Optional.empty();
        this.position = new double[3][n];
        this.total = new double[3][n];
        double[] known = new double[n];
        for (int i = 0; i < n; i++) {
            known[i] = Double.isNaN(xyz[3 * i]) ? Double.NaN : 1;
            for (int c = 0; c < 3; c++) {
                position[c][i] = xyz[3 * i + c];
            }
        }
        double from = Double.NEGATIVE_INFINITY;
        double to = Double.POSITIVE_INFINITY;
        for (AuditedResults.Load load : results.loads()) {
            forces.add(averaged(load.force(), known, filter));
            from = Math.max(from, load.force().start());
            to = Math.min(to, load.force().end());
        }
        for (int c = 0; c < 3; c++) {
            position[c] = filter.isPresent() ? filter.get().applyToRuns(position[c]) : position[c];
            for (double[][] f : forces) {
                for (int i = 0; i < n; i++) {
                    total[c][i] += f[c][i];
                }
            }
        }
        double margin = filter.isPresent() ? SETTLED / (2 * Math.PI * settings.cutoff()) : 0;
        this.isClear = clear(known, (int) Math.ceil(margin * rate) + 1, from + margin, to - margin);
    }

    /** The signals; empty without a centre of mass of some samples or without loads. */
    static Optional<BalanceSignals> of(AuditedResults results, AuditSettings settings) {
        Optional<AuditedVector> com = results.centreOfMass().or(results::velocity);
        if (com.isEmpty() || results.loads().isEmpty() || com.get().samples() < 3) {
            return Optional.empty();
        }
        double[] xyz = com.get().interleaved();
        for (int i = 0; i < xyz.length; i += 3) {
            if (!com.get().isKnown(i / 3)) {
                Arrays.fill(xyz, i, i + 3, Double.NaN);
            }
        }
        Gaps.bridge(xyz, 3, (int) (LONGEST_GAP * com.get().rate()));
        if (results.centreOfMass().isEmpty()) {
            integrate(xyz, com.get().rate());
        }
        return Optional.of(new BalanceSignals(com.get(), xyz, results, settings));
    }

    /** Positions from velocities by trapezia, each run of samples from 0. */
    private static void integrate(double[] xyz, double rate) {
        for (int c = 0; c < 3; c++) {
            double last = Double.NaN;
            double sum = 0;
            for (int i = c; i < xyz.length; i += 3) {
                double v = xyz[i];
                sum = Double.isNaN(last) ? 0 : sum + (last + v) / (2 * rate);
                last = v;
                xyz[i] = Double.isNaN(v) ? Double.NaN : sum;
            }
        }
    }

    private double[][] averaged(AuditedVector force, double[] known, Optional<LowPass> filter) {
        int n = known.length;
        int parts = (int) Math.max(1, Math.round(force.rate() / rate));
        double[][] out = new double[3][n];
        for (int c = 0; c < 3; c++) {
            Series f = force.component(c);
            for (int i = 0; i < n; i++) {
                double sum = 0;
                for (int j = 1 - parts; j < parts; j++) {
                    double time = start + (i + (double) j / parts) / rate;
                    double within = Math.max(f.start(), Math.min(f.end(), time));
                    sum += f.at(within) * (parts - Math.abs(j));
                }
                out[c][i] = sum / ((double) parts * parts) * known[i];
            }
            out[c] = filter.isPresent() ? filter.get().applyToRuns(out[c]) : out[c];
        }
        return out;
    }

    private boolean[] clear(double[] known, int margin, double from, double to) {
        int n = known.length;
        boolean[] clear = new boolean[n];
        int since = 0;
        for (int i = 0; i < n; i++) {
            since = Double.isNaN(known[i]) ? 0 : since + 1;
            clear[i] = since > margin && time(i) >= from - 1e-9 && time(i) <= to + 1e-9;
        }
        since = 0;
        for (int i = n - 1; i >= 0; i--) {
            since = Double.isNaN(known[i]) ? 0 : since + 1;
            clear[i] &= since > margin;
        }
        return clear;
    }

    double time(int i) {
        return start + i / rate;
    }

    double rate() {
        return rate;
    }

    int samples() {
        return isClear.length;
    }

    int loads() {
        return forces.size();
    }

    boolean isClear(int i) {
        return isClear[i];
    }

    /** Samples of an interval that are clear of ends and gaps, in order. */
    int[] clear(double from, double to) {
        int first = (int) Math.max(0, Math.ceil((from - start) * rate - 1e-6));
        int last = (int) Math.min(samples() - 1.0, Math.floor((to - start) * rate + 1e-6));
        int[] out = new int[Math.max(0, last - first + 1)];
        int n = 0;
        for (int i = first; i <= last; i++) {
            if (isClear[i]) {
                out[n++] = i;
            }
        }
        return Arrays.copyOf(out, n);
    }

    double position(int axis, int i) {
        return position[axis][i];
    }

    double velocity(int axis, int i) {
        return (position[axis][i + 1] - position[axis][i - 1]) * rate / 2;
    }

    double acceleration(int axis, int i) {
        double[] x = position[axis];
        return (x[i + 1] - x[i] - (x[i] - x[i - 1])) * rate * rate;
    }

    double force(int axis, int i) {
        return total[axis][i];
    }

    double force(int load, int axis, int i) {
        return forces.get(load)[axis][i];
    }
}
