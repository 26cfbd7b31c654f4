package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.OptionalDouble;
import org.solewright.analysis.gait.LandmarkTracks;
import org.solewright.analysis.numerics.ResidualAnalysis;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.foot.LandmarkMap;
import org.solewright.domain.gait.Side;
import org.solewright.domain.motion.Recording;

/** The low-pass for the markers of a recording by residual analysis: one for all of them, the median of theirs. */
final class MarkerCutoff {

    private MarkerCutoff() {}

    /**
     * Finds it.
     *
     * @param recording points in m
     * @param map which points are looked at
     * @param otherwise Hz, where the recording does not give one
     * @param findings receives what was found
     * @return Hz
     */
    static double of(Recording recording, LandmarkMap map, double otherwise, List<Finding> findings) {
        LandmarkTracks raw = LandmarkTracks.of(recording, map, 0, new ArrayList<>());
        List<Double> found = new ArrayList<>();
        List<String> seen = new ArrayList<>();
        for (Landmark landmark : Landmark.values()) {
            for (Side side : Side.values()) {
                for (String label : raw.labels(landmark, side)) {
                    if (!seen.contains(label)) {
                        seen.add(label);
                        raw.labelled(label)
                                .map(xyz -> ResidualAnalysis.cutoff(components(xyz), recording.rate()))
                                .filter(OptionalDouble::isPresent)
                                .ifPresent(c -> found.add(c.getAsDouble()));
                    }
                }
            }
        }
        if (found.isEmpty()) {
            findings.add(Finding.warning(
                    "points.cutoff-unknown",
                    recording.name(),
                    String.format(
                            Locale.ROOT,
                            "residual analysis finds no low-pass for its markers at %.1f Hz; %.1f Hz is used",
                            recording.rate(),
                            otherwise)));
            return otherwise;
        }
        double[] sorted =
                found.stream().mapToDouble(Double::doubleValue).sorted().toArray();
        double median = (sorted[(sorted.length - 1) / 2] + sorted[sorted.length / 2]) / 2;
        findings.add(Finding.note(
                "points.cutoff-found",
                recording.name(),
                String.format(
                        Locale.ROOT,
                        "residual analysis puts the low-pass for markers at %.1f Hz, the median of %d markers (%.1f to %.1f"
                                + " Hz)",
                        median,
                        sorted.length,
                        sorted[0],
                        Arrays.stream(sorted).max().orElse(median))));
        return median;
    }

    private static List<double[]> components(double[] xyz) {
        List<double[]> components = new ArrayList<>();
        for (int c = 0; c < 3; c++) {
            double[] component = new double[xyz.length / 3];
            for (int i = 0; i < component.length; i++) {
                component[i] = xyz[3 * i + c];
            }
            components.add(component);
        }
        return components;
    }
}
