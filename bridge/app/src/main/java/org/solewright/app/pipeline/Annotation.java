package org.solewright.app.pipeline;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.IntFunction;
import org.solewright.analysis.gait.Pass;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.gait.Side;
import org.solewright.domain.gait.Stance;
import org.solewright.domain.geometry.Vec3;
import org.solewright.domain.motion.PointTrack;
import org.solewright.domain.motion.RecordedEvent;
import org.solewright.formats.c3d.AddedPoint;
import org.solewright.formats.c3d.C3dCopy;
import org.solewright.formats.c3d.C3dFile;
import org.solewright.formats.io.FormatException;

/** Writes a walking recording back with what was found in it: joint centres, centres of pressure, contacts. */
final class Annotation {

    private static final double LOADED = 20;

    private final Pass pass;
    private final int frames;
    private final Map<String, AddedPoint> points = new LinkedHashMap<>();

    Annotation(Pass pass, int frames) {
        this.pass = pass;
        this.frames = frames;
    }

    /**
     * Adds a joint centre.
     *
     * @param side whose
     * @param joint such as {@code ANKLE}
     * @param at place in metres by frame, laboratory frame
     * @param how it was computed
     */
    void joint(Side side, String joint, IntFunction<Optional<Vec3>> at, String how) {
        double[] xyz = new double[3 * frames];
        Arrays.fill(xyz, Double.NaN);
        boolean isSeen = false;
        for (int frame = 0; frame < frames; frame++) {
            Optional<Vec3> place = at.apply(frame);
            if (place.isPresent() && place.get().isFinite()) {
                put(place.get(), xyz, frame);
                isSeen = true;
            }
        }
        String label = (side == Side.LEFT ? "L_" : "R_") + joint + "_CENTRE";
        if (isSeen) {
            points.putIfAbsent(label, new AddedPoint(PointTrack.of(label, xyz), how));
        }
    }

    private static void put(Vec3 v, double[] xyz, int frame) {
        xyz[3 * frame] = v.x();
        xyz[3 * frame + 1] = v.y();
        xyz[3 * frame + 2] = v.z();
    }

    private void pressure(PlatformLoads p, double rate) {
        double[] xyz = new double[3 * frames];
        Arrays.fill(xyz, Double.NaN);
        for (int frame = 0; frame < frames; frame++) {
            int sample = (int) Math.round(frame * p.rate() / rate);
            if (p.hasCentreOfPressure() && sample < p.samples() && p.vertical(sample) > LOADED) {
                put(p.centreOfPressure(sample), xyz, frame);
            }
        }
        String label = "COP_" + p.number();
        points.put(
                label,
                new AddedPoint(
                        PointTrack.of(label, xyz), "centre of pressure of platform " + p.number() + " over 20 N"));
    }

    /**
     * Writes the file into a folder.
     *
     * @param source the recording
     * @param folder of the annotated recordings
     * @param trial name of the file there; recordings of one name are told apart
     * @return what has to be said
     * @throws UseCaseException where it cannot be written
     * @throws FormatException where the recording changed meanwhile
     */
    List<Finding> write(Path source, OutputFolder folder, String trial) throws UseCaseException, FormatException {
        C3dFile file = InputFiles.read(source, C3dFile::read);
        for (PlatformLoads p : pass.trial().platforms()) {
            pressure(p, file.rate());
        }
        List<RecordedEvent> events = new ArrayList<>();
        for (Stance s : pass.stances()) {
            String side = s.side() == Side.LEFT ? "Left" : "Right";
            events.add(new RecordedEvent(s.start(), side, "Foot Strike", RecordedEvent.Source.GROUP));
            events.add(new RecordedEvent(s.end(), side, "Foot Off", RecordedEvent.Source.GROUP));
        }
        C3dCopy.Wanted like = C3dCopy.Wanted.like(file);
        C3dCopy.Wanted wanted = new C3dCopy.Wanted(
                like.processor(), like.isReal(), like.first(), like.last(), List.copyOf(points.values()), events);
        return Conversion.copy(source, file, wanted, folder.place(trial));
    }
}
