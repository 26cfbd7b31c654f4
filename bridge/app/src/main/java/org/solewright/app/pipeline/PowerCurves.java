package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import org.solewright.analysis.cost.StepMechanics;
import org.solewright.analysis.gait.Step;
import org.solewright.analysis.numerics.Series;
import org.solewright.domain.gait.CurveRow;
import org.solewright.domain.gait.Stance;

/** Power of each limb on the centre of mass over its stance, 101 points; empty where not every load is known. */
final class PowerCurves {

    private static final int POINTS = 101;

    private PowerCurves() {}

    static List<CurveRow> of(Step step, StepMechanics mechanics) {
        List<CurveRow> rows = new ArrayList<>();
        add(rows, step, step.loads().trailing(), "trailing-limb-power", mechanics.trailingPower());
        add(rows, step, step.loads().leading(), "leading-limb-power", mechanics.leadingPower());
        return rows;
    }

    private static void add(List<CurveRow> rows, Step step, Stance stance, String curve, Series power) {
        for (int i = 0; i < POINTS; i++) {
            double time = stance.start() + i * stance.duration() / (POINTS - 1);
            boolean isKnown =
                    time >= step.loads().knownFrom() && time <= step.loads().knownTo();
            double value = power.at(Math.min(time, power.end()));
            rows.add(new CurveRow(
                    stance.trial(),
                    Integer.toString(step.number()),
                    stance.side(),
                    curve,
                    "W",
                    100.0 * i / (POINTS - 1),
                    isKnown ? value : Double.NaN,
                    OptionalDouble.empty(),
                    1));
        }
    }
}
