package org.solewright.app;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.TreeSet;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.solewright.app.pipeline.FindingCures;

/** The list of finding codes in DEVELOPERS.md is that of the sources, and each has a cure. */
class FindingCodesTest {

    private static final Pattern IN_SOURCE =
            Pattern.compile("(?:Finding\\s*\\.\\s*(?:note|warning|error)|new Finding)\\(\\s*\"([a-z0-9.-]+)\"");
    private static final Pattern IN_LIST = Pattern.compile("^\\| `([a-z0-9-]+\\.[a-z0-9.-]+)` \\|", Pattern.MULTILINE);

    @Test
    void everyCodeIsListedAndEveryListedCodeIsUsed() throws IOException {
        Path root = Path.of("").toAbsolutePath();
        while (!Files.exists(root.resolve("DEVELOPERS.md"))) {
            root = root.getParent();
            assertThat(root).as("folder of DEVELOPERS.md").isNotNull();
        }
        TreeSet<String> used = new TreeSet<>();
        for (String module : List.of("converters/domain", "converters/formats", "bridge/analysis", "bridge/app")) {
            try (Stream<Path> files = Files.walk(root.resolve(module).resolve("src/main/java"))) {
                for (Path file :
                        files.filter(f -> f.toString().endsWith(".java")).toList()) {
                    Matcher m = IN_SOURCE.matcher(Files.readString(file));
                    while (m.find()) {
                        used.add(m.group(1));
                    }
                }
            }
        }
        TreeSet<String> listed = new TreeSet<>();
        Matcher m = IN_LIST.matcher(Files.readString(root.resolve("DEVELOPERS.md")));
        while (m.find()) {
            listed.add(m.group(1));
        }
        assertThat(used).hasSizeGreaterThan(50);
        assertThat(listed).isEqualTo(used);
        FindingCures cures = FindingCures.read();
        for (String code : used) {
            assertThat(cures.of(code)).as("what to do about " + code).isPresent();
        }
    }
}
