package org.solewright.formats.table;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.solewright.domain.motion.ResultsMap;
import org.solewright.formats.io.FormatException;

class ResultsTableTest {

    @TempDir
    private Path folder;

    private static ResultsMap.Column column(String name, double scale) {
        return new ResultsMap.Column(name, ResultsMap.Quantity.COP, "1", Optional.empty(), 0, scale);
    }

    private static ResultsMap.Table map(char delimiter, int skip, boolean hasHeader, String time, String... names) {
        return new ResultsMap.Table(
                "",
                delimiter,
                skip,
                hasHeader,
                time,
                1,
                time.isEmpty() ? OptionalDouble.of(100) : OptionalDouble.empty(),
                List.of(names).stream().map(n -> column(n, 1e-3)).toList());
    }

    private ResultsTable read(String text, ResultsMap.Table map) throws IOException, FormatException {
        Path file = folder.resolve("table.txt");
        Files.writeString(file, text);
        return ResultsTable.read(file, map);
    }

    @Test
    void mappedColumnsComeInTheMapsOrderAndInSiUnits() throws IOException, FormatException {
        ResultsTable t = read("remark\nt;a;b\n0;1;2\n0.01;3;\n0.02;5;nan\n", map(';', 1, true, "t", "b", "a"));
        assertThat(t.samples()).isEqualTo(3);
        assertThat(t.rate()).isCloseTo(100, within(1e-9));
        assertThat(t.isResampled()).isFalse();
        // exact: millimetres to metres.
        assertThat(t.column(1)).containsExactly(0.001, 0.003, 0.005);
        assertThat(t.column(0)[0]).isEqualTo(0.002);
        assertThat(t.column(0)[1]).isNaN();
        assertThat(t.column(0)[2]).isNaN();
    }

    @Test
    void tableWithoutHeaderAndTimesIsNumbered() throws IOException, FormatException {
        ResultsTable t = read("  1  2\n\t3\t4 \n\n", map(' ', 0, false, "", "2"));
        assertThat(t.column(0)).containsExactly(0.002, 0.004);
        assertThat(t.start()).isZero();
        assertThat(t.rate()).isEqualTo(100);
    }

    @Test
    void unevenTimesAreInterpolated() throws IOException, FormatException {
        ResultsTable t = read("t,a\n1,0\n1.01,10\n1.04,40\n1.06,60\n1.08,80\n", map(',', 0, true, "t", "a"));
        assertThat(t.isResampled()).isTrue();
        assertThat(t.start()).isEqualTo(1);
        // exact: the column is linear in time, at a mean spacing of 0.02 s.
        for (int i = 0; i < 5; i++) {
            assertThat(t.column(0)[i]).isCloseTo(0.02 * i, within(1e-12));
        }
    }

    private void refused(String text, ResultsMap.Table map, String... words) {
        assertThatThrownBy(() -> read(text, map))
                .isInstanceOf(FormatException.class)
                .satisfies(e -> assertThat(e.getMessage()).contains(words));
    }

    @Test
    void tablesThatAreNotAsMappedAreRefusedWithTheirPlace() throws IOException {
        ResultsMap.Table map = map(',', 0, true, "t", "a");
        refused("t,b\n0,1\n1,2\n", map, "no column 'a'");
        refused("t,a\n0,1\n", map, "holds 1 rows");
        refused("", map, "holds 0 rows");
        refused("t,a\n0,1\n0,2\n", map, "row 2 is at 0.0 s after 0.0 s");
        refused("t,a\n0,1\nx,2\n", map, "line 3, column t: 'x'");
        refused("t,a\n0,1\n1,1e999\n", map, "line 3, column a");
        refused("t,a\n0,\"1\n", map, "1");
        refused("one line\n", map(',', 3, true, "t", "a"), "ends within the 3 lines");
        refused("1,2\n3,4\n", map(',', 0, false, "", "3"), "column '3' is no number from 1 to 2");
        refused("1,2\n3,4\n", map(',', 0, false, "", "a"), "column 'a' is no number");
        Path latin = folder.resolve("latin.txt");
        Files.write(latin, "t,\u00e4\n0,1\n1,2\n".getBytes(StandardCharsets.ISO_8859_1));
        assertThatThrownBy(() -> ResultsTable.read(latin, map)).hasMessageContaining("not UTF-8");
    }
}
