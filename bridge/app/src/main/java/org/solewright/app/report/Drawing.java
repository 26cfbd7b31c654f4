package org.solewright.app.report;

import java.util.Locale;

/** The lines of a drawing. Styles are attributes: the page's policy forbids inline styles, and paper has no style sheet. */
final class Drawing {

    /** Colours that keep 4.5:1 on white; none carries a meaning alone, dash and label say the same. */
    static final String INK = "#1b2428";

    static final String GREY = "#566168";
    static final String GRID = "#dde3e5";
    static final String FIRST = "#0b5d66";
    static final String SECOND = "#a03a12";
    static final String THIRD = "#6a3b83";
    static final String FOURTH = "#5b6200";

    private final StringBuilder svg = new StringBuilder();
    private final double width;
    private final double height;

    /** A drawing of a size, with the words that stand for it where it is not seen. */
    Drawing(String id, double width, double height, String title, String description) {
        this.width = width;
        this.height = height;
        line("<svg xmlns=\"http://www.w3.org/2000/svg\" viewBox=\"0 0 " + number(width) + " " + number(height)
                + "\" width=\"" + number(width) + "\" height=\"" + number(height)
                + "\" role=\"img\" aria-labelledby=\"" + id + "-title " + id
                + "-desc\" font-family=\"Liberation Sans, Arimo, Helvetica, Arial, sans-serif\" font-size=\"13\" fill=\""
                + INK + "\">");
        line("<title id=\"" + id + "-title\">" + Words.escaped(title) + "</title>");
        line("<desc id=\"" + id + "-desc\">" + Words.escaped(description) + "</desc>");
    }

    double width() {
        return width;
    }

    double height() {
        return height;
    }

    void line(String text) {
        svg.append(text).append('\n');
    }

    void path(String d, String stroke, double strokeWidth, String dash) {
        line("<path d=\"" + d + "\" fill=\"none\" stroke=\"" + stroke + "\" stroke-width=\"" + number(strokeWidth)
                + "\" stroke-linejoin=\"round\" stroke-linecap=\"round\""
                + (dash.isEmpty() ? "" : " stroke-dasharray=\"" + dash + "\"") + "/>");
    }

    void area(String d, String fill, double opacity) {
        line("<path d=\"" + d + "\" fill=\"" + fill + "\" fill-opacity=\"" + number(opacity) + "\" stroke=\"none\"/>");
    }

    void circle(double x, double y, double r, String fill, String stroke) {
        line("<circle cx=\"" + number(x) + "\" cy=\"" + number(y) + "\" r=\"" + number(r) + "\" fill=\"" + fill
                + "\" stroke=\"" + stroke + "\" stroke-width=\"2\"/>");
    }

    /** A filled square stood on its corner. */
    void diamond(double x, double y, double r, String fill) {
        line("<path d=\"M" + number(x) + " " + number(y - r) + "l" + number(r) + " " + number(r) + "l" + number(-r)
                + " " + number(r) + "l" + number(-r) + " " + number(-r) + "z\" fill=\"" + fill + "\"/>");
    }

    void segment(double x1, double y1, double x2, double y2, String stroke, double strokeWidth, String dash) {
        path("M" + number(x1) + " " + number(y1) + "L" + number(x2) + " " + number(y2), stroke, strokeWidth, dash);
    }

    /** An arrow head at the second of two places. */
    void head(double x1, double y1, double x2, double y2, String fill) {
        double length = Math.hypot(x2 - x1, y2 - y1);
        if (!(length > 0)) {
            return;
        }
        double ux = (x2 - x1) / length;
        double uy = (y2 - y1) / length;
        line("<path d=\"M" + number(x2) + " " + number(y2) + "L" + number(x2 - 9 * ux + 4 * uy) + " "
                + number(y2 - 9 * uy - 4 * ux) + "L" + number(x2 - 9 * ux - 4 * uy) + " " + number(y2 - 9 * uy + 4 * ux)
                + "z\" fill=\"" + fill + "\"/>");
    }

    void text(double x, double y, String anchor, String content, String fill) {
        text(x, y, anchor, content, fill, "");
    }

    void text(double x, double y, String anchor, String content, String fill, String more) {
        line("<text x=\"" + number(x) + "\" y=\"" + number(y) + "\" text-anchor=\"" + anchor + "\" fill=\"" + fill
                + "\"" + more + ">" + Words.escaped(content) + "</text>");
    }

    /** A box that a drawing's inner part does not leave. */
    void clip(String id, double left, double top, double right, double bottom) {
        line("<clipPath id=\"" + id + "\"><rect x=\"" + number(left) + "\" y=\"" + number(top) + "\" width=\""
                + number(right - left) + "\" height=\"" + number(bottom - top) + "\"/></clipPath>");
    }

    /** A hundredth of a pixel is finer than any screen. */
    static String number(double value) {
        String text = String.format(Locale.ROOT, "%.2f", value);
        int end = text.length();
        while (text.charAt(end - 1) == '0') {
            end--;
        }
        if (text.charAt(end - 1) == '.') {
            end--;
        }
        text = text.substring(0, end);
        return text.equals("-0") ? "0" : text;
    }

    String svg() {
        return svg + "</svg>\n";
    }
}
