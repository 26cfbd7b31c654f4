package org.solewright.analysis.gait;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.TreeMap;
import java.util.stream.DoubleStream;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.geometry.Vec3;

/** Checks that need all passes of a subject: platform heights, horizontal bias. */
public final class PassChecks {

    private static final double HIGHEST = 0.020;
    private static final double HIGHEST_OF_FOOT = 0.07;

    private PassChecks() {}

    /**
     * Whether the lowest foot landmark at foot flat lies where a sole on the platform would put it: 0 to 20 mm (0 to 0.07
     * foot length) over the platform's surface.
     *
     * @param passes a subject's passes
     * @return a warning per platform that departs
     */
    public static List<Finding> platformHeights(List<Pass> passes) {
        TreeMap<Integer, List<Double>> heights = new TreeMap<>();
        TreeMap<Integer, Double> surface = new TreeMap<>();
        double foot = 0;
        for (Pass pass : passes) {
            for (PlatformStance s : pass.platformStances()) {
                if (!Double.isNaN(s.lowest())) {
                    heights.computeIfAbsent(s.stance().platforms().get(0), k -> new ArrayList<>())
                            .add(s.lowest());
                }
            }
            for (PlatformLoads p : pass.trial().platforms()) {
                surface.put(p.number(), p.centre().dot(pass.trial().up()));
            }
            for (FootTracks f : pass.trial().feet().values()) {
                foot = Math.max(foot, medianLength(f));
            }
        }
        double highest = foot > 0 ? Math.min(HIGHEST, HIGHEST_OF_FOOT * foot) : HIGHEST;
        List<Finding> findings = new ArrayList<>();
        heights.forEach((number, list) -> {
            double median = median(list.stream().mapToDouble(Double::doubleValue));
            if (median < 0 || median > highest) {
                findings.add(Finding.warning(
                        "platform.height",
                        "platform " + number,
                        String.format(
                                Locale.ROOT,
                                "the lowest foot landmark at foot flat is %.0f mm over the platform's surface, which the"
                                        + " file puts at %.0f mm; expected 0 to %.0f mm: check the platform's corners"
                                        + " or give --floor",
                                1000 * median,
                                1000 * surface.getOrDefault(number, Double.NaN),
                                1000 * highest)));
            }
        });
        return findings;
    }

    private static double medianLength(FootTracks foot) {
        return median(java.util.stream.IntStream.range(0, foot.frames())
                .filter(foot::isTracked)
                .mapToDouble(foot::length));
    }

    private static double median(DoubleStream values) {
        double[] sorted = values.sorted().toArray();
        return sorted.length == 0 ? Double.NaN : sorted[sorted.length / 2];
    }

    /**
     * Mean horizontal force of the steps of a pass against the pelvis's change of speed over their windows.
     *
     * @param pass the pass
     * @param steps its steps
     * @return a note per pass with steps
     */
    public static List<Finding> bias(Pass pass, List<Step> steps) {
        List<Finding> findings = new ArrayList<>();
        for (Step step : steps) {
            StepLoads loads = step.loads();
            double from = loads.windowFrom();
            double to = loads.windowTo();
            double half = (to - from) / 4;
            double mass = loads.totalForce().up().mean(from, to) / loads.gravity();
            // A quarter of the window on either side, so that the pelvis's swing within a step cancels.
            var before = pass.pelvisVelocity(from - half, from + half);
            var after = pass.pelvisVelocity(to - half, to + half);
            if (before.isPresent() && after.isPresent()) {
                Vec3 change = after.get().minus(before.get()).times(mass / (to - from));
                findings.add(Finding.note(
                        "loads.bias",
                        pass.trial().name() + " step " + step.number(),
                        String.format(
                                Locale.ROOT,
                                "mean horizontal force %.1f N forward and %.1f N to the right; the pelvis's change of speed"
                                        + " asks for %.1f N and %.1f N; "
                                        + (loads.isStride()
                                                ? "the mean is taken off the stride's acceleration"
                                                : "nothing is removed"),
                                tenths(loads.totalForce().forward().mean(from, to)),
                                tenths(loads.totalForce().right().mean(from, to)),
                                tenths(change.x()),
                                tenths(change.z()))));
            }
        }
        return findings;
    }

    /** Rounded to tenths, without the sign of a rounded zero. */
    private static double tenths(double force) {
        return Math.rint(10 * force) / 10 + 0.0;
    }
}
