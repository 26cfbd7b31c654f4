package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Collectors;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.geometry.Vec3;
import org.solewright.domain.motion.RecordedEvent;
import org.solewright.formats.c3d.C3dFile;
import org.solewright.formats.c3d.C3dParameter;
import org.solewright.formats.c3d.C3dPlatform;

/** A survey as a page to read: what the file holds, then what is wrong with it and what to do. */
final class SurveyPage {

    private static final int MOST_LISTED = 100;
    private static final int WIDTH = 100;

    private final Survey survey;
    private final C3dFile file;
    private final List<String> lines = new ArrayList<>();

    private SurveyPage(Survey survey) {
        this.survey = survey;
        this.file = survey.file();
    }

    static List<String> of(Survey survey) {
        SurveyPage page = new SurveyPage(survey);
        page.write();
        return page.lines;
    }

    private void write() {
        lines.add(survey.path().toString());
        lines.add("  " + file.processor().word() + ", " + (file.isReal() ? "real" : "integer") + " samples, "
                + survey.frames() + " frames from " + file.firstFrame() + " at " + number(file.rate()) + " Hz"
                + (file.rate() > 0 ? String.format(Locale.ROOT, " (%.3f s)", survey.frames() / file.rate()) : "")
                + ", lengths in " + (file.unit().isEmpty() ? "an unknown unit" : file.unit()));
        axes();
        groups();
        points();
        if (file.analog().channels() > 0) {
            listed(
                    file.analog().channels() + " analog channels at "
                            + number(file.analog().rate()) + " Hz: ",
                    file.analogLabels());
        }
        platforms();
        events();
        findings();
    }

    private void axes() {
        List<String> parts = new ArrayList<>();
        for (PlatformLoads p : survey.recording().platforms()) {
            parts.add("up is " + axis(p.up()) + " by platform " + p.number());
            break;
        }
        for (String name : List.of("X_SCREEN", "Y_SCREEN")) {
            file.parameters()
                    .find("POINT", name)
                    .filter(s -> !s.text(0).isBlank())
                    .ifPresent(s -> parts.add("POINT:" + name + " is " + s.text(0)));
        }
        if (!parts.isEmpty()) {
            lines.add("  " + String.join(", ", parts));
        }
    }

    private static String axis(Vec3 up) {
        for (String name : List.of("+x", "-x", "+y", "-y", "+z", "-z")) {
            Vec3 a = name.endsWith("x") ? Vec3.X : name.endsWith("y") ? Vec3.Y : Vec3.Z;
            if (up.dot(a.times(name.startsWith("-") ? -1 : 1)) > 0.99) {
                return name;
            }
        }
        return String.format(Locale.ROOT, "(%.2f %.2f %.2f)", up.x(), up.y(), up.z());
    }

    private void groups() {
        Map<String, Integer> counts = new LinkedHashMap<>();
        for (C3dParameter p : file.parameters().all()) {
            counts.merge(p.group(), 1, Integer::sum);
        }
        if (counts.isEmpty()) {
            lines.add("  no parameters: the header alone is used");
            return;
        }
        listed(
                "parameters by group: ",
                counts.entrySet().stream()
                        .map(e -> e.getKey() + " " + e.getValue())
                        .toList(),
                ", ");
    }

    private void points() {
        int n = file.points().points();
        Set<String> subjects = new TreeSet<>();
        for (String label : file.labels()) {
            int colon = label.indexOf(':');
            if (colon > 0) {
                subjects.add(label.substring(0, colon));
            }
        }
        String of = subjects.isEmpty()
                ? ""
                : " of " + (subjects.size() == 1 ? "subject " : "subjects ") + String.join(", ", subjects);
        if (file.frames() == 0) {
            listed(n + " points" + of + ": ", file.labels());
            return;
        }
        List<String> whole = new ArrayList<>();
        List<String> gapped = new ArrayList<>();
        for (Survey.Gaps g : survey.gaps()) {
            if (g.lost() == 0) {
                whole.add(g.label());
            } else {
                gapped.add(String.format(
                        Locale.ROOT,
                        "    %-16s lost in %d of %d frames, longest gap %d frames%s",
                        g.label(),
                        g.lost(),
                        file.frames(),
                        g.longest(),
                        file.rate() > 0 ? String.format(Locale.ROOT, " (%.3f s)", g.longest() / file.rate()) : ""));
            }
        }
        if (whole.isEmpty()) {
            lines.add("  " + n + " points" + of + (n == 0 ? "" : ", all with gaps:"));
        } else {
            listed(n + " points" + of + ", without gaps: ", whole);
        }
        lines.addAll(gapped.subList(0, Math.min(MOST_LISTED, gapped.size())));
        if (gapped.size() > MOST_LISTED) {
            lines.add("    ... and " + (gapped.size() - MOST_LISTED) + " more with gaps");
        }
    }

    private void platforms() {
        for (C3dPlatform p : file.platforms()) {
            lines.add(platform(p));
        }
        PlatformSketch.of(survey.recording().platforms()).forEach(l -> lines.add(l.isBlank() ? "" : "    " + l));
    }

    private String platform(C3dPlatform p) {
        List<Vec3> corners = survey.corners(p);
        double peak = survey.peakVertical(p.number());
        String where = corners.isEmpty()
                ? "not usable"
                : "corners "
                        + corners.stream()
                                .map(c -> String.format(Locale.ROOT, "(%.3f %.3f %.3f)", c.x(), c.y(), c.z()))
                                .collect(Collectors.joining(" "))
                        + " m"
                        + (Double.isNaN(peak) ? "" : String.format(Locale.ROOT, ", peak vertical %.1f N", peak));
        return "  platform " + p.number() + ", type " + p.type() + ": " + where;
    }

    private void events() {
        List<RecordedEvent> events = file.events();
        for (RecordedEvent e : events.subList(0, Math.min(MOST_LISTED, events.size()))) {
            lines.add(String.format(
                    Locale.ROOT,
                    "  event %.3f s %s%s (%s)",
                    e.time(),
                    e.context().isEmpty() ? "" : e.context() + " ",
                    e.label(),
                    e.source().word()));
        }
        if (events.size() > MOST_LISTED) {
            lines.add("  ... and " + (events.size() - MOST_LISTED) + " more events");
        }
    }

    private void findings() {
        FindingCures cures = FindingCures.read();
        lines.add("  " + (survey.findings().isEmpty() ? "no findings" : "findings:"));
        Set<String> told = new TreeSet<>();
        for (Finding f : survey.findings()) {
            lines.add("    " + f.severity().word() + " " + f.code()
                    + (f.where().isEmpty() ? "" : " (" + f.where() + ")") + ": " + f.message());
            if (told.add(f.code())) {
                cures.of(f.code()).ifPresent(c -> lines.add("      do: " + c));
            }
        }
    }

    private void listed(String head, List<String> words) {
        listed(head, words, " ");
    }

    private void listed(String head, List<String> words, String between) {
        List<String> shown = words.subList(0, Math.min(MOST_LISTED, words.size()));
        StringBuilder line = new StringBuilder("  ").append(head);
        int fresh = line.length();
        for (String word : shown) {
            if (line.length() > fresh && line.length() + word.length() > WIDTH) {
                lines.add(line.toString().stripTrailing());
                line = new StringBuilder("    ");
                fresh = line.length();
            }
            line.append(line.length() > fresh ? between : "").append(word);
        }
        lines.add(line.toString());
        if (words.size() > MOST_LISTED) {
            lines.add("    ... and " + (words.size() - MOST_LISTED) + " more");
        }
    }

    private static String number(double v) {
        return Double.isNaN(v) ? "unknown" : v == Math.rint(v) ? Long.toString((long) v) : Double.toString(v);
    }
}
