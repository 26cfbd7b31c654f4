package org.solewright.formats.c3d;

import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.List;

/**
 * A record of a parameter section to be written: text as bytes (one character each), numbers as doubles.
 *
 * @param id of the group, negative for the group itself
 * @param name as it is written
 * @param isLocked whether it is marked as not to be changed
 * @param description a byte per character, at most 255
 * @param width bytes of a number, -1 for characters, 0 for a group
 * @param dimensions first fastest
 * @param numbers values; empty for text
 * @param text all characters, a byte each; empty for numbers
 */
record ParameterRecord(
        int id,
        String name,
        boolean isLocked,
        String description,
        int width,
        List<Integer> dimensions,
        List<Double> numbers,
        String text) {

    private static final int LONGEST = 255;

    ParameterRecord {
        dimensions = List.copyOf(dimensions);
        numbers = List.copyOf(numbers);
    }

    static ParameterRecord of(C3dParameters.Entry e) {
        if (e.parameter().isEmpty()) {
            return new ParameterRecord(e.id(), e.name(), e.isLocked(), e.description(), 0, List.of(), List.of(), "");
        }
        C3dParameter p = e.parameter().get();
        List<Double> numbers = new ArrayList<>();
        for (int i = 0; !p.isText() && i < p.count(); i++) {
            numbers.add(p.number(i));
        }
        int stored = p.isText() ? p.storedText().length() : p.count();
        long shape = 1;
        for (int d : p.dimensions()) {
            shape = Math.min(shape * d, Integer.MAX_VALUE);
        }
        if (shape == stored) {
            return new ParameterRecord(
                    e.id(),
                    e.name(),
                    e.isLocked(),
                    e.description(),
                    p.width(),
                    p.dimensions(),
                    numbers,
                    p.storedText());
        }
        List<Integer> dimensions = cut(p, stored);
        int kept = dimensions.stream().reduce(1, (a, b) -> a * b);
        return new ParameterRecord(
                e.id(),
                e.name(),
                e.isLocked(),
                e.description(),
                p.width(),
                dimensions,
                numbers.subList(0, Math.min(kept, numbers.size())),
                p.storedText().substring(0, Math.min(kept, p.storedText().length())));
    }

    /** The shape of a value that was cut: whole lines of it, of numbers a plain list where that holds more. */
    private static List<Integer> cut(C3dParameter p, int stored) {
        boolean isLines = p.isText() && p.dimensions().size() > 1;
        List<Integer> best = isLines ? List.of(p.dimensions().get(0), 0) : List.of(Math.min(stored, LONGEST));
        long most = isLines ? 0 : best.get(0);
        long leading = 1;
        for (int k = 1; k < p.dimensions().size(); k++) {
            leading *= p.dimensions().get(k - 1);
            if (leading == 0 || leading > stored) {
                break;
            }
            long last = Math.min(LONGEST, stored / leading);
            if (leading * last >= most) {
                most = leading * last;
                best = new ArrayList<>(p.dimensions().subList(0, k));
                best.add((int) last);
            }
        }
        return best;
    }

    static ParameterRecord group(int id, String name, String description) {
        return new ParameterRecord(-id, name, false, description, 0, List.of(), List.of(), "");
    }

    static ParameterRecord integers(
            int id, String name, String description, List<Integer> dimensions, double... values) {
        return new ParameterRecord(
                id,
                name,
                false,
                description,
                2,
                dimensions,
                Arrays.stream(values).boxed().toList(),
                "");
    }

    static ParameterRecord reals(int id, String name, String description, List<Integer> dimensions, double... values) {
        return new ParameterRecord(
                id,
                name,
                false,
                description,
                4,
                dimensions,
                Arrays.stream(values).boxed().toList(),
                "");
    }

    /** A character for each byte of the text in UTF-8. */
    static String stored(String text) {
        return new String(text.getBytes(StandardCharsets.UTF_8), StandardCharsets.ISO_8859_1);
    }

    /** Lines of text in UTF-8, padded to the longest, at most 255 of them. */
    static ParameterRecord texts(int id, String name, String description, List<String> lines) {
        int width = 1;
        List<String> bytes = new ArrayList<>();
        for (String line : lines) {
            String latin = stored(line);
            latin = latin.length() > LONGEST ? latin.substring(0, LONGEST) : latin;
            bytes.add(latin);
            width = Math.max(width, latin.length());
        }
        StringBuilder text = new StringBuilder();
        for (String line : bytes) {
            text.append(line).append(" ".repeat(width - line.length()));
        }
        return new ParameterRecord(
                id, name, false, description, -1, List.of(width, lines.size()), List.of(), text.toString());
    }

    /** Lines of a text as stored, a character for each byte. */
    static List<String> linesOf(C3dParameter p) {
        int width = p.dimensions().isEmpty() ? 0 : p.dimensions().get(0);
        if (p.dimensions().size() < 2 || width == 0) {
            return p.isText() ? List.of(p.storedText()) : List.of();
        }
        List<String> lines = new ArrayList<>();
        for (int at = 0; at + width <= p.storedText().length(); at += width) {
            lines.add(p.storedText().substring(at, at + width));
        }
        return lines;
    }

    /**
     * The same text with other lines from one place on.
     *
     * @param kept lines that stay
     * @param added lines behind them, a character for each byte
     */
    ParameterRecord withLines(int kept, List<String> added) {
        int width = dimensions.get(0);
        List<String> lines = new ArrayList<>();
        for (int k = 0; k < kept; k++) {
            lines.add(text.substring(k * width, (k + 1) * width));
        }
        lines.addAll(added);
        int longest = width;
        for (String line : lines) {
            longest = Math.max(longest, Math.min(LONGEST, line.length()));
        }
        StringBuilder all = new StringBuilder();
        for (String line : lines) {
            String fitting = line.substring(0, Math.min(longest, line.length()));
            all.append(fitting).append(" ".repeat(longest - fitting.length()));
        }
        return new ParameterRecord(
                id, name, isLocked, description, -1, List.of(longest, lines.size()), List.of(), all.toString());
    }

    /** A list of numbers with zeros behind it. */
    ParameterRecord withZeros(int count) {
        List<Double> more = new ArrayList<>(numbers);
        more.addAll(Collections.nCopies(count, 0.0));
        return new ParameterRecord(id, name, isLocked, description, width, List.of(more.size()), more, "");
    }

    /** The same under a description that the replaced record had. */
    ParameterRecord like(ParameterRecord replaced) {
        return new ParameterRecord(
                replaced.id, replaced.name, replaced.isLocked, replaced.description, width, dimensions, numbers, text);
    }

    /** The name for a message: one line, whatever the file holds. */
    String plainName() {
        return name.trim().replaceAll("\\p{Cntrl}", "?");
    }

    /** Bytes from the link word on: link, value, description. */
    int bytesAfterName() {
        int value = width == 0 ? 0 : 2 + dimensions.size() + (width < 0 ? text.length() : width * numbers.size());
        return 2 + value + 1 + description.length();
    }
}
