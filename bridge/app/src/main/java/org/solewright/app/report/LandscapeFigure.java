package org.solewright.app.report;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import org.solewright.domain.cost.TransitionRow;

/** Work per step against step length for a point foot and flat feet of 1 to 6 segments, with what was measured. */
final class LandscapeFigure {

    private static final double WIDTH = 720;
    private static final double HEIGHT = 470;
    private static final double LABEL_GAP = 16;
    private static final int POINTS = 81;
    private static final int NUMBERS = 11;
    private static final String[] DASHES = {"8 4", "", "2 3", "10 3 2 3", "5 2", "1 4", "12 3"};
    private static final String[] COLOURS = {
        Drawing.INK, Drawing.FIRST, Drawing.THIRD, Drawing.FOURTH, Drawing.SECOND, Drawing.GREY, Drawing.FIRST
    };

    private LandscapeFigure() {}

    static Block.Figure of(TransitionRow row, List<PostureCurve> curves, String id) {
        double step = row.number("step_length_m").orElse(0);
        double foot = curves.stream().mapToDouble(PostureCurve::foot).max().orElse(0);
        double low = Math.max(0.05, 0.85 * foot);
        double high = 1.3 * step;
        double most = 0;
        for (PostureCurve curve : curves) {
            double w = curve.work(high);
            most = Double.isFinite(w) ? Math.max(most, w) : most;
        }
        double pushOff = row.number("push_off_J").orElse(Double.NaN);
        double collision = -row.number("collision_J").orElse(Double.NaN);
        String what = row.text("trial").orElse("") + " step " + row.text("step").orElse("");
        String title = "The step in the posture landscape, " + what;
        String description = String.format(
                Locale.ROOT,
                "Model work per step, push-off and collision at once, at %s m/s before the transition and %s kg. The"
                        + " measured step of %s m stands beside it: push-off %s J, collision %s J.%s",
                Words.number(row.number("speed_before_m_s"), 3),
                Words.number(row.number("mass_kg"), 1),
                Words.number(step, 3),
                Words.number(pushOff, 1),
                Words.number(-collision, 1),
                crossovers(row));
        Drawing drawing = new Drawing(id, WIDTH, HEIGHT, title, description);
        Axes axes = new Axes(drawing, 52, 34, 560, 420).x(low, high).y(0, most);
        axes.draw("step length (m)", "work per step (J)");
        List<double[]> ends = new ArrayList<>();
        for (int k = 0; k < curves.size(); k++) {
            double[] x = new double[POINTS];
            double[] y = new double[POINTS];
            for (int i = 0; i < POINTS; i++) {
                x[i] = low + i * (high - low) / (POINTS - 1);
                y[i] = curves.get(k).work(x[i]);
            }
            drawing.path(axes.path(x, y), COLOURS[k % COLOURS.length], 2, DASHES[k % DASHES.length]);
            if (Double.isFinite(y[POINTS - 1])) {
                ends.add(new double[] {k, axes.py(y[POINTS - 1])});
            }
        }
        names(drawing, axes, curves, ends);
        crossings(drawing, axes, row, curves);
        measured(drawing, axes, row, step, pushOff, "push_off_J_sd", "measured push-off", true);
        measured(drawing, axes, row, step, collision, "collision_J_sd", "measured collision, sign turned", false);
        return new Block.Figure(title + ".", description, drawing.svg(), numbers(curves, low, high, what));
    }

    private static String crossovers(TransitionRow row) {
        StringBuilder text = new StringBuilder();
        row.number("crossover_low_m")
                .ifPresent(d -> text.append(" A flat foot of one segment costs what the ")
                        .append(row.text("crossover_reference")
                                .orElse("reference")
                                .replace('_', ' '))
                        .append(" limb does at ")
                        .append(Words.number(d, 3))
                        .append(" m"));
        row.number("crossover_step_length_m")
                .ifPresent(
                        d -> text.append(" and at ").append(Words.number(d, 3)).append(" m"));
        return text.isEmpty() ? "" : text.append(" (rings).").toString();
    }

    /** Rings where the flat foot of one segment costs what the reference limb does. */
    private static void crossings(Drawing drawing, Axes axes, TransitionRow row, List<PostureCurve> curves) {
        for (PostureCurve curve : curves) {
            for (String column : List.of("crossover_low_m", "crossover_step_length_m")) {
                double at = row.number(column).orElse(Double.NaN);
                if (curve.segments() == 1 && axes.px(at) > axes.left() && axes.px(at) < axes.right()) {
                    drawing.circle(axes.px(at), axes.py(curve.work(at)), 5, "#ffffff", Drawing.FIRST);
                    drawing.text(
                            axes.px(at) + 9,
                            axes.py(curve.work(at)) - 9,
                            "start",
                            "crossover",
                            Drawing.INK,
                            " font-size=\"11.5\"");
                }
            }
        }
    }

    private static void names(Drawing drawing, Axes axes, List<PostureCurve> curves, List<double[]> ends) {
        ends.sort(Comparator.comparingDouble(e -> e[1]));
        double[] y = new double[ends.size()];
        for (int i = 0; i < y.length; i++) {
            y[i] = Math.max(ends.get(i)[1], i == 0 ? axes.top() + 6 : y[i - 1] + LABEL_GAP);
        }
        for (int i = y.length - 1; i >= 0; i--) {
            y[i] = Math.min(y[i], i == y.length - 1 ? axes.bottom() : y[i + 1] - LABEL_GAP);
        }
        for (int i = 0; i < y.length; i++) {
            int k = (int) ends.get(i)[0];
            String colour = COLOURS[k % COLOURS.length];
            drawing.segment(axes.right() + 2, ends.get(i)[1], axes.right() + 16, y[i], colour, 1, "");
            drawing.segment(axes.right() + 16, y[i], axes.right() + 34, y[i], colour, 2, DASHES[k % DASHES.length]);
            drawing.text(axes.right() + 38, y[i] + 4, "start", curves.get(k).name(), colour, " font-size=\"11.5\"");
        }
    }

    private static void measured(
            Drawing drawing,
            Axes axes,
            TransitionRow row,
            double step,
            double work,
            String sdColumn,
            String words,
            boolean isDiamond) {
        if (!Double.isFinite(work)) {
            return;
        }
        double x = axes.px(step) + (isDiamond ? -5 : 5);
        double sd = row.number(sdColumn).orElse(0);
        drawing.segment(x, axes.py(work - sd), x, axes.py(work + sd), Drawing.INK, 2, "");
        if (isDiamond) {
            drawing.diamond(x, axes.py(work), 7, Drawing.INK);
        } else {
            drawing.circle(x, axes.py(work), 5.5, "#ffffff", Drawing.INK);
        }
        double labelY = axes.bottom() - (isDiamond ? 34 : 14);
        drawing.segment(x, axes.py(work - sd), x, labelY - 10, Drawing.GREY, 1, "2 3");
        drawing.text(
                x, labelY, isDiamond ? "end" : "start", words, Drawing.INK, " font-weight=\"bold\" font-size=\"12\"");
    }

    private static Block.Table numbers(List<PostureCurve> curves, double low, double high, String what) {
        List<String> columns = new ArrayList<>(List.of("Step length (m)"));
        curves.forEach(c -> columns.add(Words.capital(c.name()) + " (J)"));
        List<Block.Row> rows = new ArrayList<>();
        for (int i = 0; i < NUMBERS; i++) {
            double d = low + i * (high - low) / (NUMBERS - 1);
            rows.add(new Block.Row(
                    Words.number(d, 3),
                    curves.stream().map(c -> Words.number(c.work(d), 1)).toList()));
        }
        return new Block.Table("Model work per step, " + what, columns, rows, true);
    }
}
