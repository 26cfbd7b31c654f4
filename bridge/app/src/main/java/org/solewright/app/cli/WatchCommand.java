package org.solewright.app.cli;

import java.io.PrintWriter;
import java.nio.file.Path;
import java.util.concurrent.Callable;
import java.util.function.BooleanSupplier;
import org.jspecify.annotations.Nullable;
import org.solewright.app.pipeline.UseCaseException;
import org.solewright.app.study.HandOver;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** A hand-over folder. */
@Command(
        name = "watch",
        description = "A hand-over folder: what is dropped into DIR/in is done and handed back in DIR/out, or in"
                + " DIR/failed with the reason beside it.",
        footer = {
            "",
            "Example:",
            "  solewright watch hand-over &",
            "  mv session-7 hand-over/in/     # a folder of recordings; comes back as hand-over/out/session-7",
            "A job is a folder of C3D files, or one C3D file. It may hold study.xml, subjects.csv and trials.csv as its",
            "ticket; what is missing is proposed, with DIR/landmarks.xml where it has no landmark map of its own."
        })
final class WatchCommand implements Callable<Integer> {

    private static final double LONGEST_SETTLE = 3600;

    @Parameters(paramLabel = "DIR", description = "Hand-over folder; made where it is missing.")
    private Path folder = Path.of(".");

    @Option(names = "--once", description = "End when what is there is done.")
    private boolean isOnce;

    @Option(
            names = "--settle",
            paramLabel = "S",
            defaultValue = "2",
            description = "How long a job's files must keep their sizes, s (default: ${DEFAULT-VALUE}).")
    private double settle = 2;

    @Option(names = "--jobs", paramLabel = "N", description = "Trials at once (default: one per core).")
    @Nullable
    private Integer jobs;

    @Spec
    private CommandSpec spec = CommandSpec.create();

    /** For picocli. */
    WatchCommand() {}

    @Override
    public Integer call() throws UseCaseException {
        if (!(settle >= 0 && settle <= LONGEST_SETTLE)) {
            throw GaitArguments.usage("--settle", settle + " s is out of range, expected 0 to 3600 s", "give fewer");
        }
        int atOnce = StudyArguments.jobs(jobs);
        PrintWriter out = spec.commandLine().getOut();
        Interrupt interrupt = new Interrupt(folder, spec.commandLine().getErr());
        BooleanSupplier isStopped = interrupt::isAsked;
        try {
            HandOver.Result result = HandOver.run(
                    new HandOver.Request(folder, atOnce, settle, isOnce, Version.NUMBER, isStopped), line -> {
                        out.println(FindingPrinter.printable(line));
                        out.flush();
                    });
            return result.failed() == 0 ? ExitCode.DONE : ExitCode.SOME_FAILED;
        } finally {
            interrupt.end();
        }
    }
}
