package org.solewright.app.study;

import java.net.InetAddress;
import java.net.UnknownHostException;
import java.nio.file.Path;
import java.time.Instant;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.IdentityHashMap;
import java.util.Iterator;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import java.util.Set;
import java.util.concurrent.CompletionService;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ExecutorCompletionService;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.function.BooleanSupplier;
import org.solewright.app.pipeline.UseCaseException;
import org.solewright.formats.io.FormatException;

/**
 * Runs a study: fits first, appraisals then, tables last. Tasks run on as many threads as asked, twice as many wait, so
 * that memory is bounded by the threads. One thread alone enters what came of them into the ledger.
 */
public final class StudyRun {

    private static final String WORKING = ".working";

    /**
     * What is asked.
     *
     * @param folder of the study
     * @param jobs tasks at once
     * @param isWaiting whether to wait for another run of the study
     * @param isRetrying whether failed tasks are done again although nothing changed
     * @param version of the tool
     * @param isStopped asked before each task; true: finish what is begun
     */
    public record Request(
            Path folder, int jobs, boolean isWaiting, boolean isRetrying, String version, BooleanSupplier isStopped) {}

    /**
     * What the run came to.
     *
     * @param done tasks done by this run
     * @param skipped tasks that an earlier run had done
     * @param failed tasks that failed, now or in an earlier run with the same inputs
     * @param refused tasks that are not to be done
     * @param left tasks that a stop left undone
     * @param written tables and metadata; empty where they were up to date or the run was stopped
     */
    public record Result(int done, int skipped, int failed, int refused, int left, List<Path> written) {

        /** Copies the list. */
        public Result {
            written = List.copyOf(written);
        }
    }

    private final Request request;
    private final StudyListener listener;
    private final Study study;
    private final Ledger ledger;
    private final Digests digests = new Digests();
    private final long run;
    /** Outcomes of fits, which appraisals rest on. */
    private final Map<String, Outcome> fits = new HashMap<>();

    private final Set<String> ended = new HashSet<>();
    private volatile boolean isStopping;
    private boolean isChanged;
    private int done;
    private int skipped;
    private int failed;
    private int refused;
    private int left;

    private StudyRun(Request request, StudyListener listener, Study study, Ledger ledger) throws UseCaseException {
        this.request = request;
        this.listener = listener;
        this.study = study;
        this.ledger = ledger;
        this.run = ledger.begin(
                now(), host(), request.folder().toAbsolutePath().toString(), request.version(), request.jobs());
    }

    /**
     * Runs a study, or goes on with it.
     *
     * @param request what is asked
     * @param listener told how it goes
     * @return what it came to
     * @throws UseCaseException where the study cannot be read, another run works on it, or a file cannot be written
     * @throws FormatException where one of its files is not as its format says
     */
    public static Result run(Request request, StudyListener listener) throws UseCaseException, FormatException {
        Study.read(request.folder());
        try (StudyLock lock =
                        StudyLock.of(request.folder(), request.isWaiting(), "wait for it to end, or give --wait");
                Ledger ledger = Ledger.open(request.folder())) {
            // Read again: it may have been changed while another run was waited for.
            Study study = Study.read(lock.folder());
            StudyTask.delete(request.folder().resolve(WORKING));
            StudyRun run = new StudyRun(request, listener, study, ledger);
            String how = "failed";
            try {
                Result result = run.run();
                how = result.left() > 0 ? "stopped" : "ended";
                return result;
            } finally {
                listener.finished();
                run.close(how);
            }
        }
    }

    private void close(String how) throws UseCaseException {
        StudyTask.delete(request.folder().resolve(WORKING));
        ledger.end(run, now(), how);
    }

    private static String now() {
        return Instant.now().toString();
    }

    private static String host() {
        try {
            return InetAddress.getLocalHost().getHostName();
        } catch (UnknownHostException e) {
            return "unknown";
        }
    }

    private Result run() throws UseCaseException {
        StudyPlan plan = new StudyPlan(study, request.version());
        List<FitUnit> units = FitUnit.all(study);
        Map<FitUnit, String> fitted = new HashMap<>();
        List<StudyTask> fitting = new ArrayList<>();
        for (FitUnit unit : units) {
            if (unit.isFitted()) {
                StudyTask task = plan.fit(unit);
                fitting.add(task);
                fitted.put(unit, task.id());
            }
        }
        List<StudyTask> appraising = new ArrayList<>();
        process("fit", fitting);
        for (FitUnit unit : units) {
            if (left > 0) {
                left += unit.appraised().size();
                continue;
            }
            Optional<Outcome> fit = Optional.ofNullable(fitted.get(unit)).map(fits::get);
            appraising.addAll(plan.appraisals(unit, models(fit), failure(fit)));
        }
        process("appraise", appraising);
        List<Path> written = List.of();
        if (left == 0) {
            written = tables(fitting, appraising);
        }
        return new Result(done, skipped, failed, refused, left, written);
    }

    /** Writes the tables, unless nothing has changed since they were written. */
    private List<Path> tables(List<StudyTask> fitting, List<StudyTask> appraising) throws UseCaseException {
        SummaryTables tables = new SummaryTables(study, ledger, fitting, appraising, request.version());
        StudyTask task = tables.task();
        Optional<Ledger.Entry> entry = ledger.entry(task.id());
        List<Outcome.Input> inputs = task.digested(study.folder(), digests);
        if (!isChanged && entry.isPresent() && isCurrent(task, entry.get(), inputs)) {
            return List.of();
        }
        listener.begin("tables", 0);
        List<Outcome.Output> outputs =
                tables.write(entry.map(e -> e.outcome().outputs()).orElse(List.of()));
        ledger.enter(
                task,
                request.version(),
                new Outcome(Outcome.State.DONE, "", inputs, List.of(), outputs),
                run,
                now(),
                0);
        return outputs.stream().map(o -> study.folder().resolve(o.file())).toList();
    }

    private List<Path> models(Optional<Outcome> fit) {
        return fit.map(Outcome::outputs).orElse(List.of()).stream()
                .map(o -> study.folder().resolve(o.file()))
                .filter(f -> String.valueOf(f.getFileName()).startsWith("foot-model-"))
                .toList();
    }

    private static Optional<String> failure(Optional<Outcome> fit) {
        return fit.filter(o -> o.state() != Outcome.State.DONE).map(Outcome::message);
    }

    /** What a thread hands back. */
    private record Ended(StudyTask task, Outcome outcome, boolean isSkipped, double seconds) {}

    private void process(String what, List<StudyTask> tasks) throws UseCaseException {
        if (left > 0) {
            left += tasks.size();
            return;
        }
        listener.begin(what, tasks.size());
        ExecutorService threads = Executors.newFixedThreadPool(request.jobs());
        try {
            CompletionService<Optional<Ended>> queue = new ExecutorCompletionService<>(threads);
            IdentityHashMap<Future<Optional<Ended>>, StudyTask> running = new IdentityHashMap<>();
            Iterator<StudyTask> next = tasks.iterator();
            UseCaseException broken = null;
            while (next.hasNext() || !running.isEmpty()) {
                boolean isGoingOn = broken == null && !request.isStopped().getAsBoolean();
                while (isGoingOn && next.hasNext() && running.size() < 3 * request.jobs()) {
                    StudyTask task = next.next();
                    Optional<Ledger.Entry> entry = ledger.entry(task.id());
                    running.put(queue.submit(() -> attempt(task, entry)), task);
                }
                isStopping = !isGoingOn;
                if (running.isEmpty()) {
                    break;
                }
                try {
                    Optional<Ended> ended = taken(queue, running);
                    if (ended.isPresent()) {
                        enter(ended.get());
                    }
                } catch (UseCaseException e) {
                    broken = broken == null ? e : broken;
                }
            }
            if (broken != null) {
                throw broken;
            }
            left += tasks.size() - ended(tasks);
        } finally {
            threads.shutdown();
        }
    }

    private int ended(List<StudyTask> tasks) {
        return (int) tasks.stream().filter(t -> ended.contains(t.id())).count();
    }

    private Optional<Ended> taken(
            CompletionService<Optional<Ended>> queue, IdentityHashMap<Future<Optional<Ended>>, StudyTask> running)
            throws UseCaseException {
        Future<Optional<Ended>> future;
        try {
            future = queue.take();
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
            throw new UseCaseException(
                    UseCaseException.Kind.OUTPUT, study.folder().toString(), "interrupted", "run again", e);
        }
        StudyTask task = Objects.requireNonNull(running.remove(future));
        try {
            return future.get();
        } catch (ExecutionException e) {
            Throwable cause = e.getCause();
            if (cause instanceof UseCaseException u) {
                throw u;
            }
            String why = cause instanceof OutOfMemoryError
                    ? "memory ran out: give fewer --jobs, or more by JAVA_OPTS=-Xmx"
                    : "a defect of ours (" + cause + "): please report it";
            return Optional.of(
                    new Ended(task, StudyTask.failed(task.digested(study.folder(), digests), why), false, 0));
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
            throw new IllegalStateException("a finished task is not waited for", e);
        }
    }

    /** Runs on one of the threads; empty where the run was stopped before the task began. */
    private Optional<Ended> attempt(StudyTask task, Optional<Ledger.Entry> entry) throws UseCaseException {
        if (isStopping || request.isStopped().getAsBoolean()) {
            return Optional.empty();
        }
        long start = System.nanoTime();
        List<Outcome.Input> inputs = task.digested(study.folder(), digests);
        if (entry.isPresent() && isCurrent(task, entry.get(), inputs)) {
            return Optional.of(new Ended(task, entry.get().outcome(), true, 0));
        }
        Path working = study.folder()
                .resolve(WORKING)
                .resolve(task.kind().word() + "-" + Thread.currentThread().getId());
        StudyTask.delete(working);
        Outcome outcome = task.run(
                study.folder(),
                inputs,
                working,
                entry.map(e -> e.outcome().outputs()).orElse(List.of()));
        return Optional.of(new Ended(task, outcome, false, 1e-9 * (System.nanoTime() - start)));
    }

    private boolean isCurrent(StudyTask task, Ledger.Entry entry, List<Outcome.Input> inputs) {
        Outcome outcome = entry.outcome();
        return !(request.isRetrying() && outcome.state() == Outcome.State.FAILED)
                && entry.version().equals(request.version())
                && entry.options().equals(task.options())
                && outcome.inputs().equals(inputs)
                && inputs.stream().noneMatch(i -> i.sha256().equals(StudyTask.UNREADABLE))
                && outcome.outputs().stream()
                        .allMatch(o -> Digests.matches(study.folder().resolve(o.file()), o.sha256(), o.bytes()));
    }

    private void enter(Ended ended) throws UseCaseException {
        StudyTask task = ended.task();
        Outcome outcome = ended.outcome();
        if (!ended.isSkipped()) {
            if (!isChanged) {
                // Tables of an earlier run are no longer those of its trials, also if this run never gets to them.
                ledger.forget(SummaryTables.ID);
                isChanged = true;
            }
            ledger.enter(task, request.version(), outcome, run, now(), ended.seconds());
        }
        this.ended.add(task.id());
        if (task.kind() == StudyTask.Kind.FIT) {
            fits.put(
                    task.id(),
                    new Outcome(outcome.state(), outcome.message(), List.of(), List.of(), outcome.outputs()));
        }
        switch (outcome.state()) {
            case DONE -> {
                done += ended.isSkipped() ? 0 : 1;
                skipped += ended.isSkipped() ? 1 : 0;
            }
            case FAILED -> failed++;
            case REFUSED -> refused++;
        }
        boolean isSkipped = ended.isSkipped() && outcome.state() == Outcome.State.DONE;
        listener.ended(
                task.kind().word(),
                task.name(),
                isSkipped ? "skipped" : outcome.state().word(),
                outcome.message());
    }
}
