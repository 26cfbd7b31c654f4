package org.solewright.app.report;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.OptionalDouble;
import org.solewright.domain.cost.TransitionRow;

/**
 * A slice of the landscape at one work: how far each foot steps for the work that the point foot needs for the measured
 * step, drawn as two limbs with both feet on the ground, all in one scale.
 */
final class EqualWorkFigure {

    private static final double WIDTH = 720;
    private static final double TOP = 64;
    private static final double CELL = 196;
    private static final int PER_ROW = 4;
    private static final double LIMB = 118;

    private EqualWorkFigure() {}

    static Block.Figure of(TransitionRow row, List<PostureCurve> curves, String id) {
        double step = row.number("step_length_m").orElse(0);
        double work = curves.get(0).work(step);
        String what = row.text("trial").orElse("") + " step " + row.text("step").orElse("");
        String title = "One work, several limbs, " + what;
        String description = String.format(
                Locale.ROOT,
                "For the %s J that a point foot needs for the measured step of %s m, each foot steps as far as drawn,"
                        + " at the same speed before the transition. Dots are the places about which the limb vaults.",
                Words.number(work, 1),
                Words.number(step, 3));
        int lines = (curves.size() + PER_ROW - 1) / PER_ROW;
        Drawing drawing = new Drawing(id, WIDTH, lines * CELL + 8, title, description);
        double longest = curves.stream().mapToDouble(PostureCurve::limb).max().orElse(1);
        List<Block.Row> rows = new ArrayList<>();
        for (int k = 0; k < curves.size(); k++) {
            PostureCurve curve = curves.get(k);
            OptionalDouble reached = curve.step(work);
            rows.add(Block.Row.of(
                    curve.name(),
                    Words.number(curve.limb(), 3),
                    Words.number(curve.foot(), 3),
                    Words.number(reached, 3),
                    reached.isPresent() ? Words.number(100 * reached.getAsDouble() / step, 0) : Words.NONE));
            double left = (k % PER_ROW) * WIDTH / PER_ROW;
            cell(drawing, curve, reached, left, CELL * Math.floorDiv(k, PER_ROW), LIMB / longest);
        }
        return new Block.Figure(
                title + ".",
                description,
                drawing.svg(),
                new Block.Table(
                        "Steps of one work, " + what,
                        List.of("Posture", "Limb (m)", "Foot (m)", "Step (m)", "Of the measured step (%)"),
                        rows,
                        true));
    }

    private static void cell(
            Drawing drawing, PostureCurve curve, OptionalDouble reached, double left, double top, double scale) {
        double middle = left + WIDTH / PER_ROW / 2;
        drawing.text(middle, top + 20, "middle", curve.name(), Drawing.INK, " font-weight=\"bold\" font-size=\"12\"");
        if (reached.isEmpty()) {
            drawing.text(middle, top + 100, "middle", "not within reach", Drawing.GREY);
            return;
        }
        double step = reached.getAsDouble();
        double ground = top + TOP + LIMB - 10;
        drawing.segment(left + 8, ground, left + WIDTH / PER_ROW - 8, ground, Drawing.GREY, 1, "");
        // Both limbs bear: the hip is over the middle between the old toe and the new heel.
        double span = step - curve.foot();
        double height = Math.sqrt(Math.max(0, curve.limb() * curve.limb() - span * span / 4)) * scale;
        double x0 = middle - (step + curve.foot()) / 2 * scale;
        double toe = x0 + curve.foot() * scale;
        double heel = x0 + step * scale;
        double hip = (toe + heel) / 2;
        drawing.segment(toe, ground, hip, ground - height, Drawing.SECOND, 3, "");
        drawing.segment(heel, ground, hip, ground - height, Drawing.FIRST, 3, "7 4");
        drawing.circle(hip, ground - height, 6, "#ffffff", Drawing.INK);
        for (int side = 0; side < 2; side++) {
            double start = side == 0 ? x0 : heel;
            String colour = side == 0 ? Drawing.SECOND : Drawing.FIRST;
            drawing.segment(start, ground, start + curve.foot() * scale, ground, colour, 4, "");
            for (int i = 0; i <= curve.segments(); i++) {
                double x = curve.segments() == 0 ? start : start + i * curve.foot() / curve.segments() * scale;
                drawing.line("<circle cx=\"" + Drawing.number(x) + "\" cy=\"" + Drawing.number(ground)
                        + "\" r=\"3\" fill=\"" + Drawing.INK + "\"/>");
            }
        }
        drawing.segment(x0, ground + 12, heel, ground + 12, Drawing.GREY, 1, "");
        drawing.head(x0, ground + 12, heel, ground + 12, Drawing.GREY);
        drawing.text(hip, ground + 28, "middle", Words.number(step, 3) + " m", Drawing.INK);
    }
}
