package org.solewright.app.pipeline;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.solewright.analysis.cost.ComparedPostures;
import org.solewright.analysis.cost.DistalWork;
import org.solewright.analysis.cost.PowerWork;
import org.solewright.analysis.cost.StepMechanics;
import org.solewright.analysis.fitting.FittedArc;
import org.solewright.analysis.fitting.RollOver;
import org.solewright.analysis.fitting.RollOverPath;
import org.solewright.analysis.fitting.SegmentTracking;
import org.solewright.analysis.gait.GaitSettings;
import org.solewright.analysis.gait.LandmarkTracks;
import org.solewright.analysis.gait.Pass;
import org.solewright.analysis.gait.Step;
import org.solewright.domain.cost.Measure;
import org.solewright.domain.cost.PostureCost;
import org.solewright.domain.cost.PostureRow;
import org.solewright.domain.cost.TransitionRow;
import org.solewright.domain.finding.Cautions;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.Severity;
import org.solewright.domain.finding.SourceFile;
import org.solewright.domain.foot.FootModel;
import org.solewright.domain.foot.LandmarkMap;
import org.solewright.domain.foot.Population;
import org.solewright.domain.gait.ContactRow;
import org.solewright.domain.gait.CurveRow;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.gait.Side;
import org.solewright.domain.gait.Stance;
import org.solewright.domain.gait.Use;
import org.solewright.domain.geometry.Vec3;
import org.solewright.domain.motion.Recording;
import org.solewright.formats.footmodel.FootModelFile;
import org.solewright.formats.io.FormatException;

/** Says what the posture of measured walking cost. */
public final class AppraiseUseCase {

    /**
     * What the user asked for.
     *
     * @param gait walking recordings
     * @param results a map of results, instead of recordings
     * @param tables files for tables of the map that name none
     * @param models foot models, at most one per side; may be empty
     * @param version version of the tool
     */
    public record Request(
            GaitOptions gait, Optional<Path> results, List<Path> tables, List<Path> models, String version) {

        /** Copies the list. */
        public Request {
            tables = List.copyOf(tables);
            models = List.copyOf(models);
        }

        Request with(GaitOptions other) {
            return new Request(other, results, tables, models, version);
        }
    }

    /**
     * What came of it.
     *
     * @param cost rows with their summaries, findings, provenance
     * @param mechanics of the steps, in the order of the rows of transitions
     * @param postures rows of postures.csv
     * @param contacts contact table
     * @param curves powers over stance
     * @param failed names of inputs that failed
     */
    record Result(
            PostureCost cost,
            List<StepMechanics> mechanics,
            List<PostureRow> postures,
            List<ContactRow> contacts,
            List<CurveRow> curves,
            List<String> failed) {}

    private static final String GIVEN = "given";
    private static final String DEFAULT = "default";

    private Request request;
    private final List<Finding> findings = new ArrayList<>();
    private final List<SourceFile> sources = new ArrayList<>();
    private final Map<Side, ModelLimb> models = new EnumMap<>(Side.class);
    private final List<StepMechanics> mechanics = new ArrayList<>();
    private final List<PostureRow> postures = new ArrayList<>();
    private final List<CurveRow> curves = new ArrayList<>();

    private AppraiseUseCase(Request request) {
        this.request = request;
    }

    /**
     * Runs the appraisal without writing anything.
     *
     * @param request what is asked
     * @return rows and findings
     * @throws UseCaseException where an input lacks what is needed
     * @throws FormatException where a file is not as its format says
     */
    static Result run(Request request) throws UseCaseException, FormatException {
        return new AppraiseUseCase(request).run();
    }

    private Result run() throws UseCaseException, FormatException {
        readModels();
        Optional<ResultsRecording.Loaded> results = results();
        GaitOptions options = request.gait();
        LandmarkMap map;
        InputFiles.Walking walked;
        if (results.isPresent() && results.get().recording().isPresent()) {
            map = results.get().map();
            walked = new InputFiles.Walking(List.of(results.get().recording().get()), Map.of());
        } else {
            map = InputFiles.landmarkMap(options.landmarks(), sources);
            walked = InputFiles.walking(options.walking(), options.isFlagIgnored(), sources, findings);
        }
        List<Recording> walking = walked.recordings();
        List<ContactRow> contacts = options.contacts().isPresent()
                ? InputFiles.contacts(options.contacts().get(), sources)
                : List.of();
        GaitSubject subject = GaitSubject.of(options, map, contacts, walking, Optional.empty(), limbLength());
        findings.addAll(subject.findings());
        List<TransitionRow> rows = new ArrayList<>();
        for (int i = 0; i < subject.passes().size(); i++) {
            Pass pass = subject.passes().get(i);
            List<TransitionRow> of = new ArrayList<>();
            for (Step step : subject.steps().get(i)) {
                of.add(row(pass, subject.walking().get(i), step));
            }
            rows.addAll(of);
        }
        if (options.annotate().isPresent()) {
            annotate(options.annotate().get(), walked.files(), subject);
        }
        if (rows.isEmpty()) {
            throw new UseCaseException(
                    UseCaseException.Kind.INPUT,
                    walking.get(0).name(),
                    "no recording of this call has a step from one foot to the other on its platforms",
                    "give a recording with two consecutive platform contacts");
        }
        findings.add(Finding.note(
                "columns.not-computed",
                "",
                "effective_segments, foot_work_* and audit_* are left empty by this version"));
        List<Finding> distinct = List.copyOf(new LinkedHashSet<>(findings));
        PostureCost cost = new PostureCost(
                request.version(),
                sources,
                settings(),
                TransitionSummary.withSummaries(rows),
                distinct,
                Cautions.LINES);
        List<String> failed = distinct.stream()
                .filter(f -> f.severity() == Severity.ERROR)
                .map(Finding::where)
                .distinct()
                .toList();
        return new Result(cost, mechanics, postures, ContactOverrides.rows(subject.passes()), curves, failed);
    }

    /** Reads a map of results; mass and recordings that it states become options of the call. */
    private Optional<ResultsRecording.Loaded> results() throws UseCaseException, FormatException {
        if (request.results().isEmpty()) {
            return Optional.empty();
        }
        ResultsRecording.Loaded loaded =
                ResultsRecording.read(request.results().get(), request.tables(), sources, findings);
        request = request.with(request.gait().of(loaded.files(), loaded.landmarks(), loaded.mass()));
        return Optional.of(loaded);
    }

    private void annotate(Path folder, Map<String, Path> files, GaitSubject subject)
            throws UseCaseException, FormatException {
        OutputFolder annotated = OutputFolder.of(folder, request.gait().inputs());
        for (int i = 0; i < subject.passes().size(); i++) {
            Pass pass = subject.passes().get(i);
            LandmarkTracks tracks = subject.walking().get(i);
            Annotation annotation = new Annotation(pass, tracks.recording().frames());
            for (Map.Entry<Side, ModelLimb> e : models.entrySet()) {
                ModelLimb limb = e.getValue();
                limb.shank(tracks).ifPresent(s -> {
                    annotation.joint(e.getKey(), "KNEE", f -> limb.knee(s, f), "knee centre of the model");
                    annotation.joint(e.getKey(), "ANKLE", f -> limb.ankle(s, f), "ankle centre of the model");
                });
            }
            Path file = files.get(pass.trial().name());
            if (file != null) {
                findings.addAll(
                        annotation.write(file, annotated, tracks.recording().name()));
            }
        }
    }

    private List<PostureCost.Setting> settings() {
        GaitOptions o = request.gait();
        List<PostureCost.Setting> settings = new ArrayList<>();
        fixed(settings, "gravity_m_s2", Double.toString(GaitSettings.STANDARD_GRAVITY));
        settings.add(new PostureCost.Setting(
                "marker_low_pass_Hz",
                Double.toString(o.markerCutoff()),
                o.markerCutoff() == GaitOptions.DEFAULT_MARKER_CUTOFF ? DEFAULT : GIVEN));
        fixed(settings, "load_low_pass_Hz", "none");
        fixed(settings, "contact_threshold_N", "min(20, 0.03 m g), at least 5 noise SD");
        fixed(settings, "u_v_up_m_s", "0.015 on a step, 0.003 on a stride");
        fixed(settings, "u_v_forward_m_s", "0.02");
        fixed(settings, "u_mass", "0.01");
        settings.add(new PostureCost.Setting(
                "belt_speed_m_s", Double.toString(o.beltSpeed()), o.beltSpeed() > 0 ? GIVEN : DEFAULT));
        settings.add(new PostureCost.Setting("events", o.events(), o.events().equals("platform") ? DEFAULT : GIVEN));
        settings.add(new PostureCost.Setting(
                "mirrored", Boolean.toString(o.isMirrored()), o.isMirrored() ? GIVEN : DEFAULT));
        o.mass().ifPresent(m -> settings.add(new PostureCost.Setting("mass_kg", Double.toString(m), GIVEN)));
        return settings;
    }

    private static void fixed(List<PostureCost.Setting> settings, String name, String value) {
        settings.add(new PostureCost.Setting(name, value, DEFAULT));
    }

    private void readModels() throws UseCaseException, FormatException {
        for (Path file : request.models()) {
            FootModel model = InputFiles.read(file, FootModelFile::read);
            sources.add(InputFiles.source("model", file));
            if (models.put(model.side(), new ModelLimb(model)) != null) {
                throw new UseCaseException(
                        UseCaseException.Kind.USAGE,
                        file.toString(),
                        "is the second model of the " + model.side().word() + " side",
                        "give one model per side");
            }
        }
        if (models.isEmpty()) {
            findings.add(Finding.note(
                    "model.none", "", "no model was given: limb, foot and posture columns are empty; give --model"));
        }
    }

    private Optional<Double> limbLength() {
        return models.isEmpty()
                ? Optional.empty()
                : Optional.of(models.values().stream()
                        .mapToDouble(m -> m.model().subject().limbLength().value())
                        .average()
                        .orElseThrow());
    }

    private TransitionRow row(Pass pass, LandmarkTracks tracks, Step step) {
        StepMechanics m = StepMechanics.of(step);
        mechanics.add(m);
        findings.addAll(m.findings());
        Set<String> codes = new LinkedHashSet<>();
        pass.findings().forEach(f -> codes.add(f.code()));
        m.findings().forEach(f -> codes.add(f.code()));
        Stance trailing = step.loads().trailing();
        Stance leading = step.loads().leading();
        TransitionRow.Builder row = TransitionRow.builder()
                .text("trial", pass.trial().name())
                .text("step", Integer.toString(step.number()))
                .text("side", leading.side().word())
                .text("trailing_side", trailing.side().word())
                .text("window", step.loads().isStride() ? "stride" : "step");
        for (Measure measure : Measure.values()) {
            Double value = m.values().get(measure);
            if (value != null) {
                row.number(measure.column(), measure.inColumnUnit(value));
            }
            Double sd = m.deviations().get(measure);
            if (sd != null) {
                row.number(measure.column() + "_sd", measure.inColumnUnit(sd));
            }
        }
        Optional<ModelLimb> limb = Optional.ofNullable(models.get(trailing.side()));
        if (limb.isEmpty() && !models.isEmpty()) {
            addFinding(
                    codes,
                    Finding.note(
                            "model.side-missing",
                            pass.trial().name() + " step " + step.number(),
                            "no model of the " + trailing.side().word() + " side was given: the model columns of this"
                                    + " step are empty"));
        }
        limb.ifPresent(l -> modelColumns(row, l, pass, tracks, step, m, codes));
        curves.addAll(PowerCurves.of(step, m));
        row.text("findings", String.join(";", codes));
        return row.build();
    }

    private void addFinding(Set<String> codes, Finding finding) {
        findings.add(finding);
        codes.add(finding.code());
    }

    private void modelColumns(
            TransitionRow.Builder row,
            ModelLimb limb,
            Pass pass,
            LandmarkTracks tracks,
            Step step,
            StepMechanics m,
            Set<String> codes) {
        var subject = limb.model().subject();
        double l = subject.limbLength().value();
        row.number("limb_length_m", l);
        subject.limbLength().sd().ifPresent(sd -> row.number("limb_length_m_sd", sd));
        subject.footLength().ifPresent(q -> {
            row.number("foot_length_m", q.value());
            q.sd().ifPresent(sd -> row.number("foot_length_m_sd", sd));
        });
        subject.effectiveFootLength().ifPresent(q -> {
            row.number("effective_foot_length_m", q.value());
            q.sd().ifPresent(sd -> row.number("effective_foot_length_m_sd", sd));
        });
        rollingRadius(row, limb, pass, tracks, step, codes);
        distalWork(row, limb, pass, tracks, step, codes);
        Double length = m.values().get(Measure.STEP_LENGTH);
        Double before = m.values().get(Measure.SPEED_BEFORE);
        Double mass = m.values().get(Measure.MASS);
        Double speed = m.values().get(Measure.SPEED);
        double gravity = step.loads().gravity();
        if (length != null && before != null && mass != null && length > 0 && before > 0 && mass > 0) {
            ComparedPostures compared = ComparedPostures.of(
                    limb.compared(),
                    new ComparedPostures.TakenStep(
                            pass.trial().name(), Integer.toString(step.number()), length, before, mass, gravity));
            compared.fill(row);
            postures.addAll(compared.rows());
            compared.findings().forEach(f -> addFinding(codes, f));
            if (subject.population() != Population.OTHER) {
                findings.add(Finding.note(
                        "postures.thought-experiment",
                        "digitigrade, unguligrade",
                        ComparedPostures.THOUGHT_EXPERIMENT));
            }
            row.number("step_length_nd", length / l);
            scaled(row, "push_off_nd", m.values().get(Measure.PUSH_OFF), mass * gravity * l);
            scaled(row, "collision_nd", m.values().get(Measure.COLLISION), mass * gravity * l);
        }
        scaled(row, "speed_nd", speed, Math.sqrt(gravity * l));
    }

    private static void scaled(
            TransitionRow.Builder row, String column, @org.jspecify.annotations.Nullable Double value, double by) {
        if (value != null) {
            row.number(column, value / by);
        }
    }

    /** Work distal to the shank of the trailing limb over its stance. */
    private void distalWork(
            TransitionRow.Builder row, ModelLimb limb, Pass pass, LandmarkTracks tracks, Step step, Set<String> codes) {
        Stance trailing = step.loads().trailing();
        Optional<SegmentTracking> shank = limb.shank(tracks);
        Optional<PlatformLoads> platform = pass.trial().platforms().stream()
                .filter(p -> trailing.platforms().equals(List.of(p.number())))
                .findFirst();
        Optional<PowerWork> work = Optional.empty();
        if (shank.isPresent() && platform.isPresent() && trailing.whole()) {
            SegmentTracking s = shank.get();
            Vec3 belt = pass.R_LW().x().times(-pass.trial().beltSpeed());
            work = new DistalWork(s::pose, pass.trial().rate(), pass.trial().startTime(), belt)
                    .over(platform.get(), request.gait().markerCutoff(), trailing.start(), trailing.end());
        }
        if (work.isEmpty()) {
            addFinding(
                    codes,
                    Finding.note(
                            "distal.unknown",
                            pass.trial().name() + " step " + step.number(),
                            "no work distal to the shank: "
                                    + (!trailing.whole()
                                            ? trailing.why()
                                            : "the shank is not tracked throughout the stance on one platform")));
            return;
        }
        row.number("ankle_foot_work_pos_J", work.get().positive());
        row.number("ankle_foot_work_neg_J", work.get().negative());
    }

    private void rollingRadius(
            TransitionRow.Builder row, ModelLimb limb, Pass pass, LandmarkTracks tracks, Step step, Set<String> codes) {
        Stance trailing = step.loads().trailing();
        String where = pass.trial().name() + " step " + step.number();
        Optional<SegmentTracking> shank = limb.shank(tracks);
        if (!trailing.allows(Use.ROLL_OVER) || shank.isEmpty()) {
            addFinding(
                    codes,
                    Finding.note(
                            "rolling.stance-unused",
                            where,
                            shank.isEmpty()
                                    ? "the points of the model's shank are not tracked: no rolling radius"
                                    : "no rolling radius: " + trailing.why()));
            return;
        }
        SegmentTracking s = shank.get();
        double weight = limb.model().subject().mass().value() * step.loads().gravity();
        Optional<RollOverPath> path = RollOverShapes.of(
                        pass,
                        trailing,
                        f -> limb.ankle(s, f),
                        f -> limb.knee(s, f),
                        RollOverShapes.leastLoad(weight, limb.model().subject().population() != Population.OTHER))
                .filter(RollOver::isLongEnough);
        if (path.isEmpty()) {
            addFinding(
                    codes,
                    Finding.note(
                            "rolling.stance-unused",
                            where,
                            "the roll-over of the trailing stance has too few samples"));
            return;
        }
        FittedArc arc = RollOver.arc(path.get());
        if (!(arc.curvature() > 0)) {
            addFinding(
                    codes,
                    Finding.note("rolling.flat", where, "the roll-over shape is flat or hollow: no rolling radius"));
            return;
        }
        row.number("rolling_radius_m", 1 / arc.curvature());
        RollOver.blockSd(arc, path.get().rate())
                .ifPresent(sd -> row.number("rolling_radius_m_sd", sd / (arc.curvature() * arc.curvature())));
    }
}
