package org.solewright.app.pipeline;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import org.solewright.analysis.fitting.StandingLimb;
import org.solewright.analysis.gait.Pass;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.gait.Side;
import org.solewright.formats.io.FormatException;

/** Writes walking recordings back with the joint centres and events that a fit found in them. */
final class FitAnnotations {

    private FitAnnotations() {}

    /** Writes every recording of the call that is a file; returns what has to be said. */
    static List<Finding> write(
            OutputFolder annotated,
            Map<String, Path> files,
            GaitSubject subject,
            Map<Side, StandingLimb> limbs,
            Map<Side, List<LimbMotion>> moved)
            throws UseCaseException, FormatException {
        List<Finding> findings = new ArrayList<>();
        for (int i = 0; i < subject.passes().size(); i++) {
            Pass pass = subject.passes().get(i);
            Annotation annotation =
                    new Annotation(pass, subject.walking().get(i).recording().frames());
            for (Map.Entry<Side, StandingLimb> e : limbs.entrySet()) {
                StandingLimb limb = e.getValue();
                LimbMotion motion =
                        Objects.requireNonNull(moved.get(e.getKey())).get(i);
                annotation.joint(e.getKey(), "HIP", f -> motion.hip(limb, f), "hip centre, carried by pelvis or thigh");
                annotation.joint(e.getKey(), "KNEE", f -> motion.knee(limb, f), "knee centre, carried by the shank");
                annotation.joint(e.getKey(), "ANKLE", f -> motion.ankle(limb, f), "ankle centre, carried by the shank");
            }
            Path file = files.get(pass.trial().name());
            if (file != null) {
                findings.addAll(annotation.write(
                        file, annotated, subject.walking().get(i).recording().name()));
            }
        }
        return findings;
    }
}
