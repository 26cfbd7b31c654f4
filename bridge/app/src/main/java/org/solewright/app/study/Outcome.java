package org.solewright.app.study;

import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.solewright.domain.finding.Finding;

/**
 * What came of a task.
 *
 * @param state how it ended
 * @param message the reason where it did not end well, one line
 * @param inputs what it was computed from
 * @param findings what has to be said
 * @param outputs files of the study that it wrote
 */
record Outcome(
        Outcome.State state,
        String message,
        List<Outcome.Input> inputs,
        List<Finding> findings,
        List<Outcome.Output> outputs) {

    Outcome {
        inputs = List.copyOf(inputs);
        findings = List.copyOf(findings);
        outputs = List.copyOf(outputs);
    }

    /** How a task ended. */
    enum State {
        DONE,
        FAILED,
        REFUSED;

        String word() {
            return name().toLowerCase(Locale.ROOT);
        }

        static Optional<State> ofWord(String word) {
            return java.util.Arrays.stream(values())
                    .filter(s -> s.word().equals(word))
                    .findFirst();
        }
    }

    /**
     * An input as it was found.
     *
     * @param role what it was used as
     * @param file relative to the study's folder where it lies in it
     * @param sha256 of its bytes; {@link StudyTask#UNREADABLE} where it could not be read
     */
    record Input(String role, String file, String sha256) {}

    /**
     * An output as it was written.
     *
     * @param file relative to the study's folder
     * @param sha256 of its bytes
     * @param bytes its length
     */
    record Output(String file, String sha256, long bytes) {}
}
