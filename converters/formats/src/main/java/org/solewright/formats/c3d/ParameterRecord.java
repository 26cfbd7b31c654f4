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
        boolean isCut = shape != stored;
        // A value that was cut has the shape of what is left; of text the whole lines are left.
        List<Integer> dimensions = isCut ? cut(p, stored) : p.dimensions();
        String text = p.storedText();
        int left = 1;
        for (int d : isCut ? dimensions : List.<Integer>of()) {
            left *= d;
        }
        if (isCut && p.isText()) {
            text = text.substring(0, Math.min(left, text.length()));
        } else if (isCut) {
            numbers.subList(Math.min(left, numbers.size()), numbers.size()).clear();
        }
        return new ParameterRecord(
                e.id(), e.name(), e.isLocked(), e.description(), p.width(), dimensions, numbers, text);
    }

    private static List<Integer> cut(C3dParameter p, int stored) {
        int first = p.dimensions().isEmpty() ? 0 : p.dimensions().get(0);
        if (p.dimensions().size() < 2 || (!p.isText() && stored < Math.max(1, first))) {
            return List.of(Math.min(stored, LONGEST));
        }
        return List.of(first, first == 0 ? 0 : Math.min(stored / first, LONGEST));
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

    /** Bytes from the link word on: link, value, description. */
    int bytesAfterName() {
        int value = width == 0 ? 0 : 2 + dimensions.size() + (width < 0 ? text.length() : width * numbers.size());
        return 2 + value + 1 + description.length();
    }
}
