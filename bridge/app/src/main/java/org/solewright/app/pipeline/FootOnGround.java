package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.solewright.analysis.gait.LandmarkTracks;
import org.solewright.analysis.gait.Pass;
import org.solewright.analysis.gait.StanceFoot;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.gait.Stance;
import org.solewright.domain.geometry.Vec3;

/** The landmarks of one foot in a recording beside those of its model, sampled over stances. */
final class FootOnGround {

    private static final Vec3 LOST = new Vec3(Double.NaN, Double.NaN, Double.NaN);

    /** Of the foot's length: heel or heads that stand higher than that do not stand on the floor (assumed). */
    private static final double RAISED_HEEL = 0.3;

    private static final double RAISED_HEADS = 0.5;

    private final Landmark inner;
    private final Landmark outer;
    private final Optional<Landmark> toe;
    private final ModelStanding standing;

    private FootOnGround(ModelStanding standing, Landmark inner, Landmark outer, Optional<Landmark> toe) {
        this.standing = standing;
        this.inner = inner;
        this.outer = outer;
        this.toe = toe;
    }

    /**
     * The landmarks that the model and all recordings have.
     *
     * @param standing the model's standing trial
     * @param walking recordings
     * @return empty where the heel or every forefoot landmark is missing
     */
    static Optional<FootOnGround> of(ModelStanding standing, List<LandmarkTracks> walking) {
        List<Landmark> heads = shared(
                standing,
                walking,
                List.of(Landmark.METATARSAL_1_HEAD, Landmark.METATARSAL_2_HEAD, Landmark.METATARSAL_5_HEAD));
        List<Landmark> toes = shared(standing, walking, List.of(Landmark.TOE_TIP, Landmark.HALLUX_TIP));
        List<Landmark> front = heads.isEmpty() ? toes : heads;
        return front.isEmpty()
                        || shared(standing, walking, List.of(Landmark.CALCANEUS_POSTERIOR))
                                .isEmpty()
                ? Optional.empty()
                : Optional.of(new FootOnGround(
                        standing,
                        front.get(0),
                        front.get(front.size() - 1),
                        toes.stream().findFirst()));
    }

    private static List<Landmark> shared(
            ModelStanding standing, List<LandmarkTracks> walking, List<Landmark> landmarks) {
        return landmarks.stream()
                .filter(l -> standing.landmark(l).isPresent()
                        && walking.stream()
                                .allMatch(t -> t.has(l, standing.model().side())))
                .toList();
    }

    boolean hasToe() {
        return toe.isPresent();
    }

    private double stoodAt(Landmark landmark) {
        return standing.landmark(landmark).map(Vec3::y).orElse(Double.NaN) - standing.floor();
    }

    private boolean isRaised(double height, double limit) {
        return standing.model()
                .subject()
                .footLength()
                .filter(f -> height > limit * f.value())
                .isPresent();
    }

    /** Whether the heel stood up already in standing, as an animal's may: heights are then over the floor. */
    boolean isHeelRaisedInStanding() {
        return isRaised(stoodAt(Landmark.CALCANEUS_POSTERIOR), RAISED_HEEL);
    }

    /** The foot in standing, as it is. */
    private StanceFoot.Standing stood() {
        Vec3 heel = standing.landmark(Landmark.CALCANEUS_POSTERIOR).orElseThrow();
        Vec3 heads = standing.landmark(inner)
                .orElseThrow()
                .plus(standing.landmark(outer).orElseThrow())
                .times(0.5);
        Vec3 d = heads.minus(heel);
        return new StanceFoot.Standing(
                stoodAt(Landmark.CALCANEUS_POSTERIOR),
                stoodAt(inner),
                stoodAt(outer),
                toe.map(this::stoodAt).orElse(Double.NaN),
                Math.atan2(d.y(), Math.hypot(d.x(), d.z())));
    }

    /** What heights are told over: standing, or the floor where heel or heads stood up already. */
    private StanceFoot.Standing reference() {
        StanceFoot.Standing s = stood();
        boolean headsUp = isRaised((s.innerHead() + s.outerHead()) / 2, RAISED_HEADS);
        return new StanceFoot.Standing(
                isHeelRaisedInStanding() ? 0 : s.heel(),
                headsUp ? 0 : s.innerHead(),
                headsUp ? 0 : s.outerHead(),
                s.toe(),
                s.angle());
    }

    /** The foot over a stance, with the floor where it is. */
    StanceFoot over(List<StanceFoot.Sample> samples, double floor) {
        return new StanceFoot(samples, reference(), floor);
    }

    /** Height of the floor in the walking frame as a stance tells it; NaN where it does not. */
    double floor(List<StanceFoot.Sample> samples, double rise) {
        return StanceFoot.floor(samples, stood(), rise).orElse(Double.NaN);
    }

    /** Samples at the point rate, from the frame before contact to the one after off. */
    List<StanceFoot.Sample> samples(Pass pass, LandmarkTracks tracks, LimbMotion motion, Stance stance) {
        double[] heel = track(tracks, Landmark.CALCANEUS_POSTERIOR);
        double[] in = track(tracks, inner);
        double[] out = track(tracks, outer);
        double[] tip = toe.map(t -> track(tracks, t)).orElse(new double[0]);
        double rate = pass.trial().rate();
        double begin = pass.trial().startTime();
        int first = Math.max(0, (int) Math.floor((stance.start() - begin) * rate));
        int last = Math.min(tracks.recording().frames() - 1, (int) Math.ceil((stance.end() - begin) * rate));
        List<StanceFoot.Sample> samples = new ArrayList<>();
        for (int frame = first; frame <= last; frame++) {
            double time = begin + frame / rate;
            Optional<Pass.StanceLoad> load = pass.load(stance, time);
            samples.add(new StanceFoot.Sample(
                    (time - stance.start()) / stance.duration(),
                    load.map(Pass.StanceLoad::vertical).orElse(Double.NaN),
                    onGround(pass, point(heel, frame), time),
                    onGround(pass, point(in, frame), time),
                    onGround(pass, point(out, frame), time),
                    onGround(pass, point(tip, frame), time),
                    onGround(pass, motion.ankle(standing.limb(), frame).orElse(LOST), time),
                    onGround(pass, load.map(Pass.StanceLoad::centreOfPressure).orElse(LOST), time)));
        }
        return samples;
    }

    private double[] track(LandmarkTracks tracks, Landmark landmark) {
        return tracks.track(landmark, standing.model().side()).orElse(new double[0]);
    }

    private static Vec3 point(double[] xyz, int frame) {
        return 3 * frame + 2 < xyz.length ? new Vec3(xyz[3 * frame], xyz[3 * frame + 1], xyz[3 * frame + 2]) : LOST;
    }

    /** A position in the walking frame, carried forward as a belt sees it. */
    private static Vec3 onGround(Pass pass, Vec3 p_L, double time) {
        Vec3 p_W = pass.R_LW().inverseVector(p_L);
        return p_W.plus(
                Vec3.X.times(pass.trial().beltSpeed() * (time - pass.trial().startTime())));
    }
}
