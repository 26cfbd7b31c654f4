package org.solewright.analysis.dynamics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;
import org.solewright.domain.geometry.Vec3;

class DistalPowerTest {

    private static final Vec3 LOAD = new Vec3(30, -12, 700);

    @Test
    void rigidSegmentThatRollsWithoutSlipDoesNoWork() {
        // exact: wheel of radius 0.3 m, contact below the centre: v = w x (centre - contact).
        Vec3 w = new Vec3(0, 2, 0);
        Vec3 centre = new Vec3(0.1, 0.2, 0.3);
        Vec3 contact = new Vec3(0.1, 0.2, 0);
        Vec3 v = w.cross(centre.minus(contact));
        assertThat(DistalPower.of(LOAD, Vec3.ZERO, v, w, centre, contact)).isCloseTo(0, within(1e-12));
    }

    @Test
    void slidingSegmentLosesFrictionTimesSpeed() {
        // exact: -mu N v.
        Vec3 friction = new Vec3(-0.4 * 700, 0, 700);
        assertThat(DistalPower.of(friction, Vec3.ZERO, new Vec3(0.5, 0, 0), Vec3.ZERO, Vec3.ZERO, new Vec3(0.1, 0, -1)))
                .isCloseTo(-0.4 * 700 * 0.5, within(1e-12));
    }
}
