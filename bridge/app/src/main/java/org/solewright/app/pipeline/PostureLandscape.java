package org.solewright.app.pipeline;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.solewright.analysis.cost.CostIndex;
import org.solewright.analysis.cost.Landscape;
import org.solewright.domain.cost.FootRule;
import org.solewright.domain.cost.LandscapeRow;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.Found;
import org.solewright.domain.finding.Quantity;
import org.solewright.domain.foot.FootModel;
import org.solewright.domain.foot.Subject;
import org.solewright.formats.footmodel.FootModelFile;
import org.solewright.formats.io.FormatException;

/** The posture landscape of one limb. */
public final class PostureLandscape {

    private static final double MOST = 1e6;
    private static final long MOST_ROWS = 2_000_000;
    private static final int MOST_SEGMENTS = 100;
    /** Default range of step lengths over limb length: from a shuffle to beyond the crossovers. */
    private static final double FIRST_STEP = 0.3;

    private static final double LAST_STEP = 1.1;
    private static final double STEP_SPACING = 0.05;

    private PostureLandscape() {}

    /**
     * What the user gives. Empty values are not given. A word of a list is a number or a range FROM:TO:BY.
     *
     * @param model foot model that gives limb, foot and mass
     * @param leg total limb length, m
     * @param foot foot length along the ground, m
     * @param seriesShare share of the foot length that is taken out of the limb; default 1
     * @param mass kg
     * @param speeds hip speeds before each transition, m/s
     * @param segments numbers of foot segments; none for 0 to 6
     * @param rules words of the foot rules; none for all
     * @param steps step lengths, m; none for a range
     * @param from first step length of the range, m
     * @param to last step length of the range, m
     * @param by spacing of the range, m
     * @param gravity m/s2
     */
    public record Request(
            Optional<Path> model,
            OptionalDouble leg,
            OptionalDouble foot,
            OptionalDouble seriesShare,
            OptionalDouble mass,
            List<String> speeds,
            List<String> segments,
            List<String> rules,
            List<String> steps,
            OptionalDouble from,
            OptionalDouble to,
            OptionalDouble by,
            double gravity) {

        /** Copies the lists. */
        public Request {
            speeds = List.copyOf(speeds);
            segments = List.copyOf(segments);
            rules = List.copyOf(rules);
            steps = List.copyOf(steps);
        }
    }

    private record Given(Landscape.Limb limb, Optional<FootModel> model) {}

    /**
     * Makes the landscape.
     *
     * @param request what the user gives
     * @return landscape, with the tables that are made from it
     * @throws UseCaseException where the options contradict one another or a number is out of range
     * @throws FormatException where the model's file is not a foot model
     */
    public static PostureTables of(Request request) throws UseCaseException, FormatException {
        List<Finding> findings = new ArrayList<>();
        Given given = given(request, findings);
        Landscape.Limb limb = given.limb();
        check("--leg", limb.leg(), "m");
        check("--mass", limb.mass(), "kg");
        check("--gravity", request.gravity(), "m/s2");
        if (!(limb.seriesShare() >= 0 && limb.seriesShare() <= 1)) {
            throw usage("--series-share", limb.seriesShare() + ", expected 0 to 1");
        }
        if (!(limb.foot() >= 0 && limb.foot() <= MOST)) {
            throw usage("--foot", limb.foot() + " m, expected 0 m or more");
        }
        if (request.seriesShare().isEmpty()) {
            findings.add(Finding.note(
                    "postures.series-share",
                    "",
                    "the foot is taken out of the limb length (share 1); --series-share 0 for a foot that lies flat"));
        }
        Landscape.Axes axes = new Landscape.Axes(
                segments(request),
                rules(request),
                checked("--speed", request.speeds(), "m/s"),
                steps(request, limb.leg()));
        if (axes.rows() > MOST_ROWS) {
            throw usage("--by", axes.rows() + " rows, expected at most " + MOST_ROWS + ": fewer steps, speeds or feet");
        }
        CostIndex index = CostIndex.standard(request.gravity());
        Found<List<LandscapeRow>> found = Landscape.of(limb, axes, index);
        findings.addAll(found.findings());
        return new PostureTables(limb, axes, index, given.model(), found.value(), findings);
    }

    private static Given given(Request request, List<Finding> findings) throws UseCaseException, FormatException {
        double share = request.seriesShare().orElse(1);
        if (request.model().isPresent()) {
            if (request.leg().isPresent() || request.foot().isPresent()) {
                throw usage("--model", "given beside --leg or --foot, expected one or the other");
            }
            Path file = request.model().get();
            FootModel model = read(file);
            Subject subject = model.subject();
            Optional<Quantity> foot = subject.effectiveFootLength();
            if (foot.isEmpty()) {
                foot = subject.footLength();
                findings.add(Finding.warning(
                        "postures.foot-length",
                        file.toString(),
                        "the model has no effective foot length: its foot length stands in"));
            }
            if (foot.isEmpty()) {
                throw new UseCaseException(
                        UseCaseException.Kind.INPUT,
                        file.toString(),
                        "the model has no foot length",
                        "give --leg and --foot instead");
            }
            double mass = request.mass().orElse(subject.mass().value());
            return new Given(
                    new Landscape.Limb(subject.limbLength().value(), foot.get().value(), share, mass),
                    Optional.of(model));
        }
        return new Given(
                new Landscape.Limb(
                        needed("--leg", request.leg()),
                        needed("--foot", request.foot()),
                        share,
                        needed("--mass", request.mass())),
                Optional.empty());
    }

    private static FootModel read(Path file) throws UseCaseException, FormatException {
        try {
            return FootModelFile.read(file);
        } catch (IOException e) {
            throw new UseCaseException(
                    UseCaseException.Kind.INPUT,
                    file.toString(),
                    !Files.exists(file) ? "no such file" : Files.isDirectory(file) ? "a folder" : "cannot be read",
                    "name a foot model made by fit",
                    e);
        }
    }

    private static double needed(String option, OptionalDouble value) throws UseCaseException {
        if (value.isEmpty()) {
            throw usage(option, "not given, expected --model or all of --leg, --foot and --mass");
        }
        return value.getAsDouble();
    }

    private static List<Double> checked(String option, List<String> words, String unit) throws UseCaseException {
        List<Double> values = ValueList.of(option, words);
        for (double value : values) {
            check(option, value, unit);
        }
        return values;
    }

    private static List<Integer> segments(Request request) throws UseCaseException {
        if (request.segments().isEmpty()) {
            return Landscape.Axes.ALL_SEGMENTS;
        }
        List<Integer> segments = new ArrayList<>();
        for (double value : ValueList.of("--segments", request.segments())) {
            if (!(value >= 0 && value <= MOST_SEGMENTS) || value != Math.rint(value)) {
                throw usage("--segments", value + ", expected a whole number from 0 to " + MOST_SEGMENTS);
            }
            segments.add((int) value);
        }
        return segments.stream().distinct().sorted().toList();
    }

    private static List<FootRule> rules(Request request) throws UseCaseException {
        List<FootRule> rules = new ArrayList<>();
        for (String word : request.rules()) {
            rules.add(Arrays.stream(FootRule.values())
                    .filter(r -> r.word().equals(word))
                    .findFirst()
                    .orElseThrow(() -> usage(
                            "--foot-rule", "'" + QuestionInputs.shown(word) + "', expected given, equal or optimum")));
        }
        return rules.isEmpty()
                ? List.of(FootRule.values())
                : rules.stream().distinct().sorted().toList();
    }

    private static List<Double> steps(Request request, double leg) throws UseCaseException {
        boolean range = request.from().isPresent()
                || request.to().isPresent()
                || request.by().isPresent();
        if (!request.steps().isEmpty()) {
            if (range) {
                throw usage("--step", "given beside --from, --to or --by, expected one or the other");
            }
            return checked("--step", request.steps(), "m");
        }
        double from = request.from().orElse(FIRST_STEP * leg);
        double to = request.to().orElse(LAST_STEP * leg);
        double by = request.by().orElse(STEP_SPACING * leg);
        check("--from", from, "m");
        check("--to", to, "m");
        check("--by", by, "m");
        return ValueList.range("--by", from, to, by);
    }

    private static void check(String option, double value, String unit) throws UseCaseException {
        if (!(value > 0 && value <= MOST)) {
            throw usage(option, value + " " + unit + ", expected more than 0 " + unit + " and no more than " + MOST);
        }
    }

    private static UseCaseException usage(String option, String message) {
        return new UseCaseException(UseCaseException.Kind.USAGE, option, message, "see 'solewright postures --help'");
    }
}
