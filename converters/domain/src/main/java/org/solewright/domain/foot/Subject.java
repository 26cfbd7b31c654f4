package org.solewright.domain.foot;

import java.util.Optional;
import org.solewright.domain.finding.Quantity;

/**
 * Whose foot it is.
 *
 * @param id identifier without personal data
 * @param mass body mass, kg, more than 0
 * @param stature body height, m; empty where unknown
 * @param limbLength hip centre to floor in standing, of this side, m
 * @param footLength heel to toe tip, of this side, m; empty where no landmark or regression gives it
 * @param effectiveFootLength travel of the centre of pressure in the limb frame from contact to opposite contact, m;
 *     empty where no walking recording gives it
 * @param population whose regressions apply
 * @param sex empty where not given
 */
public record Subject(
        String id,
        Quantity mass,
        Optional<Quantity> stature,
        Quantity limbLength,
        Optional<Quantity> footLength,
        Optional<Quantity> effectiveFootLength,
        Population population,
        Optional<Sex> sex) {

    /** Checks that lengths and mass are more than 0. */
    public Subject {
        checkPositive("body mass", mass, "kg");
        checkPositive("limb length", limbLength, "m");
        stature.ifPresent(q -> checkPositive("stature", q, "m"));
        footLength.ifPresent(q -> checkPositive("foot length", q, "m"));
        effectiveFootLength.ifPresent(q -> checkPositive("effective foot length", q, "m"));
    }

    private static void checkPositive(String name, Quantity q, String unit) {
        if (!(q.value() > 0)) {
            throw new IllegalArgumentException(name + " " + q.value() + " " + unit + ", expected more than 0 " + unit);
        }
    }
}
