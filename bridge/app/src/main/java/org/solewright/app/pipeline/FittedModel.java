package org.solewright.app.pipeline;

import java.util.EnumSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import org.solewright.analysis.fitting.StandingLimb;
import org.solewright.domain.finding.Cautions;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.Quantity;
import org.solewright.domain.finding.SourceFile;
import org.solewright.domain.foot.FootModel;
import org.solewright.domain.foot.Rolling;
import org.solewright.domain.foot.Segment;
import org.solewright.domain.foot.SegmentName;
import org.solewright.domain.foot.Setting;

/** Puts together what standing and walking gave to a model. */
final class FittedModel {

    private FittedModel() {}

    /** Segments whose points were tracked in walking: the shank, and the foot's first segment where it holds the heads. */
    static Set<SegmentName> observed(List<LimbMotion> motions) {
        Set<SegmentName> observed = EnumSet.noneOf(SegmentName.class);
        for (LimbMotion motion : motions) {
            if (motion.shank().isPresent()) {
                observed.add(SegmentName.SHANK);
            }
            if (motion.foot().isPresent()) {
                observed.add(SegmentName.FOOT);
            }
            observed.addAll(motion.chain().observed());
        }
        return observed;
    }

    /** The model of a standing limb with what walking added; its findings follow by {@link #withFindings}. */
    static FootModel of(
            StandingLimb limb,
            Rolling rolling,
            Optional<Quantity> effectiveFootLength,
            Set<SegmentName> observed,
            JointCurves curves,
            String version,
            List<SourceFile> sources) {
        FootModel standing = limb.model(version, sources, Cautions.LINES);
        return new FootModel(
                standing.side(),
                standing.version(),
                limb.subject(effectiveFootLength),
                standing.sources(),
                standing.segments().stream()
                        .map(g -> new Segment(
                                g.name(),
                                g.parent(),
                                g.mass(),
                                g.centreOfMass(),
                                g.inertia(),
                                g.inertiaBasis(),
                                g.length(),
                                observed.contains(g.name())))
                        .toList(),
                standing.joints().stream()
                        .map(j -> j.withMotion(curves.range(j), curves.lock(j)))
                        .toList(),
                standing.landmarks(),
                rolling,
                standing.pads(),
                standing.findings(),
                standing.cautions());
    }

    /** The same with all findings of the call and the choices it was made with. */
    static FootModel withFindings(FootModel m, List<Finding> findings, List<Setting> settings) {
        return new FootModel(
                m.side(),
                m.version(),
                m.subject(),
                m.sources(),
                m.segments(),
                m.joints(),
                m.landmarks(),
                m.rolling(),
                m.pads(),
                findings,
                m.cautions(),
                settings);
    }
}
