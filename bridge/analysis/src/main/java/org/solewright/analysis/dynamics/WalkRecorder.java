package org.solewright.analysis.dynamics;

import java.util.ArrayList;
import java.util.List;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Pose;
import org.solewright.domain.geometry.Vec3;
import org.solewright.domain.motion.PointTrack;
import org.solewright.domain.motion.Recording;

/**
 * Samples an invented walk as a laboratory would record it: points of both limbs and the pelvis, and two force platforms
 * that catch two footfalls in a row.
 *
 * <p>The walk's own frame has x forward, y to the left, z up, the ground at z = 0; a pose puts it into the laboratory.
 */
public final class WalkRecorder {

    /** Footfalls on platforms 1 and 2. */
    private static final int FIRST_ON_PLATFORM = 2;

    private static final int PLATFORM_TYPE = 2;

    private final SyntheticWalk walk;
    private final Settings settings;
    private final LimbPose pose;

    /** What a point moves with. */
    public enum Carrier {
        /** With the hip, without turning. */
        PELVIS,
        /** Turns with the limb about the hip. */
        THIGH,
        /** Turns with the limb and follows its telescoping: shank and foot. */
        SHANK_AND_FOOT
    }

    /**
     * A point of the body.
     *
     * @param label its label, unique in the recording
     * @param side whose limb; for the pelvis any
     * @param carrier what it moves with
     * @param place in the limb frame of the upright limb: x forward, y left, z up from the mid-point between the hips, m
     */
    public record BodyPoint(String label, Side side, Carrier carrier, Vec3 place) {}

    /**
     * How it is recorded.
     *
     * @param name of the recording
     * @param pointRate frames per second, Hz, above 0
     * @param samplesPerFrame force samples per frame, 1 or more
     * @param steps number of steps, 1 or more; 6 shows both platforms' footfalls with two steps before and after
     * @param rightFirst whether the right limb makes the even footfalls, of which number 2 meets platform 1
     * @param footOffset sideways distance of each foot from the mid-line, m, not negative
     * @param platformWidth sideways size of the platforms, m, above 0
     * @param ankleX forward place of the ankle in the limb frame, m
     * @param ankleZ upward place of the ankle in the limb frame, m, below 0
     * @param laboratory pose of the walk's frame in the laboratory
     */
    public record Settings(
            String name,
            double pointRate,
            int samplesPerFrame,
            int steps,
            boolean rightFirst,
            double footOffset,
            double platformWidth,
            double ankleX,
            double ankleZ,
            Pose laboratory) {

        /** Checks the ranges. */
        public Settings {
            if (!(pointRate > 0)
                    || samplesPerFrame < 1
                    || steps < 1
                    || !(footOffset >= 0)
                    || !(platformWidth > 0)
                    || !(ankleZ < 0)) {
                throw new IllegalArgumentException("recording at " + pointRate + " Hz, " + samplesPerFrame
                        + " samples per frame, " + steps + " steps, feet " + footOffset + " m aside, platforms "
                        + platformWidth + " m wide, ankle at " + ankleZ
                        + " m; expected numbers above 0 and the ankle below the hip");
            }
        }
    }

    /**
     * A recorder.
     *
     * @param walk what is recorded
     * @param settings how
     */
    public WalkRecorder(SyntheticWalk walk, Settings settings) {
        this.walk = walk;
        this.settings = settings;
        this.pose = new LimbPose(walk, settings.ankleX(), settings.ankleZ());
    }

    /**
     * The walking recording: from the first vault over foot 0 on, as many steps as set, time 0 at its first frame.
     *
     * @param points of the body, labels unique
     * @return points, two platforms, no events
     */
    public Recording walking(List<BodyPoint> points) {
        int frames = (int) Math.floor(settings.steps() * walk.stepTime() * settings.pointRate()) + 1;
        List<PointTrack> tracks = new ArrayList<>();
        for (BodyPoint point : points) {
            double[] xyz = new double[3 * frames];
            for (int frame = 0; frame < frames; frame++) {
                put(place(point, frame / settings.pointRate()), xyz, 3 * frame);
            }
            tracks.add(PointTrack.of(point.label(), xyz));
        }
        List<PlatformLoads> platforms =
                List.of(platform(1, FIRST_ON_PLATFORM, frames), platform(2, FIRST_ON_PLATFORM + 1, frames));
        return new Recording(settings.name(), settings.pointRate(), 1, frames, tracks, platforms, List.of(), List.of());
    }

    /**
     * A standing recording: both limbs upright on their lowest pivots at x = 0, nothing moves, no platforms.
     *
     * @param name of the recording
     * @param frames number of frames, 1 or more
     * @param points of the body, labels unique
     * @return points only
     */
    public Recording standing(String name, int frames, List<BodyPoint> points) {
        double height = standingHeight();
        List<PointTrack> tracks = new ArrayList<>();
        for (BodyPoint point : points) {
            double[] xyz = new double[3 * frames];
            Vec3 place = settings.laboratory().transformPosition(point.place().plus(Vec3.Z.times(height)));
            for (int frame = 0; frame < frames; frame++) {
                put(place, xyz, 3 * frame);
            }
            tracks.add(PointTrack.of(point.label(), xyz));
        }
        return new Recording(name, settings.pointRate(), 1, frames, tracks, List.of(), List.of(), List.of());
    }

    /**
     * Height of the hip above the ground when the limb is upright.
     *
     * @return m
     */
    public double standingHeight() {
        double lowest = 0;
        for (int pivot = 0; pivot <= walk.parameters().segments(); pivot++) {
            lowest = Math.max(lowest, walk.radius() * Math.cos(walk.pivotAngle(pivot)));
        }
        return lowest;
    }

    /**
     * Side of a footfall.
     *
     * @param foot number of the footfall
     * @return whose foot it is
     */
    public Side side(int foot) {
        boolean even = Math.floorMod(foot, 2) == 0;
        return even == settings.rightFirst() ? Side.RIGHT : Side.LEFT;
    }

    /**
     * A point of the body.
     *
     * @param point which
     * @param time s
     * @return laboratory frame, m
     */
    public Vec3 place(BodyPoint point, double time) {
        double[] hip = new double[HipPhase.STATE];
        walk.hip(time, hip);
        Vec3 p = point.place();
        double x = p.x();
        double z = p.z();
        if (point.carrier() != Carrier.PELVIS) {
            double[] limb = new double[2];
            pose.at(side(0) == point.side() ? 0 : 1, time, limb);
            double extension = point.carrier() == Carrier.SHANK_AND_FOOT ? limb[1] : 0;
            double limbX = x + extension * pose.axisX();
            double limbZ = z + extension * pose.axisZ();
            x = limbX * Math.cos(limb[0]) + limbZ * Math.sin(limb[0]);
            z = -limbX * Math.sin(limb[0]) + limbZ * Math.cos(limb[0]);
        }
        return settings.laboratory().transformPosition(new Vec3(hip[HipPhase.X] + x, p.y(), hip[HipPhase.Z] + z));
    }

    private PlatformLoads platform(int number, int foot, int frames) {
        WalkParameters p = walk.parameters();
        double rear = foot * p.stepLength() - (p.stepLength() - p.footLength()) / 2;
        double front = rear + p.stepLength();
        double half = settings.platformWidth() / 2;
        Pose lab = settings.laboratory();
        List<Vec3> corners = List.of(
                lab.transformPosition(new Vec3(front, -half, 0)),
                lab.transformPosition(new Vec3(rear, -half, 0)),
                lab.transformPosition(new Vec3(rear, half, 0)),
                lab.transformPosition(new Vec3(front, half, 0)));
        double rate = settings.pointRate() * settings.samplesPerFrame();
        int samples = frames * settings.samplesPerFrame();
        double aside = side(foot) == Side.RIGHT ? -settings.footOffset() : settings.footOffset();
        double[] force = new double[3 * samples];
        double[] moment = new double[3 * samples];
        double[] load = new double[3];
        for (int sample = 0; sample < samples; sample++) {
            walk.load(foot, sample / rate, load);
            Vec3 f = new Vec3(load[0], 0, load[1]);
            Vec3 arm = new Vec3(load[1] == 0 ? 0 : load[2] - (rear + front) / 2, aside, 0);
            put(lab.transformVector(f), force, 3 * sample);
            put(lab.transformVector(arm.cross(f)), moment, 3 * sample);
        }
        return new PlatformLoads(
                number, PLATFORM_TYPE, corners, lab.transformVector(Vec3.Z), rate, 0, true, force, moment);
    }

    private static void put(Vec3 v, double[] out, int at) {
        out[at] = v.x();
        out[at + 1] = v.y();
        out[at + 2] = v.z();
    }
}
