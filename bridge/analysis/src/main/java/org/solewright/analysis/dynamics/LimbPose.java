package org.solewright.analysis.dynamics;

import static org.solewright.analysis.dynamics.HipPhase.AX;
import static org.solewright.analysis.dynamics.HipPhase.AZ;
import static org.solewright.analysis.dynamics.HipPhase.STATE;
import static org.solewright.analysis.dynamics.HipPhase.VX;
import static org.solewright.analysis.dynamics.HipPhase.VZ;
import static org.solewright.analysis.dynamics.HipPhase.X;
import static org.solewright.analysis.dynamics.HipPhase.Z;

/**
 * Lean and length of the limbs of an invented walk. In single support the limb is rigid. In double support it telescopes
 * along its axis, hip to ankle, so that the loaded pivot stays on its place on the ground; hip, ankle and foot keep
 * their directions in the limb frame. In swing it is shortened by a tenth of the vault radius at most.
 */
final class LimbPose {

    private static final double SWING_SHORTENING = 0.10;

    private final SyntheticWalk walk;
    private final double axisX;
    private final double axisZ;
    private final Quintic[] innerLean;
    private final Quintic swingLean;
    private final Quintic swingExtension;
    private final double swingTime;

    /**
     * Poses of a walk.
     *
     * @param walk the walk
     * @param ankleX forward place of the ankle in the limb frame, m
     * @param ankleZ upward place of the ankle in the limb frame, m, below 0
     */
    LimbPose(SyntheticWalk walk, double ankleX, double ankleZ) {
        this.walk = walk;
        double length = Math.hypot(ankleX, ankleZ);
        this.axisX = ankleX / length;
        this.axisZ = ankleZ / length;
        WalkParameters p = walk.parameters();
        int n = p.segments();
        this.innerLean = new Quintic[n];
        double lean = walk.innerEndLean();
        double rate = walk.leanRate(lean);
        double pull = p.gravity() / walk.radius() * Math.sin(lean);
        for (int k = 0; k < n; k++) {
            innerLean[k] = new Quintic(
                    walk.phaseAt(new SyntheticWalk.Moment(0, 2 * k + 1, 0)).duration(),
                    new double[] {lean + walk.pivotAngle(k), rate, pull},
                    new double[] {-lean + walk.pivotAngle(k + 1), rate, -pull});
        }
        this.swingTime = walk.stepTime() - walk.doubleSupport();
        double[] s = new double[STATE];
        double[][] off = new double[2][3];
        double[][] contact = new double[2][3];
        HipPhase bridge = walk.phaseAt(new SyntheticWalk.Moment(0, 2 * n + 1, 0));
        bridge.state(bridge.duration(), s);
        onPivot(s, walk.pivotX(0, n), n, off[0], off[1]);
        bridge.state(0, s);
        onPivot(s, walk.pivotX(1, 0), 0, contact[0], contact[1]);
        this.swingLean = new Quintic(swingTime, off[0], contact[0]);
        this.swingExtension = new Quintic(swingTime, off[1], contact[1]);
    }

    /** Lean and extension, each with two derivatives, of a limb whose pivot stands on its place. */
    private void onPivot(double[] s, double groundX, int pivot, double[] lean, double[] extension) {
        double x = s[X] - groundX;
        double z = s[Z];
        double length = Math.hypot(x, z);
        double lengthRate = (x * s[VX] + z * s[VZ]) / length;
        double lengthBend = (s[VX] * s[VX] + s[VZ] * s[VZ] + x * s[AX] + z * s[AZ] - lengthRate * lengthRate) / length;
        double angle = walk.pivotAngle(pivot);
        double px = walk.radius() * Math.sin(angle);
        double pz = -walk.radius() * Math.cos(angle);
        double b = px * axisX + pz * axisZ;
        double root = Math.sqrt(b * b + length * length - walk.radius() * walk.radius());
        extension[0] = root - b;
        extension[1] = length * lengthRate / root;
        extension[2] = (lengthRate * lengthRate + length * lengthBend - extension[1] * extension[1]) / root;
        double vx = px + extension[0] * axisX;
        double vz = pz + extension[0] * axisZ;
        double cross = -axisX * vz + vx * axisZ;
        double square = length * length;
        double turnRate = extension[1] * cross / square;
        double turnBend = extension[2] * cross / square - 2 * lengthRate / length * turnRate;
        double leanRate = (s[VX] * z - x * s[VZ]) / square;
        double leanBend = (s[AX] * z - x * s[AZ]) / square - 2 * lengthRate / length * leanRate;
        lean[0] = Math.atan2(x, z) + Math.atan2(vx, -vz);
        lean[1] = leanRate + turnRate;
        lean[2] = leanBend + turnBend;
    }

    /**
     * The pose of the limb that makes every second footfall.
     *
     * @param parity 0 for even footfalls, 1 for odd ones
     * @param time s
     * @param out filled with lean (rad, forward positive) and extension along the axis (m)
     */
    void at(int parity, double time, double[] out) {
        int foot = (int) Math.floor((time + walk.doubleSupport()) / walk.stepTime());
        if (Math.floorMod(foot, 2) != parity) {
            foot--;
        }
        out[1] = 0;
        if (time >= walk.off(foot)) {
            double swing = Math.min(time - walk.off(foot), swingTime);
            double lift = Math.sin(Math.PI * swing / swingTime);
            out[0] = swingLean.value(swing);
            out[1] = swingExtension.value(swing) - SWING_SHORTENING * walk.radius() * lift * lift;
            return;
        }
        SyntheticWalk.Moment moment = walk.moment(time);
        if (moment.step() < foot) {
            standing(time, foot, 0, out);
        } else if (walk.isStepBridge(moment)) {
            standing(time, foot, walk.parameters().segments(), out);
        } else if (moment.isBridge()) {
            out[0] = innerLean[moment.pivot()].value(moment.time());
        } else {
            HipPhase.Vault vault = (HipPhase.Vault) walk.phaseAt(moment);
            out[0] = vault.lean(moment.time()) + walk.pivotAngle(moment.pivot());
        }
    }

    private void standing(double time, int foot, int pivot, double[] out) {
        double[] s = new double[STATE];
        double[] lean = new double[3];
        double[] extension = new double[3];
        walk.hip(time, s);
        onPivot(s, walk.pivotX(foot, pivot), pivot, lean, extension);
        out[0] = lean[0];
        out[1] = extension[0];
    }

    /** First component of the axis from hip to ankle in the limb frame. */
    double axisX() {
        return axisX;
    }

    /** Upward component of the axis. */
    double axisZ() {
        return axisZ;
    }
}
