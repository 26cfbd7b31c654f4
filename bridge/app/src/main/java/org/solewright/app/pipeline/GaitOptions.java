package org.solewright.app.pipeline;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.solewright.domain.foot.Population;
import org.solewright.domain.foot.Sex;

/**
 * What fit and appraise are given in common.
 *
 * @param standing standing recordings; several are pooled; may be empty for appraise
 * @param walking walking recordings, at least one
 * @param landmarks landmark map
 * @param mass body mass, kg
 * @param stature body height, m
 * @param population whose regressions apply
 * @param sex where given
 * @param contacts a contacts table that overrides what was found
 * @param floor height of the floor along up in the laboratory frame, m
 * @param isMirrored whether the laboratory frame is to be mirrored
 * @param markerRadius m
 * @param markerCutoff low-pass for markers, Hz; 0: none
 * @param isFlagIgnored whether samples that are flagged missing are taken for seen
 * @param beltSpeed speed of a treadmill's belts, m/s; 0 over ground
 * @param events where the times of contacts come from: platform, file or kinematic
 * @param annotate folder into which the walking recordings are written back with what was found in them
 * @param isCutoffFound whether the low-pass for markers is found by residual analysis, in place of {@code markerCutoff}
 * @param isZeroFlat whether joint angles are zero at foot flat instead of in the standing trial
 */
public record GaitOptions(
        List<Path> standing,
        List<Path> walking,
        Path landmarks,
        OptionalDouble mass,
        OptionalDouble stature,
        Population population,
        Optional<Sex> sex,
        Optional<Path> contacts,
        OptionalDouble floor,
        boolean isMirrored,
        OptionalDouble markerRadius,
        double markerCutoff,
        boolean isFlagIgnored,
        double beltSpeed,
        String events,
        Optional<Path> annotate,
        boolean isCutoffFound,
        boolean isZeroFlat) {

    /** Low-pass for markers where none is given, Hz (03 section 2). */
    public static final double DEFAULT_MARKER_CUTOFF = 10;

    /**
     * Options with a stated low-pass and the standing trial as zero.
     *
     * @param standing standing recordings; several are pooled; may be empty for appraise
     * @param walking walking recordings, at least one
     * @param landmarks landmark map
     * @param mass body mass, kg
     * @param stature body height, m
     * @param population whose regressions apply
     * @param sex where given
     * @param contacts a contacts table that overrides what was found
     * @param floor height of the floor along up in the laboratory frame, m
     * @param isMirrored whether the laboratory frame is to be mirrored
     * @param markerRadius m
     * @param markerCutoff low-pass for markers, Hz; 0: none
     * @param isFlagIgnored whether samples that are flagged missing are taken for seen
     * @param beltSpeed speed of a treadmill's belts, m/s; 0 over ground
     * @param events where the times of contacts come from: platform, file or kinematic
     * @param annotate folder into which the walking recordings are written back with what was found in them
     */
    public GaitOptions(
            List<Path> standing,
            List<Path> walking,
            Path landmarks,
            OptionalDouble mass,
            OptionalDouble stature,
            Population population,
            Optional<Sex> sex,
            Optional<Path> contacts,
            OptionalDouble floor,
            boolean isMirrored,
            OptionalDouble markerRadius,
            double markerCutoff,
            boolean isFlagIgnored,
            double beltSpeed,
            String events,
            Optional<Path> annotate) {
        this(
                standing,
                walking,
                landmarks,
                mass,
                stature,
                population,
                sex,
                contacts,
                floor,
                isMirrored,
                markerRadius,
                markerCutoff,
                isFlagIgnored,
                beltSpeed,
                events,
                annotate,
                false,
                false);
    }

    /** Copies the lists. */
    public GaitOptions {
        standing = List.copyOf(standing);
        walking = List.copyOf(walking);
        if (EventTimes.Source.ofWord(events).isEmpty()) {
            throw new IllegalArgumentException("events from '" + events + "', expected platform, file or kinematic");
        }
    }

    /** The same without standing recordings. */
    GaitOptions withoutStanding() {
        return new GaitOptions(
                List.of(),
                walking,
                landmarks,
                mass,
                stature,
                population,
                sex,
                contacts,
                floor,
                isMirrored,
                markerRadius,
                markerCutoff,
                isFlagIgnored,
                beltSpeed,
                events,
                annotate,
                isCutoffFound,
                isZeroFlat);
    }

    /** The same with recordings and landmarks that a map of results names, and its mass where none was given. */
    GaitOptions of(List<Path> files, Optional<Path> map, OptionalDouble stated) {
        return new GaitOptions(
                standing,
                files,
                map.orElse(landmarks),
                mass.isPresent() ? mass : stated,
                stature,
                population,
                sex,
                contacts,
                floor,
                isMirrored,
                markerRadius,
                markerCutoff,
                isFlagIgnored,
                beltSpeed,
                events,
                annotate,
                isCutoffFound,
                isZeroFlat);
    }

    /** All files of the call. */
    List<Path> inputs() {
        List<Path> all = new ArrayList<>(standing);
        all.addAll(walking);
        all.add(landmarks);
        contacts.ifPresent(all::add);
        return all;
    }
}
