package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;
import org.solewright.analysis.gait.Pass;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.gait.Side;
import org.solewright.domain.gait.Stance;
import org.solewright.domain.motion.RecordedEvent;
import org.solewright.domain.motion.Recording;

/** Contact times from platforms beside those that the file states and those that kinematics shows. */
final class EventTimes {

    /** Where the times of contacts come from. */
    enum Source {
        PLATFORM,
        FILE,
        KINEMATIC;

        static Optional<Source> ofWord(String word) {
            for (Source s : values()) {
                if (s.name().toLowerCase(Locale.ROOT).equals(word)) {
                    return Optional.of(s);
                }
            }
            return Optional.empty();
        }
    }

    /** Farther apart two events are not the same. */
    private static final double SAME = 0.15;
    /** Frames by which the same event may be told differently. */
    private static final double NEAR = 2;

    private EventTimes() {}

    /**
     * Takes the times of contacts from the wanted source where it has them, and says where the file's own differ.
     *
     * @param source where times come from
     * @param pass stances as platforms saw them
     * @param recording the file's events
     * @return the pass with its times
     */
    static Pass apply(Source source, Pass pass, Recording recording) {
        List<Finding> findings = new ArrayList<>();
        List<Stance> judged = new ArrayList<>();
        for (Stance stance : pass.stances()) {
            OptionalDouble strike = nearest(recording, stance.side(), true, stance.start());
            OptionalDouble off = nearest(recording, stance.side(), false, stance.end());
            say(pass, stance, recording, "contact", stance.start(), strike, findings);
            say(pass, stance, recording, "foot-off", stance.end(), off, findings);
            judged.add(
                    switch (source) {
                        case PLATFORM -> stance;
                        case FILE -> timed(stance, strike, off);
                        case KINEMATIC -> timed(stance, pass.kinematicContact(stance), pass.kinematicOff(stance));
                    });
        }
        return pass.judged(judged, findings);
    }

    private static Stance timed(Stance s, OptionalDouble start, OptionalDouble end) {
        double from = start.orElse(s.start());
        double to = end.orElse(s.end());
        return to > from
                ? new Stance(s.trial(), s.side(), s.platforms(), from, to, s.whole(), s.notUsedFor(), s.why())
                : s;
    }

    private static void say(
            Pass pass,
            Stance stance,
            Recording recording,
            String what,
            double ours,
            OptionalDouble theirs,
            List<Finding> findings) {
        if (theirs.isPresent() && Math.abs(theirs.getAsDouble() - ours) * recording.rate() > NEAR) {
            findings.add(Finding.warning(
                    "events.differ",
                    pass.trial().name() + " " + stance.side().word(),
                    String.format(
                            Locale.ROOT,
                            "the file puts the %s at %.3f s, the platform at %.3f s: %.0f frames apart",
                            what,
                            theirs.getAsDouble(),
                            ours,
                            Math.abs(theirs.getAsDouble() - ours) * recording.rate())));
        }
    }

    /** The file's event of that foot and kind nearest to a time. */
    private static OptionalDouble nearest(Recording recording, Side side, boolean isStrike, double time) {
        return recording.events().stream()
                .filter(e -> isOf(e, side) && isStrike(e) == isStrike && (isStrike || isOff(e)))
                .mapToDouble(RecordedEvent::time)
                .filter(t -> Math.abs(t - time) < SAME)
                .boxed()
                .min((a, b) -> Double.compare(Math.abs(a - time), Math.abs(b - time)))
                .map(OptionalDouble::of)
                .orElse(OptionalDouble.empty());
    }

    /** common practice: events are named after the foot, spelled out or by its letter, as R, RHS, Right. */
    private static boolean isOf(RecordedEvent e, Side side) {
        String text = e.context().isBlank() ? e.label() : e.context();
        return !text.isBlank()
                && text.trim().substring(0, 1).equalsIgnoreCase(side.word().substring(0, 1));
    }

    /** common practice: Foot Strike, Heel Strike, Initial Contact, FS, HS, IC with or without the foot's letter. */
    private static boolean isStrike(RecordedEvent e) {
        String label = e.label().toLowerCase(Locale.ROOT).trim();
        return label.contains("strike") || label.contains("contact") || label.matches("[lr]?(fs|hs|ic)");
    }

    /** common practice: Foot Off, Toe Off, FO, TO with or without the foot's letter. */
    private static boolean isOff(RecordedEvent e) {
        String label = e.label().toLowerCase(Locale.ROOT).trim();
        return label.endsWith("off") || label.matches("[lr]?(fo|to)");
    }
}
