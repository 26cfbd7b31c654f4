package org.solewright.analysis.audit;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.UnaryOperator;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.solewright.domain.finding.Finding;

/** The invented walk as results of a simulation, whole and spoilt in one place at a time. */
class BalanceAuditTest {

    private static final AuditSettings SETTINGS = new AuditSettings(AuditSettings.DEFAULT_LIMIT, 10, 9.80665);

    private final InventedResults invented = new InventedResults();

    private static List<Finding> audit(AuditedResults results) {
        BalanceAudit audit = BalanceAudit.of(results, SETTINGS).orElseThrow();
        BalanceAudit.Interval all = audit.loaded();
        List<Finding> found = new ArrayList<>(ContactAudit.of(results, SETTINGS));
        audit.over(all.from(), all.to(), 0).ifPresent(b -> found.addAll(audit.findings(b, "walk")));
        return found;
    }

    private static AuditedResults with(
            AuditedResults r, UnaryOperator<AuditedVector> com, UnaryOperator<List<AuditedResults.Load>> loads) {
        return new AuditedResults(
                r.name(), r.centreOfMass().map(com), r.velocity(), loads.apply(r.loads()), r.feet(), r.mass());
    }

    private static List<AuditedResults.Load> scaled(
            List<AuditedResults.Load> loads, List<Integer> which, int axis, double factor) {
        List<AuditedResults.Load> out = new ArrayList<>();
        for (int p = 0; p < loads.size(); p++) {
            AuditedResults.Load l = loads.get(p);
            out.add(
                    which.contains(p)
                            ? new AuditedResults.Load(
                                    l.side(), InventedResults.scaled(l.force(), axis, factor), l.centreOfPressure())
                            : l);
        }
        return out;
    }

    private static String said(List<Finding> findings) {
        StringBuilder all = new StringBuilder();
        findings.forEach(
                f -> all.append(f.code()).append(": ").append(f.message()).append('\n'));
        return all.toString();
    }

    @ParameterizedTest
    @CsvSource({"1000, 1000", "200, 1000", "1000, 500", "100, 1000"})
    void aConsistentWalkLeavesNextToNothing(double points, double loads) {
        AuditedResults results = invented.rates(points, loads).results();
        BalanceAudit audit = BalanceAudit.of(results, SETTINGS).orElseThrow();
        BalanceAudit.Interval all = audit.loaded();
        assertThat(all.isThroughout()).isTrue();
        // exact: F = m (a + g) by construction; what is left is of the samples: 1e-3 is the limit of the issue.
        Balance b = audit.over(all.from(), all.to(), 0).orElseThrow();
        assertThat(b.forceResidual()).isLessThan(1e-3);
        assertThat(b.peakForceResidual()).isLessThan(5e-3);
        assertThat(b.energyResidual()).isLessThan(1e-3);
        double step = invented.walk().stepTime();
        double from = invented.from() + 0.5;
        assertThat(audit.over(from, from + 2 * step, 2).orElseThrow().momentResidual())
                .isLessThan(1e-3);
        assertThat(audit.over(from, from + step, 1).orElseThrow().momentResidual())
                .isLessThan(1e-3);
        assertThat(audit(results)).isEmpty();
    }

    @Test
    void velocitiesOfTheCentreOfMassWillDo() {
        AuditedResults r = invented.results();
        AuditedVector com = r.centreOfMass().orElseThrow();
        double[] v = new double[3 * com.samples()];
        for (int i = 1; i < com.samples() - 1; i++) {
            for (int c = 0; c < 3; c++) {
                v[3 * i + c] = (com.at(i + 1, c) - com.at(i - 1, c)) * com.rate() / 2;
            }
        }
        AuditedVector velocity = new AuditedVector(
                "velocity of the centre of mass", List.of("vx", "vy", "vz"), com.start(), com.rate(), v);
        AuditedResults moving =
                new AuditedResults("walk", Optional.empty(), Optional.of(velocity), r.loads(), r.feet(), r.mass());
        assertThat(audit(moving)).isEmpty();
    }

    @Test
    void oneMisScaledForceColumnIsNamed() {
        AuditedResults r = with(invented.results(), c -> c, l -> scaled(l, List.of(0), 0, 0.5));
        assertThat(said(audit(r)))
                .contains("audit.column-scaled: column 'f_right_x'")
                .contains("times 2 ");
        AuditedResults up = with(invented.results(), c -> c, l -> scaled(l, List.of(1), 2, 0.1));
        assertThat(said(audit(up)))
                .contains("audit.column-scaled: column 'f_left_z'")
                .contains("times 10 ")
                .contains("audit.force-residual");
    }

    @Test
    void misScaledPositionsOfTheCentreOfMassAreNamed() {
        AuditedResults r = with(invented.results(), c -> InventedResults.scaled(c, 2, 1e-3), l -> l);
        assertThat(said(audit(r))).contains("column 'com_z'").contains("times 1000 ");
        AuditedResults forward = with(invented.results(), c -> InventedResults.scaled(c, 0, 1e-3), l -> l);
        assertThat(said(audit(forward))).contains("column 'com_x'").contains("times 1000 ");
    }

    @Test
    void oneUnitForAllForcesIsNamedAsSuch() {
        AuditedResults r = with(
                invented.results(),
                c -> c,
                l -> scaled(
                        scaled(scaled(l, List.of(0, 1), 0, 0.2248), List.of(0, 1), 1, 0.2248),
                        List.of(0, 1),
                        2,
                        0.2248));
        assertThat(said(audit(r)))
                .contains("all ground forces (or the stated mass")
                .contains("times 4.45 ");
    }

    @Test
    void aTurnedAxisIsNamed() {
        AuditedResults all = with(invented.results(), c -> c, l -> scaled(l, List.of(0, 1), 0, -1));
        assertThat(said(audit(all))).contains("audit.axis-turned: the forward columns of all ground forces");
        AuditedResults one = with(invented.results(), c -> c, l -> scaled(l, List.of(1), 2, -1));
        assertThat(said(audit(one)))
                .contains("audit.axis-turned: column 'f_left_z'")
                .contains("audit.pulling-contact");
        AuditedResults com = with(invented.results(), c -> InventedResults.scaled(c, 0, -1), l -> l);
        assertThat(said(audit(com))).contains("audit.axis-turned: column 'com_x'");
    }

    @Test
    void exchangedAxesAreNamed() {
        AuditedResults r = with(invented.results(), c -> c, loads -> {
            List<AuditedResults.Load> out = new ArrayList<>();
            for (AuditedResults.Load l : loads) {
                double[] xyz = l.force().interleaved();
                for (int i = 0; i < xyz.length; i += 3) {
                    double z = xyz[i + 2];
                    xyz[i + 2] = xyz[i + 1];
                    xyz[i + 1] = z;
                }
                out.add(new AuditedResults.Load(
                        l.side(),
                        new AuditedVector(
                                l.force().name(),
                                List.of("a", "b", "c"),
                                l.force().start(),
                                l.force().rate(),
                                xyz),
                        l.centreOfPressure()));
            }
            return out;
        });
        assertThat(said(audit(r))).contains("audit.axis-turned: ground forces left and up are exchanged");
    }

    @Test
    void aFootsForceThatWasLeftOutIsNamed() {
        AuditedResults r = with(invented.results(), c -> c, l -> l.subList(0, 1));
        assertThat(said(audit(r)))
                .contains("audit.force-residual")
                .contains("audit.force-left-out")
                .contains("the ground force of the left foot was left out");
        AuditedResults nameless = new AuditedResults(
                "walk",
                r.centreOfMass(),
                Optional.empty(),
                invented.results().loads().subList(1, 2),
                List.of(),
                r.mass());
        assertThat(said(audit(nameless))).contains("the ground force of one foot was left out");
    }

    @Test
    void massIsTheLoadsWhereNoneIsStated() {
        AuditedResults r = invented.results();
        AuditedResults unstated = new AuditedResults(
                r.name(), r.centreOfMass(), r.velocity(), r.loads(), r.feet(), OptionalDouble.empty());
        BalanceAudit audit = BalanceAudit.of(unstated, SETTINGS).orElseThrow();
        double from = invented.from() + 0.5;
        // exact: the mean vertical force over a period is the weight; the window's ends cost up to half a sample each.
        assertThat(audit.over(from, from + 2 * invented.walk().stepTime(), 2)
                        .orElseThrow()
                        .mass())
                .isCloseTo(InventedResults.MASS, within(0.1));
    }

    @Test
    void nothingIsSaidWithoutWhatItTakes() {
        AuditedResults r = invented.results();
        assertThat(BalanceAudit.of(
                        new AuditedResults("w", Optional.empty(), Optional.empty(), r.loads(), r.feet(), r.mass()),
                        SETTINGS))
                .isEmpty();
        assertThat(BalanceAudit.of(
                        new AuditedResults("w", r.centreOfMass(), Optional.empty(), List.of(), r.feet(), r.mass()),
                        SETTINGS))
                .isEmpty();
        assertThat(BalanceAudit.of(r, SETTINGS).orElseThrow().over(-5, -4, 0)).isEmpty();
    }
}
