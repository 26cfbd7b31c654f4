package org.solewright.analysis.cost;

import org.solewright.analysis.dynamics.Vault;

/**
 * The vaults of one step, one after the other: radii, leans at their ends, and the angles of the transitions between them.
 * Speeds square by square are affine in the square of the start speed, which gives every limit of the start speed in closed
 * form [derived].
 */
final class VaultChain {

    private final double[] radius;
    private final double[] start;
    private final double[] end;
    private final double[] angle;
    private final double gravity;
    private final double slope;

    private VaultChain(double[] radius, double[] start, double[] end, double[] angle, double gravity, double slope) {
        this.radius = radius;
        this.start = start;
        this.end = end;
        this.angle = angle;
        this.gravity = gravity;
        this.slope = slope;
    }

    /** Vaults of one radius over a segmented foot. */
    static VaultChain of(VaultingStep step, double gravity, double slope) {
        int n = step.transitions();
        double[] radius = new double[n];
        double[] start = new double[n];
        double[] end = new double[n];
        double[] angle = new double[n];
        for (int k = 0; k < n; k++) {
            radius[k] = step.radius();
            angle[k] = step.angle(k);
            end[k] = angle[k] / 2;
            start[k] = -step.angle(k == 0 ? n - 1 : k - 1) / 2;
        }
        return new VaultChain(radius, start, end, angle, gravity, slope);
    }

    /** Vaults over a foot whose pivots lie anywhere. */
    static VaultChain of(PivotPolygon foot, double gravity) {
        int n = foot.transitions();
        double[] radius = new double[n];
        double[] start = new double[n];
        double[] end = new double[n];
        double[] angle = new double[n];
        for (int k = 0; k < n; k++) {
            double a = foot.radiusBefore(k);
            double b = foot.radiusAfter(k);
            double s = foot.spacing(k);
            double x = (a * a - b * b + s * s) / (2 * s);
            radius[k] = a;
            angle[k] = foot.angle(k);
            end[k] = Math.asin(Math.max(-1, Math.min(1, x / a)));
            start[(k + 1) % n] = Math.asin(Math.max(-1, Math.min(1, (x - s) / b)));
        }
        return new VaultChain(radius, start, end, angle, gravity, 0);
    }

    int vaults() {
        return radius.length;
    }

    double angle(int k) {
        return angle[k];
    }

    double gravity() {
        return gravity;
    }

    /** Change of the squared speed over a vault, m2/s2. */
    double gain(int k) {
        return gain(k, end[k] + slope);
    }

    private double gain(int k, double to) {
        double from = start[k] + slope;
        return 4 * gravity * radius[k] * Math.sin((to - from) / 2) * Math.sin((to + from) / 2);
    }

    /** Whether a vault goes over the top. */
    boolean passesTop(int k) {
        return start[k] + slope < 0 && end[k] + slope > 0;
    }

    /** Squared speed at the start of a vault that just brings the hip over its highest place, m2/s2. */
    double leastSquare(int k) {
        return passesTop(k) ? -gain(k, 0) : Math.max(0, -gain(k));
    }

    /** Greatest squared speed at the start of a vault without a pull at either end, m2/s2. */
    double greatestSquare(int k) {
        double atStart = gravity * radius[k] * Math.cos(start[k] + slope);
        double atEnd = gravity * radius[k] * Math.cos(end[k] + slope) - gain(k);
        return Math.min(atStart, atEnd);
    }

    /** Duration of a vault by the squared speed at the top less what is needed to get there, m2/s2. */
    double duration(int k, double spare) {
        double r = radius[k];
        double top = passesTop(k) ? spare : spare + leastSquare(k) + gain(k, 0);
        return Vault.duration(r, gravity, start[k] + slope, end[k] + slope, top / (r * r));
    }
}
