package org.solewright.analysis.fitting;

import java.util.ArrayList;
import java.util.List;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.foot.ChainPlan;
import org.solewright.domain.geometry.Rotation;
import org.solewright.domain.geometry.Vec3;

/**
 * Mass and inertia of the segments of a plan file: each is an elliptic frustum of uniform density from its joint to the
 * next one, of the plan's widths and heights.
 *
 * @param moments in A, proximal to distal
 * @param bases where each mass comes from
 */
record PlannedMasses(List<BodyMoments> moments, List<Basis> bases) {

    /** Density of the foot's tissue, kg/m3, Dempster after [Winter 2009], table 4.1 (from memory). */
    static final double DENSITY = 1100;

    /** Length below which two joints are one, m. */
    private static final double SHORTEST = 1e-6;

    PlannedMasses {
        moments = List.copyOf(moments);
        bases = List.copyOf(bases);
    }

    /**
     * The segments' moments.
     *
     * @param plan of the chain
     * @param ends of the segments in A, m: the ankle, the joints, the tip
     * @param bodyMass kg
     * @return as many moments as the plan has segments
     */
    static PlannedMasses of(ChainPlan plan, List<Vec3> ends, double bodyMass) {
        List<BodyMoments> moments = new ArrayList<>();
        List<Basis> bases = new ArrayList<>();
        for (int i = 0; i < plan.parts().size(); i++) {
            ChainPlan.Part part = plan.parts().get(i);
            BodyMoments unit = frustum(part, ends.get(i), ends.get(i + 1));
            double density =
                    part.mass().map(m -> m.share() * bodyMass / unit.mass()).orElse(DENSITY);
            moments.add(unit.scaled(density));
            bases.add(part.mass().map(ChainPlan.MassShare::basis).orElse(Basis.ASSUMED));
        }
        return new PlannedMasses(moments, bases);
    }

    private static BodyMoments frustum(ChainPlan.Part part, Vec3 from, Vec3 to) {
        Vec3 line = to.minus(from);
        ChainPlan.Shape shape = part.shape();
        if (!(line.norm() > SHORTEST)) {
            throw new IllegalArgumentException(
                    "segment " + part.name().word() + " of the plan has length 0 m, expected more than 0 m");
        }
        BodyMoments own = TetrahedralSolid.frusta(List.of(
                        new TetrahedralSolid.Section(0, 0, 0, shape.proximalHeight() / 2, shape.proximalWidth() / 2),
                        new TetrahedralSolid.Section(
                                line.norm(), 0, 0, shape.distalHeight() / 2, shape.distalWidth() / 2)))
                .moments();
        // A segment along z has no direction across of its own.
        Vec3 across = line.unit().cross(Vec3.Z).norm() > 1e-6 ? Vec3.Z : Vec3.Y;
        Rotation turned = Rotation.ofXandZ(line, across);
        return new BodyMoments(
                own.mass(),
                from.plus(turned.transformVector(own.centre())),
                own.inertia().rotated(turned));
    }
}
