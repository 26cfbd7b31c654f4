package org.solewright.domain.motion;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.solewright.domain.geometry.Vec3;
import org.solewright.domain.motion.ResultsMap.Direction;

class ResultsMapTest {

    @Test
    void everyDirectionIsAUnitVectorAndHasItsOpposite() {
        for (Direction d : Direction.values()) {
            assertThat(d.vector().norm()).isEqualTo(1);
            // exact: six directions in three pairs.
            assertThat(List.of(Direction.values()))
                    .anyMatch(o -> o.vector().plus(d.vector()).norm() == 0);
        }
    }

    @Test
    void axesCarryComponentsToForwardLeftUp() {
        ResultsMap.Axes axes = new ResultsMap.Axes(Direction.BACKWARD, Direction.DOWN, Direction.RIGHT);
        assertThat(axes.toLaboratory(1, 2, 3).distance(new Vec3(-1, -3, -2))).isZero();
    }

    @Test
    void axesAlongOneLineAreRefused() {
        assertThatThrownBy(() -> new ResultsMap.Axes(Direction.FORWARD, Direction.UP, Direction.DOWN))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessageContaining("fewer than three lines");
    }

    @Test
    void mapsDoNotShareTheirMakersLists() {
        List<ResultsMap.Column> columns = new ArrayList<>();
        columns.add(new ResultsMap.Column("x", ResultsMap.Quantity.COP, "1", Optional.empty(), 0, 1));
        ResultsMap.Table table = new ResultsMap.Table("", ',', 0, true, "t", 1, OptionalDouble.empty(), columns);
        columns.clear();
        assertThat(table.columns()).hasSize(1);
        assertThat(table.columns().get(0).quantity().word()).isEqualTo("cop");
        List<ResultsMap.Table> tables = new ArrayList<>(List.of(table));
        ResultsMap map = new ResultsMap(
                "s",
                OptionalDouble.of(70),
                new ResultsMap.Axes(Direction.FORWARD, Direction.LEFT, Direction.UP),
                tables,
                List.of(new ResultsMap.RecordingFile("a.c3d", "m.xml")));
        tables.clear();
        assertThat(map.tables()).containsExactly(table);
    }
}
