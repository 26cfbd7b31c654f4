package org.solewright.analysis.audit;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.UnaryOperator;
import org.junit.jupiter.api.Test;
import org.solewright.domain.finding.Finding;

/** Contacts of the invented walk, whole and spoilt. */
class ContactAuditTest {

    private static final AuditSettings SETTINGS = new AuditSettings(0.05, 10, 9.80665);

    private final AuditedResults whole = new InventedResults().rates(200, 200).results();

    private static String said(AuditedResults results) {
        StringBuilder all = new StringBuilder();
        for (Finding f : ContactAudit.of(results, SETTINGS)) {
            all.append(f.code())
                    .append(' ')
                    .append(f.where())
                    .append(": ")
                    .append(f.message())
                    .append('\n');
        }
        return all.toString();
    }

    private AuditedResults withCop(int which, UnaryOperator<AuditedVector> change) {
        List<AuditedResults.Load> loads = new ArrayList<>(whole.loads());
        AuditedResults.Load l = loads.get(which);
        loads.set(which, new AuditedResults.Load(l.side(), l.force(), change.apply(l.centreOfPressure())));
        return new AuditedResults("walk", whole.centreOfMass(), Optional.empty(), loads, whole.feet(), whole.mass());
    }

    private AuditedResults withFeet(UnaryOperator<AuditedVector> change) {
        List<AuditedResults.Foot> feet = whole.feet().stream()
                .map(f -> new AuditedResults.Foot(
                        f.side(), f.landmarks().stream().map(change).toList()))
                .toList();
        return new AuditedResults("walk", whole.centreOfMass(), Optional.empty(), whole.loads(), feet, whole.mass());
    }

    private static AuditedVector raised(AuditedVector v, double by) {
        double[] xyz = v.interleaved();
        for (int i = 2; i < xyz.length; i += 3) {
            xyz[i] += by;
        }
        return new AuditedVector(v.name(), List.of("", "", ""), v.start(), v.rate(), xyz);
    }

    @Test
    void aConsistentWalkIsPassed() {
        assertThat(said(whole)).isEmpty();
    }

    @Test
    void misScaledAndTurnedCentresOfPressureAreNamed() {
        assertThat(said(withCop(0, v -> InventedResults.scaled(v, 0, 1e-3))))
                .contains("audit.load-without-contact walk right force")
                .contains("column 'cop_right_x'")
                .contains("under the right foot")
                .contains("times 1000 lies");
        assertThat(said(withCop(1, v -> InventedResults.scaled(v, 0, -1))))
                .contains(
                        "with the sign of column 'cop_left_x' (left cop, forward) turned it lies under the left foot");
    }

    @Test
    void loadsOfFeetInTheAirAndFeetBelowTheFloorAreNamed() {
        // The feet of a walk that is sampled half a step late are in the air while they are loaded.
        AuditedResults late = new AuditedResults(
                "walk",
                whole.centreOfMass(),
                Optional.empty(),
                whole.loads(),
                List.of(
                        new AuditedResults.Foot(
                                whole.feet().get(0).side(), whole.feet().get(1).landmarks()),
                        new AuditedResults.Foot(
                                whole.feet().get(1).side(), whole.feet().get(0).landmarks())),
                whole.mass());
        assertThat(said(late)).contains("audit.load-without-contact");
        assertThat(said(withFeet(v -> raised(v, -0.05))))
                .contains("audit.foot-below-floor walk left: the left foot is 0.0")
                .contains("audit.foot-below-floor walk right");
        assertThat(said(withFeet(v -> raised(v, 0.05)))).isEmpty();
    }

    @Test
    void aLimitOutOfRangeIsRefused() {
        assertThatThrownBy(() -> new AuditSettings(0, 10, 9.8)).isInstanceOf(IllegalArgumentException.class);
        assertThatThrownBy(() -> new AuditedVector("v", List.of(), 0, 100, new double[3]))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessageContaining("0 columns");
    }
}
