package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.List;

/** Numbers of an option that may be repeated: each a number or a range {@code FROM:TO:BY}. */
final class ValueList {

    private static final int MOST = 10_000;
    private static final double ROUNDING = 1e-9;

    private ValueList() {}

    /**
     * The numbers in the order they are given.
     *
     * @param option its name, for messages
     * @param words what the user wrote
     * @return numbers, not checked for their size
     * @throws UseCaseException where a word is neither number nor range, or where there are too many numbers
     */
    static List<Double> of(String option, List<String> words) throws UseCaseException {
        List<Double> values = new ArrayList<>();
        for (String word : words) {
            String[] parts = word.split(":", -1);
            if (parts.length == 1) {
                values.add(number(option, word, parts[0]));
            } else if (parts.length == 3) {
                double from = number(option, word, parts[0]);
                double to = number(option, word, parts[1]);
                double by = number(option, word, parts[2]);
                values.addAll(range(option, from, to, by));
            } else {
                throw wrong(option, word);
            }
            if (values.size() > MOST) {
                throw usage(option, values.size() + " numbers, expected at most " + MOST);
            }
        }
        return values;
    }

    /**
     * Equally spaced numbers, the last one included where it is met.
     *
     * @param option its name, for messages
     * @param from first
     * @param to last
     * @param by spacing, above 0
     * @return 1 to 10 000 numbers
     * @throws UseCaseException where they are fewer or more
     */
    static List<Double> range(String option, double from, double to, double by) throws UseCaseException {
        double count = Math.floor((to - from) / by + ROUNDING) + 1;
        if (!(by > 0 && count >= 1 && count <= MOST)) {
            throw usage(option, "from " + from + " to " + to + " by " + by + ", expected 1 to " + MOST + " numbers");
        }
        List<Double> values = new ArrayList<>();
        for (int i = 0; i < count; i++) {
            values.add(from + i * by);
        }
        return values;
    }

    private static double number(String option, String word, String part) throws UseCaseException {
        try {
            return Double.parseDouble(part);
        } catch (NumberFormatException e) {
            throw wrong(option, word);
        }
    }

    private static UseCaseException wrong(String option, String word) {
        return usage(option, "'" + QuestionInputs.shown(word) + "', expected a number or FROM:TO:BY");
    }

    private static UseCaseException usage(String option, String message) {
        return new UseCaseException(UseCaseException.Kind.USAGE, option, message, "see 'solewright postures --help'");
    }
}
