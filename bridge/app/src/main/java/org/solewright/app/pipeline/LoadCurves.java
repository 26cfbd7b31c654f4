package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import org.solewright.analysis.gait.Pass;
import org.solewright.domain.gait.CurveRow;
import org.solewright.domain.gait.Stance;

/** Vertical force of every stance, 101 points over stance, then mean and SD by side. */
final class LoadCurves {

    private static final int POINTS = 101;

    private LoadCurves() {}

    static List<CurveRow> of(List<Pass> passes) {
        List<CurveRow> rows = new ArrayList<>();
        for (Pass pass : passes) {
            int number = 0;
            for (Stance stance : pass.stances()) {
                number++;
                for (int i = 0; i < POINTS; i++) {
                    double time = stance.start() + i * stance.duration() / (POINTS - 1);
                    double value = pass.load(stance, time)
                            .map(Pass.StanceLoad::vertical)
                            .orElse(Double.NaN);
                    rows.add(new CurveRow(
                            stance.trial(),
                            Integer.toString(number),
                            stance.side(),
                            "vertical-force",
                            "N",
                            100.0 * i / (POINTS - 1),
                            value,
                            OptionalDouble.empty(),
                            1));
                }
            }
        }
        rows.addAll(PowerCurves.means(rows));
        return rows;
    }
}
