package org.solewright.app.pipeline;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Collections;
import java.util.EnumMap;
import java.util.EnumSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.Set;
import org.solewright.analysis.fitting.FootChoices;
import org.solewright.analysis.fitting.InertiaTable;
import org.solewright.analysis.fitting.StandingLimb;
import org.solewright.analysis.fitting.StandingModel;
import org.solewright.analysis.fitting.StandingOutcome;
import org.solewright.analysis.fitting.StandingPosture;
import org.solewright.analysis.fitting.StandingSettings;
import org.solewright.analysis.gait.GaitSettings;
import org.solewright.analysis.gait.Pass;
import org.solewright.app.report.FootRoll;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.Found;
import org.solewright.domain.finding.Quantity;
import org.solewright.domain.finding.Severity;
import org.solewright.domain.finding.SourceFile;
import org.solewright.domain.foot.ChainPlan;
import org.solewright.domain.foot.FittedNumber;
import org.solewright.domain.foot.FootModel;
import org.solewright.domain.foot.LandmarkMap;
import org.solewright.domain.foot.Population;
import org.solewright.domain.foot.Rolling;
import org.solewright.domain.foot.SegmentName;
import org.solewright.domain.foot.Setting;
import org.solewright.domain.gait.ContactRow;
import org.solewright.domain.gait.Side;
import org.solewright.domain.gait.Stance;
import org.solewright.domain.geometry.Vec3;
import org.solewright.domain.motion.Recording;
import org.solewright.formats.io.FormatException;

/** Fits a segmented foot model per side from standing and walking recordings. */
public final class FitUseCase {

    private static final double PROVISIONAL_MASS = 70;
    private static final double LONGEST_LIMB = 10;

    /**
     * What the user asked for.
     *
     * @param gait recordings and subject; at least one standing recording
     * @param sides sides to be fitted
     * @param isBothAsked whether a side without landmarks is left out with a warning instead of an error
     * @param segments parts of the foot, 1 to 6; empty: as many as the landmarks allow
     * @param inertia table of masses and moments of inertia
     * @param division plan file and axis of the toes
     * @param subjectId identifier without personal data
     * @param version version of the tool
     * @param runs Monte Carlo runs behind the uncertainties; 0: none
     * @param seed of these runs
     */
    public record Request(
            GaitOptions gait,
            Set<Side> sides,
            boolean isBothAsked,
            OptionalInt segments,
            InertiaTable inertia,
            Division division,
            String subjectId,
            String version,
            int runs,
            long seed) {

        /** Runs where none are asked for (design 03 section 7). */
        public static final int DEFAULT_RUNS = 200;

        /** Seed where none is given. */
        public static final long DEFAULT_SEED = 1;

        /** Copies the set. */
        public Request {
            sides = sides.isEmpty() ? Set.of() : Collections.unmodifiableSet(EnumSet.copyOf(sides));
            if (runs < 0) {
                throw new IllegalArgumentException(runs + " Monte Carlo runs, expected 0 or more");
            }
        }

        /**
         * A request with the default number of Monte Carlo runs.
         *
         * @param gait recordings and subject; at least one standing recording
         * @param sides sides to be fitted
         * @param isBothAsked whether a side without landmarks is left out with a warning instead of an error
         * @param segments parts of the foot; empty: as many as the landmarks allow
         * @param inertia table of masses and moments of inertia
         * @param subjectId identifier without personal data
         * @param version version of the tool
         */
        public Request(
                GaitOptions gait,
                Set<Side> sides,
                boolean isBothAsked,
                OptionalInt segments,
                InertiaTable inertia,
                String subjectId,
                String version) {
            this(
                    gait,
                    sides,
                    isBothAsked,
                    segments,
                    inertia,
                    Division.DEFAULT,
                    subjectId,
                    version,
                    DEFAULT_RUNS,
                    DEFAULT_SEED);
        }

        /** All files of the call. */
        List<Path> inputs() {
            List<Path> all = new ArrayList<>(gait.inputs());
            division.plan().ifPresent(all::add);
            return all;
        }
    }

    /**
     * How the foot is divided beyond the number of its parts.
     *
     * @param plan file with a plan of the user's own; empty for one by number
     * @param isFunctionalToeAxis whether the toes turn about the functional axis
     */
    public record Division(Optional<Path> plan, boolean isFunctionalToeAxis) {

        /** By number, toes that turn about the line of the metatarsal heads. */
        public static final Division DEFAULT = new Division(Optional.empty(), false);
    }

    /**
     * What came of it.
     *
     * @param models by side
     * @param limbs the standing limbs by side
     * @param rollOvers what each side's stances showed
     * @param angles joint angles over stance by side
     * @param rolls a tracked stance by side; none where there is none
     * @param contacts contact table
     * @param numbers what is known of the uncertainty of the models
     * @param findings all findings, once each
     * @param failed names of inputs that failed
     */
    record Result(
            Map<Side, FootModel> models,
            Map<Side, StandingLimb> limbs,
            Map<Side, WalkingRollOver> rollOvers,
            Map<Side, JointCurves> angles,
            GaitSubject subject,
            Map<Side, FootRoll> rolls,
            List<ContactRow> contacts,
            List<FittedNumber> numbers,
            List<Finding> findings,
            List<String> failed) {}

    private final Request request;
    private final List<Finding> findings = new ArrayList<>();
    private final List<SourceFile> sources = new ArrayList<>();
    private FootChoices choices = FootChoices.DEFAULT;

    private FitUseCase(Request request) {
        this.request = request;
    }

    /**
     * Runs the fit without writing anything.
     *
     * @param request what is asked
     * @return models and findings
     * @throws UseCaseException where an input lacks what is needed
     * @throws FormatException where a file is not as its format says
     */
    static Result run(Request request) throws UseCaseException, FormatException {
        return new FitUseCase(request).run();
    }

    private Result run() throws UseCaseException, FormatException {
        GaitOptions options = request.gait();
        LandmarkMap map = InputFiles.landmarkMap(options.landmarks(), sources);
        List<Recording> standing = InputFiles.standing(options.standing(), options.isFlagIgnored(), sources, findings);
        InputFiles.Walking walked = InputFiles.walking(options.walking(), options.isFlagIgnored(), sources, findings);
        List<ContactRow> contacts = options.contacts().isPresent()
                ? InputFiles.contacts(options.contacts().get(), sources)
                : List.of();
        choices = choices();
        return fitted(map, standing, walked, contacts);
    }

    /**
     * Fits recordings that are in memory.
     *
     * @param request what is asked; its files are not read
     * @param map landmarks
     * @param standing standing recordings, at least one
     * @param walking walking recordings, at least one
     * @return models and findings
     * @throws UseCaseException where the recordings lack what is needed
     */
    static Result of(Request request, LandmarkMap map, List<Recording> standing, List<Recording> walking)
            throws UseCaseException {
        try {
            return new FitUseCase(request).fitted(map, standing, new InputFiles.Walking(walking, Map.of()), List.of());
        } catch (FormatException e) {
            throw new IllegalStateException("no file is read", e);
        }
    }

    private Result fitted(
            LandmarkMap map, List<Recording> standing, InputFiles.Walking walked, List<ContactRow> contacts)
            throws UseCaseException, FormatException {
        GaitOptions options = request.gait();
        List<Recording> walking = walked.recordings();
        for (Recording stood : standing) {
            OneSubject.require(map, stood);
        }
        List<Recording> all = new ArrayList<>(standing);
        all.addAll(walking);
        findings.addAll(LandmarkCoverage.missingLabels(map, all));
        StandingTrial stood = StandingTrial.of(map, standing, options.isMirrored(), findings);
        Vec3 up = stood.up(walking)
                .orElseThrow(() -> new UseCaseException(
                        UseCaseException.Kind.INPUT,
                        options.standing().get(0).toString(),
                        "neither platforms nor the landmarks of hips and malleoli say where up is",
                        "map malleolus_lateral and trochanter_major or asis of both sides"));
        StandingPosture posture = stood.posture(up, options.floor());
        Set<Side> sides = sides(map, stood);
        OptionalDouble limbLength = provisionalLimbLength(posture, sides);
        GaitSubject subject = GaitSubject.of(
                options,
                map,
                contacts,
                walking,
                Optional.of(up),
                limbLength.isPresent() ? Optional.of(limbLength.getAsDouble()) : Optional.empty());
        Quantity mass = subject.mass()
                .orElseThrow(() -> new UseCaseException(
                        UseCaseException.Kind.INPUT,
                        walking.get(0).name(),
                        "no mass was given and no walking recording has a step on its platforms to measure it",
                        "give --mass KG, or recordings with two consecutive platform contacts"));
        List<Finding> axisFindings = new ArrayList<>();
        Map<Side, FootModel> models = new EnumMap<>(Side.class);
        Map<Side, StandingLimb> limbs = new EnumMap<>(Side.class);
        Map<Side, WalkingRollOver> rollOvers = new EnumMap<>(Side.class);
        Map<Side, Set<SegmentName>> observed = new EnumMap<>(Side.class);
        Map<Side, List<LimbMotion>> moved = new EnumMap<>(Side.class);
        Map<Side, JointCurves> angles = new EnumMap<>(Side.class);
        Map<Side, FootRoll> rolls = new EnumMap<>(Side.class);
        for (Side side : sides) {
            StandingLimb asStood = built(posture, mass, side, stood);
            requireSound(asStood, standing.get(0));
            List<LimbMotion> motions = subject.walking().stream()
                    .map(tracks -> LimbMotion.of(stood, tracks, asStood))
                    .toList();
            Found<StandingLimb> turned = MotionAxes.of(asStood, subject.passes(), motions);
            StandingLimb limb = turned.value();
            axisFindings.addAll(turned.findings());
            WalkingRollOver rollOver = rollOver(limb, subject, motions, mass);
            moved.put(side, motions);
            observed.put(side, FittedModel.observed(motions));
            limbs.put(side, limb);
            rollOvers.put(side, rollOver);
            ZeroPosture zero = ZeroPosture.of(limb, options.isZeroFlat(), subject.passes(), motions);
            angles.put(side, JointCurves.of(limb, posture, zero, subject.passes(), motions));
            new StanceRoll(limb).of(subject.passes(), motions).ifPresent(r -> rolls.put(side, r));
        }
        findings.addAll(subject.findings());
        List<FittedNumber> numbers = new ArrayList<>();
        axisFindings.forEach(this::addOnce);
        List<Setting> settings = settings(subject);
        for (Side side : sides) {
            StandingLimb limb = get(limbs, side);
            WalkingRollOver rollOver = get(rollOvers, side);
            Rolling rolling = rollOver.rolling();
            limb.findings().forEach(this::addOnce);
            rollOver.findings().forEach(this::addOnce);
            JointCurves curves = get(angles, side);
            curves.findings().forEach(this::addOnce);
            FootModel model = FittedModel.of(
                    limb,
                    rolling,
                    rollOver.effectiveFootLength(),
                    get(observed, side),
                    curves,
                    request.version(),
                    sources);
            UncertainModel uncertain = new UncertainModel(
                    model,
                    FitUncertainty.of(
                            limb,
                            posture,
                            p -> StandingModel.build(p, settings(mass), side) instanceof StandingOutcome.Built built
                                    ? Optional.of(built.limb())
                                    : Optional.empty(),
                            stances(limb, subject, get(moved, side), mass),
                            request.runs(),
                            request.seed()));
            models.put(side, uncertain.model());
            numbers.addAll(uncertain.rows());
        }
        if (options.annotate().isPresent()) {
            OutputFolder folder = OutputFolder.of(options.annotate().get(), request.inputs());
            findings.addAll(FitAnnotations.write(folder, walked.files(), subject, limbs, moved));
        }
        List<Finding> shared = List.copyOf(findings);
        models.replaceAll((side, m) -> FittedModel.withFindings(m, shared, settings));
        return new Result(
                models,
                limbs,
                rollOvers,
                angles,
                subject,
                rolls,
                ContactOverrides.rows(subject.passes()),
                numbers,
                shared,
                failed(shared));
    }

    private static <T> T get(Map<Side, T> map, Side side) {
        T value = map.get(side);
        if (value == null) {
            throw new IllegalStateException("no entry for the " + side.word() + " side");
        }
        return value;
    }

    private void addOnce(Finding finding) {
        if (!findings.contains(finding)) {
            findings.add(finding);
        }
    }

    /** An error of the standing limb leaves no model worth writing. */
    private static void requireSound(StandingLimb limb, Recording standing) throws UseCaseException {
        for (Finding f : limb.findings()) {
            if (f.severity() == Severity.ERROR) {
                throw new UseCaseException(
                        UseCaseException.Kind.INPUT,
                        standing.name(),
                        f.message(),
                        "correct it and fit again (" + f.code() + ")");
            }
        }
    }

    private static List<String> failed(List<Finding> findings) {
        return findings.stream()
                .filter(f -> f.severity() == Severity.ERROR)
                .map(Finding::where)
                .distinct()
                .toList();
    }

    /** Sides that are asked for and have what standing needs. */
    private Set<Side> sides(LandmarkMap map, StandingTrial stood) throws UseCaseException {
        Set<Side> sides = new java.util.TreeSet<>();
        UseCaseException first = null;
        for (Side side : Side.values()) {
            if (!request.sides().contains(side)) {
                continue;
            }
            try {
                LandmarkCoverage.requireStanding(map, stood, side);
                sides.add(side);
            } catch (UseCaseException e) {
                boolean isMapped = map.entries().stream()
                        .anyMatch(x -> x.side().map(side::equals).orElse(false));
                if (!request.isBothAsked() || isMapped) {
                    throw e;
                }
                first = first == null ? e : first;
                findings.add(Finding.warning(
                        "landmarks.side-missing",
                        side.word(),
                        "the landmark map names nothing of the " + side.word() + " side: no model for it"));
            }
        }
        if (sides.isEmpty() && first != null) {
            throw first;
        }
        return sides;
    }

    private StandingSettings settings(Quantity mass) {
        GaitOptions o = request.gait();
        return new StandingSettings(
                request.subjectId(),
                mass,
                o.stature().isPresent()
                        ? Optional.of(Quantity.of(o.stature().getAsDouble(), Basis.MEASURED))
                        : Optional.empty(),
                o.population(),
                o.sex(),
                o.markerRadius().isPresent()
                        ? Quantity.of(o.markerRadius().getAsDouble(), Basis.MEASURED)
                        : StandingSettings.DEFAULT_MARKER_RADIUS,
                request.segments(),
                request.inertia(),
                choices);
    }

    /** The choices that the numbers of a model depend on. */
    private List<Setting> settings(GaitSubject subject) {
        GaitOptions o = request.gait();
        return List.of(
                new Setting("zero", o.isZeroFlat() ? "flat" : "standing"),
                new Setting("inertia", request.inertia().word()),
                new Setting("mtp-offset", request.division().isFunctionalToeAxis() ? "functional" : "none"),
                new Setting("events", o.events()),
                new Setting("marker-cutoff", o.isCutoffFound() ? "residual" : "given"),
                new Setting("marker-low-pass", String.join(", ", subject.cutoffs())));
    }

    private FootChoices choices() throws UseCaseException, FormatException {
        Division division = request.division();
        Optional<ChainPlan> plan = division.plan().isPresent()
                ? Optional.of(InputFiles.segmentPlan(division.plan().get(), sources))
                : Optional.empty();
        return new FootChoices(plan, division.isFunctionalToeAxis());
    }

    private OptionalDouble provisionalLimbLength(StandingPosture posture, Set<Side> sides) {
        Quantity mass = Quantity.of(PROVISIONAL_MASS, Basis.ASSUMED);
        return sides.stream()
                .map(s -> StandingModel.build(posture, settings(mass), s))
                .filter(StandingOutcome.Built.class::isInstance)
                .mapToDouble(
                        o -> ((StandingOutcome.Built) o).limb().limbLength().value())
                .filter(l -> l > 0 && l < LONGEST_LIMB)
                .average();
    }

    private StandingLimb built(StandingPosture posture, Quantity mass, Side side, StandingTrial stood)
            throws UseCaseException {
        StandingOutcome outcome = StandingModel.build(posture, settings(mass), side);
        if (outcome instanceof StandingOutcome.Refused refused) {
            throw new UseCaseException(
                    UseCaseException.Kind.INPUT,
                    stood.tracks().get(0).recording().name(),
                    refused.message(),
                    refused.whatToDo());
        }
        return ((StandingOutcome.Built) outcome).limb();
    }

    private List<StanceMotion> stances(
            StandingLimb limb, GaitSubject subject, List<LimbMotion> motions, Quantity mass) {
        double leastLoad = RollOverShapes.leastLoad(
                mass.value() * GaitSettings.STANDARD_GRAVITY, request.gait().population() != Population.OTHER);
        List<StanceMotion> stances = new ArrayList<>();
        for (int i = 0; i < motions.size(); i++) {
            Pass pass = subject.passes().get(i);
            for (Stance stance : pass.stances()) {
                if (stance.side() == limb.side()) {
                    stances.add(new StanceMotion(pass, stance, limb, motions.get(i), leastLoad));
                }
            }
        }
        return stances;
    }

    private WalkingRollOver rollOver(StandingLimb limb, GaitSubject subject, List<LimbMotion> motions, Quantity mass) {
        boolean isHuman = request.gait().population() != Population.OTHER;
        WalkingRollOver rollOver = new WalkingRollOver(limb, mass.value() * GaitSettings.STANDARD_GRAVITY, isHuman);
        PoseChecks checks = new PoseChecks(limb);
        for (int i = 0; i < motions.size(); i++) {
            Pass pass = subject.passes().get(i);
            LimbMotion motion = motions.get(i);
            if (motion.shank().isEmpty()) {
                findings.add(Finding.warning(
                        "rolling.shank-not-tracked",
                        pass.trial().name(),
                        "fewer than three points of the " + limb.side().word()
                                + " shank are tracked together: no roll-over in the shank frame"));
            }
            checks.add(pass, motion);
            rollOver.add(pass, motion);
        }
        findings.addAll(checks.findings());
        return rollOver;
    }
}
