package org.solewright.formats.io;

/** Bytes or text that are not as the format says. The message is one clear line without the file's name. */
public final class FormatException extends Exception {

    private static final long serialVersionUID = 1L;

    private final String source;
    private final String message;
    private final String whatToDo;

    /**
     * A departure from the format.
     *
     * @param source the file's name as the caller gave it
     * @param message place, what was found and what was expected, in one sentence without full stop
     * @param whatToDo what the user can do, in a few words
     */
    public FormatException(String source, String message, String whatToDo) {
        super(message);
        this.source = source;
        this.message = message;
        this.whatToDo = whatToDo;
    }

    /**
     * A departure from the format with its cause.
     *
     * @param source the file's name as the caller gave it
     * @param message place, what was found and what was expected, in one sentence without full stop
     * @param whatToDo what the user can do, in a few words
     * @param cause what was thrown below
     */
    public FormatException(String source, String message, String whatToDo, Throwable cause) {
        super(message, cause);
        this.source = source;
        this.message = message;
        this.whatToDo = whatToDo;
    }

    /**
     * The file.
     *
     * @return its name as the caller gave it
     */
    public String source() {
        return source;
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
