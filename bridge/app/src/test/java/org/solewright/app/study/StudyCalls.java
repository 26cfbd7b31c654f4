package org.solewright.app.study;

import java.io.IOException;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.stream.Stream;
import org.solewright.app.cli.Main;

/** Calls the commands on studies and looks at what they left. */
final class StudyCalls {

    private StudyCalls() {}

    /** What a call printed and returned. */
    record Called(int code, String out, String err) {
        List<String> errors() {
            return err.lines().toList();
        }
    }

    static Called call(Object... args) {
        StringWriter out = new StringWriter();
        StringWriter err = new StringWriter();
        int code = Main.run(
                new PrintWriter(out),
                new PrintWriter(err),
                Stream.of(args).map(Object::toString).toArray(String[]::new));
        return new Called(code, out.toString(), err.toString());
    }

    /** Digests of all files that a study writes for people, by name. */
    static Map<String, String> results(Path study) throws IOException {
        Map<String, String> digests = new TreeMap<>();
        try (Stream<Path> files = Files.walk(study)) {
            for (Path f : files.filter(Files::isRegularFile).toList()) {
                String name = study.relativize(f).toString();
                if (name.startsWith("models")
                        || name.startsWith("results")
                        || name.startsWith("tables")
                        || name.equals("ro-crate-metadata.json")) {
                    digests.put(name, Digests.sha256(f));
                }
            }
        }
        return digests;
    }

    /** Copies a study without what was computed. */
    static void copy(Path from, Path to) throws IOException {
        try (Stream<Path> files = Files.walk(from)) {
            for (Path f : files.toList()) {
                Path target = to.resolve(from.relativize(f).toString());
                if (Files.isDirectory(f)) {
                    Files.createDirectories(target);
                } else {
                    Files.copy(f, target);
                }
            }
        }
    }
}
