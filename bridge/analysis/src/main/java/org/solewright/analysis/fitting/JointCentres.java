package org.solewright.analysis.fitting;

import java.util.Optional;
import java.util.OptionalDouble;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.foot.Located;
import org.solewright.domain.geometry.Vec3;

/** Hip and knee of a standing limb, in its ankle frame A. */
record JointCentres(Located hip, Located knee, HipSource hipSource) {

    /** Shank over shank and thigh, [Drillis Contini 1966]: 0.246 / (0.246 + 0.245). */
    private static final double SHANK_SHARE = 0.246 / (0.246 + 0.245);

    /** Hip height over foot length, [Drillis Contini 1966]: 0.530 / 0.152. */
    private static final double HIP_HEIGHT_OVER_FOOT = 0.530 / 0.152;

    /** Hip height over stature, [Drillis Contini 1966]. */
    static final double HIP_HEIGHT_OVER_STATURE = 0.530;

    /** Where the hip centre comes from. */
    enum HipSource {
        /** Regression from the pelvis. */
        PELVIS,
        /** The greater trochanter itself. */
        TROCHANTER,
        /** A share of stature or foot length, straight above the ankle. */
        PROPORTION
    }

    /**
     * Finds both.
     *
     * @param posture landmarks in L
     * @param limb the limb in A
     * @param settings population and stature
     * @param floorHeight of the floor in A, m
     * @return the centres; empty where no landmark gives a hip and the subject is not human
     */
    static Optional<JointCentres> of(
            StandingPosture posture, LimbGeometry limb, StandingSettings settings, double floorHeight) {
        Optional<Vec3> pelvis = settings.isHuman()
                ? HipCentre.fromPelvis(posture, limb.side())
                        .map(p -> limb.ankleFrame().inversePosition(p))
                : Optional.empty();
        if (pelvis.isPresent()) {
            Located hip = new Located(
                    pelvis.get(), settings.adultRegression(), OptionalDouble.of(LimbGeometry.LEG_PLACEMENT_SD));
            return Optional.of(new JointCentres(hip, knee(limb, hip), HipSource.PELVIS));
        }
        Optional<Vec3> trochanter = limb.point(Landmark.TROCHANTER_MAJOR);
        if (trochanter.isPresent()) {
            Located hip =
                    new Located(trochanter.get(), Basis.ASSUMED, OptionalDouble.of(LimbGeometry.LEG_PLACEMENT_SD));
            return Optional.of(new JointCentres(hip, knee(limb, hip), HipSource.TROCHANTER));
        }
        if (!settings.isHuman()) {
            return Optional.empty();
        }
        double height = settings.stature()
                .map(s -> HIP_HEIGHT_OVER_STATURE * s.value())
                .orElseGet(() -> HIP_HEIGHT_OVER_FOOT * limb.heelToFirstHead() / LimbGeometry.HEAD_SHARE);
        Located hip = Located.of(new Vec3(0, floorHeight + height, 0), settings.adultRegression());
        return Optional.of(new JointCentres(hip, knee(limb, hip), HipSource.PROPORTION));
    }

    private static Located knee(LimbGeometry limb, Located hip) {
        Optional<Vec3> medial = limb.point(Landmark.FEMORAL_EPICONDYLE_MEDIAL);
        Optional<Vec3> lateral = limb.point(Landmark.FEMORAL_EPICONDYLE_LATERAL);
        if (medial.isPresent() && lateral.isPresent()) {
            return new Located(
                    medial.get().plus(lateral.get()).times(0.5),
                    Basis.MEASURED,
                    OptionalDouble.of(LimbGeometry.LEG_PLACEMENT_SD / Math.sqrt(2)));
        }
        return Located.of(hip.position().times(SHANK_SHARE), Basis.ASSUMED);
    }
}
