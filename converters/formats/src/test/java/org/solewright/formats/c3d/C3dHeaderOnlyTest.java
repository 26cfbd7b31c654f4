package org.solewright.formats.c3d;

import static org.assertj.core.api.Assertions.assertThat;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import com.fasterxml.jackson.databind.JsonNode;
import java.io.IOException;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.solewright.formats.io.FormatException;

/** Header and parameters read alone say the same as the whole file. */
class C3dHeaderOnlyTest {

    private static void compare(Path path) throws IOException, FormatException {
        C3dFile whole = C3dFile.read(path);
        C3dFile header = C3dFile.readHeader(path);
        assertThat(header.labels()).as(path.toString()).isEqualTo(whole.labels());
        assertThat(header.analogLabels()).isEqualTo(whole.analogLabels());
        assertThat(header.rate()).isEqualTo(whole.rate());
        assertThat(header.storedFrames()).isEqualTo(whole.frames());
        assertThat(header.platforms()).isEqualTo(whole.platforms());
        assertThat(header.events()).isEqualTo(whole.events());
        assertThat(header.frames()).isZero();
    }

    @Test
    void ownRecordings() throws IOException, FormatException {
        for (String name : new String[] {"good.c3d", "gap_before_data.c3d", "dec_int.c3d", "mips_int.c3d"}) {
            compare(Recordings.own(name));
        }
    }

    @Test
    void realRecordings() throws IOException, FormatException {
        assumeTrue(Recordings.shared().isPresent(), "the shared recordings are not beside this checkout");
        Path folder = Recordings.shared().orElseThrow();
        for (JsonNode truth : Recordings.lines(folder.resolve("truth.jsonl"))) {
            compare(folder.resolve("files").resolve(truth.get("file").asText()));
        }
    }
}
