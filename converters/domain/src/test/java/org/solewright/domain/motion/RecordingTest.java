package org.solewright.domain.motion;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.List;
import org.junit.jupiter.api.Test;

class RecordingTest {

    private static Recording recording(int frames) {
        PointTrack track = PointTrack.of("heel", new double[] {1, 2, 3, Double.NaN, 0, 0});
        return new Recording("r.c3d", 100, 11, frames, List.of(track), List.of(), List.of(), List.of());
    }

    @Test
    void frameNumbersOfTheFileSetTheClock() {
        // exact: frame n of the file is at (n - 1)/rate, so the second frame here is number 12, at 0.11 s.
        assertThat(recording(2).time(1)).isEqualTo(0.11);
    }

    @Test
    void lostSampleIsNotValid() {
        PointTrack track = recording(2).point("heel").orElseThrow();
        assertThat(track.isValid(0)).isTrue();
        assertThat(track.isValid(1)).isFalse();
        assertThat(recording(2).point("toe")).isEmpty();
    }

    @Test
    void tracksOfAnotherLengthAreRefused() {
        assertThatThrownBy(() -> recording(3)).hasMessage("point heel has 2 frames, expected 3");
        assertThatThrownBy(() -> PointTrack.of("heel", new double[4]))
                .hasMessage("point heel has 4 components, expected a multiple of 3");
    }

    @Test
    void samplesAreCopiedInAndOut() {
        double[] xyz = {1, 2, 3};
        PointTrack track = PointTrack.of("heel", xyz);
        xyz[0] = 9;
        double[] out = new double[4];
        track.copyTo(out, 1);
        out[1] = 7;
        assertThat(track.at(0).x()).isEqualTo(1);
    }
}
