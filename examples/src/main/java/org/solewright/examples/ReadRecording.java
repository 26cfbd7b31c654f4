package org.solewright.examples;

import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.motion.Recording;
import org.solewright.formats.c3d.C3dFile;
import org.solewright.formats.io.FormatException;

/** Reads a C3D recording in SI units and looks at its platforms. */
public final class ReadRecording {

    private ReadRecording() {}

    /**
     * Greatest vertical load of each platform.
     *
     * @param file a C3D file
     * @return one line per platform
     * @throws IOException where the file cannot be read
     * @throws FormatException where it is no C3D file
     */
    public static List<String> peaks(Path file) throws IOException, FormatException {
        Recording recording = C3dFile.read(file).toRecording();
        List<String> lines = new ArrayList<>();
        for (PlatformLoads platform : recording.platforms()) {
            double peak = 0;
            for (int sample = 0; sample < platform.samples(); sample++) {
                peak = Math.max(peak, platform.vertical(sample));
            }
            lines.add(String.format(Locale.ROOT, "platform %d: %.1f N", platform.number(), peak));
        }
        return lines;
    }
}
