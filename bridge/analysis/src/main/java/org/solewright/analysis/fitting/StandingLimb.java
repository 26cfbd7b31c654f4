package org.solewright.analysis.fitting;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.Quantity;
import org.solewright.domain.finding.SourceFile;
import org.solewright.domain.foot.FootModel;
import org.solewright.domain.foot.Joint;
import org.solewright.domain.foot.LandmarkPosition;
import org.solewright.domain.foot.Located;
import org.solewright.domain.foot.Pad;
import org.solewright.domain.foot.Population;
import org.solewright.domain.foot.Rolling;
import org.solewright.domain.foot.Segment;
import org.solewright.domain.foot.SegmentName;
import org.solewright.domain.foot.Sex;
import org.solewright.domain.foot.Subject;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Pose;
import org.solewright.domain.geometry.Vec3;

/**
 * One limb as it stood: the static parts of a foot model and where they were in the laboratory.
 *
 * @param side whose
 * @param subjectId identifier
 * @param mass body mass, kg
 * @param stature body height, m; empty where not given
 * @param population whose regressions apply
 * @param sex empty where not given
 * @param hip hip centre in the laboratory frame L, m
 * @param knee knee centre in L, m
 * @param ankle ankle centre in L, m
 * @param floor height of the floor along up in L, m
 * @param limbLength hip centre to floor, m
 * @param footLength heel to toe tip, m; empty where no landmark or regression gives it
 * @param poses pose X_LS of each segment's frame in L
 * @param segments proximal to distal
 * @param joints proximal to distal
 * @param landmarks in their segments' frames
 * @param pads contact elements, rear to front
 * @param findings what has to be said
 */
public record StandingLimb(
        Side side,
        String subjectId,
        Quantity mass,
        Optional<Quantity> stature,
        Population population,
        Optional<Sex> sex,
        Located hip,
        Located knee,
        Located ankle,
        Quantity floor,
        Quantity limbLength,
        Optional<Quantity> footLength,
        Map<SegmentName, Pose> poses,
        List<Segment> segments,
        List<Joint> joints,
        List<LandmarkPosition> landmarks,
        List<Pad> pads,
        List<Finding> findings) {

    /** Copies the collections. */
    public StandingLimb {
        poses = Collections.unmodifiableMap(new LinkedHashMap<>(poses));
        segments = List.copyOf(segments);
        joints = List.copyOf(joints);
        landmarks = List.copyOf(landmarks);
        pads = List.copyOf(pads);
        findings = List.copyOf(findings);
    }

    /**
     * The limb with its hip elsewhere; what hangs on the hip follows, the segments stay.
     *
     * @param by m, laboratory frame L
     * @param up unit vector
     * @return the limb
     */
    public StandingLimb withHipMoved(Vec3 by, Vec3 up) {
        return new StandingLimb(
                side,
                subjectId,
                mass,
                stature,
                population,
                sex,
                new Located(hip.position().plus(by), hip.basis(), hip.sd()),
                knee,
                ankle,
                floor,
                new Quantity(limbLength.value() + by.dot(up), limbLength.basis(), limbLength.sd()),
                footLength,
                poses,
                segments,
                joints,
                landmarks,
                pads,
                findings);
    }

    /**
     * The limb with other joints.
     *
     * @param newJoints proximal to distal
     * @return the limb
     */
    public StandingLimb withJoints(List<Joint> newJoints) {
        return new StandingLimb(
                side,
                subjectId,
                mass,
                stature,
                population,
                sex,
                hip,
                knee,
                ankle,
                floor,
                limbLength,
                footLength,
                poses,
                segments,
                newJoints,
                landmarks,
                pads,
                findings);
    }

    /**
     * Whose foot it is, for a model.
     *
     * @param effectiveFootLength travel of the centre of pressure in the limb frame, m; empty where unknown
     * @return the subject
     */
    public Subject subject(Optional<Quantity> effectiveFootLength) {
        return new Subject(subjectId, mass, stature, limbLength, footLength, effectiveFootLength, population, sex);
    }

    /**
     * The model of this standing limb alone, to be completed by what walking shows.
     *
     * @param version version of the tool
     * @param sources inputs
     * @param cautions sentences every reader must see
     * @return a model without rolling contact
     */
    public FootModel model(String version, List<SourceFile> sources, List<String> cautions) {
        return new FootModel(
                side,
                version,
                subject(Optional.empty()),
                sources,
                segments,
                joints,
                landmarks,
                Rolling.UNKNOWN,
                pads,
                findings,
                cautions);
    }
}
