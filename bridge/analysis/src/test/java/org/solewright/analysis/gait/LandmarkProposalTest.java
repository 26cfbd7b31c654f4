package org.solewright.analysis.gait;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.solewright.analysis.gait.LandmarkProposal.Confidence;
import org.solewright.analysis.gait.LandmarkProposal.Guess;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Vec3;

/** Labels of an invented subject who stands with x forward, y to the left, z up, 1.7 m from sole to highest point. */
class LandmarkProposalTest {

    private static Map<String, Vec3> subject(Map<String, double[]> ofRight) {
        Map<String, Vec3> places = new LinkedHashMap<>();
        places.put("NECK", new Vec3(0, 0, 1.7));
        for (String side : List.of("R", "L")) {
            ofRight.forEach(
                    (name, p) -> places.put(side + name, new Vec3(p[0], side.equals("L") ? p[1] : -p[1], p[2])));
        }
        return places;
    }

    private static Map<String, double[]> foot(String inner, String outer) {
        Map<String, double[]> right = new LinkedHashMap<>();
        right.put("_HEEL", new double[] {-0.12, 0.10, 0.03});
        right.put("_MT1", new double[] {0.08, 0.07, 0.02});
        right.put("_MT5", new double[] {0.05, 0.14, 0.02});
        right.put(inner, new double[] {-0.05, 0.07, 0.09});
        right.put(outer, new double[] {-0.06, 0.13, 0.08});
        return right;
    }

    private static Optional<Guess> guess(LandmarkProposal proposal, Landmark landmark, Side side) {
        return proposal.guesses().stream()
                .filter(g -> g.landmark() == landmark && g.side().equals(Optional.of(side)))
                .findFirst();
    }

    @Test
    void wordsAndPlacesThatAgreeAreSure() {
        LandmarkProposal p = LandmarkProposal.of(subject(foot("_ANKLE_MED", "_ANKLE_LAT")), Vec3.Z);
        for (Side side : Side.values()) {
            String letter = side == Side.RIGHT ? "R" : "L";
            assertThat(guess(p, Landmark.CALCANEUS_POSTERIOR, side)).hasValueSatisfying(g -> {
                assertThat(g.labels()).containsExactly(letter + "_HEEL");
                assertThat(g.confidence()).isEqualTo(Confidence.HIGH);
            });
            assertThat(guess(p, Landmark.MALLEOLUS_MEDIAL, side).map(Guess::labels))
                    .contains(List.of(letter + "_ANKLE_MED"));
            assertThat(guess(p, Landmark.METATARSAL_5_HEAD, side).map(Guess::labels))
                    .contains(List.of(letter + "_MT5"));
        }
        assertThat(p.unknown()).containsExactly("NECK");
    }

    @Test
    void pointsWithoutWordsAreFoundByTheirPlaceAndAreDoubtful() {
        LandmarkProposal p = LandmarkProposal.of(subject(foot("_QX", "_QY")), Vec3.Z);
        assertThat(guess(p, Landmark.MALLEOLUS_MEDIAL, Side.RIGHT)).hasValueSatisfying(g -> {
            assertThat(g.labels()).containsExactly("R_QX");
            assertThat(g.confidence()).isEqualTo(Confidence.LOW);
        });
        assertThat(guess(p, Landmark.MALLEOLUS_LATERAL, Side.LEFT).map(Guess::labels))
                .contains(List.of("L_QY"));
    }

    @Test
    void labelOfTheWrongSideIsDoubted() {
        Map<String, Vec3> places = subject(foot("_ANKLE_MED", "_ANKLE_LAT"));
        Vec3 right = places.get("R_HEEL");
        places.put("R_HEEL", places.get("L_HEEL"));
        places.put("L_HEEL", right);
        LandmarkProposal p = LandmarkProposal.of(places, Vec3.Z);
        assertThat(guess(p, Landmark.CALCANEUS_POSTERIOR, Side.RIGHT)).hasValueSatisfying(g -> {
            assertThat(g.confidence()).isEqualTo(Confidence.LOW);
            assertThat(g.why()).contains("other side");
        });
        assertThat(guess(p, Landmark.METATARSAL_1_HEAD, Side.RIGHT).map(Guess::confidence))
                .contains(Confidence.HIGH);
    }

    @Test
    void pointsThatDifferInANumberAreACluster() {
        Map<String, double[]> right = foot("_ANKLE_MED", "_ANKLE_LAT");
        for (int i = 1; i <= 4; i++) {
            right.put("_SHANK_" + i, new double[] {0.01 * i, 0.1, 0.25 + 0.02 * i});
            right.put("_Q" + i, new double[] {0.02 * i, 0.1, 0.62 + 0.02 * i});
        }
        LandmarkProposal p = LandmarkProposal.of(subject(right), Vec3.Z);
        assertThat(guess(p, Landmark.SHANK_CLUSTER, Side.LEFT)).hasValueSatisfying(g -> {
            assertThat(g.labels()).containsExactly("L_SHANK_*");
            assertThat(g.confidence()).isEqualTo(Confidence.HIGH);
        });
        assertThat(guess(p, Landmark.THIGH_CLUSTER, Side.RIGHT).map(Guess::labels))
                .contains(List.of("R_Q*"));
    }

    @ParameterizedTest
    @CsvSource({
        "RHEE, CALCANEUS_POSTERIOR, RIGHT",
        "left heel, CALCANEUS_POSTERIOR, LEFT",
        "subject:L.Calcaneus, CALCANEUS_POSTERIOR, LEFT",
        "RMT1, METATARSAL_1_HEAD, RIGHT",
        "MetHead5_L, METATARSAL_5_HEAD, LEFT",
        "R_BASE1, METATARSAL_1_BASE, RIGHT",
        "LTRO, TROCHANTER_MAJOR, LEFT",
        "R.KNEE.IN, FEMORAL_EPICONDYLE_MEDIAL, RIGHT",
        "RKneeLat, FEMORAL_EPICONDYLE_LATERAL, RIGHT",
        "LASIS, ASIS, LEFT",
        "L_HALLUX, HALLUX_TIP, LEFT"
    })
    void wordsOfTheTradeAreRead(String label, Landmark landmark, Side side) {
        LandmarkWords words = LandmarkWords.of(label);
        assertThat(words.landmark()).contains(landmark);
        assertThat(words.side()).contains(side);
    }

    @ParameterizedTest
    @CsvSource({"RELB", "Angle1", "C7", "*12", "R", "''"})
    void wordsThatNameNothingStayUnknown(String label) {
        assertThat(LandmarkWords.of(label).landmark()).isEmpty();
    }

    @Test
    void noPlacesAtAllStillGiveWhatTheWordsSay() {
        Map<String, Vec3> places = new LinkedHashMap<>();
        places.put("R_HEEL", new Vec3(Double.NaN, Double.NaN, Double.NaN));
        LandmarkProposal p = LandmarkProposal.of(places, Vec3.Z);
        assertThat(guess(p, Landmark.CALCANEUS_POSTERIOR, Side.RIGHT).map(Guess::confidence))
                .contains(Confidence.MEDIUM);
        assertThat(LandmarkProposal.of(Map.of(), Vec3.Z).guesses()).isEmpty();
    }
}
