package org.solewright.analysis.gait;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.solewright.analysis.numerics.Series;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.gait.Side;
import org.solewright.domain.gait.Stance;
import org.solewright.domain.geometry.Rotation;
import org.solewright.domain.geometry.Vec3;

/**
 * One pass of walking, understood: its walking frame, the stances that platforms saw, the footfalls that kinematics saw,
 * and the loads in the walking frame.
 */
public final class Pass {

    private final WalkingTrial trial;
    private final Rotation R_LW;
    private final GaitSettings settings;
    private final WalkingTrial.Track pelvis_W;
    private final List<PlatformStance> stances;
    private final List<Footfall> footfalls;
    private final List<Finding> findings;

    private Pass(
            WalkingTrial trial,
            Rotation R_LW,
            GaitSettings settings,
            WalkingTrial.Track pelvis_W,
            List<PlatformStance> stances,
            List<Footfall> footfalls,
            List<Finding> findings) {
        this.trial = trial;
        this.R_LW = R_LW;
        this.settings = settings;
        this.pelvis_W = pelvis_W;
        this.stances = List.copyOf(stances);
        this.footfalls = List.copyOf(footfalls);
        this.findings = List.copyOf(findings);
    }

    /**
     * Analyses one recording.
     *
     * @param trial tracks and loads in the laboratory frame
     * @param settings thresholds
     * @return the pass
     */
    public static Pass of(WalkingTrial trial, GaitSettings settings) {
        Rotation R_LW = WalkingFrame.of(trial, settings.shortestStride());
        List<Finding> findings = new ArrayList<>();
        List<Footfall> footfalls = WalkingFrame.footfalls(trial, R_LW, settings.shortestStride());
        List<PlatformStance> stances = new ArrayList<>();
        StanceFinder finder = new StanceFinder(trial, R_LW, settings, findings);
        for (PlatformLoads platform : trial.platforms()) {
            stances.addAll(finder.stances(platform));
        }
        stances.sort(Comparator.comparingDouble(s -> s.stance().start()));
        double[] pelvis = FootTracks.turned(trial.pelvis().samples(), R_LW);
        for (int i = 0; trial.isOnTreadmill() && i < pelvis.length; i += 3) {
            pelvis[i] += trial.carried(trial.time(i / 3));
        }
        WalkingTrial.Track pelvis_W = new WalkingTrial.Track(pelvis);
        return new Pass(trial, R_LW, settings, pelvis_W, StanceFinder.joined(stances, findings), footfalls, findings);
    }

    /**
     * The same pass with other verdicts on its stances.
     *
     * @param reviewed stances in the same order and number
     * @param more findings to be added
     * @return the pass
     */
    Pass with(List<PlatformStance> reviewed, List<Finding> more) {
        List<Finding> all = new ArrayList<>(findings);
        all.addAll(more);
        return new Pass(trial, R_LW, settings, pelvis_W, reviewed, footfalls, all);
    }

    /**
     * The same pass with the user's verdicts on its stances.
     *
     * @param judged stances in the same order and number as {@link #stances()}
     * @param more findings to be added
     * @return the pass
     * @throws IllegalArgumentException where the number differs
     */
    public Pass judged(List<Stance> judged, List<Finding> more) {
        if (judged.size() != stances.size()) {
            throw new IllegalArgumentException(
                    judged.size() + " verdicts for " + stances.size() + " stances, expected as many");
        }
        List<PlatformStance> changed = new ArrayList<>();
        for (int i = 0; i < judged.size(); i++) {
            changed.add(stances.get(i).with(judged.get(i)));
        }
        return with(changed, more);
    }

    /**
     * The recording.
     *
     * @return as given
     */
    public WalkingTrial trial() {
        return trial;
    }

    /**
     * Walking frame in the laboratory frame.
     *
     * @return R_LW: x forward, y up, z right
     */
    public Rotation R_LW() {
        return R_LW;
    }

    /**
     * What platforms saw.
     *
     * @return stances in order of contact
     */
    public List<Stance> stances() {
        return stances.stream().map(PlatformStance::stance).toList();
    }

    List<PlatformStance> platformStances() {
        return stances;
    }

    /**
     * What has to be said.
     *
     * @return findings
     */
    public List<Finding> findings() {
        return findings;
    }

    /**
     * Position of the pelvis in the walking frame, on a treadmill as the belt sees it.
     *
     * @param time s
     * @return m; empty where it is not tracked
     */
    public Optional<Vec3> pelvis(double time) {
        double s = (time - trial.startTime()) * trial.rate();
        int i = (int) Math.floor(s);
        if (!(s >= 0) || i + 1 >= trial.frames() || !pelvis_W.isTracked(i) || !pelvis_W.isTracked(i + 1)) {
            return Optional.empty();
        }
        double f = s - i;
        return Optional.of(pelvis_W.at(i).times(1 - f).plus(pelvis_W.at(i + 1).times(f)));
    }

    /**
     * Mean velocity of the pelvis in the walking frame.
     *
     * @param from s
     * @param to s, after from
     * @return m/s; empty where the pelvis is not tracked at either end
     */
    public Optional<Vec3> pelvisVelocity(double from, double to) {
        Optional<Vec3> a = pelvis(from);
        Optional<Vec3> b = pelvis(to);
        return a.isPresent() && b.isPresent()
                ? Optional.of(b.get().minus(a.get()).times(1 / (to - from)))
                : Optional.empty();
    }

    /**
     * The load of a stance on one platform at a time, interpolated between samples.
     *
     * @param stance a stance of this pass
     * @param time s
     * @return the load; empty where the stance spans platforms or the time lies outside the samples
     */
    public Optional<StanceLoad> load(Stance stance, double time) {
        if (stance.platforms().size() != 1) {
            return Optional.empty();
        }
        for (PlatformLoads p : trial.platforms()) {
            double s = (time - p.time(0)) * p.rate();
            double nearest = Math.rint(s);
            s = Math.abs(s - nearest) < 1e-6 ? nearest : s;
            int i = (int) Math.floor(s);
            if (p.number() != stance.platforms().get(0) || i < 0 || i >= p.samples()) {
                continue;
            }
            double f = s - i;
            if (f == 0) {
                return Optional.of(new StanceLoad(p.vertical(i), p.centreOfPressure(i)));
            }
            if (i + 1 < p.samples()) {
                return Optional.of(new StanceLoad(
                        p.vertical(i) * (1 - f) + p.vertical(i + 1) * f,
                        p.centreOfPressure(i)
                                .times(1 - f)
                                .plus(p.centreOfPressure(i + 1).times(f))));
            }
        }
        return Optional.empty();
    }

    /**
     * Load under one foot.
     *
     * @param vertical force against gravity, N
     * @param centreOfPressure laboratory frame, m; NaN where unknown
     */
    public record StanceLoad(double vertical, Vec3 centreOfPressure) {}

    /**
     * Contact of the other foot that ends a stance's single support, from platforms, else from kinematics.
     *
     * @param stance a stance of this pass
     * @return s; empty where neither saw it
     */
    public Optional<Double> oppositeContact(Stance stance) {
        Side other = stance.side().opposite();
        double middle = stance.start() + 0.25 * stance.duration();
        for (PlatformStance s : stances) {
            if (s.stance().side() == other
                    && s.stance().start() > middle
                    && s.stance().start() < stance.end() + 0.1) {
                return Optional.of(s.stance().start());
            }
        }
        for (Footfall f : footfalls) {
            if (f.side() == other && f.isStartSeen() && f.start() > middle && f.start() < stance.end() + 0.1) {
                return Optional.of(f.start());
            }
        }
        return Optional.empty();
    }

    /**
     * Contact of a stance's foot as kinematics shows it [Zeni et al. 2008].
     *
     * @param stance a stance of this pass
     * @return s; empty where it is not in view
     */
    public OptionalDouble kinematicContact(Stance stance) {
        return footfall(stance)
                .filter(Footfall::isStartSeen)
                .map(f -> OptionalDouble.of(f.start()))
                .orElse(OptionalDouble.empty());
    }

    /**
     * Foot-off of a stance as kinematics shows it [Zeni et al. 2008].
     *
     * @param stance a stance of this pass
     * @return s; empty where it is not in view
     */
    public OptionalDouble kinematicOff(Stance stance) {
        return footfall(stance)
                .filter(Footfall::isEndSeen)
                .map(f -> OptionalDouble.of(f.end()))
                .orElse(OptionalDouble.empty());
    }

    private Optional<Footfall> footfall(Stance stance) {
        return footfalls.stream()
                .filter(f -> f.side() == stance.side() && f.overlaps(stance.start(), stance.end()))
                .findFirst();
    }

    /** Footfalls that no platform measured. */
    List<Footfall> unmeasured() {
        return footfalls.stream()
                .filter(f -> stances.stream()
                        .map(PlatformStance::stance)
                        .noneMatch(s -> s.side() == f.side() && f.overlaps(s.start(), s.end())))
                .toList();
    }

    List<Footfall> footfalls() {
        return footfalls;
    }

    GaitSettings settings() {
        return settings;
    }

    /** Sum of all platforms' forces in the walking frame. */
    StepLoads.Axes totalForce() {
        double[] sum = new double[0];
        PlatformLoads first = trial.platforms().get(0);
        for (PlatformLoads p : trial.platforms()) {
            double[] force = new double[3 * p.samples()];
            p.copyForceTo(force, 0);
            if (sum.length == 0) {
                sum = force;
            } else {
                for (int i = 0; i < Math.min(sum.length, force.length); i++) {
                    sum[i] += force[i];
                }
            }
        }
        return axes(sum, first.time(0), first.rate());
    }

    /** Force of one limb in the walking frame; zero away from its stance. */
    StepLoads.Axes limbForce(Stance stance) {
        double margin = 0.03;
        double[] sum = new double[0];
        PlatformLoads first = trial.platforms().get(0);
        for (PlatformLoads p : trial.platforms()) {
            if (sum.length == 0) {
                sum = new double[3 * p.samples()];
            }
            if (!stance.platforms().contains(p.number())) {
                continue;
            }
            for (int i = 0; i < p.samples(); i++) {
                double t = p.time(i);
                if (t >= stance.start() - margin && t <= stance.end() + margin) {
                    Vec3 f = p.force(i);
                    sum[3 * i] += f.x();
                    sum[3 * i + 1] += f.y();
                    sum[3 * i + 2] += f.z();
                }
            }
        }
        return axes(sum, first.time(0), first.rate());
    }

    private StepLoads.Axes axes(double[] force_L, double start, double rate) {
        double[] force_W = FootTracks.turned(force_L, R_LW);
        int n = force_W.length / 3;
        Series[] s = new Series[3];
        for (int c = 0; c < 3; c++) {
            double[] x = new double[n];
            for (int i = 0; i < n; i++) {
                x[i] = force_W[3 * i + c];
            }
            s[c] = new Series(start, rate, x);
        }
        return new StepLoads.Axes(s[0], s[1], s[2]);
    }
}
