package org.solewright.formats.table;

import java.util.List;
import org.solewright.domain.foot.FittedNumber;

/** The table of what is known of the uncertainty of a fitted foot. */
public final class UncertaintyTable {

    private static final List<String> COLUMNS = List.of(
            "side",
            "quantity",
            "unit",
            "basis",
            "value",
            "sd",
            "measurement_sd",
            "stance_sd",
            "stance_sd_is",
            "n",
            "low",
            "high",
            "smallest_difference");

    private UncertaintyTable() {}

    /**
     * The table's bytes; the same numbers give the same bytes.
     *
     * @param numbers in the order they are printed
     * @return UTF-8 text
     */
    public static byte[] bytes(List<FittedNumber> numbers) {
        return CsvText.bytes(
                COLUMNS,
                numbers.stream()
                        .map(r -> List.of(
                                r.side().word(),
                                r.quantity(),
                                r.unit(),
                                r.basis().word(),
                                CsvText.number(r.value()),
                                CsvText.number(r.sd()),
                                CsvText.number(r.measurementSd()),
                                CsvText.number(r.stanceSd()),
                                r.stanceSd().isEmpty() ? "" : r.isBetween() ? "between" : "within",
                                Integer.toString(r.n()),
                                CsvText.number(r.low()),
                                CsvText.number(r.high()),
                                CsvText.number(r.smallestDifference())))
                        .toList());
    }
}
