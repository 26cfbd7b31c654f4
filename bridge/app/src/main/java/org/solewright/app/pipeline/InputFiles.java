package org.solewright.app.pipeline;

import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;
import java.security.DigestInputStream;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.HexFormat;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.SourceFile;
import org.solewright.domain.foot.ChainPlan;
import org.solewright.domain.foot.LandmarkMap;
import org.solewright.domain.gait.ContactRow;
import org.solewright.domain.motion.Recording;
import org.solewright.formats.c3d.C3dFile;
import org.solewright.formats.c3d.C3dReading;
import org.solewright.formats.footmodel.LandmarkMapFile;
import org.solewright.formats.footmodel.SegmentPlanFile;
import org.solewright.formats.io.FormatException;
import org.solewright.formats.table.ContactsTable;

/** Reads the user's files; turns what goes wrong into one clear line. */
final class InputFiles {

    private InputFiles() {}

    /** What reads a file. */
    @FunctionalInterface
    interface Reader<T> {
        T read(Path file) throws IOException, FormatException;
    }

    /** Standing recordings: every one of them is needed. */
    static List<Recording> standing(
            List<Path> files, boolean isFlagIgnored, List<SourceFile> sources, List<Finding> findings)
            throws UseCaseException, FormatException {
        List<Recording> recordings = new ArrayList<>();
        for (Path file : files) {
            recordings.add(recording(file, "standing", isFlagIgnored, sources, findings));
        }
        return recordings;
    }

    /**
     * Walking recordings: one that cannot be used is named in a finding and left out; where none can be used, the first
     * one's reason is thrown. Files of one name in two folders are told apart as {@code walk#2}.
     */
    static Walking walking(List<Path> files, boolean isFlagIgnored, List<SourceFile> sources, List<Finding> findings)
            throws UseCaseException, FormatException {
        List<Recording> recordings = new ArrayList<>();
        Map<String, Path> byTrial = new HashMap<>();
        Set<String> names = new HashSet<>();
        UseCaseException unusable = null;
        FormatException damaged = null;
        for (Path file : files) {
            List<SourceFile> read = new ArrayList<>();
            List<Finding> said = new ArrayList<>();
            try {
                Recording r = distinct(recording(file, "walking", isFlagIgnored, read, said), names);
                recordings.add(r);
                byTrial.put(GaitSubject.trialName(r), file);
                sources.addAll(read);
                findings.addAll(said);
            } catch (UseCaseException e) {
                unusable = unusable == null && damaged == null ? e : unusable;
                findings.add(failed(nameOf(file), e.getMessage(), e.whatToDo()));
            } catch (FormatException e) {
                damaged = unusable == null && damaged == null ? e : damaged;
                findings.add(failed(nameOf(file), e.getMessage(), e.whatToDo()));
            }
        }
        if (recordings.isEmpty() && unusable != null) {
            throw unusable;
        }
        if (recordings.isEmpty() && damaged != null) {
            throw damaged;
        }
        return new Walking(recordings, byTrial);
    }

    /**
     * Walking recordings that can be used.
     *
     * @param recordings in the user's order
     * @param files by the name of the trial
     */
    record Walking(List<Recording> recordings, Map<String, Path> files) {}

    /** An input that could not be used although others of the call were. */
    static Finding failed(String where, String message, String whatToDo) {
        return Finding.error("input.failed", where, message + ": " + whatToDo);
    }

    private static Recording distinct(Recording r, Set<String> names) {
        String stem = GaitSubject.trialName(r);
        String ending = r.name().substring(stem.length());
        String name = stem;
        for (int n = 2; !names.add(name); n++) {
            name = stem + "#" + n;
        }
        return new Recording(
                name + ending,
                r.rate(),
                r.firstFrame(),
                r.frames(),
                r.points(),
                r.platforms(),
                r.events(),
                r.findings());
    }

    private static Recording recording(
            Path file, String role, boolean isFlagIgnored, List<SourceFile> sources, List<Finding> findings)
            throws UseCaseException, FormatException {
        C3dReading reading = isFlagIgnored ? C3dReading.everything().ignoringFlags() : C3dReading.everything();
        Recording r = read(file, f -> C3dFile.read(f, reading).toRecording());
        sources.add(source(role, file));
        for (Finding f : r.findings()) {
            findings.add(new Finding(
                    f.code(), f.severity(), f.where().isEmpty() ? r.name() : r.name() + " " + f.where(), f.message()));
        }
        if (r.frames() == 0) {
            throw new UseCaseException(
                    UseCaseException.Kind.INPUT,
                    file.toString(),
                    "the " + role + " recording holds no point frames",
                    "give a recording with markers");
        }
        if (!(r.rate() > 0)) {
            throw new UseCaseException(
                    UseCaseException.Kind.INPUT,
                    file.toString(),
                    "the " + role + " recording states no frame rate",
                    "give a recording with POINT:RATE");
        }
        return r;
    }

    static LandmarkMap landmarkMap(Path file, List<SourceFile> sources) throws UseCaseException, FormatException {
        LandmarkMap map = read(file, LandmarkMapFile::read);
        sources.add(source("landmarks", file));
        return map;
    }

    static ChainPlan segmentPlan(Path file, List<SourceFile> sources) throws UseCaseException, FormatException {
        ChainPlan plan = read(file, SegmentPlanFile::read);
        sources.add(source("segment-plan", file));
        return plan;
    }

    static List<ContactRow> contacts(Path file, List<SourceFile> sources) throws UseCaseException, FormatException {
        List<ContactRow> rows = read(file, ContactsTable::read);
        sources.add(source("contacts", file));
        return rows;
    }

    static <T> T read(Path file, Reader<T> reader) throws UseCaseException, FormatException {
        if (Files.isDirectory(file)) {
            throw new UseCaseException(UseCaseException.Kind.INPUT, file.toString(), "is a folder", "give a file");
        }
        try {
            return reader.read(file);
        } catch (NoSuchFileException e) {
            throw new UseCaseException(
                    UseCaseException.Kind.INPUT, file.toString(), "no such file", "check the name", e);
        } catch (IOException e) {
            throw new UseCaseException(
                    UseCaseException.Kind.INPUT,
                    file.toString(),
                    "cannot be read (" + e.getMessage() + ")",
                    "check that it is a readable file",
                    e);
        }
    }

    static SourceFile source(String role, Path file) throws UseCaseException, FormatException {
        return new SourceFile(role, nameOf(file), read(file, InputFiles::sha256));
    }

    private static String nameOf(Path file) {
        Path name = file.getFileName();
        return name == null ? file.toString() : name.toString();
    }

    private static String sha256(Path file) throws IOException {
        MessageDigest digest;
        try {
            digest = MessageDigest.getInstance("SHA-256");
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException("every Java runtime has SHA-256", e);
        }
        try (InputStream in = new DigestInputStream(Files.newInputStream(file), digest)) {
            in.transferTo(java.io.OutputStream.nullOutputStream());
        }
        return HexFormat.of().formatHex(digest.digest());
    }
}
