package org.solewright.app.report;

import java.util.Locale;

/** Two straight axes of a drawing: places, ticks and their words. */
final class Axes {

    private static final int TICKS = 6;

    private final Drawing drawing;
    private final double left;
    private final double top;
    private final double right;
    private final double bottom;
    private double lowX;
    private double highX;
    private double lowY;
    private double highY;

    Axes(Drawing drawing, double left, double top, double right, double bottom) {
        this.drawing = drawing;
        this.left = left;
        this.top = top;
        this.right = right;
        this.bottom = bottom;
    }

    Axes x(double low, double high) {
        lowX = low;
        highX = high > low ? high : low + 1;
        return this;
    }

    Axes y(double low, double high) {
        lowY = low;
        highY = high > low ? high : low + 1;
        return this;
    }

    double px(double x) {
        return left + (right - left) * (x - lowX) / (highX - lowX);
    }

    double py(double y) {
        return bottom - (bottom - top) * (y - lowY) / (highY - lowY);
    }

    double left() {
        return left;
    }

    double right() {
        return right;
    }

    double top() {
        return top;
    }

    double bottom() {
        return bottom;
    }

    /** Grid, numbers and names of the axes; zero is drawn stronger. */
    void draw(String nameX, String nameY) {
        double stepX = step(highX - lowX, TICKS);
        for (double x = Math.ceil(lowX / stepX - 1e-9) * stepX; x <= highX + 1e-9 * stepX; x += stepX) {
            drawing.segment(px(x), top, px(x), bottom, Drawing.GRID, 1, "");
            drawing.text(px(x), bottom + 17, "middle", tick(x, stepX), Drawing.GREY);
        }
        double stepY = step(highY - lowY, TICKS);
        for (double y = Math.ceil(lowY / stepY - 1e-9) * stepY; y <= highY + 1e-9 * stepY; y += stepY) {
            boolean isZero = Math.abs(y) < 1e-9 * stepY;
            drawing.segment(left, py(y), right, py(y), isZero ? Drawing.GREY : Drawing.GRID, 1, "");
            drawing.text(left - 7, py(y) + 4, "end", tick(y, stepY), Drawing.GREY);
        }
        drawing.text((left + right) / 2, bottom + 36, "middle", nameX, Drawing.INK);
        drawing.text(left - 7, top - 12, "start", nameY, Drawing.INK);
    }

    static double step(double span, int ticks) {
        double raw = span / ticks;
        double power = Math.pow(10, Math.floor(Math.log10(raw)));
        double share = raw / power;
        return power * (share <= 1 ? 1 : share <= 2 ? 2 : share <= 5 ? 5 : 10);
    }

    private static String tick(double value, double step) {
        int digits = Math.max(0, (int) -Math.floor(Math.log10(step) + 1e-9));
        String text = String.format(Locale.ROOT, "%." + digits + "f", Math.abs(value) < step * 1e-9 ? 0 : value);
        return text.replace("-", Words.MINUS);
    }

    /** A line through points; lost ones part it. */
    String path(double[] x, double[] y) {
        StringBuilder d = new StringBuilder();
        boolean isDown = false;
        for (int i = 0; i < x.length; i++) {
            if (Double.isFinite(x[i]) && Double.isFinite(y[i])) {
                d.append(isDown ? 'L' : 'M')
                        .append(Drawing.number(px(x[i])))
                        .append(' ')
                        .append(Drawing.number(py(y[i])));
                isDown = true;
            } else {
                isDown = false;
            }
        }
        return d.toString();
    }

    /** The area between points and zero. */
    String area(double[] x, double[] y) {
        return path(x, y) + "L" + Drawing.number(px(x[x.length - 1])) + " " + Drawing.number(py(0)) + "L"
                + Drawing.number(px(x[0])) + " " + Drawing.number(py(0)) + "z";
    }
}
