package org.solewright.formats.c3d;

import java.io.IOException;
import java.nio.channels.FileChannel;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.geometry.Vec3;
import org.solewright.domain.motion.RecordedEvent;
import org.solewright.formats.io.FormatException;

/** Reads one file: sniff, header, parameters, then data, each checked before anything is allocated. */
final class C3dReader {

    private static final int BLOCK = 512;
    private static final int KEY = 0x50;
    /** A PNG picture has the C3D key as its second byte. Source: PNG specification, file signature. */
    private static final byte[] PICTURE = {(byte) 0x89, 'P', 'N', 'G', '\r', '\n', 0x1a, '\n'};

    private static final double FASTEST = 1e7;
    private static final int POINT_WORDS = 4;

    private final String source;
    private final String name;
    private final byte[] bytes;
    private final long size;
    private final Optional<FileChannel> channel;
    private final C3dReading reading;
    private final List<Finding> findings = new ArrayList<>();

    /**
     * A reader.
     *
     * @param source the file as the user named it
     * @param name the file's name without folder
     * @param bytes header and parameters: the file's beginning
     * @param size of the whole file
     * @param channel the file, for samples; empty where none are wanted
     * @param reading which samples are wanted
     */
    C3dReader(String source, String name, byte[] bytes, long size, Optional<FileChannel> channel, C3dReading reading) {
        this.source = source;
        this.name = name;
        this.bytes = bytes;
        this.size = size;
        this.channel = channel;
        this.reading = reading;
    }

    C3dFile read() throws IOException, FormatException {
        sniff();
        ByteCursor any = new ByteCursor(source, bytes, Processor.INTEL);
        int block = any.u8(0);
        ByteCursor cursor = any.as(processor(any, block));
        C3dHeader header = C3dHeader.read(cursor);
        C3dParameters parameters = hasParameters(cursor, block)
                ? C3dParameters.read(cursor, block, header.dataBlock(), findings)
                : C3dParameters.none();
        return assemble(cursor, header, parameters);
    }

    private void sniff() throws FormatException {
        if (bytes.length == 0) {
            throw new FormatException(source, "is empty", "get a complete copy of the file");
        }
        if (bytes.length < 2 || (bytes[1] & 0xff) != KEY) {
            throw new FormatException(
                    source,
                    "is not a C3D file: byte 1 is " + (bytes.length < 2 ? "missing" : hex(bytes[1]))
                            + ", expected 0x50",
                    "give a C3D file");
        }
        if (Arrays.equals(bytes, 0, Math.min(PICTURE.length, bytes.length), PICTURE, 0, PICTURE.length)) {
            throw new FormatException(source, "is not a C3D file: it is a PNG picture", "give a C3D file");
        }
        if (bytes.length < BLOCK) {
            throw new FormatException(
                    source,
                    "has " + bytes.length + " bytes, less than the header's 512",
                    "get a complete copy of the file");
        }
    }

    private static String hex(byte b) {
        return "0x" + Integer.toHexString(b & 0xff);
    }

    private Processor processor(ByteCursor c, int block) throws FormatException {
        long at = (block - 1L) * BLOCK;
        if (block > 0 && c.holds(at, 4)) {
            int key = c.u8((int) at + 3);
            for (Processor p : Processor.values()) {
                if (p.key() == key) {
                    return p;
                }
            }
            findings.add(Finding.warning(
                    "processor.unknown",
                    "",
                    "the processor byte is " + key + ", expected 84, 85 or 86; it is told from the header's numbers"));
            return guess(c).orElseThrow(() -> new FormatException(
                    source,
                    "is not a C3D file: the processor byte at offset " + (at + 3) + " is " + key
                            + ", expected 84, 85 or 86, and the header's numbers make no sense",
                    "give a C3D file"));
        } else if (block > 0) {
            throw new FormatException(
                    source,
                    "ends at byte " + size + " before its parameter section at byte " + at,
                    "get a complete copy of the file");
        }
        return guess(c).orElseThrow(() -> new FormatException(
                source,
                "has no parameter section and a header whose numbers make no sense",
                "get a complete copy of the file"));
    }

    /** The processor under which the header's data block, frames and rate make sense. */
    private Optional<Processor> guess(ByteCursor c) throws FormatException {
        for (Processor p : Processor.values()) {
            C3dHeader h = C3dHeader.read(c.as(p));
            boolean isPlausible = h.rate() >= 1
                    && h.rate() < 1e5
                    && h.dataBlock() > 0
                    && h.dataBlock() < 1000
                    && h.lastFrame() >= h.firstFrame()
                    && (h.dataBlock() - 1L) * BLOCK <= size;
            if (isPlausible) {
                return Optional.of(p);
            }
        }
        return Optional.empty();
    }

    private static boolean isRate(double value) {
        return value > 0 && value < FASTEST;
    }

    private static boolean hasParameters(ByteCursor c, int block) {
        return block > 0 && c.holds((block - 1L) * BLOCK, 8);
    }

    private C3dFile assemble(ByteCursor c, C3dHeader header, C3dParameters p) throws IOException, FormatException {
        DataLayout layout = new LayoutChoice(source, header, p, size, findings).choose();
        double rate = p.number("POINT", "RATE");
        if (!isRate(rate)) {
            rate = isRate(header.rate()) ? header.rate() : Double.NaN;
        }
        List<String> labels = Labels.of(p, "POINT", layout.points(), "point_", findings);
        Samples samples = samples(c.processor(), layout, labels, LayoutChoice.scale(header, p));
        SampleChecks.add(samples.points(), findings);
        List<String> analogLabels = Labels.of(p, "ANALOG", layout.channels(), "analog_", findings);
        C3dAnalog analog = analog(samples.analog(), layout, p, rate);
        SampleChecks.add(analog, findings);
        List<String> analogUnits = new ArrayList<>();
        List<String> units = C3dParameter.joined(p.continued("ANALOG", "UNITS"));
        for (int k = 0; k < layout.channels(); k++) {
            analogUnits.add(k < units.size() ? units.get(k) : "");
        }
        rotations(p);
        List<RecordedEvent> events = events(p);
        events.addAll(header.events());
        return new C3dFile(
                name,
                c.processor(),
                layout.isReal(),
                FrameCount.first(header, p),
                rate,
                p.find("POINT", "UNITS").map(u -> u.text(0)).orElse(""),
                samples.labels(),
                samples.points(),
                analogLabels,
                analogUnits,
                analog,
                events,
                p,
                platforms(p),
                layout.frames(),
                c.words(C3dHeader.BYTES / 2),
                findings);
    }

    /** What was decoded: the wanted points with their labels, and the words of the analog channels. */
    private record Samples(List<String> labels, C3dPoints points, SampleStore analog) {}

    private Samples samples(Processor processor, DataLayout layout, List<String> labels, float scale)
            throws IOException, FormatException {
        List<String> wanted = new ArrayList<>();
        List<Integer> runs = new ArrayList<>();
        for (int point = 0; point < labels.size(); point++) {
            if (reading.points().test(labels.get(point))) {
                wanted.add(labels.get(point));
                int last = runs.size() - 1;
                if (last > 0 && runs.get(last - 1) + runs.get(last) == POINT_WORDS * point) {
                    runs.set(last, runs.get(last) + POINT_WORDS);
                } else {
                    runs.add(POINT_WORDS * point);
                    runs.add(POINT_WORDS);
                }
            }
        }
        boolean hasAnalog = reading.isAnalogWanted() && layout.channels() > 0 && layout.analogPerFrame() > 0;
        int frames = channel.isPresent() ? layout.frames() : 0;
        int analogWords = hasAnalog ? layout.channels() * layout.analogPerFrame() : 0;
        requireRoom(layout, (long) frames * POINT_WORDS * wanted.size(), (long) frames * analogWords);
        SampleStore points = SampleStore.of(layout.isReal(), frames * POINT_WORDS * wanted.size());
        SampleStore analog = SampleStore.of(layout.isReal(), frames * analogWords);
        if (channel.isPresent()) {
            int[] analogRun = hasAnalog ? new int[] {POINT_WORDS * layout.points(), analogWords} : new int[0];
            new SampleSections(channel.get(), layout, processor)
                    .read(
                            new int[][] {
                                runs.stream().mapToInt(Integer::intValue).toArray(), analogRun
                            },
                            new SampleStore[] {points, analog});
        }
        return new Samples(
                wanted,
                new C3dPoints(frames, wanted.size(), points, layout.isReal(), scale, reading.isFlagObeyed()),
                analog);
    }

    /** Says it in time where the samples would not fit in memory. */
    private void requireRoom(DataLayout layout, long pointWords, long analogWords) throws FormatException {
        long bytes = (pointWords + analogWords) * layout.wordBytes();
        long heap = Runtime.getRuntime().maxMemory();
        if (Math.max(pointWords, analogWords) > Integer.MAX_VALUE - 8 || bytes > heap - heap / 8) {
            throw new FormatException(
                    source,
                    "holds " + (bytes >> 20) + " MB of samples, more than fits in " + (heap >> 20) + " MB of memory",
                    "crop it, or allow more memory by JAVA_OPTS=-Xmx" + ((bytes >> 29) + 1) + "g");
        }
    }

    private void rotations(C3dParameters p) {
        double used = p.find("ROTATION", "USED").map(u -> u.unsigned(0)).orElse(Double.NaN);
        if (used > 0) {
            findings.add(Finding.note(
                    "rotations.not-read",
                    "ROTATION",
                    (int) used + " segment orientations are stored beside the points; they are kept as parameters and"
                            + " not read"));
        }
    }

    private C3dAnalog analog(SampleStore store, DataLayout layout, C3dParameters p, double pointRate) {
        int n = layout.channels();
        if (n == 0 || layout.analogPerFrame() == 0) {
            return C3dAnalog.none(n);
        }
        boolean isUnsigned = p.find("ANALOG", "FORMAT")
                .map(f -> f.text(0).equalsIgnoreCase("UNSIGNED"))
                .orElse(false);
        double general = p.number("ANALOG", "GEN_SCALE");
        double[] offset = new double[n];
        double[] factor = new double[n];
        List<C3dParameter> offsets = p.continued("ANALOG", "OFFSET");
        List<C3dParameter> scales = p.continued("ANALOG", "SCALE");
        for (int k = 0; k < n; k++) {
            offset[k] = at(offsets, k, isUnsigned).orElse(0.0);
            factor[k] = at(scales, k, false).orElse(1.0) * (Double.isNaN(general) ? 1 : general);
        }
        double rate = pointRate * layout.analogPerFrame();
        return new C3dAnalog(store.words() / n, n, rate, store, isUnsigned && !layout.isReal(), offset, factor);
    }

    private static Optional<Double> at(List<C3dParameter> parts, int index, boolean isUnsigned) {
        int k = index;
        for (C3dParameter part : parts) {
            if (k < part.count()) {
                double v = isUnsigned ? part.unsigned(k) : part.number(k);
                return Double.isNaN(v) ? Optional.empty() : Optional.of(v);
            }
            k -= part.count();
        }
        return Optional.empty();
    }

    private static List<RecordedEvent> events(C3dParameters p) {
        List<RecordedEvent> events = new ArrayList<>();
        Optional<C3dParameter> times = p.find("EVENT", "TIMES");
        double used = p.find("EVENT", "USED").map(u -> u.unsigned(0)).orElse(Double.NaN);
        if (times.isEmpty()) {
            return events;
        }
        List<String> labels = C3dParameter.joined(p.continued("EVENT", "LABELS"));
        List<String> contexts = C3dParameter.joined(p.continued("EVENT", "CONTEXTS"));
        int stored = times.get().count() / 2;
        int count = Double.isNaN(used) ? stored : (int) Math.min(used, stored);
        for (int k = 0; k < count; k++) {
            double time = 60 * times.get().number(2 * k) + times.get().number(2 * k + 1);
            if (Double.isFinite(time)) {
                events.add(new RecordedEvent(
                        time,
                        k < contexts.size() ? contexts.get(k) : "",
                        k < labels.size() ? labels.get(k) : "",
                        RecordedEvent.Source.GROUP));
            }
        }
        return events;
    }

    private static List<C3dPlatform> platforms(C3dParameters p) {
        List<C3dPlatform> platforms = new ArrayList<>();
        String group = "FORCE_PLATFORM";
        double used = p.find(group, "USED").map(u -> u.unsigned(0)).orElse(0.0);
        Optional<C3dParameter> types = p.find(group, "TYPE");
        Optional<C3dParameter> channels = p.find(group, "CHANNEL");
        Optional<C3dParameter> calibration = p.find(group, "CAL_MATRIX");
        int perPlatform = channels.filter(c -> !c.dimensions().isEmpty())
                .map(c -> c.dimensions().get(0))
                .orElse(0);
        int count = (int) Math.min(
                Double.isNaN(used) ? 0 : used, types.map(C3dParameter::count).orElse(0));
        Map<String, C3dParameter> found = new HashMap<>();
        p.find(group, "CORNERS").ifPresent(v -> found.put("CORNERS", v));
        p.find(group, "ORIGIN").ifPresent(v -> found.put("ORIGIN", v));
        int matrix = calibration
                .filter(c -> c.dimensions().size() >= 2)
                .map(c -> c.dimensions().get(0) * c.dimensions().get(1))
                .orElse(0);
        int rows = calibration
                .filter(c -> !c.dimensions().isEmpty())
                .map(c -> c.dimensions().get(0))
                .orElse(0);
        for (int k = 0; k < count; k++) {
            List<Vec3> corners = new ArrayList<>();
            for (int i = 0; i < 4; i++) {
                corners.add(triple(found.get("CORNERS"), 4 * k + i));
            }
            List<Integer> of = new ArrayList<>();
            for (int i = 0; i < perPlatform; i++) {
                double v = channels.get().unsigned(k * perPlatform + i);
                of.add(Double.isNaN(v) ? 0 : (int) v);
            }
            List<Double> values = new ArrayList<>();
            for (int i = 0; i < matrix && (k + 1) * matrix <= calibration.get().count(); i++) {
                values.add(calibration.get().number(k * matrix + i));
            }
            int type = (int) types.get().number(k);
            platforms.add(new C3dPlatform(k + 1, type, corners, triple(found.get("ORIGIN"), k), of, values, rows));
        }
        return platforms;
    }

    private static Vec3 triple(@org.jspecify.annotations.Nullable C3dParameter p, int index) {
        return p == null
                ? new Vec3(Double.NaN, Double.NaN, Double.NaN)
                : new Vec3(p.number(3 * index), p.number(3 * index + 1), p.number(3 * index + 2));
    }
}
