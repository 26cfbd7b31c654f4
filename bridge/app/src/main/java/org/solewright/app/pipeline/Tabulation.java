package org.solewright.app.pipeline;

import java.io.IOException;
import java.io.Writer;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.geometry.Vec3;
import org.solewright.domain.motion.RecordedEvent;
import org.solewright.domain.motion.Recording;
import org.solewright.formats.c3d.C3dFile;
import org.solewright.formats.c3d.C3dReading;
import org.solewright.formats.io.FormatException;

/** A C3D file's content as a delimited table (RFC 4180), written line by line. */
public final class Tabulation {

    private static final double LOADED = 20;

    /** What is tabulated. */
    public enum What {
        /** Coordinates and residuals in the file's own units. */
        POINTS,
        /** Scaled analog samples. */
        ANALOG,
        /** Ground reaction on the subject, laboratory frame, SI units; platform by platform. */
        LOADS,
        /** Events, EVENT group first. */
        EVENTS;

        /**
         * The table of that word.
         *
         * @param word of the command line
         * @return empty where unknown
         */
        public static Optional<What> ofWord(String word) {
            for (What w : values()) {
                if (w.name().toLowerCase(Locale.ROOT).equals(word)) {
                    return Optional.of(w);
                }
            }
            return Optional.empty();
        }
    }

    private final C3dFile file;
    private final FrameWindow window;
    private final What what;
    private final boolean hasUnitsRow;

    private Tabulation(C3dFile file, FrameWindow window, What what, boolean hasUnitsRow) {
        this.file = file;
        this.window = window;
        this.what = what;
        this.hasUnitsRow = hasUnitsRow;
    }

    /**
     * Reads a file for a table.
     *
     * @param path a C3D file
     * @param what which table
     * @param hasUnitsRow whether a second header row gives units
     * @param from first frame, as FrameWindow names it; empty: from the start
     * @param to last frame; empty: to the end
     * @param isFlagIgnored whether samples that are flagged missing are taken for seen
     * @return the table, to be written
     * @throws UseCaseException where it cannot be read
     * @throws FormatException where it is no C3D file
     */
    public static Tabulation of(
            Path path,
            What what,
            boolean hasUnitsRow,
            Optional<String> from,
            Optional<String> to,
            boolean isFlagIgnored)
            throws UseCaseException, FormatException {
        C3dReading reading = isFlagIgnored ? C3dReading.everything().ignoringFlags() : C3dReading.everything();
        C3dFile file = InputFiles.read(path, f -> C3dFile.read(f, reading));
        boolean isWhole = from.isEmpty() && to.isEmpty();
        FrameWindow window = isWhole ? FrameWindow.whole(file) : FrameWindow.of(path, file, from, to);
        return new Tabulation(file, window, what, hasUnitsRow);
    }

    /**
     * What has to be said about the file.
     *
     * @return findings; those of units and platforms for loads only
     */
    public List<Finding> findings() {
        return what == What.LOADS ? file.toRecording().findings() : file.findings();
    }

    /**
     * Writes the table.
     *
     * @param out receives lines ended by CR LF
     * @throws IOException where writing fails
     */
    public void write(Writer out) throws IOException {
        switch (what) {
            case POINTS -> points(out);
            case ANALOG -> analog(out);
            case LOADS -> loads(out);
            case EVENTS -> events(out);
        }
    }

    private static void end(Writer out) throws IOException {
        out.write("\r\n");
    }

    private static void cell(Writer out, double value) throws IOException {
        out.write(',');
        if (Double.isFinite(value)) {
            out.write(Double.toString(value));
        }
    }

    /** A cell of text, quoted where it needs it. */
    private static String quoted(String text) {
        boolean needs = text.chars().anyMatch(c -> c == ',' || c == '"' || c == '\n' || c == '\r');
        return needs ? '"' + text.replace("\"", "\"\"") + '"' : text;
    }

    private void points(Writer out) throws IOException {
        int n = file.points().points();
        out.write("frame,time_s");
        for (String label : file.labels()) {
            for (String part : new String[] {"_x", "_y", "_z", "_residual"}) {
                out.write("," + quoted(label + part));
            }
        }
        end(out);
        if (hasUnitsRow) {
            out.write(",s");
            for (int k = 0; k < 4 * n; k++) {
                out.write("," + quoted(file.unit()));
            }
            end(out);
        }
        for (int frame = window.first(); frame <= window.last(); frame++) {
            out.write(Integer.toString(file.firstFrame() + frame));
            cell(out, (file.firstFrame() + frame - 1) / file.rate());
            for (int k = 0; k < n; k++) {
                boolean isValid = file.points().isValid(frame, k);
                for (int c = 0; c < 3; c++) {
                    cell(out, isValid ? file.points().coordinate(frame, k, c) : Double.NaN);
                }
                cell(out, isValid ? file.points().residual(frame, k) : Double.NaN);
            }
            end(out);
        }
    }

    private double start() {
        return (file.firstFrame() - 1) / file.rate();
    }

    /** First analog sample of a frame. */
    private int sample(int frame) {
        return file.frames() == 0 ? 0 : frame * (file.analog().samples() / file.frames());
    }

    private void analog(Writer out) throws IOException {
        out.write("sample,time_s");
        for (String label : file.analogLabels()) {
            out.write("," + quoted(label));
        }
        end(out);
        if (hasUnitsRow) {
            out.write(",s");
            for (String unit : file.analogUnits()) {
                out.write("," + quoted(unit));
            }
            end(out);
        }
        for (int i = sample(window.first()); i < sample(window.last() + 1); i++) {
            out.write(Integer.toString(i + 1));
            cell(out, start() + i / file.analog().rate());
            for (int k = 0; k < file.analog().channels(); k++) {
                cell(out, file.analog().value(i, k));
            }
            end(out);
        }
    }

    private void loads(Writer out) throws IOException {
        Recording recording = file.toRecording();
        out.write("sample,time_s,platform,force_x,force_y,force_z,cop_x,cop_y,cop_z,free_moment");
        end(out);
        if (hasUnitsRow) {
            out.write(",s,,N,N,N,m,m,m,N m");
            end(out);
        }
        for (PlatformLoads p : recording.platforms()) {
            for (int i = sample(window.first()); i < Math.min(p.samples(), sample(window.last() + 1)); i++) {
                Vec3 f = p.force(i);
                boolean isLoaded = p.vertical(i) >= LOADED;
                Vec3 cop = isLoaded ? p.centreOfPressure(i) : new Vec3(Double.NaN, Double.NaN, Double.NaN);
                out.write(Integer.toString(i + 1));
                cell(out, p.time(i));
                out.write("," + p.number());
                cell(out, f.x());
                cell(out, f.y());
                cell(out, f.z());
                cell(out, cop.x());
                cell(out, cop.y());
                cell(out, cop.z());
                cell(out, isLoaded ? p.freeMoment(i) : Double.NaN);
                end(out);
            }
        }
    }

    private void events(Writer out) throws IOException {
        out.write("time_s,context,label,source");
        end(out);
        if (hasUnitsRow) {
            out.write("s,,,");
            end(out);
        }
        boolean isWhole = window.equals(FrameWindow.whole(file));
        for (RecordedEvent e : file.events()) {
            if (!isWhole
                    && !(e.time() >= FrameWindow.time(file, window.first())
                            && e.time() <= FrameWindow.time(file, window.last()))) {
                continue;
            }
            out.write(Double.toString(e.time()));
            out.write("," + quoted(e.context()) + "," + quoted(e.label()) + ","
                    + e.source().word());
            end(out);
        }
    }
}
