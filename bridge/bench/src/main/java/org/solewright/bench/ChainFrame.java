package org.solewright.bench;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.solewright.analysis.fitting.ChainFit;
import org.solewright.analysis.fitting.ChainModel;
import org.solewright.domain.geometry.Vec3;

/** One frame of the chain fit: four segments of five points each, 3 mm of noise, 6 mm of travel a frame. */
@State(Scope.Thread)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MICROSECONDS)
public class ChainFrame {

    private static final int SEGMENTS = 4;
    private static final int POINTS = 5;
    private static final int FRAMES = 256;

    private final double[][] present = new double[FRAMES][3 * SEGMENTS * POINTS];
    private ChainFit fit = new ChainFit(model());
    private int frame;

    private static ChainModel model() {
        Random random = new Random(1);
        List<ChainModel.Segment> segments = new ArrayList<>();
        for (int s = 0; s < SEGMENTS; s++) {
            Vec3 joint = new Vec3(0.02 * s, 1 - 0.3 * s, 0);
            List<Vec3> points = new ArrayList<>();
            for (int k = 0; k < POINTS; k++) {
                points.add(joint.plus(
                        new Vec3(0.1 * random.nextGaussian(), 0.3 * random.nextDouble(), 0.1 * random.nextGaussian())));
            }
            segments.add(new ChainModel.Segment(s - 1, joint, Optional.empty(), points, 1e5));
        }
        return new ChainModel(segments);
    }

    /** Frames forth and back, so that the last one leads to the first. */
    @Setup
    public void fill() {
        Random random = new Random(2);
        ChainModel model = model();
        for (int f = 0; f < FRAMES; f++) {
            double there = 0.006 * Math.min(f, FRAMES - f);
            int k = 0;
            for (ChainModel.Segment s : model.segments()) {
                for (Vec3 p : s.points()) {
                    present[f][k++] = p.x() + there + 0.003 * random.nextGaussian();
                    present[f][k++] = p.y() + 0.003 * random.nextGaussian();
                    present[f][k++] = p.z() + 0.003 * random.nextGaussian();
                }
            }
        }
        fit = new ChainFit(model);
    }

    /**
     * One frame after another.
     *
     * @return how it went
     */
    @Benchmark
    public ChainFit.State frame() {
        frame = (frame + 1) % FRAMES;
        return fit.fit(present[frame]);
    }
}
