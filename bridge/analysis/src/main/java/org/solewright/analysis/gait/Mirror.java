package org.solewright.analysis.gait;

import java.util.List;
import java.util.Optional;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Vec3;
import org.solewright.domain.motion.PointTrack;
import org.solewright.domain.motion.Recording;

/**
 * The mirror check and its cure: with x forward and y up, landmarks called right lie at larger z. A recording that fails
 * is left-handed, or its sides are swapped.
 */
public final class Mirror {

    private Mirror() {}

    /**
     * Whether a pass is mirrored.
     *
     * @param pass a pass of walking
     * @return true where the right heel lies to the left of the left heel on the mean; empty where one is not tracked
     */
    public static Optional<Boolean> isMirrored(Pass pass) {
        WalkingTrial trial = pass.trial();
        if (!trial.feet().containsKey(Side.LEFT) || !trial.feet().containsKey(Side.RIGHT)) {
            return Optional.empty();
        }
        double sum = 0;
        int n = 0;
        for (int i = 0; i < trial.frames(); i++) {
            double d = trial.foot(Side.RIGHT)
                    .heel(i)
                    .minus(trial.foot(Side.LEFT).heel(i))
                    .dot(pass.R_LW().z());
            if (!Double.isNaN(d)) {
                sum += d;
                n++;
            }
        }
        return n == 0 ? Optional.empty() : Optional.of(sum < 0);
    }

    /**
     * The recording seen in a mirror that stands upright: the second laboratory axis is reversed where up is not along
     * it, else the third.
     *
     * @param recording left-handed recording
     * @param up against gravity
     * @return the same in a right-handed frame
     */
    public static Recording of(Recording recording, Vec3 up) {
        boolean isSecond = Math.abs(up.y()) < 0.5;
        Vec3 sign = new Vec3(1, isSecond ? -1 : 1, isSecond ? 1 : -1);
        return new Recording(
                recording.name(),
                recording.rate(),
                recording.firstFrame(),
                recording.frames(),
                recording.points().stream().map(p -> track(p, sign)).toList(),
                recording.platforms().stream().map(p -> platform(p, sign)).toList(),
                recording.events(),
                recording.findings());
    }

    private static Vec3 flipped(Vec3 v, Vec3 sign) {
        return new Vec3(v.x() * sign.x(), v.y() * sign.y(), v.z() * sign.z());
    }

    private static PointTrack track(PointTrack p, Vec3 sign) {
        double[] xyz = new double[3 * p.frames()];
        p.copyTo(xyz, 0);
        flip(xyz, sign, 1);
        return PointTrack.of(p.label(), xyz);
    }

    private static PlatformLoads platform(PlatformLoads p, Vec3 sign) {
        double[] force = new double[3 * p.samples()];
        double[] moment = new double[force.length];
        p.copyForceTo(force, 0);
        p.copyMomentTo(moment, 0);
        flip(force, sign, 1);
        // A moment is an axial vector: (S r) x (S F) = det(S) S (r x F).
        flip(moment, sign, -1);
        List<Vec3> corners = p.corners().stream().map(c -> flipped(c, sign)).toList();
        return new PlatformLoads(
                p.number(),
                p.type(),
                corners,
                flipped(p.up(), sign),
                p.rate(),
                p.time(0),
                p.hasCentreOfPressure(),
                force,
                moment);
    }

    private static void flip(double[] xyz, Vec3 sign, double factor) {
        for (int i = 0; i < xyz.length; i += 3) {
            xyz[i] *= factor * sign.x();
            xyz[i + 1] *= factor * sign.y();
            xyz[i + 2] *= factor * sign.z();
        }
    }
}
