package org.solewright.formats.footmodel;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.solewright.domain.gait.Side;
import org.solewright.domain.motion.ResultsMap;
import org.solewright.formats.io.FormatException;

class ResultsMapFileTest {

    private static Path example() {
        Path top = Path.of("").toAbsolutePath();
        while (!Files.exists(top.resolve("DEVELOPERS.md"))) {
            top = top.getParent();
            assertThat(top).as("folder of DEVELOPERS.md").isNotNull();
        }
        return top.resolve("templates/src/main/resources/org/solewright/templates/column-map.xml");
    }

    @Test
    void exampleToCopyIsAColumnMap() throws IOException, FormatException {
        ResultsMap map = ResultsMapFile.read(example());
        assertThat(map.mass()).hasValue(70);
        assertThat(map.tables()).hasSize(2);
        ResultsMap.Table points = map.tables().get(0);
        assertThat(points.file()).isEmpty();
        assertThat(points.delimiter()).isEqualTo(',');
        assertThat(points.timeScale()).isEqualTo(1);
        ResultsMap.Column heel = points.columns().get(3);
        assertThat(heel.of()).isEqualTo("calcaneus_posterior");
        assertThat(heel.side()).isEqualTo(Optional.of(Side.RIGHT));
        assertThat(heel.axis()).isZero();
        // exact: 1 mm is 0.001 m, 1 ms is 0.001 s.
        assertThat(heel.scale()).isEqualTo(1e-3);
        assertThat(map.tables().get(1).timeScale()).isCloseTo(1e-3, within(1e-18));
        assertThat(map.tables().get(1).columns().get(0).quantity()).isEqualTo(ResultsMap.Quantity.GROUND_FORCE);
        assertThat(points.columns().get(0).side()).isEmpty();
    }

    @Test
    void axesTurnTableVectorsToForwardLeftUp() throws IOException, FormatException {
        ResultsMap.Axes axes = ResultsMapFile.read(example()).axes();
        // exact: x forward, y up, z right.
        assertThat(axes.toLaboratory(1, 2, 3).x()).isEqualTo(1);
        assertThat(axes.toLaboratory(1, 2, 3).y()).isEqualTo(-3);
        assertThat(axes.toLaboratory(1, 2, 3).z()).isEqualTo(2);
    }
}
