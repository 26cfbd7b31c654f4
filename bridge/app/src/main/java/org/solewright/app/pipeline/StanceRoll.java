package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.solewright.analysis.fitting.StandingLimb;
import org.solewright.analysis.gait.Pass;
import org.solewright.app.report.FootRoll;
import org.solewright.domain.foot.SegmentName;
import org.solewright.domain.gait.Stance;
import org.solewright.domain.gait.Use;
import org.solewright.domain.geometry.Pose;
import org.solewright.domain.geometry.Rotation;
import org.solewright.domain.geometry.Vec3;

/** A stance of one foot for the moving view: the first that may be used for the roll-over, else the first. */
final class StanceRoll {

    private static final int INSTANTS = 51;
    /** Share of the stance that must be tracked. */
    private static final double LEAST = 0.8;

    private final StandingLimb limb;

    StanceRoll(StandingLimb limb) {
        this.limb = limb;
    }

    Optional<FootRoll> of(List<Pass> passes, List<LimbMotion> motions) {
        for (boolean isAsked : new boolean[] {true, false}) {
            for (int i = 0; i < passes.size(); i++) {
                for (Stance stance : passes.get(i).stances()) {
                    if (stance.side() == limb.side() && (stance.allows(Use.ROLL_OVER) || !isAsked)) {
                        Optional<FootRoll> roll = over(passes.get(i), stance, motions.get(i));
                        if (roll.isPresent()) {
                            return roll;
                        }
                    }
                }
            }
        }
        return Optional.empty();
    }

    private Optional<FootRoll> over(Pass pass, Stance stance, LimbMotion motion) {
        Rotation R_WL = pass.R_LW().inverse();
        Optional<Vec3> place = ground(pass, stance);
        if (place.isEmpty()) {
            return Optional.empty();
        }
        Vec3 ground_W = R_WL.transformVector(place.get());
        List<FootRoll.Instant> instants = new ArrayList<>();
        for (int i = 0; i < INSTANTS; i++) {
            double time = stance.start() + i * stance.duration() / (INSTANTS - 1);
            int frame = (int)
                    Math.round((time - pass.trial().startTime()) * pass.trial().rate());
            Map<SegmentName, Pose> poses = new EnumMap<>(SegmentName.class);
            limb.poses()
                    .forEach((segment, X_LS) -> motion.chain()
                            .pose(segment.word(), frame)
                            .ifPresent(x -> poses.put(segment, inWalk(R_WL, ground_W, x.times(X_LS)))));
            if (poses.size() < limb.segments().size()) {
                continue;
            }
            Optional<Pass.StanceLoad> load = pass.load(stance, time).filter(l -> l.vertical() > 0);
            instants.add(new FootRoll.Instant(
                    100.0 * i / (INSTANTS - 1),
                    poses,
                    load.map(l -> R_WL.transformVector(l.centreOfPressure()).minus(ground_W))
                            .filter(Vec3::isFinite),
                    load.map(Pass.StanceLoad::vertical).filter(Double::isFinite).orElse(0.0)));
        }
        return instants.size() < LEAST * INSTANTS
                ? Optional.empty()
                : Optional.of(new FootRoll(stance.trial(), instants));
    }

    private static Pose inWalk(Rotation R_WL, Vec3 ground_W, Pose X_LS) {
        return new Pose(
                R_WL.times(X_LS.rotation()),
                R_WL.transformVector(X_LS.position()).minus(ground_W));
    }

    /** Where the foot stood: the mean of the centre of pressure, on the platform. */
    private static Optional<Vec3> ground(Pass pass, Stance stance) {
        Vec3 sum = Vec3.ZERO;
        int n = 0;
        for (int i = 1; i < INSTANTS - 1; i++) {
            Optional<Vec3> p = pass.load(stance, stance.start() + i * stance.duration() / (INSTANTS - 1))
                    .map(Pass.StanceLoad::centreOfPressure)
                    .filter(Vec3::isFinite);
            if (p.isPresent()) {
                sum = sum.plus(p.get());
                n++;
            }
        }
        return n == 0 ? Optional.empty() : Optional.of(sum.times(1.0 / n));
    }
}
