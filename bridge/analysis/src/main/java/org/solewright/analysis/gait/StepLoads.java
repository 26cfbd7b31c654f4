package org.solewright.analysis.gait;

import org.solewright.analysis.numerics.Series;
import org.solewright.domain.gait.Stance;

/**
 * All that the mechanics of one step-to-step transition needs, in the walking frame (forward, up, right).
 *
 * @param trailing the limb that leaves the ground
 * @param leading the limb that takes over
 * @param trailingForce its force on the subject, N, three components sampled alike
 * @param leadingForce likewise
 * @param totalForce sum of all platforms, N, three components sampled alike
 * @param windowFrom start of the work window, s
 * @param windowTo end of the work window, s
 * @param isStride whether the window is a stride; else it is one step
 * @param knownFrom from here on every load on the subject is measured, s
 * @param knownTo up to here every load on the subject is measured, s
 * @param meanForward pelvis velocity over the window, m/s
 * @param meanRight pelvis velocity over the window, m/s; 0 over a stride
 * @param biasForward horizontal platform bias to be taken off, N
 * @param biasRight likewise
 * @param shortestPhase phases of shorter duration are merged, s
 * @param gravity m/s^2
 */
public record StepLoads(
        Stance trailing,
        Stance leading,
        Axes trailingForce,
        Axes leadingForce,
        Axes totalForce,
        double windowFrom,
        double windowTo,
        boolean isStride,
        double knownFrom,
        double knownTo,
        double meanForward,
        double meanRight,
        double biasForward,
        double biasRight,
        double shortestPhase,
        double gravity) {

    /**
     * Three components of a vector over time.
     *
     * @param forward along the walking direction
     * @param up against gravity
     * @param right to the subject's right
     */
    public record Axes(Series forward, Series up, Series right) {

        /**
         * The components in order.
         *
         * @return forward, up, right
         */
        public Series[] components() {
            return new Series[] {forward, up, right};
        }
    }

    /** Checks the order of times. */
    public StepLoads {
        if (!(windowTo > windowFrom) || !(leading.start() > trailing.start())) {
            throw new IllegalArgumentException("work window from " + windowFrom + " s to " + windowTo
                    + " s with contacts at " + trailing.start() + " s and " + leading.start()
                    + " s, expected both in order of time");
        }
    }

    /**
     * Whether the limbs share the ground.
     *
     * @return true where the trailing foot leaves after the leading one lands
     */
    public boolean hasDoubleSupport() {
        return trailing.end() > leading.start();
    }
}
