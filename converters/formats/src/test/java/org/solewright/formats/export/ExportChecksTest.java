package org.solewright.formats.export;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.charset.StandardCharsets;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.foot.FootModel;
import org.solewright.domain.foot.InertiaTensor;
import org.solewright.domain.foot.SegmentName;
import org.solewright.domain.gait.Side;

class ExportChecksTest {

    @Test
    void tensorsOfBodiesPassAndOthersDoNot() {
        // Exact: a thin plate has Izz = Ixx + Iyy; a point on the line x = y = 1 has Ixx = Iyy = 1, Izz = 2, Ixy = -1.
        assertThat(TensorCheck.isPossible(new double[] {1, 0, 0, 0, 2, 0, 0, 0, 3}))
                .isTrue();
        assertThat(TensorCheck.isPossible(new double[] {1, -1, 0, -1, 1, 0, 0, 0, 2}))
                .isTrue();
        assertThat(TensorCheck.isPossible(new double[] {1, 0, 0, 0, 2, 0, 0, 0, 3.001}))
                .isFalse();
        // Diagonal in order, principal moments not: the product is larger than any mass could make it.
        assertThat(TensorCheck.isPossible(new double[] {1, 0.9, 0, 0.9, 1, 0, 0, 0, 1.5}))
                .isFalse();
        assertThat(TensorCheck.isPossible(new double[] {1, 0.1, 0, 0.2, 1, 0, 0, 0, 1}))
                .isFalse();
        assertThat(TensorCheck.isPossible(new double[9])).isFalse();
    }

    @Test
    void impossibleModelsAreNotExported() throws Exception {
        FootModel model =
                InventedFoot.of(Side.LEFT, InertiaTensor.principal(1, 1, 3), SegmentName.SHANK, SegmentName.FOOT);
        Exported e = Exports.run("table", model);
        assertThat(e.content()).isEmpty();
        assertThat(e.findings()).extracting(Finding::code).containsOnly("export.inertia-impossible");
        FootModel good = InventedFoot.all().get(0);
        FootModel loose = new FootModel(
                good.side(),
                good.version(),
                good.subject(),
                good.sources(),
                good.segments(),
                List.of(),
                good.landmarks(),
                good.rolling(),
                List.of(good.pads().get(0), good.pads().get(0)),
                List.of(),
                List.of());
        assertThat(Exports.run("table", loose).findings())
                .extracting(Finding::code)
                .containsExactly("export.joint-missing", "export.name");
    }

    private static List<String> said(String output) {
        return OutputChecks.of(output.getBytes(StandardCharsets.UTF_8)).stream()
                .map(f -> f.where() + ": " + f.message())
                .toList();
    }

    @Test
    void robotsOfForeignTemplatesAreLookedAt() {
        String inertia = "<inertia ixx='1' iyy='1' izz='3' ixy='0' ixz='0' iyz='0'/>";
        assertThat(
                        said(
                                "<robot><link name='a'><inertial><mass value='-1'/>" + inertia + "</inertial></link>"
                                        + "<link name='a'/><link name='b'/><joint name='j'><parent link='a'/><child link='c'/></joint></robot>"))
                .containsExactly(
                        "a: mass '-1' kg, expected more than 0 kg",
                        "a: its inertia can be of no body",
                        "link 'a': occurs twice",
                        "joint j: between 'a' and 'c', expected links of the file");
    }

    @Test
    void humanoidsOfForeignTemplatesAreLookedAt() {
        assertThat(said("<X3D><HAnimJoint name='humanoid_root'><HAnimJoint name='l_talocrural'>"
                        + "<HAnimSegment name='l_talus' mass='0' momentsOfInertia='1 0 0'/>"
                        + "<HAnimSegment name='l_calf' mass='1' momentsOfInertia='1 0 0 0 1 0 0 0 1'/>"
                        + "<HAnimJoint name='r_metatarsophalangeal_2'/><HAnimJoint name='skullbase'/>"
                        + "</HAnimJoint></HAnimJoint></X3D>"))
                .containsExactly(
                        "l_talus: mass '0' kg, expected more than 0 kg",
                        "l_talus: 3 values of inertia, expected nine",
                        "segment l_calf: hangs from 'l_talocrural', the standard has 'l_knee'",
                        "joint r_metatarsophalangeal_2: hangs from 'l_talocrural', the standard has 'r_tarsometatarsal_2'",
                        "joint skullbase: is no joint of a leg in ISO/IEC 19774-1: not checked");
    }

    @Test
    void otherOutputIsNotLookedAt() {
        assertThat(said("a,b\n")).isEmpty();
        assertThat(said("<other/>")).isEmpty();
        assertThat(said("<robot>")).singleElement().satisfies(m -> assertThat(m).contains("begins like XML"));
    }
}
