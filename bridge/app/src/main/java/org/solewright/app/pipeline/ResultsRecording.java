package org.solewright.app.pipeline;

import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
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

    private static final double TIME_ROUNDING = 1e-3;

    /**
     * What a map of results leads to.
     *
     * @param recording tables as one recording; empty where the map names recordings
     * @param map landmarks of the recording
     * @param mass stated body mass, kg
     * @param files C3D files that the map names
     * @param landmarks their landmark map
     * @param audited what an audit looks at; empty where the map names recordings
     */
    record Loaded(
            Optional<Recording> recording,
            LandmarkMap map,
            OptionalDouble mass,
            List<Path> files,
            Optional<Path> landmarks,
            Optional<AuditInputs> audited) {}

    private final Path xml;
    private final ResultsMap map;
    private final List<Finding> findings;
    private final List<ResultsTable> tables = new ArrayList<>();
    private final ResultsColumns columns;
    private double offset;

    private ResultsRecording(Path xml, ResultsMap map, List<Finding> findings) {
        this.xml = xml;
        this.map = map;
        this.findings = findings;
        this.columns = new ResultsColumns(xml, map, tables);
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
                    Optional.of(beside(xml, landmarks.first())),
                    Optional.empty());
        }
        ResultsRecording results = new ResultsRecording(xml, map, findings);
        results.readTables(given, sources);
        Recording recording = results.recording();
        return new Loaded(
                Optional.of(recording),
                results.landmarks(),
                map.mass(),
                List.of(),
                Optional.empty(),
                Optional.of(new AuditInputs(map, results.columns, GaitSubject.trialName(recording), results.offset)));
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

    private Recording recording() throws UseCaseException {
        Map<String, ResultsColumns.Triple> points = columns.triples(ResultsMap.Quantity.POINT_POSITION);
        if (points.isEmpty()) {
            throw wrong(xml, "maps no point-position", "map the landmarks of feet and pelvis");
        }
        columns.triples(ResultsMap.Quantity.COM_POSITION).forEach((k, t) -> points.putIfAbsent("com", t));
        double rate = 0;
        double start = Double.NaN;
        for (ResultsColumns.Triple t : points.values()) {
            if (columns.table(t).rate() > rate) {
                rate = columns.table(t).rate();
                start = columns.table(t).start();
            }
        }
        // Frames are counted on the recording's clock, which begins with frame 1 at 0 s.
        int firstFrame = (int) Math.round(start * rate) + 1;
        offset = start - (firstFrame - 1) / rate;
        int frames = frames(points, rate, start);
        List<PointTrack> tracks = new ArrayList<>();
        for (Map.Entry<String, ResultsColumns.Triple> e : points.entrySet()) {
            if (!e.getValue().isWhole()) {
                throw wrong(xml, "maps fewer than three axes of the position of " + e.getKey(), "map x, y and z");
            }
            tracks.add(PointTrack.of(e.getKey(), sampled(e.getValue(), rate, start, frames)));
        }
        String name = nameOf(xml);
        unused();
        List<PlatformLoads> loads = ResultsLoads.of(columns, offset);
        if (!loads.isEmpty()) {
            findings.add(Finding.note(
                    "results.no-borders",
                    nameOf(xml),
                    "results state no borders of platforms: every contact counts as whole"));
        }
        return new Recording(name, rate, firstFrame, frames, tracks, loads, List.of(), List.of());
    }

    private int frames(Map<String, ResultsColumns.Triple> points, double rate, double start) {
        double end = Double.POSITIVE_INFINITY;
        for (ResultsColumns.Triple t : points.values()) {
            ResultsTable table = columns.table(t);
            end = Math.min(end, table.start() + (table.samples() - 1) / table.rate());
        }
        return Math.max(1, (int) Math.floor((end - start) * rate + TIME_ROUNDING) + 1);
    }

    /** A point at the finest rate of all points; linear between the samples of a coarser table. */
    private double[] sampled(ResultsColumns.Triple triple, double rate, double start, int frames) {
        ResultsTable table = columns.table(triple);
        double[] xyz = columns.laboratory(triple);
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

    private void unused() {
        TreeSet<String> unused = new TreeSet<>();
        for (ResultsMap.Table t : map.tables()) {
            for (ResultsMap.Column c : t.columns()) {
                switch (c.quantity()) {
                    case GROUND_FORCE, COP, FREE_MOMENT, COM_POSITION, COM_VELOCITY -> {
                        // These are looked at.
                    }
                    case POINT_POSITION -> {
                        if (Landmark.ofWord(c.of()).isEmpty()) {
                            unused.add(c.of());
                        }
                    }
                    case JOINT_ANGLE, JOINT_MOMENT, JOINT_POWER -> {
                        if (columns.joints().stream().noneMatch(j -> j.has(c))) {
                            unused.add(c.quantity().word());
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
                    entries.add(new LandmarkMap.Entry(
                            landmark.get(), c.side(), List.of(new LabelPattern(ResultsColumns.key(c)))));
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
