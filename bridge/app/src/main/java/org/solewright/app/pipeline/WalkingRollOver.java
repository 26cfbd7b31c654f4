package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.solewright.analysis.fitting.FittedPath;
import org.solewright.analysis.fitting.PathFit;
import org.solewright.analysis.fitting.RollOver;
import org.solewright.analysis.fitting.RollOverPath;
import org.solewright.analysis.fitting.StandingLimb;
import org.solewright.analysis.gait.GaitSettings;
import org.solewright.analysis.gait.Pass;
import org.solewright.analysis.numerics.Sample;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.Quantity;
import org.solewright.domain.foot.Rolling;
import org.solewright.domain.gait.Stance;
import org.solewright.domain.gait.Use;
import org.solewright.domain.geometry.Vec3;

/** Rolling contact of one foot from all its usable stances: arcs, outline, pivots, effective foot length. */
final class WalkingRollOver {

    private static final int OUTLINE_POINTS = 51;
    private static final double SHORTEST_DWELL = 0.040;
    private static final double REFERENCE_LIMB = 0.9;
    private static final double DWELL_SPEED = 0.034;

    /**
     * What one stance showed.
     *
     * @param stance the stance
     * @param shank path in the shank frame
     * @param limb path in the limb frame; empty where the hip is not tracked
     * @param foot centre of pressure in the model's foot frame at the samples of {@code shank}, flat {@code [n][2]}
     */
    record Shapes(Stance stance, RollOverPath shank, Optional<RollOverPath> limb, List<Vec3> foot) {}

    private final StandingLimb limb;
    private final double leastLoad;
    private final List<Shapes> shapes = new ArrayList<>();
    private final List<Finding> findings = new ArrayList<>();

    WalkingRollOver(StandingLimb limb, double weight, boolean isHuman) {
        this.limb = limb;
        this.leastLoad = RollOverShapes.leastLoad(weight, isHuman);
    }

    /** Adds the stances of this foot in a pass. */
    void add(Pass pass, LimbMotion motion) {
        add(pass, motion, f -> motion.hip(limb, f));
    }

    /** Adds the stances of this foot in a pass, with a hip centre that is known otherwise. */
    void add(Pass pass, LimbMotion motion, RollOverShapes.Joint hip) {
        for (Stance stance : pass.stances()) {
            if (stance.side() != limb.side() || !stance.allows(Use.ROLL_OVER)) {
                continue;
            }
            Optional<RollOverPath> shank =
                    RollOverShapes.of(pass, stance, f -> motion.ankle(limb, f), f -> motion.knee(limb, f), leastLoad);
            if (shank.isEmpty() || !RollOver.isLongEnough(shank.get())) {
                findings.add(Finding.warning(
                        "rolling.stance-unused",
                        pass.trial().name() + " " + limb.side().word(),
                        shank.isEmpty()
                                ? "the opposite contact is not known, so the roll-over of this stance has no end"
                                : "the shank is tracked in " + shank.get().samples()
                                        + " samples of the roll-over, too few for an arc"));
                continue;
            }
            Optional<RollOverPath> whole = RollOverShapes.of(pass, stance, f -> motion.ankle(limb, f), hip, leastLoad)
                    .filter(RollOver::isLongEnough);
            shapes.add(new Shapes(stance, shank.get(), whole, soleTrack(pass, stance, motion)));
        }
    }

    /** Centre of pressure in the model's foot frame from contact to opposite contact. */
    private List<Vec3> soleTrack(Pass pass, Stance stance, LimbMotion motion) {
        List<Vec3> track = new ArrayList<>();
        Optional<Double> end = pass.oppositeContact(stance);
        double rate = pass.trial().rate();
        int first = (int) Math.ceil((stance.start() - pass.trial().startTime()) * rate - 1e-9);
        double stop = end.orElse(stance.end());
        for (int frame = Math.max(0, first); pass.trial().startTime() + frame / rate <= stop + 1e-9; frame++) {
            Optional<Pass.StanceLoad> load = pass.load(stance, pass.trial().startTime() + frame / rate);
            int at = frame;
            if (load.isEmpty()) {
                break;
            }
            if (load.get().vertical() > leastLoad) {
                motion.rearfoot(limb, at)
                        .map(x -> inFoot(x.inversePosition(load.get().centreOfPressure())))
                        .ifPresent(track::add);
            }
        }
        return track;
    }

    /** A position of the standing laboratory frame in the frame of the foot's first segment. */
    private Vec3 inFoot(Vec3 p_L) {
        return Optional.ofNullable(limb.poses().get(limb.segments().get(1).name()))
                .map(x -> x.inversePosition(p_L))
                .orElse(new Vec3(Double.NaN, Double.NaN, Double.NaN));
    }

    /** What came of it for the model. */
    Rolling rolling() {
        List<Rolling.Arc> arcs = new ArrayList<>();
        if (shapes.isEmpty()) {
            findings.add(Finding.warning(
                    "rolling.none",
                    limb.side().word(),
                    "no stance of the " + limb.side().word()
                            + " foot can be used for the roll-over: the model has no rolling contact"));
            return Rolling.UNKNOWN;
        }
        arcs.add(RollOver.common(
                Rolling.Frame.SHANK, shapes.stream().map(Shapes::shank).toList()));
        List<RollOverPath> limbs =
                shapes.stream().flatMap(s -> s.limb().stream()).toList();
        if (limbs.isEmpty()) {
            findings.add(Finding.warning(
                    "rolling.no-limb-frame",
                    limb.side().word(),
                    "neither pelvis nor thigh is tracked with three points: no arc in the limb frame, no effective foot"
                            + " length"));
        } else {
            arcs.add(RollOver.common(Rolling.Frame.LIMB, limbs));
        }
        for (Rolling.Arc arc : arcs) {
            if (arc.curvature() <= 0) {
                findings.add(Finding.warning(
                        "rolling.flat",
                        limb.side().word(),
                        "the roll-over shape in the " + arc.frame().word()
                                + " frame is flat or hollow: it has no radius"));
            }
        }
        return new Rolling(arcs, outline(), pivots(), Optional.empty());
    }

    /** Travel of the centre of pressure in the limb frame, m. */
    Optional<Quantity> effectiveFootLength() {
        double[] extents = shapes.stream()
                .flatMap(s -> s.limb().stream())
                .mapToDouble(RollOverPath::extent)
                .toArray();
        if (extents.length == 0) {
            return Optional.empty();
        }
        Sample sample = Sample.of(extents);
        return Optional.of(new Quantity(sample.mean(), Basis.MEASURED, sample.sd()));
    }

    private List<Rolling.OutlinePoint> outline() {
        double[] x = new double[OUTLINE_POINTS];
        double[] y = new double[OUTLINE_POINTS];
        int n = 0;
        for (Shapes s : shapes) {
            if (s.foot().size() < 2) {
                continue;
            }
            n++;
            for (int i = 0; i < OUTLINE_POINTS; i++) {
                double at = i * (s.foot().size() - 1.0) / (OUTLINE_POINTS - 1);
                int k = Math.min((int) at, s.foot().size() - 2);
                Vec3 p = s.foot()
                        .get(k)
                        .times(1 - (at - k))
                        .plus(s.foot().get(k + 1).times(at - k));
                x[i] += p.x();
                y[i] += p.y();
            }
        }
        List<Rolling.OutlinePoint> outline = new ArrayList<>();
        for (int i = 0; i < OUTLINE_POINTS && n > 0; i++) {
            outline.add(new Rolling.OutlinePoint(x[i] / n, y[i] / n));
        }
        return outline;
    }

    /** One stance's pivots in the limb frame with the samples that each run spans. */
    record LimbPivots(Shapes shapes, FittedPath path, List<int[]> dwells) {}

    /** Pivots of the stances whose limb path dwells; empty where any of them rolls on. */
    List<LimbPivots> limbPivots() {
        double scale = Math.sqrt(limb.limbLength().value() / REFERENCE_LIMB);
        double dwellSpeed = DWELL_SPEED
                * Math.sqrt(GaitSettings.STANDARD_GRAVITY * limb.limbLength().value());
        List<LimbPivots> found = new ArrayList<>();
        for (Shapes s : shapes) {
            if (s.limb().isEmpty() || !s.stance().allows(Use.PIVOTS)) {
                continue;
            }
            RollOverPath path = s.limb().get();
            List<int[]> dwells = RollOver.dwells(path, SHORTEST_DWELL * scale);
            if (dwells.size() < 2) {
                return List.of();
            }
            double[] weights = PathFit.dwellWeights(path.x(), path.y(), path.load(), 1 / path.rate(), dwellSpeed);
            FittedPath pivots = PathFit.pivots(path.x(), path.y(), weights, dwells.size());
            if (!areApart(pivots, path, dwells)) {
                return List.of();
            }
            found.add(new LimbPivots(s, pivots, dwells));
        }
        boolean agree = found.stream().map(p -> p.dwells().size()).distinct().count() <= 1;
        return agree ? found : List.of();
    }

    /** Neighbours three SD apart, the SD being that of the samples within the dwells. */
    private static boolean areApart(FittedPath pivots, RollOverPath path, List<int[]> dwells) {
        double[] x = path.x();
        double[] y = path.y();
        double sum = 0;
        int n = 0;
        for (int k = 0; k < dwells.size(); k++) {
            for (int i = dwells.get(k)[0]; i <= dwells.get(k)[1]; i++) {
                sum += Math.pow(x[i] - pivots.x(k), 2) + Math.pow(y[i] - pivots.y(k), 2);
                n++;
            }
        }
        double sd = Math.sqrt(sum / n);
        for (int k = 1; k < pivots.places(); k++) {
            if (Math.hypot(pivots.x(k) - pivots.x(k - 1), pivots.y(k) - pivots.y(k - 1)) < 3 * sd) {
                return false;
            }
        }
        return true;
    }

    private List<Rolling.Pivot> pivots() {
        List<LimbPivots> found = limbPivots();
        if (found.isEmpty()) {
            findings.add(Finding.note(
                    "rolling.continuous",
                    limb.side().word(),
                    "the centre of pressure does not dwell at separate places of the sole: it rolls on, and no pivots are"
                            + " reported"));
            return List.of();
        }
        List<Rolling.Pivot> pivots = new ArrayList<>();
        Vec3 heel = inFoot(limb.landmarks().isEmpty() ? Vec3.ZERO : heelInLaboratory());
        for (int k = 0; k < found.get(0).dwells().size(); k++) {
            double along = 0;
            double height = 0;
            double from = 0;
            double to = 0;
            for (LimbPivots p : found) {
                int first = p.dwells().get(k)[0];
                int last = Math.min(p.dwells().get(k)[1], p.shapes().foot().size() - 1);
                Vec3 mean = Vec3.ZERO;
                for (int i = first; i <= last; i++) {
                    mean = mean.plus(p.shapes().foot().get(i).times(1.0 / (last - first + 1)));
                }
                double percent =
                        100 / p.shapes().shank().rate() / p.shapes().stance().duration();
                along += (mean.x() - heel.x()) / found.size();
                height += mean.y() / found.size();
                from += first * percent / found.size();
                to += last * percent / found.size();
            }
            pivots.add(new Rolling.Pivot(along, height, from, to));
        }
        return pivots;
    }

    private Vec3 heelInLaboratory() {
        return limb.landmarks().stream()
                .filter(l -> l.name().equals("calcaneus_posterior"))
                .findFirst()
                .flatMap(l ->
                        Optional.ofNullable(limb.poses().get(l.segment())).map(x -> x.transformPosition(l.position())))
                .orElse(Vec3.ZERO);
    }

    List<Shapes> shapes() {
        return shapes;
    }

    List<Finding> findings() {
        return findings;
    }
}
