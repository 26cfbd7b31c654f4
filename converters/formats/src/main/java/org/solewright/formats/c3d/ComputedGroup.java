package org.solewright.formats.c3d;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.motion.RecordedEvent;

/** Labels of computed points and events among those of a file, and a group of our own that says which they are. */
final class ComputedGroup {

    private static final String NAME = "SOLEWRIGHT";
    private static final int MOST = 255;

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

    void add() {
        int own = section.group(NAME, "Points and events that were computed, not recorded");
        List<String> labels =
                wanted.points().stream().map(p -> p.track().label()).toList();
        List<String> descriptions =
                wanted.points().stream().map(AddedPoint::description).toList();
        if (!labels.isEmpty()) {
            points("LABELS", "Names of the points", labels);
            points("DESCRIPTIONS", "What the points are", descriptions);
            lines(own, "POINTS", "Computed points, laboratory frame", labels);
            lines(own, "METHODS", "How each of them was computed", descriptions);
        }
        if (!wanted.events().isEmpty()) {
            events(own);
        }
    }

    private void lines(int group, String name, String description, List<String> all) {
        for (int from = 0, k = 1; from < all.size(); from += MOST, k++) {
            section.put(ParameterRecord.texts(
                    group,
                    k == 1 ? name : name + k,
                    description,
                    all.subList(from, Math.min(all.size(), from + MOST))));
        }
    }

    /** The file's own texts, blank where it has none, then those of the computed points. */
    private void points(String name, String description, List<String> added) {
        int point = section.group("POINT", "Points in space");
        List<String> all = new ArrayList<>(C3dParameter.joined(file.parameters().continued("POINT", name)));
        int own = file.points().points();
        while (all.size() < own) {
            all.add("");
        }
        all.subList(own, all.size()).clear();
        all.addAll(added);
        lines(point, name, description, all);
    }

    private void events(int own) {
        int event = section.group("EVENT", "Events");
        C3dParameters p = file.parameters();
        int used = (int) file.events().stream()
                .filter(e -> e.source() == RecordedEvent.Source.GROUP)
                .count();
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
        List<RecordedEvent> all = new ArrayList<>(file.events().stream()
                .filter(e -> e.source() == RecordedEvent.Source.GROUP)
                .toList());
        all.addAll(added);
        double[] times = new double[2 * all.size()];
        for (int k = 0; k < all.size(); k++) {
            times[2 * k] = Math.floor(all.get(k).time() / 60);
            times[2 * k + 1] = all.get(k).time() - 60 * times[2 * k];
        }
        section.put(ParameterRecord.integers(event, "USED", "Number of events", List.of(), all.size()));
        section.put(ParameterRecord.texts(
                event,
                "CONTEXTS",
                "Sides",
                all.stream().map(RecordedEvent::context).toList()));
        section.put(ParameterRecord.texts(
                event,
                "LABELS",
                "What happened",
                all.stream().map(RecordedEvent::label).toList()));
        section.put(ParameterRecord.reals(event, "TIMES", "Minutes and seconds", List.of(2, all.size()), times));
        extend(p.find("EVENT", "SUBJECTS"), event, "SUBJECTS", all.size());
        extend(p.find("EVENT", "DESCRIPTIONS"), event, "DESCRIPTIONS", all.size());
        section.put(ParameterRecord.integers(
                own, "EVENTS", "Computed events: the last so many of group EVENT", List.of(), added.size()));
    }

    private void extend(Optional<C3dParameter> texts, int group, String name, int count) {
        if (texts.isPresent()) {
            List<String> all = new ArrayList<>(texts.get().texts());
            while (all.size() < count) {
                all.add("");
            }
            section.put(ParameterRecord.texts(group, name, "", all.subList(0, count)));
        }
    }
}
