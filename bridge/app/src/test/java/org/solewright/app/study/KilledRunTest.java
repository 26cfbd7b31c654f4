package org.solewright.app.study;

import static org.assertj.core.api.Assertions.assertThat;
import static org.solewright.app.study.StudyCalls.call;
import static org.solewright.app.study.StudyCalls.results;

import java.io.BufferedReader;
import java.io.File;
import java.io.IOException;
import java.io.InputStreamReader;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.solewright.app.cli.Main;
import org.solewright.app.pipeline.InventedStudy;
import org.solewright.app.study.StudyCalls.Called;

/** A process that is killed in the middle of a study, by SIGKILL where the system has it. */
class KilledRunTest {

    @TempDir
    private Path folder;

    private static Process start(Path study) throws IOException {
        String classes =
                System.getProperty("java.class.path") + File.pathSeparator + System.getProperty("jdk.module.path", "");
        return new ProcessBuilder(List.of(
                        Path.of(System.getProperty("java.home"), "bin", "java").toString(),
                        "-XX:TieredStopAtLevel=1",
                        "-cp",
                        classes,
                        Main.class.getName(),
                        "study",
                        study.toString(),
                        "--jobs",
                        "1",
                        "--progress",
                        "json"))
                .redirectOutput(ProcessBuilder.Redirect.DISCARD)
                .start();
    }

    @Test
    void killedRunGoesOnToTheSameBytes() throws IOException, InterruptedException {
        Path undisturbed = folder.resolve("undisturbed");
        InventedStudy.writeWhole(undisturbed, 2, 2);
        Path killed = folder.resolve("killed");
        StudyCalls.copy(undisturbed, killed);
        assertThat(call("study", undisturbed).code()).isZero();

        Process process = start(killed);
        int ended = 0;
        try (BufferedReader events =
                new BufferedReader(new InputStreamReader(process.getErrorStream(), StandardCharsets.UTF_8))) {
            for (String line = events.readLine(); line != null && ended < 3; line = events.readLine()) {
                ended += line.contains("\"event\":\"ended\"") ? 1 : 0;
            }
            process.destroyForcibly().waitFor();
        } finally {
            process.destroyForcibly();
        }
        assertThat(ended).as("tasks that ended before the kill").isEqualTo(3);
        assertThat(killed.resolve("tables")).doesNotExist();

        Called resumed = call("study", killed);
        assertThat(resumed.err()).isEmpty();
        assertThat(resumed.code()).isZero();
        // At least what was told before the kill is not done again.
        assertThat(resumed.out())
                .doesNotContain(" 6 done")
                .doesNotContain(" 5 done")
                .doesNotContain(" 4 done");
        assertThat(results(killed)).isEqualTo(results(undisturbed)).hasSizeGreaterThan(20);
        try (Stream<Path> files = Files.walk(killed)) {
            assertThat(files.map(f -> f.getFileName().toString()))
                    .noneMatch(n -> n.endsWith(".part") || n.equals(".working"));
        }
    }
}
