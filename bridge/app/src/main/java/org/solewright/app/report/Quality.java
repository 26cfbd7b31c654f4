package org.solewright.app.report;

import java.util.List;

/**
 * What limits the recordings and what they are usable for: the first thing on every page.
 *
 * @param summary one sentence that names every limit
 * @param aspects what was looked at, in a fixed order
 * @param uses questions and whether the recordings answer them
 */
public record Quality(String summary, List<Aspect> aspects, List<Usable> uses) {

    /**
     * Something that was looked at.
     *
     * @param name of it
     * @param isLimiting whether it limits what the recordings are usable for
     * @param state in a word
     * @param seen what was seen; empty where nothing
     * @param limits what that limits; empty where nothing
     */
    public record Aspect(String name, boolean isLimiting, String state, List<String> seen, List<String> limits) {

        /** Copies the lists. */
        public Aspect {
            seen = List.copyOf(seen);
            limits = List.copyOf(limits);
        }
    }

    /**
     * A question that a reader may have.
     *
     * @param question in words
     * @param answer {@code yes}, {@code in part} or {@code no}
     * @param why in words
     */
    public record Usable(String question, String answer, String why) {

        static Usable of(String question, int usable, int all, String why) {
            return new Usable(question, usable == 0 ? "no" : usable < all ? "in part" : "yes", why);
        }
    }

    /** Copies the lists. */
    public Quality {
        aspects = List.copyOf(aspects);
        uses = List.copyOf(uses);
    }
}
