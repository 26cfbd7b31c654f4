package org.solewright.app.pipeline;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.stream.Collectors;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.geometry.Vec3;
import org.solewright.domain.motion.RecordedEvent;
import org.solewright.domain.motion.Recording;
import org.solewright.formats.c3d.C3dFile;
import org.solewright.formats.c3d.C3dPlatform;
import org.solewright.formats.io.FormatException;

/**
 * What a C3D file holds and what is wrong with it.
 *
 * @param path the file as the user named it
 * @param file its content; without samples where only the header was read
 * @param recording the same in SI units
 * @param isHeaderOnly whether no data block was touched
 */
public record Survey(Path path, C3dFile file, Recording recording, boolean isHeaderOnly) {

    private static final int MOST_LISTED = 100;

    /**
     * Surveys a file.
     *
     * @param path a C3D file
     * @param isHeaderOnly whether to touch no data block
     * @return the survey
     * @throws UseCaseException where it cannot be read
     * @throws FormatException where it is no C3D file
     */
    public static Survey of(Path path, boolean isHeaderOnly) throws UseCaseException, FormatException {
        C3dFile file = InputFiles.read(path, f -> isHeaderOnly ? C3dFile.readHeader(f) : C3dFile.read(f));
        return new Survey(path, file, file.toRecording(), isHeaderOnly);
    }

    /**
     * Findings of the file, its units and platforms.
     *
     * @return in the order they were made
     */
    public List<Finding> findings() {
        return recording.findings();
    }

    /** The file in one line. */
    String oneLine() {
        return String.format(
                Locale.ROOT,
                "%s: %d points, %d frames at %s Hz, %d analog channels, %d platforms, %d events, %d findings",
                file.name(),
                file.points().points(),
                frames(),
                number(file.rate()),
                file.analog().channels(),
                file.platforms().size(),
                file.events().size(),
                findings().size());
    }

    /**
     * Number of whole frames that the file holds.
     *
     * @return zero or more
     */
    public int frames() {
        return file.storedFrames();
    }

    /**
     * Greatest vertical force of a platform.
     *
     * @param number of the platform
     * @return N; NaN where the platform cannot be used or no data was read
     */
    public double peakVertical(int number) {
        double peak = Double.NaN;
        for (PlatformLoads p : recording.platforms()) {
            for (int i = 0; p.number() == number && i < p.samples(); i++) {
                double v = p.vertical(i);
                peak = Double.isNaN(peak) ? v : Math.max(peak, v);
            }
        }
        return peak;
    }

    /**
     * Corners of a platform in metres, as far as its unit is known.
     *
     * @param platform as stored
     * @return four positions in the laboratory frame; empty where the platform cannot be used
     */
    public List<Vec3> corners(C3dPlatform platform) {
        return recording.platforms().stream()
                .filter(p -> p.number() == platform.number())
                .findFirst()
                .map(PlatformLoads::corners)
                .orElse(List.of());
    }

    /**
     * A page to read.
     *
     * @return one line each
     */
    public List<String> page() {
        List<String> lines = new ArrayList<>();
        lines.add(path.toString());
        lines.add("  " + file.processor().word() + ", " + (file.isReal() ? "real" : "integer") + " samples, "
                + frames() + " frames from " + file.firstFrame() + " at " + number(file.rate()) + " Hz"
                + (file.rate() > 0 ? String.format(Locale.ROOT, " (%.3f s)", frames() / file.rate()) : "")
                + ", lengths in " + (file.unit().isEmpty() ? "an unknown unit" : file.unit()));
        points(lines);
        if (file.analog().channels() > 0) {
            lines.add("  " + file.analog().channels() + " analog channels at "
                    + number(file.analog().rate()) + " Hz: " + listed(file.analogLabels()));
        }
        for (C3dPlatform p : file.platforms()) {
            lines.add(platform(p));
        }
        for (RecordedEvent e : file.events()) {
            lines.add(String.format(
                    Locale.ROOT,
                    "  event %.3f s %s%s (%s)",
                    e.time(),
                    e.context().isEmpty() ? "" : e.context() + " ",
                    e.label(),
                    e.source().word()));
        }
        lines.add("  " + (findings().isEmpty() ? "no findings" : "findings:"));
        for (Finding f : findings()) {
            lines.add("    " + f.severity().word() + " " + f.code()
                    + (f.where().isEmpty() ? "" : " (" + f.where() + ")") + ": " + f.message());
        }
        return lines;
    }

    private void points(List<String> lines) {
        int n = file.points().points();
        if (file.frames() == 0) {
            lines.add("  " + n + " points: " + listed(file.labels()));
            return;
        }
        List<String> whole = new ArrayList<>();
        List<String> gapped = new ArrayList<>();
        for (int k = 0; k < n; k++) {
            int lost = 0;
            int longest = 0;
            int run = 0;
            for (int frame = 0; frame < file.frames(); frame++) {
                run = file.points().isValid(frame, k) ? 0 : run + 1;
                lost += run > 0 ? 1 : 0;
                longest = Math.max(longest, run);
            }
            if (lost == 0) {
                whole.add(file.labels().get(k));
            } else {
                gapped.add(String.format(
                        Locale.ROOT,
                        "    %-16s lost in %d of %d frames, longest gap %d frames%s",
                        file.labels().get(k),
                        lost,
                        file.frames(),
                        longest,
                        file.rate() > 0 ? String.format(Locale.ROOT, " (%.3f s)", longest / file.rate()) : ""));
            }
        }
        lines.add("  " + n + " points" + (whole.isEmpty() ? "" : ", without gaps: " + listed(whole)));
        lines.addAll(gapped.subList(0, Math.min(MOST_LISTED, gapped.size())));
        if (gapped.size() > MOST_LISTED) {
            lines.add("    ... and " + (gapped.size() - MOST_LISTED) + " more with gaps");
        }
    }

    private String platform(C3dPlatform p) {
        List<Vec3> corners = corners(p);
        String where = corners.isEmpty()
                ? "not usable"
                : "corners "
                        + corners.stream()
                                .map(c -> String.format(Locale.ROOT, "(%.3f %.3f %.3f)", c.x(), c.y(), c.z()))
                                .collect(Collectors.joining(" "))
                        + " m"
                        + (Double.isNaN(peakVertical(p.number()))
                                ? ""
                                : String.format(Locale.ROOT, ", peak vertical %.1f N", peakVertical(p.number())));
        return "  platform " + p.number() + ", type " + p.type() + ": " + where;
    }

    private static String listed(List<String> labels) {
        return String.join(" ", labels.subList(0, Math.min(MOST_LISTED, labels.size())))
                + (labels.size() > MOST_LISTED ? " ... and " + (labels.size() - MOST_LISTED) + " more" : "");
    }

    private static String number(double v) {
        return Double.isNaN(v) ? "unknown" : v == Math.rint(v) ? Long.toString((long) v) : Double.toString(v);
    }
}
