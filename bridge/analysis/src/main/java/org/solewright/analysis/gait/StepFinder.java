package org.solewright.analysis.gait;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.gait.Side;
import org.solewright.domain.gait.Stance;
import org.solewright.domain.geometry.Vec3;

/**
 * The steps of a pass and their work windows: a stride between like contacts where all its loads are whole, else exactly
 * one step centred on the middle of the double support. Never from one zero of the fore-aft force to the next: that
 * window is up to 9 % longer or shorter than a step.
 */
public final class StepFinder {

    private final Pass pass;
    private final List<Finding> findings = new ArrayList<>();

    private StepFinder(Pass pass) {
        this.pass = pass;
    }

    /**
     * The steps of a pass in order.
     *
     * @param pass a pass with at least one platform
     * @param findings receives what has to be said
     * @return steps whose loads fill their work window
     */
    public static List<Step> steps(Pass pass, List<Finding> findings) {
        StepFinder finder = new StepFinder(pass);
        List<Step> steps = finder.find();
        findings.addAll(finder.findings);
        return steps;
    }

    private List<Step> find() {
        List<Step> steps = new ArrayList<>();
        List<PlatformStance> stances = pass.platformStances();
        if (stances.size() < 2) {
            findings.add(Finding.warning(
                    "gait.no-step",
                    pass.trial().name(),
                    "platforms saw " + stances.size() + " stances, so no step from one foot to the other can be"
                            + " computed; record two consecutive platform contacts"));
            return steps;
        }
        for (int i = 0; i + 1 < stances.size(); i++) {
            PlatformStance trailing = stances.get(i);
            PlatformStance leading = stances.get(i + 1);
            if (trailing.stance().side() != leading.stance().side() && areNeighbours(trailing, leading)) {
                step(steps.size() + 1, i).ifPresent(steps::add);
            }
        }
        return steps;
    }

    private boolean areNeighbours(PlatformStance trailing, PlatformStance leading) {
        double flight = leading.stance().start() - trailing.stance().end();
        return trailing.isEndSeen()
                && leading.isStartSeen()
                && flight < trailing.stance().duration() / 2
                && pass.footfalls().stream()
                        .noneMatch(f -> f.isStartSeen()
                                && f.start() > trailing.stance().start() + 0.1
                                && f.start() < leading.stance().start() - 0.1);
    }

    private Optional<Step> step(int number, int i) {
        Stance trailing = pass.platformStances().get(i).stance();
        Stance leading = pass.platformStances().get(i + 1).stance();
        String where = pass.trial().name() + " step " + number;
        double time = leading.start() - trailing.start();
        double middle = (leading.start() + trailing.end()) / 2;
        double knownFrom = knownFrom(middle);
        double knownTo = knownTo(middle);
        if (trailing.end() < leading.start()) {
            findings.add(Finding.warning(
                    "gait.flight",
                    where,
                    String.format(
                            Locale.ROOT,
                            "no double support: the feet are both off the ground for %.3f s",
                            leading.start() - trailing.end())));
        }
        Optional<double[]> stride = strideWindow(i, knownFrom, knownTo);
        double from = stride.map(w -> w[0]).orElse(middle - time / 2);
        double to = stride.map(w -> w[1]).orElse(middle + time / 2);
        if (from < knownFrom || to > knownTo) {
            findings.add(Finding.warning(
                    "gait.window-not-measured",
                    where,
                    String.format(
                            Locale.ROOT,
                            "the work window from %.3f to %.3f s reaches beyond the interval %.3f to %.3f s in which"
                                    + " platforms measured every load; the step is not computed",
                            from,
                            to,
                            knownFrom,
                            knownTo)));
            return Optional.empty();
        }
        Optional<Vec3> velocity = pass.pelvisVelocity(from, to);
        if (velocity.isEmpty()) {
            findings.add(Finding.warning(
                    "gait.pelvis-lost",
                    where,
                    "the pelvis is not tracked at the ends of the work window; the step is not computed"));
            return Optional.empty();
        }
        Vec3 v = velocity.get();
        StepLoads loads = new StepLoads(
                trailing,
                leading,
                pass.limbForce(trailing),
                pass.limbForce(leading),
                pass.totalForce(),
                from,
                to,
                stride.isPresent(),
                knownFrom,
                knownTo,
                v.x(),
                stride.isPresent() ? 0 : v.z(),
                0,
                0,
                pass.settings().shortestPhase(),
                pass.settings().gravity());
        double[] heels = heels(trailing, leading);
        return Optional.of(new Step(number, loads, heels[0], heels[1], time, neighbourSpeeds(trailing, leading)));
    }

    /**
     * Speeds from contact to contact of this step and its neighbours. All contacts from kinematics: mixed with those from
     * platforms their different delays would look like changes of speed. Where kinematics saw too few, from platforms.
     */
    private List<Double> neighbourSpeeds(Stance trailing, Stance leading) {
        List<Double> contacts = pass.footfalls().stream()
                .filter(Footfall::isStartSeen)
                .map(Footfall::start)
                .filter(t -> Math.abs(t - trailing.start()) < 2 * trailing.duration())
                .toList();
        if (contacts.size() < 3) {
            contacts = pass.stances().stream().map(Stance::start).toList();
        }
        List<Double> speeds = new ArrayList<>();
        for (int i = 0; i + 1 < contacts.size(); i++) {
            boolean isNear = contacts.get(i + 1) > trailing.start() - 0.5 * trailing.duration()
                    && contacts.get(i) < leading.start() + 0.5 * trailing.duration();
            if (isNear) {
                pass.pelvisVelocity(contacts.get(i), contacts.get(i + 1)).ifPresent(v -> speeds.add(v.x()));
            }
        }
        return speeds;
    }

    /** Forward and sideways distance of the heels at their contacts. */
    private double[] heels(Stance trailing, Stance leading) {
        Vec3 a = heel(trailing);
        Vec3 b = heel(leading);
        double width = (b.z() - a.z()) * (leading.side() == Side.RIGHT ? 1 : -1);
        double carried = pass.trial().beltSpeed() * (leading.start() - trailing.start());
        return new double[] {b.x() - a.x() + carried, width};
    }

    private Vec3 heel(Stance stance) {
        WalkingTrial trial = pass.trial();
        double s = (stance.start() - trial.startTime()) * trial.rate();
        int frame = (int) Math.max(0, Math.min(trial.frames() - 2, Math.floor(s)));
        FootTracks foot = trial.foot(stance.side());
        Vec3 p = foot.heel(frame)
                .times(1 - (s - frame))
                .plus(foot.heel(frame + 1).times(s - frame));
        return pass.R_LW().inverseVector(p);
    }

    /** A stride that begins with the trailing contact and has every load whole; empty where there is none. */
    private Optional<double[]> strideWindow(int i, double knownFrom, double knownTo) {
        List<PlatformStance> stances = pass.platformStances();
        if (i < 1 || i + 2 >= stances.size()) {
            return Optional.empty();
        }
        Stance next = stances.get(i + 2).stance();
        boolean alternate = next.side() == stances.get(i).stance().side()
                && stances.get(i - 1).stance().side()
                        == stances.get(i + 1).stance().side();
        boolean whole = true;
        for (int k = i - 1; k <= i + 1; k++) {
            whole &= stances.get(k).stance().whole();
        }
        double from = stances.get(i).stance().start();
        double to = next.start();
        return alternate && whole && stances.get(i + 2).isStartSeen() && from >= knownFrom && to <= knownTo
                ? Optional.of(new double[] {from, to})
                : Optional.empty();
    }

    private double knownFrom(double time) {
        double known = Math.max(pass.totalForce().up().start(), pass.trial().time(0));
        for (Footfall f : pass.unmeasured()) {
            if (f.start() < time && f.end() < time) {
                known = Math.max(known, f.end());
            }
        }
        return known;
    }

    private double knownTo(double time) {
        double known = Math.min(
                pass.totalForce().up().end(), pass.trial().time(pass.trial().frames() - 1));
        for (Footfall f : pass.unmeasured()) {
            if (f.end() > time && f.start() > time) {
                known = Math.min(known, f.start());
            }
        }
        return known;
    }
}
