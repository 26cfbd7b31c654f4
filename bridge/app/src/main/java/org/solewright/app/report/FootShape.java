package org.solewright.app.report;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.solewright.domain.foot.FootModel;
import org.solewright.domain.foot.Joint;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.foot.LandmarkPosition;
import org.solewright.domain.foot.Pad;
import org.solewright.domain.foot.Segment;
import org.solewright.domain.foot.SegmentName;
import org.solewright.domain.geometry.Vec3;

/**
 * Drawn shape of a model's segments: rounded sections through the landmarks' heights and widths. It shows where the segments
 * are, not what the foot looks like. Axes of all segments are parallel in the posture of the model, so positions add up.
 */
final class FootShape {

    /** Points around a section. */
    static final int AROUND = 16;

    private static final int STATIONS = 7;
    private static final double TAPER = 0.6;
    private static final double THIN = 0.012;
    /** Between an ellipse, 2, and a box. */
    private static final double ROUNDNESS = 2.6;

    /** One section of the foot across x: middle and half axes, from the ankle. */
    private record Station(double x, double y, double z, double height, double width) {}

    /**
     * The surface of one segment, in its own frame.
     *
     * @param name of the segment
     * @param sections rings of {@link #AROUND} points from one end to the other
     */
    record Part(SegmentName name, List<List<Vec3>> sections) {}

    private final FootModel model;
    private final double floor;

    FootShape(FootModel model) {
        this.model = model;
        double lowest = -0.08;
        for (Pad p : model.pads()) {
            lowest = Math.min(lowest, origin(p.segment()).plus(p.centre()).y() - p.radius());
        }
        this.floor = lowest;
    }

    /** Height of the floor from the ankle, m. */
    double floor() {
        return floor;
    }

    /** Ankle centre in the shank's frame. */
    Vec3 ankle_S() {
        return model.joints().stream()
                .filter(j -> j.proximal() == SegmentName.SHANK)
                .findFirst()
                .map(j -> j.centre().position())
                .orElse(Vec3.ZERO);
    }

    /** Origin of a segment from the ankle. */
    Vec3 origin(SegmentName segment) {
        if (segment == SegmentName.SHANK) {
            return ankle_S().times(-1);
        }
        for (Joint j : model.joints()) {
            if (j.distal() == segment && j.proximal() != SegmentName.SHANK) {
                return origin(j.proximal()).plus(j.centre().position());
            }
        }
        return Vec3.ZERO;
    }

    /** A landmark from the ankle. */
    Optional<Vec3> landmark(Landmark landmark) {
        return model.landmarks().stream()
                .filter(l -> l.name().equals(landmark.word()))
                .findFirst()
                .map(this::fromAnkle);
    }

    Vec3 fromAnkle(LandmarkPosition l) {
        return origin(l.segment()).plus(l.position());
    }

    List<Part> parts() {
        List<Part> parts = new ArrayList<>();
        List<Station> foot = stations();
        for (Segment segment : model.segments()) {
            if (segment.name() == SegmentName.SHANK) {
                parts.add(shank());
            } else if (foot.size() > 1) {
                parts.add(part(segment.name(), foot));
            }
        }
        return parts;
    }

    private Part part(SegmentName name, List<Station> foot) {
        boolean isFirst =
                model.joints().stream().anyMatch(j -> j.distal() == name && j.proximal() == SegmentName.SHANK);
        double from = isFirst ? foot.get(0).x() : origin(name).x();
        double to = model.joints().stream()
                .filter(j -> j.proximal() == name)
                .findFirst()
                .map(j -> origin(j.distal()).x())
                .orElse(foot.get(foot.size() - 1).x());
        List<List<Vec3>> sections = new ArrayList<>();
        for (int i = 0; i < STATIONS; i++) {
            Station s = at(foot, from + i * (to - from) / (STATIONS - 1));
            // The ends of the foot are round.
            boolean isEnd = (i == 0 && isFirst)
                    || (i == STATIONS - 1 && to >= foot.get(foot.size() - 1).x() - 1e-9);
            double share = isEnd ? 0.7 : 1;
            List<Vec3> ring = new ArrayList<>();
            for (int k = 0; k < AROUND; k++) {
                double a = 2 * Math.PI * k / AROUND;
                ring.add(new Vec3(
                                s.x(),
                                s.y() + share * s.height() * rounded(Math.sin(a)),
                                s.z() + share * s.width() * rounded(Math.cos(a)))
                        .minus(origin(name)));
            }
            sections.add(ring);
        }
        return new Part(name, sections);
    }

    private static double rounded(double x) {
        return Math.signum(x) * Math.pow(Math.abs(x), 2 / ROUNDNESS);
    }

    private Part shank() {
        Vec3 ankle = ankle_S();
        double ankleWidth = halfWidth(Landmark.MALLEOLUS_MEDIAL, Landmark.MALLEOLUS_LATERAL, 0.035);
        double kneeWidth = halfWidth(Landmark.FEMORAL_EPICONDYLE_MEDIAL, Landmark.FEMORAL_EPICONDYLE_LATERAL, 0.05);
        List<List<Vec3>> sections = new ArrayList<>();
        for (int i = 0; i < STATIONS; i++) {
            double share = i / (STATIONS - 1.0);
            double calf = Math.sin(Math.PI * Math.min(1, 1.35 * share));
            double width = 0.75 * (kneeWidth * (1 - share) + ankleWidth * share);
            double depth = width * (1 + 0.35 * calf);
            List<Vec3> ring = new ArrayList<>();
            for (int k = 0; k < AROUND; k++) {
                double a = 2 * Math.PI * k / AROUND;
                ring.add(ankle.times(share).plus(new Vec3(depth * Math.sin(a), 0, width * Math.cos(a))));
            }
            sections.add(ring);
        }
        return new Part(SegmentName.SHANK, sections);
    }

    private double halfWidth(Landmark a, Landmark b, double otherwise) {
        Optional<Vec3> first = landmark(a);
        Optional<Vec3> second = landmark(b);
        return first.isPresent() && second.isPresent()
                ? Math.max(THIN, Math.abs(first.get().z() - second.get().z()) / 2)
                : otherwise;
    }

    private List<Station> stations() {
        List<Station> stations = new ArrayList<>();
        Optional<Vec3> heel = landmark(Landmark.CALCANEUS_POSTERIOR);
        Optional<Vec3> first = landmark(Landmark.METATARSAL_1_HEAD);
        Optional<Vec3> fifth = landmark(Landmark.METATARSAL_5_HEAD);
        if (heel.isEmpty() || first.isEmpty() || fifth.isEmpty()) {
            return stations;
        }
        Vec3 heads = first.get().plus(fifth.get()).times(0.5);
        double ankleWidth = halfWidth(Landmark.MALLEOLUS_MEDIAL, Landmark.MALLEOLUS_LATERAL, 0.03) * 0.8;
        double ballWidth = Math.abs(first.get().z() - fifth.get().z()) / 2;
        double ballHeight =
                Math.max(THIN, (Math.max(first.get().y(), fifth.get().y()) - floor) / 2);
        add(stations, heel.get().x(), heel.get().z(), (heel.get().y() - floor) * 0.75, TAPER * ankleWidth * 1.25);
        add(stations, 0, 0, -floor / 2, ankleWidth);
        Optional<Vec3> navicular = landmark(Landmark.NAVICULAR_TUBEROSITY);
        Optional<Vec3> cuboid = landmark(Landmark.CUBOID);
        if (navicular.isPresent() && cuboid.isPresent() && navicular.get().x() < heads.x() - 0.01) {
            Vec3 middle = navicular.get().plus(cuboid.get()).times(0.5);
            add(
                    stations,
                    middle.x(),
                    middle.z(),
                    (navicular.get().y() - floor) / 2,
                    Math.abs(navicular.get().z() - cuboid.get().z()) / 2);
        }
        add(stations, heads.x(), heads.z(), ballHeight, ballWidth);
        Vec3 tip = landmark(Landmark.TOE_TIP)
                .or(() -> landmark(Landmark.HALLUX_TIP))
                .orElse(new Vec3(
                        model.subject()
                                .footLength()
                                .map(q -> heel.get().x() + q.value())
                                .orElse(heads.x()
                                        + 0.4 * (heads.x() - heel.get().x())),
                        0,
                        heads.z()));
        add(stations, tip.x(), (tip.z() + heads.z()) / 2, TAPER * ballHeight, TAPER * ballWidth);
        return stations;
    }

    private void add(List<Station> stations, double x, double z, double height, double width) {
        double h = Math.max(THIN / 2, height);
        if (stations.isEmpty() || x > stations.get(stations.size() - 1).x() + 0.002) {
            stations.add(new Station(x, floor + h, z, h, Math.max(THIN, width)));
        }
    }

    private static Station at(List<Station> stations, double x) {
        int i = 0;
        while (i < stations.size() - 2 && x > stations.get(i + 1).x()) {
            i++;
        }
        Station a = stations.get(i);
        Station b = stations.get(i + 1);
        double t = Math.max(0, Math.min(1, (x - a.x()) / (b.x() - a.x())));
        return new Station(
                x,
                a.y() + t * (b.y() - a.y()),
                a.z() + t * (b.z() - a.z()),
                a.height() + t * (b.height() - a.height()),
                a.width() + t * (b.width() - a.width()));
    }
}
