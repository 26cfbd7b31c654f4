package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.geometry.Vec3;

/**
 * Platforms seen from above, drawn in characters: edges, corner numbers, and the path of the centre of pressure. One
 * column is half as wide as a line is high, so that a square looks square.
 */
final class PlatformSketch {

    private static final int MOST_COLUMNS = 64;
    private static final int MOST_ROWS = 24;
    private static final double ROW_PER_COLUMN = 2;
    private static final double LOADED = 20;

    private final Vec3 across;
    private final Vec3 along;
    private final double left;
    private final double top;
    private final double metresPerColumn;
    private final char[][] field;

    private PlatformSketch(Vec3 across, Vec3 along, double left, double top, double metresPerColumn, char[][] field) {
        this.across = across;
        this.along = along;
        this.left = left;
        this.top = top;
        this.metresPerColumn = metresPerColumn;
        this.field = field;
    }

    /** The drawing, a line each; nothing where there is no platform. */
    static List<String> of(List<PlatformLoads> platforms) {
        if (platforms.isEmpty()) {
            return List.of();
        }
        Vec3 up = axis(platforms.get(0).up());
        Vec3 first = up.x() != 0 ? Vec3.Y : Vec3.X;
        Vec3 second = up.cross(first);
        double[] extent = extent(platforms, first, second);
        // The longer side lies across the page; the other axis is turned with it, still seen from above.
        boolean isTurned = extent[3] - extent[2] > extent[1] - extent[0];
        Vec3 across = isTurned ? second : first;
        Vec3 along = isTurned ? first.times(-1) : second;
        double[] e = extent(platforms, across, along);
        double width = e[1] - e[0];
        double height = e[3] - e[2];
        double perColumn = Math.max(width / (MOST_COLUMNS - 1), height / (ROW_PER_COLUMN * (MOST_ROWS - 1)));
        int columns = (int) Math.round(width / perColumn) + 1;
        int rows = (int) Math.round(height / (ROW_PER_COLUMN * perColumn)) + 1;
        char[][] field = new char[rows][columns];
        for (char[] row : field) {
            Arrays.fill(row, ' ');
        }
        PlatformSketch sketch = new PlatformSketch(across, along, e[0], e[3], perColumn, field);
        platforms.forEach(sketch::draw);
        return sketch.lines();
    }

    /** The axis nearest to a direction. */
    private static Vec3 axis(Vec3 up) {
        double x = Math.abs(up.x());
        double y = Math.abs(up.y());
        double z = Math.abs(up.z());
        return x > y && x > z
                ? Vec3.X.times(Math.signum(up.x()))
                : y > z ? Vec3.Y.times(Math.signum(up.y())) : Vec3.Z.times(Math.signum(up.z()));
    }

    private static double[] extent(List<PlatformLoads> platforms, Vec3 across, Vec3 along) {
        double[] e = {
            Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY
        };
        for (PlatformLoads p : platforms) {
            for (Vec3 c : p.corners()) {
                e[0] = Math.min(e[0], c.dot(across));
                e[1] = Math.max(e[1], c.dot(across));
                e[2] = Math.min(e[2], c.dot(along));
                e[3] = Math.max(e[3], c.dot(along));
            }
        }
        return e;
    }

    private void draw(PlatformLoads p) {
        for (int i = 0; i < 4; i++) {
            Vec3 from = p.corners().get(i);
            Vec3 to = p.corners().get((i + 1) % 4);
            for (int k = 0; k <= MOST_COLUMNS; k++) {
                put(from.plus(to.minus(from).times((double) k / MOST_COLUMNS)), '.');
            }
        }
        for (int i = 0; i < p.samples(); i++) {
            if (p.hasCentreOfPressure() && p.vertical(i) > LOADED) {
                put(p.centreOfPressure(i), '+');
            }
        }
        for (int i = 0; i < 4; i++) {
            put(p.corners().get(i), (char) ('1' + i));
        }
        String number = "P" + p.number();
        for (int i = 0; i < number.length(); i++) {
            put(p.centre().plus(across.times((i - 0.5) * metresPerColumn)), number.charAt(i));
        }
    }

    private void put(Vec3 place, char mark) {
        int column = (int) Math.round((place.dot(across) - left) / metresPerColumn);
        int row = (int) Math.round((top - place.dot(along)) / (ROW_PER_COLUMN * metresPerColumn));
        if (row >= 0 && row < field.length && column >= 0 && column < field[0].length) {
            field[row][column] = mark;
        }
    }

    private List<String> lines() {
        List<String> lines = new ArrayList<>();
        lines.add(String.format(
                Locale.ROOT,
                "platforms from above, %s to the right, %s up the page, a column is %.0f mm; 1 to 4 corners, + centre of"
                        + " pressure",
                name(across),
                name(along),
                1000 * metresPerColumn));
        for (char[] row : field) {
            lines.add(("  " + new String(row)).stripTrailing());
        }
        return lines;
    }

    private static String name(Vec3 axis) {
        return axis.x() != 0 ? sign(axis.x()) + "x" : axis.y() != 0 ? sign(axis.y()) + "y" : sign(axis.z()) + "z";
    }

    private static String sign(double v) {
        return v < 0 ? "-" : "+";
    }
}
