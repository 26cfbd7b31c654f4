package org.solewright.analysis.gait;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.foot.LandmarkMap;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Vec3;
import org.solewright.domain.motion.Recording;

/** Markers that jump onto another's path: their names were exchanged within the recording. */
public final class MarkerSwaps {

    /** Departure from the path of the two samples before, m, that no marker on skin makes in a frame (common practice). */
    private static final double JUMP = 0.02;

    /** The place it lands on lies this much nearer to the other's path than to its own. */
    private static final double NEARER = 4;

    /** Slower recordings do not follow a path, Hz. */
    private static final double SLOWEST = 20;

    private MarkerSwaps() {}

    /**
     * Looks for them.
     *
     * @param recording points in m
     * @param map the points that are looked at
     * @return a warning per pair of labels, at its first jump
     */
    public static List<Finding> of(Recording recording, LandmarkMap map) {
        if (recording.rate() < SLOWEST) {
            return List.of();
        }
        LandmarkTracks raw = LandmarkTracks.of(recording, map, 0, new ArrayList<>());
        List<String> labels = new ArrayList<>();
        List<double[]> tracks = new ArrayList<>();
        for (Landmark landmark : Landmark.values()) {
            for (Side side : Side.values()) {
                for (String label : raw.labels(landmark, side)) {
                    if (!labels.contains(label)) {
                        labels.add(label);
                        tracks.add(raw.labelled(label).orElseThrow());
                    }
                }
            }
        }
        List<Finding> findings = new ArrayList<>();
        List<String> told = new ArrayList<>();
        for (int i = 0; i < labels.size(); i++) {
            for (int frame = 2; frame < recording.frames(); frame++) {
                double jump = at(tracks.get(i), frame).distance(expected(tracks.get(i), frame));
                if (jump > JUMP) {
                    int other = landedOn(tracks, i, frame, jump / NEARER);
                    if (other >= 0 && !told.contains(pair(i, other))) {
                        told.add(pair(i, other));
                        findings.add(swapped(recording, labels.get(i), labels.get(other), frame, jump));
                    }
                }
            }
        }
        return findings;
    }

    private static int landedOn(List<double[]> tracks, int marker, int frame, double within) {
        Vec3 place = at(tracks.get(marker), frame);
        for (int other = 0; other < tracks.size(); other++) {
            if (other != marker && place.distance(expected(tracks.get(other), frame)) < within) {
                return other;
            }
        }
        return -1;
    }

    private static String pair(int a, int b) {
        return Math.min(a, b) + " " + Math.max(a, b);
    }

    /** NaN components where lost. */
    private static Vec3 at(double[] xyz, int frame) {
        return new Vec3(xyz[3 * frame], xyz[3 * frame + 1], xyz[3 * frame + 2]);
    }

    /** Where two samples lead to in a straight line. */
    private static Vec3 expected(double[] xyz, int frame) {
        return at(xyz, frame - 1).times(2).minus(at(xyz, frame - 2));
    }

    private static Finding swapped(Recording recording, String label, String other, int frame, double jump) {
        return Finding.warning(
                "points.swapped",
                recording.name() + " " + label,
                String.format(
                        Locale.ROOT,
                        "at %.3f s it jumps by %.0f mm onto the path of %s: their names are exchanged from there on, or for a"
                                + " while; correct them in the recording software",
                        recording.time(frame),
                        1000 * jump,
                        other));
    }
}
