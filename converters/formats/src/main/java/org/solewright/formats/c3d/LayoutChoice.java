package org.solewright.formats.c3d;

import java.util.ArrayList;
import java.util.List;
import org.solewright.domain.finding.Finding;
import org.solewright.formats.io.FormatException;

/**
 * Where the samples lie. Header and parameters each state it; where they disagree the file's size decides, and where it
 * does not tell: POINT:SCALE over the header's scale, the header's analog samples per frame over the rounded ratio of the
 * rates, ANALOG:USED over the header's words, the header's points and data block over POINT:USED and POINT:DATA_START.
 */
final class LayoutChoice {

    private static final int BLOCK = 512;
    private static final int MOST_POINTS = 65535;
    private static final double MOST_PER_FRAME = 1e4;

    private final String source;
    private final C3dHeader header;
    private final C3dParameters p;
    private final long size;
    private final List<Finding> findings;

    LayoutChoice(String source, C3dHeader header, C3dParameters parameters, long size, List<Finding> findings) {
        this.source = source;
        this.header = header;
        this.p = parameters;
        this.size = size;
        this.findings = findings;
    }

    /** The scale of integer samples and of residuals; negative where samples are reals. */
    static float scale(C3dHeader header, C3dParameters p) {
        double stored = p.number("POINT", "SCALE");
        return Double.isFinite(stored) && stored != 0 ? (float) stored : header.scale();
    }

    /** The layout with its whole frames, each inside the file. */
    DataLayout choose() throws FormatException {
        List<DataLayout> candidates = candidates();
        long frames = FrameCount.declared(header, p);
        DataLayout best = candidates.get(0);
        for (DataLayout candidate : candidates) {
            if (misfit(candidate, frames) < misfit(best, frames)) {
                best = candidate;
            }
        }
        say(best);
        return withFrames(best);
    }

    private List<DataLayout> candidates() {
        List<DataLayout> all = new ArrayList<>();
        for (boolean isReal : storages()) {
            for (int block : blocks()) {
                int start = (int) Math.min((Math.max(1, block) - 1L) * BLOCK, size);
                for (int points : points()) {
                    for (int perFrame : perFrame()) {
                        for (int channels : channels(perFrame)) {
                            all.add(new DataLayout(start, 0, points, channels, perFrame, isReal));
                        }
                    }
                }
            }
        }
        return all;
    }

    private List<Boolean> storages() {
        boolean isReal = scale(header, p) < 0;
        float other = header.scale();
        boolean isOther = other < 0;
        return other != 0 && Float.isFinite(other) && isOther != isReal ? List.of(isReal, isOther) : List.of(isReal);
    }

    private List<Integer> blocks() {
        int byHeader = header.dataBlock();
        double stored = p.find("POINT", "DATA_START").map(d -> d.unsigned(0)).orElse(Double.NaN);
        int byParameter = stored >= 2 ? (int) stored : byHeader;
        return byHeader < 1
                ? List.of(byParameter)
                : byParameter == byHeader ? List.of(byHeader) : List.of(byHeader, byParameter);
    }

    private List<Integer> points() {
        int byHeader = header.points();
        double used = p.find("POINT", "USED").map(u -> u.unsigned(0)).orElse(Double.NaN);
        return used >= 0 && used <= MOST_POINTS && used != byHeader ? List.of(byHeader, (int) used) : List.of(byHeader);
    }

    private List<Integer> perFrame() {
        int byHeader = header.analogPerFrame();
        double ratio = p.number("ANALOG", "RATE") / p.number("POINT", "RATE");
        int byRates = ratio >= 1 && ratio < MOST_PER_FRAME ? (int) Math.round(ratio) : 0;
        if (byHeader == 0) {
            return List.of(byRates > 0 ? byRates : header.analogWords() > 0 ? 1 : 0);
        }
        return byRates > 0 && byRates != byHeader ? List.of(byHeader, byRates) : List.of(byHeader);
    }

    private List<Integer> channels(int perFrame) {
        int byWords = header.analogWords() / Math.max(1, perFrame);
        double used = p.find("ANALOG", "USED").map(u -> u.unsigned(0)).orElse(Double.NaN);
        if (!(used >= 0)) {
            return List.of(byWords);
        }
        return used * perFrame == header.analogWords() ? List.of((int) used) : List.of((int) used, byWords);
    }

    /** By how many blocks the frames miss the file's end; the last block may be padded. */
    private long misfit(DataLayout layout, long frames) {
        long over = size - layout.start() - frames * layout.frameBytes();
        return over < 0 ? 1 - over / BLOCK : over / BLOCK;
    }

    private void say(DataLayout chosen) {
        List<Integer> blocks = blocks();
        if (blocks.size() > 1) {
            findings.add(Finding.warning(
                    "data.start",
                    "",
                    "the header puts the data at block " + blocks.get(0) + ", POINT:DATA_START at block "
                            + blocks.get(1) + "; block " + (chosen.start() / BLOCK + 1) + " is read"));
        }
        if (storages().size() > 1) {
            findings.add(Finding.warning(
                    "points.scale",
                    "",
                    "the header's scale says " + storage(header.scale() < 0) + " samples, POINT:SCALE "
                            + storage(scale(header, p) < 0) + "; they are read as " + storage(chosen.isReal())));
        }
        if (points().size() > 1) {
            findings.add(Finding.warning(
                    "points.count",
                    "",
                    "the header says " + points().get(0) + " points per frame, POINT:USED " + points().get(1) + "; "
                            + chosen.points() + " are read"));
        }
        int perFrame = perFrame().get(0);
        if (perFrame().size() > 1) {
            findings.add(Finding.warning(
                    "analog.rate",
                    "",
                    "the header says " + perFrame + " analog samples per frame, the rates "
                            + perFrame().get(1) + "; " + chosen.analogPerFrame() + " are read"));
        }
        List<Integer> channels = channels(perFrame);
        if (channels.size() > 1) {
            findings.add(Finding.warning(
                    "analog.count",
                    "",
                    "the header says " + header.analogWords() + " analog words per frame, the parameters "
                            + channels.get(0) + " channels of " + perFrame + " samples; " + chosen.channels()
                            + " channels are read"));
        }
    }

    private static String storage(boolean isReal) {
        return isReal ? "real" : "integer";
    }

    private DataLayout withFrames(DataLayout layout) throws FormatException {
        long room = Math.max(0, size - layout.start());
        long bytes = layout.frameBytes();
        if (bytes == 0) {
            if (p.all().isEmpty()) {
                throw new FormatException(
                        source, "has neither parameters nor frames", "get a complete copy of the file");
            }
            return layout;
        }
        long fits = room / bytes;
        long count = FrameCount.of(header, p, fits, findings);
        if (count > fits) {
            if (fits == 0 && p.all().isEmpty()) {
                throw new FormatException(
                        source,
                        "ends at byte " + size + " before its first frame at byte " + layout.start(),
                        "get a complete copy of the file");
            }
            String message = "the file says " + count + " frames and ends after " + fits + " whole ones";
            findings.add(
                    fits == 0
                            ? Finding.error("file.truncated", "", message)
                            : Finding.warning("file.truncated", "", message));
            count = fits;
        } else if (room - count * bytes >= BLOCK) {
            findings.add(Finding.note(
                    "file.surplus", "", (room - count * bytes) + " bytes follow the last frame and are not read"));
        }
        return layout.withFrames((int) count);
    }
}
