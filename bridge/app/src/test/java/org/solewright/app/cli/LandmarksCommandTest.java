package org.solewright.app.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;

/** A landmark map that the tool proposes for recordings. */
class LandmarksCommandTest extends DemoCalls {

    @Test
    void proposedMapOfTheDemoFitsAFootLikeTheOneWrittenByHand() throws IOException {
        Path map = folder.resolve("proposed.xml");
        Called c = call("landmarks", at("standing.c3d"), "--out", map.toString());
        assertThat(c.code()).as(c.err()).isZero();
        assertThat(c.err()).contains("landmarks.proposed").doesNotContain("landmark.missing");
        assertThat(Files.readString(map)).contains("confirm every line").contains("<!-- ");
        Path byHand = folder.resolve("by-hand");
        Path proposed = folder.resolve("by-proposal");
        assertThat(fit("--out", byHand.toString()).code()).isZero();
        Called f = call(
                "fit",
                "--standing",
                at("standing.c3d"),
                "--walking",
                at("walking-1.c3d"),
                "--landmarks",
                map.toString(),
                "--runs",
                "3",
                "--out",
                proposed.toString());
        assertThat(f.code()).as(f.err()).isZero();
        // independent: the map that the invented study was made with leads to the same joint.
        assertThat(centre(proposed)).isEqualTo(centre(byHand));
    }

    private static String centre(Path dir) throws IOException {
        String xml = Files.readString(dir.resolve("foot-model-right.xml"));
        String joint = xml.substring(xml.indexOf("<centre "));
        return joint.substring(0, joint.indexOf(" basis"));
    }

    @Test
    void recordingsWithoutPointsAndInputsAsOutputsAreRefusedInOneLine() throws IOException {
        Called missing = call("landmarks", folder.resolve("absent.c3d").toString());
        assertThat(missing.code()).isEqualTo(3);
        assertThat(missing.err().lines()).hasSize(1);
        byte[] before = Files.readAllBytes(demo.resolve("standing.c3d"));
        Called same = call("landmarks", at("standing.c3d"), "--out", at("standing.c3d"));
        assertThat(same.code()).isEqualTo(4);
        assertThat(Files.readAllBytes(demo.resolve("standing.c3d"))).isEqualTo(before);
    }
}
