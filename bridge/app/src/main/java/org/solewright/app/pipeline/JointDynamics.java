package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.stream.IntStream;
import org.solewright.analysis.cost.PowerWork;
import org.solewright.analysis.dynamics.ChainLink;
import org.solewright.analysis.dynamics.FilteredLoads;
import org.solewright.analysis.dynamics.FootLoadRule;
import org.solewright.analysis.dynamics.JointLoads;
import org.solewright.analysis.dynamics.SegmentState;
import org.solewright.analysis.dynamics.Wrench;
import org.solewright.analysis.gait.Pass;
import org.solewright.analysis.numerics.Series;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.foot.Joint;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.foot.Segment;
import org.solewright.domain.foot.SegmentName;
import org.solewright.domain.gait.CurveRow;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.gait.Stance;
import org.solewright.domain.geometry.Pose;
import org.solewright.domain.geometry.Vec3;

/**
 * Inverse dynamics of a model's shank and foot over one stance on one platform: sagittal moments (dorsiflexion and knee
 * extension positive, of the proximal on the distal segment) and powers of its joints, 101 points. A joint inside the foot
 * has a moment only where one wrench tells it ({@link FootLoadRule}).
 */
final class JointDynamics {

    private static final int POINTS = 101;

    /** Vertical speed below which a landmark rests, m/s: a third of its speed as the heel begins to rise [assumed]. */
    private static final double STILL = 0.05;

    /** Rise over where it rests that lifts a landmark off the ground, share of foot length: 10 mm of 0.26 m. */
    private static final double RISE = 0.0385;

    /** Foot length where the model has none, m (common practice). */
    private static final double USUAL_FOOT = 0.26;

    private final ModelChain chain;
    private final Pass pass;
    private final Stance stance;
    private final FilteredLoads loads;
    private final int first;
    private final int count;
    private final double[][] moment;
    private final double[][] power;
    private final double[][] most;
    private boolean isIndeterminate;

    private JointDynamics(ModelChain chain, Pass pass, Stance stance, PlatformLoads platform, double cutoff) {
        this.chain = chain;
        this.pass = pass;
        this.stance = stance;
        this.loads = FilteredLoads.of(platform, cutoff);
        double start = pass.trial().startTime();
        double rate = pass.trial().rate();
        this.first = (int) Math.ceil((stance.start() - start) * rate - 1e-9);
        this.count = Math.max(0, (int) Math.floor((stance.end() - start) * rate + 1e-9) - first + 1);
        int segments = chain.model().segments().size();
        this.moment = unknown(segments, count);
        this.power = unknown(segments, count);
        this.most = unknown(segments, count);
    }

    private static double[][] unknown(int rows, int columns) {
        double[][] a = new double[rows][columns];
        for (double[] row : a) {
            Arrays.fill(row, Double.NaN);
        }
        return a;
    }

    /** The joints over a stance on one platform; empty where it stood on several or the shank is not tracked. */
    static Optional<JointDynamics> of(Optional<ModelChain> chain, Pass pass, Stance stance, double cutoff) {
        Optional<PlatformLoads> platform = pass.trial().platforms().stream()
                .filter(p -> stance.platforms().equals(List.of(p.number())))
                .findFirst();
        if (chain.isEmpty() || platform.isEmpty() || !stance.whole()) {
            return Optional.empty();
        }
        JointDynamics joints = new JointDynamics(chain.get(), pass, stance, platform.get(), cutoff);
        joints.solve();
        return Optional.of(joints);
    }

    private void solve() {
        double[] heel = heights(Landmark.CALCANEUS_POSTERIOR);
        double[] heads = headHeights();
        double lift = RISE * footLength();
        double heelDown = resting(heel) + lift;
        double headsDown = resting(heads) + lift;
        for (int i = 0; i < count; i++) {
            Optional<List<ChainLink>> links = links(first + i);
            double time = pass.trial().startTime() + (first + i) / pass.trial().rate();
            if (links.isEmpty() || !loads.covers(time)) {
                continue;
            }
            // A landmark that is not known counts as on the ground: then nothing is told.
            boolean isHeelDown = !(heel[i] > heelDown);
            boolean areHeadsDown = !(heads[i] > headsDown);
            frame(i, links.get(), isHeelDown, areHeadsDown);
        }
    }

    private double footLength() {
        return chain.model().subject().footLength().map(q -> q.value()).orElse(USUAL_FOOT);
    }

    private void frame(int i, List<ChainLink> links, boolean isHeelDown, boolean areHeadsDown) {
        Vec3 right = pass.R_LW().z();
        JointLoads joints = JointLoads.of(
                links, pass.trial().up().times(-org.solewright.analysis.gait.GaitSettings.STANDARD_GRAVITY));
        for (int s = 0; s < links.size(); s++) {
            boolean isInside = s >= 2;
            FootLoadRule.State state =
                    isInside ? state(s, links, isHeelDown, areHeadsDown) : FootLoadRule.State.DETERMINED;
            double m = joints.on(s).moment().dot(right);
            boolean isPowered = s > 0 && isObserved(s) && isObserved(s - 1);
            if (state == FootLoadRule.State.DETERMINED) {
                moment[s][i] = m;
                power[s][i] = isPowered ? joints.power(s) : Double.NaN;
            } else if (state == FootLoadRule.State.BOUNDED && s == links.size() - 1) {
                bounds(s, i, links, m, right);
            } else {
                isIndeterminate = true;
            }
        }
    }

    private boolean isObserved(int segment) {
        return chain.isObserved(chain.model().segments().get(segment).name());
    }

    /** Place along the foot, from the joint's centre forward. */
    private double along(Vec3 place, ChainLink link) {
        return place.minus(link.joint()).dot(pass.R_LW().x());
    }

    private Vec3 centreOfPressure(Wrench wrench) {
        Vec3 up = pass.trial().up();
        return wrench.about()
                .plus(up.cross(wrench.moment()).times(1 / wrench.force().dot(up)));
    }

    private FootLoadRule.State state(int s, List<ChainLink> links, boolean isHeelDown, boolean areHeadsDown) {
        Wrench ground = links.get(links.size() - 1).external();
        double cop = along(centreOfPressure(ground), links.get(s));
        // Behind a joint whose proximal neighbour is the rearmost segment there is the heel alone.
        boolean isLast = s == links.size() - 1;
        boolean isNeighbourDown = isLast && areHeadsDown;
        return FootLoadRule.state(isHeelDown, isNeighbourDown, cop, 0);
    }

    private void bounds(int s, int i, List<ChainLink> links, double m, Vec3 right) {
        ChainLink toes = links.get(s);
        Wrench ground = toes.external();
        double vertical = ground.force().dot(pass.trial().up());
        double cop = along(centreOfPressure(ground), toes);
        double tip = chain.model().segments().get(s).length().value();
        double rear = -RISE * footLength();
        if (!(vertical > 0) || !(tip > 0)) {
            return;
        }
        FootLoadRule.Share share = FootLoadRule.share(FootLoadRule.State.BOUNDED, vertical, cop, rear, 0, tip);
        double unloaded = m + ground.at(toes.joint()).moment().dot(right);
        most[s][i] = unloaded - share.leastMoment();
        moment[s][i] = unloaded - share.greatestMoment();
    }

    private Optional<List<ChainLink>> links(int frame) {
        List<ChainLink> links = new ArrayList<>();
        List<Segment> segments = chain.model().segments();
        double step = 1 / pass.trial().rate();
        for (int s = 0; s < segments.size(); s++) {
            Segment segment = segments.get(s);
            Optional<Pose> before = chain.pose(segment.name(), frame - 1);
            Optional<Pose> now = chain.pose(segment.name(), frame);
            Optional<Pose> after = chain.pose(segment.name(), frame + 1);
            if (before.isEmpty() || now.isEmpty() || after.isEmpty()) {
                return Optional.empty();
            }
            SegmentState state = SegmentState.of(
                    before.get(),
                    now.get(),
                    after.get(),
                    step,
                    segment.centreOfMass().position());
            double time = pass.trial().startTime() + frame * step;
            Wrench ground = s == segments.size() - 1 && loads.covers(time) ? loads.at(time) : Wrench.NONE;
            links.add(new ChainLink(
                    segment.mass().value(), segment.inertia(), state, now.get().position(), ground));
        }
        return Optional.of(links);
    }

    private double[] heights(Landmark landmark) {
        double[] h = new double[count];
        Arrays.fill(h, Double.NaN);
        chain.model().landmarks().stream()
                .filter(l -> l.name().equals(landmark.word()))
                .findFirst()
                .ifPresent(l -> {
                    for (int i = 0; i < count; i++) {
                        Optional<Pose> x = chain.pose(l.segment(), first + i);
                        if (x.isPresent()) {
                            h[i] = x.get()
                                    .transformPosition(l.position())
                                    .dot(pass.trial().up());
                        }
                    }
                });
        return h;
    }

    private double[] headHeights() {
        double[] one = heights(Landmark.METATARSAL_1_HEAD);
        double[] five = heights(Landmark.METATARSAL_5_HEAD);
        double[] h = new double[count];
        for (int i = 0; i < count; i++) {
            h[i] = Math.min(one[i], five[i]);
        }
        return h;
    }

    /** Median height while a landmark hardly rises or falls; the lowest one where it always does. */
    private double resting(double[] h) {
        double slow = STILL / pass.trial().rate();
        double[] rests = IntStream.range(1, Math.max(1, count - 1))
                .filter(i -> Math.abs(h[i + 1] - h[i - 1]) < 2 * slow)
                .mapToDouble(i -> h[i])
                .sorted()
                .toArray();
        return rests.length > 0
                ? rests[rests.length / 2]
                : Arrays.stream(h).filter(v -> !Double.isNaN(v)).min().orElse(Double.NaN);
    }

    private Optional<Joint> joint(int segment) {
        SegmentName name = chain.model().segments().get(segment).name();
        return chain.model().joints().stream().filter(j -> j.distal() == name).findFirst();
    }

    private String name(int segment) {
        return segment == 0 ? "knee" : joint(segment).map(Joint::name).orElse("joint");
    }

    /** Positive and negative work of the ankle over the stance; empty where its power is not known throughout. */
    Optional<PowerWork> ankleWork() {
        return power.length > 1 && count > 2 && Arrays.stream(power[1]).noneMatch(Double::isNaN)
                ? Optional.of(PowerWork.of(power[1], 1 / pass.trial().rate()))
                : Optional.empty();
    }

    /** What has to be said about joints inside the foot. */
    List<Finding> findings() {
        return isIndeterminate
                ? List.of(Finding.note(
                        "segment-loads.indeterminate",
                        stance.trial() + " " + stance.side().word(),
                        "one wrench per foot does not tell how its segments share the load while what is behind a joint"
                                + " bears too: moments and powers inside the foot are empty there"))
                : List.of();
    }

    /** Curves over the stance; those that are empty throughout are left out. */
    List<CurveRow> curves(String step) {
        List<CurveRow> rows = new ArrayList<>();
        for (int s = 0; s < moment.length; s++) {
            boolean isBounded = Arrays.stream(most[s]).anyMatch(v -> !Double.isNaN(v));
            if (isBounded) {
                double[] high = new double[count];
                for (int i = 0; i < count; i++) {
                    high[i] = Double.isNaN(most[s][i]) ? moment[s][i] : most[s][i];
                }
                add(rows, step, name(s) + "-moment-low", "N.m", moment[s]);
                add(rows, step, name(s) + "-moment-high", "N.m", high);
            } else {
                add(rows, step, name(s) + "-moment", "N.m", moment[s]);
            }
            add(rows, step, name(s) + "-power", "W", power[s]);
        }
        return rows;
    }

    private void add(List<CurveRow> rows, String step, String curve, String unit, double[] values) {
        if (Arrays.stream(values).allMatch(Double::isNaN)) {
            return;
        }
        Series series = new Series(
                pass.trial().startTime() + first / pass.trial().rate(),
                pass.trial().rate(),
                values);
        for (int k = 0; k < POINTS; k++) {
            double time = stance.start() + k * stance.duration() / (POINTS - 1);
            rows.add(new CurveRow(
                    stance.trial(),
                    step,
                    stance.side(),
                    curve,
                    unit,
                    100.0 * k / (POINTS - 1),
                    series.at(time),
                    OptionalDouble.empty(),
                    1));
        }
    }
}
