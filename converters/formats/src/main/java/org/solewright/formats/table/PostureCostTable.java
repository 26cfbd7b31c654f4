package org.solewright.formats.table;

import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
import org.solewright.domain.cost.TransitionColumns;
import org.solewright.domain.cost.TransitionRow;
import org.solewright.formats.io.AtomicOutput;

/** The posture-cost table, columns of {@link TransitionColumns#ALL}. */
public final class PostureCostTable {

    private PostureCostTable() {}

    /**
     * Writes the table; the same rows give the same bytes.
     *
     * @param file target, replaced as a whole
     * @param rows in the order they are printed
     * @throws IOException where it cannot be written
     */
    public static void write(Path file, List<TransitionRow> rows) throws IOException {
        AtomicOutput.write(file, bytes(rows));
    }

    /**
     * The bytes that {@link #write} writes.
     *
     * @param rows in the order they are printed
     * @return UTF-8 text
     */
    public static byte[] bytes(List<TransitionRow> rows) {
        return CsvText.bytes(
                TransitionColumns.ALL,
                rows.stream()
                        .map(row -> TransitionColumns.ALL.stream()
                                .map(column -> row.text(column).orElse(""))
                                .toList())
                        .toList());
    }
}
