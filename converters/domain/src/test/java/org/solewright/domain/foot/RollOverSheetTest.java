package org.solewright.domain.foot;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.finding.Cautions;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.Quantity;
import org.solewright.domain.finding.SourceFile;
import org.solewright.domain.gait.Side;

class RollOverSheetTest {

    private static RollOverSheet.Value value(RollOverMeasure measure, double value, int n) {
        return new RollOverSheet.Value(
                measure,
                value,
                OptionalDouble.empty(),
                RollOverSheet.Spread.BETWEEN_STANCES,
                n,
                OptionalDouble.empty(),
                OptionalDouble.empty(),
                Basis.MEASURED);
    }

    @Test
    void footAndStanceFindTheirNumbers() {
        RollOverSheet.Stance stance = new RollOverSheet.Stance(
                "w",
                1,
                0.5,
                List.of(1),
                true,
                "",
                List.of(value(RollOverMeasure.HEEL_RISE, 0.6, 1)),
                Optional.of(true),
                "seen",
                Optional.empty());
        RollOverSheet.Foot foot = new RollOverSheet.Foot(
                Side.LEFT,
                Quantity.of(0.9, Basis.MEASURED),
                Optional.empty(),
                Optional.empty(),
                List.of(stance),
                List.of(value(RollOverMeasure.CONTACT_ANGLE, 0.4, 2)),
                List.of("seen"),
                List.of(),
                List.of(new RollOverSheet.Lock("ankle", new Joint.Lock(0, 25, Basis.MEASURED))));
        RollOverSheet sheet = new RollOverSheet(
                "0",
                "S",
                true,
                List.of(new SourceFile("model", "m.xml", "0123456789abcdef".repeat(4))),
                List.of(new RollOverSheet.Setting("floor_m", "0", "given")),
                List.of(foot),
                List.of(new RollOverSheet.Comparison("about 0.22 of stature", "somebody")),
                List.of(Finding.note("rolling.flat", "", "flat")),
                Cautions.LINES);
        assertThat(sheet.feet().get(0).mean(RollOverMeasure.CONTACT_ANGLE)).isPresent();
        assertThat(sheet.feet().get(0).mean(RollOverMeasure.HEEL_RISE)).isEmpty();
        assertThat(stance.value(RollOverMeasure.HEEL_RISE)).isPresent();
        assertThat(stance.value(RollOverMeasure.COP_PATH)).isEmpty();
        assertThat(RollOverSheet.Spread.WITHIN_STANCE.word()).isEqualTo("within-stance");
    }

    @Test
    void numbersAreFiniteAndOfStances() {
        assertThatIllegalArgumentException()
                .isThrownBy(() -> value(RollOverMeasure.HEEL_RISE, Double.NaN, 1))
                .withMessageContaining("heel_rise NaN");
        assertThatIllegalArgumentException().isThrownBy(() -> value(RollOverMeasure.HEEL_RISE, 0.6, 0));
    }

    @Test
    void measuresKnowNameUnitAndMeaning() {
        for (RollOverMeasure m : RollOverMeasure.values()) {
            assertThat(RollOverMeasure.ofWord(m.word())).contains(m);
            assertThat(m.ofUnit(m.inUnit(0.25))).isCloseTo(0.25, within(1e-15));
            assertThat(m.definition()).isNotBlank();
            assertThat(m.unit()).isNotBlank();
        }
        // exact: 0.5 of stance is 50 %, pi rad are 180 deg.
        assertThat(RollOverMeasure.HEEL_RISE.inUnit(0.5)).isEqualTo(50);
        assertThat(RollOverMeasure.CONTACT_ANGLE.inUnit(Math.PI)).isCloseTo(180, within(1e-12));
        assertThat(RollOverMeasure.SHANK_RADIUS_OVER_LIMB.isOfRadius()).isTrue();
        assertThat(RollOverMeasure.SHANK_CURVATURE.isOfRadius()).isFalse();
    }
}
