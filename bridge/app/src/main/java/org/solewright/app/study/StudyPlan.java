package org.solewright.app.study;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.EnumSet;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.solewright.analysis.fitting.InertiaTable;
import org.solewright.app.pipeline.AppraiseReport;
import org.solewright.app.pipeline.AppraiseUseCase;
import org.solewright.app.pipeline.FitReport;
import org.solewright.app.pipeline.FitUseCase;
import org.solewright.app.pipeline.GaitOptions;
import org.solewright.app.pipeline.UseCaseException;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.foot.FootModel;
import org.solewright.domain.foot.Population;
import org.solewright.domain.foot.Sex;
import org.solewright.domain.gait.Side;
import org.solewright.domain.motion.ResultsMap;
import org.solewright.domain.study.StudySettings;
import org.solewright.domain.study.StudySubject;
import org.solewright.domain.study.StudyTrial;
import org.solewright.formats.footmodel.FootModelFile;
import org.solewright.formats.footmodel.ResultsMapFile;
import org.solewright.formats.io.FormatException;

/** Which tasks a study consists of: a fit per foot, then an appraisal per trial. */
final class StudyPlan {

    /** Difference between a limb length by hand and by markers that is worth a look; common practice. */
    private static final double LIMB_LENGTH_SHARE = 0.05;

    private final Study study;
    private final String version;
    private final Map<String, StudySubject> subjects;

    StudyPlan(Study study, String version) {
        this.study = study;
        this.version = version;
        this.subjects = study.subjectsById();
    }

    /** The subject of a trial; one without a line in the table has nothing stated. */
    private StudySubject subject(String id) {
        StudySubject s = subjects.get(id);
        return s != null
                ? s
                : new StudySubject(
                        id,
                        OptionalDouble.empty(),
                        OptionalDouble.empty(),
                        OptionalDouble.empty(),
                        Population.UNKNOWN,
                        Optional.empty(),
                        "",
                        0);
    }

    private Path file(String name) {
        return study.named(name).orElse(study.folder());
    }

    private List<Path> files(List<StudyTrial> trials) {
        return trials.stream().map(t -> file(t.file())).toList();
    }

    /** The fit of a foot. */
    StudyTask fit(FitUnit unit) {
        StudySettings settings = study.settings();
        StudySubject subject = subject(unit.subject());
        List<StudyTrial> walking = unit.fitted(settings.fitTrials());
        List<StudyTask.Source> inputs = new ArrayList<>();
        inputs.add(new StudyTask.Source("landmarks", file(settings.landmarks())));
        unit.standing().forEach(t -> inputs.add(new StudyTask.Source("standing", file(t.file()))));
        walking.forEach(t -> inputs.add(new StudyTask.Source("walking", file(t.file()))));
        double belt = walking.get(0).beltSpeed();
        GaitOptions options = options(subject, files(unit.standing()), files(walking), belt);
        String text = text(subject, belt) + ";stature=" + subject.stature() + ";limbLength="
                + subject.limbLength() + ";segments=" + settings.segments() + ";inertia=" + settings.inertia()
                + ";otherCondition=" + unit.isOtherCondition();
        return new StudyTask(
                StudyTask.Kind.FIT,
                unit.subject(),
                unit.session(),
                unit.condition().word(),
                "",
                inputs,
                text,
                StudyTask.place(
                        "models",
                        unit.subject(),
                        unit.session(),
                        unit.condition().word()),
                Optional.empty(),
                out -> fitted(unit, subject, options, out));
    }

    private List<Finding> fitted(FitUnit unit, StudySubject subject, GaitOptions options, Path out)
            throws UseCaseException, FormatException {
        FitUseCase.Request request = new FitUseCase.Request(
                options,
                EnumSet.allOf(Side.class),
                true,
                study.settings().segments(),
                InertiaTable.ofWord(study.settings().inertia()).orElseThrow(),
                subject.id(),
                version);
        List<Finding> findings = new ArrayList<>(unit.findings(""));
        findings.addAll(FitReport.write(request, out).findings());
        for (Side side : Side.values()) {
            Path model = out.resolve("foot-model-" + side.word() + ".xml");
            if (subject.limbLength().isPresent() && Files.exists(model)) {
                checkLimbLength(read(model), subject.limbLength().getAsDouble(), findings);
            }
        }
        return findings;
    }

    private static FootModel read(Path model) throws UseCaseException, FormatException {
        try {
            return FootModelFile.read(model);
        } catch (IOException e) {
            throw new UseCaseException(
                    UseCaseException.Kind.OUTPUT,
                    model.toString(),
                    "cannot be read back (" + e.getMessage() + ")",
                    "check the folder",
                    e);
        }
    }

    private static void checkLimbLength(FootModel model, double byHand, List<Finding> findings) {
        double byMarkers = model.subject().limbLength().value();
        if (Math.abs(byMarkers / byHand - 1) > LIMB_LENGTH_SHARE) {
            findings.add(Finding.warning(
                    "study.limb-length",
                    model.side().word(),
                    String.format(
                            Locale.ROOT,
                            "limb length by hand %.3f m, by markers %.3f m: check both",
                            byHand,
                            byMarkers)));
        }
    }

    /**
     * The appraisals of a foot's trials.
     *
     * @param unit the foot
     * @param models its files; empty where there are none
     * @param failure why the fit failed; empty where it did not
     */
    List<StudyTask> appraisals(FitUnit unit, List<Path> models, Optional<String> failure) {
        return unit.appraised().stream()
                .map(t -> appraisal(unit, t, models, failure))
                .toList();
    }

    private StudyTask appraisal(FitUnit unit, StudyTrial trial, List<Path> models, Optional<String> failure) {
        StudySubject subject = subject(trial.subject());
        boolean isResults = trial.kind() == StudyTrial.Kind.RESULTS;
        Path file = file(trial.file());
        boolean isMap = isResults && trial.file().endsWith(".xml");
        Path map = isMap ? file : file(study.settings().columnMap().orElse(trial.file()));
        List<StudyTask.Source> inputs = new ArrayList<>();
        if (isResults) {
            inputs.add(new StudyTask.Source("results", map));
            inputs.addAll(isMap ? named(map) : List.of(new StudyTask.Source("table", file)));
        } else {
            inputs.add(new StudyTask.Source("landmarks", file(study.settings().landmarks())));
            inputs.add(new StudyTask.Source("walking", file));
        }
        models.forEach(m -> inputs.add(new StudyTask.Source("model", m)));
        AppraiseUseCase.Request request = new AppraiseUseCase.Request(
                options(subject, List.of(), isResults ? List.of() : List.of(file), trial.beltSpeed()),
                isResults ? Optional.of(map) : Optional.empty(),
                isResults && !isMap ? List.of(file) : List.of(),
                models,
                version);
        return new StudyTask(
                StudyTask.Kind.APPRAISE,
                trial.subject(),
                trial.session(),
                trial.condition().word(),
                trial.name(),
                inputs,
                text(subject, trial.beltSpeed()) + ";kind=" + trial.kind().word() + ";condition="
                        + trial.condition().word() + ";sole=" + trial.soleThickness() + ";aid=" + trial.walkingAid()
                        + ";slope=" + trial.slope() + ";fit=" + failure.orElse(""),
                StudyTask.place(Study.RESULTS, trial.subject(), trial.session(), trial.name()),
                refusal(trial, unit, failure),
                out -> {
                    List<Finding> findings = new ArrayList<>(unit.findings(""));
                    findings.addAll(StudyCheck.conditions(trial, ""));
                    findings.addAll(AppraiseReport.write(request, out).findings());
                    return findings;
                });
    }

    private static Optional<Finding> refusal(StudyTrial trial, FitUnit unit, Optional<String> failure) {
        if (trial.isAided()) {
            return StudyCheck.conditions(trial, "").stream()
                    .filter(f -> f.code().equals(StudyCheck.AIDED))
                    .findFirst();
        }
        return failure.map(
                why -> Finding.error("study.fit-failed", "", "no foot: the fit of " + unit.name() + " failed: " + why));
    }

    /** Files that a map of results names. One that cannot be read says so when it is used. */
    private static List<StudyTask.Source> named(Path map) {
        List<StudyTask.Source> sources = new ArrayList<>();
        try {
            ResultsMap results = ResultsMapFile.read(map);
            results.tables().stream()
                    .filter(t -> !t.file().isEmpty())
                    .forEach(t -> sources.add(new StudyTask.Source("table", map.resolveSibling(t.file()))));
            results.recordings().forEach(r -> {
                sources.add(new StudyTask.Source("recording", map.resolveSibling(r.file())));
                sources.add(new StudyTask.Source("landmarks", map.resolveSibling(r.landmarks())));
            });
        } catch (IOException | FormatException | InvalidPathException e) {
            return List.of();
        }
        return sources;
    }

    private GaitOptions options(StudySubject subject, List<Path> standing, List<Path> walking, double belt) {
        StudySettings settings = study.settings();
        return new GaitOptions(
                standing,
                walking,
                file(settings.landmarks()),
                subject.mass(),
                subject.stature(),
                subject.population(),
                subject.sex(),
                Optional.empty(),
                settings.floor(),
                settings.isMirrored(),
                settings.markerRadius(),
                settings.markerCutoff(),
                settings.isFlagIgnored(),
                belt,
                settings.events(),
                Optional.empty());
    }

    /** What fit and appraisal depend on beside their files. */
    private String text(StudySubject s, double belt) {
        StudySettings settings = study.settings();
        return "mass=" + s.mass() + ";population=" + s.population().word() + ";sex="
                + s.sex().map(Sex::word).orElse("") + ";lowPass=" + settings.markerCutoff() + ";radius="
                + settings.markerRadius() + ";floor=" + settings.floor() + ";mirrored=" + settings.isMirrored()
                + ";flags=" + settings.isFlagIgnored() + ";events=" + settings.events() + ";belt=" + belt;
    }
}
