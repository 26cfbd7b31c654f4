package org.solewright.app.study;

/** Told how a study goes on, by one thread. */
public interface StudyListener {

    /**
     * A part of the study begins.
     *
     * @param what it does: {@code fit}, {@code appraise} or {@code tables}
     * @param tasks how many tasks it has
     */
    void begin(String what, int tasks);

    /**
     * A task has ended and stands in the ledger.
     *
     * @param kind fit or appraise
     * @param name subject, session and trial
     * @param state done, failed, refused or skipped
     * @param message the reason where it did not end well, else empty
     */
    void ended(String kind, String name, String state, String message);

    /** All parts have ended, or the run was stopped. */
    void finished();
}
