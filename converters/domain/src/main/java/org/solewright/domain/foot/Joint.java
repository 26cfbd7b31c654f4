package org.solewright.domain.foot;

import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.geometry.Vec3;

/**
 * A joint between two segments.
 *
 * @param name such as {@code ankle}, {@code midtarsal}, {@code metatarsophalangeal}
 * @param proximal segment above it
 * @param distal segment below it
 * @param kind how it moves
 * @param centre in the proximal segment's frame, m
 * @param axes in the proximal segment's frame, in the order of rotation; as many as the kind has, none for a ball
 * @param range of the first axis's angle; empty where unknown
 * @param lock where the joint holds still in stance; empty where it does not or is not known
 */
public record Joint(
        String name,
        SegmentName proximal,
        SegmentName distal,
        Kind kind,
        Located centre,
        List<Axis> axes,
        Optional<Range> range,
        Optional<Lock> lock) {

    /** How a joint moves. */
    public enum Kind {
        /** About one axis. */
        HINGE,
        /** About two axes, one after the other. */
        UNIVERSAL,
        /** About any axis through the centre. */
        BALL;

        /**
         * The word used in files.
         *
         * @return {@code hinge}, {@code universal} or {@code ball}
         */
        public String word() {
            return name().toLowerCase(Locale.ROOT);
        }

        private int axes() {
            return this == BALL ? 0 : this == HINGE ? 1 : 2;
        }
    }

    /**
     * An axis of rotation.
     *
     * @param name such as {@code talocrural}
     * @param direction unit vector in the proximal segment's frame; about the transverse axes (talocrural, midtarsal,
     *     metatarsophalangeal) z is positive, so that toes moving up count positive on both sides; the subtalar axis points
     *     forward and up, so that turning the sole inwards counts positive on a right foot and negative on a left one
     * @param basis where it comes from
     * @param sd standard deviation of its direction, rad; empty where unknown
     * @param source what it was taken from
     */
    public record Axis(String name, Vec3 direction, Basis basis, OptionalDouble sd, Source source) {

        /** What an axis was taken from. */
        public enum Source {
            /** The turning of its two segments against each other. */
            MOTION,
            /** The line between two landmarks. */
            LANDMARKS,
            /** A published mean, or the axis of a neighbouring joint or of the frame. */
            CONVENTION;

            /**
             * The word used in files.
             *
             * @return {@code motion}, {@code landmarks} or {@code convention}
             */
            public String word() {
                return name().toLowerCase(Locale.ROOT);
            }
        }

        /**
         * An axis that was not taken from motion.
         *
         * @param name such as {@code talocrural}
         * @param direction unit vector
         * @param basis measured means that it is the line between landmarks
         * @param sd rad; empty where unknown
         */
        public Axis(String name, Vec3 direction, Basis basis, OptionalDouble sd) {
            this(name, direction, basis, sd, basis == Basis.MEASURED ? Source.LANDMARKS : Source.CONVENTION);
        }

        private static final double TOLERANCE = 1e-6;

        /** Checks that the direction has unit length. */
        public Axis {
            if (!(Math.abs(direction.norm() - 1) < TOLERANCE)) {
                throw new IllegalArgumentException("axis " + name + " has length " + direction.norm() + ", expected 1");
            }
        }
    }

    /**
     * Range of the joint's angle, zero in the standing trial.
     *
     * @param min rad
     * @param max rad, not less than {@code min}
     * @param basis where it comes from
     */
    public record Range(double min, double max, Basis basis) {

        /** Checks the order. */
        public Range {
            if (!(min <= max)) {
                throw new IllegalArgumentException("joint range from " + min + " to " + max + " rad");
            }
        }
    }

    /**
     * The longest interval of stance in which the joint holds still.
     *
     * @param angle mean angle over it, rad, zero in the standing trial
     * @param stancePercent length of the interval, per cent of stance, 0-100
     * @param basis where it comes from
     */
    public record Lock(double angle, double stancePercent, Basis basis) {

        private static final double WHOLE = 100;

        /** Checks the share. */
        public Lock {
            if (!(stancePercent >= 0 && stancePercent <= WHOLE)) {
                throw new IllegalArgumentException("lock over " + stancePercent + " % of stance, expected 0 to 100 %");
            }
        }
    }

    /** Copies the list and checks the number of axes. */
    public Joint {
        axes = List.copyOf(axes);
        if (axes.size() != kind.axes()) {
            throw new IllegalArgumentException("joint " + name + " is a " + kind.word() + " and has " + axes.size()
                    + " axes, expected " + kind.axes());
        }
    }

    /**
     * The joint about other axes.
     *
     * @param newAxes as many as the kind has
     * @return the joint
     */
    public Joint withAxes(List<Axis> newAxes) {
        return new Joint(name, proximal, distal, kind, centre, newAxes, range, lock);
    }

    /**
     * The joint with the range and lock that walking showed.
     *
     * @param newRange empty where unknown
     * @param newLock empty where there is none
     * @return the joint
     */
    public Joint withMotion(Optional<Range> newRange, Optional<Lock> newLock) {
        return new Joint(name, proximal, distal, kind, centre, axes, newRange, newLock);
    }
}
