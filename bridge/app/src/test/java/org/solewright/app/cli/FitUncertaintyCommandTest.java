package org.solewright.app.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;

/** The table of uncertainties that {@code fit} writes. */
class FitUncertaintyCommandTest extends DemoCalls {

    /** Rows by side and quantity: column to cell. */
    private static Map<String, Map<String, String>> table(Path dir) throws IOException {
        List<String> lines = Files.readAllLines(dir.resolve("fit-uncertainty.csv"));
        String[] columns = lines.get(0).split(",", -1);
        Map<String, Map<String, String>> rows = new LinkedHashMap<>();
        for (String line : lines.subList(1, lines.size())) {
            String[] cells = line.split(",", -1);
            Map<String, String> row = new LinkedHashMap<>();
            for (int i = 0; i < cells.length; i++) {
                row.put(columns[i], cells[i]);
            }
            rows.put(cells[0] + " " + cells[1], row);
        }
        return rows;
    }

    private Map<String, Map<String, String>> fitted(String name, String... more) throws IOException {
        Path dir = folder.resolve(name);
        List<String> args = new ArrayList<>(List.of(more));
        args.addAll(List.of("--out", dir.toString()));
        Called c = fit(args.toArray(String[]::new));
        assertThat(c.code()).as(c.err()).isZero();
        return table(dir);
    }

    @Test
    void sameSeedGivesTheSameBytesAndAnotherDoesNot() throws IOException {
        fitted("one", "--runs", "20", "--seed", "9");
        fitted("two", "--runs", "20", "--seed", "9");
        fitted("other", "--runs", "20", "--seed", "10");
        for (String file : List.of("fit-uncertainty.csv", "foot-model-right.xml")) {
            assertThat(folder.resolve("one").resolve(file))
                    .hasSameBinaryContentAs(folder.resolve("two").resolve(file));
        }
        assertThat(Files.mismatch(
                        folder.resolve("one").resolve("fit-uncertainty.csv"),
                        folder.resolve("other").resolve("fit-uncertainty.csv")))
                .isPositive();
    }

    @Test
    void oneStanceGivesNoIntervalAndSaysWithin() throws IOException {
        Map<String, Map<String, String>> rows = fitted("single", "--runs", "20");
        Map<String, String> curvature = rows.get("right arc.limb.curvature");
        assertThat(curvature).containsEntry("n", "1").containsEntry("stance_sd_is", "within");
        assertThat(curvature.get("low")).isEmpty();
        Map<String, String> foot = rows.get("right effective_foot_length");
        assertThat(foot.get("stance_sd")).isEmpty();
        assertThat(foot.get("measurement_sd")).isNotEmpty();
        // exact: two places of 5 mm along the foot; 20 runs scatter by a sixth of it, three times that is half.
        Map<String, String> length = rows.get("right foot_length");
        double scale = Double.parseDouble(rows.get("right limb_length").get("value")) / 0.9;
        assertThat(Double.parseDouble(length.get("sd"))).isBetween(0.0035 * scale, 0.0107 * scale);
        assertThat(length.get("low")).isNotEmpty();
    }

    @Test
    void withoutRunsNothingIsSaidOfPlacement() throws IOException {
        Map<String, Map<String, String>> rows = fitted("none", "--runs", "0");
        assertThat(rows.values()).allSatisfy(r -> {
            assertThat(r.get("measurement_sd")).isEmpty();
            assertThat(r.get("low")).isEmpty();
        });
        assertThat(fit("--runs", "-1").code()).isEqualTo(2);
    }

    @Test
    void anglesTellTheSmallestDifferenceWorthBelieving() throws IOException {
        Map<String, Map<String, String>> rows = fitted("two-walks", "--runs", "20", "--walking", at("walking-2.c3d"));
        List<Map<String, String>> angles = rows.values().stream()
                .filter(r ->
                        r.get("quantity").startsWith("angle.") && r.get("n").equals("2"))
                .toList();
        assertThat(angles).isNotEmpty().allSatisfy(r -> {
            // exact: 1.96 sqrt(2) SD; 1e-9 for the printed digits.
            double sd = Double.parseDouble(r.get("sd"));
            assertThat(Double.parseDouble(r.get("smallest_difference")))
                    .isBetween(2.7718 * sd - 1e-9, 2.7719 * sd + 1e-9);
            assertThat(r).containsEntry("stance_sd_is", "between").containsEntry("low", "");
        });
    }
}
