package org.solewright.analysis.fitting;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.foot.SidedLandmark;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Vec3;

class ErrorDrawTest {

    private static final MeasurementErrors ERRORS = MeasurementErrors.REFERENCE;

    @Test
    void errorIsTheSameWhateverWasDrawnBefore() {
        ErrorDraw one = new ErrorDraw(ERRORS, 5, 3);
        Vec3 first = one.placement(Landmark.CALCANEUS_POSTERIOR, Side.LEFT);
        ErrorDraw other = new ErrorDraw(ERRORS, 5, 3);
        other.hip(Side.RIGHT);
        other.skin("foot left", 7);
        other.platform(1, Vec3.Z);
        assertThat(other.placement(Landmark.CALCANEUS_POSTERIOR, Side.LEFT)).isEqualTo(first);
        assertThat(new ErrorDraw(ERRORS, 5, 4).placement(Landmark.CALCANEUS_POSTERIOR, Side.LEFT))
                .isNotEqualTo(first);
        assertThat(new ErrorDraw(ERRORS, 6, 3).placement(Landmark.CALCANEUS_POSTERIOR, Side.LEFT))
                .isNotEqualTo(first);
        assertThat(one.placement(Landmark.CALCANEUS_POSTERIOR, Side.RIGHT)).isNotEqualTo(first);
    }

    @Test
    void errorsAreAsLargeAsStated() {
        int runs = 4000;
        double foot = 0;
        double knee = 0;
        double skin = 0;
        double cop = 0;
        double height = 0;
        double cross = 0;
        for (int run = 0; run < runs; run++) {
            ErrorDraw draw = new ErrorDraw(ERRORS, 1, run);
            Vec3 heel = draw.placement(Landmark.CALCANEUS_POSTERIOR, Side.LEFT);
            foot += heel.dot(heel) / 3 / runs;
            Vec3 epicondyle = draw.placement(Landmark.FEMORAL_EPICONDYLE_LATERAL, Side.LEFT);
            knee += epicondyle.dot(epicondyle) / 3 / runs;
            cross += heel.dot(epicondyle) / 3 / runs;
            ErrorDraw.Skin moved = draw.skin("shank left", 1);
            for (int i = 0; i < 20; i++) {
                Vec3 e = moved.at(0, (i + 0.5) / 20);
                skin += e.dot(e) / 3 / 20 / runs;
            }
            Vec3 plate = draw.platform(2, Vec3.Z);
            cop += (plate.x() * plate.x() + plate.y() * plate.y()) / 2 / runs;
            height += plate.z() * plate.z() / runs;
        }
        // design 03 section 7: SD of each component; the mean square of n normal numbers scatters by sqrt(2/n) of
        // itself,
        // four such SDs of 4000 (12000 for three components) are under 9 %.
        assertThat(Math.sqrt(foot)).isCloseTo(0.005, within(0.005 * 0.05));
        assertThat(Math.sqrt(knee)).isCloseTo(0.010, within(0.010 * 0.05));
        assertThat(Math.sqrt(skin)).isCloseTo(0.002, within(0.002 * 0.05));
        assertThat(Math.sqrt(cop)).isCloseTo(0.003, within(0.003 * 0.05));
        assertThat(Math.sqrt(height)).isCloseTo(0.003, within(0.003 * 0.05));
        assertThat(cross).isCloseTo(0, within(4 * 0.005 * 0.010 / Math.sqrt(3.0 * runs)));
    }

    @Test
    void noErrorsMoveNothing() {
        assertThat(ErrorDraw.NONE.placement(Landmark.ASIS, Side.LEFT)).isEqualTo(Vec3.ZERO);
        assertThat(ErrorDraw.NONE.skin("foot", 2).at(1, 0.3)).isEqualTo(Vec3.ZERO);
        assertThat(ErrorDraw.NONE.platform(1, Vec3.Z).norm()).isZero();
    }

    @Test
    void clustersStayWhereTheyWereSeen() {
        SidedLandmark heel = new SidedLandmark(Landmark.CALCANEUS_POSTERIOR, Side.LEFT);
        SidedLandmark cluster = new SidedLandmark(Landmark.SHANK_CLUSTER, Side.LEFT);
        StandingPosture posture = new StandingPosture(
                Map.of(heel, Vec3.X), Map.of(cluster, List.of(Vec3.Y)), Vec3.Z, OptionalDouble.empty());
        ErrorDraw draw = new ErrorDraw(ERRORS, 1, 1);
        StandingPosture placed = draw.placed(posture);
        assertThat(placed.cluster(Landmark.SHANK_CLUSTER, Side.LEFT)).containsExactly(Vec3.Y);
        assertThat(placed.position(Landmark.CALCANEUS_POSTERIOR, Side.LEFT))
                .contains(Vec3.X.plus(draw.placement(Landmark.CALCANEUS_POSTERIOR, Side.LEFT)));
    }

    @Test
    void errorsScaleWithTheSubjectButThoseOfThePlatformDoNot() {
        MeasurementErrors small = ERRORS.scaled(0.09);
        // exact: a tenth of the reference limb.
        assertThat(small.footPlacement()).isCloseTo(0.0005, within(1e-15));
        assertThat(small.skin()).isCloseTo(0.0002, within(1e-15));
        assertThat(small.centreOfPressure()).isEqualTo(0.003);
        assertThatThrownBy(() -> new MeasurementErrors(-1, 0, 0, 0, 0))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessageContaining("-1.0");
    }
}
