package org.solewright.domain.gait;

import java.util.List;
import org.solewright.domain.geometry.Vec3;

/**
 * The ground reaction on the subject measured by one platform, in the laboratory frame.
 *
 * <p>The load is a wrench about the centre of the platform's surface: force and moment per sample. Centre of pressure
 * and free moment follow from it. The force that acts <em>on the subject</em> is stored: standing still it points
 * along {@link #up()}.
 */
public final class PlatformLoads {

    /** Type of loads that no platform with borders measured, as those of a simulation. */
    public static final int BORDERLESS = 0;

    private final int number;
    private final int type;
    private final List<Vec3> corners;
    private final Vec3 centre;
    private final Vec3 up;
    private final double rate;
    private final double startTime;
    private final boolean hasCentreOfPressure;
    private final double[] force;
    private final double[] moment;

    /**
     * Loads of one platform.
     *
     * @param number number of the platform in the file, from 1
     * @param type platform type of the C3D format; {@link #BORDERLESS} for loads whose surface has no known borders
     * @param corners four corners in the laboratory frame, m
     * @param up unit normal of the surface, away from the floor
     * @param rate samples per second, Hz, more than 0
     * @param startTime time of the first sample on the recording's clock, s
     * @param hasCentreOfPressure whether the moment is known
     * @param force {@code [samples][3]} row-major, N, on the subject, laboratory frame; copied
     * @param moment {@code [samples][3]} row-major, N m, on the subject about the surface centre, laboratory frame;
     *     copied; not looked at where the centre of pressure is unknown
     * @throws IllegalArgumentException where a shape or the rate is wrong
     */
    public PlatformLoads(
            int number,
            int type,
            List<Vec3> corners,
            Vec3 up,
            double rate,
            double startTime,
            boolean hasCentreOfPressure,
            double[] force,
            double[] moment) {
        if (corners.size() != 4) {
            throw new IllegalArgumentException(
                    "platform " + number + " has " + corners.size() + " corners, expected 4");
        }
        if (force.length % 3 != 0 || moment.length != force.length) {
            throw new IllegalArgumentException("platform " + number + " has " + force.length + " force and "
                    + moment.length + " moment components, expected equal multiples of 3");
        }
        if (!(rate > 0)) {
            throw new IllegalArgumentException("platform " + number + " rate " + rate + " Hz, expected more than 0 Hz");
        }
        this.number = number;
        this.type = type;
        this.corners = List.copyOf(corners);
        this.centre = corners.get(0)
                .plus(corners.get(1))
                .plus(corners.get(2))
                .plus(corners.get(3))
                .times(0.25);
        this.up = up.unit();
        this.rate = rate;
        this.startTime = startTime;
        this.hasCentreOfPressure = hasCentreOfPressure;
        this.force = force.clone();
        this.moment = moment.clone();
    }

    /**
     * Number of the platform in the file.
     *
     * @return from 1
     */
    public int number() {
        return number;
    }

    /**
     * Whether the corners are the platform's own.
     *
     * @return false where the surface has no known borders, so that no contact can be over one
     */
    public boolean hasBorders() {
        return type != BORDERLESS;
    }

    /**
     * Platform type of the C3D format.
     *
     * @return 1 to 7; {@link #BORDERLESS} for other loads
     */
    public int type() {
        return type;
    }

    /**
     * Corners in the laboratory frame, m, in the file's order.
     *
     * @return four positions
     */
    public List<Vec3> corners() {
        return corners;
    }

    /**
     * Mean of the corners, m.
     *
     * @return position in the laboratory frame
     */
    public Vec3 centre() {
        return centre;
    }

    /**
     * Unit normal of the surface, away from the floor.
     *
     * @return direction in the laboratory frame
     */
    public Vec3 up() {
        return up;
    }

    /**
     * Samples per second.
     *
     * @return Hz
     */
    public double rate() {
        return rate;
    }

    /**
     * Number of samples.
     *
     * @return zero or more
     */
    public int samples() {
        return force.length / 3;
    }

    /**
     * Time of a sample on the recording's clock.
     *
     * @param sample zero-based
     * @return s
     */
    public double time(int sample) {
        return startTime + sample / rate;
    }

    /**
     * Whether the moment, and with it the centre of pressure, is known.
     *
     * @return true where known
     */
    public boolean hasCentreOfPressure() {
        return hasCentreOfPressure;
    }

    /**
     * Force on the subject.
     *
     * @param sample zero-based
     * @return N, laboratory frame
     */
    public Vec3 force(int sample) {
        return new Vec3(force[3 * sample], force[3 * sample + 1], force[3 * sample + 2]);
    }

    /**
     * Component of the force along {@link #up()}.
     *
     * @param sample zero-based
     * @return N, positive when the subject is pushed up
     */
    public double vertical(int sample) {
        return force[3 * sample] * up.x() + force[3 * sample + 1] * up.y() + force[3 * sample + 2] * up.z();
    }

    /**
     * Intersection of the wrench axis with the platform's surface. Near zero load it runs away: ask only where the
     * vertical force is over a threshold.
     *
     * @param sample zero-based
     * @return m, laboratory frame; NaN where unknown
     */
    public Vec3 centreOfPressure(int sample) {
        if (!hasCentreOfPressure) {
            return new Vec3(Double.NaN, Double.NaN, Double.NaN);
        }
        Vec3 m = new Vec3(moment[3 * sample], moment[3 * sample + 1], moment[3 * sample + 2]);
        return centre.plus(up.cross(m).times(1 / vertical(sample)));
    }

    /**
     * Moment about the surface's normal at the centre of pressure, positive by the right-hand rule about {@link #up()}.
     *
     * @param sample zero-based
     * @return N m, on the subject; NaN where unknown
     */
    public double freeMoment(int sample) {
        if (!hasCentreOfPressure) {
            return Double.NaN;
        }
        Vec3 m = new Vec3(moment[3 * sample], moment[3 * sample + 1], moment[3 * sample + 2]);
        Vec3 arm = centreOfPressure(sample).minus(centre);
        return m.minus(arm.cross(force(sample))).dot(up);
    }

    /**
     * All force samples into the caller's array.
     *
     * @param out target, {@code [samples][3]} row-major, N, laboratory frame
     * @param offset first index written
     */
    public void copyForceTo(double[] out, int offset) {
        System.arraycopy(force, 0, out, offset, force.length);
    }

    /**
     * All moment samples into the caller's array.
     *
     * @param out target, {@code [samples][3]} row-major, N m, about the surface centre, laboratory frame
     * @param offset first index written
     */
    public void copyMomentTo(double[] out, int offset) {
        System.arraycopy(moment, 0, out, offset, moment.length);
    }
}
