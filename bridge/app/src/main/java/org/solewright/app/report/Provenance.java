package org.solewright.app.report;

import java.util.ArrayList;
import java.util.List;
import org.solewright.domain.cost.PostureCost;
import org.solewright.domain.finding.SourceFile;

/** Where the numbers of a page come from: files with their hashes, options, version. */
final class Provenance {

    private Provenance() {}

    static Section section(List<SourceFile> sources, List<PostureCost.Setting> settings, String version) {
        List<Block> blocks = new ArrayList<>();
        List<Block.Row> files = new ArrayList<>();
        sources.forEach(s -> files.add(Block.Row.of(s.role(), PostureCostPage.fileName(s.path()), s.sha256())));
        blocks.add(new Block.Table("Files that were read", List.of("Role", "File", "SHA-256"), files, false));
        if (!settings.isEmpty()) {
            List<Block.Row> rows = new ArrayList<>();
            settings.forEach(s -> rows.add(Block.Row.of(s.name(), Words.typeset(s.value()), s.basis())));
            blocks.add(new Block.Table(
                    "Options; given by the user or default", List.of("Option", "Value", "Basis"), rows, false));
        }
        blocks.add(new Block.Text("Written by Solewright " + version
                + ". The same input gives the same page, byte for byte. Lengths in metres, works in joules, forward along"
                + " the walk, up against gravity."));
        return new Section("provenance", "Provenance", blocks, false);
    }
}
