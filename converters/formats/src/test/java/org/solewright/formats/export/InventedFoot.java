package org.solewright.formats.export;

import java.util.ArrayList;
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
import org.solewright.domain.foot.Setting;
import org.solewright.domain.foot.Subject;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Vec3;

/** Invented feet of every division, with joints of every kind. */
final class InventedFoot {

    static final InertiaTensor INERTIA = new InertiaTensor(0.004, 0.005, 0.006, -1e-4, 2e-4, 3e-4);

    private InventedFoot() {}

    /** Feet from one rigid piece to five segments, of both sides. */
    static List<FootModel> all() {
        List<FootModel> models = new ArrayList<>();
        for (Side side : Side.values()) {
            models.add(of(side, INERTIA, SegmentName.SHANK, SegmentName.FOOT));
            models.add(of(side, INERTIA, SegmentName.SHANK, SegmentName.FOOT, SegmentName.TOES));
            models.add(of(side, INERTIA, SegmentName.SHANK, SegmentName.HINDFOOT, SegmentName.FOREFOOT));
            models.add(
                    of(side, INERTIA, SegmentName.SHANK, SegmentName.HINDFOOT, SegmentName.FOREFOOT, SegmentName.TOES));
            models.add(of(
                    side,
                    INERTIA,
                    SegmentName.SHANK,
                    SegmentName.HINDFOOT,
                    SegmentName.MIDFOOT,
                    SegmentName.FOREFOOT,
                    SegmentName.TOES));
            models.add(of(side, INERTIA, SegmentName.SHANK, SegmentName.FOOT, SegmentName.PHALANX_2));
            models.add(of(side, INERTIA, SegmentName.SHANK, SegmentName.FOREFOOT, SegmentName.TOES));
            models.add(of(
                    side,
                    INERTIA,
                    SegmentName.SHANK,
                    SegmentName.HINDFOOT,
                    SegmentName.FOREFOOT,
                    SegmentName.PHALANX_1,
                    SegmentName.PHALANX_2,
                    SegmentName.PHALANX_3));
        }
        return models;
    }

    static FootModel of(Side side, InertiaTensor inertia, SegmentName... names) {
        List<Segment> segments = new ArrayList<>();
        List<Joint> joints = new ArrayList<>();
        List<LandmarkPosition> landmarks = new ArrayList<>();
        List<Pad> pads = new ArrayList<>();
        for (int i = 0; i < names.length; i++) {
            segments.add(segment(
                    names[i], i == 0 ? Optional.empty() : Optional.of(names[i - 1]), 3.5 / (1 + 2 * i), inertia));
            if (i > 0) {
                joints.add(joint(i, names[i - 1], names[i]));
                pads.add(new Pad(
                        "pad_" + i, names[i], new Vec3(0.01 * i, -0.02, 0.003), 0.02, 8e5, 1, 0.8, Basis.ASSUMED));
            }
            landmarks.add(new LandmarkPosition("point." + i, names[i], new Vec3(0.1, -0.01 * i, 0.02)));
        }
        return new FootModel(
                side,
                "0.1.0",
                subject(),
                List.of(new SourceFile("standing", "s, \"1\".c3d", "0".repeat(64))),
                segments,
                joints,
                landmarks,
                rolling(),
                pads,
                List.of(Finding.warning("mass.differs", "subject", "given -- and \"measured\" <mass> \\ differ")),
                Cautions.LINES,
                List.of(new Setting("zero", "standing")));
    }

    private static Subject subject() {
        return new Subject(
                "=demo-01",
                Quantity.of(70, Basis.MEASURED, 0.1),
                Optional.empty(),
                Quantity.of(0.9, Basis.REGRESSION),
                Optional.of(Quantity.of(0.25, Basis.ASSUMED)),
                Optional.empty(),
                Population.ADULT,
                Optional.empty());
    }

    private static Segment segment(SegmentName name, Optional<SegmentName> parent, double mass, InertiaTensor inertia) {
        return new Segment(
                name,
                parent,
                Quantity.of(mass, Basis.REGRESSION),
                Located.of(new Vec3(0.03, -0.05, 0.01), Basis.REGRESSION),
                inertia,
                Basis.REGRESSION,
                Quantity.of(0.1, Basis.MEASURED),
                true);
    }

    private static Joint joint(int number, SegmentName proximal, SegmentName distal) {
        Joint.Kind kind = number == 1 ? Joint.Kind.UNIVERSAL : number == 2 ? Joint.Kind.HINGE : Joint.Kind.BALL;
        List<Joint.Axis> axes = List.of(
                new Joint.Axis("first", Vec3.Z, Basis.MEASURED, OptionalDouble.of(0.07)),
                new Joint.Axis("second", new Vec3(0.6, 0.8, 0), Basis.REGRESSION, OptionalDouble.empty()));
        return new Joint(
                "joint_" + number,
                proximal,
                distal,
                kind,
                Located.of(number == 1 ? new Vec3(0, -0.4, 0) : new Vec3(0.06, -0.02, 0.01), Basis.MEASURED),
                axes.subList(0, kind == Joint.Kind.UNIVERSAL ? 2 : kind == Joint.Kind.HINGE ? 1 : 0),
                kind == Joint.Kind.BALL ? Optional.empty() : Optional.of(new Joint.Range(-0.3, 0.4, Basis.MEASURED)),
                number == 2 ? Optional.of(new Joint.Lock(0.1, 12.5, Basis.MEASURED)) : Optional.empty());
    }

    private static Rolling rolling() {
        OptionalDouble none = OptionalDouble.empty();
        return new Rolling(
                List.of(
                        new Rolling.Arc(
                                Rolling.Frame.SHANK,
                                4,
                                OptionalDouble.of(0.2),
                                OptionalDouble.of(0.02),
                                OptionalDouble.of(0.05),
                                OptionalDouble.of(0.21),
                                0.2,
                                0.003,
                                2),
                        new Rolling.Arc(Rolling.Frame.LIMB, 0, none, none, none, none, 0.21, 0.004, 1)),
                List.of(new Rolling.OutlinePoint(-0.05, -0.08), new Rolling.OutlinePoint(0.12, -0.081)),
                List.of(new Rolling.Pivot(0.02, 0, 0, 21.5)),
                Optional.of(new Rolling.Cap(0.4, new Vec3(0, 0.1, 0.2), 0.01)));
    }
}
