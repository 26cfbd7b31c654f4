package org.solewright.formats.c3d;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.geometry.Vec3;
import org.solewright.domain.motion.PointTrack;
import org.solewright.domain.motion.RecordedEvent;
import org.solewright.domain.motion.Recording;
import org.solewright.formats.io.FormatException;

/** What is written and read again is the same data: exact to float32 of the millimetre or newton stored. */
class C3dWriterTest {

    private static final double FLOAT = 1.2e-7;

    @TempDir
    private Path folder;

    private static Recording recording() {
        double[] a = {0.1, 0.2, 0.3, 0.11, 0.21, 0.31, Double.NaN, Double.NaN, Double.NaN};
        double[] b = {-1.5, 0, 0.0123456, -1.4, 0, 0.02, -1.3, 0, 0.03};
        int samples = 15;
        double[] force = new double[3 * samples];
        double[] moment = new double[3 * samples];
        for (int i = 0; i < samples; i++) {
            force[3 * i] = 5 * i;
            force[3 * i + 1] = -3;
            force[3 * i + 2] = 60 * i;
            moment[3 * i] = 0.5 * i;
            moment[3 * i + 1] = -2.0 * i;
            moment[3 * i + 2] = 0.1;
        }
        // A platform turned by 90 degrees in the laboratory: its x is along the laboratory's y.
        List<Vec3> corners =
                List.of(new Vec3(0.5, 0.9, 0), new Vec3(0.5, 0.3, 0), new Vec3(0.1, 0.3, 0), new Vec3(0.1, 0.9, 0));
        PlatformLoads loads = new PlatformLoads(1, 2, corners, Vec3.Z, 500, 0, true, force, moment);
        return new Recording(
                "w.c3d",
                100,
                1,
                3,
                List.of(PointTrack.of("heel", a), PointTrack.of("\u00e9paule", b)),
                List.of(loads),
                List.of(new RecordedEvent(1.25, "Right", "Foot Strike", RecordedEvent.Source.GROUP)),
                List.of());
    }

    private Recording again(Recording r) throws IOException, FormatException {
        Path file = folder.resolve("w.c3d");
        C3dWriter.write(file, r);
        return C3dFile.read(file).toRecording();
    }

    @Test
    void pointsAndGapsComeBack() throws IOException, FormatException {
        Recording r = again(recording());
        assertThat(r.rate()).isEqualTo(100);
        assertThat(r.frames()).isEqualTo(3);
        assertThat(r.points()).extracting(PointTrack::label).containsExactly("heel", "\u00e9paule");
        assertThat(r.points().get(0).isValid(2)).isFalse();
        assertThat(r.points().get(0).isValid(1)).isTrue();
        for (int frame = 0; frame < 3; frame++) {
            Vec3 expected = recording().points().get(1).at(frame);
            assertThat(r.points().get(1).at(frame).distance(expected)).isLessThan(FLOAT * 1.5);
        }
        assertThat(r.findings()).isEmpty();
    }

    @Test
    void platformLoadsComeBack() throws IOException, FormatException {
        PlatformLoads before = recording().platforms().get(0);
        PlatformLoads after = again(recording()).platforms().get(0);
        assertThat(after.rate()).isEqualTo(500);
        assertThat(after.samples()).isEqualTo(15);
        assertThat(after.up().distance(Vec3.Z)).isLessThan(1e-6);
        for (int i = 1; i < 15; i++) {
            assertThat(after.force(i).distance(before.force(i))).isLessThan(FLOAT * 1000);
            assertThat(after.centreOfPressure(i).distance(before.centreOfPressure(i)))
                    .isLessThan(1e-6);
            assertThat(after.freeMoment(i)).isCloseTo(before.freeMoment(i), within(1e-4));
        }
    }

    @Test
    void eventsComeBack() throws IOException, FormatException {
        assertThat(again(recording()).events())
                .containsExactly(new RecordedEvent(1.25, "Right", "Foot Strike", RecordedEvent.Source.GROUP));
    }

    @Test
    void sameRecordingGivesTheSameBytes() {
        assertThat(C3dWriter.bytes(recording())).isEqualTo(C3dWriter.bytes(recording()));
    }

    @Test
    void whatDoesNotFitIsRefusedWithTheNumbers() {
        double[] one = new double[3];
        List<PointTrack> many = java.util.stream.IntStream.range(0, 300)
                .mapToObj(i -> PointTrack.of("p" + i, one))
                .toList();
        Recording r = new Recording("many", 100, 1, 1, many, List.of(), List.of(), List.of());
        assertThatThrownBy(() -> C3dWriter.bytes(r))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessageContaining("300 points");
    }
}
