package org.solewright.domain.motion;

import org.solewright.domain.geometry.Vec3;

/**
 * The path of one labelled point in the laboratory frame, in metres; a lost sample is NaN in all three components.
 * Bulk samples are copied on the way in and out.
 */
public final class PointTrack {

    private final String label;
    private final double[] xyz;

    private PointTrack(String label, double[] xyz) {
        this.label = label;
        this.xyz = xyz;
    }

    /**
     * A track from flat samples.
     *
     * @param label name of the point, unique within a recording
     * @param xyz {@code [frames][3]} row-major, m; NaN where lost; copied
     * @return the track
     * @throws IllegalArgumentException where the length is not a multiple of three
     */
    public static PointTrack of(String label, double[] xyz) {
        if (xyz.length % 3 != 0) {
            throw new IllegalArgumentException(
                    "point " + label + " has " + xyz.length + " components, expected a multiple of 3");
        }
        return new PointTrack(label, xyz.clone());
    }

    /**
     * Name of the point.
     *
     * @return the label
     */
    public String label() {
        return label;
    }

    /**
     * Number of frames.
     *
     * @return frames, zero or more
     */
    public int frames() {
        return xyz.length / 3;
    }

    /**
     * One sample.
     *
     * @param frame zero-based
     * @return position in m, NaN components where lost
     */
    public Vec3 at(int frame) {
        return new Vec3(xyz[3 * frame], xyz[3 * frame + 1], xyz[3 * frame + 2]);
    }

    /**
     * Whether the sample is there.
     *
     * @param frame zero-based
     * @return true where all components are numbers
     */
    public boolean isValid(int frame) {
        return !Double.isNaN(xyz[3 * frame] + xyz[3 * frame + 1] + xyz[3 * frame + 2]);
    }

    /**
     * All samples into the caller's array.
     *
     * @param out target, {@code [frames][3]} row-major, m
     * @param offset first index written
     */
    public void copyTo(double[] out, int offset) {
        System.arraycopy(xyz, 0, out, offset, xyz.length);
    }
}
