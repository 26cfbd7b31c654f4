package org.solewright.app.report;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import org.solewright.domain.foot.FootModel;
import org.solewright.domain.foot.Joint;
import org.solewright.domain.foot.Pad;
import org.solewright.domain.foot.Rolling;
import org.solewright.domain.foot.SegmentName;
import org.solewright.domain.geometry.Pose;
import org.solewright.domain.geometry.Vec3;

/** Still drawings of a foot: from the side, from above, and over stance. */
final class FootStill {

    private static final double WIDTH = 560;
    private static final double MARGIN = 46;
    private static final String[] COLOURS = {Drawing.GREY, Drawing.FIRST, Drawing.SECOND, Drawing.THIRD, Drawing.FOURTH
    };
    private static final int MOST_INSTANTS = 5;

    private final FootModel model;
    private final FootShape shape;
    private final List<FootShape.Part> parts;

    FootStill(FootModel model, FootShape shape) {
        this.model = model;
        this.shape = shape;
        this.parts = shape.parts();
    }

    /** Which components go right and up. */
    private enum View {
        SIDE,
        TOP;

        double right(Vec3 v) {
            return v.x();
        }

        double up(Vec3 v) {
            return this == SIDE ? v.y() : -v.z();
        }
    }

    /** Scale and place of a drawing. */
    private static final class Frame {
        private final Drawing drawing;
        private final double scale;
        private final double left;
        private final double top;

        Frame(Drawing drawing, double scale, double left, double top) {
            this.drawing = drawing;
            this.scale = scale;
            this.left = left;
            this.top = top;
        }

        double x(double v) {
            return MARGIN + (v - left) * scale;
        }

        double y(double v) {
            return MARGIN + (top - v) * scale;
        }
    }

    List<Block.Figure> figures(List<FootRoll.Instant> instants) {
        FootRoll.Instant standing = SceneData.standing(model, shape);
        List<Block.Figure> figures = new ArrayList<>();
        figures.add(figure(
                "still-side",
                View.SIDE,
                List.of(standing),
                "The foot from the side",
                "As it stood: segments, joints (rings), pads of the sole (dashed circles)"
                        + (ArcLine.of(model, shape).isEmpty()
                                ? "."
                                : " and the arc fitted to the roll-over in the shank frame (heavy dashes)."),
                joints()));
        figures.add(figure(
                "still-top",
                View.TOP,
                List.of(standing),
                "The foot from above",
                "As it stood, the subject's right below: joints (rings) with their axes (lines) and pads (dashed circles).",
                pads()));
        if (instants.size() > 1) {
            List<FootRoll.Instant> some = new ArrayList<>();
            for (int i = 0; i < MOST_INSTANTS; i++) {
                some.add(instants.get(i * (instants.size() - 1) / (MOST_INSTANTS - 1)));
            }
            figures.add(figure(
                    "still-roll",
                    View.SIDE,
                    some,
                    "The foot over stance, from the side",
                    "Five instants of the tracked stance, later ones drawn heavier, with the centre of pressure (diamonds).",
                    roll(some)));
        }
        return figures;
    }

    private List<Vec3> points(FootRoll.Instant instant, FootShape.Part part) {
        Pose pose = instant.poses().get(part.name());
        List<Vec3> points = new ArrayList<>();
        if (pose != null) {
            int skipped = part.name() == SegmentName.SHANK ? part.sections().size() / 2 : 0;
            part.sections()
                    .subList(skipped, part.sections().size())
                    .forEach(ring -> ring.forEach(p -> points.add(pose.transformPosition(p))));
        }
        return points;
    }

    private Block.Figure figure(
            String id,
            View view,
            List<FootRoll.Instant> instants,
            String title,
            String description,
            Block.Table numbers) {
        double[] box = {
            Double.MAX_VALUE, -Double.MAX_VALUE, view == View.TOP ? Double.MAX_VALUE : -0.02, -Double.MAX_VALUE
        };
        for (FootRoll.Instant instant : instants) {
            for (FootShape.Part part : parts) {
                for (Vec3 p : points(instant, part)) {
                    box[0] = Math.min(box[0], view.right(p));
                    box[1] = Math.max(box[1], view.right(p));
                    box[2] = Math.min(box[2], view.up(p));
                    box[3] = Math.max(box[3], view.up(p));
                }
            }
        }
        double scale = (WIDTH - 2 * MARGIN) / Math.max(0.05, box[1] - box[0]);
        double height = 2 * MARGIN + Math.max(0.05, box[3] - box[2]) * scale;
        String words = title + ", " + model.side().word() + " side";
        Drawing drawing = new Drawing(id + "-" + model.side().word(), WIDTH, height, words, description);
        Frame frame = new Frame(drawing, scale, box[0], box[3]);
        if (view == View.SIDE) {
            drawing.segment(MARGIN / 2, frame.y(0), WIDTH - MARGIN / 2, frame.y(0), Drawing.GREY, 1, "");
        }
        for (int i = 0; i < instants.size(); i++) {
            draw(frame, view, instants.get(i), instants.size() == 1 ? 2 : 0.8 + 0.45 * i, instants.size() == 1);
        }
        if (instants.size() == 1) {
            details(frame, view, instants.get(0));
        } else {
            pressures(frame, instants);
        }
        drawing.segment(MARGIN, height - 14, MARGIN + 0.05 * scale, height - 14, Drawing.INK, 2, "");
        drawing.text(MARGIN + 0.05 * scale + 6, height - 10, "start", "50 mm", Drawing.INK, " font-size=\"11\"");
        return new Block.Figure(words + ".", description, drawing.svg(), numbers);
    }

    private void draw(Frame frame, View view, FootRoll.Instant instant, double stroke, boolean isNamed) {
        for (int k = 0; k < parts.size(); k++) {
            List<double[]> hull = hull(points(instant, parts.get(k)), view);
            if (hull.isEmpty()) {
                continue;
            }
            StringBuilder d = new StringBuilder();
            double sumX = 0;
            double sumY = 0;
            for (double[] p : hull) {
                d.append(d.isEmpty() ? 'M' : 'L')
                        .append(Drawing.number(frame.x(p[0])))
                        .append(' ')
                        .append(Drawing.number(frame.y(p[1])));
                sumX += frame.x(p[0]) / hull.size();
                sumY += frame.y(p[1]) / hull.size();
            }
            String colour = COLOURS[k % COLOURS.length];
            frame.drawing.area(d + "z", colour, isNamed ? 0.14 : 0.05);
            frame.drawing.path(d + "z", colour, stroke, "");
            if (isNamed) {
                frame.drawing.text(
                        sumX, sumY + 4, "middle", parts.get(k).name().word(), colour, " font-weight=\"bold\"");
            }
        }
    }

    private void details(Frame frame, View view, FootRoll.Instant standing) {
        for (Pad pad : model.pads()) {
            Pose pose = standing.poses().get(pad.segment());
            if (pose != null) {
                Vec3 c = pose.transformPosition(pad.centre());
                frame.drawing.line("<circle cx=\"" + Drawing.number(frame.x(view.right(c))) + "\" cy=\""
                        + Drawing.number(frame.y(view.up(c))) + "\" r=\""
                        + Drawing.number(pad.radius() * frame.scale)
                        + "\" fill=\"none\" stroke=\"" + Drawing.INK + "\" stroke-dasharray=\"3 3\"/>");
            }
        }
        for (Joint joint : model.joints()) {
            Pose pose = standing.poses().get(joint.proximal());
            if (pose == null) {
                continue;
            }
            Vec3 c = pose.transformPosition(joint.centre().position());
            for (Joint.Axis axis : joint.axes()) {
                Vec3 a = c.plus(axis.direction().times(0.05));
                Vec3 b = c.minus(axis.direction().times(0.05));
                frame.drawing.segment(
                        frame.x(view.right(a)),
                        frame.y(view.up(a)),
                        frame.x(view.right(b)),
                        frame.y(view.up(b)),
                        Drawing.INK,
                        1.5,
                        "");
            }
            frame.drawing.circle(frame.x(view.right(c)), frame.y(view.up(c)), 5, "#ffffff", Drawing.INK);
        }
        Pose shank = standing.poses().get(SegmentName.SHANK);
        if (view == View.SIDE && shank != null) {
            StringBuilder d = new StringBuilder();
            for (Vec3 p : ArcLine.of(model, shape)) {
                Vec3 q = shank.transformPosition(p);
                d.append(d.isEmpty() ? 'M' : 'L')
                        .append(Drawing.number(frame.x(q.x())))
                        .append(' ')
                        .append(Drawing.number(frame.y(q.y())));
            }
            frame.drawing.path(d.toString(), Drawing.INK, 2.5, "9 5");
        }
    }

    private static void pressures(Frame frame, List<FootRoll.Instant> instants) {
        for (FootRoll.Instant i : instants) {
            i.centreOfPressure().ifPresent(p -> {
                frame.drawing.diamond(frame.x(p.x()), frame.y(0), 5, Drawing.INK);
                frame.drawing.text(
                        frame.x(p.x()),
                        frame.y(0) + 18,
                        "middle",
                        Words.number(i.percent(), 0) + " %",
                        Drawing.INK,
                        " font-size=\"10.5\"");
            });
        }
    }

    /** Convex hull in a view, monotone chain [Andrew 1979]. */
    private static List<double[]> hull(List<Vec3> points, View view) {
        List<double[]> sorted = new ArrayList<>();
        points.forEach(p -> sorted.add(new double[] {view.right(p), view.up(p)}));
        sorted.sort(Comparator.<double[]>comparingDouble(p -> p[0]).thenComparingDouble(p -> p[1]));
        List<double[]> hull = new ArrayList<>();
        for (int side = 0; side < 2 && !sorted.isEmpty(); side++) {
            int base = hull.size();
            for (int k = 0; k < sorted.size(); k++) {
                double[] p = sorted.get(side == 0 ? k : sorted.size() - 1 - k);
                while (hull.size() >= base + 2 && turn(hull.get(hull.size() - 2), hull.get(hull.size() - 1), p) <= 0) {
                    hull.remove(hull.size() - 1);
                }
                hull.add(p);
            }
            hull.remove(hull.size() - 1);
        }
        return hull;
    }

    private static double turn(double[] a, double[] b, double[] c) {
        return (b[0] - a[0]) * (c[1] - a[1]) - (b[1] - a[1]) * (c[0] - a[0]);
    }

    private Block.Table joints() {
        List<Block.Row> rows = new ArrayList<>();
        for (Joint j : model.joints()) {
            Vec3 c = shape.origin(j.distal());
            rows.add(Block.Row.of(
                    j.name(),
                    Words.number(1000 * c.x(), 0),
                    Words.number(1000 * (c.y() - shape.floor()), 0),
                    Words.number(1000 * c.z(), 0)));
        }
        model.rolling()
                .arc(Rolling.Frame.SHANK)
                .ifPresent(a -> rows.add(Block.Row.of(
                        String.format(
                                Locale.ROOT,
                                "arc of radius %s mm, centre over the ankle",
                                Words.number(1000 * a.radius(), 0)),
                        Words.number(1000 * a.centreX().orElse(Double.NaN), 0),
                        Words.number(1000 * a.centreY().orElse(Double.NaN), 0),
                        Words.NONE)));
        return new Block.Table(
                "Joints from the ankle, heights over the floor",
                List.of("Joint", "Forward (mm)", "Up (mm)", "Right (mm)"),
                rows,
                true);
    }

    private Block.Table pads() {
        List<Block.Row> rows = new ArrayList<>();
        for (Pad pad : model.pads()) {
            Vec3 c = shape.origin(pad.segment()).plus(pad.centre());
            rows.add(Block.Row.of(
                    pad.name().replace('_', ' '),
                    Words.number(1000 * c.x(), 0),
                    Words.number(1000 * c.z(), 0),
                    Words.number(1000 * pad.radius(), 0)));
        }
        return new Block.Table(
                "Pads from the ankle", List.of("Pad", "Forward (mm)", "Right (mm)", "Radius (mm)"), rows, true);
    }

    private static Block.Table roll(List<FootRoll.Instant> instants) {
        List<Block.Row> rows = new ArrayList<>();
        for (FootRoll.Instant i : instants) {
            rows.add(Block.Row.of(
                    Words.number(i.percent(), 0),
                    i.centreOfPressure().map(p -> Words.number(1000 * p.x(), 0)).orElse(Words.NONE),
                    Words.number(i.vertical(), 0)));
        }
        return new Block.Table(
                "Centre of pressure and load at the instants drawn",
                List.of("Stance (%)", "Centre of pressure forward (mm)", "Vertical load (N)"),
                rows,
                true);
    }
}
