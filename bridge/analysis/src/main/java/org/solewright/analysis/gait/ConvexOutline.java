package org.solewright.analysis.gait;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;

/** A convex outline on the ground, in two horizontal components (m). */
final class ConvexOutline {

    /** A point on the ground, m. */
    record Point(double x, double z) {}

    private final List<Point> corners;

    private ConvexOutline(List<Point> corners) {
        this.corners = corners;
    }

    /** Convex hull (monotone chain, Andrew 1979, from memory) of at least one point. */
    static ConvexOutline around(List<Point> points) {
        List<Point> sorted = new ArrayList<>(points);
        sorted.sort(Comparator.comparingDouble(Point::x).thenComparingDouble(Point::z));
        List<Point> hull = new ArrayList<>();
        for (int side = 0; side < 2; side++) {
            int base = hull.size();
            for (int k = 0; k < sorted.size(); k++) {
                Point p = sorted.get(side == 0 ? k : sorted.size() - 1 - k);
                while (hull.size() >= base + 2 && turn(hull.get(hull.size() - 2), hull.get(hull.size() - 1), p) <= 0) {
                    hull.remove(hull.size() - 1);
                }
                hull.add(p);
            }
            hull.remove(hull.size() - 1);
        }
        return new ConvexOutline(hull.isEmpty() ? List.of(sorted.get(0)) : List.copyOf(hull));
    }

    List<Point> corners() {
        return corners;
    }

    /** Distance from the outline's area, m; zero inside. */
    double distance(double x, double z) {
        boolean isInside = corners.size() > 2;
        double nearest = Double.POSITIVE_INFINITY;
        for (int i = 0; i < corners.size(); i++) {
            Point a = corners.get(i);
            Point b = corners.get((i + 1) % corners.size());
            isInside &= turn(a, b, new Point(x, z)) >= 0;
            nearest = Math.min(nearest, toSegment(a, b, x, z));
        }
        return isInside ? 0 : nearest;
    }

    private static double toSegment(Point a, Point b, double x, double z) {
        double dx = b.x - a.x;
        double dz = b.z - a.z;
        double length2 = dx * dx + dz * dz;
        double t = length2 > 0 ? Math.max(0, Math.min(1, ((x - a.x) * dx + (z - a.z) * dz) / length2)) : 0;
        return Math.hypot(x - a.x - t * dx, z - a.z - t * dz);
    }

    static double turn(Point a, Point b, Point c) {
        return (b.x - a.x) * (c.z - a.z) - (b.z - a.z) * (c.x - a.x);
    }
}
