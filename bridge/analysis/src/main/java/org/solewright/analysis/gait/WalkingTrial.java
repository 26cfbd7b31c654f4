package org.solewright.analysis.gait;

import java.util.Collections;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Vec3;

/**
 * One pass of walking as the analysis takes it: smoothed tracks and loads in the laboratory frame.
 *
 * @param name for messages
 * @param rate point rate, Hz
 * @param startTime time of the first frame on the recording's clock, s
 * @param up unit vector against gravity in the laboratory frame
 * @param pelvis the pelvis's path, {@code [frames][3]}, m
 * @param feet tracks by side
 * @param platforms loads
 * @param beltSpeed speed of the treadmill's belts, m/s, 0 over ground; platforms are then the belts and the laboratory's
 *     frame is at rest
 */
public record WalkingTrial(
        String name,
        double rate,
        double startTime,
        Vec3 up,
        Track pelvis,
        Map<Side, FootTracks> feet,
        List<PlatformLoads> platforms,
        double beltSpeed) {

    /** A path that is shared with its maker and not to be changed. */
    public static final class Track {

        private final double[] xyz;

        /**
         * A path.
         *
         * @param xyz {@code [frames][3]} row-major, m, NaN where lost; not copied
         */
        public Track(double[] xyz) {
            this.xyz = xyz;
        }

        /**
         * Number of frames.
         *
         * @return zero or more
         */
        public int frames() {
            return xyz.length / 3;
        }

        boolean isTracked(int frame) {
            return !Double.isNaN(xyz[3 * frame]);
        }

        Vec3 at(int frame) {
            return FootTracks.at(xyz, frame);
        }

        double[] samples() {
            return xyz;
        }
    }

    /** Copies the collections and checks the speed. */
    public WalkingTrial {
        if (!(beltSpeed >= 0)) {
            throw new IllegalArgumentException("belt speed " + beltSpeed + " m/s, expected 0 or more");
        }
        feet = feet.isEmpty() ? Map.of() : Collections.unmodifiableMap(new EnumMap<>(feet));
        platforms = List.copyOf(platforms);
    }

    /**
     * Tracks of a foot.
     *
     * @param side one of {@link #feet()}
     * @return tracks in the laboratory frame
     * @throws IllegalArgumentException where that foot is not tracked
     */
    FootTracks foot(Side side) {
        FootTracks foot = feet.get(side);
        if (foot == null) {
            throw new IllegalArgumentException(side.word() + " foot asked for, tracked are " + feet.keySet());
        }
        return foot;
    }

    boolean isOnTreadmill() {
        return beltSpeed > 0;
    }

    /** How far the belt has carried a point of it backwards since the recording's start. */
    double carried(double time) {
        return beltSpeed * (time - startTime);
    }

    int frames() {
        return pelvis.frames();
    }

    double time(int frame) {
        return startTime + frame / rate;
    }

    /** Nearest frame to a time, within the recording. */
    int frame(double time) {
        return (int) Math.max(0, Math.min(frames() - 1, Math.round((time - startTime) * rate)));
    }
}
