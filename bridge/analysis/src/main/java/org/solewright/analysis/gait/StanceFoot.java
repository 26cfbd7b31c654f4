package org.solewright.analysis.gait;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import org.solewright.domain.geometry.Vec3;

/**
 * One foot over one stance, sample by sample, beside the same foot in standing: heights, foot-floor angle, and where the
 * centre of pressure lies along the foot. Ground frame G of the stance: y up, x along the foot at foot flat, z to the
 * right, origin below the mean heel at foot flat.
 */
public final class StanceFoot {

    /** Part of stance in which the foot's direction and the floor are taken (common practice). */
    private static final double FLAT_FROM = 0.2;

    private static final double FLAT_TO = 0.5;

    private final List<Sample> samples;
    private final Standing standing;
    private final double floor;
    private final Vec3 along;
    private final Vec3 right;
    private final Vec3 origin;

    /**
     * One sample. A position that is not known is NaN. All in a frame whose y is up and in which the floor rests: on a
     * treadmill the belt's motion is added.
     *
     * @param phase part of stance, 0 at contact, 1 at off; samples outside help to interpolate
     * @param load vertical force, N
     * @param heel rear of the calcaneus, m
     * @param innerHead metatarsal head on the inner side, m
     * @param outerHead metatarsal head on the outer side, m; the inner one where only one is tracked
     * @param toe tip of the toes, m
     * @param ankle ankle centre, m
     * @param centreOfPressure m
     */
    public record Sample(
            double phase,
            double load,
            Vec3 heel,
            Vec3 innerHead,
            Vec3 outerHead,
            Vec3 toe,
            Vec3 ankle,
            Vec3 centreOfPressure) {

        private Vec3 heads() {
            return innerHead.plus(outerHead).times(0.5);
        }
    }

    /**
     * The foot in standing.
     *
     * @param heel height of the rear of the calcaneus over the floor, m
     * @param innerHead height of the inner metatarsal head, m
     * @param outerHead height of the outer metatarsal head, m
     * @param toe height of the toe tip, m; NaN where not known
     * @param angle foot-floor angle, rad: heel to metatarsal heads against the horizontal, heads higher positive
     */
    public record Standing(double heel, double innerHead, double outerHead, double toe, double angle) {

        private double heads() {
            return (innerHead + outerHead) / 2;
        }
    }

    /**
     * A foot over a stance.
     *
     * @param samples in order of time
     * @param standing the same foot in standing
     * @param floor height of the floor along y in the samples' frame, m
     */
    public StanceFoot(List<Sample> samples, Standing standing, double floor) {
        this.samples = List.copyOf(samples);
        this.standing = standing;
        this.floor = floor;
        Vec3 direction = Vec3.ZERO;
        Vec3 heel = Vec3.ZERO;
        int n = 0;
        for (Sample s : samples) {
            Vec3 d = s.heads().minus(s.heel());
            if (s.phase() >= FLAT_FROM && s.phase() <= FLAT_TO && d.isFinite()) {
                direction = direction.plus(new Vec3(d.x(), 0, d.z()));
                heel = heel.plus(s.heel());
                n++;
            }
        }
        Vec3 lost = new Vec3(Double.NaN, Double.NaN, Double.NaN);
        along = direction.norm() > 0 ? direction.unit() : lost;
        right = along.cross(Vec3.Y);
        origin = n > 0 ? heel.times(1.0 / n) : lost;
    }

    /**
     * The floor as a foot tells it that stands on it: the mean, over its landmarks, of the least height at foot flat less the
     * height in standing. A landmark that stays higher than the lowest by more than the limit does not stand on the floor.
     *
     * @param samples in order of time
     * @param standing the same foot in standing
     * @param rise limit, m
     * @return height along y, m; empty where no landmark is tracked at foot flat
     */
    public static OptionalDouble floor(List<Sample> samples, Standing standing, double rise) {
        List<Double> offsets = new ArrayList<>();
        for (int landmark = 0; landmark < 4; landmark++) {
            double least = Double.POSITIVE_INFINITY;
            for (Sample s : samples) {
                double[] heights = {
                    s.heel().y(), s.innerHead().y(), s.outerHead().y(), s.toe().y()
                };
                if (s.phase() >= FLAT_FROM && s.phase() <= FLAT_TO && heights[landmark] < least) {
                    least = heights[landmark];
                }
            }
            double[] stood = {standing.heel(), standing.innerHead(), standing.outerHead(), standing.toe()};
            if (Double.isFinite(least - stood[landmark])) {
                offsets.add(least - stood[landmark]);
            }
        }
        double lowest = offsets.stream().mapToDouble(v -> v).min().orElse(Double.NaN);
        return offsets.stream()
                .mapToDouble(v -> v)
                .filter(v -> v <= lowest + rise)
                .average();
    }

    /**
     * Number of samples.
     *
     * @return 0 or more
     */
    public int size() {
        return samples.size();
    }

    /**
     * Place in stance.
     *
     * @param sample from 0
     * @return 0 at contact, 1 at off
     */
    public double phase(int sample) {
        return samples.get(sample).phase();
    }

    /**
     * Vertical force.
     *
     * @param sample from 0
     * @return N
     */
    public double load(int sample) {
        return samples.get(sample).load();
    }

    /**
     * Height of the heel above its standing height.
     *
     * @param sample from 0
     * @return m; NaN where not tracked
     */
    public double heel(int sample) {
        return samples.get(sample).heel().y() - floor - standing.heel();
    }

    /**
     * Height of the middle of the metatarsal heads above its standing height.
     *
     * @param sample from 0
     * @return m; NaN where not tracked
     */
    public double heads(int sample) {
        return samples.get(sample).heads().y() - floor - standing.heads();
    }

    /**
     * Foot-floor angle less that of standing.
     *
     * @param sample from 0
     * @return rad, metatarsal heads higher positive; NaN where not tracked
     */
    public double angle(int sample) {
        Vec3 d = samples.get(sample).heads().minus(samples.get(sample).heel());
        return Math.atan2(d.y(), Math.hypot(d.x(), d.z())) - standing.angle();
    }

    /**
     * Where the centre of pressure lies along the foot.
     *
     * @param sample from 0
     * @return forward of the heel at foot flat, m; NaN where not known
     */
    public double centreOfPressure(int sample) {
        return forward(samples.get(sample).centreOfPressure());
    }

    /**
     * How far the centre of pressure lies before the ankle.
     *
     * @param sample from 0
     * @return m; negative behind it; NaN where not known
     */
    public double beforeAnkle(int sample) {
        Sample s = samples.get(sample);
        return forward(s.centreOfPressure()) - forward(s.ankle());
    }

    /**
     * How far the centre of pressure lies before the metatarsal line, the line through inner and outer head.
     *
     * @param sample from 0
     * @return m; negative behind it; NaN where not known
     */
    public double beforeHeads(int sample) {
        Sample s = samples.get(sample);
        double inner = sideways(s.innerHead());
        double outer = sideways(s.outerHead());
        double share = inner == outer
                ? 0
                : Math.max(0, Math.min(1, (sideways(s.centreOfPressure()) - inner) / (outer - inner)));
        double line = forward(s.innerHead()) * (1 - share) + forward(s.outerHead()) * share;
        return forward(s.centreOfPressure()) - line;
    }

    /**
     * How far the centre of pressure lies before the tip of the toes.
     *
     * @param sample from 0
     * @return m; negative behind it; NaN where not known
     */
    public double beforeToe(int sample) {
        Sample s = samples.get(sample);
        return forward(s.centreOfPressure()) - forward(s.toe());
    }

    private double forward(Vec3 p) {
        return p.minus(origin).dot(along);
    }

    private double sideways(Vec3 p) {
        return p.minus(origin).dot(right);
    }
}
