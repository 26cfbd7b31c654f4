package org.solewright.analysis.dynamics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;

class SprawledLimbTest {

    private static SprawledLimb limb(double speed) throws LimitException {
        return SprawledLimb.of(0.3, 0.22, 0.12, speed, 0.6, 0.8);
    }

    @Test
    void trackLengthIsThatOfItsSamples() throws LimitException {
        for (double speed : new double[] {0.6, 0.44, 0.3, 0.42426406871192857}) {
            SprawledLimb limb = limb(speed);
            double length = 0;
            int n = 20000;
            for (int i = 1; i <= n; i++) {
                double a = 0.8 * (i - 1) / n;
                double b = 0.8 * i / n;
                length += Math.hypot(limb.kneeX(b) - limb.kneeX(a), limb.kneeY(b) - limb.kneeY(a));
            }
            // independent: polyline of the track, error of order 1/n^2.
            assertThat(limb.trackLength()).isCloseTo(length, within(1e-8));
        }
    }

    @Test
    void contactCurveIsAsLongAsTheTrackAndStaysOnTheSphere() throws LimitException {
        SprawledLimb limb = limb(0.6);
        double[] curve = limb.contactCurve(2001);
        double length = 0;
        for (int i = 0; i < 2001; i++) {
            assertThat(Math.sqrt(square(curve, i))).isCloseTo(0.12, within(1e-12));
            if (i > 0) {
                double x = curve[3 * i] - curve[3 * i - 3];
                double y = curve[3 * i + 1] - curve[3 * i - 2];
                double z = curve[3 * i + 2] - curve[3 * i - 1];
                length += Math.sqrt(x * x + y * y + z * z);
            }
        }
        // exact: rolling without slip maps the track to the sphere isometrically.
        assertThat(length).isCloseTo(limb.trackLength(), within(1e-7));
    }

    private static double square(double[] c, int i) {
        return c[3 * i] * c[3 * i] + c[3 * i + 1] * c[3 * i + 1] + c[3 * i + 2] * c[3 * i + 2];
    }

    @Test
    void circularTrackIsASmallCircle() throws LimitException {
        // exact: a full turn about the small circle's own centre comes back to the start of the curve.
        double full = 2 * Math.PI / Math.hypot(1, 0.2 / 0.12);
        CircularTrack track = CircularTrack.of(0.2, 0.12, full);
        assertThat(track.sphereArcAngle()).isCloseTo(2 * Math.PI, within(1e-14));
        assertThat(track.contactEnd()).containsExactly(new double[] {0, 0, -0.12}, within(1e-15));
        // exact: tan(angular radius) = c / r.
        assertThat(Math.tan(track.circleAngle())).isCloseTo(0.2 / 0.12, within(1e-14));
    }

    @Test
    void toesOfAGreatCircleLeaveItByTheirSagitta() {
        double[] circle = new double[3 * 1201];
        for (int i = 0; i <= 1200; i++) {
            double a = 1.5 * i / 1200;
            circle[3 * i] = 0.12 * Math.sin(a);
            circle[3 * i + 2] = -0.12 * Math.cos(a);
        }
        for (int n : new int[] {1, 2, 3, 4, 6}) {
            // exact: r (1 - cos(angle / (2 N))), nodes on samples.
            double sagitta = 0.12 * (1 - Math.cos(1.5 / (2 * n)));
            assertThat(ToePolyline.equalArc(circle, n).deviation()).isCloseTo(sagitta, within(1e-9));
        }
        double[] coarse = new double[3 * 121];
        for (int i = 0; i <= 120; i++) {
            System.arraycopy(circle, 30 * i, coarse, 3 * i, 3);
        }
        assertThat(ToePolyline.minimax(coarse, 3).deviation()).isCloseTo(0.12 * (1 - Math.cos(0.25)), within(1e-6));
        assertThat(ToePolyline.minimax(coarse, 3).nodes()).containsExactly(0, 40, 80, 120);
    }

    @Test
    void toesNearACuspAgreeWithTheWorkedDeviations() throws LimitException {
        // published: design of the solver, worked answer G-002: deviations at equal arcs rel 1e-3, minimax on 201
        // samples rel
        // 2e-2; three segments are worse than two at equal arcs.
        SprawledLimb limb = limb(0.44);
        double[] fine = limb.contactCurve(4001);
        double[] equal = {0.049143636656985616, 0.002817686987888902, 0.0163158764325218, 0.0008290319118577214};
        double[] minimax = {0.049143636656985616, 0.0027569614810493506, 0.002582710236088464, 0.00080533251192751};
        double[] coarse = limb.contactCurve(201);
        for (int n = 1; n <= 4; n++) {
            assertThat(ToePolyline.equalArc(fine, n).deviation()).isCloseTo(equal[n - 1], within(3e-3 * equal[n - 1]));
            assertThat(ToePolyline.minimax(coarse, n).deviation())
                    .isCloseTo(minimax[n - 1], within(2e-2 * minimax[n - 1]));
        }
    }

    @Test
    void femurThatDoesNotReachIsRefused() {
        assertThatThrownBy(() -> SprawledLimb.of(0.1, 0.3, 0.12, 1, 0.5, 0.5))
                .isInstanceOf(LimitException.class)
                .hasMessageContaining("femur 0.1 m");
        assertThatThrownBy(() -> CircularTrack.of(0, 0.1, 1)).hasMessageContaining("track radius 0.0 m");
        assertThatThrownBy(() -> CircularTrack.of(1, 0, 1)).hasMessageContaining("sphere radius 0.0 m");
    }

    @Test
    void slowAndFastStancesOfOneTrackAreOne() throws LimitException {
        // exact: rolling has no time of its own; 1e-300 s once took for ever
        double[] expected = limb(0.44).rotation(0.8);
        for (double time : new double[] {1e-250, 1e-9, 1e9}) {
            SprawledLimb other = SprawledLimb.of(0.3, 0.22, 0.12, 0.44 * 0.8 / time, 0.6, time);
            assertThat(other.rotation(time)).containsExactly(expected, within(1e-11));
        }
    }

    @Test
    void sizesScaleOut() throws LimitException {
        // exact: dimensional scaling [Hof 1996], lengths x 7
        SprawledLimb other = SprawledLimb.of(2.1, 1.54, 0.84, 0.44 * 7, 0.6, 0.8);
        assertThat(other.trackLength() / 7)
                .isCloseTo(limb(0.44).trackLength(), within(1e-12 * limb(0.44).trackLength()));
        assertThat(other.rotation(0.8)).containsExactly(limb(0.44).rotation(0.8), within(1e-12));
    }

    @Test
    void endlessRollingIsRefused() throws LimitException {
        SprawledLimb far = SprawledLimb.of(0.3, 0.22, 0.12, 1e9, 0.6, 0.8);
        assertThatThrownBy(() -> far.rotation(0.8))
                .isInstanceOf(LimitException.class)
                .hasMessageContaining("10000.0 times the radius");
    }
}
