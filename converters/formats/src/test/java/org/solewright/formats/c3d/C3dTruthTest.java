package org.solewright.formats.c3d;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.NullNode;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Named;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.geometry.Vec3;
import org.solewright.domain.motion.RecordedEvent;
import org.solewright.domain.motion.Recording;
import org.solewright.formats.io.FormatException;

/**
 * Real recordings against decoded truth: independent, from another reader confirmed by a third ({@code truth.jsonl}), and
 * independently computed platform figures ({@code platforms.jsonl}). Tolerances are those of the truth: sums 1e-9 of the
 * absolute sum, single values to float32.
 */
class C3dTruthTest {

    private static final double FLOAT = 1.2e-7;

    /** One file with its truth; the file is empty where the recordings are absent. */
    record Case(Path file, JsonNode truth) {}

    static Stream<Named<Case>> recordings() {
        List<Named<Case>> cases = new ArrayList<>();
        Recordings.shared()
                .ifPresentOrElse(
                        folder -> Recordings.lines(folder.resolve("truth.jsonl"))
                                .forEach(t -> add(cases, folder.resolve("files"), t)),
                        () -> cases.add(Named.of("recordings absent", new Case(Path.of(""), NullNode.getInstance()))));
        Path own = Recordings.own("synthetic-truth.jsonl");
        Recordings.lines(own).stream().filter(t -> !t.has("expect")).forEach(t -> add(cases, own.getParent(), t));
        return cases.stream();
    }

    private static void add(List<Named<Case>> cases, Path folder, JsonNode truth) {
        String name = truth.get("file").asText();
        cases.add(Named.of(name, new Case(folder.resolve(name), truth)));
    }

    @ParameterizedTest
    @MethodSource("recordings")
    void contentIsTheTruth(Case c) throws IOException, FormatException {
        assumeTrue(Files.isRegularFile(c.file()), "the shared recordings are not beside this checkout");
        C3dFile file = C3dFile.read(c.file());
        JsonNode t = c.truth();
        assertThat(file.processor().word()).isEqualTo(t.get("processor").asText());
        assertThat(file.isReal()).isEqualTo(t.get("storage").asText().equals("float"));
        assertThat(file.points().points()).isEqualTo(t.get("points").asInt());
        assertThat(file.frames()).isEqualTo(t.get("frames").asInt());
        assertThat(file.firstFrame()).isEqualTo(t.get("first_frame").asInt());
        assertThat(file.rate()).isCloseTo(t.get("point_rate").asDouble(), within(1e-5));
        assertThat(file.analog().channels()).isEqualTo(t.get("analog_channels").asInt());
        if (!t.get("point_units").asText().isEmpty()) {
            assertThat(file.unit()).isEqualTo(t.get("point_units").asText());
        }
        sums(file, t);
        pointProbes(file, t);
        // One truth stops reading parameters at a group whose description length is missing (a link of 2 bytes, which
        // the
        // format's readers must accept); labels, scales and events come after it.
        if (!t.get("reader_notes").toString().contains("goes backwards")) {
            labels(file, t);
            analog(file, t);
            events(file, t);
        }
    }

    private static void labels(C3dFile file, JsonNode t) {
        JsonNode stored = t.get("point_labels");
        for (int k = 0; k < Math.min(file.labels().size(), stored.size()); k++) {
            String label = stored.get(k).asText();
            if (!label.isBlank()) {
                assertThat(file.labels().get(k)).startsWith(label.trim());
            }
        }
        assertThat(file.labels()).doesNotHaveDuplicates().hasSize(file.points().points());
    }

    private static void sums(C3dFile file, JsonNode t) {
        double[] sum = new double[3];
        double residual = 0;
        long cameras = 0;
        int valid = 0;
        for (int frame = 0; frame < file.frames(); frame++) {
            for (int point = 0; point < file.points().points(); point++) {
                if (file.points().isValid(frame, point)) {
                    valid++;
                    residual += file.points().residual(frame, point);
                    cameras += Integer.bitCount(file.points().cameras(frame, point));
                    for (int k = 0; k < 3; k++) {
                        sum[k] += file.points().coordinate(frame, point, k);
                    }
                }
            }
        }
        double tolerance = 1e-9 * t.get("sum_abs").asDouble() + 1e-9;
        assertThat(valid).isEqualTo(t.get("valid").asInt());
        assertThat(sum[0]).isCloseTo(t.get("sum_x").asDouble(), within(tolerance));
        assertThat(sum[1]).isCloseTo(t.get("sum_y").asDouble(), within(tolerance));
        assertThat(sum[2]).isCloseTo(t.get("sum_z").asDouble(), within(tolerance));
        double expected = t.get("sum_residual").asDouble();
        assertThat(residual).isCloseTo(expected, within(1e-6 * Math.abs(expected) + 1e-9));
        assertThat(cameras).isEqualTo(t.get("camera_bits").asLong());
    }

    private static void pointProbes(C3dFile file, JsonNode t) {
        for (JsonNode p : t.get("probes")) {
            int frame = p.get(0).asInt();
            int point = p.get(1).asInt();
            boolean isValid = p.get(3).asBoolean();
            assertThat(file.points().isValid(frame, point)).isEqualTo(isValid);
            if (isValid) {
                for (int k = 0; k < 3; k++) {
                    double v = p.get(4 + k).asDouble();
                    assertThat(file.points().coordinate(frame, point, k)).isCloseTo(v, within(FLOAT * Math.abs(v)));
                }
                double residual = p.get(7).asDouble();
                assertThat(file.points().residual(frame, point))
                        .isCloseTo(residual, within(FLOAT * Math.abs(residual) + 1e-12));
                assertThat(file.points().cameras(frame, point))
                        .isEqualTo(p.get(8).asInt());
            }
        }
    }

    private static void analog(C3dFile file, JsonNode t) {
        if (t.path("analog_ambiguous").asBoolean() || t.get("analog_channels").asInt() == 0) {
            return;
        }
        assertThat(file.analog().rate()).isCloseTo(t.get("analog_rate").asDouble(), within(1e-4));
        for (JsonNode p : t.path("analog_probes")) {
            double v = p.get(2).asDouble();
            assertThat(file.analog().value(p.get(0).asInt(), p.get(1).asInt()))
                    .isCloseTo(v, within(4 * FLOAT * Math.abs(v) + 1e-12));
        }
        JsonNode sums = t.path("analog_sums");
        for (int channel = 0; channel < sums.size(); channel++) {
            double sum = 0;
            for (int i = 0; i < file.analog().samples(); i++) {
                sum += file.analog().value(i, channel);
            }
            double scale = t.get("analog_abs_sums").get(channel).asDouble();
            assertThat(sum).isCloseTo(sums.get(channel).asDouble(), within(1e-9 * scale + 1e-9));
        }
    }

    private static void events(C3dFile file, JsonNode t) {
        List<RecordedEvent> group = file.events().stream()
                .filter(e -> e.source() == RecordedEvent.Source.GROUP)
                .toList();
        List<RecordedEvent> header = file.events().stream()
                .filter(e -> e.source() == RecordedEvent.Source.HEADER)
                .toList();
        compare(group, t.get("events"));
        compare(header, t.get("header_events"));
    }

    private static void compare(List<RecordedEvent> found, JsonNode expected) {
        assertThat(found).hasSize(expected.size());
        for (int k = 0; k < expected.size(); k++) {
            assertThat(found.get(k).label())
                    .isEqualTo(expected.get(k).get("label").asText().trim());
            assertThat(found.get(k).time())
                    .isCloseTo(expected.get(k).get("time_s").asDouble(), within(1e-5));
        }
    }

    static Stream<Named<Case>> platforms() {
        List<Named<Case>> cases = new ArrayList<>();
        Recordings.shared()
                .ifPresentOrElse(
                        folder -> Recordings.lines(folder.resolve("platforms.jsonl")).stream()
                                .filter(t -> t.path("trust").asBoolean()
                                        && t.get("type").asInt() <= 4)
                                .forEach(t -> cases.add(Named.of(
                                        t.get("file").asText() + " platform "
                                                + t.get("plate").asInt(),
                                        new Case(
                                                folder.resolve("files")
                                                        .resolve(t.get("file").asText()),
                                                t)))),
                        () -> cases.add(Named.of("recordings absent", new Case(Path.of(""), NullNode.getInstance()))));
        return cases.stream();
    }

    @ParameterizedTest
    @MethodSource("platforms")
    void trustedPlatformMeasuresTheIndependentFigures(Case c) throws IOException, FormatException {
        assumeTrue(Files.isRegularFile(c.file()), "the shared recordings are not beside this checkout");
        Recording recording = C3dFile.read(c.file()).toRecording();
        JsonNode t = c.truth();
        PlatformLoads p = recording.platforms().stream()
                .filter(x -> x.number() == t.get("plate").asInt())
                .findFirst()
                .orElseThrow();
        double metres = LengthUnit.metres(t.get("length_unit").asText()).orElse(Double.NaN);
        JsonNode v = t.get("values");
        double peak = 0;
        int loaded = 0;
        Vec3 cop = Vec3.ZERO;
        Vec3 impulse = Vec3.ZERO;
        for (int i = 0; i < p.samples(); i++) {
            peak = Math.max(peak, p.vertical(i));
            if (p.vertical(i) > 20) {
                loaded++;
                cop = cop.plus(p.centreOfPressure(i));
                impulse = impulse.plus(p.force(i).times(1 / p.rate()));
            }
        }
        double expectedPeak = v.get("peak_fz_N").asDouble();
        assertThat(peak).isCloseTo(expectedPeak, within(0.005 * expectedPeak));
        assertThat(p.rate()).isCloseTo(t.get("rate_hz").asDouble(), within(1e-3));
        if (!Double.isNaN(metres) && v.get("mean_cop").size() == 3) {
            Vec3 mean = cop.times(1.0 / loaded);
            assertThat(mean.distance(vector(v.get("mean_cop")).times(metres))).isLessThan(0.002);
        }
        Vec3 expectedImpulse = vector(v.get("impulse_Ns"));
        assertThat(impulse.distance(expectedImpulse)).isLessThan(0.005 * expectedImpulse.norm());
    }

    private static Vec3 vector(JsonNode n) {
        return new Vec3(n.get(0).asDouble(), n.get(1).asDouble(), n.get(2).asDouble());
    }
}
