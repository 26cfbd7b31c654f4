package org.solewright.formats.c3d;

import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import org.solewright.domain.geometry.Vec3;

/** Length units as files spell them. */
final class LengthUnit {

    private static final double SHORTEST_SIDE = 0.05;
    private static final double LONGEST_SIDE = 3;
    private static final Map<String, Double> METRES = Map.ofEntries(
            Map.entry("mm", 1e-3),
            Map.entry("millimeter", 1e-3),
            Map.entry("millimetre", 1e-3),
            Map.entry("millimeters", 1e-3),
            Map.entry("cm", 1e-2),
            Map.entry("centimeter", 1e-2),
            Map.entry("centimeters", 1e-2),
            Map.entry("dm", 1e-1),
            Map.entry("m", 1.0),
            Map.entry("mete", 1.0),
            Map.entry("meter", 1.0),
            Map.entry("meters", 1.0),
            Map.entry("metre", 1.0),
            Map.entry("metres", 1.0),
            // exact: international inch and foot of 1959.
            Map.entry("in", 0.0254),
            Map.entry("inch", 0.0254),
            Map.entry("ft", 0.3048));

    private LengthUnit() {}

    /** Metres in one of the unit; empty where the word is unknown. */
    static Optional<Double> metres(String word) {
        return Optional.ofNullable(METRES.get(word.trim().toLowerCase(Locale.ROOT)));
    }

    /** The one of mm, cm and m that makes all platform sides 0.05 to 3 m long. */
    static Optional<Double> fitting(List<C3dPlatform> platforms) {
        for (double factor : new double[] {1e-3, 1e-2, 1}) {
            if (!platforms.isEmpty() && platforms.stream().allMatch(p -> hasPlausibleSides(p.corners(), factor))) {
                return Optional.of(factor);
            }
        }
        return Optional.empty();
    }

    /** The word for one of the assumed units. */
    static String word(double metres) {
        return metres > 0.5 ? "m" : metres > 0.005 ? "cm" : "mm";
    }

    static boolean hasPlausibleSides(List<Vec3> corners, double factor) {
        for (int i = 0; i < 4; i++) {
            double side = factor * corners.get(i).distance(corners.get((i + 1) % 4));
            if (!(side >= SHORTEST_SIDE && side <= LONGEST_SIDE)) {
                return false;
            }
        }
        return true;
    }
}
