package org.solewright.analysis.cost;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.solewright.analysis.numerics.Series;

class PowerPhasesTest {

    @Test
    void phasesAreTheRunsOfOneSign() {
        Series power = sampled(t -> 100 * Math.sin(2 * Math.PI * t));
        List<PowerPhases.Run> runs = PowerPhases.runs(power, 0.1, 1.9, 0.015);
        assertThat(runs).hasSize(4);
        // exact: crossings at half seconds; half a sine of amplitude 100 and half period 0.5 s is 100/pi.
        assertThat(runs.get(1).start()).isCloseTo(0.5, within(1e-6));
        assertThat(runs.get(1).work()).isCloseTo(-100 / Math.PI, within(1e-3));
        assertThat(runs.get(2).work()).isCloseTo(100 / Math.PI, within(1e-3));
    }

    @Test
    void shortExcursionBelongsToThePhaseAroundIt() {
        // A spike of 10 ms inside a negative phase; its work is over 1 % of the whole.
        Series power = sampled(t -> t < 0.5 ? -50 : t < 0.51 ? 200 : t < 1 ? -50 : 50);
        List<PowerPhases.Run> runs = PowerPhases.runs(power, 0, 1.9, 0.015);
        assertThat(runs).hasSize(2);
        // exact: -50 W over 0.99 s and 200 W over 10 ms, the flanks of 1 ms counted half.
        assertThat(runs.get(0).work()).isCloseTo(-50 * 0.99 + 200 * 0.01, within(0.2));
    }

    @Test
    void weakExcursionBelongsToThePhaseAroundIt() {
        Series power = sampled(t -> t < 0.5 ? -50 : t < 0.6 ? 1 : t < 1 ? -50 : 50);
        assertThat(PowerPhases.runs(power, 0, 1.9, 0.015)).hasSize(2);
    }

    @Test
    void runsCoverTheIntervalAndAddUpToItsWork() {
        Series power = sampled(t -> 30 * Math.sin(9 * t) + 20 * Math.sin(31 * t + 1));
        List<PowerPhases.Run> runs = PowerPhases.runs(power, 0.2, 1.7, 0.015);
        double sum = runs.stream().mapToDouble(PowerPhases.Run::work).sum();
        assertThat(sum).isCloseTo(power.integral(0.2, 1.7), within(1e-9));
        assertThat(runs.get(0).start()).isEqualTo(0.2);
        assertThat(runs.get(runs.size() - 1).end()).isEqualTo(1.7);
        for (int i = 1; i < runs.size(); i++) {
            assertThat(runs.get(i).start()).isEqualTo(runs.get(i - 1).end());
            assertThat(runs.get(i).isPositive()).isNotEqualTo(runs.get(i - 1).isPositive());
        }
    }

    private static Series sampled(java.util.function.DoubleUnaryOperator f) {
        double[] p = new double[2001];
        for (int i = 0; i < p.length; i++) {
            p[i] = f.applyAsDouble(i / 1000.0);
        }
        return new Series(0, 1000, p);
    }
}
