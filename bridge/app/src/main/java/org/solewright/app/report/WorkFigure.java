package org.solewright.app.report;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import org.solewright.domain.cost.TransitionRow;

/** Bars of the works of every transition from zero, each with its interval of one SD. */
final class WorkFigure {

    private static final double WIDTH = 720;
    private static final double LEFT = 168;
    private static final double RIGHT = 700;
    private static final double BAR = 13;
    private static final double GAP = 18;
    /** More transitions than this are shown by their means alone. */
    private static final int MOST = 8;

    private static final String[] COLUMNS = {
        "push_off_J", "collision_J", "rebound_J", "preload_J", "push_off_ds_J", "collision_ds_J"
    };
    private static final String[] NAMES = {
        "push-off", "collision", "rebound", "preload", "push-off, double support", "collision, double support"
    };

    private WorkFigure() {}

    /** A row's name in the figure. */
    private static String name(TransitionRow row) {
        if (row.text("trial").orElse("").equals("*")) {
            return "mean" + row.text("of").map(o -> ", " + o).orElse("")
                    + row.text("side").map(s -> ", " + s).orElse("");
        }
        return row.text("trial").orElse("") + " step " + row.text("step").orElse("");
    }

    static Block.Figure of(List<TransitionRow> all, String id) {
        List<TransitionRow> rows = new ArrayList<>();
        for (TransitionRow row : all) {
            if (!row.text("trial").orElse("").equals("*")) {
                rows.add(row);
            }
        }
        if (rows.size() > MOST) {
            rows.clear();
            for (TransitionRow row : all) {
                if (row.text("step").orElse("").equals("mean")
                        && row.text("trial").orElse("").equals("*")) {
                    rows.add(row);
                }
            }
        }
        String title = "Works of the four phases";
        String description =
                "Positive work is done by the limb, negative work is taken up by it. A whisker is one SD from"
                        + " the doubt about mean velocity and mass; each bar carries its work and, in brackets, the number of its step.";
        double group = rows.size() * BAR + GAP;
        double top0 = 20 + 16 * ((rows.size() + 1) / 2) + 10;
        double bottom = top0 + COLUMNS.length * group;
        Drawing drawing = new Drawing(id, WIDTH, bottom + 46, title, description);
        double low = 0;
        double high = 0;
        for (TransitionRow row : rows) {
            for (String column : COLUMNS) {
                double v = row.number(column).orElse(0);
                double sd = row.number(column + "_sd").orElse(0);
                low = Math.min(low, v - sd);
                high = Math.max(high, v + sd);
            }
        }
        double room = 0.3 * (high - low);
        Axes axes = new Axes(drawing, LEFT, top0, RIGHT, bottom)
                .x(low - (low < 0 ? room : 0), high + room)
                .y(0, 1);
        for (int i = 0; i < rows.size(); i++) {
            drawing.text(
                    i % 2 == 0 ? 8 : WIDTH / 2,
                    20 + 16 * Math.floorDiv(i, 2),
                    "start",
                    "(" + (i + 1) + ") " + name(rows.get(i)),
                    Drawing.INK);
        }
        verticals(drawing, axes);
        for (int k = 0; k < COLUMNS.length; k++) {
            double top = top0 + k * group + GAP / 2;
            drawing.text(
                    LEFT - 8,
                    top + rows.size() * BAR / 2 + 4,
                    "end",
                    NAMES[k],
                    Drawing.INK,
                    k < 4 ? " font-weight=\"bold\"" : " font-size=\"11\"");
            for (int i = 0; i < rows.size(); i++) {
                bar(drawing, axes, rows.get(i), i + 1, COLUMNS[k], top + i * BAR);
            }
        }
        return new Block.Figure(title + ".", description, drawing.svg(), numbers(rows));
    }

    private static void verticals(Drawing drawing, Axes axes) {
        double x0 = axes.px(0);
        double span = axes.px(1) - x0;
        double step = Axes.step((RIGHT - LEFT) / span, 7);
        for (int i = -40; i <= 40; i++) {
            double x = x0 + i * step * span;
            if (x >= LEFT - 0.5 && x <= RIGHT + 0.5) {
                drawing.segment(x, axes.top(), x, axes.bottom(), i == 0 ? Drawing.GREY : Drawing.GRID, 1, "");
                drawing.text(x, axes.bottom() + 17, "middle", Words.number(i * step, 0), Drawing.GREY);
            }
        }
        drawing.text((LEFT + RIGHT) / 2, axes.bottom() + 36, "middle", "work (J)", Drawing.INK);
    }

    private static void bar(Drawing drawing, Axes axes, TransitionRow row, int number, String column, double top) {
        OptionalDouble value = row.number(column);
        double middle = top + BAR / 2;
        if (value.isEmpty()) {
            drawing.text(
                    axes.px(0) + 6,
                    middle + 4,
                    "start",
                    "(" + number + ") not known",
                    Drawing.GREY,
                    " font-size=\"10.5\"");
            return;
        }
        double v = value.getAsDouble();
        OptionalDouble sd = row.number(column + "_sd");
        double a = Math.min(axes.px(0), axes.px(v));
        double b = Math.max(axes.px(0), axes.px(v));
        String fill = v >= 0 ? Drawing.SECOND : Drawing.FIRST;
        drawing.line("<rect x=\"" + Drawing.number(a) + "\" y=\"" + Drawing.number(top + 2) + "\" width=\""
                + Drawing.number(b - a) + "\" height=\"" + Drawing.number(BAR - 4) + "\" fill=\"" + fill
                + "\" fill-opacity=\"0.35\" stroke=\"" + fill + "\"/>");
        double end = v >= 0 ? b : a;
        if (sd.isPresent()) {
            double l = axes.px(v - sd.getAsDouble());
            double r = axes.px(v + sd.getAsDouble());
            drawing.path(
                    "M" + Drawing.number(l) + " " + Drawing.number(middle - 3) + "v6M" + Drawing.number(l) + " "
                            + Drawing.number(middle) + "H" + Drawing.number(r) + "M" + Drawing.number(r) + " "
                            + Drawing.number(middle - 3) + "v6",
                    Drawing.INK,
                    1.2,
                    "");
            end = v >= 0 ? r : l;
        }
        drawing.text(
                end + (v >= 0 ? 7 : -7),
                middle + 4,
                v >= 0 ? "start" : "end",
                "(" + number + ") " + Words.withSd(v, sd, 1) + " J",
                Drawing.INK,
                " font-size=\"10.5\"");
    }

    private static Block.Table numbers(List<TransitionRow> rows) {
        List<Block.Row> out = new ArrayList<>();
        for (TransitionRow row : rows) {
            List<String> cells = new ArrayList<>();
            for (String column : COLUMNS) {
                cells.add(
                        row.number(column).isPresent()
                                ? Words.withSd(row.number(column).getAsDouble(), row.number(column + "_sd"), 1)
                                : Words.NONE);
            }
            out.add(new Block.Row(name(row), cells));
        }
        List<String> columns = new ArrayList<>(List.of("Transition"));
        for (String n : NAMES) {
            columns.add(Words.capital(n) + " (J)");
        }
        return new Block.Table("Works of the four phases, with one SD", columns, out, true);
    }
}
