package org.solewright.app.cli;

import java.io.PrintWriter;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.EnumSet;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.Set;
import java.util.concurrent.Callable;
import org.jspecify.annotations.Nullable;
import org.solewright.analysis.fitting.InertiaTable;
import org.solewright.app.pipeline.FitReport;
import org.solewright.app.pipeline.FitUseCase;
import org.solewright.app.pipeline.GaitOptions;
import org.solewright.app.pipeline.UseCaseException;
import org.solewright.domain.gait.Side;
import org.solewright.formats.io.FormatException;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;

/** Fits a segmented foot model per side. */
@Command(
        name = "fit",
        description = "Fits a segmented foot model per side from standing and walking recordings.",
        footer = {
            "",
            "Example:",
            "  solewright fit --standing standing.c3d --walking walk-1.c3d --walking walk-2.c3d \\",
            "    --landmarks map.xml --mass 71.5 --population adult --sex female --out model",
            "Writes foot-model-right.xml, foot-model-left.xml, fit-contacts.csv, fit-curves.csv and",
            "fit-uncertainty.csv to the folder model; --html and --pdf add a page per side, as",
            "foot-model-right.html and foot-model-right.pdf."
        })
final class FitCommand implements Callable<Integer> {

    private static final int MOST_RUNS = 100_000;

    @Option(
            names = "--standing",
            paramLabel = "S.c3d",
            required = true,
            description = "Standing recording; may be repeated.")
    private List<Path> standing = new ArrayList<>();

    @Mixin
    private GaitArguments gait = new GaitArguments();

    @Option(names = "--stature", paramLabel = "M", description = "Body height, m.")
    @Nullable
    private Double stature;

    @Option(names = "--population", paramLabel = "WORD", description = "adult, child or other.")
    @Nullable
    private String population;

    @Option(names = "--sex", paramLabel = "WORD", description = "female or male.")
    @Nullable
    private String sex;

    @Option(
            names = "--side",
            paramLabel = "WORD",
            defaultValue = "both",
            description = "left, right or both (default: ${DEFAULT-VALUE}).")
    private String side = "both";

    @Option(
            names = "--segments",
            paramLabel = "N",
            description = "Parts of the foot, 1 to 6 (default: as many as the landmarks allow).")
    @Nullable
    private Integer segments;

    @Option(
            names = "--plan",
            paramLabel = "P.xml",
            description = "Segment plan of your own, such as an animal's digit, in place of --segments.")
    private Optional<Path> plan = Optional.empty();

    @Option(
            names = "--mtp-offset",
            paramLabel = "KIND",
            defaultValue = "none",
            description = "Where the toes turn: none (line of the metatarsal heads) or functional (16 %% of foot length"
                    + " before it, 2 %% above; default: ${DEFAULT-VALUE}).")
    private String toeAxis = "none";

    @Option(
            names = "--inertia",
            paramLabel = "TABLE",
            defaultValue = "deleva",
            description = "deleva or dempster (default: ${DEFAULT-VALUE}).")
    private String inertia = "deleva";

    @Option(
            names = "--runs",
            paramLabel = "N",
            defaultValue = "200",
            description = "Monte Carlo runs behind the uncertainties, 0 for none (default: ${DEFAULT-VALUE}).")
    private int runs = FitUseCase.Request.DEFAULT_RUNS;

    @Option(
            names = "--seed",
            paramLabel = "N",
            defaultValue = "1",
            description = "Seed of the Monte Carlo runs (default: ${DEFAULT-VALUE}).")
    private long seed = FitUseCase.Request.DEFAULT_SEED;

    @Option(names = "--subject", paramLabel = "ID", defaultValue = "", description = "Identifier for the model.")
    private String subject = "";

    @Option(
            names = "--out",
            paramLabel = "DIR",
            defaultValue = ".",
            description = "Folder for the results (default: ${DEFAULT-VALUE}).")
    private Path out = Path.of(".");

    @Mixin
    private PageArguments pages = new PageArguments();

    @Spec
    private CommandSpec spec = CommandSpec.create();

    /** For picocli. */
    FitCommand() {}

    @Override
    public Integer call() throws UseCaseException, FormatException {
        GaitOptions options = gait.options(standing, stature, population, sex, false);
        if (segments != null && (segments < 1 || segments > 6)) {
            throw GaitArguments.usage(
                    "--segments", segments + " parts of the foot, expected 1 to 6", "use 1 to 6, or a plan by --plan");
        }
        if (segments != null && plan.isPresent()) {
            throw GaitArguments.usage("--plan", "is given together with --segments", "give one of them");
        }
        if (!toeAxis.equals("none") && !toeAxis.equals("functional")) {
            throw GaitArguments.usage("--mtp-offset", "'" + toeAxis + "' is unknown", "use none or functional");
        }
        if (runs < 0 || runs > MOST_RUNS) {
            throw GaitArguments.usage(
                    "--runs", runs + " Monte Carlo runs, expected 0 to " + MOST_RUNS, "use 200, or 0 for none");
        }
        FitUseCase.Request request = new FitUseCase.Request(
                options,
                sides(),
                side.equals("both"),
                segments == null ? OptionalInt.empty() : OptionalInt.of(segments),
                table(),
                new FitUseCase.Division(plan, toeAxis.equals("functional")),
                subject,
                Version.NUMBER,
                runs,
                seed);
        FitReport report = FitReport.write(request, out, pages.forms());
        PrintWriter stderr = spec.commandLine().getErr();
        FindingPrinter.print(stderr, report.findings());
        report.lines().forEach(spec.commandLine().getOut()::println);
        return report.failed().isEmpty() ? ExitCode.DONE : ExitCode.SOME_FAILED;
    }

    private Set<Side> sides() throws UseCaseException {
        return switch (side) {
            case "both" -> EnumSet.allOf(Side.class);
            case "left" -> EnumSet.of(Side.LEFT);
            case "right" -> EnumSet.of(Side.RIGHT);
            default -> throw GaitArguments.usage("--side", "'" + side + "' is unknown", "use left, right or both");
        };
    }

    private InertiaTable table() throws UseCaseException {
        return InertiaTable.ofWord(inertia)
                .orElseThrow(() ->
                        GaitArguments.usage("--inertia", "'" + inertia + "' is unknown", "use deleva or dempster"));
    }
}
