package org.solewright.app.report;

import java.util.OptionalDouble;
import org.solewright.analysis.cost.StepFactor;
import org.solewright.analysis.dynamics.LimitException;
import org.solewright.analysis.numerics.Root;
import org.solewright.domain.cost.Posture;
import org.solewright.domain.cost.PostureRow;
import org.solewright.domain.cost.WorkForm;

/**
 * Work of a compass or a flat foot of given length over step length, at the mass and speed of one step, push-off and
 * collision at once.
 *
 * @param name in words
 * @param segments N, 0 for the compass
 * @param limb hip to bearing place, m
 * @param foot length on the ground, m
 * @param energy m v^2/2 before the transition, J
 */
record PostureCurve(String name, int segments, double limb, double foot, double energy) {

    private static final double MARCH = 0.01;

    static PostureCurve of(PostureRow row, double mass) {
        int n = row.posture().segments().orElse(0);
        return new PostureCurve(words(row.posture()), n, row.limb(), row.foot(), mass * row.speed() * row.speed() / 2);
    }

    static String words(Posture posture) {
        return switch (posture.kind()) {
            case COMPASS -> "point foot";
            case PLANTIGRADE ->
                posture.segments().orElseThrow() == 1
                        ? "flat foot, 1 segment"
                        : "flat foot, " + posture.segments().orElseThrow() + " segments";
            case ROLLING_ARC -> "rolling arc";
            case DIGITIGRADE -> "heel raised, on the toes";
            case UNGULIGRADE -> "on the tip of the toe";
        };
    }

    private StepFactor factor() {
        return new StepFactor.Given(WorkForm.SIMULTANEOUS, segments, limb, foot, 0);
    }

    /** Work per step, J; NaN out of reach. */
    double work(double stepLength) {
        try {
            return energy * factor().at(stepLength).factor();
        } catch (LimitException e) {
            return Double.NaN;
        }
    }

    double shortest() {
        return factor().shortest();
    }

    /** The longest step that costs no more than a work, m; empty where none does within reach. */
    OptionalDouble step(double work) {
        double longest = factor().longest();
        double last = Double.NaN;
        for (double d = longest - MARCH; d > shortest(); d -= MARCH) {
            double w = work(d);
            if (Double.isFinite(w) && w <= work) {
                return Double.isNaN(last)
                        ? OptionalDouble.empty()
                        : OptionalDouble.of(Root.inBracket(x -> work(x) - work, d, last));
            }
            last = Double.isFinite(w) ? d : Double.NaN;
        }
        return OptionalDouble.empty();
    }
}
