package org.solewright.domain.foot;

import java.util.List;
import java.util.Optional;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.SourceFile;
import org.solewright.domain.gait.Side;

/**
 * A segmented foot with its shank and its rolling contact, in the posture of the standing trial. Axes of all segment
 * frames: x forward, y up, z to the subject's right; origin at the segment's proximal joint. SI units.
 *
 * @param side whose foot
 * @param version version of the tool that made it
 * @param subject whose body
 * @param sources inputs, in the order of their use
 * @param segments shank and the foot's segments, proximal to distal
 * @param joints proximal to distal
 * @param landmarks in the standing trial
 * @param rolling how the sole rolls
 * @param pads contact elements, rear to front
 * @param findings what has to be said about it
 * @param cautions sentences every reader must see
 * @param settings choices it was made with
 */
public record FootModel(
        Side side,
        String version,
        Subject subject,
        List<SourceFile> sources,
        List<Segment> segments,
        List<Joint> joints,
        List<LandmarkPosition> landmarks,
        Rolling rolling,
        List<Pad> pads,
        List<Finding> findings,
        List<String> cautions,
        List<Setting> settings) {

    /**
     * A model that says nothing about the choices it was made with.
     *
     * @param side whose foot
     * @param version version of the tool that made it
     * @param subject whose body
     * @param sources inputs, in the order of their use
     * @param segments shank and the foot's segments, proximal to distal
     * @param joints proximal to distal
     * @param landmarks in the standing trial
     * @param rolling how the sole rolls
     * @param pads contact elements, rear to front
     * @param findings what has to be said about it
     * @param cautions sentences every reader must see
     */
    public FootModel(
            Side side,
            String version,
            Subject subject,
            List<SourceFile> sources,
            List<Segment> segments,
            List<Joint> joints,
            List<LandmarkPosition> landmarks,
            Rolling rolling,
            List<Pad> pads,
            List<Finding> findings,
            List<String> cautions) {
        this(
                side, version, subject, sources, segments, joints, landmarks, rolling, pads, findings, cautions,
                List.of());
    }

    /** Copies the lists and checks that parents, joints, landmarks and pads name segments of the model. */
    public FootModel {
        sources = List.copyOf(sources);
        segments = List.copyOf(segments);
        joints = List.copyOf(joints);
        landmarks = List.copyOf(landmarks);
        pads = List.copyOf(pads);
        findings = List.copyOf(findings);
        cautions = List.copyOf(cautions);
        settings = List.copyOf(settings);
        List<SegmentName> names = segments.stream().map(Segment::name).toList();
        if (names.stream().distinct().count() != names.size()) {
            throw new IllegalArgumentException("a segment occurs twice in " + names);
        }
        for (Segment s : segments) {
            s.parent()
                    .ifPresent(
                            p -> checkSegment(names, p, "parent of " + s.name().word()));
        }
        for (Joint j : joints) {
            checkSegment(names, j.proximal(), "joint " + j.name());
            checkSegment(names, j.distal(), "joint " + j.name());
        }
        for (LandmarkPosition l : landmarks) {
            checkSegment(names, l.segment(), "landmark " + l.name());
        }
        for (Pad p : pads) {
            checkSegment(names, p.segment(), "pad " + p.name());
        }
    }

    private static void checkSegment(List<SegmentName> names, SegmentName name, String what) {
        if (!names.contains(name)) {
            throw new IllegalArgumentException(what + " names segment " + name.word() + ", which the model has not");
        }
    }

    /**
     * A segment.
     *
     * @param name which
     * @return the segment, empty where the model has none of that name
     */
    public Optional<Segment> segment(SegmentName name) {
        return segments.stream().filter(s -> s.name() == name).findFirst();
    }

    /**
     * A joint.
     *
     * @param name such as {@code ankle}
     * @return the joint, empty where the model has none of that name
     */
    public Optional<Joint> joint(String name) {
        return joints.stream().filter(j -> j.name().equals(name)).findFirst();
    }
}
