package org.solewright.app.report;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.solewright.analysis.cost.CentreOfMassMotion;
import org.solewright.domain.cost.Measure;

/**
 * Velocity of the centre of mass in the sagittal plane over the work window, both axes in one scale from zero, so that the
 * angle that is seen is the angle.
 */
final class HodographFigure {

    private static final double WIDTH = 560;
    private static final double LEFT = 56;
    private static final double RIGHT = 425;
    private static final double TOP = 34;
    private static final int POINTS = 150;
    private static final int NUMBERS = 21;

    private final TransitionView view;
    private final CentreOfMassMotion motion;
    private final double[] time;
    private final double[] forward;
    private final double[] up;

    private HodographFigure(TransitionView view) {
        this.view = view;
        motion = view.mechanics().motion();
        time = TransitionView.times(motion.velocity(0), motion.from(), motion.to(), POINTS);
        forward = new double[time.length];
        up = new double[time.length];
        for (int i = 0; i < time.length; i++) {
            forward[i] = motion.velocity(0).at(time[i]);
            up[i] = motion.velocity(1).at(time[i]);
        }
    }

    static Block.Figure of(TransitionView view, String id) {
        return new HodographFigure(view).figure(id);
    }

    private Block.Figure figure(String id) {
        double fastest = 0;
        double steepest = 0.1;
        int lowest = 0;
        int highest = 0;
        for (int i = 0; i < time.length; i++) {
            fastest = Math.max(fastest, forward[i]);
            steepest = Math.max(steepest, Math.abs(up[i]));
            lowest = direction(i) < direction(lowest) ? i : lowest;
            highest = direction(i) > direction(highest) ? i : highest;
        }
        String angle = Words.number(view.value(Measure.TRANSITION_ANGLE), 1) + "\u00b0";
        String title = "Velocity of the centre of mass, " + view.name();
        String description = String.format(
                Locale.ROOT,
                "Over the work window the direction turns by %s, from its lowest to its highest; %s of it in double"
                        + " support, drawn thick. Both axes have one scale.",
                angle,
                view.value(Measure.TRANSITION_ANGLE_DOUBLE_SUPPORT).isPresent()
                        ? Words.number(view.value(Measure.TRANSITION_ANGLE_DOUBLE_SUPPORT), 1) + "\u00b0"
                        : "nothing");
        double scale = (RIGHT - LEFT) / (1.04 * fastest);
        double reach = 1.15 * steepest;
        double bottom = TOP + 2 * reach * scale;
        Drawing drawing = new Drawing(id, WIDTH, bottom + 46, title, description);
        Axes axes =
                new Axes(drawing, LEFT, TOP, RIGHT, bottom).x(0, 1.04 * fastest).y(-reach, reach);
        axes.draw("forward (m/s)", "upward (m/s)");
        ray(drawing, axes, lowest);
        ray(drawing, axes, highest);
        double radius = 0.42 * (RIGHT - LEFT);
        drawing.path(
                "M" + polar(axes, radius, direction(lowest)) + "A" + Drawing.number(radius) + " "
                        + Drawing.number(radius) + " 0 0 0 " + polar(axes, radius, direction(highest)),
                Drawing.INK,
                1.5,
                "");
        drawing.text(axes.px(0) + radius - 8, axes.py(0) - 6, "end", angle, Drawing.INK, " font-weight=\"bold\"");
        drawing.path(axes.path(forward, up), Drawing.FIRST, 2, "");
        doubleSupport(drawing, axes);
        int middle = time.length / 5;
        drawing.head(
                axes.px(forward[middle - 1]),
                axes.py(up[middle - 1]),
                axes.px(forward[middle]),
                axes.py(up[middle]),
                Drawing.FIRST);
        return new Block.Figure(title + ".", description, drawing.svg(), numbers());
    }

    private double direction(int i) {
        return Math.atan2(up[i], forward[i]);
    }

    private static String polar(Axes axes, double radius, double angle) {
        return Drawing.number(axes.px(0) + radius * Math.cos(angle)) + " "
                + Drawing.number(axes.py(0) - radius * Math.sin(angle));
    }

    private void ray(Drawing drawing, Axes axes, int at) {
        drawing.segment(axes.px(0), axes.py(0), axes.px(forward[at]), axes.py(up[at]), Drawing.GREY, 1, "5 4");
    }

    private void doubleSupport(Drawing drawing, Axes axes) {
        double contact = view.step().loads().leading().start();
        double off = view.step().loads().trailing().end();
        List<double[]> in = new ArrayList<>();
        for (int i = 0; i < time.length; i++) {
            if (time[i] >= contact && time[i] <= off) {
                in.add(new double[] {forward[i], up[i]});
            }
        }
        if (in.size() > 1) {
            drawing.path(
                    axes.path(
                            in.stream().mapToDouble(p -> p[0]).toArray(),
                            in.stream().mapToDouble(p -> p[1]).toArray()),
                    Drawing.SECOND,
                    5,
                    "");
        }
        event(drawing, axes, contact, view.leading().word() + " foot lands");
        if (off > contact) {
            event(drawing, axes, off, view.trailing().word() + " foot leaves");
        }
    }

    private void event(Drawing drawing, Axes axes, double at, String words) {
        double x = axes.px(motion.velocity(0).at(at));
        double y = axes.py(motion.velocity(1).at(at));
        if (!Double.isFinite(x + y)) {
            return;
        }
        drawing.diamond(x, y, 6, Drawing.INK);
        drawing.text(x + 12, y + 4, "start", words, Drawing.INK);
    }

    private Block.Table numbers() {
        List<Block.Row> rows = new ArrayList<>();
        double contact = view.step().loads().leading().start();
        for (int i = 0; i < NUMBERS; i++) {
            double t = motion.from() + i * (motion.to() - motion.from()) / (NUMBERS - 1);
            rows.add(Block.Row.of(
                    Words.number(1000 * (t - contact), 0),
                    Words.number(motion.velocity(0).at(t), 3),
                    Words.number(motion.velocity(1).at(t), 3),
                    Words.number(Math.toDegrees(motion.direction(t)), 1)));
        }
        return new Block.Table(
                "Velocity of the centre of mass, " + view.name(),
                List.of("Time from contact (ms)", "Forward (m/s)", "Upward (m/s)", "Direction (\u00b0)"),
                rows,
                true);
    }
}
