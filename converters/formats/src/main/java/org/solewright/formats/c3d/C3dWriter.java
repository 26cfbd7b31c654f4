package org.solewright.formats.c3d;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.geometry.Vec3;
import org.solewright.domain.motion.PointTrack;
import org.solewright.domain.motion.RecordedEvent;
import org.solewright.domain.motion.Recording;
import org.solewright.formats.io.AtomicOutput;

/**
 * Writes a recording as C3D: Intel, reals, points in mm, platforms as type 2 with six channels each in N and N mm. A file
 * written and read again is the same data to float32.
 */
public final class C3dWriter {

    private static final int BLOCK = 512;
    private static final int MOST = 255;
    private static final int MOST_FRAMES = 65535;
    private static final double MM = 1000;
    /** Depth of the measuring origin below the surface that is written, mm. */
    private static final double DEPTH = 40;

    private final Recording recording;
    private final int perFrame;

    private C3dWriter(Recording recording) {
        this.recording = recording;
        this.perFrame = perFrame(recording);
    }

    /**
     * The bytes of the file.
     *
     * @param recording at most 65 535 frames, 255 points and 42 platforms, platforms sampled alike at a whole multiple of
     *     the point rate
     * @return a C3D file
     * @throws IllegalArgumentException where it does not fit
     */
    public static byte[] bytes(Recording recording) {
        return new C3dWriter(recording).build();
    }

    /**
     * Writes the file.
     *
     * @param target replaced as a whole
     * @param recording see {@link #bytes}
     * @throws IOException where it cannot be written
     */
    public static void write(Path target, Recording recording) throws IOException {
        AtomicOutput.write(target, bytes(recording));
    }

    private static int perFrame(Recording r) {
        if (r.frames() > MOST_FRAMES
                || r.points().size() > MOST
                || 6 * r.platforms().size() > MOST) {
            throw new IllegalArgumentException("recording of " + r.frames() + " frames, "
                    + r.points().size() + " points and " + r.platforms().size()
                    + " platforms, expected at most 65535, 255 and 42");
        }
        int per = 0;
        for (PlatformLoads p : r.platforms()) {
            double ratio = p.rate() / r.rate();
            int whole = (int) Math.round(ratio);
            if (whole < 1 || Math.abs(ratio - whole) > 1e-6 || (per != 0 && per != whole)) {
                throw new IllegalArgumentException("platform " + p.number() + " sampled at " + p.rate()
                        + " Hz, expected a whole multiple of " + r.rate() + " Hz, the same for all");
            }
            per = whole;
        }
        return per;
    }

    private byte[] build() {
        int channels = 6 * recording.platforms().size();
        ParameterWriter sizing = parameters(0);
        int dataBlock = 2 + sizing.blocks();
        byte[] section = parameters(dataBlock).section();
        int words = recording.frames() * (4 * recording.points().size() + channels * perFrame);
        int blocks = (int) ((4L * words + BLOCK - 1) / BLOCK);
        ByteBuffer out = ByteBuffer.allocate(BLOCK * (dataBlock - 1 + blocks)).order(ByteOrder.LITTLE_ENDIAN);
        header(out, dataBlock, channels);
        out.position(BLOCK);
        out.put(section);
        out.position(BLOCK * (dataBlock - 1));
        data(out);
        return out.array();
    }

    private void header(ByteBuffer out, int dataBlock, int channels) {
        out.put(0, (byte) 2);
        out.put(1, (byte) 0x50);
        out.putShort(2, (short) recording.points().size());
        out.putShort(4, (short) (channels * perFrame));
        out.putShort(6, (short) recording.firstFrame());
        out.putShort(8, (short) (recording.firstFrame() + recording.frames() - 1));
        out.putFloat(12, -1f);
        out.putShort(16, (short) dataBlock);
        out.putShort(18, (short) perFrame);
        out.putFloat(20, (float) recording.rate());
    }

    private ParameterWriter parameters(int dataBlock) {
        ParameterWriter p = new ParameterWriter();
        List<String> labels = recording.points().stream().map(PointTrack::label).toList();
        p.group("POINT", "Points in space");
        p.integers("USED", "Points per frame", new int[] {labels.size()});
        p.reals("SCALE", "Negative: samples are reals", new double[] {-1});
        p.reals("RATE", "Frames per second", new double[] {recording.rate()});
        p.integers("DATA_START", "First block of the data", new int[] {dataBlock});
        p.integers("FRAMES", "Number of frames", new int[] {recording.frames()});
        p.text("UNITS", "Length unit", "mm");
        p.texts("LABELS", "Names of the points", labels);
        p.texts("DESCRIPTIONS", "What the points are", labels);
        analogParameters(p);
        platformParameters(p);
        eventParameters(p);
        return p;
    }

    private void analogParameters(ParameterWriter p) {
        List<String> labels = new ArrayList<>();
        List<String> units = new ArrayList<>();
        for (PlatformLoads platform : recording.platforms()) {
            for (String part : List.of("Fx", "Fy", "Fz", "Mx", "My", "Mz")) {
                labels.add(part + platform.number());
                units.add(part.startsWith("F") ? "N" : "Nmm");
            }
        }
        double[] ones = new double[labels.size()];
        java.util.Arrays.fill(ones, 1);
        p.group("ANALOG", "Analog channels");
        p.integers("USED", "Number of channels", new int[] {labels.size()});
        if (labels.isEmpty()) {
            return;
        }
        p.texts("LABELS", "Names of the channels", labels);
        p.texts("DESCRIPTIONS", "What the channels are", labels);
        p.texts("UNITS", "Units of the channels", units);
        p.reals("GEN_SCALE", "Scale of all channels", new double[] {1});
        p.reals("SCALE", "Scale of each channel", ones, labels.size());
        p.integers("OFFSET", "Offset of each channel", new int[labels.size()], labels.size());
        p.reals("RATE", "Samples per second", new double[] {recording.rate() * perFrame});
    }

    private void platformParameters(ParameterWriter p) {
        int n = recording.platforms().size();
        p.group("FORCE_PLATFORM", "Force platforms");
        p.integers("USED", "Number of platforms", new int[] {n});
        if (n == 0) {
            return;
        }
        int[] types = new int[n];
        int[] channels = new int[6 * n];
        double[] corners = new double[12 * n];
        double[] origins = new double[3 * n];
        for (int k = 0; k < n; k++) {
            types[k] = 2;
            origins[3 * k + 2] = -DEPTH;
            for (int i = 0; i < 6; i++) {
                channels[6 * k + i] = 6 * k + i + 1;
            }
            for (int i = 0; i < 4; i++) {
                Vec3 c = recording.platforms().get(k).corners().get(i).times(MM);
                corners[12 * k + 3 * i] = c.x();
                corners[12 * k + 3 * i + 1] = c.y();
                corners[12 * k + 3 * i + 2] = c.z();
            }
        }
        p.integers("TYPE", "Types of the platforms", types, n);
        p.integers("ZERO", "Frames of the baseline; none", new int[] {1, 0}, 2);
        p.reals("CORNERS", "Corners in the laboratory", corners, 3, 4, n);
        p.reals("ORIGIN", "From the measuring origin to the surface centre", origins, 3, n);
        p.integers("CHANNEL", "Channels of each platform", channels, 6, n);
    }

    private void eventParameters(ParameterWriter p) {
        List<RecordedEvent> events = recording.events();
        if (events.isEmpty()) {
            return;
        }
        double[] times = new double[2 * events.size()];
        for (int k = 0; k < events.size(); k++) {
            times[2 * k + 1] = events.get(k).time();
        }
        p.group("EVENT", "Events");
        p.integers("USED", "Number of events", new int[] {events.size()});
        p.texts("CONTEXTS", "Sides", events.stream().map(RecordedEvent::context).toList());
        p.texts(
                "LABELS",
                "What happened",
                events.stream().map(RecordedEvent::label).toList());
        p.reals("TIMES", "Minutes and seconds", times, 2, events.size());
    }

    private void data(ByteBuffer out) {
        int points = recording.points().size();
        double[][] loads = new double[recording.platforms().size()][];
        for (int k = 0; k < loads.length; k++) {
            loads[k] = channels(recording.platforms().get(k));
        }
        for (int frame = 0; frame < recording.frames(); frame++) {
            for (int point = 0; point < points; point++) {
                PointTrack track = recording.points().get(point);
                boolean isValid = track.isValid(frame);
                Vec3 at = isValid ? track.at(frame).times(MM) : Vec3.ZERO;
                out.putFloat((float) at.x()).putFloat((float) at.y()).putFloat((float) at.z());
                out.putFloat(isValid ? 0f : -1f);
            }
            for (int sample = frame * perFrame; sample < (frame + 1) * perFrame; sample++) {
                for (double[] load : loads) {
                    // A recording may end with the sample of its last frame; the rest of that frame repeats it.
                    int at = 6 * Math.min(sample, load.length / 6 - 1);
                    for (int i = 0; i < 6; i++) {
                        out.putFloat((float) load[at + i]);
                    }
                }
            }
        }
    }

    /** Six channels in platform axes about the measuring origin, {@code [samples][6]}, N and N mm. */
    private static double[] channels(PlatformLoads p) {
        PlatformAxes axes = PlatformAxes.of(p.corners());
        int n = p.samples();
        double[] force = new double[3 * n];
        double[] moment = new double[3 * n];
        p.copyForceTo(force, 0);
        p.copyMomentTo(moment, 0);
        double[] out = new double[6 * n];
        for (int i = 0; i < n; i++) {
            Vec3 f = axes.fromLaboratory(new Vec3(force[3 * i], force[3 * i + 1], force[3 * i + 2]));
            Vec3 m = axes.fromLaboratory(new Vec3(moment[3 * i], moment[3 * i + 1], moment[3 * i + 2]))
                    .times(MM)
                    .plus(new Vec3(0, 0, -DEPTH).cross(f));
            out[6 * i] = f.x();
            out[6 * i + 1] = f.y();
            out[6 * i + 2] = f.z();
            out[6 * i + 3] = m.x();
            out[6 * i + 4] = m.y();
            out[6 * i + 5] = m.z();
        }
        return out;
    }
}
