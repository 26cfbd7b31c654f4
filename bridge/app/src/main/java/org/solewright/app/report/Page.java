package org.solewright.app.report;

import java.util.List;

/**
 * A page in words, tables and drawings.
 *
 * @param kind what sort of page it is
 * @param title its heading
 * @param lead one sentence under the heading
 * @param facts who and what was measured
 * @param quality what limits the recordings and what they are usable for
 * @param findings all findings of the call, gravest first
 * @param sections in order
 * @param hasRoomForNotes whether there are lines for the notes of a licensed reader
 * @param cautions sentences that every reader must see
 */
public record Page(
        String kind,
        String title,
        String lead,
        List<Fact> facts,
        Quality quality,
        List<FindingGroup> findings,
        List<Section> sections,
        boolean hasRoomForNotes,
        List<String> cautions) {

    /**
     * Something to know about the measurement.
     *
     * @param name of it
     * @param text what it is
     */
    public record Fact(String name, String text) {}

    /** Copies the lists; a page without cautions is none. */
    public Page {
        facts = List.copyOf(facts);
        findings = List.copyOf(findings);
        sections = List.copyOf(sections);
        cautions = List.copyOf(cautions);
        if (cautions.isEmpty()) {
            throw new IllegalArgumentException("page '" + title + "' has no cautions, expected at least one");
        }
    }

    /**
     * Title of the document.
     *
     * @return kind and title
     */
    public String documentTitle() {
        return kind + ": " + title;
    }

    /** Whether a view that moves is on the page. */
    boolean hasScene() {
        return sections.stream().anyMatch(s -> s.blocks().stream().anyMatch(Block.Scene.class::isInstance));
    }
}
