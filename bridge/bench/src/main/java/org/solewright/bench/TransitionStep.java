package org.solewright.bench;

import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.solewright.analysis.cost.VaultingStep;
import org.solewright.analysis.dynamics.LimitException;
import org.solewright.domain.cost.WorkForm;

/** The checked closed form of a step against the bare formula in a loop, both summed over the same thousand steps. */
@State(Scope.Thread)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MICROSECONDS)
public class TransitionStep {

    private static final int STEPS = 1000;

    private final double[] stepLength = new double[STEPS];
    private final double[] footLength = new double[STEPS];

    /** Steps of 0.4 to 0.8 m and feet of 0.1 to 0.3 m. */
    @Setup
    public void fill() {
        for (int i = 0; i < STEPS; i++) {
            stepLength[i] = 0.4 + 0.4 * i / STEPS;
            footLength[i] = 0.1 + 0.2 * (i * 7 % STEPS) / STEPS;
        }
    }

    /**
     * The formula, nothing checked.
     *
     * @return sum of the factors
     */
    @Benchmark
    public double bare() {
        double sum = 0;
        for (int i = 0; i < STEPS; i++) {
            double l = 0.9 - footLength[i];
            double inner = footLength[i] / 2 / l;
            double last = (stepLength[i] - footLength[i]) / l;
            double q = inner * inner;
            double p = last * last;
            sum += 2 * (q / (4 - q)) + p / (4 - p);
        }
        return sum;
    }

    /**
     * The closed form as callers use it.
     *
     * @return sum of the factors
     * @throws LimitException never, for these steps
     */
    @Benchmark
    public double checked() throws LimitException {
        double sum = 0;
        for (int i = 0; i < STEPS; i++) {
            sum += VaultingStep.given(2, stepLength[i], 0.9, footLength[i], 1).factor(WorkForm.PUSH_OFF);
        }
        return sum;
    }
}
