package org.solewright.formats.c3d;

import java.io.IOException;
import java.io.OutputStream;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.List;
import java.util.Optional;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.motion.RecordedEvent;
import org.solewright.formats.io.AtomicOutput;
import org.solewright.formats.io.FormatException;

/**
 * Writes a file that was read as C3D again: for any processor, as reals or integers, whole or cropped, with computed points
 * and events added. All parameters and unknown groups stay, in their order; read again it is the same data, reals to the
 * last bit, integers to half a quantisation step.
 *
 * <p>Frame counts over 65 535 are written in every form that readers use: POINT:FRAMES without sign or as a real,
 * POINT:LONG_FRAMES, TRIAL:ACTUAL_START_FIELD and ACTUAL_END_FIELD.
 */
public final class C3dCopy {

    private static final int BLOCK = 512;
    private static final int MOST = 255;
    private static final int FIELD = 65536;
    private static final int HEADER_EVENTS = 18;

    /**
     * How a file is written again.
     *
     * @param processor whose numbers
     * @param isReal reals, else integers
     * @param first zero-based first frame that is kept
     * @param last zero-based last frame that is kept, inclusive
     * @param points computed points, in the file's length unit, with all frames of the file
     * @param events computed events
     */
    public record Wanted(
            Processor processor,
            boolean isReal,
            int first,
            int last,
            List<AddedPoint> points,
            List<RecordedEvent> events) {

        /** Copies the lists. */
        public Wanted {
            points = List.copyOf(points);
            events = List.copyOf(events);
        }

        /**
         * The form of the file itself.
         *
         * @param file that is written again
         * @return everything, unchanged
         */
        public static Wanted like(C3dFile file) {
            return new Wanted(file.processor(), file.isReal(), 0, file.frames() - 1, List.of(), List.of());
        }
    }

    private final C3dFile file;
    private final Wanted wanted;
    private final int frames;
    private final int perFrame;
    private final List<Finding> findings = new ArrayList<>();
    private final SampleForm form;

    private C3dCopy(C3dFile file, Wanted wanted) throws FormatException {
        this.file = file;
        this.wanted = wanted;
        this.frames = Math.max(0, wanted.last() - wanted.first() + 1);
        int channels = file.analog().channels();
        this.perFrame = file.frames() > 0 && channels > 0 ? file.analog().samples() / file.frames() : 0;
        this.form = SampleForm.of(file, wanted, perFrame, findings);
        requireCounts();
    }

    /**
     * Writes a file.
     *
     * @param file what was read, with all its samples
     * @param wanted how it is written
     * @param target replaced as a whole; must not be the file itself
     * @return what has to be said: what could not be held exactly
     * @throws FormatException where the data do not fit the wanted form
     * @throws IOException where the target cannot be written
     */
    public static List<Finding> write(C3dFile file, Wanted wanted, Path target) throws IOException, FormatException {
        C3dCopy copy = new C3dCopy(file, wanted);
        ParameterSection section = copy.section();
        AtomicOutput.write(target, out -> copy.write(section, out));
        return List.copyOf(copy.findings);
    }

    private void requireCounts() throws FormatException {
        int points = file.points().points() + wanted.points().size();
        long words = (long) perFrame * file.analog().channels();
        if (points > FIELD - 1 || words > FIELD - 1) {
            throw new FormatException(
                    file.name(),
                    points + " points and " + words
                            + " analog words per frame do not fit the format, which counts to 65535",
                    "leave some out");
        }
    }

    private ParameterSection section() throws FormatException {
        ParameterSection s = ParameterSection.of(file.name(), file.parameters());
        int point = s.group("POINT", "Points in space");
        int points = file.points().points() + wanted.points().size();
        s.put(ParameterRecord.integers(point, "USED", "Points per frame", List.of(), points));
        s.put(ParameterRecord.reals(point, "SCALE", "Negative: samples are reals", List.of(), form.scale()));
        if (file.rate() > 0) {
            s.put(ParameterRecord.reals(point, "RATE", "Frames per second", List.of(), file.rate()));
        }
        frameCounts(s, point);
        analog(s);
        if (wanted.first() > 0 || wanted.last() < file.frames() - 1) {
            baseline(s);
        }
        names(s, "POINT", file.points().points(), file.labels());
        names(s, "ANALOG", file.analog().channels(), file.analogLabels());
        if (s.find("ROTATION", "USED")
                .filter(u -> u.numbers().stream().anyMatch(n -> n != 0))
                .isPresent()) {
            int rotation = s.group("ROTATION", "Segment orientations");
            s.put(ParameterRecord.integers(rotation, "USED", "Number of segments", List.of(), 0));
            findings.add(Finding.warning(
                    "rotations.dropped",
                    "ROTATION",
                    "the segment orientations of the file are not written; their parameters stay, ROTATION:USED is 0"));
        }
        if (!wanted.points().isEmpty() || !wanted.events().isEmpty()) {
            new ComputedGroup(file, wanted, s, findings).add();
        }
        // Its value depends on the size of the section, not the size on it.
        s.put(ParameterRecord.integers(point, "DATA_START", "First block of the data", List.of(), 0));
        int data = 2 + s.blocks();
        if (data > FIELD - 1) {
            throw new FormatException(
                    file.name(),
                    "its parameters take " + s.blocks() + " blocks, more than the format can point behind",
                    "");
        }
        s.put(ParameterRecord.integers(point, "DATA_START", "First block of the data", List.of(), signed(data)));
        requireVax(s);
        s.requireLinks();
        return s;
    }

    /** Other readers want names and descriptions of whatever there is. */
    private static void names(ParameterSection s, String group, int count, List<String> labels) throws FormatException {
        if (count == 0) {
            return;
        }
        int id = s.group(group, "");
        if (s.find(group, "LABELS").isEmpty()) {
            s.putLines(id, "LABELS", "Names", labels);
        }
        if (s.find(group, "DESCRIPTIONS").isEmpty()) {
            s.putLines(id, "DESCRIPTIONS", "What they are", Collections.nCopies(count, ""));
        }
    }

    private static int signed(int unsigned) {
        return (short) unsigned;
    }

    private void frameCounts(ParameterSection s, int point) throws FormatException {
        boolean isLong = frames > FIELD - 1;
        s.put(
                isLong
                        ? ParameterRecord.reals(point, "FRAMES", "Number of frames", List.of(), frames)
                        : ParameterRecord.integers(point, "FRAMES", "Number of frames", List.of(), signed(frames)));
        ParameterRecord longFrames = ParameterRecord.reals(point, "LONG_FRAMES", "Number of frames", List.of(), frames);
        if (isLong) {
            s.put(longFrames);
        } else {
            s.replace(longFrames);
        }
        long first = file.firstFrame() + (long) wanted.first();
        long last = first + frames - 1;
        boolean hasField = s.find("TRIAL", "ACTUAL_START_FIELD").isPresent();
        if (isLong || last > FIELD - 1 || hasField) {
            int trial = s.group("TRIAL", "Trial");
            s.put(field(trial, "ACTUAL_START_FIELD", "First frame, low word first", first));
            s.put(field(trial, "ACTUAL_END_FIELD", "Last frame, low word first", Math.max(0, last)));
        }
    }

    private static ParameterRecord field(int group, String name, String description, long value) {
        return ParameterRecord.integers(
                group, name, description, List.of(2), signed((int) (value % FIELD)), signed((int) (value / FIELD)));
    }

    private void analog(ParameterSection s) throws FormatException {
        int channels = file.analog().channels();
        if (channels == 0 && s.find("ANALOG", "USED").isEmpty()) {
            return;
        }
        int analog = s.group("ANALOG", "Analog channels");
        s.put(ParameterRecord.integers(analog, "USED", "Number of channels", List.of(), signed(channels)));
        if (channels > 0 && file.analog().rate() > 0) {
            s.put(ParameterRecord.reals(
                    analog,
                    "RATE",
                    "Samples per second",
                    List.of(),
                    file.analog().rate()));
        }
        if (form.isAnalogRescaled()) {
            continued(s, analog, "SCALE", "Scale of each channel", form.analogScales(), false);
            continued(s, analog, "OFFSET", "Offset of each channel", new double[channels], true);
            s.replace(ParameterRecord.texts(analog, "FORMAT", "Integers", List.of("SIGNED")));
            s.replace(ParameterRecord.integers(analog, "BITS", "Bits of a sample", List.of(), 16));
        }
    }

    /** A list of numbers in pieces of 255: NAME, NAME2, ... */
    private static void continued(
            ParameterSection s, int group, String name, String description, double[] values, boolean isInteger) {
        for (int from = 0, k = 1; from < values.length; from += MOST, k++) {
            double[] part = Arrays.copyOfRange(values, from, Math.min(values.length, from + MOST));
            String piece = k == 1 ? name : name + k;
            s.put(
                    isInteger
                            ? ParameterRecord.integers(group, piece, description, List.of(part.length), part)
                            : ParameterRecord.reals(group, piece, description, List.of(part.length), part));
        }
    }

    /** The frames of ZERO are counted from the first one of the file. */
    private void baseline(ParameterSection s) {
        Optional<ParameterRecord> zero = s.find("FORCE_PLATFORM", "ZERO");
        if (zero.isEmpty() || zero.get().numbers().size() < 2) {
            return;
        }
        double from = Math.max(1, zero.get().numbers().get(0));
        double to = zero.get().numbers().get(1);
        if (to < from) {
            return;
        }
        double first = Math.max(1, from - wanted.first());
        double last = Math.min(frames, to - wanted.first());
        boolean isKept = last >= first;
        if (!isKept) {
            findings.add(Finding.warning(
                    "platform.zero-cropped",
                    "FORCE_PLATFORM",
                    "the frames that ZERO names are cropped away: no baseline can be taken off any more"));
        }
        s.put(ParameterRecord.integers(zero.get().id(), "ZERO", "", List.of(2), isKept ? first : 1, isKept ? last : 0));
    }

    private void requireVax(ParameterSection s) throws FormatException {
        if (wanted.processor() != Processor.DEC) {
            return;
        }
        for (ParameterRecord r : s.records()) {
            for (double v : r.numbers()) {
                if (r.width() == 4 && !(Math.abs(v) < VaxFloat.TOO_LARGE)) {
                    throw new FormatException(
                            file.name(),
                            "parameter " + r.plainName() + " holds " + v + ", which has no form in VAX numbers",
                            "write it for another processor");
                }
            }
        }
    }

    private void write(ParameterSection section, OutputStream out) throws IOException {
        out.write(header(2 + section.blocks()));
        out.write(section.bytes(wanted.processor()));
        long written = form.write(wanted.first(), frames, out);
        int rest = (int) (written % BLOCK);
        if (rest > 0) {
            out.write(new byte[BLOCK - rest]);
        }
    }

    private byte[] header(int dataBlock) {
        ByteBuffer b = ByteBuffer.allocate(BLOCK)
                .order(wanted.processor() == Processor.MIPS ? ByteOrder.BIG_ENDIAN : ByteOrder.LITTLE_ENDIAN);
        for (int i = 0; i < file.headerWords().size(); i++) {
            b.putShort(2 * i, (short) file.headerWords().get(i).intValue());
        }
        b.put(0, (byte) 2).put(1, (byte) 0x50);
        b.putShort(2, (short) (file.points().points() + wanted.points().size()));
        b.putShort(4, (short) (file.analog().channels() * perFrame));
        long first = file.firstFrame() + (long) wanted.first();
        b.putShort(6, (short) Math.min(first, FIELD - 1));
        b.putShort(8, (short) Math.min(Math.max(0, first + frames - 1), FIELD - 1));
        b.putInt(12, WordOutput.word((float) form.scale(), wanted.processor()));
        b.putShort(16, (short) dataBlock).putShort(18, (short) perFrame);
        float rate = file.rate() > 0 ? (float) file.rate() : 0;
        b.putInt(20, WordOutput.word(rate, wanted.processor()));
        headerEvents(b);
        return b.array();
    }

    private void headerEvents(ByteBuffer b) {
        List<RecordedEvent> events = file.events().stream()
                .filter(e -> e.source() == RecordedEvent.Source.HEADER)
                .limit(HEADER_EVENTS)
                .toList();
        b.putShort(C3dHeader.EVENT_COUNT, (short) events.size());
        for (int k = 0; k < HEADER_EVENTS; k++) {
            boolean isOne = k < events.size();
            float time = isOne ? (float) events.get(k).time() : 0;
            b.putInt(
                    C3dHeader.EVENT_TIMES + 4 * k,
                    WordOutput.word(Math.abs(time) < VaxFloat.TOO_LARGE ? time : 0, wanted.processor()));
            byte[] label = new byte[4];
            byte[] text = isOne ? events.get(k).label().getBytes(StandardCharsets.UTF_8) : new byte[0];
            Arrays.fill(label, isOne ? (byte) ' ' : 0);
            System.arraycopy(text, 0, label, 0, Math.min(4, text.length));
            b.put(C3dHeader.EVENT_LABELS + 4 * k, label);
        }
        // Flags and reserved bytes lie as they were: single bytes do not turn with the order of words.
        for (int at = C3dHeader.EVENT_FLAGS; at < C3dHeader.EVENT_LABELS; at += 2) {
            int word = file.headerWords().get(at / 2);
            boolean wasMips = file.processor() == Processor.MIPS;
            b.put(at, (byte) (wasMips ? word >> 8 : word));
            b.put(at + 1, (byte) (wasMips ? word : word >> 8));
        }
    }
}
