package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.solewright.analysis.fitting.ChainFit;
import org.solewright.analysis.fitting.ErrorDraw;
import org.solewright.analysis.fitting.RigidFit;
import org.solewright.analysis.fitting.RollOverPath;
import org.solewright.analysis.fitting.StandingLimb;
import org.solewright.analysis.gait.Pass;
import org.solewright.domain.foot.SegmentName;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.gait.Stance;
import org.solewright.domain.gait.Use;
import org.solewright.domain.geometry.Pose;
import org.solewright.domain.geometry.Rotation;
import org.solewright.domain.geometry.Vec3;

/**
 * One stance as it was measured, and as it would have been measured with other errors. An error of skin or joint centres
 * is slow: its effect on the poses is worked out by the same fits at a few instants and interpolated between them.
 */
final class StanceMotion {

    /** Instants of a stance at which the fits are repeated: five per period of the fastest slow term. */
    private static final int KNOTS = 6;

    private static final String SHANK = SegmentName.SHANK.word();
    private static final String HIP = "hip";

    private final Pass pass;
    private final Stance stance;
    private final StandingLimb limb;
    private final LimbMotion motion;
    private final double leastLoad;
    private final int first;
    private final int last;
    private final int opposite;
    private final List<Optional<Pass.StanceLoad>> loads = new ArrayList<>();
    private final Map<String, List<Optional<Pose>>> poses = new LinkedHashMap<>();
    private final Optional<Vec3> platformUp;

    StanceMotion(Pass pass, Stance stance, StandingLimb limb, LimbMotion motion, double leastLoad) {
        this.pass = pass;
        this.stance = stance;
        this.limb = limb;
        this.motion = motion;
        this.leastLoad = leastLoad;
        double rate = pass.trial().rate();
        double start = pass.trial().startTime();
        first = Math.max(0, (int) Math.ceil((stance.start() - start) * rate - 1e-9));
        last = (int) Math.floor((stance.end() - start) * rate + 1e-9);
        opposite = stance.allows(Use.ROLL_OVER)
                ? pass.oppositeContact(stance)
                        .map(t -> (int) Math.floor((t - start) * rate + 1e-9))
                        .orElse(-1)
                : -1;
        platformUp = pass.trial().platforms().stream()
                .filter(p -> stance.platforms().equals(List.of(p.number())))
                .map(PlatformLoads::up)
                .findFirst();
        for (int frame = first; frame <= opposite; frame++) {
            loads.add(pass.load(stance, start + frame / rate));
        }
        for (String name : motion.chain().names()) {
            poses.put(name, poses(f -> motion.chain().pose(name, f)));
        }
        poses.put(SHANK, poses(motion::shankPose));
        poses.put(HIP, poses(motion::hipPose));
    }

    private interface PoseAt {
        Optional<Pose> at(int frame);
    }

    private List<Optional<Pose>> poses(PoseAt pose) {
        List<Optional<Pose>> all = new ArrayList<>();
        for (int frame = first; frame <= Math.max(last, opposite); frame++) {
            all.add(pose.at(frame));
        }
        return all;
    }

    private Optional<Pose> nominal(String segment, int frame) {
        List<Optional<Pose>> all = poses.get(segment);
        int at = frame - first;
        return all == null || at < 0 || at >= all.size() ? Optional.empty() : all.get(at);
    }

    private double share(int frame) {
        return last > first ? Math.min(1, (frame - first) / (double) (last - first)) : 0;
    }

    /** The stance as another draw of errors would have shown it. */
    Seen seen(ErrorDraw draw, StandingLimb other) {
        return new Seen(draw, other);
    }

    /** A stance under one draw of errors. */
    final class Seen {

        private final StandingLimb other;
        private final Vec3 platform;
        private final Map<String, double[]> shifts = new LinkedHashMap<>();
        private final int[] knots = new int[KNOTS];

        private Seen(ErrorDraw draw, StandingLimb other) {
            this.other = other;
            platform = stance.platforms().size() == 1 && platformUp.isPresent()
                    ? draw.platform(stance.platforms().get(0), platformUp.get())
                    : Vec3.ZERO;
            for (int k = 0; k < KNOTS; k++) {
                knots[k] = first + Math.round(k * (last - first) / (KNOTS - 1f));
            }
            if (draw == ErrorDraw.NONE) {
                return;
            }
            if (!motion.chain().names().isEmpty()) {
                chain(draw);
            }
            if (!motion.hipCarrier().reference().isEmpty()) {
                carrier(draw);
            }
        }

        private void chain(ErrorDraw draw) {
            List<String> names = motion.chain().names();
            var model = motion.chain().model(other);
            List<double[]> tracks = motion.chain().tracks();
            ChainFit fit = new ChainFit(model);
            List<ErrorDraw.Skin> skins = new ArrayList<>();
            for (int s = 0; s < names.size(); s++) {
                shifts.put(names.get(s), unknown());
                skins.add(draw.skin(
                        names.get(s) + " " + limb.side().word(),
                        model.segments().get(s).points().size()));
            }
            double[] present = new double[3 * tracks.size()];
            for (int k = 0; k < KNOTS; k++) {
                int point = 0;
                for (int s = 0; s < names.size(); s++) {
                    Optional<Pose> pose = nominal(names.get(s), knots[k]);
                    for (int i = 0; i < model.segments().get(s).points().size(); i++) {
                        put(present, point, tracks.get(point), knots[k], pose, skins.get(s), i);
                        point++;
                    }
                }
                boolean isKnown = fit.fit(present) == ChainFit.State.DETERMINED;
                for (int s = 0; s < names.size(); s++) {
                    Optional<Pose> before = nominal(names.get(s), knots[k]);
                    if (isKnown && fit.isObserved(s) && before.isPresent()) {
                        put(shifts.get(names.get(s)), k, before.get(), fit.pose(s));
                    }
                }
            }
        }

        private void carrier(ErrorDraw draw) {
            LimbMotion.Points points = motion.hipCarrier();
            int n = points.reference().size();
            String name = motion.pelvis().isPresent()
                    ? "pelvis"
                    : "thigh " + limb.side().word();
            ErrorDraw.Skin skin = draw.skin(name, n);
            double[] shift = unknown();
            double[] a = new double[3 * n];
            double[] b = new double[3 * n];
            for (int i = 0; i < n; i++) {
                Vec3 p = points.reference().get(i);
                a[3 * i] = p.x();
                a[3 * i + 1] = p.y();
                a[3 * i + 2] = p.z();
            }
            for (int k = 0; k < KNOTS; k++) {
                Optional<Pose> pose = nominal(HIP, knots[k]);
                for (int i = 0; i < n; i++) {
                    put(b, i, points.tracks().get(i), knots[k], pose, skin, i);
                }
                Optional<RigidFit> fit = RigidFit.of(a, b);
                if (fit.isPresent() && pose.isPresent()) {
                    put(shift, k, pose.get(), fit.get().pose());
                }
            }
            shifts.put(HIP, shift);
        }

        private static double[] unknown() {
            double[] shift = new double[6 * KNOTS];
            Arrays.fill(shift, Double.NaN);
            return shift;
        }

        /** A tracked point with its skin motion; as it was where the segment's pose is not known. */
        private void put(
                double[] present,
                int to,
                double[] track,
                int frame,
                Optional<Pose> pose,
                ErrorDraw.Skin skin,
                int point) {
            System.arraycopy(track, 3 * frame, present, 3 * to, 3);
            if (pose.isPresent()) {
                Vec3 e = pose.get().transformVector(skin.at(point, share(frame)));
                present[3 * to] += e.x();
                present[3 * to + 1] += e.y();
                present[3 * to + 2] += e.z();
            }
        }

        /** Rotation vector and translation of the pose after an error against that before it, in the standing frame. */
        private static void put(double @org.jspecify.annotations.Nullable [] shift, int knot, Pose before, Pose after) {
            if (shift == null) {
                throw new IllegalStateException("no room for a segment's shift");
            }
            Rotation turn = before.rotation().inverse().times(after.rotation());
            Vec3 w = turn.vector();
            Vec3 t = before.inversePosition(after.position());
            double[] six = {w.x(), w.y(), w.z(), t.x(), t.y(), t.z()};
            System.arraycopy(six, 0, shift, 6 * knot, 6);
        }

        /** Pose of a segment with the effect of the errors, from standing to a frame. */
        Optional<Pose> pose(String segment, int frame) {
            Optional<Pose> before = nominal(segment, frame);
            double[] shift = shifts.get(segment);
            return before.isEmpty() || shift == null ? before : before.map(x -> x.times(at(shift, frame)));
        }

        private Pose at(double[] shift, int frame) {
            int lower = -1;
            int upper = -1;
            for (int k = 0; k < KNOTS; k++) {
                if (!Double.isNaN(shift[6 * k])) {
                    lower = knots[k] <= frame || lower < 0 ? k : lower;
                    upper = upper < 0 || knots[upper] < frame ? k : upper;
                }
            }
            if (lower < 0) {
                return new Pose(Rotation.IDENTITY, Vec3.ZERO);
            }
            int gap = knots[upper] - knots[lower];
            double part = gap > 0 ? Math.max(0, Math.min(1, (frame - knots[lower]) / (double) gap)) : 0;
            double[] six = new double[6];
            for (int i = 0; i < 6; i++) {
                six[i] = shift[6 * lower + i] * (1 - part) + shift[6 * upper + i] * part;
            }
            return new Pose(Rotation.ofVector(new Vec3(six[0], six[1], six[2])), new Vec3(six[3], six[4], six[5]));
        }

        /** Roll-over path in the shank's or the limb's frame; empty where the stance gives none. */
        Optional<RollOverPath> path(boolean isShank) {
            if (opposite < first) {
                return Optional.empty();
            }
            RollOverPath.Collector collector =
                    new RollOverPath.Collector(pass.trial().rate(), pass.R_LW());
            Vec3 upper = isShank ? other.knee().position() : other.hip().position();
            for (int frame = first; frame <= opposite; frame++) {
                Optional<Pass.StanceLoad> load = loads.get(frame - first);
                if (load.isEmpty() || !(load.get().vertical() > leastLoad)) {
                    continue;
                }
                Optional<Pose> shank = pose(SHANK, frame);
                Optional<Pose> above = isShank ? shank : pose(HIP, frame);
                if (shank.isPresent() && above.isPresent()) {
                    collector.add(
                            load.get().centreOfPressure().plus(platform),
                            shank.get().transformPosition(other.ankle().position()),
                            above.get().transformPosition(upper),
                            load.get().vertical());
                }
            }
            return Optional.of(collector.path());
        }

        /** Frame nearest to a share of the stance. */
        int frame(double share) {
            return first + (int) Math.round(share * (last - first));
        }
    }
}
