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

/** What the sources cite as [Author Year] stands among the references of DEVELOPERS.md. */
class ReferencesTest {

    private static final Pattern CITED =
            Pattern.compile("\\[([A-Z]\\p{L}+)[^\\]\\d]*?\\b((?:18|19|20)\\d\\d)\\b[^\\]]*]");

    @Test
    void everyCitationHasItsReference() throws IOException {
        Path root = Path.of("").toAbsolutePath();
        while (!Files.exists(root.resolve("DEVELOPERS.md"))) {
            root = root.getParent();
            assertThat(root).as("folder of DEVELOPERS.md").isNotNull();
        }
        List<String> references = List.of(Files.readString(root.resolve("DEVELOPERS.md"))
                .split("## References")[1]
                .split("\n- "));
        TreeSet<String> missing = new TreeSet<>();
        int cited = 0;
        for (String module : List.of("converters/domain", "converters/formats", "bridge/analysis", "bridge/app")) {
            try (Stream<Path> files = Files.walk(root.resolve(module).resolve("src"))) {
                for (Path file :
                        files.filter(f -> f.toString().endsWith(".java")).toList()) {
                    Matcher m = CITED.matcher(Files.readString(file));
                    while (m.find()) {
                        cited++;
                        String author = m.group(1);
                        String year = m.group(2);
                        if (references.stream().noneMatch(r -> r.contains(author) && r.contains(year))) {
                            missing.add(author + " " + year + " (" + file.getFileName() + ")");
                        }
                    }
                }
            }
        }
        assertThat(cited).isGreaterThan(20);
        assertThat(missing).isEmpty();
    }
}
