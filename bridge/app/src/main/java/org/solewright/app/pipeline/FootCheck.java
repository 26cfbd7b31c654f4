package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.solewright.analysis.fitting.StandingLimb;
import org.solewright.analysis.gait.GaitSettings;
import org.solewright.analysis.gait.LandmarkTracks;
import org.solewright.analysis.gait.Pass;
import org.solewright.analysis.gait.RollOverCheck;
import org.solewright.analysis.gait.StanceFoot;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.Quantity;
import org.solewright.domain.foot.Population;
import org.solewright.domain.gait.Side;
import org.solewright.domain.gait.Stance;
import org.solewright.domain.gait.Use;

/** Checks every stance of one foot: the model's standing trial beside the walking recordings. */
final class FootCheck {

    /** Height over standing up to which heel or heads are down, m, for a limb of 0.9 m (design 03 section 6). */
    static final double RISE = 0.010;

    private static final double REFERENCE_LIMB = 0.9;

    private final ModelStanding standing;
    private final StandingLimb limb;
    private final FootOnGround ground;
    private final RollOverCheck.Limits limits;
    private final WalkingRollOver rollOver;
    private final List<CheckedStance> stances = new ArrayList<>();
    private final List<Finding> findings = new ArrayList<>();
    private JointCurves angles;

    private FootCheck(ModelStanding standing, FootOnGround ground) {
        this.standing = standing;
        this.ground = ground;
        limb = standing.limb();
        double weight = limb.mass().value() * GaitSettings.STANDARD_GRAVITY;
        limits = new RollOverCheck.Limits(
                RISE * limb.limbLength().value() / REFERENCE_LIMB,
                limb.footLength().map(Quantity::value).orElse(Double.NaN),
                RollOverShapes.leastLoad(weight, isHuman()));
        rollOver = new WalkingRollOver(limb, weight, isHuman());
        angles = angles(List.of(), List.of(), false);
    }

    /**
     * Checks the stances of a foot.
     *
     * @param standing the model's standing trial
     * @param ground its landmarks in the recordings
     * @param subject walking, analysed
     * @param options what the user gave: height of the floor, zero of the joint angles
     * @return the foot, checked
     */
    static FootCheck of(ModelStanding standing, FootOnGround ground, GaitSubject subject, GaitOptions options) {
        FootCheck check = new FootCheck(standing, ground);
        check.check(subject, options);
        check.say();
        return check;
    }

    private void check(GaitSubject subject, GaitOptions options) {
        List<LimbMotion> motions = new ArrayList<>();
        PoseChecks poses = new PoseChecks(limb);
        Map<Stance, List<StanceFoot.Sample>> samples = new LinkedHashMap<>();
        List<WalkingHip> hips = new ArrayList<>();
        for (int i = 0; i < subject.passes().size(); i++) {
            Pass pass = subject.passes().get(i);
            LandmarkTracks tracks = subject.walking().get(i);
            LimbMotion motion = LimbMotion.of(standing.labels(tracks), tracks, limb);
            WalkingHip hip = new WalkingHip(limb, tracks, motion);
            motions.add(motion);
            hips.add(hip);
            if (motion.shank().isPresent()) {
                poses.add(pass, motion);
                rollOver.add(pass, motion, hip::at);
            } else {
                findings.add(Finding.warning(
                        "rolling.shank-not-tracked",
                        pass.trial().name(),
                        "fewer than three points of the " + side().word()
                                + " shank of the model are tracked: no ankle, no roll-over shape"));
            }
            for (Stance stance : pass.stances()) {
                if (stance.side() == side()) {
                    samples.put(stance, ground.samples(pass, tracks, motion, stance));
                }
            }
        }
        double height = options.floor().isPresent() ? options.floor().getAsDouble() : floor(samples);
        for (int i = 0; i < motions.size(); i++) {
            add(subject.passes().get(i), motions.get(i), hips.get(i), samples, height);
        }
        angles = angles(subject.passes(), motions, options.isZeroFlat());
        findings.addAll(poses.findings());
    }

    private JointCurves angles(List<Pass> passes, List<LimbMotion> motions, boolean isZeroFlat) {
        ZeroPosture zero = ZeroPosture.of(limb, isZeroFlat, passes, motions);
        return JointCurves.of(limb, standing.posture(), zero, passes, motions, CheckedStance::isComplete);
    }

    /** Median of what the whole stances tell; of all stances where none is whole. */
    private double floor(Map<Stance, List<StanceFoot.Sample>> samples) {
        double[] whole = floors(samples, true);
        double[] told = whole.length > 0 ? whole : floors(samples, false);
        int n = told.length;
        return n == 0 ? Double.NaN : (told[(n - 1) / 2] + told[n / 2]) / 2;
    }

    private double[] floors(Map<Stance, List<StanceFoot.Sample>> samples, boolean isCompleteNeeded) {
        double[] told = samples.entrySet().stream()
                .filter(e -> !isCompleteNeeded || CheckedStance.isComplete(e.getKey()))
                .mapToDouble(e -> ground.floor(e.getValue(), limits.rise()))
                .filter(Double::isFinite)
                .toArray();
        Arrays.sort(told);
        return told;
    }

    private void add(
            Pass pass, LimbMotion motion, WalkingHip hip, Map<Stance, List<StanceFoot.Sample>> samples, double floor) {
        int number = 0;
        for (Stance stance : pass.stances()) {
            number++;
            List<StanceFoot.Sample> of = samples.get(stance);
            if (of != null) {
                StanceFoot foot = ground.over(of, floor);
                stances.add(new CheckedStance(
                        pass,
                        motion,
                        hip,
                        stance,
                        number,
                        foot,
                        RollOverCheck.of(foot, limits),
                        rollOver.shapes().stream()
                                .filter(s -> s.stance().equals(stance))
                                .findFirst()));
            }
        }
    }

    private void say() {
        for (CheckedStance s : stances) {
            if (!s.isComplete()) {
                findings.add(Finding.warning(
                        "rollover.stance-left-out",
                        place(s),
                        (s.stance().allows(Use.CONTACT_ANGLE)
                                        ? "only the contact angle of this stance is used: "
                                        : "no number of this stance is used: ")
                                + s.stance().why()));
            }
        }
        if (limb.footLength().isEmpty()) {
            findings.add(Finding.warning(
                    "rollover.no-foot-length",
                    side().word(),
                    "the model has no foot length: which places bore load is not told"));
        }
        if (ground.isHeelRaisedInStanding()) {
            findings.add(Finding.note(
                    "rollover.standing-raised",
                    side().word(),
                    "the heel stood up already in the standing trial: its heights are told over the floor"));
        }
        rollOver.findings().forEach(f -> addOnce(f));
        angles.findings().forEach(f -> addOnce(f));
    }

    private void addOnce(Finding finding) {
        if (!findings.contains(finding)) {
            findings.add(finding);
        }
    }

    static String place(CheckedStance s) {
        return s.stance().trial() + " stance " + s.number() + " "
                + s.stance().side().word();
    }

    Side side() {
        return limb.side();
    }

    boolean isHuman() {
        return limb.population() != Population.OTHER;
    }

    StandingLimb limb() {
        return limb;
    }

    boolean hasToe() {
        return ground.hasToe();
    }

    RollOverCheck.Limits limits() {
        return limits;
    }

    /** All stances of the foot, in order. */
    List<CheckedStance> stances() {
        return stances;
    }

    /** Stances of which every place in stance is known. */
    List<CheckedStance> complete() {
        return stances.stream().filter(CheckedStance::isComplete).toList();
    }

    WalkingRollOver rollOver() {
        return rollOver;
    }

    /** Joint angles over the complete stances. */
    JointCurves angles() {
        return angles;
    }

    List<Finding> findings() {
        return findings;
    }
}
