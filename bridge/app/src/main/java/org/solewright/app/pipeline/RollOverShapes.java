package org.solewright.app.pipeline;

import java.util.Optional;
import org.solewright.analysis.fitting.RollOverPath;
import org.solewright.analysis.gait.Pass;
import org.solewright.domain.gait.Stance;
import org.solewright.domain.geometry.Vec3;

/**
 * The roll-over path of one stance: from contact to opposite contact, samples with a vertical load over max(50 N, 0.05 m
 * g), at the point rate.
 */
final class RollOverShapes {

    private static final double LEAST_LOAD = 50;
    private static final double LEAST_SHARE = 0.05;

    /** Where a joint centre is in a frame. */
    @FunctionalInterface
    interface Joint {
        Optional<Vec3> at(int frame);
    }

    private RollOverShapes() {}

    /**
     * Load that a sample needs.
     *
     * @param weight subject's weight, N
     * @param isHuman animals have no 50 N
     * @return N
     */
    static double leastLoad(double weight, boolean isHuman) {
        return isHuman ? Math.max(LEAST_LOAD, LEAST_SHARE * weight) : LEAST_SHARE * weight;
    }

    /**
     * The path.
     *
     * @param pass the pass
     * @param stance one of its stances
     * @param ankle ankle by frame, laboratory frame
     * @param upper knee or hip by frame, laboratory frame
     * @param leastLoad N
     * @return the path; empty where the opposite contact is not known
     */
    static Optional<RollOverPath> of(Pass pass, Stance stance, Joint ankle, Joint upper, double leastLoad) {
        Optional<Double> end = pass.oppositeContact(stance);
        if (end.isEmpty()) {
            return Optional.empty();
        }
        RollOverPath.Collector collector =
                new RollOverPath.Collector(pass.trial().rate(), pass.R_LW());
        double rate = pass.trial().rate();
        int first = (int) Math.ceil((stance.start() - pass.trial().startTime()) * rate - 1e-9);
        int last = (int) Math.floor((end.get() - pass.trial().startTime()) * rate + 1e-9);
        for (int frame = Math.max(0, first); frame <= last; frame++) {
            Optional<Pass.StanceLoad> load = pass.load(stance, pass.trial().startTime() + frame / rate);
            Optional<Vec3> a = ankle.at(frame);
            Optional<Vec3> u = upper.at(frame);
            if (load.isPresent() && a.isPresent() && u.isPresent() && load.get().vertical() > leastLoad) {
                collector.add(
                        load.get().centreOfPressure(),
                        a.get(),
                        u.get(),
                        load.get().vertical());
            }
        }
        return Optional.of(collector.path());
    }
}
