package org.solewright.app.report;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.solewright.analysis.cost.StepPhases;
import org.solewright.analysis.gait.StepLoads;
import org.solewright.analysis.numerics.Series;
import org.solewright.domain.cost.Measure;

/** Power of each limb on the centre of mass around a transition, its phases shaded and named with their works. */
final class PowerFigure {

    private static final double WIDTH = 560;
    private static final double HEIGHT = 340;
    private static final int POINTS = 220;
    private static final int NUMBERS = 21;
    private static final String DASH = "7 4";

    private final TransitionView view;
    private final StepLoads loads;
    private final List<StepPhases.Phase> phases;
    private final double contact;
    private final double from;
    private final double to;

    private PowerFigure(TransitionView view) {
        this.view = view;
        loads = view.step().loads();
        phases = view.phases();
        contact = loads.leading().start();
        double first = loads.windowFrom();
        double last = loads.windowTo();
        for (StepPhases.Phase phase : phases) {
            first = Math.min(first, phase.start());
            last = Math.max(last, phase.end());
        }
        from = Math.max(first, loads.knownFrom());
        to = Math.min(last, loads.knownTo());
    }

    static Block.Figure of(TransitionView view, String id) {
        return new PowerFigure(view).figure(id);
    }

    static String word(Measure measure) {
        return switch (measure) {
            case PUSH_OFF -> "push-off";
            case COLLISION -> "collision";
            case REBOUND -> "rebound";
            case PRELOAD -> "preload";
            default -> measure.column();
        };
    }

    private Block.Figure figure(String id) {
        String title = "Power of each limb on the centre of mass, " + view.name();
        List<String> works = new ArrayList<>();
        phases.forEach(p -> works.add(word(p.measure()) + " " + Words.number(p.work(), 1) + " J"));
        String description = works.isEmpty()
                ? "No phase has a work; the findings say why."
                : "Shaded areas are works: " + Words.list(works) + ".";
        Drawing drawing = new Drawing(id, WIDTH, HEIGHT, title, description);
        double low = 0;
        double high = 0;
        for (double t : TransitionView.times(view.mechanics().trailingPower(), from, to, POINTS)) {
            for (double p : new double[] {trailing(t), leading(t)}) {
                low = Double.isFinite(p) ? Math.min(low, p) : low;
                high = Double.isFinite(p) ? Math.max(high, p) : high;
            }
        }
        double room = 0.16 * (high - low);
        Axes axes = new Axes(drawing, 62, 34, 545, 294)
                .x(1000 * (from - contact), 1000 * (to - contact))
                .y(low - 1.9 * room, high + room);
        doubleSupport(drawing, axes);
        axes.draw("time from " + view.leading().word() + " contact (ms)", "power (W)");
        for (StepPhases.Phase phase : phases) {
            shade(drawing, axes, phase);
        }
        curve(drawing, axes, true);
        curve(drawing, axes, false);
        for (StepPhases.Phase phase : phases) {
            label(drawing, axes, phase);
        }
        legend(drawing, axes);
        return new Block.Figure(title + ".", description, drawing.svg(), numbers());
    }

    private double trailing(double t) {
        return t >= loads.trailing().start() && t <= loads.trailing().end()
                ? view.mechanics().trailingPower().at(t)
                : Double.NaN;
    }

    private double leading(double t) {
        return t >= loads.leading().start() && t <= loads.leading().end()
                ? view.mechanics().leadingPower().at(t)
                : Double.NaN;
    }

    private void doubleSupport(Drawing drawing, Axes axes) {
        if (!loads.hasDoubleSupport()) {
            return;
        }
        double a = axes.px(0);
        double b = axes.px(1000 * (loads.trailing().end() - contact));
        drawing.line("<rect x=\"" + Drawing.number(a) + "\" y=\"" + Drawing.number(axes.top()) + "\" width=\""
                + Drawing.number(b - a) + "\" height=\"" + Drawing.number(axes.bottom() - axes.top())
                + "\" fill=\"#f0f3f4\"/>");
        drawing.text((a + b) / 2, axes.bottom() - 6, "middle", "both feet bear", Drawing.GREY, " font-size=\"11\"");
    }

    private Series power(StepPhases.Phase phase) {
        return phase.isTrailing()
                ? view.mechanics().trailingPower()
                : view.mechanics().leadingPower();
    }

    private void shade(Drawing drawing, Axes axes, StepPhases.Phase phase) {
        double[] t = TransitionView.times(power(phase), phase.start(), phase.end(), POINTS);
        double[] x = new double[t.length];
        double[] y = new double[t.length];
        for (int i = 0; i < t.length; i++) {
            x[i] = 1000 * (t[i] - contact);
            y[i] = power(phase).at(t[i]);
        }
        drawing.area(axes.area(x, y), phase.isTrailing() ? Drawing.SECOND : Drawing.FIRST, 0.2);
    }

    private void label(Drawing drawing, Axes axes, StepPhases.Phase phase) {
        double extreme = 0;
        double at = phase.start();
        for (double t : TransitionView.times(power(phase), phase.start(), phase.end(), POINTS)) {
            double p = power(phase).at(t);
            if (Math.abs(p) > Math.abs(extreme)) {
                extreme = p;
                at = t;
            }
        }
        boolean isUp = extreme > 0;
        double x = Math.max(axes.left() + 52, Math.min(axes.right() - 58, axes.px(1000 * (at - contact))));
        double y = axes.py(extreme) + (isUp ? -20 : 18);
        String fill = phase.isTrailing() ? Drawing.SECOND : Drawing.FIRST;
        drawing.text(x, y, "middle", word(phase.measure()), fill, " font-weight=\"bold\"");
        drawing.text(x, y + 14, "middle", Words.withSd(phase.work(), view.sd(phase.measure()), 1) + " J", fill);
    }

    private void curve(Drawing drawing, Axes axes, boolean isTrailing) {
        double[] t = TransitionView.times(view.mechanics().trailingPower(), from, to, POINTS);
        double[] x = new double[t.length];
        double[] y = new double[t.length];
        for (int i = 0; i < t.length; i++) {
            x[i] = 1000 * (t[i] - contact);
            y[i] = isTrailing ? trailing(t[i]) : leading(t[i]);
        }
        drawing.path(axes.path(x, y), isTrailing ? Drawing.SECOND : Drawing.FIRST, 2, isTrailing ? "" : DASH);
    }

    private void legend(Drawing drawing, Axes axes) {
        double y = axes.top() - 12;
        double x = axes.right() - 330;
        drawing.segment(x, y - 4, x + 30, y - 4, Drawing.SECOND, 2, "");
        drawing.text(x + 36, y, "start", "trailing limb, " + view.trailing().word(), Drawing.SECOND);
        drawing.segment(x + 170, y - 4, x + 200, y - 4, Drawing.FIRST, 2, DASH);
        drawing.text(x + 206, y, "start", "leading limb, " + view.leading().word(), Drawing.FIRST);
    }

    private Block.Table numbers() {
        List<Block.Row> rows = new ArrayList<>();
        for (int i = 0; i < NUMBERS; i++) {
            double t = from + i * (to - from) / (NUMBERS - 1);
            rows.add(Block.Row.of(
                    Words.number(1000 * (t - contact), 0), Words.number(trailing(t), 0), Words.number(leading(t), 0)));
        }
        return new Block.Table(
                String.format(
                        Locale.ROOT, "Power of each limb, %s; every sample is in appraise-curves.csv", view.name()),
                List.of("Time from contact (ms)", "Trailing limb (W)", "Leading limb (W)"),
                rows,
                true);
    }
}
