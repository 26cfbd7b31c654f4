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
import java.util.HexFormat;
import java.util.List;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.SourceFile;
import org.solewright.domain.foot.LandmarkMap;
import org.solewright.domain.gait.ContactRow;
import org.solewright.domain.motion.Recording;
import org.solewright.formats.c3d.C3dFile;
import org.solewright.formats.footmodel.LandmarkMapFile;
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

    static List<Recording> recordings(List<Path> files, String role, List<SourceFile> sources, List<Finding> findings)
            throws UseCaseException, FormatException {
        List<Recording> recordings = new ArrayList<>();
        for (Path file : files) {
            Recording r = read(file, f -> C3dFile.read(f).toRecording());
            sources.add(source(role, file));
            for (Finding f : r.findings()) {
                findings.add(new Finding(
                        f.code(),
                        f.severity(),
                        f.where().isEmpty() ? r.name() : r.name() + " " + f.where(),
                        f.message()));
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
            recordings.add(r);
        }
        return recordings;
    }

    static LandmarkMap landmarkMap(Path file, List<SourceFile> sources) throws UseCaseException, FormatException {
        LandmarkMap map = read(file, LandmarkMapFile::read);
        sources.add(source("landmarks", file));
        return map;
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
        Path name = file.getFileName();
        return new SourceFile(role, name == null ? file.toString() : name.toString(), read(file, InputFiles::sha256));
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
