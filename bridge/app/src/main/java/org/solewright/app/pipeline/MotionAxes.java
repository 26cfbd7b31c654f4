package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;
import org.solewright.analysis.fitting.MotionAxis;
import org.solewright.analysis.fitting.StandingLimb;
import org.solewright.analysis.gait.Pass;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.Found;
import org.solewright.domain.foot.Joint;
import org.solewright.domain.geometry.Pose;
import org.solewright.domain.geometry.Rotation;
import org.solewright.domain.geometry.Vec3;

/**
 * Axes of the joints from how their segments turned against each other in stance, where both were seen by three points or
 * more, turned by over 10 deg and left under 2 deg to one hinge; else the axis stays as standing gave it.
 */
final class MotionAxes {

    /** Looks at a joint within this time are one, s (design 03 section 7: blocks of 100 ms). */
    private static final double BLOCK = 0.1;

    private MotionAxes() {}

    /**
     * The limb with the axes that motion showed.
     *
     * @param limb as it stood
     * @param passes walking recordings
     * @param motions of the limb, in the passes' order
     * @return the limb, and a note for each axis that motion gave
     */
    static Found<StandingLimb> of(StandingLimb limb, List<Pass> passes, List<LimbMotion> motions) {
        List<Joint> joints = new ArrayList<>();
        List<Finding> findings = new ArrayList<>();
        for (Joint joint : limb.joints()) {
            List<Rotation> relative = new ArrayList<>();
            double blocks = 0;
            for (int i = 0; i < passes.size(); i++) {
                List<Rotation> here =
                        relative(limb, joint, passes.get(i), motions.get(i).chain());
                blocks += here.size() / passes.get(i).trial().rate() / BLOCK;
                relative.addAll(here);
            }
            Optional<MotionAxis> axis = joint.axes().isEmpty()
                    ? Optional.empty()
                    : MotionAxis.of(relative).filter(MotionAxis::isAccepted);
            if (axis.isPresent()) {
                findings.add(note(limb, joint, axis.get(), relative.size()));
                joints.add(turned(limb, joint, axis.get(), blocks));
            } else {
                joints.add(joint);
            }
        }
        return new Found<>(findings.isEmpty() ? limb : limb.withJoints(joints), findings);
    }

    /** Turns R_p^T R_d of the distal in the proximal segment from standing to the frames of stance. */
    private static List<Rotation> relative(StandingLimb limb, Joint joint, Pass pass, LimbChain chain) {
        String proximal = joint.proximal().word();
        String distal = joint.distal().word();
        if (!chain.isTurnSeen(proximal) || !chain.isTurnSeen(distal)) {
            return List.of();
        }
        List<Rotation> relative = new ArrayList<>();
        for (int frame : StanceFrames.of(pass, limb.side())) {
            Optional<Pose> p = chain.pose(proximal, frame);
            Optional<Pose> d = chain.pose(distal, frame);
            if (p.isPresent() && d.isPresent()) {
                relative.add(p.get().rotation().inverse().times(d.get().rotation()));
            }
        }
        return relative;
    }

    private static Joint turned(StandingLimb limb, Joint joint, MotionAxis axis, double blocks) {
        Pose proximal = Optional.ofNullable(limb.poses().get(joint.proximal())).orElseThrow();
        Joint.Axis old = joint.axes().get(0);
        Vec3 direction = proximal.rotation().inverseVector(axis.proximal());
        // The sense of an axis is that of the anatomical one: toes up, or to the subject's right.
        Vec3 alike = direction.dot(old.direction()) < 0 ? direction.times(-1) : direction;
        List<Joint.Axis> axes = new ArrayList<>(joint.axes());
        axes.set(
                0,
                new Joint.Axis(
                        old.name(),
                        alike,
                        Basis.MEASURED,
                        OptionalDouble.of(axis.sd(blocks)),
                        Joint.Axis.Source.MOTION));
        return joint.withAxes(axes);
    }

    private static Finding note(StandingLimb limb, Joint joint, MotionAxis axis, int frames) {
        return Finding.note(
                "joint.axis-from-motion",
                limb.side().word() + " " + joint.name(),
                String.format(
                        Locale.ROOT,
                        "the %s %s turns by %.0f deg about one axis, which %d frames of stance leave by %.1f deg rms: it is"
                                + " taken from them instead of the landmarks",
                        limb.side().word(),
                        joint.name(),
                        Math.toDegrees(axis.range()),
                        frames,
                        Math.toDegrees(axis.residual())));
    }
}
