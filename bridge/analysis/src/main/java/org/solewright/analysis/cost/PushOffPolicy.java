package org.solewright.analysis.cost;

import java.util.Arrays;
import java.util.stream.Collectors;
import org.solewright.analysis.dynamics.Limit;
import org.solewright.analysis.dynamics.LimitException;

/** Where a vaulting limb pushes off. */
public enum PushOffPolicy {
    /** Nowhere: v+ = v- cos(angle). */
    NONE("none"),
    /** At every transition, so that the speed is kept. */
    ALL("all"),
    /** At the last transition alone, so that the next step starts at the same speed. */
    TOE("toe");

    private final String word;

    PushOffPolicy(String word) {
        this.word = word;
    }

    /**
     * The word of scripts.
     *
     * @return {@code none}, {@code all} or {@code toe}
     */
    public String word() {
        return word;
    }

    /**
     * The policy of a word.
     *
     * @param word of a script
     * @return the policy
     * @throws LimitException POLICY where there is none of that name
     */
    public static PushOffPolicy ofWord(String word) throws LimitException {
        for (PushOffPolicy p : values()) {
            if (p.word.equals(word)) {
                return p;
            }
        }
        throw new LimitException(
                Limit.POLICY,
                "push-off policy '" + word + "', expected one of "
                        + Arrays.stream(values()).map(PushOffPolicy::word).collect(Collectors.joining(", ")));
    }
}
