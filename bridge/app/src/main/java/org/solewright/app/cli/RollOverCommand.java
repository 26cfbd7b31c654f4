package org.solewright.app.cli;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.Callable;
import org.solewright.app.pipeline.GaitOptions;
import org.solewright.app.pipeline.RollOverReport;
import org.solewright.app.pipeline.RollOverUseCase;
import org.solewright.app.pipeline.UseCaseException;
import org.solewright.domain.gait.Side;
import org.solewright.formats.io.FormatException;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;

/** Says how a foot rolled over the ground. */
@Command(
        name = "rollover",
        description = "Says how the foot of a model rolled over the ground in walking: the roll-over check sheet.",
        footer = {
            "",
            "Example:",
            "  solewright rollover --model model/foot-model-right.xml --model model/foot-model-left.xml \\",
            "    --walking walk-1.c3d --walking walk-2.c3d --landmarks map.xml --out check",
            "Writes rollover.csv, rollover.xml and rollover-curves.csv.",
            "An engineering description, no diagnosis."
        })
final class RollOverCommand implements Callable<Integer> {

    @Option(
            names = "--model",
            paramLabel = "M.xml",
            required = true,
            description = "Foot model that fit wrote; one per side.")
    private List<Path> models = new ArrayList<>();

    @Mixin
    private GaitArguments gait = new GaitArguments();

    @Option(
            names = "--side",
            paramLabel = "WORD",
            defaultValue = "both",
            description = "left, right or both: which of the models is checked (default: ${DEFAULT-VALUE}).")
    private String side = "both";

    @Option(
            names = "--out",
            paramLabel = "DIR",
            defaultValue = ".",
            description = "Folder for the results (default: ${DEFAULT-VALUE}).")
    private Path out = Path.of(".");

    @Spec
    private CommandSpec spec = CommandSpec.create();

    /** For picocli. */
    RollOverCommand() {}

    @Override
    public Integer call() throws UseCaseException, FormatException {
        GaitOptions options = gait.options(List.of(), null, null, null, false);
        if (options.annotate().isPresent()) {
            throw GaitArguments.usage("--annotate", "is not for rollover", "give it to appraise");
        }
        RollOverUseCase.Request request = new RollOverUseCase.Request(options, models, side(), Version.NUMBER);
        RollOverReport report = RollOverReport.write(request, out);
        FindingPrinter.print(spec.commandLine().getErr(), report.findings());
        report.lines().forEach(spec.commandLine().getOut()::println);
        return report.failed().isEmpty() ? ExitCode.DONE : ExitCode.SOME_FAILED;
    }

    private Optional<Side> side() throws UseCaseException {
        return switch (side) {
            case "both" -> Optional.empty();
            case "left" -> Optional.of(Side.LEFT);
            case "right" -> Optional.of(Side.RIGHT);
            default -> throw GaitArguments.usage("--side", "'" + side + "' is unknown", "use left, right or both");
        };
    }
}
