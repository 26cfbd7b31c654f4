package org.solewright.analysis.gait;

import java.util.ArrayList;
import java.util.EnumSet;
import java.util.List;
import java.util.Locale;
import java.util.Set;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.gait.Stance;
import org.solewright.domain.gait.Use;

/**
 * The second look at a subject's stances, over all passes: a stance whose centre of pressure travels less than 0.85 of
 * the subject's other stances was not wholly on its platform, even where the outline lies inside.
 */
public final class ContactReview {

    private static final double LEAST_TRAVEL = 0.85;

    private ContactReview() {}

    /**
     * Reviews all stances.
     *
     * @param passes a subject's passes
     * @return the passes with stances marked and findings added
     */
    public static List<Pass> of(List<Pass> passes) {
        List<Pass> reviewed = new ArrayList<>();
        for (Pass pass : passes) {
            List<PlatformStance> stances = new ArrayList<>();
            List<Finding> findings = new ArrayList<>();
            for (PlatformStance s : pass.platformStances()) {
                boolean hasBorders = pass.trial().platforms().stream()
                        .filter(p -> s.stance().platforms().contains(p.number()))
                        .allMatch(PlatformLoads::hasBorders);
                stances.add(hasBorders ? review(s, passes, findings) : s);
            }
            reviewed.add(pass.with(stances, findings));
        }
        return reviewed;
    }

    private static PlatformStance review(PlatformStance s, List<Pass> passes, List<Finding> findings) {
        double sum = 0;
        double sumStart = 0;
        double sumEnd = 0;
        int n = 0;
        for (Pass p : passes) {
            for (PlatformStance o : p.platformStances()) {
                if (!o.equals(s) && o.stance().whole() && !Double.isNaN(o.copTravel())) {
                    sum += o.copTravel();
                    sumStart += o.copStart();
                    sumEnd += o.copEnd();
                    n++;
                }
            }
        }
        if (n == 0 || !s.stance().whole() || !(s.copTravel() < LEAST_TRAVEL * sum / n)) {
            return s;
        }
        boolean isLate = s.copStart() - sumStart / n > sumEnd / n - s.copEnd();
        StanceFinder.Border border = isLate ? StanceFinder.Border.REAR : StanceFinder.Border.FRONT;
        String why = String.format(
                Locale.ROOT,
                "centre of pressure travels %.2f foot lengths, the subject's other stances %.2f; the %s of the foot was"
                        + " not on the platform",
                s.copTravel(),
                sum / n,
                isLate ? "rear" : "front");
        Set<Use> excluded = EnumSet.copyOf(border.excludes());
        Stance old = s.stance();
        findings.add(Finding.warning(
                "loads.foot-over-edge",
                old.trial() + " platform " + old.platforms() + " " + old.side().word(),
                why + "; not used for " + StanceFinder.words(excluded)));
        return s.with(
                new Stance(old.trial(), old.side(), old.platforms(), old.start(), old.end(), false, excluded, why));
    }
}
