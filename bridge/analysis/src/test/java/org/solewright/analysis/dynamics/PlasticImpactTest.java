package org.solewright.analysis.dynamics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;

class PlasticImpactTest {

    private static LimbChain.Segment segment(int parent, double length, double mass, double angle, double rate) {
        return new LimbChain.Segment(parent, length, mass, length / 2, mass * length * length / 12, angle, rate);
    }

    @Test
    void endOfARodThatStopsTurnsItAboutThatEnd() throws LimitException {
        // exact: a rod of mass m falls flat at speed v; its distal end is held. Angular momentum about that end is m v
        // l/2 =
        // (m l^2 / 3) w, and the loss is m v^2/2 - m l^2 w^2/6 = m v^2/8.
        LimbChain rod = new LimbChain(0, List.of(segment(-1, 1.2, 3, Math.PI / 2, 0)));
        PlasticImpact impact = PlasticImpact.of(rod, 0, -2, List.of(new PlasticImpact.Point(0, 1.2, List.of())));
        assertThat(impact.rate(0)).isCloseTo(2 * 3 / (2 * 1.2), within(1e-12));
        assertThat(impact.loss()).isCloseTo(3 * 4.0 / 8, within(1e-12));
        assertThat(impact.energyAfter()).isCloseTo(impact.energyBefore() - impact.loss(), within(1e-12));
    }

    @Test
    void limbsWithoutMassAreThePointMassStep() throws LimitException {
        double angle = 0.35;
        double speed = 1.3;
        double rate = speed / 0.9;
        double[] excess = new double[3];
        double[] scales = {1e-2, 1e-3, 1e-4};
        for (int i = 0; i < scales.length; i++) {
            double m = 7 * scales[i];
            LimbChain walker =
                    new LimbChain(70, List.of(segment(-1, 0.9, m, -angle, rate), segment(-1, 0.9, m, angle, rate)));
            // The hip vaults about the old foot: velocity (cos, -sin)(angle) x speed.
            PlasticImpact impact = PlasticImpact.of(
                    walker,
                    speed * Math.cos(angle),
                    -speed * Math.sin(angle),
                    List.of(new PlasticImpact.Point(1, 0.9, List.of())));
            // exact: m v^2/2 sin^2(2 angle) of a point mass without a push; linear in the limbs' mass (design F5).
            double point = 70 * speed * speed / 2 * Math.pow(Math.sin(2 * angle), 2);
            excess[i] = (impact.loss() / point - 1) / scales[i];
        }
        assertThat(excess[1]).isCloseTo(excess[2], within(0.02 * Math.abs(excess[2]) + 1e-6));
    }

    @Test
    void momentumChangesByTheImpulsesAlone() throws LimitException {
        LimbChain chain = new LimbChain(
                20, List.of(segment(-1, 0.5, 4, 0.3, 1.5), segment(0, 0.4, 3, -0.2, -2), segment(1, 0.2, 1, 1.3, 0.7)));
        List<PlasticImpact.Constraint> constraints = new ArrayList<>();
        constraints.add(new PlasticImpact.Point(2, 0.2, List.of()));
        constraints.add(new PlasticImpact.Lock(0, 1));
        PlasticImpact impact = PlasticImpact.of(chain, 1.2, -0.4, constraints);
        double[] before = momentum(chain, 1.2, -0.4, new double[] {1.5, -2, 0.7});
        double[] after = momentum(
                chain, impact.hipX(), impact.hipZ(), new double[] {impact.rate(0), impact.rate(1), impact.rate(2)});
        // exact: the lock is inside; only the ground changes the total momentum.
        assertThat(after[0] - before[0]).isCloseTo(impact.impulses()[0], within(1e-12));
        assertThat(after[1] - before[1]).isCloseTo(impact.impulses()[1], within(1e-12));
        assertThat(impact.rate(0)).isCloseTo(impact.rate(1), within(1e-12));
        assertThat(impact.loss()).isPositive();
    }

    /** independent: sum of the masses' momenta by their own kinematics. */
    private static double[] momentum(LimbChain chain, double hx, double hz, double[] rates) {
        double[] p = {chain.hipMass() * hx, chain.hipMass() * hz};
        for (int s = 0; s < rates.length; s++) {
            double x = hx;
            double z = hz;
            double along = chain.segments().get(s).centre();
            for (int k = s; k >= 0; k = chain.segments().get(k).parent()) {
                x += along * Math.cos(chain.segments().get(k).angle()) * rates[k];
                z += along * Math.sin(chain.segments().get(k).angle()) * rates[k];
                int parent = chain.segments().get(k).parent();
                along = parent >= 0 ? chain.segments().get(parent).length() : 0;
            }
            p[0] += chain.segments().get(s).mass() * x;
            p[1] += chain.segments().get(s).mass() * z;
        }
        return p;
    }

    @Test
    void everyListedModeIsConsistent() throws LimitException {
        LimbChain table = new LimbChain(10, List.of(segment(-1, 1, 1, -0.6, 0), segment(-1, 1, 1, 0.6, 0)));
        List<PlasticImpact.Point> feet =
                List.of(new PlasticImpact.Point(0, 1, List.of()), new PlasticImpact.Point(1, 1, List.of()));
        List<PlasticImpact.Constraint> hinged = List.of();
        List<PlasticImpact.Mode> modes = PlasticImpact.modes(table, 0, -1, feet, hinged);
        assertThat(modes).isNotEmpty();
        assertThat(modes).noneMatch(m -> m.kept().isEmpty());
        // exact: moving up leaves the ground without any contact.
        assertThat(PlasticImpact.modes(table, 0, 1, feet, hinged))
                .anyMatch(m -> m.kept().isEmpty());
    }

    @Test
    void constraintsThatDependOnOneAnotherAreRefused() {
        LimbChain rod = new LimbChain(1, List.of(segment(-1, 1, 1, 0, 0)));
        PlasticImpact.Point end = new PlasticImpact.Point(0, 1, List.of());
        assertThatThrownBy(() -> PlasticImpact.of(rod, 0, -1, List.of(end, end)))
                .isInstanceOf(LimitException.class)
                .hasMessageContaining("4 rows of constraints on 3 coordinates");
        LimbChain massless = new LimbChain(0, List.of(segment(-1, 1, 0, 0, 0)));
        assertThatThrownBy(() -> PlasticImpact.of(massless, 0, -1, List.of(end)))
                .hasMessageContaining("without mass");
        assertThatThrownBy(() -> new LimbChain(1, List.of(segment(0, 1, 1, 0, 0))))
                .isInstanceOf(IllegalArgumentException.class);
    }
}
