package org.solewright.domain.motion;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Vec3;

/**
 * What the columns of somebody's result files mean. Without file names it is a template that a laboratory writes once for
 * its platform.
 *
 * @param subject identifier; may be empty
 * @param mass body mass, kg, where stated
 * @param axes what the tables' axes mean
 * @param tables delimited tables
 * @param recordings C3D files
 */
public record ResultsMap(
        String subject, OptionalDouble mass, Axes axes, List<Table> tables, List<RecordingFile> recordings) {

    /** Copies the lists. */
    public ResultsMap {
        tables = List.copyOf(tables);
        recordings = List.copyOf(recordings);
    }

    /** A direction of the subject. */
    public enum Direction {
        /** Where the subject walks to. */
        FORWARD(1, 0, 0),
        /** Where the subject comes from. */
        BACKWARD(-1, 0, 0),
        /** Against gravity. */
        UP(0, 0, 1),
        /** With gravity. */
        DOWN(0, 0, -1),
        /** To the subject's left. */
        LEFT(0, 1, 0),
        /** To the subject's right. */
        RIGHT(0, -1, 0);

        private final int forward;
        private final int left;
        private final int up;

        Direction(int forward, int left, int up) {
            this.forward = forward;
            this.left = left;
            this.up = up;
        }

        /**
         * The direction in the laboratory frame of results: x forward, y left, z up.
         *
         * @return unit vector
         */
        public Vec3 vector() {
            return new Vec3(forward, left, up);
        }
    }

    /**
     * What the tables' axes mean.
     *
     * @param x direction of the tables' x
     * @param y of their y
     * @param z of their z
     */
    public record Axes(Direction x, Direction y, Direction z) {

        /** Checks that the three are along different lines. */
        public Axes {
            double volume = x.vector().cross(y.vector()).dot(z.vector());
            if (Math.abs(volume) != 1) {
                throw new IllegalArgumentException("axes " + x + ", " + y + " and " + z
                        + " lie along fewer than three lines, expected one of each pair of directions");
            }
        }

        /**
         * A vector of a table in the laboratory frame.
         *
         * @param a component along the table's x
         * @param b along its y
         * @param c along its z
         * @return x forward, y left, z up
         */
        public Vec3 toLaboratory(double a, double b, double c) {
            return x.vector().times(a).plus(y.vector().times(b)).plus(z.vector().times(c));
        }
    }

    /** What a column holds. */
    public enum Quantity {
        /** Centre of mass of the body, m. */
        COM_POSITION("com-position"),
        /** Velocity of the centre of mass, m/s. */
        COM_VELOCITY("com-velocity"),
        /** Force of the ground on the subject, N. */
        GROUND_FORCE("ground-force"),
        /** Centre of pressure, m. */
        COP("cop"),
        /** Moment about the vertical through the centre of pressure, N m. */
        FREE_MOMENT("free-moment"),
        /** A landmark or joint centre, m. */
        POINT_POSITION("point-position"),
        /** Orientation of a segment. */
        SEGMENT_ORIENTATION("segment-orientation"),
        /** Angle of a joint, rad. */
        JOINT_ANGLE("joint-angle"),
        /** Moment of a joint, N m. */
        JOINT_MOMENT("joint-moment"),
        /** Power of a joint, W. */
        JOINT_POWER("joint-power");

        private final String word;

        Quantity(String word) {
            this.word = word;
        }

        /**
         * The word used in files.
         *
         * @return such as {@code ground-force}
         */
        public String word() {
            return word;
        }
    }

    /**
     * One column.
     *
     * @param name in the table's header, or its number from 1 where there is none
     * @param quantity what it holds
     * @param of landmark, joint or platform; may be empty
     * @param side whose
     * @param axis 0 x, 1 y, 2 z; -1 where the quantity has no axis
     * @param scale by which its numbers become SI units
     */
    public record Column(String name, Quantity quantity, String of, Optional<Side> side, int axis, double scale) {}

    /**
     * A delimited table.
     *
     * @param file name; empty in a template
     * @param delimiter between cells; a blank: any run of blanks and tabulators
     * @param skipLines lines above the header
     * @param hasHeader whether a line of names precedes the numbers
     * @param timeColumn name of the time column; empty where there is none
     * @param timeScale by which its numbers become seconds
     * @param rate samples per second, Hz, where there is no time column
     * @param columns what is read
     */
    public record Table(
            String file,
            char delimiter,
            int skipLines,
            boolean hasHeader,
            String timeColumn,
            double timeScale,
            OptionalDouble rate,
            List<Column> columns) {

        /** Copies the list. */
        public Table {
            columns = List.copyOf(columns);
        }
    }

    /**
     * A C3D file among the results.
     *
     * @param file name
     * @param landmarks name of its landmark map
     */
    public record RecordingFile(String file, String landmarks) {}
}
