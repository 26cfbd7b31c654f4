package org.solewright.analysis.numerics;

/** How an iteration ended. */
public sealed interface Outcome {

    /**
     * What was left when it ended.
     *
     * @return largest scaled step or residual of the method, not negative
     */
    double residual();

    /**
     * How often it went round.
     *
     * @return iterations, zero or more
     */
    int iterations();

    /**
     * The method reached its tolerance.
     *
     * @param residual what was left
     * @param iterations how often it went round
     */
    record Converged(double residual, int iterations) implements Outcome {}

    /**
     * The method gave up before its tolerance; its last value may still serve, but says nothing of its accuracy.
     *
     * @param residual what was left
     * @param iterations how often it went round
     */
    record Stalled(double residual, int iterations) implements Outcome {}
}
