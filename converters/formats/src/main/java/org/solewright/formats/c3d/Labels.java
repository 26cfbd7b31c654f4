package org.solewright.formats.c3d;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.solewright.domain.finding.Finding;

/** Labels that are one per point and unlike one another. */
final class Labels {

    private static final int MOST_NAMED = 8;

    private Labels() {}

    /** The labels of a group's points or channels; repeated ones are said. */
    static List<String> of(C3dParameters p, String group, int count, String prefix, List<Finding> findings) {
        List<String> stored = C3dParameter.joined(p.continued(group, "LABELS"));
        List<String> labels = of(stored, count, prefix);
        List<String> renamed = new ArrayList<>();
        for (int k = 0; k < Math.min(count, stored.size()); k++) {
            if (!stored.get(k).isBlank() && !labels.get(k).equals(stored.get(k))) {
                renamed.add(labels.get(k));
            }
        }
        if (!renamed.isEmpty()) {
            findings.add(Finding.note(
                    "labels.repeated",
                    group,
                    renamed.size() + " labels repeat an earlier one and are told apart by a number: "
                            + String.join(" ", renamed.subList(0, Math.min(MOST_NAMED, renamed.size())))
                            + (renamed.size() > MOST_NAMED ? " ..." : "")));
        }
        return labels;
    }

    /** How many of the points or channels have a label, blank ones included. */
    static int stored(C3dParameters p, String group, int count) {
        int stored = 0;
        for (C3dParameter part : p.continued(group, "LABELS")) {
            stored += part.texts().size();
        }
        return Math.min(count, stored);
    }

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
