package org.solewright.analysis.gait;

import java.util.ArrayList;
import java.util.EnumMap;
import java.util.EnumSet;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.gait.Side;
import org.solewright.domain.gait.Stance;
import org.solewright.domain.gait.Use;
import org.solewright.domain.geometry.Rotation;
import org.solewright.domain.geometry.Vec3;

/**
 * Turns times under load into stances: which foot it was and whether the foot was wholly on the platform. A foot half off
 * the platform moves its centre of pressure inwards, so that a centre of pressure near a border proves nothing: the
 * foot's outline decides.
 */
final class StanceFinder {

    private static final double NEAR = 0.2;
    private static final double SHARE = 0.9;
    // The part of stance in which a plantigrade human foot is flat (common practice).
    private static final double FLAT_AT = 0.35;

    /** Where an outline leaves a platform. */
    enum Border {
        REAR,
        FRONT,
        SIDE;

        Set<Use> excludes() {
            return switch (this) {
                case REAR ->
                    EnumSet.of(Use.CONTACT_ANGLE, Use.ROLL_OVER, Use.PIVOTS, Use.COLLISION, Use.REBOUND, Use.MASS);
                case FRONT -> EnumSet.of(Use.ROLL_OVER, Use.PIVOTS, Use.PRELOAD, Use.PUSH_OFF, Use.MASS);
                case SIDE -> EnumSet.allOf(Use.class);
            };
        }

        String word() {
            return name().toLowerCase(Locale.ROOT);
        }
    }

    private final WalkingTrial trial;
    private final Rotation R_LW;
    private final GaitSettings settings;
    private final List<Finding> findings;
    private final Map<Side, FootTracks> feet_W = new EnumMap<>(Side.class);

    StanceFinder(WalkingTrial trial, Rotation R_LW, GaitSettings settings, List<Finding> findings) {
        this.trial = trial;
        this.R_LW = R_LW;
        this.settings = settings;
        this.findings = findings;
        trial.feet().forEach((side, foot) -> feet_W.put(side, foot.in(R_LW)));
    }

    List<PlatformStance> stances(PlatformLoads platform) {
        List<PlatformStance> found = new ArrayList<>();
        if (!platform.hasCentreOfPressure()) {
            return found;
        }
        double threshold = ContactDetector.threshold(platform, settings.weight());
        for (ContactDetector.Loaded loaded : ContactDetector.detect(platform, threshold, settings.shortestContact())) {
            foot(platform, loaded)
                    .ifPresentOrElse(
                            side -> found.add(stance(platform, loaded, side)),
                            () -> findings.add(Finding.warning(
                                    "loads.unassigned",
                                    trial.name() + " platform " + platform.number(),
                                    String.format(
                                            Locale.ROOT,
                                            "load of %.0f N from %.3f to %.3f s belongs to no tracked foot alone;"
                                                    + " it is not used as a stance",
                                            loaded.peak(),
                                            loaded.start(),
                                            loaded.end()))));
        }
        return found;
    }

    private Optional<Side> foot(PlatformLoads platform, ContactDetector.Loaded loaded) {
        Optional<Side> best = Optional.empty();
        double bestDistance = Double.POSITIVE_INFINITY;
        for (Map.Entry<Side, FootTracks> e : feet_W.entrySet()) {
            int near = 0;
            int asked = 0;
            double sum = 0;
            for (int i = firstSample(platform, loaded);
                    i < platform.samples() && platform.time(i) <= loaded.end();
                    i++) {
                int frame = trial.frame(platform.time(i));
                if (!e.getValue().isTracked(frame)) {
                    continue;
                }
                Vec3 cop = R_LW.inverseVector(platform.centreOfPressure(i));
                double d = ConvexOutline.around(e.getValue().outline(frame)).distance(cop.x(), cop.z());
                asked++;
                sum += d;
                near += d <= NEAR * e.getValue().length(frame) ? 1 : 0;
            }
            if (asked > 0 && near >= SHARE * asked && sum / asked < bestDistance) {
                best = Optional.of(e.getKey());
                bestDistance = sum / asked;
            }
        }
        return best;
    }

    private static int firstSample(PlatformLoads platform, ContactDetector.Loaded loaded) {
        return (int) Math.max(0, Math.ceil((loaded.start() - platform.time(0)) * platform.rate()));
    }

    private PlatformStance stance(PlatformLoads platform, ContactDetector.Loaded loaded, Side side) {
        FootTracks foot = trial.foot(side).in(R_LW);
        int flat = trial.frame(loaded.start() + FLAT_AT * (loaded.end() - loaded.start()));
        Map<Border, Double> over = foot.isTracked(flat) ? overlaps(platform, foot, flat) : Map.of();
        Set<Use> excluded = EnumSet.noneOf(Use.class);
        over.keySet().forEach(b -> excluded.addAll(b.excludes()));
        if (!loaded.isStartSeen()) {
            excluded.addAll(Border.REAR.excludes());
        }
        if (!loaded.isEndSeen()) {
            excluded.addAll(Border.FRONT.excludes());
        }
        String why = over.entrySet().stream()
                .map(e -> String.format(
                        Locale.ROOT,
                        "foot over the %s border by %.0f mm",
                        e.getKey().word(),
                        1000 * e.getValue()))
                .collect(Collectors.joining(", "));
        if (!over.isEmpty()) {
            findings.add(Finding.warning(
                    "loads.foot-over-edge",
                    trial.name() + " platform " + platform.number() + " " + side.word(),
                    why + "; not used for " + words(excluded)));
        }
        if (!loaded.isStartSeen() || !loaded.isEndSeen()) {
            why = (why.isEmpty() ? "" : why + ", ") + "the recording begins or ends during the contact";
        }
        Stance stance = new Stance(
                trial.name(),
                side,
                List.of(platform.number()),
                loaded.start(),
                loaded.end(),
                excluded.isEmpty(),
                excluded,
                why);
        double[] travel = copTravel(platform, loaded, foot, flat);
        double lowest = foot.isTracked(flat)
                ? foot.lowest(flat) - R_LW.inverseVector(platform.centre()).y()
                : Double.NaN;
        return new PlatformStance(stance, travel[0], travel[1], lowest, loaded.isStartSeen(), loaded.isEndSeen());
    }

    static String words(Set<Use> uses) {
        return uses.stream().sorted().map(Use::word).collect(Collectors.joining(", "));
    }

    /** Greatest distance of the outline over each kind of border, m; borders it does not cross are absent. */
    private Map<Border, Double> overlaps(PlatformLoads platform, FootTracks foot, int frame) {
        List<ConvexOutline.Point> corners = platform.corners().stream()
                .map(R_LW::inverseVector)
                .map(c -> new ConvexOutline.Point(c.x(), c.z()))
                .toList();
        List<ConvexOutline.Point> hull = ConvexOutline.around(corners).corners();
        Vec3 forward = foot.forward(frame);
        Map<Border, Double> over = new EnumMap<>(Border.class);
        for (int i = 0; i < hull.size(); i++) {
            ConvexOutline.Point a = hull.get(i);
            ConvexOutline.Point b = hull.get((i + 1) % hull.size());
            double length = Math.hypot(b.x() - a.x(), b.z() - a.z());
            // Outward normal of a hull that runs counter-clockwise in (x, z).
            double nx = (b.z() - a.z()) / length;
            double nz = -(b.x() - a.x()) / length;
            double along = nx * forward.x() + nz * forward.z();
            Border border = along > Math.sqrt(0.5) ? Border.FRONT : along < -Math.sqrt(0.5) ? Border.REAR : Border.SIDE;
            for (ConvexOutline.Point p : foot.outline(frame)) {
                double beyond = (p.x() - a.x()) * nx + (p.z() - a.z()) * nz;
                if (beyond > 0) {
                    over.merge(border, beyond, Math::max);
                }
            }
        }
        return over;
    }

    /** Start and end of the centre of pressure along the foot at foot flat, in foot lengths from the heel. */
    private double[] copTravel(PlatformLoads platform, ContactDetector.Loaded loaded, FootTracks foot, int flat) {
        if (!foot.isTracked(flat)) {
            return new double[] {Double.NaN, Double.NaN};
        }
        double least = Math.max(0.05 * loaded.peak(), 20);
        double low = Double.POSITIVE_INFINITY;
        double high = Double.NEGATIVE_INFINITY;
        for (int i = firstSample(platform, loaded); i < platform.samples() && platform.time(i) <= loaded.end(); i++) {
            if (platform.vertical(i) < least) {
                continue;
            }
            double s = R_LW.inverseVector(platform.centreOfPressure(i))
                    .minus(foot.heel(flat))
                    .plus(new Vec3(trial.beltSpeed() * (platform.time(i) - trial.time(flat)), 0, 0))
                    .dot(foot.forward(flat));
            low = Math.min(low, s);
            high = Math.max(high, s);
        }
        return new double[] {low / foot.length(flat), high / foot.length(flat)};
    }

    /** Joins stances of one foot on several platforms at the same time: their loads are summed. */
    static List<PlatformStance> joined(List<PlatformStance> stances, List<Finding> findings) {
        List<PlatformStance> out = new ArrayList<>();
        for (PlatformStance s : stances) {
            PlatformStance last = out.isEmpty() ? null : out.get(out.size() - 1);
            if (last != null
                    && last.stance().side() == s.stance().side()
                    && s.stance().start() < last.stance().end()) {
                out.set(out.size() - 1, join(last, s, findings));
            } else {
                out.add(s);
            }
        }
        return out;
    }

    private static PlatformStance join(PlatformStance a, PlatformStance b, List<Finding> findings) {
        List<Integer> platforms = new ArrayList<>(a.stance().platforms());
        platforms.addAll(b.stance().platforms());
        platforms.sort(null);
        findings.add(Finding.warning(
                "loads.foot-on-two-platforms",
                a.stance().trial() + " " + a.stance().side().word(),
                "one foot stood on platforms " + platforms + " at once; their forces are summed, and the stance is used"
                        + " for nothing that needs one centre of pressure"));
        Set<Use> excluded = EnumSet.of(Use.CONTACT_ANGLE, Use.ROLL_OVER, Use.PIVOTS);
        return a.with(new Stance(
                a.stance().trial(),
                a.stance().side(),
                platforms,
                Math.min(a.stance().start(), b.stance().start()),
                Math.max(a.stance().end(), b.stance().end()),
                false,
                excluded,
                "one foot on two platforms"));
    }
}
