package org.solewright.app.study;

import static org.assertj.core.api.Assertions.assertThat;
import static org.solewright.app.study.StudyCalls.call;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.solewright.app.pipeline.InventedStudy;
import org.solewright.app.study.StudyCalls.Called;

class WatchCommandTest {

    @TempDir
    private Path folder;

    @Test
    void whatIsDroppedInIsHandedBackAndAFailureWithItsReason() throws IOException {
        Path watched = folder.resolve("hand-over");
        Path invented = folder.resolve("invented");
        InventedStudy.write(invented, 1, 1);
        Path in = Files.createDirectories(watched.resolve("in"));
        Files.copy(invented.resolve("landmarks.xml"), watched.resolve("landmarks.xml"));
        // A job of a folder, without and with its ticket, a job of one recording, one that is broken, one unfinished.
        StudyCalls.copy(invented.resolve("P001"), in.resolve("session"));
        Files.copy(invented.resolve("P001/walking-1.c3d"), in.resolve("walk.c3d"));
        Files.write(in.resolve("broken.c3d"), new byte[] {1, 2, 3});
        Files.createDirectory(in.resolve("empty"));
        Files.write(in.resolve("copying.c3d.part"), new byte[10]);
        Called called = call("watch", watched, "--once", "--settle", "0.1");
        assertThat(called.err()).isEmpty();
        assertThat(called.code()).isEqualTo(1);
        assertThat(called.out().lines()).hasSize(4);
        assertThat(called.out())
                .contains("broken.c3d.job failed: 0 tasks done, 1 failed, ")
                .contains("empty failed: 0 tasks done, 0 failed, ")
                .contains("session done: 2 tasks done, 0 failed, ")
                .contains("walk.c3d.job done: 1 tasks done, 0 failed, ");
        assertThat(watched.resolve("out/session/results/S1/-/walking-1/posture-cost.csv"))
                .exists();
        assertThat(watched.resolve("out/session/models/S1/-/barefoot/foot-model-right.xml"))
                .exists();
        assertThat(watched.resolve("out/walk.c3d.job/tables/transitions.csv")).exists();
        assertThat(watched.resolve("failed/broken.c3d.job.reason.txt"))
                .content()
                .startsWith("appraise S1/broken failed: ");
        assertThat(watched.resolve("failed/empty.reason.txt"))
                .content()
                .isEqualTo("empty: holds no file *.c3d: put the recordings there, in a folder per subject\n");
        assertThat(in.resolve("copying.c3d.part")).exists();
        assertThat(Files.list(watched.resolve("working"))).isEmpty();
    }

    @Test
    void jobThatAStoppedWatchLeftIsDoneAtTheNextStart() throws IOException {
        Path watched = folder.resolve("hand-over");
        Path invented = folder.resolve("invented");
        InventedStudy.writeWhole(invented, 1, 1);
        StudyCalls.copy(invented, watched.resolve("working/job"));
        Files.createDirectories(watched.resolve("out/job"));
        Called called = call("watch", watched, "--once", "--settle", "0");
        assertThat(called.out()).startsWith("job-2 done: 2 tasks done");
        assertThat(watched.resolve("out/job-2/tables/transitions.csv")).exists();
    }

    @Test
    void secondWatchAndWrongNumbersAreRefused() throws Exception {
        try (StudyLock lock = StudyLock.of(folder, false, "")) {
            Called called = call("watch", lock.folder(), "--once");
            assertThat(called.code()).isEqualTo(4);
            assertThat(called.err()).contains("another run works on it: stop the other watch first");
        }
        assertThat(call("watch", folder, "--settle", "-1").code()).isEqualTo(2);
        assertThat(call("watch", folder, "--jobs", "0").code()).isEqualTo(2);
    }
}
