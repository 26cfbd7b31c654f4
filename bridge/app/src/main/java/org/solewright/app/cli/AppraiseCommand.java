package org.solewright.app.cli;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.Callable;
import org.solewright.app.pipeline.AppraiseReport;
import org.solewright.app.pipeline.AppraiseUseCase;
import org.solewright.app.pipeline.UseCaseException;
import org.solewright.formats.io.FormatException;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;

/** Says what the posture of measured walking cost. */
@Command(
        name = "appraise",
        description = "Says what the posture of measured walking cost, beside other postures of the same limb.",
        footer = {
            "",
            "Example:",
            "  solewright appraise --model model/foot-model-right.xml --model model/foot-model-left.xml \\",
            "    --walking walk-1.c3d --walking walk-2.c3d --landmarks map.xml --out cost",
            "Writes posture-cost.csv, posture-cost.xml, postures.csv, appraise-contacts.csv and appraise-curves.csv;",
            "--html and --pdf add posture-cost.html and posture-cost.pdf.",
            "Works are mechanical work under stated assumptions, not metabolic energy."
        })
final class AppraiseCommand implements Callable<Integer> {

    @Option(
            names = "--model",
            paramLabel = "M.xml",
            description =
                    "Foot model; one per side; may be left out where only the work on the centre of mass is asked.")
    private List<Path> models = new ArrayList<>();

    @Option(
            names = "--results",
            paramLabel = "R.xml",
            description = "Column map of simulated or measured results, instead of --walking and --landmarks.")
    private Optional<Path> results = Optional.empty();

    @Option(
            names = "--table",
            paramLabel = "FILE",
            description = "File for a table of the column map that names none; may be repeated.")
    private List<Path> tables = new ArrayList<>();

    @Option(
            names = "--audit-limit",
            paramLabel = "SHARE",
            defaultValue = "0.05",
            description = "Audit of --results: residuals above this share of body weight, positive work, foot length or"
                    + " mass are errors (default: ${DEFAULT-VALUE}).")
    private double auditLimit;

    @Mixin
    private GaitArguments gait = new GaitArguments();

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
    AppraiseCommand() {}

    @Override
    public Integer call() throws UseCaseException, FormatException {
        if (!(auditLimit > 0 && auditLimit <= 10)) {
            throw GaitArguments.usage(
                    "--audit-limit", auditLimit + " is out of range, expected more than 0 to 10", "give a share");
        }
        AppraiseUseCase.Request request = new AppraiseUseCase.Request(
                gait.options(List.of(), null, null, null, results.isPresent()),
                results,
                tables,
                models,
                Version.NUMBER,
                auditLimit);
        AppraiseReport report = AppraiseReport.write(request, out, pages.forms());
        FindingPrinter.print(spec.commandLine().getErr(), report.findings());
        report.lines().forEach(spec.commandLine().getOut()::println);
        return report.failed().isEmpty() ? ExitCode.DONE : ExitCode.SOME_FAILED;
    }
}
