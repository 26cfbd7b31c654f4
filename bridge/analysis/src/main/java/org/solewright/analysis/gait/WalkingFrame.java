package org.solewright.analysis.gait;

import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Rotation;
import org.solewright.domain.geometry.Vec3;

/**
 * The walking frame of one pass: x along the straight line fitted to the pelvis over the longest whole number of strides
 * in view (else the whole pass), on a treadmill against the belt, y up, z to the subject's right ([Wu and Cavanagh 1995]).
 */
final class WalkingFrame {

    private static final double NEAR_BELT = 0.2;

    private WalkingFrame() {}

    /**
     * The frame.
     *
     * @param trial tracks in the laboratory frame
     * @param shortestStride s, for telling peaks apart
     * @return R_LW
     * @throws IllegalArgumentException where the pelvis is not tracked in two frames or does not move
     */
    static Rotation of(WalkingTrial trial, double shortestStride) {
        if (trial.isOnTreadmill()) {
            return along(trial, againstBelt(trial));
        }
        Rotation first = along(trial, direction(trial, 0, trial.frames() - 1));
        int[] strides = longestStrides(trial, first, shortestStride);
        return strides.length == 0 ? first : along(trial, direction(trial, strides[0], strides[1]));
    }

    /**
     * Forward on a treadmill: against the motion of the heels while the belt carries them, which are the frames whose speed
     * is near the belt's.
     */
    private static Vec3 againstBelt(WalkingTrial trial) {
        Vec3 facing = Vec3.ZERO;
        for (FootTracks foot : trial.feet().values()) {
            for (int i = 0; i < foot.frames(); i++) {
                if (foot.isTracked(i)) {
                    facing = facing.plus(foot.headCentre(i).minus(foot.heel(i)));
                }
            }
        }
        facing = horizontal(trial, facing).unit();
        Vec3 carried = Vec3.ZERO;
        for (FootTracks foot : trial.feet().values()) {
            for (int i = 1; i < foot.frames(); i++) {
                Vec3 v = horizontal(trial, foot.heel(i).minus(foot.heel(i - 1))).times(trial.rate());
                double backward = -v.dot(facing) / trial.beltSpeed();
                if (backward > 1 - NEAR_BELT && backward < 1 + NEAR_BELT) {
                    carried = carried.minus(v);
                }
            }
        }
        return carried.norm() > 0 ? carried : facing;
    }

    private static Vec3 horizontal(WalkingTrial trial, Vec3 v) {
        return v.minus(trial.up().times(v.dot(trial.up())));
    }

    private static Rotation along(WalkingTrial trial, Vec3 direction) {
        return Rotation.ofYandX(trial.up(), direction);
    }

    /** Horizontal velocity of the straight line fitted to the pelvis, by least squares over time. */
    private static Vec3 direction(WalkingTrial trial, int from, int to) {
        double meanFrame = 0;
        Vec3 mean = Vec3.ZERO;
        int n = 0;
        for (int i = from; i <= to; i++) {
            if (trial.pelvis().isTracked(i)) {
                meanFrame += i;
                mean = mean.plus(trial.pelvis().at(i));
                n++;
            }
        }
        if (n < 2) {
            throw new IllegalArgumentException("pelvis tracked in " + n + " frames, expected at least 2");
        }
        meanFrame /= n;
        mean = mean.times(1.0 / n);
        Vec3 slope = Vec3.ZERO;
        for (int i = from; i <= to; i++) {
            if (trial.pelvis().isTracked(i)) {
                slope = slope.plus(trial.pelvis().at(i).minus(mean).times(i - meanFrame));
            }
        }
        return horizontal(trial, slope);
    }

    private static int[] longestStrides(WalkingTrial trial, Rotation R_LW, double shortestStride) {
        int[] best = {};
        for (Side side : trial.feet().keySet()) {
            List<Integer> contacts = contactFrames(trial, R_LW, side, shortestStride);
            if (contacts.size() > 1) {
                int from = contacts.get(0);
                int to = contacts.get(contacts.size() - 1);
                if (best.length == 0 || to - from > best[1] - best[0]) {
                    best = new int[] {from, to};
                }
            }
        }
        return best;
    }

    private static List<Integer> contactFrames(WalkingTrial trial, Rotation R_LW, Side side, double shortestStride) {
        FootTracks foot = trial.foot(side);
        double[] ahead = new double[trial.frames()];
        for (int i = 0; i < ahead.length; i++) {
            ahead[i] = foot.heel(i).minus(trial.pelvis().at(i)).dot(R_LW.x());
        }
        return KinematicEvents.peaks(ahead, (int) Math.round(shortestStride * trial.rate()));
    }

    /**
     * Time on the ground of both feet from kinematics.
     *
     * @param trial tracks in the laboratory frame
     * @param R_LW walking frame
     * @param shortestStride s
     * @return footfalls in order of their start
     */
    static List<Footfall> footfalls(WalkingTrial trial, Rotation R_LW, double shortestStride) {
        int apart = (int) Math.round(shortestStride * trial.rate());
        Map<Side, List<Footfall>> bySide = new EnumMap<>(Side.class);
        for (Side side : trial.feet().keySet()) {
            FootTracks foot = trial.foot(side);
            double[] behind = new double[trial.frames()];
            for (int i = 0; i < behind.length; i++) {
                behind[i] = trial.pelvis().at(i).minus(foot.headCentre(i)).dot(R_LW.x());
            }
            bySide.put(
                    side,
                    pair(
                            side,
                            trial,
                            contactFrames(trial, R_LW, side, shortestStride),
                            KinematicEvents.peaks(behind, apart)));
        }
        List<Footfall> all = new ArrayList<>();
        bySide.values().forEach(all::addAll);
        all.sort(java.util.Comparator.comparingDouble(Footfall::start));
        return all;
    }

    private static List<Footfall> pair(Side side, WalkingTrial trial, List<Integer> contacts, List<Integer> offs) {
        List<Footfall> falls = new ArrayList<>();
        double first = trial.time(0);
        double last = trial.time(trial.frames() - 1);
        if (!offs.isEmpty() && (contacts.isEmpty() || offs.get(0) < contacts.get(0))) {
            falls.add(new Footfall(side, first, trial.time(offs.get(0)), false, true));
        }
        for (int c : contacts) {
            double end = last;
            boolean seen = false;
            for (int o : offs) {
                if (o > c) {
                    end = trial.time(o);
                    seen = true;
                    break;
                }
            }
            falls.add(new Footfall(side, trial.time(c), end, true, seen));
        }
        return falls;
    }
}
