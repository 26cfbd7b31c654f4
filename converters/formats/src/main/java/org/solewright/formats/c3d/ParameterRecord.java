package org.solewright.formats.c3d;

import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.Arrays;
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
        // A value that was cut has the shape of what is left.
        List<Integer> dimensions = shape == stored ? p.dimensions() : cut(p, stored);
        return new ParameterRecord(
                e.id(), e.name(), e.isLocked(), e.description(), p.width(), dimensions, numbers, p.storedText());
    }

    private static List<Integer> cut(C3dParameter p, int stored) {
        if (p.dimensions().size() < 2 || stored < p.dimensions().get(0)) {
            return List.of(Math.min(stored, LONGEST));
        }
        return List.of(p.dimensions().get(0), Math.min(stored / p.dimensions().get(0), LONGEST));
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

    /** Lines of text in UTF-8, padded to the longest, at most 255 of them. */
    static ParameterRecord texts(int id, String name, String description, List<String> lines) {
        int width = 1;
        List<String> bytes = new ArrayList<>();
        for (String line : lines) {
            String latin = new String(line.getBytes(StandardCharsets.UTF_8), StandardCharsets.ISO_8859_1);
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
