package org.solewright.app.cli;

import java.io.PrintWriter;
import java.nio.charset.StandardCharsets;
import org.solewright.app.pipeline.UseCaseException;
import org.solewright.formats.io.FormatException;
import picocli.CommandLine;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.ScopeType;

/** Entry of the command line. */
@Command(
        name = "solewright",
        description = "Turns gait recordings into segmented-foot models and says what the posture cost.",
        mixinStandardHelpOptions = true,
        versionProvider = Version.class,
        scope = ScopeType.INHERIT,
        synopsisSubcommandLabel = "COMMAND",
        subcommands = {
            SurveyCommand.class,
            TabulateCommand.class,
            ConvertCommand.class,
            LandmarksCommand.class,
            FitCommand.class,
            RollOverCommand.class,
            ExportCommand.class,
            AppraiseCommand.class,
            MapCommand.class,
            PosturesCommand.class,
            SolveCommand.class,
            SprawlCommand.class,
            StudyCommand.class,
            CompareCommand.class,
            WatchCommand.class,
            DemoCommand.class,
        })
public final class Main {

    @Option(names = "--trace", scope = ScopeType.INHERIT, description = "Print a stack trace with an error.")
    private boolean trace;

    /** For picocli. */
    Main() {}

    /**
     * Runs a command and ends the process with its exit code.
     *
     * @param args command and options
     */
    public static void main(String[] args) {
        PrintWriter out = new PrintWriter(System.out, false, StandardCharsets.UTF_8);
        PrintWriter err = new PrintWriter(System.err, true, StandardCharsets.UTF_8);
        int code = run(out, err, args);
        out.flush();
        err.flush();
        System.exit(code);
    }

    /**
     * Runs a command without ending the process.
     *
     * @param out where results go
     * @param err where findings, progress and errors go
     * @param args command and options
     * @return exit code of 05-interfaces
     */
    public static int run(PrintWriter out, PrintWriter err, String... args) {
        Main main = new Main();
        CommandLine line = new CommandLine(main).setOut(out).setErr(err);
        line.setParameterExceptionHandler((e, a) -> usage(e));
        line.setExecutionExceptionHandler((e, l, parsed) -> main.failed(e, err));
        int code;
        try {
            code = line.execute(args);
        } catch (OutOfMemoryError e) {
            code = main.failed(new IllegalStateException(e), err);
        }
        out.flush();
        err.flush();
        return code;
    }

    private static int usage(ParameterException e) {
        CommandLine line = e.getCommandLine();
        line.getErr()
                .println("solewright: " + oneLine(String.valueOf(e.getMessage())) + ": see 'solewright "
                        + (line.getParent() == null ? "" : line.getCommandName() + " ") + "--help'");
        return ExitCode.USAGE;
    }

    private int failed(Exception e, PrintWriter err) {
        int code;
        String text;
        if (e instanceof UseCaseException u) {
            text = u.file() + ": " + u.getMessage() + ": " + u.whatToDo();
            code = switch (u.kind()) {
                case USAGE -> ExitCode.USAGE;
                case INPUT -> ExitCode.INPUT;
                case OUTPUT -> ExitCode.OUTPUT;
            };
        } else if (e instanceof FormatException f) {
            text = f.source() + ": " + f.getMessage() + ": " + f.whatToDo();
            code = ExitCode.INPUT;
        } else if (isOutOfMemory(e)) {
            text = "the input needs more memory than this run may take: allow more, for example by"
                    + " JAVA_OPTS=-Xmx4g, or give less at once";
            code = ExitCode.INPUT;
        } else {
            text = "a defect of ours (" + e + "): please report it with the output of --trace";
            code = ExitCode.DEFECT;
        }
        err.println("solewright: " + oneLine(text));
        if (trace) {
            e.printStackTrace(err);
        }
        return code;
    }

    /** The tasks of a pool hand errors of the machine over as the cause of an exception. */
    private static boolean isOutOfMemory(Throwable e) {
        Throwable cause = e;
        while (cause != null && !(cause instanceof OutOfMemoryError)) {
            cause = cause.getCause();
        }
        return cause != null;
    }

    private static String oneLine(String text) {
        return text.replaceAll("\\s*[\\r\\n]+\\s*", " ");
    }
}
