package org.solewright.analysis.fitting;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.solewright.domain.geometry.Pose;
import org.solewright.domain.geometry.Vec3;

/**
 * The pose of one segment over a recording, frame by frame, from the points that are fixed to it: separate rigid fits
 * ([Soederkvist and Wedin 1993]) of where the points are to where they were in the standing trial.
 */
public final class SegmentTracking {

    private final List<Optional<RigidFit>> fits;
    private final int fitted;

    private SegmentTracking(List<Optional<RigidFit>> fits) {
        this.fits = List.copyOf(fits);
        this.fitted = (int) fits.stream().filter(Optional::isPresent).count();
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
            throw new IllegalArgumentException(reference.size() + " reference points for " + tracks.size() + " tracks");
        }
        double[] a = new double[3 * reference.size()];
        for (int k = 0; k < reference.size(); k++) {
            a[3 * k] = reference.get(k).x();
            a[3 * k + 1] = reference.get(k).y();
            a[3 * k + 2] = reference.get(k).z();
        }
        double[] b = new double[a.length];
        List<Optional<RigidFit>> fits = new ArrayList<>(frames);
        for (int frame = 0; frame < frames; frame++) {
            for (int k = 0; k < tracks.size(); k++) {
                System.arraycopy(tracks.get(k), 3 * frame, b, 3 * k, 3);
            }
            fits.add(RigidFit.of(a, b));
        }
        return new SegmentTracking(fits);
    }

    /**
     * A point of the segment in a frame.
     *
     * @param standing where the point was in the standing trial, laboratory frame, m
     * @param frame zero-based
     * @return where it is now, m; empty where the pose is not known
     */
    public Optional<Vec3> at(Vec3 standing, int frame) {
        return fit(frame).map(f -> f.pose().transformPosition(standing));
    }

    /**
     * The pose in a frame.
     *
     * @param frame zero-based
     * @return X from standing to present, laboratory frame; empty where not known
     */
    public Optional<Pose> pose(int frame) {
        return fit(frame).map(RigidFit::pose);
    }

    /**
     * The fit in a frame: its rms and the change of shape tell how far the segment was rigid.
     *
     * @param frame zero-based
     * @return the fit; empty where not known or beyond the recording
     */
    public Optional<RigidFit> fit(int frame) {
        return frame < fits.size() ? fits.get(frame) : Optional.empty();
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
