package org.solewright.formats.table;

import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
import org.solewright.domain.gait.CurveRow;
import org.solewright.formats.io.AtomicOutput;

/** The table of curves over steps and stances. */
public final class CurvesTable {

    private static final List<String> COLUMNS =
            List.of("trial", "step", "side", "curve", "unit", "percent", "mean", "sd", "n");

    private CurvesTable() {}

    /**
     * Writes the table; the same rows give the same bytes.
     *
     * @param file target, replaced as a whole
     * @param rows in the order they are printed
     * @throws IOException where it cannot be written
     */
    public static void write(Path file, List<CurveRow> rows) throws IOException {
        AtomicOutput.write(file, bytes(rows));
    }

    /**
     * The bytes that {@link #write} writes.
     *
     * @param rows in the order they are printed
     * @return UTF-8 text
     */
    public static byte[] bytes(List<CurveRow> rows) {
        return CsvText.bytes(
                COLUMNS,
                rows.stream()
                        .map(r -> List.of(
                                r.trial(),
                                r.step(),
                                r.side().word(),
                                r.curve(),
                                r.unit(),
                                CsvText.number(r.percent()),
                                CsvText.number(r.mean()),
                                CsvText.number(r.sd()),
                                Integer.toString(r.n())))
                        .toList());
    }
}
