package org.solewright.formats.c3d;

import java.util.ArrayList;
import java.util.Collection;
import java.util.Collections;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import org.solewright.domain.finding.Finding;
import org.solewright.formats.io.FormatException;

/**
 * The parameter section. The chain of links is followed to its end, not the block count, which is 0 or too small in real
 * files; a link that leaves the section ends the chain.
 */
public final class C3dParameters {

    private static final int BLOCK = 512;
    private static final int FIRST_RECORD = 4;
    private static final int MOST_CONTINUATIONS = 1000;

    private final Map<String, C3dParameter> parameters = new LinkedHashMap<>();
    private final List<Entry> entries = new ArrayList<>();

    /**
     * A record of the section as it lies in the file, for writing it back: a group (negative id) or a parameter.
     *
     * @param id of the group, negative for the group itself
     * @param name as stored
     * @param isLocked whether it is marked as not to be changed
     * @param description as stored
     * @param parameter the first of its name; empty for a group
     */
    record Entry(int id, String name, boolean isLocked, String description, Optional<C3dParameter> parameter) {}

    /** All groups and the first parameter of each name, in the file's order; text in ISO 8859-1, so byte for byte. */
    List<Entry> entries() {
        return Collections.unmodifiableList(entries);
    }

    private C3dParameters() {}

    /** An empty section. */
    static C3dParameters none() {
        return new C3dParameters();
    }

    /**
     * All parameters in the file's order, the first of each name.
     *
     * @return parameters
     */
    public Collection<C3dParameter> all() {
        return Collections.unmodifiableCollection(parameters.values());
    }

    /**
     * A parameter.
     *
     * @param group upper case
     * @param name upper case
     * @return the first of that name; empty where there is none
     */
    public Optional<C3dParameter> find(String group, String name) {
        return Optional.ofNullable(parameters.get(group + ":" + name));
    }

    /** NAME, NAME2, NAME3, ... as far as they go. */
    List<C3dParameter> continued(String group, String name) {
        List<C3dParameter> parts = new ArrayList<>();
        find(group, name).ifPresent(parts::add);
        for (int k = 2; k < MOST_CONTINUATIONS && !parts.isEmpty(); k++) {
            Optional<C3dParameter> next = find(group, name + k);
            if (next.isEmpty()) {
                break;
            }
            parts.add(next.get());
        }
        return parts;
    }

    /** First number of a parameter; NaN where it is missing. */
    double number(String group, String name) {
        return find(group, name).map(p -> p.number(0)).orElse(Double.NaN);
    }

    /**
     * Reads the section.
     *
     * @param cursor in the file's processor
     * @param block first block of the section, 1-based
     * @param dataBlock first block of the data, 1-based, as the header says
     * @param findings receives what has to be said
     */
    static C3dParameters read(ByteCursor cursor, int block, int dataBlock, List<Finding> findings)
            throws FormatException {
        return new Reader(cursor, block, dataBlock, findings).read();
    }

    /** One record as it lies in the file. */
    private record Raw(
            int group,
            String name,
            String storedName,
            boolean isLocked,
            int type,
            List<Integer> dimensions,
            int data,
            int end) {}

    /** Reads records; group names may come after their parameters. */
    private static final class Reader {
        private final ByteCursor cursor;
        private final List<Finding> findings;
        private final int start;
        private final int end;
        private final Map<Integer, String> groups = new HashMap<>();
        private final List<Raw> raws = new ArrayList<>();

        Reader(ByteCursor cursor, int block, int dataBlock, List<Finding> findings) {
            this.cursor = cursor;
            this.findings = findings;
            this.start = (block - 1) * BLOCK;
            long data = (dataBlock - 1L) * BLOCK;
            this.end = data > start && data < cursor.length() ? (int) data : cursor.length();
        }

        C3dParameters read() throws FormatException {
            records();
            C3dParameters section = new C3dParameters();
            int repeated = 0;
            for (Raw raw : raws) {
                if (raw.group() < 0) {
                    section.entries.add(new Entry(
                            raw.group(),
                            raw.storedName(),
                            raw.isLocked(),
                            description(raw.data(), raw.end()),
                            Optional.empty()));
                    continue;
                }
                String group = groups.getOrDefault(raw.group(), "GROUP_" + raw.group());
                String key = group + ":" + raw.name();
                if (section.parameters.containsKey(key)) {
                    repeated++;
                } else {
                    C3dParameter value = value(group, raw);
                    section.parameters.put(key, value);
                    section.entries.add(new Entry(
                            raw.group(),
                            raw.storedName(),
                            raw.isLocked(),
                            description(raw.data() + value.storedBytes(), raw.end()),
                            Optional.of(value)));
                }
            }
            if (repeated > 0) {
                findings.add(Finding.warning(
                        "parameters.repeated",
                        "",
                        repeated + " parameters repeat the name of an earlier one; the first of each stands"));
            }
            return section;
        }

        private void records() throws FormatException {
            int at = start + FIRST_RECORD;
            while (at + 2 <= end) {
                int signed = cursor.i8(at);
                int length = Math.abs(signed);
                int id = cursor.i8(at + 1);
                if (length == 0 || id == 0 || at + 2 + length + 2 > end) {
                    return;
                }
                int link = at + 2 + length;
                int offset = cursor.u16(link);
                int next = link + offset;
                boolean isLast = offset == 0;
                boolean isOut = next > end || (offset < 2 && !isLast);
                int limit = isLast || isOut ? end : next;
                String name = cursor.text(at + 2, length).trim().toUpperCase(Locale.ROOT);
                if (id < 0) {
                    if (groups.putIfAbsent(-id, name) == null) {
                        raws.add(new Raw(
                                id, name, cursor.latin(at + 2, length), signed < 0, 0, List.of(), link + 2, limit));
                    }
                } else {
                    parameter(id, name, cursor.latin(at + 2, length), signed < 0, link + 2, limit);
                }
                if (isLast) {
                    return;
                }
                if (isOut) {
                    findings.add(Finding.warning(
                            "parameters.link",
                            "",
                            "the link of " + name + " at byte " + link
                                    + " leaves the parameter section; the chain ends there"));
                    return;
                }
                at = next;
            }
        }

        /** Text after a value: its length in a byte, then its bytes; empty where it is missing or cut. */
        private String description(int at, int limit) throws FormatException {
            if (at >= limit) {
                return "";
            }
            int length = cursor.u8(at);
            return at + 1 + length <= limit ? cursor.latin(at + 1, length) : "";
        }

        private void parameter(int id, String name, String storedName, boolean isLocked, int at, int limit)
                throws FormatException {
            if (at + 2 > limit) {
                return;
            }
            int type = cursor.i8(at);
            int count = cursor.u8(at + 1);
            List<Integer> dimensions = new ArrayList<>();
            int data = at + 2 + count;
            if (data > limit) {
                findings.add(cut(name, at));
                return;
            }
            for (int k = 0; k < count; k++) {
                dimensions.add(cursor.u8(at + 2 + k));
            }
            raws.add(new Raw(id, name, storedName, isLocked, type, dimensions, data, limit));
        }

        private static Finding cut(String name, int at) {
            return Finding.warning(
                    "parameters.cut",
                    "",
                    "the value of " + name + " at byte " + at + " runs past its link; it is cut there");
        }

        private C3dParameter value(String group, Raw raw) throws FormatException {
            int width = raw.type() == 2 || raw.type() == 4 || raw.type() == 1 ? raw.type() : -1;
            int size = Math.abs(width);
            long room = Math.max(0, (raw.end() - raw.data()) / size);
            long count = 1;
            for (int d : raw.dimensions()) {
                // Up to 255 dimensions of up to 255: the product is held just above what there is room for.
                count = d == 0 ? 0 : Math.min(count, room + 1) * d;
            }
            if (count > room) {
                findings.add(cut(group + ":" + raw.name(), raw.data()));
                count = room;
            }
            if (width == -1) {
                return new C3dParameter(
                        group,
                        raw.name(),
                        width,
                        raw.dimensions(),
                        new double[0],
                        lines(raw, (int) count),
                        cursor.latin(raw.data(), (int) count));
            }
            double[] numbers = new double[(int) count];
            for (int i = 0; i < numbers.length; i++) {
                int at = raw.data() + i * size;
                numbers[i] = switch (width) {
                    case 1 -> cursor.i8(at);
                    case 2 -> cursor.i16(at);
                    default -> cursor.f32(at);
                };
            }
            return new C3dParameter(group, raw.name(), width, raw.dimensions(), numbers, List.of(), "");
        }

        private List<String> lines(Raw raw, int count) throws FormatException {
            List<String> lines = new ArrayList<>();
            if (raw.dimensions().size() < 2) {
                lines.add(cursor.text(raw.data(), count));
                return lines;
            }
            int width = raw.dimensions().get(0);
            for (int at = 0; width > 0 && at + width <= count; at += width) {
                lines.add(cursor.text(raw.data() + at, width).trim());
            }
            return lines;
        }
    }
}
