package org.solewright.app.pipeline;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.Severity;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.geometry.Vec3;
import org.solewright.domain.motion.Recording;
import org.solewright.formats.c3d.C3dFile;
import org.solewright.formats.c3d.C3dPlatform;
import org.solewright.formats.c3d.C3dReading;
import org.solewright.formats.io.FormatException;

/**
 * What a C3D file holds and what is wrong with it.
 *
 * @param path the file as the user named it
 * @param file its content; without samples where only the header was read
 * @param recording its platforms and findings in SI units; without tracks
 * @param isHeaderOnly whether no data block was touched
 */
public record Survey(Path path, C3dFile file, Recording recording, boolean isHeaderOnly) {

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
        return of(path, isHeaderOnly, C3dReading.everything());
    }

    /**
     * Surveys a file.
     *
     * @param path a C3D file
     * @param isHeaderOnly whether to touch no data block
     * @param reading how it is read
     * @return the survey
     * @throws UseCaseException where it cannot be read
     * @throws FormatException where it is no C3D file
     */
    public static Survey of(Path path, boolean isHeaderOnly, C3dReading reading)
            throws UseCaseException, FormatException {
        C3dFile file = InputFiles.read(path, f -> isHeaderOnly ? C3dFile.readHeader(f) : C3dFile.read(f, reading));
        return new Survey(path, file, file.withoutTracks(), isHeaderOnly);
    }

    /**
     * The same with every warning made an error.
     *
     * @return a stricter survey
     */
    public Survey strict() {
        List<Finding> findings = recording.findings().stream()
                .map(f -> f.severity() == Severity.WARNING
                        ? new Finding(f.code(), Severity.ERROR, f.where(), f.message())
                        : f)
                .toList();
        return new Survey(
                path,
                file,
                new Recording(
                        recording.name(),
                        recording.rate(),
                        recording.firstFrame(),
                        recording.frames(),
                        recording.points(),
                        recording.platforms(),
                        recording.events(),
                        findings),
                isHeaderOnly);
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
        return SurveyPage.of(this);
    }

    /**
     * In how many frames a point was lost.
     *
     * @param label of the point
     * @param lost frames in which it is not seen
     * @param longest run of such frames
     */
    record Gaps(String label, int lost, int longest) {}

    /** One per point; none where no data was read. */
    List<Gaps> gaps() {
        List<Gaps> all = new ArrayList<>();
        for (int k = 0; file.frames() > 0 && k < file.points().points(); k++) {
            int lost = 0;
            int longest = 0;
            int run = 0;
            for (int frame = 0; frame < file.frames(); frame++) {
                run = file.points().isValid(frame, k) ? 0 : run + 1;
                lost += run > 0 ? 1 : 0;
                longest = Math.max(longest, run);
            }
            all.add(new Gaps(file.labels().get(k), lost, longest));
        }
        return all;
    }

    private static String number(double v) {
        return Double.isNaN(v) ? "unknown" : v == Math.rint(v) ? Long.toString((long) v) : Double.toString(v);
    }
}
