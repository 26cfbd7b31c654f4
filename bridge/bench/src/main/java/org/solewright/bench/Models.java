package org.solewright.bench;

import java.util.List;
import java.util.concurrent.TimeUnit;
import java.util.stream.DoubleStream;
import java.util.stream.IntStream;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.State;
import org.solewright.analysis.cost.CostIndex;
import org.solewright.analysis.cost.Landscape;
import org.solewright.analysis.cost.PushOffPolicy;
import org.solewright.analysis.cost.VaultingGait;
import org.solewright.analysis.cost.VaultingStep;
import org.solewright.analysis.dynamics.LimitException;
import org.solewright.analysis.dynamics.SimplestWalker;
import org.solewright.analysis.dynamics.WalkerGait;
import org.solewright.domain.cost.FootRule;

/** Models with a time of their own to keep. */
@State(Scope.Thread)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MICROSECONDS)
public class Models {

    private static final double GRAVITY = 9.80665;

    private static final Landscape.Axes MILLION = new Landscape.Axes(
            IntStream.rangeClosed(0, 4).boxed().toList(),
            List.of(FootRule.GIVEN, FootRule.EQUAL),
            DoubleStream.iterate(0.8, v -> v + 0.01).limit(100).boxed().toList(),
            DoubleStream.iterate(0.3, d -> d + 0.003).limit(200).boxed().toList());

    /**
     * A landscape of a million rows: 5 feet, 2 rules, 100 speeds, 200 steps, 5 forms.
     *
     * @return number of rows
     */
    @Benchmark
    public int landscape() {
        return Landscape.of(new Landscape.Limb(0.9, 0.2, 1, 70), MILLION, CostIndex.standard(GRAVITY))
                .value()
                .size();
    }

    /**
     * A level gait at a mean speed.
     *
     * @return the gait
     * @throws LimitException never, for this gait
     */
    @Benchmark
    public VaultingGait levelGait() throws LimitException {
        VaultingStep step = VaultingStep.given(1, 0.6, 0.9, 0.2, 1);
        return VaultingGait.level(step, 1.2, PushOffPolicy.ALL, GRAVITY);
    }

    /**
     * A walker's fixed point on a slope with its eigenvalues.
     *
     * @return the gait
     * @throws LimitException never, for this slope
     */
    @Benchmark
    public WalkerGait walker() throws LimitException {
        return SimplestWalker.passive(SimplestWalker.Gait.LONG, 0.009, 0, 0, 0);
    }
}
