package org.solewright.domain.gait;

import java.util.List;

/**
 * One contact of a foot with the ground, and what it may be used for. A row of the contacts table, written by the tool
 * and accepted back from the user.
 *
 * @param trial name of the recording
 * @param side whose foot
 * @param platforms numbers of the platforms it stood on as in the recording, from 1; empty where none saw it
 * @param start contact on the recording's clock, s
 * @param end foot-off on the recording's clock, s, not before {@code start}
 * @param whole whether all its load is known
 * @param usedFor what it is used for
 * @param notUsedFor what it is not used for
 * @param why the reason in one sentence; empty where there is nothing to say
 */
public record ContactRow(
        String trial,
        Side side,
        List<Integer> platforms,
        double start,
        double end,
        boolean whole,
        List<Use> usedFor,
        List<Use> notUsedFor,
        String why) {

    /** Copies the lists and checks times and platforms. */
    public ContactRow {
        platforms = List.copyOf(platforms);
        usedFor = List.copyOf(usedFor);
        notUsedFor = List.copyOf(notUsedFor);
        if (!(start <= end) || !Double.isFinite(start) || !Double.isFinite(end)) {
            throw new IllegalArgumentException("contact from " + start + " s to " + end + " s");
        }
        for (int platform : platforms) {
            if (platform < 1) {
                throw new IllegalArgumentException("platform number " + platform + ", expected 1 or more");
            }
        }
    }
}
