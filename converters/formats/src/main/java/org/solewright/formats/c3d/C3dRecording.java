package org.solewright.formats.c3d;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.motion.PointTrack;
import org.solewright.domain.motion.Recording;

/** A file's content in SI units. */
final class C3dRecording {

    private C3dRecording() {}

    static Recording of(C3dFile file) {
        return of(file, true);
    }

    static Recording withoutTracks(C3dFile file) {
        return of(file, false);
    }

    private static Recording of(C3dFile file, boolean withTracks) {
        List<Finding> findings = new ArrayList<>(file.findings());
        Optional<Double> stated = LengthUnit.metres(file.unit());
        double metres = stated.or(() -> LengthUnit.fitting(file.platforms())).orElse(1e-3);
        if (stated.isEmpty()) {
            findings.add(Finding.warning(
                    "units.assumed",
                    "",
                    "the length unit is " + (file.unit().isEmpty() ? "not stated" : "'" + file.unit() + "'")
                            + "; lengths are taken as " + LengthUnit.word(metres)
                            + (LengthUnit.fitting(file.platforms()).isPresent()
                                    ? ", which makes the platforms 0.05 to 3 m wide"
                                    : "")));
        }
        boolean isKnown =
                stated.isPresent() || LengthUnit.fitting(file.platforms()).isPresent();
        List<PlatformLoads> platforms = new PlatformReader(file, metres, isKnown, findings).loads();
        return new Recording(
                file.name(),
                file.rate(),
                file.firstFrame(),
                file.frames(),
                withTracks ? tracks(file, metres) : List.of(),
                platforms,
                file.events(),
                findings);
    }

    private static List<PointTrack> tracks(C3dFile file, double metres) {
        C3dPoints points = file.points();
        List<PointTrack> tracks = new ArrayList<>();
        for (int point = 0; point < points.points() && points.frames() > 0; point++) {
            double[] xyz = new double[3 * points.frames()];
            for (int frame = 0; frame < points.frames(); frame++) {
                boolean isValid = points.isValid(frame, point);
                for (int c = 0; c < 3; c++) {
                    xyz[3 * frame + c] = isValid ? points.coordinate(frame, point, c) * metres : Double.NaN;
                }
            }
            tracks.add(PointTrack.of(file.labels().get(point), xyz));
        }
        return tracks;
    }
}
