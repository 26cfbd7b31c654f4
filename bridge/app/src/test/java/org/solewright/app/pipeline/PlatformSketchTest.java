package org.solewright.app.pipeline;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.geometry.Vec3;

class PlatformSketchTest {

    private static PlatformLoads platform(int number, double x0, double y0, double x1, double y1) {
        List<Vec3> corners =
                List.of(new Vec3(x1, y1, 0), new Vec3(x0, y1, 0), new Vec3(x0, y0, 0), new Vec3(x1, y0, 0));
        // 100 N straight down through the centre: the centre of pressure is there.
        return new PlatformLoads(number, 2, corners, Vec3.Z, 100, 0, true, new double[] {0, 0, 100}, new double[3]);
    }

    @Test
    void cornersAndPressureLieWhereTheyAreSeenFromAbove() {
        List<String> page = PlatformSketch.of(List.of(platform(1, 0, 0, 2, 1)));
        assertThat(page.get(0)).contains("+x to the right, +y up the page");
        // exact: 2 m by 1 m at 64 columns: 63 columns of 2/63 m, half of them high, and two columns to a line.
        assertThat(page).hasSize(1 + 17);
        assertThat(page.get(1)).startsWith("  2").endsWith("1").hasSize(2 + 64);
        assertThat(page.get(17)).startsWith("  3").endsWith("4");
    }

    @Test
    void longerSideLiesAcrossThePageAndLeftStaysLeft() {
        List<String> page = PlatformSketch.of(List.of(platform(1, 0, 0, 1, 2)));
        // exact: seen from above with y to the right, x points down the page.
        assertThat(page.get(0)).contains("+y to the right, -x up the page");
        assertThat(page.get(1)).startsWith("  3").endsWith("2");
        assertThat(page.get(17)).startsWith("  4").endsWith("1");
    }

    @Test
    void noPlatformNoDrawing() {
        assertThat(PlatformSketch.of(List.of())).isEmpty();
    }
}
