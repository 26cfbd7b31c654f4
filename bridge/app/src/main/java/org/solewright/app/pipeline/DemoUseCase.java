package org.solewright.app.pipeline;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.EnumSet;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import org.solewright.analysis.cost.StepMechanics;
import org.solewright.analysis.fitting.ArcFit;
import org.solewright.analysis.fitting.InertiaTable;
import org.solewright.analysis.fitting.RollOverPath;
import org.solewright.analysis.gait.GaitSettings;
import org.solewright.app.report.PageForm;
import org.solewright.domain.cost.Measure;
import org.solewright.domain.cost.WalkTruth;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.foot.Population;
import org.solewright.domain.foot.Sex;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Vec3;
import org.solewright.formats.io.FormatException;

/**
 * The demo: writes an invented study, runs the main job on it and compares what comes out with the truth that the study
 * was made from. The maker and the analysis share nothing but domain types.
 */
public final class DemoUseCase {

    /** Tolerances of design 04 I6. */
    private static final double MASS_SHARE = 1e-4;

    private static final double SPEED = 2e-4;
    private static final double WORK_SHARE = 2e-3;
    private static final double PIVOT = 0.0005;
    private static final double RADIUS = 0.0001;
    /** Two samples of the platforms. */
    private static final double TIME = 0.002;

    /**
     * One number beside its truth.
     *
     * @param what quantity and recording
     * @param unit of the numbers
     * @param found by the analysis
     * @param truth by construction
     * @param tolerance greatest difference
     */
    public record Comparison(String what, String unit, double found, double truth, double tolerance) {

        /**
         * Whether the number is right.
         *
         * @return true where the difference is within the tolerance
         */
        public boolean isRight() {
            return Math.abs(found - truth) <= tolerance;
        }
    }

    /**
     * What the demo did.
     *
     * @param lines what to print, in order
     * @param findings of fit and appraise
     * @param comparisons with the truth
     */
    public record Result(List<String> lines, List<Finding> findings, List<Comparison> comparisons) {

        /** Copies the lists. */
        public Result {
            lines = List.copyOf(lines);
            findings = List.copyOf(findings);
            comparisons = List.copyOf(comparisons);
        }
    }

    private final Path folder;
    private final String version;
    private final List<String> lines = new ArrayList<>();
    private final List<Comparison> comparisons = new ArrayList<>();

    private DemoUseCase(Path folder, String version) {
        this.folder = folder;
        this.version = version;
    }

    /**
     * Runs the demo.
     *
     * @param folder where the study and its results are written; made where it is missing
     * @param version version of the tool
     * @return what it did
     * @throws UseCaseException where the folder cannot be written
     * @throws FormatException where a file of our own cannot be read back
     */
    public static Result run(Path folder, String version) throws UseCaseException, FormatException {
        return new DemoUseCase(folder, version).run();
    }

    private Result run() throws UseCaseException, FormatException {
        DemoStudy.Files files = DemoStudy.write(folder);
        lines.add(
                "An invented subject, " + DemoStudy.SUBJECT + ", whose every number is known; no person was recorded.");
        lines.add("1. wrote " + files.standing() + ", " + files.walking().get(0) + ", "
                + files.walking().get(1) + " and " + files.landmarks());
        // The recordings have no noise: a marker filter would only blunt what is to be compared.
        GaitOptions options = new GaitOptions(
                List.of(files.standing()),
                files.walking(),
                files.landmarks(),
                OptionalDouble.empty(),
                OptionalDouble.empty(),
                Population.ADULT,
                Optional.of(Sex.FEMALE),
                Optional.empty(),
                OptionalDouble.of(0),
                false,
                OptionalDouble.empty(),
                0,
                false,
                0,
                "platform",
                Optional.empty());
        survey(files);
        FitUseCase.Request fit = new FitUseCase.Request(
                options,
                EnumSet.allOf(Side.class),
                true,
                OptionalInt.of(1),
                InertiaTable.DE_LEVA,
                DemoStudy.SUBJECT,
                version);
        lines.add("3. fit");
        FitUseCase.Result fitted = FitUseCase.run(fit);
        FitReport fitReport = FitReport.write(fitted, fit, folder, EnumSet.of(PageForm.HTML));
        fitReport.lines().forEach(l -> lines.add("   " + l));
        GaitOptions walking = options.withoutStanding();
        AppraiseUseCase.Request appraise = new AppraiseUseCase.Request(
                walking,
                Optional.empty(),
                List.of(),
                List.of(folder.resolve("foot-model-right.xml"), folder.resolve("foot-model-left.xml")),
                version);
        lines.add("4. appraise");
        AppraiseUseCase.Result appraised = AppraiseUseCase.run(appraise);
        AppraiseReport appraiseReport =
                AppraiseReport.write(appraised, appraise, folder, EnumSet.allOf(PageForm.class));
        appraiseReport.lines().forEach(l -> lines.add("   " + l));
        lines.add("5. rollover");
        RollOverReport rolled = RollOverReport.write(
                new RollOverUseCase.Request(walking, appraise.models(), Optional.empty(), version), folder);
        rolled.lines().forEach(l -> lines.add("   " + l));
        postures();
        compareFit(fitted);
        compareSteps(appraised);
        lines.add("7. beside the truth (tolerances: design of the synthetic trial)");
        comparisons.forEach(c -> lines.add(String.format(
                Locale.ROOT,
                "   %-44s %12.6f  truth %12.6f  off by %9.2e of %.1e allowed %-3s %s",
                c.what(),
                c.found(),
                c.truth(),
                Math.abs(c.found() - c.truth()),
                c.tolerance(),
                c.unit(),
                c.isRight() ? "ok" : "OUT")));
        long right = comparisons.stream().filter(Comparison::isRight).count();
        lines.add("   " + right + " of " + comparisons.size() + " numbers agree with the truth");
        List<Finding> findings = new ArrayList<>(fitReport.findings());
        appraiseReport.findings().stream().filter(f -> !findings.contains(f)).forEach(findings::add);
        rolled.findings().stream().filter(f -> !findings.contains(f)).forEach(findings::add);
        return new Result(lines, findings, comparisons);
    }

    private void survey(DemoStudy.Files files) throws UseCaseException, FormatException {
        lines.add("2. survey");
        for (Path file : List.of(
                files.standing(), files.walking().get(0), files.walking().get(1))) {
            lines.add("   " + Survey.of(file, false).oneLine());
        }
    }

    private void postures() throws UseCaseException, FormatException {
        DemoStudy.Walk walk = DemoStudy.WALKS.get(0);
        PostureTables tables = PostureLandscape.of(new PostureLandscape.Request(
                Optional.of(folder.resolve("foot-model-right.xml")),
                OptionalDouble.empty(),
                OptionalDouble.empty(),
                OptionalDouble.of(0),
                OptionalDouble.empty(),
                List.of(Double.toString(walk.speed())),
                List.of(),
                List.of(),
                List.of(Double.toString(walk.stepLength())),
                OptionalDouble.empty(),
                OptionalDouble.empty(),
                OptionalDouble.empty(),
                GaitSettings.STANDARD_GRAVITY));
        Path file = folder.resolve("landscape.csv");
        ResultText.write(file, tables.landscape());
        lines.add("6. postures: wrote " + file + ", feet of 0 to 6 segments at " + walk.stepLength() + " m and "
                + walk.speed() + " m/s");
    }

    private void compareFit(FitUseCase.Result fitted) {
        fitted.subject()
                .mass()
                .ifPresent(m -> add("mass", "kg", m.value(), DemoStudy.MASS, MASS_SHARE * DemoStudy.MASS));
        WalkTruth truth = DemoStudy.WALKS.get(0).synthetic().truth();
        fitted.rollOvers().forEach((side, rollOver) -> {
            List<WalkingRollOver.LimbPivots> pivots = rollOver.limbPivots();
            for (WalkingRollOver.LimbPivots p : pivots) {
                comparePivots(side, p, truth);
            }
            if (pivots.isEmpty()) {
                add(side.word() + " pivots found", "", 0, truth.pivots().size(), 0);
            }
        });
    }

    private void comparePivots(Side side, WalkingRollOver.LimbPivots found, WalkTruth truth) {
        String where = side.word() + ", " + found.shapes().stance().trial();
        // The limb frame of the roll-over: origin ankle, y towards the hip.
        Vec3 ankle = DemoStudy.ankle();
        double length = ankle.norm();
        double ux = -ankle.x() / length;
        double uz = -ankle.z() / length;
        for (int k = 0; k < truth.pivots().size() && k < found.path().places(); k++) {
            double dx = truth.pivots().get(k).x() - ankle.x();
            double dz = truth.pivots().get(k).z() - ankle.z();
            double x = dx * uz - dz * ux;
            double y = dx * ux + dz * uz;
            add(
                    "pivot " + (k + 1) + " from its true place (" + where + ")",
                    "m",
                    Math.hypot(found.path().x(k) - x, found.path().y(k) - y),
                    0,
                    PIVOT);
        }
        add("radius of the vaults (" + where + ")", "m", radius(found), truth.radius(), RADIUS);
    }

    /** Radius of the circle through the samples at which the centre of pressure dwells. */
    private static double radius(WalkingRollOver.LimbPivots found) {
        RollOverPath path = found.shapes().limb().orElseThrow();
        double[] x = path.x();
        double[] y = path.y();
        double[] weights = new double[x.length];
        for (int[] dwell : found.dwells()) {
            // The ends of a dwell already move.
            for (int i = dwell[0] + 1; i < dwell[1]; i++) {
                weights[i] = 1;
            }
        }
        return ArcFit.fit(x, y, weights).radius();
    }

    private void compareSteps(AppraiseUseCase.Result appraised) {
        for (int i = 0; i < appraised.mechanics().size(); i++) {
            StepMechanics m = appraised.mechanics().get(i);
            DemoStudy.Walk walk = DemoStudy.WALKS.get(i);
            WalkTruth truth = walk.synthetic().truth();
            WalkTruth.Transition last =
                    truth.transitions().get(truth.transitions().size() - 1);
            compare(m, Measure.STEP_TIME, "step time, " + walk.name(), "s", truth.stepTime(), TIME);
            compare(m, Measure.STEP_LENGTH, "step length, " + walk.name(), "m", walk.stepLength(), PIVOT);
            compare(m, Measure.SPEED, "mean speed, " + walk.name(), "m/s", truth.speed(), SPEED);
            if (last instanceof WalkTruth.Step step) {
                compare(
                        m,
                        Measure.PUSH_OFF_DOUBLE_SUPPORT,
                        "push-off in double support, " + walk.name(),
                        "J",
                        step.trailingPositive(),
                        WORK_SHARE * step.trailingPositive());
                compare(
                        m,
                        Measure.COLLISION_DOUBLE_SUPPORT,
                        "collision in double support, " + walk.name(),
                        "J",
                        step.leadingNegative(),
                        -WORK_SHARE * step.leadingNegative());
            }
        }
    }

    private void compare(StepMechanics m, Measure measure, String what, String unit, double truth, double tolerance) {
        Double found = m.values().get(measure);
        add(what, unit, found == null ? Double.NaN : found, truth, tolerance);
    }

    private void add(String what, String unit, double found, double truth, double tolerance) {
        comparisons.add(new Comparison(what, unit, found, truth, tolerance));
    }
}
