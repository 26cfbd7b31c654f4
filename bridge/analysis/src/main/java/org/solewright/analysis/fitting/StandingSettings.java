package org.solewright.analysis.fitting;

import java.util.Optional;
import java.util.OptionalInt;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.finding.Quantity;
import org.solewright.domain.foot.Population;
import org.solewright.domain.foot.Sex;

/**
 * What a model from a standing trial needs beside the landmarks.
 *
 * @param subjectId identifier without personal data
 * @param mass body mass, kg
 * @param stature body height, m; empty where not given
 * @param population whose regressions apply
 * @param sex empty where not given
 * @param markerRadius from a marker's centre to the skin, m
 * @param segments parts of the foot, 1 to 3; empty for as many as the landmarks allow
 * @param inertia which table the masses and moments of inertia come from
 */
public record StandingSettings(
        String subjectId,
        Quantity mass,
        Optional<Quantity> stature,
        Population population,
        Optional<Sex> sex,
        Quantity markerRadius,
        OptionalInt segments,
        InertiaTable inertia) {

    /** Marker radius where none is given, m (common practice, 14 mm markers). */
    public static final Quantity DEFAULT_MARKER_RADIUS = Quantity.of(0.007, Basis.ASSUMED);

    /** Most parts of a foot. */
    static final int MOST_SEGMENTS = 3;

    /** Checks mass, marker radius and number of segments. */
    public StandingSettings {
        if (!(mass.value() > 0)) {
            throw new IllegalArgumentException("body mass " + mass.value() + " kg, expected more than 0 kg");
        }
        if (!(markerRadius.value() >= 0)) {
            throw new IllegalArgumentException("marker radius " + markerRadius.value() + " m, expected 0 m or more");
        }
        if (segments.isPresent() && (segments.getAsInt() < 1 || segments.getAsInt() > MOST_SEGMENTS)) {
            throw new IllegalArgumentException(segments.getAsInt() + " foot segments, expected 1 to " + MOST_SEGMENTS);
        }
    }

    /**
     * Where a number from a regression on adults stands for this subject.
     *
     * @return regression for an adult, else assumed
     */
    Basis adultRegression() {
        return population == Population.ADULT ? Basis.REGRESSION : Basis.ASSUMED;
    }

    boolean isHuman() {
        return population != Population.OTHER;
    }
}
