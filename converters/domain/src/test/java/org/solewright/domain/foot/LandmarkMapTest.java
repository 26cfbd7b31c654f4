package org.solewright.domain.foot;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.solewright.domain.gait.Side;

class LandmarkMapTest {

    private static final LandmarkMap MAP = new LandmarkMap(
            "invented",
            List.of(
                    entry(Landmark.SACRUM, Optional.empty(), "SACR"),
                    entry(Landmark.CALCANEUS_POSTERIOR, Optional.of(Side.LEFT), "L_HEEL"),
                    entry(Landmark.SHANK_CLUSTER, Optional.of(Side.RIGHT), "R_SHANK_*", "R_SHIN")));

    private static LandmarkMap.Entry entry(Landmark landmark, Optional<Side> side, String... patterns) {
        return new LandmarkMap.Entry(
                landmark,
                side,
                List.of(patterns).stream().map(LabelPattern::new).toList());
    }

    @Test
    void pointOfTheMidlineStandsUnderBothSides() {
        assertThat(MAP.labels(Landmark.SACRUM, Side.LEFT, List.of("SACR"))).containsExactly("SACR");
        assertThat(MAP.labels(Landmark.SACRUM, Side.RIGHT, List.of("SACR"))).containsExactly("SACR");
        assertThat(MAP.names(Landmark.CALCANEUS_POSTERIOR, Side.RIGHT)).isFalse();
    }

    @Test
    void subjectBeforeTheColonIsStripped() {
        assertThat(MAP.labels(Landmark.CALCANEUS_POSTERIOR, Side.LEFT, List.of("s07:L_HEEL", "L_HEEL2")))
                .containsExactly("s07:L_HEEL");
    }

    @Test
    void starStandsForAnyCharactersAndTheOrderIsThatOfTheNames() {
        assertThat(MAP.labels(
                        Landmark.SHANK_CLUSTER, Side.RIGHT, List.of("R_SHIN", "R_SHANK_2", "R_SHANK_1", "L_SHANK_1")))
                .containsExactly("R_SHANK_1", "R_SHANK_2", "R_SHIN");
    }

    @Test
    void manyStarsDoNotHang() {
        assertThat(new LabelPattern("*a".repeat(30) + "b").matches("a".repeat(5000)))
                .isFalse();
    }

    @Test
    void patternsMatchWholeLabels() {
        assertThat(new LabelPattern("a*c").matches("abc")).isTrue();
        assertThat(new LabelPattern("a*c").matches("ac")).isTrue();
        assertThat(new LabelPattern("a*c").matches("abcd")).isFalse();
        assertThat(new LabelPattern("*").matches("")).isTrue();
        assertThat(new LabelPattern("heel").matches("HEEL")).isFalse();
    }

    @Test
    void entryWithoutLabelIsRefused() {
        assertThatThrownBy(() -> entry(Landmark.CUBOID, Optional.of(Side.LEFT)))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessage("landmark cuboid has no label");
    }

    @Test
    void onlyClustersKeepTheirPointsApart() {
        assertThat(Landmark.SHANK_CLUSTER.isCluster()).isTrue();
        assertThat(Landmark.SACRUM.isCluster()).isFalse();
        assertThat(Landmark.ofWord("malleolus_medial")).contains(Landmark.MALLEOLUS_MEDIAL);
        assertThat(Landmark.ofWord("heel")).isEmpty();
    }
}
