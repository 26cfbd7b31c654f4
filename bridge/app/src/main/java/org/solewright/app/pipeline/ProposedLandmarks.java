package org.solewright.app.pipeline;

import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import org.solewright.analysis.gait.LandmarkProposal;
import org.solewright.analysis.gait.LandmarkTracks;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.foot.LabelPattern;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.foot.LandmarkMap;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Vec3;
import org.solewright.domain.motion.PointTrack;
import org.solewright.domain.motion.Recording;
import org.solewright.formats.footmodel.LandmarkMapFile;
import org.solewright.formats.io.FormatException;

/**
 * A landmark map proposed from the labels of recordings and from where their points were.
 *
 * @param xml the map, with a comment at each landmark, UTF-8
 * @param findings what the user must look at
 */
public record ProposedLandmarks(String xml, List<Finding> findings) {

    private static final List<Landmark> REQUIRED = List.of(
            Landmark.MALLEOLUS_MEDIAL,
            Landmark.MALLEOLUS_LATERAL,
            Landmark.CALCANEUS_POSTERIOR,
            Landmark.METATARSAL_1_HEAD,
            Landmark.METATARSAL_5_HEAD);

    private static final List<String> HEAD = List.of(
            "Proposed from the labels of the recordings and from where their points were: confirm every line.",
            "high: words and place say the same; medium: only one of them; low: they disagree, or the place alone.");

    /** Most labels that are named in one finding. */
    private static final int MOST_NAMED = 40;

    /** Copies the list. */
    public ProposedLandmarks {
        findings = List.copyOf(findings);
    }

    /**
     * Reads the recordings and proposes a map.
     *
     * @param files recordings, at least one; a standing one first where there is one
     * @param name of the map
     * @return the proposal
     * @throws UseCaseException where a file cannot be read or has no points
     * @throws FormatException where a file is not a C3D file
     */
    public static ProposedLandmarks of(List<Path> files, String name) throws UseCaseException, FormatException {
        List<Finding> findings = new ArrayList<>();
        List<Recording> recordings = InputFiles.standing(files, false, new ArrayList<>(), findings);
        Map<String, Vec3> places = places(recordings);
        if (places.isEmpty()) {
            throw new UseCaseException(
                    UseCaseException.Kind.INPUT,
                    files.get(0).toString(),
                    "has no labelled points",
                    "give a recording with points");
        }
        LandmarkProposal proposal = LandmarkProposal.of(places, up(recordings, places));
        List<LandmarkMap.Entry> entries = new ArrayList<>();
        List<String> notes = new ArrayList<>();
        for (LandmarkProposal.Guess g : proposal.guesses()) {
            entries.add(new LandmarkMap.Entry(
                    g.landmark(),
                    g.side(),
                    g.labels().stream().map(LabelPattern::new).toList()));
            notes.add(g.confidence().name().toLowerCase(Locale.ROOT) + ": " + g.why());
        }
        return new ProposedLandmarks(
                new String(LandmarkMapFile.bytes(new LandmarkMap(name, entries), HEAD, notes), StandardCharsets.UTF_8),
                said(proposal));
    }

    /** Mean position of every label over the first recording that shows it. */
    private static Map<String, Vec3> places(List<Recording> recordings) {
        Map<String, Vec3> places = new LinkedHashMap<>();
        for (Recording r : recordings) {
            for (PointTrack p : r.points()) {
                Vec3 known = places.get(p.label());
                if (known == null || !known.isFinite()) {
                    double[] xyz = new double[3 * r.frames()];
                    p.copyTo(xyz, 0);
                    places.put(
                            p.label(), LandmarkTracks.meanOf(xyz).orElse(new Vec3(Double.NaN, Double.NaN, Double.NaN)));
                }
            }
        }
        return places;
    }

    /** Up from the platforms, else the axis along which the points reach farthest. */
    private static Vec3 up(List<Recording> recordings, Map<String, Vec3> places) {
        for (Recording r : recordings) {
            for (PlatformLoads p : r.platforms()) {
                return p.up();
            }
        }
        Vec3 best = Vec3.Z;
        double farthest = -1;
        for (Vec3 axis : List.of(Vec3.Z, Vec3.Y, Vec3.X)) {
            double low = Double.POSITIVE_INFINITY;
            double high = Double.NEGATIVE_INFINITY;
            for (Vec3 p : places.values()) {
                if (p.isFinite()) {
                    low = Math.min(low, p.dot(axis));
                    high = Math.max(high, p.dot(axis));
                }
            }
            if (high - low > farthest) {
                farthest = high - low;
                best = axis;
            }
        }
        return best;
    }

    private static List<Finding> said(LandmarkProposal proposal) {
        List<Finding> findings = new ArrayList<>();
        findings.add(Finding.note(
                "landmarks.proposed",
                "",
                proposal.guesses().size() + " landmarks and clusters are proposed ("
                        + count(proposal, LandmarkProposal.Confidence.HIGH) + " high, "
                        + count(proposal, LandmarkProposal.Confidence.MEDIUM) + " medium, "
                        + count(proposal, LandmarkProposal.Confidence.LOW) + " low confidence): confirm each"));
        for (Side side : Side.values()) {
            List<String> missing = REQUIRED.stream()
                    .filter(l -> proposal.guesses().stream()
                            .noneMatch(g -> g.landmark() == l && g.side().equals(Optional.of(side))))
                    .map(Landmark::word)
                    .toList();
            if (!missing.isEmpty()) {
                findings.add(Finding.warning(
                        "landmark.missing",
                        side.word(),
                        "no label was found for " + String.join(", ", missing)
                                + ", without which no foot is fitted: name its label by hand"));
            }
        }
        if (!proposal.unknown().isEmpty()) {
            List<String> shown = proposal.unknown().stream().limit(MOST_NAMED).toList();
            findings.add(Finding.note(
                    "landmarks.label-unknown",
                    "",
                    proposal.unknown().size() + " labels were not recognised: " + String.join(", ", shown)
                            + (shown.size() < proposal.unknown().size() ? ", ..." : "")));
        }
        return findings;
    }

    private static long count(LandmarkProposal proposal, LandmarkProposal.Confidence confidence) {
        return proposal.guesses().stream()
                .filter(g -> g.confidence() == confidence)
                .count();
    }
}
