package org.solewright.app.report;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.solewright.domain.foot.FootModel;
import org.solewright.domain.foot.Rolling;
import org.solewright.domain.geometry.Vec3;

/** The fitted arc of the shank frame as a line fixed to the shank. */
final class ArcLine {

    private static final int POINTS = 33;

    private ArcLine() {}

    /** Points of the arc in the shank's frame, about its lowest point; empty where there is none or it is flat. */
    static List<Vec3> of(FootModel model, FootShape shape) {
        Optional<Rolling.Arc> found = model.rolling().arc(Rolling.Frame.SHANK);
        if (found.isEmpty()
                || !(found.get().curvature() > 0)
                || found.get().centreX().isEmpty()
                || found.get().centreY().isEmpty()) {
            return List.of();
        }
        Rolling.Arc arc = found.get();
        Vec3 ankle = shape.ankle_S();
        Vec3 up = ankle.times(-1).unit();
        Vec3 forward = new Vec3(up.y(), -up.x(), 0).unit();
        double half = Math.min(Math.PI / 2, arc.arcLength() / arc.radius() / 2);
        // The heel is behind the ankle: the arc's middle is under the middle of the centre of pressure's way.
        double middle = Math.atan2(arc.arcLength() / 4, arc.radius());
        List<Vec3> points = new ArrayList<>();
        for (int i = 0; i < POINTS; i++) {
            double a = middle - half + 2 * half * i / (POINTS - 1);
            double x = arc.centreX().getAsDouble() + arc.radius() * Math.sin(a);
            double y = arc.centreY().getAsDouble() - arc.radius() * Math.cos(a);
            points.add(ankle.plus(forward.times(x)).plus(up.times(y)));
        }
        return points;
    }
}
