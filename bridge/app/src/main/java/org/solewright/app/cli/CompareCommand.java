package org.solewright.app.cli;

import java.io.PrintWriter;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.Callable;
import org.solewright.app.pipeline.UseCaseException;
import org.solewright.app.study.SessionComparison;
import org.solewright.domain.finding.Cautions;
import org.solewright.formats.io.FormatException;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** Compares two sessions or conditions. */
@Command(
        name = "compare",
        description = "Compares two sessions or conditions, with the smallest difference worth believing after markers"
                + " were placed anew.",
        footer = {
            "",
            "Example:",
            "  solewright compare before/posture-cost.csv after/posture-cost.csv",
            "  solewright compare barefoot shod --study recordings --by condition"
        })
final class CompareCommand implements Callable<Integer> {

    @Parameters(
            index = "0",
            paramLabel = "A",
            description = "posture-cost.csv or its folder; with --study: a session or condition.")
    private String first = "";

    @Parameters(index = "1", paramLabel = "B", description = "The other.")
    private String second = "";

    @Option(names = "--study", paramLabel = "DIR", description = "Compare within the results of this study.")
    private Optional<Path> study = Optional.empty();

    @Option(
            names = "--by",
            paramLabel = "COLUMN",
            defaultValue = "session",
            description = "With --study: session, condition or subject (default: ${DEFAULT-VALUE}).")
    private String by = "session";

    @Option(names = "--out", paramLabel = "F.csv", description = "Write the comparison as a table.")
    private Optional<Path> out = Optional.empty();

    @Spec
    private CommandSpec spec = CommandSpec.create();

    /** For picocli. */
    CompareCommand() {}

    @Override
    public Integer call() throws UseCaseException, FormatException {
        List<SessionComparison.Row> rows = SessionComparison.of(side(first), side(second));
        PrintWriter print = spec.commandLine().getOut();
        SessionComparison.lines(rows).forEach(print::println);
        if (out.isPresent()) {
            SessionComparison.write(out.get(), rows);
            print.println("wrote " + out.get());
        }
        Cautions.LINES.forEach(print::println);
        return ExitCode.DONE;
    }

    private SessionComparison.Side side(String name) throws UseCaseException {
        if (study.isEmpty()) {
            return new SessionComparison.Side(Path.of(name), "", "");
        }
        if (!List.of("session", "condition", "subject").contains(by)) {
            throw GaitArguments.usage("--by", "'" + by + "' is unknown", "use session, condition or subject");
        }
        return new SessionComparison.Side(study.get().resolve("tables").resolve("transitions.csv"), by, name);
    }
}
