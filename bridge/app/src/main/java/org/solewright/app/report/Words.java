package org.solewright.app.report;

import java.util.Locale;
import java.util.OptionalDouble;
import java.util.regex.Pattern;

/** Numbers and sentences as they are printed: U+2212 for minus, a plus-minus sign, no more digits than the SD bears. */
final class Words {

    static final String MINUS = "\u2212";
    /** What stands where there is no number. */
    static final String NONE = "\u2013";

    private static final Pattern MINUS_NUMBER = Pattern.compile("(?<![\\w.-])-(?=\\d)");
    private static final int MOST_DIGITS = 4;

    private Words() {}

    /** A number with a fixed count of decimals. */
    static String number(double value, int digits) {
        if (!Double.isFinite(value)) {
            return NONE;
        }
        String text = String.format(Locale.ROOT, "%." + digits + "f", value);
        return text.startsWith("-") ? (isZero(text) ? text.substring(1) : MINUS + text.substring(1)) : text;
    }

    private static boolean isZero(String text) {
        return text.chars().allMatch(c -> c == '-' || c == '0' || c == '.');
    }

    static String number(OptionalDouble value, int digits) {
        return value.isPresent() ? number(value.getAsDouble(), digits) : NONE;
    }

    /** Decimals that an SD bears: two of its figures where it begins with 1, else one. */
    static int digits(double sd) {
        if (!(sd > 0)) {
            return MOST_DIGITS;
        }
        int exponent = (int) Math.floor(Math.log10(sd));
        double lead = sd / Math.pow(10, exponent);
        int figures = lead < 1.95 ? 2 : 1;
        return Math.max(0, Math.min(MOST_DIGITS, figures - 1 - exponent));
    }

    /** A value with its SD, both rounded to what the SD bears; without an SD to the given decimals. */
    static String withSd(double value, OptionalDouble sd, int digits) {
        if (sd.isEmpty() || !(sd.getAsDouble() > 0) || !Double.isFinite(value)) {
            return number(value, digits);
        }
        int d = digits(sd.getAsDouble());
        return number(value, d) + " \u00b1 " + number(sd.getAsDouble(), d);
    }

    /** A sentence of ours with typographic minus and plus-minus signs. */
    static String typeset(String sentence) {
        return MINUS_NUMBER.matcher(sentence.replace("+-", "\u00b1")).replaceAll(MINUS);
    }

    /** Text in an attribute or element of XML. */
    static String escaped(String text) {
        return text.replace("&", "&amp;")
                .replace("<", "&lt;")
                .replace(">", "&gt;")
                .replace("\"", "&quot;");
    }

    /** With a capital. */
    static String capital(String word) {
        return word.isEmpty() ? word : word.substring(0, 1).toUpperCase(Locale.ROOT) + word.substring(1);
    }

    /** Words joined as in a sentence. */
    static String list(java.util.List<String> words) {
        if (words.size() < 2) {
            return String.join("", words);
        }
        return String.join(", ", words.subList(0, words.size() - 1)) + " and " + words.get(words.size() - 1);
    }
}
