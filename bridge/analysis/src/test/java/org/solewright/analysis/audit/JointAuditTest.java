package org.solewright.analysis.audit;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.solewright.domain.finding.Finding;

class JointAuditTest {

    private static final AuditSettings SETTINGS = new AuditSettings(0.05, 10, 9.80665);

    private static List<Finding> audit(double factor, double noise) {
        double[] v = new double[3 * 500];
        for (int i = 0; i < 500; i++) {
            double t = i / 500.0;
            v[3 * i] = 0.3 * Math.sin(6 * t);
            v[3 * i + 1] = 80 * Math.cos(5 * t);
            v[3 * i + 2] = factor * v[3 * i + 1] * 0.3 * 6 * Math.cos(6 * t) + noise * Math.sin(90 * t);
        }
        AuditedVector values = new AuditedVector("ankle", List.of("a", "m", "p"), 0, 500, v);
        return JointAudit.of(List.of(new JointAudit.Columns("right ankle", "a", "m", "p", values)), SETTINGS, "walk");
    }

    @Test
    void powerThatIsMomentTimesRateIsPassed() {
        // exact: the angle's derivative; central differences are short by (6 x 2e-3)^2/6 = 2.4e-5.
        assertThat(audit(1, 0)).isEmpty();
    }

    @Test
    void powerOfTheOtherSenseOrUnitIsNamed() {
        assertThat(audit(-1, 0)).singleElement().satisfies(f -> {
            assertThat(f.code()).isEqualTo("audit.joint-power");
            assertThat(f.where()).isEqualTo("walk right ankle");
            assertThat(f.message())
                    .contains("column 'p' is not 'm' times the rate of 'a'")
                    .endsWith("times -1 they agree");
        });
        assertThat(audit(0.001, 0))
                .singleElement()
                .satisfies(f -> assertThat(f.message()).endsWith("times 1000 they agree"));
        assertThat(audit(1, 200))
                .singleElement()
                .satisfies(f -> assertThat(f.message()).doesNotContain("they agree"));
    }
}
