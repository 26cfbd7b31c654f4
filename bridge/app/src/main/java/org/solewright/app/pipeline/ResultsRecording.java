package org.solewright.app.pipeline;

import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.TreeSet;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.SourceFile;
import org.solewright.domain.foot.LabelPattern;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.foot.LandmarkMap;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Vec3;
import org.solewright.domain.motion.PointTrack;
import org.solewright.domain.motion.Recording;
import org.solewright.domain.motion.ResultsMap;
import org.solewright.formats.footmodel.ResultsMapFile;
import org.solewright.formats.io.FormatException;
import org.solewright.formats.table.ResultsTable;

/**
 * Simulated or measured results in delimited tables as a recording, so that they are appraised like one: points named by
 * their landmarks, and loads as those of platforms without borders. Laboratory frame: x forward, y left, z up.
 */
final class ResultsRecording {

    /** By how much the assumed surface reaches beyond the centres of pressure, m. */
    private static final double MARGIN = 1;

    private static final double LOADED = 20;
    private static final double TIME_ROUNDING = 1e-3;

    /**
     * What a map of results leads to.
     *
     * @param recording tables as one recording; empty where the map names recordings
     * @param map landmarks of the recording
     * @param mass stated body mass, kg
     * @param files C3D files that the map names
     * @param landmarks their landmark map
     */
    record Loaded(
            Optional<Recording> recording,
            LandmarkMap map,
            OptionalDouble mass,
            List<Path> files,
            Optional<Path> landmarks) {}

    private final Path xml;
    private final ResultsMap map;
    private final List<Finding> findings;
    private final List<ResultsTable> tables = new ArrayList<>();

    private ResultsRecording(Path xml, ResultsMap map, List<Finding> findings) {
        this.xml = xml;
        this.map = map;
        this.findings = findings;
    }

    /**
     * Reads a map of results and its files.
     *
     * @param xml the map
     * @param given tables for those of the map that name no file, in its order
     * @param sources receives the files
     * @param findings receives what has to be said
     * @return what it leads to
     * @throws UseCaseException where a file is missing or does not hold what is needed
     * @throws FormatException where a file is not as its format says
     */
    static Loaded read(Path xml, List<Path> given, List<SourceFile> sources, List<Finding> findings)
            throws UseCaseException, FormatException {
        ResultsMap map = InputFiles.read(xml, ResultsMapFile::read);
        sources.add(InputFiles.source("results", xml));
        if (map.tables().isEmpty() == map.recordings().isEmpty()) {
            throw wrong(
                    xml,
                    map.tables().isEmpty() ? "names neither tables nor recordings" : "names tables and recordings",
                    "name tables, or recordings with one landmark map");
        }
        if (map.tables().isEmpty()) {
            List<Path> files = new ArrayList<>();
            TreeSet<String> landmarks = new TreeSet<>();
            for (ResultsMap.RecordingFile r : map.recordings()) {
                files.add(beside(xml, r.file()));
                landmarks.add(r.landmarks());
            }
            if (landmarks.size() != 1) {
                throw wrong(xml, "names landmark maps " + landmarks, "give all its recordings one landmark map");
            }
            return new Loaded(
                    Optional.empty(),
                    new LandmarkMap("", List.of()),
                    map.mass(),
                    files,
                    Optional.of(beside(xml, landmarks.first())));
        }
        ResultsRecording results = new ResultsRecording(xml, map, findings);
        results.readTables(given, sources);
        return new Loaded(
                Optional.of(results.recording()), results.landmarks(), map.mass(), List.of(), Optional.empty());
    }

    private static Path beside(Path xml, String name) throws UseCaseException {
        Path folder = xml.toAbsolutePath().getParent();
        try {
            return folder == null ? Path.of(name) : folder.resolve(name);
        } catch (InvalidPathException e) {
            throw wrong(xml, "names the file '" + name + "', which is no file name", "correct the name");
        }
    }

    private static UseCaseException wrong(Path file, String message, String whatToDo) {
        return new UseCaseException(UseCaseException.Kind.INPUT, file.toString(), message, whatToDo);
    }

    private void readTables(List<Path> given, List<SourceFile> sources) throws UseCaseException, FormatException {
        int next = 0;
        for (ResultsMap.Table table : map.tables()) {
            Path file;
            if (!table.file().isEmpty()) {
                file = beside(xml, table.file());
            } else if (next < given.size()) {
                file = given.get(next++);
            } else {
                throw wrong(xml, "is a template: table " + (next + 1) + " names no file", "give --table FILE");
            }
            ResultsTable read = InputFiles.read(file, f -> ResultsTable.read(f, table));
            sources.add(InputFiles.source("table", file));
            tables.add(read);
            if (read.isResampled()) {
                findings.add(Finding.note(
                        "results.resampled",
                        nameOf(file),
                        String.format(
                                Locale.ROOT,
                                "its times are uneven; its columns are interpolated linearly to %.6g Hz",
                                read.rate())));
            }
        }
        if (next < given.size()) {
            throw new UseCaseException(
                    UseCaseException.Kind.USAGE,
                    given.get(next).toString(),
                    "the map has no table without a file name left for it",
                    "leave it out or leave the file name out of the map");
        }
    }

    private static String nameOf(Path file) {
        Path name = file.getFileName();
        return name == null ? file.toString() : name.toString();
    }

    /** Three columns of one thing in one table; -1 where an axis is missing. */
    private static final class Triple {
        private final int table;
        private final int[] axis = {-1, -1, -1};

        Triple(int table) {
            this.table = table;
        }

        boolean isWhole() {
            return axis[0] >= 0 && axis[1] >= 0 && axis[2] >= 0;
        }
    }

    private Map<String, Triple> triples(ResultsMap.Quantity quantity) throws UseCaseException {
        Map<String, Triple> all = new LinkedHashMap<>();
        for (int t = 0; t < map.tables().size(); t++) {
            List<ResultsMap.Column> columns = map.tables().get(t).columns();
            for (int k = 0; k < columns.size(); k++) {
                ResultsMap.Column c = columns.get(k);
                if (c.quantity() != quantity) {
                    continue;
                }
                if (c.axis() < 0 && quantity != ResultsMap.Quantity.FREE_MOMENT) {
                    throw wrong(
                            xml,
                            "column '" + c.name() + "' of " + quantity.word() + " names no axis",
                            "give x, y or z");
                }
                Triple of = all.get(key(c));
                if (of == null) {
                    of = new Triple(t);
                    all.put(key(c), of);
                }
                int axis = Math.max(0, c.axis());
                if (of.table != t || of.axis[axis] >= 0) {
                    throw wrong(
                            xml,
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
    private static String key(ResultsMap.Column c) {
        String side = c.side().map(Side::word).orElse("");
        return side.isEmpty() ? c.of() : c.of().isEmpty() ? side : side + "_" + c.of();
    }

    private double[] laboratory(Triple triple) {
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

    private static void put(double[] xyz, int i, Vec3 v) {
        xyz[3 * i] = v.x();
        xyz[3 * i + 1] = v.y();
        xyz[3 * i + 2] = v.z();
    }

    private Recording recording() throws UseCaseException {
        Map<String, Triple> points = triples(ResultsMap.Quantity.POINT_POSITION);
        if (points.isEmpty()) {
            throw wrong(xml, "maps no point-position", "map the landmarks of feet and pelvis");
        }
        triples(ResultsMap.Quantity.COM_POSITION).forEach((k, t) -> points.putIfAbsent("com", t));
        double rate = 0;
        double start = Double.NaN;
        for (Triple t : points.values()) {
            if (tables.get(t.table).rate() > rate) {
                rate = tables.get(t.table).rate();
                start = tables.get(t.table).start();
            }
        }
        // Frames are counted on the recording's clock, which begins with frame 1 at 0 s.
        int firstFrame = (int) Math.round(start * rate) + 1;
        double offset = start - (firstFrame - 1) / rate;
        int frames = frames(points, rate, start);
        List<PointTrack> tracks = new ArrayList<>();
        for (Map.Entry<String, Triple> e : points.entrySet()) {
            if (!e.getValue().isWhole()) {
                throw wrong(xml, "maps fewer than three axes of the position of " + e.getKey(), "map x, y and z");
            }
            tracks.add(PointTrack.of(e.getKey(), sampled(e.getValue(), rate, start, frames)));
        }
        String name = nameOf(xml);
        unused();
        return new Recording(name, rate, firstFrame, frames, tracks, loads(offset), List.of(), List.of());
    }

    private int frames(Map<String, Triple> points, double rate, double start) {
        double end = Double.POSITIVE_INFINITY;
        for (Triple t : points.values()) {
            ResultsTable table = tables.get(t.table);
            end = Math.min(end, table.start() + (table.samples() - 1) / table.rate());
        }
        return Math.max(1, (int) Math.floor((end - start) * rate + TIME_ROUNDING) + 1);
    }

    /** A point at the finest rate of all points; linear between the samples of a coarser table. */
    private double[] sampled(Triple triple, double rate, double start, int frames) {
        ResultsTable table = tables.get(triple.table);
        double[] xyz = laboratory(triple);
        boolean isSame = Math.abs(table.rate() / rate - 1) < 1e-9 && Math.abs(table.start() - start) < 1e-9;
        if (isSame) {
            return Arrays.copyOf(xyz, 3 * frames);
        }
        String note = String.format(
                Locale.ROOT, "points of %.6g Hz are interpolated linearly to %.6g Hz", table.rate(), rate);
        if (findings.stream().noneMatch(f -> f.message().equals(note))) {
            findings.add(Finding.note("results.interpolated", nameOf(xml), note));
        }
        double[] out = new double[3 * frames];
        for (int i = 0; i < frames; i++) {
            double at = (start + i / rate - table.start()) * table.rate();
            int before = (int) Math.max(0, Math.min(table.samples() - 2, Math.floor(at)));
            double share = at - before;
            for (int c = 0; c < 3; c++) {
                out[3 * i + c] = share < -TIME_ROUNDING || share > 1 + TIME_ROUNDING
                        ? Double.NaN
                        : xyz[3 * before + c] * (1 - share) + xyz[3 * before + 3 + c] * share;
            }
        }
        return out;
    }

    private List<PlatformLoads> loads(double offset) throws UseCaseException {
        Map<String, Triple> forces = triples(ResultsMap.Quantity.GROUND_FORCE);
        Map<String, Triple> pressures = triples(ResultsMap.Quantity.COP);
        Map<String, Triple> moments = triples(ResultsMap.Quantity.FREE_MOMENT);
        List<PlatformLoads> loads = new ArrayList<>();
        for (Map.Entry<String, Triple> e : forces.entrySet()) {
            Triple cop = pressures.get(e.getKey());
            if (!e.getValue().isWhole() || cop == null || cop.table != e.getValue().table) {
                throw wrong(
                        xml,
                        "the ground force '" + e.getKey() + "' has "
                                + (e.getValue().isWhole()
                                        ? "no centre of pressure in its table"
                                        : "fewer than three axes"),
                        "map x, y and z of ground-force and cop under one name");
            }
            loads.add(loads(loads.size() + 1, e.getValue(), cop, Optional.ofNullable(moments.get(e.getKey())), offset));
        }
        if (!loads.isEmpty()) {
            findings.add(Finding.note(
                    "results.no-borders",
                    nameOf(xml),
                    "results state no borders of platforms: every contact counts as whole"));
        }
        return loads;
    }

    private PlatformLoads loads(int number, Triple force, Triple cop, Optional<Triple> moment, double offset) {
        ResultsTable table = tables.get(force.table);
        double[] f = laboratory(force);
        double[] p = laboratory(cop);
        double[] free = moment.filter(m -> m.table == force.table)
                .map(this::vertical)
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
            put(m, i, about.plus(new Vec3(0, 0, twist)));
        }
        return new PlatformLoads(
                number, PlatformLoads.BORDERLESS, corners, Vec3.Z, table.rate(), table.start() - offset, true, f, m);
    }

    private double[] vertical(Triple moment) {
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

    private void unused() {
        TreeSet<String> unused = new TreeSet<>();
        for (ResultsMap.Table t : map.tables()) {
            for (ResultsMap.Column c : t.columns()) {
                switch (c.quantity()) {
                    case GROUND_FORCE, COP, FREE_MOMENT, COM_POSITION -> {
                        // These are looked at.
                    }
                    case POINT_POSITION -> {
                        if (Landmark.ofWord(c.of()).isEmpty()) {
                            unused.add(c.of());
                        }
                    }
                    default -> unused.add(c.quantity().word());
                }
            }
        }
        if (!unused.isEmpty()) {
            findings.add(Finding.note(
                    "results.unused", nameOf(xml), "columns of " + String.join(", ", unused) + " are not looked at"));
        }
    }

    /** Every point that is named after a landmark; the centre of mass stands in for a pelvis that is not mapped. */
    private LandmarkMap landmarks() {
        List<LandmarkMap.Entry> entries = new ArrayList<>();
        boolean hasPelvis = false;
        boolean hasCentre = false;
        for (ResultsMap.Table t : map.tables()) {
            for (ResultsMap.Column c : t.columns()) {
                hasCentre |= c.quantity() == ResultsMap.Quantity.COM_POSITION;
                Optional<Landmark> landmark =
                        c.quantity() == ResultsMap.Quantity.POINT_POSITION ? Landmark.ofWord(c.of()) : Optional.empty();
                if (landmark.isPresent() && c.axis() == 0) {
                    entries.add(new LandmarkMap.Entry(landmark.get(), c.side(), List.of(new LabelPattern(key(c)))));
                    hasPelvis |= List.of(Landmark.ASIS, Landmark.PSIS, Landmark.SACRUM, Landmark.TROCHANTER_MAJOR)
                            .contains(landmark.get());
                }
            }
        }
        if (!hasPelvis && hasCentre) {
            entries.add(new LandmarkMap.Entry(Landmark.SACRUM, Optional.empty(), List.of(new LabelPattern("com"))));
        }
        return new LandmarkMap(map.subject(), entries);
    }
}
