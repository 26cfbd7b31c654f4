package org.solewright.formats.c3d;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.solewright.domain.finding.Finding;

/**
 * How many frames a file has. The header counts in 16 bits; longer trials say it in parameters. Where they disagree the
 * file's size decides.
 */
final class FrameCount {

    private static final int FIELD = 65536;

    private FrameCount() {}

    /**
     * What the file says, the most explicit statement first. A header whose last frame is the largest that it can name says
     * nothing beside a parameter that says more.
     */
    private static List<Long> statements(C3dHeader header, C3dParameters p) {
        List<Long> said = new ArrayList<>();
        Optional<Long> from = field(p, "ACTUAL_START_FIELD");
        Optional<Long> to = field(p, "ACTUAL_END_FIELD");
        if (from.isPresent() && to.isPresent() && to.get() >= from.get()) {
            said.add(to.get() - from.get() + 1);
        }
        add(said, p.number("POINT", "LONG_FRAMES"));
        p.find("POINT", "FRAMES").ifPresent(f -> add(said, f.unsigned(0)));
        long counted = (long) header.lastFrame() - header.firstFrame() + 1;
        boolean isFull = header.lastFrame() == FIELD - 1 && said.stream().anyMatch(s -> s > counted);
        if (counted > 0 && !isFull) {
            said.add(counted);
        }
        return said;
    }

    private static void add(List<Long> said, double value) {
        if (value >= 1 && value < 1e12) {
            said.add((long) value);
        }
    }

    /** Two unsigned 16-bit words, low first. */
    private static Optional<Long> field(C3dParameters p, String name) {
        return p.find("TRIAL", name)
                .filter(f -> f.count() >= 2)
                .map(f -> (long) f.unsigned(0) + FIELD * (long) f.unsigned(1));
    }

    /** First frame: TRIAL's where its low word is the header's or the header cannot name it, else the header's. */
    static int first(C3dHeader header, C3dParameters p) {
        Optional<Long> from = field(p, "ACTUAL_START_FIELD");
        return from.filter(f -> f < Integer.MAX_VALUE
                        && (f % FIELD == header.firstFrame() || (f >= FIELD && header.firstFrame() == FIELD - 1)))
                .map(Long::intValue)
                .orElse(header.firstFrame());
    }

    static long declared(C3dHeader header, C3dParameters p) {
        List<Long> said = statements(header, p);
        return said.isEmpty() ? 0 : said.get(0);
    }

    /**
     * The count: of those that fit the file's size the one that fills it best, else the most explicit one.
     *
     * @param fits whole frames that the file has room for
     */
    static long of(C3dHeader header, C3dParameters p, long fits, List<Finding> findings) {
        List<Long> said = statements(header, p);
        if (said.isEmpty()) {
            return 0;
        }
        long best = -1;
        for (long s : said) {
            if (s <= fits && s > best) {
                best = s;
            }
        }
        if (said.stream().distinct().count() > 1) {
            findings.add(Finding.note(
                    "frames.disagree", "", "the file states frame counts of " + said + " and has room for " + fits));
        }
        return best >= 0 ? best : said.get(0);
    }
}
