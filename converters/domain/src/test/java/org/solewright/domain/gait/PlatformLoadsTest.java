package org.solewright.domain.gait;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.solewright.domain.geometry.Vec3;

/** Expected numbers are exact: a known force at a known place gives the wrench, the wrench must give the place back. */
class PlatformLoadsTest {

    private static final List<Vec3> CORNERS =
            List.of(new Vec3(1.4, 0.9, 0.2), new Vec3(1.0, 0.9, 0.2), new Vec3(1.0, 0.3, 0.2), new Vec3(1.4, 0.3, 0.2));
    private static final Vec3 CENTRE = new Vec3(1.2, 0.6, 0.2);
    private static final Vec3 FORCE = new Vec3(30, -12, 700);
    private static final Vec3 PLACE = new Vec3(1.31, 0.52, 0.2);
    private static final double FREE = 4.5;

    private static PlatformLoads loads(boolean hasCop) {
        Vec3 m = PLACE.minus(CENTRE).cross(FORCE).plus(Vec3.Z.times(FREE));
        return new PlatformLoads(
                3,
                2,
                CORNERS,
                Vec3.Z.times(2),
                500,
                1.5,
                hasCop,
                new double[] {0, 0, 0, FORCE.x(), FORCE.y(), FORCE.z()},
                new double[] {0, 0, 0, m.x(), m.y(), m.z()});
    }

    @Test
    void centreOfPressureIsWhereTheForceActs() {
        assertThat(loads(true).centreOfPressure(1).distance(PLACE)).isLessThan(1e-12);
        assertThat(loads(true).freeMoment(1)).isCloseTo(FREE, within(1e-10));
        assertThat(loads(true).centre().distance(CENTRE)).isLessThan(1e-12);
    }

    @Test
    void verticalIsAlongTheUnitNormal() {
        assertThat(loads(true).vertical(1)).isEqualTo(700);
        assertThat(loads(true).up()).isEqualTo(Vec3.Z);
        assertThat(loads(true).force(1)).isEqualTo(FORCE);
    }

    @Test
    void samplesAreOnTheRecordingsClock() {
        assertThat(loads(true).samples()).isEqualTo(2);
        assertThat(loads(true).time(1)).isEqualTo(1.502);
    }

    @Test
    void unknownMomentGivesNoCentreOfPressure() {
        assertThat(loads(false).centreOfPressure(1).isFinite()).isFalse();
        assertThat(loads(false).freeMoment(1)).isNaN();
        assertThat(loads(false).vertical(1)).isEqualTo(700);
    }

    @Test
    void samplesAreCopiedInAndOut() {
        double[] force = {1, 2, 3};
        PlatformLoads p = new PlatformLoads(1, 2, CORNERS, Vec3.Z, 100, 0, true, force, new double[3]);
        force[0] = 99;
        assertThat(p.force(0).x()).isEqualTo(1);
        double[] out = new double[5];
        p.copyForceTo(out, 1);
        out[1] = 50;
        assertThat(p.force(0)).isEqualTo(new Vec3(1, 2, 3));
        p.copyMomentTo(out, 2);
        assertThat(out[2]).isZero();
    }

    @Test
    void wrongShapesAreRefusedWithTheNumbers() {
        assertThatThrownBy(() -> new PlatformLoads(
                        1, 2, CORNERS.subList(0, 3), Vec3.Z, 100, 0, true, new double[3], new double[3]))
                .hasMessage("platform 1 has 3 corners, expected 4");
        assertThatThrownBy(() -> new PlatformLoads(1, 2, CORNERS, Vec3.Z, 100, 0, true, new double[3], new double[6]))
                .hasMessageContaining("3 force and 6 moment components");
        assertThatThrownBy(() -> new PlatformLoads(1, 2, CORNERS, Vec3.Z, 0, 0, true, new double[3], new double[3]))
                .hasMessage("platform 1 rate 0.0 Hz, expected more than 0 Hz");
    }
}
