package org.solewright.analysis.dynamics;

/**
 * What one wrench per foot says about a joint inside that foot [derived]. The wrench fixes the sum of what the segments
 * bear, not their shares: a joint inside the foot has a moment only while everything proximal to it is off the ground and
 * the centre of pressure (COP) lies beyond its axis. While of all that is proximal to it the forefoot alone still bears,
 * and the heel has risen, the share of what lies distal to the joint is known between two bounds. Earlier it is
 * indeterminate.
 *
 * <p>Distances are along the foot, forward positive, from any one origin.
 */
public final class FootLoadRule {

    /** What can be said. */
    public enum State {
        /** Distal parts bear the whole wrench. */
        DETERMINED,
        /** Between two bounds. */
        BOUNDED,
        /** Nothing. */
        INDETERMINATE
    }

    /**
     * The share of what lies distal to a joint.
     *
     * @param state what can be said; INDETERMINATE: the other components are NaN
     * @param leastShare of the vertical force, 0 to 1
     * @param greatestShare of the vertical force, 0 to 1
     * @param leastMoment of the ground's vertical force on the distal parts about the axis, N m, that lifts them
     * @param greatestMoment likewise
     */
    public record Share(
            State state, double leastShare, double greatestShare, double leastMoment, double greatestMoment) {}

    private FootLoadRule() {}

    /**
     * What can be said about a joint.
     *
     * @param heelBears whether the heel, or anything behind the segment next to the joint, is on the ground
     * @param neighbourBears whether the segment next to the joint, proximal to it, is on the ground
     * @param cop centre of pressure, m
     * @param axis of the joint, m
     * @return state
     */
    public static State state(boolean heelBears, boolean neighbourBears, double cop, double axis) {
        if (heelBears) {
            return State.INDETERMINATE;
        }
        if (neighbourBears) {
            return State.BOUNDED;
        }
        return cop > axis ? State.DETERMINED : State.INDETERMINATE;
    }

    /**
     * The share of the distal parts. With T on them at x_T between axis and tip, and F - T on the proximal part at x_P
     * between its rear end and the axis, T x_T + (F - T) x_P = F x: the moment T (x_T - axis) is least with all that the
     * proximal part bears put at the axis, greatest with that put at its rear end and T at the tip.
     *
     * @param state as {@link #state} says
     * @param force vertical force on the foot, N, above 0
     * @param cop x, m
     * @param rear rearmost place where the proximal part bears, m, before the axis
     * @param axis of the joint, m
     * @param tip foremost place of the foot, m, beyond the axis
     * @return the share
     * @throws IllegalArgumentException where rear, axis and tip do not follow each other
     */
    public static Share share(State state, double force, double cop, double rear, double axis, double tip) {
        if (!(rear <= axis && axis < tip)) {
            throw new IllegalArgumentException("foot with rear " + rear + " m, axis " + axis + " m and tip " + tip
                    + " m, expected them in this order");
        }
        double beyond = force * (cop - axis);
        switch (state) {
            case DETERMINED -> {
                return new Share(state, 1, 1, beyond, beyond);
            }
            case INDETERMINATE -> {
                return new Share(state, Double.NaN, Double.NaN, Double.NaN, Double.NaN);
            }
            default -> {
                double x = Math.max(rear, Math.min(tip, cop));
                double least = Math.max(0, (x - axis) / (tip - axis));
                double greatest = x >= axis ? 1 : (x - rear) / (axis - rear);
                double most = force * (x - rear) * (tip - axis) / (tip - rear);
                return new Share(state, least, greatest, Math.max(0, beyond), Math.max(Math.max(0, beyond), most));
            }
        }
    }
}
