package org.solewright.formats.table;

import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
import org.solewright.domain.cost.PostureRow;
import org.solewright.formats.io.AtomicOutput;

/** The table of compared postures, columns of {@link PostureRow#COLUMNS}. */
public final class PosturesTable {

    private PosturesTable() {}

    /**
     * Writes the table; the same rows give the same bytes.
     *
     * @param file target, replaced as a whole
     * @param rows in the order they are printed
     * @throws IOException where it cannot be written
     */
    public static void write(Path file, List<PostureRow> rows) throws IOException {
        AtomicOutput.write(file, bytes(rows));
    }

    /**
     * The bytes that {@link #write} writes.
     *
     * @param rows in the order they are printed
     * @return UTF-8 text
     */
    public static byte[] bytes(List<PostureRow> rows) {
        return CsvText.bytes(
                PostureRow.COLUMNS, rows.stream().map(PostureRow::cells).toList());
    }
}
