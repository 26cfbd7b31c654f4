package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.geometry.Vec3;
import org.solewright.domain.motion.ResultsMap;
import org.solewright.formats.table.ResultsTable;

/** Ground forces of results as loads of platforms without borders. */
final class ResultsLoads {

    /** By how much the assumed surface reaches beyond the centres of pressure, m. */
    private static final double MARGIN = 1;

    private static final double LOADED = 20;

    private ResultsLoads() {}

    /**
     * Loads of all ground forces.
     *
     * @param columns of the tables
     * @param offset of the tables' clock from that of the recording, s
     * @throws UseCaseException where a force lacks an axis or its centre of pressure
     */
    static List<PlatformLoads> of(ResultsColumns columns, double offset) throws UseCaseException {
        Map<String, ResultsColumns.Triple> forces = columns.triples(ResultsMap.Quantity.GROUND_FORCE);
        Map<String, ResultsColumns.Triple> pressures = columns.triples(ResultsMap.Quantity.COP);
        Map<String, ResultsColumns.Triple> moments = columns.triples(ResultsMap.Quantity.FREE_MOMENT);
        List<PlatformLoads> loads = new ArrayList<>();
        for (Map.Entry<String, ResultsColumns.Triple> e : forces.entrySet()) {
            ResultsColumns.Triple cop = pressures.get(e.getKey());
            if (!e.getValue().isWhole() || cop == null || columns.table(cop) != columns.table(e.getValue())) {
                throw columns.wrong(
                        "the ground force '" + e.getKey() + "' has "
                                + (e.getValue().isWhole()
                                        ? "no centre of pressure in its table"
                                        : "fewer than three axes"),
                        "map x, y and z of ground-force and cop under one name");
            }
            loads.add(loads(
                    columns,
                    loads.size() + 1,
                    e.getValue(),
                    cop,
                    Optional.ofNullable(moments.get(e.getKey())),
                    offset));
        }
        return loads;
    }

    private static PlatformLoads loads(
            ResultsColumns columns,
            int number,
            ResultsColumns.Triple force,
            ResultsColumns.Triple cop,
            Optional<ResultsColumns.Triple> moment,
            double offset) {
        ResultsTable table = columns.table(force);
        double[] f = columns.laboratory(force);
        double[] p = columns.laboratory(cop);
        double[] free = moment.filter(m -> columns.table(m) == table)
                .map(columns::vertical)
                .orElseGet(() -> new double[table.samples()]);
        int n = table.samples();
        for (int i = 0; i < 3 * n; i++) {
            f[i] = Double.isNaN(f[i]) ? 0 : f[i];
        }
        double[] box = {
            Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY, 0, 0
        };
        for (int i = 0; i < n; i++) {
            if (Math.abs(f[3 * i + 2]) > LOADED && Double.isFinite(p[3 * i] + p[3 * i + 1] + p[3 * i + 2])) {
                box[0] = Math.min(box[0], p[3 * i]);
                box[1] = Math.max(box[1], p[3 * i]);
                box[2] = Math.min(box[2], p[3 * i + 1]);
                box[3] = Math.max(box[3], p[3 * i + 1]);
                box[4] += p[3 * i + 2];
                box[5]++;
            }
        }
        boolean isLoaded = box[5] > 0;
        double height = isLoaded ? box[4] / box[5] : 0;
        double x0 = isLoaded ? box[0] - MARGIN : -MARGIN;
        double x1 = isLoaded ? box[1] + MARGIN : MARGIN;
        double y0 = isLoaded ? box[2] - MARGIN : -MARGIN;
        double y1 = isLoaded ? box[3] + MARGIN : MARGIN;
        List<Vec3> corners = List.of(
                new Vec3(x1, y1, height), new Vec3(x0, y1, height), new Vec3(x0, y0, height), new Vec3(x1, y0, height));
        Vec3 centre = new Vec3((x0 + x1) / 2, (y0 + y1) / 2, height);
        double[] m = new double[3 * n];
        for (int i = 0; i < n; i++) {
            Vec3 at = new Vec3(p[3 * i], p[3 * i + 1], p[3 * i + 2]);
            Vec3 of = new Vec3(f[3 * i], f[3 * i + 1], f[3 * i + 2]);
            Vec3 about = at.isFinite() ? at.minus(centre).cross(of) : Vec3.ZERO;
            double twist = Double.isFinite(free[i]) ? free[i] : 0;
            ResultsColumns.put(m, i, about.plus(new Vec3(0, 0, twist)));
        }
        return new PlatformLoads(
                number, PlatformLoads.BORDERLESS, corners, Vec3.Z, table.rate(), table.start() - offset, true, f, m);
    }
}
