package org.solewright.analysis.fitting;

import java.util.Optional;
import org.solewright.domain.foot.ChainPlan;

/**
 * How a foot is divided beyond the number of its parts.
 *
 * @param plan a plan of the user's own, in place of a number of parts
 * @param isFunctionalToeAxis whether the metatarsophalangeal joint lies at its functional axis, 16 % of foot length
 *     before and 2 % above the line of the heads [Front Bioeng Biotechnol 2014], instead of on that line
 */
public record FootChoices(Optional<ChainPlan> plan, boolean isFunctionalToeAxis) {

    /** No plan of the user's own, toes that turn about the line of the metatarsal heads. */
    public static final FootChoices DEFAULT = new FootChoices(Optional.empty(), false);
}
