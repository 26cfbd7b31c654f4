package org.solewright.domain.gait;

import java.util.Collections;
import java.util.EnumSet;
import java.util.List;
import java.util.Set;

/**
 * One foot's time on the ground as platforms saw it.
 *
 * @param trial name of the recording
 * @param side the foot
 * @param platforms numbers of the platforms it stood on, in the file's order; more than one where it spanned them
 * @param start contact, s on the recording's clock
 * @param end foot-off, s, after start
 * @param whole whether the foot's outline lay inside the platform
 * @param notUsedFor what it may not be used for; empty for a whole stance
 * @param why the reason, empty for a whole stance
 */
public record Stance(
        String trial,
        Side side,
        List<Integer> platforms,
        double start,
        double end,
        boolean whole,
        Set<Use> notUsedFor,
        String why) {

    /** Copies the collections and checks the order of times. */
    public Stance {
        platforms = List.copyOf(platforms);
        notUsedFor = notUsedFor.isEmpty() ? Set.of() : Collections.unmodifiableSet(EnumSet.copyOf(notUsedFor));
        if (!(end > start)) {
            throw new IllegalArgumentException(
                    "stance ends at " + end + " s, expected after its start at " + start + " s");
        }
    }

    /**
     * Whether the stance may be used for that.
     *
     * @param use the purpose
     * @return true where nothing speaks against it
     */
    public boolean allows(Use use) {
        return !notUsedFor.contains(use);
    }

    /**
     * Time on the ground.
     *
     * @return s
     */
    public double duration() {
        return end - start;
    }
}
