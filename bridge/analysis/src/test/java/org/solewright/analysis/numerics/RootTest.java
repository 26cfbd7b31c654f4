package org.solewright.analysis.numerics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;

class RootTest {

    @Test
    void findsRootsToTheLastDigits() {
        assertThat(Root.inBracket(x -> x * x - 2, 0, 2)).isCloseTo(Math.sqrt(2), within(1e-15)); // exact
        assertThat(Root.inBracket(Math::cos, 0, 3)).isCloseTo(Math.PI / 2, within(1e-15));
        assertThat(Root.inBracket(x -> x - 1e-9, 0, 1)).isCloseTo(1e-9, within(1e-24));
    }

    @Test
    void rootAtAnEndIsTaken() {
        assertThat(Root.inBracket(x -> x, 0, 1)).isZero();
        assertThat(Root.inBracket(x -> x - 1, 0, 1)).isEqualTo(1);
    }

    @Test
    void bracketWithoutChangeOfSignIsRefused() {
        assertThatThrownBy(() -> Root.inBracket(x -> x * x + 1, 0, 2))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessage("function is 1.0 at 0.0 and 5.0 at 2.0, expected opposite signs");
        assertThatThrownBy(() -> Root.inBracket(x -> Double.NaN, 0, 2)).isInstanceOf(IllegalArgumentException.class);
    }
}
