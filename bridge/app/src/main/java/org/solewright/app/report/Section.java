package org.solewright.app.report;

import java.util.List;

/**
 * A section of a page.
 *
 * @param id of its element, unique on the page
 * @param heading of it
 * @param blocks in order
 * @param isOnOneSheet whether it begins a sheet of paper of its own
 */
public record Section(String id, String heading, List<Block> blocks, boolean isOnOneSheet) {

    /** Copies the list. */
    public Section {
        blocks = List.copyOf(blocks);
    }
}
