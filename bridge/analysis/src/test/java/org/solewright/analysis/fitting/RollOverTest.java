package org.solewright.analysis.fitting;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.solewright.domain.foot.Rolling;
import org.solewright.domain.geometry.Rotation;
import org.solewright.domain.geometry.Vec3;

/**
 * A wheel of known radius rolls over the ground, its spoke to the ankle and knee turning with it: exact, the roll-over
 * shape of a rolling wheel is the wheel.
 */
class RollOverTest {

    private static final double RATE = 200;
    private static final double RADIUS = 0.32;
    // The laboratory walks along -y: x forward of W is -y of L.
    private static final Rotation R_LW = new Rotation(Vec3.Y.times(-1), Vec3.Z, Vec3.X.times(-1));

    /** Shank with the ankle 0.24 m below the wheel's centre and the knee 0.16 m above it, leaning from back to front. */
    private static RollOverPath wheel(double radius, double ankleBelow) {
        RollOverPath.Collector collector = new RollOverPath.Collector(RATE, R_LW);
        for (int i = 0; i <= 120; i++) {
            double lean = -0.35 + 0.7 * i / 120;
            Vec3 centre_W = new Vec3(radius * lean, radius, 0.1);
            Vec3 up_W = new Vec3(Math.sin(lean), Math.cos(lean), 0);
            Vec3 ankle_W = centre_W.minus(up_W.times(ankleBelow));
            Vec3 knee_W = centre_W.plus(up_W.times(0.16)).plus(Vec3.Z.times(0.03));
            Vec3 cop_W = new Vec3(radius * lean, 0, 0.1);
            collector.add(
                    R_LW.transformVector(cop_W), R_LW.transformVector(ankle_W), R_LW.transformVector(knee_W), 700);
        }
        return collector.path();
    }

    @Test
    void rollOverShapeOfAWheelIsTheWheel() {
        FittedArc arc = RollOver.arc(wheel(RADIUS, 0.24));
        // The 10 Hz smoothing of a path of constant pace costs under 0.1 mm away from its ends.
        assertThat(arc.radius()).isCloseTo(RADIUS, within(0.002));
        assertThat(arc.centreY().getAsDouble()).isCloseTo(0.24, within(0.002));
        assertThat(arc.centreX().getAsDouble()).isCloseTo(0, within(0.001));
        // exact: arc of radius times the turn.
        assertThat(arc.arcLength()).isCloseTo(RADIUS * 0.7, within(0.002));
    }

    @Test
    void severalStancesGiveTheMeanCurvatureAndItsSpread() {
        Rolling.Arc arc = RollOver.common(Rolling.Frame.SHANK, List.of(wheel(0.25, 0.2), wheel(0.5, 0.2)));
        // exact: curvatures 4 and 2, mean 3, SD sqrt 2; radius 1/3 and its SD sqrt 2/9.
        assertThat(arc.curvature()).isCloseTo(3, within(0.05));
        assertThat(arc.curvatureSd().getAsDouble()).isCloseTo(Math.sqrt(2), within(0.05));
        assertThat(arc.radiusSd().getAsDouble()).isCloseTo(Math.sqrt(2) / 9, within(0.01));
        assertThat(arc.steps()).isEqualTo(2);
    }

    @Test
    void rollingWheelDwellsNowhere() {
        assertThat(RollOver.dwells(wheel(RADIUS, 0.24), 0.04)).isEmpty();
    }

    @Test
    void pathThatRestsDwellsWhereItRests() {
        RollOverPath.Collector collector = new RollOverPath.Collector(RATE, Rotation.IDENTITY);
        List<Double> places = new ArrayList<>();
        for (int i = 0; i < 40; i++) {
            places.add(0.0);
        }
        for (int i = 1; i < 10; i++) {
            places.add(0.01 * i);
        }
        for (int i = 0; i < 30; i++) {
            places.add(0.1);
        }
        for (double x : places) {
            collector.add(new Vec3(x, 0, 0), new Vec3(0, 0.08, 0), new Vec3(0, 0.5, 0), 700);
        }
        List<int[]> dwells = RollOver.dwells(collector.path(), 0.04);
        assertThat(dwells).hasSize(2);
        assertThat(dwells.get(0)[0]).isZero();
        assertThat(dwells.get(1)[1]).isEqualTo(places.size() - 1);
    }

    @Test
    void travelWeightsAddUpToTheTravel() {
        RollOverPath path = wheel(RADIUS, 0.24);
        double sum = 0;
        for (double w : path.travelWeights()) {
            sum += w;
        }
        // exact but for the chords: arc of radius times the turn, chords shorter by (0.7/120)^2/24.
        assertThat(sum).isCloseTo(RADIUS * 0.7, within(1e-6));
        assertThat(path.extent()).isCloseTo(2 * RADIUS * Math.sin(0.35), within(1e-9));
    }
}
