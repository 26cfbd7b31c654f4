package org.solewright.analysis.cost;

import java.util.Optional;
import java.util.function.IntFunction;
import org.solewright.analysis.dynamics.FilteredLoads;
import org.solewright.analysis.dynamics.Wrench;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.geometry.Pose;
import org.solewright.domain.geometry.Vec3;

/**
 * Work of everything distal to a segment over a stance, joints and soft parts alike [Takahashi and Stanhope 2013]: the
 * ground's wrench on the segment as if it were rigid to the ground. Loads and poses pass the same low-pass [Bisseling and
 * Hof 2006]; the power of a rigid foot alone would miss what its own joints do.
 */
public final class DistalWork {

    private final IntFunction<Optional<Pose>> pose;
    private final double rate;
    private final double startTime;
    private final Vec3 belt;

    /**
     * A segment's motion.
     *
     * @param pose of the segment by zero-based frame, body to laboratory frame; empty where it is not known
     * @param rate frames per second, Hz
     * @param startTime of the first frame, s
     * @param belt velocity of the ground in the laboratory frame, m/s; 0 over ground
     */
    public DistalWork(IntFunction<Optional<Pose>> pose, double rate, double startTime, Vec3 belt) {
        this.pose = pose;
        this.rate = rate;
        this.startTime = startTime;
        this.belt = belt;
    }

    /**
     * Positive and negative work over a stance.
     *
     * @param platform on which the foot stands
     * @param cutoff low-pass that the poses' points have passed, Hz; 0: none
     * @param from contact, s
     * @param to foot-off, s
     * @return the works; empty where the pose is not known throughout
     */
    public Optional<PowerWork> over(PlatformLoads platform, double cutoff, double from, double to) {
        FilteredLoads loads = FilteredLoads.of(platform, cutoff);
        int first = (int) Math.ceil((from - startTime) * rate);
        int last = (int) Math.floor((to - startTime) * rate);
        if (last - first < 2) {
            return Optional.empty();
        }
        double[] power = new double[last - first + 1];
        for (int frame = first; frame <= last; frame++) {
            Optional<Vec3[]> motion = motion(frame, platform.centre());
            double time = startTime + frame / rate;
            if (motion.isEmpty() || !loads.covers(time)) {
                return Optional.empty();
            }
            Wrench load = loads.at(time);
            power[frame - first] =
                    load.force().dot(motion.get()[0]) + load.moment().dot(motion.get()[1]);
        }
        return Optional.of(PowerWork.of(power, 1 / rate));
    }

    /** Velocity against the ground of the body's point at a place, and the body's angular velocity. */
    private Optional<Vec3[]> motion(int frame, Vec3 place) {
        if (frame < 1) {
            return Optional.empty();
        }
        Optional<Pose> before = pose.apply(frame - 1);
        Optional<Pose> now = pose.apply(frame);
        Optional<Pose> after = pose.apply(frame + 1);
        if (before.isEmpty() || now.isEmpty() || after.isEmpty()) {
            return Optional.empty();
        }
        Vec3 v = velocity(before.get(), now.get(), after.get(), place);
        Vec3 x = velocity(before.get(), now.get(), after.get(), place.plus(Vec3.X))
                .minus(v);
        Vec3 y = velocity(before.get(), now.get(), after.get(), place.plus(Vec3.Y))
                .minus(v);
        // w x (1, 0, 0) = (0, w_z, -w_y), w x (0, 1, 0) = (-w_z, 0, w_x).
        Vec3 w = new Vec3(y.z(), -x.z(), (x.y() - y.x()) / 2);
        return Optional.of(new Vec3[] {v.minus(belt), w});
    }

    private Vec3 velocity(Pose before, Pose now, Pose after, Vec3 place) {
        Vec3 body = now.inversePosition(place);
        return after.transformPosition(body)
                .minus(before.transformPosition(body))
                .times(rate / 2);
    }
}
