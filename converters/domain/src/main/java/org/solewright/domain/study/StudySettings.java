package org.solewright.domain.study;

import java.util.Collections;
import java.util.EnumSet;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.Set;

/**
 * What holds for all trials of a study.
 *
 * @param name what the laboratory calls the study
 * @param date day of publication for the metadata, as in {@code 2026-03-01}; empty where not stated
 * @param landmarks file of the landmark map, relative to the study's folder
 * @param columnMap file of the column map of results, relative to the study's folder
 * @param markerCutoff low-pass for markers, Hz; 0: none
 * @param markerRadius m
 * @param floor height of the floor along up, m
 * @param isMirrored whether the laboratory frame is to be mirrored
 * @param isFlagIgnored whether samples that are flagged missing are taken for seen
 * @param events where the times of contacts come from: platform, file or kinematic
 * @param segments parts of the foot; empty: as many as the landmarks allow
 * @param inertia table of masses and moments of inertia: deleva or dempster
 * @param fitTrials most walking trials that one foot is fitted from
 * @param outputs tables of the study that are written
 */
public record StudySettings(
        String name,
        String date,
        String landmarks,
        Optional<String> columnMap,
        double markerCutoff,
        OptionalDouble markerRadius,
        OptionalDouble floor,
        boolean isMirrored,
        boolean isFlagIgnored,
        String events,
        OptionalInt segments,
        String inertia,
        int fitTrials,
        Set<StudySettings.Output> outputs) {

    /** Most walking trials of a fit where nothing is stated. */
    public static final int DEFAULT_FIT_TRIALS = 10;

    /** Words for where contacts come from. */
    public static final List<String> EVENTS = List.of("platform", "file", "kinematic");

    /** Words for tables of inertia. */
    public static final List<String> INERTIA = List.of("deleva", "dempster");

    /** A table of the study. */
    public enum Output {
        /** One row per transition. */
        TRANSITIONS,
        /** One row per measured number. */
        MEASURES,
        /** One row per compared posture. */
        POSTURES,
        /** One row per finding. */
        FINDINGS,
        /** One row per foot model. */
        FEET;

        /**
         * The word used in files.
         *
         * @return such as {@code transitions}
         */
        public String word() {
            return name().toLowerCase(Locale.ROOT);
        }
    }

    /** Checks that numbers are in range. */
    public StudySettings {
        outputs = outputs.isEmpty() ? Set.of() : Collections.unmodifiableSet(EnumSet.copyOf(outputs));
        if (!(markerCutoff >= 0) || fitTrials < 1) {
            throw new IllegalArgumentException("marker low-pass " + markerCutoff + " Hz, at least 0; " + fitTrials
                    + " walking trials of a fit, at least 1");
        }
    }
}
