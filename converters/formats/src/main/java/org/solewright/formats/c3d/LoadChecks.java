package org.solewright.formats.c3d;

import java.util.List;
import java.util.Locale;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.geometry.Vec3;

/** Whether the loads of a platform can be those of a subject who stands on it. */
final class LoadChecks {

    /** Vertical force over which a sample counts as loaded, N. Source: common practice. */
    static final double LOADED = 20;

    /** Vertical force, N, that no drift explains: sound recordings go down to -11 N. Source: the tests' recordings. */
    private static final double PULL = -50;

    /** Share of the loaded samples; sound recordings have none. Source: the tests' recordings. */
    private static final double MOST_OUTSIDE = 0.05;

    private LoadChecks() {}

    static void add(PlatformLoads loads, List<Finding> findings) {
        String where = "platform " + loads.number();
        Vec3 x = loads.corners().get(0).minus(loads.corners().get(1));
        Vec3 y = loads.corners().get(0).minus(loads.corners().get(3));
        int loaded = 0;
        int outside = 0;
        double lowest = 0;
        for (int i = 0; i < loads.samples(); i++) {
            double vertical = loads.vertical(i);
            lowest = Math.min(lowest, vertical);
            if (vertical > LOADED && loads.hasCentreOfPressure()) {
                loaded++;
                Vec3 arm = loads.centreOfPressure(i).minus(loads.centre());
                boolean isInside = Math.abs(arm.dot(x)) <= x.dot(x) / 2 && Math.abs(arm.dot(y)) <= y.dot(y) / 2;
                outside += isInside ? 0 : 1;
            }
        }
        if (lowest < PULL) {
            findings.add(Finding.warning(
                    "platform.negative-load",
                    where,
                    String.format(
                            Locale.ROOT,
                            "its vertical force goes down to %.1f N, as if it pulled the subject: check its channels,"
                                    + " their scale and the baseline",
                            lowest)));
        }
        if (outside > MOST_OUTSIDE * loaded) {
            findings.add(Finding.warning(
                    "platform.cop-outside",
                    where,
                    "the centre of pressure is outside the corners in " + Math.round(100.0 * outside / loaded)
                            + " % of the loaded samples: check ORIGIN, CORNERS and the order of the channels"));
        }
    }
}
