package org.solewright.analysis.gait;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.solewright.analysis.numerics.Gaps;
import org.solewright.analysis.numerics.LowPass;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.foot.LandmarkMap;
import org.solewright.domain.foot.SidedLandmark;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Vec3;
import org.solewright.domain.motion.PointTrack;
import org.solewright.domain.motion.Recording;

/**
 * The landmarks of one recording: labels mapped, lost samples marked, short gaps bridged, smoothed. Laboratory frame, m.
 */
public final class LandmarkTracks {

    private static final double LONGEST_GAP = 0.1;
    private static final double MOST_OF_RATE = 0.4;
    private static final Side MIDLINE = Side.LEFT;

    private final Recording recording;
    private final Map<SidedLandmark, List<double[]>> tracks = new LinkedHashMap<>();
    private final Map<SidedLandmark, List<String>> labels = new LinkedHashMap<>();

    private LandmarkTracks(Recording recording) {
        this.recording = recording;
    }

    /**
     * Maps, bridges and smooths.
     *
     * @param recording points in m
     * @param map which label is which landmark
     * @param cutoff low-pass for markers, Hz; never used over 0.4 of the point rate; 0 or less: none
     * @param findings receives what has to be said
     * @return tracks of all landmarks that the recording has
     */
    public static LandmarkTracks of(Recording recording, LandmarkMap map, double cutoff, List<Finding> findings) {
        LandmarkTracks tracks = new LandmarkTracks(recording);
        List<String> recorded =
                recording.points().stream().map(PointTrack::label).toList();
        Optional<LowPass> filter = cutoff > 0 && recording.frames() > 1
                ? Optional.of(LowPass.of(Math.min(cutoff, highestCutoff(recording.rate())), recording.rate()))
                : Optional.empty();
        Map<String, double[]> smoothed = new LinkedHashMap<>();
        int zeros = 0;
        for (Landmark landmark : Landmark.values()) {
            for (Side side : Side.values()) {
                List<String> found = map.labels(landmark, side, recorded);
                for (String label : found) {
                    if (!smoothed.containsKey(label)) {
                        double[] xyz = samples(recording, label);
                        zeros += zeroAsMissing(xyz);
                        smoothed.put(label, smooth(xyz, recording, label, filter, findings));
                    }
                }
                if (!found.isEmpty()) {
                    SidedLandmark key = new SidedLandmark(landmark, side);
                    tracks.tracks.put(key, found.stream().map(smoothed::get).toList());
                    tracks.labels.put(key, found);
                }
            }
        }
        if (zeros > 0) {
            findings.add(Finding.note(
                    "points.zero-as-missing",
                    recording.name(),
                    zeros + " samples of mapped points lie exactly at 0, 0, 0 and are taken as missing"));
        }
        return tracks;
    }

    /**
     * The highest low-pass that is used at a point rate.
     *
     * @param rate Hz
     * @return Hz, 0.4 of the rate
     */
    public static double highestCutoff(double rate) {
        return MOST_OF_RATE * rate;
    }

    private static double[] samples(Recording recording, String label) {
        double[] xyz = new double[3 * recording.frames()];
        recording.point(label).ifPresent(p -> p.copyTo(xyz, 0));
        return xyz;
    }

    private static int zeroAsMissing(double[] xyz) {
        int zeros = 0;
        for (int i = 0; i < xyz.length; i += 3) {
            if (xyz[i] == 0 && xyz[i + 1] == 0 && xyz[i + 2] == 0) {
                xyz[i] = Double.NaN;
                xyz[i + 1] = Double.NaN;
                xyz[i + 2] = Double.NaN;
                zeros++;
            }
        }
        return zeros;
    }

    private static double[] smooth(
            double[] xyz, Recording recording, String label, Optional<LowPass> filter, List<Finding> findings) {
        int bridged = Gaps.bridge(xyz, 3, (int) Math.floor(LONGEST_GAP * recording.rate() + 1e-9));
        if (bridged > 0) {
            findings.add(Finding.note(
                    "points.gap-bridged",
                    recording.name() + " " + label,
                    bridged + " samples were bridged by a spline"));
        }
        if (filter.isEmpty()) {
            return xyz;
        }
        int n = xyz.length / 3;
        double[] component = new double[n];
        for (int c = 0; c < 3; c++) {
            for (int i = 0; i < n; i++) {
                component[i] = xyz[3 * i + c];
            }
            double[] filtered = filter.get().applyToRuns(component);
            for (int i = 0; i < n; i++) {
                xyz[3 * i + c] = filtered[i];
            }
        }
        return xyz;
    }

    /**
     * The recording.
     *
     * @return as given
     */
    public Recording recording() {
        return recording;
    }

    /**
     * Whether the recording has a label for that landmark.
     *
     * @param landmark which
     * @param side which
     * @return true where there is one
     */
    public boolean has(Landmark landmark, Side side) {
        return tracks.containsKey(new SidedLandmark(landmark, side));
    }

    /**
     * Labels of a landmark in this recording.
     *
     * @param landmark which
     * @param side which
     * @return labels in the map's order, empty where there are none
     */
    public List<String> labels(Landmark landmark, Side side) {
        return labels.getOrDefault(new SidedLandmark(landmark, side), List.of());
    }

    /**
     * Path of a landmark: the mean of its labels, lost where one of them is.
     *
     * @param landmark which
     * @param side which
     * @return {@code [frames][3]}, m, NaN where lost; a fresh array; empty where the recording has no label for it
     */
    public Optional<double[]> track(Landmark landmark, Side side) {
        List<double[]> all = tracks.get(new SidedLandmark(landmark, side));
        if (all == null) {
            return Optional.empty();
        }
        double[] mean = new double[3 * recording.frames()];
        for (double[] t : all) {
            for (int i = 0; i < mean.length; i++) {
                mean[i] += t[i] / all.size();
            }
        }
        return Optional.of(mean);
    }

    /**
     * Path of one label.
     *
     * @param label a label that some landmark of this recording has
     * @return {@code [frames][3]}, m, NaN where lost; a fresh array; empty where it is not mapped
     */
    public Optional<double[]> labelled(String label) {
        for (Map.Entry<SidedLandmark, List<String>> e : labels.entrySet()) {
            int i = e.getValue().indexOf(label);
            if (i >= 0) {
                return Optional.ofNullable(tracks.get(e.getKey()))
                        .map(t -> t.get(i).clone());
            }
        }
        return Optional.empty();
    }

    /**
     * Mean position of a landmark over the recording.
     *
     * @param landmark which
     * @param side which
     * @return m, laboratory frame; empty where it has no label or is never seen
     */
    public Optional<Vec3> mean(Landmark landmark, Side side) {
        return track(landmark, side).flatMap(LandmarkTracks::meanOf);
    }

    /**
     * Mean of the samples that are there.
     *
     * @param xyz {@code [frames][3]}, NaN where lost
     * @return mean; empty where all are lost
     */
    public static Optional<Vec3> meanOf(double[] xyz) {
        Vec3 sum = Vec3.ZERO;
        int n = 0;
        for (int i = 0; i < xyz.length; i += 3) {
            if (!Double.isNaN(xyz[i])) {
                sum = sum.plus(new Vec3(xyz[i], xyz[i + 1], xyz[i + 2]));
                n++;
            }
        }
        return n == 0 ? Optional.empty() : Optional.of(sum.times(1.0 / n));
    }

    /**
     * The pelvis's path: the mean of its tracked landmarks (iliac spines and sacrum), lost where one of them is.
     *
     * @return {@code [frames][3]}, m; empty where no pelvic landmark is tracked
     */
    public Optional<double[]> pelvis() {
        List<double[]> parts = new ArrayList<>();
        for (Landmark l : List.of(Landmark.ASIS, Landmark.PSIS, Landmark.TROCHANTER_MAJOR)) {
            Optional<double[]> left = track(l, Side.LEFT);
            Optional<double[]> right = track(l, Side.RIGHT);
            boolean isNeeded = l != Landmark.TROCHANTER_MAJOR || parts.isEmpty();
            if (left.isPresent() && right.isPresent() && isNeeded) {
                parts.add(left.get());
                parts.add(right.get());
            }
        }
        track(Landmark.SACRUM, MIDLINE)
                .or(() -> track(Landmark.SACRUM, Side.RIGHT))
                .ifPresent(parts::add);
        if (parts.isEmpty()) {
            return Optional.empty();
        }
        double[] mean = new double[3 * recording.frames()];
        for (double[] p : parts) {
            for (int i = 0; i < mean.length; i++) {
                mean[i] += p[i] / parts.size();
            }
        }
        return Optional.of(mean);
    }

    /**
     * Tracks of one foot as the contact analysis needs them.
     *
     * @param side the foot
     * @return tracks; empty where heel or every forefoot landmark is missing
     */
    public Optional<FootTracks> foot(Side side) {
        List<double[]> heads = new ArrayList<>();
        for (Landmark l : List.of(Landmark.METATARSAL_1_HEAD, Landmark.METATARSAL_2_HEAD, Landmark.METATARSAL_5_HEAD)) {
            track(l, side).ifPresent(heads::add);
        }
        Optional<double[]> toe = track(Landmark.TOE_TIP, side).or(() -> track(Landmark.HALLUX_TIP, side));
        if (heads.isEmpty()) {
            toe.ifPresent(heads::add);
        }
        return heads.isEmpty()
                ? Optional.empty()
                : track(Landmark.CALCANEUS_POSTERIOR, side).map(heel -> new FootTracks(heel, heads, toe));
    }
}
