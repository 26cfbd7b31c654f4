package org.solewright.app.study;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Stream;
import org.solewright.app.pipeline.UseCaseException;
import org.solewright.domain.finding.Finding;
import org.solewright.formats.io.FormatException;

/**
 * One piece of work of a study: inputs and options in, files out. It writes into a folder of its own and moves the files
 * to their places when all are there.
 *
 * @param kind what is done
 * @param subject identifier
 * @param session identifier, may be empty
 * @param condition what was on the foot
 * @param trial identifier; empty for a fit
 * @param inputs files that the result depends on
 * @param options what else it depends on, as one text
 * @param folder where its files go, relative to the study's folder
 * @param refusal why it is not done at all
 * @param work what is done
 */
record StudyTask(
        StudyTask.Kind kind,
        String subject,
        String session,
        String condition,
        String trial,
        List<StudyTask.Source> inputs,
        String options,
        Path folder,
        Optional<Finding> refusal,
        StudyTask.Work work) {

    /** Stands for the digest of a file that cannot be read. */
    static final String UNREADABLE = "unreadable";

    StudyTask {
        inputs = List.copyOf(inputs);
    }

    /** What is done. */
    enum Kind {
        FIT,
        APPRAISE,
        TABLES;

        String word() {
            return name().toLowerCase(java.util.Locale.ROOT);
        }
    }

    /** A file that a result depends on. */
    record Source(String role, Path file) {}

    /** Computes and writes. */
    @FunctionalInterface
    interface Work {
        /**
         * Does the work.
         *
         * @param out empty folder for its files
         * @return findings
         * @throws UseCaseException where an input lacks what is needed or a file cannot be written
         * @throws FormatException where an input is not as its format says
         */
        List<Finding> run(Path out) throws UseCaseException, FormatException;
    }

    /** Identifier in the ledger. */
    String id() {
        return kind.word() + " " + name();
    }

    /** Identifier for people. */
    String name() {
        return subject + "/" + (session.isEmpty() ? "" : session + "/") + (trial.isEmpty() ? condition : trial);
    }

    /** Where a session's results lie; its folder is no identifier where the session has none. */
    static Path place(String top, String subject, String session, String last) {
        return Path.of(top, subject, session.isEmpty() ? "-" : session, last);
    }

    /**
     * The inputs as they are now.
     *
     * @param study folder of the study
     * @param digests of the files of this run
     */
    List<Outcome.Input> digested(Path study, Digests digests) {
        List<Outcome.Input> digested = new ArrayList<>();
        for (Source s : inputs) {
            Path file = s.file();
            String name = file.startsWith(study) ? study.relativize(file).toString() : file.toString();
            digested.add(new Outcome.Input(s.role(), name.replace('\\', '/'), digests.of(file)));
        }
        return digested;
    }

    /**
     * Does the work.
     *
     * @param study folder of the study
     * @param digested inputs as they are
     * @param working folder for unfinished files, of this task alone
     * @param former files that an earlier run of the task wrote
     * @return what came of it
     * @throws UseCaseException where a file cannot be written
     */
    Outcome run(Path study, List<Outcome.Input> digested, Path working, List<Outcome.Output> former)
            throws UseCaseException {
        if (refusal.isPresent()) {
            Finding f = refusal.get();
            remove(study, former, Set.of());
            boolean isRefused = f.code().equals(StudyCheck.AIDED);
            return new Outcome(
                    isRefused ? Outcome.State.REFUSED : Outcome.State.FAILED,
                    f.message(),
                    digested,
                    List.of(f),
                    List.of());
        }
        try {
            List<Finding> findings = work.run(working);
            List<Outcome.Output> outputs = moved(study, working, former);
            Optional<Finding> error = kind == Kind.FIT
                    ? Optional.empty()
                    : findings.stream()
                            .filter(f -> f.severity() == org.solewright.domain.finding.Severity.ERROR)
                            .findFirst();
            return new Outcome(
                    error.isPresent() ? Outcome.State.FAILED : Outcome.State.DONE,
                    error.map(Finding::message).orElse(""),
                    digested,
                    findings,
                    outputs);
        } catch (FormatException e) {
            return failed(study, former, digested, e.getMessage() + ": " + e.whatToDo());
        } catch (UseCaseException e) {
            if (e.kind() == UseCaseException.Kind.OUTPUT) {
                throw e;
            }
            return failed(study, former, digested, e.getMessage() + ": " + e.whatToDo());
        } finally {
            delete(working);
        }
    }

    private Outcome failed(Path study, List<Outcome.Output> former, List<Outcome.Input> digested, String why)
            throws UseCaseException {
        remove(study, former, Set.of());
        return failed(digested, why);
    }

    /** The outcome of a task that a defect ended. */
    static Outcome failed(List<Outcome.Input> digested, String why) {
        String line = why.replaceAll("\\s*[\\r\\n]+\\s*", " ");
        return new Outcome(
                Outcome.State.FAILED, line, digested, List.of(Finding.error("study.failed", "", line)), List.of());
    }

    private List<Outcome.Output> moved(Path study, Path working, List<Outcome.Output> former) throws UseCaseException {
        Path target = study.resolve(folder);
        try {
            Files.createDirectories(target);
            List<Outcome.Output> outputs = new ArrayList<>();
            Set<String> names = new HashSet<>();
            for (Path file : files(working)) {
                Path place = target.resolve(working.relativize(file).toString());
                String name = study.relativize(place).toString().replace('\\', '/');
                outputs.add(new Outcome.Output(name, Digests.sha256(file), Files.size(file)));
                Files.move(file, place, StandardCopyOption.ATOMIC_MOVE, StandardCopyOption.REPLACE_EXISTING);
                names.add(name);
            }
            remove(study, former, names);
            return outputs;
        } catch (IOException e) {
            throw unwritable(target, e);
        }
    }

    private static List<Path> files(Path folder) throws IOException {
        try (Stream<Path> files = Files.list(folder)) {
            return files.sorted().toList();
        }
    }

    /** Removes files that an earlier run of the task wrote and this one did not. */
    private static void remove(Path study, List<Outcome.Output> former, Set<String> kept) throws UseCaseException {
        for (Outcome.Output o : former) {
            if (!kept.contains(o.file())) {
                try {
                    Files.deleteIfExists(study.resolve(o.file()));
                } catch (IOException e) {
                    throw unwritable(study.resolve(o.file()), e);
                }
            }
        }
    }

    static UseCaseException unwritable(Path file, IOException e) {
        return new UseCaseException(
                UseCaseException.Kind.OUTPUT,
                file.toString(),
                "cannot be written (" + e.getMessage() + ")",
                "free space or make it writable, then run again: what is done stays done",
                e);
    }

    /** Deletes a folder of unfinished files with what is in it. */
    static void delete(Path folder) throws UseCaseException {
        if (!Files.exists(folder)) {
            return;
        }
        try (Stream<Path> files = Files.walk(folder)) {
            for (Path file : files.sorted(java.util.Comparator.reverseOrder()).toList()) {
                Files.deleteIfExists(file);
            }
        } catch (IOException e) {
            throw unwritable(folder, e);
        }
    }
}
