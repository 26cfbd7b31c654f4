package org.solewright.analysis.gait;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.gait.Side;

/**
 * What the text of a label says: words of the trade, whole or shortened to three letters or more, with the side before or
 * behind them.
 *
 * @param part of the body that the label names; empty where it names none
 * @param side whose; empty where the label does not say
 * @param number in the label, such as that of a metatarsal; 0 without
 * @param isInner whether it says medial or inner
 * @param isOuter whether it says lateral or outer
 */
record LandmarkWords(Optional<Part> part, Optional<Side> side, int number, boolean isInner, boolean isOuter) {

    private static final int SHORTEST = 3;

    /** Parts of the body that labels name. */
    enum Part {
        HEEL("HEEL", "CALCANEUS"),
        SUSTENTACULUM("SUSTENTACULUM"),
        PERONEAL("PERONEAL"),
        NAVICULAR("NAVICULAR"),
        CUBOID("CUBOID"),
        BASE("BASE", "METATARSALBASE", "METBASE", "MTB"),
        HEAD("METATARSAL", "METATARSUS", "METHEAD", "MTH", "MTP", "MT", "HEAD", "BALL"),
        HALLUX("HALLUX", "BIGTOE", "GREATTOE"),
        TOE("TOE"),
        ANKLE("ANKLE", "MALLEOLUS"),
        KNEE("KNEE", "EPICONDYLE", "CONDYLE"),
        TROCHANTER("TROCHANTER", "GREATTROCHANTER", "GTROCHANTER"),
        ASIS("ASIS"),
        PSIS("PSIS"),
        SACRUM("SACRUM"),
        THIGH("THIGH", "FEMUR"),
        SHANK("SHANK", "TIBIA", "CALF"),
        HINDFOOT("HINDFOOT", "REARFOOT"),
        MIDFOOT("MIDFOOT"),
        FOREFOOT("FOREFOOT"),
        PELVIS("PELVIS");

        /** Separated by spaces. */
        private final String words;

        Part(String... words) {
            this.words = String.join(" ", words);
        }
    }

    /** Reads a label; what precedes a colon is a subject's name. */
    static LandmarkWords of(String label) {
        String text = label.substring(label.lastIndexOf(':') + 1);
        int number = 0;
        List<String> tokens = new ArrayList<>();
        for (String token :
                text.split("[^A-Za-z0-9]+|(?<=[a-z])(?=[A-Z])|(?<=[A-Za-z])(?=[0-9])|(?<=[0-9])(?=[A-Za-z])", -1)) {
            if (token.matches("[0-9]{1,3}")) {
                number = number == 0 ? Integer.parseInt(token) : number;
            } else if (!token.isEmpty()) {
                tokens.add(token.toUpperCase(Locale.ROOT));
            }
        }
        Optional<Side> side = Optional.empty();
        for (String token : List.copyOf(tokens)) {
            Optional<Side> named = side(token);
            if (side.isEmpty() && named.isPresent()) {
                side = named;
                tokens.remove(token);
            }
        }
        String joined = String.join("", tokens);
        Optional<Found> found = found(joined);
        if (found.isEmpty() && side.isEmpty() && joined.length() > SHORTEST - 1) {
            // A side's letter before or behind the word, without a separator.
            for (boolean isBefore : new boolean[] {true, false}) {
                String letter = isBefore ? joined.substring(0, 1) : joined.substring(joined.length() - 1);
                String rest = isBefore ? joined.substring(1) : joined.substring(0, joined.length() - 1);
                if (found.isEmpty() && side(letter).isPresent() && found(rest).isPresent()) {
                    side = side(letter);
                    found = found(rest);
                }
            }
        }
        String more = found.map(Found::rest).orElse(joined);
        boolean isInner = says(tokens, more, "MEDIAL", "INNER", "INSIDE", "IN");
        boolean isOuter = !isInner && says(tokens, more, "LATERAL", "OUTER", "OUTSIDE", "OUT");
        return new LandmarkWords(found.map(Found::part), side, number, isInner, isOuter);
    }

    private static Optional<Side> side(String token) {
        return switch (token) {
            case "R", "RT", "RIGHT" -> Optional.of(Side.RIGHT);
            case "L", "LT", "LEFT" -> Optional.of(Side.LEFT);
            default -> Optional.empty();
        };
    }

    private record Found(Part part, String rest) {}

    /** The longest word that the text begins with, or that begins with the whole text. */
    private static Optional<Found> found(String text) {
        Optional<Found> best = Optional.empty();
        int longest = 0;
        for (Part part : Part.values()) {
            for (String word : part.words.split(" ", -1)) {
                int common = common(word, text);
                boolean isWhole = common == word.length();
                boolean isShortened = common >= SHORTEST && common == text.length();
                boolean isQualified = common >= SHORTEST && isQualifier(text.substring(common));
                if ((isWhole || isShortened || isQualified) && common > longest) {
                    longest = common;
                    best = Optional.of(new Found(part, text.substring(common)));
                }
            }
        }
        return best;
    }

    private static int common(String word, String text) {
        int n = 0;
        while (n < word.length() && n < text.length() && word.charAt(n) == text.charAt(n)) {
            n++;
        }
        return n;
    }

    private static boolean isQualifier(String rest) {
        return rest.startsWith("MED") || rest.startsWith("LAT") || rest.equals("IN") || rest.equals("OUT");
    }

    private static boolean says(List<String> tokens, String more, String... words) {
        for (String word : words) {
            for (String token : tokens) {
                boolean isLong = token.length() >= SHORTEST;
                if (token.equals(word) || (isLong && word.startsWith(token))) {
                    return true;
                }
            }
            boolean isLong = more.length() >= SHORTEST;
            if (more.equals(word) || (isLong && (word.startsWith(more) || more.startsWith(word)))) {
                return true;
            }
        }
        return false;
    }

    /** The landmark that the text names, the lateral one where it does not say which; empty for a cluster or nothing. */
    Optional<Landmark> landmark() {
        return part.flatMap(p -> switch (p) {
            case HEEL -> Optional.of(Landmark.CALCANEUS_POSTERIOR);
            case SUSTENTACULUM -> Optional.of(Landmark.SUSTENTACULUM_TALI);
            case PERONEAL -> Optional.of(Landmark.PERONEAL_TUBERCLE);
            case NAVICULAR -> Optional.of(Landmark.NAVICULAR_TUBEROSITY);
            case CUBOID -> Optional.of(Landmark.CUBOID);
            case BASE ->
                number == 1
                        ? Optional.of(Landmark.METATARSAL_1_BASE)
                        : number == 5 ? Optional.of(Landmark.METATARSAL_5_BASE) : Optional.<Landmark>empty();
            case HEAD ->
                switch (number) {
                    case 1 -> Optional.of(Landmark.METATARSAL_1_HEAD);
                    case 2 -> Optional.of(Landmark.METATARSAL_2_HEAD);
                    case 5 -> Optional.of(Landmark.METATARSAL_5_HEAD);
                    default -> Optional.<Landmark>empty();
                };
            case HALLUX -> Optional.of(Landmark.HALLUX_TIP);
            case TOE -> Optional.of(Landmark.TOE_TIP);
            case ANKLE -> Optional.of(isInner ? Landmark.MALLEOLUS_MEDIAL : Landmark.MALLEOLUS_LATERAL);
            case KNEE ->
                Optional.of(isInner ? Landmark.FEMORAL_EPICONDYLE_MEDIAL : Landmark.FEMORAL_EPICONDYLE_LATERAL);
            case TROCHANTER -> Optional.of(Landmark.TROCHANTER_MAJOR);
            case ASIS -> Optional.of(Landmark.ASIS);
            case PSIS -> Optional.of(Landmark.PSIS);
            case SACRUM -> Optional.of(Landmark.SACRUM);
            case THIGH, SHANK, HINDFOOT, MIDFOOT, FOREFOOT, PELVIS -> Optional.<Landmark>empty();
        });
    }

    /** The cluster that the text names a point of. */
    Optional<Landmark> cluster() {
        return part.flatMap(p -> switch (p) {
            case THIGH -> Optional.of(Landmark.THIGH_CLUSTER);
            case SHANK -> Optional.of(Landmark.SHANK_CLUSTER);
            case HINDFOOT -> Optional.of(Landmark.HINDFOOT_CLUSTER);
            case MIDFOOT -> Optional.of(Landmark.MIDFOOT_CLUSTER);
            case FOREFOOT -> Optional.of(Landmark.FOREFOOT_CLUSTER);
            case PELVIS -> Optional.of(Landmark.PELVIS_CLUSTER);
            default -> Optional.<Landmark>empty();
        });
    }
}
