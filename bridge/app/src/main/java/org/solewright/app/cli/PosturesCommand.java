package org.solewright.app.cli;

import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.concurrent.Callable;
import org.jspecify.annotations.Nullable;
import org.solewright.app.pipeline.PostureLandscape;
import org.solewright.app.pipeline.PostureTables;
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
            "  solewright postures --leg 0.9 --foot 0.2 --mass 70 --speed 1.25 --step 0.6",
            "The index_ columns weigh work, swing and activation of pivots against one another: no metabolic energy."
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
            description = "Hip speed just before each transition, m/s; faster than the mean speed. A number or a range"
                    + " FROM:TO:BY; may be repeated.")
    private List<String> speeds = new ArrayList<>();

    @Option(
            names = "--segments",
            paramLabel = "N",
            description = "Numbers of foot segments, a number or a range FROM:TO:BY; may be repeated; default 0 to 6.")
    private List<String> segments = new ArrayList<>();

    @Option(
            names = "--foot-rule",
            paramLabel = "RULE",
            description = "given, equal (all vaults equal) or optimum (cheapest foot); may be repeated; default all.")
    private List<String> rules = new ArrayList<>();

    @Option(
            names = "--step",
            paramLabel = "M",
            description = "Step length, m; a number or a range FROM:TO:BY; may be repeated.")
    private List<String> steps = new ArrayList<>();

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

    @Option(
            names = "--optimum",
            paramLabel = "F.csv",
            description = "File for the cheapest step lengths by the cost index (no metabolic energy).")
    private Optional<Path> optimum = Optional.empty();

    @Option(
            names = "--constant-work",
            paramLabel = "F.csv",
            description = "File for the legs and feet that cost what the given leg and foot do.")
    private Optional<Path> constantWork = Optional.empty();

    @Option(
            names = "--postures",
            paramLabel = "F.csv",
            description = "With --model: file for its limb as plantigrade, digitigrade and unguligrade.")
    private Optional<Path> postures = Optional.empty();

    @Option(
            names = "--plot",
            paramLabel = "F.svg",
            description =
                    "Picture of push-off work over step length at the first speed, equal-vault feet where they are"
                            + " asked for; its table goes beside it, F.csv.")
    private Optional<Path> plot = Optional.empty();

    /** For picocli. */
    PosturesCommand() {}

    @Override
    public Integer call() throws UseCaseException, FormatException {
        PostureTables tables = PostureLandscape.of(new PostureLandscape.Request(
                model,
                given(leg),
                given(foot),
                given(seriesShare),
                given(mass),
                speeds,
                segments,
                rules,
                steps,
                given(from),
                given(to),
                given(by),
                gravity));
        // All bytes are made before any file is written.
        Map<Path, byte[]> files = new LinkedHashMap<>();
        if (out.isPresent()) {
            add(files, out.get(), tables.landscape());
        }
        if (optimum.isPresent()) {
            add(files, optimum.get(), tables.optima());
        }
        if (constantWork.isPresent()) {
            add(files, constantWork.get(), tables.constantWork());
        }
        if (postures.isPresent()) {
            add(files, postures.get(), tables.postures());
        }
        if (plot.isPresent()) {
            add(files, plot.get(), tables.plot());
            add(files, beside(plot.get()), tables.plotted());
        }
        for (Map.Entry<Path, byte[]> file : files.entrySet()) {
            ResultText.write(file.getKey(), file.getValue());
        }
        if (out.isEmpty()) {
            spec.commandLine().getOut().print(new String(tables.landscape(), StandardCharsets.UTF_8));
        }
        FindingPrinter.print(spec.commandLine().getErr(), tables.findings());
        return ExitCode.DONE;
    }

    private static void add(Map<Path, byte[]> files, Path file, byte[] bytes) throws UseCaseException {
        Path place = file.toAbsolutePath().normalize();
        if (files.keySet().stream().anyMatch(f -> f.toAbsolutePath().normalize().equals(place))) {
            throw new UseCaseException(
                    UseCaseException.Kind.USAGE,
                    file.toString(),
                    "named for two outputs",
                    "give every output its own file");
        }
        files.put(file, bytes);
    }

    /** The table of a picture: the same name with .csv. */
    private static Path beside(Path picture) {
        String name = String.valueOf(picture.getFileName());
        int dot = name.lastIndexOf('.');
        return picture.resolveSibling((dot > 0 ? name.substring(0, dot) : name) + ".csv");
    }

    private static OptionalDouble given(@Nullable Double value) {
        return value == null ? OptionalDouble.empty() : OptionalDouble.of(value);
    }
}
