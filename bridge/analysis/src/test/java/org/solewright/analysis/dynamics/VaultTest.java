package org.solewright.analysis.dynamics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class VaultTest {

    private static final double G = 9.81;

    /** independent: Gauss-Legendre quadrature of 1/rate instead of elliptic integrals. */
    private static double byQuadrature(double r, double a, double b, double rate, double slope) {
        return new Quadrature()
                .integral(
                        x -> 1 / Math.sqrt(rate * rate + 2 * G / r * (Math.cos(a + slope) - Math.cos(x + slope))),
                        a,
                        b,
                        400);
    }

    @ParameterizedTest
    @CsvSource({
        "0.9, -0.3, 0.4, 1.6, 0",
        "0.5, -0.1, 0.05, 0.8, 0",
        "0.9, -0.4, 0.4, 1.5, 0.1",
        "0.9, 0.1, 0.6, 0.05, 0",
        "0.9, 0.1, 0.6, 3, 0",
        "0.9, -0.6, -0.2, 1.9, 0",
        "0.9, -0.05, 0.3, 0.4, -0.02"
    })
    void ellipticDurationAgreesWithQuadrature(double r, double a, double b, double rate, double slope)
            throws LimitException {
        assertThat(Vault.duration(r, G, a, b, rate, slope))
                .isCloseTo(byQuadrature(r, a, b, rate, slope), within(1e-10));
        // exact: energy.
        double end = Vault.endRate(r, G, a, b, rate, slope);
        assertThat(r * end * end / 2 + G * Math.cos(b + slope))
                .isCloseTo(r * rate * rate / 2 + G * Math.cos(a + slope), within(1e-12));
    }

    @Test
    void vaultBackwardsIsItsMirrorImage() throws LimitException {
        // exact: symmetry.
        assertThat(Vault.duration(0.9, G, 0.3, -0.4, -1.6, 0.05))
                .isEqualTo(Vault.duration(0.9, G, -0.3, 0.4, 1.6, -0.05));
        assertThat(Vault.endRate(0.9, G, 0.3, -0.4, -1.6, 0)).isNegative();
    }

    @Test
    void startAtRestBehindTheTopFalls() throws LimitException {
        // independent: with sin(x/2) = sin(a/2) cosh-like growth; quadrature after the substitution x = a + s^2.
        double a = 0.1;
        double byQuadrature = new Quadrature()
                .integral(
                        s -> 2 * s / Math.sqrt(2 * G / 0.9 * (Math.cos(a) - Math.cos(a + s * s))),
                        1e-9,
                        Math.sqrt(0.4),
                        400);
        assertThat(Vault.duration(0.9, G, a, 0.5, 0, 0)).isCloseTo(byQuadrature, within(1e-6));
    }

    @Test
    void massThatDoesNotGetThereIsSaid() {
        // exact: the top of 0.3 rad needs w^2 = (2 g / r)(1 - cos 0.3) = 0.9737, so w of 0.9868 rad/s.
        assertThatThrownBy(() -> Vault.duration(0.9, G, -0.3, 0.3, 0.98, 0))
                .isInstanceOf(LimitException.class)
                .hasMessageContaining("start rate of 0.98");
        assertThatThrownBy(() -> Vault.duration(0.9, G, -0.3, 0.3, -1, 0)).isInstanceOf(LimitException.class);
        assertThatThrownBy(() -> Vault.duration(0, G, -0.3, 0.3, 1, 0)).isInstanceOf(LimitException.class);
    }
}
