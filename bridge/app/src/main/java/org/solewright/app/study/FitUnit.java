package org.solewright.app.study;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.study.StudyTrial;

/**
 * Trials that share a foot: one subject, one session, since markers are placed anew in the next, and one condition.
 *
 * @param subject identifier
 * @param session identifier, may be empty
 * @param condition what was on the foot
 * @param standing standing trials to fit from
 * @param isOtherCondition whether those stand in another condition, as there is none in this
 * @param appraised walking trials and results, in the order of the table
 */
record FitUnit(
        String subject,
        String session,
        StudyTrial.Condition condition,
        List<StudyTrial> standing,
        boolean isOtherCondition,
        List<StudyTrial> appraised) {

    FitUnit {
        standing = List.copyOf(standing);
        appraised = List.copyOf(appraised);
    }

    private record Key(String subject, String session) {}

    /** All feet of a study, in the order in which the table comes to them. */
    static List<FitUnit> all(Study study) {
        Map<Key, Map<StudyTrial.Condition, List<StudyTrial>>> sessions = new LinkedHashMap<>();
        for (StudyTrial t : study.trials()) {
            sessions.computeIfAbsent(new Key(t.subject(), t.session()), k -> new LinkedHashMap<>())
                    .computeIfAbsent(t.condition(), k -> new ArrayList<>())
                    .add(t);
        }
        List<FitUnit> units = new ArrayList<>();
        sessions.forEach((key, conditions) -> conditions.forEach((condition, trials) -> {
            List<StudyTrial> standing = standing(trials);
            boolean isOther = standing.isEmpty();
            if (isOther) {
                standing = standing(
                        conditions.values().stream().flatMap(List::stream).toList());
            }
            units.add(new FitUnit(
                    key.subject(),
                    key.session(),
                    condition,
                    standing,
                    isOther && !standing.isEmpty(),
                    trials.stream()
                            .filter(t -> t.kind() != StudyTrial.Kind.STANDING)
                            .toList()));
        }));
        return units;
    }

    private static List<StudyTrial> standing(List<StudyTrial> trials) {
        return trials.stream().filter(t -> t.kind() == StudyTrial.Kind.STANDING).toList();
    }

    /** Walking trials that the foot is fitted from: without aids, on belts of one speed, the first of the table. */
    List<StudyTrial> fitted(int most) {
        List<StudyTrial> walking = appraised.stream()
                .filter(t -> t.kind() == StudyTrial.Kind.WALKING && !t.isAided())
                .toList();
        return walking.stream()
                .filter(t -> t.beltSpeed() == walking.get(0).beltSpeed())
                .limit(most)
                .toList();
    }

    /** Whether there is a foot to be fitted. */
    boolean isFitted() {
        return !standing.isEmpty() && !fitted(1).isEmpty();
    }

    /** Subject and session in one word for messages. */
    String name() {
        return subject + (session.isEmpty() ? "" : "/" + session);
    }

    /** What has to be said about the standing trials. */
    List<Finding> findings(String where) {
        if (standing.isEmpty()) {
            return List.of(Finding.warning(
                    "study.no-standing",
                    where,
                    name() + " has no standing trial: its trials are appraised without a foot model"));
        }
        if (isOtherCondition) {
            return List.of(Finding.warning(
                    "study.standing-condition",
                    where,
                    name() + " has no standing trial " + condition.word() + ": that of another condition is used"));
        }
        return List.of();
    }
}
