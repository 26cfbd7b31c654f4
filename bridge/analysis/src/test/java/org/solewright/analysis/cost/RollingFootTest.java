package org.solewright.analysis.cost;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;
import org.solewright.analysis.dynamics.Limit;
import org.solewright.analysis.dynamics.LimitException;
import org.solewright.domain.cost.WorkForm;

class RollingFootTest {

    @Test
    void pointFootIsTheCompass() throws LimitException {
        RollingFoot foot = RollingFoot.full(0.7, 0.9, 0);
        VaultingStep compass = VaultingStep.given(0, 0.7, 0.9, 0, 1);
        for (WorkForm form : WorkForm.values()) {
            assertThat(foot.factor(form)).as(form.word()).isCloseTo(compass.factor(form), within(1e-14)); // exact
        }
    }

    @Test
    void wheelCostsNothing() throws LimitException {
        assertThat(RollingFoot.full(0.7, 0.9, 0.9).factor(WorkForm.PUSH_OFF)).isZero(); // exact: R = L
    }

    @Test
    void contactLeanMakesTheStep() throws LimitException {
        RollingFoot foot = RollingFoot.full(1.0, 0.9, 0.45);
        double a = foot.halfAngle();
        assertThat(2 * 0.45 * a + 2 * 0.45 * Math.sin(a)).isCloseTo(1.0, within(1e-14)); // exact: its equation
        // independent: slope of the hip's path by differences of hip(theta) = (R t + c sin t, R + c cos t)
        double h = 1e-6;
        double dx = 0.45 * 2 * h + 0.45 * (Math.sin(a + h) - Math.sin(a - h));
        double dz = 0.45 * (Math.cos(a + h) - Math.cos(a - h));
        assertThat(foot.contactAngle()).isCloseTo(Math.atan2(-dz, dx), within(1e-9));
    }

    @Test
    void arcLongEnoughIsAsIfEndless() throws LimitException {
        RollingFoot foot = RollingFoot.shortArc(0.7, 0.9, 0.27, 0.5);
        assertThat(foot.truncated()).isFalse();
        assertThat(foot.contactAngle())
                .isEqualTo(RollingFoot.full(0.7, 0.9, 0.27).contactAngle());
        assertThat(foot.arcLength()).isCloseTo(0.27, within(1e-15));
    }

    @Test
    void shorterArcCostsMore() throws LimitException {
        double before = 0;
        for (double half = 0.39; half > 0; half -= 0.03) {
            RollingFoot foot = RollingFoot.shortArc(0.7, 0.9, 0.27, half);
            assertThat(foot.truncated()).isTrue();
            double factor = foot.factor(WorkForm.PUSH_OFF);
            assertThat(factor).isGreaterThan(before);
            before = factor;
        }
        // exact: without an arc the edge is a point at L below the hip
        assertThat(RollingFoot.shortArc(0.7, 0.9, 0.27, 0).factor(WorkForm.PUSH_OFF))
                .isCloseTo(RollingFoot.full(0.7, 0.9, 0).factor(WorkForm.PUSH_OFF), within(1e-14));
    }

    @Test
    void shortArcIsContinuousWhereItsEdgeComesIn() throws LimitException {
        double lean = RollingFoot.full(0.7, 0.9, 0.27).halfAngle();
        RollingFoot whole = RollingFoot.shortArc(0.7, 0.9, 0.27, lean + 1e-9);
        RollingFoot cut = RollingFoot.shortArc(0.7, 0.9, 0.27, lean - 1e-9);
        assertThat(whole.truncated()).isFalse();
        assertThat(cut.truncated()).isTrue();
        // exact: the same posture from both sides; slopes of order 1 times 2e-9
        assertThat(cut.contactAngle()).isCloseTo(whole.contactAngle(), within(1e-8));
        assertThat(cut.halfAngle()).isCloseTo(whole.halfAngle(), within(1e-8));
    }

    @Test
    void limitsOfTheArc() {
        assertThat(limit(0.7, 0.9, -0.1)).isEqualTo(Limit.ARC_RADIUS);
        assertThat(limit(0.7, 0.9, 0.91)).isEqualTo(Limit.ARC_RADIUS);
        assertThat(limit(0, 0.9, 0.3)).isEqualTo(Limit.NONPOSITIVE_STEP);
        assertThat(limit(0.7, 0, 0)).isEqualTo(Limit.NONPOSITIVE_RADIUS);
        assertThat(limit(1.8, 0.9, 0)).isEqualTo(Limit.STEP_OUT_OF_REACH); // exact: D < pi R + 2 (L - R)
        LimitException e = catchThrowableOfType(LimitException.class, () -> RollingFoot.shortArc(2.2, 0.9, 0.3, 0.3));
        assertThat(e.limit()).isEqualTo(Limit.STEP_OUT_OF_REACH);
    }

    private static Limit limit(double step, double limb, double radius) {
        return catchThrowableOfType(LimitException.class, () -> RollingFoot.full(step, limb, radius))
                .limit();
    }

    @Test
    void equivalentArcCostsTheSame() throws LimitException {
        VaultingStep step = VaultingStep.given(2, 0.6, 0.9, 0.25, 1);
        double factor = step.factor(WorkForm.PUSH_OFF);
        double ratio = RollingFoot.equivalentRatio(0.6, 0.9, factor);
        // independent: factor of the answer
        assertThat(RollingFoot.full(0.6, 0.9, ratio * 0.9).factor(WorkForm.PUSH_OFF))
                .isCloseTo(factor, within(1e-14));
    }

    @Test
    void oneFlatSegmentWithEqualVaultsIsAnArcOfThreeTenths() throws LimitException {
        VaultingStep step = VaultingStep.equalVaults(1, 0.6, 0.9, 0);
        // exact: 1 - 1/sqrt 2 = 0.2929
        assertThat(RollingFoot.equivalentRatioSmallAngle(step)).isCloseTo(1 - 1 / Math.sqrt(2), within(1e-15));
    }

    @Test
    void compassIsEquivalentToNoArc() throws LimitException {
        VaultingStep step = VaultingStep.given(0, 0.6, 0.9, 0, 1);
        assertThat(RollingFoot.equivalentRatio(0.6, 0.9, step.factor(WorkForm.PUSH_OFF)))
                .isZero(); // exact
        assertThat(RollingFoot.equivalentRatioSmallAngle(step)).isCloseTo(0, within(1e-15));
    }

    @Test
    void polygonOnACircleIsTheVaultingStep() throws LimitException {
        double radius = 0.7;
        double[] pivots = new double[6];
        double half = Math.asin(0.1 / (2 * radius));
        for (int i = 0; i < 3; i++) {
            pivots[2 * i] = radius * Math.sin((i - 1) * 2 * half);
            pivots[2 * i + 1] = -radius * Math.cos((i - 1) * 2 * half);
        }
        PivotPolygon polygon = PivotPolygon.of(pivots, 0.6);
        VaultingStep step = VaultingStep.given(2, 0.6, 0.7, 0.2, 0);
        for (WorkForm form : new WorkForm[] {WorkForm.NO_PUSH, WorkForm.PUSH_OFF, WorkForm.SIMULTANEOUS}) {
            assertThat(polygon.factor(form)).isCloseTo(step.factor(form), within(1e-13)); // exact: equal radii
        }
    }

    @Test
    void limitsOfThePolygon() {
        assertThat(polygonLimit(new double[] {-0.1, -0.9, 0, -0.88, 0.1, -0.9}, 0.6))
                .isEqualTo(Limit.POLYGON_NOT_CONVEX);
        assertThat(polygonLimit(new double[] {-0.1, -0.9, 0, -0.9, 0.1, -0.9}, 0.6))
                .isEqualTo(Limit.POLYGON_NOT_CONVEX);
        assertThat(polygonLimit(new double[] {-0.1, -0.9, 0.1, -0.9}, 0.2)).isEqualTo(Limit.STEP_NOT_LONGER_THAN_FOOT);
        assertThat(polygonLimit(new double[] {-0.1, -0.9, 0.1, -0.9}, 3)).isEqualTo(Limit.PIVOT_SPACING_OUT_OF_REACH);
        assertThat(polygonLimit(new double[] {-0.1, -0.9, 0.1, -0.9}, 0)).isEqualTo(Limit.NONPOSITIVE_STEP);
        assertThat(polygonLimit(new double[] {}, 0.6)).isEqualTo(Limit.SEGMENT_COUNT);
        assertThat(polygonLimit(new double[] {0, 0}, 0.6)).isEqualTo(Limit.NONPOSITIVE_RADIUS);
    }

    private static Limit polygonLimit(double[] pivots, double step) {
        return catchThrowableOfType(LimitException.class, () -> PivotPolygon.of(pivots, step))
                .limit();
    }

    @Test
    void powerIsSplitAtItsZero() {
        PowerWork work = PowerWork.of(new double[] {3, -1, -1, 0, 2}, 0.5);
        // exact: triangles 3*0.375/2 and 1*0.125/2, then -0.5, -0.25, +0.5
        assertThat(work.positive()).isCloseTo(0.5625 + 0.5, within(1e-15));
        assertThat(work.negative()).isCloseTo(-0.0625 - 0.5 - 0.25, within(1e-15));
    }

    @Test
    void collisionAngleOfForceAndVelocityInThePlane() {
        double lean = 0.1;
        double slope = 0.05;
        double[] force = new double[9];
        double[] velocity = new double[9];
        for (int i = 0; i < 3; i++) {
            force[3 * i] = -700 * Math.sin(lean);
            force[3 * i + 2] = 700 * Math.cos(lean);
            velocity[3 * i] = 1.3 * Math.cos(slope);
            velocity[3 * i + 2] = -1.3 * Math.sin(slope);
        }
        CollisionMeasures m = CollisionMeasures.of(force, velocity, 0.01, 70, 9.81);
        // exact: force leans back by 0.1, velocity falls by 0.05, so they miss the right angle by 0.15
        assertThat(m.collisionAngle()).isCloseTo(0.15, within(1e-14));
        assertThat(m.forceAngle()).isCloseTo(0.1, within(1e-14));
        assertThat(m.velocityAngle()).isCloseTo(0.05, within(1e-14));
        assertThat(m.collisionFraction()).isCloseTo(1, within(1e-13));
        assertThat(m.mechanicalCostOfTransport())
                .isCloseTo(700 * Math.sin(0.15) / (70 * 9.81 * Math.cos(slope)), within(1e-14));
    }

    @Test
    void weightlessSamplesHaveNoAngle() {
        CollisionMeasures m = CollisionMeasures.of(new double[6], new double[6], 0.01, 70, 9.81);
        assertThat(m.collisionFraction()).isZero(); // exact: 0/0 counts as 0
        assertThat(m.mechanicalCostOfTransport()).isNaN();
    }
}
