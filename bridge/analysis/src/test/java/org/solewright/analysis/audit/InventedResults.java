package org.solewright.analysis.audit;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.DoubleFunction;
import org.solewright.analysis.dynamics.SyntheticWalk;
import org.solewright.analysis.dynamics.WalkParameters;
import org.solewright.analysis.dynamics.WalkRecorder;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Pose;
import org.solewright.domain.geometry.Rotation;
import org.solewright.domain.geometry.Vec3;

/** Results of a simulation of the invented walk: every footfall loads its foot; one thing may be spoilt. */
final class InventedResults {

    static final double MASS = 70;
    private static final double ASIDE = 0.1;
    private static final double ANKLE_X = -0.06;
    private static final double ANKLE_Z = -0.66;
    private static final int STEPS = 8;
    /** A moment within the walk, so that the results begin and end loaded, and nothing is at the origin. */
    private static final double START = 0.37;

    private final SyntheticWalk walk =
            new SyntheticWalk(new WalkParameters(MASS, 0.95, 2, 0.22, 0.62, 1.35, 0.4, 0.6, 9.80665));
    private final WalkRecorder recorder = new WalkRecorder(
            walk,
            new WalkRecorder.Settings(
                    "walk",
                    100,
                    10,
                    6,
                    true,
                    ASIDE,
                    0.5,
                    ANKLE_X,
                    ANKLE_Z,
                    new Pose(new Rotation(Vec3.X, Vec3.Y, Vec3.Z), Vec3.ZERO)));

    private double pointRate = 250;
    private double loadRate = 500;

    InventedResults rates(double points, double loads) {
        pointRate = points;
        loadRate = loads;
        return this;
    }

    SyntheticWalk walk() {
        return walk;
    }

    double from() {
        return START;
    }

    double to() {
        return START + STEPS * walk.stepTime();
    }

    private AuditedVector vector(String name, String column, double rate, DoubleFunction<Vec3> at) {
        int n = (int) Math.floor((to() - from()) * rate);
        double[] xyz = new double[3 * n];
        for (int i = 0; i < n; i++) {
            Vec3 v = at.apply(from() + i / rate);
            xyz[3 * i] = v.x();
            xyz[3 * i + 1] = v.y();
            xyz[3 * i + 2] = v.z();
        }
        return new AuditedVector(name, List.of(column + "_x", column + "_y", column + "_z"), from(), rate, xyz);
    }

    private static boolean isRight(int foot) {
        return foot % 2 == 0;
    }

    /** Force (first three) and centre of pressure of one side. */
    private double[] load(Side side, double time) {
        double[] out = new double[6];
        double[] one = new double[3];
        int step = (int) Math.floor(time / walk.stepTime());
        out[4] = side == Side.LEFT ? ASIDE : -ASIDE;
        for (int foot = step - 1; foot <= step + 1; foot++) {
            if (isRight(foot) == (side == Side.RIGHT)) {
                walk.load(foot, time, one);
                if (one[1] != 0) {
                    out[0] = one[0];
                    out[2] = one[1];
                    out[3] = one[2];
                }
            }
        }
        return out;
    }

    private AuditedVector point(Side side, String label, Vec3 place) {
        WalkRecorder.BodyPoint p = new WalkRecorder.BodyPoint(label, side, WalkRecorder.Carrier.SHANK_AND_FOOT, place);
        return vector(side.word() + " " + label, label, pointRate, t -> recorder.place(p, t));
    }

    private AuditedResults.Foot foot(Side side) {
        double y = side == Side.LEFT ? ASIDE : -ASIDE;
        double down = -(walk.parameters().limbLength() - walk.parameters().footLength());
        return new AuditedResults.Foot(
                side,
                List.of(
                        point(side, "heel", new Vec3(-0.12, y, down + 0.06)),
                        point(side, "head", new Vec3(0.05, y, down + 0.06)),
                        point(side, "toe", new Vec3(0.13, y, down + 0.06))));
    }

    AuditedResults results() {
        double[] s = new double[6];
        AuditedVector com = vector("centre of mass", "com", pointRate, t -> {
            walk.hip(t, s);
            return new Vec3(s[0], 0, s[1]);
        });
        List<AuditedResults.Load> loads = new ArrayList<>();
        List<AuditedResults.Foot> feet = new ArrayList<>();
        for (Side side : List.of(Side.RIGHT, Side.LEFT)) {
            loads.add(new AuditedResults.Load(
                    Optional.of(side),
                    vector(side.word() + " force", "f_" + side.word(), loadRate, t -> {
                        double[] l = load(side, t);
                        return new Vec3(l[0], l[1], l[2]);
                    }),
                    vector(side.word() + " cop", "cop_" + side.word(), loadRate, t -> {
                        double[] l = load(side, t);
                        return l[2] > 0 ? new Vec3(l[3], l[4], 0) : new Vec3(Double.NaN, Double.NaN, Double.NaN);
                    })));
            feet.add(foot(side));
        }
        return new AuditedResults("walk", Optional.of(com), Optional.empty(), loads, feet, OptionalDouble.of(MASS));
    }

    /** A vector with one axis multiplied. */
    static AuditedVector scaled(AuditedVector v, int axis, double factor) {
        double[] xyz = v.interleaved();
        for (int i = axis; i < xyz.length; i += 3) {
            xyz[i] *= factor;
        }
        List<String> names = new ArrayList<>();
        for (int c = 0; c < 3; c++) {
            String words = v.column(c);
            names.add(words.substring(words.indexOf('\'') + 1, words.lastIndexOf('\'')));
        }
        return new AuditedVector(v.name(), names, v.start(), v.rate(), xyz);
    }
}
