package org.solewright.formats.c3d;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.function.Consumer;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.motion.PointTrack;
import org.solewright.domain.motion.RecordedEvent;
import org.solewright.formats.io.FormatException;

/** Copies at the edges of the format: long trials, large sections, odd groups, numbers that do not fit. */
class C3dCopyEdgesTest {

    @TempDir
    private Path folder;

    private C3dFile copied(C3dFile file, C3dCopy.Wanted wanted, List<Finding> said)
            throws IOException, FormatException {
        Path target = folder.resolve("copy.c3d");
        said.addAll(C3dCopy.write(file, wanted, target));
        return C3dFile.read(target);
    }

    private C3dFile copied(C3dFile file, C3dCopy.Wanted wanted) throws IOException, FormatException {
        return copied(file, wanted, new ArrayList<>());
    }

    private static C3dCopy.Wanted as(C3dFile file, Processor processor, boolean isReal) {
        return new C3dCopy.Wanted(processor, isReal, 0, file.frames() - 1, List.of(), List.of());
    }

    private static C3dCopy.Wanted with(C3dFile file, List<AddedPoint> points, List<RecordedEvent> events) {
        return new C3dCopy.Wanted(file.processor(), file.isReal(), 0, file.frames() - 1, points, events);
    }

    private static AddedPoint at(C3dFile file, String label, double metres, String description) {
        double[] xyz = new double[3 * file.frames()];
        Arrays.fill(xyz, metres);
        return new AddedPoint(PointTrack.of(label, xyz), description);
    }

    private static RecordedEvent event(double time, String side, String label) {
        return new RecordedEvent(time, side, label, RecordedEvent.Source.GROUP);
    }

    /** An Intel file of one point in mm with these samples, a scale of 0.1 where they are integers. */
    private C3dFile made(boolean isReal, Consumer<ParameterWriter> more, float... words)
            throws IOException, FormatException {
        return C3dFile.read(write(isReal, 0, more, words));
    }

    private Path write(boolean isReal, int channels, Consumer<ParameterWriter> more, float... words)
            throws IOException {
        float scale = isReal ? -0.1f : 0.1f;
        int frames = words.length / (4 + channels);
        ParameterWriter p = new ParameterWriter();
        p.group("POINT", "Points");
        p.integers("USED", "Points", new int[] {1});
        p.reals("SCALE", "Scale", new double[] {scale});
        p.reals("RATE", "Rate", new double[] {100});
        p.integers("FRAMES", "Frames", new int[] {(short) Math.min(frames, 65535)});
        p.text("UNITS", "Unit", "mm");
        p.texts("LABELS", "Names", List.of("HEEL"));
        more.accept(p);
        int data = 2 + p.blocks();
        ByteBuffer out = ByteBuffer.allocate(512 * (data - 1) + words.length * (isReal ? 4 : 2))
                .order(ByteOrder.LITTLE_ENDIAN);
        out.put(0, (byte) 2).put(1, (byte) 0x50).putShort(2, (short) 1).putShort(4, (short) channels);
        out.putShort(6, (short) 1).putShort(8, (short) Math.min(frames, 65535)).putFloat(12, scale);
        out.putShort(16, (short) data)
                .putShort(18, (short) (channels > 0 ? 1 : 0))
                .putFloat(20, 100);
        out.position(512);
        out.put(p.section());
        out.position(512 * (data - 1));
        for (float w : words) {
            if (isReal) {
                out.putFloat(w);
            } else {
                out.putShort((short) (int) w);
            }
        }
        Path file = folder.resolve("made.c3d");
        Files.write(file, out.array());
        return file;
    }

    @Test
    void partBehindFrame65535KeepsItsClock() throws IOException, FormatException {
        float[] words = new float[4 * 70_001];
        for (int frame = 0; frame < 70_001; frame++) {
            words[4 * frame] = frame / 10;
        }
        C3dFile file = made(
                false,
                p -> {
                    p.group("TRIAL", "Trial");
                    p.integers("ACTUAL_START_FIELD", "First", new int[] {1, 0}, 2);
                    p.integers("ACTUAL_END_FIELD", "Last", new int[] {70_001 - 65_536, 1}, 2);
                },
                words);
        assertThat(file.frames()).isEqualTo(70_001);
        for (Processor processor : Processor.values()) {
            C3dFile part = copied(file, new C3dCopy.Wanted(processor, false, 68_000, 68_100, List.of(), List.of()));
            // exact: frame 1 is the first; what has 68 000 frames before it is frame 68 001.
            assertThat(part.firstFrame()).isEqualTo(68_001);
            assertThat(part.frames()).isEqualTo(101);
            assertThat(part.points().coordinate(100, 0, 0)).isCloseTo(681, within(1e-3));
            assertThat(part.findings()).extracting(Finding::code).doesNotContain("frames.disagree");
            // A part of the part still knows where it is.
            C3dFile smaller = copied(part, new C3dCopy.Wanted(processor, true, 50, 60, List.of(), List.of()));
            assertThat(smaller.firstFrame()).isEqualTo(68_051);
            assertThat(smaller.frames()).isEqualTo(11);
            C3dFile whole = copied(file, as(file, processor, true));
            assertThat(whole.frames()).isEqualTo(70_001);
            assertThat(whole.firstFrame()).isEqualTo(1);
            C3dFile across = copied(file, new C3dCopy.Wanted(processor, false, 65_000, 66_999, List.of(), List.of()));
            assertThat(across.firstFrame()).isEqualTo(65_001);
            assertThat(across.frames()).isEqualTo(2000);
        }
    }

    @Test
    void sectionsLongerThan255BlocksComeBack() throws IOException, FormatException {
        C3dFile file = C3dFile.read(Recordings.own("good.c3d"));
        List<AddedPoint> many = new ArrayList<>();
        for (int k = 0; k < 600; k++) {
            many.add(at(file, "C" + k, k * 0.001, k + " " + "x".repeat(240)));
        }
        for (Processor processor : Processor.values()) {
            C3dFile copy = copied(file, new C3dCopy.Wanted(processor, true, 0, file.frames() - 1, many, List.of()));
            // exact: 600 descriptions of at least 240 bytes in two lists take more than 562 blocks of 512.
            assertThat(copy.headerWords().get(8)).isGreaterThan(562);
            assertThat(C3dParameter.joined(copy.parameters().continued("SOLEWRIGHT", "METHODS")))
                    .hasSize(600)
                    .startsWith("0 " + "x".repeat(240));
            assertThat(copy.points().coordinate(0, copy.labels().indexOf("C599"), 2))
                    .isCloseTo(599, within(1e-3));
            IndependentDecoder.compare("long section", folder.resolve("copy.c3d"), copy);
            IndependentDecoder.compareParameters(
                    "long section",
                    folder.resolve("copy.c3d"),
                    file,
                    Set.of("POINT:USED", "POINT:SCALE", "POINT:DATA_START", "POINT:LABELS", "POINT:DESCRIPTIONS"));
        }
    }

    @Test
    void computedSamplesBeyondTheKeptScaleAreMissingNotMisplaced() throws IOException, FormatException {
        C3dFile file = made(false, p -> {}, 10, 20, 30, 0, 11, 21, 31, 0);
        List<Finding> said = new ArrayList<>();
        // exact: steps of 0.1 mm reach 3276.7 mm.
        C3dFile copy = copied(
                file, with(file, List.of(at(file, "NEAR", 3.2767, ""), at(file, "FAR", 3.2769, "")), List.of()), said);
        assertThat(copy.points().isValid(0, 1)).isTrue();
        assertThat(copy.points().coordinate(0, 1, 0)).isCloseTo(3276.7, within(1e-3));
        assertThat(copy.points().isValid(0, 2)).isFalse();
        assertThat(copy.points().stored(1, 0, 1)).isEqualTo(21);
        assertThat(said).extracting(Finding::code).containsExactly("points.added-outside");
        assertThat(said.get(0).message()).startsWith("2 computed samples");
        C3dFile vax = copied(
                file, new C3dCopy.Wanted(Processor.DEC, true, 0, 1, List.of(at(file, "AFAR", 1e36, "")), List.of()));
        assertThat(vax.points().isValid(0, 1)).isFalse();
    }

    @Test
    void flagsThatWereIgnoredAreNotWrittenAgain() throws IOException, FormatException {
        Path path = write(true, 0, p -> {}, 1, 2, 3, -1, 0, 0, 0, -1, 4, 5, 6, 65535, 7, 8, 9, 259);
        C3dFile file = C3dFile.read(path, C3dReading.everything().ignoringFlags());
        for (boolean isReal : new boolean[] {true, false}) {
            C3dFile copy = copied(file, as(file, Processor.MIPS, isReal));
            assertThat(copy.points().isValid(0, 0)).isTrue();
            assertThat(copy.points().isValid(1, 0)).isFalse();
            assertThat(copy.points().isValid(2, 0)).isTrue();
            // exact: 259 = 256 + 3: the first camera, a residual of 3 steps.
            assertThat(copy.points().cameras(3, 0)).isEqualTo(1);
            assertThat(copy.points().coordinate(2, 0, 0)).isCloseTo(4, within(0.001));
        }
        C3dFile obeyed = copied(C3dFile.read(path), as(file, Processor.INTEL, true));
        assertThat(obeyed.points().stored(0, 0, 3)).isEqualTo(-1);
        assertThat(obeyed.points().stored(2, 0, 3)).isEqualTo(65535);
    }

    @Test
    void stepOfIntegersIsSaidAndFollowsThePartThatIsKept() throws IOException, FormatException {
        C3dFile file = made(true, p -> {}, 30_000, 1, 1, 0, 32.767f, 1, 1, 0);
        List<Finding> said = new ArrayList<>();
        C3dFile copy = copied(file, new C3dCopy.Wanted(Processor.INTEL, false, 1, 1, List.of(), List.of()), said);
        // exact: 32.767 mm in 32 767 steps.
        assertThat(copy.parameters().number("POINT", "SCALE")).isCloseTo(0.001, within(1e-9));
        assertThat(said).extracting(Finding::code).containsExactly("samples.quantised");
        assertThat(said.get(0).message()).contains("steps of 0.00100 mm");
        said.clear();
        copied(copy, C3dCopy.Wanted.like(copy), said);
        assertThat(said).isEmpty();
    }

    @Test
    void recordingWithoutASampleInSightHasAScaleThatEveryProcessorHolds() throws IOException, FormatException {
        C3dFile file = made(true, p -> {}, 0, 0, 0, -1, 0, 0, 0, -1);
        for (Processor processor : Processor.values()) {
            C3dFile copy = copied(file, as(file, processor, false));
            assertThat(copy.parameters().number("POINT", "SCALE")).isEqualTo(1);
            assertThat(copy.points().isValid(0, 0)).isFalse();
            assertThat(copy.isReal()).isFalse();
        }
    }

    @Test
    void unsignedAnalogSamplesKeepTheirValuesInEveryForm() throws IOException, FormatException {
        Path path = write(
                false,
                1,
                p -> {
                    p.group("ANALOG", "Analog");
                    p.integers("USED", "Channels", new int[] {1});
                    p.reals("GEN_SCALE", "Scale", new double[] {1});
                    p.reals("SCALE", "Scales", new double[] {0.5}, 1);
                    p.integers("OFFSET", "Offsets", new int[] {(short) 40_000}, 1);
                    p.text("FORMAT", "Format", "UNSIGNED");
                    p.integers("BITS", "Bits", new int[] {16});
                    p.reals("RATE", "Rate", new double[] {100});
                },
                1,
                2,
                3,
                0,
                65_000,
                1,
                2,
                3,
                0,
                100);
        C3dFile file = C3dFile.read(path);
        // exact: (65000 - 40000) / 2 and (100 - 40000) / 2.
        assertThat(file.analog().value(0, 0)).isEqualTo(12_500);
        for (Processor processor : Processor.values()) {
            for (boolean isReal : new boolean[] {true, false}) {
                C3dFile copy = copied(file, as(file, processor, isReal));
                assertThat(copy.analog().value(0, 0)).isEqualTo(12_500);
                assertThat(copy.analog().value(1, 0)).isEqualTo(-19_950);
                C3dFile back = copied(copy, as(copy, Processor.INTEL, false));
                assertThat(back.analog().value(0, 0)).isEqualTo(12_500);
                assertThat(back.analog().stored(1, 0)).isEqualTo(100);
            }
        }
    }

    @Test
    void analogRealsInNewStepsAreSignedIntegersOf16Bits() throws IOException, FormatException {
        Path path = write(
                true,
                1,
                p -> {
                    p.group("ANALOG", "Analog");
                    p.integers("USED", "Channels", new int[] {1});
                    p.reals("GEN_SCALE", "Scale", new double[] {-2});
                    p.reals("SCALE", "Scales", new double[] {0.5}, 1);
                    p.integers("OFFSET", "Offsets", new int[] {7}, 1);
                    p.text("FORMAT", "Format", "UNSIGNED");
                    p.integers("BITS", "Bits", new int[] {12});
                },
                1,
                2,
                3,
                0,
                0.25f,
                1,
                2,
                3,
                0,
                1000.5f);
        C3dFile file = C3dFile.read(path);
        C3dFile copy = copied(file, as(file, Processor.DEC, false));
        // exact: (0.25 - 7) x 0.5 x -2 = 6.75 and -993.5; half a step is 993.5 / 65534.
        assertThat(copy.analog().value(0, 0)).isCloseTo(6.75, within(0.0152));
        assertThat(copy.analog().value(1, 0)).isCloseTo(-993.5, within(0.0152));
        assertThat(copy.parameters().number("ANALOG", "BITS")).isEqualTo(16);
        assertThat(copy.parameters().find("ANALOG", "FORMAT").orElseThrow().text(0))
                .isEqualTo("SIGNED");
        assertThat(copy.parameters().number("ANALOG", "GEN_SCALE")).isEqualTo(-2);
    }

    @Test
    void eventsOfTheFileStayAsTheyAreBeforeComputedOnes() throws IOException, FormatException {
        C3dFile file = made(
                true,
                p -> {
                    p.group("EVENT", "Events");
                    p.integers("USED", "Number", new int[] {3});
                    p.texts("CONTEXTS", "Sides", List.of("Left", "Right", "Left"));
                    p.texts("LABELS", "Labels", List.of("Foot Strike", "Foot Off", "Foot Off"));
                    p.texts("SUBJECTS", "Subjects", List.of("A", "B", "C"));
                    p.integers("ICON_IDS", "Icons", new int[] {1, 2, 3}, 3);
                    p.reals("TIMES", "Times", new double[] {0, 1.5, 0, Double.NaN, 2, 0.25}, 2, 3);
                },
                1,
                2,
                3,
                0);
        assertThat(file.events()).hasSize(2);
        C3dFile copy = copied(file, with(file, List.of(), List.of(event(125.5, "Right", "Foot Strike"))));
        C3dParameters p = copy.parameters();
        assertThat(p.find("EVENT", "LABELS").orElseThrow().texts())
                .containsExactly("Foot Strike", "Foot Off", "Foot Off", "Foot Strike");
        assertThat(p.find("EVENT", "CONTEXTS").orElseThrow().texts()).containsExactly("Left", "Right", "Left", "Right");
        assertThat(p.find("EVENT", "SUBJECTS").orElseThrow().texts()).containsExactly("A", "B", "C", "");
        assertThat(p.find("EVENT", "ICON_IDS").orElseThrow().number(3)).isZero();
        assertThat(p.find("EVENT", "TIMES").orElseThrow().number(3)).isNaN();
        // exact: 125.5 s are 2 minutes and 5.5 s.
        assertThat(p.find("EVENT", "TIMES").orElseThrow().number(6)).isEqualTo(2);
        assertThat(p.find("EVENT", "TIMES").orElseThrow().number(7)).isEqualTo(5.5);
        assertThat(copy.events())
                .startsWith(file.events().get(0), file.events().get(1))
                .hasSize(3);
        assertThat(p.find("SOLEWRIGHT", "EVENT_TIMES").orElseThrow().number(0)).isEqualTo(125.5);
        assertThat(p.find("SOLEWRIGHT", "EVENT_LABELS").orElseThrow().texts()).containsExactly("Foot Strike");
    }

    @Test
    void computedEventsThatFindNoRoomAreLeftOutAndSaid() throws IOException, FormatException {
        C3dFile file = made(true, p -> {}, 1, 2, 3, 0);
        List<RecordedEvent> many = new ArrayList<>();
        for (int k = 0; k < 300; k++) {
            many.add(event(k, "Left", "E" + k));
        }
        List<Finding> said = new ArrayList<>();
        C3dFile copy = copied(file, with(file, List.of(), many), said);
        assertThat(copy.events()).hasSize(255);
        assertThat(copy.events().get(254).time()).isEqualTo(254);
        assertThat(said).extracting(Finding::code).containsExactly("events.no-room");
        said.clear();
        C3dFile again = copied(copy, with(copy, List.of(), many.subList(0, 1)), said);
        assertThat(again.events()).isEqualTo(copy.events());
        assertThat(said).extracting(Finding::code).containsExactly("events.no-room");
    }

    @Test
    void groupThatIsDeclaredUnderTwoNumbersIsOneGroup() throws IOException, FormatException {
        C3dFile file = made(
                true,
                p -> {
                    p.group("EXTRA", "First");
                    p.integers("A", "a", new int[] {1});
                    p.group("POINT", "Again");
                    p.integers("DATA_START", "Data", new int[] {3});
                    p.reals("LONG_FRAMES", "Frames", new double[] {1});
                },
                1,
                2,
                3,
                0);
        assertThat(file.frames()).isEqualTo(1);
        C3dFile copy = copied(file, with(file, List.of(at(file, "MORE", 1, "m".repeat(200))), List.of()));
        assertThat(copy.parameters().number("POINT", "DATA_START"))
                .isEqualTo(copy.headerWords().get(8).doubleValue());
        assertThat(copy.findings()).extracting(Finding::code).doesNotContain("parameters.repeated", "data.start");
        assertThat(copy.labels()).containsExactly("HEEL", "MORE");
    }

    @Test
    void whatOtherReadersExpectIsThere() throws IOException, FormatException {
        C3dFile file = C3dFile.read(write(
                true,
                1,
                p -> {
                    p.group("ANALOG", "Analog");
                    p.integers("USED", "Channels", new int[] {1});
                    p.group("ROTATION", "Rotations");
                    p.integers("USED", "Segments", new int[] {2});
                },
                1,
                2,
                3,
                0,
                5));
        List<Finding> said = new ArrayList<>();
        C3dFile copy = copied(file, C3dCopy.Wanted.like(file), said);
        assertThat(copy.parameters().find("POINT", "DESCRIPTIONS").orElseThrow().count())
                .isEqualTo(1);
        assertThat(copy.parameters().find("ANALOG", "LABELS").orElseThrow().texts())
                .isEqualTo(file.analogLabels());
        assertThat(copy.parameters().number("ROTATION", "USED")).isZero();
        assertThat(said).extracting(Finding::code).containsExactly("rotations.dropped");
    }

    @Test
    void whatTheFormatCannotHoldIsRefusedInASentence() throws IOException, FormatException {
        C3dFile crowded = made(
                true,
                p -> {
                    for (int k = 2; k <= 127; k++) {
                        p.group("G" + k, "");
                    }
                },
                1,
                2,
                3,
                0);
        assertThatThrownBy(() -> copied(crowded, with(crowded, List.of(at(crowded, "A", 1, "")), List.of())))
                .isInstanceOf(FormatException.class)
                .hasMessageContaining("has 127 groups already");
        // Written last without a link, a value may be as long as the file.
        C3dFile large = made(true, p -> p.reals("LARGE", "Large", new double[20_000], 100, 200), 1, 2, 3, 0);
        assertThatThrownBy(() -> copied(large, C3dCopy.Wanted.like(large)))
                .isInstanceOf(FormatException.class)
                .hasMessageContaining("parameter LARGE takes 8001");
    }

    private static ParameterRecord record(int width, List<Integer> shape, double[] numbers, String text) {
        C3dParameter p = new C3dParameter("G", "CUT", width, shape, numbers, List.of(), text);
        return ParameterRecord.of(new C3dParameters.Entry(1, "CUT\n", false, "", Optional.of(p)));
    }

    @Test
    void valueThatWasCutIsWrittenWithAShapeThatHoldsIt() {
        // exact: ten characters are two whole lines of four; 7 numbers are no whole rows of 2, 8 are four.
        ParameterRecord lines = record(-1, List.of(4, 3), new double[0], "abcdefghij");
        assertThat(lines.dimensions()).containsExactly(4, 2);
        assertThat(lines.text()).isEqualTo("abcdefgh");
        assertThat(record(-1, List.of(21, 5), new double[0], "abc").dimensions())
                .containsExactly(21, 0);
        assertThat(record(2, List.of(2, 5), new double[7], "").dimensions()).containsExactly(7);
        assertThat(record(2, List.of(2, 5), new double[8], "").dimensions()).containsExactly(2, 4);
        ParameterRecord deep = record(4, List.of(2, 200, 3), new double[1100], "");
        assertThat(deep.dimensions()).containsExactly(2, 200, 2);
        assertThat(deep.numbers()).hasSize(800);
        assertThat(deep.plainName()).isEqualTo("CUT");
    }
}
