package org.solewright.app.pipeline;

/** A use case that cannot be done with what the user gave. Ends as one line and an exit code. */
public final class UseCaseException extends Exception {

    private static final long serialVersionUID = 1L;

    /** What failed. */
    public enum Kind {
        /** The options contradict one another. */
        USAGE,
        /** An input could not be read or made sense of. */
        INPUT,
        /** An output could not be written. */
        OUTPUT
    }

    private final Kind kind;
    private final String file;
    private final String message;
    private final String whatToDo;

    /**
     * A failure.
     *
     * @param kind what failed
     * @param file the file or option concerned
     * @param message what is wrong, one sentence without full stop
     * @param whatToDo what the user can do
     */
    public UseCaseException(Kind kind, String file, String message, String whatToDo) {
        super(message);
        this.kind = kind;
        this.file = file;
        this.message = message;
        this.whatToDo = whatToDo;
    }

    /**
     * A failure with its cause.
     *
     * @param kind what failed
     * @param file the file or option concerned
     * @param message what is wrong, one sentence without full stop
     * @param whatToDo what the user can do
     * @param cause what was thrown below
     */
    public UseCaseException(Kind kind, String file, String message, String whatToDo, Throwable cause) {
        super(message, cause);
        this.kind = kind;
        this.file = file;
        this.message = message;
        this.whatToDo = whatToDo;
    }

    /**
     * What failed.
     *
     * @return the kind
     */
    public Kind kind() {
        return kind;
    }

    /**
     * What it concerns.
     *
     * @return file or option
     */
    public String file() {
        return file;
    }

    /**
     * What the user can do.
     *
     * @return a few words
     */
    public String whatToDo() {
        return whatToDo;
    }

    /**
     * What is wrong.
     *
     * @return one sentence without full stop
     */
    @Override
    public String getMessage() {
        return message;
    }
}
