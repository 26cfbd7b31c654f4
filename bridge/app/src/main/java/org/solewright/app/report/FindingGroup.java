package org.solewright.app.report;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.Severity;

/**
 * Findings of one severity.
 *
 * @param severity {@code error}, {@code warning} or {@code note}
 * @param heading with their number
 * @param entries in the order in which they were found
 */
public record FindingGroup(String severity, String heading, List<Entry> entries) {

    /**
     * One finding.
     *
     * @param where it is; may be empty
     * @param message what was found
     * @param cure what to do; may be empty
     * @param code of it
     */
    public record Entry(String where, String message, String cure, String code) {}

    /** Copies the list. */
    public FindingGroup {
        entries = List.copyOf(entries);
    }

    /**
     * Groups findings, gravest first; the same sentence at several places is one entry that names them all.
     *
     * @param findings of a call
     * @param cures what to do about a code
     * @return one group per severity that occurs
     */
    static List<FindingGroup> of(List<Finding> findings, Function<String, Optional<String>> cures) {
        List<FindingGroup> groups = new ArrayList<>();
        for (Severity severity : List.of(Severity.ERROR, Severity.WARNING, Severity.NOTE)) {
            Map<List<String>, List<String>> places = new LinkedHashMap<>();
            for (Finding f : findings) {
                if (f.severity() == severity) {
                    List<String> where = places.computeIfAbsent(List.of(f.code(), f.message()), k -> new ArrayList<>());
                    if (!f.where().isEmpty() && !where.contains(f.where())) {
                        where.add(f.where());
                    }
                }
            }
            List<Entry> entries = new ArrayList<>();
            places.forEach((what, where) -> entries.add(new Entry(
                    where.isEmpty() ? "" : String.join(", ", where) + ":",
                    Words.typeset(what.get(1)),
                    cures.apply(what.get(0)).map(Words::typeset).orElse(""),
                    what.get(0))));
            if (!entries.isEmpty()) {
                groups.add(new FindingGroup(severity.word(), heading(severity, entries.size()), entries));
            }
        }
        return groups;
    }

    private static String heading(Severity severity, int count) {
        String what =
                switch (severity) {
                    case ERROR -> count == 1 ? "error: this input failed" : "errors: these inputs failed";
                    case WARNING ->
                        count == 1
                                ? "warning: look at it before using the numbers"
                                : "warnings: look at them before using the numbers";
                    case NOTE -> count == 1 ? "note" : "notes";
                };
        return count + " " + what;
    }
}
