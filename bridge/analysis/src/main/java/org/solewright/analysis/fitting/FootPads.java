package org.solewright.analysis.fitting;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.foot.Pad;
import org.solewright.domain.foot.SegmentName;
import org.solewright.domain.geometry.Vec3;

/**
 * Contact elements of the sole: spheres that touch the floor in standing, under the heel, the outer metatarsal heads and
 * the great toe. Everything about them is assumed until loads in walking say better.
 */
final class FootPads {

    /** Pad radius over foot length (design 03 section 6, assumed). */
    private static final double HEEL_RADIUS = 0.09;

    private static final double OTHER_RADIUS = 0.05;

    /** Compression of the heel at the first vertical peak of walking, m (published 9-11 mm, from memory). */
    private static final double HEEL_COMPRESSION = 0.009;

    /** First vertical peak of walking over weight (common practice, from memory). */
    private static final double FIRST_PEAK = 1.1;

    /** Standard gravity, m/s2. */
    private static final double G = 9.80665;

    /** Damping, s/m, and dry friction (common practice, from memory). */
    private static final double DAMPING = 1.0;

    private static final double FRICTION = 0.8;

    private final LimbGeometry limb;
    private final double floorHeight;
    private final double markerRadius;
    private final double footLength;
    private final double heelStiffness;

    /**
     * Pads of a limb.
     *
     * @param limb in A
     * @param floorHeight of the floor in A, m
     * @param markerRadius m
     * @param footLength m
     * @param mass body mass, kg
     */
    FootPads(LimbGeometry limb, double floorHeight, double markerRadius, double footLength, double mass) {
        this.limb = limb;
        this.floorHeight = floorHeight;
        this.markerRadius = markerRadius;
        this.footLength = footLength;
        heelStiffness = FIRST_PEAK * mass * G / Math.pow(HEEL_COMPRESSION, 1.5);
    }

    /**
     * The pads, rear to front.
     *
     * @param rear segment that bears the heel
     * @param rearOrigin its origin in A
     * @param front segment that bears the metatarsal heads
     * @param frontOrigin its origin in A
     * @param toes segment that bears the toes
     * @param toesOrigin its origin in A
     * @return pads in their segments' frames
     */
    List<Pad> pads(
            SegmentName rear, Vec3 rearOrigin, SegmentName front, Vec3 frontOrigin, SegmentName toes, Vec3 toesOrigin) {
        List<Pad> pads = new ArrayList<>();
        double heelRadius = HEEL_RADIUS * footLength;
        double radius = OTHER_RADIUS * footLength;
        Vec3 heel = limb.required(Landmark.CALCANEUS_POSTERIOR);
        pads.add(pad("heel", rear, onFloor(heel.x() + markerRadius + heelRadius, heel.z(), heelRadius), rearOrigin));
        Vec3 first = limb.required(Landmark.METATARSAL_1_HEAD);
        Vec3 fifth = limb.required(Landmark.METATARSAL_5_HEAD);
        Vec3 across = fifth.minus(first).unit();
        double inwards = Math.min(markerRadius + radius, fifth.distance(first) / 2);
        Vec3 firstPad = first.plus(across.times(inwards));
        Vec3 fifthPad = fifth.minus(across.times(inwards));
        pads.add(pad("metatarsal_5", front, onFloor(fifthPad.x(), fifthPad.z(), radius), frontOrigin));
        pads.add(pad("metatarsal_1", front, onFloor(firstPad.x(), firstPad.z(), radius), frontOrigin));
        Optional<Vec3> tip = limb.point(Landmark.HALLUX_TIP).or(() -> limb.point(Landmark.TOE_TIP));
        tip.ifPresent(t ->
                pads.add(pad("hallux", toes, onFloor(t.x() - markerRadius - radius, t.z(), radius), toesOrigin)));
        return List.copyOf(pads);
    }

    private Vec3 onFloor(double x, double z, double radius) {
        return new Vec3(x, floorHeight + radius, z);
    }

    private Pad pad(String name, SegmentName segment, Vec3 centre_A, Vec3 origin_A) {
        double radius = centre_A.y() - floorHeight;
        double stiffness = heelStiffness * Math.sqrt(radius / (HEEL_RADIUS * footLength));
        return new Pad(name, segment, centre_A.minus(origin_A), radius, stiffness, DAMPING, FRICTION, Basis.ASSUMED);
    }
}
