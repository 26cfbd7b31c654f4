package org.solewright.formats.c3d;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.List;
import java.util.Locale;
import java.util.Set;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.motion.RecordedEvent;
import org.solewright.formats.io.FormatException;

/** Labels of computed points and events among those of a file, and a group of our own that says which they are. */
final class ComputedGroup {

    private static final String NAME = "SOLEWRIGHT";
    private static final int MOST = 255;
    private static final int SECONDS = 60;
    private static final Set<String> KNOWN = Set.of("USED", "TIMES", "CONTEXTS", "LABELS");

    private final C3dFile file;
    private final C3dCopy.Wanted wanted;
    private final ParameterSection section;
    private final List<Finding> findings;

    ComputedGroup(C3dFile file, C3dCopy.Wanted wanted, ParameterSection section, List<Finding> findings) {
        this.file = file;
        this.wanted = wanted;
        this.section = section;
        this.findings = findings;
    }

    void add() throws FormatException {
        int own = section.group(NAME, "Points and events that were computed, not recorded");
        List<String> labels =
                wanted.points().stream().map(p -> p.track().label()).toList();
        List<String> descriptions =
                wanted.points().stream().map(AddedPoint::description).toList();
        if (!labels.isEmpty()) {
            points("LABELS", "Names of the points", labels);
            points("DESCRIPTIONS", "What the points are", descriptions);
            section.putLines(own, "POINTS", "Computed points, laboratory frame, unit as POINT:UNITS", labels);
            section.putLines(own, "METHODS", "How each of them was computed", descriptions);
        }
        if (!wanted.events().isEmpty()) {
            events(own);
        }
    }

    /** The file's own texts, blank where it has none, then those of the computed points. */
    private void points(String name, String description, List<String> added) throws FormatException {
        int point = section.group("POINT", "Points in space");
        List<String> all = new ArrayList<>(C3dParameter.joined(file.parameters().continued("POINT", name)));
        int own = file.points().points();
        while (all.size() < own) {
            all.add("");
        }
        all.subList(own, all.size()).clear();
        all.addAll(added);
        section.putLines(point, name, description, all);
    }

    /** The entries of the group EVENT stay byte for byte; the computed ones come behind them. */
    private void events(int own) throws FormatException {
        int event = section.group("EVENT", "Events");
        int used = file.countedEvents();
        int room = Math.max(0, MOST - used);
        List<RecordedEvent> added =
                wanted.events().subList(0, Math.min(room, wanted.events().size()));
        if (added.size() < wanted.events().size()) {
            findings.add(Finding.warning(
                    "events.no-room",
                    "EVENT",
                    (wanted.events().size() - added.size()) + " computed events do not fit beside the file's " + used
                            + ": the format holds 255"));
        }
        if (added.isEmpty()) {
            return;
        }
        List<String> contexts = added.stream().map(RecordedEvent::context).toList();
        List<String> labels = added.stream().map(RecordedEvent::label).toList();
        extend(
                event,
                used,
                contexts.stream().map(ParameterRecord::stored).toList(),
                labels.stream().map(ParameterRecord::stored).toList());
        double[] times = Arrays.copyOf(
                section.find("EVENT", "TIMES")
                        .map(t -> t.numbers().stream()
                                .mapToDouble(Double::doubleValue)
                                .toArray())
                        .orElse(new double[0]),
                2 * (used + added.size()));
        double[] seconds = new double[added.size()];
        for (int k = 0; k < added.size(); k++) {
            seconds[k] = added.get(k).time();
            times[2 * (used + k)] = Math.floor(seconds[k] / SECONDS);
            times[2 * (used + k) + 1] = seconds[k] - SECONDS * times[2 * (used + k)];
        }
        int all = used + added.size();
        section.put(ParameterRecord.integers(event, "USED", "Number of events", List.of(), all));
        section.put(ParameterRecord.reals(event, "TIMES", "Minutes and seconds", List.of(2, all), times));
        section.put(ParameterRecord.integers(
                own, "EVENTS", "Computed events: the last so many of group EVENT", List.of(), added.size()));
        section.putLines(own, "EVENT_CONTEXTS", "Side of each computed event", contexts);
        section.putLines(own, "EVENT_LABELS", "Computed events: contacts of the feet as found", labels);
        section.put(ParameterRecord.reals(
                own, "EVENT_TIMES", "Seconds; frame n is at (n - 1) / POINT:RATE", List.of(seconds.length), seconds));
    }

    /** Whatever has one entry per event gets entries for the computed ones: their words, else blanks and zeros. */
    private void extend(int event, int used, List<String> contexts, List<String> labels) {
        List<String> blanks = Collections.nCopies(labels.size(), "");
        for (ParameterRecord r : section.records()) {
            String name = r.name().trim().toUpperCase(Locale.ROOT);
            boolean isPerEvent = used > 0
                    && !r.dimensions().isEmpty()
                    && r.dimensions().get(r.dimensions().size() - 1) == used;
            if (!section.isOf(r, event) || !isPerEvent || KNOWN.contains(name)) {
                continue;
            }
            if (r.width() < 0 && r.dimensions().size() == 2) {
                section.put(r.withLines(used, blanks));
            } else if (r.width() > 0 && r.dimensions().size() == 1) {
                section.put(r.withZeros(labels.size()));
            }
        }
        section.put(joined(event, "CONTEXTS", "Sides", used).withLines(used, contexts));
        section.put(joined(event, "LABELS", "What happened", used).withLines(used, labels));
    }

    /** The lines of NAME, NAME2, ... in one parameter, byte for byte. */
    private ParameterRecord joined(int event, String name, String description, int used) {
        ParameterRecord all = ParameterRecord.texts(event, name, description, List.of());
        int lines = 0;
        for (C3dParameter p : file.parameters().continued("EVENT", name)) {
            all = all.withLines(lines, ParameterRecord.linesOf(p));
            lines += p.count();
        }
        return all.withLines(Math.min(lines, used), Collections.nCopies(Math.max(0, used - lines), ""));
    }
}
