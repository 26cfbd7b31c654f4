package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import org.solewright.analysis.fitting.ErrorDraw;
import org.solewright.analysis.fitting.FittedArc;
import org.solewright.analysis.fitting.JointAngles;
import org.solewright.analysis.fitting.RollOver;
import org.solewright.analysis.fitting.RollOverPath;
import org.solewright.analysis.fitting.StandingLimb;
import org.solewright.analysis.fitting.StandingPosture;
import org.solewright.domain.foot.Joint;
import org.solewright.domain.foot.Rolling;
import org.solewright.domain.foot.Segment;
import org.solewright.domain.geometry.Pose;
import org.solewright.domain.geometry.Rotation;
import org.solewright.domain.geometry.Vec3;

/**
 * The fitted numbers of one foot under one draw of errors, by name: one value for what standing gives, one per stance for
 * what walking gives (SI units; NaN where a stance does not give it).
 */
final class FitNumbers {

    /** Places of a stance at which the extremes of an angle are looked for. */
    private static final int PLACES = 51;

    static final List<String> ANGLES = List.of("dorsiflexion", "inversion", "adduction");

    private final Map<String, double[]> values = new LinkedHashMap<>();

    private FitNumbers() {}

    static FitNumbers of(List<StanceMotion> stances, ErrorDraw draw, StandingLimb limb, StandingPosture posture) {
        FitNumbers numbers = new FitNumbers();
        numbers.standing(limb);
        List<StanceMotion.Seen> seen = new ArrayList<>();
        for (StanceMotion stance : stances) {
            seen.add(stance.seen(draw, limb));
        }
        numbers.arcs(seen);
        for (Joint joint : limb.joints()) {
            numbers.angles(joint, JointCurves.axes(limb, joint, posture), limb, seen);
        }
        return numbers;
    }

    Map<String, double[]> values() {
        return values;
    }

    private void standing(StandingLimb limb) {
        one("limb_length", limb.limbLength().value());
        limb.footLength().ifPresent(q -> one("foot_length", q.value()));
        for (Segment segment : limb.segments()) {
            one("segment." + segment.name().word() + ".length", segment.length().value());
        }
        for (Joint joint : limb.joints()) {
            xyz("joint." + joint.name() + ".centre", joint.centre().position());
            for (Joint.Axis axis : joint.axes()) {
                xyz("axis." + axis.name(), axis.direction());
            }
        }
    }

    private void one(String name, double value) {
        values.put(name, new double[] {value});
    }

    private void xyz(String name, Vec3 v) {
        one(name + "_x", v.x());
        one(name + "_y", v.y());
        one(name + "_z", v.z());
    }

    private void arcs(List<StanceMotion.Seen> stances) {
        int n = stances.size();
        for (Rolling.Frame frame : Rolling.Frame.values()) {
            boolean isShank = frame == Rolling.Frame.SHANK;
            double[] curvature = unknown(n);
            double[] x = unknown(n);
            double[] y = unknown(n);
            double[] length = unknown(n);
            double[] extent = unknown(n);
            double[] within = unknown(n);
            for (int i = 0; i < n; i++) {
                Optional<RollOverPath> path = stances.get(i).path(isShank).filter(RollOver::isLongEnough);
                if (path.isEmpty()) {
                    continue;
                }
                FittedArc arc = RollOver.arc(path.get());
                curvature[i] = arc.curvature();
                x[i] = arc.centreX().orElse(Double.NaN);
                y[i] = arc.centreY().orElse(Double.NaN);
                length[i] = arc.arcLength();
                extent[i] = path.get().extent();
                within[i] = RollOver.blockSd(arc, path.get().rate()).orElse(Double.NaN);
            }
            String name = "arc." + frame.word() + ".";
            values.put(name + "curvature", curvature);
            values.put(name + "centre_x", x);
            values.put(name + "centre_y", y);
            values.put(name + "length", length);
            values.put(name + "curvature_within", within);
            if (!isShank) {
                values.put("effective_foot_length", extent);
            }
        }
    }

    private static double[] unknown(int n) {
        double[] values = new double[n];
        Arrays.fill(values, Double.NaN);
        return values;
    }

    private void angles(Joint joint, Rotation axes, StandingLimb limb, List<StanceMotion.Seen> stances) {
        int kinds = joint.kind() == Joint.Kind.HINGE ? 1 : ANGLES.size();
        double[][] least = new double[kinds][];
        double[][] most = new double[kinds][];
        for (int k = 0; k < kinds; k++) {
            least[k] = unknown(stances.size());
            most[k] = unknown(stances.size());
        }
        for (int i = 0; i < stances.size(); i++) {
            StanceMotion.Seen stance = stances.get(i);
            for (int place = 0; place < PLACES; place++) {
                int frame = stance.frame(place / (PLACES - 1.0));
                Optional<Pose> proximal = stance.pose(joint.proximal().word(), frame);
                Optional<Pose> distal = stance.pose(joint.distal().word(), frame);
                if (proximal.isEmpty() || distal.isEmpty()) {
                    continue;
                }
                JointAngles a = JointAngles.of(
                        axes, proximal.get().rotation(), distal.get().rotation(), limb.side());
                double[] three = {a.dorsiflexion(), a.inversion(), a.adduction()};
                for (int k = 0; k < kinds; k++) {
                    least[k][i] = Double.isNaN(least[k][i]) ? three[k] : Math.min(least[k][i], three[k]);
                    most[k][i] = Double.isNaN(most[k][i]) ? three[k] : Math.max(most[k][i], three[k]);
                }
            }
        }
        for (int k = 0; k < kinds; k++) {
            String name = String.format(Locale.ROOT, "angle.%s.%s", joint.name(), ANGLES.get(k));
            values.put(name + "_min", least[k]);
            values.put(name + "_max", most[k]);
        }
    }
}
