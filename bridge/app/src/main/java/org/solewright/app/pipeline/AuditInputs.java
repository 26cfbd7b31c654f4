package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.solewright.analysis.audit.AuditedResults;
import org.solewright.analysis.audit.AuditedVector;
import org.solewright.analysis.audit.JointAudit;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.gait.Side;
import org.solewright.domain.motion.ResultsMap;
import org.solewright.formats.table.ResultsTable;

/** What an audit looks at, from the tables at their own rates, on the clock of the recording made of them. */
final class AuditInputs {

    private static final List<Landmark> FOOT = List.of(
            Landmark.CALCANEUS_POSTERIOR,
            Landmark.METATARSAL_1_HEAD,
            Landmark.METATARSAL_2_HEAD,
            Landmark.METATARSAL_5_HEAD,
            Landmark.TOE_TIP,
            Landmark.HALLUX_TIP);

    private static final List<Landmark> HEADS =
            List.of(Landmark.METATARSAL_1_HEAD, Landmark.METATARSAL_2_HEAD, Landmark.METATARSAL_5_HEAD);
    private static final double TOES = 0.37;

    private final ResultsMap map;
    private final ResultsColumns columns;
    private final String name;
    private final double offset;
    private final AuditedResults results;

    AuditInputs(ResultsMap map, ResultsColumns columns, String name, double offset) throws UseCaseException {
        this.map = map;
        this.columns = columns;
        this.name = name;
        this.offset = offset;
        this.results = new AuditedResults(
                name,
                whole(ResultsMap.Quantity.COM_POSITION, "centre of mass"),
                whole(ResultsMap.Quantity.COM_VELOCITY, "velocity of the centre of mass"),
                loads(),
                feet(),
                map.mass());
    }

    AuditedResults results() {
        return results;
    }

    private AuditedVector vector(ResultsColumns.Triple triple, String words) {
        ResultsTable table = columns.table(triple);
        return new AuditedVector(
                words, columns.names(triple), table.start() - offset, table.rate(), columns.laboratory(triple));
    }

    private Optional<AuditedVector> whole(ResultsMap.Quantity quantity, String words) throws UseCaseException {
        return columns.triples(quantity).values().stream()
                .filter(ResultsColumns.Triple::isWhole)
                .findFirst()
                .map(t -> vector(t, words));
    }

    private Optional<Side> side(ResultsMap.Quantity quantity, String key) {
        return map.tables().stream()
                .flatMap(t -> t.columns().stream())
                .filter(c -> c.quantity() == quantity && ResultsColumns.key(c).equals(key))
                .findFirst()
                .flatMap(ResultsMap.Column::side);
    }

    private List<AuditedResults.Load> loads() throws UseCaseException {
        Map<String, ResultsColumns.Triple> pressures = columns.triples(ResultsMap.Quantity.COP);
        List<AuditedResults.Load> loads = new ArrayList<>();
        for (Map.Entry<String, ResultsColumns.Triple> e :
                columns.triples(ResultsMap.Quantity.GROUND_FORCE).entrySet()) {
            ResultsColumns.Triple cop = pressures.get(e.getKey());
            if (cop != null) {
                loads.add(new AuditedResults.Load(
                        side(ResultsMap.Quantity.GROUND_FORCE, e.getKey()),
                        vector(e.getValue(), "ground force " + e.getKey()),
                        vector(cop, "centre of pressure " + e.getKey())));
            }
        }
        return loads;
    }

    /** Landmarks of each foot that stand in the table of its first one. */
    private List<AuditedResults.Foot> feet() throws UseCaseException {
        Map<String, ResultsColumns.Triple> points = columns.triples(ResultsMap.Quantity.POINT_POSITION);
        List<AuditedResults.Foot> feet = new ArrayList<>();
        for (Side side : Side.values()) {
            Map<String, ResultsColumns.Triple> own = new LinkedHashMap<>();
            for (Landmark landmark : FOOT) {
                String key = side.word() + "_" + landmark.word();
                ResultsColumns.Triple t = points.get(key);
                boolean isAlike = t != null
                        && own.values().stream().allMatch(o -> columns.table(o).equals(columns.table(t)));
                if (t != null && isAlike) {
                    own.put(key, t);
                }
            }
            if (!own.isEmpty()) {
                List<AuditedVector> landmarks = new ArrayList<>();
                own.forEach((key, t) -> landmarks.add(vector(t, key.replace('_', ' '))));
                toe(side, own).ifPresent(landmarks::add);
                feet.add(new AuditedResults.Foot(side, landmarks));
            }
        }
        return feet;
    }

    /** Where no toe is mapped: the first head carried 0.37 of its distance from the heel forward (design 03 section 3). */
    private Optional<AuditedVector> toe(Side side, Map<String, ResultsColumns.Triple> own) {
        ResultsColumns.Triple heel = own.get(side.word() + "_" + Landmark.CALCANEUS_POSTERIOR.word());
        List<ResultsColumns.Triple> heads = HEADS.stream()
                .map(h -> Optional.ofNullable(own.get(side.word() + "_" + h.word())))
                .flatMap(Optional::stream)
                .toList();
        boolean hasToe = own.keySet().stream()
                .anyMatch(k -> k.endsWith(Landmark.TOE_TIP.word()) || k.endsWith(Landmark.HALLUX_TIP.word()));
        if (heel == null || heads.isEmpty() || hasToe) {
            return Optional.empty();
        }
        double[] from = columns.laboratory(heel);
        double[] xyz = columns.laboratory(heads.get(0));
        for (int i = 0; i < xyz.length; i++) {
            // Forward along the ground; the height stays that of the head.
            xyz[i] += i % 3 == 2 ? 0 : TOES * (xyz[i] - from[i]);
        }
        ResultsTable table = columns.table(heel);
        return Optional.of(new AuditedVector(
                side.word() + " toes", List.of("", "", ""), table.start() - offset, table.rate(), xyz));
    }

    List<JointAudit.Columns> joints() {
        List<JointAudit.Columns> joints = new ArrayList<>();
        for (ResultsColumns.JointColumns j : columns.joints()) {
            double[] angle = columns.samples(j, j.angle());
            double[] moment = columns.samples(j, j.moment());
            double[] power = columns.samples(j, j.power());
            double[] values = new double[3 * angle.length];
            for (int i = 0; i < angle.length; i++) {
                values[3 * i] = angle[i];
                values[3 * i + 1] = moment[i];
                values[3 * i + 2] = power[i];
            }
            String of = ResultsColumns.key(j.power()).replace('_', ' ');
            List<String> names =
                    List.of(j.angle().name(), j.moment().name(), j.power().name());
            joints.add(new JointAudit.Columns(
                    of,
                    names.get(0),
                    names.get(1),
                    names.get(2),
                    new AuditedVector(
                            of, names, j.table().start() - offset, j.table().rate(), values)));
        }
        return joints;
    }

    String name() {
        return name;
    }
}
