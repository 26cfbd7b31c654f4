package org.solewright.app.cli;

import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.concurrent.Callable;
import org.jspecify.annotations.Nullable;
import org.solewright.app.pipeline.PostureLandscape;
import org.solewright.app.pipeline.ResultText;
import org.solewright.app.pipeline.UseCaseException;
import org.solewright.formats.io.FormatException;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;

/** The posture landscape of one limb. */
@Command(
        name = "postures",
        description = "Tabulates what feet of 0 to 6 segments would cost one limb, over step length.",
        footer = {
            "",
            "Example: a limb of 0.9 m with a foot of 0.2 m at one step length",
            "  solewright postures --leg 0.9 --foot 0.2 --mass 70 --speed 1.25 --step 0.6"
        })
final class PosturesCommand implements Callable<Integer> {

    @Spec
    private CommandSpec spec = CommandSpec.create();

    @Option(names = "--model", paramLabel = "M.xml", description = "Foot model: gives limb, foot and mass.")
    private Optional<Path> model = Optional.empty();

    @Option(names = "--leg", paramLabel = "M", description = "Total limb length, m.")
    private @Nullable Double leg;

    @Option(names = "--foot", paramLabel = "M", description = "Foot length along the ground, m.")
    private @Nullable Double foot;

    @Option(
            names = "--series-share",
            paramLabel = "S",
            description = "Share of the foot length that is taken out of the limb: 1 for a raised foot (default), 0 for"
                    + " a foot that lies flat.")
    private @Nullable Double seriesShare;

    @Option(names = "--mass", paramLabel = "KG", description = "Body mass, kg; default: the model's.")
    private @Nullable Double mass;

    @Option(
            names = "--speed",
            required = true,
            paramLabel = "M_S",
            description = "Hip speed just before each transition, m/s; faster than the mean speed.")
    private double speed;

    @Option(names = "--step", paramLabel = "M", description = "Step length, m; may be repeated.")
    private List<Double> steps = new ArrayList<>();

    @Option(names = "--from", paramLabel = "M", description = "First step length, m; default 0.3 limb lengths.")
    private @Nullable Double from;

    @Option(names = "--to", paramLabel = "M", description = "Last step length, m; default 1.1 limb lengths.")
    private @Nullable Double to;

    @Option(names = "--by", paramLabel = "M", description = "Spacing of step lengths, m; default 0.05 limb lengths.")
    private @Nullable Double by;

    @Option(
            names = "--gravity",
            paramLabel = "M_S2",
            defaultValue = "9.80665",
            description = "Gravity, m/s2; default ${DEFAULT-VALUE}.")
    private double gravity;

    @Option(names = "--out", paramLabel = "F.csv", description = "File for the table; default: standard output.")
    private Optional<Path> out = Optional.empty();

    /** For picocli. */
    PosturesCommand() {}

    @Override
    public Integer call() throws UseCaseException, FormatException {
        PostureLandscape.Table table = PostureLandscape.of(new PostureLandscape.Request(
                model,
                given(leg),
                given(foot),
                given(seriesShare),
                given(mass),
                speed,
                steps,
                given(from),
                given(to),
                given(by),
                gravity));
        if (out.isPresent()) {
            ResultText.write(out.get(), table.csv().getBytes(StandardCharsets.UTF_8));
        } else {
            spec.commandLine().getOut().print(table.csv());
        }
        FindingPrinter.print(spec.commandLine().getErr(), table.findings());
        return ExitCode.DONE;
    }

    private static OptionalDouble given(@Nullable Double value) {
        return value == null ? OptionalDouble.empty() : OptionalDouble.of(value);
    }
}
