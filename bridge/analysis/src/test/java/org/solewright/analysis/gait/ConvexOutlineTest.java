package org.solewright.analysis.gait;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.solewright.analysis.gait.ConvexOutline.Point;

/** Expected numbers are exact: distances from a rectangle of 0.3 by 0.1 m. */
class ConvexOutlineTest {

    private final ConvexOutline rectangle = ConvexOutline.around(
            List.of(new Point(0, 0), new Point(0.3, 0), new Point(0.15, 0.05), new Point(0.3, 0.1), new Point(0, 0.1)));

    @Test
    void pointsInsideTheHullAreNoCorners() {
        assertThat(rectangle.corners())
                .containsExactlyInAnyOrder(new Point(0, 0), new Point(0.3, 0), new Point(0.3, 0.1), new Point(0, 0.1));
    }

    @Test
    void distanceIsZeroInsideAndToTheNearestEdgeOrCornerOutside() {
        assertThat(rectangle.distance(0.1, 0.05)).isZero();
        assertThat(rectangle.distance(0.1, 0.15)).isCloseTo(0.05, within(1e-12));
        assertThat(rectangle.distance(0.33, -0.04)).isCloseTo(0.05, within(1e-12));
    }

    @Test
    void twoPointsAreALineAndOnePointAPoint() {
        ConvexOutline line = ConvexOutline.around(List.of(new Point(0, 0), new Point(1, 0)));
        assertThat(line.distance(0.5, 0.2)).isCloseTo(0.2, within(1e-12));
        assertThat(line.distance(1.3, 0.4)).isCloseTo(0.5, within(1e-12));
        assertThat(ConvexOutline.around(List.of(new Point(1, 1))).distance(1, 3))
                .isCloseTo(2, within(1e-12));
    }
}
