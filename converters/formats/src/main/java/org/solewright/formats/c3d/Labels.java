package org.solewright.formats.c3d;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;

/** Labels that are one per point and unlike one another. */
final class Labels {

    private Labels() {}

    /**
     * The first {@code count} labels: blank or missing ones are numbered, repeated ones get {@code #2}, {@code #3}.
     *
     * @param stored as stored
     * @param count how many are wanted
     * @param prefix of numbered ones
     */
    static List<String> of(List<String> stored, int count, String prefix) {
        List<String> labels = new ArrayList<>();
        Map<String, Integer> seen = new HashMap<>();
        Set<String> taken = new HashSet<>();
        for (int k = 0; k < count; k++) {
            String label = k < stored.size() && !stored.get(k).isBlank() ? stored.get(k) : prefix + (k + 1);
            int times = seen.merge(label, 1, Integer::sum);
            String unlike = times == 1 ? label : label + "#" + times;
            while (!taken.add(unlike)) {
                times = seen.merge(label, 1, Integer::sum);
                unlike = label + "#" + times;
            }
            labels.add(unlike);
        }
        return labels;
    }
}
