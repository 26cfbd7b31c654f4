package org.solewright.app.study;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeMap;
import org.solewright.app.pipeline.UseCaseException;
import org.solewright.domain.study.StudyTrial;
import org.solewright.formats.io.FormatException;

/** How far a study is, by its ledger. */
public final class StudyStatus {

    private static final int MOST_NAMED = 50;

    private StudyStatus() {}

    /**
     * Tells how far a study is.
     *
     * @param folder of the study
     * @return what to print
     * @throws UseCaseException where study or ledger cannot be read
     * @throws FormatException where a file of the study is not as its format says
     */
    public static List<String> lines(Path folder) throws UseCaseException, FormatException {
        Study study = Study.read(folder);
        List<String> lines = new ArrayList<>();
        Set<String> wanted = new HashSet<>();
        for (StudyTrial t : study.trials()) {
            if (t.kind() != StudyTrial.Kind.STANDING) {
                wanted.add("appraise " + t.id());
            }
        }
        Optional<Ledger> found = Ledger.look(folder);
        if (found.isEmpty()) {
            lines.add(folder + ": " + wanted.size() + " trials, nothing was run yet");
            return lines;
        }
        try (Ledger ledger = found.get()) {
            Map<String, Integer> states = new TreeMap<>();
            Map<String, String> failures = new TreeMap<>();
            ledger.each("SELECT id, kind, state, message FROM task ORDER BY id", row -> {
                String id = cell(row, "id");
                if (wanted.contains(id)) {
                    states.merge(cell(row, "state"), 1, Integer::sum);
                }
                if ((wanted.contains(id) || cell(row, "kind").equals("fit"))
                        && !cell(row, "message").isEmpty()) {
                    failures.put(id, cell(row, "state") + ": " + cell(row, "message"));
                }
            });
            int known = states.values().stream().mapToInt(Integer::intValue).sum();
            StringBuilder summary = new StringBuilder(folder + ": " + wanted.size() + " trials");
            states.forEach(
                    (state, n) -> summary.append(", ").append(n).append(' ').append(state));
            lines.add(summary + ", " + (wanted.size() - known) + " not done yet");
            failures.entrySet().stream()
                    .limit(MOST_NAMED)
                    .forEach(e -> lines.add("  " + e.getKey() + " " + e.getValue()));
            if (failures.size() > MOST_NAMED) {
                lines.add("  and " + (failures.size() - MOST_NAMED) + " more: see 'study export'");
            }
            Map<String, String> last = new HashMap<>();
            ledger.each("SELECT * FROM run ORDER BY id DESC LIMIT 1", last::putAll);
            if (!last.isEmpty()) {
                lines.add("last run: began " + cell(last, "started") + " on " + cell(last, "host") + " with "
                        + cell(last, "jobs") + " jobs, " + cell(last, "how")
                        + (cell(last, "ended").isEmpty() ? " (it runs, or it was killed)" : " " + cell(last, "ended")));
            }
        }
        return lines;
    }

    private static String cell(Map<String, String> row, String column) {
        return row.getOrDefault(column, "");
    }
}
