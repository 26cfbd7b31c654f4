package org.solewright.domain.study;

import java.util.Optional;
import java.util.OptionalDouble;
import org.solewright.domain.foot.Population;
import org.solewright.domain.foot.Sex;

/**
 * A subject of a study, without personal data.
 *
 * @param id identifier
 * @param mass kg
 * @param stature m
 * @param limbLength hip to floor as measured by hand, m
 * @param population whose regressions apply
 * @param sex where stated
 * @param notes anything
 * @param line of the table, from 1
 */
public record StudySubject(
        String id,
        OptionalDouble mass,
        OptionalDouble stature,
        OptionalDouble limbLength,
        Population population,
        Optional<Sex> sex,
        String notes,
        long line) {}
