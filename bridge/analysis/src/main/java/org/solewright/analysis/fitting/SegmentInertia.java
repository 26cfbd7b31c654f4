package org.solewright.analysis.fitting;

import java.util.Optional;
import org.solewright.domain.foot.InertiaTensor;
import org.solewright.domain.foot.Sex;

/**
 * Mass, centre of mass and radii of gyration of a segment by a published table, as shares of body mass and of the
 * segment's length. Radii are about the axes through the centre of mass.
 *
 * <p>In [de Leva 1996] "sagittal" and "transverse" name the axis of rotation, not the plane: about the sagittal axis of
 * the trunk the radius (0.372) is larger than about its transverse one (0.347; both from memory), as for any body broader than deep. For
 * the foot, whose long axis lies forward, the sagittal column is therefore about the axis from sole to instep and the
 * transverse one about the axis across; the foot is broader than high.
 *
 * @param mass share of body mass
 * @param centre distance of the centre of mass from the segment's first end, share of its length
 * @param sagittal radius about the axis normal to the long axis in the sagittal plane, share of length
 * @param transverse radius about the axis across (medial to lateral), share of length
 * @param longitudinal radius about the long axis, share of length
 */
record SegmentInertia(double mass, double centre, double sagittal, double transverse, double longitudinal) {

    // [de Leva 1996], table 4: foot heel to toe tip, from the heel; shank knee to ankle centre, from the knee.
    private static final SegmentInertia DE_LEVA_FOOT_F = new SegmentInertia(0.0129, 0.4014, 0.299, 0.279, 0.139);
    private static final SegmentInertia DE_LEVA_FOOT_M = new SegmentInertia(0.0137, 0.4415, 0.257, 0.245, 0.124);
    private static final SegmentInertia DE_LEVA_SHANK_F = new SegmentInertia(0.0481, 0.4352, 0.267, 0.263, 0.092);
    private static final SegmentInertia DE_LEVA_SHANK_M = new SegmentInertia(0.0433, 0.4395, 0.251, 0.246, 0.102);

    // Dempster after [Winter 2009], table 4.1: foot lateral malleolus to second metatarsal head, shank femoral condyles
    // to medial malleolus, both from the first end. The table has one radius, about the axis across.
    private static final double DEMPSTER_FOOT_MASS = 0.0145;
    private static final double DEMPSTER_FOOT_CENTRE = 0.50;
    private static final double DEMPSTER_FOOT_RADIUS = 0.475;
    private static final double DEMPSTER_SHANK_MASS = 0.0465;
    private static final double DEMPSTER_SHANK_CENTRE = 0.433;
    private static final double DEMPSTER_SHANK_RADIUS = 0.302;

    /**
     * The foot.
     *
     * @param table which
     * @param sex empty for the mean of both
     * @return shares of body mass and of the foot's length as the table measures it
     */
    static SegmentInertia foot(InertiaTable table, Optional<Sex> sex) {
        SegmentInertia deLeva = bySex(DE_LEVA_FOOT_F, DE_LEVA_FOOT_M, sex);
        return switch (table) {
            case DE_LEVA -> deLeva;
            case DEMPSTER -> deLeva.shaped(DEMPSTER_FOOT_MASS, DEMPSTER_FOOT_CENTRE, DEMPSTER_FOOT_RADIUS);
        };
    }

    /**
     * The shank.
     *
     * @param table which
     * @param sex empty for the mean of both
     * @return shares of body mass and of the length from knee to ankle
     */
    static SegmentInertia shank(InertiaTable table, Optional<Sex> sex) {
        SegmentInertia deLeva = bySex(DE_LEVA_SHANK_F, DE_LEVA_SHANK_M, sex);
        return switch (table) {
            case DE_LEVA -> deLeva;
            case DEMPSTER -> deLeva.shaped(DEMPSTER_SHANK_MASS, DEMPSTER_SHANK_CENTRE, DEMPSTER_SHANK_RADIUS);
        };
    }

    /**
     * The tensor about the centre of mass in the segment's own axes.
     *
     * @param segmentMass kg
     * @param length m
     * @return about the long axis as x, the sagittal as y, the transverse as z
     */
    InertiaTensor tensor(double segmentMass, double length) {
        double square = segmentMass * length * length;
        return InertiaTensor.principal(
                square * longitudinal * longitudinal, square * sagittal * sagittal, square * transverse * transverse);
    }

    /** A table with one radius: the others keep the proportions of this one, which is an assumption. */
    private SegmentInertia shaped(double newMass, double newCentre, double across) {
        double k = across / transverse;
        return new SegmentInertia(newMass, newCentre, k * sagittal, across, k * longitudinal);
    }

    private static SegmentInertia bySex(SegmentInertia f, SegmentInertia m, Optional<Sex> sex) {
        if (sex.isPresent()) {
            return sex.get() == Sex.FEMALE ? f : m;
        }
        return new SegmentInertia(
                (f.mass + m.mass) / 2,
                (f.centre + m.centre) / 2,
                (f.sagittal + m.sagittal) / 2,
                (f.transverse + m.transverse) / 2,
                (f.longitudinal + m.longitudinal) / 2);
    }
}
