package org.solewright.formats.export;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.foot.FootModel;
import org.solewright.domain.foot.InertiaTensor;
import org.solewright.domain.foot.Joint;
import org.solewright.domain.foot.Pad;
import org.solewright.domain.foot.Segment;
import org.solewright.domain.foot.SegmentName;

/** What must be true of a model before any format can hold it. Masses are positive in every model there is. */
final class ModelChecks {

    private ModelChecks() {}

    static List<Finding> of(FootModel model) {
        List<Finding> findings = new ArrayList<>();
        Set<SegmentName> above = new HashSet<>();
        for (Segment s : model.segments()) {
            checkInertia(s, findings);
            checkJoint(model, s, above, findings);
            above.add(s.name());
        }
        Set<String> joints = new HashSet<>();
        for (Joint j : model.joints()) {
            checkName("joint", j.name(), joints, findings);
            Set<String> axes = new HashSet<>();
            j.axes().forEach(a -> checkName("axis of joint " + j.name(), a.name(), axes, findings));
        }
        Set<String> pads = new HashSet<>();
        for (Pad p : model.pads()) {
            checkName("pad", p.name(), pads, findings);
        }
        return findings;
    }

    private static void checkInertia(Segment s, List<Finding> findings) {
        InertiaTensor i = s.inertia();
        double[] nine = {i.xx(), i.xy(), i.xz(), i.xy(), i.yy(), i.yz(), i.xz(), i.yz(), i.zz()};
        if (!TensorCheck.isPossible(nine)) {
            findings.add(Finding.error(
                    "export.inertia-impossible",
                    s.name().word(),
                    "inertia " + i.xx() + ", " + i.yy() + ", " + i.zz() + "; " + i.xy() + ", " + i.xz() + ", " + i.yz()
                            + " kg m2 can be of no body: a principal moment exceeds the sum of the other two"));
        }
    }

    private static void checkJoint(FootModel model, Segment s, Set<SegmentName> above, List<Finding> findings) {
        List<Joint> own =
                model.joints().stream().filter(j -> j.distal() == s.name()).toList();
        boolean isFirst = above.isEmpty();
        Optional<SegmentName> parent = own.stream().map(Joint::proximal).findFirst();
        boolean isRight = isFirst
                ? own.isEmpty() && s.parent().isEmpty()
                : own.size() == 1 && parent.equals(s.parent()) && above.contains(parent.orElseThrow());
        if (!isRight) {
            findings.add(Finding.error(
                    "export.joint-missing",
                    s.name().word(),
                    own.size() + " joints above it, expected "
                            + (isFirst
                                    ? "none above the first segment"
                                    : "one to its parent, which stands before it")));
        }
    }

    private static void checkName(String what, String name, Set<String> seen, List<Finding> findings) {
        if (!name.matches("[\\p{L}_][\\p{L}\\p{N}_.-]*")) {
            findings.add(Finding.error(
                    "export.name", what + " '" + name + "'", "other formats take letters, digits, '_', '.' and '-'"));
        }
        if (!seen.add(name)) {
            findings.add(Finding.error("export.name", what + " '" + name + "'", "occurs twice"));
        }
    }
}
