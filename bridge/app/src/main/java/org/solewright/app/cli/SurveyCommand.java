package org.solewright.app.cli;

import java.io.PrintWriter;
import java.nio.file.Path;
import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.Callable;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import org.solewright.app.pipeline.FindingCures;
import org.solewright.app.pipeline.Survey;
import org.solewright.app.pipeline.SurveyJson;
import org.solewright.app.pipeline.UseCaseException;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.Severity;
import org.solewright.formats.c3d.C3dReading;
import org.solewright.formats.io.FormatException;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** Says what C3D files hold and what is wrong with them. */
@Command(
        name = "survey",
        description = "Says what C3D files hold, what is wrong with them and what to do.",
        footer = {"", "Example:", "  solewright survey walk-1.c3d walk-2.c3d --json"})
final class SurveyCommand implements Callable<Integer> {

    @Parameters(paramLabel = "FILE", arity = "1..*", description = "C3D files.")
    private List<Path> files = new ArrayList<>();

    @Option(names = "--json", description = "One JSON document per file, each on one line.")
    private boolean isJson;

    @Option(names = "--header", description = "Read no data block; leave gaps and peaks out.")
    private boolean isHeaderOnly;

    @Option(names = "--strict", description = "Findings of severity warning count as errors.")
    private boolean isStrict;

    @Option(names = "--ignore-flags", description = "Take samples for seen that the file flags as missing.")
    private boolean isIgnoringFlags;

    @Spec
    private CommandSpec spec = CommandSpec.create();

    /** For picocli. */
    SurveyCommand() {}

    /** What is printed about one file. */
    private record Surveyed(List<String> out, Optional<String> error) {}

    @Override
    public Integer call() throws InterruptedException {
        int workers = Math.min(Runtime.getRuntime().availableProcessors(), files.size());
        ExecutorService pool = Executors.newFixedThreadPool(workers);
        try {
            return print(pool, workers);
        } finally {
            pool.shutdownNow();
        }
    }

    /** Results in the order of the files; a few ahead of the printed one, so that memory is bounded by the workers. */
    private int print(ExecutorService pool, int workers) throws InterruptedException {
        PrintWriter out = spec.commandLine().getOut();
        Deque<Future<Surveyed>> ahead = new ArrayDeque<>();
        int failed = 0;
        int next = 0;
        for (int i = 0; i < files.size(); i++) {
            while (next < files.size() && ahead.size() <= workers) {
                Path file = files.get(next++);
                ahead.add(pool.submit(() -> surveyed(file)));
            }
            Surveyed one = result(ahead.remove());
            if (!isJson && i > 0 && !one.out().isEmpty()) {
                out.println();
            }
            one.out().forEach(out::println);
            out.flush();
            if (one.error().isPresent()) {
                failed++;
                spec.commandLine()
                        .getErr()
                        .println(FindingPrinter.printable(one.error().get()));
            }
        }
        return failed == 0 ? ExitCode.DONE : failed == files.size() ? ExitCode.INPUT : ExitCode.SOME_FAILED;
    }

    private static Surveyed result(Future<Surveyed> future) throws InterruptedException {
        try {
            return future.get();
        } catch (ExecutionException e) {
            throw new IllegalStateException(e.getCause());
        }
    }

    private Surveyed surveyed(Path file) {
        try {
            C3dReading reading = isIgnoringFlags ? C3dReading.everything().ignoringFlags() : C3dReading.everything();
            Survey survey = Survey.of(file, isHeaderOnly, reading);
            survey = isStrict ? survey.strict() : survey;
            List<String> lines = isJson
                    ? List.of(SurveyJson.line(survey))
                    : survey.page().stream().map(FindingPrinter::printable).toList();
            FindingCures cures = FindingCures.read();
            return new Surveyed(
                    lines,
                    survey.findings().stream()
                            .filter(f -> f.severity() == Severity.ERROR)
                            .findFirst()
                            .map(f -> "solewright: " + file + ": " + f.message()
                                    + cures.of(f.code()).map(c -> ": " + c).orElse("")));
        } catch (UseCaseException e) {
            return failed(file, Finding.error("file.unreadable", "", e.getMessage() + ": " + e.whatToDo()));
        } catch (FormatException e) {
            return failed(file, Finding.error("file.format", "", e.getMessage() + ": " + e.whatToDo()));
        }
    }

    private Surveyed failed(Path file, Finding finding) {
        return new Surveyed(
                isJson ? List.of(SurveyJson.failed(file.toString(), finding)) : List.of(),
                Optional.of("solewright: " + file + ": " + finding.message()));
    }
}
