package org.solewright.analysis.fitting;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.solewright.domain.geometry.Pose;

/** The poses of a chain's segments over a recording, by {@link ChainFit} frame after frame. */
public final class ChainTracking {

    private final List<List<Optional<Pose>>> poses;
    private final int determined;

    private ChainTracking(List<List<Optional<Pose>>> poses, int determined) {
        this.poses = poses;
        this.determined = determined;
    }

    /**
     * Fits every frame.
     *
     * @param model the chain as it stood
     * @param tracks its points over the recording, segment by segment, each {@code [frames][3]}, m, NaN where lost; not
     *     modified
     * @param frames number of frames
     * @return the poses
     * @throws IllegalArgumentException where the number of tracks is not that of the points
     */
    public static ChainTracking of(ChainModel model, List<double[]> tracks, int frames) {
        if (tracks.size() != model.points()) {
            throw new IllegalArgumentException(tracks.size() + " tracks for a chain of " + model.points() + " points");
        }
        ChainFit fit = new ChainFit(model);
        double[] present = new double[3 * tracks.size()];
        List<List<Optional<Pose>>> poses = new ArrayList<>(frames);
        int determined = 0;
        int segments = model.segments().size();
        for (int frame = 0; frame < frames; frame++) {
            for (int k = 0; k < tracks.size(); k++) {
                System.arraycopy(tracks.get(k), 3 * frame, present, 3 * k, 3);
            }
            boolean isKnown = fit.fit(present) == ChainFit.State.DETERMINED;
            determined += isKnown ? 1 : 0;
            List<Optional<Pose>> here = new ArrayList<>(segments);
            for (int s = 0; s < segments; s++) {
                here.add(isKnown && fit.isObserved(s) ? Optional.of(fit.pose(s)) : Optional.empty());
            }
            poses.add(here);
        }
        return new ChainTracking(poses, determined);
    }

    /**
     * Pose of a segment.
     *
     * @param segment its index in the chain
     * @param frame zero-based
     * @return X from standing to present, laboratory frame; empty where not known or beyond the recording
     */
    public Optional<Pose> pose(int segment, int frame) {
        return frame >= 0 && frame < poses.size() ? poses.get(frame).get(segment) : Optional.empty();
    }

    /**
     * Number of frames in which the chain is known.
     *
     * @return zero or more
     */
    public int determined() {
        return determined;
    }
}
