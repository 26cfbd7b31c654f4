package org.solewright.formats.table;

import de.siegmar.fastcsv.writer.CsvWriter;
import de.siegmar.fastcsv.writer.LineDelimiter;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.OptionalDouble;

/** Rows of cells to the bytes of a delimited table. */
final class CsvText {

    private CsvText() {}

    static byte[] bytes(List<String> header, Iterable<List<String>> rows) {
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        try (CsvWriter csv = CsvWriter.builder().lineDelimiter(LineDelimiter.LF).build(out, StandardCharsets.UTF_8)) {
            csv.writeRecord(header);
            for (List<String> row : rows) {
                csv.writeRecord(row);
            }
        } catch (IOException e) {
            throw new IllegalStateException("writing to memory failed", e);
        }
        return out.toByteArray();
    }

    /** A number, empty where it is none. */
    static String number(double value) {
        return Double.isFinite(value) ? Double.toString(value) : "";
    }

    static String number(OptionalDouble value) {
        return number(value.orElse(Double.NaN));
    }
}
