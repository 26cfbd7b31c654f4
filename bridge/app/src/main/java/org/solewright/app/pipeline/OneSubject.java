package org.solewright.app.pipeline;

import java.util.Set;
import java.util.TreeSet;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.foot.LandmarkMap;
import org.solewright.domain.gait.Side;
import org.solewright.domain.motion.PointTrack;
import org.solewright.domain.motion.Recording;

/** A recording of two people must not be read as one whose markers lie midway between them. */
final class OneSubject {

    private OneSubject() {}

    /**
     * Checks that a landmark's labels belong to one person.
     *
     * @param map landmarks
     * @param recording its labels may have a subject's name before a colon
     * @throws UseCaseException where the map takes the points of several people for one landmark
     */
    static void require(LandmarkMap map, Recording recording) throws UseCaseException {
        var labels = recording.points().stream().map(PointTrack::label).toList();
        Set<String> people = new TreeSet<>();
        for (Landmark landmark : Landmark.values()) {
            for (Side side : Side.values()) {
                map.labels(landmark, side, labels).stream()
                        .filter(l -> l.indexOf(':') > 0)
                        .map(l -> l.substring(0, l.indexOf(':')))
                        .forEach(people::add);
            }
        }
        if (people.size() > 1) {
            String first = people.iterator().next();
            throw new UseCaseException(
                    UseCaseException.Kind.INPUT,
                    recording.name(),
                    "the landmark map fits the markers of " + people.size() + " people in it: "
                            + String.join(", ", people),
                    "put the name of one of them before the labels of the map, such as " + first + ":LABEL");
        }
    }
}
