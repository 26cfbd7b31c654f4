package org.solewright.app.report;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import org.solewright.analysis.cost.StepMechanics;
import org.solewright.analysis.cost.StepPhases;
import org.solewright.analysis.gait.Step;
import org.solewright.analysis.numerics.Series;
import org.solewright.domain.cost.Measure;
import org.solewright.domain.gait.Side;

/**
 * One transition as the figures draw it.
 *
 * @param step where its loads are
 * @param mechanics what it cost
 */
public record TransitionView(Step step, StepMechanics mechanics) {

    String trial() {
        return step.loads().leading().trial();
    }

    String name() {
        return trial() + " step " + step.number();
    }

    Side trailing() {
        return step.loads().trailing().side();
    }

    Side leading() {
        return step.loads().leading().side();
    }

    List<StepPhases.Phase> phases() {
        return StepPhases.of(step.loads(), mechanics);
    }

    OptionalDouble value(Measure measure) {
        Double value = mechanics.values().get(measure);
        return value == null ? OptionalDouble.empty() : OptionalDouble.of(measure.inColumnUnit(value));
    }

    OptionalDouble sd(Measure measure) {
        Double value = mechanics.deviations().get(measure);
        return value == null ? OptionalDouble.empty() : OptionalDouble.of(measure.inColumnUnit(value));
    }

    /** Times of an interval with both ends, at most so many apart; more than a drawing shows are left out. */
    static double[] times(Series series, double from, double to, int most) {
        List<Double> times = new ArrayList<>();
        times.add(from);
        int first = series.nextSample(from);
        int last = Math.min(series.samples() - 1, series.nextSample(to) - 1);
        int stride = Math.max(1, (last - first + 1) / most);
        for (int i = first; i <= last; i += stride) {
            if (series.time(i) < to) {
                times.add(series.time(i));
            }
        }
        times.add(to);
        return times.stream().mapToDouble(t -> t).toArray();
    }
}
