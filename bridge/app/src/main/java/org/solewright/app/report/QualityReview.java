package org.solewright.app.report;

import java.io.IOException;
import java.io.InputStreamReader;
import java.io.Reader;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Properties;
import java.util.Set;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.Severity;
import org.solewright.domain.gait.ContactRow;

/**
 * Sorts the findings of a call by what they are about, and says what they limit. The words stand in {@code
 * finding-limits.properties}: code, aspect, what is limited.
 */
final class QualityReview {

    /** Where a message is told whole, not by its first clause. */
    private static final String WHOLE = "{message}";

    private static final String RESOURCE = "finding-limits.properties";

    /** What is looked at, in the order of the page. */
    private enum Aspect {
        CONTACTS("Contacts on platforms"),
        POSES("Marker clusters and joint gaps"),
        LENGTHS("Limb and foot lengths"),
        PLATFORMS("Platforms: height, origin, drift"),
        MASS("Body mass"),
        STEADINESS("Steadiness of the walk"),
        SAMPLES("Recorded samples"),
        POPULATION("Population");

        private final String words;

        Aspect(String words) {
            this.words = words;
        }
    }

    private final Properties words = new Properties();
    private final Map<Aspect, Set<String>> seen = new EnumMap<>(Aspect.class);
    private final Map<Aspect, Set<String>> limits = new EnumMap<>(Aspect.class);
    private final Map<Aspect, Set<String>> noted = new EnumMap<>(Aspect.class);
    private final Map<Aspect, Set<String>> names = new EnumMap<>(Aspect.class);
    private final List<Quality.Usable> uses = new ArrayList<>();

    QualityReview() {
        try (Reader in = new InputStreamReader(
                Objects.requireNonNull(QualityReview.class.getResourceAsStream(RESOURCE), RESOURCE),
                StandardCharsets.UTF_8)) {
            words.load(in);
        } catch (IOException e) {
            throw new UncheckedIOException("a resource of our own cannot be read", e);
        }
        for (Aspect aspect : Aspect.values()) {
            seen.put(aspect, new LinkedHashSet<>());
            limits.put(aspect, new LinkedHashSet<>());
            noted.put(aspect, new LinkedHashSet<>());
            names.put(aspect, new LinkedHashSet<>());
        }
    }

    private static Set<String> of(Map<Aspect, Set<String>> all, Aspect aspect) {
        return Objects.requireNonNull(all.get(aspect));
    }

    /** Sorts findings in. */
    QualityReview findings(List<Finding> findings) {
        // One line for a sentence that holds at several places.
        Map<List<String>, List<String>> places = new LinkedHashMap<>();
        for (Finding f : findings) {
            String entry = words.getProperty(f.code());
            if (entry == null) {
                continue;
            }
            String[] parts = entry.split("\\|", -1);
            String message = parts[2].contains(WHOLE) ? f.message() : brief(f.message());
            String named = parts[2].strip().replace("{where}", f.where()).replace(WHOLE, "");
            String severity = f.severity() == Severity.NOTE ? "note" : "limit";
            places.computeIfAbsent(
                            List.of(severity, parts[0].strip(), message, parts[1].strip()), k -> new ArrayList<>())
                    .add(f.where());
            if (severity.equals("limit") && !named.isBlank()) {
                of(names, Aspect.valueOf(parts[0].strip())).add(named);
            }
        }
        places.forEach((what, where) -> {
            Aspect aspect = Aspect.valueOf(what.get(1));
            List<String> at =
                    where.stream().filter(w -> !w.isEmpty()).distinct().toList();
            String line = Words.typeset((at.isEmpty() ? "" : Words.list(at) + ": ") + what.get(2));
            if (what.get(0).equals("limit")) {
                of(seen, aspect).add(line);
                of(limits, aspect).add(what.get(3));
            } else if (aspect == Aspect.PLATFORMS) {
                of(noted, aspect).add(line);
            }
        });
        return this;
    }

    /** The first clause of a message, which has the numbers. */
    private static String brief(String message) {
        int end = message.length();
        for (String stop : List.of(": ", "; ", " (")) {
            int at = message.indexOf(stop);
            if (at > 0) {
                end = Math.min(end, at);
            }
        }
        return message.substring(0, end);
    }

    /** Says how many contacts are whole and names the others. */
    QualityReview contacts(List<ContactRow> contacts) {
        List<String> whole = new ArrayList<>();
        for (ContactRow c : contacts) {
            String name = c.trial() + " " + c.side().word();
            if (c.whole()) {
                whole.add(name);
            } else if (!c.platforms().isEmpty()) {
                of(seen, Aspect.CONTACTS)
                        .add(Words.typeset(name + ", platform "
                                + c.platforms().toString().replaceAll("[\\[\\]]", "") + ": " + brief(c.why())));
                of(limits, Aspect.CONTACTS)
                        .add("not used for "
                                + Words.list(c.notUsedFor().stream()
                                        .map(u -> u.word())
                                        .toList()) + " (" + name + ")");
                of(names, Aspect.CONTACTS).add(name + " not wholly on its platform");
            }
        }
        if (!contacts.isEmpty()) {
            of(noted, Aspect.CONTACTS)
                    .add(whole.size() + " of " + contacts.size() + " contacts are whole"
                            + (whole.isEmpty() ? "" : ": " + Words.list(whole)));
        }
        return this;
    }

    /** Where the mass comes from. */
    QualityReview mass(String source) {
        of(noted, Aspect.MASS).add(source);
        return this;
    }

    /** A question and whether it is answered. */
    QualityReview use(Quality.Usable use) {
        uses.add(use);
        return this;
    }

    Quality quality() {
        List<Quality.Aspect> aspects = new ArrayList<>();
        for (Aspect aspect : Aspect.values()) {
            List<String> lines = new ArrayList<>(of(noted, aspect));
            boolean isLimiting = !of(seen, aspect).isEmpty();
            lines.addAll(of(seen, aspect));
            aspects.add(new Quality.Aspect(
                    aspect.words,
                    isLimiting,
                    isLimiting ? "limits" : lines.isEmpty() ? "nothing found" : "noted",
                    lines,
                    List.copyOf(of(limits, aspect))));
        }
        List<String> named = new ArrayList<>();
        names.values().forEach(named::addAll);
        String summary = named.isEmpty()
                ? "Nothing was found that limits these recordings beyond the uncertainty printed with each number."
                : "These recordings are limited by: " + String.join("; ", named) + ".";
        return new Quality(Words.typeset(summary), aspects, uses);
    }
}
