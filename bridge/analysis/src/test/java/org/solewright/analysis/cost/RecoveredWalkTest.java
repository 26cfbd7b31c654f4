package org.solewright.analysis.cost;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.solewright.analysis.dynamics.SyntheticWalk;
import org.solewright.analysis.dynamics.WalkParameters;
import org.solewright.analysis.numerics.Series;
import org.solewright.domain.cost.WalkTruth;

/** The truth of an invented walk, recovered from its sampled forces alone; tolerances of design 04 I6. */
class RecoveredWalkTest {

    @ParameterizedTest
    @CsvSource({"0, 0, 0.6, 0.35", "1, 0.2, 0.65, 0.35", "2, 0.22, 0.62, 0.4", "3, 0.24, 0.6, 0.4"})
    void massVelocityAndWorksComeBackFromOneStep(int segments, double foot, double stepLength, double share) {
        SyntheticWalk walk =
                new SyntheticWalk(new WalkParameters(70, 0.95, segments, foot, stepLength, 1.35, share, 0.6, 9.81));
        WalkTruth truth = walk.truth();
        int n = (int) Math.round(walk.stepTime() * 1000);
        double dt = walk.stepTime() / n;
        double start = walk.contact(2) - walk.stepTime() / 3;
        double[] fx = new double[n + 1];
        double[] fz = new double[n + 1];
        double[][] trailing = new double[2][n + 1];
        double[][] leading = new double[2][n + 1];
        double[] load = new double[3];
        for (int i = 0; i <= n; i++) {
            double t = start + i * dt;
            walk.load(1, t, load);
            trailing[0][i] = load[0];
            trailing[1][i] = load[1];
            walk.load(2, t, load);
            leading[0][i] = load[0];
            leading[1][i] = load[1];
            fx[i] = trailing[0][i] + leading[0][i];
            fz[i] = trailing[1][i] + leading[1][i];
        }
        Series up = new Series(0, 1 / dt, fz);
        double mass = up.mean(0, walk.stepTime()) / 9.81;
        assertThat(mass / 70).isCloseTo(1, within(1e-4));
        double[] vx = velocity(fx, 0, mass, dt, stepLength / walk.stepTime());
        double[] vz = velocity(fz, mass * 9.81, mass, dt, 0);
        double[] hip = new double[6];
        double[] trailingPower = new double[n + 1];
        double[] leadingPower = new double[n + 1];
        for (int i = 0; i <= n; i++) {
            walk.hip(start + i * dt, hip);
            assertThat(vx[i]).isCloseTo(hip[2], within(2e-4));
            assertThat(vz[i]).isCloseTo(hip[3], within(2e-4));
            boolean bridge = start + i * dt >= walk.contact(2) && start + i * dt <= walk.off(1);
            trailingPower[i] = bridge ? trailing[0][i] * vx[i] + trailing[1][i] * vz[i] : 0;
            leadingPower[i] = bridge ? leading[0][i] * vx[i] + leading[1][i] * vz[i] : 0;
        }
        WalkTruth.Step step = (WalkTruth.Step) truth.transitions().get(segments);
        assertThat(PowerWork.of(trailingPower, dt).positive() / step.trailingPositive())
                .isCloseTo(1, within(2e-3));
        assertThat(PowerWork.of(leadingPower, dt).negative() / step.leadingNegative())
                .isCloseTo(1, within(2e-3));
    }

    private static double[] velocity(double[] force, double weight, double mass, double dt, double mean) {
        double[] v = new double[force.length];
        for (int i = 1; i < v.length; i++) {
            v[i] = v[i - 1] + ((force[i - 1] + force[i]) / 2 - weight) / mass * dt;
        }
        double found = new Series(0, 1 / dt, v).mean(0, (v.length - 1) * dt);
        for (int i = 0; i < v.length; i++) {
            v[i] += mean - found;
        }
        return v;
    }
}
