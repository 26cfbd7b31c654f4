package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import org.solewright.domain.cost.LandscapeRow;

/**
 * A landscape as a picture: work per step against step length over limb length, one curve per number of segments. Curves
 * differ by dashes and bear their names, so that the picture is read without colour; crossings of the compass are marked.
 */
final class LandscapePlot {

    private static final double LEFT = 70;
    private static final double RIGHT = 640;
    private static final double TOP = 64;
    private static final double BOTTOM = 460;
    private static final double LABEL_GAP = 15;
    private static final int TICKS = 6;

    /** Dark colours of different lightness that stay apart for the colour-blind [Okabe & Ito 2008]. */
    private static final String[] COLOURS = {"#000000", "#0072b2", "#d55e00", "#009e73", "#7a4a8c", "#8a6d00", "#444444"
    };

    private static final String[] DASHES = {"", "9 4", "3 3", "12 3 3 3", "2 5", "16 5", "9 3 2 3 2 3"};

    private final List<Curve> curves;
    private final double lastX;
    private final double firstX;
    private final double greatest;
    private final StringBuilder svg = new StringBuilder();

    private LandscapePlot(List<Curve> curves) {
        this.curves = curves;
        this.firstX = 0;
        this.lastX =
                curves.stream().mapToDouble(c -> c.x(c.rows.size() - 1)).max().orElse(1);
        // Curves that shoot up at the end of the reach would press the others flat.
        double most = curves.stream().mapToDouble(Curve::greatest).max().orElse(1);
        double least = curves.stream().mapToDouble(Curve::greatest).min().orElse(1);
        this.greatest = Math.max(Double.MIN_NORMAL, Math.min(most, Math.max(3 * least, most / 3)));
    }

    /** Points of one foot that have a work. */
    private record Curve(int segments, List<LandscapeRow> rows) {
        double x(int i) {
            return rows.get(i).stepLength() / rows.get(i).leg();
        }

        double work(int i) {
            return rows.get(i).workPerStep().orElse(0);
        }

        double greatest() {
            double most = 0;
            for (int i = 0; i < rows.size(); i++) {
                most = Math.max(most, work(i));
            }
            return most;
        }

        String name() {
            return segments == 0 ? "point foot" : segments + (segments == 1 ? " segment" : " segments");
        }
    }

    /**
     * The picture.
     *
     * @param rows of one rule, speed and form of the work
     * @return SVG; the same rows give the same text
     */
    static String of(List<LandscapeRow> rows) {
        List<Curve> curves = new ArrayList<>();
        rows.stream().mapToInt(LandscapeRow::segments).distinct().sorted().forEach(n -> {
            List<LandscapeRow> of = rows.stream()
                    .filter(r -> r.segments() == n && r.workPerStep().isPresent())
                    .sorted(Comparator.comparingDouble(LandscapeRow::stepLength))
                    .toList();
            if (!of.isEmpty()) {
                curves.add(new Curve(n, of));
            }
        });
        return new LandscapePlot(curves).draw(rows);
    }

    private String draw(List<LandscapeRow> all) {
        String about = all.isEmpty()
                ? "no rows"
                : all.get(0).footRule().word() + " foot, "
                        + all.get(0).workForm().word() + " work, "
                        + number(all.get(0).speed()) + " m/s before each transition, limb "
                        + number(all.get(0).leg()) + " m";
        line("<svg xmlns=\"http://www.w3.org/2000/svg\" viewBox=\"0 0 760 520\" width=\"760\" height=\"520\""
                + " role=\"img\" aria-labelledby=\"title desc\" font-family=\"sans-serif\" font-size=\"13\">");
        line("<title id=\"title\">Work per step against step length over limb length</title>");
        line("<desc id=\"desc\">" + about + ". " + description() + "</desc>");
        line("<rect width=\"760\" height=\"520\" fill=\"#ffffff\"/>");
        text(LEFT, 26, "start", "Work per step by number of foot segments", " font-size=\"16\" font-weight=\"bold\"");
        text(LEFT, 46, "start", about, " fill=\"#333333\"");
        axes();
        line("<clipPath id=\"frame\"><rect x=\"" + number(LEFT) + "\" y=\"" + number(TOP) + "\" width=\""
                + number(RIGHT - LEFT) + "\" height=\"" + number(BOTTOM - TOP) + "\"/></clipPath>");
        for (int i = 0; i < curves.size(); i++) {
            curve(curves.get(i), i);
        }
        for (int i = 0; i < curves.size(); i++) {
            crossing(curves.get(i), i);
        }
        labels();
        line("</svg>");
        return svg.toString();
    }

    private String description() {
        StringBuilder text = new StringBuilder();
        for (Curve curve : curves) {
            LandscapeRow last = curve.rows.get(curve.rows.size() - 1);
            text.append(curve.name())
                    .append(": ")
                    .append(number(last.workPerStep().orElse(0)))
                    .append(" J at ")
                    .append(number(last.stepLength() / last.leg()));
            if (last.crossover().isPresent()) {
                text.append(", costs what the point foot does at ")
                        .append(number(last.crossover().getAsDouble() / last.leg()));
            }
            text.append(". ");
        }
        return text.append("All numbers stand in the table beside the picture.").toString();
    }

    private void axes() {
        double stepX = tick(lastX - firstX);
        for (int i = 0; i * stepX <= lastX * (1 + 1e-9); i++) {
            double x = px(i * stepX);
            rule(x, TOP, x, BOTTOM);
            text(x, BOTTOM + 19, "middle", number(i * stepX), "");
        }
        double stepY = tick(greatest);
        for (int i = 0; i * stepY <= greatest * (1 + 1e-9); i++) {
            double y = py(i * stepY);
            rule(LEFT, y, RIGHT, y);
            text(LEFT - 8, y + 4, "end", number(i * stepY), "");
        }
        line("<path d=\"M" + number(LEFT) + " " + number(TOP) + "V" + number(BOTTOM) + "H" + number(RIGHT)
                + "\" fill=\"none\" stroke=\"#000000\"/>");
        text((LEFT + RIGHT) / 2, BOTTOM + 42, "middle", "step length / limb length", "");
        text(
                0,
                0,
                "middle",
                "work per step (J)",
                " transform=\"translate(20 " + number((TOP + BOTTOM) / 2) + ") rotate(-90)\"");
    }

    private static double tick(double span) {
        double raw = span / TICKS;
        double power = Math.pow(10, Math.floor(Math.log10(raw)));
        double share = raw / power;
        return power * (share <= 1 ? 1 : share <= 2 ? 2 : share <= 5 ? 5 : 10);
    }

    private void curve(Curve curve, int place) {
        StringBuilder d = new StringBuilder();
        for (int i = 0; i < curve.rows.size(); i++) {
            d.append(i == 0 ? "M" : "L")
                    .append(number(px(curve.x(i))))
                    .append(' ')
                    .append(number(py(curve.work(i))));
        }
        line("<path d=\"" + d + "\" fill=\"none\" clip-path=\"url(#frame)\" stroke=\"" + colour(place)
                + "\" stroke-width=\"2\"" + dash(place) + "/>");
    }

    /** A ring where the curve meets that of the point foot. */
    private void crossing(Curve curve, int place) {
        LandscapeRow any = curve.rows.get(0);
        if (any.crossover().isEmpty()) {
            return;
        }
        double at = any.crossover().getAsDouble() / any.leg();
        for (int i = 1; i < curve.rows.size(); i++) {
            if (curve.x(i - 1) <= at && at <= curve.x(i)) {
                double share = (at - curve.x(i - 1)) / (curve.x(i) - curve.x(i - 1));
                double work = curve.work(i - 1) + share * (curve.work(i) - curve.work(i - 1));
                if (work <= greatest) {
                    line("<circle cx=\"" + number(px(at)) + "\" cy=\"" + number(py(work))
                            + "\" r=\"5\" fill=\"#ffffff\" stroke=\"" + colour(place) + "\" stroke-width=\"2\"><title>"
                            + curve.name() + ": crossover at " + number(at) + " limb lengths</title></circle>");
                }
                return;
            }
        }
    }

    /** Names at the ends of the curves, moved apart. */
    private void labels() {
        record Label(int place, double x, double y) {}
        List<Label> labels = new ArrayList<>();
        for (int i = 0; i < curves.size(); i++) {
            Curve curve = curves.get(i);
            int last = curve.rows.size() - 1;
            labels.add(new Label(i, px(curve.x(last)), Math.max(TOP, py(curve.work(last)))));
        }
        labels.sort(Comparator.comparingDouble(Label::y));
        double[] y = new double[labels.size()];
        for (int i = 0; i < y.length; i++) {
            y[i] = Math.max(labels.get(i).y(), i == 0 ? TOP : y[i - 1] + LABEL_GAP);
        }
        for (int i = y.length - 1; i >= 0; i--) {
            y[i] = Math.min(y[i], i == y.length - 1 ? BOTTOM : y[i + 1] - LABEL_GAP);
        }
        for (int i = 0; i < y.length; i++) {
            int place = labels.get(i).place();
            line("<path d=\"M" + number(labels.get(i).x()) + " "
                    + number(labels.get(i).y()) + "L" + number(RIGHT + 8) + " " + number(y[i])
                    + "h28\" fill=\"none\" stroke=\"" + colour(place) + "\"" + dash(place) + "/>");
            text(RIGHT + 40, y[i] + 4, "start", curves.get(place).name(), " fill=\"" + colour(place) + "\"");
        }
        if (curves.stream().anyMatch(c -> c.rows.get(0).crossover().isPresent())) {
            text(RIGHT, BOTTOM + 42, "end", "ring: costs what the point foot does", " fill=\"#333333\"");
        }
    }

    private static String colour(int place) {
        return COLOURS[place % COLOURS.length];
    }

    private static String dash(int place) {
        String dash = DASHES[place % DASHES.length];
        return dash.isEmpty() ? "" : " stroke-dasharray=\"" + dash + "\"";
    }

    private double px(double x) {
        return LEFT + (RIGHT - LEFT) * (x - firstX) / (lastX - firstX);
    }

    private double py(double work) {
        return BOTTOM - (BOTTOM - TOP) * work / greatest;
    }

    private void rule(double x1, double y1, double x2, double y2) {
        line("<path d=\"M" + number(x1) + " " + number(y1) + "L" + number(x2) + " " + number(y2)
                + "\" stroke=\"#dddddd\"/>");
    }

    private void text(double x, double y, String anchor, String content, String more) {
        line("<text x=\"" + number(x) + "\" y=\"" + number(y) + "\" text-anchor=\"" + anchor + "\"" + more + ">"
                + content + "</text>");
    }

    private void line(String text) {
        svg.append(text).append('\n');
    }

    /** Four significant decimals are finer than a pixel and than a reader needs. */
    private static String number(double value) {
        String text = String.format(Locale.ROOT, "%.4f", value);
        return text.replaceAll("\\.?0+$", "");
    }
}
