package org.solewright.domain.finding;

import java.util.List;

/** The cautions that stand in every model, summary and report. */
public final class Cautions {

    /** One sentence each, in the order they are printed. */
    public static final List<String> LINES = List.of(
            "For engineering and research.",
            "Not a medical device; not for diagnosis or treatment decisions, which belong to licensed practitioners"
                    + " under local rules.",
            "Model costs are mechanical work under stated assumptions, not metabolic energy.",
            "Check landmarks and platform geometry before use.");

    private Cautions() {}
}
