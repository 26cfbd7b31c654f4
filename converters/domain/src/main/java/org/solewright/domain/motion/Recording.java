package org.solewright.domain.motion;

import java.util.List;
import java.util.Optional;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.gait.PlatformLoads;

/**
 * One recording in SI units in its laboratory frame.
 *
 * @param name the file's name without folder, for messages
 * @param rate point rate, Hz, more than 0 where there are frames
 * @param firstFrame number of the first frame as in the file
 * @param frames number of point frames
 * @param points tracks in the file's order, each with {@code frames} samples
 * @param platforms usable force platforms in the file's order
 * @param events events as the file states them
 * @param findings what has to be said about the file
 */
public record Recording(
        String name,
        double rate,
        int firstFrame,
        int frames,
        List<PointTrack> points,
        List<PlatformLoads> platforms,
        List<RecordedEvent> events,
        List<Finding> findings) {

    /** Copies the lists and checks the lengths. */
    public Recording {
        points = List.copyOf(points);
        platforms = List.copyOf(platforms);
        events = List.copyOf(events);
        findings = List.copyOf(findings);
        for (PointTrack p : points) {
            if (p.frames() != frames) {
                throw new IllegalArgumentException(
                        "point " + p.label() + " has " + p.frames() + " frames, expected " + frames);
            }
        }
    }

    /**
     * Time of a frame on the file's clock.
     *
     * @param frame zero-based
     * @return (firstFrame + frame - 1) / rate, s
     */
    public double time(int frame) {
        return (firstFrame - 1 + frame) / rate;
    }

    /**
     * The track of that label.
     *
     * @param label exact label
     * @return the track, empty where the recording has none
     */
    public Optional<PointTrack> point(String label) {
        return points.stream().filter(p -> p.label().equals(label)).findFirst();
    }
}
