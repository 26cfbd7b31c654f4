package org.solewright.formats.c3d;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.net.URISyntaxException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Where the recordings and their truth lie. */
final class Recordings {

    private Recordings() {}

    /** The folder of recordings beside the checkout; empty where it is absent. */
    static Optional<Path> shared() {
        String named = System.getProperty("solewright.shared", "");
        if (!named.isEmpty()) {
            return Optional.of(Path.of(named, "c3d")).filter(Files::isDirectory);
        }
        for (Path p = Path.of("").toAbsolutePath(); p != null; p = p.getParent()) {
            Path c3d = p.resolve("shared").resolve("c3d");
            if (Files.isDirectory(c3d)) {
                return Optional.of(c3d);
            }
        }
        return Optional.empty();
    }

    /** A recording of the project's own test resources. */
    static Path own(String name) {
        try {
            return Path.of(Recordings.class.getResource(name).toURI());
        } catch (URISyntaxException e) {
            throw new IllegalStateException(e);
        }
    }

    /** One JSON object per line. */
    static List<JsonNode> lines(Path file) {
        ObjectMapper mapper = new ObjectMapper();
        List<JsonNode> nodes = new ArrayList<>();
        try {
            for (String line : Files.readAllLines(file)) {
                if (!line.isBlank()) {
                    nodes.add(mapper.readTree(line));
                }
            }
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
        return nodes;
    }
}
