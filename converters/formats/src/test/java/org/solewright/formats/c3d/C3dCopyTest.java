package org.solewright.formats.c3d;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import com.fasterxml.jackson.databind.JsonNode;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Set;
import java.util.stream.Stream;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestFactory;
import org.junit.jupiter.api.io.TempDir;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.motion.PointTrack;
import org.solewright.domain.motion.RecordedEvent;
import org.solewright.formats.io.FormatException;

/**
 * What is written and read again is the same data in all six encodings: parameters, events and platforms; real samples to
 * the last bit their storage holds, integers to half a step.
 */
class C3dCopyTest {

    /** What the form of the file itself decides. */
    private static final Set<String> OF_THE_FORM = Set.of(
            "POINT:USED",
            "POINT:SCALE",
            "POINT:RATE",
            "POINT:DATA_START",
            "POINT:FRAMES",
            "POINT:LONG_FRAMES",
            "ANALOG:USED",
            "ANALOG:RATE",
            "ANALOG:SCALE",
            "ANALOG:OFFSET",
            "ANALOG:FORMAT",
            "ANALOG:BITS",
            "TRIAL:ACTUAL_START_FIELD",
            "TRIAL:ACTUAL_END_FIELD");

    @TempDir
    private Path folder;

    private static C3dCopy.Wanted as(C3dFile file, Processor processor, boolean isReal) {
        return new C3dCopy.Wanted(processor, isReal, 0, file.frames() - 1, List.of(), List.of());
    }

    private C3dFile copied(C3dFile file, C3dCopy.Wanted wanted) throws IOException, FormatException {
        Path target = folder.resolve("copy.c3d");
        C3dCopy.write(file, wanted, target);
        return C3dFile.read(target);
    }

    private void comesBack(Path path) throws IOException, FormatException {
        C3dFile file = C3dFile.read(path);
        for (Processor processor : Processor.values()) {
            for (boolean isReal : new boolean[] {true, false}) {
                C3dFile copy = copied(file, as(file, processor, isReal));
                String how = path.getFileName() + " as " + processor + (isReal ? " reals" : " integers");
                assertThat(copy.processor()).as(how).isEqualTo(processor);
                assertThat(copy.isReal()).as(how).isEqualTo(isReal);
                sameHead(how, file, copy);
                samePoints(how, file, copy);
                sameAnalog(how, file, copy);
                IndependentDecoder.compare(how, folder.resolve("copy.c3d"), copy);
                IndependentDecoder.compareParameters(how, folder.resolve("copy.c3d"), file, OF_THE_FORM);
            }
        }
    }

    private static void sameHead(String how, C3dFile file, C3dFile copy) {
        assertThat(copy.frames()).as(how).isEqualTo(file.frames());
        assertThat(copy.firstFrame()).as(how).isEqualTo(file.firstFrame());
        assertThat(copy.labels()).as(how).isEqualTo(file.labels());
        assertThat(copy.analogLabels()).as(how).isEqualTo(file.analogLabels());
        assertThat(copy.analogUnits()).as(how).isEqualTo(file.analogUnits());
        assertThat(copy.unit()).as(how).isEqualTo(file.unit());
        assertThat((float) copy.rate()).as(how).isEqualTo((float) file.rate());
        assertThat(copy.events()).as(how).isEqualTo(file.events());
        for (C3dParameter p : file.parameters().all()) {
            String name = p.group() + ":" + p.name();
            if (OF_THE_FORM.contains(name)) {
                continue;
            }
            C3dParameter q = copy.parameters()
                    .find(p.group(), p.name())
                    .orElseThrow(() -> new AssertionError(how + " lost " + name));
            assertThat(q.storedText()).as(how + " " + name).isEqualTo(p.storedText());
            assertThat(q.width()).as(how + " " + name).isEqualTo(p.width());
            assertThat(q.count()).as(how + " " + name).isEqualTo(p.count());
            for (int i = 0; i < p.count() && !p.isText(); i++) {
                double v = p.number(i) == 0 ? 0 : p.number(i);
                assertThat(q.number(i) == 0 ? 0 : q.number(i))
                        .as(how + " " + name)
                        .isEqualTo(v);
            }
        }
        List<String> before = names(file);
        if (!before.isEmpty()) {
            assertThat(names(copy)).as(how).containsSubsequence(before);
        }
    }

    private static List<String> names(C3dFile file) {
        List<String> names = new ArrayList<>();
        file.parameters().entries().forEach(e -> names.add(e.id() + " " + e.name() + " " + e.description()));
        return names;
    }

    private static void samePoints(String how, C3dFile file, C3dFile copy) {
        C3dPoints a = file.points();
        C3dPoints b = copy.points();
        assertThat(b.points()).as(how).isEqualTo(a.points());
        boolean isSameStorage = file.isReal() == copy.isReal();
        double scale = Math.abs(copy.parameters().number("POINT", "SCALE"));
        int wrong = 0;
        for (int frame = 0; frame < a.frames(); frame++) {
            for (int point = 0; point < a.points(); point++) {
                boolean isSame = a.isValid(frame, point) == b.isValid(frame, point);
                isSame &= a.cameras(frame, point) == b.cameras(frame, point);
                for (int c = 0; c < 3 && a.isValid(frame, point); c++) {
                    double x = a.coordinate(frame, point, c);
                    double y = b.coordinate(frame, point, c);
                    // Reals hold 24 bits of an integer times its scale.
                    double room = isSameStorage ? 0 : copy.isReal() ? Math.ulp((float) x) : 0.5001 * scale;
                    isSame &= Math.abs(x - y) <= room;
                }
                double residualRoom = isSameStorage || copy.isReal() ? 0 : 0.5001 * scale;
                isSame &= Math.abs(a.residual(frame, point) - b.residual(frame, point)) <= residualRoom;
                wrong += isSame ? 0 : 1;
            }
        }
        assertThat(wrong).as(how + ": samples that differ").isZero();
    }

    private static void sameAnalog(String how, C3dFile file, C3dFile copy) {
        C3dAnalog a = file.analog();
        C3dAnalog b = copy.analog();
        assertThat(b.samples()).as(how).isEqualTo(a.samples());
        int wrong = 0;
        for (int k = 0; k < a.channels(); k++) {
            double largest = 0;
            for (int i = 0; i < a.samples(); i++) {
                largest = Math.max(largest, Math.abs(a.value(i, k)));
            }
            double room = file.isReal() && !copy.isReal() ? 0.5001 * largest / 32767 : 0;
            for (int i = 0; i < a.samples(); i++) {
                wrong += Math.abs(a.value(i, k) - b.value(i, k)) <= room ? 0 : 1;
            }
        }
        assertThat(wrong).as(how + ": analog samples that differ").isZero();
    }

    @Test
    void ownRecordingsComeBackInAllSixEncodings() throws IOException, FormatException {
        for (String name : new String[] {"good.c3d", "gap_before_data.c3d", "dec_int.c3d", "mips_int.c3d"}) {
            comesBack(Recordings.own(name));
        }
    }

    @TestFactory
    Stream<DynamicTest> realRecordingsComeBackInAllSixEncodings() {
        assumeTrue(Recordings.shared().isPresent(), "the shared recordings are not beside this checkout");
        Path shared = Recordings.shared().orElseThrow();
        return Recordings.lines(shared.resolve("truth.jsonl")).stream()
                .map(t -> t.get("file").asText())
                .map(name -> DynamicTest.dynamicTest(
                        name, () -> comesBack(shared.resolve("files").resolve(name))));
    }

    @Test
    void sameFormGivesTheSameSampleBytes() throws IOException, FormatException {
        for (String name : new String[] {"good.c3d", "dec_int.c3d", "mips_int.c3d"}) {
            C3dFile file = C3dFile.read(Recordings.own(name));
            copied(file, C3dCopy.Wanted.like(file));
            byte[] original = Files.readAllBytes(Recordings.own(name));
            byte[] copy = Files.readAllBytes(folder.resolve("copy.c3d"));
            int from = start(original);
            int to = start(copy);
            int words = file.frames()
                    * (4 * file.points().points()
                            + file.analog().channels() * (file.analog().samples() / file.frames()));
            int bytes = words * (file.isReal() ? 4 : 2);
            // exact: nothing was changed.
            assertThat(Arrays.equals(original, from, from + bytes, copy, to, to + bytes))
                    .as(name)
                    .isTrue();
        }
    }

    private static int start(byte[] file) {
        boolean isMips = file[512 * ((file[0] & 0xff) - 1) + 3] == 86;
        ByteBuffer b = ByteBuffer.wrap(file).order(isMips ? ByteOrder.BIG_ENDIAN : ByteOrder.LITTLE_ENDIAN);
        return 512 * ((b.getShort(16) & 0xffff) - 1);
    }

    @Test
    void croppedFileKeepsItsClock() throws IOException, FormatException {
        C3dFile file = C3dFile.read(Recordings.own("good.c3d"));
        C3dFile copy = copied(file, new C3dCopy.Wanted(Processor.INTEL, true, 3, 7, List.of(), List.of()));
        assertThat(copy.frames()).isEqualTo(5);
        assertThat(copy.firstFrame()).isEqualTo(file.firstFrame() + 3);
        assertThat(copy.events()).isEqualTo(file.events());
        for (int frame = 0; frame < 5; frame++) {
            for (int point = 0; point < file.labels().size(); point++) {
                assertThat(copy.points().stored(frame, point, 1))
                        .isEqualTo(file.points().stored(frame + 3, point, 1));
            }
        }
        int perFrame = file.analog().samples() / file.frames();
        assertThat(copy.analog().samples()).isEqualTo(5 * perFrame);
        assertThat(copy.analog().value(0, 0)).isEqualTo(file.analog().value(3 * perFrame, 0));
    }

    @Test
    void computedPointsAndEventsAreNamedInAGroupOfTheirOwn() throws IOException, FormatException {
        C3dFile file = C3dFile.read(Recordings.own("good.c3d"));
        double[] xyz = new double[3 * file.frames()];
        Arrays.setAll(xyz, i -> i < 3 ? Double.NaN : 0.001 * i);
        AddedPoint ankle = new AddedPoint(PointTrack.of("R_ANKLE_CENTRE", xyz), "midpoint of the malleoli, fitted");
        RecordedEvent strike = new RecordedEvent(61.5, "Right", "Foot Strike", RecordedEvent.Source.GROUP);
        for (Processor processor : Processor.values()) {
            for (boolean isReal : new boolean[] {true, false}) {
                C3dFile copy = copied(
                        file,
                        new C3dCopy.Wanted(processor, isReal, 0, file.frames() - 1, List.of(ankle), List.of(strike)));
                int last = file.labels().size();
                assertThat(copy.labels()).hasSize(last + 1).endsWith("R_ANKLE_CENTRE");
                assertThat(copy.labels().subList(0, last)).isEqualTo(file.labels());
                assertThat(copy.points().isValid(0, last)).isFalse();
                // exact: 0.004 m in the file's millimetres, to float32 or half a step.
                double step = isReal ? 1e-5 : Math.abs(copy.parameters().number("POINT", "SCALE")) / 2;
                assertThat(copy.points().coordinate(1, last, 1)).isCloseTo(4, within(step));
                List<RecordedEvent> grouped = copy.events().stream()
                        .filter(e -> e.source() == RecordedEvent.Source.GROUP)
                        .toList();
                assertThat(grouped.get(grouped.size() - 1).label()).isEqualTo("Foot Strike");
                assertThat(grouped.get(grouped.size() - 1).time()).isCloseTo(61.5, within(1e-5));
                assertThat(copy.parameters()
                                .find("SOLEWRIGHT", "POINTS")
                                .orElseThrow()
                                .texts())
                        .containsExactly("R_ANKLE_CENTRE");
                assertThat(copy.parameters()
                                .find("SOLEWRIGHT", "METHODS")
                                .orElseThrow()
                                .text(0))
                        .isEqualTo("midpoint of the malleoli, fitted");
            }
        }
    }

    @Test
    void moreThan255LabelsAndMoreThan65535FramesComeBack() throws IOException, FormatException {
        C3dFile file = C3dFile.read(Recordings.own("good.c3d"));
        List<AddedPoint> many = new ArrayList<>();
        for (int k = 0; k < 600; k++) {
            double[] xyz = new double[3 * file.frames()];
            Arrays.fill(xyz, k * 0.001);
            many.add(new AddedPoint(PointTrack.of("C" + k, xyz), "made"));
        }
        C3dFile wide = copied(file, new C3dCopy.Wanted(Processor.MIPS, true, 0, file.frames() - 1, many, List.of()));
        int own = file.labels().size();
        assertThat(wide.labels()).hasSize(own + 600);
        assertThat(wide.labels().get(own + 599)).isEqualTo("C599");
        assertThat(wide.points().coordinate(0, own + 599, 0)).isCloseTo(599, within(1e-3));
        assertThat(wide.findings()).extracting(Finding::code).doesNotContain("labels.repeated");

        Path source = folder.resolve("long.c3d");
        longFile(source, 70_001);
        C3dFile made = C3dFile.read(source);
        assertThat(made.frames()).isEqualTo(70_001);
        C3dFile copy = copied(made, as(made, Processor.DEC, false));
        assertThat(copy.frames()).isEqualTo(70_001);
        assertThat(copy.parameters().number("POINT", "LONG_FRAMES")).isEqualTo(70_001);
        assertThat(copy.parameters().number("POINT", "FRAMES")).isEqualTo(70_001);
        assertThat(copy.parameters()
                        .find("TRIAL", "ACTUAL_END_FIELD")
                        .orElseThrow()
                        .unsigned(0))
                .isEqualTo(70_001 - 65_536);
        assertThat(copy.points().coordinate(70_000, 0, 0)).isCloseTo(7, within(1e-3));
    }

    /** One integer point, whose frames are counted in POINT:LONG_FRAMES alone. */
    private static void longFile(Path target, int frames) throws IOException {
        ParameterWriter p = new ParameterWriter();
        p.group("POINT", "Points");
        p.integers("USED", "Points", new int[] {1});
        p.reals("SCALE", "Integers", new double[] {0.001});
        p.reals("RATE", "Rate", new double[] {100});
        p.integers("DATA_START", "Data", new int[] {3});
        p.reals("LONG_FRAMES", "Frames", new double[] {frames});
        p.text("UNITS", "Unit", "mm");
        ByteBuffer out = ByteBuffer.allocate(1024 + 8 * frames).order(ByteOrder.LITTLE_ENDIAN);
        out.put(0, (byte) 2).put(1, (byte) 0x50).putShort(2, (short) 1).putShort(6, (short) 1);
        out.putShort(8, (short) -1).putFloat(12, 0.001f).putShort(16, (short) 3).putFloat(20, 100);
        out.position(512);
        out.put(p.section());
        out.position(1024);
        for (int i = 0; i < frames; i++) {
            out.putShort((short) (i / 10))
                    .putShort((short) 0)
                    .putShort((short) 0)
                    .putShort((short) 0);
        }
        Files.write(target, out.array());
    }

    @Test
    void numbersWithoutAVaxFormAreRefusedAndFourthWordsReplaced() throws IOException, FormatException {
        byte[] bytes = Files.readAllBytes(Recordings.own("good.c3d"));
        ByteBuffer b = ByteBuffer.wrap(bytes).order(ByteOrder.LITTLE_ENDIAN);
        int data = start(bytes);
        b.putFloat(data + 12, 1.7e38f);
        b.putFloat(data + 4, -0.0f);
        b.putFloat(data + 16, Float.NaN);
        Path odd = folder.resolve("odd.c3d");
        Files.write(odd, bytes);
        C3dFile file = C3dFile.read(odd);
        Path target = folder.resolve("copy.c3d");
        List<Finding> said = C3dCopy.write(file, as(file, Processor.DEC, true), target);
        C3dFile copy = C3dFile.read(target);
        // published: design 02: -0 becomes 0, fourth words from 1.7014e38 up become 0; 1.7e38 still fits.
        assertThat(copy.points().stored(0, 0, 3)).isEqualTo(1.7e38f);
        assertThat(Float.floatToRawIntBits(copy.points().stored(0, 0, 1))).isZero();
        assertThat(copy.points().isValid(0, 1)).isFalse();
        assertThat(said).extracting(Finding::code).containsExactly("points.place-replaced");
        b.putFloat(data + 12, 3e38f);
        Files.write(odd, bytes);
        C3dFile larger = C3dFile.read(odd);
        said = C3dCopy.write(larger, as(larger, Processor.DEC, true), target);
        assertThat(said).extracting(Finding::code).contains("points.word-replaced");
        assertThat(C3dFile.read(target).points().stored(0, 0, 3)).isZero();
        b.putFloat(data, 3e38f);
        Files.write(odd, bytes);
        C3dFile far = C3dFile.read(odd);
        assertThatThrownBy(() -> C3dCopy.write(far, as(far, Processor.DEC, true), target))
                .isInstanceOf(FormatException.class)
                .hasMessageContaining("3.0E38")
                .hasMessageContaining("no form in VAX numbers");
    }

    @Test
    void textThatWasCutWithinALineComesBackWithItsWholeLines() throws IOException, FormatException {
        byte[] bytes = Files.readAllBytes(Recordings.own("good.c3d"));
        String all = new String(bytes, StandardCharsets.ISO_8859_1);
        int at = all.indexOf("LABELS", 512) + 6;
        // Lines of 255 characters do not fit: none is left whole, so that the points are numbered.
        bytes[at + 4] = (byte) 255;
        Path odd = folder.resolve("odd.c3d");
        Files.write(odd, bytes);
        C3dFile file = C3dFile.read(odd);
        assertThat(file.findings()).extracting(Finding::code).contains("parameters.cut");
        C3dFile copy = copied(file, C3dCopy.Wanted.like(file));
        assertThat(copy.labels()).isEqualTo(file.labels());
        assertThat(copy.findings()).extracting(Finding::code).doesNotContain("parameters.cut");
    }

    @Test
    void vaxWordsOfEveryExponentComeBack() {
        for (int exponent = 1; exponent < 254; exponent++) {
            for (int fraction : new int[] {0, 1, 0x400000, 0x7fffff}) {
                float value = Float.intBitsToFloat(exponent << 23 | fraction);
                if (Math.abs(value) < VaxFloat.TOO_LARGE) {
                    assertThat(VaxFloat.of(VaxFloat.word(value))).isEqualTo(value);
                    assertThat(VaxFloat.of(VaxFloat.word(-value))).isEqualTo(-value);
                }
            }
        }
        assertThat(VaxFloat.of(VaxFloat.word(0x1p-128f))).isEqualTo(0x1p-128f);
        assertThat(VaxFloat.word(0x1p-129f)).isZero();
    }

    @Test
    void everyGroupIsDeclaredAndTheChainEndsWithZero() throws IOException, FormatException {
        assumeTrue(Recordings.shared().isPresent(), "the shared recordings are not beside this checkout");
        Path files = Recordings.shared().orElseThrow().resolve("files");
        for (JsonNode truth : Recordings.lines(Recordings.shared().orElseThrow().resolve("truth.jsonl"))) {
            C3dFile file = C3dFile.read(files.resolve(truth.get("file").asText()));
            C3dFile copy = copied(file, C3dCopy.Wanted.like(file));
            assertThat(copy.findings())
                    .as(file.name())
                    .extracting(Finding::code)
                    .doesNotContain(
                            "parameters.link",
                            "parameters.cut",
                            "parameters.repeated",
                            "frames.disagree",
                            "points.count",
                            "analog.count",
                            "analog.rate",
                            "data.start",
                            "points.scale",
                            "file.truncated",
                            "file.surplus");
        }
    }
}
