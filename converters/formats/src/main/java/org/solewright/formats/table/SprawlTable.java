package org.solewright.formats.table;

import java.util.ArrayList;
import java.util.List;

/** Tables of a sprawled limb: the way of its knee and the toe curve on its spherical foot. */
public final class SprawlTable {

    private static final List<String> KNEE =
            List.of("time_s", "hip_x_m", "knee_x_m", "knee_y_m", "knee_z_m", "track_curvature_1_m");
    private static final List<String> TOE = List.of("time_s", "arc_length_m", "toe_x_m", "toe_y_m", "toe_z_m");
    private static final List<String> NODES =
            List.of("node_rule", "node", "time_s", "toe_x_m", "toe_y_m", "toe_z_m", "deviation_m");

    private SprawlTable() {}

    /**
     * The knee in the world: x forward, y to the limb's side, z up.
     *
     * @param rows {@code [samples][6]} row-major: time, s; hip x; knee x, y, z, m; curvature of the track to the left,
     *     1/m, empty where it is not finite
     * @return the table's bytes
     */
    public static byte[] kneeTrack(double[] rows) {
        return CsvText.bytes(KNEE, lines(rows, KNEE.size()));
    }

    /**
     * The contact curve in the foot's frame, which is the world's at the start of the stance, from the knee.
     *
     * @param rows {@code [samples][5]} row-major: time, s; arc length, m; x, y, z, m
     * @return the table's bytes
     */
    public static byte[] toeCurve(double[] rows) {
        return CsvText.bytes(TOE, lines(rows, TOE.size()));
    }

    /**
     * The nodes of toe segments on the curve.
     *
     * @param rules a word per row
     * @param rows {@code [nodes][6]} row-major: number, from 0; time, s; x, y, z, m; the polyline's deviation, m
     * @return the table's bytes
     */
    public static byte[] toeNodes(List<String> rules, double[] rows) {
        List<List<String>> lines = lines(rows, NODES.size() - 1);
        for (int i = 0; i < lines.size(); i++) {
            List<String> line = lines.get(i);
            line.set(0, Integer.toString((int) rows[i * (NODES.size() - 1)]));
            line.add(0, rules.get(i));
        }
        return CsvText.bytes(NODES, lines);
    }

    private static List<List<String>> lines(double[] rows, int width) {
        List<List<String>> lines = new ArrayList<>();
        for (int i = 0; i < rows.length; i += width) {
            List<String> line = new ArrayList<>();
            for (int k = 0; k < width; k++) {
                line.add(CsvText.number(rows[i + k]));
            }
            lines.add(line);
        }
        return lines;
    }
}
