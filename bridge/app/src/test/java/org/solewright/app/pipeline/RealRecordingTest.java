package org.solewright.app.pipeline;

import static org.assertj.core.api.Assertions.assertThat;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.io.IOException;
import java.net.URISyntaxException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.EnumSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.solewright.analysis.fitting.InertiaTable;
import org.solewright.analysis.fitting.RollOver;
import org.solewright.app.report.PageForm;
import org.solewright.domain.cost.TransitionRow;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.foot.FootModel;
import org.solewright.domain.foot.Population;
import org.solewright.domain.foot.Rolling;
import org.solewright.domain.gait.ContactRow;
import org.solewright.domain.gait.CurveRow;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.gait.Side;
import org.solewright.domain.gait.Use;
import org.solewright.domain.geometry.Rotation;
import org.solewright.domain.geometry.Vec3;
import org.solewright.domain.motion.PointTrack;
import org.solewright.domain.motion.Recording;
import org.solewright.formats.c3d.C3dFile;
import org.solewright.formats.c3d.C3dWriter;
import org.solewright.formats.footmodel.FootModelFile;
import org.solewright.formats.io.FormatException;

/**
 * The main job on a real recording: one person, barefoot, two platforms, no mass in the file. Bands: independent, from the
 * calculation of design 03 section 9, with its column "accept".
 */
class RealRecordingTest {

    @TempDir
    private static Path folder;

    private static Optional<Path> files;
    private static FitReport fit;
    private static AppraiseReport appraisal;
    private static AppraiseUseCase.Result result;
    private static FitUseCase.Result fitted;

    private static Path recording(String name) {
        return files.orElseThrow().resolve("s26-" + name + ".c3d");
    }

    private static GaitOptions options(List<Path> standing) throws URISyntaxException {
        Path map = Path.of(RealRecordingTest.class
                .getResource("/org/solewright/app/s26-landmarks.xml")
                .toURI());
        return new GaitOptions(
                standing,
                List.of(
                        recording("walking-hybrid-1-1"),
                        recording("walking-hybrid-1-2"),
                        recording("walking-hybrid-1-3")),
                map,
                OptionalDouble.empty(),
                OptionalDouble.empty(),
                Population.UNKNOWN,
                Optional.empty(),
                Optional.empty(),
                OptionalDouble.empty(),
                false,
                OptionalDouble.empty(),
                GaitOptions.DEFAULT_MARKER_CUTOFF,
                false,
                0,
                "platform",
                Optional.empty());
    }

    @BeforeAll
    static void fitAndAppraise() throws URISyntaxException, UseCaseException, FormatException {
        files = SharedFolder.find().map(s -> s.resolve("c3d").resolve("files")).filter(Files::isDirectory);
        assumeTrue(files.isPresent(), "the shared recordings are not beside this checkout");
        FitUseCase.Request request = new FitUseCase.Request(
                options(List.of(recording("standing-hybrid-1"))),
                EnumSet.allOf(Side.class),
                true,
                OptionalInt.empty(),
                InertiaTable.DE_LEVA,
                "s26",
                "test");
        fit = FitReport.write(request, folder);
        fitted = FitUseCase.run(request);
        AppraiseUseCase.Request cost = new AppraiseUseCase.Request(
                options(List.of()),
                Optional.empty(),
                List.of(),
                List.of(folder.resolve("foot-model-right.xml"), folder.resolve("foot-model-left.xml")),
                "test");
        appraisal = AppraiseReport.write(cost, folder);
        result = AppraiseUseCase.run(cost);
    }

    private static TransitionRow row(int walk) {
        return result.cost().rows().stream()
                .filter(r -> r.text("trial").orElse("").equals("s26-walking-hybrid-1-" + walk))
                .findFirst()
                .orElseThrow();
    }

    private static void each(String column, double low, double high) {
        for (int walk = 1; walk <= 3; walk++) {
            assertThat(row(walk).number(column).orElse(Double.NaN))
                    .as(column + " of walk " + walk)
                    .isBetween(low, high);
        }
    }

    private static void around(String column, double tolerance, double first, double second, double third) {
        double[] expected = {first, second, third};
        for (int walk = 1; walk <= 3; walk++) {
            assertThat(row(walk).number(column).orElse(Double.NaN))
                    .as(column + " of walk " + walk)
                    .isBetween(expected[walk - 1] - tolerance, expected[walk - 1] + tolerance);
        }
    }

    @Test
    void massStepAndSpeedAreInTheirBands() {
        each("mass_kg", 81.5, 84.5);
        around("step_length_m", 0.006, 0.793, 0.795, 0.782);
        around("step_time_s", 0.006, 0.517, 0.518, 0.501);
        around("speed_m_s", 0.02, 1.553, 1.550, 1.580);
        each("speed_before_m_s", 1.65, 1.72);
    }

    @Test
    void worksAreInTheirBands() {
        each("push_off_J", 16.5, 24);
        each("push_off_ds_J", 13.5, 17.5);
        each("collision_J", -23, -16);
        each("collision_ds_J", -20.5, -15.5);
        each("rebound_J", 5, 11.5);
        for (int walk = 1; walk <= 2; walk++) {
            assertThat(row(walk).number("preload_J").orElse(Double.NaN)).isBetween(-15.5, -9.0);
        }
        assertThat(row(3).number("preload_J")).isEmpty();
    }

    @Test
    void anglesAndCollisionMeasuresAreInTheirBands() {
        each("transition_angle_deg", 19, 24);
        each("transition_angle_ds_deg", 10.5, 14);
        each("collision_angle_deg", 3.3, 3.9);
        each("collision_fraction", 0.25, 0.30);
        each("mechanical_cost_of_transport", 0.060, 0.069);
        each("com_height_range_m", 0.041, 0.052);
    }

    @Test
    void worksCarryTheirSpread() {
        // independent: an upward doubt of 0.015 m/s under some 800 N over 0.1 s of double support alone is 1.2 J.
        each("push_off_J_sd", 0.3, 4);
        each("collision_J_sd", 0.3, 4);
    }

    @Test
    void onlyTheTwoStancesOverAnEdgeAreMarked() {
        Map<String, Boolean> whole = fitted.contacts().stream()
                .collect(java.util.stream.Collectors.toMap(
                        c -> c.trial().substring(c.trial().length() - 1)
                                + c.side().word(),
                        ContactRow::whole));
        assertThat(whole)
                .containsOnly(
                        Map.entry("1right", true),
                        Map.entry("1left", true),
                        Map.entry("2right", false),
                        Map.entry("2left", true),
                        Map.entry("3right", true),
                        Map.entry("3left", false));
        assertThat(codes(fit.findings(), "loads.foot-over-edge")).hasSize(2);
        ContactRow second = fitted.contacts().stream()
                .filter(c -> c.trial().endsWith("2") && c.side() == Side.RIGHT)
                .findFirst()
                .orElseThrow();
        assertThat(second.notUsedFor()).contains(Use.CONTACT_ANGLE, Use.ROLL_OVER, Use.COLLISION, Use.MASS);
        assertThat(second.usedFor()).contains(Use.PUSH_OFF);
        ContactRow third = fitted.contacts().stream()
                .filter(c -> c.trial().endsWith("3") && c.side() == Side.LEFT)
                .findFirst()
                .orElseThrow();
        assertThat(third.notUsedFor()).contains(Use.PRELOAD, Use.PUSH_OFF, Use.MASS);
        assertThat(third.usedFor()).contains(Use.COLLISION);
    }

    private static List<Finding> codes(List<Finding> findings, String code) {
        return findings.stream().filter(f -> f.code().equals(code)).toList();
    }

    @Test
    void whatIsDoubtfulIsSaid() {
        for (String code : List.of(
                "platform.origin-sign",
                "points.flag-65535",
                "platform.height",
                "mass.not-given",
                "limb.length-differs",
                "population.unknown")) {
            assertThat(codes(fit.findings(), code)).as(code).isNotEmpty();
        }
        assertThat(codes(fit.findings(), "cluster.deformed"))
                .extracting(Finding::where)
                .containsExactly("right shank");
        assertThat(codes(fit.findings(), "platform.height").get(0).message()).contains("-23 mm");
        assertThat(codes(appraisal.findings(), "gait.unsteady"))
                .extracting(Finding::where)
                .anyMatch(w -> w.contains("1-3"));
        assertThat(fit.failed()).isEmpty();
    }

    @Test
    void rollingRadiusOfAStepIsThatOfTheChainsPose() {
        // independent: band of design 03 section 9 for the chain pose; the right shank's points alone leave it (0.364
        // m).
        for (int walk : new int[] {1, 3}) {
            assertThat(row(walk).number("rolling_radius_m").orElseThrow()).isBetween(0.24, 0.36);
        }
        assertThat(row(2).number("rolling_radius_m"))
                .as("foot over the rear border")
                .isEmpty();
    }

    @Test
    void arcsAreFiniteWithTheirSpread() throws IOException, FormatException {
        for (Side side : Side.values()) {
            FootModel model = FootModelFile.read(folder.resolve("foot-model-" + side.word() + ".xml"));
            for (Rolling.Frame frame : Rolling.Frame.values()) {
                Rolling.Arc arc = model.rolling().arc(frame).orElseThrow();
                assertThat(arc.radius())
                        .as(side + " " + frame)
                        .isBetween(
                                frame == Rolling.Frame.SHANK ? 0.24 : 0.21, frame == Rolling.Frame.SHANK ? 0.36 : 0.31);
                assertThat(arc.radiusSd()).isPresent();
                assertThat(arc.radiusSd().getAsDouble()).isFinite();
            }
            assertThat(model.cautions()).isNotEmpty();
        }
    }

    @Test
    void everyStanceHasItsRadiiByTheChainPose() {
        for (Side side : Side.values()) {
            List<WalkingRollOver.Shapes> shapes = Optional.ofNullable(
                            fitted.rollOvers().get(side))
                    .orElseThrow()
                    .shapes();
            assertThat(shapes).hasSize(2);
            for (WalkingRollOver.Shapes s : shapes) {
                assertThat(RollOver.common(Rolling.Frame.SHANK, List.of(s.shank()))
                                .radius())
                        .as(side + " shank")
                        .isBetween(0.24, 0.36);
                assertThat(RollOver.common(Rolling.Frame.LIMB, List.of(s.limb().orElseThrow()))
                                .radius())
                        .as(side + " limb")
                        .isBetween(0.21, 0.31);
            }
        }
    }

    @Test
    void ankleAnglesOfStanceAreThoseOfWalking() throws IOException, FormatException {
        // common practice, ankle in stance, from memory: some 5-10 deg plantarflexed after contact, 10 deg
        // dorsiflexed before heel rise, 20 deg plantarflexed at toe-off; 12 deg wide for barefoot and for one person.
        for (Side side : Side.values()) {
            List<CurveRow> mean = Optional.ofNullable(fitted.angles().get(side)).orElseThrow().rows().stream()
                    .filter(r ->
                            r.curve().equals("ankle-dorsiflexion") && r.step().equals("mean"))
                    .toList();
            assertThat(mean).hasSize(101);
            double most = mean.stream().mapToDouble(CurveRow::mean).max().orElseThrow();
            double least = mean.stream().mapToDouble(CurveRow::mean).min().orElseThrow();
            assertThat(most).isBetween(0.0, 22.0);
            assertThat(least).isBetween(-32.0, -5.0);
            FootModel model = FootModelFile.read(folder.resolve("foot-model-" + side.word() + ".xml"));
            assertThat(model.joints().get(0).range().orElseThrow().max())
                    .isCloseTo(Math.toRadians(most), org.assertj.core.api.Assertions.within(1e-12));
        }
    }

    @Test
    void modelIsValidAgainstItsSchemaAndComesBackTheSame() throws IOException, FormatException {
        // Reading validates against the schema.
        FootModel model = FootModelFile.read(folder.resolve("foot-model-left.xml"));
        assertThat(FootModelFile.bytes(model)).isEqualTo(Files.readAllBytes(folder.resolve("foot-model-left.xml")));
    }

    @Test
    void comparedPosturesOfTheStepHaveTheRightOrder() {
        for (int walk = 1; walk <= 3; walk++) {
            TransitionRow row = row(walk);
            double compass = row.number("compass_J").orElse(Double.NaN);
            // independent: design 03 section 8 gives 42.3 J for l 0.931 m, D 0.793 m, v 1.675 m/s, m 83.2 kg.
            assertThat(compass).isBetween(41.0, 44.0);
            assertThat(row.number("plantigrade_1_J").orElse(Double.NaN)).isLessThan(compass);
            assertThat(row.number("plantigrade_6_J").orElse(Double.NaN))
                    .isLessThan(row.number("plantigrade_3_J").orElse(Double.NaN));
        }
    }

    @Test
    void turnedLaboratoryGivesTheSameWorks() throws IOException, FormatException, UseCaseException, URISyntaxException {
        // independent: physics does not know the laboratory's axes. y up, walking towards -z, written by our own writer
        // as
        // type-2 platforms; float32 leaves 1e-6 of a coordinate or force.
        Rotation turn = new Rotation(Vec3.Z.times(-1), Vec3.X.times(-1), Vec3.Y);
        List<Path> turned = new java.util.ArrayList<>();
        for (int walk = 1; walk <= 3; walk++) {
            Path file = folder.resolve("s26-walking-hybrid-1-" + walk + ".c3d");
            C3dWriter.write(
                    file,
                    turned(C3dFile.read(recording("walking-hybrid-1-" + walk)).toRecording(), turn));
            turned.add(file);
        }
        GaitOptions o = options(List.of());
        AppraiseUseCase.Result again = AppraiseUseCase.run(new AppraiseUseCase.Request(
                new GaitOptions(
                        List.of(),
                        turned,
                        o.landmarks(),
                        o.mass(),
                        o.stature(),
                        o.population(),
                        o.sex(),
                        o.contacts(),
                        o.floor(),
                        false,
                        o.markerRadius(),
                        o.markerCutoff(),
                        false,
                        0,
                        "platform",
                        Optional.empty()),
                Optional.empty(),
                List.of(),
                List.of(folder.resolve("foot-model-right.xml"), folder.resolve("foot-model-left.xml")),
                "test"));
        for (int row = 0; row < 3; row++) {
            TransitionRow before = result.cost().rows().stream()
                    .filter(r -> !r.text("trial").orElse("").equals("*"))
                    .toList()
                    .get(row);
            TransitionRow after = again.cost().rows().stream()
                    .filter(r -> !r.text("trial").orElse("").equals("*"))
                    .toList()
                    .get(row);
            for (String column : List.of(
                    "push_off_J",
                    "collision_J",
                    "step_length_m",
                    "step_width_m",
                    "speed_m_s",
                    "transition_angle_deg",
                    "collision_fraction",
                    "compass_J")) {
                double expected = before.number(column).orElseThrow();
                assertThat(after.number(column).orElse(Double.NaN))
                        .as(column)
                        .isCloseTo(expected, org.assertj.core.api.Assertions.within(2e-4 * Math.abs(expected)));
            }
        }
    }

    private static Recording turned(Recording r, Rotation turn) {
        List<PointTrack> points = r.points().stream()
                .map(p -> {
                    double[] xyz = new double[3 * p.frames()];
                    p.copyTo(xyz, 0);
                    return PointTrack.of(p.label(), turned(xyz, turn));
                })
                .toList();
        List<PlatformLoads> platforms = r.platforms().stream()
                .map(p -> {
                    double[] force = new double[3 * p.samples()];
                    double[] moment = new double[force.length];
                    p.copyForceTo(force, 0);
                    p.copyMomentTo(moment, 0);
                    return new PlatformLoads(
                            p.number(),
                            2,
                            p.corners().stream().map(turn::transformVector).toList(),
                            turn.transformVector(p.up()),
                            p.rate(),
                            p.time(0),
                            true,
                            turned(force, turn),
                            turned(moment, turn));
                })
                .toList();
        return new Recording(r.name(), r.rate(), r.firstFrame(), r.frames(), points, platforms, r.events(), List.of());
    }

    private static double[] turned(double[] xyz, Rotation turn) {
        double[] out = new double[xyz.length];
        for (int i = 0; i < xyz.length; i += 3) {
            Vec3 v = turn.transformVector(new Vec3(xyz[i], xyz[i + 1], xyz[i + 2]));
            out[i] = v.x();
            out[i + 1] = v.y();
            out[i + 2] = v.z();
        }
        return out;
    }

    @Test
    void pagesNameFirstWhatLimitsTheseRecordings() {
        Map<String, byte[]> pages = new LinkedHashMap<>(ResultPages.files(result, true, EnumSet.of(PageForm.HTML)));
        pages.putAll(ResultPages.files(fitted, EnumSet.of(PageForm.HTML)));
        assertThat(pages).containsOnlyKeys("posture-cost.html", "foot-model-right.html", "foot-model-left.html");
        pages.forEach((name, bytes) -> {
            String text = new String(bytes, StandardCharsets.UTF_8);
            int from = text.indexOf("<p class=\"limit\">");
            String first = text.substring(from, text.indexOf("</p>", from));
            // Design 03 section 9: the findings that must appear, in the words of the page's first sentence.
            assertThat(first)
                    .as(name)
                    .contains(
                            "deformed cluster of the right shank",
                            "s26-walking-hybrid-1-2 right not wholly on its platform",
                            "s26-walking-hybrid-1-3 left not wholly on its platform",
                            "platform height",
                            "mass not given");
            int findings = text.indexOf("<h2>Findings</h2>");
            assertThat(from).as(name).isPositive().isLessThan(findings);
            assertThat(text.substring(from, findings).contains("right trochanter"))
                    .as(name + " tells of the right trochanter before the findings")
                    .isTrue();
            String own = text.replaceAll("(?s)<script[^>]*>.*?</script>", "");
            assertThat(own.length()).as(name).isLessThan(300_000);
        });
    }
}
