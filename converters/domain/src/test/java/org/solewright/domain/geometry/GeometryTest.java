package org.solewright.domain.geometry;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;

/** Expected numbers are exact: worked by hand from the definitions. */
class GeometryTest {

    private static final double ROUNDING = 1e-12;

    @Test
    void vectorAlgebraIsThatOfThreeComponents() {
        Vec3 a = new Vec3(1, 2, 3);
        Vec3 b = new Vec3(-2, 0.5, 4);
        assertThat(a.plus(b)).isEqualTo(new Vec3(-1, 2.5, 7));
        assertThat(a.minus(b)).isEqualTo(new Vec3(3, 1.5, -1));
        assertThat(a.times(2)).isEqualTo(new Vec3(2, 4, 6));
        assertThat(a.dot(b)).isEqualTo(-2 + 1 + 12);
        assertThat(a.cross(b)).isEqualTo(new Vec3(2 * 4 - 3 * 0.5, 3 * -2 - 1 * 4, 1 * 0.5 - 2 * -2));
        assertThat(new Vec3(3, 4, 12).norm()).isEqualTo(13);
        assertThat(a.distance(a)).isZero();
    }

    @Test
    void directionOfNothingIsRefused() {
        assertThatThrownBy(Vec3.ZERO::unit)
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessage("vector of length 0.0 has no direction");
        assertThat(new Vec3(0, 0, -5).unit()).isEqualTo(new Vec3(0, 0, -1));
    }

    @Test
    void lostSampleIsNotFinite() {
        assertThat(new Vec3(1, Double.NaN, 0).isFinite()).isFalse();
        assertThat(new Vec3(1, 2, Double.POSITIVE_INFINITY).isFinite()).isFalse();
        assertThat(Vec3.X.isFinite()).isTrue();
    }

    @Test
    void rotationTurnsIntoItsOuterFrameAndBack() {
        // A quarter turn about z: the inner x axis is the outer y axis.
        Rotation R_AB = new Rotation(Vec3.Y, Vec3.X.times(-1), Vec3.Z);
        assertThat(R_AB.transformVector(new Vec3(1, 0, 7)).distance(new Vec3(0, 1, 7)))
                .isLessThan(ROUNDING);
        assertThat(R_AB.inverseVector(new Vec3(0, 1, 7)).distance(new Vec3(1, 0, 7)))
                .isLessThan(ROUNDING);
        assertThat(R_AB.times(R_AB.inverse()).x().distance(Vec3.X)).isLessThan(ROUNDING);
    }

    @Test
    void axesThatAreNoFrameAreRefused() {
        assertThatThrownBy(() -> new Rotation(Vec3.X, Vec3.Y, Vec3.Z.times(-1)))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessageContaining("right-handed");
        assertThatThrownBy(() -> new Rotation(Vec3.X.times(2), Vec3.Y, Vec3.Z))
                .isInstanceOf(IllegalArgumentException.class);
    }

    @Test
    void frameOfTwoDirectionsKeepsTheFirst() {
        Rotation r = Rotation.ofYandX(new Vec3(0, 0, 2), new Vec3(3, 0, 1));
        assertThat(r.y()).isEqualTo(Vec3.Z);
        assertThat(r.x().distance(Vec3.X)).isLessThan(ROUNDING);
        assertThat(r.z().distance(Vec3.Y.times(-1))).isLessThan(ROUNDING);
        Rotation s = Rotation.ofXandZ(new Vec3(0, 5, 0), new Vec3(0, 1, 1));
        assertThat(s.x()).isEqualTo(Vec3.Y);
        assertThat(s.z().distance(Vec3.Z)).isLessThan(ROUNDING);
    }

    @Test
    void positionsMoveAndDirectionsOnlyTurn() {
        Pose x_AB = new Pose(new Rotation(Vec3.Y, Vec3.X.times(-1), Vec3.Z), new Vec3(10, 0, 0));
        assertThat(x_AB.transformPosition(new Vec3(1, 2, 3)).distance(new Vec3(8, 1, 3)))
                .isLessThan(ROUNDING);
        assertThat(x_AB.transformVector(new Vec3(1, 2, 3)).distance(new Vec3(-2, 1, 3)))
                .isLessThan(ROUNDING);
        assertThat(x_AB.inversePosition(new Vec3(8, 1, 3)).distance(new Vec3(1, 2, 3)))
                .isLessThan(ROUNDING);
        Pose twice = x_AB.times(x_AB);
        Vec3 p = new Vec3(0.3, -0.2, 1);
        assertThat(twice.transformPosition(p).distance(x_AB.transformPosition(x_AB.transformPosition(p))))
                .isCloseTo(0, within(ROUNDING));
    }

    @Test
    void rotationVectorTurnsByItsLength() {
        // exact: a quarter turn about z carries x to y; the vector of a rotation is the one it was made of.
        Rotation quarter = Rotation.ofVector(new Vec3(0, 0, Math.PI / 2));
        assertThat(quarter.transformVector(Vec3.X).distance(Vec3.Y)).isLessThan(1e-15);
        Vec3 w = new Vec3(0.3, -0.7, 1.1);
        assertThat(Rotation.ofVector(w).vector().distance(w)).isLessThan(1e-14);
        assertThat(Rotation.ofVector(Vec3.ZERO)).isEqualTo(Rotation.IDENTITY);
        assertThat(Rotation.IDENTITY.vector()).isEqualTo(Vec3.ZERO);
        Vec3 tiny = new Vec3(1e-9, 0, -2e-9);
        assertThat(Rotation.ofVector(tiny).vector().distance(tiny)).isLessThan(1e-20);
    }
}
