package org.solewright.analysis.numerics;

import java.util.Arrays;
import java.util.Optional;

/**
 * Minimises a sum of squares by Newton steps with the damping of Levenberg and Marquardt [Levenberg 1944, Marquardt
 * 1963]; where the full second derivative is not positive definite the Gauss-Newton matrix takes its place.
 *
 * <p>It stops on the step, not on the cost: near the minimum the cost is flat to the square root of the rounding, and a
 * test on it would leave half of the digits on the table. Parameters are to be scaled by the caller so that 1 is a
 * large change.
 */
public final class DampedNewton {

    private static final int MOST_ITERATIONS = 500;
    private static final double STEP_TOLERANCE = 1e-13;
    /** Below this step the change of the cost drowns in rounding and cannot judge a step. */
    private static final double SMALL_STEP = 1e-6;

    private static final double COST_ROUNDING = 1e-12;
    private static final double FIRST_DAMPING = 1e-4;
    private static final double DAMPING_FACTOR = 10;
    private static final double LEAST_DAMPING = 1e-12;
    private static final double GREATEST_DAMPING = 1e14;

    /** A cost with its derivatives. */
    public interface Problem {

        /**
         * Half the weighted sum of squared residuals.
         *
         * @param p parameters, unmodified
         * @return cost, not negative
         */
        double cost(double[] p);

        /**
         * Derivatives of the cost; all three arrays come filled with zeros.
         *
         * @param p parameters, unmodified
         * @param gradient filled with the sum of w e de/dp
         * @param gaussNewton filled with the sum of w de/dp (de/dp)^T, row-major
         * @param curvature filled with the sum of w e d2e/dp2, row-major; may be left zero where e is small
         */
        void derivatives(double[] p, double[] gradient, double[] gaussNewton, double[] curvature);
    }

    private DampedNewton() {}

    /**
     * Walks from a start to a minimum.
     *
     * @param problem what is minimised
     * @param p start, replaced by the last point reached
     * @return whether the last step was below 1e-13 of the parameters' size
     */
    public static Outcome minimise(Problem problem, double[] p) {
        int n = p.length;
        double[] gradient = new double[n];
        double[] gaussNewton = new double[n * n];
        double[] curvature = new double[n * n];
        double cost = problem.cost(p);
        double damping = FIRST_DAMPING;
        double size = Double.POSITIVE_INFINITY;
        for (int iteration = 0; iteration < MOST_ITERATIONS; iteration++) {
            Arrays.fill(gradient, 0);
            Arrays.fill(gaussNewton, 0);
            Arrays.fill(curvature, 0);
            problem.derivatives(p, gradient, gaussNewton, curvature);
            boolean moved = false;
            while (!moved && damping < GREATEST_DAMPING) {
                double[] step = step(gradient, gaussNewton, curvature, damping);
                size = size(step, p);
                double[] trial = p.clone();
                for (int i = 0; i < n; i++) {
                    trial[i] += step[i];
                }
                double trialCost = problem.cost(trial);
                if (trialCost <= cost || (size < SMALL_STEP && trialCost <= cost * (1 + COST_ROUNDING))) {
                    System.arraycopy(trial, 0, p, 0, n);
                    cost = trialCost;
                    damping = damping < LEAST_DAMPING ? 0 : damping / DAMPING_FACTOR;
                    moved = true;
                } else {
                    damping = Math.max(damping, LEAST_DAMPING) * DAMPING_FACTOR;
                }
            }
            if (!moved || size < STEP_TOLERANCE) {
                return size < SMALL_STEP
                        ? new Outcome.Converged(size, iteration + 1)
                        : new Outcome.Stalled(size, iteration + 1);
            }
        }
        return new Outcome.Stalled(size, MOST_ITERATIONS);
    }

    private static double[] step(double[] gradient, double[] gaussNewton, double[] curvature, double damping) {
        int n = gradient.length;
        double[] matrix = new double[n * n];
        for (int i = 0; i < n * n; i++) {
            matrix[i] = gaussNewton[i] + curvature[i];
        }
        damp(matrix, gaussNewton, n, damping);
        Optional<Cholesky> factor = Cholesky.of(matrix, n);
        double more = Math.max(damping, LEAST_DAMPING);
        double[] step = new double[n];
        while (factor.isEmpty()) {
            if (!(more < GREATEST_DAMPING)) {
                Arrays.fill(step, Double.NaN);
                return step;
            }
            System.arraycopy(gaussNewton, 0, matrix, 0, n * n);
            damp(matrix, gaussNewton, n, more);
            factor = Cholesky.of(matrix, n);
            more *= DAMPING_FACTOR;
        }
        for (int i = 0; i < n; i++) {
            step[i] = -gradient[i];
        }
        factor.get().solve(step);
        return step;
    }

    private static void damp(double[] matrix, double[] gaussNewton, int n, double damping) {
        for (int i = 0; i < n; i++) {
            double diagonal = gaussNewton[i * n + i];
            matrix[i * n + i] += damping * (diagonal > 0 ? diagonal : 1);
        }
    }

    private static double size(double[] step, double[] p) {
        double size = 0;
        for (int i = 0; i < step.length; i++) {
            size = Math.max(size, Math.abs(step[i]) / (1 + Math.abs(p[i])));
        }
        return size;
    }
}
