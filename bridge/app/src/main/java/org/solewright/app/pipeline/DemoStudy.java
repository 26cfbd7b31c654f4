package org.solewright.app.pipeline;

import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.solewright.analysis.dynamics.SyntheticWalk;
import org.solewright.analysis.dynamics.WalkParameters;
import org.solewright.analysis.dynamics.WalkRecorder;
import org.solewright.analysis.dynamics.WalkRecorder.BodyPoint;
import org.solewright.analysis.dynamics.WalkRecorder.Carrier;
import org.solewright.analysis.gait.GaitSettings;
import org.solewright.domain.foot.LabelPattern;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.foot.LandmarkMap;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Pose;
import org.solewright.domain.geometry.Rotation;
import org.solewright.domain.geometry.Vec3;
import org.solewright.formats.c3d.C3dWriter;
import org.solewright.formats.footmodel.LandmarkMapFile;

/**
 * The invented study of the demo: one subject, D-01, made by design 04 I with every number known. A point mass vaults over
 * three pivots of a stiff foot; landmarks are fixed to the limb. No person was recorded.
 */
final class DemoStudy {

    /** Subject of the study. */
    static final String SUBJECT = "D-01";
    /** Mass of the invented subject, kg. */
    static final double MASS = 70;
    /** Total limb length; the foot is taken out of it, m. */
    static final double LIMB = 1.18;
    /** Ground length of the foot from first to last pivot, m. */
    static final double FOOT = 0.28;
    /** Parts of the foot: three pivots. */
    static final int SEGMENTS = 2;

    private static final double RADIUS = LIMB - FOOT;
    private static final double POINT_RATE = 200;
    private static final int SAMPLES_PER_FRAME = 5;
    private static final int STEPS = 6;
    private static final double FOOT_OFFSET = 0.09;
    private static final double PLATFORM_WIDTH = 0.6;
    private static final double ANKLE_X = -0.05;
    private static final double ANKLE_Z = -(RADIUS - 0.08);
    static final int STANDING_FRAMES = 100;
    private static final double STEP_SHARE = 0.4;

    /**
     * One walk of the study.
     *
     * @param name of the recording
     * @param stepLength m
     * @param speed at the ideal transition, m/s
     */
    record Walk(String name, double stepLength, double speed) {

        SyntheticWalk synthetic() {
            return new SyntheticWalk(new WalkParameters(
                    MASS,
                    LIMB,
                    SEGMENTS,
                    FOOT,
                    stepLength,
                    speed,
                    STEP_SHARE,
                    WalkParameters.DEFAULT_INNER_BRIDGE_SHARE,
                    GaitSettings.STANDARD_GRAVITY));
        }

        WalkRecorder recorder() {
            // The laboratory's x runs against the walk and its y to the right, as any laboratory's may.
            Rotation turned = new Rotation(Vec3.X.times(-1), Vec3.Y.times(-1), Vec3.Z);
            return new WalkRecorder(
                    synthetic(),
                    new WalkRecorder.Settings(
                            name,
                            POINT_RATE,
                            SAMPLES_PER_FRAME,
                            STEPS,
                            true,
                            FOOT_OFFSET,
                            PLATFORM_WIDTH,
                            ANKLE_X,
                            ANKLE_Z,
                            new Pose(turned, new Vec3(2.0, 0.1, 0))));
        }
    }

    /** The walks, slower first. */
    static final List<Walk> WALKS = List.of(new Walk("walking-1", 0.58, 1.08), new Walk("walking-2", 0.62, 1.14));

    private DemoStudy() {}

    static Vec3 ankle() {
        return new Vec3(ANKLE_X, 0, ANKLE_Z);
    }

    /** Files by role, written into the folder. */
    record Files(Path standing, List<Path> walking, Path landmarks) {}

    static Files write(Path folder) throws UseCaseException {
        OutputFolder.of(folder, List.of());
        try {
            Path standing = folder.resolve("standing.c3d");
            C3dWriter.write(standing, WALKS.get(0).recorder().standing("standing.c3d", STANDING_FRAMES, points(true)));
            List<Path> walking = new ArrayList<>();
            for (Walk walk : WALKS) {
                Path file = folder.resolve(walk.name() + ".c3d");
                C3dWriter.write(file, walk.recorder().walking(points(false)));
                walking.add(file);
            }
            Path landmarks = folder.resolve("landmarks.xml");
            LandmarkMapFile.write(landmarks, map());
            return new Files(standing, walking, landmarks);
        } catch (IOException e) {
            throw new UseCaseException(
                    UseCaseException.Kind.OUTPUT,
                    folder.toString(),
                    "cannot be written (" + e.getMessage() + ")",
                    "give another folder",
                    e);
        }
    }

    /** Places of one limb's landmarks: forward, outwards, up from the mid-point between the hips; m. */
    private static Map<Landmark, double[]> places() {
        double sole = -RADIUS;
        double kneeX = ANKLE_X / 2;
        double kneeZ = ANKLE_Z / 2;
        Map<Landmark, double[]> places = new LinkedHashMap<>();
        places.put(Landmark.TROCHANTER_MAJOR, new double[] {0, 0.16, 0});
        places.put(Landmark.FEMORAL_EPICONDYLE_LATERAL, new double[] {kneeX, 0.14, kneeZ});
        places.put(Landmark.FEMORAL_EPICONDYLE_MEDIAL, new double[] {kneeX, 0.04, kneeZ});
        places.put(Landmark.MALLEOLUS_LATERAL, new double[] {ANKLE_X, 0.12, ANKLE_Z});
        places.put(Landmark.MALLEOLUS_MEDIAL, new double[] {ANKLE_X, 0.06, ANKLE_Z});
        places.put(Landmark.CALCANEUS_POSTERIOR, new double[] {-0.15, 0.09, sole + 0.03});
        places.put(Landmark.METATARSAL_1_HEAD, new double[] {0.08, 0.06, sole + 0.006});
        places.put(Landmark.METATARSAL_5_HEAD, new double[] {0.05, 0.13, sole + 0.003});
        places.put(Landmark.TOE_TIP, new double[] {0.16, 0.08, sole + 0.006});
        return places;
    }

    private static final double[][] THIGH = {{0.03, 0.15, -0.15}, {-0.04, 0.15, -0.2}, {0.02, 0.14, -0.28}};
    private static final double[][] SHANK = {
        {0.02, 0.13, -0.5}, {-0.07, 0.13, -0.55}, {0.01, 0.12, -0.66}, {-0.08, 0.12, -0.62}
    };

    static List<BodyPoint> points(boolean isStanding) {
        List<BodyPoint> points = new ArrayList<>();
        points.add(new BodyPoint("SACR", Side.RIGHT, Carrier.PELVIS, new Vec3(-0.12, 0, 0.05)));
        for (Side side : Side.values()) {
            double out = side == Side.LEFT ? 1 : -1;
            places().forEach((landmark, p) -> {
                // As in a usual protocol: ankles and knees carry markers in the standing trial only.
                boolean isStandingOnly = landmark == Landmark.MALLEOLUS_MEDIAL
                        || landmark == Landmark.MALLEOLUS_LATERAL
                        || landmark == Landmark.FEMORAL_EPICONDYLE_MEDIAL
                        || landmark == Landmark.FEMORAL_EPICONDYLE_LATERAL;
                if (isStanding || !isStandingOnly) {
                    points.add(new BodyPoint(
                            label(landmark, side),
                            side,
                            landmark == Landmark.TROCHANTER_MAJOR ? Carrier.THIGH : Carrier.SHANK_AND_FOOT,
                            new Vec3(p[0], out * p[1], p[2])));
                }
            });
            cluster(points, THIGH, side, "TH", Carrier.THIGH);
            cluster(points, SHANK, side, "SH", Carrier.SHANK_AND_FOOT);
        }
        return points;
    }

    private static void cluster(List<BodyPoint> points, double[][] places, Side side, String name, Carrier carrier) {
        double out = side == Side.LEFT ? 1 : -1;
        for (int k = 0; k < places.length; k++) {
            points.add(new BodyPoint(
                    letter(side) + name + (k + 1),
                    side,
                    carrier,
                    new Vec3(places[k][0], out * places[k][1], places[k][2])));
        }
    }

    private static String letter(Side side) {
        return side == Side.LEFT ? "L" : "R";
    }

    static String label(Landmark landmark, Side side) {
        return letter(side)
                + switch (landmark) {
                    case TROCHANTER_MAJOR -> "TRO";
                    case FEMORAL_EPICONDYLE_LATERAL -> "KNL";
                    case FEMORAL_EPICONDYLE_MEDIAL -> "KNM";
                    case MALLEOLUS_LATERAL -> "ANL";
                    case MALLEOLUS_MEDIAL -> "ANM";
                    case CALCANEUS_POSTERIOR -> "HEE";
                    case METATARSAL_1_HEAD -> "MT1";
                    case METATARSAL_5_HEAD -> "MT5";
                    case TOE_TIP -> "TOE";
                    default -> landmark.word();
                };
    }

    static LandmarkMap map() {
        List<LandmarkMap.Entry> entries = new ArrayList<>();
        entries.add(entry(Landmark.SACRUM, Optional.empty(), "SACR"));
        for (Side side : Side.values()) {
            for (Landmark landmark : places().keySet()) {
                entries.add(entry(landmark, Optional.of(side), label(landmark, side)));
            }
            entries.add(entry(Landmark.THIGH_CLUSTER, Optional.of(side), letter(side) + "TH*"));
            entries.add(entry(Landmark.SHANK_CLUSTER, Optional.of(side), letter(side) + "SH*"));
        }
        return new LandmarkMap("demo", entries);
    }

    private static LandmarkMap.Entry entry(Landmark landmark, Optional<Side> side, String label) {
        return new LandmarkMap.Entry(landmark, side, List.of(new LabelPattern(label)));
    }
}
