package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.IntToDoubleFunction;
import org.solewright.analysis.fitting.RollOverPath;
import org.solewright.analysis.gait.Pass;
import org.solewright.analysis.gait.StanceFoot;
import org.solewright.domain.gait.CurveRow;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.gait.Stance;
import org.solewright.domain.geometry.Pose;
import org.solewright.domain.geometry.Vec3;

/**
 * Curves of one foot over its complete stances, 101 points: every stance, then mean, SD and number, then the events. The
 * roll-over points end with the opposite contact.
 */
final class RollOverCurves {

    static final String ANGLE = "foot-floor-angle";
    static final String ALONG = "cop-along-foot";

    private static final int POINTS = 101;
    private static final String METRE = "m";

    /** One curve of one stance: its unit and 101 values in it, NaN where not known. */
    private static final class Curve {
        private final String unit;
        private final double[] values;

        Curve(String unit, double[] values) {
            this.unit = unit;
            this.values = values;
        }
    }

    private final FootCheck check;
    private final List<CurveRow> rows = new ArrayList<>();
    private final Map<String, List<double[]>> ofStances = new LinkedHashMap<>();
    private final Map<String, String> units = new LinkedHashMap<>();
    private final Map<String, List<Double>> events = new LinkedHashMap<>();

    private RollOverCurves(FootCheck check) {
        this.check = check;
    }

    static RollOverCurves of(FootCheck check) {
        RollOverCurves curves = new RollOverCurves(check);
        check.complete().forEach(curves::add);
        curves.means();
        curves.rows.addAll(check.angles().rows());
        check.complete().forEach(curves::addEvents);
        curves.meanEvents();
        return curves;
    }

    List<CurveRow> rows() {
        return rows;
    }

    /**
     * Root mean square over stance of the SD between stances; empty for fewer than two.
     *
     * @param curve name of the curve
     * @return in the curve's unit
     */
    OptionalDouble consistency(String curve) {
        List<double[]> of = ofStances.getOrDefault(curve, List.of());
        if (of.size() < 2) {
            return OptionalDouble.empty();
        }
        StanceAverage average = StanceAverage.of(of);
        double sum = 0;
        int n = 0;
        for (int i = 0; i < POINTS; i++) {
            if (!Double.isNaN(average.sd(i))) {
                sum += average.sd(i) * average.sd(i);
                n++;
            }
        }
        return n == 0 ? OptionalDouble.empty() : OptionalDouble.of(Math.sqrt(sum / n));
    }

    private void add(CheckedStance s) {
        Map<String, Curve> curves = new LinkedHashMap<>();
        StanceFoot foot = s.foot();
        IntToDoubleFunction loaded = i -> foot.load(i) > check.limits().leastLoad() ? 1 : Double.NaN;
        curves.put(ANGLE, new Curve("deg", over(foot, i -> Math.toDegrees(foot.angle(i)))));
        curves.put("heel-height", new Curve(METRE, over(foot, foot::heel)));
        curves.put("metatarsal-height", new Curve(METRE, over(foot, foot::heads)));
        curves.put(ALONG, new Curve(METRE, over(foot, i -> loaded.applyAsDouble(i) * foot.centreOfPressure(i))));
        vectors(curves, s);
        force(curves, s);
        curves.forEach((name, curve) -> {
            units.put(name, curve.unit);
            if (Arrays.stream(curve.values).anyMatch(v -> !Double.isNaN(v))) {
                ofStances.computeIfAbsent(name, k -> new ArrayList<>()).add(curve.values);
                for (int i = 0; i < POINTS; i++) {
                    rows.add(row(s, name, curve.unit, i, curve.values[i], OptionalDouble.empty(), 1));
                }
            }
        });
    }

    /** Centre of pressure in the foot frame, and as roll-over shape in the frames of shank and limb. */
    private void vectors(Map<String, Curve> curves, CheckedStance s) {
        int n = s.foot().size();
        double[][] at = new double[7][n];
        for (double[] a : at) {
            Arrays.fill(a, Double.NaN);
        }
        double rate = s.pass().trial().rate();
        double begin = s.pass().trial().startTime();
        int first = Math.max(0, (int) Math.floor((s.stance().start() - begin) * rate));
        double end = s.pass().oppositeContact(s.stance()).orElse(Double.NaN);
        for (int i = 0; i < n; i++) {
            int frame = first + i;
            double time = begin + frame / rate;
            Optional<Vec3> cop = s.pass()
                    .load(s.stance(), time)
                    .filter(l -> l.vertical() > check.limits().leastLoad())
                    .map(Pass.StanceLoad::centreOfPressure);
            if (cop.isEmpty()) {
                continue;
            }
            Optional<Pose> foot = s.motion().rearfoot(check.limb(), frame);
            if (foot.isPresent()) {
                Vec3 p_A = foot.get().inversePosition(cop.get());
                at[0][i] = p_A.x();
                at[1][i] = p_A.y();
                at[2][i] = p_A.z();
            }
            Optional<Vec3> ankle = s.motion().ankle(check.limb(), frame);
            if (ankle.isPresent() && time <= end + 1 / rate) {
                shape(at, 3, i, s.pass(), cop.get(), ankle.get(), s.motion().knee(check.limb(), frame));
                shape(at, 5, i, s.pass(), cop.get(), ankle.get(), s.hip().at(frame));
            }
        }
        String[] names = {
            "cop-foot-forward",
            "cop-foot-up",
            "cop-foot-right",
            "roll-over-shank-forward",
            "roll-over-shank-up",
            "roll-over-limb-forward",
            "roll-over-limb-up"
        };
        for (int k = 0; k < names.length; k++) {
            double[] values = at[k];
            curves.put(names[k], new Curve(METRE, over(s.foot(), i -> values[i])));
        }
    }

    private static void shape(double[][] at, int row, int i, Pass pass, Vec3 cop, Vec3 ankle, Optional<Vec3> upper) {
        if (upper.isEmpty()) {
            return;
        }
        RollOverPath.Collector one = new RollOverPath.Collector(1, pass.R_LW());
        one.add(cop, ankle, upper.get(), 1);
        RollOverPath path = one.path();
        if (path.samples() == 1) {
            at[row][i] = path.x()[0];
            at[row + 1][i] = path.y()[0];
        }
    }

    /** Force on the subject in the walking frame. */
    private static void force(Map<String, Curve> curves, CheckedStance s) {
        double[][] force = new double[3][POINTS];
        for (int i = 0; i < POINTS; i++) {
            double time = s.stance().start() + i * s.stance().duration() / (POINTS - 1);
            Vec3 f = forceAt(s.pass(), s.stance(), time);
            force[0][i] = f.x();
            force[1][i] = f.y();
            force[2][i] = f.z();
        }
        curves.put("forward-force", new Curve("N", force[0]));
        curves.put("vertical-force", new Curve("N", force[1]));
        curves.put("right-force", new Curve("N", force[2]));
    }

    private static Vec3 forceAt(Pass pass, Stance stance, double time) {
        Vec3 sum = Vec3.ZERO;
        for (PlatformLoads p : pass.trial().platforms()) {
            if (stance.platforms().contains(p.number())) {
                double s = (time - p.time(0)) * p.rate();
                int i = (int) Math.floor(s + 1e-9);
                if (i < 0 || i >= p.samples()) {
                    return new Vec3(Double.NaN, Double.NaN, Double.NaN);
                }
                int next = Math.min(i + 1, p.samples() - 1);
                double share = Math.max(0, s - i);
                sum = sum.plus(p.force(i).times(1 - share)).plus(p.force(next).times(share));
            }
        }
        return pass.R_LW().inverseVector(sum);
    }

    /** At 101 points of stance, between samples by linear interpolation. */
    private static double[] over(StanceFoot foot, IntToDoubleFunction value) {
        double[] out = new double[POINTS];
        int k = 0;
        for (int i = 0; i < POINTS; i++) {
            double phase = i / (POINTS - 1.0);
            while (k + 2 < foot.size() && foot.phase(k + 1) < phase) {
                k++;
            }
            double a = foot.size() > 1 ? foot.phase(k) : Double.NaN;
            double share = foot.size() > 1 ? (phase - a) / (foot.phase(k + 1) - a) : Double.NaN;
            out[i] = share >= -1e-9 && share <= 1 + 1e-9
                    ? between(value.applyAsDouble(k), value.applyAsDouble(k + 1), share)
                    : Double.NaN;
        }
        return out;
    }

    /** An exact hit must not read a lost neighbour. */
    private static double between(double a, double b, double share) {
        return share < 1e-9 ? a : share > 1 - 1e-9 ? b : a * (1 - share) + b * share;
    }

    private void means() {
        ofStances.forEach((name, of) -> {
            StanceAverage average = StanceAverage.of(of);
            for (int i = 0; i < POINTS; i++) {
                double sd = average.sd(i);
                rows.add(mean(
                        name,
                        units.getOrDefault(name, ""),
                        100.0 * i / (POINTS - 1),
                        average.mean(i),
                        Double.isNaN(sd) ? OptionalDouble.empty() : OptionalDouble.of(sd),
                        average.count(i)));
            }
        });
    }

    private void addEvents(CheckedStance s) {
        Stance stance = s.stance();
        event(s, "foot-flat-begin", s.check().flat().from());
        event(s, "foot-flat-end", s.check().flat().to());
        event(s, "heel-rise", s.check().heelRise());
        event(
                s,
                "opposite-contact",
                s.pass()
                        .oppositeContact(stance)
                        .map(t -> (t - stance.start()) / stance.duration())
                        .orElse(Double.NaN));
        event(
                s,
                "opposite-off",
                s.pass().stances().stream()
                        .filter(o ->
                                o.side() != stance.side() && o.end() > stance.start() && o.start() < stance.start())
                        .mapToDouble(o -> (o.end() - stance.start()) / stance.duration())
                        .findFirst()
                        .orElse(Double.NaN));
    }

    private void event(CheckedStance s, String name, double phase) {
        if (Double.isNaN(phase)) {
            return;
        }
        events.computeIfAbsent(name, k -> new ArrayList<>()).add(100 * phase);
        rows.add(new CurveRow(
                s.stance().trial(),
                Integer.toString(s.number()),
                check.side(),
                "event-" + name,
                "%",
                100 * phase,
                100 * phase,
                OptionalDouble.empty(),
                1));
    }

    private void meanEvents() {
        events.forEach((name, of) -> {
            StanceAverage average =
                    StanceAverage.of(of.stream().map(v -> new double[] {v}).toList());
            double sd = average.sd(0);
            rows.add(mean(
                    "event-" + name,
                    "%",
                    average.mean(0),
                    average.mean(0),
                    Double.isNaN(sd) ? OptionalDouble.empty() : OptionalDouble.of(sd),
                    average.count(0)));
        });
    }

    private CurveRow mean(String curve, String unit, double percent, double mean, OptionalDouble sd, int n) {
        return new CurveRow("*", "mean", check.side(), curve, unit, percent, mean, sd, n);
    }

    private CurveRow row(
            CheckedStance s, String curve, String unit, int point, double value, OptionalDouble sd, int n) {
        return new CurveRow(
                s.stance().trial(),
                Integer.toString(s.number()),
                check.side(),
                curve,
                unit,
                100.0 * point / (POINTS - 1),
                value,
                sd,
                n);
    }
}
