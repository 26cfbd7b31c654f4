package org.solewright.formats.io;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import org.junit.jupiter.api.Test;

class SpellingTest {

    private static final List<String> KNOWN = List.of("R_HEEL", "L_HEEL", "R_ANKLE_LAT");

    @Test
    void closestWordIsFoundWhateverTheCase() {
        assertThat(Spelling.nearest("r_heel", KNOWN)).contains("R_HEEL");
        assertThat(Spelling.nearest("R_ANKEL_LAT", KNOWN)).contains("R_ANKLE_LAT");
        assertThat(Spelling.nearest("L-HEEL", KNOWN)).contains("L_HEEL");
    }

    @Test
    void firstOfEquallyCloseWordsIsTaken() {
        assertThat(Spelling.nearest("_HEEL", KNOWN)).contains("R_HEEL");
    }

    @Test
    void farWordsAndHugeWordsHaveNoNeighbour() {
        assertThat(Spelling.nearest("SACRUM", KNOWN)).isEmpty();
        assertThat(Spelling.nearest("R".repeat(100_000), KNOWN)).isEmpty();
        assertThat(Spelling.nearest("x", List.of())).isEmpty();
        assertThat(Spelling.hint("SACRUM", KNOWN)).isEqualTo("use one of R_HEEL, L_HEEL, R_ANKLE_LAT");
        assertThat(Spelling.hint("R_HEAL", KNOWN)).isEqualTo("did you mean 'R_HEEL'?");
    }
}
