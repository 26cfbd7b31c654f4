package org.solewright.domain.cost;

import java.util.List;

/**
 * What is true of an invented walk, known from its construction.
 *
 * @param stepTime s
 * @param speed mean forward speed, m/s
 * @param radius of the vaults, m
 * @param doubleSupport duration for which both limbs are loaded, s
 * @param pivots of the foot in the limb frame, rear to front
 * @param transitions of one step in the order of time, the last one from foot to foot
 * @param leastLimbForce smallest push of a limb along its axis in double support, ends included, N; negative where a limb
 *     would have to pull
 * @param centreOfPressureMonotone whether the centre of pressure never runs backwards under a foot
 */
public record WalkTruth(
        double stepTime,
        double speed,
        double radius,
        double doubleSupport,
        List<Place> pivots,
        List<Transition> transitions,
        double leastLimbForce,
        boolean centreOfPressureMonotone) {

    /**
     * A place in the limb frame: origin at the hip.
     *
     * @param x forward, m
     * @param z up, m
     */
    public record Place(double x, double z) {}

    /** What is true of a transition between two vaults. */
    public sealed interface Transition {

        /**
         * How long it takes.
         *
         * @return s
         */
        double duration();

        /**
         * What the impulsive models say of it.
         *
         * @return works at the ideal transition
         */
        Impulsive impulsive();
    }

    /**
     * From one pivot of the foot to the next, under one limb.
     *
     * @param positive positive work of the limb, J
     * @param negative negative work of the limb, J, not positive
     * @param duration s
     * @param impulsive what the impulsive models say
     */
    public record Inner(double positive, double negative, double duration, Impulsive impulsive) implements Transition {}

    /**
     * From the last pivot of one foot to the first of the next, both limbs loaded.
     *
     * @param trailingPositive positive work of the trailing limb, J
     * @param trailingNegative negative work of the trailing limb, J, not positive
     * @param leadingPositive positive work of the leading limb, J
     * @param leadingNegative negative work of the leading limb, J, not positive
     * @param combinedPositive positive work of both limbs' summed power, J
     * @param duration s
     * @param impulsive what the impulsive models say
     */
    public record Step(
            double trailingPositive,
            double trailingNegative,
            double leadingPositive,
            double leadingNegative,
            double combinedPositive,
            double duration,
            Impulsive impulsive)
            implements Transition {}

    /**
     * The impulsive models at the ideal transition; they are lower than the work of a transition that takes time.
     *
     * @param speed hip speed at the ideal transition, m/s
     * @param angle between the limbs, rad
     * @param pushOff J
     * @param simultaneous J
     * @param combined J, sin^2 of half the angle: simultaneous work of both limbs' summed power
     * @param noPush J
     */
    public record Impulsive(
            double speed, double angle, double pushOff, double simultaneous, double combined, double noPush) {}

    /** Copies the lists. */
    public WalkTruth {
        pivots = List.copyOf(pivots);
        transitions = List.copyOf(transitions);
    }
}
