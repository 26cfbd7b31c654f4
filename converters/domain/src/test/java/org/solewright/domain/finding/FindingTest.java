package org.solewright.domain.finding;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

class FindingTest {

    @Test
    void severityFollowsFromTheWord() {
        assertThat(Finding.note("a.b", "x", "m").severity()).isEqualTo(Severity.NOTE);
        assertThat(Finding.warning("a.b", "x", "m").severity()).isEqualTo(Severity.WARNING);
        assertThat(Finding.error("a.b", "x", "m")).isEqualTo(new Finding("a.b", Severity.ERROR, "x", "m"));
        assertThat(Severity.WARNING.word()).isEqualTo("warning");

        assertThat(Basis.REGRESSION.word()).isEqualTo("regression");
    }

    @Test
    void findingWithoutCodeOrSentenceIsRefused() {
        assertThatThrownBy(() -> Finding.note(" ", "x", "m"))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessage("finding without code or message: code ' '");
        assertThatThrownBy(() -> Finding.note("a.b", "x", "")).isInstanceOf(IllegalArgumentException.class);
    }

    @Test
    void foundKeepsItsOwnFindings() {
        List<Finding> list = new ArrayList<>(List.of(Finding.note("a.b", "", "m")));
        Found<String> found = new Found<>("value", list);
        list.clear();
        assertThat(found.findings()).hasSize(1);
        assertThat(found.value()).isEqualTo("value");
    }

    @Test
    void quantityIsFiniteAndItsDeviationNotNegative() {
        assertThat(Quantity.of(2, Basis.MEASURED).sd()).isEmpty();
        assertThat(Quantity.of(2, Basis.MEASURED, 0.5).sd()).hasValue(0.5);
        assertThatThrownBy(() -> Quantity.of(Double.NaN, Basis.ASSUMED))
                .hasMessage("quantity NaN, expected a finite number");
        assertThatThrownBy(() -> new Quantity(1, Basis.ASSUMED, OptionalDouble.of(-1)))
                .hasMessage("standard deviation -1.0, expected 0 or more");
    }
}
