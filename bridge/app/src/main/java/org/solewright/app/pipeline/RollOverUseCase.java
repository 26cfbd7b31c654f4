package org.solewright.app.pipeline;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.solewright.analysis.gait.GaitSettings;
import org.solewright.analysis.gait.LandmarkTracks;
import org.solewright.domain.finding.Cautions;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.Severity;
import org.solewright.domain.finding.SourceFile;
import org.solewright.domain.foot.FootModel;
import org.solewright.domain.foot.LandmarkMap;
import org.solewright.domain.foot.Population;
import org.solewright.domain.foot.RollOverSheet;
import org.solewright.domain.gait.ContactRow;
import org.solewright.domain.gait.CurveRow;
import org.solewright.domain.gait.Side;
import org.solewright.domain.motion.Recording;
import org.solewright.formats.footmodel.FootModelFile;
import org.solewright.formats.io.FormatException;

/** Checks how the feet of models rolled over the ground in walking recordings. */
public final class RollOverUseCase {

    private static final List<RollOverSheet.Comparison> PUBLISHED = List.of(
            new RollOverSheet.Comparison(
                    "people without walking disability, shank frame (ankle-foot): arc radius about 0.22 of stature",
                    "Hansen & Meier 2010"),
            new RollOverSheet.Comparison(
                    "people without walking disability, limb frame (knee-ankle-foot): arc radius about 0.17 of stature",
                    "Hansen & Meier 2010"),
            new RollOverSheet.Comparison(
                    "the centre of pressure of people walking rolls as under a wheel of about 0.3 of limb length",
                    "Adamczyk, Collins & Kuo 2006"),
            new RollOverSheet.Comparison(
                    "people walking on arc-shaped feet: the length of the arc matters more than its radius; metabolic cost was"
                            + " least at a length of about 0.29 of limb length",
                    "Adamczyk & Kuo 2013"));

    /**
     * What the user asked for.
     *
     * @param gait walking recordings and options; no standing recording
     * @param models foot models, one per side
     * @param sides sides to be checked; empty: those of the models
     * @param version version of the tool
     */
    public record Request(GaitOptions gait, List<Path> models, Optional<Side> sides, String version) {

        /** Copies the list. */
        public Request {
            models = List.copyOf(models);
        }
    }

    /**
     * What came of it.
     *
     * @param sheet the check sheet
     * @param curves curves over stance and events
     * @param failed names of inputs that failed
     */
    record Result(RollOverSheet sheet, List<CurveRow> curves, List<String> failed) {}

    private final Request request;
    private final List<Finding> findings = new ArrayList<>();
    private final List<SourceFile> sources = new ArrayList<>();

    private RollOverUseCase(Request request) {
        this.request = request;
    }

    /**
     * Runs the check without writing anything.
     *
     * @param request what is asked
     * @return sheet and curves
     * @throws UseCaseException where an input lacks what is needed
     * @throws FormatException where a file is not as its format says
     */
    static Result run(Request request) throws UseCaseException, FormatException {
        return new RollOverUseCase(request).run();
    }

    private Result run() throws UseCaseException, FormatException {
        GaitOptions options = request.gait();
        Map<Side, ModelStanding> models = models();
        LandmarkMap map = InputFiles.landmarkMap(options.landmarks(), sources);
        List<Recording> walking = InputFiles.walking(options.walking(), options.isFlagIgnored(), sources, findings)
                .recordings();
        if (walking.stream().allMatch(r -> r.platforms().isEmpty())) {
            throw new UseCaseException(
                    UseCaseException.Kind.INPUT,
                    walking.get(0).name(),
                    "the walking recording holds no force platform",
                    "give a recording over platforms");
        }
        List<ContactRow> contacts = options.contacts().isPresent()
                ? InputFiles.contacts(options.contacts().get(), sources)
                : List.of();
        double limbLength = models.values().stream()
                .mapToDouble(m -> m.model().subject().limbLength().value())
                .average()
                .orElseThrow();
        GaitSubject subject =
                GaitSubject.of(withMass(models), map, contacts, walking, Optional.empty(), Optional.of(limbLength));
        findings.addAll(subject.findings());
        List<RollOverSheet.Foot> feet = new ArrayList<>();
        List<CurveRow> curves = new ArrayList<>();
        for (ModelStanding model : models.values()) {
            check(model, subject, feet, curves);
        }
        if (feet.isEmpty()) {
            ModelStanding first = models.values().iterator().next();
            throw new UseCaseException(
                    UseCaseException.Kind.INPUT,
                    walking.get(0).name(),
                    "no " + first.model().side().word() + " foot stood on a platform in the recordings of this call",
                    "give the model of the other side, or recordings with that foot's contacts");
        }
        List<Finding> distinct = List.copyOf(new LinkedHashSet<>(findings));
        return new Result(
                sheet(models, feet, distinct),
                curves,
                distinct.stream()
                        .filter(f -> f.severity() == Severity.ERROR)
                        .map(Finding::where)
                        .distinct()
                        .toList());
    }

    private RollOverSheet sheet(
            Map<Side, ModelStanding> models, List<RollOverSheet.Foot> feet, List<Finding> distinct) {
        FootModel first = models.values().iterator().next().model();
        boolean isHuman = first.subject().population() != Population.OTHER;
        return new RollOverSheet(
                request.version(),
                first.subject().id(),
                isHuman,
                sources,
                settings(),
                feet,
                isHuman ? PUBLISHED : List.of(),
                distinct,
                Cautions.LINES);
    }

    private void check(ModelStanding model, GaitSubject subject, List<RollOverSheet.Foot> feet, List<CurveRow> curves)
            throws UseCaseException {
        Side side = model.model().side();
        boolean stood =
                subject.passes().stream().anyMatch(p -> p.stances().stream().anyMatch(s -> s.side() == side));
        if (!stood) {
            findings.add(Finding.warning(
                    "rollover.no-stance",
                    side.word(),
                    "no " + side.word() + " foot stood on a platform in the recordings of this call"));
            return;
        }
        List<LandmarkTracks> walking = subject.walking();
        FootOnGround ground = FootOnGround.of(model, walking)
                .orElseThrow(() -> new UseCaseException(
                        UseCaseException.Kind.INPUT,
                        "the model of the " + side.word() + " side",
                        "holds no heel or no forefoot landmark that the recordings track as well",
                        "fit the model with the landmark map of the recordings"));
        FootCheck check = FootCheck.of(model, ground, subject, request.gait());
        RollOverCurves over = RollOverCurves.of(check);
        CheckedFoot foot = new CheckedFoot(check, over);
        feet.add(foot.foot());
        check.findings().forEach(findings::add);
        check.rollOver().findings().forEach(findings::add);
        findings.addAll(foot.findings());
        curves.addAll(over.rows());
    }

    /** The mass decides the load from which on the centre of pressure is used: as given, else the model's. */
    private GaitOptions withMass(Map<Side, ModelStanding> models) {
        GaitOptions options = request.gait();
        double mass = models.values().iterator().next().model().subject().mass().value();
        return options.of(options.walking(), Optional.empty(), OptionalDouble.of(mass));
    }

    private Map<Side, ModelStanding> models() throws UseCaseException, FormatException {
        Map<Side, ModelStanding> models = new EnumMap<>(Side.class);
        for (Path file : request.models()) {
            FootModel model = InputFiles.read(file, FootModelFile::read);
            sources.add(InputFiles.source("model", file));
            ModelStanding standing = ModelStanding.of(model)
                    .orElseThrow(() -> new UseCaseException(
                            UseCaseException.Kind.INPUT,
                            file.toString(),
                            "the model has no joint between shank and foot",
                            "give a model that fit wrote"));
            if (model.landmarks().isEmpty()) {
                throw new UseCaseException(
                        UseCaseException.Kind.INPUT,
                        file.toString(),
                        "the model holds no landmarks, so that it cannot be found in a recording",
                        "give a model that fit wrote");
            }
            if (models.put(model.side(), standing) != null) {
                throw new UseCaseException(
                        UseCaseException.Kind.USAGE,
                        file.toString(),
                        "is the second model of the " + model.side().word() + " side",
                        "give one model per side");
            }
        }
        if (request.sides().isPresent()) {
            Side side = request.sides().get();
            if (!models.containsKey(side)) {
                throw new UseCaseException(
                        UseCaseException.Kind.USAGE,
                        "--side",
                        "asks for the " + side.word() + " foot, of which no model is given",
                        "give its model by --model");
            }
            models.keySet().retainAll(List.of(side));
        }
        return models;
    }

    private List<RollOverSheet.Setting> settings() {
        GaitOptions o = request.gait();
        List<RollOverSheet.Setting> settings = new ArrayList<>();
        setting(settings, "gravity_m_s2", Double.toString(GaitSettings.STANDARD_GRAVITY), false);
        setting(
                settings,
                "marker_low_pass_Hz",
                o.isCutoffFound() ? "by residual analysis" : Double.toString(o.markerCutoff()),
                o.isCutoffFound() || o.markerCutoff() != GaitOptions.DEFAULT_MARKER_CUTOFF);
        setting(settings, "zero_of_joint_angles", o.isZeroFlat() ? "flat" : "standing", o.isZeroFlat());
        setting(settings, "load_low_pass_Hz", "none", false);
        setting(settings, "contact_threshold_N", "min(20, 0.03 m g), at least 5 noise SD", false);
        setting(settings, "cop_threshold_N", "max(50, 0.05 m g); 0.05 m g for an animal", false);
        setting(settings, "heel_rise_m", FootCheck.RISE + " times limb length over 0.9", false);
        setting(
                settings,
                "floor_m",
                o.floor().isPresent()
                        ? Double.toString(o.floor().getAsDouble())
                        : "mean of the foot's landmarks at foot flat, less their standing heights",
                o.floor().isPresent());
        setting(settings, "belt_speed_m_s", Double.toString(o.beltSpeed()), o.beltSpeed() > 0);
        setting(settings, "events", o.events(), !o.events().equals("platform"));
        setting(settings, "mirrored", Boolean.toString(o.isMirrored()), o.isMirrored());
        o.mass().ifPresent(m -> setting(settings, "mass_kg", Double.toString(m), true));
        return settings;
    }

    private static void setting(List<RollOverSheet.Setting> settings, String name, String value, boolean isGiven) {
        settings.add(new RollOverSheet.Setting(name, value, isGiven ? "given" : "default"));
    }
}
