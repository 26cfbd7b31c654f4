package org.solewright.app.pipeline;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Vec3;
import org.solewright.domain.motion.ResultsMap;
import org.solewright.formats.table.ResultsTable;

/** Columns of tables of results that belong together as vectors, in the laboratory frame (x forward, y left, z up). */
final class ResultsColumns {

    private final Path xml;
    private final ResultsMap map;
    private final List<ResultsTable> tables;

    /**
     * Columns of some tables.
     *
     * @param xml the map's file, for messages
     * @param map what the columns mean
     * @param tables in the order of the map's
     */
    ResultsColumns(Path xml, ResultsMap map, List<ResultsTable> tables) {
        this.xml = xml;
        this.map = map;
        this.tables = tables;
    }

    ResultsTable table(Triple triple) {
        return tables.get(triple.table);
    }

    UseCaseException wrong(String message, String whatToDo) {
        return new UseCaseException(UseCaseException.Kind.INPUT, xml.toString(), message, whatToDo);
    }

    /** Three columns of one thing in one table; -1 where an axis is missing. */
    static final class Triple {
        private final int table;
        private final int[] axis = {-1, -1, -1};

        Triple(int table) {
            this.table = table;
        }

        boolean isWhole() {
            return axis[0] >= 0 && axis[1] >= 0 && axis[2] >= 0;
        }
    }

    /** Vectors of one quantity by side and name, in the order of the map. */
    Map<String, Triple> triples(ResultsMap.Quantity quantity) throws UseCaseException {
        Map<String, Triple> all = new LinkedHashMap<>();
        for (int t = 0; t < map.tables().size(); t++) {
            List<ResultsMap.Column> columns = map.tables().get(t).columns();
            for (int k = 0; k < columns.size(); k++) {
                ResultsMap.Column c = columns.get(k);
                if (c.quantity() != quantity) {
                    continue;
                }
                if (c.axis() < 0 && quantity != ResultsMap.Quantity.FREE_MOMENT) {
                    throw wrong("column '" + c.name() + "' of " + quantity.word() + " names no axis", "give x, y or z");
                }
                Triple of = all.get(key(c));
                if (of == null) {
                    of = new Triple(t);
                    all.put(key(c), of);
                }
                int axis = Math.max(0, c.axis());
                if (of.table != t || of.axis[axis] >= 0) {
                    throw wrong(
                            "column '" + c.name() + "' is " + quantity.word() + " of " + key(c)
                                    + " for the second time",
                            "give each once, in one table");
                }
                of.axis[axis] = k;
            }
        }
        return all;
    }

    /** Side and name: {@code right_calcaneus_posterior}, {@code 3}. */
    static String key(ResultsMap.Column c) {
        String side = c.side().map(Side::word).orElse("");
        return side.isEmpty() ? c.of() : c.of().isEmpty() ? side : side + "_" + c.of();
    }

    /** {@code [3 * samples]}, row-major; an axis that is missing is 0. */
    double[] laboratory(Triple triple) {
        ResultsTable table = tables.get(triple.table);
        double[][] parts = new double[3][];
        for (int c = 0; c < 3; c++) {
            parts[c] = triple.axis[c] < 0 ? new double[table.samples()] : table.column(triple.axis[c]);
        }
        double[] xyz = new double[3 * table.samples()];
        for (int i = 0; i < table.samples(); i++) {
            put(xyz, i, map.axes().toLaboratory(parts[0][i], parts[1][i], parts[2][i]));
        }
        return xyz;
    }

    /** Angle, moment and power of one joint about one axis, in one table. */
    record JointColumns(
            ResultsTable table, ResultsMap.Column angle, ResultsMap.Column moment, ResultsMap.Column power) {

        boolean has(ResultsMap.Column c) {
            return c.equals(angle) || c.equals(moment) || c.equals(power);
        }
    }

    /** Joints that have one angle, one moment and one power in a table. */
    List<JointColumns> joints() {
        List<JointColumns> joints = new ArrayList<>();
        for (int t = 0; t < map.tables().size(); t++) {
            List<ResultsMap.Column> columns = map.tables().get(t).columns();
            for (ResultsMap.Column power : columns) {
                List<ResultsMap.Column> angles = of(columns, ResultsMap.Quantity.JOINT_ANGLE, key(power));
                List<ResultsMap.Column> moments = of(columns, ResultsMap.Quantity.JOINT_MOMENT, key(power));
                if (power.quantity() == ResultsMap.Quantity.JOINT_POWER && angles.size() == 1 && moments.size() == 1) {
                    joints.add(new JointColumns(tables.get(t), angles.get(0), moments.get(0), power));
                }
            }
        }
        return joints;
    }

    private static List<ResultsMap.Column> of(
            List<ResultsMap.Column> columns, ResultsMap.Quantity quantity, String key) {
        return columns.stream()
                .filter(c -> c.quantity() == quantity && key(c).equals(key))
                .toList();
    }

    /** Samples of a column of a joint's table. */
    double[] samples(JointColumns joint, ResultsMap.Column column) {
        int t = tables.indexOf(joint.table());
        return joint.table().column(map.tables().get(t).columns().indexOf(column));
    }

    /** Names of the table's columns behind the laboratory's axes; empty where an axis is missing. */
    List<String> names(Triple triple) {
        List<ResultsMap.Column> columns = map.tables().get(triple.table).columns();
        String[] names = {"", "", ""};
        List<ResultsMap.Direction> of =
                List.of(map.axes().x(), map.axes().y(), map.axes().z());
        for (int k = 0; k < of.size(); k++) {
            Vec3 d = of.get(k).vector();
            int axis = d.x() != 0 ? 0 : d.y() != 0 ? 1 : 2;
            names[axis] = triple.axis[k] < 0 ? "" : columns.get(triple.axis[k]).name();
        }
        return List.of(names);
    }

    static void put(double[] xyz, int i, Vec3 v) {
        xyz[3 * i] = v.x();
        xyz[3 * i + 1] = v.y();
        xyz[3 * i + 2] = v.z();
    }

    /** The part along up, {@code [samples]}. */
    double[] vertical(Triple moment) {
        ResultsTable table = tables.get(moment.table);
        if (moment.axis[1] < 0 && moment.axis[2] < 0) {
            ResultsMap.Column c = map.tables().get(moment.table).columns().get(moment.axis[0]);
            if (c.axis() < 0) {
                return table.column(moment.axis[0]);
            }
        }
        double[] xyz = laboratory(moment);
        double[] up = new double[table.samples()];
        for (int i = 0; i < up.length; i++) {
            up[i] = xyz[3 * i + 2];
        }
        return up;
    }
}
