package org.solewright.app.pipeline;

import java.nio.file.Path;
import java.util.Locale;
import java.util.Optional;
import org.solewright.domain.motion.RecordedEvent;
import org.solewright.formats.c3d.C3dFile;

/**
 * A part of a recording, from one frame to another.
 *
 * @param first zero-based
 * @param last zero-based, inclusive
 */
record FrameWindow(int first, int last) {

    private static final String FORMS =
            "give a frame number, a time such as 1.25s, or an event such as 'Right Foot Strike'";
    private static final double ROUNDING = 1e-6;

    /** The whole recording. */
    static FrameWindow whole(C3dFile file) {
        return new FrameWindow(0, file.frames() - 1);
    }

    /**
     * The part that options name. A frame is as numbered in the file; a time ends in {@code s}; an event is its label, or
     * context and label, the first of them, for the end the first after the beginning.
     *
     * @param path for messages
     * @param file the recording
     * @param from first frame
     * @param to last frame, inclusive
     * @return the part
     * @throws UseCaseException where an option names nothing of the recording
     */
    static FrameWindow of(Path path, C3dFile file, Optional<String> from, Optional<String> to) throws UseCaseException {
        FrameWindow whole = whole(file);
        if (file.frames() == 0 && (from.isPresent() || to.isPresent())) {
            throw new UseCaseException(
                    UseCaseException.Kind.USAGE,
                    path.toString(),
                    "has no frames to take a part of",
                    "leave --from and --to out");
        }
        int first = from.isPresent() ? frame(path, file, "--from", from.get(), whole.first, true) : whole.first;
        int last = to.isPresent() ? frame(path, file, "--to", to.get(), first, false) : whole.last;
        if (last < first) {
            throw new UseCaseException(
                    UseCaseException.Kind.USAGE,
                    path.toString(),
                    "--to frame " + (file.firstFrame() + last) + " is before --from frame "
                            + (file.firstFrame() + first),
                    "exchange them");
        }
        return new FrameWindow(first, last);
    }

    private static int frame(Path path, C3dFile file, String option, String text, int after, boolean isFirst)
            throws UseCaseException {
        double place;
        if (text.matches("\\d{1,9}")) {
            place = Integer.parseInt(text) - file.firstFrame();
        } else if (text.matches("-?\\d{1,9}(\\.\\d{1,12})?s")) {
            double exact =
                    Double.parseDouble(text.substring(0, text.length() - 1)) * file.rate() + 1 - file.firstFrame();
            place = isFirst ? Math.ceil(exact - ROUNDING) : Math.floor(exact + ROUNDING);
        } else {
            place = Math.rint(event(path, file, option, text, after) * file.rate() + 1 - file.firstFrame());
        }
        if (!(place >= 0 && place < file.frames())) {
            throw new UseCaseException(
                    UseCaseException.Kind.USAGE,
                    path.toString(),
                    option + " " + text + " is outside its frames " + file.firstFrame() + " to "
                            + (file.firstFrame() + file.frames() - 1),
                    FORMS);
        }
        return (int) place;
    }

    private static double event(Path path, C3dFile file, String option, String text, int after)
            throws UseCaseException {
        double least = (file.firstFrame() - 1 + after) / file.rate() - ROUNDING;
        String wanted = plain(text);
        return file.events().stream()
                .filter(e -> plain(e.label()).equals(wanted)
                        || plain(e.context() + " " + e.label()).equals(wanted))
                .mapToDouble(RecordedEvent::time)
                .filter(t -> t >= least)
                .min()
                .orElseThrow(() -> new UseCaseException(
                        UseCaseException.Kind.USAGE,
                        path.toString(),
                        option + " '" + text + "' names no event in it"
                                + (file.events().isEmpty() ? ", it has none" : ""),
                        FORMS));
    }

    private static String plain(String text) {
        return text.replace(':', ' ').trim().toLowerCase(Locale.ROOT);
    }

    /** Seconds of a frame on the file's clock. */
    static double time(C3dFile file, int frame) {
        return (file.firstFrame() - 1 + frame) / file.rate();
    }
}
