package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import org.solewright.analysis.gait.LandmarkTracks;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.foot.LabelPattern;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.foot.LandmarkMap;
import org.solewright.domain.gait.Side;
import org.solewright.domain.motion.PointTrack;
import org.solewright.domain.motion.Recording;
import org.solewright.formats.io.Spelling;

/** Whether the recordings of a call have the labels that the landmark map names, and the landmarks that are needed. */
final class LandmarkCoverage {

    private static final List<Landmark> NEEDED_STANDING = List.of(
            Landmark.MALLEOLUS_MEDIAL,
            Landmark.MALLEOLUS_LATERAL,
            Landmark.CALCANEUS_POSTERIOR,
            Landmark.METATARSAL_1_HEAD,
            Landmark.METATARSAL_5_HEAD);
    private static final List<Landmark> FOREFOOT = List.of(
            Landmark.METATARSAL_1_HEAD,
            Landmark.METATARSAL_2_HEAD,
            Landmark.METATARSAL_5_HEAD,
            Landmark.HALLUX_TIP,
            Landmark.TOE_TIP);

    private LandmarkCoverage() {}

    /**
     * Labels of the map that no recording of the call has.
     *
     * @param map landmark map
     * @param recordings all recordings of the call
     * @return a warning per label
     */
    static List<Finding> missingLabels(LandmarkMap map, List<Recording> recordings) {
        Set<String> recorded = new LinkedHashSet<>();
        recordings.forEach(r -> r.points().forEach(p -> recorded.add(p.label())));
        List<Finding> findings = new ArrayList<>();
        for (LandmarkMap.Entry entry : map.entries()) {
            for (LabelPattern pattern : entry.labels()) {
                if (recorded.stream().noneMatch(pattern::matches)) {
                    findings.add(Finding.warning(
                            "landmarks.label-missing",
                            name(entry),
                            "no recording of this call has the label '" + pattern.text() + "'"
                                    + suggestion(pattern.text(), recorded)));
                }
            }
        }
        return findings;
    }

    /** Landmarks to which a recording offers more than one label of one name, which are averaged. */
    static List<Finding> repeatedLabels(Recording recording) {
        List<Finding> findings = new ArrayList<>();
        for (PointTrack p : recording.points()) {
            if (p.label().matches(".*#\\d+")) {
                findings.add(Finding.warning(
                        "landmarks.label-repeated",
                        recording.name(),
                        "label '" + p.label() + "' stands for a repeated label; only the first of them is mapped"));
            }
        }
        return findings;
    }

    static void requireStanding(LandmarkMap map, StandingTrial standing, Side side) throws UseCaseException {
        for (Landmark landmark : NEEDED_STANDING) {
            if (standing.landmark(landmark, side).isEmpty()) {
                throw missing(map, standing.tracks().get(0).recording(), side, landmark, "standing recording");
            }
        }
    }

    static void requireWalking(LandmarkMap map, LandmarkTracks tracks, Side side) throws UseCaseException {
        if (!tracks.has(Landmark.CALCANEUS_POSTERIOR, side)) {
            throw missing(map, tracks.recording(), side, Landmark.CALCANEUS_POSTERIOR, "walking recording");
        }
        if (FOREFOOT.stream().noneMatch(l -> tracks.has(l, side))) {
            throw missing(map, tracks.recording(), side, Landmark.METATARSAL_1_HEAD, "walking recording");
        }
    }

    private static UseCaseException missing(
            LandmarkMap map, Recording recording, Side side, Landmark landmark, String what) {
        List<String> recorded =
                recording.points().stream().map(PointTrack::label).toList();
        Optional<LabelPattern> named = map.patterns(landmark, side).stream().findFirst();
        String found = named.map(p -> recorded.stream().anyMatch(p::matches)
                        ? "label '" + p.text() + "' is never seen in it"
                        : "it has no label '" + p.text() + "'" + suggestion(p.text(), recorded))
                .orElse("the landmark map names no label for it");
        return new UseCaseException(
                UseCaseException.Kind.INPUT,
                recording.name(),
                "the " + what + " lacks the " + side.word() + " " + landmark.word() + ": " + found,
                "correct the landmark map or record the landmark");
    }

    private static String suggestion(String text, Iterable<String> recorded) {
        List<String> words = new ArrayList<>();
        recorded.forEach(words::add);
        return Spelling.nearest(text, words)
                .map(w -> "; did you mean '" + w + "'?")
                .orElse("");
    }

    private static String name(LandmarkMap.Entry entry) {
        return entry.side().map(s -> s.word() + " ").orElse("")
                + entry.landmark().word();
    }
}
