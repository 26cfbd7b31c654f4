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
 * @param segments parts of the foot, 1 to 6; empty for as many as the landmarks allow
 * @param inertia which table the masses and moments of inertia come from
 * @param choices how the foot is divided beyond that
 */
public record StandingSettings(
        String subjectId,
        Quantity mass,
        Optional<Quantity> stature,
        Population population,
        Optional<Sex> sex,
        Quantity markerRadius,
        OptionalInt segments,
        InertiaTable inertia,
        FootChoices choices) {

    /** Marker radius where none is given, m (common practice, 14 mm markers). */
    public static final Quantity DEFAULT_MARKER_RADIUS = Quantity.of(0.007, Basis.ASSUMED);

    /** Checks mass, marker radius and number of segments. */
    public StandingSettings {
        if (!(mass.value() > 0)) {
            throw new IllegalArgumentException("body mass " + mass.value() + " kg, expected more than 0 kg");
        }
        if (!(markerRadius.value() >= 0)) {
            throw new IllegalArgumentException("marker radius " + markerRadius.value() + " m, expected 0 m or more");
        }
        if (segments.isPresent() && (segments.getAsInt() < 1 || segments.getAsInt() > SegmentPlan.MOST)) {
            throw new IllegalArgumentException(
                    segments.getAsInt() + " foot segments, expected 1 to " + SegmentPlan.MOST);
        }
    }

    /**
     * Settings with the usual choices.
     *
     * @param subjectId identifier without personal data
     * @param mass body mass, kg
     * @param stature body height, m; empty where not given
     * @param population whose regressions apply
     * @param sex empty where not given
     * @param markerRadius from a marker's centre to the skin, m
     * @param segments parts of the foot, 1 to 6; empty for as many as the landmarks allow
     * @param inertia which table the masses and moments of inertia come from
     */
    public StandingSettings(
            String subjectId,
            Quantity mass,
            Optional<Quantity> stature,
            Population population,
            Optional<Sex> sex,
            Quantity markerRadius,
            OptionalInt segments,
            InertiaTable inertia) {
        this(subjectId, mass, stature, population, sex, markerRadius, segments, inertia, FootChoices.DEFAULT);
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
