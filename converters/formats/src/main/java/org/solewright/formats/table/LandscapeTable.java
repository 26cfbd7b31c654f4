package org.solewright.formats.table;

import java.util.List;
import org.solewright.domain.cost.LandscapeRow;

/** The table of a limb's posture landscape, columns of {@link LandscapeRow#COLUMNS}. */
public final class LandscapeTable {

    private LandscapeTable() {}

    /**
     * The bytes of the table; the same rows give the same bytes.
     *
     * @param rows in the order they are printed
     * @return UTF-8 text
     */
    public static byte[] bytes(List<LandscapeRow> rows) {
        return CsvText.bytes(
                LandscapeRow.COLUMNS, rows.stream().map(LandscapeRow::cells).toList());
    }
}
