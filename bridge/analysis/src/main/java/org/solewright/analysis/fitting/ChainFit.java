package org.solewright.analysis.fitting;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.solewright.domain.geometry.Pose;
import org.solewright.domain.geometry.Rotation;

/**
 * Poses of all segments of a chain at once: weighted least squares over all tracked points with common joint centres
 * [Lu O'Connor 1999], by Levenberg-Marquardt with the analytic Jacobian, started from the frame before. Joints are balls
 * or hinges. Every object has its own workspace: one per thread, frames in their order.
 *
 * <p>A segment none of whose points (nor any below it) are there keeps its turn relative to its parent and is not
 * observed. Do not read a pose after {@link State#UNDETERMINED}: some turn is then only what it last was.
 */
public final class ChainFit {

    /** How a frame went. */
    public enum State {
        /** All segments that have points are known. */
        DETERMINED,
        /** The points that are there leave some turn or position open. */
        UNDETERMINED,
        /** No minimum was reached in 100 steps. */
        STALLED
    }

    /** Step, m and rad, below which the minimum is reached: far under what markers resolve (common practice). */
    private static final double SMALLEST_STEP = 1e-9;

    private static final int MOST_STEPS = 100;
    private static final double FIRST_DAMPING = 1e-6;
    private static final double LEAST_DAMPING = 1e-12;
    private static final double MOST_DAMPING = 1e12;
    private static final double DAMPING_FACTOR = 10;

    /** Relative rounding of a sum of squares: below it a step is not refused. */
    private static final double ROUNDING = 1e-12;

    /** Pivot over diagonal element below which a parameter follows from the others. */
    private static final double SINGULAR = 1e-7;

    private static final int FEWEST_POINTS = 3;

    private final ChainModel model;
    private final ChainLayout layout;
    private final double[] normal;
    private final double[] right;
    private final double[] factor;
    private final double[] step;
    private ChainState now;
    private ChainState next;
    private boolean isWarm;
    private int steps;

    /**
     * A fit of a chain.
     *
     * @param model the chain as it stood
     */
    public ChainFit(ChainModel model) {
        this.model = model;
        layout = new ChainLayout(model);
        normal = new double[layout.parameters * layout.parameters];
        factor = new double[normal.length];
        right = new double[layout.parameters];
        step = new double[layout.parameters];
        now = new ChainState(layout);
        next = new ChainState(layout);
    }

    /**
     * Fits one frame.
     *
     * @param present {@code [points][3]} row-major, m, laboratory frame, segment by segment; NaN where a point is lost;
     *     not modified
     * @return how it went
     * @throws IllegalArgumentException where the length is not that of the chain's points
     */
    public State fit(double[] present) {
        if (present.length != 3 * layout.points) {
            throw new IllegalArgumentException(
                    present.length + " components for a chain of " + layout.points + " points");
        }
        boolean wasWarm = isWarm;
        if (wasWarm) {
            now.orthonormalise();
            now.evaluate(present);
        } else {
            now.place(standingStart(present), present);
        }
        boolean isAtMinimum = descend(present);
        if (!isAtMinimum && wasWarm) {
            now.place(standingStart(present), present);
            isAtMinimum = descend(present);
        }
        now.normalEquations(normal, right);
        boolean isDetermined = now.weight() > 0 && decompose(0, SINGULAR);
        isWarm = isAtMinimum && isDetermined;
        return !isDetermined ? State.UNDETERMINED : isAtMinimum ? State.DETERMINED : State.STALLED;
    }

    private boolean descend(double[] present) {
        double damping = FIRST_DAMPING;
        for (steps = 1; steps <= MOST_STEPS; steps++) {
            now.normalEquations(normal, right);
            boolean isLower;
            do {
                if (damping > MOST_DAMPING) {
                    return false;
                }
                if (!decompose(damping, 0)) {
                    damping *= DAMPING_FACTOR;
                    isLower = false;
                    continue;
                }
                double largest = solve();
                next.moved(now, step);
                next.evaluate(present);
                if (largest < SMALLEST_STEP) {
                    swap();
                    return true;
                }
                isLower = next.cost() <= now.cost() * (1 + ROUNDING);
                damping = isLower ? Math.max(LEAST_DAMPING, damping / DAMPING_FACTOR) : damping * DAMPING_FACTOR;
            } while (!isLower);
            swap();
        }
        return false;
    }

    private void swap() {
        ChainState old = now;
        now = next;
        next = old;
    }

    /** Cholesky factor of the normal matrix with its diagonal raised; parameters that move no point are held. */
    private boolean decompose(double damping, double least) {
        int n = layout.parameters;
        for (int i = 0; i < n; i++) {
            double diagonal = normal[i * n + i];
            boolean isHeld = !(diagonal > 0);
            for (int j = 0; j <= i; j++) {
                double sum = normal[i * n + j];
                if (i == j) {
                    sum = isHeld ? 1 : diagonal * (1 + damping);
                }
                for (int k = 0; k < j; k++) {
                    sum -= factor[i * n + k] * factor[j * n + k];
                }
                if (i == j) {
                    if (!(sum > least * diagonal)) {
                        return false;
                    }
                    factor[i * n + i] = Math.sqrt(sum);
                } else {
                    factor[i * n + j] = sum / factor[j * n + j];
                }
            }
        }
        return true;
    }

    /** Solves for the step and returns its largest element. */
    private double solve() {
        int n = layout.parameters;
        for (int i = 0; i < n; i++) {
            double sum = right[i];
            for (int k = 0; k < i; k++) {
                sum -= factor[i * n + k] * step[k];
            }
            step[i] = sum / factor[i * n + i];
        }
        double largest = 0;
        for (int i = n - 1; i >= 0; i--) {
            double sum = step[i];
            for (int k = i + 1; k < n; k++) {
                sum -= factor[k * n + i] * step[k];
            }
            step[i] = sum / factor[i * n + i];
            largest = Math.max(largest, Math.abs(step[i]));
        }
        return largest;
    }

    /** Turns from separate rigid fits where a segment has its three points, else as its parent's. */
    private List<Rotation> standingStart(double[] present) {
        List<Optional<Rotation>> own = new ArrayList<>();
        int from = 0;
        for (ChainModel.Segment segment : model.segments()) {
            int count = segment.points().size();
            double[] reference = new double[3 * count];
            for (int k = 0; k < count; k++) {
                reference[3 * k] = segment.points().get(k).x();
                reference[3 * k + 1] = segment.points().get(k).y();
                reference[3 * k + 2] = segment.points().get(k).z();
            }
            double[] here = Arrays.copyOfRange(present, 3 * from, 3 * (from + count));
            own.add(
                    count < FEWEST_POINTS || segment.hinge().isPresent()
                            ? Optional.empty()
                            : RigidFit.of(reference, here).map(f -> f.pose().rotation()));
            from += count;
        }
        Rotation any = own.stream().flatMap(Optional::stream).findFirst().orElse(Rotation.IDENTITY);
        List<Rotation> rotations = new ArrayList<>();
        for (int s = 0; s < own.size(); s++) {
            Rotation above = s == 0 ? any : rotations.get(layout.parent[s]);
            rotations.add(own.get(s).orElse(above));
        }
        return rotations;
    }

    /**
     * Pose of a segment in the last frame.
     *
     * @param segment its index in the chain
     * @return X from where the segment was in the standing trial to where it is now, laboratory frame
     */
    public Pose pose(int segment) {
        return now.pose(segment);
    }

    /**
     * Whether the last frame had a point of the segment or of one that hangs on it.
     *
     * @param segment its index in the chain
     * @return false where the segment only follows its parent
     */
    public boolean isObserved(int segment) {
        int i = layout.first[segment];
        return normal[i * layout.parameters + i] > 0;
    }

    /**
     * Weighted root mean square distance between the carried points and the present ones in the last frame.
     *
     * @return m; NaN where no point was there
     */
    public double rms() {
        return Math.sqrt(now.cost() / now.weight());
    }

    /**
     * Steps that the last frame took.
     *
     * @return one or more
     */
    public int steps() {
        return steps;
    }

    /** Forgets the frame before. */
    public void restart() {
        isWarm = false;
    }
}
