package org.solewright.formats.footmodel;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;

import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.finding.Cautions;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.Quantity;
import org.solewright.domain.finding.SourceFile;
import org.solewright.domain.foot.Joint;
import org.solewright.domain.foot.RollOverMeasure;
import org.solewright.domain.foot.RollOverSheet;
import org.solewright.domain.foot.Rolling;
import org.solewright.domain.gait.Side;
import org.solewright.formats.table.RollOverTable;

class RollOverFileTest {

    private static RollOverSheet.Value value(RollOverMeasure measure, double value, int n) {
        return new RollOverSheet.Value(
                measure,
                value,
                OptionalDouble.of(0.5 * value),
                n == 1 ? RollOverSheet.Spread.WITHIN_STANCE : RollOverSheet.Spread.BETWEEN_STANCES,
                n,
                n < 3 ? OptionalDouble.empty() : OptionalDouble.of(0.25 * value),
                n < 3 ? OptionalDouble.empty() : OptionalDouble.of(2 * value),
                Basis.MEASURED);
    }

    private static RollOverSheet sheet() {
        RollOverSheet.Stance stance = new RollOverSheet.Stance(
                "walk \u0001 1",
                1,
                0.5,
                List.of(1, 2),
                false,
                "foot over the rear border",
                List.of(value(RollOverMeasure.HEEL_RISE, 0.625, 1)),
                Optional.of(true),
                "seen",
                Optional.of("plantigrade"));
        RollOverSheet.Foot foot = new RollOverSheet.Foot(
                Side.LEFT,
                Quantity.of(0.9, Basis.ASSUMED),
                Optional.of(Quantity.of(0.25, Basis.MEASURED, 0.005)),
                Optional.of(Quantity.of(1.7, Basis.MEASURED)),
                List.of(stance),
                List.of(value(RollOverMeasure.HEEL_RISE, 0.5, 4)),
                List.of("Heel bore load 0-10 % of stance."),
                List.of(new Rolling.Pivot(0.01, 0, 0, 30)),
                List.of(new RollOverSheet.Lock("ankle", new Joint.Lock(0, 25, Basis.MEASURED))));
        return new RollOverSheet(
                "0.1.0",
                "S",
                false,
                List.of(new SourceFile("model", "m.xml", InventedModel.DIGEST)),
                List.of(new RollOverSheet.Setting("floor_m", "0.0", "given")),
                List.of(foot),
                List.of(new RollOverSheet.Comparison("about 0.22 of stature", "Hansen & Meier 2010")),
                List.of(
                        Finding.note("rolling.continuous", "left", "rolls on"),
                        Finding.note("rolling.flat", "", "flat")),
                Cautions.LINES);
    }

    @Test
    void everyNumberHasUnitBasisAndSpread() {
        String xml = new String(RollOverFile.bytes(sheet()), StandardCharsets.UTF_8);
        // exact: 0.625 and 0.5 of stance in per cent; SD half, ends a quarter and twice the value, as made above.
        assertThat(xml)
                .contains("<value measure=\"heel_rise\" value=\"62.5\" unit=\"%\" basis=\"measured\" sd=\"31.25\""
                        + " spread=\"within-stance\" n=\"1\"/>")
                .contains("<value measure=\"heel_rise\" value=\"50.0\" unit=\"%\" basis=\"measured\" sd=\"25.0\""
                        + " spread=\"between-stances\" n=\"4\" low=\"12.5\" high=\"100.0\"/>")
                .contains("<heelBearing bore=\"true\">seen</heelBearing>")
                .contains("platforms=\"1 2\" whole=\"false\" why=\"foot over the rear border\" posture=\"plantigrade\"")
                .contains("<length of=\"limb\" value=\"0.9\" basis=\"assumed\"/>")
                .contains("<comparison source=\"Hansen &amp; Meier 2010\">")
                .contains("Not a medical device");
        assertThat(RollOverFile.bytes(sheet())).isEqualTo(RollOverFile.bytes(sheet()));
    }

    @Test
    void tableHasOneNumberARow() {
        String csv = new String(RollOverTable.bytes(sheet()), StandardCharsets.UTF_8);
        assertThat(csv.lines())
                .startsWith("trial,step,side,measure,unit,value,sd,spread,n,low,high,basis,text")
                .contains(
                        "*,mean,left,heel_rise,%,50.0,25.0,between-stances,4,12.5,100.0,measured,",
                        "*,mean,left,pivot_1_to,%,30.0,,,,,,measured,",
                        "*,mean,left,lock_ankle_length,%,25.0,,,,,,measured,",
                        "*,mean,left,observation,,,,,,,,,Heel bore load 0-10 % of stance.",
                        "*,,,published,,,,,,,,,about 0.22 of stature (Hansen & Meier 2010)",
                        "*,,,finding,,,,,,,,,note rolling.continuous left: rolls on")
                .allMatch(l -> l.split(",", -1).length >= 13);
    }

    @Test
    void measuresKnowTheirUnits() {
        for (RollOverMeasure m : RollOverMeasure.values()) {
            assertThat(RollOverMeasure.ofWord(m.word())).contains(m);
            assertThat(m.ofUnit(m.inUnit(0.25))).isEqualTo(0.25);
            assertThat(m.definition()).isNotBlank();
        }
        assertThat(RollOverMeasure.SHANK_RADIUS_OVER_LIMB.isOfRadius()).isTrue();
        assertThat(RollOverMeasure.SHANK_CURVATURE.isOfRadius()).isFalse();
        assertThat(sheet().feet().get(0).mean(RollOverMeasure.HEEL_RISE)).isPresent();
        assertThat(sheet().feet().get(0).stances().get(0).value(RollOverMeasure.TOES_TO))
                .isEmpty();
        assertThatIllegalArgumentException().isThrownBy(() -> value(RollOverMeasure.HEEL_RISE, Double.NaN, 1));
    }
}
