package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.EnumSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import org.solewright.analysis.gait.Pass;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.gait.ContactRow;
import org.solewright.domain.gait.Stance;
import org.solewright.domain.gait.Use;

/** Contacts as tables: what was found, written; what the user says, applied. The user's word stands. */
final class ContactOverrides {

    private ContactOverrides() {}

    /**
     * Replaces the verdicts on stances by those of a table.
     *
     * @param rows the user's table
     * @param passes as found
     * @param findings receives a note per contradiction and per row that matches no stance
     * @return passes with the table's verdicts
     */
    static List<Pass> apply(List<ContactRow> rows, List<Pass> passes, List<Finding> findings) {
        List<ContactRow> unused = new ArrayList<>(rows);
        List<Pass> changed = new ArrayList<>();
        for (Pass pass : passes) {
            List<Stance> judged = new ArrayList<>();
            List<Finding> more = new ArrayList<>();
            for (Stance stance : pass.stances()) {
                Optional<ContactRow> row =
                        rows.stream().filter(r -> isOf(r, stance)).findFirst();
                row.ifPresent(unused::remove);
                judged.add(row.map(r -> judge(r, stance, more)).orElse(stance));
            }
            changed.add(pass.judged(judged, more));
        }
        for (ContactRow row : unused) {
            findings.add(Finding.warning(
                    "contacts.unmatched",
                    row.trial() + " " + row.side().word(),
                    "the contacts table has a row from " + row.start() + " to " + row.end()
                            + " s that matches no contact found; it is not used"));
        }
        return changed;
    }

    private static boolean isOf(ContactRow row, Stance stance) {
        double shared = Math.min(row.end(), stance.end()) - Math.max(row.start(), stance.start());
        return row.trial().equals(stance.trial())
                && row.side() == stance.side()
                && shared > 0.5 * Math.min(row.end() - row.start(), stance.duration());
    }

    private static Stance judge(ContactRow row, Stance stance, List<Finding> findings) {
        Set<Use> excluded = EnumSet.noneOf(Use.class);
        for (Use use : Use.values()) {
            if (row.notUsedFor().contains(use)) {
                excluded.add(use);
            }
        }
        if (!row.whole() && excluded.isEmpty()) {
            excluded = EnumSet.allOf(Use.class);
        }
        if (row.whole() == stance.whole() && excluded.equals(stance.notUsedFor())) {
            return stance;
        }
        findings.add(Finding.note(
                "contacts.contradicted",
                stance.trial() + " " + stance.side().word(),
                "the contacts table says " + verdict(row.whole(), excluded) + ", the analysis found "
                        + verdict(stance.whole(), stance.notUsedFor()) + "; the table stands"));
        String why = row.why().isBlank() ? "by the contacts table" : row.why();
        return new Stance(
                stance.trial(),
                stance.side(),
                stance.platforms(),
                stance.start(),
                stance.end(),
                row.whole() && excluded.isEmpty(),
                excluded,
                excluded.isEmpty() ? "" : why);
    }

    private static String verdict(boolean whole, Set<Use> excluded) {
        return (whole ? "whole" : "not whole")
                + (excluded.isEmpty() ? "" : ", not for " + String.join(" ", words(excluded)));
    }

    private static List<String> words(Set<Use> uses) {
        return uses.stream().sorted().map(Use::word).toList();
    }

    /**
     * What was found as a table.
     *
     * @param passes as judged
     * @return one row per stance
     */
    static List<ContactRow> rows(List<Pass> passes) {
        List<ContactRow> rows = new ArrayList<>();
        for (Pass pass : passes) {
            for (Stance s : pass.stances()) {
                List<Use> used = Arrays.stream(Use.values()).filter(s::allows).toList();
                rows.add(new ContactRow(
                        s.trial(),
                        s.side(),
                        s.platforms(),
                        s.start(),
                        s.end(),
                        s.whole(),
                        used,
                        s.notUsedFor().stream().sorted().toList(),
                        s.why()));
            }
        }
        return rows;
    }
}
