package org.solewright.formats.c3d;

import java.util.ArrayList;
import java.util.List;

/**
 * One parameter of a C3D file: numbers or text with their shape.
 *
 * <p>Numbers are kept as doubles whatever their width in the file, integers signed; {@link #unsigned(int)} reads a 16-bit
 * one without its sign.
 */
public final class C3dParameter {

    private final String group;
    private final String name;
    private final int width;
    private final List<Integer> dimensions;
    private final double[] numbers;
    private final List<String> texts;
    private final String storedText;

    /**
     * A parameter.
     *
     * @param group upper case
     * @param name upper case
     * @param width bytes of a number, -1 for characters
     * @param dimensions as stored
     * @param numbers values; empty for text
     * @param texts lines; empty for numbers
     * @param storedText all characters as stored, a byte each; empty for numbers
     */
    C3dParameter(
            String group,
            String name,
            int width,
            List<Integer> dimensions,
            double[] numbers,
            List<String> texts,
            String storedText) {
        this.group = group;
        this.name = name;
        this.width = width;
        this.dimensions = List.copyOf(dimensions);
        this.numbers = numbers;
        this.texts = List.copyOf(texts);
        this.storedText = storedText;
    }

    /** Bytes of a number, -1 for characters. */
    int width() {
        return width;
    }

    /** All characters as stored, a byte each. */
    String storedText() {
        return storedText;
    }

    /** Bytes that the values take in the file. */
    int storedBytes() {
        return isText() ? storedText.length() : numbers.length * width;
    }

    /**
     * Name of the group, upper case.
     *
     * @return such as {@code POINT}
     */
    public String group() {
        return group;
    }

    /**
     * Name within the group, upper case.
     *
     * @return such as {@code RATE}
     */
    public String name() {
        return name;
    }

    /**
     * Shape as stored, first dimension fastest; empty for a scalar.
     *
     * @return dimensions
     */
    public List<Integer> dimensions() {
        return dimensions;
    }

    /**
     * Whether it holds text.
     *
     * @return true for characters
     */
    public boolean isText() {
        return width == -1;
    }

    /**
     * Number of values: numbers, or lines of text.
     *
     * @return zero or more
     */
    public int count() {
        return isText() ? texts.size() : numbers.length;
    }

    /**
     * A number.
     *
     * @param index zero-based in stored order
     * @return its value; NaN beyond the last and for text
     */
    public double number(int index) {
        return index < 0 || index >= numbers.length ? Double.NaN : numbers[index];
    }

    /**
     * A number that counts: a 16-bit integer without its sign.
     *
     * @param index zero-based in stored order
     * @return its value; NaN beyond the last and for text
     */
    public double unsigned(int index) {
        double v = number(index);
        return width == 2 && v < 0 ? v + 65536 : v;
    }

    /**
     * A line of text.
     *
     * @param index zero-based
     * @return without trailing blanks; empty beyond the last and for numbers
     */
    public String text(int index) {
        return index < 0 || index >= texts.size() ? "" : texts.get(index);
    }

    /**
     * All lines of text.
     *
     * @return without trailing blanks
     */
    public List<String> texts() {
        return texts;
    }

    /**
     * The values of several parameters one after the other.
     *
     * @param parts LABELS, LABELS2, ...
     * @return all lines
     */
    static List<String> joined(List<C3dParameter> parts) {
        List<String> all = new ArrayList<>();
        parts.forEach(p -> all.addAll(p.texts()));
        return all;
    }
}
