package org.solewright.app.cli;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.solewright.domain.foot.FootModel;
import org.solewright.domain.foot.Segment;
import org.solewright.domain.foot.SegmentName;
import org.solewright.formats.footmodel.FootModelFile;
import org.solewright.formats.io.FormatException;

/** Fits with every number of segments and with a plan file, from the command line. */
class SegmentPlansTest extends DemoCalls {

    private static final String PLAN = """
            <segmentPlan xmlns="urn:solewright:segment-plan:1" name="two parts">
              <segment name="forefoot">
                <shape proximalWidth="0.06" proximalHeight="0.05" distalWidth="0.08" distalHeight="0.03" massShare="0.011"/>
                <carries landmark="calcaneus_posterior"/>
                <carries landmark="metatarsal_1_head"/>
                <carries landmark="metatarsal_5_head"/>
              </segment>
              <segment name="toes">
                <joint name="toe">
                  <centre landmark="metatarsal_1_head" other="metatarsal_5_head"/>
                  <axis direction="across"/>
                </joint>
                <shape proximalWidth="0.08" proximalHeight="0.03" distalWidth="0.04" distalHeight="0.02"/>
                <carries landmark="toe_tip"/>
              </segment>
              <tip landmark="toe_tip"/>
            </segmentPlan>
            """;

    private static FootModel model(Path out) throws IOException, FormatException {
        return FootModelFile.read(out.resolve("foot-model-right.xml"));
    }

    private static double footMass(FootModel model) {
        return model.segments().stream()
                .filter(s -> s.name() != SegmentName.SHANK)
                .mapToDouble(s -> s.mass().value())
                .sum();
    }

    @ParameterizedTest
    @ValueSource(ints = {1, 2, 3, 4, 5, 6})
    void everyNumberOfSegmentsGivesAModelOfTheSameMassAndRolling(int parts) throws IOException, FormatException {
        Path out = folder.resolve("parts-" + parts);
        Called c = fit("--segments", Integer.toString(parts), "--out", out.toString());
        assertThat(c.code()).as(c.err()).isZero();
        FootModel model = model(out);
        assertThat(model.segments()).hasSize(parts + 1);
        FootModel rigid = rigid(out);
        // exact: the parts sum to the whole
        assertThat(footMass(model)).isCloseTo(footMass(rigid), within(1e-9));
        assertThat(c.out()).contains("  segment shank");
        // the toe tip turns the first toe segment, those beyond it follow
        List<Segment> beyond = model.segments().stream()
                .filter(s -> s.name() == SegmentName.PHALANX_2 || s.name() == SegmentName.PHALANX_3)
                .toList();
        assertThat(beyond).allMatch(s -> !s.observed());
        if (parts > 3) {
            // the demo has no point between hindfoot and metatarsal heads
            assertThat(model.segment(SegmentName.MIDFOOT).orElseThrow().observed())
                    .isFalse();
            assertThat(c.err()).contains("note tarsometatarsal.proportion");
        }
        // the invented foot is rigid: a chain of more parts rolls on the same arc (0.2 mm: the chain's own weights)
        assertThat(model.rolling().arcs().get(0).radius())
                .isCloseTo(rigid.rolling().arcs().get(0).radius(), within(2e-4));
    }

    private static FootModel rigid(Path beside) throws IOException, FormatException {
        Path out = beside.resolve("rigid");
        assertThat(fit("--segments", "1", "--out", out.toString()).code()).isZero();
        return model(out);
    }

    @Test
    void planFileDividesTheFootAndIsNamedInTheSources() throws IOException, FormatException {
        Path plan = Files.writeString(folder.resolve("own.xml"), PLAN);
        Path out = folder.resolve("planned");
        Called c = fit("--plan", plan.toString(), "--out", out.toString());
        assertThat(c.code()).as(c.err()).isZero();
        assertThat(c.err()).contains("note plan.mass-assumed").contains("the right toes");
        FootModel model = model(out);
        assertThat(model.segments().stream().map(Segment::name))
                .containsExactly(SegmentName.SHANK, SegmentName.FOREFOOT, SegmentName.TOES);
        assertThat(model.segments()).allMatch(Segment::observed);
        // exact: 1.1 % of the body mass
        assertThat(model.segments().get(1).mass().value())
                .isCloseTo(0.011 * model.subject().mass().value(), within(1e-12));
        assertThat(model.sources())
                .anyMatch(s -> s.role().equals("segment-plan") && s.path().equals("own.xml"));
        assertThat(model.joint("toe")).isPresent();
    }

    @Test
    void wrongPlanIsOneLineWithFileAndPlace() throws IOException {
        Path plan = Files.writeString(folder.resolve("wrong.xml"), PLAN.replace("name=\"toes\"", "name=\"toe\""));
        Called c =
                fit("--plan", plan.toString(), "--out", folder.resolve("none").toString());
        assertThat(c.code()).isEqualTo(3);
        assertThat(c.errors())
                .singleElement()
                .isEqualTo("solewright: " + plan + ": line 8: unknown segment 'toe': did you mean 'toes'?");
        Path lacking = Files.writeString(
                folder.resolve("lacking.xml"),
                PLAN.replace("<tip landmark=\"toe_tip\"/>", "<tip landmark=\"hallux_tip\"/>"));
        Called none = fit(
                "--plan", lacking.toString(), "--out", folder.resolve("none").toString());
        assertThat(none.code()).isEqualTo(3);
        assertThat(none.err()).contains("has no left hallux_tip, where the segment plan puts a joint or the tip");
    }

    @Test
    void choicesThatExcludeEachOtherAreWrongUsage() {
        assertThat(fit("--plan", "p.xml", "--segments", "2").code()).isEqualTo(2);
        assertThat(fit("--mtp-offset", "some").code()).isEqualTo(2);
        assertThat(fit("--segments", "7").code()).isEqualTo(2);
        Called absent = fit("--plan", folder.resolve("absent.xml").toString());
        assertThat(absent.code()).isEqualTo(3);
        assertThat(absent.errors()).hasSize(1);
    }

    @Test
    void functionalToeAxisIsMovedForwardAndUp() throws IOException, FormatException {
        Path out = folder.resolve("functional");
        assertThat(fit("--segments", "2", "--mtp-offset", "functional", "--out", out.toString())
                        .code())
                .isZero();
        Path plain = folder.resolve("on-the-line");
        assertThat(fit("--segments", "2", "--out", plain.toString()).code()).isZero();
        FootModel model = model(out);
        double forward = model.joint("metatarsophalangeal")
                        .orElseThrow()
                        .centre()
                        .position()
                        .x()
                - model(plain)
                        .joint("metatarsophalangeal")
                        .orElseThrow()
                        .centre()
                        .position()
                        .x();
        // published: 16 % of foot length [Front Bioeng Biotechnol 2014]; the length along x, not along the tip's own
        // line
        assertThat(forward).isBetween(0.155 * 0.31, 0.161 * 0.31);
    }
}
