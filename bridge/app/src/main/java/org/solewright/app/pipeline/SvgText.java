package org.solewright.app.pipeline;

import java.util.Locale;

/** The lines of a picture. */
final class SvgText {

    private final StringBuilder svg = new StringBuilder();

    void line(String text) {
        svg.append(text).append('\n');
    }

    void text(double x, double y, String anchor, String content, String more) {
        line("<text x=\"" + number(x) + "\" y=\"" + number(y) + "\" text-anchor=\"" + anchor + "\"" + more + ">"
                + content + "</text>");
    }

    /** Four significant decimals are finer than a pixel and than a reader needs. */
    static String number(double value) {
        String text = String.format(Locale.ROOT, "%.4f", value).replaceAll("\\.?0+$", "");
        return text.equals("-0") ? "0" : text;
    }

    @Override
    public String toString() {
        return svg.toString();
    }
}
