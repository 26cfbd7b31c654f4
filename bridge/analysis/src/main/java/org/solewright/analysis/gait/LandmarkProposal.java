package org.solewright.analysis.gait;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Vec3;

/**
 * Which labels of a standing recording may stand for which landmarks: by the words in them, checked and completed by where
 * the points were. A proposal for a user to confirm.
 *
 * @param guesses in the order of the landmarks, right before left
 * @param unknown labels that were not placed, in the order of the recording
 */
public record LandmarkProposal(List<Guess> guesses, List<String> unknown) {

    /** How sure a guess is. */
    public enum Confidence {
        /** Words and place say the same. */
        HIGH,
        /** One of them says it and the other is silent. */
        MEDIUM,
        /** Words and place disagree, or a place alone was looked at among few. */
        LOW
    }

    /**
     * One guess.
     *
     * @param landmark which
     * @param side whose; empty for the mid-line
     * @param labels one label, or the pattern of a cluster's
     * @param confidence how sure
     * @param why one phrase
     */
    public record Guess(
            Landmark landmark, Optional<Side> side, List<String> labels, Confidence confidence, String why) {

        /** Copies the list. */
        public Guess {
            labels = List.copyOf(labels);
        }
    }

    /** Copies the lists. */
    public LandmarkProposal {
        guesses = List.copyOf(guesses);
        unknown = List.copyOf(unknown);
    }

    /** A point of a foot's ankle lies below this share of stature, a knee between the next two. */
    private static final double ANKLE_SHARE = 0.12;

    private static final double KNEE_LOW = 0.2;
    private static final double KNEE_HIGH = 0.42;
    private static final double SHANK_HIGH = 0.32;
    private static final double THIGH_HIGH = 0.6;
    private static final double HIP_LOW = 0.4;
    private static final double FOOT_SHARE = 0.09;
    private static final int FEWEST_OF_CLUSTER = 3;

    /** Hip height over stature [Drillis Contini 1966]: a recording may show nothing above the pelvis. */
    private static final double HIP_SHARE = 0.530;

    private static final List<Landmark> HIPS =
            List.of(Landmark.TROCHANTER_MAJOR, Landmark.ASIS, Landmark.PSIS, Landmark.SACRUM);

    /**
     * Proposes landmarks.
     *
     * @param places label to mean standing position, m, in the order of the recording; NaN where never seen
     * @param up unit vector
     * @return the proposal
     */
    public static LandmarkProposal of(Map<String, Vec3> places, Vec3 up) {
        return new Maker(places, up).proposal();
    }

    /** Works one proposal out. */
    private static final class Maker {
        private final Map<String, Vec3> places;
        private final Vec3 up;
        private final Map<String, LandmarkWords> words = new LinkedHashMap<>();
        private final List<Guess> guesses = new ArrayList<>();
        private final List<String> left = new ArrayList<>();
        private double lowest = Double.POSITIVE_INFINITY;
        private double height;
        private Optional<Vec3> right = Optional.empty();
        private Optional<Vec3> middle = Optional.empty();

        Maker(Map<String, Vec3> places, Vec3 up) {
            this.places = places;
            this.up = up;
            double highest = Double.NEGATIVE_INFINITY;
            for (Map.Entry<String, Vec3> e : places.entrySet()) {
                words.put(e.getKey(), LandmarkWords.of(e.getKey()));
                left.add(e.getKey());
                if (e.getValue().isFinite()) {
                    lowest = Math.min(lowest, e.getValue().dot(up));
                    highest = Math.max(highest, e.getValue().dot(up));
                }
            }
            height = Math.max(highest - lowest, hipHeight() / HIP_SHARE);
        }

        /** Mean height of what is named after pelvis and hip, m; 0 without. */
        private double hipHeight() {
            double sum = 0;
            int n = 0;
            for (Map.Entry<String, Vec3> e : places.entrySet()) {
                Optional<Landmark> named = wordsOf(e.getKey()).landmark();
                if (e.getValue().isFinite() && named.filter(HIPS::contains).isPresent()) {
                    sum += e.getValue().dot(up) - lowest;
                    n++;
                }
            }
            return n == 0 ? 0 : sum / n;
        }

        LandmarkProposal proposal() {
            findRight();
            clusters();
            for (String label : List.copyOf(left)) {
                wordsOf(label).landmark().ifPresent(landmark -> byWords(label, landmark));
            }
            if (right.isPresent() && height > 0) {
                for (Side side : new Side[] {Side.RIGHT, Side.LEFT}) {
                    byPlace(side);
                }
            }
            guesses.sort(Comparator.comparing(Guess::landmark)
                    .thenComparing(
                            g -> g.side().map(s -> s == Side.RIGHT ? 0 : 1).orElse(2)));
            return new LandmarkProposal(guesses, left);
        }

        /** To the right: between points of the same words on both sides; else by the feet, whose toes lie forward. */
        private void findRight() {
            Vec3 sum = Vec3.ZERO;
            Vec3 centre = Vec3.ZERO;
            int pairs = 0;
            for (String a : words.keySet()) {
                for (String b : words.keySet()) {
                    LandmarkWords r = wordsOf(a);
                    LandmarkWords l = wordsOf(b);
                    boolean isPair = r.side().equals(Optional.of(Side.RIGHT))
                            && l.side().equals(Optional.of(Side.LEFT))
                            && r.part().isPresent()
                            && r.part().equals(l.part())
                            && r.number() == l.number()
                            && r.isInner() == l.isInner()
                            && place(a).isFinite()
                            && place(b).isFinite();
                    if (isPair) {
                        sum = sum.plus(place(a)).minus(place(b));
                        centre = centre.plus(place(a)).plus(place(b));
                        pairs++;
                    }
                }
            }
            if (pairs > 0) {
                middle = Optional.of(centre.times(0.5 / pairs));
                right = level(sum);
            }
        }

        private Optional<Vec3> level(Vec3 v) {
            Vec3 across = v.minus(up.times(v.dot(up)));
            return across.norm() > 0 ? Optional.of(across.unit()) : Optional.empty();
        }

        private LandmarkWords wordsOf(String label) {
            return words.computeIfAbsent(label, LandmarkWords::of);
        }

        private Vec3 place(String label) {
            return places.getOrDefault(label, new Vec3(Double.NaN, Double.NaN, Double.NaN));
        }

        private double heightOf(String label) {
            return (place(label).dot(up) - lowest) / height;
        }

        /** Three labels or more that differ in a number alone and name a segment, or lie between two joints. */
        private void clusters() {
            Map<String, List<String>> groups = new TreeMap<>();
            for (String label : left) {
                String base = label.replaceAll("[0-9]+$", "");
                if (!base.equals(label)) {
                    groups.computeIfAbsent(base, k -> new ArrayList<>()).add(label);
                }
            }
            groups.forEach((base, members) -> {
                LandmarkWords own = wordsOf(members.get(0));
                Optional<Landmark> named = own.cluster();
                if (members.size() < FEWEST_OF_CLUSTER || own.landmark().isPresent()) {
                    return;
                }
                Optional<Landmark> byPlace = clusterByPlace(members);
                Optional<Side> side = own.side().or(() -> sideByPlace(members.get(0)));
                Optional<Landmark> landmark = named.or(() -> byPlace);
                if (landmark.isEmpty() || side.isEmpty()) {
                    return;
                }
                boolean isSame = named.isPresent() && (byPlace.equals(named) || byPlace.isEmpty());
                guesses.add(new Guess(
                        landmark.get(),
                        side,
                        List.of(base + "*"),
                        isSame ? Confidence.HIGH : named.isPresent() ? Confidence.MEDIUM : Confidence.LOW,
                        members.size() + " labels that differ in a number, "
                                + (named.isPresent() ? "named after the segment" : "between two joints")));
                left.removeAll(members);
            });
        }

        private Optional<Landmark> clusterByPlace(List<String> members) {
            if (!(height > 0)) {
                return Optional.empty();
            }
            double mean = members.stream()
                    .filter(m -> place(m).isFinite())
                    .mapToDouble(this::heightOf)
                    .average()
                    .orElse(Double.NaN);
            return mean > ANKLE_SHARE && mean < SHANK_HIGH
                    ? Optional.of(Landmark.SHANK_CLUSTER)
                    : mean >= SHANK_HIGH && mean < THIGH_HIGH ? Optional.of(Landmark.THIGH_CLUSTER) : Optional.empty();
        }

        private Optional<Side> sideByPlace(String label) {
            return right.flatMap(r -> middle.filter(m -> place(label).isFinite())
                    .map(m -> place(label).minus(m).dot(r) > 0 ? Side.RIGHT : Side.LEFT));
        }

        private void byWords(String label, Landmark landmark) {
            LandmarkWords own = wordsOf(label);
            boolean isMidline = landmark == Landmark.SACRUM;
            Optional<Side> placed = sideByPlace(label);
            Optional<Side> side = isMidline ? Optional.empty() : own.side().or(() -> placed);
            if (!isMidline && side.isEmpty()) {
                return;
            }
            boolean isTaken = guesses.stream()
                    .anyMatch(g -> g.landmark() == landmark && g.side().equals(side));
            if (isTaken) {
                return;
            }
            boolean isSideRight = isMidline || placed.isEmpty() || placed.equals(side);
            boolean isHeightRight = isHeightRight(landmark, label);
            Confidence confidence = !isSideRight || !isHeightRight
                    ? Confidence.LOW
                    : place(label).isFinite() && right.isPresent() ? Confidence.HIGH : Confidence.MEDIUM;
            String why = !isSideRight
                    ? "its words name it, but it lies on the other side"
                    : !isHeightRight ? "its words name it, but not its height" : "its words name it";
            guesses.add(new Guess(landmark, side, List.of(label), confidence, why));
            left.remove(label);
        }

        private boolean isHeightRight(Landmark landmark, String label) {
            if (!(height > 0) || !place(label).isFinite()) {
                return true;
            }
            double h = heightOf(label);
            return switch (landmark) {
                case FEMORAL_EPICONDYLE_LATERAL, FEMORAL_EPICONDYLE_MEDIAL -> h > KNEE_LOW - 0.05 && h < 0.6;
                case TROCHANTER_MAJOR, ASIS, PSIS, SACRUM -> h > HIP_LOW;
                default -> h < 0.25;
            };
        }

        /** Fills what words did not name from the points of a side that are left. */
        private void byPlace(Side side) {
            Vec3 across = right.orElseThrow().times(side == Side.RIGHT ? 1 : -1);
            Vec3 forward = up.cross(right.orElseThrow());
            List<String> own = left.stream()
                    .filter(l -> sideByPlace(l).equals(Optional.of(side))
                            && wordsOf(l).part().isEmpty())
                    .toList();
            pair(side, own, across, FOOT_SHARE / 3, ANKLE_SHARE, Landmark.MALLEOLUS_MEDIAL, Landmark.MALLEOLUS_LATERAL);
            pair(
                    side,
                    own,
                    across,
                    KNEE_LOW,
                    KNEE_HIGH,
                    Landmark.FEMORAL_EPICONDYLE_MEDIAL,
                    Landmark.FEMORAL_EPICONDYLE_LATERAL);
            Comparator<String> rearFirst = Comparator.comparingDouble(l -> place(l).dot(forward));
            Comparator<String> innerFirst = Comparator.comparingDouble(l -> place(l).dot(across));
            fill(side, low(own), rearFirst, Landmark.CALCANEUS_POSTERIOR, "the rearmost low point of the side");
            fill(side, low(own), rearFirst.reversed(), Landmark.TOE_TIP, "the foremost low point of the side");
            fill(side, low(own), innerFirst, Landmark.METATARSAL_1_HEAD, "the innermost low point that was left");
            fill(
                    side,
                    low(own),
                    innerFirst.reversed(),
                    Landmark.METATARSAL_5_HEAD,
                    "the outermost low point that was left");
        }

        private List<String> low(List<String> own) {
            return own.stream()
                    .filter(l -> left.contains(l) && heightOf(l) < FOOT_SHARE)
                    .toList();
        }

        private boolean isKnown(Landmark landmark, Side side) {
            return guesses.stream()
                    .anyMatch(g -> g.landmark() == landmark && g.side().equals(Optional.of(side)));
        }

        private void fill(Side side, List<String> from, Comparator<String> order, Landmark landmark, String why) {
            if (!isKnown(landmark, side) && !from.isEmpty()) {
                String label = from.stream().min(order).orElseThrow();
                guesses.add(new Guess(landmark, Optional.of(side), List.of(label), Confidence.LOW, why));
                left.remove(label);
            }
        }

        /** Two points of about one height within a band; the inner and the outer one. */
        private void pair(
                Side side, List<String> own, Vec3 across, double low, double high, Landmark inner, Landmark outer) {
            if (isKnown(inner, side) && isKnown(outer, side)) {
                return;
            }
            List<String> band = own.stream()
                    .filter(l -> left.contains(l) && heightOf(l) > low && heightOf(l) < high)
                    .sorted(Comparator.comparingDouble(l -> place(l).dot(across)))
                    .toList();
            if (band.size() != 2) {
                return;
            }
            String why = "one of two points of the side at that height, the ";
            guesses.add(new Guess(inner, Optional.of(side), List.of(band.get(0)), Confidence.LOW, why + "inner one"));
            guesses.add(new Guess(outer, Optional.of(side), List.of(band.get(1)), Confidence.LOW, why + "outer one"));
            left.removeAll(band);
        }
    }
}
