package org.solewright.analysis.gait;

import java.util.List;
import java.util.Optional;
import org.solewright.domain.geometry.Rotation;
import org.solewright.domain.geometry.Vec3;

/**
 * The tracked landmarks of one foot at the point rate: flat {@code [frames][3]} row-major arrays in m, NaN where lost.
 * The arrays are shared with the maker and are not to be changed.
 */
public final class FootTracks {

    // [Drillis & Contini 1966] has no such ratio; 03 section 5 gives heel to first metatarsal head as 0.73 of the foot.
    private static final double FIRST_HEAD_OF_FOOT = 0.73;
    private static final double TOES_OF_HEEL_TO_HEAD = 0.37;
    private static final double HEEL_BACK = 0.010;

    private final double[] heel;
    private final List<double[]> heads;
    private final Optional<double[]> toe;

    /**
     * Tracks of one foot.
     *
     * @param heel rear of the calcaneus
     * @param heads metatarsal heads, the first (medial) one first; at least one
     * @param toe tip of the toes, where tracked
     * @throws IllegalArgumentException where no head is given or lengths differ
     */
    public FootTracks(double[] heel, List<double[]> heads, Optional<double[]> toe) {
        if (heads.isEmpty()) {
            throw new IllegalArgumentException("foot without a metatarsal head, expected at least 1");
        }
        for (double[] h : heads) {
            if (h.length != heel.length) {
                throw new IllegalArgumentException(
                        "metatarsal head has " + h.length / 3 + " frames, heel has " + heel.length / 3);
            }
        }
        this.heel = heel;
        this.heads = List.copyOf(heads);
        this.toe = toe;
    }

    /**
     * The same tracks in another frame with the same origin.
     *
     * @param R_LW the other frame's axes in this one
     * @return tracks in the other frame
     */
    FootTracks in(Rotation R_LW) {
        return new FootTracks(
                turned(heel, R_LW), heads.stream().map(h -> turned(h, R_LW)).toList(), toe.map(t -> turned(t, R_LW)));
    }

    static double[] turned(double[] p_L, Rotation R_LW) {
        double[] p_W = new double[p_L.length];
        for (int i = 0; i < p_L.length; i += 3) {
            Vec3 p = R_LW.inverseVector(new Vec3(p_L[i], p_L[i + 1], p_L[i + 2]));
            p_W[i] = p.x();
            p_W[i + 1] = p.y();
            p_W[i + 2] = p.z();
        }
        return p_W;
    }

    int frames() {
        return heel.length / 3;
    }

    Vec3 heel(int frame) {
        return at(heel, frame);
    }

    /** Mean of the metatarsal heads. */
    Vec3 headCentre(int frame) {
        Vec3 sum = Vec3.ZERO;
        for (double[] h : heads) {
            sum = sum.plus(at(h, frame));
        }
        return sum.times(1.0 / heads.size());
    }

    /** Lowest tracked landmark by the second component. */
    double lowest(int frame) {
        double low = at(heel, frame).y();
        for (double[] h : heads) {
            low = Math.min(low, at(h, frame).y());
        }
        if (toe.isPresent()) {
            low = Math.min(low, at(toe.get(), frame).y());
        }
        return low;
    }

    /** Foot length at a frame, m: heel to toe tip, else heel to first head over 0.73 (regression). */
    double length(int frame) {
        return toe.map(t -> at(t, frame).distance(heel(frame)))
                .orElseGet(() -> at(heads.get(0), frame).distance(heel(frame)) / FIRST_HEAD_OF_FOOT);
    }

    /** Unit vector heel to metatarsal heads, horizontal part (y = 0), in a frame whose y is up. */
    Vec3 forward(int frame) {
        Vec3 d = headCentre(frame).minus(heel(frame));
        return new Vec3(d.x(), 0, d.z()).unit();
    }

    /**
     * Outline on the ground in a frame whose y is up: heel landmark 10 mm back, metatarsal heads, toe tip; where the toe
     * is not tracked, the heads carried 0.37 of the heel-to-first-head distance forward.
     */
    List<ConvexOutline.Point> outline(int frame) {
        List<ConvexOutline.Point> points = new java.util.ArrayList<>();
        Vec3 forward = forward(frame);
        Vec3 back = heel(frame).minus(forward.times(HEEL_BACK));
        points.add(new ConvexOutline.Point(back.x(), back.z()));
        double toes = TOES_OF_HEEL_TO_HEAD * at(heads.get(0), frame).distance(heel(frame));
        for (double[] h : heads) {
            Vec3 p = at(h, frame);
            points.add(new ConvexOutline.Point(p.x(), p.z()));
            if (toe.isEmpty()) {
                Vec3 q = p.plus(forward.times(toes));
                points.add(new ConvexOutline.Point(q.x(), q.z()));
            }
        }
        if (toe.isPresent()) {
            Vec3 t = at(toe.get(), frame);
            points.add(new ConvexOutline.Point(t.x(), t.z()));
        }
        return points;
    }

    boolean isTracked(int frame) {
        boolean tracked = !Double.isNaN(heel[3 * frame])
                && toe.map(t -> !Double.isNaN(t[3 * frame])).orElse(true);
        for (double[] h : heads) {
            tracked &= !Double.isNaN(h[3 * frame]);
        }
        return tracked;
    }

    static Vec3 at(double[] xyz, int frame) {
        return new Vec3(xyz[3 * frame], xyz[3 * frame + 1], xyz[3 * frame + 2]);
    }
}
