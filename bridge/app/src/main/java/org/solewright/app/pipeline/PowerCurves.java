package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import org.solewright.analysis.cost.StepMechanics;
import org.solewright.analysis.gait.Step;
import org.solewright.analysis.numerics.Series;
import org.solewright.domain.gait.CurveRow;
import org.solewright.domain.gait.Stance;

/**
 * Power of each limb on the centre of mass over its stance; the same and the velocity of the centre of mass over the work
 * window ({@code step-}); 101 points each, empty where not every load is known. A point holds the mean over the interval
 * nearer to it than to its neighbours, so that areas by the trapezoidal rule are the integrals of the samples; where the
 * sign changes in that interval it is 0, and what lies to either side of the change is added to the neighbours.
 */
final class PowerCurves {

    private static final int POINTS = 101;
    private static final String WATT = "W";
    private static final String SPEED = "m/s";
    private static final List<String> DIRECTIONS = List.of("forward", "up", "right");

    private final List<CurveRow> rows = new ArrayList<>();
    private final Step step;

    private PowerCurves(Step step) {
        this.step = step;
    }

    static List<CurveRow> of(Step step, StepMechanics mechanics) {
        PowerCurves curves = new PowerCurves(step);
        Stance trailing = step.loads().trailing();
        Stance leading = step.loads().leading();
        curves.add(trailing, "trailing-limb-power", WATT, mechanics.trailingPower(), trailing.start(), trailing.end());
        curves.add(leading, "leading-limb-power", WATT, mechanics.leadingPower(), leading.start(), leading.end());
        double from = step.loads().windowFrom();
        double to = step.loads().windowTo();
        curves.add(trailing, "step-trailing-limb-power", WATT, mechanics.trailingPower(), from, to);
        curves.add(leading, "step-leading-limb-power", WATT, mechanics.leadingPower(), from, to);
        for (int c = 0; c < DIRECTIONS.size(); c++) {
            curves.add(
                    leading,
                    "step-com-velocity-" + DIRECTIONS.get(c),
                    SPEED,
                    mechanics.motion().velocity(c),
                    from,
                    to);
        }
        return curves.rows;
    }

    private void add(Stance stance, String curve, String unit, Series values, double from, double to) {
        double half = (to - from) / (POINTS - 1) / 2;
        double[] mean = new double[POINTS];
        double[] positive = new double[POINTS];
        for (int i = 0; i < POINTS; i++) {
            double time = from + i * (to - from) / (POINTS - 1);
            double a = Math.max(Math.max(from, time - half), step.loads().knownFrom());
            double b = Math.min(Math.min(to, time + half), Math.min(step.loads().knownTo(), values.end()));
            boolean isKnown =
                    time >= step.loads().knownFrom() && time <= step.loads().knownTo() && b > a;
            mean[i] = isKnown ? values.mean(a, b) : Double.NaN;
            positive[i] = isKnown ? values.positiveIntegral(a, b) / (b - a) : Double.NaN;
        }
        double[] shown = parted(mean, positive);
        for (int i = 0; i < POINTS; i++) {
            rows.add(new CurveRow(
                    stance.trial(),
                    Integer.toString(step.number()),
                    stance.side(),
                    curve,
                    unit,
                    100.0 * i / (POINTS - 1),
                    shown[i],
                    OptionalDouble.empty(),
                    1));
        }
    }

    /** Where the sign changes once within an interval: 0 there, what is positive and negative at the neighbours. */
    private static double[] parted(double[] mean, double[] positive) {
        double[] shown = mean.clone();
        for (int i = 2; i + 2 < mean.length; i++) {
            double up = positive[i];
            double down = mean[i] - up;
            boolean isMixed = up > 0 && down < 0 && mean[i - 1] * mean[i + 1] < 0;
            boolean isClear = isOfOneSign(mean, positive, i - 1) && isOfOneSign(mean, positive, i + 1);
            if (isMixed && isClear) {
                boolean isFalling = mean[i - 1] > 0;
                shown[i] = 0;
                shown[i - 1] += isFalling ? up : down;
                shown[i + 1] += isFalling ? down : up;
            }
        }
        return shown;
    }

    private static boolean isOfOneSign(double[] mean, double[] positive, int i) {
        return positive[i] == 0 || mean[i] == positive[i] || Math.abs(mean[i] - positive[i]) < 1e-9 * positive[i];
    }

    /** Mean, SD and number over the single curves of each side and name. */
    static List<CurveRow> means(List<CurveRow> single) {
        Map<String, List<CurveRow>> byCurve = new LinkedHashMap<>();
        for (CurveRow r : single) {
            byCurve.computeIfAbsent(r.side().word() + " " + r.curve(), k -> new ArrayList<>())
                    .add(r);
        }
        List<CurveRow> means = new ArrayList<>();
        for (List<CurveRow> of : byCurve.values()) {
            List<double[]> curves = new ArrayList<>();
            for (int i = 0; i < of.size(); i += POINTS) {
                curves.add(of.subList(i, i + POINTS).stream()
                        .mapToDouble(CurveRow::mean)
                        .toArray());
            }
            StanceAverage average = StanceAverage.of(curves);
            for (int i = 0; i < POINTS; i++) {
                double sd = average.sd(i);
                means.add(new CurveRow(
                        "*",
                        "mean",
                        of.get(0).side(),
                        of.get(0).curve(),
                        of.get(0).unit(),
                        100.0 * i / (POINTS - 1),
                        average.mean(i),
                        Double.isNaN(sd) ? OptionalDouble.empty() : OptionalDouble.of(sd),
                        average.count(i)));
            }
        }
        return means;
    }
}
