package org.solewright.analysis.fitting;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.geometry.Vec3;

/** Whether a person stood upright on straight knees with the heel down, from the landmarks of the standing trial alone. */
final class UprightChecks {

    /** Lean of the limb, from ankle to hip (common practice). */
    private static final double LEANING = Math.toRadians(10);

    /** Knee flexion (common practice). */
    private static final double BENT = Math.toRadians(15);

    /** Slope of the foot from heel to metatarsal heads (common practice; bare feet have 5 to 10 deg). */
    private static final double STEEP = Math.toRadians(16);

    private UprightChecks() {}

    static List<Finding> of(LimbGeometry limb, JointCentres centres) {
        List<Finding> findings = new ArrayList<>();
        String side = limb.side().word();
        Vec3 hip = centres.hip().position();
        double lean = Math.atan2(Math.hypot(hip.x(), hip.z()), hip.y());
        if (lean > LEANING) {
            findings.add(Finding.warning(
                    "standing.tilted",
                    side,
                    text(
                            "the " + side
                                    + " limb leans by %.0f deg from ankle to hip in the standing trial: record standing"
                                    + " upright, check which way is up, or give --zero flat",
                            lean)));
        }
        Vec3 knee = centres.knee().position();
        Vec3 thigh = hip.minus(knee);
        double bend = Math.atan2(knee.cross(thigh).norm(), knee.dot(thigh));
        if (centres.knee().basis() == Basis.MEASURED && bend > BENT) {
            findings.add(Finding.warning(
                    "standing.knee-bent",
                    side,
                    text(
                            "the " + side
                                    + " knee is bent by %.0f deg in the standing trial, so that limb length and joint"
                                    + " angles start from there: record standing on straight knees, or give --zero flat",
                            bend)));
        }
        Vec3 heel = limb.required(Landmark.CALCANEUS_POSTERIOR);
        double slope = Math.atan2(heel.y() - limb.heads().y(), LimbGeometry.level(heel, limb.heads()));
        if (slope > STEEP) {
            findings.add(Finding.warning(
                    "standing.heel-raised",
                    side,
                    text(
                            "the " + side
                                    + " heel lies so high over the metatarsal heads in the standing trial that the foot"
                                    + " slopes by %.0f deg: record standing with the heel down, or give --zero flat",
                            slope)));
        }
        return findings;
    }

    private static String text(String form, double angle) {
        return String.format(Locale.ROOT, form, Math.toDegrees(angle));
    }
}
