package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.Predicate;
import org.solewright.analysis.fitting.JointAngles;
import org.solewright.analysis.fitting.StandingLimb;
import org.solewright.analysis.fitting.StandingPosture;
import org.solewright.analysis.gait.Pass;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.foot.Joint;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.foot.SegmentName;
import org.solewright.domain.gait.CurveRow;
import org.solewright.domain.gait.Side;
import org.solewright.domain.gait.Stance;
import org.solewright.domain.geometry.Pose;
import org.solewright.domain.geometry.Rotation;
import org.solewright.domain.geometry.Vec3;

/**
 * Angles of one foot's joints over stance, zero in the standing trial or at foot flat, 101 points: every stance of its own,
 * then mean and SD over all, then how far that zero lies from the standing trial. A joint between two segments of the chain, one of which is not tracked, has none.
 */
final class JointCurves {

    private static final int POINTS = 101;
    private static final List<String> NAMES = List.of("dorsiflexion", "inversion", "adduction");

    private final StandingLimb limb;
    private final ZeroPosture zero;
    private final Predicate<Stance> isUsed;
    private final List<CurveRow> rows = new ArrayList<>();
    private final List<Finding> findings = new ArrayList<>();
    private final Map<String, StanceAverage> dorsiflexion = new LinkedHashMap<>();

    private JointCurves(StandingLimb limb, ZeroPosture zero, Predicate<Stance> isUsed) {
        this.limb = limb;
        this.zero = zero;
        this.isUsed = isUsed;
    }

    static JointCurves of(
            StandingLimb limb, StandingPosture posture, ZeroPosture zero, List<Pass> passes, List<LimbMotion> motions) {
        return of(limb, posture, zero, passes, motions, stance -> true);
    }

    /** Angles over those stances alone that are asked for. */
    static JointCurves of(
            StandingLimb limb,
            StandingPosture posture,
            ZeroPosture zero,
            List<Pass> passes,
            List<LimbMotion> motions,
            Predicate<Stance> isUsed) {
        JointCurves curves = new JointCurves(limb, zero, isUsed);
        curves.findings.addAll(zero.findings());
        for (Joint joint : limb.joints()) {
            curves.add(joint, axes(limb, joint, posture), passes, motions);
        }
        return curves;
    }

    /** R_LB of a joint: z across it, of the ankle along the malleoli, y up the shank [Wu 2002]. */
    static Rotation axes(StandingLimb limb, Joint joint, StandingPosture posture) {
        Pose proximal = Optional.ofNullable(limb.poses().get(joint.proximal())).orElseThrow();
        Vec3 across = proximal.transformVector(joint.axes().get(0).direction());
        Vec3 upwards = joint.proximal() == SegmentName.SHANK
                ? limb.knee().position().minus(limb.ankle().position())
                : posture.up();
        Optional<Vec3> medial = posture.position(Landmark.MALLEOLUS_MEDIAL, limb.side());
        Optional<Vec3> lateral = posture.position(Landmark.MALLEOLUS_LATERAL, limb.side());
        if (joint.proximal() == SegmentName.SHANK && medial.isPresent() && lateral.isPresent()) {
            Vec3 outwards = lateral.get().minus(medial.get());
            across = limb.side() == Side.RIGHT ? outwards : outwards.times(-1);
        }
        return JointAngles.axes(across, upwards);
    }

    private void add(Joint joint, Rotation axes, List<Pass> passes, List<LimbMotion> motions) {
        boolean isHinge = joint.kind() == Joint.Kind.HINGE;
        List<List<double[]>> ofStances = List.of(new ArrayList<>(), new ArrayList<>(), new ArrayList<>());
        double steepest = 0;
        for (int i = 0; i < passes.size(); i++) {
            Pass pass = passes.get(i);
            int number = 0;
            for (Stance stance : pass.stances()) {
                number++;
                if (stance.side() != limb.side() || !isUsed.test(stance)) {
                    continue;
                }
                double[][] angles =
                        over(pass, stance, joint, axes, motions.get(i).chain());
                for (int k = 0; k < (isHinge ? 1 : NAMES.size()); k++) {
                    if (hasAny(angles[k])) {
                        ofStances.get(k).add(angles[k]);
                        addRows(stance.trial(), Integer.toString(number), name(joint, k), angles[k]);
                    }
                }
                for (double floating : angles[1]) {
                    steepest = Double.isNaN(floating) ? steepest : Math.max(steepest, Math.abs(floating));
                }
            }
        }
        for (int k = 0; k < NAMES.size(); k++) {
            if (!ofStances.get(k).isEmpty()) {
                StanceAverage average = StanceAverage.of(ofStances.get(k));
                addMean(name(joint, k), average);
                addZero(
                        name(joint, k),
                        angle(JointAngles.of(axes, Rotation.IDENTITY, zero.turn(joint), limb.side()), k),
                        joint);
                if (k == 0) {
                    dorsiflexion.put(joint.name(), average);
                }
            }
        }
        if (steepest > JointAngles.LARGEST_FLOATING) {
            findings.add(Finding.warning(
                    "joint.floating-angle",
                    limb.side().word() + " " + joint.name(),
                    String.format(
                            Locale.ROOT,
                            "the floating angle of the %s %s reaches %.0f deg in stance, over 80 deg: its other two"
                                    + " angles have no meaning there",
                            limb.side().word(),
                            joint.name(),
                            Math.toDegrees(steepest))));
        }
    }

    private static String name(Joint joint, int angle) {
        return joint.name() + "-" + NAMES.get(angle);
    }

    private static boolean hasAny(double[] values) {
        for (double v : values) {
            if (!Double.isNaN(v)) {
                return true;
            }
        }
        return false;
    }

    /** The three angles, rad, at 101 points of a stance, between frames by linear interpolation; NaN where not known. */
    private double[][] over(Pass pass, Stance stance, Joint joint, Rotation axes, LimbChain chain) {
        double[][] out = new double[NAMES.size()][POINTS];
        for (int i = 0; i < POINTS; i++) {
            double time = stance.start() + i * stance.duration() / (POINTS - 1);
            double at = (time - pass.trial().startTime()) * pass.trial().rate();
            int frame = (int) Math.floor(at + 1e-9);
            double part = Math.max(0, at - frame);
            double[] before = at(joint, axes, chain, frame);
            double[] after = part > 1e-9 ? at(joint, axes, chain, frame + 1) : before;
            for (int k = 0; k < out.length; k++) {
                double turn = Math.IEEEremainder(after[k] - before[k], 2 * Math.PI);
                out[k][i] = before[k] + part * turn;
            }
        }
        return out;
    }

    private double[] at(Joint joint, Rotation axes, LimbChain chain, int frame) {
        Optional<Pose> proximal = chain.pose(joint.proximal().word(), frame);
        Optional<Pose> distal = chain.pose(joint.distal().word(), frame);
        if (proximal.isEmpty() || distal.isEmpty()) {
            return new double[] {Double.NaN, Double.NaN, Double.NaN};
        }
        JointAngles angles = JointAngles.of(
                axes,
                proximal.get().rotation(),
                distal.get().rotation().times(zero.turn(joint).inverse()),
                limb.side());
        return new double[] {angles.dorsiflexion(), angles.inversion(), angles.adduction()};
    }

    private void addRows(String trial, String step, String curve, double[] angles) {
        for (int i = 0; i < POINTS; i++) {
            rows.add(new CurveRow(
                    trial,
                    step,
                    limb.side(),
                    curve,
                    "deg",
                    100.0 * i / (POINTS - 1),
                    Math.toDegrees(angles[i]),
                    OptionalDouble.empty(),
                    1));
        }
    }

    private void addMean(String curve, StanceAverage average) {
        for (int i = 0; i < POINTS; i++) {
            double sd = average.sd(i);
            rows.add(new CurveRow(
                    "*",
                    "mean",
                    limb.side(),
                    curve,
                    "deg",
                    100.0 * i / (POINTS - 1),
                    Math.toDegrees(average.mean(i)),
                    Double.isNaN(sd) ? OptionalDouble.empty() : OptionalDouble.of(Math.toDegrees(sd)),
                    average.count(i)));
        }
    }

    /** Where the angle's zero lies from the standing trial: the same value at all points. */
    private void addZero(String curve, double angle, Joint joint) {
        for (int i = 0; i < POINTS; i++) {
            rows.add(new CurveRow(
                    "*",
                    "mean",
                    limb.side(),
                    curve + "-zero-" + zero.word(),
                    "deg",
                    100.0 * i / (POINTS - 1),
                    Math.toDegrees(angle),
                    OptionalDouble.empty(),
                    zero.stances(joint)));
        }
    }

    private static double angle(JointAngles angles, int k) {
        return k == 0 ? angles.dorsiflexion() : k == 1 ? angles.inversion() : angles.adduction();
    }

    List<CurveRow> rows() {
        return rows;
    }

    List<Finding> findings() {
        return findings;
    }

    /** Least and largest mean angle over stance of a joint's first axis; empty where it was not tracked. */
    Optional<Joint.Range> range(Joint joint) {
        return Optional.ofNullable(dorsiflexion.get(joint.name())).map(a -> {
            double[] ends = a.range();
            return new Joint.Range(ends[0], ends[1], Basis.MEASURED);
        });
    }

    /** Where a joint's angle holds still in stance; empty where it does not or was not tracked. */
    Optional<Joint.Lock> lock(Joint joint) {
        return Optional.ofNullable(dorsiflexion.get(joint.name())).flatMap(StanceAverage::lock);
    }
}
