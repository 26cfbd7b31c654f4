package org.solewright.domain.finding;

import java.util.List;

/**
 * A value together with what has to be said about it.
 *
 * @param value the value
 * @param findings findings in the order they were made
 * @param <T> type of the value
 */
public record Found<T>(T value, List<Finding> findings) {

    /** Copies the list. */
    public Found {
        findings = List.copyOf(findings);
    }
}
