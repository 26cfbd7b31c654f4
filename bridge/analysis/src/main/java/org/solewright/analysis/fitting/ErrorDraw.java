package org.solewright.analysis.fitting;

import java.util.LinkedHashMap;
import java.util.Map;
import java.util.SplittableRandom;
import java.util.random.RandomGenerator;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.foot.SidedLandmark;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Vec3;

/**
 * The errors of one Monte Carlo run. Every error has a name and its own stream of random numbers, seeded by run and name:
 * it is the same whatever else was drawn before it, in whatever thread. Not for use by several threads at once.
 */
public final class ErrorDraw {

    /** No errors at all. */
    public static final ErrorDraw NONE = new ErrorDraw(new MeasurementErrors(0, 0, 0, 0, 0), 0, 0);

    /** Half periods of the slow motion over a stance. */
    private static final int HALF_PERIODS = 3;

    /** Cosines of 0, 1 and 2 half periods have mean squares of 1, 1/2 and 1/2. */
    private static final double MEAN_SQUARE = 2;

    private final MeasurementErrors errors;
    private final long seed;

    /**
     * A run's errors.
     *
     * @param errors how large
     * @param seed of the whole study
     * @param run number of the run
     */
    public ErrorDraw(MeasurementErrors errors, long seed, int run) {
        this.errors = errors;
        this.seed = new SplittableRandom(seed).nextLong() + new SplittableRandom(run).nextLong();
    }

    private RandomGenerator stream(String name) {
        long hash = 1125899906842597L;
        for (int i = 0; i < name.length(); i++) {
            hash = 31 * hash + name.charAt(i);
        }
        return new SplittableRandom(seed ^ hash);
    }

    private Vec3 vector(RandomGenerator random, double sd) {
        return sd == 0
                ? Vec3.ZERO
                : new Vec3(sd * random.nextGaussian(), sd * random.nextGaussian(), sd * random.nextGaussian());
    }

    /**
     * A number of the standard normal distribution.
     *
     * @param name what it is for
     * @return the same for the same name
     */
    public double normal(String name) {
        return stream(name).nextGaussian();
    }

    /**
     * Landmarks as they would have been had they been placed otherwise; clusters are what they are.
     *
     * @param posture mean standing positions
     * @return a posture with every landmark moved
     */
    public StandingPosture placed(StandingPosture posture) {
        Map<SidedLandmark, Vec3> moved = new LinkedHashMap<>();
        posture.landmarks().forEach((key, p) -> moved.put(key, p.plus(placement(key.landmark(), key.side()))));
        return new StandingPosture(moved, posture.clusters(), posture.up(), posture.floor());
    }

    /**
     * Placement error of a landmark.
     *
     * @param landmark which
     * @param side whose
     * @return m, laboratory frame of the standing trial
     */
    public Vec3 placement(Landmark landmark, Side side) {
        return vector(stream("place " + landmark.word() + " " + side.word()), errors.placement(landmark));
    }

    /**
     * Error of a hip centre beyond that of its landmarks.
     *
     * @param side whose
     * @return m
     */
    public Vec3 hip(Side side) {
        return vector(stream("hip " + side.word()), errors.legPlacement());
    }

    /**
     * Error of a platform: height along its normal, offset of the centre of pressure across it.
     *
     * @param platform its number; one laboratory has one set, so that the error is the same in every recording
     * @param up its normal, unit vector
     * @return m to be added to the centre of pressure
     */
    public Vec3 platform(int platform, Vec3 up) {
        RandomGenerator random = stream("platform " + platform);
        Vec3 offset = vector(random, errors.centreOfPressure());
        double height = errors.platformHeight() * random.nextGaussian();
        return offset.minus(up.times(offset.dot(up))).plus(up.times(height));
    }

    /**
     * Slow motion of points over the bone.
     *
     * @param segment name of the segment, with its side
     * @param points number of points
     * @return the motions, in the segment's frame of the standing trial
     */
    public Skin skin(String segment, int points) {
        return new Skin(segment, points);
    }

    /** Displacements of the points of a segment over a stance. */
    public final class Skin {

        private final double[] coefficients;

        private Skin(String segment, int points) {
            coefficients = new double[points * HALF_PERIODS * 3];
            double sd = errors.skin() / Math.sqrt(MEAN_SQUARE);
            for (int k = 0; k < points && sd > 0; k++) {
                RandomGenerator random = stream("skin " + segment + " " + k);
                for (int i = 0; i < HALF_PERIODS * 3; i++) {
                    coefficients[k * HALF_PERIODS * 3 + i] = sd * random.nextGaussian();
                }
            }
        }

        /**
         * Displacement of a point.
         *
         * @param point zero-based
         * @param share of the stance, 0 to 1
         * @return m, in the segment's frame of the standing trial
         */
        public Vec3 at(int point, double share) {
            int from = point * HALF_PERIODS * 3;
            double one = Math.cos(Math.PI * share);
            double two = Math.cos(2 * Math.PI * share);
            return new Vec3(
                    coefficients[from] + one * coefficients[from + 3] + two * coefficients[from + 6],
                    coefficients[from + 1] + one * coefficients[from + 4] + two * coefficients[from + 7],
                    coefficients[from + 2] + one * coefficients[from + 5] + two * coefficients[from + 8]);
        }
    }
}
