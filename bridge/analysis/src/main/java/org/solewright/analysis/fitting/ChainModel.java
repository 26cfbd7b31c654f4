package org.solewright.analysis.fitting;

import java.util.List;
import java.util.Optional;
import org.solewright.domain.geometry.Vec3;

/**
 * A limb as a chain of rigid segments that share their joint centres, as it stood: what {@link ChainFit} moves.
 *
 * @param segments parents before children; the first one is free, every other hangs on a joint
 */
public record ChainModel(List<Segment> segments) {

    private static final double TOLERANCE = 1e-6;

    /**
     * One segment.
     *
     * @param parent index of the segment above, -1 for the first
     * @param joint centre of the joint with the parent in the standing trial, laboratory frame, m; not used for the first
     * @param hinge axis of a joint that only turns about it, unit vector in the standing trial; empty for a ball joint
     * @param points the segment's tracked points in the standing trial, laboratory frame, m
     * @param weight of each of its points, 1/rms^2 of the cluster, m^-2
     */
    public record Segment(int parent, Vec3 joint, Optional<Vec3> hinge, List<Vec3> points, double weight) {

        /** Copies the points and checks weight and axis. */
        public Segment {
            points = List.copyOf(points);
            if (!(weight > 0 && Double.isFinite(weight))) {
                throw new IllegalArgumentException("cluster weight " + weight + " 1/m^2, expected more than 0");
            }
            if (hinge.isPresent() && !(Math.abs(hinge.get().norm() - 1) < TOLERANCE)) {
                throw new IllegalArgumentException(
                        "hinge axis of length " + hinge.get().norm() + ", expected 1");
            }
        }
    }

    /** Copies the list and checks the order. */
    public ChainModel {
        segments = List.copyOf(segments);
        if (segments.isEmpty()) {
            throw new IllegalArgumentException("a chain of 0 segments, expected at least 1");
        }
        for (int s = 0; s < segments.size(); s++) {
            int parent = segments.get(s).parent();
            if (s == 0 ? parent != -1 : parent < 0 || parent >= s) {
                throw new IllegalArgumentException("segment " + s + " hangs on segment " + parent
                        + ", expected -1 for the first and an earlier one for the others");
            }
        }
        if (segments.get(0).hinge().isPresent()) {
            throw new IllegalArgumentException("the first segment of a chain is free, it has no hinge");
        }
    }

    /**
     * Number of points over all segments, the order of {@link ChainFit#fit}: segment by segment.
     *
     * @return zero or more
     */
    public int points() {
        return segments.stream().mapToInt(s -> s.points().size()).sum();
    }
}
