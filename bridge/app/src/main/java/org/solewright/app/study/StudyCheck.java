package org.solewright.app.study;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.solewright.app.pipeline.UseCaseException;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.Severity;
import org.solewright.domain.foot.Population;
import org.solewright.domain.study.StudySubject;
import org.solewright.domain.study.StudyTrial;
import org.solewright.formats.c3d.C3dFile;
import org.solewright.formats.footmodel.LandmarkMapFile;
import org.solewright.formats.footmodel.ResultsMapFile;
import org.solewright.formats.io.FormatException;

/** Everything that is wrong with a study before anything runs, each with its file and line. */
public final class StudyCheck {

    /** Code of the finding that keeps a trial from being done. */
    static final String AIDED = "study.walking-aid";

    private final List<Finding> findings = new ArrayList<>();

    private StudyCheck() {}

    /**
     * What was checked.
     *
     * @param subjects number of subjects
     * @param trials number of trials
     * @param findings in the order of the files and lines
     */
    public record Result(int subjects, int trials, List<Finding> findings) {

        /** Copies the list. */
        public Result {
            findings = List.copyOf(findings);
        }

        /**
         * How many findings are errors.
         *
         * @return number of errors
         */
        public long errors() {
            return findings.stream().filter(f -> f.severity() == Severity.ERROR).count();
        }
    }

    /**
     * Checks a study.
     *
     * @param folder of the study
     * @return what is wrong
     * @throws UseCaseException where the folder is none
     */
    public static Result of(Path folder) throws UseCaseException {
        StudyCheck check = new StudyCheck();
        List<FormatException> wrong = new ArrayList<>();
        Optional<Study> study = Study.read(folder, wrong);
        for (FormatException e : wrong) {
            check.unusable(e);
        }
        study.ifPresent(check::check);
        return new Result(
                study.map(s -> s.subjects().size()).orElse(0),
                study.map(s -> s.trials().size()).orElse(0),
                check.findings);
    }

    private void unusable(FormatException e) {
        String source = e.source();
        Path name = Path.of(source).getFileName();
        findings.add(Finding.error(
                "study.unusable", name == null ? source : name.toString(), e.getMessage() + ": " + e.whatToDo()));
    }

    private void check(Study study) {
        xml(study, study.settings().landmarks(), LandmarkMapFile::read);
        study.settings().columnMap().ifPresent(f -> xml(study, f, ResultsMapFile::read));
        Set<String> used = new HashSet<>();
        study.trials().forEach(t -> used.add(t.subject()));
        for (StudySubject s : study.subjects()) {
            subject(s, used.contains(s.id()));
        }
        if (study.trials().isEmpty()) {
            findings.add(Finding.error("study.empty", Study.TRIALS, "it has no trial: nothing would be done"));
        }
        Set<String> unknown = new HashSet<>();
        Map<String, StudySubject> subjects = study.subjectsById();
        for (StudyTrial t : study.trials()) {
            if (!subjects.containsKey(t.subject()) && unknown.add(t.subject())) {
                findings.add(Finding.error(
                        "study.subject-unknown",
                        place(t),
                        "subject '" + t.subject() + "' is not in " + Study.SUBJECTS));
            }
            trial(study, t);
        }
        for (FitUnit unit : FitUnit.all(study)) {
            if (!unit.appraised().isEmpty()) {
                unit.findings(place(unit.appraised().get(0))).forEach(findings::add);
            }
        }
    }

    /** Reads a file of settings. */
    @FunctionalInterface
    private interface Reader {
        Object read(Path file) throws IOException, FormatException;
    }

    private void xml(Study study, String name, Reader reader) {
        Optional<Path> file = study.named(name);
        if (file.isEmpty() || !Files.isRegularFile(file.get())) {
            findings.add(Finding.error(
                    "study.file-missing", Study.SETTINGS, "it names '" + name + "', which is no file in this folder"));
            return;
        }
        try {
            reader.read(file.get());
        } catch (FormatException e) {
            unusable(e);
        } catch (IOException e) {
            findings.add(Finding.error("study.unusable", name, "it cannot be read (" + e.getMessage() + ")"));
        }
    }

    private void subject(StudySubject s, boolean isUsed) {
        String where = Study.SUBJECTS + " line " + s.line();
        if (!isUsed) {
            findings.add(Finding.warning("study.subject-unused", where, "subject '" + s.id() + "' has no trial"));
        }
        if (s.mass().isEmpty()) {
            findings.add(Finding.warning(
                    "study.mass-missing",
                    where,
                    "subject '" + s.id() + "' has no mass: it is taken from the platforms"));
        }
        if (s.population() == Population.UNKNOWN) {
            findings.add(Finding.warning(
                    "study.population-missing",
                    where,
                    "subject '" + s.id() + "' has no population: regressions for adults are assumed"));
        }
    }

    private static String place(StudyTrial t) {
        return Study.TRIALS + " line " + t.line();
    }

    private void trial(Study study, StudyTrial t) {
        file(study, t);
        findings.addAll(conditions(t, place(t)));
    }

    private void file(Study study, StudyTrial t) {
        Optional<Path> file = study.named(t.file());
        if (file.isEmpty() || !Files.exists(file.get())) {
            findings.add(Finding.error("study.file-missing", place(t), "there is no file '" + t.file() + "'"));
            return;
        }
        if (!Files.isRegularFile(file.get()) || !Files.isReadable(file.get())) {
            findings.add(Finding.error(
                    "study.file-unreadable",
                    place(t),
                    "'" + t.file() + "' is "
                            + (Files.isDirectory(file.get()) ? "a folder" : "no file that may be read")));
            return;
        }
        boolean isTable = t.kind() == StudyTrial.Kind.RESULTS && !t.file().endsWith(".xml");
        if (isTable && study.settings().columnMap().isEmpty()) {
            findings.add(Finding.error(
                    "study.column-map-missing",
                    place(t),
                    "'" + t.file() + "' is a table of results, and " + Study.SETTINGS + " names no column map"));
        }
        try {
            if (t.kind() == StudyTrial.Kind.RESULTS) {
                if (!isTable) {
                    ResultsMapFile.read(file.get());
                }
            } else {
                C3dFile.readHeader(file.get());
            }
        } catch (FormatException e) {
            findings.add(Finding.error("study.file-unreadable", place(t), "'" + t.file() + "': " + e.getMessage()));
        } catch (IOException e) {
            findings.add(Finding.error(
                    "study.file-unreadable", place(t), "'" + t.file() + "' cannot be read (" + e.getMessage() + ")"));
        }
    }

    /** What the columns of a trial mean for its appraisal. */
    static List<Finding> conditions(StudyTrial t, String where) {
        List<Finding> findings = new ArrayList<>();
        if (t.isAided()) {
            findings.add(Finding.error(
                    "study.walking-aid",
                    where,
                    "walking aid '" + t.walkingAid()
                            + "': loads on the hands are not measured, which voids the work of the limbs"));
        }
        if (t.slope() != 0) {
            findings.add(
                    Finding.warning(
                            "study.slope",
                            where,
                            "the ground slopes: the compared postures are those of level ground, and lifting the body is work"));
        }
        if (t.condition() == StudyTrial.Condition.SHOD && t.soleThickness().isEmpty()) {
            findings.add(Finding.warning(
                    "study.sole-thickness",
                    where,
                    "shod without a sole thickness: lengths to the floor include an unknown sole"));
        }
        if (t.condition() == StudyTrial.Condition.PROSTHESIS) {
            findings.add(Finding.warning(
                    "study.prosthesis",
                    where,
                    "masses of the foot's parts come from regressions on living limbs, which a prosthesis is not"));
        }
        return findings;
    }
}
