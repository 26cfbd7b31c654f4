package org.solewright.analysis.dynamics;

/** A model has no value at these inputs. The message says which number breaks which limit. */
public final class LimitException extends Exception {

    private static final long serialVersionUID = 1L;

    private final Limit limit;

    /**
     * A broken limit.
     *
     * @param limit which
     * @param message the numbers, one sentence without full stop
     */
    public LimitException(Limit limit, String message) {
        super(message);
        this.limit = limit;
    }

    /**
     * Which limit is broken.
     *
     * @return its code
     */
    public Limit limit() {
        return limit;
    }
}
