package org.solewright.analysis.gait;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.foot.LabelPattern;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.foot.LandmarkMap;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Vec3;
import org.solewright.domain.motion.PointTrack;
import org.solewright.domain.motion.Recording;

class LandmarkTracksTest {

    private static final int FRAMES = 60;

    private static double[] still(double x) {
        double[] xyz = new double[3 * FRAMES];
        for (int i = 0; i < FRAMES; i++) {
            xyz[3 * i] = x;
            xyz[3 * i + 1] = 0.2;
            xyz[3 * i + 2] = 0.03;
        }
        return xyz;
    }

    private static LandmarkMap map(Landmark landmark, String... labels) {
        return new LandmarkMap(
                "m",
                List.of(new LandmarkMap.Entry(
                        landmark,
                        Optional.of(Side.RIGHT),
                        Arrays.stream(labels).map(LabelPattern::new).toList())));
    }

    private static Recording recording(PointTrack... points) {
        return new Recording("w.c3d", 100, 1, FRAMES, List.of(points), List.of(), List.of(), List.of());
    }

    @Test
    void severalLabelsOfALandmarkAreAveraged() {
        LandmarkTracks tracks = LandmarkTracks.of(
                recording(PointTrack.of("a", still(1)), PointTrack.of("b", still(2))),
                map(Landmark.CUBOID, "a", "b"),
                10,
                new ArrayList<>());
        assertThat(tracks.mean(Landmark.CUBOID, Side.RIGHT).orElseThrow().x()).isCloseTo(1.5, within(1e-9));
        assertThat(tracks.mean(Landmark.CUBOID, Side.LEFT)).isEmpty();
    }

    @Test
    void samplesAtTheVeryOriginAreMissingAndSaid() {
        double[] xyz = still(1);
        Arrays.fill(xyz, 30, 33, 0);
        List<Finding> findings = new ArrayList<>();
        LandmarkTracks tracks =
                LandmarkTracks.of(recording(PointTrack.of("a", xyz)), map(Landmark.CUBOID, "a"), 0, findings);
        assertThat(findings)
                .extracting(Finding::code)
                .containsExactlyInAnyOrder("points.zero-as-missing", "points.gap-bridged");
        // exact: a spline through a constant is that constant.
        assertThat(tracks.track(Landmark.CUBOID, Side.RIGHT).orElseThrow()[30]).isCloseTo(1, within(1e-9));
    }

    @Test
    void gapsOverATenthOfASecondStayOpen() {
        double[] xyz = still(1);
        Arrays.fill(xyz, 60, 60 + 3 * 11, Double.NaN);
        LandmarkTracks tracks =
                LandmarkTracks.of(recording(PointTrack.of("a", xyz)), map(Landmark.CUBOID, "a"), 10, new ArrayList<>());
        double[] track = tracks.track(Landmark.CUBOID, Side.RIGHT).orElseThrow();
        assertThat(track[60]).isNaN();
        assertThat(track[57]).isCloseTo(1, within(1e-9));
    }

    @Test
    void mirrorReversesWhatPointsSidewaysAndKeepsThePhysics() {
        List<Vec3> corners =
                List.of(new Vec3(0.5, 0.2, 0), new Vec3(0, 0.2, 0), new Vec3(0, -0.4, 0), new Vec3(0.5, -0.4, 0));
        Vec3 force = new Vec3(20, -15, 600);
        Vec3 m = new Vec3(0.1, 0.05, 0).cross(force).plus(Vec3.Z.times(3));
        PlatformLoads loads = new PlatformLoads(
                1, 2, corners, Vec3.Z, 100, 0, true, new double[] {force.x(), force.y(), force.z()}, new double[] {
                    m.x(), m.y(), m.z()
                });
        Recording r = new Recording(
                "w.c3d", 100, 1, FRAMES, List.of(PointTrack.of("a", still(1))), List.of(loads), List.of(), List.of());
        Recording seen = Mirror.of(r, Vec3.Z);
        // exact: y reversed; the centre of pressure moves with its platform, the free moment turns the other way.
        assertThat(seen.points().get(0).at(0)).isEqualTo(new Vec3(1, -0.2, 0.03));
        PlatformLoads after = seen.platforms().get(0);
        Vec3 cop = loads.centreOfPressure(0);
        assertThat(after.force(0)).isEqualTo(new Vec3(20, 15, 600));
        assertThat(after.centreOfPressure(0).distance(new Vec3(cop.x(), -cop.y(), cop.z())))
                .isLessThan(1e-12);
        assertThat(after.freeMoment(0)).isCloseTo(-loads.freeMoment(0), within(1e-9));
    }
}
