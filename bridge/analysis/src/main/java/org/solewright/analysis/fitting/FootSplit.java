package org.solewright.analysis.fitting;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.geometry.Vec3;

/**
 * Splits a foot's mass among its segments: one solid of elliptic frusta through the landmarks' heights and widths, of
 * uniform density, gets mass, centre of mass and tensor of the whole foot by one affine map and is then sliced at the
 * joint planes. The slices recombine to the whole exactly.
 *
 * @param parts moments of the slices in the ankle frame A, rear to front
 * @param smallestStretch least stretch of the map
 * @param largestStretch greatest stretch of the map
 */
record FootSplit(List<BodyMoments> parts, double smallestStretch, double largestStretch) {

    /** Least rise of x from one section to the next, m. */
    private static final double APART = 0.002;

    /** Heel and toe ends are narrower than ankle and ball by this factor (assumed). */
    private static final double TAPER = 0.6;

    /** Smallest half axis of a section, m (assumed). */
    private static final double THINNEST = 0.005;

    /** A slice lighter than this share of the foot is none. */
    private static final double LIGHTEST = 1e-4;

    /**
     * A joint's plane.
     *
     * @param point in A, m
     * @param forward normal, pointing to the toes
     */
    record Plane(Vec3 point, Vec3 forward) {}

    /**
     * Splits the foot.
     *
     * @param whole mass, centre and tensor of the foot in A
     * @param limb landmarks in A
     * @param floorHeight of the floor in A, m
     * @param markerRadius m
     * @param toeTip in A
     * @param planes of the joints, rear to front
     * @return the slices; empty where the landmarks do not make a solid or a plane does not cut it
     */
    static Optional<FootSplit> of(
            BodyMoments whole,
            LimbGeometry limb,
            double floorHeight,
            double markerRadius,
            Vec3 toeTip,
            List<Plane> planes) {
        List<TetrahedralSolid.Section> sections = sections(limb, floorHeight, markerRadius, toeTip);
        if (sections.size() < 2) {
            return Optional.empty();
        }
        TetrahedralSolid raw = TetrahedralSolid.frusta(sections);
        BodyMoments rawMoments = raw.moments();
        return SymmetricMap.between(rawMoments.spread(), whole.spread()).flatMap(map -> {
            TetrahedralSolid solid = raw.mapped(map, rawMoments.centre(), whole.centre());
            double density = whole.mass() / solid.moments().mass();
            return slices(solid, planes, density, whole.mass())
                    .map(parts -> new FootSplit(parts, map.smallest(), map.largest()));
        });
    }

    private static Optional<List<BodyMoments>> slices(
            TetrahedralSolid solid, List<Plane> planes, double density, double mass) {
        List<BodyMoments> parts = new ArrayList<>();
        TetrahedralSolid rest = solid;
        for (Plane plane : planes) {
            parts.add(rest.behind(plane.point(), plane.forward()).moments().scaled(density));
            rest = rest.behind(plane.point(), plane.forward().times(-1));
        }
        parts.add(rest.moments().scaled(density));
        boolean allThere = parts.stream().allMatch(p -> p.mass() > LIGHTEST * mass);
        return allThere ? Optional.of(List.copyOf(parts)) : Optional.empty();
    }

    private static List<TetrahedralSolid.Section> sections(
            LimbGeometry limb, double floorHeight, double markerRadius, Vec3 toeTip) {
        Vec3 heel = limb.required(Landmark.CALCANEUS_POSTERIOR);
        double ankleWidth = halfWidth(limb, Landmark.MALLEOLUS_MEDIAL, Landmark.MALLEOLUS_LATERAL, markerRadius);
        double ballWidth = halfWidth(limb, Landmark.METATARSAL_1_HEAD, Landmark.METATARSAL_5_HEAD, markerRadius);
        Vec3 heads = limb.heads();
        double ballHeight = thick(heads.y() - floorHeight);
        List<TetrahedralSolid.Section> sections = new ArrayList<>();
        double heelHeight = thick(heel.y() - floorHeight);
        add(sections, heel.x() + markerRadius, floorHeight, heel.z(), heelHeight, TAPER * ankleWidth);
        add(sections, 0, floorHeight, 0, thick(-floorHeight / 2), ankleWidth);
        if (limb.hasMidtarsalLandmarks()) {
            Vec3 navicular = limb.required(Landmark.NAVICULAR_TUBEROSITY);
            Vec3 cuboid = limb.required(Landmark.CUBOID);
            Vec3 middle = navicular.plus(cuboid).times(0.5);
            double height = thick((navicular.y() - floorHeight) / 2);
            double width = halfWidth(limb, Landmark.NAVICULAR_TUBEROSITY, Landmark.CUBOID, markerRadius);
            if (middle.x() < heads.x() - APART) {
                add(sections, middle.x(), floorHeight, middle.z(), height, width);
            }
        }
        add(sections, heads.x(), floorHeight, heads.z(), ballHeight, ballWidth);
        add(sections, toeTip.x(), floorHeight, toeTip.z(), TAPER * ballHeight, TAPER * ballWidth);
        return sections;
    }

    private static void add(
            List<TetrahedralSolid.Section> sections,
            double x,
            double floorHeight,
            double z,
            double height,
            double width) {
        if (sections.isEmpty() || x > sections.get(sections.size() - 1).x() + APART) {
            sections.add(new TetrahedralSolid.Section(x, floorHeight + height, z, height, width));
        }
    }

    private static double halfWidth(LimbGeometry limb, Landmark a, Landmark b, double markerRadius) {
        return thick(Math.abs(limb.required(a).z() - limb.required(b).z()) / 2 - markerRadius);
    }

    private static double thick(double half) {
        return Math.max(THINNEST, half);
    }
}
