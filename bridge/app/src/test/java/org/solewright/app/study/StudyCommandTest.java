package org.solewright.app.study;

import static org.assertj.core.api.Assertions.assertThat;
import static org.solewright.app.study.StudyCalls.call;
import static org.solewright.app.study.StudyCalls.results;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.json.JsonMapper;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.solewright.app.pipeline.InventedStudy;
import org.solewright.app.study.StudyCalls.Called;
import org.solewright.formats.io.FormatException;
import org.solewright.formats.table.PlainTable;

class StudyCommandTest {

    @TempDir
    private static Path shared;

    @TempDir
    private Path folder;

    private Path study;

    @BeforeAll
    static void invent() throws IOException {
        InventedStudy.writeWhole(shared.resolve("invented"), 2, 2);
    }

    @BeforeEach
    void copy() throws IOException {
        study = folder.resolve("study");
        StudyCalls.copy(shared.resolve("invented"), study);
    }

    private void write(String name, String text) throws IOException {
        Files.writeString(study.resolve(name), text, StandardCharsets.UTF_8);
    }

    private String read(String name) throws IOException {
        return Files.readString(study.resolve(name), StandardCharsets.UTF_8);
    }

    @Test
    void secondRunSkipsAllAndOneJobGivesTheBytesOfTwo() throws IOException, FormatException {
        Called first = call("study", study, "--jobs", 2);
        assertThat(first.err()).isEmpty();
        assertThat(first.code()).isZero();
        assertThat(first.out()).startsWith(study + ": 6 done, 0 unchanged and skipped, 0 failed, 0 refused");
        Called second = call("study", study);
        assertThat(second.out())
                .isEqualTo(study + ": 0 done, 6 unchanged and skipped, 0 failed, 0 refused\n" + study
                        + "/tables: up to date\n");
        Path other = folder.resolve("elsewhere");
        StudyCalls.copy(shared.resolve("invented"), other);
        assertThat(call("study", other, "--jobs", 1).code()).isZero();
        assertThat(results(other)).isEqualTo(results(study)).hasSizeGreaterThan(20);
        PlainTable.Content transitions = PlainTable.read(study.resolve("tables/transitions.csv"));
        assertThat(transitions.columns()).startsWith("subject", "session", "condition", "trial", "step", "side");
        assertThat(transitions.rows()).hasSize(4);
        assertThat(PlainTable.read(study.resolve("tables/feet.csv")).rows()).hasSize(4);
        // Exact: the invented subject weighs 70 kg, as stated.
        PlainTable.Content measures = PlainTable.read(study.resolve("tables/measures.csv"));
        assertThat(measures.rows().stream()
                        .filter(r -> measures.cell(r, "quantity").equals("limb_length_m")))
                .isNotEmpty()
                .allMatch(r -> measures.cell(r, "unit").equals("m"));
        assertThat(read("tables/trials.csv")).doesNotContain(folder.toString());
        assertThat(read("tables/findings.csv")).doesNotContain(folder.toString());
    }

    @Test
    void metadataNameEveryTableWithItsDigest() throws IOException {
        call("study", study);
        JsonNode crate = new JsonMapper()
                .readTree(study.resolve("ro-crate-metadata.json").toFile());
        JsonNode table = null;
        for (JsonNode e : crate.get("@graph")) {
            if (e.get("@id").asText().equals("tables/transitions.csv")) {
                table = e;
            }
            assertThat(e.get("@id").asText()).doesNotStartWith("/");
        }
        assertThat(table).isNotNull();
        assertThat(table.get("sha256").asText()).isEqualTo(Digests.sha256(study.resolve("tables/transitions.csv")));
        assertThat(crate.get("@graph").get(1).get("datePublished").asText()).isEqualTo("2026-03-01");
    }

    @Test
    void changedInputIsDoneAgainAndNothingElse() throws IOException {
        call("study", study);
        Files.copy(
                study.resolve("P001/walking-1.c3d"),
                study.resolve("P002/walking-2.c3d"),
                java.nio.file.StandardCopyOption.REPLACE_EXISTING);
        // The walk, and the foot that it was fitted from, and the other walk of that foot.
        assertThat(call("study", study).out()).startsWith(study + ": 3 done, 3 unchanged and skipped");
        Files.delete(study.resolve("results/P001/-/walking-1/postures.csv"));
        write("results/P001/-/walking-2/posture-cost.csv", "cut");
        assertThat(call("study", study).out()).startsWith(study + ": 2 done, 4 unchanged and skipped");
        write("subjects.csv", "id,mass_kg,population,sex\nP001,70,adult,female\nP002,70,adult,male\n");
        assertThat(call("study", study).out()).startsWith(study + ": 3 done, 3 unchanged and skipped");
    }

    @Test
    void oneBadTrialIsNamedAndTheOthersAreDone() throws IOException, FormatException {
        Files.write(study.resolve("P002/walking-1.c3d"), new byte[0]);
        write(
                "trials.csv",
                "subject,kind,file,walking_aid\nP001,standing,P001/standing.c3d,\nP001,walking,P001/walking-1.c3d,\n"
                        + "P001,walking,P001/walking-2.c3d,cane\nP002,standing,P002/standing.c3d,\n"
                        + "P002,walking,P002/walking-1.c3d,\nP002,walking,P002/walking-2.c3d,\n");
        Called called = call("study", study);
        assertThat(called.code()).isEqualTo(1);
        assertThat(called.out()).startsWith(study + ": 4 done, 0 unchanged and skipped, 1 failed, 1 refused\n");
        assertThat(called.errors())
                .hasSize(2)
                .anyMatch(l -> l.startsWith(
                        "solewright: appraise P001/walking-2 refused: walking aid 'cane': loads on the hands"));
        assertThat(called.errors()).anyMatch(l -> l.startsWith("solewright: appraise P002/walking-1 failed: "));
        PlainTable.Content trials = PlainTable.read(study.resolve("tables/trials.csv"));
        assertThat(trials.rows().stream().map(r -> trials.cell(r, "state")))
                .containsExactly("done", "done", "done", "refused", "failed", "done");
        // Nothing has changed: named again, not done again.
        assertThat(call("study", study).out())
                .startsWith(study + ": 0 done, 4 unchanged and skipped, 1 failed, 1 refused");
        Files.copy(
                study.resolve("P001/walking-1.c3d"),
                study.resolve("P002/walking-1.c3d"),
                java.nio.file.StandardCopyOption.REPLACE_EXISTING);
        Called status = call("study", "status", study);
        assertThat(status.out()).contains("4 trials, 2 done, 1 failed, 1 refused, 0 not done yet");
        Called retried = call("study", "retry", study, "--failed");
        assertThat(retried.out()).contains("0 failed, 1 refused");
    }

    @Test
    void failedFitFailsItsTrialsWithTheReason() throws IOException {
        Files.write(study.resolve("P002/standing.c3d"), new byte[] {1, 2, 3});
        Called called = call("study", study);
        assertThat(called.code()).isEqualTo(1);
        assertThat(called.errors())
                .hasSize(3)
                .anyMatch(l ->
                        l.startsWith("solewright: appraise P002/walking-1 failed: no foot: the fit of P002 failed: "));
    }

    @Test
    void checkNamesEverythingWithFileAndLine() throws IOException {
        write("subjects.csv", "id,mass_kg,population\nP001,70,adult\nP009,,\nP001,1,adult\n");
        write(
                "trials.csv",
                "subject,kind,file,condition,walking_aid,slope_deg\nP001,standing,P001/standing.c3d,,,\n"
                        + "P001,walking,P001/none.c3d,,,\nP002,walking,P002/walking-1.c3d,shod,,5\n"
                        + "P001,walking,P001,,,\nP001,walking,P001/walking-1.c3d,,crutches,\n"
                        + "P001,walking,trials.csv,prosthesis,,\nP001,jumping,x.c3d,,,\nP001,results,t.csv,,,\n"
                        + "P001,results,P001/walking-2.c3d,,,\n");
        Called called = call("study", "check", study);
        assertThat(called.code()).isEqualTo(1);
        String all = called.err();
        assertThat(all)
                .contains("subjects.csv: error study.unusable: line 4: subject 'P001' for the second time")
                .contains("trials.csv: error study.unusable: line 8: kind 'jumping'")
                .contains("subjects.csv line 3: warning study.subject-unused")
                .contains("subjects.csv line 3: warning study.mass-missing")
                .contains("subjects.csv line 3: warning study.population-missing")
                .contains("trials.csv line 3: error study.file-missing: there is no file 'P001/none.c3d'")
                .contains("trials.csv line 4: error study.subject-unknown")
                .contains("trials.csv line 4: warning study.slope")
                .contains("trials.csv line 4: warning study.sole-thickness")
                .contains("trials.csv line 4: warning study.no-standing")
                .contains("trials.csv line 5: error study.file-unreadable: 'P001' is a folder")
                .contains("trials.csv line 6: error study.walking-aid")
                .contains("trials.csv line 7: error study.file-unreadable: 'trials.csv'")
                .contains("trials.csv line 7: warning study.prosthesis")
                .contains("trials.csv line 7: warning study.standing-condition")
                .contains("trials.csv line 9: error study.file-missing")
                .contains("trials.csv line 10: error study.column-map-missing");
        Called run = call("study", study);
        assertThat(run.code()).isEqualTo(3);
        assertThat(run.errors()).hasSize(1);
        assertThat(run.err()).contains("(the first of 2 mistakes)");
    }

    @Test
    void studyThatIsNoneIsOneLine() throws IOException {
        assertThat(call("study", folder.resolve("none")).err())
                .isEqualTo("solewright: " + folder.resolve("none")
                        + ": no such folder: give the folder of a study; 'study init DIR' makes one of a folder of"
                        + " recordings\n");
        Called file = call("study", study.resolve("study.xml"));
        assertThat(file.code()).isEqualTo(3);
        assertThat(file.errors()).hasSize(1);
        write("study.xml", "<study");
        Called xml = call("study", study);
        assertThat(xml.code()).isEqualTo(3);
        assertThat(xml.errors()).hasSize(1);
        Called check = call("study", "check", folder);
        assertThat(check.code()).isEqualTo(3);
        assertThat(check.errors()).hasSize(3);
        assertThat(call("study").code()).isEqualTo(2);
        assertThat(call("study", study, "--jobs", 0).code()).isEqualTo(2);
        assertThat(call("study", study, "--progress", "x").code()).isEqualTo(2);
    }

    @Test
    void damagedLedgerIsRefusedAndLeftAsItIs() throws IOException {
        call("study", study);
        Path ledger = study.resolve("ledger.sqlite");
        byte[] bytes = Files.readAllBytes(ledger);
        for (int i = 4096; i < 12288; i++) {
            bytes[i] = (byte) (31 * i);
        }
        Files.write(ledger, bytes);
        Called called = call("study", study);
        assertThat(called.code()).isEqualTo(3);
        assertThat(called.errors()).hasSize(1);
        assertThat(called.err()).contains("ledger.sqlite: is a damaged ledger (");
        assertThat(Files.readAllBytes(ledger)).isEqualTo(bytes);
        Files.writeString(ledger, "no database, but text that is long enough to be looked at".repeat(30));
        assertThat(call("study", study).err()).contains("is a damaged ledger (SQLITE_NOTADB)");
        assertThat(call("study", "status", study).code()).isEqualTo(3);
        Files.delete(ledger);
        Files.createDirectory(ledger);
        Called directory = call("study", study);
        assertThat(directory.code()).isEqualTo(3);
        assertThat(directory.errors()).hasSize(1);
    }

    @Test
    void secondRunAtOnceIsRefused() throws Exception {
        try (StudyLock lock = StudyLock.of(study, false, "wait")) {
            Called called = call("study", lock.folder());
            assertThat(called.code()).isEqualTo(4);
            assertThat(called.err())
                    .isEqualTo(
                            "solewright: " + study + ": another run works on it: wait for it to end, or give --wait\n");
        }
        assertThat(call("study", study, "--wait").code()).isZero();
    }

    @Test
    void unwritableResultsEndTheRunAndLoseNothing() throws IOException {
        write("results", "a file where a folder is needed");
        Called called = call("study", study);
        assertThat(called.code()).isEqualTo(4);
        assertThat(called.errors()).hasSize(1);
        assertThat(called.err()).contains("cannot be written").contains("what is done stays done");
        Files.delete(study.resolve("results"));
        Called again = call("study", study);
        assertThat(again.code()).isZero();
        assertThat(again.out()).contains("4 done, 2 unchanged and skipped");
    }

    @Test
    void stoppedRunSaysHowToGoOn() throws Exception {
        int[] asked = {0};
        StudyRun.Result stopped =
                StudyRun.run(new StudyRun.Request(study, 1, false, false, "test", () -> asked[0]++ > 6), new Silent());
        assertThat(stopped.left()).isPositive();
        assertThat(stopped.written()).isEmpty();
        StudyRun.Result rest =
                StudyRun.run(new StudyRun.Request(study, 1, false, false, "test", () -> false), new Silent());
        assertThat(rest.skipped()).isEqualTo(stopped.done());
        assertThat(rest.done() + rest.skipped()).isEqualTo(6);
    }

    /** Hears nothing. */
    private static final class Silent implements StudyListener {
        @Override
        public void begin(String what, int tasks) {}

        @Override
        public void ended(String kind, String name, String state, String message) {}

        @Override
        public void finished() {}
    }

    @Test
    void jsonProgressIsOneEventALine() throws IOException {
        List<String> events = call("study", study, "--progress", "json").errors();
        // Three parts begin, six tasks end, one end.
        assertThat(events).hasSize(10);
        JsonMapper mapper = new JsonMapper();
        assertThat(mapper.readTree(events.get(0)).get("event").asText()).isEqualTo("begin");
        assertThat(mapper.readTree(events.get(1)).get("of").asInt()).isEqualTo(2);
        assertThat(mapper.readTree(events.get(9)).get("event").asText()).isEqualTo("finished");
    }

    @Test
    void ledgerIsExported() throws IOException, FormatException {
        assertThat(call("study", "export", study).err()).contains("there is no ledger: run the study first");
        call("study", study);
        Called csv = call("study", "export", study, "--format", "csv", "--out", folder.resolve("out"));
        assertThat(csv.code()).isZero();
        PlainTable.Content tasks = PlainTable.read(folder.resolve("out/task.csv"));
        assertThat(tasks.rows()).hasSize(7);
        assertThat(call("study", "export", study, "--format", "sqlite").out())
                .isEqualTo("wrote " + study + "/ledger-export.sqlite\n");
        assertThat(Files.size(study.resolve("ledger-export.sqlite"))).isPositive();
        assertThat(call("study", "export", study, "--format", "parquet").code()).isEqualTo(2);
    }

    @Test
    void initProposesFromPlainFolders() throws IOException, FormatException {
        for (String name : List.of("study.xml", "subjects.csv", "trials.csv")) {
            Files.delete(study.resolve(name));
        }
        Called init = call("study", "init", study);
        assertThat(init.code()).isZero();
        assertThat(init.out())
                .contains("found 2 subjects, 2 standing and 4 walking trials")
                .contains("the landmark map is landmarks.xml");
        PlainTable.Content trials = PlainTable.read(study.resolve("trials.csv"));
        assertThat(trials.rows().stream().map(r -> trials.cell(r, "kind")))
                .containsExactly("standing", "walking", "walking", "standing", "walking", "walking");
        assertThat(call("study", "check", study).code()).isZero();
        assertThat(call("study", study).code()).isZero();
        Called again = call("study", "init", study);
        assertThat(again.code()).isEqualTo(4);
        assertThat(again.err()).contains("is there already and is not replaced");
        assertThat(call("study", "init", study.resolve("models")).code()).isEqualTo(3);
    }

    @Test
    void initUnderstandsNamesByParts() throws IOException, FormatException {
        Path named = folder.resolve("named");
        Path of = Files.createDirectories(named.resolve("sub-07/ses-2"));
        // A name that does not tell: the motion does.
        Files.copy(study.resolve("P001/standing.c3d"), of.resolve("sub-07_ses-2_task-a_run-1.c3d"));
        Files.copy(study.resolve("P001/walking-1.c3d"), of.resolve("sub-07_ses-2_task-a_run-2.c3d"));
        Files.copy(study.resolve("P001/walking-2.c3d"), of.resolve("sub-07_ses-2_task-shodwalk_run-3.c3d"));
        assertThat(call("study", "init", named).out()).contains("no landmark map was found");
        PlainTable.Content trials = PlainTable.read(named.resolve("trials.csv"));
        assertThat(trials.rows().stream()
                        .map(r -> String.join(
                                " ",
                                trials.cell(r, "subject"),
                                trials.cell(r, "session"),
                                trials.cell(r, "trial"),
                                trials.cell(r, "kind"),
                                trials.cell(r, "condition"))))
                .containsExactly(
                        "07 2 a-1 standing barefoot", "07 2 a-2 walking barefoot", "07 2 shodwalk-3 walking shod");
    }
}
