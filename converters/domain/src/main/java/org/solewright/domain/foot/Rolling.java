package org.solewright.domain.foot;

import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;
import org.solewright.domain.geometry.Vec3;

/**
 * How the sole rolls on the ground; everything in it is measured in walking.
 *
 * @param arcs arcs fitted to the roll-over shape, at most one per frame
 * @param outline centre of pressure in the foot frame, in the order of time
 * @param pivots places of the sole about which the limb vaults, rear to front
 * @param cap sphere fitted to the path of the centre of pressure in the knee frame, for sprawled postures
 */
public record Rolling(List<Arc> arcs, List<OutlinePoint> outline, List<Pivot> pivots, Optional<Cap> cap) {

    /** Nothing known, as from a standing trial alone. */
    public static final Rolling UNKNOWN = new Rolling(List.of(), List.of(), List.of(), Optional.empty());

    /** The body frame of a roll-over shape; y points from the ankle up along it. */
    public enum Frame {
        /** Ankle to knee. */
        SHANK,
        /** Ankle to hip. */
        LIMB;

        /**
         * The word used in files.
         *
         * @return {@code shank} or {@code limb}
         */
        public String word() {
            return name().toLowerCase(Locale.ROOT);
        }
    }

    /**
     * A circular arc in the sagittal plane of its frame, origin at the ankle.
     *
     * @param frame the body frame
     * @param curvature 1/m; 0 where the shape is flat
     * @param curvatureSd standard deviation, 1/m; empty where unknown
     * @param radiusSd standard deviation of the radius, m; empty where unknown or flat
     * @param centreX forward of the ankle, m; empty where flat
     * @param centreY above the ankle, m; empty where flat
     * @param arcLength length of the fitted arc, m
     * @param rms root mean square distance of the path from the arc, m
     * @param steps number of stances behind it, 1 or more
     */
    public record Arc(
            Frame frame,
            double curvature,
            OptionalDouble curvatureSd,
            OptionalDouble radiusSd,
            OptionalDouble centreX,
            OptionalDouble centreY,
            double arcLength,
            double rms,
            int steps) {

        /** Checks that the numbers are finite. */
        public Arc {
            if (!Double.isFinite(curvature + arcLength + rms) || steps < 1) {
                throw new IllegalArgumentException("arc of curvature " + curvature + " 1/m, length " + arcLength
                        + " m, rms " + rms + " m over " + steps + " stances, expected finite numbers and 1 stance");
            }
        }

        /**
         * The radius.
         *
         * @return 1 / curvature, m; infinite where flat
         */
        public double radius() {
            return curvature == 0 ? Double.POSITIVE_INFINITY : 1 / curvature;
        }
    }

    /**
     * A place of the outline.
     *
     * @param x forward in the foot frame, m
     * @param y up in the foot frame, m
     */
    public record OutlinePoint(double x, double y) {}

    /**
     * A place of the sole about which the limb vaults.
     *
     * @param position along the sole from the heel, m
     * @param height above the sole's plane, m
     * @param from begin, per cent of stance
     * @param to end, per cent of stance
     */
    public record Pivot(double position, double height, double from, double to) {

        private static final double WHOLE = 100;

        /** Checks that the place is finite and the times lie in order within stance. */
        public Pivot {
            if (!Double.isFinite(position + height) || !(from >= 0 && from <= to && to <= WHOLE)) {
                throw new IllegalArgumentException("pivot at " + position + " m, " + height + " m high, from " + from
                        + " to " + to + " % of stance, expected a finite place and 0 to 100 % in order");
            }
        }
    }

    /**
     * A sphere.
     *
     * @param radius m
     * @param centre in the knee frame, m
     * @param rms root mean square distance of the path from the sphere, m
     */
    public record Cap(double radius, Vec3 centre, double rms) {

        /** Checks that the radius is more than 0 and all is finite. */
        public Cap {
            if (!(radius > 0) || !centre.isFinite() || !Double.isFinite(radius + rms)) {
                throw new IllegalArgumentException("cap of radius " + radius + " m about " + centre + ", rms " + rms
                        + " m, expected finite numbers and a radius of more than 0 m");
            }
        }
    }

    /** Copies the lists. */
    public Rolling {
        arcs = List.copyOf(arcs);
        outline = List.copyOf(outline);
        pivots = List.copyOf(pivots);
    }

    /**
     * The arc of a frame.
     *
     * @param frame which
     * @return the arc, empty where none was fitted
     */
    public Optional<Arc> arc(Frame frame) {
        return arcs.stream().filter(a -> a.frame() == frame).findFirst();
    }
}
