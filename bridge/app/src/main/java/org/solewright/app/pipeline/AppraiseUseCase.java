package org.solewright.app.pipeline;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import org.solewright.analysis.audit.AuditSettings;
import org.solewright.analysis.cost.StepMechanics;
import org.solewright.analysis.gait.GaitSettings;
import org.solewright.analysis.gait.LandmarkTracks;
import org.solewright.analysis.gait.Pass;
import org.solewright.analysis.gait.Step;
import org.solewright.app.report.TransitionView;
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
import org.solewright.domain.gait.ContactRow;
import org.solewright.domain.gait.CurveRow;
import org.solewright.domain.gait.Side;
import org.solewright.domain.gait.Stance;
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
     * @param auditLimit residuals of results above this share are errors
     */
    public record Request(
            GaitOptions gait,
            Optional<Path> results,
            List<Path> tables,
            List<Path> models,
            String version,
            double auditLimit) {

        /** Copies the list. */
        public Request {
            tables = List.copyOf(tables);
            models = List.copyOf(models);
        }

        /**
         * With the usual limit of audits.
         *
         * @param gait walking recordings
         * @param results a map of results, instead of recordings
         * @param tables files for tables of the map that name none
         * @param models foot models, at most one per side; may be empty
         * @param version version of the tool
         */
        public Request(GaitOptions gait, Optional<Path> results, List<Path> tables, List<Path> models, String version) {
            this(gait, results, tables, models, version, AuditSettings.DEFAULT_LIMIT);
        }

        Request with(GaitOptions other) {
            return new Request(other, results, tables, models, version, auditLimit);
        }
    }

    /**
     * What came of it.
     *
     * @param cost rows with their summaries, findings, provenance
     * @param mechanics of the steps, in the order of the rows of transitions
     * @param transitions the same with their loads
     * @param models whose limbs these are
     * @param postures rows of postures.csv
     * @param contacts contact table
     * @param curves powers over stance
     * @param failed names of inputs that failed
     */
    record Result(
            PostureCost cost,
            List<StepMechanics> mechanics,
            List<TransitionView> transitions,
            List<FootModel> models,
            List<PostureRow> postures,
            List<ContactRow> contacts,
            List<CurveRow> curves,
            List<String> failed) {}

    private static final String GIVEN = "given";
    private static final String DEFAULT = "default";

    private final Request request;
    private final Optional<ResultsRecording.Loaded> results;
    private final List<Finding> findings;
    private final List<SourceFile> sources;
    private final Map<Side, ModelLimb> models = new EnumMap<>(Side.class);
    private final List<StepMechanics> mechanics = new ArrayList<>();
    private final List<TransitionView> transitions = new ArrayList<>();
    private final List<PostureRow> postures = new ArrayList<>();
    private final List<CurveRow> curves = new ArrayList<>();
    private final List<CurveRow> powers = new ArrayList<>();
    private Optional<ResultsAudit> audit = Optional.empty();

    private AppraiseUseCase(
            Request request,
            Optional<ResultsRecording.Loaded> results,
            List<SourceFile> sources,
            List<Finding> findings) {
        this.request = request;
        this.results = results;
        this.sources = sources;
        this.findings = findings;
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
        List<SourceFile> sources = new ArrayList<>();
        List<Finding> findings = new ArrayList<>();
        if (request.results().isEmpty()) {
            return new AppraiseUseCase(request, Optional.empty(), sources, findings).run();
        }
        ResultsRecording.Loaded loaded =
                ResultsRecording.read(request.results().get(), request.tables(), sources, findings);
        // Mass and recordings that the map of results states become options of the call.
        Request stated = request.with(request.gait().of(loaded.files(), loaded.landmarks(), loaded.mass()));
        return new AppraiseUseCase(stated, Optional.of(loaded), sources, findings).run();
    }

    private Result run() throws UseCaseException, FormatException {
        readModels();
        audit = results.flatMap(r -> r.audited())
                .map(a -> new ResultsAudit(
                        a, mass(), request.auditLimit(), request.gait().markerCutoff()));
        try {
            return appraised();
        } catch (UseCaseException e) {
            if (e.kind() != UseCaseException.Kind.INPUT
                    || audit.isEmpty()
                    || !audit.get().hasErrors()) {
                throw e;
            }
            // What the audit found is the likely reason, and says more.
            findings.addAll(audit.get().findings());
            findings.add(InputFiles.failed(e.file(), String.valueOf(e.getMessage()), e.whatToDo()));
            return result(List.of(), List.of());
        }
    }

    /** Given or stated, else the models'. */
    private OptionalDouble mass() {
        OptionalDouble given = request.gait().mass();
        return given.isPresent()
                ? given
                : models.values().stream()
                        .mapToDouble(m -> m.model().subject().mass().value())
                        .average();
    }

    private Result appraised() throws UseCaseException, FormatException {
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
        if (rows.isEmpty()) {
            throw new UseCaseException(
                    UseCaseException.Kind.INPUT,
                    walking.get(0).name(),
                    "no recording of this call has a step from one foot to the other on its platforms",
                    "give a recording with two consecutive platform contacts");
        }
        if (options.annotate().isPresent()) {
            annotate(options.annotate().get(), walked.files(), subject);
        }
        curves.addAll(powers);
        curves.addAll(PowerCurves.means(powers));
        findings.add(Finding.note("columns.not-computed", "", "effective_segments is left empty by this version"));
        audit.ifPresent(a -> findings.addAll(a.findings()));
        return result(TransitionSummary.withSummaries(rows), ContactOverrides.rows(subject.passes()));
    }

    private Result result(List<TransitionRow> rows, List<ContactRow> contacts) {
        List<Finding> distinct = List.copyOf(new LinkedHashSet<>(findings));
        PostureCost cost = new PostureCost(request.version(), sources, settings(), rows, distinct, Cautions.LINES);
        List<String> failed = distinct.stream()
                .filter(f -> f.severity() == Severity.ERROR)
                .map(Finding::where)
                .distinct()
                .toList();
        return new Result(
                cost,
                mechanics,
                transitions,
                models.values().stream().map(ModelLimb::model).toList(),
                postures,
                contacts,
                curves,
                failed);
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
                if (limb.hasShank(tracks)) {
                    annotation.joint(e.getKey(), "KNEE", f -> limb.knee(tracks, f), "knee centre of the model");
                    annotation.joint(e.getKey(), "ANKLE", f -> limb.ankle(tracks, f), "ankle centre of the model");
                }
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
        if (audit.isPresent()) {
            settings.add(new PostureCost.Setting(
                    "audit_limit",
                    Double.toString(request.auditLimit()),
                    request.auditLimit() == AuditSettings.DEFAULT_LIMIT ? DEFAULT : GIVEN));
        }
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
        transitions.add(new TransitionView(step, m));
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
        if (limb.isPresent()) {
            ModelColumns columns =
                    new ModelColumns(pass, tracks, step, request.gait().markerCutoff());
            columns.fill(row, limb.get(), m);
            postures.addAll(columns.postures());
            curves.addAll(columns.curves());
            columns.findings().forEach(f -> addFinding(codes, f));
            findings.addAll(columns.unlisted());
        }
        powers.addAll(PowerCurves.of(step, m));
        audit.ifPresent(a -> a.fill(row, step, m));
        row.text("findings", String.join(";", codes));
        return row.build();
    }

    private void addFinding(Set<String> codes, Finding finding) {
        findings.add(finding);
        codes.add(finding.code());
    }
}
