package org.solewright.analysis.dynamics;

import org.solewright.analysis.numerics.LowPass;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.geometry.Vec3;

/**
 * The ground reaction of one platform through the low-pass that the markers pass as well [Bisseling and Hof 2006]: loads
 * that are sharper than the motion would show up as joint moments that nobody made.
 */
public final class FilteredLoads {

    /** Above this share of the rate a filter would do nothing (design 03 section 2). */
    private static final double LARGEST_SHARE = 0.4;

    private final PlatformLoads platform;
    private final double[] force;
    private final double[] moment;

    private FilteredLoads(PlatformLoads platform, double[] force, double[] moment) {
        this.platform = platform;
        this.force = force;
        this.moment = moment;
    }

    /**
     * Filters the loads of a platform.
     *
     * @param platform loads
     * @param cutoff low-pass, Hz; 0: none
     * @return the filtered loads
     */
    public static FilteredLoads of(PlatformLoads platform, double cutoff) {
        double[] force = new double[3 * platform.samples()];
        double[] moment = new double[3 * platform.samples()];
        platform.copyForceTo(force, 0);
        platform.copyMomentTo(moment, 0);
        if (cutoff > 0 && cutoff < LARGEST_SHARE * platform.rate()) {
            LowPass filter = LowPass.of(cutoff, platform.rate());
            filter(filter, force);
            filter(filter, moment);
        }
        return new FilteredLoads(platform, force, moment);
    }

    private static void filter(LowPass filter, double[] xyz) {
        double[] one = new double[xyz.length / 3];
        for (int c = 0; c < 3; c++) {
            for (int i = 0; i < one.length; i++) {
                one[i] = xyz[3 * i + c];
            }
            double[] smooth = filter.apply(one);
            for (int i = 0; i < one.length; i++) {
                xyz[3 * i + c] = smooth[i];
            }
        }
    }

    /**
     * Whether there is a sample next to a time.
     *
     * @param time s
     * @return false outside the samples
     */
    public boolean covers(double time) {
        int sample = sample(time);
        return sample >= 0 && sample < platform.samples();
    }

    /**
     * The load on the subject at the sample next to a time.
     *
     * @param time s, one that {@link #covers}
     * @return wrench about the centre of the platform's surface, laboratory frame
     */
    public Wrench at(double time) {
        int i = 3 * sample(time);
        return new Wrench(
                new Vec3(force[i], force[i + 1], force[i + 2]),
                new Vec3(moment[i], moment[i + 1], moment[i + 2]),
                platform.centre());
    }

    private int sample(double time) {
        return (int) Math.round((time - platform.time(0)) * platform.rate());
    }
}
