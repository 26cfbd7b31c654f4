package org.solewright.app.cli;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;
import org.jspecify.annotations.Nullable;
import org.solewright.app.pipeline.GaitOptions;
import org.solewright.app.pipeline.UseCaseException;
import org.solewright.domain.foot.Population;
import org.solewright.domain.foot.Sex;
import picocli.CommandLine.Option;

/** Options that fit and appraise have in common. */
final class GaitArguments {

    @Option(names = "--walking", paramLabel = "W.c3d", description = "Walking recording; may be repeated.")
    private List<Path> walking = new ArrayList<>();

    @Option(names = "--landmarks", paramLabel = "MAP.xml", description = "Landmark map.")
    @Nullable
    private Path landmarks;

    @Option(names = "--mass", paramLabel = "KG", description = "Body mass, kg; else measured by the platforms.")
    @Nullable
    private Double mass;

    @Option(names = "--contacts", paramLabel = "C.csv", description = "Contacts table whose verdicts stand.")
    @Nullable
    private Path contacts;

    @Option(names = "--floor", paramLabel = "Z", description = "Height of the floor along up, m.")
    @Nullable
    private Double floor;

    @Option(names = "--mirrored", description = "The laboratory frame is left-handed: mirror it.")
    private boolean isMirrored;

    @Option(names = "--marker-radius", paramLabel = "M", description = "Marker radius, m (default: 0.007, assumed).")
    @Nullable
    private Double markerRadius;

    @Option(
            names = "--marker-low-pass",
            paramLabel = "HZ",
            defaultValue = "10",
            description = "Low-pass for markers, Hz; 0: none (default: ${DEFAULT-VALUE}).")
    private double markerCutoff;

    @Option(
            names = "--marker-cutoff",
            paramLabel = "KIND",
            description =
                    "residual: find the low-pass for markers by residual analysis, in place of --marker-low-pass.")
    @Nullable
    private String cutoffKind;

    @Option(
            names = "--zero",
            paramLabel = "KIND",
            defaultValue = "standing",
            description = "Where joint angles are zero: in the standing trial or at foot flat: standing or flat"
                    + " (default: ${DEFAULT-VALUE}).")
    private String zero = "standing";

    @Option(
            names = "--events",
            paramLabel = "KIND",
            defaultValue = "platform",
            description =
                    "Where the times of contacts come from: platform, file or kinematic (default: ${DEFAULT-VALUE}).")
    private String events = "platform";

    @Option(
            names = "--belt-speed",
            paramLabel = "M_S",
            defaultValue = "0",
            description = "Speed of the treadmill's belts, m/s; the platforms are the belts.")
    private double beltSpeed;

    @Option(names = "--ignore-flags", description = "Take samples for seen that a file flags as missing.")
    private boolean isFlagIgnored;

    @Option(
            names = "--annotate",
            paramLabel = "DIR",
            description =
                    "Write the walking recordings into this folder with joint centres, centres of pressure, contacts.")
    private Optional<Path> annotate = Optional.empty();

    /** For picocli. */
    GaitArguments() {}

    /**
     * The options as the use cases take them.
     *
     * @param standing standing recordings
     * @param stature m
     * @param population word of the command line
     * @param sex word of the command line
     * @param hasResults whether a map of results stands in for recordings
     * @return checked options
     * @throws UseCaseException where a value is out of range
     */
    GaitOptions options(
            List<Path> standing,
            @Nullable Double stature,
            @Nullable String population,
            @Nullable String sex,
            boolean hasResults)
            throws UseCaseException {
        Path map = inputs(hasResults);
        if (!events.equals("platform") && !events.equals("file") && !events.equals("kinematic")) {
            throw usage("--events", "'" + events + "' is unknown", "use platform, file or kinematic");
        }
        if (cutoffKind != null && !cutoffKind.equals("residual")) {
            throw usage("--marker-cutoff", "'" + cutoffKind + "' is unknown", "use residual, or --marker-low-pass HZ");
        }
        if (!zero.equals("standing") && !zero.equals("flat")) {
            throw usage("--zero", "'" + zero + "' is unknown", "use standing or flat");
        }
        check("--belt-speed", beltSpeed, 0, 20, "m/s");
        if (isMirrored && annotate.isPresent()) {
            throw usage(
                    "--annotate",
                    "is not given together with --mirrored",
                    "annotate recordings of a right-handed frame");
        }
        check("--mass", mass, 0.01, 1e5, "kg");
        check("--stature", stature, 0.05, 10, "m");
        check("--floor", floor, -100, 100, "m");
        check("--marker-radius", markerRadius, 0, 0.1, "m");
        check("--marker-low-pass", markerCutoff, 0, 1e4, "Hz");
        return new GaitOptions(
                standing,
                walking,
                map,
                optional(mass),
                optional(stature),
                population(population),
                sex(sex),
                Optional.ofNullable(contacts),
                optional(floor),
                isMirrored,
                optional(markerRadius),
                markerCutoff,
                isFlagIgnored,
                beltSpeed,
                events,
                annotate,
                cutoffKind != null,
                zero.equals("flat"));
    }

    /** Recordings with a landmark map, or a map of results. */
    private Path inputs(boolean hasResults) throws UseCaseException {
        if (hasResults) {
            if (!walking.isEmpty() || landmarks != null) {
                throw usage("--results", "is given together with --walking or --landmarks", "give one of them");
            }
            return Path.of("");
        }
        if (walking.isEmpty()) {
            throw usage("--walking", "is missing", "give a walking recording");
        }
        if (landmarks == null) {
            throw usage("--landmarks", "is missing", "give a landmark map");
        }
        return landmarks;
    }

    private static OptionalDouble optional(@Nullable Double value) {
        return value == null ? OptionalDouble.empty() : OptionalDouble.of(value);
    }

    private static void check(String name, @Nullable Double value, double low, double high, String unit)
            throws UseCaseException {
        if (value != null && !(value >= low && value <= high)) {
            throw usage(
                    name,
                    String.format(
                            Locale.ROOT, "%s %s is out of range, expected %s to %s %s", value, unit, low, high, unit),
                    "give a number in that range");
        }
    }

    static Population population(@Nullable String word) throws UseCaseException {
        if (word == null) {
            return Population.UNKNOWN;
        }
        return Population.ofWord(word)
                .filter(p -> p != Population.UNKNOWN)
                .orElseThrow(() -> usage("--population", "'" + word + "' is unknown", "use adult, child or other"));
    }

    static Optional<Sex> sex(@Nullable String word) throws UseCaseException {
        if (word == null) {
            return Optional.empty();
        }
        for (Sex s : Sex.values()) {
            if (s.word().equals(word)) {
                return Optional.of(s);
            }
        }
        throw usage("--sex", "'" + word + "' is unknown", "use female or male");
    }

    static UseCaseException usage(String option, String message, String whatToDo) {
        return new UseCaseException(UseCaseException.Kind.USAGE, option, message, whatToDo);
    }
}
