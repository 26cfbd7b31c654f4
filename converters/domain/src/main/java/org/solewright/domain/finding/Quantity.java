package org.solewright.domain.finding;

import java.util.OptionalDouble;

/**
 * A number with where it comes from and how sure it is. Unit and frame are those of the place that holds it.
 *
 * @param value the value, finite
 * @param basis where it comes from
 * @param sd standard deviation in the unit of the value, not negative; empty where unknown
 */
public record Quantity(double value, Basis basis, OptionalDouble sd) {

    /** Checks that the value is finite and the standard deviation not negative. */
    public Quantity {
        if (!Double.isFinite(value)) {
            throw new IllegalArgumentException("quantity " + value + ", expected a finite number");
        }
        if (sd.isPresent() && !(sd.getAsDouble() >= 0 && Double.isFinite(sd.getAsDouble()))) {
            throw new IllegalArgumentException("standard deviation " + sd.getAsDouble() + ", expected 0 or more");
        }
    }

    /**
     * A quantity whose standard deviation is unknown.
     *
     * @param value the value
     * @param basis where it comes from
     * @return the quantity
     */
    public static Quantity of(double value, Basis basis) {
        return new Quantity(value, basis, OptionalDouble.empty());
    }

    /**
     * A quantity with its standard deviation.
     *
     * @param value the value
     * @param basis where it comes from
     * @param sd standard deviation, same unit, not negative
     * @return the quantity
     */
    public static Quantity of(double value, Basis basis, double sd) {
        return new Quantity(value, basis, OptionalDouble.of(sd));
    }
}
