package org.solewright.formats.table;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.solewright.domain.gait.ContactRow;
import org.solewright.domain.gait.Side;
import org.solewright.domain.gait.Use;
import org.solewright.formats.io.FormatException;

class ContactsTableTest {

    private static final String HEADER = "trial,side,platform,start_s,end_s,whole,used_for,not_used_for,why\n";

    private static final List<ContactRow> ROWS = List.of(
            new ContactRow(
                    "walk-1.c3d",
                    Side.RIGHT,
                    List.of(1),
                    2.2583333333333333,
                    2.9,
                    true,
                    List.of(Use.MASS, Use.PUSH_OFF),
                    List.of(),
                    ""),
            new ContactRow(
                    "walk-1.c3d",
                    Side.LEFT,
                    List.of(1, 2),
                    2.75,
                    3.4,
                    false,
                    List.of(),
                    List.of(Use.CONTACT_ANGLE, Use.COLLISION),
                    "rear border, 31 mm over"),
            new ContactRow("walk-1.c3d", Side.RIGHT, List.of(), 3.3, 3.9, false, List.of(), List.of(), "kinematic"));

    @TempDir
    Path folder;

    private Path file(String content) throws IOException {
        return Files.writeString(folder.resolve("contacts.csv"), content);
    }

    private FormatException refusal(String content) throws IOException {
        Path file = file(content);
        FormatException e = catchThrowableOfType(FormatException.class, () -> ContactsTable.read(file));
        assertThat(e).as("refused").isNotNull();
        assertThat(e.source()).isEqualTo(file.toString());
        return e;
    }

    @Test
    void writtenTableHasTheFixedColumnsAndReadsBackEqual() throws Exception {
        Path file = folder.resolve("contacts.csv");
        ContactsTable.write(file, ROWS);
        assertThat(Files.readString(file))
                .startsWith(HEADER + "walk-1.c3d,right,1,2.2583333333333333,2.9,true,mass;push-off,,\n"
                        + "walk-1.c3d,left,1+2,2.75,3.4,false,,contact-angle;collision,\"rear border, 31 mm over\"\n");
        assertThat(ContactsTable.read(file)).isEqualTo(ROWS);
    }

    @Test
    void handMadeTableNeedsOnlyWhatMatters() throws Exception {
        Path file = file("\ufeffside , trial,whole,end_s,start_s\r\nLeft,w,yes,3,2.5\r\n\r\nright,w,no,4,3.5\r\n");
        assertThat(ContactsTable.read(file))
                .containsExactly(
                        new ContactRow("w", Side.LEFT, List.of(), 2.5, 3, true, List.of(), List.of(), ""),
                        new ContactRow("w", Side.RIGHT, List.of(), 3.5, 4, false, List.of(), List.of(), ""));
    }

    @Test
    void departuresNameLineAndWhatWasMeant() throws Exception {
        FormatException side = refusal(HEADER + "w,rigth,1,1,2,true,,,\n");
        assertThat(side).hasMessage("line 2: side 'rigth', expected left or right");
        assertThat(side.whatToDo()).isEqualTo("did you mean 'right'?");
        FormatException use = refusal(HEADER + "w,right,1,1,2,true,mass;colision,,\n");
        assertThat(use).hasMessage("line 2: unknown use 'colision' in used_for");
        assertThat(use.whatToDo()).isEqualTo("did you mean 'collision'?");
        FormatException column = refusal(HEADER.replace("start_s", "start") + "w,right,1,1,2,true,,,\n");
        assertThat(column).hasMessage("line 1: unknown column 'start'");
        assertThat(column.whatToDo()).isEqualTo("did you mean 'start_s'?");
    }

    @Test
    void numbersAndTimesAreChecked() throws Exception {
        FormatException comma = refusal(HEADER + "w,right,1,\"1,5\",2,true,,,\n");
        assertThat(comma).hasMessage("line 2: start_s '1,5', expected a number in s");
        assertThat(comma.whatToDo()).isEqualTo("write a point as decimal mark");
        assertThat(refusal(HEADER + "w,right,1,3,2,true,,,\n")).hasMessage("line 2: contact from 3.0 s to 2.0 s");
        assertThat(refusal(HEADER + "w,right,1,NaN,2,true,,,\n"))
                .hasMessage("line 2: start_s 'NaN', expected a finite number in s");
        assertThat(refusal(HEADER + "w,right,0,1,2,true,,,\n").getMessage()).startsWith("line 2: platform '0', ");
        assertThat(refusal(HEADER + "w,right,1,1,2,maybe,,,\n"))
                .hasMessage("line 2: whole 'maybe', expected true or false");
    }

    @Test
    void damagedTablesAreRefused() throws Exception {
        assertThat(refusal("")).hasMessage("the file is empty, expected a header row");
        assertThat(refusal("trial,side\nw,left\n"))
                .hasMessage("line 1: no column 'start_s', expected " + HEADER.strip());
        assertThat(refusal(HEADER + "w,right,1\n")).hasMessage("line 2: 3 cells, expected 9 as in the header");
        Path latin = Files.write(
                folder.resolve("latin.csv"),
                (HEADER + "w,right,1,1,2,true,,,f\u00fcnf\n").getBytes(StandardCharsets.ISO_8859_1));
        FormatException e = catchThrowableOfType(FormatException.class, () -> ContactsTable.read(latin));
        assertThat(e).hasMessage("bytes that are not UTF-8 text");
    }
}
