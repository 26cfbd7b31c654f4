package org.solewright.examples;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.solewright.analysis.cost.ComparedPostures;
import org.solewright.domain.cost.Posture;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.geometry.Vec3;
import org.solewright.domain.motion.Recording;
import org.solewright.formats.c3d.C3dWriter;
import org.solewright.formats.io.FormatException;

class ExamplesTest {

    @TempDir
    private Path folder;

    @Test
    void platformPeaksAreRead() throws IOException, FormatException {
        List<Vec3> corners =
                List.of(new Vec3(0.5, -0.3, 0), new Vec3(0, -0.3, 0), new Vec3(0, 0.3, 0), new Vec3(0.5, 0.3, 0));
        double[] force = {0, 0, 100, 0, 0, 812.5};
        PlatformLoads loads = new PlatformLoads(1, 2, corners, Vec3.Z, 100, 0, true, force, new double[6]);
        Path file = folder.resolve("r.c3d");
        C3dWriter.write(file, new Recording("r.c3d", 100, 1, 2, List.of(), List.of(loads), List.of(), List.of()));
        // exact: 812.5 is a float.
        assertThat(ReadRecording.peaks(file)).containsExactly("platform 1: 812.5 N");
    }

    @Test
    void compassCostsWhatTheClosedFormSays() {
        ComparedPostures postures = AskTheSolver.postures(0.931, 0.213, 0.793, 1.675, 83.2);
        double compass = postures.work(Posture.all().stream()
                        .filter(p -> p.word().equals("compass"))
                        .findFirst()
                        .orElseThrow())
                .orElseThrow();
        // exact: simultaneous, (D/l)^2/2 times m v^2/2.
        double expected = Math.pow(0.793 / 0.931, 2) / 2 * 83.2 * 1.675 * 1.675 / 2;
        assertThat(compass).isCloseTo(expected, within(1e-9 * expected));
    }
}
