package org.solewright.app.report;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

class WordsTest {

    @Test
    void minusIsTheMathematicalOne() {
        assertThat(Words.number(-17.25, 1)).isEqualTo("\u221217.3");
        assertThat(Words.typeset("from -3 to 2 +- 1, walk-1 and --sex"))
                .isEqualTo("from \u22123 to 2 \u00b1 1, walk-1 and --sex");
    }

    @Test
    void nothingIsLessThanZeroWhenItRoundsToZero() {
        assertThat(Words.number(-0.0004, 2)).isEqualTo("0.00");
        assertThat(Words.number(Double.NaN, 2)).isEqualTo(Words.NONE);
    }

    @Test
    void valuesAreRoundedToTheirSd() {
        // exact: the SD's first figure, its first two where it begins with 1
        assertThat(Words.withSd(22.0633, OptionalDouble.of(1.372), 1)).isEqualTo("22.1 \u00b1 1.4");
        assertThat(Words.withSd(-12.472, OptionalDouble.of(0.62), 3)).isEqualTo("\u221212.5 \u00b1 0.6");
        assertThat(Words.withSd(0.3215, OptionalDouble.of(0.0294), 3)).isEqualTo("0.32 \u00b1 0.03");
        assertThat(Words.withSd(1234, OptionalDouble.of(25), 1)).isEqualTo("1234 \u00b1 25");
        assertThat(Words.withSd(5, OptionalDouble.empty(), 2)).isEqualTo("5.00");
    }

    @Test
    void listsReadAsInASentence() {
        assertThat(Words.list(java.util.List.of("a", "b", "c"))).isEqualTo("a, b and c");
        assertThat(Words.list(java.util.List.of())).isEmpty();
    }
}
