package org.solewright.app.cli;

import java.io.Console;
import java.io.PrintWriter;
import java.lang.reflect.InvocationTargetException;
import java.nio.file.Path;
import org.jspecify.annotations.Nullable;
import org.solewright.app.pipeline.UseCaseException;
import org.solewright.app.study.StudyListener;
import org.solewright.app.study.StudyRun;
import org.solewright.formats.io.FormatException;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;

/** Options of running a study, and the run itself. */
final class StudyArguments {

    private static final int MOST_JOBS = 1024;

    @Option(names = "--jobs", paramLabel = "N", description = "Trials at once (default: one per core).")
    @Nullable
    private Integer jobs;

    @Option(
            names = "--progress",
            paramLabel = "KIND",
            defaultValue = "auto",
            description = "auto: a bar on a terminal, else a line per failed trial; json: one event a line on standard"
                    + " error; none (default: ${DEFAULT-VALUE}).")
    private String progress = "auto";

    @Option(names = "--wait", description = "Wait for another run of the same study instead of refusing.")
    private boolean isWaiting;

    /** For picocli. */
    StudyArguments() {}

    /**
     * Runs a study and prints what it came to.
     *
     * @param folder of the study
     * @param isRetrying whether failed trials are done again
     * @param spec of the command
     * @return exit code
     */
    int run(Path folder, boolean isRetrying, CommandSpec spec) throws UseCaseException, FormatException {
        int atOnce = jobs(jobs);
        PrintWriter err = spec.commandLine().getErr();
        PrintWriter out = spec.commandLine().getOut();
        StudyListener listener = listener(err);
        Interrupt interrupt = new Interrupt(folder, err);
        StudyRun.Result result;
        try {
            result = StudyRun.run(
                    new StudyRun.Request(folder, atOnce, isWaiting, isRetrying, Version.NUMBER, interrupt::isAsked),
                    listener);
        } finally {
            interrupt.end();
        }
        out.println(folder + ": " + result.done() + " done, " + result.skipped() + " unchanged and skipped, "
                + result.failed() + " failed, " + result.refused() + " refused"
                + (result.left() > 0 ? ", " + result.left() + " left" : ""));
        result.written().forEach(f -> out.println("wrote " + f));
        if (result.written().isEmpty() && result.left() == 0) {
            out.println(folder.resolve("tables") + ": up to date");
        }
        if (result.left() > 0) {
            err.println("solewright: " + folder + ": stopped before " + result.left()
                    + " tasks: the same command goes on where it stopped");
        }
        return result.failed() + result.refused() + result.left() > 0 ? ExitCode.SOME_FAILED : ExitCode.DONE;
    }

    /** How many trials at once. */
    static int jobs(@Nullable Integer asked) throws UseCaseException {
        int jobs = asked == null ? Runtime.getRuntime().availableProcessors() : asked;
        if (jobs < 1 || jobs > MOST_JOBS) {
            throw GaitArguments.usage(
                    "--jobs", jobs + " trials at once, expected 1 to " + MOST_JOBS, "give a number in that range");
        }
        return jobs;
    }

    private StudyListener listener(PrintWriter err) throws UseCaseException {
        return switch (progress) {
            case "auto" -> isTerminal() ? new BarProgress(err) : new PlainProgress(err);
            case "json" -> new JsonProgress(err);
            case "none" -> new PlainProgress(err);
            default ->
                throw GaitArguments.usage("--progress", "'" + progress + "' is unknown", "use auto, json or none");
        };
    }

    /** Whether the user looks on. From Java 22 there is a console also where nobody does, which then says so. */
    @SuppressWarnings("SystemConsoleNull")
    private static boolean isTerminal() {
        Console console = System.console();
        if (console == null || System.getenv("TERM") == null) {
            return false;
        }
        try {
            return Boolean.TRUE.equals(Console.class.getMethod("isTerminal").invoke(console));
        } catch (NoSuchMethodException e) {
            return true;
        } catch (IllegalAccessException | InvocationTargetException e) {
            return false;
        }
    }
}
