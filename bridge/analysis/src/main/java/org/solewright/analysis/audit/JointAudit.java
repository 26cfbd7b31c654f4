package org.solewright.analysis.audit;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.solewright.domain.finding.Finding;

/** Audit of what results say of their own joints: power against moment times rate of the angle. */
public final class JointAudit {

    /** Power below this, W, is no matter (a thousandth of what an ankle gives in walking). */
    private static final double LEAST_POWER = 0.3;

    private static final double EXPLAINED = 0.25;

    private JointAudit() {}

    /**
     * A joint's columns about one axis.
     *
     * @param name such as {@code right ankle}
     * @param angle name of the column of its angle
     * @param moment name of the column of its moment
     * @param power name of the column of its power
     * @param values angle in rad, moment in N m, power in W, {@code [samples][3]} as a vector's; NaN where lost
     */
    public record Columns(String name, String angle, String moment, String power, AuditedVector values) {}

    /**
     * Compares each joint's power with its moment times the central difference of its angle.
     *
     * @param joints of the results, one axis each
     * @param settings limit: rms of the difference over rms of the power
     * @param where for messages
     * @return errors over the limit, one a joint at most
     */
    public static List<Finding> of(List<Columns> joints, AuditSettings settings, String where) {
        List<Finding> found = new ArrayList<>();
        for (Columns joint : joints) {
            power(joint, settings, where).ifPresent(found::add);
        }
        return found;
    }

    private static Optional<Finding> power(Columns joint, AuditSettings settings, String where) {
        AuditedVector v = joint.values();
        double pp = 0;
        double pq = 0;
        double qq = 0;
        int n = 0;
        for (int i = 1; i < v.samples() - 1; i++) {
            double own = v.at(i, 1) * (v.at(i + 1, 0) - v.at(i - 1, 0)) * v.rate() / 2;
            double given = v.at(i, 2);
            if (!Double.isNaN(own + given)) {
                pp += given * given;
                pq += given * own;
                qq += own * own;
                n++;
            }
        }
        double size = Math.sqrt(Math.max(pp, qq) / Math.max(1, n));
        double difference = Math.sqrt(Math.max(0, pp - 2 * pq + qq) / Math.max(1, n));
        if (n == 0 || size < LEAST_POWER || difference <= settings.limit() * size) {
            return Optional.empty();
        }
        double factor = pp > 0 ? pq / pp : 0;
        boolean isFactor = pp > 0 && Math.sqrt(Math.max(0, qq - factor * pq)) < EXPLAINED * Math.sqrt(qq);
        return Optional.of(Finding.error(
                "audit.joint-power",
                where + " " + joint.name(),
                String.format(
                        Locale.ROOT,
                        "column '%s' is not '%s' times the rate of '%s': they differ by %.1f W rms of %.1f W%s",
                        joint.power(),
                        joint.moment(),
                        joint.angle(),
                        difference,
                        size,
                        isFactor ? "; times " + Factor.text(factor) + " they agree" : "")));
    }
}
