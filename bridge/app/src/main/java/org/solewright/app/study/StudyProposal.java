package org.solewright.app.study;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.EnumSet;
import java.util.HashMap;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.solewright.app.pipeline.ResultText;
import org.solewright.app.pipeline.UseCaseException;
import org.solewright.domain.foot.Population;
import org.solewright.domain.motion.PointTrack;
import org.solewright.domain.motion.Recording;
import org.solewright.domain.study.StudySettings;
import org.solewright.domain.study.StudySubject;
import org.solewright.domain.study.StudyTrial;
import org.solewright.formats.c3d.C3dFile;
import org.solewright.formats.footmodel.LandmarkMapFile;
import org.solewright.formats.footmodel.StudyFile;
import org.solewright.formats.io.FormatException;
import org.solewright.formats.table.StudyTables;

/**
 * Proposes the three files of a study from a folder of recordings: who, which session and what kind of trial by the names
 * of folders and files, and by the motion where a name does not tell.
 */
public final class StudyProposal {

    private static final Pattern PART = Pattern.compile("(?<![\\p{L}\\p{N}])(sub|ses|task|run)-([\\p{L}\\p{N}+]+)");
    private static final Pattern STANDING = Pattern.compile("stand|static|calib|neutral|upright");
    private static final Pattern WALKING = Pattern.compile("walk|gait|dynamic|level");
    private static final Map<String, StudyTrial.Condition> CONDITIONS = new LinkedHashMap<>(Map.of(
            "barefoot", StudyTrial.Condition.BAREFOOT,
            "shod", StudyTrial.Condition.SHOD,
            "shoe", StudyTrial.Condition.SHOD,
            "orthosis", StudyTrial.Condition.ORTHOSIS,
            "insole", StudyTrial.Condition.ORTHOSIS,
            "prosthesis", StudyTrial.Condition.PROSTHESIS));
    /** Farther than people sway, nearer than they walk; m. */
    private static final double SWAY = 0.3;

    private static final int DEEPEST = 12;

    private final Path folder;
    private final List<String> lines = new ArrayList<>();
    private int assumedBarefoot;

    private StudyProposal(Path folder) {
        this.folder = folder;
    }

    /**
     * Proposes and writes what is not there yet.
     *
     * @param folder of recordings
     * @param today day for the metadata, as in {@code 2026-03-01}
     * @return what to print
     * @throws UseCaseException where there are no recordings, one of the files is there already, or none can be written
     */
    public static List<String> write(Path folder, String today) throws UseCaseException {
        return new StudyProposal(folder).write(today);
    }

    /**
     * Proposes what is missing and leaves what is there.
     *
     * @param folder of recordings
     * @throws UseCaseException where there are no recordings, or a file cannot be written
     */
    static void complete(Path folder) throws UseCaseException {
        new StudyProposal(folder).propose("");
    }

    private List<String> write(String today) throws UseCaseException {
        if (!Files.isDirectory(folder)) {
            throw new UseCaseException(
                    UseCaseException.Kind.INPUT,
                    folder.toString(),
                    Files.exists(folder) ? "is not a folder" : "no such folder",
                    "give a folder of C3D recordings");
        }
        for (String name : List.of(Study.SETTINGS, Study.SUBJECTS, Study.TRIALS)) {
            if (Files.exists(folder.resolve(name))) {
                throw new UseCaseException(
                        UseCaseException.Kind.OUTPUT,
                        folder.resolve(name).toString(),
                        "is there already and is not replaced",
                        "edit it, or move it away");
            }
        }
        return propose(today);
    }

    private List<String> propose(String today) throws UseCaseException {
        List<Path> files = files();
        List<Path> recordings = files.stream().filter(f -> hasEnding(f, ".c3d")).toList();
        if (recordings.isEmpty()) {
            throw new UseCaseException(
                    UseCaseException.Kind.INPUT,
                    folder.toString(),
                    "holds no file *.c3d",
                    "put the recordings there, in a folder per subject");
        }
        List<StudyTrial> trials = new ArrayList<>();
        Set<String> taken = new HashSet<>();
        for (Path file : recordings) {
            trials.add(trial(file, taken));
        }
        List<StudySubject> subjects = trials.stream()
                .map(StudyTrial::subject)
                .distinct()
                .map(StudyProposal::subject)
                .toList();
        Optional<String> map = landmarks(files);
        StudySettings settings = new StudySettings(
                name(folder.toAbsolutePath().normalize()),
                today,
                map.orElse("landmarks.xml"),
                Optional.empty(),
                org.solewright.app.pipeline.GaitOptions.DEFAULT_MARKER_CUTOFF,
                OptionalDouble.empty(),
                OptionalDouble.empty(),
                false,
                false,
                "platform",
                OptionalInt.empty(),
                "deleva",
                StudySettings.DEFAULT_FIT_TRIALS,
                EnumSet.allOf(StudySettings.Output.class));
        writeNew(Study.SETTINGS, StudyFile.bytes(settings));
        writeNew(Study.SUBJECTS, StudyTables.subjectBytes(subjects));
        writeNew(Study.TRIALS, StudyTables.trialBytes(trials));
        report(trials, subjects, map);
        return lines;
    }

    private void writeNew(String name, byte[] content) throws UseCaseException {
        if (!Files.exists(folder.resolve(name))) {
            ResultText.write(folder.resolve(name), content);
        }
    }

    private void report(List<StudyTrial> trials, List<StudySubject> subjects, Optional<String> map) {
        long standing = trials.stream()
                .filter(t -> t.kind() == StudyTrial.Kind.STANDING)
                .count();
        lines.add("found " + subjects.size() + " subjects, " + standing + " standing and " + (trials.size() - standing)
                + " walking trials");
        lines.add("wrote " + folder.resolve(Study.SETTINGS));
        lines.add("wrote " + folder.resolve(Study.SUBJECTS) + ": fill in masses, statures, populations and sexes");
        lines.add("wrote " + folder.resolve(Study.TRIALS)
                + ": correct sessions, kinds and conditions where they are wrong");
        if (assumedBarefoot > 0) {
            lines.add(
                    "assumed: barefoot in " + assumedBarefoot + " trials, no walking aid, level ground, no treadmill");
        }
        lines.add(
                map.isPresent()
                        ? "the landmark map is " + map.get()
                        : "no landmark map was found: put one at " + folder.resolve("landmarks.xml"));
        lines.add("next: solewright study check " + folder);
    }

    /** All files but those that a study itself writes and hidden ones, in the order of their names. */
    private List<Path> files() throws UseCaseException {
        try (Stream<Path> walk = Files.walk(folder, DEEPEST)) {
            return walk.map(folder::relativize)
                    .filter(StudyProposal::isWanted)
                    .filter(f -> Files.isRegularFile(folder.resolve(f)))
                    .sorted((a, b) -> text(a).compareTo(text(b)))
                    .toList();
        } catch (IOException | java.io.UncheckedIOException e) {
            throw new UseCaseException(
                    UseCaseException.Kind.INPUT,
                    folder.toString(),
                    "cannot be read (" + e.getMessage() + ")",
                    "check the folder",
                    e);
        }
    }

    private static boolean isWanted(Path file) {
        for (Path part : file) {
            if (part.toString().startsWith(".")) {
                return false;
            }
        }
        String top = file.getName(0).toString();
        return file.getNameCount() == 1
                || !List.of(Study.RESULTS, Study.TABLES, "models").contains(top);
    }

    private static String text(Path file) {
        return file.toString().replace('\\', '/');
    }

    private static boolean hasEnding(Path file, String ending) {
        return text(file).toLowerCase(Locale.ROOT).endsWith(ending);
    }

    private static String name(Path file) {
        Path name = file.getFileName();
        return name == null ? "study" : name.toString();
    }

    private static StudySubject subject(String id) {
        return new StudySubject(
                id,
                OptionalDouble.empty(),
                OptionalDouble.empty(),
                OptionalDouble.empty(),
                Population.UNKNOWN,
                Optional.empty(),
                "",
                0);
    }

    private StudyTrial trial(Path file, Set<String> taken) {
        String path = text(file);
        Map<String, String> parts = new HashMap<>();
        Matcher m = PART.matcher(path);
        while (m.find()) {
            parts.put(m.group(1), m.group(2));
        }
        int folders = file.getNameCount() - 1;
        String subject = parts.getOrDefault("sub", folders > 0 ? file.getName(0).toString() : "S1");
        String session = parts.getOrDefault(
                "ses",
                parts.containsKey("sub") || folders < 2 ? "" : file.getName(1).toString());
        String stem = name(file).replaceFirst("\\.[^.]*$", "");
        String trial = parts.containsKey("task")
                ? parts.get("task") + (parts.containsKey("run") ? "-" + parts.get("run") : "")
                : stem;
        String lower = path.toLowerCase(Locale.ROOT);
        StudyTrial.Kind kind = kind(file, parts.getOrDefault("task", stem).toLowerCase(Locale.ROOT));
        return new StudyTrial(
                identifier(subject),
                session.isEmpty() ? "" : identifier(session),
                distinct(identifier(subject) + "/" + session + "/", identifier(trial), taken),
                kind,
                path,
                condition(lower),
                OptionalDouble.empty(),
                StudyTrial.NO_AID,
                0,
                0,
                0);
    }

    private static String distinct(String before, String trial, Set<String> taken) {
        String name = trial;
        for (int n = 2; !taken.add((before + name).toLowerCase(Locale.ROOT)); n++) {
            name = trial + "-" + n;
        }
        return name;
    }

    /** Letters that an identifier does not hold become a hyphen. */
    private static String identifier(String text) {
        String clean = text.replaceAll("[^\\p{L}\\p{N}._+-]", "-").replaceAll("^[^\\p{L}\\p{N}]+", "");
        String some = clean.isEmpty() ? "x" : clean;
        return some.substring(0, Math.min(some.length(), 90));
    }

    private StudyTrial.Condition condition(String path) {
        for (Map.Entry<String, StudyTrial.Condition> e : CONDITIONS.entrySet()) {
            if (path.contains(e.getKey())) {
                return e.getValue();
            }
        }
        assumedBarefoot++;
        return StudyTrial.Condition.BAREFOOT;
    }

    private StudyTrial.Kind kind(Path file, String name) {
        if (STANDING.matcher(name).find()) {
            return StudyTrial.Kind.STANDING;
        }
        if (WALKING.matcher(name).find()) {
            return StudyTrial.Kind.WALKING;
        }
        try {
            return isStill(C3dFile.read(folder.resolve(file)).toRecording())
                    ? StudyTrial.Kind.STANDING
                    : StudyTrial.Kind.WALKING;
        } catch (IOException | FormatException e) {
            lines.add(text(file) + ": cannot be read (" + e.getMessage() + "); entered as walking");
            return StudyTrial.Kind.WALKING;
        }
    }

    /** Whether no point of a recording travels. */
    private static boolean isStill(Recording recording) {
        double farthest = 0;
        for (PointTrack p : recording.points()) {
            double[] xyz = new double[3 * recording.frames()];
            p.copyTo(xyz, 0);
            int first = -1;
            for (int i = 0; i < xyz.length; i += 3) {
                if (Double.isNaN(xyz[i])) {
                    continue;
                }
                if (first < 0) {
                    first = i;
                }
                farthest = Math.max(
                        farthest,
                        Math.hypot(
                                Math.hypot(xyz[i] - xyz[first], xyz[i + 1] - xyz[first + 1]),
                                xyz[i + 2] - xyz[first + 2]));
            }
        }
        return farthest < SWAY;
    }

    private Optional<String> landmarks(List<Path> files) {
        for (Path file : files) {
            if (hasEnding(file, ".xml")) {
                try {
                    LandmarkMapFile.read(folder.resolve(file));
                    return Optional.of(text(file));
                } catch (IOException | FormatException e) {
                    // Some other XML file: not what is looked for.
                }
            }
        }
        return Optional.empty();
    }
}
