package org.solewright.domain.cost;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * One row of the posture-cost table: for each column a number, a text, or nothing. Two rows are equal where all their
 * cells are.
 *
 * @param cells values by column, in the order of {@link TransitionColumns#ALL}; absent columns are empty
 */
public record TransitionRow(Map<String, Cell> cells) {

    /** What stands in a column. */
    public sealed interface Cell {

        /**
         * As it stands in a table.
         *
         * @return the text, or the number in digits that read back as the same number
         */
        String text();
    }

    /**
     * A number.
     *
     * @param value finite, in the unit of the column's name
     */
    public record Amount(double value) implements Cell {

        @Override
        public String text() {
            return Double.toString(value);
        }
    }

    /**
     * A whole number.
     *
     * @param value a count
     */
    public record Count(int value) implements Cell {

        @Override
        public String text() {
            return Integer.toString(value);
        }
    }

    /**
     * Words.
     *
     * @param text not empty
     */
    public record Text(String text) implements Cell {}

    /** Copies the cells in the order of the columns and checks that the columns are known. */
    public TransitionRow {
        Map<String, Cell> ordered = new LinkedHashMap<>();
        for (String column : TransitionColumns.ALL) {
            Cell cell = cells.get(column);
            if (cell != null) {
                ordered.put(column, cell);
            }
        }
        if (ordered.size() != cells.size()) {
            throw new IllegalArgumentException(
                    "row with columns " + cells.keySet() + ", expected only those of the" + " posture-cost table");
        }
        cells = Collections.unmodifiableMap(ordered);
    }

    /**
     * An empty row to be filled.
     *
     * @return the builder
     */
    public static Builder builder() {
        return new Builder();
    }

    /**
     * The number in a column.
     *
     * @param column one of {@link TransitionColumns#ALL}
     * @return the number; empty where the column is empty or holds words
     */
    public OptionalDouble number(String column) {
        Cell cell = cells.get(column);
        if (cell instanceof Amount n) {
            return OptionalDouble.of(n.value());
        }
        return cell instanceof Count c ? OptionalDouble.of(c.value()) : OptionalDouble.empty();
    }

    /**
     * What a column shows.
     *
     * @param column one of {@link TransitionColumns#ALL}
     * @return the text; empty where the column is empty
     */
    public Optional<String> text(String column) {
        return Optional.ofNullable(cells.get(column)).map(Cell::text);
    }

    /** Fills a row column by column. Not shared between threads. */
    public static final class Builder {

        private final Map<String, Cell> cells = new LinkedHashMap<>();

        private Builder() {}

        /**
         * Puts a number.
         *
         * @param column one of the columns that hold numbers
         * @param value in the unit of the column's name; a value that is not finite leaves the column empty
         * @return this
         * @throws IllegalArgumentException where there is no such column of numbers
         */
        public Builder number(String column, double value) {
            check(column, false);
            if (Double.isFinite(value)) {
                cells.put(column, new Amount(value));
            } else {
                cells.remove(column);
            }
            return this;
        }

        /**
         * Puts a number where there is one.
         *
         * @param column one of the columns that hold numbers
         * @param value in the unit of the column's name; empty leaves the column empty
         * @return this
         * @throws IllegalArgumentException where there is no such column of numbers
         */
        public Builder number(String column, OptionalDouble value) {
            return number(column, value.orElse(Double.NaN));
        }

        /**
         * Puts a whole number.
         *
         * @param column one of the columns that hold numbers
         * @param value a count
         * @return this
         * @throws IllegalArgumentException where there is no such column of numbers
         */
        public Builder count(String column, int value) {
            check(column, false);
            cells.put(column, new Count(value));
            return this;
        }

        /**
         * Puts words.
         *
         * @param column one of the columns that hold words
         * @param value the words; empty leaves the column empty
         * @return this
         * @throws IllegalArgumentException where there is no such column of words
         */
        public Builder text(String column, String value) {
            check(column, true);
            if (value.isEmpty()) {
                cells.remove(column);
            } else {
                cells.put(column, new Text(value));
            }
            return this;
        }

        /**
         * The row.
         *
         * @return a row of what was put
         */
        public TransitionRow build() {
            return new TransitionRow(cells);
        }

        private static void check(String column, boolean words) {
            if (!TransitionColumns.ALL.contains(column) || TransitionColumns.TEXT.contains(column) != words) {
                throw new IllegalArgumentException("'" + column + "' is not a column of "
                        + (words ? "words" : "numbers") + " of the posture-cost table");
            }
        }
    }
}
