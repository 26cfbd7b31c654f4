package org.solewright.formats.footmodel;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.finding.Cautions;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.Quantity;
import org.solewright.domain.finding.SourceFile;
import org.solewright.domain.foot.FootModel;
import org.solewright.domain.foot.InertiaTensor;
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
import org.solewright.domain.geometry.Vec3;

/** An invented model in which everything that can be there is there, with numbers that need all their digits. */
final class InventedModel {

    static final String DIGEST = "0123456789abcdef".repeat(4);

    private InventedModel() {}

    static FootModel full() {
        return new FootModel(
                Side.LEFT,
                "0.1.0",
                new Subject(
                        "demo-01",
                        Quantity.of(1.0 / 3 + 80, Basis.MEASURED, 0.1),
                        Optional.of(Quantity.of(1.8, Basis.ASSUMED)),
                        Quantity.of(0.931, Basis.REGRESSION, 0.01),
                        Optional.of(Quantity.of(0.29, Basis.REGRESSION)),
                        Optional.of(Quantity.of(0.213, Basis.MEASURED, 0.004)),
                        Population.ADULT,
                        Optional.of(Sex.FEMALE)),
                List.of(new SourceFile("standing", "stand 1.c3d", DIGEST), new SourceFile("walking", "w.c3d", DIGEST)),
                List.of(
                        segment(SegmentName.SHANK, Optional.empty(), 3.7),
                        segment(SegmentName.FOOT, Optional.of(SegmentName.SHANK), 0.9),
                        segment(SegmentName.TOES, Optional.of(SegmentName.FOOT), 0.2)),
                List.of(ankle(), toes()),
                List.of(
                        new LandmarkPosition("calcaneus_posterior", SegmentName.FOOT, new Vec3(-0.06, -0.03, 1e-17)),
                        new LandmarkPosition("shank_cluster.1", SegmentName.SHANK, new Vec3(0.1, -0.2, 0.3))),
                new Rolling(
                        List.of(
                                new Rolling.Arc(
                                        Rolling.Frame.SHANK,
                                        1 / 0.3,
                                        OptionalDouble.of(0.2),
                                        OptionalDouble.of(0.02),
                                        OptionalDouble.of(0.05),
                                        OptionalDouble.of(0.21),
                                        0.2,
                                        0.003,
                                        2),
                                new Rolling.Arc(
                                        Rolling.Frame.LIMB,
                                        0,
                                        OptionalDouble.empty(),
                                        OptionalDouble.empty(),
                                        OptionalDouble.empty(),
                                        OptionalDouble.empty(),
                                        0.21,
                                        0.004,
                                        1)),
                        List.of(new Rolling.OutlinePoint(-0.05, -0.08), new Rolling.OutlinePoint(0.12, -0.081)),
                        List.of(new Rolling.Pivot(0.02, 0, 0, 21.5), new Rolling.Pivot(0.17, 0.001, 60, 100)),
                        Optional.of(new Rolling.Cap(0.4, new Vec3(0, 0.1, 0.2), 0.01))),
                List.of(new Pad(
                        "heel", SegmentName.FOOT, new Vec3(-0.04, -0.05, 0), 0.026, 1e6 / 3, 1, 0.8, Basis.ASSUMED)),
                List.of(Finding.warning("cluster.deformed", "right shank", "7 mm <rms> & more, \"so\"\u00fc")),
                Cautions.LINES);
    }

    private static Segment segment(SegmentName name, Optional<SegmentName> parent, double mass) {
        return new Segment(
                name,
                parent,
                Quantity.of(mass, Basis.REGRESSION),
                new Located(new Vec3(0.1, -0.2, 1.0 / 3), Basis.REGRESSION, OptionalDouble.of(0.001)),
                new InertiaTensor(0.01, 0.02, 0.03, -1e-4, 2e-4, 3e-4),
                Basis.REGRESSION,
                Quantity.of(0.2, Basis.MEASURED),
                name == SegmentName.FOOT);
    }

    private static Joint ankle() {
        return new Joint(
                "ankle",
                SegmentName.SHANK,
                SegmentName.FOOT,
                Joint.Kind.UNIVERSAL,
                Located.of(new Vec3(0, -0.42, 0), Basis.MEASURED),
                List.of(
                        new Joint.Axis("talocrural", Vec3.Z, Basis.MEASURED, OptionalDouble.of(0.07)),
                        new Joint.Axis("subtalar", new Vec3(0.6, 0.8, 0), Basis.REGRESSION, OptionalDouble.empty())),
                Optional.of(new Joint.Range(-0.3, 0.4, Basis.MEASURED)),
                Optional.of(new Joint.Lock(0.1, 12.5, Basis.MEASURED)));
    }

    private static Joint toes() {
        return new Joint(
                "metatarsophalangeal",
                SegmentName.FOOT,
                SegmentName.TOES,
                Joint.Kind.BALL,
                Located.of(new Vec3(0.12, -0.06, 0), Basis.MEASURED),
                List.of(),
                Optional.empty(),
                Optional.empty());
    }
}
