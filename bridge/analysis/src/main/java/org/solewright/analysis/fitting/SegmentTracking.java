package org.solewright.analysis.fitting;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.solewright.domain.geometry.Pose;
import org.solewright.domain.geometry.Vec3;

/**
 * The pose of one segment over a recording, frame by frame, from the points that are fixed to it: separate rigid fits
 * ([Soederkvist & Wedin 1993]) of where the points are to where they were in the standing trial.
 */
public final class SegmentTracking {

    private final List<Optional<Pose>> poses;
    private final double rms;
    private final double shapeChange;
    private final int fitted;

    private SegmentTracking(List<Optional<Pose>> poses, double rms, double shapeChange, int fitted) {
        this.poses = List.copyOf(poses);
        this.rms = rms;
        this.shapeChange = shapeChange;
        this.fitted = fitted;
    }

    /**
     * Fits every frame.
     *
     * @param reference positions of the segment's points in the standing trial, laboratory frame, m
     * @param tracks the same points over the recording, each {@code [frames][3]}, m, NaN where lost; not modified
     * @param frames number of frames
     * @return poses X that carry standing positions to present ones; empty where fewer than three points are there
     * @throws IllegalArgumentException where the numbers of points differ
     */
    public static SegmentTracking of(List<Vec3> reference, List<double[]> tracks, int frames) {
        if (reference.size() != tracks.size()) {
            throw new IllegalArgumentException(
                    reference.size() + " reference points for " + tracks.size() + " tracks");
        }
        double[] a = new double[3 * reference.size()];
        for (int k = 0; k < reference.size(); k++) {
            a[3 * k] = reference.get(k).x();
            a[3 * k + 1] = reference.get(k).y();
            a[3 * k + 2] = reference.get(k).z();
        }
        double[] b = new double[a.length];
        List<Optional<Pose>> poses = new ArrayList<>(frames);
        double sumRms = 0;
        double sumShape = 0;
        int fitted = 0;
        for (int frame = 0; frame < frames; frame++) {
            for (int k = 0; k < tracks.size(); k++) {
                System.arraycopy(tracks.get(k), 3 * frame, b, 3 * k, 3);
            }
            Optional<RigidFit> fit = RigidFit.of(a, b);
            poses.add(fit.map(RigidFit::pose));
            if (fit.isPresent()) {
                sumRms += fit.get().rms() * fit.get().rms();
                sumShape += fit.get().shapeChange() * fit.get().shapeChange();
                fitted++;
            }
        }
        return new SegmentTracking(
                poses,
                fitted == 0 ? Double.NaN : Math.sqrt(sumRms / fitted),
                fitted == 0 ? Double.NaN : Math.sqrt(sumShape / fitted),
                fitted);
    }

    /**
     * A point of the segment in a frame.
     *
     * @param standing where the point was in the standing trial, laboratory frame, m
     * @param frame zero-based
     * @return where it is now, m; empty where the pose is not known
     */
    public Optional<Vec3> at(Vec3 standing, int frame) {
        return poses.get(frame).map(p -> p.transformPosition(standing));
    }

    /**
     * The pose in a frame.
     *
     * @param frame zero-based
     * @return X from standing to present, laboratory frame; empty where not known
     */
    public Optional<Pose> pose(int frame) {
        return poses.get(frame);
    }

    /**
     * Root mean square distance of carried and present points over all fitted frames.
     *
     * @return m; NaN where no frame was fitted
     */
    public double rms() {
        return rms;
    }

    /**
     * Root mean square change of the distances between the points over all fitted frames.
     *
     * @return m; NaN where no frame was fitted
     */
    public double shapeChange() {
        return shapeChange;
    }

    /**
     * Number of frames with a pose.
     *
     * @return zero or more
     */
    public int fitted() {
        return fitted;
    }
}
