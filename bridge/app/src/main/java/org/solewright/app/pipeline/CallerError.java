package org.solewright.app.pipeline;

/** A question that cannot be asked that way; the other questions of the file are still answered. */
final class CallerError extends Exception {

    private static final long serialVersionUID = 1L;

    /** What is wrong with the question. */
    enum Code {
        /** No such question, or none that this version answers. */
        UNKNOWN_QUESTION,
        /** An input is needed and not given. */
        MISSING_INPUT,
        /** An input is not what its name says. */
        WRONG_TYPE
    }

    private final Code code;

    CallerError(Code code, String message) {
        super(message);
        this.code = code;
    }

    Code code() {
        return code;
    }
}
