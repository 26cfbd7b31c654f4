package org.solewright.bench;

import java.io.IOException;
import java.io.PrintWriter;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.TreeMap;
import org.openjdk.jmh.results.RunResult;
import org.openjdk.jmh.runner.Runner;
import org.openjdk.jmh.runner.RunnerException;
import org.openjdk.jmh.runner.options.OptionsBuilder;
import org.openjdk.jmh.runner.options.TimeValue;
import org.openjdk.jmh.runner.options.VerboseMode;

/** Runs all benchmarks once and prints their times and what they are to their yardsticks. */
public final class Ratios {

    private static final int ROUNDS = 3;

    private Ratios() {}

    /**
     * Runs them.
     *
     * @param args part of the names of the benchmarks to run; none for all
     * @throws RunnerException where the harness cannot run
     * @throws IOException where the folder for temporary files cannot be used
     */
    public static void main(String[] args) throws RunnerException, IOException {
        PrintWriter out = new PrintWriter(System.out, true, StandardCharsets.UTF_8);
        List<String> recordings = recordings(out);
        if (args.length == 0 || "org.solewright.bench.C3dDecode".contains(args[0])) {
            C3dMemory.print(out);
        }
        OptionsBuilder options = new OptionsBuilder();
        options.include(args.length > 0 ? args[0] : "org.solewright.bench")
                .forks(1)
                .warmupIterations(ROUNDS)
                .warmupTime(TimeValue.seconds(2))
                .measurementIterations(ROUNDS)
                .measurementTime(TimeValue.seconds(2))
                .jvmArgs(jvmArgs())
                .param("file", recordings.toArray(new String[0]))
                .verbosity(VerboseMode.SILENT);
        Map<String, Double> times = new TreeMap<>();
        for (RunResult result : new Runner(options.build()).run()) {
            String name = result.getParams().getBenchmark();
            String file = result.getParams().getParam("file");
            times.put(
                    name.substring(name.lastIndexOf('.', name.lastIndexOf('.') - 1) + 1)
                            + (file == null ? "" : " " + file),
                    result.getPrimaryResult().getScore());
        }
        times.forEach((name, time) -> out.printf(Locale.ROOT, "%-44s %14.3f us%n", name, time));
        ratio(
                out,
                times,
                "TransitionStep.checked",
                "TransitionStep.bare",
                "transition step over bare formula, at most 3");
        ratio(out, times, "SolveFile.jackson", "SolveFile.solve", "JSON alone over solve, at least 0.3");
        for (String file : recordings) {
            String wanted = file.equals(C3dDecode.GENERATED) ? "0.5" : "0.3";
            ratio(
                    out,
                    times,
                    "C3dDecode.plain " + file,
                    "C3dDecode.read " + file,
                    file + ": plain loop over reading, at least " + wanted);
            ratio(out, times, "C3dDecode.copy " + file, "C3dDecode.read " + file, file + ": copy over reading");
            ratio(
                    out,
                    times,
                    "C3dDecode.readOnePoint " + file,
                    "C3dDecode.read " + file,
                    file + ": one point over reading all");
        }
        limit(out, times, "Models.landscape", 1e6, "million rows of a landscape over 1 s, at most 1");
        limit(out, times, "Models.levelGait", 50, "level gait over 50 us, at most 1");
        limit(out, times, "Models.walker", 5000, "walker with eigenvalues over 5 ms, at most 1");
    }

    private static List<String> recordings(PrintWriter out) {
        List<String> there = new ArrayList<>(List.of(C3dDecode.GENERATED));
        for (String name : C3dDecode.SHARED) {
            if (C3dDecode.shared(name).isPresent()) {
                there.add(name);
            } else {
                out.println("left out, not there: " + name);
            }
        }
        return there;
    }

    private static String[] jvmArgs() {
        String shared = System.getProperty("solewright.shared", "");
        return shared.isEmpty() ? new String[] {"-Xmx2g"} : new String[] {"-Xmx2g", "-Dsolewright.shared=" + shared};
    }

    private static void ratio(PrintWriter out, Map<String, Double> times, String of, String to, String what) {
        Double a = times.get(of);
        Double b = times.get(to);
        if (a != null && b != null) {
            out.printf(Locale.ROOT, "%8.3f  %s%n", a / b, what);
        }
    }

    private static void limit(PrintWriter out, Map<String, Double> times, String of, double limit, String what) {
        Double time = times.get(of);
        if (time != null) {
            out.printf(Locale.ROOT, "%8.3f  %s%n", time / limit, what);
        }
    }
}
