package org.solewright.app.study;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.function.BooleanSupplier;
import java.util.function.Consumer;
import java.util.stream.Stream;
import org.solewright.app.pipeline.UseCaseException;
import org.solewright.formats.io.AtomicOutput;
import org.solewright.formats.io.FormatException;

/**
 * The hand-over folder: what is dropped into {@code in} is done and handed back in {@code out}, or in {@code failed} with
 * the reason beside. A job is a folder of recordings, or one recording. Its three files of a study may lie in it as the
 * job's ticket; what is missing is proposed, with the landmark map of the hand-over folder where the job has none.
 *
 * <p>A job is taken when its files have kept their sizes for a while, and then moved by a rename into a working folder,
 * where a restart finds it again.
 */
public final class HandOver {

    private static final String IN = "in";
    private static final String WORKING = "working";
    private static final String OUT = "out";
    private static final String FAILED = "failed";
    private static final String LANDMARKS = "landmarks.xml";
    private static final long PAUSE_MS = 500;

    /**
     * What is asked.
     *
     * @param folder the hand-over folder, made where it is missing
     * @param jobs trials at once
     * @param settle how long a job's files must keep their sizes, s
     * @param isOnce whether to end when what is there is done
     * @param version of the tool
     * @param isStopped asked between jobs and trials
     */
    public record Request(
            Path folder, int jobs, double settle, boolean isOnce, String version, BooleanSupplier isStopped) {}

    private final Request request;
    private final Consumer<String> log;
    private int done;
    private int failed;

    private HandOver(Request request, Consumer<String> log) {
        this.request = request;
        this.log = log;
    }

    /**
     * What was done.
     *
     * @param done jobs handed back
     * @param failed jobs that failed
     */
    public record Result(int done, int failed) {}

    /**
     * Watches a folder until it is stopped, or once.
     *
     * @param request what is asked
     * @param log receives a line per job
     * @return what was done
     * @throws UseCaseException where the folder cannot be written, or another watch works on it
     */
    public static Result run(Request request, Consumer<String> log) throws UseCaseException {
        try {
            for (String part : List.of(IN, WORKING, OUT, FAILED)) {
                Files.createDirectories(request.folder().resolve(part));
            }
        } catch (IOException e) {
            throw StudyTask.unwritable(request.folder(), e);
        }
        try (StudyLock lock = StudyLock.of(request.folder(), false, "stop the other watch first")) {
            return new HandOver(request, log).watch(lock.folder());
        }
    }

    private Result watch(Path folder) throws UseCaseException {
        for (Path job : jobs(folder.resolve(WORKING))) {
            work(job);
        }
        Map<Path, String> seen = new HashMap<>();
        Map<Path, Long> since = new HashMap<>();
        while (!request.isStopped().getAsBoolean()) {
            boolean isUnsettled = false;
            for (Path job : jobs(folder.resolve(IN))) {
                String state = state(job);
                long now = System.nanoTime();
                if (!state.equals(seen.put(job, state))) {
                    since.put(job, now);
                }
                if (now - since.getOrDefault(job, now) >= 1e9 * request.settle()) {
                    seen.remove(job);
                    work(moved(job, folder.resolve(WORKING)));
                } else {
                    isUnsettled = true;
                }
                if (request.isStopped().getAsBoolean()) {
                    break;
                }
            }
            if (request.isOnce() && !isUnsettled) {
                break;
            }
            pause();
        }
        return new Result(done, failed);
    }

    private static void pause() throws UseCaseException {
        try {
            Thread.sleep(PAUSE_MS);
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
            throw new UseCaseException(UseCaseException.Kind.OUTPUT, "watch", "interrupted", "start it again", e);
        }
    }

    /** Jobs in a folder in the order of their names; hidden and unfinished names are passed over. */
    private static List<Path> jobs(Path folder) throws UseCaseException {
        try (Stream<Path> files = Files.list(folder)) {
            return files.filter(f -> !nameOf(f).startsWith(".")
                            && !nameOf(f).endsWith(".part")
                            && !nameOf(f).endsWith(".tmp"))
                    .sorted()
                    .toList();
        } catch (IOException e) {
            throw StudyTask.unwritable(folder, e);
        }
    }

    private static String nameOf(Path file) {
        return String.valueOf(file.getFileName());
    }

    /** Names and sizes of a job's files; while it is copied they change. */
    private static String state(Path job) {
        StringBuilder state = new StringBuilder();
        try (Stream<Path> files = Files.walk(job)) {
            for (Path f : files.sorted().toList()) {
                state.append(f)
                        .append(' ')
                        .append(Files.isRegularFile(f) ? Files.size(f) : -1)
                        .append('\n');
            }
        } catch (IOException | java.io.UncheckedIOException e) {
            // A file that vanished meanwhile: not settled.
            state.append(System.nanoTime());
        }
        return state.toString();
    }

    /** Moves by a rename; a name that is taken gets a number. */
    private static Path moved(Path job, Path into) throws UseCaseException {
        String name = nameOf(job);
        Path target = into.resolve(name);
        for (int n = 2; Files.exists(target); n++) {
            target = into.resolve(name + "-" + n);
        }
        try {
            return Files.move(job, target, StandardCopyOption.ATOMIC_MOVE);
        } catch (IOException e) {
            throw StudyTask.unwritable(target, e);
        }
    }

    private void work(Path job) throws UseCaseException {
        long start = System.nanoTime();
        String failure;
        StudyRun.Result result = new StudyRun.Result(0, 0, 0, 0, 0, List.of());
        try {
            Path study = prepared(job);
            Heard heard = new Heard();
            result = StudyRun.run(
                    new StudyRun.Request(study, request.jobs(), false, false, request.version(), request.isStopped()),
                    heard);
            if (result.left() > 0) {
                return;
            }
            failure = heard.failures.isEmpty() ? "" : String.join("\n", heard.failures);
            handBack(study, failure, result, 1e-9 * (System.nanoTime() - start));
        } catch (UseCaseException e) {
            if (e.kind() == UseCaseException.Kind.OUTPUT) {
                throw e;
            }
            handBack(job, reason(e.file(), e.getMessage(), e.whatToDo()), result, 1e-9 * (System.nanoTime() - start));
        } catch (FormatException e) {
            handBack(job, reason(e.source(), e.getMessage(), e.whatToDo()), result, 1e-9 * (System.nanoTime() - start));
        }
    }

    private String reason(String file, String message, String whatToDo) {
        String working = request.folder().resolve(WORKING).toString() + "/";
        return (file + ": " + message + ": " + whatToDo).replace(working, "").replaceAll("\\s*[\\r\\n]+\\s*", " ");
    }

    /** The job as the folder of a study. */
    private Path prepared(Path job) throws UseCaseException {
        Path study = job;
        try {
            if (!Files.isDirectory(job)) {
                study = job.resolveSibling(nameOf(job) + ".job");
                Files.createDirectories(study);
                Files.move(job, study.resolve(nameOf(job)), StandardCopyOption.ATOMIC_MOVE);
            }
            Path map = request.folder().resolve(LANDMARKS);
            Path own = study.resolve(LANDMARKS);
            if (Files.isRegularFile(map) && !Files.exists(own) && !Files.exists(study.resolve(Study.SETTINGS))) {
                byte[] bytes = Files.readAllBytes(map);
                AtomicOutput.write(own, bytes);
            }
        } catch (IOException e) {
            throw StudyTask.unwritable(study, e);
        }
        boolean isWhole =
                Stream.of(Study.SETTINGS, Study.SUBJECTS, Study.TRIALS).allMatch(new Present(study)::has);
        if (!isWhole) {
            StudyProposal.complete(study);
        }
        return study;
    }

    private record Present(Path folder) {
        boolean has(String name) {
            return Files.exists(folder.resolve(name));
        }
    }

    private void handBack(Path job, String failure, StudyRun.Result result, double seconds) throws UseCaseException {
        boolean isFailed = !failure.isEmpty();
        Path target = moved(job, request.folder().resolve(isFailed ? FAILED : OUT));
        String line = failure.isEmpty() ? "" : failure.lines().findFirst().orElse("");
        if (isFailed) {
            failed++;
            try {
                AtomicOutput.write(
                        target.resolveSibling(nameOf(target) + ".reason.txt"),
                        (failure + "\n").getBytes(StandardCharsets.UTF_8));
            } catch (IOException e) {
                throw StudyTask.unwritable(target, e);
            }
        } else {
            done++;
        }
        log.accept(nameOf(target) + " " + (isFailed ? "failed" : "done") + ": "
                + (result.done() + result.skipped()) + " tasks done, " + (result.failed() + result.refused())
                + " failed, " + String.format(java.util.Locale.ROOT, "%.1f s", seconds) + ", " + target
                + (isFailed ? ": " + line : ""));
    }

    /** Remembers what did not end well. */
    private static final class Heard implements StudyListener {
        private final List<String> failures = new ArrayList<>();

        @Override
        public void begin(String what, int tasks) {}

        @Override
        public void ended(String kind, String name, String state, String message) {
            if (!message.isEmpty()) {
                failures.add(kind + " " + name + " " + state + ": " + message);
            }
        }

        @Override
        public void finished() {}
    }
}
