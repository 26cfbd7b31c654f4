package org.solewright.formats.c3d;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.geometry.Vec3;

/**
 * Force-platform channels to the ground reaction on the subject, in the laboratory frame (types 1 to 7).
 *
 * <p>Platform axes P: x along c1 + c4 - c2 - c3, z = x cross (c1 + c2 - c3 - c4), pointing down. ORIGIN points from the
 * measuring origin to the surface centre, so its z is negative; files with a positive one mean the opposite. Moments are
 * force times the file's length unit whatever the label says. Whether a file stores reaction or action is told by the sign
 * of the vertical force on its most loaded platform.
 */
final class PlatformReader {

    private static final int FORCES = 3;
    private static final double UNLOADED = 10;
    private static final double RISE = 50;
    private static final double LOW_PERCENTILE = 0.005;

    private final C3dFile file;
    private final double metres;
    private final boolean isUnitKnown;
    private final List<Finding> findings;

    PlatformReader(C3dFile file, double metres, boolean isUnitKnown, List<Finding> findings) {
        this.file = file;
        this.metres = metres;
        this.isUnitKnown = isUnitKnown;
        this.findings = findings;
    }

    /** A platform that can be used, with its wrench in platform axes about the surface centre, before the sign. */
    private static final class Usable {
        private final C3dPlatform platform;
        private final PlatformAxes axes;
        private final boolean hasCop;
        private final double[] force;
        private final double[] moment;

        Usable(C3dPlatform platform, PlatformAxes axes, boolean hasCop, double[] force, double[] moment) {
            this.platform = platform;
            this.axes = axes;
            this.hasCop = hasCop;
            this.force = force;
            this.moment = moment;
        }

        double vertical(int sample) {
            return -force[FORCES * sample + 2];
        }
    }

    List<PlatformLoads> loads() {
        List<Usable> usable = new ArrayList<>();
        for (C3dPlatform p : file.platforms()) {
            usable(p).ifPresent(usable::add);
        }
        double sign = sign(usable);
        List<PlatformLoads> loads = new ArrayList<>();
        for (Usable u : usable) {
            PlatformLoads of = loads(u, sign);
            LoadChecks.add(of, findings);
            loads.add(of);
        }
        return loads;
    }

    private Optional<Usable> usable(C3dPlatform p) {
        String where = "platform " + p.number();
        if (!PlatformChannels.knows(p.type())) {
            return refuse(where, "is of type " + p.type() + "; types 1 to 7 are known");
        }
        int channels = PlatformChannels.width(p.type());
        if (p.channels().size() < channels
                || p.channels().subList(0, channels).stream()
                        .anyMatch(c -> c < 1 || c > file.analog().channels())) {
            return refuse(
                    where,
                    "names channels " + p.channels() + ", expected " + channels + " between 1 and "
                            + file.analog().channels());
        }
        if (!(file.analog().rate() > 0 && file.rate() > 0)) {
            return refuse(where, "has no sample rate");
        }
        if (!p.corners().stream().allMatch(Vec3::isFinite)) {
            return refuse(where, "has corners that are not finite");
        }
        if (isUnitKnown && !LengthUnit.hasPlausibleSides(p.corners(), metres)) {
            return refuse(where, "has sides outside 0.05 to 3 m");
        }
        PlatformAxes axes;
        try {
            axes = PlatformAxes.of(p.corners());
        } catch (IllegalArgumentException e) {
            return refuse(where, "has corners that span no plane");
        }
        Optional<PlatformChannels> converted = PlatformChannels.of(p);
        if (converted.isEmpty()) {
            return refuse(
                    where,
                    "is of type " + p.type() + " and has no " + PlatformChannels.neededMatrix(p.type())
                            + " calibration matrix");
        }
        PlatformChannels six = converted.get();
        if (p.type() == 6 && six.hasSensorDistances()) {
            findings.add(Finding.note(
                    "platform.channel-order",
                    where,
                    "its twelve channels are taken as Fx1 Fy1 Fz1 to Fx4 Fy4 Fz4 of the sensors at corners 1 to 4: check the"
                            + " centre of pressure"));
        }
        boolean hasOrigin = p.origin().isFinite();
        boolean isZero = hasOrigin && p.origin().norm() == 0;
        boolean hasCop =
                isUnitKnown && (six.isPressureCentre() || (hasOrigin && !(six.hasSensorDistances() && isZero)));
        if (!hasCop) {
            findings.add(Finding.warning(
                    "platform.no-cop",
                    where,
                    (isUnitKnown ? "its ORIGIN is " + (isZero ? "0" : "not stored") : "the length unit is not known")
                            + ": its forces are used, a centre of pressure cannot be computed"));
        }
        return Optional.of(wrench(p, six, axes, hasCop));
    }

    private Optional<Usable> refuse(String where, String why) {
        findings.add(Finding.warning(
                "platform.unusable", where, "the platform " + why + "; it is left out, the others are used"));
        return Optional.empty();
    }

    private Vec3 origin(C3dPlatform p, PlatformChannels six) {
        Vec3 o = p.origin();
        if (!o.isFinite()) {
            return Vec3.ZERO;
        }
        boolean isUpward = o.z() > 0;
        if (isUpward && !six.isPressureCentre()) {
            findings.add(Finding.warning(
                    "platform.origin-sign",
                    "platform " + p.number(),
                    String.format(
                            Locale.ROOT,
                            "ORIGIN has z = %.1f %s, expected negative (from the measuring origin to the surface, z down);"
                                    + " %s reversed",
                            o.z(),
                            file.unit(),
                            six.hasSensorDistances() ? "its z is" : "it is")));
        }
        if (six.hasSensorDistances()) {
            return new Vec3(o.x(), o.y(), isUpward ? -o.z() : o.z());
        }
        return isUpward ? o.times(-1) : o;
    }

    private Usable wrench(C3dPlatform p, PlatformChannels six, PlatformAxes axes, boolean hasCop) {
        int n = file.analog().samples();
        double[] c = channels(p, six, n);
        Vec3 o = origin(p, six);
        Vec3 arm = six.hasSensorDistances() ? new Vec3(0, 0, o.z()) : o;
        double[] force = new double[FORCES * n];
        double[] moment = new double[FORCES * n];
        double[] w = new double[6];
        for (int i = 0; i < n; i++) {
            six.six(c, i * six.width(), o, w);
            int at = FORCES * i;
            System.arraycopy(w, 0, force, at, FORCES);
            if (six.isPressureCentre()) {
                // Channels 4 and 5 are the centre of pressure from the surface centre, 6 the free moment about it.
                moment[at] = w[4] * w[2] * metres;
                moment[at + 1] = -w[3] * w[2] * metres;
                moment[at + 2] = (w[3] * w[1] - w[4] * w[0] + w[5]) * metres;
            } else {
                // M about the surface centre = M about the measuring origin - o x F.
                moment[at] = (w[3] - (arm.y() * w[2] - arm.z() * w[1])) * metres;
                moment[at + 1] = (w[4] - (arm.z() * w[0] - arm.x() * w[2])) * metres;
                moment[at + 2] = (w[5] - (arm.x() * w[1] - arm.y() * w[0])) * metres;
            }
        }
        return new Usable(p, axes, hasCop, force, moment);
    }

    /** The platform's channels, {@code [samples][width]}, less the mean of the ZERO window where that is unloaded. */
    private double[] channels(C3dPlatform p, PlatformChannels six, int n) {
        int width = six.width();
        double[] c = new double[n * width];
        for (int k = 0; k < width; k++) {
            int channel = p.channels().get(k) - 1;
            for (int i = 0; i < n; i++) {
                c[i * width + k] = file.analog().value(i, channel);
            }
        }
        int[] window = zeroWindow(n);
        if (window.length == 0) {
            return c;
        }
        if (!isUnloaded(p, six, c, n, window)) {
            findings.add(Finding.note(
                    "platform.zero-loaded",
                    "platform " + p.number(),
                    "it is not seen unloaded in the frames that ZERO names; no baseline is taken off"));
            return c;
        }
        for (int k = 0; k < width; k++) {
            double sum = 0;
            for (int i = window[0]; i < window[1]; i++) {
                sum += c[i * width + k];
            }
            double mean = sum / (window[1] - window[0]);
            for (int i = 0; i < n; i++) {
                c[i * width + k] -= mean;
            }
        }
        return c;
    }

    /** Samples of the ZERO window, from inclusive, to exclusive; empty where there is none. */
    private int[] zeroWindow(int n) {
        Optional<C3dParameter> zero = file.parameters().find("FORCE_PLATFORM", "ZERO");
        int frames = file.frames();
        if (zero.isEmpty() || zero.get().count() < 2 || frames == 0) {
            return new int[0];
        }
        int perFrame = n / frames;
        long first = Math.max(1, (long) zero.get().number(0));
        long last = Math.min(frames, (long) zero.get().number(1));
        return last < first ? new int[0] : new int[] {(int) (first - 1) * perFrame, (int) last * perFrame};
    }

    private static boolean isUnloaded(C3dPlatform p, PlatformChannels six, double[] c, int n, int[] window) {
        double[] vertical = new double[n];
        double[] w = new double[6];
        for (int i = 0; i < n; i++) {
            six.six(c, i * six.width(), p.origin(), w);
            vertical[i] = w[2];
        }
        double[] sorted = vertical.clone();
        Arrays.sort(sorted);
        // The stored sign is not known yet: the load rises to the side on which the extreme is farther from the median.
        double median = sorted[n / 2];
        boolean isNegative = median - sorted[0] > sorted[n - 1] - median;
        int rank = (int) Math.round(LOW_PERCENTILE * (n - 1));
        double low = isNegative ? -sorted[n - 1 - rank] : sorted[rank];
        double high = isNegative ? -sorted[0] : sorted[n - 1];
        double mean = 0;
        for (int i = window[0]; i < window[1]; i++) {
            mean += (isNegative ? -vertical[i] : vertical[i]) / (window[1] - window[0]);
        }
        return Math.abs(mean - low) <= UNLOADED && high - low > RISE;
    }

    /**
     * +1 where the file stores the reaction on the subject, -1 where it stores the action on the floor: by the most
     * loaded platform whose load changes, since a broken one may show a great force that never does; where none
     * changes, by the most loaded one. Noise turns nothing.
     */
    private double sign(List<Usable> usable) {
        double extreme = 0;
        boolean isChanging = false;
        for (Usable u : usable) {
            double low = Double.POSITIVE_INFINITY;
            double high = Double.NEGATIVE_INFINITY;
            for (int i = 0; i < u.force.length / FORCES; i++) {
                low = Math.min(low, u.vertical(i));
                high = Math.max(high, u.vertical(i));
            }
            double farther = Math.abs(low) > Math.abs(high) ? low : high;
            boolean changes = high - low > RISE;
            boolean isBetter = changes == isChanging ? Math.abs(farther) > Math.abs(extreme) : changes;
            if (isBetter && Double.isFinite(farther)) {
                extreme = farther;
                isChanging = changes;
            }
        }
        if (extreme < -LoadChecks.LOADED) {
            findings.add(Finding.note(
                    "platform.action-stored",
                    "",
                    "the platforms' channels hold the force on the floor; it is reversed to the force on the subject"));
        }
        return extreme < -LoadChecks.LOADED ? -1 : 1;
    }

    private PlatformLoads loads(Usable u, double sign) {
        int n = u.force.length / FORCES;
        double[] force = new double[FORCES * n];
        double[] moment = new double[FORCES * n];
        for (int i = 0; i < n; i++) {
            put(u.axes.toLaboratory(u.force, FORCES * i, sign), force, FORCES * i);
            put(u.axes.toLaboratory(u.moment, FORCES * i, sign), moment, FORCES * i);
        }
        List<Vec3> corners =
                u.platform.corners().stream().map(c -> c.times(metres)).toList();
        return new PlatformLoads(
                u.platform.number(),
                u.platform.type(),
                corners,
                u.axes.z().times(-1),
                file.analog().rate(),
                (file.firstFrame() - 1) / file.rate(),
                u.hasCop,
                force,
                moment);
    }

    private static void put(Vec3 v, double[] out, int at) {
        out[at] = v.x();
        out[at + 1] = v.y();
        out[at + 2] = v.z();
    }
}
