package org.solewright.domain.gait;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.List;
import java.util.Set;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

/** Stances and the contacts table made of them. */
class ContactsTest {

    private static Stance stance(double start, double end) {
        return new Stance("walk", Side.LEFT, List.of(2), start, end, false, Set.of(Use.PUSH_OFF), "front edge");
    }

    private static ContactRow row(double start, double end, List<Integer> platforms) {
        return new ContactRow("walk", Side.LEFT, platforms, start, end, true, List.of(Use.MASS), List.of(), "");
    }

    @Test
    void stanceServesWhatNothingSpeaksAgainst() {
        assertThat(stance(1, 1.75).allows(Use.COLLISION)).isTrue();
        assertThat(stance(1, 1.75).allows(Use.PUSH_OFF)).isFalse();
        // exact: binary fractions.
        assertThat(stance(1, 1.75).duration()).isEqualTo(0.75);
        assertThat(Side.LEFT.opposite()).isEqualTo(Side.RIGHT);
    }

    @Test
    void stanceThatEndsBeforeItStartsIsRefused() {
        assertThatThrownBy(() -> stance(2, 1)).hasMessage("stance ends at 1.0 s, expected after its start at 2.0 s");
        assertThatThrownBy(() -> stance(Double.NaN, 1)).isInstanceOf(IllegalArgumentException.class);
    }

    @Test
    void rowOfImpossibleTimesOrPlatformsIsRefused() {
        assertThat(row(1, 1, List.of()).platforms()).isEmpty();
        assertThatThrownBy(() -> row(2, 1, List.of(1))).hasMessage("contact from 2.0 s to 1.0 s");
        assertThatThrownBy(() -> row(0, Double.POSITIVE_INFINITY, List.of(1)))
                .isInstanceOf(IllegalArgumentException.class);
        assertThatThrownBy(() -> row(0, 1, List.of(0))).hasMessage("platform number 0, expected 1 or more");
    }

    @Test
    void usesHaveTheWordsOfTheTable() {
        assertThat(Stream.of(Use.values()).map(Use::word))
                .containsExactly(
                        "contact-angle", "roll-over", "pivots", "collision", "rebound", "preload", "push-off", "mass");
    }
}
