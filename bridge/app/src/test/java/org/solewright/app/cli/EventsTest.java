package org.solewright.app.cli;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.solewright.domain.motion.RecordedEvent;
import org.solewright.domain.motion.Recording;
import org.solewright.formats.c3d.C3dFile;
import org.solewright.formats.c3d.C3dWriter;
import org.solewright.formats.io.FormatException;

/** Contacts by platforms, by the file's events and by kinematics. */
class EventsTest extends DemoCalls {

    /** A demo recording whose events are those that platforms show, moved by some seconds. */
    private Path eventful(double late) throws IOException, FormatException {
        Path notes = folder.resolve("notes");
        assertThat(fit("--out", folder.resolve("plain").toString(), "--annotate", notes.toString())
                        .code())
                .isZero();
        List<RecordedEvent> events =
                C3dFile.read(notes.resolve("walking-1.c3d")).events();
        Recording walk = C3dFile.read(demo.resolve("walking-1.c3d")).toRecording();
        List<RecordedEvent> moved = new ArrayList<>();
        for (RecordedEvent e : events) {
            moved.add(new RecordedEvent(e.time() + late, e.context(), e.label(), e.source()));
        }
        Path file = Files.createDirectories(folder.resolve("late" + late)).resolve("walking-1.c3d");
        C3dWriter.write(
                file,
                new Recording(
                        "walking-1.c3d",
                        walk.rate(),
                        1,
                        walk.frames(),
                        walk.points(),
                        walk.platforms(),
                        moved,
                        List.of()));
        return file;
    }

    private Called appraise(Path walking, String... more) {
        List<String> args = new ArrayList<>(List.of(
                "appraise",
                "--walking",
                walking.toString(),
                "--landmarks",
                at("landmarks.xml"),
                "--out",
                folder.resolve("cost").toString()));
        args.addAll(List.of(more));
        return call(args.toArray(String[]::new));
    }

    private double firstStart() throws IOException {
        return Double.parseDouble(Files.readAllLines(folder.resolve("cost").resolve("appraise-contacts.csv"))
                .get(1)
                .split(",")[3]);
    }

    @Test
    void eventsThatAgreeAreNotMentionedAndLateOnesAre() throws IOException, FormatException {
        assertThat(appraise(eventful(0)).err()).doesNotContain("events.differ");
        Called late = appraise(eventful(0.015));
        assertThat(late.err()).contains("warning events.differ").contains("3 frames apart");
        double platform = firstStart();
        Called file = appraise(eventful(0.015), "--events", "file");
        assertThat(file.code()).as(file.err()).isZero();
        // exact: the file's events are 0.015 s late; they are stored as float32 seconds.
        assertThat(firstStart()).isCloseTo(platform + 0.015, within(1e-6));
    }

    @Test
    void kinematicContactsAreNearThoseOfThePlatforms() throws IOException, FormatException {
        appraise(eventful(0));
        double platform = firstStart();
        assertThat(appraise(eventful(0), "--events", "kinematic").code()).isZero();
        // published: [Zeni et al. 2008] tell contacts within a few frames of platforms: 0.03 s.
        assertThat(firstStart()).isCloseTo(platform, within(0.06));
        assertThat(firstStart()).isNotEqualTo(platform);
    }

    @Test
    void unknownSourcesAndSpeedsAreWrongUsage() throws IOException, FormatException {
        assertThat(appraise(eventful(0), "--events", "guess").err()).contains("use platform, file or kinematic");
        assertThat(appraise(eventful(0), "--belt-speed", "-1").code()).isEqualTo(2);
    }
}
