package org.solewright.app.cli;

import java.io.PrintWriter;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.Callable;
import org.solewright.app.pipeline.Survey;
import org.solewright.app.pipeline.SurveyJson;
import org.solewright.app.pipeline.UseCaseException;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.Severity;
import org.solewright.formats.io.FormatException;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** Says what C3D files hold and what is wrong with them. */
@Command(
        name = "survey",
        description = "Says what a C3D file holds and what is wrong with it.",
        footer = {"", "Example:", "  solewright survey walk-1.c3d walk-2.c3d --json"})
final class SurveyCommand implements Callable<Integer> {

    @Parameters(paramLabel = "FILE", arity = "1..*", description = "C3D files.")
    private List<Path> files = new ArrayList<>();

    @Option(names = "--json", description = "One JSON document per file, each on one line.")
    private boolean isJson;

    @Option(names = "--header", description = "Read no data block; leave gaps and peaks out.")
    private boolean isHeaderOnly;

    @Spec
    private CommandSpec spec = CommandSpec.create();

    /** For picocli. */
    SurveyCommand() {}

    @Override
    public Integer call() {
        PrintWriter out = spec.commandLine().getOut();
        int failed = 0;
        for (Path file : files) {
            try {
                Survey survey = Survey.of(file, isHeaderOnly);
                if (isJson) {
                    out.println(SurveyJson.line(survey));
                } else {
                    survey.page().forEach(l -> out.println(FindingPrinter.printable(l)));
                }
                for (Finding f : survey.findings()) {
                    if (f.severity() == Severity.ERROR) {
                        failed++;
                        spec.commandLine()
                                .getErr()
                                .println("solewright: " + file + ": " + f.message()
                                        + ": get a complete copy of the file");
                        break;
                    }
                }
            } catch (UseCaseException e) {
                failed++;
                report(out, file, Finding.error("file.unreadable", "", e.getMessage() + ": " + e.whatToDo()));
            } catch (FormatException e) {
                failed++;
                report(out, file, Finding.error("file.format", "", e.getMessage() + ": " + e.whatToDo()));
            }
            out.flush();
        }
        return failed == 0 ? ExitCode.DONE : failed == files.size() ? ExitCode.INPUT : ExitCode.SOME_FAILED;
    }

    private void report(PrintWriter out, Path file, Finding finding) {
        spec.commandLine().getErr().println(FindingPrinter.printable("solewright: " + file + ": " + finding.message()));
        if (isJson) {
            out.println(SurveyJson.failed(file.toString(), finding));
        }
    }
}
