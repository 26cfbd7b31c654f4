package org.solewright.formats.c3d;

import java.io.ByteArrayOutputStream;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import org.solewright.formats.io.FormatException;

/**
 * A parameter section to be written: the records of a file that was read, in their order, some of them replaced, some
 * added. What some readers choke on is not written: every group is declared, the last link is 0, the block count is right,
 * every record has a description.
 */
final class ParameterSection {

    private static final int BLOCK = 512;
    private static final int MOST_BLOCKS = 255;
    private static final int LARGEST_LINK = 65535;
    private static final int MOST_LINES = 255;
    private static final int MOST_GROUPS = 127;

    private final List<ParameterRecord> records = new ArrayList<>();
    private final Map<String, Integer> groups = new HashMap<>();
    private final Map<Integer, String> names = new HashMap<>();
    private final String source;

    private ParameterSection(String source) {
        this.source = source;
    }

    /** The records of a file; groups that it did not declare are declared. */
    static ParameterSection of(String source, C3dParameters parameters) {
        ParameterSection section = new ParameterSection(source);
        Map<Integer, String> declared = section.names;
        for (C3dParameters.Entry e : parameters.entries()) {
            if (e.id() < 0) {
                String name = e.name().trim().toUpperCase(Locale.ROOT);
                declared.put(-e.id(), name);
                section.groups.putIfAbsent(name, -e.id());
            }
        }
        for (C3dParameters.Entry e : parameters.entries()) {
            if (e.id() > 0 && !declared.containsKey(e.id())) {
                declared.put(e.id(), "GROUP_" + e.id());
                section.groups.put("GROUP_" + e.id(), e.id());
                section.records.add(ParameterRecord.group(e.id(), "GROUP_" + e.id(), "was not declared"));
            }
            section.records.add(ParameterRecord.of(e));
        }
        return section;
    }

    /** Makes sure that there is such a group and gives its number. */
    int group(String name, String description) throws FormatException {
        Integer known = groups.get(name);
        if (known != null) {
            return known;
        }
        int id = 1;
        while (names.containsKey(id)) {
            id++;
        }
        if (id > MOST_GROUPS) {
            throw new FormatException(
                    source, "has " + MOST_GROUPS + " groups already and none can be added", "leave --annotate out");
        }
        groups.put(name, id);
        names.put(id, name);
        records.add(ParameterRecord.group(id, name, description));
        return id;
    }

    /** A group may be declared under two numbers; its parameters are one group's all the same. */
    private int find(int group, String name) {
        for (int i = 0; i < records.size(); i++) {
            ParameterRecord r = records.get(i);
            if (isOf(r, group) && r.name().trim().toUpperCase(Locale.ROOT).equals(name)) {
                return i;
            }
        }
        return -1;
    }

    Optional<ParameterRecord> find(String group, String name) {
        Integer id = groups.get(group);
        int at = id == null ? -1 : find(id, name);
        return at < 0 ? Optional.empty() : Optional.of(records.get(at));
    }

    /** Replaces a parameter in its place, keeping its name, lock and description, or adds it after the others. */
    void put(ParameterRecord record) {
        int at = find(record.id(), record.name());
        if (at >= 0) {
            records.set(at, record.like(records.get(at)));
        } else {
            records.add(record);
        }
    }

    /** Replaces a parameter only where there is one. */
    void replace(ParameterRecord record) {
        if (find(record.id(), record.name()) >= 0) {
            put(record);
        }
    }

    void remove(String group, String name) {
        Integer id = groups.get(group);
        int at = id == null ? -1 : find(id, name);
        if (at >= 0) {
            records.remove(at);
        }
    }

    /** Numbers of the section, for checks before it is written. */
    List<ParameterRecord> records() {
        return List.copyOf(records);
    }

    /** Lines of text in pieces of 255: NAME, NAME2, ... */
    void putLines(int group, String name, String description, List<String> all) {
        for (int from = 0, k = 1; from < all.size(); from += MOST_LINES, k++) {
            put(ParameterRecord.texts(
                    group,
                    k == 1 ? name : name + k,
                    description,
                    all.subList(from, Math.min(all.size(), from + MOST_LINES))));
        }
    }

    /** Whether a record is a parameter of a group. */
    boolean isOf(ParameterRecord r, int group) {
        return r.id() > 0 && names.getOrDefault(r.id(), "").equals(names.getOrDefault(group, ""));
    }

    /** Refuses what no link reaches over. */
    void requireLinks() throws FormatException {
        for (ParameterRecord r : records) {
            if (r.bytesAfterName() > LARGEST_LINK) {
                throw new FormatException(
                        source,
                        "parameter " + r.plainName() + " takes " + r.bytesAfterName() + " bytes, more than the "
                                + LARGEST_LINK + " that a link reaches over",
                        "");
            }
        }
    }

    int blocks() {
        long bytes = 4;
        for (ParameterRecord r : records) {
            bytes += 2L + r.name().length() + r.bytesAfterName();
        }
        return (int) ((bytes + BLOCK - 1) / BLOCK);
    }

    /** The whole section, filled up to full blocks. */
    byte[] bytes(Processor processor) {
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        out.write(1);
        out.write(0x50);
        out.write(Math.min(MOST_BLOCKS, blocks()));
        out.write(processor.key());
        for (int i = 0; i < records.size(); i++) {
            write(out, records.get(i), processor, i == records.size() - 1);
        }
        byte[] section = new byte[blocks() * BLOCK];
        System.arraycopy(out.toByteArray(), 0, section, 0, out.size());
        return section;
    }

    private static void write(ByteArrayOutputStream out, ParameterRecord r, Processor processor, boolean isLast) {
        int next = r.bytesAfterName();
        ByteBuffer b = ByteBuffer.allocate(2 + r.name().length() + next)
                .order(processor == Processor.MIPS ? ByteOrder.BIG_ENDIAN : ByteOrder.LITTLE_ENDIAN);
        b.put((byte) (r.isLocked() ? -r.name().length() : r.name().length()));
        b.put((byte) r.id());
        b.put(r.name().getBytes(StandardCharsets.ISO_8859_1));
        b.putShort((short) (isLast ? 0 : next));
        if (r.width() != 0) {
            b.put((byte) r.width());
            b.put((byte) r.dimensions().size());
            r.dimensions().forEach(d -> b.put((byte) d.intValue()));
            b.put(r.text().getBytes(StandardCharsets.ISO_8859_1));
            for (double v : r.numbers()) {
                switch (r.width()) {
                    case 1 -> b.put((byte) v);
                    case 2 -> b.putShort((short) (int) v);
                    default -> b.putInt(WordOutput.word((float) v, processor));
                }
            }
        }
        b.put((byte) r.description().length());
        b.put(r.description().getBytes(StandardCharsets.ISO_8859_1));
        out.write(b.array(), 0, b.position());
    }
}
