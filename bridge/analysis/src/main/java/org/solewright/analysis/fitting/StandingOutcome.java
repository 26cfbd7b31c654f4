package org.solewright.analysis.fitting;

/** What came of building a limb from a standing trial. */
public sealed interface StandingOutcome {

    /**
     * The limb was built.
     *
     * @param limb model, poses and findings
     */
    record Built(StandingLimb limb) implements StandingOutcome {}

    /**
     * The standing trial does not allow a model.
     *
     * @param message what is wrong, one sentence without full stop
     * @param whatToDo what the user can do
     */
    record Refused(String message, String whatToDo) implements StandingOutcome {}
}
