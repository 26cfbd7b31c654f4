package org.solewright.app.pipeline;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.solewright.analysis.cost.Landscape;
import org.solewright.domain.cost.LandscapeRow;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.Found;
import org.solewright.domain.finding.Quantity;
import org.solewright.domain.foot.FootModel;
import org.solewright.domain.foot.Subject;
import org.solewright.formats.footmodel.FootModelFile;
import org.solewright.formats.io.FormatException;
import org.solewright.formats.table.LandscapeTable;

/** The posture landscape of one limb as a table. */
public final class PostureLandscape {

    private static final double MOST = 1e6;
    private static final int MOST_STEPS = 10_000;
    /** Default range of step lengths over limb length: from a shuffle to beyond the crossovers. */
    private static final double FIRST_STEP = 0.3;

    private static final double LAST_STEP = 1.1;
    private static final double STEP_SPACING = 0.05;

    private PostureLandscape() {}

    /**
     * What the user gives. Empty values are not given.
     *
     * @param model foot model that gives limb, foot and mass
     * @param leg total limb length, m
     * @param foot foot length along the ground, m
     * @param seriesShare share of the foot length that is taken out of the limb; default 1
     * @param mass kg
     * @param speed hip speed before each transition, m/s
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
            double speed,
            List<Double> steps,
            OptionalDouble from,
            OptionalDouble to,
            OptionalDouble by,
            double gravity) {

        /** Copies the list. */
        public Request {
            steps = List.copyOf(steps);
        }
    }

    /**
     * The table and what has to be said about it.
     *
     * @param csv UTF-8 text
     * @param findings in the order they were made
     */
    public record Table(String csv, List<Finding> findings) {

        /** Copies the list. */
        public Table {
            findings = List.copyOf(findings);
        }
    }

    private record Limb(double leg, double foot, double mass) {}

    /**
     * Makes the table.
     *
     * @param request what the user gives
     * @return the table
     * @throws UseCaseException where the options contradict one another or a number is out of range
     * @throws FormatException where the model's file is not a foot model
     */
    public static Table of(Request request) throws UseCaseException, FormatException {
        List<Finding> findings = new ArrayList<>();
        Limb limb = limb(request, findings);
        check("--leg", limb.leg(), "m");
        check("--mass", limb.mass(), "kg");
        check("--speed", request.speed(), "m/s");
        check("--gravity", request.gravity(), "m/s2");
        double share = request.seriesShare().orElse(1);
        if (!(share >= 0 && share <= 1)) {
            throw usage("--series-share", share + ", expected 0 to 1");
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
        findings.add(Finding.note(
                "postures.index-later",
                "",
                "the index_ columns are empty: this version does not compute the cost index"));
        Found<List<LandscapeRow>> found = Landscape.of(
                limb.leg(),
                limb.foot(),
                share,
                limb.mass(),
                request.gravity(),
                request.speed(),
                steps(request, limb.leg()));
        findings.addAll(found.findings());
        String csv = new String(LandscapeTable.bytes(found.value()), StandardCharsets.UTF_8);
        return new Table(csv, findings);
    }

    private static Limb limb(Request request, List<Finding> findings) throws UseCaseException, FormatException {
        if (request.model().isPresent()) {
            if (request.leg().isPresent() || request.foot().isPresent()) {
                throw usage("--model", "given beside --leg or --foot, expected one or the other");
            }
            Path file = request.model().get();
            Subject subject = read(file).subject();
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
            return new Limb(
                    subject.limbLength().value(),
                    foot.get().value(),
                    request.mass().orElse(subject.mass().value()));
        }
        return new Limb(
                needed("--leg", request.leg()), needed("--foot", request.foot()), needed("--mass", request.mass()));
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

    private static double[] steps(Request request, double leg) throws UseCaseException {
        boolean range = request.from().isPresent()
                || request.to().isPresent()
                || request.by().isPresent();
        if (!request.steps().isEmpty()) {
            if (range) {
                throw usage("--step", "given beside --from, --to or --by, expected one or the other");
            }
            for (double step : request.steps()) {
                check("--step", step, "m");
            }
            return request.steps().stream().mapToDouble(Double::doubleValue).toArray();
        }
        double from = request.from().orElse(FIRST_STEP * leg);
        double to = request.to().orElse(LAST_STEP * leg);
        double by = request.by().orElse(STEP_SPACING * leg);
        check("--from", from, "m");
        check("--to", to, "m");
        check("--by", by, "m");
        double count = Math.floor((to - from) / by + 1e-9) + 1;
        if (!(count >= 1 && count <= MOST_STEPS)) {
            throw usage(
                    "--by",
                    "steps from " + from + " m to " + to + " m by " + by + " m, expected 1 to " + MOST_STEPS
                            + " step lengths");
        }
        double[] steps = new double[(int) count];
        for (int i = 0; i < steps.length; i++) {
            steps[i] = from + i * by;
        }
        return steps;
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
