package org.solewright.formats.c3d;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.geometry.Vec3;
import org.solewright.domain.motion.Recording;
import org.solewright.formats.io.FormatException;

/**
 * One wrench on one platform, stored the way each type stores it. The platform's axes are x along the laboratory's x, y
 * along its -y, z down; its centre is at (0.25, 0.3, 0) m. The same load is meant throughout: 20 N forward and 800 N up on
 * the subject, 50 mm along platform x and -30 mm along platform y from the centre, so at (0.30, 0.33) m in the laboratory.
 */
class PlatformReaderTest {

    /** Newtons and millimetres are stored as float32 of numbers below 1e5. */
    private static final double STORED = 1e-5;

    private static final double FX = 20;
    private static final double FZ = -800;
    private static final double X = 50;
    private static final double Y = -30;
    private static final double DEPTH = 40;
    private static final double[] CORNERS = {500, 0, 0, 0, 0, 0, 0, 600, 0, 500, 600, 0};

    @TempDir
    private Path folder;

    /** Moments about a measuring origin DEPTH below the centre, N mm: r x F with r = (X, Y, -DEPTH), z down. */
    private static double[] sixChannels() {
        return new double[] {FX, 0, FZ, Y * FZ, -DEPTH * FX - X * FZ, -Y * FX};
    }

    private Recording read(int type, double[] origin, double[] sample, double[] more, String... named)
            throws IOException, FormatException {
        return read(type, origin, new double[][] {sample, sample}, new int[] {1, 0}, more, named);
    }

    private Recording read(
            int type, double[] origin, double[][] samples, int[] zero, double[] calibration, String... without)
            throws IOException, FormatException {
        ParameterWriter sizing = parameters(0, type, origin, samples, zero, calibration, List.of(without));
        int data = 2 + sizing.blocks();
        byte[] section = parameters(data, type, origin, samples, zero, calibration, List.of(without))
                .section();
        int channels = samples[0].length;
        ByteBuffer out = ByteBuffer.allocate(512 * data).order(ByteOrder.LITTLE_ENDIAN);
        out.put(0, (byte) 2).put(1, (byte) 0x50).putShort(4, (short) channels).putShort(6, (short) 1);
        out.putShort(8, (short) samples.length).putFloat(12, -1).putShort(16, (short) data);
        out.putShort(18, (short) 1).putFloat(20, 100);
        out.position(512);
        out.put(section);
        for (double[] sample : samples) {
            for (double v : sample) {
                out.putFloat((float) v);
            }
        }
        Path file = folder.resolve("platform.c3d");
        Files.write(file, out.array());
        return C3dFile.read(file).toRecording();
    }

    private static ParameterWriter parameters(
            int data,
            int type,
            double[] origin,
            double[][] samples,
            int[] zero,
            double[] calibration,
            List<String> without) {
        int n = samples[0].length;
        ParameterWriter p = new ParameterWriter();
        p.group("POINT", "Points");
        p.integers("USED", "Points", new int[] {0});
        p.reals("SCALE", "Reals", new double[] {-1});
        p.reals("RATE", "Rate", new double[] {100});
        p.integers("DATA_START", "Data", new int[] {data});
        p.integers("FRAMES", "Frames", new int[] {samples.length});
        p.text("UNITS", "Unit", "mm");
        p.group("ANALOG", "Channels");
        p.integers("USED", "Channels", new int[] {n});
        p.reals("GEN_SCALE", "Scale", new double[] {1});
        double[] ones = new double[n];
        java.util.Arrays.fill(ones, 1);
        p.reals("SCALE", "Scales", ones, n);
        p.integers("OFFSET", "Offsets", new int[n], n);
        p.reals("RATE", "Rate", new double[] {100});
        p.group("FORCE_PLATFORM", "Platforms");
        p.integers("USED", "Platforms", new int[] {1});
        p.integers("TYPE", "Types", new int[] {type}, 1);
        p.integers("ZERO", "Baseline", zero, 2);
        if (!without.contains("CORNERS")) {
            p.reals("CORNERS", "Corners", CORNERS, 3, 4, 1);
        }
        if (!without.contains("ORIGIN")) {
            p.reals("ORIGIN", "Origin", origin, 3, 1);
        }
        int[] numbers = new int[without.contains("CHANNEL") ? 3 : n];
        for (int i = 0; i < numbers.length; i++) {
            numbers[i] = i + 1;
        }
        p.integers("CHANNEL", "Channels", numbers, numbers.length, 1);
        if (calibration.length > 0) {
            int rows = calibration.length / n;
            p.reals("CAL_MATRIX", "Calibration", calibration, rows, n, 1);
        }
        return p;
    }

    private static void isTheLoad(Recording r) {
        PlatformLoads loads = r.platforms().get(0);
        assertThat(loads.force(0).distance(new Vec3(20, 0, 800))).isLessThan(STORED);
        assertThat(loads.up().distance(Vec3.Z)).isLessThan(STORED);
        // exact: centre + x (1, 0, 0) + y (0, -1, 0).
        assertThat(loads.centreOfPressure(0).distance(new Vec3(0.30, 0.33, 0)))
                .as(loads.centreOfPressure(0).toString())
                .isLessThan(STORED);
        // exact: the force through that point has no moment about the platform's normal there.
        assertThat(loads.freeMoment(0)).isCloseTo(0, within(STORED));
    }

    private static List<String> codes(Recording r) {
        return r.findings().stream().map(Finding::code).toList();
    }

    private static double[] origin(double z) {
        return new double[] {0, 0, z};
    }

    @Test
    void typeTwoStoresForcesAndMomentsAboutItsOrigin() throws IOException, FormatException {
        Recording r = read(2, origin(-DEPTH), sixChannels(), new double[0]);
        isTheLoad(r);
        assertThat(r.findings()).isEmpty();
    }

    @Test
    void positiveOriginMeansItsOppositeAndIsSaid() throws IOException, FormatException {
        Recording r = read(2, origin(DEPTH), sixChannels(), new double[0]);
        isTheLoad(r);
        assertThat(codes(r)).containsExactly("platform.origin-sign");
        assertThat(r.findings().get(0).message()).contains("ORIGIN has z = 40.0 mm, expected negative");
    }

    @Test
    void typeOneStoresTheCentreOfPressure() throws IOException, FormatException {
        isTheLoad(read(1, origin(0), new double[] {FX, 0, FZ, X, Y, 0}, new double[0]));
    }

    private static final double A = 120;
    private static final double B = 200;

    /** exact: four verticals with the wanted sum and moments and no twist; both Fx chosen for Mz, no Fy. */
    private static double[] eightChannels() {
        double[] six = sixChannels();
        double along = six[3] / (4 * B);
        double across = six[4] / (4 * A);
        double turn = six[5] / (2 * B);
        return new double[] {
            FX / 2 - turn,
            FX / 2 + turn,
            0,
            0,
            FZ / 4 + along - across,
            FZ / 4 + along + across,
            FZ / 4 - along + across,
            FZ / 4 - along - across
        };
    }

    @Test
    void typeThreeSumsItsEightSensors() throws IOException, FormatException {
        isTheLoad(read(3, new double[] {A, B, -DEPTH}, eightChannels(), new double[0]));
        Recording reversed = read(3, new double[] {A, B, DEPTH}, eightChannels(), new double[0]);
        isTheLoad(reversed);
        assertThat(reversed.findings().get(0).message()).contains("its z is reversed");
    }

    @Test
    void typeFiveMakesSixOfEightByItsMatrix() throws IOException, FormatException {
        // exact: the sums of type 3 written as a 6 x 8 matrix, stored column by column.
        double[][] sums = {
            {1, 1, 0, 0, 0, 0, 0, 0},
            {0, 0, 1, 1, 0, 0, 0, 0},
            {0, 0, 0, 0, 1, 1, 1, 1},
            {0, 0, 0, 0, B, B, -B, -B},
            {0, 0, 0, 0, -A, A, A, -A},
            {-B, B, A, -A, 0, 0, 0, 0}
        };
        double[] matrix = new double[48];
        for (int row = 0; row < 6; row++) {
            for (int column = 0; column < 8; column++) {
                matrix[6 * column + row] = sums[row][column];
            }
        }
        isTheLoad(read(5, origin(-DEPTH), eightChannels(), matrix));
    }

    @Test
    void typeSevenMultipliesTheEightOfTypeThree() throws IOException, FormatException {
        // exact: the first channel is half of what it should be and lacks a tenth of the second.
        double[] eight = eightChannels();
        double[] matrix = new double[64];
        for (int i = 0; i < 8; i++) {
            matrix[8 * i + i] = 1;
        }
        matrix[0] = 2;
        matrix[8] = 0.1;
        eight[0] = (eight[0] - 0.1 * eight[1]) / 2;
        isTheLoad(read(7, new double[] {A, B, -DEPTH}, eight, matrix));
    }

    @Test
    void typeSixHasThreeForcesOfEachOfFourSensors() throws IOException, FormatException {
        double[] eight = eightChannels();
        // exact: type 3 sums Fx of the sensors at +b and at -b, here one sensor of each pair carries all of it.
        double[] twelve = {eight[0], 0, eight[4], 0, 0, eight[5], eight[1], 0, eight[6], 0, 0, eight[7]};
        Recording plain = read(6, new double[] {A, B, -DEPTH}, twelve, new double[0]);
        isTheLoad(plain);
        assertThat(codes(plain)).containsExactly("platform.channel-order");
        double[] half = new double[144];
        for (int i = 0; i < 12; i++) {
            half[12 * i + i] = 0.5;
            twelve[i] *= 2;
        }
        isTheLoad(read(6, new double[] {A, B, -DEPTH}, twelve, half));
    }

    @Test
    void typeThreeWithoutSensorDistancesHasForceAndNoCentreOfPressure() throws IOException, FormatException {
        Recording r = read(3, origin(0), new double[] {FX, 0, 0, 0, -200, -200, -200, -200}, new double[0]);
        assertThat(codes(r)).containsExactly("platform.no-cop");
        assertThat(r.platforms().get(0).vertical(0)).isCloseTo(800, within(STORED));
        assertThat(r.platforms().get(0).centreOfPressure(0).isFinite()).isFalse();
    }

    @Test
    void typeFourMultipliesByItsMatrixStoredColumnByColumn() throws IOException, FormatException {
        double[] six = sixChannels();
        // exact: twice each channel, and 0.25 of channel 3 on the first force: element (1, 3), stored as number 2 * 6 +
        // 1.
        double[] matrix = new double[36];
        for (int i = 0; i < 6; i++) {
            matrix[6 * i + i] = 2;
        }
        matrix[6 * 2] = 0.25;
        double[] raw = new double[6];
        for (int i = 0; i < 6; i++) {
            raw[i] = six[i] / 2;
        }
        raw[0] = (six[0] - 0.25 * raw[2]) / 2;
        isTheLoad(read(4, origin(-DEPTH), raw, matrix));
    }

    @Test
    void actionOnTheFloorIsTurnedIntoReactionAndIsSaid() throws IOException, FormatException {
        double[] action = sixChannels();
        for (int i = 0; i < action.length; i++) {
            action[i] = -action[i];
        }
        Recording r = read(2, origin(-DEPTH), action, new double[0]);
        isTheLoad(r);
        assertThat(codes(r)).containsExactly("platform.action-stored");
    }

    @Test
    void noiseOfAnEmptyPlatformIsLeftAsStored() throws IOException, FormatException {
        double[] noise = {0, 0, 6.5, 0, 0, 0};
        Recording r = read(2, origin(-DEPTH), noise, new double[0]);
        assertThat(r.platforms().get(0).vertical(0)).isCloseTo(-6.5, within(STORED));
        assertThat(r.findings()).isEmpty();
    }

    @Test
    void platformThatNeverChangesDoesNotTurnTheOthers() throws IOException, FormatException {
        List<Vec3> corners =
                List.of(new Vec3(0.5, 0, 0), new Vec3(0, 0, 0), new Vec3(0, 0.6, 0), new Vec3(0.5, 0.6, 0));
        double[] stuck = {0, 0, -1500, 0, 0, -1500};
        double[] loaded = {0, 0, 0, 0, 0, 800};
        List<PlatformLoads> loads = new ArrayList<>();
        for (double[] force : List.of(stuck, loaded)) {
            loads.add(new PlatformLoads(
                    loads.size() + 1, 2, corners, Vec3.Z, 100, 0, true, force, new double[force.length]));
        }
        Path file = folder.resolve("stuck.c3d");
        C3dWriter.write(file, new Recording("stuck.c3d", 100, 1, 2, List.of(), loads, List.of(), List.of()));
        Recording r = C3dFile.read(file).toRecording();
        // exact: the written numbers, both with their sign.
        assertThat(r.platforms().get(1).vertical(1)).isCloseTo(800, within(STORED));
        assertThat(r.platforms().get(0).vertical(1)).isCloseTo(-1500, within(STORED));
        assertThat(codes(r)).containsExactly("platform.negative-load");
    }

    @Test
    void platformThatPullsTheSubjectIsSaid() throws IOException, FormatException {
        double[] pull = {0, 0, 60, 0, 0, 0};
        Recording r = read(2, origin(-DEPTH), new double[][] {sixChannels(), pull}, new int[] {1, 0}, new double[0]);
        isTheLoad(r);
        assertThat(codes(r)).containsExactly("platform.negative-load");
        assertThat(r.findings().get(0).message()).contains("goes down to -60.0 N");
    }

    @Test
    void centreOfPressureOutsideTheCornersIsSaid() throws IOException, FormatException {
        // exact: x = -My / Fz = -240000 / -800 = 300 mm from the centre, 50 mm beyond the edge at 250 mm.
        Recording r = read(2, origin(0), new double[] {0, 0, FZ, 0, 240000, 0}, new double[0]);
        assertThat(codes(r)).containsExactly("platform.cop-outside");
        assertThat(r.findings().get(0).message()).contains("in 100 % of the loaded samples");
    }

    @Test
    void baselineOfAnUnloadedWindowIsTakenOff() throws IOException, FormatException {
        double[] bias = {3, -2, 5, 100, 200, 300};
        double[] loaded = sixChannels();
        for (int i = 0; i < 6; i++) {
            loaded[i] += bias[i];
        }
        // exact: frames 2 and 3 hold the bias alone, so what is left of frame 1 is the load.
        isTheLoad(read(2, origin(-DEPTH), new double[][] {loaded, bias, bias}, new int[] {2, 3}, new double[0]));
    }

    @Test
    void baselineOfALoadedWindowIsLeft() throws IOException, FormatException {
        double[] none = new double[6];
        Recording r =
                read(2, origin(-DEPTH), new double[][] {sixChannels(), none, none}, new int[] {1, 1}, new double[0]);
        isTheLoad(r);
        assertThat(codes(r)).containsExactly("platform.zero-loaded");
    }

    @Test
    void platformsThatCannotBeUsedAreLeftOutAndSaid() throws IOException, FormatException {
        double[] none = new double[0];
        Recording unknown = read(9, origin(-DEPTH), sixChannels(), none);
        assertThat(unknown.platforms()).isEmpty();
        assertThat(unknown.findings().get(0).message()).contains("is of type 9; types 1 to 7 are known");
        assertThat(read(2, origin(-DEPTH), sixChannels(), none, "CORNERS")
                        .findings()
                        .get(0)
                        .message())
                .contains("has corners that are not finite");
        assertThat(read(2, origin(-DEPTH), sixChannels(), none, "CHANNEL")
                        .findings()
                        .get(0)
                        .message())
                .contains("expected 6 between 1 and 6");
        assertThat(read(4, origin(-DEPTH), sixChannels(), none)
                        .findings()
                        .get(0)
                        .message())
                .contains("has no 6 x 6 calibration matrix");
        assertThat(read(7, new double[] {A, B, -DEPTH}, eightChannels(), none)
                        .findings()
                        .get(0)
                        .message())
                .contains("has no 8 x 8 calibration matrix");
        assertThat(codes(read(2, origin(-DEPTH), sixChannels(), none, "ORIGIN")))
                .contains("platform.no-cop");
    }
}
