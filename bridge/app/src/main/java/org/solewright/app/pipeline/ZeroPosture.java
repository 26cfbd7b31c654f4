package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;
import org.solewright.analysis.fitting.MotionAxis;
import org.solewright.analysis.fitting.StandingLimb;
import org.solewright.analysis.gait.Pass;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.foot.Joint;
import org.solewright.domain.foot.SegmentName;
import org.solewright.domain.gait.Stance;
import org.solewright.domain.geometry.Pose;
import org.solewright.domain.geometry.Rotation;
import org.solewright.domain.geometry.Vec3;

/**
 * Where the joint angles of one limb are zero: in the standing trial, or at foot flat. Foot flat is the frame of a stance's
 * middle at which the shank, from ankle to knee, stands most upright; without a shank the 35 % frame. Its turns are averaged
 * over stances.
 */
final class ZeroPosture {

    /** Part of stance in which the whole foot is on the floor in walking (design 03 section 9: from 8-11 to 58-64 %). */
    private static final double FLAT_FROM = 0.12;

    private static final double FLAT_TO = 0.55;
    private static final double FLAT_MIDDLE = 0.35;

    /** Foot steeper in standing than at foot flat by more than this: its heel was raised (common practice). */
    private static final double RAISED = Math.toRadians(7);

    private final StandingLimb limb;
    private final boolean isFlat;
    private final Map<String, List<Rotation>> turns = new LinkedHashMap<>();
    private final Map<String, Rotation> means = new LinkedHashMap<>();
    private final List<Double> pitches = new ArrayList<>();

    private ZeroPosture(StandingLimb limb, boolean isFlat) {
        this.limb = limb;
        this.isFlat = isFlat;
    }

    /**
     * The zero of a limb.
     *
     * @param limb as it stood
     * @param isFlat whether foot flat is zero instead of standing
     * @param passes walking recordings
     * @param motions of the limb, in the passes' order
     * @return the zero; standing stands in for a joint that no foot flat shows
     */
    static ZeroPosture of(StandingLimb limb, boolean isFlat, List<Pass> passes, List<LimbMotion> motions) {
        ZeroPosture zero = new ZeroPosture(limb, isFlat);
        for (int i = 0; i < passes.size(); i++) {
            for (Stance stance : passes.get(i).stances()) {
                if (stance.side() == limb.side()) {
                    LimbMotion motion = motions.get(i);
                    zero.flatFrame(passes.get(i), stance, motion).ifPresent(frame -> zero.add(motion, frame));
                }
            }
        }
        zero.turns.forEach((joint, all) -> zero.means.put(joint, MotionAxis.mean(all)));
        return zero;
    }

    private OptionalInt flatFrame(Pass pass, Stance stance, LimbMotion motion) {
        double least = Double.POSITIVE_INFINITY;
        int best = -1;
        for (int frame : StanceFrames.of(pass, stance, FLAT_FROM, FLAT_TO)) {
            Optional<Vec3> ankle = motion.ankle(limb, frame);
            Optional<Vec3> knee = motion.knee(limb, frame);
            if (ankle.isPresent() && knee.isPresent()) {
                Vec3 shank = knee.get().minus(ankle.get()).unit();
                double lean = shank.cross(pass.trial().up()).norm();
                if (lean < least) {
                    least = lean;
                    best = frame;
                }
            }
        }
        if (best >= 0) {
            return OptionalInt.of(best);
        }
        return StanceFrames.of(pass, stance, FLAT_MIDDLE, FLAT_TO).stream()
                .mapToInt(Integer::intValue)
                .findFirst();
    }

    private void add(LimbMotion motion, int frame) {
        for (Joint joint : limb.joints()) {
            Optional<Pose> proximal = motion.chain().pose(joint.proximal().word(), frame);
            Optional<Pose> distal = motion.chain().pose(joint.distal().word(), frame);
            if (proximal.isPresent() && distal.isPresent()) {
                turns.computeIfAbsent(joint.name(), k -> new ArrayList<>())
                        .add(proximal.get()
                                .rotation()
                                .inverse()
                                .times(distal.get().rotation()));
            }
        }
        Optional<Pose> foot = motion.rearfoot(limb, frame);
        Optional<Pose> stood =
                Optional.ofNullable(limb.poses().get(limb.segments().get(1).name()));
        if (foot.isPresent() && stood.isPresent()) {
            Vec3 forward = foot.get().transformVector(stood.get().rotation().x());
            pitches.add(Math.asin(
                    Math.max(-1, Math.min(1, forward.dot(stood.get().rotation().y())))));
        }
    }

    /** Turn R_p^T R_d of a joint from standing to its zero. */
    Rotation turn(Joint joint) {
        return isFlat ? means.getOrDefault(joint.name(), Rotation.IDENTITY) : Rotation.IDENTITY;
    }

    /** {@code standing} or {@code flat}, as on the command line. */
    String word() {
        return isFlat ? "flat" : "standing";
    }

    /** Stances behind the zero of a joint. */
    int stances(Joint joint) {
        return isFlat ? turns.getOrDefault(joint.name(), List.of()).size() : 1;
    }

    /** What has to be said about the standing trial, and about joints without a foot flat. */
    List<Finding> findings() {
        List<Finding> findings = new ArrayList<>();
        String side = limb.side().word();
        double sum = 0;
        for (double pitch : pitches) {
            sum += pitch / pitches.size();
        }
        if (!isFlat && sum > RAISED) {
            findings.add(Finding.warning(
                    "standing.heel-raised",
                    side,
                    String.format(
                            Locale.ROOT,
                            "the %s foot stood with its heel raised: %.0f deg steeper than at foot flat in walking; record"
                                    + " standing with the heel down, or give --zero flat",
                            side,
                            Math.toDegrees(sum))));
        }
        for (Joint joint : limb.joints()) {
            if (isFlat && joint.proximal() == SegmentName.SHANK && !means.containsKey(joint.name())) {
                findings.add(Finding.warning(
                        "joint.zero-standing",
                        side + " " + joint.name(),
                        "no stance shows the " + side + " " + joint.name()
                                + " at foot flat: its angles are zero in the standing trial"));
            }
        }
        return findings;
    }
}
