package org.solewright.domain.foot;

import java.util.List;
import java.util.Optional;
import org.solewright.domain.gait.Side;

/**
 * Which labels of a recording stand for which anatomical landmarks.
 *
 * @param name what the laboratory calls this map; may be empty
 * @param entries in the file's order
 */
public record LandmarkMap(String name, List<Entry> entries) {

    /**
     * The labels of one landmark.
     *
     * @param landmark what they stand for
     * @param side whose it is; empty where both sides share the labels (a point of the midline)
     * @param labels patterns, at least one
     */
    public record Entry(Landmark landmark, Optional<Side> side, List<LabelPattern> labels) {

        /** Copies the list and checks that there is a label. */
        public Entry {
            labels = List.copyOf(labels);
            if (labels.isEmpty()) {
                throw new IllegalArgumentException("landmark " + landmark.word() + " has no label");
            }
        }

        private boolean isOf(Landmark l, Side s) {
            return landmark == l && side.map(s::equals).orElse(true);
        }
    }

    /** Copies the list. */
    public LandmarkMap {
        entries = List.copyOf(entries);
    }

    /**
     * The patterns for a landmark.
     *
     * @param landmark what is sought
     * @param side whose
     * @return patterns in the file's order; empty where the map does not name it
     */
    public List<LabelPattern> patterns(Landmark landmark, Side side) {
        return entries.stream()
                .filter(e -> e.isOf(landmark, side))
                .flatMap(e -> e.labels().stream())
                .distinct()
                .toList();
    }

    /**
     * The labels of a recording that stand for a landmark.
     *
     * @param landmark what is sought
     * @param side whose
     * @param recorded labels of the recording
     * @return those that fit one of the patterns, in the order of the patterns, then by name; empty where none
     */
    public List<String> labels(Landmark landmark, Side side, List<String> recorded) {
        return patterns(landmark, side).stream()
                .flatMap(p -> recorded.stream().filter(p::matches).sorted())
                .distinct()
                .toList();
    }

    /**
     * Whether the map names a landmark.
     *
     * @param landmark what is sought
     * @param side whose
     * @return true where it has a label for it
     */
    public boolean names(Landmark landmark, Side side) {
        return entries.stream().anyMatch(e -> e.isOf(landmark, side));
    }
}
