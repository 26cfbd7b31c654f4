package org.solewright.formats.c3d;

import java.util.Set;
import java.util.function.Predicate;

/**
 * What is read of a file, so that what is not asked for is not decoded.
 *
 * @param points labels of the points that are wanted
 * @param isAnalogWanted whether analog samples, and with them force platforms, are wanted
 * @param isFlagObeyed whether a sample that is flagged missing counts as missing; where not, every sample whose
 *     coordinates are finite numbers and not all 0 counts as seen
 */
public record C3dReading(Predicate<String> points, boolean isAnalogWanted, boolean isFlagObeyed) {

    /**
     * Everything, as the file flags it.
     *
     * @return the usual reading
     */
    public static C3dReading everything() {
        return new C3dReading(label -> true, true, true);
    }

    /**
     * Some points alone.
     *
     * @param labels exact labels
     * @return a reading of those points without analog samples
     */
    public static C3dReading only(Set<String> labels) {
        return new C3dReading(Set.copyOf(labels)::contains, false, true);
    }

    /**
     * The same, but for the flags.
     *
     * @return a reading that takes samples flagged missing for seen
     */
    public C3dReading ignoringFlags() {
        return new C3dReading(points, isAnalogWanted, false);
    }
}
