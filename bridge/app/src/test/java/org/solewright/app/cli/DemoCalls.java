package org.solewright.app.cli;

import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.io.TempDir;

/** Calls the commands on the demo's invented study, written once. */
abstract class DemoCalls {

    @TempDir
    static Path folder;

    static Path demo;
    static Called demonstrated;

    /** What a call printed and returned. */
    record Called(int code, String out, String err) {
        List<String> errors() {
            return err.lines().toList();
        }
    }

    static Called call(String... args) {
        StringWriter out = new StringWriter();
        StringWriter err = new StringWriter();
        int code = Main.run(new PrintWriter(out), new PrintWriter(err), args);
        return new Called(code, out.toString(), err.toString());
    }

    @BeforeAll
    static void runTheDemoOnce() {
        demo = folder.resolve("demo");
        demonstrated = call("demo", demo.toString());
    }

    static String at(String name) {
        return demo.resolve(name).toString();
    }

    static Called fit(String... more) {
        List<String> args = new ArrayList<>(List.of(
                "fit",
                "--standing",
                at("standing.c3d"),
                "--walking",
                at("walking-1.c3d"),
                "--landmarks",
                at("landmarks.xml")));
        args.addAll(Arrays.asList(more));
        if (!args.contains("--runs")) {
            // Few Monte Carlo runs: their number is not what these calls are about.
            args.addAll(List.of("--runs", "3"));
        }
        return call(args.toArray(String[]::new));
    }
}
