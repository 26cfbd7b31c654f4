package org.solewright.app.cli;

/** What the process returns. */
final class ExitCode {

    /** All done. */
    static final int DONE = 0;
    /** Done, but some inputs failed or an audit found an inconsistency. */
    static final int SOME_FAILED = 1;
    /** Wrong usage. */
    static final int USAGE = 2;
    /** An input could not be read or made sense of. */
    static final int INPUT = 3;
    /** An output could not be written. */
    static final int OUTPUT = 4;
    /** A defect of ours. */
    static final int DEFECT = 70;

    private ExitCode() {}
}
