package org.solewright.analysis.numerics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;

class EllipticIntegralTest {

    @Test
    void symmetricIntegralsHavePublishedValues() {
        // published: [Carlson 1979] via the table of checks in his later papers, 14 digits (from memory).
        assertThat(EllipticIntegral.symmetricFirstKind(1, 2, 0)).isCloseTo(1.3110287771461, within(1e-13));
        assertThat(EllipticIntegral.symmetricFirstKind(2, 3, 4)).isCloseTo(0.58408284167715, within(1e-14));
        assertThat(EllipticIntegral.symmetricSecondKind(0, 2, 1)).isCloseTo(1.7972103521034, within(1e-13));
        assertThat(EllipticIntegral.symmetricSecondKind(2, 3, 4)).isCloseTo(0.16510527294261, within(1e-14));
    }

    @Test
    void circleIsTheLimitOfTheEllipse() {
        // exact: m = 0 gives the angle, m = 1 the inverse Gudermannian and the sine.
        assertThat(EllipticIntegral.first(0.7, 0)).isCloseTo(0.7, within(1e-15));
        assertThat(EllipticIntegral.second(-0.7, 0)).isCloseTo(-0.7, within(1e-15));
        assertThat(EllipticIntegral.first(0.7, 1)).isCloseTo(Math.log(Math.tan(Math.PI / 4 + 0.35)), within(1e-14));
        assertThat(EllipticIntegral.second(0.7, 1)).isCloseTo(Math.sin(0.7), within(1e-15));
    }
}
