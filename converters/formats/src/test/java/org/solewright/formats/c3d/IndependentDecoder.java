package org.solewright.formats.c3d;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.DataInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;

/**
 * A second decoder of well-formed C3D files, written from the public format guide, that shares no code with the reader: byte
 * by byte, without buffers of numbers, and strict: it knows no repairs.
 */
final class IndependentDecoder {

    private final byte[] file;
    private final int key;
    private final Map<String, Integer> values = new HashMap<>();
    private final Map<String, Boolean> locks = new HashMap<>();
    private final Map<String, Boolean> locked = new HashMap<>();
    private final Map<Integer, Integer> shapes = new HashMap<>();

    private IndependentDecoder(byte[] file) {
        this.file = file;
        this.key = file[512 * (file[0] - 1) + 3];
        chain();
    }

    private int byteAt(long at) {
        return file[(int) at] & 255;
    }

    private int word(long at) {
        return key == 86 ? byteAt(at) * 256 + byteAt(at + 1) : byteAt(at + 1) * 256 + byteAt(at);
    }

    private int signed(long at) {
        return word(at) > 32767 ? word(at) - 65536 : word(at);
    }

    private double real(long at) {
        int[] b = {byteAt(at), byteAt(at + 1), byteAt(at + 2), byteAt(at + 3)};
        // Most significant byte first: VAX F stores the words of a number in exchanged order.
        int[] m = key == 86 ? b : key == 84 ? new int[] {b[3], b[2], b[1], b[0]} : new int[] {b[1], b[0], b[3], b[2]};
        int exponent = (m[0] & 127) * 2 + m[1] / 128;
        double mantissa = (m[1] & 127) * 65536.0 + m[2] * 256.0 + m[3];
        double sign = m[0] > 127 ? -1 : 1;
        if (key == 85) {
            return exponent == 0 ? 0 : sign * (8388608 + mantissa) * Math.pow(2, exponent - 152);
        }
        if (exponent == 255) {
            return Double.NaN;
        }
        return exponent == 0
                ? sign * mantissa * Math.pow(2, -149)
                : sign * (8388608 + mantissa) * Math.pow(2, exponent - 150);
    }

    /** Remembers where the value of every parameter lies. */
    private void chain() {
        Map<Integer, String> groups = new HashMap<>();
        Map<String, Integer> places = new HashMap<>();
        int at = 512 * (file[0] - 1) + 4;
        while (true) {
            int length = Math.abs(file[at]);
            int id = file[at + 1];
            StringBuilder name = new StringBuilder();
            for (int i = 0; i < length; i++) {
                name.append((char) byteAt(at + 2 + i));
            }
            int link = at + 2 + length;
            if (id < 0) {
                groups.putIfAbsent(-id, name.toString().trim().toUpperCase(Locale.ROOT));
            } else {
                int dimensions = byteAt(link + 3);
                String key = id + ":" + name.toString().trim().toUpperCase(Locale.ROOT);
                places.putIfAbsent(key, link + 4 + dimensions);
                locks.putIfAbsent(key, file[at] < 0);
                shapes.putIfAbsent(link + 4 + dimensions, link + 2);
            }
            if (word(link) == 0) {
                break;
            }
            at = link + word(link);
        }
        places.forEach((name, place) -> {
            int colon = name.indexOf(':');
            String full = groups.get(Integer.valueOf(name.substring(0, colon))) + name.substring(colon);
            values.putIfAbsent(full, place);
            locked.putIfAbsent(full, locks.getOrDefault(name, false));
        });
    }

    static void compare(String how, Path path, C3dFile read) throws IOException {
        try (InputStream in = Files.newInputStream(path);
                DataInputStream data = new DataInputStream(in)) {
            new IndependentDecoder(data.readAllBytes()).compare(how, read);
        }
    }

    /**
     * Holds every parameter of a file against what stands in its copy: width, shape, values, bytes of text, description and
     * lock.
     *
     * @param source what was copied
     * @param exceptFor names that the form of the copy decides
     */
    static void compareParameters(String how, Path copy, C3dFile source, Set<String> exceptFor) throws IOException {
        IndependentDecoder decoder = new IndependentDecoder(Files.readAllBytes(copy));
        for (C3dParameters.Entry e : source.parameters().entries()) {
            if (e.parameter().isPresent()) {
                C3dParameter p = e.parameter().get();
                String name = p.group() + ":" + p.name();
                if (!exceptFor.contains(name)) {
                    decoder.compare(how + " " + name, name, e, p);
                }
            }
        }
    }

    private void compare(String how, String name, C3dParameters.Entry e, C3dParameter p) {
        assertThat(values).as(how).containsKey(name);
        int at = values.get(name);
        int shape = shapes.get(at);
        int width = file[shape];
        int count = 1;
        List<Integer> dimensions = new ArrayList<>();
        for (int k = 0; k < byteAt(shape + 1); k++) {
            dimensions.add(byteAt(shape + 2 + k));
            count *= byteAt(shape + 2 + k);
        }
        int stored = p.isText() ? p.storedText().length() : p.count();
        assertThat(width).as(how).isEqualTo(p.width());
        assertThat(count).as(how).isEqualTo(stored);
        if (p.dimensions().stream().mapToLong(d -> d).reduce(1, (a, b) -> Math.min(1_000_000, a * b)) == stored) {
            assertThat(dimensions).as(how).isEqualTo(p.dimensions());
        }
        StringBuilder text = new StringBuilder();
        int wrong = 0;
        for (int k = 0; k < count; k++) {
            if (width < 0) {
                text.append((char) byteAt(at + k));
            } else {
                double v = width == 1 ? file[at + k] : width == 2 ? signed(at + 2L * k) : real(at + 4L * k);
                wrong += v == p.number(k) || Double.isNaN(v) ? 0 : 1;
            }
        }
        assertThat(wrong).as(how).isZero();
        assertThat(text.toString()).as(how).isEqualTo(p.storedText());
        int behind = at + count * Math.abs(width);
        StringBuilder description = new StringBuilder();
        for (int k = 0; k < byteAt(behind); k++) {
            description.append((char) byteAt(behind + 1 + k));
        }
        assertThat(description.toString()).as(how).isEqualTo(e.description());
        assertThat(locked.get(name)).as(how).isEqualTo(e.isLocked());
    }

    private void compare(String how, C3dFile read) {
        int points = word(2);
        int analogWords = word(4);
        double scale = real(12);
        assertThat(points).as(how).isEqualTo(read.points().points());
        if (values.containsKey("POINT:SCALE")) {
            assertThat(real(values.get("POINT:SCALE"))).as(how).isEqualTo(scale);
        }
        if (values.containsKey("POINT:DATA_START")) {
            assertThat(word(values.get("POINT:DATA_START"))).as(how).isEqualTo(word(16));
        }
        int width = scale < 0 ? 4 : 2;
        long at = 512L * (word(16) - 1);
        int wrong = 0;
        for (int frame = 0; frame < read.frames(); frame++) {
            for (int point = 0; point < points; point++) {
                for (int c = 0; c < 3; c++, at += width) {
                    double v = scale < 0 ? real(at) : signed(at) * scale;
                    double ours = read.points().coordinate(frame, point, c);
                    boolean isLost = Double.isNaN(v) || Double.isNaN(ours);
                    wrong += v == ours || isLost || Math.abs(v - ours) < 1e-6 * Math.abs(v) ? 0 : 1;
                }
                double w = scale < 0 ? real(at) : signed(at);
                boolean isMissing = w < 0 || (w > 32767 && w < 65536);
                wrong += isMissing && read.points().isValid(frame, point) ? 1 : 0;
                at += width;
            }
            for (int i = 0; i < analogWords; i++, at += width) {
                int channels = read.analog().channels();
                int sample = frame * word(18) + i / channels;
                double ours = read.analog().stored(sample, i % channels);
                double v = scale < 0 ? real(at) : ours < 0 || signed(at) > 0 ? signed(at) : word(at);
                wrong += v == ours || Double.isNaN(v) ? 0 : 1;
            }
        }
        assertThat(wrong)
                .as(how + ": numbers on which an independent decoder disagrees")
                .isZero();
    }
}
