package org.solewright.app.pipeline;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Optional;

/** Finds the folder of shared data beside the checkout; tests that need it are skipped, visibly, without it. */
final class SharedFolder {

    private SharedFolder() {}

    static Optional<Path> find() {
        String given = System.getProperty("solewright.shared", "");
        if (!given.isEmpty()) {
            return Optional.of(Path.of(given)).filter(Files::isDirectory);
        }
        Path at = Path.of("").toAbsolutePath();
        while (at != null) {
            Path shared = at.resolve("shared");
            if (Files.isDirectory(shared.resolve("design"))) {
                return Optional.of(shared);
            }
            at = at.getParent();
        }
        return Optional.empty();
    }
}
