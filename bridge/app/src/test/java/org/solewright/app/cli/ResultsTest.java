package org.solewright.app.cli;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;

/** Results in delimited tables, by column maps: the demo's walk as tables, open gait data, bad maps and tables. */
class ResultsTest extends DemoCalls {

    private static final Map<String, String> LANDMARKS = new LinkedHashMap<>();

    static {
        LANDMARKS.put("heel", "calcaneus_posterior");
        LANDMARKS.put("metatarsal1_head", "metatarsal_1_head");
        LANDMARKS.put("metatarsal5_head", "metatarsal_5_head");
        LANDMARKS.put("metatarsal2_head", "metatarsal_2_head");
        LANDMARKS.put("asis", "asis");
        LANDMARKS.put("psis", "psis");
        LANDMARKS.put("greater_trochanter", "trochanter_major");
        LANDMARKS.put("lateral_malleolus", "malleolus_lateral");
        LANDMARKS.put("medial_malleolus", "malleolus_medial");
    }

    private static Optional<Path> gait() {
        for (Path p = Path.of("").toAbsolutePath(); p != null; p = p.getParent()) {
            if (Files.isRegularFile(p.resolve("shared/gait/walk1_forces.csv"))) {
                return Optional.of(p.resolve("shared/gait"));
            }
        }
        return Optional.empty();
    }

    private static String column(String name, String quantity, String of, String side, String axis, String unit) {
        return "    <column name=\"" + name + "\" quantity=\"" + quantity + "\"" + attribute("of", of)
                + attribute("side", side) + attribute("axis", axis) + " unit=\"" + unit + "\"/>\n";
    }

    private static String attribute(String name, String value) {
        return value.isEmpty() ? "" : " " + name + "=\"" + value + "\"";
    }

    private static String walkMap(Path data) {
        StringBuilder xml = new StringBuilder("<results xmlns=\"urn:solewright:results:1\">\n"
                + "  <axes x=\"forward\" y=\"up\" z=\"right\"/>\n"
                + "  <table file=\"" + data.resolve("walk1_markers.csv") + "\" timeColumn=\"time_s\">\n");
        for (String side : List.of("right", "left")) {
            LANDMARKS.forEach((recorded, landmark) -> {
                for (String axis : List.of("x", "y", "z")) {
                    xml.append(column(
                            side + "_" + recorded + "_" + axis + "_mm", "point-position", landmark, side, axis, "mm"));
                }
            });
        }
        xml.append("  </table>\n  <table timeColumn=\"time_s\">\n");
        for (int p = 1; p <= 7; p++) {
            for (String axis : List.of("x", "y", "z")) {
                xml.append(column("p" + p + "_f" + axis + "_N", "ground-force", "" + p, "", axis, "N"));
                xml.append(column("p" + p + "_cop" + axis + "_mm", "cop", "" + p, "", axis, "mm"));
            }
        }
        return xml.append("  </table>\n</results>\n").toString();
    }

    private static Map<String, String> strideRow(Path cost) throws IOException {
        List<String> lines = Files.readAllLines(cost.resolve("posture-cost.csv"));
        String[] head = lines.get(0).split(",", -1);
        for (String line : lines) {
            String[] cells = line.split(",", -1);
            if (cells[4].equals("stride")) {
                Map<String, String> row = new LinkedHashMap<>();
                for (int i = 0; i < head.length; i++) {
                    row.put(head[i], cells[i]);
                }
                return row;
            }
        }
        throw new AssertionError("no stride among " + lines);
    }

    private static double number(Map<String, String> row, String column) {
        return Double.parseDouble(row.getOrDefault(column, "NaN"));
    }

    @Test
    void openGaitDataGiveTheFiguresWorkedOutElsewhere() throws IOException {
        Optional<Path> data = gait();
        assumeTrue(data.isPresent(), "the shared gait data are not beside this checkout");
        Path map = Files.writeString(folder.resolve("walk.xml"), walkMap(data.get()));
        Path forces = data.get().resolve("walk1_forces.csv");
        Path cost = folder.resolve("walk-cost");
        Called plain =
                call("appraise", "--results", map.toString(), "--table", forces.toString(), "--out", cost.toString());
        assertThat(plain.code()).as(plain.err()).isEqualTo(3);
        assertThat(plain.err()).contains("left-handed").contains("--mirrored");
        Called c = call(
                "appraise",
                "--results",
                map.toString(),
                "--table",
                forces.toString(),
                "--mirrored",
                "--out",
                cost.toString());
        assertThat(c.code()).as(c.err()).isZero();
        Map<String, String> row = strideRow(cost);
        // independent: README of the data, one stride from sample 343 to 837 at 450 Hz.
        assertThat(number(row, "mass_kg")).isCloseTo(76.52, within(0.2));
        assertThat(number(row, "speed_m_s")).isCloseTo(1.178, within(0.012));
        assertThat(number(row, "com_height_range_m")).isCloseTo(0.0288, within(0.001));
        assertThat(number(row, "combined_positive_J")).isCloseTo(0.776 * 45.2, within(0.02 * 0.776 * 45.2 + 0.2));
        assertThat(number(row, "combined_negative_J")).isCloseTo(-0.667 * 30.5, within(0.02 * 0.667 * 30.5 + 0.2));
        assertThat(c.err()).contains("note results.no-borders");
    }

    /** The demo's first walk as two tables: points in millimetres with y up, loads in newtons with z up. */
    private Path demoAsTables(String timeUnit) throws IOException {
        Path points = folder.resolve("points.csv");
        Path loads = folder.resolve("loads.txt");
        List<String> p = new ArrayList<>(call("tabulate", at("walking-1.c3d"), "--what", "points")
                .out()
                .lines()
                .toList());
        p.addAll(0, List.of("made by a platform", "two lines of remarks"));
        Files.write(points, p);
        Map<String, String[]> rows = new LinkedHashMap<>();
        call("tabulate", at("walking-1.c3d"), "--what", "loads")
                .out()
                .lines()
                .skip(1)
                .forEach(line -> {
                    String[] cells = line.split(",", -1);
                    String[] row = rows.computeIfAbsent(cells[0], k -> new String[15]);
                    row[0] = timeUnit.equals("ms") ? Double.toString(1000 * Double.parseDouble(cells[1])) : cells[1];
                    int platform = Integer.parseInt(cells[2]) - 1;
                    for (int i = 0; i < 7; i++) {
                        row[1 + 7 * platform + i] = cells[3 + i].isEmpty() ? "nan" : cells[3 + i];
                    }
                });
        List<String> table = new ArrayList<>();
        rows.values().forEach(r -> table.add("  " + String.join("   ", r)));
        Files.write(loads, table);
        StringBuilder xml =
                new StringBuilder("<results xmlns=\"urn:solewright:results:1\" subject=\"demo\" mass=\"70\">\n"
                        + "  <axes x=\"forward\" y=\"left\" z=\"up\"/>\n"
                        + "  <table file=\"points.csv\" skipLines=\"2\" timeColumn=\"time_s\">\n");
        for (String[] landmark : new String[][] {
            {"SACR", "sacrum", "both"},
            {"LHEE", "calcaneus_posterior", "left"},
            {"RHEE", "calcaneus_posterior", "right"},
            {"LMT1", "metatarsal_1_head", "left"},
            {"RMT1", "metatarsal_1_head", "right"},
            {"LMT5", "metatarsal_5_head", "left"},
            {"RMT5", "metatarsal_5_head", "right"},
            {"LTOE", "toe_tip", "left"},
            {"RTOE", "toe_tip", "right"}
        }) {
            for (String axis : List.of("x", "y", "z")) {
                xml.append(column(landmark[0] + "_" + axis, "point-position", landmark[1], landmark[2], axis, "mm"));
            }
        }
        xml.append(
                "  </table>\n  <table file=\"loads.txt\" delimiter=\"space\" header=\"false\" timeColumn=\"1\" timeUnit=\""
                        + timeUnit + "\">\n");
        for (int platform = 0; platform < 2; platform++) {
            for (int i = 0; i < 7; i++) {
                String quantity = i < 3 ? "ground-force" : i < 6 ? "cop" : "free-moment";
                String axis = i < 6 ? "xyz".substring(i % 3, i % 3 + 1) : "";
                xml.append(column(
                        "" + (2 + 7 * platform + i),
                        quantity,
                        "" + platform,
                        "",
                        axis,
                        i < 3 ? "N" : i < 6 ? "m" : "N.m"));
            }
        }
        return Files.writeString(
                folder.resolve("demo-results.xml"),
                xml.append("  </table>\n</results>\n").toString());
    }

    @Test
    void walkInTablesCostsWhatTheRecordingCosts() throws IOException {
        Path recorded = folder.resolve("recorded");
        assertThat(call(
                                "appraise",
                                "--walking",
                                at("walking-1.c3d"),
                                "--landmarks",
                                at("landmarks.xml"),
                                "--mass",
                                "70",
                                "--out",
                                recorded.toString())
                        .code())
                .isZero();
        for (String unit : List.of("s", "ms")) {
            Path tabled = folder.resolve("tabled-" + unit);
            Called c = call("appraise", "--results", demoAsTables(unit).toString(), "--out", tabled.toString());
            assertThat(c.code()).as(c.err()).isZero();
            Map<String, String> a = firstRow(recorded);
            Map<String, String> b = firstRow(tabled);
            for (String column : List.of(
                    "push_off_J",
                    "collision_J",
                    "step_length_m",
                    "step_time_s",
                    "speed_m_s",
                    "mass_kg",
                    "transition_angle_deg")) {
                // independent: the same loads and points by way of C3D.
                assertThat(number(b, column))
                        .as(column)
                        .isCloseTo(number(a, column), within(2e-3 * Math.abs(number(a, column))));
            }
        }
    }

    private static Map<String, String> firstRow(Path cost) throws IOException {
        List<String> lines = Files.readAllLines(cost.resolve("posture-cost.csv"));
        String[] head = lines.get(0).split(",", -1);
        String[] cells = lines.get(1).split(",", -1);
        Map<String, String> row = new LinkedHashMap<>();
        for (int i = 0; i < head.length; i++) {
            row.put(head[i], cells[i]);
        }
        return row;
    }

    private void refused(String xml, int code, String... words) throws IOException {
        Path map = Files.writeString(folder.resolve("bad.xml"), xml);
        Path out = folder.resolve("never");
        Called c = call("appraise", "--results", map.toString(), "--out", out.toString());
        assertThat(c.code()).as(xml + c.err()).isEqualTo(code);
        assertThat(c.errors()).as(c.err()).hasSize(1);
        assertThat(c.err()).contains(words);
        assertThat(out).doesNotExist();
    }

    @Test
    void badMapsAndTablesEndInOneLine() throws IOException {
        String good = Files.readString(demoAsTables("s"));
        refused(good.replace("points.csv", "absent.csv"), 3, "absent.csv", "no such file");
        refused(good.replace("\"RHEE_x\"", "\"RHEEL_x\""), 3, "no column 'RHEEL_x'", "did you mean 'RHEE_x'?");
        refused(good.replace("y=\"left\"", "y=\"down\""), 3, "axes");
        refused(good.replace("quantity=\"cop\"", "quantity=\"pressure\""), 3, "pressure");
        refused(good.replace("unit=\"N.m\"", "unit=\"lbf\""), 3, "lbf");
        refused(good.replace(" timeColumn=\"1\"", ""), 3, "neither timeColumn nor rate");
        refused(good.replace("mass=\"70\"", "mass=\"-1\""), 3, "mass -1.0 kg");
        refused(good.replace("file=\"loads.txt\" ", ""), 3, "is a template", "--table");
        refused(good.replace("skipLines=\"2\"", "skipLines=\"1\""), 3, "points.csv");
        refused("<!DOCTYPE r [<!ENTITY e SYSTEM \"file:///etc/passwd\">]>" + good, 3, "bad.xml");
        Path points = folder.resolve("points.csv");
        String table = Files.readString(points);
        Files.writeString(points, table.replaceFirst("\n1,0\\.0,", "\n1,zero,"));
        refused(good, 3, "line 4, column time_s: 'zero'");
        Files.writeString(points, table);
        Called both = call(
                "appraise",
                "--results",
                "x.xml",
                "--walking",
                at("walking-1.c3d"),
                "--out",
                folder.resolve("n").toString());
        assertThat(both.code()).isEqualTo(2);
        assertThat(call("appraise", "--out", folder.resolve("n").toString()).err())
                .contains("--walking");
    }
}
