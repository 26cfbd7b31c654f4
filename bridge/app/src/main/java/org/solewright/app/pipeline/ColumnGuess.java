package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.gait.Side;
import org.solewright.domain.motion.ResultsMap;

/**
 * What a column may be by the words of its name: words and letters that people who measure movement use anyway.
 *
 * @param quantity what it holds; empty for time and for what is not recognised
 * @param isTime whether it is the time
 * @param of landmark, joint or number of a platform; may be empty
 * @param side where named
 * @param axis 0 x, 1 y, 2 z; -1 where none is named
 * @param unit as named; empty where it is not
 * @param isNamed whether a whole word, not a letter, tells the quantity
 */
record ColumnGuess(
        Optional<ResultsMap.Quantity> quantity,
        boolean isTime,
        String of,
        Optional<Side> side,
        int axis,
        String unit,
        boolean isNamed) {

    private static final List<String> JOINTS =
            List.of("hip", "knee", "ankle", "subtalar", "midtarsal", "metatarsophalangeal", "mtp", "toe");
    private static final List<String> UNITS = List.of(
            "m", "cm", "mm", "n", "kn", "nm", "nmm", "deg", "rad", "s", "ms", "w", "degrees", "radians", "seconds");

    /** Words of a name in lower case: letters and digits apart, capitals begin a word. */
    static List<String> words(String name) {
        String spaced = name.replaceAll("([a-z])([A-Z])", "$1 $2")
                .replaceAll("([A-Za-z])([0-9])", "$1 $2")
                .replaceAll("([0-9])([A-Za-z])", "$1 $2");
        List<String> words = new ArrayList<>();
        for (String w : spaced.toLowerCase(Locale.ROOT).split("[^a-z0-9%]+", -1)) {
            if (!w.isEmpty()) {
                words.add(w);
            }
        }
        return words;
    }

    static ColumnGuess of(String name, String unitCell) {
        List<String> words = words(name.replace("N.m", "Nm").replace("N.mm", "Nmm"));
        String unit = unit(words, unitCell.isEmpty() ? "" : String.join("", words(unitCell)));
        int axis = axis(words);
        Optional<Side> side = side(words);
        if (any(words, "time", "seconds", "milliseconds") || words.equals(List.of("t"))) {
            return new ColumnGuess(Optional.empty(), true, "", Optional.empty(), -1, unit, true);
        }
        Optional<ResultsMap.Quantity> named = quantity(words);
        Optional<ResultsMap.Quantity> quantity = named.or(() -> byLetters(words));
        Optional<String> landmark = landmark(words);
        if (quantity.isEmpty() && (landmark.isPresent() || joint(words).isPresent()) && axis >= 0) {
            quantity = Optional.of(ResultsMap.Quantity.POINT_POSITION);
        }
        String of = quantity.map(q -> of(q, words, landmark)).orElse("");
        return new ColumnGuess(quantity, false, of, side, axis, unit, named.isPresent() || landmark.isPresent());
    }

    private static String of(ResultsMap.Quantity quantity, List<String> words, Optional<String> landmark) {
        return switch (quantity) {
            case COM_POSITION, COM_VELOCITY -> "";
            case GROUND_FORCE, COP, FREE_MOMENT -> number(words);
            case POINT_POSITION -> landmark.or(() -> joint(words)).orElse("");
            default -> joint(words).orElse("");
        };
    }

    private static boolean any(List<String> words, String... wanted) {
        for (String w : wanted) {
            if (words.contains(w)) {
                return true;
            }
        }
        return false;
    }

    private static Optional<ResultsMap.Quantity> quantity(List<String> words) {
        boolean isMass = any(words, "com") || (any(words, "centre", "center") && any(words, "mass"));
        boolean isPressure = any(words, "cop") || (any(words, "centre", "center") && any(words, "pressure"));
        boolean isGround = any(words, "ground", "free", "plate", "platform", "reaction");
        if (isMass) {
            return Optional.of(
                    any(words, "velocity", "vel", "v", "speed")
                            ? ResultsMap.Quantity.COM_VELOCITY
                            : ResultsMap.Quantity.COM_POSITION);
        }
        if (isPressure) {
            return Optional.of(ResultsMap.Quantity.COP);
        }
        if (any(words, "moment", "torque")) {
            return joint(words).isPresent() && !isGround
                    ? Optional.of(ResultsMap.Quantity.JOINT_MOMENT)
                    : isGround ? Optional.of(ResultsMap.Quantity.FREE_MOMENT) : Optional.empty();
        }
        if (any(words, "force", "grf")) {
            // A force of a joint is none of the ground.
            return joint(words).isPresent() ? Optional.empty() : Optional.of(ResultsMap.Quantity.GROUND_FORCE);
        }
        if (any(words, "angle", "flexion", "dorsiflexion")) {
            return Optional.of(ResultsMap.Quantity.JOINT_ANGLE);
        }
        if (any(words, "power")) {
            return Optional.of(ResultsMap.Quantity.JOINT_POWER);
        }
        return any(words, "position", "pos")
                        && (landmark(words).isPresent() || joint(words).isPresent())
                ? Optional.of(ResultsMap.Quantity.POINT_POSITION)
                : Optional.empty();
    }

    /** Fx, copx and the like. */
    private static Optional<ResultsMap.Quantity> byLetters(List<String> words) {
        for (String w : words) {
            if (w.matches("g?r?f[xyz]|f")) {
                return Optional.of(ResultsMap.Quantity.GROUND_FORCE);
            }
            if (w.matches("cop[xyz]|[cp][xyz]")) {
                return Optional.of(ResultsMap.Quantity.COP);
            }
            if (w.matches("com[xyz]")) {
                return Optional.of(ResultsMap.Quantity.COM_POSITION);
            }
            if (w.matches("t[xyz]|m[xyz]")) {
                return Optional.of(ResultsMap.Quantity.FREE_MOMENT);
            }
        }
        return Optional.empty();
    }

    private static int axis(List<String> words) {
        for (int i = words.size() - 1; i >= 0; i--) {
            String w = words.get(i);
            if (w.matches("[xyz]")) {
                return w.charAt(0) - 'x';
            }
            if (w.matches("(g?r?f|cop|com|[cptmv])[xyz]")) {
                return w.charAt(w.length() - 1) - 'x';
            }
        }
        return -1;
    }

    private static Optional<Side> side(List<String> words) {
        boolean isLeft = any(words, "left", "l");
        boolean isRight = any(words, "right", "r");
        return isLeft == isRight ? Optional.empty() : Optional.of(isLeft ? Side.LEFT : Side.RIGHT);
    }

    private static String unit(List<String> words, String cell) {
        String last = !cell.isEmpty() ? cell : words.isEmpty() ? "" : words.get(words.size() - 1);
        boolean isOneOfMore = words.size() > 1 || !cell.isEmpty();
        if (!isOneOfMore || !UNITS.contains(last)) {
            return "";
        }
        return switch (last) {
            case "n" -> "N";
            case "kn" -> "kN";
            case "nm" -> "N.m";
            case "nmm" -> "N.mm";
            case "w" -> "W";
            case "degrees" -> "deg";
            case "radians" -> "rad";
            case "seconds" -> "s";
            default -> last;
        };
    }

    /** Number of a platform: digits after its word, or the only ones. */
    private static String number(List<String> words) {
        return words.stream().filter(w -> w.matches("[0-9]{1,3}")).findFirst().orElse("");
    }

    private static Optional<String> joint(List<String> words) {
        return JOINTS.stream()
                .filter(words::contains)
                .findFirst()
                .map(j -> j.equals("mtp") ? "metatarsophalangeal" : j);
    }

    private static Optional<String> landmark(List<String> words) {
        String joined = String.join("_", words);
        for (Landmark l : Landmark.values()) {
            if (joined.contains(l.word().replaceAll("([a-z])_([0-9])", "$1_$2"))) {
                return Optional.of(l.word());
            }
        }
        if (any(words, "heel", "calcaneus")) {
            return Optional.of(Landmark.CALCANEUS_POSTERIOR.word());
        }
        if (any(words, "malleolus")) {
            return any(words, "medial")
                    ? Optional.of(Landmark.MALLEOLUS_MEDIAL.word())
                    : any(words, "lateral") ? Optional.of(Landmark.MALLEOLUS_LATERAL.word()) : Optional.empty();
        }
        if (any(words, "metatarsal", "metatarsal1", "head", "met")) {
            for (int n : new int[] {1, 2, 5}) {
                if (words.contains(Integer.toString(n))) {
                    return Landmark.ofWord("metatarsal_" + n + "_" + (any(words, "base") ? "base" : "head"))
                            .map(Landmark::word);
                }
            }
        }
        if (any(words, "toe", "hallux")) {
            return Optional.of(any(words, "hallux") ? Landmark.HALLUX_TIP.word() : Landmark.TOE_TIP.word());
        }
        return any(words, "trochanter") ? Optional.of(Landmark.TROCHANTER_MAJOR.word()) : Optional.empty();
    }
}
