package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import org.solewright.analysis.fitting.RigidFit;
import org.solewright.analysis.fitting.SegmentTracking;
import org.solewright.analysis.fitting.StandingLimb;
import org.solewright.analysis.gait.Pass;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.gait.Side;
import org.solewright.domain.gait.Stance;
import org.solewright.domain.geometry.Vec3;

/**
 * How far the segments of one limb were rigid and held together while the foot stood on platforms: there the poses are
 * used. Limits are those of design 03 section 5, scaled by limb length.
 */
final class PoseChecks {

    private static final double DEFORMED = 0.0045;
    private static final double GAP = 0.017;

    private final StandingLimb limb;
    private final Map<String, List<RigidFit>> fits = new LinkedHashMap<>();
    private final List<Double> ankleGaps = new ArrayList<>();

    PoseChecks(StandingLimb limb) {
        this.limb = limb;
    }

    /** Adds the stances of this limb in a pass. */
    void add(Pass pass, LimbMotion motion) {
        collect("shank", motion.shank(), pass);
        collect("foot", motion.foot(), pass);
        collect("thigh", motion.thigh(), pass);
        gap(pass, motion).ifPresent(ankleGaps::add);
    }

    /** What has to be said about all stances added. */
    List<Finding> findings() {
        List<Finding> findings = new ArrayList<>();
        fits.forEach((segment, of) -> deformed(segment, of).ifPresent(findings::add));
        jointGap().ifPresent(findings::add);
        return findings;
    }

    private void collect(String segment, Optional<SegmentTracking> tracking, Pass pass) {
        if (tracking.isEmpty()) {
            return;
        }
        List<RigidFit> of = fits.computeIfAbsent(segment, k -> new ArrayList<>());
        for (int frame : stanceFrames(pass, limb.side())) {
            tracking.get().fit(frame).ifPresent(of::add);
        }
    }

    private static List<Integer> stanceFrames(Pass pass, Side side) {
        List<Integer> frames = new ArrayList<>();
        double rate = pass.trial().rate();
        double start = pass.trial().startTime();
        for (Stance stance : pass.stances()) {
            int last = (int) Math.floor((stance.end() - start) * rate);
            for (int frame = (int) Math.max(0, Math.ceil((stance.start() - start) * rate));
                    stance.side() == side && frame <= last;
                    frame++) {
                frames.add(frame);
            }
        }
        return frames;
    }

    private Optional<Finding> deformed(String segment, List<RigidFit> of) {
        double rms = rootMeanSquare(of.stream().map(RigidFit::rms).toList());
        double shape = rootMeanSquare(of.stream().map(RigidFit::shapeChange).toList());
        double limit = DEFORMED * limb.limbLength().value();
        if (!(rms > limit)) {
            return Optional.empty();
        }
        return Optional.of(Finding.warning(
                "cluster.deformed",
                limb.side().word() + " " + segment,
                String.format(
                        Locale.ROOT,
                        "in stance the points of the %s %s depart from their standing shape by %.1f mm rms (distances"
                                + " between them change by %.1f mm rms), over the limit of %.1f mm: its pose is that"
                                + " uncertain; check for swapped or moved markers",
                        limb.side().word(),
                        segment,
                        1000 * rms,
                        1000 * shape,
                        1000 * limit)));
    }

    private static double rootMeanSquare(List<Double> values) {
        double sum = 0;
        for (double v : values) {
            sum += v * v / values.size();
        }
        return Math.sqrt(sum);
    }

    /** Root mean square distance of the ankle as shank and foot carry it, over the pass's stances of this foot. */
    private Optional<Double> gap(Pass pass, LimbMotion motion) {
        double sum = 0;
        int n = 0;
        for (int at : stanceFrames(pass, limb.side())) {
            Optional<Vec3> byShank =
                    motion.shank().flatMap(s -> s.at(limb.ankle().position(), at));
            Optional<Vec3> byFoot = motion.foot().flatMap(f -> f.at(limb.ankle().position(), at));
            if (byShank.isPresent() && byFoot.isPresent()) {
                double d = byShank.get().distance(byFoot.get());
                sum += d * d;
                n++;
            }
        }
        return n == 0 ? Optional.empty() : Optional.of(Math.sqrt(sum / n));
    }

    private Optional<Finding> jointGap() {
        double gap = rootMeanSquare(ankleGaps);
        double limit = GAP * limb.limbLength().value();
        if (ankleGaps.isEmpty() || !(gap > limit)) {
            return Optional.empty();
        }
        return Optional.of(Finding.warning(
                "joint.gap",
                limb.side().word() + " ankle",
                String.format(
                        Locale.ROOT,
                        "shank and foot put the %s ankle %.0f mm rms apart, over the limit of %.0f mm",
                        limb.side().word(),
                        1000 * gap,
                        1000 * limit)));
    }
}
