package org.solewright.analysis.audit;

import java.util.Arrays;
import java.util.List;
import org.solewright.domain.gait.Side;

/** Where a foot is by its landmarks: whether it stands, how far a place on the ground is from it. */
final class FootRest {

    /** A foot stands where its lowest landmark is within this share of foot length of its lowest rests. */
    private static final double NEAR_GROUND = 0.3;

    private static final double SLOW = 0.6;
    private static final double LOW_RANK = 0.1;

    private final Side side;
    private final List<AuditedVector> landmarks;
    private final double ground;
    private final double length;

    FootRest(AuditedResults.Foot foot) {
        this.side = foot.side();
        this.landmarks = foot.landmarks();
        AuditedVector first = landmarks.get(0);
        double[] low = new double[first.samples()];
        double[] spans = new double[first.samples()];
        for (int i = 0; i < low.length; i++) {
            low[i] = lowest(i);
            spans[i] = span(i);
        }
        this.ground = ranked(low, LOW_RANK);
        this.length = ranked(spans, 0.5);
    }

    private static double ranked(double[] values, double rank) {
        double[] known =
                Arrays.stream(values).filter(v -> !Double.isNaN(v)).sorted().toArray();
        return known.length == 0 ? Double.NaN : known[(int) (rank * (known.length - 1))];
    }

    Side side() {
        return side;
    }

    /** Greatest distance of two landmarks, m, median over the samples; NaN where never seen together. */
    double length() {
        return length;
    }

    /** Height of the lowest landmark while the foot rests, m. */
    double ground() {
        return ground;
    }

    int samples() {
        return landmarks.get(0).samples();
    }

    double time(int sample) {
        return landmarks.get(0).time(sample);
    }

    /** Height of the lowest landmark, m; NaN where one is lost. */
    double lowest(int sample) {
        double low = Double.POSITIVE_INFINITY;
        for (AuditedVector v : landmarks) {
            double z = v.isKnown(sample) ? v.at(sample, 2) : Double.NaN;
            low = Double.isNaN(z) ? Double.NaN : Math.min(low, z);
        }
        return low;
    }

    private double span(int sample) {
        double span = landmarks.size() > 1 ? 0 : Double.NaN;
        for (int a = 0; a < landmarks.size(); a++) {
            for (int b = a + 1; b < landmarks.size(); b++) {
                double sum = 0;
                for (int c = 0; c < 3; c++) {
                    double d = landmarks.get(a).at(sample, c) - landmarks.get(b).at(sample, c);
                    sum += d * d;
                }
                double root = Math.sqrt(sum);
                span = Double.isNaN(root) ? Double.NaN : Math.max(span, root);
            }
        }
        return span;
    }

    /** Low and slow: one landmark near the ground and moving little. */
    boolean stands(double time) {
        int i = landmarks.get(0).sample(time);
        if (i < 1 || i >= samples() - 1 || !(lowest(i) < ground + NEAR_GROUND * usualLength())) {
            return false;
        }
        for (AuditedVector v : landmarks) {
            double sum = 0;
            for (int c = 0; c < 3; c++) {
                double d = (v.at(i + 1, c) - v.at(i - 1, c)) * v.rate() / 2;
                sum += d * d;
            }
            if (Math.sqrt(sum) < SLOW) {
                return true;
            }
        }
        return false;
    }

    private double usualLength() {
        return Double.isNaN(length) ? 0.25 : length;
    }

    /** Horizontal distance of a centre of pressure from the landmarks and the lines between them, m; infinite where unknown. */
    double distance(AuditedVector cop, int sample, double time) {
        int i = landmarks.get(0).sample(time);
        double x = cop.at(sample, 0);
        double y = cop.at(sample, 1);
        if (i < 0 || Double.isNaN(x + y)) {
            return Double.POSITIVE_INFINITY;
        }
        double least = Double.POSITIVE_INFINITY;
        for (int a = 0; a < landmarks.size(); a++) {
            for (int b = a; b < landmarks.size(); b++) {
                least = Math.min(least, toLine(landmarks.get(a), landmarks.get(b), i, x, y));
            }
        }
        return least;
    }

    private static double toLine(AuditedVector a, AuditedVector b, int i, double x, double y) {
        double dx = b.at(i, 0) - a.at(i, 0);
        double dy = b.at(i, 1) - a.at(i, 1);
        double px = x - a.at(i, 0);
        double py = y - a.at(i, 1);
        double square = dx * dx + dy * dy;
        double t = square > 0 ? Math.max(0, Math.min(1, (px * dx + py * dy) / square)) : 0;
        double d = Math.hypot(px - t * dx, py - t * dy);
        return Double.isNaN(d) ? Double.POSITIVE_INFINITY : d;
    }

    /** Mean of the landmarks along an axis, m; NaN where one is lost. */
    double middle(double time, int axis) {
        int i = landmarks.get(0).sample(time);
        double sum = i < 0 ? Double.NaN : 0;
        for (int k = 0; i >= 0 && k < landmarks.size(); k++) {
            sum += landmarks.get(k).at(i, axis) / landmarks.size();
        }
        return sum;
    }
}
