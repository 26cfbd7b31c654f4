package org.solewright.analysis.fitting;

import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.finding.Quantity;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.foot.Population;
import org.solewright.domain.foot.Sex;
import org.solewright.domain.foot.SidedLandmark;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Vec3;

/**
 * An invented person of round numbers, standing on the floor at height 0 in a laboratory whose axes are x right, y
 * forward, z up.
 */
final class InventedSubject {

    static final double MASS = 80;

    final Map<SidedLandmark, Vec3> landmarks = new HashMap<>();
    final Map<SidedLandmark, List<Vec3>> clusters = new HashMap<>();
    OptionalDouble floor = OptionalDouble.of(0);
    Population population = Population.ADULT;
    Optional<Sex> sex = Optional.of(Sex.MALE);
    Optional<Quantity> stature = Optional.empty();
    OptionalInt segments = OptionalInt.empty();
    InertiaTable inertia = InertiaTable.DE_LEVA;
    FootChoices choices = FootChoices.DEFAULT;

    InventedSubject() {
        for (Side side : Side.values()) {
            put(Landmark.CALCANEUS_POSTERIOR, side, -0.06, 0.04, 0.10);
            put(Landmark.MALLEOLUS_MEDIAL, side, 0.005, 0.08, 0.055);
            put(Landmark.MALLEOLUS_LATERAL, side, -0.005, 0.07, 0.145);
            put(Landmark.METATARSAL_1_HEAD, side, 0.135, 0.02, 0.045);
            put(Landmark.METATARSAL_5_HEAD, side, 0.115, 0.01, 0.155);
            put(Landmark.TOE_TIP, side, 0.19, 0.015, 0.10);
            put(Landmark.FEMORAL_EPICONDYLE_MEDIAL, side, 0, 0.49, 0.06);
            put(Landmark.FEMORAL_EPICONDYLE_LATERAL, side, 0, 0.49, 0.14);
            put(Landmark.TROCHANTER_MAJOR, side, 0, 0.90, 0.17);
            put(Landmark.ASIS, side, 0.06, 0.98, 0.115);
            put(Landmark.SACRUM, side, -0.13, 0.98, 0);
            clusters.put(
                    new SidedLandmark(Landmark.SHANK_CLUSTER, side),
                    List.of(lab(side, 0, 0.3, 0.15), lab(side, 0.02, 0.25, 0.15), lab(side, -0.02, 0.25, 0.14)));
        }
    }

    /** From forward, up, outwards (from the midline) to the laboratory. */
    static Vec3 lab(Side side, double forward, double up, double outwards) {
        return new Vec3(side == Side.RIGHT ? outwards : -outwards, forward, up);
    }

    void put(Landmark landmark, Side side, double forward, double up, double outwards) {
        landmarks.put(new SidedLandmark(landmark, side), lab(side, forward, up, outwards));
    }

    void putBoth(Landmark landmark, double forward, double up, double outwards) {
        put(landmark, Side.LEFT, forward, up, outwards);
        put(landmark, Side.RIGHT, forward, up, outwards);
    }

    void remove(Landmark landmark) {
        landmarks.remove(new SidedLandmark(landmark, Side.LEFT));
        landmarks.remove(new SidedLandmark(landmark, Side.RIGHT));
    }

    /** Landmarks of midfoot, metatarsal bases and joints of the toes on both sides. */
    void putAllJoints() {
        putBoth(Landmark.NAVICULAR_TUBEROSITY, 0.045, 0.045, 0.055);
        putBoth(Landmark.CUBOID, 0.035, 0.03, 0.145);
        putBoth(Landmark.METATARSAL_1_BASE, 0.075, 0.04, 0.06);
        putBoth(Landmark.METATARSAL_5_BASE, 0.055, 0.02, 0.14);
        putBoth(Landmark.INTERPHALANGEAL_1, 0.155, 0.018, 0.10);
        putBoth(Landmark.INTERPHALANGEAL_2, 0.172, 0.016, 0.10);
    }

    StandingPosture posture() {
        return new StandingPosture(landmarks, clusters, Vec3.Z, floor);
    }

    StandingSettings settings() {
        return new StandingSettings(
                "demo-01",
                Quantity.of(MASS, Basis.MEASURED, 0.8),
                stature,
                population,
                sex,
                StandingSettings.DEFAULT_MARKER_RADIUS,
                segments,
                inertia,
                choices);
    }

    StandingOutcome build(Side side) {
        return StandingModel.build(posture(), settings(), side);
    }

    StandingLimb limb(Side side) {
        StandingOutcome outcome = build(side);
        if (outcome instanceof StandingOutcome.Built built) {
            return built.limb();
        }
        throw new AssertionError("not built: " + outcome);
    }
}
