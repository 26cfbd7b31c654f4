package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.solewright.analysis.fitting.FittedArc;
import org.solewright.analysis.fitting.RollOver;
import org.solewright.analysis.fitting.RollOverPath;
import org.solewright.analysis.gait.RollOverCheck;
import org.solewright.analysis.numerics.Sample;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.Quantity;
import org.solewright.domain.foot.Joint;
import org.solewright.domain.foot.RollOverMeasure;
import org.solewright.domain.foot.RollOverSheet;
import org.solewright.domain.gait.Use;

/** Makes one foot of a roll-over sheet out of its checked stances. */
final class CheckedFoot {

    private final FootCheck check;
    private final RollOverCurves curves;
    private final List<Finding> findings = new ArrayList<>();

    CheckedFoot(FootCheck check, RollOverCurves curves) {
        this.check = check;
        this.curves = curves;
    }

    List<Finding> findings() {
        return findings;
    }

    RollOverSheet.Foot foot() {
        List<RollOverSheet.Stance> stances =
                check.stances().stream().map(this::stance).toList();
        List<RollOverSheet.Value> summary = summary(stances);
        if (check.complete().size() == 1) {
            findings.add(
                    Finding.note(
                            "rollover.one-stance",
                            check.side().word(),
                            "one stance of the " + check.side().word()
                                    + " foot can be used: no SD between stances, no consistency; SD of arcs are within-stance"));
        }
        List<RollOverSheet.Lock> locks = new ArrayList<>();
        for (Joint joint : check.limb().joints()) {
            check.angles().lock(joint).ifPresent(l -> locks.add(new RollOverSheet.Lock(joint.name(), l)));
        }
        RollOverSheet.Foot foot = new RollOverSheet.Foot(
                check.side(),
                check.limb().limbLength(),
                check.limb().footLength(),
                check.limb().stature(),
                stances,
                summary,
                List.of(),
                check.rollOver().shapes().isEmpty()
                        ? List.of()
                        : check.rollOver().rolling().pivots(),
                locks);
        return new RollOverSheet.Foot(
                foot.side(),
                foot.limbLength(),
                foot.footLength(),
                foot.stature(),
                stances,
                summary,
                RollOverWords.of(foot),
                foot.pivots(),
                locks);
    }

    private RollOverSheet.Stance stance(CheckedStance s) {
        RollOverCheck c = s.check();
        boolean isComplete = s.isComplete();
        boolean isKnown = isComplete && !Double.isNaN(c.heelShare());
        double length = check.limits().footLength();
        return new RollOverSheet.Stance(
                s.stance().trial(),
                s.number(),
                s.stance().start(),
                s.stance().platforms(),
                s.stance().whole(),
                s.stance().why(),
                values(s),
                isKnown ? Optional.of(c.isHeelBearing()) : Optional.empty(),
                isComplete ? evidence(c) : "",
                check.isHuman() || !isComplete
                        ? Optional.empty()
                        : Optional.of(c.posture(length, check.hasToe()).name().toLowerCase(Locale.ROOT)));
    }

    private String evidence(RollOverCheck c) {
        if (Double.isNaN(c.heelShare())) {
            return "whether the heel bore load is not known: ankle, centre of pressure or foot length is missing";
        }
        double length = check.limits().footLength();
        return String.format(
                Locale.ROOT,
                "centre of pressure behind the ankle, heel low, for %.1f %% of stance (bears from %.0f %% on); least heel"
                        + " height %.0f mm over standing, %.1f %% of foot length (low up to %.0f %%)",
                100 * c.heelShare(),
                100 * RollOverCheck.LEAST_HEEL_SHARE,
                1000 * c.leastHeel(),
                100 * c.leastHeel() / length,
                100 * RollOverCheck.LOW);
    }

    private List<RollOverSheet.Value> values(CheckedStance s) {
        Map<RollOverMeasure, Double> found = new EnumMap<>(RollOverMeasure.class);
        Map<RollOverMeasure, Double> within = new EnumMap<>(RollOverMeasure.class);
        RollOverCheck c = s.check();
        if (s.stance().allows(Use.CONTACT_ANGLE)) {
            found.put(RollOverMeasure.CONTACT_ANGLE, c.contactAngle());
        }
        if (s.isComplete()) {
            found.put(RollOverMeasure.STANCE_TIME, s.stance().duration());
            found.put(RollOverMeasure.FLAT_FROM, c.flat().from());
            found.put(RollOverMeasure.FLAT_TO, c.flat().to());
            found.put(RollOverMeasure.HEEL_RISE, c.heelRise());
            found.put(RollOverMeasure.HEEL_FROM, c.heel().from());
            found.put(RollOverMeasure.HEEL_TO, c.heel().to());
            found.put(RollOverMeasure.HEEL_SHARE, c.heelShare());
            found.put(RollOverMeasure.METATARSAL_FROM, c.heads().from());
            found.put(RollOverMeasure.METATARSAL_TO, c.heads().to());
            found.put(RollOverMeasure.TOES_FROM, c.toes().from());
            found.put(RollOverMeasure.TOES_TO, c.toes().to());
            found.put(RollOverMeasure.COP_PATH, c.travel());
            found.put(
                    RollOverMeasure.COP_PATH_SHARE, c.travel() / check.limits().footLength());
            found.put(RollOverMeasure.LEAST_HEEL, c.leastHeel());
            found.put(RollOverMeasure.LEAST_HEADS, c.leastHeads());
        }
        s.shapes().ifPresent(shapes -> {
            arc(
                    found,
                    within,
                    shapes.shank(),
                    List.of(
                            RollOverMeasure.SHANK_CURVATURE,
                            RollOverMeasure.SHANK_RADIUS,
                            RollOverMeasure.SHANK_RADIUS_OVER_LIMB,
                            RollOverMeasure.SHANK_RADIUS_OVER_STATURE,
                            RollOverMeasure.SHANK_ARC_LENGTH));
            shapes.limb().ifPresent(limb -> {
                found.put(RollOverMeasure.EFFECTIVE_LENGTH, limb.extent());
                arc(
                        found,
                        within,
                        limb,
                        List.of(
                                RollOverMeasure.LIMB_CURVATURE,
                                RollOverMeasure.LIMB_RADIUS,
                                RollOverMeasure.LIMB_RADIUS_OVER_LIMB,
                                RollOverMeasure.LIMB_RADIUS_OVER_STATURE,
                                RollOverMeasure.LIMB_ARC_LENGTH));
            });
        });
        List<RollOverSheet.Value> values = new ArrayList<>();
        for (Map.Entry<RollOverMeasure, Double> e : found.entrySet()) {
            if (Double.isFinite(e.getValue())) {
                Double sd = within.get(e.getKey());
                values.add(new RollOverSheet.Value(
                        e.getKey(),
                        e.getValue(),
                        sd == null ? OptionalDouble.empty() : OptionalDouble.of(sd),
                        RollOverSheet.Spread.WITHIN_STANCE,
                        1,
                        OptionalDouble.empty(),
                        OptionalDouble.empty(),
                        basis(e.getKey())));
            }
        }
        return values;
    }

    /** Curvature, radius, radius over limb length and stature, length of an arc; no radius where it is flat or hollow. */
    private void arc(
            Map<RollOverMeasure, Double> found,
            Map<RollOverMeasure, Double> within,
            RollOverPath path,
            List<RollOverMeasure> measures) {
        FittedArc arc = RollOver.arc(path);
        double curvature = arc.curvature();
        OptionalDouble sd = RollOver.blockSd(arc, path.rate());
        found.put(measures.get(0), curvature);
        found.put(measures.get(4), arc.arcLength());
        sd.ifPresent(u -> within.put(measures.get(0), u));
        double[] over = {
            1,
            check.limb().limbLength().value(),
            check.limb().stature().map(Quantity::value).orElse(Double.NaN)
        };
        for (int k = 0; k < over.length && curvature > 0; k++) {
            RollOverMeasure measure = measures.get(k + 1);
            double by = over[k];
            found.put(measure, 1 / curvature / by);
            sd.ifPresent(u -> within.put(measure, u / (curvature * curvature) / by));
        }
    }

    /** The weakest basis of what goes into a measure. */
    private Basis basis(RollOverMeasure measure) {
        Basis limb = check.limb().limbLength().basis();
        Basis foot = check.limb().footLength().map(Quantity::basis).orElse(Basis.MEASURED);
        return switch (measure) {
            case SHANK_RADIUS_OVER_LIMB, LIMB_RADIUS_OVER_LIMB -> limb;
            case COP_PATH_SHARE, HEEL_FROM, HEEL_TO, HEEL_SHARE, METATARSAL_FROM, METATARSAL_TO, TOES_FROM, TOES_TO ->
                foot;
            default -> Basis.MEASURED;
        };
    }

    private List<RollOverSheet.Value> summary(List<RollOverSheet.Stance> stances) {
        List<RollOverSheet.Value> summary = new ArrayList<>();
        for (RollOverMeasure measure : RollOverMeasure.values()) {
            List<RollOverSheet.Value> of =
                    stances.stream().flatMap(s -> s.value(measure).stream()).toList();
            if (!of.isEmpty()) {
                summary.add(mean(measure, of));
            }
        }
        consistency(RollOverCurves.ANGLE)
                .ifPresent(v -> summary.add(alike(RollOverMeasure.ANGLE_CONSISTENCY, Math.toRadians(v))));
        consistency(RollOverCurves.ALONG).ifPresent(v -> summary.add(alike(RollOverMeasure.COP_CONSISTENCY, v)));
        return summary;
    }

    private Optional<Double> consistency(String curve) {
        OptionalDouble v = curves.consistency(curve);
        return v.isPresent() ? Optional.of(v.getAsDouble()) : Optional.empty();
    }

    private RollOverSheet.Value alike(RollOverMeasure measure, double value) {
        return new RollOverSheet.Value(
                measure,
                value,
                OptionalDouble.empty(),
                RollOverSheet.Spread.BETWEEN_STANCES,
                check.complete().size(),
                OptionalDouble.empty(),
                OptionalDouble.empty(),
                Basis.MEASURED);
    }

    /** Mean, SD and interval; of radii by way of their curvatures. */
    private static RollOverSheet.Value mean(RollOverMeasure measure, List<RollOverSheet.Value> of) {
        if (of.size() == 1) {
            return of.get(0);
        }
        boolean isRadius = measure.isOfRadius();
        Sample sample = Sample.of(of.stream()
                .mapToDouble(v -> isRadius ? 1 / v.value() : v.value())
                .toArray());
        double m = sample.mean();
        OptionalDouble half = sample.half95();
        double h = half.orElse(Double.NaN);
        double sd = sample.sd().orElseThrow();
        return new RollOverSheet.Value(
                measure,
                isRadius ? 1 / m : m,
                OptionalDouble.of(isRadius ? sd / (m * m) : sd),
                RollOverSheet.Spread.BETWEEN_STANCES,
                sample.n(),
                half.isPresent() ? OptionalDouble.of(isRadius ? 1 / (m + h) : m - h) : OptionalDouble.empty(),
                half.isPresent() && !(isRadius && m <= h)
                        ? OptionalDouble.of(isRadius ? 1 / (m - h) : m + h)
                        : OptionalDouble.empty(),
                of.get(0).basis());
    }
}
