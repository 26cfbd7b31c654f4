package org.solewright.app.study;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.solewright.app.pipeline.UseCaseException;
import org.solewright.domain.study.StudySettings;
import org.solewright.domain.study.StudySubject;
import org.solewright.domain.study.StudyTrial;
import org.solewright.formats.footmodel.StudyFile;
import org.solewright.formats.io.FormatException;
import org.solewright.formats.table.StudyTables;

/**
 * A study as its three files state it.
 *
 * @param folder that holds it
 * @param settings of {@code study.xml}
 * @param subjects of {@code subjects.csv}
 * @param trials of {@code trials.csv}
 */
record Study(Path folder, StudySettings settings, List<StudySubject> subjects, List<StudyTrial> trials) {

    static final String SETTINGS = "study.xml";
    static final String SUBJECTS = "subjects.csv";
    static final String TRIALS = "trials.csv";
    static final String RESULTS = "results";
    static final String TABLES = "tables";
    static final String LEDGER = "ledger.sqlite";

    Study {
        subjects = List.copyOf(subjects);
        trials = List.copyOf(trials);
    }

    /**
     * Reads the three files.
     *
     * @param folder of the study
     * @param wrong receives every departure from their formats
     * @return the study without what is wrong; empty where a file cannot be used at all
     * @throws UseCaseException where the folder is none
     */
    static Optional<Study> read(Path folder, List<FormatException> wrong) throws UseCaseException {
        if (!Files.isDirectory(folder)) {
            throw new UseCaseException(
                    UseCaseException.Kind.INPUT,
                    folder.toString(),
                    Files.exists(folder) ? "is not a folder" : "no such folder",
                    "give the folder of a study; 'study init DIR' makes one of a folder of recordings");
        }
        Optional<StudySettings> settings = file(folder.resolve(SETTINGS), StudyFile::read, wrong);
        Optional<StudyTables.Read<StudySubject>> subjects =
                file(folder.resolve(SUBJECTS), StudyTables::subjects, wrong);
        Optional<StudyTables.Read<StudyTrial>> trials = file(folder.resolve(TRIALS), StudyTables::trials, wrong);
        subjects.ifPresent(s -> wrong.addAll(s.wrong()));
        trials.ifPresent(t -> wrong.addAll(t.wrong()));
        if (settings.isEmpty() || subjects.isEmpty() || trials.isEmpty()) {
            return Optional.empty();
        }
        return Optional.of(new Study(
                folder, settings.get(), subjects.get().rows(), trials.get().rows()));
    }

    /**
     * Reads a study that is to be used.
     *
     * @param folder of the study
     * @return the study
     * @throws UseCaseException where the folder is none, or more than one thing is wrong
     * @throws FormatException where one thing is wrong
     */
    static Study read(Path folder) throws UseCaseException, FormatException {
        List<FormatException> wrong = new ArrayList<>();
        Optional<Study> study = read(folder, wrong);
        if (wrong.size() > 1) {
            FormatException first = wrong.get(0);
            throw new UseCaseException(
                    UseCaseException.Kind.INPUT,
                    first.source(),
                    first.getMessage() + " (the first of " + wrong.size() + " mistakes)",
                    "'study check " + folder + "' names them all");
        }
        if (!wrong.isEmpty()) {
            throw wrong.get(0);
        }
        return study.orElseThrow();
    }

    /** Reads a file. */
    @FunctionalInterface
    private interface Reader<T> {
        T read(Path file) throws IOException, FormatException;
    }

    private static <T> Optional<T> file(Path file, Reader<T> reader, List<FormatException> wrong) {
        try {
            if (Files.isDirectory(file)) {
                throw new FormatException(file.toString(), "is a folder, expected a file", "put the file there");
            }
            return Optional.of(reader.read(file));
        } catch (FormatException e) {
            wrong.add(e);
        } catch (NoSuchFileException e) {
            wrong.add(new FormatException(
                    file.toString(), "no such file", "'study init DIR' proposes it from a folder of recordings", e));
        } catch (IOException e) {
            wrong.add(new FormatException(
                    file.toString(), "cannot be read (" + e.getMessage() + ")", "check that it is a readable file", e));
        }
        return Optional.empty();
    }

    /** A file that the study names; empty where its name can be none. */
    Optional<Path> named(String name) {
        try {
            return Optional.of(folder.resolve(name));
        } catch (InvalidPathException e) {
            return Optional.empty();
        }
    }

    Map<String, StudySubject> subjectsById() {
        Map<String, StudySubject> byId = new HashMap<>();
        subjects.forEach(s -> byId.put(s.id(), s));
        return byId;
    }
}
