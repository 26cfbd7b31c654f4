package org.solewright.domain.foot;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import org.assertj.core.data.Offset;
import org.junit.jupiter.api.Test;
import org.solewright.domain.geometry.Rotation;
import org.solewright.domain.geometry.Vec3;

class InertiaTensorTest {

    /** Rounding of a few operations on numbers near one. */
    private static final Offset<Double> ROUNDING = within(1e-14);

    /** Point masses are the independent reference: I = sum m (r^2 E - r r^T). */
    private static InertiaTensor ofPoint(double m, Vec3 r) {
        return new InertiaTensor(
                m * (r.y() * r.y() + r.z() * r.z()),
                m * (r.x() * r.x() + r.z() * r.z()),
                m * (r.x() * r.x() + r.y() * r.y()),
                -m * r.x() * r.y(),
                -m * r.x() * r.z(),
                -m * r.y() * r.z());
    }

    private static void assertSame(InertiaTensor a, InertiaTensor b) {
        assertThat(a.xx()).isCloseTo(b.xx(), ROUNDING);
        assertThat(a.yy()).isCloseTo(b.yy(), ROUNDING);
        assertThat(a.zz()).isCloseTo(b.zz(), ROUNDING);
        assertThat(a.xy()).isCloseTo(b.xy(), ROUNDING);
        assertThat(a.xz()).isCloseTo(b.xz(), ROUNDING);
        assertThat(a.yz()).isCloseTo(b.yz(), ROUNDING);
    }

    @Test
    void rotatingTheTensorIsRotatingTheMasses() {
        Rotation r = Rotation.ofXandZ(new Vec3(1, 2, -0.5), new Vec3(0.2, 0.1, 1));
        Vec3 p = new Vec3(0.3, -0.1, 0.2);
        Vec3 q = new Vec3(-0.2, 0.4, 0.1);
        InertiaTensor body = ofPoint(2, p).plus(ofPoint(1, q));
        assertSame(body.rotated(r), ofPoint(2, r.transformVector(p)).plus(ofPoint(1, r.transformVector(q))));
    }

    @Test
    void shiftingTheTensorIsShiftingTheMasses() {
        // exact: two masses of 1 kg about their middle
        Vec3 half = new Vec3(0.1, 0.2, -0.3);
        Vec3 offset = new Vec3(0.5, -0.4, 0.2);
        InertiaTensor own = ofPoint(1, half).plus(ofPoint(1, half.times(-1)));
        assertSame(own.shifted(2, offset), ofPoint(1, offset.plus(half)).plus(ofPoint(1, offset.minus(half))));
    }

    @Test
    void negativeMomentIsRefusedWithItsNumbers() {
        assertThatThrownBy(() -> InertiaTensor.principal(1, -0.2, 1))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessage("inertia 1.0, -0.2, 1.0; 0.0, 0.0, 0.0 kg m2, expected finite elements and moments of 0 or"
                        + " more");
    }

    @Test
    void angularMomentumFollowsTheTensor() {
        assertThat(InertiaTensor.principal(1, 2, 3).times(new Vec3(1, 1, 1))).isEqualTo(new Vec3(1, 2, 3));
        assertThat(new InertiaTensor(1, 1, 1, -0.5, 0, 0).times(Vec3.X)).isEqualTo(new Vec3(1, -0.5, 0));
    }
}
