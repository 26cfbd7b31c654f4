package org.solewright.formats.footmodel;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.foot.ChainPlan;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.foot.SegmentName;
import org.solewright.formats.io.FormatException;

class SegmentPlanFileTest {

    private static final String GOOD = """
            <?xml version="1.0" encoding="UTF-8"?>
            <segmentPlan xmlns="urn:solewright:segment-plan:1" name="digit">
              <segment name="forefoot">
                <shape proximalWidth="0.03" proximalHeight="0.04" distalWidth="0.05" distalHeight="0.06" massShare="0.01"/>
                <carries landmark="calcaneus_posterior"/>
                <carries landmark="forefoot_cluster"/>
              </segment>
              <segment name="phalanx_1">
                <joint name="fetlock">
                  <centre landmark="metatarsal_1_head" other="metatarsal_5_head"/>
                  <axis from="metatarsal_1_head" to="metatarsal_5_head"/>
                </joint>
                <shape proximalWidth="0.03" proximalHeight="0.02" distalWidth="0.02" distalHeight="0.01"/>
              </segment>
              <segment name="phalanx_2">
                <joint name="pastern">
                  <centre landmark="interphalangeal_1"/>
                  <axis direction="across"/>
                </joint>
                <shape proximalWidth="0.03" proximalHeight="0.02" distalWidth="0.02" distalHeight="0.01"
                       massShare="0.001" massBasis="measured"/>
                <carries landmark="toe_tip"/>
              </segment>
              <tip landmark="toe_tip"/>
            </segmentPlan>
            """;

    @TempDir
    Path folder;

    private Path file(String content) throws IOException {
        return Files.writeString(folder.resolve("plan.xml"), content);
    }

    @Test
    void readsSegmentsJointsShapesAndLandmarks() throws Exception {
        ChainPlan.Shape thin = new ChainPlan.Shape(0.03, 0.02, 0.02, 0.01);
        ChainPlan.Place tip = new ChainPlan.Place(Landmark.TOE_TIP, Optional.empty());
        assertThat(SegmentPlanFile.read(file(GOOD)))
                .isEqualTo(new ChainPlan(
                        "digit",
                        List.of(
                                new ChainPlan.Part(
                                        SegmentName.FOREFOOT,
                                        Optional.empty(),
                                        new ChainPlan.Shape(0.03, 0.04, 0.05, 0.06),
                                        Optional.of(new ChainPlan.MassShare(0.01, Basis.ASSUMED)),
                                        List.of(Landmark.CALCANEUS_POSTERIOR, Landmark.FOREFOOT_CLUSTER)),
                                new ChainPlan.Part(
                                        SegmentName.PHALANX_1,
                                        Optional.of(new ChainPlan.Hinge(
                                                "fetlock",
                                                new ChainPlan.Place(
                                                        Landmark.METATARSAL_1_HEAD,
                                                        Optional.of(Landmark.METATARSAL_5_HEAD)),
                                                new ChainPlan.Axis.Through(
                                                        Landmark.METATARSAL_1_HEAD, Landmark.METATARSAL_5_HEAD))),
                                        thin,
                                        Optional.empty(),
                                        List.of()),
                                new ChainPlan.Part(
                                        SegmentName.PHALANX_2,
                                        Optional.of(new ChainPlan.Hinge(
                                                "pastern",
                                                new ChainPlan.Place(Landmark.INTERPHALANGEAL_1, Optional.empty()),
                                                new ChainPlan.Axis.Along(ChainPlan.Direction.ACROSS))),
                                        thin,
                                        Optional.of(new ChainPlan.MassShare(0.001, Basis.MEASURED)),
                                        List.of(Landmark.TOE_TIP))),
                        tip));
    }

    @Test
    void planThatShipsIsInOrder() throws Exception {
        Path top = Path.of("").toAbsolutePath().getParent().getParent();
        ChainPlan example = SegmentPlanFile.read(
                top.resolve("templates/src/main/resources/org/solewright/templates/segment-plan.xml"));
        assertThat(example.carriers()).containsEntry(Landmark.TOE_TIP, SegmentName.PHALANX_2);
    }

    @Test
    void everySegmentOfTheFootMayStandInAPlan() throws Exception {
        for (SegmentName name : SegmentName.values()) {
            if (name != SegmentName.SHANK && !GOOD.contains("\"" + name.word() + "\"")) {
                assertThat(SegmentPlanFile.read(file(GOOD.replace("\"phalanx_1\"", "\"" + name.word() + "\"")))
                                .parts()
                                .get(1)
                                .name())
                        .isEqualTo(name);
            }
        }
    }

    // The first line of each departure is where its element stands in the text above, counted from 1.
    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            value = {
                "name=\"phalanx_1\" | name=\"toe\" | line 8: unknown segment 'toe'",
                "name=\"phalanx_1\" | name=\"shank\" | line 8: unknown segment 'shank'",
                "name=\"phalanx_1\" | name=\"forefoot\" | line 2: segment forefoot occurs twice",
                "carries landmark=\"toe_tip\" | carries landmark=\"tip\" | line 22: unknown landmark 'tip'",
                "tip landmark=\"toe_tip\" | tip landmark=\"shank_cluster\" | line 24: unknown landmark 'shank_cluster'",
                "carries landmark=\"toe_tip\" | carries landmark=\"calcaneus_posterior\" | line 2: landmark calcaneus_posterior is carried twice",
                "joint name=\"pastern\" | joint name=\"fetlock\" | line 2: joint fetlock occurs twice",
                "axis direction=\"across\" | axis direction=\"sideways\" | line 18: 'sideways', expected one of across, forward, up",
                "axis direction=\"across\" | axis from=\"toe_tip\" | line 18: an axis with neither two different landmarks from and to nor a direction alone",
                "axis direction=\"across\" | axis direction=\"up\" from=\"toe_tip\" to=\"cuboid\" | line 18: an axis with neither two different landmarks from and to nor a direction alone",
                "other=\"metatarsal_5_head\" | other=\"metatarsal_1_head\" | line 10: landmark 'metatarsal_1_head' twice, expected two different ones or one alone",
                "massShare=\"0.01\" | massBasis=\"measured\" | line 4: attribute 'massBasis' without 'massShare'",
                "massShare=\"0.01\" | massShare=\"0.9999\" | line 2: mass shares sum to 1.0009, expected less than 1",
                "</segmentPlan> | </plan> | line 25:",
            })
    void wrongPlanIsOneSentenceWithItsLine(String right, String wrong, String message) throws IOException {
        assertThat(GOOD).contains(right);
        Path file = file(GOOD.replace(right, wrong));
        FormatException e = catchThrowableOfType(FormatException.class, () -> SegmentPlanFile.read(file));
        assertThat(e).as("refused").isNotNull();
        assertThat(e.source()).isEqualTo(file.toString());
        assertThat(e.getMessage()).startsWith(message).doesNotContain("\n");
    }

    @Test
    void jointsAreWhereSegmentsMeetAndNowhereElse() throws IOException {
        String joint = GOOD.substring(GOOD.indexOf("<joint name=\"fetlock\""), GOOD.indexOf("</joint>") + 8);
        Path without = file(GOOD.replace(joint, ""));
        assertThat(catchThrowableOfType(FormatException.class, () -> SegmentPlanFile.read(without))
                        .getMessage())
                .isEqualTo("line 2: segment phalanx_1 has no joint, expected one");
        Path first = file(GOOD.replaceFirst("<shape", joint.replace("fetlock", "hock") + "<shape"));
        assertThat(catchThrowableOfType(FormatException.class, () -> SegmentPlanFile.read(first))
                        .getMessage())
                .isEqualTo(
                        "line 2: segment forefoot is the first and has a joint, expected none: it hangs on the ankle");
    }
}
