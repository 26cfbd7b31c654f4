package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import org.solewright.analysis.gait.ContactReview;
import org.solewright.analysis.gait.FootTracks;
import org.solewright.analysis.gait.GaitSettings;
import org.solewright.analysis.gait.LandmarkTracks;
import org.solewright.analysis.gait.MarkerSwaps;
import org.solewright.analysis.gait.Mirror;
import org.solewright.analysis.gait.Pass;
import org.solewright.analysis.gait.PassChecks;
import org.solewright.analysis.gait.Step;
import org.solewright.analysis.gait.StepFinder;
import org.solewright.analysis.gait.SubjectMass;
import org.solewright.analysis.gait.WalkingTrial;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.Quantity;
import org.solewright.domain.foot.LandmarkMap;
import org.solewright.domain.gait.ContactRow;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Vec3;
import org.solewright.domain.motion.Recording;

/**
 * One subject's walking, analysed: what fit and appraise share. Recordings in, passes, steps and mass out.
 */
final class GaitSubject {

    private static final double SHORTEST_WALK = 0.3;
    private static final double LARGEST_TILT = Math.toRadians(20);

    private final GaitOptions options;
    private final LandmarkMap map;
    private final List<ContactRow> contacts;
    private final List<Finding> findings = new ArrayList<>();
    private final List<LandmarkTracks> walking = new ArrayList<>();
    private final List<String> cutoffs = new ArrayList<>();
    private List<Pass> passes = List.of();
    private List<List<Step>> steps = List.of();
    private Optional<Quantity> mass = Optional.empty();

    private GaitSubject(GaitOptions options, LandmarkMap map, List<ContactRow> contacts) {
        this.options = options;
        this.map = map;
        this.contacts = contacts;
    }

    /**
     * Analyses the walking recordings.
     *
     * @param options what the user gave
     * @param map landmark map
     * @param contacts the user's verdicts on contacts, may be empty
     * @param recordings walking recordings in the user's order
     * @param up against gravity from the standing trial, where there is one
     * @param limbLength hip to floor, m; empty where not known
     * @return the analysed subject
     * @throws UseCaseException where a recording lacks what is needed
     */
    static GaitSubject of(
            GaitOptions options,
            LandmarkMap map,
            List<ContactRow> contacts,
            List<Recording> recordings,
            Optional<Vec3> up,
            Optional<Double> limbLength)
            throws UseCaseException {
        GaitSubject subject = new GaitSubject(options, map, contacts);
        List<WalkingTrial> trials = new ArrayList<>();
        UseCaseException first = null;
        for (Recording r : recordings) {
            try {
                trials.add(subject.tracked(r, up));
            } catch (UseCaseException e) {
                first = first == null ? e : first;
                subject.findings.add(InputFiles.failed(r.name(), e.getMessage(), e.whatToDo()));
            }
        }
        if (trials.isEmpty() && first != null) {
            throw first;
        }
        subject.analyse(trials, limbLength);
        return subject;
    }

    private WalkingTrial tracked(Recording recording, Optional<Vec3> standingUp) throws UseCaseException {
        Recording seen = options.isMirrored() ? Mirror.of(recording, up(recording, standingUp)) : recording;
        OneSubject.require(map, recording);
        findings.addAll(MarkerSwaps.of(seen, map));
        double cutoff = options.isCutoffFound()
                ? MarkerCutoff.of(seen, map, options.markerCutoff(), findings)
                : options.markerCutoff();
        LandmarkTracks tracks = LandmarkTracks.of(seen, map, cutoff, findings);
        WalkingTrial trial = trial(tracks, standingUp);
        findings.addAll(LandmarkCoverage.repeatedLabels(recording));
        walking.add(tracks);
        double used = Math.min(cutoff, LandmarkTracks.highestCutoff(recording.rate()));
        cutoffs.add(trialName(recording) + (used > 0 ? String.format(Locale.ROOT, " %.1f Hz", used) : " none"));
        return trial;
    }

    private void analyse(List<WalkingTrial> trials, Optional<Double> limbLength) throws UseCaseException {
        GaitSettings first = limbLength
                .map(l -> new GaitSettings(GaitSettings.STANDARD_GRAVITY, l, weight(options.mass())))
                .orElseGet(() -> new GaitSettings(
                        GaitSettings.STANDARD_GRAVITY,
                        GaitSettings.unknownSubject().limbLength(),
                        weight(options.mass())));
        run(trials, first, new ArrayList<>());
        dropFailed(trials);
        mass = SubjectMass.of(steps).map(SubjectMass::mass);
        double found = options.mass().orElse(mass.map(Quantity::value).orElse(Double.NaN));
        GaitSettings second =
                new GaitSettings(first.gravity(), first.limbLength(), found * GaitSettings.STANDARD_GRAVITY);
        run(trials, second, findings);
        dropFailed(trials);
        findings.addAll(PassChecks.platformHeights(passes));
        checkMass();
    }

    /** Leaves out recordings that say nothing or the opposite; where none is left, the first one's reason is thrown. */
    private void dropFailed(List<WalkingTrial> trials) throws UseCaseException {
        List<Finding> failures = new ArrayList<>();
        for (int i = passes.size() - 1; i >= 0; i--) {
            Optional<Finding> failure = failure(passes.get(i));
            if (failure.isPresent()) {
                failures.add(0, failure.get());
                trials.remove(i);
                walking.remove(i);
                passes.remove(i);
                steps.remove(i);
            }
        }
        if (passes.isEmpty() && !failures.isEmpty()) {
            Finding first = failures.get(0);
            throw new UseCaseException(
                    UseCaseException.Kind.INPUT, first.where(), first.message(), whatToDo(first.code()));
        }
        findings.addAll(failures);
    }

    private static Optional<Finding> failure(Pass pass) {
        if (Mirror.isMirrored(pass).orElse(false)) {
            return Optional.of(Finding.error(
                    "frame.mirrored",
                    pass.trial().name(),
                    "the landmarks called right lie on the walker's left: the laboratory frame is left-handed or the"
                            + " sides are swapped"));
        }
        return pass.stances().isEmpty()
                ? Optional.of(Finding.error(
                        "loads.no-contact", pass.trial().name(), "no tracked foot stood on a force platform"))
                : Optional.empty();
    }

    private static String whatToDo(String code) {
        return code.equals("frame.mirrored")
                ? "check the landmark map, or give --mirrored"
                : "give a recording that hits the platforms";
    }

    private static double weight(java.util.OptionalDouble mass) {
        return mass.orElse(Double.NaN) * GaitSettings.STANDARD_GRAVITY;
    }

    private void run(List<WalkingTrial> trials, GaitSettings settings, List<Finding> into) throws UseCaseException {
        List<Pass> found = new ArrayList<>();
        for (WalkingTrial trial : trials) {
            found.add(Pass.of(trial, settings));
        }
        passes = new ArrayList<>(ContactReview.of(found));
        EventTimes.Source events = EventTimes.Source.ofWord(options.events()).orElseThrow();
        for (int i = 0; i < passes.size(); i++) {
            passes.set(i, EventTimes.apply(events, passes.get(i), walking.get(i).recording()));
        }
        if (!contacts.isEmpty()) {
            passes = new ArrayList<>(ContactOverrides.apply(contacts, passes, into));
        }
        List<List<Step>> all = new ArrayList<>();
        for (Pass pass : passes) {
            List<Step> of = pass.trial().platforms().isEmpty() ? List.of() : StepFinder.steps(pass, into);
            into.addAll(PassChecks.bias(pass, of));
            all.add(of);
            into.addAll(pass.findings());
        }
        steps = all;
        mass = SubjectMass.of(steps).map(SubjectMass::mass);
    }

    private void checkMass() {
        Optional<SubjectMass> measured = SubjectMass.of(steps);
        if (options.mass().isPresent()) {
            double given = options.mass().getAsDouble();
            measured.ifPresent(m -> {
                if (Math.abs(m.mass().value() / given - 1) > 0.03) {
                    findings.add(Finding.warning(
                            "mass.differs",
                            "subject",
                            String.format(
                                    Locale.ROOT,
                                    "mass given %.1f kg, platforms measured %.1f kg: check both",
                                    given,
                                    m.mass().value())));
                }
            });
            mass = Optional.of(Quantity.of(given, Basis.MEASURED));
            return;
        }
        measured.ifPresent(m -> {
            findings.add(Finding.warning(
                    "mass.not-given",
                    "subject",
                    String.format(
                            Locale.ROOT,
                            "no mass was given; %.1f kg is taken from the mean vertical load of %d work window%s",
                            m.mass().value(),
                            m.windows(),
                            m.windows() == 1 ? "" : "s")));
            if (!m.isWhole()) {
                findings.add(Finding.warning(
                        "mass.over-edge",
                        "subject",
                        "no work window has two whole contacts; the mass comes from stances that were not wholly on"
                                + " their platforms: give --mass"));
            }
        });
    }

    private WalkingTrial trial(LandmarkTracks tracks, Optional<Vec3> standingUp) throws UseCaseException {
        Map<Side, FootTracks> feet = new EnumMap<>(Side.class);
        for (Side side : Side.values()) {
            if (map.entries().stream().anyMatch(e -> e.side().map(side::equals).orElse(false))) {
                LandmarkCoverage.requireWalking(map, tracks, side);
                tracks.foot(side).ifPresent(f -> feet.put(side, f));
            }
        }
        Recording r = tracks.recording();
        double[] pelvis = tracks.pelvis()
                .orElseThrow(() -> new UseCaseException(
                        UseCaseException.Kind.INPUT,
                        r.name(),
                        "the walking recording lacks every pelvic landmark (asis, psis, sacrum, trochanter_major)",
                        "map at least one: the walking direction and speed come from the pelvis"));
        if (options.beltSpeed() == 0) {
            checkTravel(r, pelvis);
        }
        return new WalkingTrial(
                trialName(r),
                r.rate(),
                r.time(0),
                up(r, standingUp),
                new WalkingTrial.Track(pelvis),
                feet,
                r.platforms(),
                options.beltSpeed());
    }

    /** A walk needs a pelvis that is seen and goes somewhere. */
    private static void checkTravel(Recording recording, double[] pelvis) throws UseCaseException {
        int tracked = 0;
        Vec3 first = Vec3.ZERO;
        double farthest = 0;
        for (int i = 0; i < pelvis.length; i += 3) {
            if (!Double.isNaN(pelvis[i])) {
                Vec3 at = new Vec3(pelvis[i], pelvis[i + 1], pelvis[i + 2]);
                first = tracked == 0 ? at : first;
                farthest = Math.max(farthest, at.distance(first));
                tracked++;
            }
        }
        if (tracked < 2) {
            throw new UseCaseException(
                    UseCaseException.Kind.INPUT,
                    recording.name(),
                    "the pelvic landmarks are seen together in " + tracked + " of " + recording.frames() + " frames",
                    "map landmarks that are seen while walking");
        }
        if (farthest < SHORTEST_WALK) {
            throw new UseCaseException(
                    UseCaseException.Kind.INPUT,
                    recording.name(),
                    String.format(Locale.ROOT, "the pelvis travels %.2f m in it: nobody walks", farthest),
                    "give a walking recording over ground");
        }
    }

    /** Up from the platforms' normals, else from the standing trial; they must agree within 20 degrees. */
    private Vec3 up(Recording recording, Optional<Vec3> standing) throws UseCaseException {
        Vec3 sum = Vec3.ZERO;
        for (PlatformLoads p : recording.platforms()) {
            sum = sum.plus(p.up());
        }
        if (sum.norm() > 0.5) {
            Vec3 up = sum.unit();
            if (standing.isPresent() && !(Math.acos(Math.min(1, up.dot(standing.get()))) < LARGEST_TILT)) {
                findings.add(Finding.warning(
                        "frame.up-differs",
                        recording.name(),
                        String.format(
                                Locale.ROOT,
                                "the platforms' normals and the standing trial disagree about up by %.0f deg; the"
                                        + " platforms' is used",
                                Math.toDegrees(Math.acos(Math.min(1, up.dot(standing.get())))))));
            }
            return up;
        }
        return standing.orElseThrow(() -> new UseCaseException(
                UseCaseException.Kind.INPUT,
                recording.name(),
                "neither a force platform nor a standing recording says where up is",
                "record platforms or give --standing"));
    }

    /** The name of a trial in tables: that of its file without the ending. */
    static String trialName(Recording recording) {
        String name = recording.name();
        int dot = name.lastIndexOf('.');
        return dot > 0 ? name.substring(0, dot) : name;
    }

    List<Finding> findings() {
        return findings;
    }

    List<Pass> passes() {
        return passes;
    }

    /** Tracks by pass, in the passes' order. */
    List<LandmarkTracks> walking() {
        return walking;
    }

    /** Low-pass of the markers of each recording that could be read, for the settings of a model. */
    List<String> cutoffs() {
        return cutoffs;
    }

    /** Steps by pass, in the passes' order. */
    List<List<Step>> steps() {
        return steps;
    }

    /** Given, else measured; empty where neither. */
    Optional<Quantity> mass() {
        return mass;
    }
}
