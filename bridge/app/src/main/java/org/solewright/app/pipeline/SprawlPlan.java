package org.solewright.app.pipeline;

import java.util.Locale;
import org.solewright.analysis.dynamics.ToePolyline;

/**
 * A sprawled limb from above: left the world with hip path, knee track and femur, right the toe curve on the foot with its
 * segments. Lines differ by dashes and marks, so that the picture is read without colour.
 */
final class SprawlPlan {

    private static final double TOP = 80;
    private static final double HEIGHT = 330;
    private static final double WIDTH = 380;
    private static final double LEFT = 40;
    private static final double GAP = 40;
    /** Colours that stay apart for the colour-blind [Okabe & Ito 2008]. */
    private static final String BLUE = "#0072b2";

    private static final String RED = "#d55e00";

    private final Sprawl.Drawn drawn;
    private final SvgText svg = new SvgText();

    private SprawlPlan(Sprawl.Drawn drawn) {
        this.drawn = drawn;
    }

    static String of(Sprawl.Drawn drawn) {
        return new SprawlPlan(drawn).draw();
    }

    /** Metres to the page, the same scale both ways, x to the right and y up. */
    private record Scale(double perMetre, double left, double bottom, double x0, double y0) {
        static Scale of(double[] x, double[] y, double left) {
            double width = Math.max(1e-9, x[1] - x[0]);
            double height = Math.max(1e-9, y[1] - y[0]);
            double per = Math.min(WIDTH / width, HEIGHT / height);
            return new Scale(
                    per, left + (WIDTH - per * width) / 2, TOP + HEIGHT - (HEIGHT - per * height) / 2, x[0], y[0]);
        }

        String at(double x, double y) {
            return SvgText.number(px(x)) + " " + SvgText.number(py(y));
        }

        double px(double x) {
            return left + perMetre * (x - x0);
        }

        double py(double y) {
            return bottom - perMetre * (y - y0);
        }
    }

    private String draw() {
        Sprawl.Request r = drawn.request();
        svg.line("<svg xmlns=\"http://www.w3.org/2000/svg\" viewBox=\"0 0 880 520\" width=\"880\" height=\"520\""
                + " role=\"img\" aria-labelledby=\"title desc\" font-family=\"sans-serif\" font-size=\"13\">");
        svg.line("<title id=\"title\">Sprawled limb from above</title>");
        svg.line("<desc id=\"desc\">Hip path, knee track and femur on the ground; toe curve on the foot with "
                + r.segments() + " segments. All numbers stand in the tables beside the picture.</desc>");
        svg.line("<rect width=\"880\" height=\"520\" fill=\"#ffffff\"/>");
        svg.text(LEFT, 26, "start", "Sprawled limb from above", " font-size=\"16\" font-weight=\"bold\"");
        svg.text(
                LEFT,
                46,
                "start",
                String.format(
                        Locale.ROOT,
                        "femur %s m, hip at %s m, sphere of %s m, %s m/s, protraction %.1f degrees, stance %s s",
                        r.femur(),
                        r.hipHeight(),
                        r.sphereRadius(),
                        r.speed(),
                        Math.toDegrees(r.protraction()),
                        r.stanceTime()),
                " fill=\"#333333\"");
        world();
        foot();
        svg.line("</svg>");
        return svg.toString();
    }

    private void world() {
        Sprawl.Request r = drawn.request();
        double[] x = {0, r.speed() * r.stanceTime()};
        double[] y = {0, 0};
        for (int i = 0; i < Sprawl.SAMPLES; i++) {
            double t = Sprawl.time(r, i);
            widen(x, Sprawl.kneeX(drawn, t));
            widen(y, drawn.limb().kneeY(t));
        }
        Scale s = Scale.of(x, y, LEFT);
        svg.text(LEFT, 70, "start", "on the ground: x forward, y to the limb's side", "");
        svg.line("<path d=\"M" + s.at(0, 0) + "L" + s.at(r.speed() * r.stanceTime(), 0)
                + "\" fill=\"none\" stroke=\"#000000\" stroke-dasharray=\"3 3\"/>");
        for (int k = 0; k <= 2; k++) {
            double t = r.stanceTime() * k / 2;
            double kneeX = Sprawl.kneeX(drawn, t);
            double kneeY = drawn.limb().kneeY(t);
            svg.line("<path d=\"M" + s.at(r.speed() * t, 0) + "L" + s.at(kneeX, kneeY)
                    + "\" stroke=\"#888888\" stroke-width=\"1.5\"/>");
            dot(s, r.speed() * t, 0, "#000000", "#000000");
            dot(s, kneeX, kneeY, BLUE, k == 0 ? "#ffffff" : BLUE);
        }
        StringBuilder d = new StringBuilder();
        for (int i = 0; i < Sprawl.SAMPLES; i++) {
            double t = Sprawl.time(r, i);
            d.append(i == 0 ? "M" : "L")
                    .append(s.at(Sprawl.kneeX(drawn, t), drawn.limb().kneeY(t)));
        }
        svg.line("<path d=\"" + d + "\" fill=\"none\" stroke=\"" + BLUE + "\" stroke-width=\"2\"/>");
        bar(s, LEFT);
        key(LEFT, 462, "#000000", " stroke-dasharray=\"3 3\"", "path of the hip");
        key(LEFT + 140, 462, BLUE, " stroke-width=\"2\"", "track of knee and ground contact");
        key(LEFT, 482, "#888888", "", "femur at start (ring), middle and end of the stance");
    }

    private void foot() {
        double left = LEFT + WIDTH + GAP;
        double[] x = {drawn.toe().at(0, 0), drawn.toe().at(0, 0)};
        double[] y = {drawn.toe().at(0, 1), drawn.toe().at(0, 1)};
        StringBuilder d = new StringBuilder();
        for (int i = 0; i < Sprawl.SAMPLES; i++) {
            widen(x, drawn.toe().at(i, 0));
            widen(y, drawn.toe().at(i, 1));
        }
        Scale s = Scale.of(x, y, left);
        for (int i = 0; i < Sprawl.SAMPLES; i++) {
            d.append(i == 0 ? "M" : "L")
                    .append(s.at(drawn.toe().at(i, 0), drawn.toe().at(i, 1)));
        }
        svg.text(left, 70, "start", "on the foot, in its frame at the start of the stance", "");
        svg.line("<path d=\"" + d + "\" fill=\"none\" stroke=\"" + BLUE + "\" stroke-width=\"2\"/>");
        polyline(s, drawn.equal(), "#000000", " stroke-dasharray=\"3 3\"");
        polyline(s, drawn.minimax(), RED, " stroke-dasharray=\"9 4\"");
        dot(s, drawn.toe().at(0, 0), drawn.toe().at(0, 1), BLUE, "#ffffff");
        bar(s, left);
        key(left, 462, BLUE, " stroke-width=\"2\"", "toe curve (ring: start)");
        key(left, 482, "#000000", " stroke-dasharray=\"3 3\"", "equal arcs, off by " + millimetres(drawn.equal()));
        key(left, 502, RED, " stroke-dasharray=\"9 4\"", "best nodes, off by " + millimetres(drawn.minimax()));
    }

    private static String millimetres(ToePolyline line) {
        return String.format(Locale.ROOT, "%.2f mm", 1000 * line.deviation());
    }

    private void polyline(Scale s, ToePolyline line, String colour, String dash) {
        StringBuilder d = new StringBuilder();
        for (int node : line.nodes()) {
            double x = drawn.toe().at(node, 0);
            double y = drawn.toe().at(node, 1);
            d.append(d.length() == 0 ? "M" : "L").append(s.at(x, y));
            dot(s, x, y, colour, colour);
        }
        svg.line("<path d=\"" + d + "\" fill=\"none\" stroke=\"" + colour + "\" stroke-width=\"1.5\"" + dash + "/>");
    }

    private static void widen(double[] range, double value) {
        range[0] = Math.min(range[0], value);
        range[1] = Math.max(range[1], value);
    }

    private void dot(Scale s, double x, double y, String stroke, String fill) {
        svg.line("<circle cx=\"" + SvgText.number(s.px(x)) + "\" cy=\"" + SvgText.number(s.py(y)) + "\" r=\"4\" fill=\""
                + fill + "\" stroke=\"" + stroke + "\" stroke-width=\"1.5\"/>");
    }

    private void key(double x, double y, String colour, String more, String name) {
        svg.line("<path d=\"M" + SvgText.number(x) + " " + SvgText.number(y - 4) + "h24\" fill=\"none\" stroke=\""
                + colour + "\"" + more + "/>");
        svg.text(x + 30, y, "start", name, "");
    }

    /** A bar of 1, 2 or 5 times a power of ten, at most a third of the panel long. */
    private void bar(Scale s, double left) {
        double most = WIDTH / 3 / s.perMetre();
        double power = Math.pow(10, Math.floor(Math.log10(most)));
        double length = power * (most / power >= 5 ? 5 : most / power >= 2 ? 2 : 1);
        svg.line("<path d=\"M" + SvgText.number(left) + " 432v6h" + SvgText.number(length * s.perMetre())
                + "v-6\" fill=\"none\" stroke=\"#000000\"/>");
        String name = length >= 1 ? SvgText.number(length) + " m" : SvgText.number(1000 * length) + " mm";
        svg.text(left + length * s.perMetre() + 8, 440, "start", name, "");
    }
}
