package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import org.solewright.domain.cost.LandscapeRow;

/**
 * A landscape as a picture: work per step against step length over limb length, one curve per number of segments. Curves
 * differ by dashes and bear their names, so that the picture is read without colour; crossings of the compass are marked.
 */
final class LandscapePlot {

    private static final double LEFT = 70;
    private static final double RIGHT = 640;
    private static final double TOP = 104;
    private static final double BOTTOM = 460;
    private static final double LABEL_GAP = 15;
    private static final int TICKS = 6;
    /** Height of the frame over the cheapest curve's greatest work. */
    private static final double ROOM = 1.6;

    private static final double NUMERAL_GAP = 20;

    /** Dark colours of different lightness that stay apart for the colour-blind [Okabe & Ito 2008]. */
    private static final String[] COLOURS = {"#000000", "#0072b2", "#d55e00", "#009e73", "#7a4a8c", "#8a6d00", "#444444"
    };

    private static final String[] DASHES = {"", "9 4", "3 3", "12 3 3 3", "2 5", "16 5", "9 3 2 3 2 3"};

    private final List<Curve> curves;
    private final double lastX;
    private final double firstX;
    private final double greatest;
    private final SvgText svg = new SvgText();

    private LandscapePlot(List<Curve> curves) {
        this.curves = curves;
        double shortest = curves.stream().mapToDouble(c -> c.x(0)).min().orElse(0);
        this.lastX =
                curves.stream().mapToDouble(c -> c.x(c.rows.size() - 1)).max().orElse(1);
        double tick = tick(lastX - shortest);
        this.firstX = Math.floor(shortest / tick + 1e-9) * tick;
        // Curves that shoot up at the end of the reach would press the others flat: they leave the frame at its top.
        double most = curves.stream().mapToDouble(Curve::greatest).max().orElse(1);
        double least = curves.stream().mapToDouble(Curve::greatest).min().orElse(1);
        this.greatest = Math.max(Double.MIN_NORMAL, Math.min(most, ROOM * least));
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
        for (int i = 0; firstX + i * stepX <= lastX * (1 + 1e-9); i++) {
            double x = px(firstX + i * stepX);
            rule(x, TOP, x, BOTTOM);
            text(x, BOTTOM + 19, "middle", number(firstX + i * stepX), "");
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

    /** A curve's end in the frame. */
    private record End(int place, double x, double y) {}

    /** Where a curve leaves the frame, or its last point. */
    private End end(int place) {
        Curve curve = curves.get(place);
        for (int i = 0; i < curve.rows.size(); i++) {
            if (curve.work(i) > greatest) {
                double share = i == 0 ? 0 : (greatest - curve.work(i - 1)) / (curve.work(i) - curve.work(i - 1));
                double x = i == 0 ? curve.x(0) : curve.x(i - 1) + share * (curve.x(i) - curve.x(i - 1));
                return new End(place, px(x), TOP);
            }
        }
        int last = curve.rows.size() - 1;
        return new End(place, px(curve.x(last)), py(curve.work(last)));
    }

    /** Names at the ends of the curves: numerals above the frame where they leave it, else at its side. */
    private void labels() {
        List<End> above = new ArrayList<>();
        List<End> beside = new ArrayList<>();
        for (int i = 0; i < curves.size(); i++) {
            boolean leaves = curves.get(i).greatest() > greatest;
            (leaves ? above : beside).add(end(i));
        }
        numerals(above);
        names(beside);
        if (curves.stream().anyMatch(c -> c.rows.get(0).crossover().isPresent())) {
            text(LEFT + 10, TOP + 18, "start", "ring: costs what the point foot does", " fill=\"#333333\"");
        }
    }

    private void numerals(List<End> ends) {
        ends.sort(Comparator.comparingDouble(End::x));
        double[] x = apart(ends.stream().mapToDouble(End::x).toArray(), LEFT, RIGHT, NUMERAL_GAP);
        for (int i = 0; i < x.length; i++) {
            int place = ends.get(i).place();
            line("<path d=\"M" + number(ends.get(i).x()) + " " + number(TOP) + "L" + number(x[i]) + " "
                    + number(TOP - 16) + "\" fill=\"none\" stroke=\"" + colour(place) + "\"/>");
            text(
                    x[i],
                    TOP - 21,
                    "middle",
                    Integer.toString(curves.get(place).segments()),
                    " fill=\"" + colour(place) + "\"");
        }
        if (x.length > 0) {
            text(x[0] - NUMERAL_GAP, TOP - 21, "end", "segments:", " fill=\"#333333\"");
        }
    }

    private void names(List<End> ends) {
        ends.sort(Comparator.comparingDouble(End::y));
        double[] y = apart(ends.stream().mapToDouble(End::y).toArray(), TOP, BOTTOM, LABEL_GAP);
        for (int i = 0; i < y.length; i++) {
            int place = ends.get(i).place();
            line("<path d=\"M" + number(ends.get(i).x()) + " "
                    + number(ends.get(i).y()) + "L" + number(RIGHT + 8) + " " + number(y[i])
                    + "h4\" fill=\"none\" stroke=\"" + colour(place) + "\"/>");
            text(RIGHT + 16, y[i] + 4, "start", curves.get(place).name(), " fill=\"" + colour(place) + "\"");
        }
    }

    /** Sorted places moved apart by a gap, within limits. */
    private static double[] apart(double[] places, double low, double high, double gap) {
        double[] out = places.clone();
        for (int i = 0; i < out.length; i++) {
            out[i] = Math.max(out[i], i == 0 ? low : out[i - 1] + gap);
        }
        for (int i = out.length - 1; i >= 0; i--) {
            out[i] = Math.min(out[i], i == out.length - 1 ? high : out[i + 1] - gap);
        }
        return out;
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
        svg.text(x, y, anchor, content, more);
    }

    private void line(String text) {
        svg.line(text);
    }

    private static String number(double value) {
        return SvgText.number(value);
    }
}
