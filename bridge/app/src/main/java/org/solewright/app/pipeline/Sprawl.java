package org.solewright.app.pipeline;

import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import org.solewright.analysis.dynamics.LimitException;
import org.solewright.analysis.dynamics.SprawledLimb;
import org.solewright.analysis.dynamics.ToePolyline;
import org.solewright.formats.table.SprawlTable;

/** The knee track and the toe curve of a sprawled limb on a spherical foot, as tables and a plan view. */
public final class Sprawl {

    /** Samples of the stance, odd so that one is at mid-stance, where a track may have its cusp. */
    static final int SAMPLES = 241;

    private static final int MOST_SEGMENTS = 60;
    private static final int KNEE_COLUMNS = 6;
    private static final int TOE_COLUMNS = 5;
    private static final int NODE_COLUMNS = 6;

    private Sprawl() {}

    /**
     * What is asked.
     *
     * @param femur m
     * @param hipHeight m
     * @param sphereRadius m
     * @param speed of the hip, m/s
     * @param protraction angle of the femur before the lateral axis at the start, rad, above 0 and below pi/2
     * @param stanceTime s
     * @param segments toe segments, 1 to 60
     */
    public record Request(
            double femur,
            double hipHeight,
            double sphereRadius,
            double speed,
            double protraction,
            double stanceTime,
            int segments) {}

    /** A limb with its samples and the segments that stand for its toe curve. */
    record Drawn(SprawledLimb limb, Request request, Curve toe, ToePolyline equal, ToePolyline minimax) {}

    /** Points of the toe curve, {@code [SAMPLES][3]}, m. */
    static final class Curve {
        private final double[] points;

        Curve(double[] points) {
            this.points = points.clone();
        }

        double at(int sample, int component) {
            return points[3 * sample + component];
        }
    }

    /**
     * Writes knee-track.csv, toe-curve.csv, toe-segments.csv and sprawl.svg.
     *
     * @param request the limb
     * @param folder where to
     * @return lines for the user
     * @throws UseCaseException where the limb cannot be, or a file cannot be written
     */
    public static List<String> write(Request request, Path folder) throws UseCaseException {
        check(request);
        Map<String, byte[]> files = new LinkedHashMap<>();
        Drawn drawn;
        try {
            SprawledLimb limb = SprawledLimb.of(
                    request.femur(),
                    request.hipHeight(),
                    request.sphereRadius(),
                    request.speed(),
                    request.protraction(),
                    request.stanceTime());
            double[] toe = limb.contactCurve(SAMPLES);
            drawn = new Drawn(
                    limb,
                    request,
                    new Curve(toe),
                    ToePolyline.equalArc(toe, request.segments()),
                    ToePolyline.minimax(toe, request.segments()));
        } catch (LimitException e) {
            throw new UseCaseException(
                    UseCaseException.Kind.USAGE,
                    "sprawl",
                    e.limit().name() + ", " + e.getMessage(),
                    "give a limb that can stand so",
                    e);
        }
        files.put("knee-track.csv", SprawlTable.kneeTrack(knee(drawn)));
        files.put("toe-curve.csv", SprawlTable.toeCurve(toe(drawn)));
        files.put("toe-segments.csv", nodes(drawn));
        files.put("sprawl.svg", SprawlPlan.of(drawn).getBytes(StandardCharsets.UTF_8));
        List<String> lines = summary(drawn);
        for (Path file : OutputFolder.of(folder, List.of()).write(files)) {
            lines.add("wrote " + file);
        }
        return lines;
    }

    private static void check(Request r) throws UseCaseException {
        positive("--femur", r.femur(), "m");
        positive("--hip-height", r.hipHeight(), "m");
        positive("--sphere-radius", r.sphereRadius(), "m");
        positive("--speed", r.speed(), "m/s");
        positive("--stance-time", r.stanceTime(), "s");
        if (!(r.protraction() > 0 && r.protraction() < Math.PI / 2)) {
            throw usage("--protraction", r.protraction() + " rad", "an angle above 0 and below 90deg");
        }
        if (r.segments() < 1 || r.segments() > MOST_SEGMENTS) {
            throw usage("--segments", Integer.toString(r.segments()), "1 to " + MOST_SEGMENTS);
        }
    }

    private static void positive(String option, double value, String unit) throws UseCaseException {
        if (!(value > 0 && Double.isFinite(value))) {
            throw usage(option, value + " " + unit, "a number above 0");
        }
    }

    private static UseCaseException usage(String option, String given, String expected) {
        return new UseCaseException(UseCaseException.Kind.USAGE, option, "is " + given, "give " + expected);
    }

    static double time(Request r, int sample) {
        return r.stanceTime() * sample / (SAMPLES - 1);
    }

    private static double[] knee(Drawn d) {
        double[] rows = new double[SAMPLES * KNEE_COLUMNS];
        for (int i = 0; i < SAMPLES; i++) {
            double t = time(d.request(), i);
            int at = i * KNEE_COLUMNS;
            rows[at] = t;
            // The limb counts the knee from where it starts, which is before the hip.
            rows[at + 1] = d.request().speed() * t;
            rows[at + 2] = kneeX(d, t);
            rows[at + 3] = d.limb().kneeY(t);
            rows[at + 4] = d.request().sphereRadius();
            rows[at + 5] = d.limb().curvature(t);
        }
        return rows;
    }

    /** Forward place of the knee where the hip starts at 0. */
    static double kneeX(Drawn d, double time) {
        return d.limb().kneeX(time)
                + d.limb().planarRadius() * Math.sin(d.request().protraction());
    }

    private static double[] toe(Drawn d) {
        double[] rows = new double[SAMPLES * TOE_COLUMNS];
        double length = 0;
        double r = d.request().sphereRadius();
        for (int i = 0; i < SAMPLES; i++) {
            if (i > 0) {
                double chord = 0;
                for (int c = 0; c < 3; c++) {
                    chord += Math.pow(d.toe().at(i, c) - d.toe().at(i - 1, c), 2);
                }
                // The great-circle arc over the chord between two points of the sphere.
                length += 2 * r * Math.asin(Math.min(1, Math.sqrt(chord) / (2 * r)));
            }
            int at = i * TOE_COLUMNS;
            rows[at] = time(d.request(), i);
            rows[at + 1] = length;
            for (int c = 0; c < 3; c++) {
                rows[at + 2 + c] = d.toe().at(i, c);
            }
        }
        return rows;
    }

    private static byte[] nodes(Drawn d) {
        int count = d.request().segments() + 1;
        List<String> rules = new ArrayList<>();
        double[] rows = new double[2 * count * NODE_COLUMNS];
        for (int i = 0; i < 2 * count; i++) {
            boolean isEqual = i < count;
            ToePolyline line = isEqual ? d.equal() : d.minimax();
            int sample = line.nodes()[i % count];
            rules.add(isEqual ? "equal-arc" : "minimax");
            int at = i * NODE_COLUMNS;
            rows[at] = i % count;
            rows[at + 1] = time(d.request(), sample);
            for (int c = 0; c < 3; c++) {
                rows[at + 2 + c] = d.toe().at(sample, c);
            }
            rows[at + 5] = line.deviation();
        }
        return SprawlTable.toeNodes(rules, rows);
    }

    private static List<String> summary(Drawn d) {
        double ratio = d.limb().rateRatio();
        List<String> lines = new ArrayList<>();
        lines.add(line("hip to knee in plan    %.4f m", d.limb().planarRadius()));
        lines.add(line("rate ratio             %.4f", ratio)
                + (ratio < 1
                        ? ", rolls forward throughout"
                        : ratio > 1 ? ", rolls backwards at mid-stance" : ", stands still at mid-stance: a cusp"));
        lines.add(line("knee track             %.4f m long", d.limb().trackLength())
                + line(", %.4f m forward", d.limb().netAdvance()));
        lines.add("toe in " + d.request().segments()
                + (d.request().segments() == 1 ? " segment: " : " segments: ")
                + line("deviation %.2f mm at equal arcs", 1000 * d.equal().deviation())
                + line(", %.2f mm at the best nodes", 1000 * d.minimax().deviation()));
        return lines;
    }

    private static String line(String format, double value) {
        return String.format(Locale.ROOT, format, value);
    }
}
