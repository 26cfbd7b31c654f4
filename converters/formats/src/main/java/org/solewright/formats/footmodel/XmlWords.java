package org.solewright.formats.footmodel;

import java.util.Arrays;
import java.util.Objects;
import java.util.OptionalDouble;
import java.util.function.DoubleConsumer;
import java.util.function.Function;
import org.jspecify.annotations.Nullable;

/** Small turns between what stands in XML and domain values. */
final class XmlWords {

    private XmlWords() {}

    /**
     * The constant that has this word; the schema has let no other word pass.
     *
     * @throws IllegalStateException where schema and domain do not agree
     */
    static <E> E find(E[] constants, Function<E, String> word, String text) {
        return Arrays.stream(constants)
                .filter(c -> word.apply(c).equals(text))
                .findFirst()
                .orElseThrow(() -> new IllegalStateException("the schema lets '" + text + "' pass, the domain not"));
    }

    static OptionalDouble optional(@Nullable Double value) {
        return value == null ? OptionalDouble.empty() : OptionalDouble.of(Objects.requireNonNull(value));
    }

    /** Sets an attribute where there is a finite number, such as not for the radius's deviation of a flat arc. */
    static void put(OptionalDouble value, DoubleConsumer setter) {
        if (value.isPresent() && Double.isFinite(value.getAsDouble())) {
            setter.accept(value.getAsDouble());
        }
    }

    /**
     * Text that XML can carry: characters it forbids become U+FFFD [XML 1.0, 2.2].
     *
     * @param text any
     * @return the same where nothing is forbidden
     */
    static String legal(String text) {
        StringBuilder out = new StringBuilder(text.length());
        text.codePoints().forEach(c -> out.appendCodePoint(isLegal(c) ? c : 0xFFFD));
        return out.toString();
    }

    private static boolean isLegal(int c) {
        return c == '\t' || c == '\n' || (c >= 0x20 && c <= 0xD7FF) || (c >= 0xE000 && c <= 0xFFFD) || c >= 0x10000;
    }
}
